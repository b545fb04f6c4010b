using CsCheck;

namespace Drypeak.Figures.Tests;

/// <summary>Plots to draw: one of each use, from Ternmarsh, and any number of varied ones.</summary>
internal static class PlotCharts
{
    /// <summary>Results of a lot in order, with limits, center line and one signal.</summary>
    public static PlotChart InOrder { get; } = new()
    {
        Title = "11 of 12 tests met 95 % relative compaction",
        Subtitle = "mean 96.7 %, standard deviation 1.2 %",
        Reference = "Ternmarsh, lot 12",
        Description = "Relative compaction of 12 tests in order. 11 of them met at least 95 %; test 7 did not.",
        X = new PlotAxis("Test") { Positions = [.. Enumerable.Range(1, 12).Select(i => new PlotPosition(i, $"{i}"))] },
        Y = new PlotAxis("Relative compaction (%)"),
        Lines = [new PlotLine([.. InOrderValues.Select((value, i) => new PlotPoint(i + 1, value))], PlotLineRole.Quiet)],
        Limits = [new PlotLimit(95, "at least 95 %"), new PlotLimit(96.7, "mean 96.7 %", Role: PlotLineRole.Quiet)],
        Marks = [.. InOrderValues.Select((value, i) => new PlotMark(i + 1, value, value < 95 ? MarkRole.NotMet : MarkRole.Met, value < 95 ? "7: below the limit" : null))],
    };

    /// <summary>How often each value came, with both limits.</summary>
    public static PlotChart Histogram { get; } = new()
    {
        Title = "92.4 % of the lot lies within its limits",
        Reference = "Ternmarsh, lot 12",
        Description = "Relative compaction of 40 tests as a histogram from 93 to 101 %, with limits at 95 and 100 %.",
        X = new PlotAxis("Relative compaction (%)"),
        Y = new PlotAxis("Tests") { From = 0 },
        Areas = [.. ((int[])[1, 3, 7, 12, 9, 5, 2, 1]).Select((count, i) => new PlotArea([new(93 + i, 0), new(94 + i, 0), new(94 + i, count), new(93 + i, count)], PlotAreaRole.Bar))],
        Limits = [new PlotLimit(95, "at least 95 %", Upright: true), new PlotLimit(100, "at most 100 %", Upright: true)],
    };

    /// <summary>A family of curves with the point and the curve between two.</summary>
    public static PlotChart Family { get; } = new()
    {
        Title = "Maximum dry density 1.88 Mg/m³ at 13.1 % water, between B and C",
        Reference = "Ternmarsh, borrow areas 2 to 9",
        Description = "A point of 11.8 % water and 1.85 Mg/m³ on the dry side of a family of four curves; the curve through it lies between B and C.",
        X = new PlotAxis("Water content (%)"),
        Y = new PlotAxis("Dry density (Mg/m³)"),
        Lines =
        [
            .. ((string Label, double W, double Density)[])[("A", 10.2, 2.01), ("B", 12.4, 1.92), ("C", 14.6, 1.82), ("D", 17.1, 1.72)] is var family
                ? family.Select(curve => new PlotLine(Curve(curve.W, curve.Density), PlotLineRole.Quiet, curve.Label) { LabelAt = PlotLabelPlace.End }) : [],
            new PlotLine(Curve(13.1, 1.88), PlotLineRole.Result, "through the point"),
        ],
        Marks = [new PlotMark(11.8, 1.863, MarkRole.Measured, "point"), new PlotMark(13.1, 1.88, MarkRole.Result, "1.88 Mg/m³ at 13.1 %")],
    };

    /// <summary>The chance that a lot is accepted, with both risks.</summary>
    public static PlotChart Risk { get; } = new()
    {
        Title = "Producer's risk 5.1 %, consumer's risk 9.8 %",
        Description = "Probability of acceptance against the lot's true mean.",
        X = new PlotAxis("True mean of relative compaction (%)"),
        Y = new PlotAxis("Probability of acceptance") { From = 0, To = 1 },
        Lines = [new PlotLine([.. Enumerable.Range(0, 81).Select(i => new PlotPoint(93 + (i / 10.0), 1 / (1 + Math.Exp(-2.1 * (93 + (i / 10.0) - 96.5)))))], PlotLineRole.Result, "5 tests, mean at least 96.5 %")],
        Limits = [new PlotLimit(95.4, "rejectable", Upright: true), new PlotLimit(97.9, "acceptable", Upright: true, Role: PlotLineRole.Reference)],
        Marks = [new PlotMark(95.4, 0.09, MarkRole.Result, "consumer's risk"), new PlotMark(97.9, 0.95, MarkRole.Result, "producer's risk")],
    };

    /// <summary>Where in water content and density a lot's tests lie.</summary>
    public static PlotChart Window { get; } = new()
    {
        Title = "8 of 10 tests lie in the window",
        Reference = "Ternmarsh, lot 12",
        Description = "Dry density against water content of 10 tests; 8 lie within the window.",
        X = new PlotAxis("Water content (%)"),
        Y = new PlotAxis("Dry density (Mg/m³)"),
        Areas = [new PlotArea([new(12.1, 1.834), new(15.1, 1.834), new(15.1, 1.86), new(13.3, 1.93), new(12.1, 1.96)], PlotAreaRole.Accepted, "accepted")],
        Lines = [new PlotLine([.. Enumerable.Range(0, 41).Select(i => 10 + (i / 5.0)).Select(w => new PlotPoint(w, 2.68 / (1 + (2.68 * w / 100))))], PlotLineRole.Reference, "zero air voids")],
        Marks =
        [
            .. ((double, double)[])[(12.4, 1.85), (12.9, 1.87), (13.1, 1.90), (13.8, 1.86), (14.1, 1.85), (14.6, 1.845), (12.6, 1.91), (13.4, 1.88)] is var inside
                ? inside.Select((test, i) => new PlotMark(test.Item1, test.Item2, MarkRole.Met, $"{i + 1}", MarkShape.Square)) : [],
            new PlotMark(11.6, 1.85, MarkRole.NotMet, "9", MarkShape.Square), new PlotMark(13.6, 1.82, MarkRole.Undecided, "10", MarkShape.Square),
        ],
    };

    /// <summary>A plan of test locations on one lift, at one scale in both directions.</summary>
    public static PlotChart Plan { get; } = new()
    {
        Title = "12 locations on lift 3",
        Reference = "Ternmarsh, 1+200 to 1+260",
        Description = "A plan of 12 test locations over a length of 60 m and a width of 24 m.",
        X = new PlotAxis("Station (m)"),
        Y = new PlotAxis("Offset (m)"),
        SameScale = true,
        Areas = [new PlotArea([new(1200, 0), new(1260, 0), new(1260, 24), new(1200, 24)], PlotAreaRole.Band)],
        Lines = [.. Enumerable.Range(1, 11).Select(i => new PlotLine([new(1200 + (5 * i), 0), new(1200 + (5 * i), 24)], PlotLineRole.Quiet) { Dash = PlotDash.Dotted })],
        Marks = [.. Enumerable.Range(0, 12).Select(i => new PlotMark(1201.3 + (5 * i) + (i * 7 % 3), 2 + (i * 11 % 21), MarkRole.Measured, $"3-{i + 1}", MarkShape.Diamond))],
    };

    /// <summary>Density against passes of a roller.</summary>
    public static PlotChart Passes { get; } = new()
    {
        Title = "6 passes reach 95 %",
        Description = "Relative compaction against passes of the roller.",
        X = new PlotAxis("Passes"),
        Y = new PlotAxis("Relative compaction (%)"),
        Areas = [new PlotArea([new(2, 88), new(4, 92.4), new(6, 94.6), new(8, 95.8), new(10, 96.2), new(10, 97.4), new(8, 96.8), new(6, 95.8), new(4, 93.8), new(2, 90)], PlotAreaRole.Band, "95 % band")],
        Lines = [new PlotLine([new(2, 89), new(4, 93.1), new(6, 95.2), new(8, 96.3), new(10, 96.8)], PlotLineRole.Result)],
        Limits = [new PlotLimit(95, "at least 95 %")],
        Marks = [new PlotMark(2, 89, MarkRole.Measured), new PlotMark(4, 93.1, MarkRole.Measured), new PlotMark(6, 95.2, MarkRole.Measured), new PlotMark(8, 96.3, MarkRole.Measured), new PlotMark(10, 96.8, MarkRole.SetAside, "10, rain", MarkShape.Triangle)],
    };

    /// <summary>Each use by its name.</summary>
    public static IReadOnlyDictionary<string, PlotChart> ByName { get; } = new Dictionary<string, PlotChart>
    {
        ["in-order"] = InOrder,
        ["histogram"] = Histogram,
        ["family"] = Family,
        ["risk"] = Risk,
        ["window"] = Window,
        ["plan"] = Plan,
        ["passes"] = Passes,
    };

    /// <summary>As many marks as a figure takes.</summary>
    public static PlotChart Crowd { get; } = new()
    {
        Title = "10,000 locations",
        Description = "10,000 locations.",
        X = new PlotAxis("Station (m)"),
        Y = new PlotAxis("Offset (m)"),
        Marks = [.. Enumerable.Range(0, PlotChart.MostMarks).Select(i => new PlotMark(i * 0.37, i * 7919 % 1000 / 40.0, i % 97 == 0 ? MarkRole.NotMet : MarkRole.Met, $"L{i}"))],
    };

    private static Gen<string> Text { get; } = Gen.OneOf(Gen.OneOf("", "1", "at least 95 %", "<b>&\"'</b>", "ä ö ü ß", "مرحبا", "中文標籤", "line\nbreak\u0007", "\uD800 alone"), Gen.String[Gen.Char, 0, 40], Gen.Const(new string('W', 200)));

    private static Gen<double> Number { get; } = Gen.Frequency((8, Gen.Double[0, 100]), (2, Gen.Double[-50, 50]), (1, Gen.OneOf(0, 1e-9, -1e9, 1e9, 1e-300)));

    private static Gen<PlotPoint> Point { get; } = Gen.Select(Number, Number, (x, y) => new PlotPoint(x, y));

    private static Gen<PlotAxis> Axis { get; } =
        from title in Text
        from fixedFrom in Gen.Double[-100, 1000].Nullable()
        from span in Gen.Double[1e-3, 1000].Nullable()
        from names in Gen.Frequency((3, Gen.Bool.Select(_ => (IReadOnlyList<PlotPosition>?)null)), (1, Gen.Select(Number, Text, (at, name) => new PlotPosition(at, name)).Array[0, 30].Select(names => (IReadOnlyList<PlotPosition>?)names)))
        select new PlotAxis(title) { From = fixedFrom, To = (fixedFrom ?? 0) + span is { } to && (fixedFrom is null || to > fixedFrom) ? to : null, Positions = names };

    /// <summary>Plots of any content.</summary>
    public static Gen<PlotChart> Any { get; } =
        from title in Text
        from subtitle in Text
        from x in Axis
        from y in Axis
        from sameScale in Gen.Bool
        from areas in Gen.Select(Point.Array[3, 9], Gen.Enum<PlotAreaRole>(), Text, (corners, role, label) => new PlotArea(corners, role, label)).Array[0, 5]
        from lines in Gen.Select(Point.Array[2, 30], Gen.Enum<PlotLineRole>(), Text, Gen.Enum<PlotLabelPlace>(), (points, role, label, place) => new PlotLine(points, role, label) { LabelAt = place }).Array[0, 8]
        from limits in Gen.Select(Number, Text, Gen.Bool, Gen.Enum<PlotLineRole>(), (value, label, upright, role) => new PlotLimit(value, label, upright, role)).Array[0, 5]
        from marks in Gen.Select(Number, Number, Gen.Enum<MarkRole>(), Text, Gen.Enum<MarkShape>(), (mx, my, role, label, shape) => new PlotMark(mx, my, role, label, shape)).Array[0, 80]
        select new PlotChart
        {
            Title = string.IsNullOrWhiteSpace(title) ? "A plot" : title,
            Subtitle = subtitle,
            Description = "A plot.",
            X = x,
            Y = y,
            SameScale = sameScale,
            Areas = areas,
            Lines = lines,
            Limits = limits,
            Marks = marks,
        };

    private static IReadOnlyList<double> InOrderValues => [97.1, 96.4, 98.0, 96.9, 97.7, 95.6, 94.2, 96.3, 97.4, 96.8, 95.9, 98.3];

    private static PlotPoint[] Curve(double optimum, double maximum) =>
        [.. Enumerable.Range(0, 41).Select(i => optimum - 4 + (i / 5.0)).Select(w => new PlotPoint(w, maximum - (0.006 * (w - optimum) * (w - optimum))))];
}
