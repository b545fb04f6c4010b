using Drypeak.Soil.Acceptance.LotRules;
using Drypeak.Soil.Acceptance.Statistics;
using MathNet.Numerics.Distributions;

namespace Drypeak.Soil.Acceptance.Plans;

/// <summary>What a plan has to keep: an acceptable lot is seldom rejected, a rejectable one seldom accepted.</summary>
/// <param name="AcceptableLevel">True mean of a lot that should be accepted.</param>
/// <param name="RejectableLevel">True mean of a lot that should be rejected.</param>
/// <param name="ProducersRisk">Greatest probability of rejecting the acceptable lot; over 0 and below 1.</param>
/// <param name="ConsumersRisk">Greatest probability of accepting the rejectable lot; over 0 and below 1, the two together below 1.</param>
/// <param name="StandardDeviation">True standard deviation of single tests, over 0.</param>
public sealed record PlanRisks(double AcceptableLevel, double RejectableLevel, double ProducersRisk, double ConsumersRisk, double StandardDeviation)
{
    /// <summary>How far the levels lie apart, in standard deviations.</summary>
    internal double Apart => Math.Abs(AcceptableLevel - RejectableLevel) / StandardDeviation;

    /// <summary>Whether greater is better: the limit is a minimum.</summary>
    public bool IsAbove => AcceptableLevel > RejectableLevel;

    /// <summary>How far a level lies inside a limit, in standard deviations.</summary>
    internal double Inside(double level, double limit) => (IsAbove ? level - limit : limit - level) / StandardDeviation;

    /// <summary>A limit on the good side of which a value so many standard deviations from the rejectable level lies.</summary>
    internal Requirement LimitAbove(double fromRejectable, AcceptedQuantity quantity) => IsAbove
        ? new Requirement(quantity, RejectableLevel + (fromRejectable * StandardDeviation), null)
        : new Requirement(quantity, null, RejectableLevel - (fromRejectable * StandardDeviation));
}

/// <summary>
/// The smallest number of tests, and the number to hold them against, that keep two stated risks. For each count a rule has a least number
/// with which the consumer's risk is kept and a greatest with which the producer's is; the plan is the first count at which they leave room,
/// and takes the middle of it.
/// </summary>
public static class PlanDesign
{
    /// <summary>Whether the rule can be designed: its number is one, and theory gives its risks.</summary>
    public static bool IsPossibleFor(QuantityRule rule) => rule is MeanRule or EveryTestRule or PercentWithinLimitsRule or CharacteristicValueRule or ShareOfTestsRule;

    /// <summary>Whether the design finds the limit itself; else it takes the rule's limit and finds the factor or the share.</summary>
    public static bool FindsLimit(QuantityRule rule) => rule is MeanRule or EveryTestRule;

    /// <summary>The plan, or null where none with so many tests or fewer keeps both risks.</summary>
    /// <param name="rule">Its kind, quantity and (where the design does not find it) its one limit, on the side of the rejectable level.</param>
    /// <param name="risks">What is to be kept.</param>
    /// <param name="mostTests">1 or more.</param>
    public static AcceptancePlan? Find(QuantityRule rule, PlanRisks risks, int mostTests)
    {
        if (rule is ShareOfTestsRule share)
        {
            return FindShare(share, risks, mostTests);
        }

        // Room grows with the count: doubling finds a count that suffices, halving the least.
        var (least, enough) = (rule.LeastCount - 1, rule.LeastCount);
        while (RoomAt(rule, risks, enough) is null)
        {
            if (enough >= mostTests)
            {
                return null;
            }

            (least, enough) = (enough, Math.Min(2 * enough, mostTests));
        }

        while (enough - least > 1)
        {
            var middle = least + ((enough - least) / 2);
            (least, enough) = RoomAt(rule, risks, middle) is null ? (middle, enough) : (least, middle);
        }

        return new AcceptancePlan([With(rule, RoomAt(rule, risks, enough)!.Value, enough, risks)], enough, risks.StandardDeviation);
    }

    /// <summary>The middle of what both risks leave at a count; null where they leave nothing. In standard deviations.</summary>
    private static double? RoomAt(QuantityRule rule, PlanRisks risks, int count)
    {
        var (least, greatest) = Bounds(rule, risks, count);
        return least <= greatest ? (least + greatest) / 2 : null;
    }

    /// <summary>
    /// The least number with which the consumer's risk is kept, and the greatest with which the producer's is. Of mean and every test: the
    /// limit, in standard deviations above the rejectable level; of a share or a characteristic value: the factor k of mean − k·s.
    /// </summary>
    private static (double Least, double Greatest) Bounds(QuantityRule rule, PlanRisks risks, int count)
    {
        static double Z(double p) => NormalDistribution.Quantile(p);
        var root = Math.Sqrt(count);
        double Factor(double level, double risk) =>
            NoncentralT.Quantile(risk, count - 1, root * risks.Inside(level, (rule.Limits.Minimum ?? rule.Limits.Maximum)!.Value)) / root;
        return rule switch
        {
            MeanRule => (Z(1 - risks.ConsumersRisk) / root, risks.Apart + (Z(risks.ProducersRisk) / root)),
            EveryTestRule => (-Z(Math.Pow(risks.ConsumersRisk, 1.0 / count)), risks.Apart - Z(Math.Pow(1 - risks.ProducersRisk, 1.0 / count))),
            PercentWithinLimitsRule => Held(Factor(risks.RejectableLevel, 1 - risks.ConsumersRisk), Factor(risks.AcceptableLevel, risks.ProducersRisk), (count - 1) / root),
            _ => (Factor(risks.RejectableLevel, 1 - risks.ConsumersRisk), Factor(risks.AcceptableLevel, risks.ProducersRisk)),
        };

        // A share lies between 0 and 1, and so does the quality index between its two ends; a share of 0 would accept everything.
        static (double, double) Held(double least, double greatest, double end) => greatest > -end ? (Math.Max(least, -end), Math.Min(greatest, end)) : (1, 0);
    }

    private static QuantityRule With(QuantityRule rule, double number, int count, PlanRisks risks) => rule switch
    {
        MeanRule => new MeanRule(risks.LimitAbove(number, rule.Limits.Quantity)),
        EveryTestRule => new EveryTestRule(risks.LimitAbove(number, rule.Limits.Quantity)),
        PercentWithinLimitsRule share => share with { Required = PercentWithinLimits.OfOneLimit(number, count) },
        CharacteristicValueRule characteristic => characteristic with { Factor = number, Risk = null, Fraction = null },
        _ => throw new ArgumentException("This rule has no design.", nameof(rule)),
    };

    /// <summary>A count is a whole number, so that room does not grow steadily: each count is looked at.</summary>
    private static AcceptancePlan? FindShare(ShareOfTestsRule rule, PlanRisks risks, int mostTests)
    {
        var good = rule.Limits.ProbabilityOfConformance(risks.AcceptableLevel, risks.StandardDeviation);
        var poor = rule.Limits.ProbabilityOfConformance(risks.RejectableLevel, risks.StandardDeviation);
        var within = 1;
        for (var count = 1; good > poor && count <= mostTests; count++)
        {
            // The least number within the limits that keeps the consumer's risk; it does not fall as the count grows.
            while (within <= count && 1 - Binomial.CDF(poor, count, within - 1) > risks.ConsumersRisk)
            {
                within++;
            }

            if (within <= count && Binomial.CDF(good, count, within - 1) <= risks.ProducersRisk)
            {
                return new AcceptancePlan([rule with { Required = within / (double)count }], count, risks.StandardDeviation);
            }
        }

        return null;
    }
}
