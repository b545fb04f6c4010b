using Drypeak.Soil.Acceptance.Statistics;
using Drypeak.Soil.FieldDensity.Review;
using Drypeak.Soil.Quantities;

namespace Drypeak.Soil.Acceptance.LotRules;

/// <summary>
/// The mean, moved by k standard deviations towards a limit, still lies within it: mean − k·s above a minimum, mean + k·s below a maximum.
/// </summary>
/// <param name="Limits">The quantity and its limits.</param>
/// <param name="Factor">k as the specification gives it, or null.</param>
/// <param name="Risk">Instead of k: the chance of rejecting a lot of which exactly the fraction lies within a limit.</param>
/// <param name="Fraction">With the risk; both over 0 and below 1.</param>
public sealed record CharacteristicValueRule(Requirement Limits, double? Factor, double? Risk, double? Fraction) : QuantityRule(Limits)
{
    /// <inheritdoc/>
    public override string Code => "characteristic-value";

    /// <inheritdoc/>
    public override string Basis => Factor is { }
        ? "Mean − k·s against a minimum, mean + k·s against a maximum; k of the specification"
        : "Mean − k·s against a minimum, mean + k·s against a maximum; k = t(n − 1, z(fraction)·√n; risk)/√n by the noncentral t distribution (ISO 16269-6)";

    /// <inheritdoc/>
    public override int LeastCount => 2;

    /// <summary>k for a sample.</summary>
    public double FactorOf(int count) => Factor ?? ToleranceFactor.OneLimit(count, Fraction!.Value, Risk!.Value);

    /// <inheritdoc/>
    internal override LotJudgement Assess(KnownValues known, UnitSet units)
    {
        var summary = known.Summary!.Value;
        var k = FactorOf(known.Count);
        var value = Worse(summary, k);
        return new LotJudgement(this, value, DecidingLimit(value), IsWithin(value) ? Conformance.Met : Conformance.NotMet,
            $"The characteristic value, the mean {JudgementWords.Text(Limits.Quantity, summary.Mean, units)} {(value <= summary.Mean ? "less" : "plus")} {ReaderText.Fixed(Math.Abs(k), 2)} standard deviations of {JudgementWords.Amount(Limits.Quantity, summary.StandardDeviation!.Value, units)}, is {Standing(value, units)}.")
        {
            Factor = k,
            NoSpread = summary.StandardDeviation == 0,
        };
    }

    /// <inheritdoc/>
    internal override SampleAcceptance AcceptanceOf(int count)
    {
        var k = FactorOf(count);
        return (in SampleSummary summary, ReadOnlySpan<double> _) => IsWithin(Worse(summary, k));
    }

    /// <inheritdoc/>
    internal override Func<double, double> ExactProbability(int count, double deviation)
    {
        var k = FactorOf(count);
        if (Limits is not { Minimum: { } minimum, Maximum: { } maximum })
        {
            return OneLimitProbability.Of(Limits, k, count, deviation);
        }

        var half = (maximum - minimum) / 2;
        var most = k > 0 ? half / k / deviation : double.PositiveInfinity;
        return new TwoLimitProbability(minimum + half, count, deviation, most, y => half - (k * y * deviation)).At;
    }

    /// <summary>Of the two values that two limits have, the one with less room.</summary>
    private double Worse(in SampleSummary summary, double k)
    {
        var (below, above) = (summary.Mean - (k * summary.StandardDeviation!.Value), summary.Mean + (k * summary.StandardDeviation.Value));
        return Limits switch
        {
            { Minimum: { } minimum, Maximum: { } maximum } => below - minimum <= maximum - above ? below : above,
            { Minimum: { } } => below,
            _ => above,
        };
    }
}
