using CsCheck;
using Drypeak.Soil.Acceptance;
using Drypeak.Soil.Acceptance.ControlCharts;
using Drypeak.Soil.Tests.Published;
using Xunit;

namespace Drypeak.Soil.Tests.Acceptance;

public sealed class ControlChartTests
{
    private static readonly System.Text.Json.JsonElement File = PublishedFile.Read("control-charts.json");

    [Fact]
    public void The_constants_are_the_published_ones()
    {
        var constants = File.GetProperty("constants");
        Digits.Printed([constants.Number("d2"), constants.Number("d3"), constants.Number("D4")], [MovingRangeChart.D2, MovingRangeChart.D3, MovingRangeChart.D4], 3);
    }

    [Fact]
    public void Individuals_are_the_published_example()
    {
        var published = File.GetProperty("individuals");
        var chart = Chart(File.Numbers("values"), ControlChartKind.Individuals);
        Digits.Printed(published.Number("center"), chart.Center!.Value, 1);
        Digits.Printed(published.Number("meanMovingRange"), chart.MovingRange!.Center, 2);
        Digits.Printed([published.Number("upper"), published.Number("lower"), published.Number("upperOfMovingRange")], [chart.Upper!.Value, chart.Lower!.Value, chart.MovingRange.Upper], 1);
    }

    [Fact]
    public void Cumulative_sums_are_the_published_example()
    {
        var chart = Chart(File.Numbers("values"), ControlChartKind.Cusum, plan => plan with { Target = 99, StandardDeviation = 1, Reference = 1, Decision = 10 });
        Digits.Printed(File.Numbers("upward"), chart.Points.Select(point => point.Sums!.Value.Upward), 1);
        Digits.Printed(File.Numbers("downward"), chart.Points.Select(point => point.Sums!.Value.Downward), 1);
        Assert.All(chart.Points, point => Assert.Null(point.Signal));
        Assert.Equal((-10, 10), (chart.Lower!.Value, chart.Upper!.Value));
    }

    [Fact]
    public void Moving_averages_are_the_published_example()
    {
        var published = File.GetProperty("ewma");
        var chart = Chart(published.Numbers("values"), ControlChartKind.Ewma, plan => plan with { Target = 50, StandardDeviation = 2.0539, Weight = 0.3 });
        Digits.Printed(published.Numbers("averages"), chart.Points.Select(point => point.Plotted), 2);
        Assert.Equal(published.Number("upper"), chart.Upper!.Value, 2e-4);
        Assert.Equal(published.Number("lower"), chart.Lower!.Value, 2e-4);
        Assert.All(chart.Points, point => Assert.Null(point.Signal));
    }

    /// <summary>In standard deviations from the center; the run signals at the last result and nowhere before.</summary>
    [Theory]
    [InlineData(RunRules.WesternElectric, "rule 1", 0.1, -3.1)]
    [InlineData(RunRules.WesternElectric, "rule 2", 2.1, 0.1, 2.1)]
    [InlineData(RunRules.WesternElectric, "rule 3", -1.1, -1.2, 0.3, -1.5, -1.1)]
    [InlineData(RunRules.WesternElectric, "rule 4", .1, .2, .3, .1, .5, .4, .1, .3)]
    [InlineData(RunRules.Nelson, "test 1", 3.1)]
    [InlineData(RunRules.Nelson, "test 2", .1, .2, .3, .1, .5, .4, .1, .3, .2)]
    [InlineData(RunRules.Nelson, "test 3", -.3, -.2, -.1, .1, .2, .3)]
    [InlineData(RunRules.Nelson, "test 4", .1, .3, .1, .3, -.1, .2, .1, .3, -.1, .2, .1, .4, .2, .3)]
    [InlineData(RunRules.Nelson, "test 5", -2.2, -2.1)]
    [InlineData(RunRules.Nelson, "test 6", 1.1, 1.2, 1.1, .5, 1.3)]
    [InlineData(RunRules.Nelson, "test 7", .1, -.2, .3, -.1, -.3, .2, -.1, -.2, .3, .1, -.2, -.3, .1, .2, -.3)]
    [InlineData(RunRules.Nelson, "test 8", 1.1, -1.2, 1.1, 1.3, -1.1, -1.3, 1.2, -1.4)]
    [InlineData(RunRules.LimitsOnly, "Shewhart", 1.1, 1.2, 1.3, 1.1, 1.2, -3.5)]
    public void A_run_signals_at_its_end_by_the_rule_that_it_breaks(RunRules rules, string name, params double[] z)
    {
        // Two of three and four of five need three and five results: quiet ones stand before.
        double[] values = name is "test 5" ? [0.3, .. z] : z;
        var chart = Chart(values, ControlChartKind.Individuals, plan => plan with { Target = 0, StandardDeviation = 1, Rules = rules });
        Assert.Contains(name, chart.Points[^1].Signal, StringComparison.Ordinal);
        Assert.All(chart.Points.SkipLast(1), point => Assert.Null(point.Signal));
    }

    [Fact]
    public void On_a_limit_is_not_beyond_it() =>
        Assert.All(Chart([3, -3, 0, 2, 0, 2], ControlChartKind.Individuals, plan => plan with { Target = 0, StandardDeviation = 1 }).Points, point => Assert.Null(point.Signal));

    [Theory]
    [InlineData(ControlChartKind.Individuals)]
    [InlineData(ControlChartKind.Ewma)]
    [InlineData(ControlChartKind.Cusum)]
    public void Equal_results_and_single_ones_signal_nothing(ControlChartKind kind)
    {
        var equal = Chart([0.96, 0.96, 0.96], kind);
        Assert.All(equal.Points, point => Assert.Null(point.Signal));
        Assert.Equal(equal.Lower, equal.Upper);
        var single = Chart([0.96], kind);
        Assert.Null(single.Lower);
        Assert.Null(Assert.Single(single.Points).Signal);
        Assert.Null(Chart([], kind).Center);
    }

    /// <summary>A chart in other units is the same chart: all that is plotted moves and stretches with the results.</summary>
    [Fact]
    public void A_chart_moves_and_stretches_with_its_results() =>
        Gen.Select(Gen.Double[0.8, 1.1].Array[3, 40], Gen.Double[0.1, 50], Gen.Double[-5, 5], Gen.Enum<ControlChartKind>()).Sample((values, scale, shift, kind) =>
        {
            var (before, after) = (Chart(values, kind), Chart([.. values.Select(value => shift + (scale * value))], kind));
            var moved = kind == ControlChartKind.Cusum ? 0 : shift;
            Assert.Equal(moved + (scale * before.Upper!.Value), after.Upper!.Value, 1e-9 * (5 + (50 * scale)));
            Assert.All(before.Points.Zip(after.Points), pair => Assert.Equal(moved + (scale * pair.First.Plotted), pair.Second.Plotted, 1e-9 * (5 + (50 * scale))));
        });

    private static ControlChart Chart(IReadOnlyList<double> values, ControlChartKind kind, Func<ControlChartPlan, ControlChartPlan>? with = null)
    {
        var plan = new ControlChartPlan(AcceptedQuantity.RelativeCompaction, kind);
        return LotAnalysis.Analyze(Lots.Of(values) with { ControlChart = with?.Invoke(plan) ?? plan }).ControlChart!;
    }
}
