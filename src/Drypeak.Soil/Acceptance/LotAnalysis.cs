using Drypeak.Soil.Acceptance.ControlCharts;
using Drypeak.Soil.Acceptance.LotRules;
using Drypeak.Soil.Acceptance.Statistics;
using MathNet.Numerics.Distributions;

namespace Drypeak.Soil.Acceptance;

/// <summary>A lot from its tests to its outcome: which tests count, what each rule says of them, and what else is to be seen.</summary>
public static class LotAnalysis
{
    private const double MeanCoverage = 0.95;

    private static readonly AcceptedQuantity[] Quantities = Enum.GetValues<AcceptedQuantity>();

    /// <summary>Trends are looked for in what the roller and the water cart govern.</summary>
    private static readonly AcceptedQuantity[] Trending =
        [AcceptedQuantity.RelativeCompaction, AcceptedQuantity.DryDensity, AcceptedQuantity.WaterContent, AcceptedQuantity.WaterContentFromOptimum];

    /// <summary>Analyzes a lot.</summary>
    public static LotResult Analyze(Lot lot)
    {
        var replacedBy = lot.Tests.Where(test => test.Replaces is { }).ToDictionary(test => test.Replaces!, test => test.Label);
        List<LotTest> counted = [.. lot.Tests.Where(test => test.SetAside is null && !replacedBy.ContainsKey(test.Label))];
        if (counted.TrueForAll(test => test.Time is { }))
        {
            counted = [.. counted.OrderBy(test => test.Time)];
        }

        var sample = new LotSample(counted, lot.Units);
        List<LotJudgement> rules = [.. lot.Rules.Select(rule => rule.Judge(sample))];
        var result = new LotResult
        {
            Counted = counted,
            ReplacedBy = replacedBy,
            Rules = rules,
            Outcome = OutcomeOf(lot, counted, rules),
            Statistics = [.. Quantities.Select(quantity => Estimate(quantity, sample, lot)).OfType<QuantityEstimate>()],
            Trends = [.. Trends(sample)],
            ControlChart = lot.ControlChart is { } plan ? ControlChart.Of(plan, sample.Of(plan.Quantity)) : null,
            Window = lot.Window is { } window ? Located(window, counted, lot) : null,
            Findings = [],
        };
        return result with { Findings = [.. LotReview.Of(lot, result, sample).OrderBy(finding => finding.Severity)] };
    }

    /// <summary>Any rule not met: rejected; else any undecided: undecided. Without rules every test must be accepted.</summary>
    private static TestOutcome? OutcomeOf(Lot lot, List<LotTest> counted, List<LotJudgement> rules)
    {
        var outcomes = lot.Rules.Count > 0
            ? rules.ConvertAll<TestOutcome?>(judged => judged.Conformance switch
            {
                Conformance.Met => TestOutcome.Accepted,
                Conformance.NotMet => TestOutcome.Rejected,
                _ => TestOutcome.Undecided,
            })
            : counted.ConvertAll(test => test.Outcome);
        return lot.Rules.Count == 0 && lot.Tests.All(test => test.Outcome is null) ? null
            : outcomes.Contains(TestOutcome.Rejected) ? TestOutcome.Rejected
            : outcomes.Count == 0 || outcomes.Contains(TestOutcome.Undecided) || outcomes.Contains(null) ? TestOutcome.Undecided
            : TestOutcome.Accepted;
    }

    private static QuantityEstimate? Estimate(AcceptedQuantity quantity, LotSample sample, Lot lot)
    {
        if (sample.Of(quantity).Summary is not { } summary)
        {
            return null;
        }

        if (summary is not { StandardDeviation: { } deviation, Count: var count, Mean: var mean })
        {
            return new QuantityEstimate(quantity, summary, null, null, null);
        }

        var reach = StudentT.InvCDF(0, 1, count - 1, (1 + MeanCoverage) / 2) * deviation / Math.Sqrt(count);
        var k = ToleranceFactor.TwoLimits(count, lot.ToleranceFraction, lot.ToleranceConfidence);
        return new QuantityEstimate(quantity, summary, (mean - reach, mean + reach), (mean - (k * deviation), mean + (k * deviation)), k);
    }

    private static IEnumerable<QuantityTrend> Trends(LotSample sample) =>
        from quantity in Trending
        from along in Enum.GetValues<Along>()
        let trend = Trend.Of(
            [.. sample.Tests.Select(test => (Place: along == Along.Station ? test.Station : test.Lift, Value: test.Values[quantity]))
                .Where(pair => pair is { Place: { }, Value: { } }).Select(pair => (pair.Place!.Value, pair.Value!.Value))])
        where trend is { }
        select new QuantityTrend(quantity, along, trend);

    private static WindowResult Located(CompactionWindow window, List<LotTest> counted, Lot lot)
    {
        List<string> inside = [];
        List<(string, string)> outside = [];
        List<(string, string)> unknown = [];
        foreach (var test in counted)
        {
            var (crossed, notKnown) = window.Locate(test);
            outside.AddRange(crossed.Select(edge => (test.Label, edge)));
            unknown.AddRange(notKnown.Select(edge => (test.Label, edge)));
            if (crossed.Count + notKnown.Count == 0)
            {
                inside.Add(test.Label);
            }
        }

        return new WindowResult(inside, outside, unknown, WetOfOptimumsRule.ShareOf(counted), WindowPolygon.Of(window, lot.Reference));
    }
}
