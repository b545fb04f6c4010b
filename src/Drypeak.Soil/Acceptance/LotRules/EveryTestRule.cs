using Drypeak.Soil.Acceptance.Statistics;
using Drypeak.Soil.Quantities;

namespace Drypeak.Soil.Acceptance.LotRules;

/// <summary>Every value lies within the limits; the worst one decides.</summary>
/// <param name="Limits">The quantity and its limits.</param>
public sealed record EveryTestRule(Requirement Limits) : QuantityRule(Limits)
{
    /// <inheritdoc/>
    public override string Code => "every-test";

    /// <inheritdoc/>
    public override string Basis => "Every value within the limits: " + LotFindingKinds.CommonPractice + "; probability of acceptance pⁿ, p the share of a normal distribution within the limits";

    /// <inheritdoc/>
    internal override LotJudgement Assess(KnownValues known, UnitSet units)
    {
        var worst = known.Values[0];
        List<string> outside = [];
        for (var i = 0; i < known.Count; i++)
        {
            worst = Limits.MarginOf(known.Values[i]) < Limits.MarginOf(worst) ? known.Values[i] : worst;
            if (!IsWithin(known.Values[i]))
            {
                outside.Add(known.Tests[i].Label);
            }
        }

        return outside.Count == 0
            ? new LotJudgement(this, worst, DecidingLimit(worst), Conformance.Met, $"All {known.Count} values lie {LimitsInWords(units)}; the worst is {Standing(worst, units)}.")
            : new LotJudgement(this, worst, DecidingLimit(worst), Conformance.NotMet,
                $"{Labels.Listed(outside, "test")} {(outside.Count == 1 ? "lies" : "lie")} outside: {Limits.Quantity.Words()} must be {LimitsInWords(units)}, and the worst is {Standing(worst, units)}.");
    }

    /// <inheritdoc/>
    internal override SampleAcceptance AcceptanceOf(int count) => (in SampleSummary summary, ReadOnlySpan<double> _) => IsWithin(summary.Minimum) && IsWithin(summary.Maximum);

    /// <inheritdoc/>
    internal override Func<double, double> ExactProbability(int count, double deviation) =>
        level => Math.Pow(Limits.ProbabilityOfConformance(level, deviation), count);

    private protected override bool IsFinal(LotJudgement judged) => judged.Conformance == Conformance.NotMet;
}
