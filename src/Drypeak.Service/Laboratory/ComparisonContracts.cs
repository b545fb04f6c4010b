using System.Text.Json.Serialization;
using Drypeak.Service.Contracts;

namespace Drypeak.Service.Laboratory;

/// <summary>Two tests of one soil, by two operators or laboratories.</summary>
public sealed record ComparisonRequest
{
    /// <summary>The two tests, each a whole moisture-density request.</summary>
    [JsonRequired]
    public IReadOnlyList<MoistureDensityRequest>? Tests { get; init; }
}

/// <summary>How far the two are apart, and how far they may be.</summary>
public sealed record ComparisonAnswer
{
    /// <summary>Units: those of the first test.</summary>
    public required UnitsContract Units { get; init; }

    /// <summary>The two peaks, in the order of the request; null where a test has none.</summary>
    public required IReadOnlyList<OptimumAnswer?> Optima { get; init; }

    /// <summary>Second less first; null where a test has no peak.</summary>
    public PeakDifferenceAnswer? Difference { get; init; }

    /// <summary>The difference that the two uncertainties allow at 95 %; null where one is unknown.</summary>
    public PeakDifferenceAnswer? Allowed { get; init; }

    /// <summary>Whether the difference is within what is allowed; null where it cannot be said.</summary>
    public AgreementAnswer? Agree { get; init; }

    /// <summary>What standards allow between two tests of one soil.</summary>
    public required IReadOnlyList<PrecisionAnswer> Precision { get; init; }

    /// <summary>What a careful reviewer says of both; each pointer begins with /tests/0 or /tests/1.</summary>
    public required IReadOnlyList<FindingContract> Findings { get; init; }

    /// <summary>Version and digest.</summary>
    public required ProvenanceContract Provenance { get; init; }

    /// <summary>What to bear in mind.</summary>
    public required IReadOnlyList<string> Cautions { get; init; }
}

/// <summary>A difference of two peaks, or a limit to it.</summary>
/// <param name="WaterContent" example="0.4">Percentage points.</param>
/// <param name="MaximumDryDensity" example="0.012">In units.density.</param>
public sealed record PeakDifferenceAnswer(double WaterContent, double MaximumDryDensity);

/// <summary>Whether two peaks agree.</summary>
/// <param name="WaterContent" example="true">Optimum water content.</param>
/// <param name="MaximumDryDensity" example="true">Maximum dry density.</param>
public sealed record AgreementAnswer(bool WaterContent, bool MaximumDryDensity);

/// <summary>A standard's limit.</summary>
/// <param name="Conditions" example="two laboratories">Who made the two tests.</param>
/// <param name="Limit">How far they may differ.</param>
/// <param name="Agree">Whether they do.</param>
/// <param name="Basis" example="AASHTO T 99, precision (from memory)">The standard.</param>
public sealed record PrecisionAnswer(string Conditions, PeakDifferenceAnswer Limit, AgreementAnswer Agree, string Basis);

/// <summary>A kind of finding.</summary>
/// <param name="Code" example="optimum-at-edge">Stable code.</param>
/// <param name="Severity" example="warning">Its usual severity; a finding says its own.</param>
/// <param name="Meaning" example="The peak may well lie outside the tested water contents.">What it means.</param>
/// <param name="Why" example="Close to the last specimen the peak is not bracketed.">Why it matters.</param>
/// <param name="Remedy" example="Make another specimen beyond that end.">What to do.</param>
/// <param name="Basis" example="Chance of a peak outside the tested range over 0.15">The rule and its source.</param>
public sealed record FindingKindAnswer(string Code, string Severity, string Meaning, string Why, string Remedy, string Basis);
