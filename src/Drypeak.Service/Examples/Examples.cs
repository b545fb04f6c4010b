using System.Text;
using Drypeak.Figures;
using Drypeak.Soil.Quantities;

namespace Drypeak.Service;

/// <summary>Whole examples from Ternmarsh, an invented flood embankment: they stand in the API description and behind the pages' demo.</summary>
internal static class Examples
{
    /// <summary>A laboratory test of five specimens, as JSON.</summary>
    public static string MoistureDensityRequest { get; } = Text("moisture-density.json");

    /// <summary>The same soil tested by two laboratories, as JSON.</summary>
    public static string ComparisonRequest { get; } = Text("comparison.json");

    /// <summary>Lines for a chart, as JSON.</summary>
    public static string SaturationLinesRequest { get; } = Text("saturation-lines.json");

    /// <summary>The fines of a stony fill corrected to all of it, as JSON.</summary>
    public static string OversizeCorrectionRequest { get; } = Text("oversize-correction.json");

    /// <summary>One soil at standard and modified effort, as JSON.</summary>
    public static string EffortSeriesRequest { get; } = Text("effort-series.json");

    /// <summary>A sand cone test of a lift, as JSON.</summary>
    public static string FieldDensityRequest { get; } = Text("field-density.json");

    /// <summary>A sand between its limits, as JSON.</summary>
    public static string RelativeDensityRequest { get; } = Text("relative-density.json");

    /// <summary>A point on the family of the borrow areas, as JSON.</summary>
    public static string OnePointRequest { get; } = Text("one-point.json");

    /// <summary>The rapid method on a lift, as JSON.</summary>
    public static string RapidMethodRequest { get; } = Text("rapid-method.json");

    /// <summary>A lot of ten tests with a retest and one set aside, as JSON.</summary>
    public static string LotAcceptanceRequest { get; } = Text("lot-acceptance.json");

    /// <summary>What six tests a lot risk, as JSON.</summary>
    public static string AcceptancePlanRequest { get; } = Text("acceptance-plan.json");

    /// <summary>Two laboratory tests, a row a specimen, as CSV.</summary>
    public static string LaboratoryCsv { get; } = Text("moisture-density.csv");

    /// <summary>A compaction test and two field densities, as AGS4.</summary>
    public static string Ags4 { get; } = Text("ternmarsh.ags");

    /// <summary>Water for five portions of the borrow area's soil, as JSON.</summary>
    public static string SpecimenWaterRequest { get; } = Text("specimen-water.json");

    /// <summary>Water for a lift on a dry day, as JSON.</summary>
    public static string LiftWaterRequest { get; } = Text("lift-water.json");

    /// <summary>A reach of the embankment from two borrow areas, as JSON.</summary>
    public static string QuantitiesRequest { get; } = Text("quantities.json");

    /// <summary>A test programme around a culvert, as JSON.</summary>
    public static string TestLocationsRequest { get; } = Text("test-locations.json");

    /// <summary>A padfoot roller, as JSON.</summary>
    public static string RollerOutputRequest { get; } = Text("roller-output.json");

    /// <summary>A trial strip of four, six, eight and ten passes, as JSON.</summary>
    public static string TestStripRequest { get; } = Text("test-strip.json");

    private static string Text(string name)
    {
        using var stream = typeof(Examples).Assembly.GetManifestResourceStream($"Drypeak.Service.Examples.{name}")
            ?? throw new InvalidOperationException($"The example {name} is not in the program.");
        using var reader = new StreamReader(stream, Encoding.UTF8);
        return reader.ReadToEnd();
    }
}

/// <summary>Charts for the API description's addresses. Their numbers are written here, not computed, so that an address reads the same on every machine.</summary>
internal static class ExampleChart
{
    /// <summary>A laboratory test.</summary>
    public static CompactionChart Compaction { get; } = new()
    {
        Reference = "Ternmarsh, borrow area 7, sample 3",
        DensityUnit = DensityUnit.MegagramPerCubicMeter,
        Specimens =
        [
            new ChartSpecimen(10.1, 1.749, "1", false), new ChartSpecimen(12.0, 1.821, "2", false), new ChartSpecimen(13.8, 1.861, "3", false),
            new ChartSpecimen(16.1, 1.83, "4", false), new ChartSpecimen(18.0, 1.77, "5", false),
        ],
        Curve =
        [
            new ChartPoint(10.1, 1.75), new ChartPoint(11, 1.782), new ChartPoint(12, 1.817), new ChartPoint(13, 1.848), new ChartPoint(14.2, 1.864),
            new ChartPoint(15, 1.855), new ChartPoint(16, 1.83), new ChartPoint(17, 1.799), new ChartPoint(18, 1.767),
        ],
        Optimum = new ChartOptimum(14.2, 1.864, "14.2 %", "1.86 Mg/m³", [13.7, 15.3], [1.843, 1.885]),
        SpecificGravity = 2.7,
        WaterDensity = 998.2,
    };

    /// <summary>Results in order with a limit.</summary>
    public static PlotChart Plot { get; } = new()
    {
        Title = "4 of 5 tests met 95 % relative compaction",
        Reference = "Ternmarsh, lot 12",
        Description = "Relative compaction of 5 tests in order: 94.1 to 98.3 %. 4 of them met at least 95 %.",
        X = new PlotAxis("Test") { Positions = [new(1, "1"), new(2, "2"), new(3, "3"), new(4, "4"), new(5, "5")] },
        Y = new PlotAxis("Relative compaction (%)"),
        Limits = [new PlotLimit(95, "at least 95 %")],
        Marks =
        [
            new PlotMark(1, 97.2, MarkRole.Met), new PlotMark(2, 96.4, MarkRole.Met), new PlotMark(3, 94.1, MarkRole.NotMet, "3"),
            new PlotMark(4, 98.3, MarkRole.Met), new PlotMark(5, 96.9, MarkRole.Met),
        ],
    };
}
