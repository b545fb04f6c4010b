using Drypeak.Figures;
using Drypeak.Service.Acceptance;
using Drypeak.Service.Field;
using Drypeak.Service.Pages.Forms;
using Drypeak.Service.Pages.Tables;
using Drypeak.Soil.Acceptance;

namespace Drypeak.Service.Pages.Acceptance;

/// <summary>The page of a lot: a table of tests is pasted, rules are chosen, and the decision comes out as a sheet that can be printed.</summary>
internal static class LotPage
{
    /// <summary>Quantities as the form offers them.</summary>
    internal static readonly IReadOnlyList<Choice> Quantities =
        [.. Specification.Quantities.Select(quantity => new Choice(quantity.Key, quantity.Value.Words()))];

    private static readonly ChoiceField LengthUnit = FormFields.LengthUnit with { Label = "Stations in", Otherwise = "m" };

    private static readonly NumberField Maximum = new("maximum-dry-density", "Maximum dry density", "/laboratory/maximumDryDensity") { UnitOf = FormFields.DensityUnit };
    private static readonly NumberField Optimum = new("optimum-water-content", "Optimum water content", "/laboratory/optimumWaterContent") { Unit = "%" };

    private static readonly TableField Tests = new("tests", "Tests", "/tests",
    [
        new ColumnKind("Test", Measure.Text, "label"),
        new ColumnKind("Relative compaction", Measure.Percent, "relativeCompaction"),
        new ColumnKind("Water content", Measure.Percent, "waterContent"),
        new ColumnKind("Dry density", Measure.Density, "dryDensity"),
        new ColumnKind("Wet density", Measure.Density, "wetDensity"),
        new ColumnKind("Station", Measure.Ratio, "station"),
        new ColumnKind("Offset", Measure.Ratio, "offset"),
        new ColumnKind("Lift", Measure.Ratio, "lift"),
        new ColumnKind("Time", Measure.Text, "time"),
        new ColumnKind("Replaces", Measure.Text, "replaces"),
        new ColumnKind("Set aside", Measure.Text, "setAside"),
    ])
    {
        Lines = 10,
        Row = "Test",
        Hint = "From a spreadsheet, with a header: Test, Relative compaction or Dry density, Water content, Station, Offset, Lift, Time, Replaces (the test that this one is a retest of), Set aside (why).",
    };

    private static readonly NumberField LeastCompaction = new("least-compaction", "Relative compaction at least", "/specification/requirements/[quantity=relativeCompaction]/minimum") { Unit = "%" };
    private static readonly NumberField MostAirVoids = new("most-air-voids", "Air voids at most", "/specification/requirements/[quantity=airVoids]/maximum") { Unit = "%" };
    private static readonly NumberField Driest = new("driest", "From the optimum, not below", "/specification/requirements/[quantity=waterContentFromOptimum]/minimum") { Unit = "%", Hint = "such as -2" };
    private static readonly NumberField Wettest = new("wettest", "From the optimum, not above", "/specification/requirements/[quantity=waterContentFromOptimum]/maximum") { Unit = "%" };

    private static readonly CheckField EveryTest = new("every-test", "Every test must meet the specification", "/lotRules/[rule=every-test]") { Hint = "without any rule chosen here, this is the rule" };
    private static readonly NumberField Mean = OfRule("mean", "Mean, at least", "minimum");
    private static readonly NumberField WithinLimit = OfRule("percent-within-limits", "Percent within limits: limit, at least", "minimum");
    private static readonly NumberField WithinRequired = new("percent-within-limits-required", "of the lot, at least", "/lotRules/[rule=percent-within-limits]/required") { Unit = "%" };
    private static readonly NumberField MovingMean = OfRule("moving-mean", "Mean of consecutive tests, at least", "minimum");
    private static readonly NumberField MovingCount = new("moving-mean-count", "so many tests in it", "/lotRules/[rule=moving-mean]/count");
    private static readonly NumberField MovingFloor = new("moving-mean-floor", "and none below", "/lotRules/[rule=moving-mean]/floor");
    private static readonly NumberField Characteristic = OfRule("characteristic-value", "Characteristic value, at least", "minimum");
    private static readonly NumberField CharacteristicFactor = new("characteristic-value-factor", "mean less so many standard deviations", "/lotRules/[rule=characteristic-value]/factor");
    private static readonly NumberField Share = OfRule("share-of-tests", "Counted share of tests: limit, at least", "minimum");
    private static readonly NumberField ShareRequired = new("share-of-tests-required", "of the tests, at least", "/lotRules/[rule=share-of-tests]/required") { Unit = "%" };
    private static readonly NumberField WetShare = new("wet-share", "Tests wet of the line of optimums, at least", "/lotRules/[rule=wet-of-line-of-optimums]/required") { Unit = "%", Hint = "needs the specific gravity" };

    private static readonly ChoiceField ChartKind = new("chart-kind", "Control chart", "/controlChart/kind",
        [new("", "none"), new(ControlChartRules.Individuals, "individuals with moving range"), new(ControlChartRules.Ewma, "exponentially weighted moving average"), new(ControlChartRules.Cusum, "cumulative sums")]);
    private static readonly ChoiceField ChartQuantity = new("chart-quantity", "of", "/controlChart/quantity", Quantities) { OnlyWith = [ChartKind.Name] };

    private static readonly NumberField WindowCompaction = new("window-compaction", "Relative compaction at least", "/window/minimumRelativeCompaction") { Unit = "%" };
    private static readonly NumberField WindowSaturation = new("window-saturation", "Saturation at least", "/window/minimumSaturation") { Unit = "%" };
    private static readonly NumberField WindowAirVoids = new("window-air-voids", "Air voids at most", "/window/maximumAirVoids") { Unit = "%" };
    private static readonly NumbersField WindowWater = new("window-water", "From the optimum, driest and wettest", "/window/waterContentFromOptimum") { Unit = "%", Hint = "such as 0 3" };

    public static FormPage Of(LotAcceptanceJob job) => new FormPage<LotAcceptanceRequest, LotAcceptanceAnswer>
    {
        Address = "/lot",
        Heading = "Lot acceptance",
        Lead = "From the tests of a lot to accepted or not: by which rule, by how much, and what else is to be seen in them.",
        Action = "Decide",
        WhatComesOut = "One word for the lot, each rule with its value and its limit, the results in order with what signals, their histogram, the window and the map; on paper as one sheet.",
        HasWorking = false,
        Parts =
        [
            new("", [FormFields.Reference]) { Columns = 1 },
            new("Units", [FormFields.DensityUnit, LengthUnit, FormFields.DecimalMark]) { Columns = 3 },
            new("Held against the laboratory", [Maximum, Optimum, FormFields.SpecificGravity with { Hint = "for saturation, air voids and the line of optimums" }]),
            new("Tests", [Tests]) { Columns = 1 },
            new("Required of each test", [LeastCompaction, MostAirVoids, Driest, Wettest]),
            new("Rules of the lot", [EveryTest, Mean, WithinLimit, WithinRequired, Characteristic, CharacteristicFactor]) { Columns = 1 },
            new("Further rules", [MovingMean, MovingCount, MovingFloor, Share, ShareRequired, WetShare]) { UnderMore = true, Columns = 1 },
            new("Control chart", [ChartKind, ChartQuantity]) { UnderMore = true },
            new("Compaction window", [WindowCompaction, WindowSaturation, WindowAirVoids, WindowWater]) { UnderMore = true },
        ],
        Demonstrations = Demonstrations,
        Help = typeof(RuleHelp),
        View = typeof(LotAnswerView),
        Check = job.Check,
        Compute = request => FormAnswer.Of<LotAcceptanceRequest, LotAcceptanceAnswer, PlotChart>(job.Compute, job.Chart)(request) with
        {
            Further = [.. job.FurtherPictures(request).Select(picture => (picture.Name, (Func<FigureSize, Figure>)(size => job.Chart.Draw(picture.Chart, new FigureOptions { Size = size }))))],
        },
        Headline = answer => answer.Lot.Outcome is { } outcome ? char.ToUpperInvariant(outcome[0]) + outcome[1..] : $"{answer.Lot.Count} tests",
    };

    private static NumberField OfRule(string rule, string label, string member) => new(rule, label, $"/lotRules/[rule={rule}]/{member}")
    {
        Beside = new ChoiceField(rule + "-quantity", $"Quantity of the rule {rule.Replace('-', ' ')}", $"/lotRules/[rule={rule}]/quantity", Quantities) { OnlyWith = [rule] },
    };

    private static IReadOnlyList<FormDemonstration> Demonstrations { get; } =
    [
        new("accepted", "a lot with a retest that is accepted",
            (FormFields.Reference, "Ternmarsh, lot 12, 1+200 to 1+400"), (Maximum, "1.93"), (Optimum, "12.1"), (FormFields.SpecificGravity, "2.68"), (FormFields.Determined, "measured"),
            (Tests, """
                Test	Relative compaction	Water content	Station	Offset	Lift	Replaces	Set aside
                12-1	97.9	12.6	1208	2.5	3
                12-2	95.6	12.3	1226	6.0	3
                12-3	93.2	13.9	1251	4.2	3
                12-4	98.1	12.9	1283	1.1	3
                12-5	96.2	13.1	1305	7.3	4
                12-6	98.6	13.4	1322	3.4	4
                12-7	91.0	12.8	1340	5.5	4		gauge stood on a stone
                12-8	96.0	13.0	1361	2.0	4
                12-9	98.8	12.7	1388	6.4	4
                12-10	96.8	12.9	1252	4.0	3	12-3
                """), (LeastCompaction, "95"), (Mean, "96"), (WithinLimit, "95"), (WithinRequired, "85"), (ChartKind, ControlChartRules.Individuals),
            (WindowCompaction, "95"), (WindowSaturation, "75"), (WindowWater, "0 3")),
        new("rejected", "a lot whose mean is good and whose spread is not",
            (FormFields.Reference, "Ternmarsh, lot 15, 1+800 to 2+000"),
            (Tests, "Test\tRelative compaction\n15-1\t99.8\n15-2\t93.6\n15-3\t98.9\n15-4\t94.0\n15-5\t100.6\n15-6\t93.1\n15-7\t99.4"), (Mean, "96"), (WithinLimit, "95"), (WithinRequired, "85")),
        new("undecided", "two tests that are too few for the rule",
            (FormFields.Reference, "Ternmarsh, lot 16"), (Tests, "Test\tRelative compaction\n16-1\t97.1\n16-2\t98.4"), (WithinLimit, "95"), (WithinRequired, "85")),
    ];
}
