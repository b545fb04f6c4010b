using CsCheck;
using Drypeak.Soil.Acceptance;
using Drypeak.Soil.Acceptance.LotRules;
using Drypeak.Soil.Acceptance.Plans;
using Xunit;

namespace Drypeak.Soil.Tests.Acceptance;

public sealed class PlanTests
{
    private const int Trials = 60_000;

    /// <summary>Twenty plans and more: by theory, and by the very rules that judge real lots.</summary>
    public static TheoryData<QuantityRule, int, double> Plans
    {
        get
        {
            var data = new TheoryData<QuantityRule, int, double>
            {
                { new MeanRule(Lots.Compaction(0.95)), 4, 0.02 },
                { new MeanRule(Lots.Compaction(null, 0.99)), 9, 0.03 },
                { new MeanRule(Lots.Compaction(0.95, 0.97)), 5, 0.015 },
                { new EveryTestRule(Lots.Compaction(0.93)), 6, 0.02 },
                { new EveryTestRule(Lots.Compaction(null, 1.0)), 3, 0.02 },
                { new EveryTestRule(Lots.Compaction(0.92, 1.0)), 5, 0.02 },
                { new ShareOfTestsRule(Lots.Compaction(0.95), 0.9), 10, 0.02 },
                { new ShareOfTestsRule(Lots.Compaction(0.93, 0.99), 0.8), 7, 0.02 },
                { new PercentWithinLimitsRule(Lots.Compaction(0.94), 0.9), 3, 0.02 },
                { new PercentWithinLimitsRule(Lots.Compaction(0.94), 0.9), 4, 0.02 },
                { new PercentWithinLimitsRule(Lots.Compaction(0.94), 0.8), 10, 0.02 },
                { new PercentWithinLimitsRule(Lots.Compaction(null, 0.98), 0.85), 6, 0.02 },
                { new PercentWithinLimitsRule(Lots.Compaction(0.95), 1), 5, 0.02 },
                { new PercentWithinLimitsRule(Lots.Compaction(0.92, 1.0), 0.9), 5, 0.02 },
                { new PercentWithinLimitsRule(Lots.Compaction(0.92, 1.0), 0.8), 4, 0.03 },
                { new PercentWithinLimitsRule(Lots.Compaction(0.93, 0.98), 0.7), 20, 0.02 },
                { new CharacteristicValueRule(Lots.Compaction(0.94), 0.8, null, null), 5, 0.02 },
                { new CharacteristicValueRule(Lots.Compaction(null, 0.99), 1.2, null, null), 8, 0.02 },
                { new CharacteristicValueRule(Lots.Compaction(0.94), null, 0.1, 0.9), 6, 0.02 },
                { new CharacteristicValueRule(Lots.Compaction(0.91, 1.0), 1.0, null, null), 5, 0.025 },
                { new CharacteristicValueRule(Lots.Compaction(0.91, 1.0), -0.5, null, null), 4, 0.03 },
                { new CharacteristicValueRule(Lots.Compaction(0.95), 0.5, null, null), 2, 0.02 },
            };
            return data;
        }
    }

    /// <summary>Within four standard errors, with room for a probability that no trial hit.</summary>
    [Theory]
    [MemberData(nameof(Plans), DisableDiscoveryEnumeration = true)]
    public void By_theory_is_by_trials(QuantityRule rule, int count, double deviation)
    {
        var plan = new AcceptancePlan([rule], count, deviation);
        double[] levels = [0.93, 0.95, 0.96, 0.97, 0.99];
        Assert.True(plan.IsExact);
        var (exact, simulated) = (plan.At(levels, 1, Trials), PlanSimulation.Run(plan, levels, 11, Trials));
        Assert.Null(exact.Trials);
        Assert.All(exact.Points.Zip(simulated), pair =>
        {
            var p = pair.First.Probability;
            Assert.Equal(p, pair.Second.Probability, (4 * Math.Sqrt(p * (1 - p) / Trials)) + (5.0 / Trials));
        });
    }

    [Fact]
    public void Of_three_tests_and_two_limits_a_share_is_simulated() =>
        Assert.False(new AcceptancePlan([new PercentWithinLimitsRule(Lots.Compaction(0.92, 1), 0.9)], 3, 0.02).IsExact);

    [Fact]
    public void A_combination_is_accepted_no_more_often_than_each_of_its_rules()
    {
        QuantityRule[] rules = [new MeanRule(Lots.Compaction(0.96)), new MovingMeanRule(Lots.Compaction(0.95), 3, 0.92), new PercentWithinLimitsRule(Lots.Compaction(0.94, 1.02), 0.85)];
        double[] levels = [0.94, 0.96, 0.98];
        var together = new AcceptancePlan(rules, 8, 0.02).At(levels, 3, 30_000);
        Assert.Equal(30_000, together.Trials);
        foreach (var rule in rules)
        {
            var alone = PlanSimulation.Run(new AcceptancePlan([rule], 8, 0.02), levels, 3, 30_000);
            Assert.All(together.Points.Zip(alone), pair => Assert.True(pair.First.Probability <= pair.Second.Probability));
        }
    }

    [Fact]
    public void The_same_seed_gives_the_same_curve_and_another_seed_another()
    {
        var plan = new AcceptancePlan([new MovingMeanRule(Lots.Compaction(0.95), 3, null)], 6, 0.02);
        IReadOnlyList<AcceptanceProbability> Run(int seed) => PlanSimulation.Run(plan, [0.95, 0.96], seed, 20_000);
        Assert.Equal(Run(5), Run(5));
        Assert.NotEqual(Run(5), Run(6));
    }

    /// <summary>Fewer tests than the rule needs accept nothing: the rule would stay undecided.</summary>
    [Fact]
    public void Too_few_tests_accept_nothing() =>
        Assert.Equal(0, new AcceptancePlan([new PercentWithinLimitsRule(Lots.Compaction(0.9), 0.5)], 2, 0.02).At([0.99], 1, 1).Points[0].Probability);

    /// <summary>Levels, limits and scatter in another unit: the same curve.</summary>
    [Fact]
    public void A_curve_does_not_depend_on_the_unit() => Gen.Select(Gen.Double[0.01, 3000], Gen.Int[4, 30], Gen.Double[0.005, 0.05], Gen.Double[0.9, 1.0]).Sample((scale, count, deviation, level) =>
    {
        Requirement Limits(double unit) => new(AcceptedQuantity.VoidRatio, 0.94 * unit, 1.01 * unit);
        QuantityRule[] Rules(double unit) =>
            [new MeanRule(Limits(unit)), new EveryTestRule(Limits(unit)), new PercentWithinLimitsRule(Limits(unit), 0.8), new CharacteristicValueRule(Limits(unit), 0.7, null, null)];
        Assert.All(Rules(1).Zip(Rules(scale)), pair => Assert.Equal(
            new AcceptancePlan([pair.First], count, deviation).At([level], 1, 1).Points[0].Probability,
            new AcceptancePlan([pair.Second], count, deviation * scale).At([level * scale], 1, 1).Points[0].Probability, 1e-9));
    });

    private static readonly Gen<PlanRisks> Risks =
        from apart in Gen.Double[0.02, 0.06]
        from producers in Gen.Double[0.01, 0.2]
        from consumers in Gen.Double[0.01, 0.2]
        from deviation in Gen.Double[0.01, 0.03]
        from minimum in Gen.Bool
        select new PlanRisks(0.97, minimum ? 0.97 - apart : 0.97 + apart, producers, consumers, deviation);

    /// <summary>The plan that is found keeps both risks, and no plan with a test less does, whatever its limit.</summary>
    [Fact]
    public void A_design_keeps_both_risks_with_the_fewest_tests() => Gen.Select(Risks, Gen.Int[0, 4]).Sample((risks, kind) =>
    {
        var limits = risks.IsAbove ? Lots.Compaction(risks.RejectableLevel - (0.3 * risks.StandardDeviation)) : Lots.Compaction(null, risks.RejectableLevel + (0.3 * risks.StandardDeviation));
        QuantityRule rule = kind switch
        {
            0 => new MeanRule(limits),
            1 => new EveryTestRule(limits),
            2 => new PercentWithinLimitsRule(limits, 0.9),
            3 => new CharacteristicValueRule(limits, 1, null, null),
            _ => new ShareOfTestsRule(limits, 0.9),
        };
        if (PlanDesign.Find(rule, risks, 300) is not { } plan)
        {
            Assert.True(kind is 1 or 2 or 3 or 4);
            return;
        }

        var points = plan.At([risks.AcceptableLevel, risks.RejectableLevel], 1, 1).Points;
        Assert.True(1 - points[0].Probability <= risks.ProducersRisk + 1e-7, $"{rule.Code} {plan.Count}: producer {1 - points[0].Probability} over {risks.ProducersRisk}");
        Assert.True(points[1].Probability <= risks.ConsumersRisk + 1e-7, $"{rule.Code} {plan.Count}: consumer {points[1].Probability} over {risks.ConsumersRisk}");
    }, iter: 60);

    /// <summary>n = ((z₀.₉₅ + z₀.₉₀)·σ/Δ)², by the textbook: (1.645 + 1.282)² = 8.56 for Δ = σ.</summary>
    [Fact]
    public void A_mean_needs_as_many_tests_as_the_textbook_says()
    {
        var plan = PlanDesign.Find(new MeanRule(Lots.Compaction(0)), new PlanRisks(0.98, 0.96, 0.05, 0.10, 0.02), 100)!;
        Assert.Equal(9, plan.Count);
        Assert.Null(PlanDesign.Find(new MeanRule(Lots.Compaction(0)), new PlanRisks(0.98, 0.96, 0.05, 0.10, 0.02), 8));
    }
}
