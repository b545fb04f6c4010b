using Drypeak.Soil.Acceptance.Statistics;
using Drypeak.Soil.FieldDensity.Review;
using Drypeak.Soil.Quantities;

namespace Drypeak.Soil.Acceptance.LotRules;

/// <summary>The mean of any so many consecutive tests lies within the limits, and no single test below a floor.</summary>
/// <param name="Limits">The quantity and the limits of the mean.</param>
/// <param name="Span">Consecutive tests in a mean, 2 or more.</param>
/// <param name="Floor">The least single value, in the quantity's SI unit, or null.</param>
public sealed record MovingMeanRule(Requirement Limits, int Span, double? Floor) : QuantityRule(Limits)
{
    /// <inheritdoc/>
    public override string Code => "moving-mean";

    /// <inheritdoc/>
    public override string Basis => "Mean of any so many consecutive tests, none below a floor: " + LotFindingKinds.CommonPractice;

    /// <inheritdoc/>
    internal override bool LooksAtEachValue => true;

    /// <inheritdoc/>
    internal override LotJudgement Assess(KnownValues known, UnitSet units)
    {
        string Text(double value) => JudgementWords.Text(Limits.Quantity, value, units);
        var below = known.Tests.Where((_, i) => IsBelowFloor(known.Values[i])).Select(test => test.Label).ToList();
        var floor = below.Count == 0 ? "" : $" {Labels.Listed(below, "test")} {(below.Count == 1 ? "lies" : "lie")} below the floor of {Text(Floor!.Value)}.";
        if (WorstMean(known.Values, out var at) is not { } worst)
        {
            return new LotJudgement(this, null, Limits.Minimum ?? Limits.Maximum, below.Count > 0 ? Conformance.NotMet : Conformance.Undecided,
                $"A mean of {Span} consecutive tests needs as many; there {(known.Count == 1 ? "is 1" : $"are {known.Count}")}.{floor}")
            { TooFew = true };
        }

        return new LotJudgement(this, worst, DecidingLimit(worst), IsWithin(worst) && below.Count == 0 ? Conformance.Met : Conformance.NotMet,
            $"The worst mean of {Span} consecutive tests ({known.Tests[at].Label} to {known.Tests[at + Span - 1].Label}) is {Standing(worst, units)}.{floor}");
    }

    /// <inheritdoc/>
    internal override SampleAcceptance AcceptanceOf(int count) => (in SampleSummary summary, ReadOnlySpan<double> values) =>
        !IsBelowFloor(summary.Minimum) && WorstMean(values, out _) is { } worst && IsWithin(worst);

    private protected override bool IsFinal(LotJudgement judged) => judged is { Conformance: Conformance.NotMet, Value: null };

    private bool IsBelowFloor(double value) => Floor is { } floor && new Requirement(Limits.Quantity, floor, null) is var least && least.MarginOf(value) < -least.Tolerance;

    /// <summary>The mean with the least margin, and where it begins; null where there are fewer values than it needs.</summary>
    private double? WorstMean(ReadOnlySpan<double> values, out int at)
    {
        at = 0;
        double? worst = null;
        var sum = 0.0;
        for (var i = 0; i + Span <= values.Length; i++)
        {
            // The sum slides along; each full span it is made anew, so that rounding does not gather over a long lot.
            sum = i % Span == 0 ? SumOf(values.Slice(i, Span)) : sum - values[i - 1] + values[i + Span - 1];
            if (worst is not { } known || Limits.MarginOf(sum / Span) < Limits.MarginOf(known))
            {
                (worst, at) = (sum / Span, i);
            }
        }

        return worst;
    }

    private static double SumOf(ReadOnlySpan<double> values)
    {
        var sum = 0.0;
        foreach (var value in values)
        {
            sum += value;
        }

        return sum;
    }
}
