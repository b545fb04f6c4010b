using System.Text.Json.Serialization;
using Drypeak.Service.Contracts;
using Drypeak.Service.Field;

namespace Drypeak.Service.Acceptance;

/// <summary>A lot: tests of one stretch of work that are accepted or rejected together.</summary>
public sealed record LotAcceptanceRequest : IWaterGiven
{
    /// <summary>One line that names the lot, up to 200 characters.</summary>
    /// <example>Ternmarsh, lot 12, 1+200 to 1+400</example>
    public string? Reference { get; init; }

    /// <summary>Up to 30 labels of the caller's own with texts, carried unchanged into the answer.</summary>
    public IReadOnlyDictionary<string, string>? Identification { get; init; }

    /// <summary>Units of the request and of the answer; stations and offsets are in units.length.</summary>
    public UnitsContract? Units { get; init; }

    /// <summary>What the tests are held against, where a test brings nothing of its own.</summary>
    public LaboratoryContract? Laboratory { get; init; }

    /// <summary>Specific gravity of the solids. Without it there is no saturation, no air voids, no line of optimums.</summary>
    public SpecificGravityContract? SpecificGravity { get; init; }

    /// <summary>Temperature of the water, °C, 0 to 40. Default 20.</summary>
    /// <example>20</example>
    public double? WaterTemperature { get; init; }

    /// <summary>Density of water, in units.density, in place of its temperature.</summary>
    /// <example>1.0</example>
    public double? WaterDensity { get; init; }

    /// <summary>Standard uncertainties of each test's values, where the test brings none of its own.</summary>
    public FieldUncertaintyContract? Uncertainty { get; init; }

    /// <summary>What is required of each test, and how it is decided.</summary>
    public SpecificationContract? Specification { get; init; }

    /// <summary>The rules of the lot, 1 to 20, all to be met. Without them every test must be accepted.</summary>
    public IReadOnlyList<LotRuleContract>? LotRules { get; init; }

    /// <summary>The tests, 1 to 20,000; in order, unless they have times.</summary>
    [JsonRequired]
    public IReadOnlyList<LotTestContract>? Tests { get; init; }

    /// <summary>A control chart of the results in order.</summary>
    public ControlChartContract? ControlChart { get; init; }

    /// <summary>A zone in the plane of water content and dry density; each member given is an edge.</summary>
    public WindowContract? Window { get; init; }

    /// <summary>How much of the lot the tolerance intervals hold, and how surely.</summary>
    public ToleranceIntervalContract? ToleranceInterval { get; init; }
}

/// <summary>A test of a lot: values that are known already, or a whole field test.</summary>
public sealed record LotTestContract : IWaterContentGiven
{
    /// <summary>Its label, up to 200 characters, once in a lot. Default: its position.</summary>
    /// <example>12-7</example>
    public string? Label { get; init; }

    /// <summary>%.</summary>
    /// <example>96.4</example>
    public double? RelativeCompaction { get; init; }

    /// <summary>In units.density.</summary>
    /// <example>1.861</example>
    public double? DryDensity { get; init; }

    /// <summary>In units.density.</summary>
    /// <example>2.09</example>
    public double? WetDensity { get; init; }

    /// <summary>% of dry mass.</summary>
    /// <example>12.3</example>
    public double? WaterContent { get; init; }

    /// <summary>Moisture tins, up to 20; the water content is the mean over them.</summary>
    public IReadOnlyList<TinContract>? Tins { get; init; }

    /// <summary>Water content, % of wet mass.</summary>
    /// <example>11.0</example>
    public double? WetBasis { get; init; }

    /// <summary>Water content by a calcium-carbide tester.</summary>
    public CarbideContract? Carbide { get; init; }

    /// <summary>Percentage points; negative on the dry side.</summary>
    /// <example>0.2</example>
    public double? WaterContentFromOptimum { get; init; }

    /// <summary>Degree of saturation, %.</summary>
    /// <example>81.5</example>
    public double? Saturation { get; init; }

    /// <summary>% of the total volume.</summary>
    /// <example>5.2</example>
    public double? AirVoids { get; init; }

    /// <summary>Relative density of a free-draining soil, %.</summary>
    /// <example>72</example>
    public double? RelativeDensity { get; init; }

    /// <summary>Ratio.</summary>
    /// <example>0.44</example>
    public double? VoidRatio { get; init; }

    /// <summary>A whole field-density request in place of values; its values come in the lot's units, and what it leaves out of laboratory, specific gravity and water is the lot's.</summary>
    public FieldDensityRequest? FieldDensity { get; init; }

    /// <summary>What this test is held against: several soils in a lot each have their own.</summary>
    public LaboratoryContract? Laboratory { get; init; }

    /// <summary>Specific gravity of this test's solids; default: the lot's.</summary>
    public SpecificGravityContract? SpecificGravity { get; init; }

    /// <summary>Standard uncertainties of this test's values; default: the lot's.</summary>
    public FieldUncertaintyContract? Uncertainty { get; init; }

    /// <summary>Why the test does not count; it is shown all the same.</summary>
    /// <example>gauge stood on a stone</example>
    public string? SetAside { get; init; }

    /// <summary>Label of the test that this is a retest of: both are shown, and this one counts.</summary>
    /// <example>12-3</example>
    public string? Replaces { get; init; }

    /// <summary>When it was made, as 2026-05-12 or 2026-05-12T14:30 or with seconds or an offset; on all tests or on none. Then it gives the order.</summary>
    /// <example>2026-05-12T14:30</example>
    public string? Time { get; init; }

    /// <summary>Along the work, in units.length.</summary>
    /// <example>1240</example>
    public double? Station { get; init; }

    /// <summary>Across the work, in units.length.</summary>
    /// <example>3.0</example>
    public double? Offset { get; init; }

    /// <summary>Number of the lift, −10,000 to 10,000.</summary>
    /// <example>4</example>
    public int? Lift { get; init; }
}

/// <summary>A control chart that is wanted.</summary>
public sealed record ControlChartContract
{
    /// <summary>What is charted, as in a requirement.</summary>
    /// <example>relativeCompaction</example>
    [JsonRequired]
    public string? Quantity { get; init; }

    /// <summary>"individuals" with moving range, "ewma" (exponentially weighted moving average), or "cusum" (cumulative sums).</summary>
    /// <example>individuals</example>
    [JsonRequired]
    public string? Kind { get; init; }

    /// <summary>The level that the work should keep, in the quantity's unit. Default: the mean of the results.</summary>
    /// <example>97</example>
    public double? Target { get; init; }

    /// <summary>Standard deviation of single results, in the quantity's unit, over 0. Default: mean moving range over 1.128.</summary>
    /// <example>1.4</example>
    public double? StandardDeviation { get; init; }

    /// <summary>With "ewma": weight of the newest result, over 0 and up to 1. Default 0.2.</summary>
    /// <example>0.2</example>
    public double? Weight { get; init; }

    /// <summary>With "individuals" and "ewma": half width of the control limits, in standard deviations of what is plotted, over 0 and up to 10. Default 3.</summary>
    /// <example>3</example>
    public double? Width { get; init; }

    /// <summary>With "cusum": reference value k in standard deviations, 0 to 10. Default 0.5.</summary>
    /// <example>0.5</example>
    public double? Reference { get; init; }

    /// <summary>With "cusum": decision interval h in standard deviations, over 0 and up to 100. Default 5.</summary>
    /// <example>5</example>
    public double? Decision { get; init; }

    /// <summary>With "individuals": "western-electric" (1956, four rules), "nelson" (1984, eight tests) or "limits" alone. Default: western-electric.</summary>
    /// <example>western-electric</example>
    public string? RunRules { get; init; }
}

/// <summary>A compaction window; each member given is an edge, inclusive.</summary>
public sealed record WindowContract
{
    /// <summary>%.</summary>
    /// <example>95</example>
    public double? MinimumRelativeCompaction { get; init; }

    /// <summary>%.</summary>
    /// <example>103</example>
    public double? MaximumRelativeCompaction { get; init; }

    /// <summary>In units.density.</summary>
    /// <example>1.80</example>
    public double? MinimumDryDensity { get; init; }

    /// <summary>In units.density.</summary>
    /// <example>1.98</example>
    public double? MaximumDryDensity { get; init; }

    /// <summary>%.</summary>
    /// <example>80</example>
    public double? MinimumSaturation { get; init; }

    /// <summary>%.</summary>
    /// <example>97</example>
    public double? MaximumSaturation { get; init; }

    /// <summary>% of the total volume.</summary>
    /// <example>1</example>
    public double? MinimumAirVoids { get; init; }

    /// <summary>% of the total volume.</summary>
    /// <example>10</example>
    public double? MaximumAirVoids { get; init; }

    /// <summary>Driest and wettest water content, %.</summary>
    /// <example>[11, 16]</example>
    public IReadOnlyList<double>? WaterContent { get; init; }

    /// <summary>Driest and wettest, percentage points from the optimum.</summary>
    /// <example>[0, 3]</example>
    public IReadOnlyList<double>? WaterContentFromOptimum { get; init; }

    /// <summary>Whether a test must lie on the line of optimums or wet of it: the line of the saturation at the laboratory's optimum.</summary>
    /// <example>true</example>
    public bool? WetOfLineOfOptimums { get; init; }
}

/// <summary>A tolerance interval of a normal distribution.</summary>
public sealed record ToleranceIntervalContract
{
    /// <summary>Share of the lot within it, 0.01 to 0.9999. Default 0.9.</summary>
    /// <example>0.9</example>
    public double? Fraction { get; init; }

    /// <summary>Confidence, 0.01 to 0.9999. Default 0.95.</summary>
    /// <example>0.95</example>
    public double? Confidence { get; init; }
}
