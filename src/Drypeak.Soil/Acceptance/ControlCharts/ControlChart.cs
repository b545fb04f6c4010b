using Drypeak.Soil.Acceptance.LotRules;

namespace Drypeak.Soil.Acceptance.ControlCharts;

/// <summary>Kinds of control charts for single results in order.</summary>
public enum ControlChartKind
{
    /// <summary>Individuals with moving range.</summary>
    Individuals,
    /// <summary>Exponentially weighted moving average.</summary>
    Ewma,
    /// <summary>Cumulative sums, upward and downward.</summary>
    Cusum,
}

/// <summary>A control chart that is wanted. Immutable, safe on any thread.</summary>
/// <param name="Quantity">What is charted.</param>
/// <param name="Kind">How.</param>
public sealed record ControlChartPlan(AcceptedQuantity Quantity, ControlChartKind Kind)
{
    /// <summary>The center that the work should keep, in SI; null: the mean of the results.</summary>
    public double? Target { get; init; }

    /// <summary>The standard deviation of single results, in SI, over 0; null: from the mean moving range.</summary>
    public double? StandardDeviation { get; init; }

    /// <summary>λ of the exponentially weighted moving average, over 0 and up to 1.</summary>
    public double Weight { get; init; } = 0.2;

    /// <summary>Half width of the control limits in standard deviations of what is plotted (individuals and EWMA).</summary>
    public double Width { get; init; } = 3;

    /// <summary>k of the cumulative sums, in standard deviations: half the shift that is to be found soon.</summary>
    public double Reference { get; init; } = 0.5;

    /// <summary>h of the cumulative sums, in standard deviations: where they signal.</summary>
    public double Decision { get; init; } = 5;

    /// <summary>The run rules of an individuals chart.</summary>
    public RunRules Rules { get; init; } = RunRules.WesternElectric;
}

/// <summary>A point of a control chart.</summary>
/// <param name="Test">The test.</param>
/// <param name="Observed">Its result.</param>
/// <param name="Plotted">What the chart shows: the result, the moving average, or the greater of the two sums, downward negative.</param>
/// <param name="Signal">By which rule it signals, or null.</param>
public sealed record ControlPoint(LotTest Test, double Observed, double Plotted, string? Signal)
{
    /// <summary>The upward and the downward sum, both 0 or more; null on other charts.</summary>
    public (double Upward, double Downward)? Sums { get; init; }
}

/// <summary>A control chart.</summary>
/// <param name="Plan">What was wanted.</param>
/// <param name="Center">Center line of what is plotted; null without results.</param>
/// <param name="Lower">Lower control limit; null where no standard deviation is known.</param>
/// <param name="Upper">Upper control limit.</param>
/// <param name="StandardDeviation">Of single results: given, or mean moving range over d₂.</param>
/// <param name="Points">In order.</param>
/// <param name="MovingRange">With individuals of two and more.</param>
public sealed record ControlChart(
    ControlChartPlan Plan, double? Center, double? Lower, double? Upper, double? StandardDeviation, IReadOnlyList<ControlPoint> Points, MovingRangeChart? MovingRange)
{
    /// <summary>On what it stands.</summary>
    public string Basis => Plan.Kind switch
    {
        ControlChartKind.Individuals => "W. A. Shewhart, Economic Control of Quality of Manufactured Product, 1931: mean ± 3·(mean moving range)/d₂, d₂ = 1.128; run rules: " + Plan.Rules.Source(),
        ControlChartKind.Ewma => "S. W. Roberts, Control chart tests based on geometric moving averages, Technometrics 1 (1959): z = λx + (1 − λ)z, center ± L·σ·√(λ/(2 − λ))",
        _ => "E. S. Page, Continuous inspection schemes, Biometrika 41 (1954): C⁺ = max(0, x − (center + kσ) + C⁺), C⁻ likewise downward, a signal over hσ",
    };

    /// <summary>The chart of the results that are known.</summary>
    internal static ControlChart Of(ControlChartPlan plan, KnownValues known)
    {
        if (known.Summary is not { } summary)
        {
            return new ControlChart(plan, null, null, null, null, [], null);
        }

        var ranges = MovingRangeChart.Of(known);
        var center = plan.Target ?? summary.Mean;
        var sigma = plan.StandardDeviation ?? (summary.StandardDeviation == 0 ? 0 : ranges?.Center / MovingRangeChart.D2);
        return plan.Kind switch
        {
            ControlChartKind.Individuals => Individuals(plan, known, center, sigma, ranges),
            ControlChartKind.Ewma => Averages(plan, known, center, sigma),
            _ => Sums(plan, known, center, sigma),
        };
    }

    private static ControlChart Individuals(ControlChartPlan plan, KnownValues known, double center, double? sigma, MovingRangeChart? ranges)
    {
        var signals = sigma is > 0 and var s ? RunRuleSignals.Of([.. known.Values.Select(value => (value - center) / s)], plan.Rules, plan.Width) : new string?[known.Count];
        return new ControlChart(plan, center, center - (plan.Width * sigma), center + (plan.Width * sigma), sigma,
            [.. known.Tests.Select((test, i) => new ControlPoint(test, known.Values[i], known.Values[i], signals[i]))], ranges);
    }

    private static ControlChart Averages(ControlChartPlan plan, KnownValues known, double center, double? sigma)
    {
        var half = plan.Width * sigma * Math.Sqrt(plan.Weight / (2 - plan.Weight));
        var average = center;
        var points = new List<ControlPoint>(known.Count);
        foreach (var (test, value) in known.Tests.Zip(known.Values))
        {
            average = (plan.Weight * value) + ((1 - plan.Weight) * average);
            points.Add(new ControlPoint(test, value, average, Beyond(average - center, half)));
        }

        return new ControlChart(plan, center, center - half, center + half, sigma, points, null);
    }

    private static string? Beyond(double away, double? half) =>
        half is not > 0 || Math.Abs(away) <= half * RunRuleSignals.JustBeyond ? null : away > 0 ? "The moving average is above the upper control limit (Roberts 1959)." : "The moving average is below the lower control limit (Roberts 1959).";

    private static ControlChart Sums(ControlChartPlan plan, KnownValues known, double center, double? sigma)
    {
        var limit = plan.Decision * sigma;
        var (upward, downward) = (0.0, 0.0);
        var points = new List<ControlPoint>(known.Count);
        foreach (var (test, value) in known.Tests.Zip(known.Values))
        {
            var allowance = plan.Reference * (sigma ?? 0);
            (upward, downward) = (Math.Max(0, value - center - allowance + upward), Math.Max(0, center - value - allowance + downward));
            var signal = limit is not > 0 ? null
                : upward > limit * RunRuleSignals.JustBeyond ? "The upward sum is over the decision interval: the level has risen (Page 1954)."
                : downward > limit * RunRuleSignals.JustBeyond ? "The downward sum is over the decision interval: the level has fallen (Page 1954)."
                : null;
            points.Add(new ControlPoint(test, value, upward >= downward ? upward : -downward, signal) { Sums = (upward, downward) });
        }

        return new ControlChart(plan, 0, -limit, limit, sigma, points, null);
    }
}
