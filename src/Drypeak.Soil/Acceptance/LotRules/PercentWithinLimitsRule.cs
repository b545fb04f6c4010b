using Drypeak.Soil.Acceptance.Statistics;
using Drypeak.Soil.Quantities;
using MathNet.Numerics.RootFinding;

namespace Drypeak.Soil.Acceptance.LotRules;

/// <summary>The estimated share of the lot within the limits reaches what is required.</summary>
/// <param name="Limits">The quantity and its limits.</param>
/// <param name="Required">A fraction, 0 to 1.</param>
public sealed record PercentWithinLimitsRule(Requirement Limits, double Required) : QuantityRule(Limits)
{
    /// <inheritdoc/>
    public override string Code => "percent-within-limits";

    /// <inheritdoc/>
    public override string Basis => "FHWA Technical Advisory T 5080.12 and AASHTO R 9: quality index Q = (mean − limit)/s, share by the beta distribution, standard deviation method";

    /// <inheritdoc/>
    public override bool GivesShare => true;

    /// <inheritdoc/>
    public override int LeastCount => PercentWithinLimits.LeastCount;

    /// <inheritdoc/>
    internal override LotJudgement Assess(KnownValues known, UnitSet units)
    {
        var summary = known.Summary!.Value;
        var deviation = summary.StandardDeviation!.Value;
        if (deviation == 0)
        {
            var inside = IsWithin(summary.Mean);
            return Judged(inside ? 1 : 0, $"All {known.Count} values are equal, {Standing(summary.Mean, units)}, so that {(inside ? "all" : "none")} of the lot counts as within the limits.")
                with
            { NoSpread = true };
        }

        var (lower, upper) = QualityIndices(summary);
        var share = PercentWithinLimits.Of(lower, upper, known.Count);
        return Judged(share, $"An estimated {ReaderText.Percent(share)} of the lot is {LimitsInWords(units)}, where {ReaderText.Percent(Required)} is required.") with { QualityIndex = (lower, upper) };
    }

    private LotJudgement Judged(double share, string explanation) =>
        new(this, share, Required, Reaches(share, Required) ? Conformance.Met : Conformance.NotMet, explanation);

    private (double? Lower, double? Upper) QualityIndices(in SampleSummary summary) =>
        ((summary.Mean - Limits.Minimum) / summary.StandardDeviation, (Limits.Maximum - summary.Mean) / summary.StandardDeviation);

    /// <summary>Asks the beta distribution only where the two sides are not clear by themselves.</summary>
    internal override SampleAcceptance AcceptanceOf(int count)
    {
        if (Required <= 0)
        {
            return (in SampleSummary _, ReadOnlySpan<double> _) => true;
        }

        var least = PercentWithinLimits.QualityIndexOf(Required, count);
        var enough = PercentWithinLimits.QualityIndexOf((1 + Required) / 2, count);
        return (in SampleSummary summary, ReadOnlySpan<double> _) =>
        {
            var (lower, upper) = QualityIndices(summary);
            return (lower, upper) switch
            {
                ({ } low, { } high) => Math.Min(low, high) >= least && (Math.Min(low, high) >= enough || Reaches(PercentWithinLimits.Of(low, high, count), Required)),
                _ => (lower ?? upper)!.Value >= least,
            };
        };
    }

    /// <summary>
    /// One limit: Q·√n is noncentral t. Two limits: of four tests or more, at a given s the mean may lie as far from the middle as the estimate
    /// allows; of three the estimate is not one piece, and is simulated.
    /// </summary>
    internal override Func<double, double>? ExactProbability(int count, double deviation)
    {
        if (Required <= 0)
        {
            return _ => 1;
        }

        if (Limits is not { Minimum: { } minimum, Maximum: { } maximum })
        {
            return OneLimitProbability.Of(Limits, PercentWithinLimits.QualityIndexOf(Required, count), count, deviation);
        }

        if (count <= PercentWithinLimits.LeastCount || maximum <= minimum)
        {
            return null;
        }

        var half = (maximum - minimum) / 2;
        var most = half / PercentWithinLimits.QualityIndexOf((1 + Required) / 2, count) / deviation;
        return new TwoLimitProbability(minimum + half, count, deviation, most, y => Reach(half, y * deviation, count)).At;
    }

    /// <summary>How far from the middle the mean may lie at a standard deviation, where it may lie in the middle.</summary>
    private double Reach(double half, double deviation, int count)
    {
        double Excess(double off) => PercentWithinLimits.Of((half - off) / deviation, (half + off) / deviation, count) - Required;
        var far = half + (deviation * (count - 1) / Math.Sqrt(count));
        return Excess(0) < 0 ? 0 : Brent.FindRoot(Excess, 0, far, 1e-12 * far, 200);
    }
}
