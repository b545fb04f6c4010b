using System.Text.Json.Serialization;
using Drypeak.Figures.Drawing;
using Drypeak.Soil.Quantities;

namespace Drypeak.Figures;

/// <summary>
/// What a compaction figure shows, in the reader's units: everything needed, and nothing that a fit would have to find. Water contents are
/// in % of dry mass, densities in <see cref="DensityUnit"/>. Every number is finite and within ±<see cref="LargestNumber"/>;
/// <see cref="CompactionFigure.Refusal(CompactionChart, FigureOptions)"/> says where one is not. Immutable, safe on any thread.
/// </summary>
public sealed record CompactionChart
{
    /// <summary>The largest number, of either sign, that a figure is drawn for.</summary>
    public const double LargestNumber = 1e9;

    /// <summary>The test's one-line name, in any language; shown elided where it is long. Null or blank: none.</summary>
    public string? Reference { get; init; }

    /// <summary>The result in one line where it is not the optimum, as for a field test on its laboratory's curve; null or blank: the optimum is the result.</summary>
    [JsonIgnore(Condition = JsonIgnoreCondition.WhenWritingNull)]
    public string? Statement { get; init; }

    /// <summary>Unit of every density of the chart.</summary>
    public required DensityUnit DensityUnit { get; init; }

    /// <summary>The specimens, in any order; none is possible.</summary>
    public required IReadOnlyList<ChartSpecimen> Specimens { get; init; }

    /// <summary>The fitted curve, in order of water content; empty where there is none.</summary>
    public IReadOnlyList<ChartPoint> Curve { get; init; } = [];

    /// <summary>The curve's pointwise 95 % interval, in order of water content; null where there is none.</summary>
    [JsonIgnore(Condition = JsonIgnoreCondition.WhenWritingNull)]
    public IReadOnlyList<ChartBandPoint>? Band { get; init; }

    /// <summary>Curves of other models, drawn where they are asked for; null where the chart carries none.</summary>
    [JsonIgnore(Condition = JsonIgnoreCondition.WhenWritingNull)]
    public IReadOnlyList<ChartModel>? Models { get; init; }

    /// <summary>The fitted optimum, or null where the tested range holds none.</summary>
    public ChartOptimum? Optimum { get; init; }

    /// <summary>The optimum that an engineer adopted: where given, it is the result that the figure's title and leader lines show.</summary>
    public ChartOptimum? Adopted { get; init; }

    /// <summary>The reported optimum corrected for oversize.</summary>
    public ChartOptimum? Corrected { get; init; }

    /// <summary>Specific gravity of solids, over 0. With <see cref="WaterDensity"/> it gives the lines; the zero-air-voids line is then always drawn.</summary>
    public double? SpecificGravity { get; init; }

    /// <summary>Density of water, kg/m³, over 0.</summary>
    public double? WaterDensity { get; init; }

    /// <summary>Lines of equal saturation, %, each over 0 and up to 100 (which is the zero-air-voids line).</summary>
    public IReadOnlyList<double> Saturation { get; init; } = [];

    /// <summary>Lines of equal air voids, % of the total volume, each from 0 (the zero-air-voids line) to below 100.</summary>
    public IReadOnlyList<double> AirVoids { get; init; } = [];

    /// <summary>Water content where one more specimen would tell most, %, or null.</summary>
    public double? NextSpecimen { get; init; }

    /// <summary>Field tests, in any order.</summary>
    public IReadOnlyList<ChartFieldTest> FieldTests { get; init; } = [];

    /// <summary>Where a field test is accepted, or null.</summary>
    [JsonIgnore(Condition = JsonIgnoreCondition.WhenWritingNull)]
    public ChartZone? Zone { get; init; }

    /// <summary>Every optimum that is given.</summary>
    internal IEnumerable<ChartOptimum> Optima => new[] { Optimum, Adopted, Corrected }.OfType<ChartOptimum>();
}

/// <summary>A point of the chart.</summary>
/// <param name="WaterContent">%.</param>
/// <param name="DryDensity">In the chart's unit.</param>
public readonly record struct ChartPoint(double WaterContent, double DryDensity)
{
    /// <summary>As numbers along the axes.</summary>
    internal DataPoint Data => new(WaterContent, DryDensity);
}

/// <summary>How far the curve is known at a water content.</summary>
/// <param name="WaterContent">%.</param>
/// <param name="Lower">In the chart's unit.</param>
/// <param name="Upper">In the chart's unit.</param>
public readonly record struct ChartBandPoint(double WaterContent, double Lower, double Upper);

/// <summary>The curve of another model.</summary>
/// <param name="Name">Its name, as in an answer.</param>
/// <param name="Curve">In order of water content.</param>
public sealed record ChartModel(string Name, IReadOnlyList<ChartPoint> Curve);

/// <summary>A specimen's mark.</summary>
/// <param name="WaterContent">%.</param>
/// <param name="DryDensity">In the chart's unit.</param>
/// <param name="Label">The specimen's label, drawn beside the mark where there is room; null: none.</param>
/// <param name="SetAside">Not fitted: drawn hollow.</param>
public sealed record ChartSpecimen(double WaterContent, double DryDensity, string? Label, bool SetAside)
{
    /// <summary>Half of the 95 % interval of the water content, %, 0 or more; null where its uncertainty is not known.</summary>
    [JsonIgnore(Condition = JsonIgnoreCondition.WhenWritingNull)]
    public double? WaterContentPlusMinus { get; init; }

    /// <summary>Half of the 95 % interval of the dry density, in the chart's unit, 0 or more; null where its uncertainty is not known.</summary>
    [JsonIgnore(Condition = JsonIgnoreCondition.WhenWritingNull)]
    public double? DryDensityPlusMinus { get; init; }

    /// <summary>Whether an error bar is drawn.</summary>
    internal bool IsUncertain => WaterContentPlusMinus > 0 || DryDensityPlusMinus > 0;

    /// <summary>Where the specimen stands.</summary>
    internal ChartPoint Point => new(WaterContent, DryDensity);
}

/// <summary>A field test's mark: a square, filled or crossed by what it came to.</summary>
/// <param name="WaterContent">%.</param>
/// <param name="DryDensity">In the chart's unit.</param>
/// <param name="Label">The test's label, drawn beside the mark where there is room; null: none.</param>
/// <param name="Outcome">What it came to; <see cref="MarkRole.Measured"/> where it was not judged.</param>
public sealed record ChartFieldTest(double WaterContent, double DryDensity, string? Label, MarkRole Outcome)
{
    /// <summary>Where the test stands.</summary>
    internal ChartPoint Point => new(WaterContent, DryDensity);
}

/// <summary>Where water content and dry density are both as asked for.</summary>
/// <param name="Corners">In turn, three or more; the last is joined to the first.</param>
/// <param name="Label">What is written in it, where there is room; null: nothing.</param>
public sealed record ChartZone(IReadOnlyList<ChartPoint> Corners, string? Label);

/// <summary>An optimum, with the texts in which it is reported.</summary>
/// <param name="WaterContent">%.</param>
/// <param name="MaximumDryDensity">In the chart's unit.</param>
/// <param name="ReportedWaterContent">As reported, with its unit: <c>13.9 %</c>.</param>
/// <param name="ReportedMaximumDryDensity">As reported, with its unit: <c>1.83 Mg/m³</c>.</param>
/// <param name="WaterContentInterval">Ends of the 95 % interval, %, lower first; null where there is none.</param>
/// <param name="MaximumDryDensityInterval">Ends of the 95 % interval, in the chart's unit, lower first; null where there is none.</param>
public sealed record ChartOptimum(
    double WaterContent,
    double MaximumDryDensity,
    string ReportedWaterContent,
    string ReportedMaximumDryDensity,
    double[]? WaterContentInterval,
    double[]? MaximumDryDensityInterval)
{
    /// <summary>Where the optimum stands.</summary>
    internal ChartPoint Point => new(WaterContent, MaximumDryDensity);
}

/// <summary>Size of a figure in px (1/96 inch).</summary>
/// <param name="Width">px, <see cref="Smallest"/> to <see cref="Largest"/>.</param>
/// <param name="Height">px, <see cref="Smallest"/> to <see cref="Largest"/>.</param>
public sealed record FigureSize(int Width, int Height)
{
    /// <summary>Smallest width and height, px.</summary>
    public const int Smallest = 240;

    /// <summary>Largest width and height, px.</summary>
    public const int Largest = 2400;

    /// <summary>The size meant where none is given.</summary>
    public static FigureSize Default { get; } = new(960, 640);
}
