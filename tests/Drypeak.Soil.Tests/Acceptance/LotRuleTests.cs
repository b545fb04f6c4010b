using CsCheck;
using Drypeak.Soil.Acceptance;
using Drypeak.Soil.Acceptance.LotRules;
using Drypeak.Soil.Acceptance.Statistics;
using Xunit;

namespace Drypeak.Soil.Tests.Acceptance;

public sealed class LotRuleTests
{
    [Fact]
    public void The_mean_decides_by_itself()
    {
        var rule = new MeanRule(Lots.Compaction(0.96));
        Assert.Equal(Conformance.Met, rule.Judged(0.94, 0.98).Conformance);
        Assert.Equal(Conformance.NotMet, rule.Judged(0.94, 0.9799).Conformance);
        Assert.Equal(0.96, rule.Judged(0.94, 0.98).Value!.Value, 1e-12);
    }

    [Fact]
    public void Every_test_is_as_good_as_its_worst()
    {
        var judged = new EveryTestRule(Lots.Compaction(0.95, 1.02)).Judged(0.96, 1.03, 0.948);
        Assert.Equal(Conformance.NotMet, judged.Conformance);
        Assert.Equal((1.03, 1.02), (judged.Value!.Value, judged.Limit!.Value));
        Assert.Contains("Tests 2 and 3 lie outside", judged.Explanation, StringComparison.Ordinal);
    }

    [Fact]
    public void The_moving_mean_is_the_lowest_of_so_many_in_order()
    {
        var rule = new MovingMeanRule(Lots.Compaction(0.96), 3, 0.93);
        var judged = rule.Judged(0.97, 0.96, 0.95, 0.96, 0.99);
        Assert.Equal((0.96 + 0.95 + 0.96) / 3, judged.Value!.Value, 1e-12);
        Assert.Equal(Conformance.NotMet, judged.Conformance);
        Assert.Equal(Conformance.Met, rule.Judged(0.97, 0.96, 0.95, 0.99, 0.99).Conformance);
        Assert.Equal(Conformance.NotMet, rule.Judged(1.0, 1.0, 0.929, 1.0, 1.0).Conformance);
        Assert.Equal(Conformance.Met, rule.Judged(1.0, 1.0, 0.93, 1.0, 1.0).Conformance);
    }

    [Fact]
    public void Fewer_tests_than_a_moving_mean_needs_are_undecided_unless_one_lies_below_the_floor()
    {
        var rule = new MovingMeanRule(Lots.Compaction(0.96), 3, 0.93);
        Assert.Equal((Conformance.Undecided, null), (rule.Judged(0.99, 0.99).Conformance, rule.Judged(0.99, 0.99).Value));
        Assert.Equal(Conformance.NotMet, rule.Judged(0.99, 0.92).Conformance);
    }

    [Fact]
    public void The_sliding_sum_is_the_sum() => Gen.Select(Gen.Double[0.8, 1.1].Array[1, 60], Gen.Int[2, 12]).Sample((values, span) =>
    {
        var judged = new MovingMeanRule(Lots.Compaction(0.9), span, null).Judged(values);
        var means = Enumerable.Range(0, Math.Max(0, values.Length - span + 1)).Select(i => values.Skip(i).Take(span).Average()).ToList();
        Assert.Equal(means.Count == 0 ? null : means.Min(), judged.Value, (a, b) => a == b || Math.Abs(a!.Value - b!.Value) < 1e-12);
    });

    /// <summary>T 5080.12, by hand: 4 tests 96, 97, 98, 99 against 95: mean 97.5, s 1.29099, Q 1.93649, PWL ½ + Q/3 over 1: all of it.</summary>
    [Fact]
    public void A_percentage_within_limits_shows_its_quality_index()
    {
        var judged = new PercentWithinLimitsRule(Lots.Compaction(0.965, 1.0), 0.8).Judged(0.96, 0.97, 0.98, 0.99);
        var s = Math.Sqrt(5.0 / 3) / 100;
        Assert.Equal(0.01 / s, judged.QualityIndex!.Value.Lower!.Value, 1e-9);
        Assert.Equal(0.025 / s, judged.QualityIndex.Value.Upper!.Value, 1e-9);
        Assert.Equal(0.5 + (0.01 / s / 3), judged.Value!.Value, 1e-9);
        Assert.Equal(Conformance.NotMet, judged.Conformance);
    }

    [Theory]
    [InlineData(0.95, 1.0, Conformance.Met)]
    [InlineData(0.94, 0.0, Conformance.NotMet)]
    public void Equal_values_are_all_within_or_none(double value, double share, Conformance conformance)
    {
        var judged = new PercentWithinLimitsRule(Lots.Compaction(0.95), 0.9).Judged(value, value, value);
        Assert.Equal((share, conformance, null), (judged.Value!.Value, judged.Conformance, judged.QualityIndex));
        Assert.True(judged.NoSpread);
        Assert.Contains("no-spread", LotAnalysis.Analyze(Lots.Of([value, value, value], new PercentWithinLimitsRule(Lots.Compaction(0.95), 0.9))).Findings.Select(finding => finding.Code));
    }

    [Theory]
    [InlineData(1)]
    [InlineData(2)]
    public void Two_tests_have_no_percentage_within_limits(int count)
    {
        var result = LotAnalysis.Analyze(Lots.Of(Enumerable.Repeat(0.97, count), new PercentWithinLimitsRule(Lots.Compaction(0.95), 0.9)));
        Assert.Equal((null, Conformance.Undecided), (result.Rules[0].Value, result.Rules[0].Conformance));
        Assert.Equal(TestOutcome.Undecided, result.Outcome);
        Assert.Contains("too-few-tests", result.Findings.Select(finding => finding.Code));
    }

    /// <summary>z(0.9) = 1.2816: of many tests k is z(fraction), less what the risk allows for few.</summary>
    [Fact]
    public void A_characteristic_value_takes_its_factor_from_risk_and_fraction()
    {
        double[] values = [0.96, 0.97, 0.98, 0.99, 0.95];
        var judged = new CharacteristicValueRule(Lots.Compaction(0.95), null, 0.1, 0.9).Judged(values);
        var k = ToleranceFactor.OneLimit(5, 0.9, 0.1);
        Assert.Equal(k, judged.Factor!.Value, 1e-12);
        Assert.Equal(0.97 - (k * Math.Sqrt(0.00025)), judged.Value!.Value, 1e-12);
        Assert.Equal(0.97 + (0.5 * Math.Sqrt(0.00025)), new CharacteristicValueRule(Lots.Compaction(null, 1), 0.5, null, null).Judged(values).Value!.Value, 1e-12);
    }

    /// <summary>What the rule promises: a lot of which exactly the fraction lies within the limit is rejected with the stated risk.</summary>
    [Fact]
    public void A_derived_factor_keeps_its_risk() => Gen.Select(Gen.Double[0.02, 0.5], Gen.Double[0.6, 0.99], Gen.Int[2, 60]).Sample((risk, fraction, count) =>
    {
        var rule = new CharacteristicValueRule(Lots.Compaction(0.95), null, risk, fraction);
        var level = 0.95 + (0.02 * MathNet.Numerics.Distributions.Normal.InvCDF(0, 1, fraction));
        Assert.Equal(1 - risk, new Drypeak.Soil.Acceptance.Plans.AcceptancePlan([rule], count, 0.02).At([level], 1, 1).Points[0].Probability, 1e-7);
    }, iter: 40);

    [Fact]
    public void Nine_of_ten_are_counted()
    {
        var rule = new ShareOfTestsRule(Lots.Compaction(0.95), 0.9);
        double[] nine = [.. Enumerable.Repeat(0.96, 9), 0.9];
        Assert.Equal((0.9, Conformance.Met), (rule.Judged(nine).Value!.Value, rule.Judged(nine).Conformance));
        Assert.Equal(Conformance.NotMet, rule.Judged([.. nine.Skip(1)]).Conformance);
    }

    [Fact]
    public void A_missing_value_leaves_a_rule_undecided_with_what_is_known()
    {
        var lot = Lots.Of([0.97, 0.98, 0.99], new MeanRule(Lots.Compaction(0.95)), new EveryTestRule(Lots.Compaction(0.98)));
        var result = LotAnalysis.Analyze(lot with { Tests = [.. lot.Tests, Lots.Test("wet", (AcceptedQuantity.WaterContent, 0.12))] });
        Assert.Equal((Conformance.Undecided, 0.98), (result.Rules[0].Conformance, Math.Round(result.Rules[0].Value!.Value, 12)));
        Assert.Equal(Conformance.NotMet, result.Rules[1].Conformance);
        Assert.Equal(TestOutcome.Rejected, result.Outcome);
        Assert.Contains("wet", result.Findings.First(finding => finding.Code == "quantity-missing").Message, StringComparison.Ordinal);
    }

    [Fact]
    public void A_lot_is_as_good_as_its_worst_rule()
    {
        TestOutcome? Outcome(params LotRule[] rules) => LotAnalysis.Analyze(Lots.Of([0.96, 0.98], rules)).Outcome;
        LotRule met = new MeanRule(Lots.Compaction(0.95)), missed = new MeanRule(Lots.Compaction(0.98)), undecided = new PercentWithinLimitsRule(Lots.Compaction(0.95), 0.9);
        Assert.Equal(TestOutcome.Accepted, Outcome(met));
        Assert.Equal(TestOutcome.Undecided, Outcome(met, undecided));
        Assert.Equal(TestOutcome.Rejected, Outcome(undecided, missed, met));
        Assert.Null(Outcome());
    }

    /// <summary>The order of the tests has no meaning but for moving means and charts.</summary>
    [Fact]
    public void The_order_does_not_matter_where_it_has_no_meaning() => Gen.Double[0.85, 1.08].Array[3, 50].Sample(values =>
    {
        LotRule[] rules =
        [
            new MeanRule(Lots.Compaction(0.95)), new EveryTestRule(Lots.Compaction(0.9, 1.05)), new PercentWithinLimitsRule(Lots.Compaction(0.93, 1.04), 0.8),
            new CharacteristicValueRule(Lots.Compaction(0.93), 0.8, null, null), new ShareOfTestsRule(Lots.Compaction(0.95), 0.8),
        ];
        var (forward, backward) = (LotAnalysis.Analyze(Lots.Of(values, rules)), LotAnalysis.Analyze(Lots.Of(values.Reverse(), rules)));
        Assert.All(forward.Rules.Zip(backward.Rules), pair =>
        {
            Assert.Equal(pair.First.Value!.Value, pair.Second.Value!.Value, 1e-9);
            Assert.Equal(pair.First.Conformance, pair.Second.Conformance);
        });
    });

    /// <summary>A limit that is raised never turns a rejected lot into an accepted one.</summary>
    [Fact]
    public void A_stricter_limit_accepts_no_more() => Gen.Select(Gen.Double[0.85, 1.05].Array[3, 20], Gen.Double[0.9, 1.0], Gen.Double[0, 0.05]).Sample((values, limit, more) =>
    {
        QuantityRule[] Rules(double minimum) =>
        [
            new MeanRule(Lots.Compaction(minimum)), new EveryTestRule(Lots.Compaction(minimum)), new MovingMeanRule(Lots.Compaction(minimum), 3, null),
            new PercentWithinLimitsRule(Lots.Compaction(minimum), 0.8), new CharacteristicValueRule(Lots.Compaction(minimum), 0.8, null, null), new ShareOfTestsRule(Lots.Compaction(minimum), 0.8),
        ];
        Assert.All(Rules(limit).Zip(Rules(limit + more)), pair => Assert.True(pair.First.Judged(values).Conformance <= pair.Second.Judged(values).Conformance));
    });

    /// <summary>A prepared acceptance says what the judgement says.</summary>
    [Fact]
    public void What_the_simulation_asks_is_what_the_lot_is_told() => Gen.Select(Gen.Double[0.85, 1.08].Array[4, 25], Gen.Double[0.5, 1]).Sample((values, required) =>
    {
        QuantityRule[] rules =
        [
            new MeanRule(Lots.Compaction(0.95, 1)), new EveryTestRule(Lots.Compaction(0.9)), new MovingMeanRule(Lots.Compaction(0.95), 3, 0.9),
            new PercentWithinLimitsRule(Lots.Compaction(0.9, 1.02), required), new PercentWithinLimitsRule(Lots.Compaction(0.93), required),
            new CharacteristicValueRule(Lots.Compaction(0.9, 1.05), 0.5, null, null), new ShareOfTestsRule(Lots.Compaction(0.95), required),
        ];
        Assert.All(rules, rule => Assert.Equal(
            rule.Judged(values).Conformance == Conformance.Met, rule.AcceptanceOf(values.Length)(SampleSummary.Of(values)!.Value, values)));
    });
}
