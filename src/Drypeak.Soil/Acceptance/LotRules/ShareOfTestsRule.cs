using Drypeak.Soil.Acceptance.Statistics;
using Drypeak.Soil.Quantities;
using MathNet.Numerics.Distributions;

namespace Drypeak.Soil.Acceptance.LotRules;

/// <summary>A counted share of the tests, such as nine of ten, lies within the limits.</summary>
/// <param name="Limits">The quantity and its limits.</param>
/// <param name="Required">A fraction, 0 to 1.</param>
public sealed record ShareOfTestsRule(Requirement Limits, double Required) : QuantityRule(Limits)
{
    private const double Arithmetic = 1e-9;

    /// <inheritdoc/>
    public override string Code => "share-of-tests";

    /// <inheritdoc/>
    public override string Basis => "Counted share of the tests within the limits: " + LotFindingKinds.CommonPractice + "; probability of acceptance by the binomial distribution";

    /// <inheritdoc/>
    public override bool GivesShare => true;

    /// <inheritdoc/>
    internal override bool LooksAtEachValue => true;

    /// <summary>How many of so many tests have to lie within the limits.</summary>
    public int LeastWithin(int count) => (int)Math.Ceiling(Required * count * (1 - Arithmetic));

    /// <inheritdoc/>
    internal override LotJudgement Assess(KnownValues known, UnitSet units)
    {
        var within = CountWithin(known.Values);
        var share = within / (double)known.Count;
        return new LotJudgement(this, share, Required, within >= LeastWithin(known.Count) ? Conformance.Met : Conformance.NotMet,
            $"{within} of {known.Count} tests are {LimitsInWords(units)}: {ReaderText.Percent(share)}, where {ReaderText.Percent(Required)} is required.");
    }

    /// <inheritdoc/>
    internal override SampleAcceptance AcceptanceOf(int count)
    {
        var least = LeastWithin(count);
        return (in SampleSummary _, ReadOnlySpan<double> values) => CountWithin(values) >= least;
    }

    /// <inheritdoc/>
    internal override Func<double, double> ExactProbability(int count, double deviation)
    {
        var least = LeastWithin(count);
        return level => least == 0 ? 1 : 1 - Binomial.CDF(Math.Min(1, Limits.ProbabilityOfConformance(level, deviation)), count, least - 1);
    }

    private int CountWithin(ReadOnlySpan<double> values)
    {
        var within = 0;
        foreach (var value in values)
        {
            within += IsWithin(value) ? 1 : 0;
        }

        return within;
    }
}
