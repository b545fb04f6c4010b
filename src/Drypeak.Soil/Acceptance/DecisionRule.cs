namespace Drypeak.Soil.Acceptance;

/// <summary>Whether a requirement is met.</summary>
public enum Conformance
{
    /// <summary>It is.</summary>
    Met,
    /// <summary>It is not.</summary>
    NotMet,
    /// <summary>It cannot be said: the value is inside a guard band, or unknown, or as uncertain as nobody knows.</summary>
    Undecided,
}

/// <summary>How a test as a whole came out.</summary>
public enum TestOutcome
{
    /// <summary>Every requirement is met.</summary>
    Accepted,
    /// <summary>One or more is not met.</summary>
    Rejected,
    /// <summary>None is missed, but one or more is undecided.</summary>
    Undecided,
}

/// <summary>Why a requirement is undecided.</summary>
public enum Doubt
{
    /// <summary>It is decided.</summary>
    None,
    /// <summary>The value could not be computed.</summary>
    ValueUnknown,
    /// <summary>A guarded rule was asked for, and no uncertainty is known.</summary>
    UncertaintyUnknown,
    /// <summary>The value lies within the guard band of a limit.</summary>
    WithinGuardBand,
}

/// <summary>A requirement held against a value.</summary>
/// <param name="Requirement">The requirement.</param>
/// <param name="Value">The value, or null where it could not be computed.</param>
/// <param name="StandardUncertainty">Of the value, or null.</param>
/// <param name="Conformance">The outcome.</param>
/// <param name="Doubt">Why it is undecided.</param>
/// <param name="GuardBand">Width of the guard band; 0 under simple acceptance, null where it is unknown.</param>
public sealed record Judgement(Requirement Requirement, double? Value, double? StandardUncertainty, Conformance Conformance, Doubt Doubt, double? GuardBand)
{
    /// <summary>How far inside the nearer limit; negative outside; null without a value.</summary>
    public double? Margin => Value is { } value ? Requirement.MarginOf(value) : null;

    /// <summary>Null without a value or an uncertainty.</summary>
    public double? ProbabilityOfConformance =>
        Value is { } value && StandardUncertainty is { } u ? Requirement.ProbabilityOfConformance(value, u) : null;
}

/// <summary>
/// The decision rule of a specification (ISO/IEC 17025:2017, 3.7 and 7.8.6; JCGM 106:2012, clause 8): simple acceptance, or guarded with a
/// stated risk, where a guard band of z(1 − risk)·u lies on both sides of each limit.
/// </summary>
/// <param name="Risk">Of a wrong decision at the edge of the guard band, over 0 and up to 0.5; null is simple acceptance.</param>
public sealed record DecisionRule(double? Risk)
{
    /// <summary>Simple acceptance: the measured value decides.</summary>
    public static DecisionRule Simple { get; } = new((double?)null);

    /// <summary>Holds a value against a requirement.</summary>
    /// <param name="requirement">The requirement.</param>
    /// <param name="value">The value, or null where it could not be computed.</param>
    /// <param name="standardUncertainty">Of the value, 0 or more, or null where unknown.</param>
    public Judgement Judge(Requirement requirement, double? value, double? standardUncertainty)
    {
        Judgement Undecided(Doubt doubt, double? band) => new(requirement, value, standardUncertainty, Conformance.Undecided, doubt, band);
        if (value is not { } known)
        {
            return Undecided(Doubt.ValueUnknown, null);
        }

        if (Risk is { } && standardUncertainty is null)
        {
            return Undecided(Doubt.UncertaintyUnknown, null);
        }

        var band = Risk is { } risk ? NormalDistribution.Quantile(1 - risk) * standardUncertainty!.Value : 0;
        var margin = requirement.MarginOf(known);
        return margin >= band - requirement.Tolerance ? new(requirement, value, standardUncertainty, Conformance.Met, Doubt.None, band)
            : margin <= -band + (band > 0 ? requirement.Tolerance : 0) ? new(requirement, value, standardUncertainty, Conformance.NotMet, Doubt.None, band)
            : Undecided(Doubt.WithinGuardBand, band);
    }

    /// <summary>The outcome of a whole test; null where nothing was required.</summary>
    public static TestOutcome? OutcomeOf(IReadOnlyCollection<Judgement> judgements) =>
        judgements.Count == 0 ? null
            : judgements.Any(judged => judged.Conformance == Conformance.NotMet) ? TestOutcome.Rejected
            : judgements.Any(judged => judged.Conformance == Conformance.Undecided) ? TestOutcome.Undecided
            : TestOutcome.Accepted;
}
