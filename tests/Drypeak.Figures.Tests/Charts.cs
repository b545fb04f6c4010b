using CsCheck;
using Drypeak.Soil.Quantities;

namespace Drypeak.Figures.Tests;

/// <summary>Charts to draw: one written by hand, and any number of varied ones.</summary>
internal static class Charts
{
    /// <summary>Five specimens and their parabola, with everything that a first answer shows.</summary>
    public static CompactionChart Ternmarsh { get; } = new()
    {
        Reference = "Ternmarsh flood embankment, borrow area 7, sample 3",
        DensityUnit = DensityUnit.MegagramPerCubicMeter,
        Specimens =
        [
            new(9.8, 1.712, "1", false),
            new(11.7, 1.782, "2", false),
            new(13.2, 1.826, "3", false),
            new(15.4, 1.811, "4", false),
            new(17.3, 1.757, "5", false),
        ],
        Curve = Parabola(14.1, 1.826, 0.0063, 9.8, 17.3),
        Band = [.. Enumerable.Range(0, 17).Select(i => 9.8 + (7.5 * i / 16)).Select(w => new ChartBandPoint(w, Peaked(w) - Half(w), Peaked(w) + Half(w)))],
        Optimum = new(14.1, 1.826, "14.1 %", "1.83 Mg/m³", [13.6, 14.6], [1.813, 1.839]),
        SpecificGravity = 2.68,
        WaterDensity = 998.2,
        Saturation = [100, 90, 80],
        AirVoids = [5, 10],
    };

    /// <summary>The same with everything that a figure can show.</summary>
    public static CompactionChart Full { get; } = Ternmarsh with
    {
        Specimens = [.. Ternmarsh.Specimens, new(12.6, 1.70, "6", true)],
        Adopted = new(13.7, 1.84, "13.7 %", "1.84 Mg/m³", null, null),
        Corrected = new(12.9, 1.878, "12.9 %", "1.88 Mg/m³", null, null),
        NextSpecimen = 14.5,
    };

    /// <summary>Field tests on the laboratory's curve, with the zone where they are accepted.</summary>
    public static CompactionChart InTheField { get; } = Ternmarsh with
    {
        Statement = "2 of 4 field tests accepted",
        FieldTests =
        [
            new(13.1, 1.790, "1+240", MarkRole.Met), new(14.6, 1.775, "1+260", MarkRole.Met),
            new(11.4, 1.742, "1+280", MarkRole.NotMet), new(16.2, 1.741, "1+300", MarkRole.Undecided),
        ],
        Zone = new([new(12.1, 1.735), new(16.1, 1.735), new(16.1, 1.85), new(12.1, 1.95)], "accepted"),
    };

    /// <summary>With curves of other models.</summary>
    public static CompactionChart WithModels { get; } = Ternmarsh with
    {
        Models = [new("parabola", Parabola(14.2, 1.822, 0.0058, 9.8, 17.3)), new("spline", Parabola(13.6, 1.832, 0.0068, 9.8, 17.3))],
    };

    /// <summary>A test without a peak.</summary>
    public static CompactionChart WithoutOptimum { get; } = Ternmarsh with { Specimens = [.. Ternmarsh.Specimens.Take(3)], Curve = [], Band = null, Optimum = null };

    /// <summary>Sizes, the extremes among them.</summary>
    public static Gen<FigureSize> Size { get; } = Gen.OneOf(
        Gen.Select(Gen.Int[FigureSize.Smallest, FigureSize.Largest], Gen.Int[FigureSize.Smallest, FigureSize.Largest], (width, height) => new FigureSize(width, height)),
        Gen.OneOf(new FigureSize(240, 240), new(320, 240), new(480, 320), FigureSize.Default, new(2400, 2400), new FigureSize(2400, 240), new(240, 2400)));

    /// <summary>Texts as people write them, and as they should not.</summary>
    private static Gen<string> Text { get; } = Gen.OneOf(
        Gen.OneOf("", "1", "A-12", "borrow area 7", "<b>&\"'</b>", "ä ö ü ß", "ρd ≤ 95 %", "مرحبا", "中文標籤", "😀😀", "line\nbreak\u0007", "\uD800 alone", "\uFFFE"),
        Gen.String[Gen.Char, 0, 40],
        Gen.Const(new string('W', 200)));

    /// <summary>Charts of every kind: any unit, number of specimens, lines, optima and texts.</summary>
    public static Gen<CompactionChart> Any { get; } =
        from unit in Gen.Enum<DensityUnit>()
        from count in Gen.Frequency((6, Gen.Int[0, 9]), (1, Gen.Int[10, 60]), (1, Gen.Const(500)))
        from optimumWater in Gen.OneOf(Gen.Double[6, 30], Gen.Double[0, 300])
        from density in Gen.Frequency((8, Gen.Double[1200, 2300]), (1, Gen.OneOf(1e-3, 30000, 1e6)))
        from spread in Gen.OneOf(Gen.Double[0, 8], Gen.Const(0.0))
        from bent in Gen.Double[-0.02, 0.02]
        from noise in Gen.Double[-1, 1].Array[count]
        from setAside in Gen.Int[0, 9].Array[count]
        from labels in Text.Array[count]
        from reference in Text
        from hasOptimum in Gen.Bool
        from hasAdopted in Gen.Bool
        from hasCorrected in Gen.Bool
        from hasNext in Gen.Bool
        from gravity in Gen.Double[2.5, 2.9].Nullable()
        from saturation in Gen.Double[30, 100].Array[0, 20]
        from airVoids in Gen.Double[0, 30].Array[0, 20]
        from fieldTests in Gen.Select(Gen.Double[-3, 3], Gen.Double[0.9, 1.02], Text, Gen.Int[0, 4].Select(i => ((MarkRole[])[MarkRole.Measured, MarkRole.SetAside, MarkRole.Met, MarkRole.NotMet, MarkRole.Undecided])[i])).Array[0, 12]
        from zone in Text.Null()
        select Chart(unit, optimumWater, density, spread, bent, noise, setAside, labels, reference, hasOptimum, hasAdopted, hasCorrected, hasNext, gravity, saturation, airVoids) is var chart && fieldTests.Length == 0 ? chart : InField(chart, optimumWater, new Density(density).In(unit), fieldTests, zone);

    private static double Peaked(double w) => 1.826 - (0.0063 * (w - 14.1) * (w - 14.1));

    private static double Half(double w) => 0.013 + (0.0011 * (w - 13.5) * (w - 13.5));

    public static IReadOnlyList<ChartPoint> Parabola(double optimum, double maximum, double bent, double from, double to) =>
        [.. Enumerable.Range(0, 61).Select(i => from + ((to - from) * i / 60)).Select(w => new ChartPoint(w, maximum - (bent * (w - optimum) * (w - optimum))))];

    private static CompactionChart InField(CompactionChart chart, double water, double maximum, (double OffWater, double Share, string Label, MarkRole Outcome)[] tests, string? zone) => chart with
    {
        Statement = zone,
        FieldTests = [.. tests.Select(test => new ChartFieldTest(Math.Max(0, water + test.OffWater), maximum * test.Share, test.Label, test.Outcome))],
        Zone = zone is null ? null : new([new(water - 1, maximum * 0.95), new(water + 2, maximum * 0.95), new(water + 2, maximum * 1.5), new(water - 1, maximum * 1.5)], zone),
    };

    private static CompactionChart Chart(
        DensityUnit unit, double water, double kilogramsPerCubicMeter, double spread, double bent, double[] noise, int[] setAside, string[] labels, string reference,
        bool hasOptimum, bool hasAdopted, bool hasCorrected, bool hasNext, double? gravity, double[] saturation, double[] airVoids)
    {
        var maximum = new Density(kilogramsPerCubicMeter).In(unit);
        double From(int i, double count) => Math.Max(0, water + (spread * ((i / Math.Max(1, count - 1)) - 0.5)));
        ChartOptimum Optimum(double by) => new(
            water - by, maximum * (1 + (by / 50)), $"{water - by:0.0} %", $"{maximum * (1 + (by / 50)):0.##} {unit.Symbol()}", [water - by - 0.4, water - by + 0.5], [maximum * 0.99, maximum * 1.01]);

        return new CompactionChart
        {
            Reference = reference,
            DensityUnit = unit,
            Specimens = [.. noise.Select((off, i) => new ChartSpecimen(From(i, noise.Length), maximum * (1 - Math.Abs(off * bent)), labels[i], setAside[i] == 0))],
            Curve = spread > 0 ? Parabola(water, maximum, bent * maximum / 10, water - (spread / 2), water + (spread / 2)) : [],
            Optimum = hasOptimum ? Optimum(0) : null,
            Adopted = hasAdopted ? Optimum(0.3) : null,
            Corrected = hasCorrected ? Optimum(1.1) : null,
            NextSpecimen = hasNext ? water + 0.5 : null,
            SpecificGravity = gravity,
            WaterDensity = 998.2,
            Saturation = saturation,
            AirVoids = airVoids,
        };
    }
}
