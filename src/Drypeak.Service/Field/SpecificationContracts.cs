using System.Text.Json.Serialization;

namespace Drypeak.Service.Field;

/// <summary>What is required, and how it is decided.</summary>
public sealed record SpecificationContract
{
    /// <summary>The requirements, 1 to 20.</summary>
    [JsonRequired]
    public IReadOnlyList<RequirementContract>? Requirements { get; init; }

    /// <summary>The decision rule. Default: simple.</summary>
    public DecisionContract? Decision { get; init; }
}

/// <summary>One requirement; both limits are inclusive, and one of them is given.</summary>
public sealed record RequirementContract
{
    /// <summary>relativeCompaction, dryDensity, wetDensity, waterContent, waterContentFromOptimum, saturation, airVoids, relativeDensity or voidRatio.</summary>
    /// <example>relativeCompaction</example>
    [JsonRequired]
    public string? Quantity { get; init; }

    /// <summary>Lower limit: %, units.density or a ratio, as the quantity is.</summary>
    /// <example>95</example>
    public double? Minimum { get; init; }

    /// <summary>Upper limit.</summary>
    /// <example>105</example>
    public double? Maximum { get; init; }
}

/// <summary>The decision rule (ISO/IEC 17025; JCGM 106).</summary>
public sealed record DecisionContract
{
    /// <summary>"simple": the value decides. "guarded": a guard band of z(1 − risk)·u lies on both sides of each limit.</summary>
    /// <example>guarded</example>
    [JsonRequired]
    public string? Rule { get; init; }

    /// <summary>With "guarded": the risk of a wrong decision at the edge of the band, over 0 and up to 0.5.</summary>
    /// <example>0.05</example>
    public double? Risk { get; init; }
}

/// <summary>A requirement held against the test.</summary>
/// <param name="Quantity" example="relativeCompaction">As in the request.</param>
/// <param name="Minimum" example="95">As in the request.</param>
/// <param name="Maximum" example="105">As in the request.</param>
/// <param name="Value" example="95.8">%, units.density or a ratio; null where it could not be computed.</param>
/// <param name="Margin" example="0.8">How far inside the nearer limit; negative outside.</param>
/// <param name="StandardUncertainty" example="0.92">Of the value, field and laboratory to first order; null where none is known.</param>
/// <param name="ProbabilityOfConformance" example="0.81">0 to 1, by the normal model; null without an uncertainty.</param>
/// <param name="Outcome" example="met">met, not-met or undecided.</param>
/// <param name="Explanation" example="The relative compaction is 95.8 %, 0.78 above the minimum of 95.0 %.">By how much and why, and the next step where it is undecided.</param>
public sealed record RequirementAnswer(
    string Quantity, double? Minimum, double? Maximum, double? Value, double? Margin, double? StandardUncertainty, double? ProbabilityOfConformance, string Outcome, string Explanation);
