using Drypeak.Soil.Acceptance.ControlCharts;
using Drypeak.Soil.Acceptance.LotRules;
using Drypeak.Soil.Acceptance.Statistics;

namespace Drypeak.Soil.Acceptance;

/// <summary>What a lot comes to.</summary>
public sealed record LotResult
{
    /// <summary>The tests that count, in the order of their times, or as they were given.</summary>
    public required IReadOnlyList<LotTest> Counted { get; init; }

    /// <summary>Label of the retest by label of the test that it replaced.</summary>
    public required IReadOnlyDictionary<string, string> ReplacedBy { get; init; }

    /// <summary>Each rule, in the order of the lot.</summary>
    public required IReadOnlyList<LotJudgement> Rules { get; init; }

    /// <summary>The outcome; null where nothing was required.</summary>
    public TestOutcome? Outcome { get; init; }

    /// <summary>Each quantity of which there is a value.</summary>
    public required IReadOnlyList<QuantityEstimate> Statistics { get; init; }

    /// <summary>Trends along the work, for tests with a place.</summary>
    public required IReadOnlyList<QuantityTrend> Trends { get; init; }

    /// <summary>The control chart, or null.</summary>
    public ControlChart? ControlChart { get; init; }

    /// <summary>The window, or null.</summary>
    public WindowResult? Window { get; init; }

    /// <summary>What a careful reviewer says, worst first.</summary>
    public required IReadOnlyList<Finding> Findings { get; init; }
}

/// <summary>An estimate of one quantity of the lot.</summary>
/// <param name="Quantity">The quantity.</param>
/// <param name="Summary">Of its values, in SI.</param>
/// <param name="MeanInterval">95 % interval of the mean; null for one value.</param>
/// <param name="ToleranceInterval">Holds the stated fraction of the lot with the stated confidence; null for one value.</param>
/// <param name="ToleranceFactor">k of that interval.</param>
public sealed record QuantityEstimate(
    AcceptedQuantity Quantity, SampleSummary Summary, (double Lower, double Upper)? MeanInterval, (double Lower, double Upper)? ToleranceInterval, double? ToleranceFactor);

/// <summary>Along what a trend runs.</summary>
public enum Along
{
    /// <summary>Stations, m.</summary>
    Station,
    /// <summary>Lifts, by number.</summary>
    Lift,
}

/// <summary>A trend of one quantity.</summary>
/// <param name="Quantity">The quantity, in SI.</param>
/// <param name="Along">Along stations or lifts.</param>
/// <param name="Trend">The line.</param>
public sealed record QuantityTrend(AcceptedQuantity Quantity, Along Along, Trend Trend);

/// <summary>The tests in the plane of the window.</summary>
/// <param name="Inside">Labels of the tests inside every edge.</param>
/// <param name="Outside">An entry for each edge that a test crosses.</param>
/// <param name="Unknown">An entry for each edge that a test cannot be held against.</param>
/// <param name="WetOfOptimums">Share of the tests on the line of optimums or wet of it, of those that can be held against it; null where none can.</param>
/// <param name="Polygon">Water content and dry density, in SI; empty without room, null where it is not closed or not known.</param>
public sealed record WindowResult(
    IReadOnlyList<string> Inside,
    IReadOnlyList<(string Label, string Edge)> Outside,
    IReadOnlyList<(string Label, string Edge)> Unknown,
    double? WetOfOptimums,
    IReadOnlyList<(double WaterContent, double DryDensity)>? Polygon);
