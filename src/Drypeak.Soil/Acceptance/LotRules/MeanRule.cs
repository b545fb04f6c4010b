using Drypeak.Soil.Acceptance.Statistics;
using Drypeak.Soil.Quantities;

namespace Drypeak.Soil.Acceptance.LotRules;

/// <summary>The mean of the lot lies within the limits.</summary>
/// <param name="Limits">The quantity and its limits.</param>
public sealed record MeanRule(Requirement Limits) : QuantityRule(Limits)
{
    /// <inheritdoc/>
    public override string Code => "mean";

    /// <inheritdoc/>
    public override string Basis => "Arithmetic mean of the lot: " + LotFindingKinds.CommonPractice + "; the mean of n tests is normal with σ/√n";

    /// <inheritdoc/>
    internal override LotJudgement Assess(KnownValues known, UnitSet units)
    {
        var mean = known.Summary!.Value.Mean;
        return new LotJudgement(this, mean, DecidingLimit(mean), IsWithin(mean) ? Conformance.Met : Conformance.NotMet,
            $"The mean of {known.Count} {(known.Count == 1 ? "test" : "tests")} is {Standing(mean, units)}.");
    }

    /// <inheritdoc/>
    internal override SampleAcceptance AcceptanceOf(int count) => (in SampleSummary summary, ReadOnlySpan<double> _) => IsWithin(summary.Mean);

    /// <inheritdoc/>
    internal override Func<double, double> ExactProbability(int count, double deviation) =>
        level => Limits.ProbabilityOfConformance(level, deviation / Math.Sqrt(count));
}
