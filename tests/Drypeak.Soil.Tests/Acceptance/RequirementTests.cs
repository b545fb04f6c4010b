using CsCheck;
using Drypeak.Soil.Acceptance;
using MathNet.Numerics.Distributions;
using MathNet.Numerics.Random;
using Xunit;

namespace Drypeak.Soil.Tests.Acceptance;

public sealed class RequirementTests
{
    private static readonly Gen<(Requirement Requirement, double Value, double U)> Any =
        from lower in Gen.Double[0.5, 1.0]
        from width in Gen.Double[0.01, 0.3]
        from kind in Gen.Int[0, 2]
        from value in Gen.Double[0.4, 1.4]
        from u in Gen.Double[0.001, 0.2]
        select (new Requirement(AcceptedQuantity.RelativeCompaction, kind == 1 ? null : lower, kind == 0 ? null : lower + width), value, u);

    /// <summary>MathNet's normal distribution, and the definition by an integral over the limits.</summary>
    [Fact]
    public void The_probability_of_conformance_is_the_share_of_the_normal_distribution_within_the_limits() => Any.Sample(any =>
    {
        var normal = new Normal(any.Value, any.U);
        var expected = (any.Requirement.Maximum is { } most ? normal.CumulativeDistribution(most) : 1) - (any.Requirement.Minimum is { } least ? normal.CumulativeDistribution(least) : 0);
        Assert.Equal(expected, any.Requirement.ProbabilityOfConformance(any.Value, any.U), 1e-12);
    });

    /// <summary>A million trials from a stated seed: three standard errors of a share near one half are 0.0015.</summary>
    [Theory]
    [InlineData(0.95, null, 0.96, 0.02)]
    [InlineData(null, 0.02, 0.01, 0.008)]
    [InlineData(-0.02, 0.02, -0.015, 0.01)]
    public void The_probability_of_conformance_is_what_trials_give(double? minimum, double? maximum, double value, double u)
    {
        var requirement = new Requirement(AcceptedQuantity.WaterContentFromOptimum, minimum, maximum);
        var trials = new double[1_000_000];
        Normal.Samples(new MersenneTwister(20_240_601), trials, value, u);
        var share = trials.Count(trial => requirement.MarginOf(trial) >= 0) / (double)trials.Length;
        Assert.Equal(share, requirement.ProbabilityOfConformance(value, u), 0.0016);
    }

    [Fact]
    public void Far_outside_the_probability_keeps_its_digits()
    {
        var requirement = new Requirement(AcceptedQuantity.RelativeCompaction, 1, 2);
        // Φ(−10) = 7.61985302416e-24 (Abramowitz and Stegun, table 26.2; from memory).
        Assert.Equal(1, requirement.ProbabilityOfConformance(0, 0.1) / 7.61985302416e-24, 1e-9);
    }

    /// <summary>A requirement is one or the other: what is met under the guarded rule is met under the simple one, and what is missed is missed.</summary>
    [Fact]
    public void A_guarded_decision_never_turns_a_simple_one_round() =>
        Gen.Select(Any, Gen.Double[0.001, 0.5]).Sample((any, risk) =>
        {
            var simple = DecisionRule.Simple.Judge(any.Requirement, any.Value, any.U).Conformance;
            var guarded = new DecisionRule(risk).Judge(any.Requirement, any.Value, any.U).Conformance;
            Assert.True(guarded == simple || guarded == Conformance.Undecided, $"{simple} became {guarded}.");
            Assert.NotEqual(Conformance.Undecided, simple);
        });

    /// <summary>JCGM 106:2012, clause 8: beyond a guard band of z(1 − risk)·u on one limit, the probability of the wrong decision is at most the risk.</summary>
    [Fact]
    public void A_guarded_decision_on_one_limit_keeps_its_risk() =>
        Gen.Select(Any, Gen.Double[0.001, 0.5]).Where((any, _) => any.Requirement.Minimum is null || any.Requirement.Maximum is null).Sample((any, risk) =>
        {
            var judged = new DecisionRule(risk).Judge(any.Requirement, any.Value, any.U);
            var conforms = judged.ProbabilityOfConformance!.Value;
            Assert.True(judged.Conformance switch
            {
                Conformance.Met => conforms >= 1 - risk - 1e-7,
                Conformance.NotMet => conforms <= risk + 1e-7,
                _ => conforms > risk - 1e-7 && conforms < 1 - risk + 1e-7,
            });
        });

    /// <summary>The law of propagation against trials: the ratio of two normal quantities with small uncertainties.</summary>
    [Fact]
    public void First_order_uncertainty_is_what_trials_give()
    {
        var random = new MersenneTwister(7);
        var (dry, most) = (new double[400_000], new double[400_000]);
        Normal.Samples(random, dry, 1820, 15);
        Normal.Samples(random, most, 1900, 10);
        var ratios = dry.Zip(most, (d, m) => d / m).ToList();
        var mean = ratios.Average();
        var deviation = Math.Sqrt(ratios.Average(ratio => (ratio - mean) * (ratio - mean)));
        var first = FirstOrderUncertainty.Of(moved => moved[0] / moved[1], [(1820, 15), (1900, 10)]);
        Assert.Equal(1, first!.Value / deviation, 0.005);
    }

    [Fact]
    public void An_input_that_does_not_matter_lends_no_uncertainty() =>
        Assert.Null(FirstOrderUncertainty.Of(moved => moved[0], [(2, null), (3, 0.1)]));
}
