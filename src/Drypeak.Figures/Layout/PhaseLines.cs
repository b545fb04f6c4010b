using Drypeak.Figures.Drawing;
using Drypeak.Soil.Phases;
using Drypeak.Soil.Quantities;

namespace Drypeak.Figures.Layout;

/// <summary>Kinds of lines through states of equal air.</summary>
internal enum PhaseLineKind
{
    ZeroAirVoids,
    Saturation,
    AirVoids,
}

/// <summary>A line of equal saturation or equal air voids.</summary>
/// <param name="Kind">Its kind.</param>
/// <param name="Percent">Its saturation or air voids, %.</param>
/// <param name="DryDensityAt">Dry density in the chart's unit at a water content in %, 0 or more.</param>
internal sealed record PhaseLine(PhaseLineKind Kind, double Percent, Func<double, double> DryDensityAt)
{
    private string PercentText => FormattableString.Invariant($"{Percent:0.###} %");

    /// <summary>Its label, the fullest first.</summary>
    public IReadOnlyList<string> Labels => Kind switch
    {
        PhaseLineKind.ZeroAirVoids => ["zero air voids", "S 100 %"],
        PhaseLineKind.Saturation => [$"saturation {PercentText}", $"S {PercentText}"],
        PhaseLineKind.AirVoids => [$"air voids {PercentText}", $"A {PercentText}"],
        _ => throw new InvalidOperationException(),
    };

    /// <summary>Its class in SVG.</summary>
    public string Name => Kind switch
    {
        PhaseLineKind.ZeroAirVoids => "zero-air-voids",
        PhaseLineKind.Saturation => "saturation",
        PhaseLineKind.AirVoids => "air-voids",
        _ => throw new InvalidOperationException(),
    };

    public Stroke Stroke(TypeScale type, Theme theme) => Kind switch
    {
        PhaseLineKind.ZeroAirVoids => new(ColorRole.Ink, 1.25 * type.Unit, type.Dash(theme.ZeroAirVoidsDash)),
        PhaseLineKind.Saturation => new(ColorRole.Quiet, type.Unit, type.Dash([7, 4])),
        PhaseLineKind.AirVoids => new(ColorRole.Quiet, type.Unit, type.Dash([1.5, 3.5])),
        _ => throw new InvalidOperationException(),
    };
}

/// <summary>The lines that a chart asks for, the zero-air-voids line first; none where the solids are not known.</summary>
internal sealed class PhaseLines
{
    private PhaseLines(IReadOnlyList<PhaseLine> all) => All = all;

    public IReadOnlyList<PhaseLine> All { get; }

    public static PhaseLines Of(CompactionChart chart)
    {
        if (chart is not { SpecificGravity: { } gravity, WaterDensity: { } kilogramsPerCubicMeter })
        {
            return new PhaseLines([]);
        }

        var water = new Density(kilogramsPerCubicMeter);
        PhaseLine Saturation(double percent, PhaseLineKind kind) => new(kind, percent, w =>
            PhaseRelations.OnSaturationLine(WaterContent.FromPercent(w), percent / 100, gravity, water).In(chart.DensityUnit));
        PhaseLine AirVoids(double percent) => new(PhaseLineKind.AirVoids, percent, w =>
            PhaseRelations.OnAirVoidsLine(WaterContent.FromPercent(w), percent / 100, gravity, water).In(chart.DensityUnit));

        return new PhaseLines(
        [
            Saturation(100, PhaseLineKind.ZeroAirVoids),
            .. chart.Saturation.Where(percent => percent != 100).Distinct().Select(percent => Saturation(percent, PhaseLineKind.Saturation)),
            .. chart.AirVoids.Where(percent => percent != 0).Distinct().Select(AirVoids),
        ]);
    }

    public double? ZeroAirVoidsAt(double waterContent) => All.Count > 0 && waterContent >= 0 ? All[0].DryDensityAt(waterContent) : null;
}
