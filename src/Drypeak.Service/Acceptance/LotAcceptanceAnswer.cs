using System.Text.Json.Serialization;
using Drypeak.Service.Contracts;
using Drypeak.Service.Field;

namespace Drypeak.Service.Acceptance;

/// <summary>What a lot comes to. Numbers are unrounded, in the units that the request asked for; percentages in %.</summary>
public sealed record LotAcceptanceAnswer
{
    /// <summary>As in the request.</summary>
    /// <example>Ternmarsh, lot 12, 1+200 to 1+400</example>
    public string? Reference { get; init; }

    /// <summary>As in the request; absent where it had none.</summary>
    [JsonIgnore(Condition = JsonIgnoreCondition.WhenWritingNull)]
    public IReadOnlyDictionary<string, string>? Identification { get; init; }

    /// <summary>All units that were used.</summary>
    public required UnitsContract Units { get; init; }

    /// <summary>Every test, in the order of the request; those set aside and replaced too.</summary>
    public required IReadOnlyList<LotTestAnswer> Tests { get; init; }

    /// <summary>The lot as a whole.</summary>
    public required LotAnswer Lot { get; init; }

    /// <summary>The control chart; null where none was asked for.</summary>
    public ControlChartAnswer? ControlChart { get; init; }

    /// <summary>The tests in the window; null where none was asked for.</summary>
    public WindowAnswer? Window { get; init; }

    /// <summary>What a careful reviewer says, worst first.</summary>
    public required IReadOnlyList<FindingContract> Findings { get; init; }

    /// <summary>What to bear in mind.</summary>
    public required IReadOnlyList<string> Cautions { get; init; }

    /// <summary>Addresses of the pictures.</summary>
    public required LotLinksContract Links { get; init; }

    /// <summary>Version and digest.</summary>
    public required ProvenanceContract Provenance { get; init; }
}

/// <summary>A test of the lot.</summary>
public sealed record LotTestAnswer
{
    /// <summary>As in the request; its position where it had none.</summary>
    /// <example>12-7</example>
    public required string Label { get; init; }

    /// <summary>%; null where unknown.</summary>
    /// <example>96.4</example>
    public double? RelativeCompaction { get; init; }

    /// <summary>In units.density; null where unknown.</summary>
    /// <example>1.861</example>
    public double? DryDensity { get; init; }

    /// <summary>% of dry mass; null where unknown.</summary>
    /// <example>12.3</example>
    public double? WaterContent { get; init; }

    /// <summary>Percentage points; null where unknown.</summary>
    /// <example>0.2</example>
    public double? WaterContentFromOptimum { get; init; }

    /// <summary>%; null where unknown.</summary>
    /// <example>81.5</example>
    public double? Saturation { get; init; }

    /// <summary>% of the total volume; null where unknown.</summary>
    /// <example>5.2</example>
    public double? AirVoids { get; init; }

    /// <summary>Each requirement of the specification, in its order.</summary>
    public required IReadOnlyList<RequirementAnswer> Requirements { get; init; }

    /// <summary>accepted, rejected or undecided; null where nothing was required.</summary>
    /// <example>accepted</example>
    public string? Outcome { get; init; }

    /// <summary>Whether the test takes part in the rules, the statistics and the charts.</summary>
    /// <example>true</example>
    public required bool Counts { get; init; }

    /// <summary>Why it was set aside, or null.</summary>
    /// <example>gauge stood on a stone</example>
    public string? SetAside { get; init; }

    /// <summary>Label of the test that it replaces, or null.</summary>
    /// <example>12-3</example>
    public string? Replaces { get; init; }

    /// <summary>Label of the retest that replaces it, or null.</summary>
    /// <example>12-9</example>
    public string? ReplacedBy { get; init; }

    /// <summary>Findings on a whole field test; absent where there are none.</summary>
    [JsonIgnore(Condition = JsonIgnoreCondition.WhenWritingNull)]
    public IReadOnlyList<FindingContract>? Findings { get; init; }
}

/// <summary>The lot as a whole.</summary>
/// <param name="Outcome" example="accepted">accepted, rejected or undecided; null where nothing was required.</param>
/// <param name="Explanation" example="All 3 rules are met.">In one sentence why.</param>
/// <param name="Count" example="9">Tests that count.</param>
/// <param name="Rules">Each rule, in the order of the request.</param>
/// <param name="Statistics">Each quantity of which a value is known, over the tests that count.</param>
/// <param name="Trends">Along the work, for tests with a station or a lift.</param>
public sealed record LotAnswer(
    string? Outcome, string Explanation, int Count, IReadOnlyList<LotRuleAnswer> Rules, IReadOnlyList<StatisticsAnswer> Statistics, IReadOnlyList<TrendAnswer> Trends);

/// <summary>A rule held against the lot.</summary>
public sealed record LotRuleAnswer
{
    /// <summary>As in the request.</summary>
    /// <example>mean</example>
    public required string Rule { get; init; }

    /// <summary>As in the request; null where the rule looks at outcomes.</summary>
    /// <example>relativeCompaction</example>
    public string? Quantity { get; init; }

    /// <summary>What the rule looks at: in the quantity's unit; % for a share; tests accepted for "every-test" without a quantity; null where it could not be computed.</summary>
    /// <example>96.8</example>
    public double? Value { get; init; }

    /// <summary>What the value is held against; of two limits the one that decides.</summary>
    /// <example>96</example>
    public double? Limit { get; init; }

    /// <summary>met, not-met or undecided.</summary>
    /// <example>met</example>
    public required string Outcome { get; init; }

    /// <summary>One sentence for the site.</summary>
    /// <example>The mean of 9 tests is 96.8 %, 0.80 above the minimum of 96.0 %.</example>
    public required string Explanation { get; init; }

    /// <summary>The source of the rule.</summary>
    /// <example>FHWA Technical Advisory T 5080.12</example>
    public required string Basis { get; init; }

    /// <summary>With "percent-within-limits": Q of each limit; null where the standard deviation is 0 or there are too few tests.</summary>
    public QualityIndexAnswer? QualityIndex { get; init; }

    /// <summary>With "characteristic-value": k as given or derived.</summary>
    /// <example>0.8</example>
    public double? Factor { get; init; }
}

/// <summary>Quality indices, (mean − limit)/s and (limit − mean)/s.</summary>
/// <param name="Lower" example="1.31">Of the lower limit; null without one.</param>
/// <param name="Upper" example="2.05">Of the upper limit; null without one.</param>
public sealed record QualityIndexAnswer(double? Lower, double? Upper);

/// <summary>A quantity over the tests that count.</summary>
/// <param name="Quantity" example="relativeCompaction">The quantity; its numbers are in %, units.density or a ratio.</param>
/// <param name="Count" example="9">Values.</param>
/// <param name="Mean" example="96.8">Arithmetic mean.</param>
/// <param name="StandardDeviation" example="1.4">About the mean, by n − 1; null for one value.</param>
/// <param name="Minimum" example="94.1">The least.</param>
/// <param name="Maximum" example="98.9">The greatest.</param>
/// <param name="MeanInterval" example="[95.7, 97.9]">95 % interval of the mean; null for one value.</param>
/// <param name="ToleranceInterval">Holds the stated fraction of the lot with the stated confidence; null for one value.</param>
public sealed record StatisticsAnswer(
    string Quantity, int Count, double Mean, double? StandardDeviation, double Minimum, double Maximum, IReadOnlyList<double>? MeanInterval, ToleranceIntervalAnswer? ToleranceInterval);

/// <summary>A tolerance interval: mean ± factor·s, for a normal distribution.</summary>
/// <param name="Fraction" example="0.9">Share of the lot within it.</param>
/// <param name="Confidence" example="0.95">How surely.</param>
/// <param name="Factor" example="2.967">k.</param>
/// <param name="Interval" example="[92.6, 101.0]">Its ends.</param>
public sealed record ToleranceIntervalAnswer(double Fraction, double Confidence, double Factor, IReadOnlyList<double> Interval);

/// <summary>A straight line through the results along the work, by least squares.</summary>
/// <param name="Quantity" example="relativeCompaction">The quantity.</param>
/// <param name="Along" example="station">"station" in units.length, or "lift".</param>
/// <param name="Count" example="9">Tests with a place and a value.</param>
/// <param name="Slope" example="-0.004">Change of the quantity for one unit of length, or one lift.</param>
/// <param name="Interval" example="[-0.011, 0.003]">95 % interval of the slope.</param>
/// <param name="StandardError" example="0.003">Of the slope.</param>
/// <param name="Intercept" example="101.7">The line at station 0 or lift 0.</param>
public sealed record TrendAnswer(string Quantity, string Along, int Count, double Slope, IReadOnlyList<double> Interval, double StandardError, double Intercept);

/// <summary>A control chart. Its numbers are in the quantity's unit.</summary>
public sealed record ControlChartAnswer
{
    /// <summary>As in the request.</summary>
    /// <example>relativeCompaction</example>
    public required string Quantity { get; init; }

    /// <summary>As in the request.</summary>
    /// <example>individuals</example>
    public required string Kind { get; init; }

    /// <summary>Center line of what is plotted: the mean or the target; 0 for "cusum"; null without results.</summary>
    /// <example>96.8</example>
    public double? Center { get; init; }

    /// <summary>Lower control limit; null where no standard deviation is known.</summary>
    /// <example>92.9</example>
    public double? Lower { get; init; }

    /// <summary>Upper control limit.</summary>
    /// <example>100.7</example>
    public double? Upper { get; init; }

    /// <summary>Standard deviation of single results: as given, or mean moving range over 1.128.</summary>
    /// <example>1.3</example>
    public double? StandardDeviation { get; init; }

    /// <summary>The results, in order.</summary>
    public required IReadOnlyList<ControlPointAnswer> Points { get; init; }

    /// <summary>With "individuals": the chart of the moving ranges; null with fewer than two results.</summary>
    public MovingRangeAnswer? MovingRange { get; init; }

    /// <summary>The source of limits and rules.</summary>
    /// <example>W. A. Shewhart, 1931</example>
    public required string Basis { get; init; }
}

/// <summary>A point of a control chart.</summary>
/// <param name="Label" example="12-7">The test.</param>
/// <param name="Value" example="96.4">What is plotted: the result, the moving average, or the greater of the two sums, downward negative.</param>
/// <param name="Observed" example="96.4">The result.</param>
/// <param name="Signal" example="Above the upper control limit (Western Electric rule 1).">By which rule it signals, or null.</param>
/// <param name="Upward" example="1.2">With "cusum": the upward sum.</param>
/// <param name="Downward" example="0">With "cusum": the downward sum, 0 or more.</param>
public sealed record ControlPointAnswer(string Label, double Value, double Observed, string? Signal, double? Upward, double? Downward);

/// <summary>The chart of the differences between neighbors.</summary>
/// <param name="Center" example="1.47">Mean moving range.</param>
/// <param name="Upper" example="4.8">Its control limit, 3.267 times the mean; the lower one is 0.</param>
/// <param name="Ranges" example="[1.2, 0.8]">From each result to the one before, beginning with the second.</param>
public sealed record MovingRangeAnswer(double Center, double Upper, IReadOnlyList<double> Ranges);

/// <summary>The tests in the window.</summary>
/// <param name="Inside" example="[&quot;12-1&quot;, &quot;12-2&quot;]">Labels of the tests inside every edge.</param>
/// <param name="Outside">An entry for each edge that a test crosses.</param>
/// <param name="Undecided">An entry for each edge that a test cannot be held against, for want of a value.</param>
/// <param name="WetOfLineOfOptimums" example="77.8">Share of the tests on the line of optimums or wet of it, %, of those that can be held against it; null where none can.</param>
/// <param name="Polygon" example="[[12.1, 1.84], [15.1, 1.84], [14.2, 1.93]]">Corners as [water content %, dry density], curved edges in steps; empty where the edges leave no room, null where they do not close or need what is unknown.</param>
public sealed record WindowAnswer(
    IReadOnlyList<string> Inside, IReadOnlyList<WindowEdgeAnswer> Outside, IReadOnlyList<WindowEdgeAnswer> Undecided, double? WetOfLineOfOptimums, IReadOnlyList<IReadOnlyList<double>>? Polygon);

/// <summary>A test and an edge of the window.</summary>
/// <param name="Label" example="12-4">The test.</param>
/// <param name="Edge" example="minimumSaturation">The window's member.</param>
public sealed record WindowEdgeAnswer(string Label, string Edge);

/// <summary>Addresses of the pictures of a lot. svg, png and pdf are the results in order with their limits and signals; further pictures have members of their own.</summary>
public sealed record LotLinksContract
{
    /// <summary>The results in order as SVG.</summary>
    /// <example>/v1/charts/lot-acceptance.svg?d=…</example>
    public string? Svg { get; init; }

    /// <summary>The results in order as PNG.</summary>
    /// <example>/v1/charts/lot-acceptance.png?d=…</example>
    public string? Png { get; init; }

    /// <summary>The results in order as PDF.</summary>
    /// <example>/v1/charts/lot-acceptance.pdf?d=…</example>
    public string? Pdf { get; init; }

    /// <summary>The histogram of the results with the limits; null where there is none.</summary>
    public LinksContract? Histogram { get; init; }

    /// <summary>The window with the tests in the plane of water content and dry density; null where there is none.</summary>
    public LinksContract? Window { get; init; }

    /// <summary>The map by station and offset; null where the tests have no places.</summary>
    public LinksContract? Map { get; init; }
}
