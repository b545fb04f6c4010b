using Drypeak.Figures;
using Drypeak.Service.Charts;
using Drypeak.Service.Contracts;
using Drypeak.Service.Field;
using Drypeak.Service.Hosting;
using Drypeak.Service.Laboratory;
using Drypeak.Soil.Acceptance;
using Drypeak.Soil.Acceptance.ControlCharts;
using Drypeak.Soil.Acceptance.LotRules;
using Drypeak.Soil.FieldDensity.Review;
using Drypeak.Soil.Laboratory;
using Drypeak.Soil.Quantities;

namespace Drypeak.Service.Acceptance;

/// <summary><c>POST /v1/lot-acceptance</c>: a lot from contract to contract. The endpoint and the page both call this.</summary>
internal sealed class LotAcceptanceJob(MoistureDensityJob laboratory, FieldDensityJob field, Limits limits)
{
    /// <summary>More marks than this never fit an address; larger pictures are to be posted for.</summary>
    private const int MostLinkedTests = 500;

    private readonly Lazy<LotAcceptanceRules> _rules = new(() => new(laboratory, field, limits));

    /// <summary>The kind of its charts.</summary>
    public ChartKind<PlotChart> Chart { get; } = ChartKind.Plot("lot-acceptance", "A picture of a lot: results in order, histogram, window or map", limits);

    public static void Map(IEndpointRouteBuilder app)
    {
        var job = app.ServiceProvider.GetRequiredService<LotAcceptanceJob>();
        app.MapJob<LotAcceptanceRequest, LotAcceptanceAnswer, PlotChart>(
                "/v1/lot-acceptance", job.Check, job.Compute, Examples.LotAcceptanceRequest, job.Chart,
                bodyBytes: app.ServiceProvider.GetRequiredService<Limits>().LotBodyBytes)
            .WithTags("Lots")
            .WithName("lot-acceptance")
            .WithSummary("Accept or reject a lot by its rules")
            .WithDescription("Tests as values or whole field tests, several soils, retests and tests set aside; rules from every test to percent within limits and characteristic value; control chart, compaction window, estimates and trends. With Accept: image/svg+xml, image/png or application/pdf the answer is the main picture, the results in order with their limits and signals, which links.svg, links.png and links.pdf give too. links.histogram, links.window and links.map are the further pictures of the same answer, each with an svg, png and pdf of its own.");
    }

    /// <summary>Every broken rule; empty where the request can be computed.</summary>
    public IReadOnlyList<Fault> Check(LotAcceptanceRequest request) => _rules.Value.Check(request);

    /// <summary>Computes a request that passed <see cref="Check"/>.</summary>
    public Charted<LotAcceptanceAnswer, PlotChart> Compute(LotAcceptanceRequest request)
    {
        var (lot, findingsByLabel, ofLaboratory) = LotMapping.ToLot(request, []);
        var result = LotAnalysis.Analyze(lot);
        var charts = new LotCharts(lot, result, request.Reference);
        var main = charts.InOrder();
        List<Finding> findings = [.. result.Findings, .. ofLaboratory, .. OfTests(findingsByLabel)];
        var links = LinksOf(charts, main, lot.Tests.Count, findings);
        var answer = new LotAcceptanceAnswer
        {
            Reference = request.Reference,
            Identification = request.Identification,
            Units = lot.Units.ToContract(),
            Tests = TestsOf(lot, result, findingsByLabel, request),
            Lot = new LotAnswer(
                result.Outcome?.ToString().ToLowerInvariant(), Explanation(lot, result), result.Counted.Count,
                [.. result.Rules.Select((judged, i) => ToAnswer(judged, request.LotRules![i], lot.Units))],
                [.. result.Statistics.Select(known => ToAnswer(known, lot))],
                [.. result.Trends.Select(trend => ToAnswer(trend, lot.Units))]),
            ControlChart = result.ControlChart is { } chart ? ToAnswer(chart, request.ControlChart!, lot.Units) : null,
            Window = result.Window is { } window ? ToAnswer(window, lot.Units) : null,
            Findings = [.. findings.OrderBy(finding => finding.Severity).Select(FindingContract.Of)],
            Cautions = CautionsOf(request),
            Links = links,
            Provenance = ProvenanceContract.Of(request),
        };
        return new Charted<LotAcceptanceAnswer, PlotChart>(answer, main);
    }

    /// <summary>The pictures besides the main one that can be drawn, each with its name.</summary>
    public IReadOnlyList<(string Name, PlotChart Chart)> FurtherPictures(LotAcceptanceRequest request)
    {
        var lot = LotMapping.ToLot(request, []).Lot;
        var charts = new LotCharts(lot, LotAnalysis.Analyze(lot), request.Reference);
        (string Name, PlotChart? Chart)[] all = [("Histogram", charts.Histogram()), ("Compaction window", charts.Window()), ("Map", charts.Map())];
        return [.. all.Where(picture => picture.Chart is { } chart && Chart.CheckAddress(chart).Count == 0).Select(picture => (picture.Name, picture.Chart!))];
    }

    /// <summary>The lot's outcome in one sentence.</summary>
    private static string Explanation(Lot lot, LotResult result)
    {
        var decisive = result.Rules.FirstOrDefault(judged => judged.Conformance == result.Outcome switch { TestOutcome.Rejected => Conformance.NotMet, TestOutcome.Undecided => Conformance.Undecided, _ => Conformance.Met });
        int Tests(TestOutcome outcome) => result.Counted.Count(test => test.Outcome == outcome);
        return (result.Outcome, result.Rules.Count) switch
        {
            (null, _) => "Nothing was required: give specification or lotRules for a decision.",
            (TestOutcome.Accepted, 0) => $"All {result.Counted.Count} tests are accepted.",
            (TestOutcome.Rejected, 0) => $"{Tests(TestOutcome.Rejected)} of {result.Counted.Count} tests are rejected, and without rules of the lot every test must be accepted.",
            (_, 0) => $"{Tests(TestOutcome.Undecided)} of {result.Counted.Count} tests are undecided, and without rules of the lot every test must be accepted.",
            (TestOutcome.Accepted, 1) => $"The rule is met. {decisive!.Explanation}",
            (TestOutcome.Accepted, var count) => $"All {count} rules are met.",
            _ => decisive!.Explanation,
        };
    }

    private static List<LotTestAnswer> TestsOf(
        Lot lot, LotResult result, IReadOnlyDictionary<string, IReadOnlyList<Finding>> findings, LotAcceptanceRequest request)
    {
        var counted = result.Counted.ToHashSet<LotTest>(ReferenceEqualityComparer.Instance);
        return
        [
            .. lot.Tests.Select((test, i) =>
            {
                double? In(AcceptedQuantity quantity) => test.Values[quantity] / Specification.UnitOf(quantity, lot.Units);
                var requirements = (request.Specification ?? request.Tests![i].FieldDensity?.Specification)?.Requirements;
                return new LotTestAnswer
                {
                    Label = test.Label,
                    RelativeCompaction = In(AcceptedQuantity.RelativeCompaction),
                    DryDensity = In(AcceptedQuantity.DryDensity),
                    WaterContent = In(AcceptedQuantity.WaterContent),
                    WaterContentFromOptimum = In(AcceptedQuantity.WaterContentFromOptimum),
                    Saturation = In(AcceptedQuantity.Saturation),
                    AirVoids = In(AcceptedQuantity.AirVoids),
                    Requirements = [.. test.Judgements.Select((judged, k) => judged.ToAnswer(requirements![k], JudgementWords.Of(judged, test.Values.Soil, lot.Units), lot.Units))],
                    Outcome = test.Outcome?.ToString().ToLowerInvariant(),
                    Counts = counted.Contains(test),
                    SetAside = test.SetAside,
                    Replaces = test.Replaces,
                    ReplacedBy = result.ReplacedBy.GetValueOrDefault(test.Label),
                    Findings = findings.TryGetValue(test.Label, out var found) ? [.. found.Select(FindingContract.Of)] : null,
                };
            }),
        ];
    }

    /// <summary>One finding for all that the tests' own findings say; each stands at its test.</summary>
    private static IEnumerable<Finding> OfTests(IReadOnlyDictionary<string, IReadOnlyList<Finding>> findings)
    {
        if (findings.Count > 0)
        {
            var worst = findings.Values.SelectMany(found => found).OrderBy(finding => finding.Severity).First();
            yield return LotFindingKinds.TestsHaveFindings.At("/tests",
                $"{findings.Count} {(findings.Count == 1 ? "test has" : "tests have")} findings of {(findings.Count == 1 ? "its" : "their")} own; the worst at {worst.Place}: {worst.Message} Read them all at the tests.", worst.Severity);
        }
    }

    private static LotRuleAnswer ToAnswer(LotJudgement judged, LotRuleContract given, UnitSet units)
    {
        var unit = judged.Rule is QuantityRule { GivesShare: false } rule ? Specification.UnitOf(rule.Limits.Quantity, units) : judged.Rule.GivesShare ? 0.01 : 1;
        return new LotRuleAnswer
        {
            Rule = judged.Rule.Code,
            Quantity = given.Quantity,
            Value = judged.Value / unit,
            Limit = judged.Limit / unit,
            Outcome = Specification.NameOf(judged.Conformance),
            Explanation = judged.Explanation,
            Basis = judged.Rule.Basis,
            QualityIndex = judged.QualityIndex is { } index ? new QualityIndexAnswer(index.Lower, index.Upper) : null,
            Factor = judged.Factor,
        };
    }

    private static StatisticsAnswer ToAnswer(QuantityEstimate known, Lot lot)
    {
        var unit = Specification.UnitOf(known.Quantity, lot.Units);
        var summary = known.Summary;
        double[]? Interval((double Lower, double Upper)? ends) => ends is { } known ? [known.Lower / unit, known.Upper / unit] : null;
        return new StatisticsAnswer(
            Specification.NameOf(known.Quantity), summary.Count, summary.Mean / unit, summary.StandardDeviation / unit, summary.Minimum / unit, summary.Maximum / unit,
            Interval(known.MeanInterval),
            known.ToleranceFactor is { } factor ? new ToleranceIntervalAnswer(lot.ToleranceFraction, lot.ToleranceConfidence, factor, Interval(known.ToleranceInterval)!) : null);
    }

    private static TrendAnswer ToAnswer(QuantityTrend found, UnitSet units)
    {
        var (trend, unit) = (found.Trend, Specification.UnitOf(found.Quantity, units));
        var along = found.Along == Along.Station ? units.Length.InMeters() : 1;
        return new TrendAnswer(
            Specification.NameOf(found.Quantity), found.Along.ToString().ToLowerInvariant(), trend.Count, trend.Slope / unit * along, [trend.Lower / unit * along, trend.Upper / unit * along],
            trend.StandardError / unit * along, trend.Intercept / unit);
    }

    private static ControlChartAnswer ToAnswer(ControlChart chart, ControlChartContract given, UnitSet units)
    {
        var unit = Specification.UnitOf(chart.Plan.Quantity, units);
        return new ControlChartAnswer
        {
            Quantity = given.Quantity!,
            Kind = given.Kind!,
            Center = chart.Center / unit,
            Lower = chart.Lower / unit,
            Upper = chart.Upper / unit,
            StandardDeviation = chart.StandardDeviation / unit,
            Points = [.. chart.Points.Select(point => new ControlPointAnswer(
                point.Test.Label, point.Plotted / unit, point.Observed / unit, point.Signal, point.Sums?.Upward / unit, point.Sums?.Downward / unit))],
            MovingRange = chart.MovingRange is { } ranges ? new MovingRangeAnswer(ranges.Center / unit, ranges.Upper / unit, [.. ranges.Ranges.Select(range => range / unit)]) : null,
            Basis = chart.Basis,
        };
    }

    private static WindowAnswer ToAnswer(WindowResult window, UnitSet units)
    {
        var unit = Specification.UnitOf(AcceptedQuantity.DryDensity, units);
        return new WindowAnswer(
            window.Inside,
            [.. window.Outside.Select(entry => new WindowEdgeAnswer(entry.Label, entry.Edge))],
            [.. window.Unknown.Select(entry => new WindowEdgeAnswer(entry.Label, entry.Edge))],
            window.WetOfOptimums * 100,
            window.Polygon is { } corners ? [.. corners.Select(corner => (double[])[100 * corner.WaterContent, corner.DryDensity / unit])] : null);
    }

    private LotLinksContract LinksOf(LotCharts charts, PlotChart? main, int tests, List<Finding> findings)
    {
        if (tests > MostLinkedTests)
        {
            findings.Add(ChartAddress.NoAddress.At("", "The charts hold more than an address can carry, so no links are given. Post the request with Accept: image/svg+xml, image/png or application/pdf to get the picture."));
            return new LotLinksContract();
        }

        var noted = false;
        LinksContract? Links(PlotChart? chart)
        {
            if (chart is null)
            {
                return null;
            }

            var links = Chart.LinksOf(chart, limits, out var whyNot);
            if (whyNot is { } finding && !noted)
            {
                noted = true;
                findings.Add(finding);
            }

            return whyNot is null ? links : null;
        }

        var first = Links(main);
        return new LotLinksContract { Svg = first?.Svg, Png = first?.Png, Pdf = first?.Pdf, Histogram = Links(charts.Histogram()), Window = Links(charts.Window()), Map = Links(charts.Map()) };
    }

    private static IReadOnlyList<string> CautionsOf(LotAcceptanceRequest request) =>
    [
        .. Cautions.OfArithmetic,
        LotCautions.RandomTests,
        .. request.Tests!.Any(test => test.FieldDensity is { } whole && FieldMethodNames.WeighsSoil(whole.Method)) ? [Cautions.OfExcavation] : Array.Empty<string>(),
        .. request.Tests!.Any(test => test.FieldDensity?.NuclearGauge is { }) ? [Cautions.OfNuclearGauge] : Array.Empty<string>(),
        .. request.Tests!.Any(test => test.Tins is { } || test.FieldDensity?.Tins is { }) ? [Cautions.OfOven] : Array.Empty<string>(),
        .. request.Tests!.Any(test => test.Carbide is { } || test.FieldDensity?.Carbide is { }) ? [Cautions.OfCarbideTester] : Array.Empty<string>(),
    ];
}

/// <summary>The cautions that go with lots and plans.</summary>
internal static class LotCautions
{
    public const string RandomTests = "Rules of a lot speak for its tests if these were placed at random, by a plan drawn up before the work (ASTM D3665), and the lot is one soil, one lift scheme, one roller.";
    public const string NormalTests = "The risks hold for tests that scatter normally about the lot's mean with the stated standard deviation.";
}
