using System.Text.Json.Serialization;

namespace Drypeak.Service.Acceptance;

/// <summary>A rule by which a lot is accepted; each rule takes the members that belong to it and no others.</summary>
public sealed record LotRuleContract
{
    /// <summary>every-test, mean, moving-mean, percent-within-limits, characteristic-value, share-of-tests or wet-of-line-of-optimums.</summary>
    /// <example>percent-within-limits</example>
    [JsonRequired]
    public string? Rule { get; init; }

    /// <summary>What the rule looks at, as in a requirement. With "every-test" it may be left out: then every test must be accepted by the specification.</summary>
    /// <example>relativeCompaction</example>
    public string? Quantity { get; init; }

    /// <summary>Lower limit, inclusive: %, units.density or a ratio, as the quantity is.</summary>
    /// <example>95</example>
    public double? Minimum { get; init; }

    /// <summary>Upper limit, inclusive.</summary>
    /// <example>102</example>
    public double? Maximum { get; init; }

    /// <summary>With "moving-mean": consecutive tests in a mean, 2 or more.</summary>
    /// <example>5</example>
    public int? Count { get; init; }

    /// <summary>With "moving-mean": no single value may lie below it.</summary>
    /// <example>93</example>
    public double? Floor { get; init; }

    /// <summary>With "percent-within-limits", "share-of-tests" and "wet-of-line-of-optimums": the share required, %, 0 to 100.</summary>
    /// <example>90</example>
    public double? Required { get; init; }

    /// <summary>With "characteristic-value": k of mean − k·s, −100 to 100.</summary>
    /// <example>0.8</example>
    public double? Factor { get; init; }

    /// <summary>With "characteristic-value" in place of the factor: the chance of rejecting a lot of which exactly the fraction lies within the limit, 0.000001 to 0.999999.</summary>
    /// <example>0.1</example>
    public double? Risk { get; init; }

    /// <summary>With the risk: the fraction, 0.000001 to 0.999999.</summary>
    /// <example>0.9</example>
    public double? Fraction { get; init; }
}
