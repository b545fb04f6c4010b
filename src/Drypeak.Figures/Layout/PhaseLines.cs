using Drypeak.Figures.Drawing;
using Drypeak.Soil.Phases;
using Drypeak.Soil.Quantities;

namespace Drypeak.Figures.Layout;

/// <summary>A line of equal saturation or equal air voids.</summary>
/// <param name="Kind">Its kind.</param>
/// <param name="Percent">Its saturation or air voids, %.</param>
/// <param name="Phrases">The language that its label is in.</param>
/// <param name="DryDensityAt">Dry density in the chart's unit at a water content in %, 0 or more.</param>
internal sealed record PhaseLine(PhaseLineKind Kind, double Percent, Phrases Phrases, Func<double, double> DryDensityAt)
{

    /// <summary>Its label, the fullest first.</summary>
    public IReadOnlyList<string> Labels => Kind switch
    {
        PhaseLineKind.ZeroAirVoids => [Phrases.ZeroAirVoids, Filled(Phrases.Saturation.Brief)],
        PhaseLineKind.Saturation => [Filled(Phrases.Saturation.Full), Filled(Phrases.Saturation.Brief)],
        PhaseLineKind.AirVoids => [Filled(Phrases.AirVoids.Full), Filled(Phrases.AirVoids.Brief)],
        _ => throw new InvalidOperationException(),
    };

    private string Filled(string template) => Phrases.Fill(template, Phrases.Number(FormattableString.Invariant($"{Percent:0.###} %")));

    /// <summary>Its class in SVG.</summary>
    public string Name => Kind.Name();

    public Stroke Stroke(TypeScale type, Theme theme) => Kind switch
    {
        PhaseLineKind.ZeroAirVoids => new(ColorRole.Ink, 1.25 * type.Unit, type.Dash(theme.ReferenceDash)),
        PhaseLineKind.Saturation => new(ColorRole.Quiet, type.Unit, type.Dash([7, 4])),
        PhaseLineKind.AirVoids => new(ColorRole.Quiet, type.Unit, type.Dash([1.5, 3.5])),
        _ => throw new InvalidOperationException(),
    };
}

/// <summary>The lines that a chart asks for, the zero-air-voids line first, of the kinds to be drawn; none where the solids are not known.</summary>
internal sealed class PhaseLines
{
    private PhaseLines(IReadOnlyList<PhaseLine> all) => All = all;

    public IReadOnlyList<PhaseLine> All { get; }

    public static PhaseLines Of(CompactionChart chart, FigureOptions options)
    {
        if (chart is not { SpecificGravity: { } gravity, WaterDensity: { } kilogramsPerCubicMeter })
        {
            return new PhaseLines([]);
        }

        var water = new Density(kilogramsPerCubicMeter);
        PhaseLine Saturation(double percent, PhaseLineKind kind) => new(kind, percent, options.Language.Phrases, w =>
            PhaseRelations.OnSaturationLine(WaterContent.FromPercent(w), percent / 100, gravity, water).In(chart.DensityUnit));
        PhaseLine AirVoids(double percent) => new(PhaseLineKind.AirVoids, percent, options.Language.Phrases, w =>
            PhaseRelations.OnAirVoidsLine(WaterContent.FromPercent(w), percent / 100, gravity, water).In(chart.DensityUnit));

        PhaseLine[] all =
        [
            Saturation(100, PhaseLineKind.ZeroAirVoids),
            .. chart.Saturation.Where(percent => percent != 100).Distinct().Select(percent => Saturation(percent, PhaseLineKind.Saturation)),
            .. chart.AirVoids.Where(percent => percent != 0).Distinct().Select(AirVoids),
        ];
        return new PhaseLines([.. all.Where(line => options.Lines.Contains(line.Kind))]);
    }

    public double? ZeroAirVoidsAt(double waterContent) => All is [{ Kind: PhaseLineKind.ZeroAirVoids } line, ..] && waterContent >= 0 ? line.DryDensityAt(waterContent) : null;
}
