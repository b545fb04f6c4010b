using Drypeak.Soil.Acceptance.Statistics;
using Drypeak.Soil.FieldDensity.Review;
using Drypeak.Soil.Quantities;

namespace Drypeak.Soil.Acceptance.LotRules;

/// <summary>A rule by which a whole lot is accepted. Immutable, safe on any thread.</summary>
public abstract record LotRule
{
    /// <summary>Its name in the interface: <c>percent-within-limits</c>.</summary>
    public abstract string Code { get; }

    /// <summary>On what it stands.</summary>
    public abstract string Basis { get; }

    /// <summary>Whether value and limit are shares of something, rather than of the quantity's own kind.</summary>
    public virtual bool GivesShare => false;

    /// <summary>Holds the rule against the tests that count.</summary>
    internal abstract LotJudgement Judge(LotSample sample);
}

/// <summary>A rule that looks at the values of one quantity, in the order of the tests.</summary>
/// <param name="Limits">The quantity and its limits.</param>
public abstract record QuantityRule(Requirement Limits) : LotRule
{
    private const double Arithmetic = 1e-9;

    /// <summary>Values that the rule needs to say anything.</summary>
    public virtual int LeastCount => 1;

    /// <summary>Whether the order or the single values matter, and not only the summary of the sample.</summary>
    internal virtual bool LooksAtEachValue => false;

    /// <summary>Whether a sample of so many values is accepted: what <see cref="Assess"/> says, made ready to be asked many times.</summary>
    internal abstract SampleAcceptance AcceptanceOf(int count);

    /// <summary>The probability of acceptance against the true mean, where theory gives it; null where it has to be simulated.</summary>
    /// <param name="count">Values in the sample, <see cref="LeastCount"/> or more.</param>
    /// <param name="deviation">True standard deviation, over 0.</param>
    internal virtual Func<double, double>? ExactProbability(int count, double deviation) => null;

    /// <inheritdoc/>
    internal override LotJudgement Judge(LotSample sample)
    {
        var known = sample.Of(Limits.Quantity);
        if (known.Count < LeastCount)
        {
            return new LotJudgement(this, null, null, Conformance.Undecided,
                known.Count == 0
                    ? $"No test that counts has a value of {Limits.Quantity.Words()}. Give it, or what it follows from."
                    : $"The rule needs {LeastCount} tests or more with {Limits.Quantity.Words()}; there {(known.Count == 1 ? "is 1" : $"are {known.Count}")}. Make more tests.")
            {
                TooFew = known.Count > 0,
                Missing = known.Missing,
            };
        }

        var judged = Assess(known, sample.Units);
        return known.Missing.Count == 0 ? judged
            : judged with
            {
                Missing = known.Missing,
                Conformance = IsFinal(judged) ? judged.Conformance : Conformance.Undecided,
                Explanation = $"{judged.Explanation} {Labels.Listed(known.Missing, "test")} {(known.Missing.Count == 1 ? "has" : "have")} no value of {Limits.Quantity.Words()}"
                    + (IsFinal(judged) ? "." : ", so that the rule stays undecided: give it, or set the test aside with a reason."),
            };
    }

    /// <summary>Judges a sample that is large enough.</summary>
    internal abstract LotJudgement Assess(KnownValues known, UnitSet units);

    /// <summary>Whether no further value could change the judgement.</summary>
    private protected virtual bool IsFinal(LotJudgement judged) => false;

    /// <summary>The limit that a value is nearest to, or furthest beyond.</summary>
    private protected double DecidingLimit(double value) =>
        Limits is { Minimum: { } minimum, Maximum: { } maximum } ? (value - minimum <= maximum - value ? minimum : maximum) : (Limits.Minimum ?? Limits.Maximum)!.Value;

    /// <summary>At least the limits' margin, with the tolerance of arithmetic.</summary>
    private protected bool IsWithin(double value) => Limits.MarginOf(value) >= -Limits.Tolerance;

    /// <summary>A share against the one required.</summary>
    private protected static bool Reaches(double share, double required) => share >= required * (1 - Arithmetic);

    /// <summary>Where a value stands to its deciding limit: <c>96.4 %, 0.40 above the minimum of 96.0 %</c>.</summary>
    private protected string Standing(double value, UnitSet units) => JudgementWords.Standing(Limits, value, units);

    /// <summary>The limits in words: <c>at least 95.0 %</c>.</summary>
    private protected string LimitsInWords(UnitSet units)
    {
        string Text(double value) => JudgementWords.Text(Limits.Quantity, value, units);
        return Limits switch
        {
            { Minimum: { } minimum, Maximum: { } maximum } => $"from {Text(minimum)} to {Text(maximum)}",
            { Minimum: { } minimum } => $"at least {Text(minimum)}",
            { Maximum: { } maximum } => $"at most {Text(maximum)}",
            _ => throw new InvalidOperationException("A rule has a limit."),
        };
    }
}

/// <summary>Whether a sample is accepted.</summary>
/// <param name="summary">Of the sample.</param>
/// <param name="values">In order; may be empty for a rule that looks at the summary alone.</param>
internal delegate bool SampleAcceptance(in SampleSummary summary, ReadOnlySpan<double> values);

/// <summary>A rule held against a lot.</summary>
/// <param name="Rule">The rule.</param>
/// <param name="Value">What it looks at: in the quantity's SI unit, or a share; null where it could not be computed.</param>
/// <param name="Limit">What the value is held against.</param>
/// <param name="Conformance">The outcome.</param>
/// <param name="Explanation">One sentence for the site.</param>
public sealed record LotJudgement(LotRule Rule, double? Value, double? Limit, Conformance Conformance, string Explanation)
{
    /// <summary>The quality indices of a percentage within limits; null elsewhere, and where s is 0.</summary>
    public (double? Lower, double? Upper)? QualityIndex { get; init; }

    /// <summary>The factor k of a characteristic value.</summary>
    public double? Factor { get; init; }

    /// <summary>Whether there are fewer tests than the rule needs.</summary>
    public bool TooFew { get; init; }

    /// <summary>Whether all values are equal, so that the rule's standard deviation is 0.</summary>
    public bool NoSpread { get; init; }

    /// <summary>Labels of the tests without a value.</summary>
    public IReadOnlyList<string> Missing { get; init; } = [];
}
