using CsCheck;
using Drypeak.Soil.Acceptance;
using Drypeak.Soil.Acceptance.Statistics;
using Drypeak.Soil.Phases;
using Drypeak.Soil.Quantities;
using Xunit;

namespace Drypeak.Soil.Tests.Acceptance;

public sealed class WindowAndTrendTests
{
    private static readonly CompactionWindow Usual = new(
        [
            new("minimumRelativeCompaction", Lots.Compaction(0.95)),
            new("minimumSaturation", new Requirement(AcceptedQuantity.Saturation, 0.8, null)),
            new("maximumAirVoids", new Requirement(AcceptedQuantity.AirVoids, null, 0.1)),
            new("waterContentFromOptimum", new Requirement(AcceptedQuantity.WaterContentFromOptimum, 0, 0.03)),
        ], false);

    [Fact]
    public void Each_test_is_inside_or_outside_by_the_edges_that_it_crosses()
    {
        var lot = Lots.Of([]) with
        {
            Tests =
            [
                Lots.Test("in", (AcceptedQuantity.DryDensity, 1850), (AcceptedQuantity.WaterContent, 0.14)),
                Lots.Test("loose", (AcceptedQuantity.DryDensity, 1780), (AcceptedQuantity.WaterContent, 0.145)),
                Lots.Test("dry", (AcceptedQuantity.DryDensity, 1850), (AcceptedQuantity.WaterContent, 0.11)),
                Lots.Test("unknown", (AcceptedQuantity.RelativeCompaction, 0.97)),
            ],
            Window = Usual,
        };
        var window = LotAnalysis.Analyze(lot).Window!;
        Assert.Equal(["in"], window.Inside);
        Assert.Equal([("loose", "minimumRelativeCompaction"), ("loose", "minimumSaturation"), ("dry", "minimumSaturation"), ("dry", "maximumAirVoids"), ("dry", "waterContentFromOptimum")], window.Outside);
        Assert.Equal([("unknown", "minimumSaturation"), ("unknown", "maximumAirVoids"), ("unknown", "waterContentFromOptimum")], window.Unknown);
    }

    /// <summary>Every corner lies on two edges or more, and no edge cuts a corner off: the polygon is what the edges say of single tests.</summary>
    [Fact]
    public void A_point_lies_in_the_polygon_where_a_test_of_it_is_inside() =>
        Gen.Select(Gen.Double[0.05, 0.25], Gen.Double[1600, 2200], Gen.Double[0.9, 0.99], Gen.Double[0.7, 0.95], Gen.Double[0.02, 0.15], Gen.Double[0.01, 0.05]).Sample((w, dry, compaction, saturation, airVoids, wet) =>
        {
            var window = new CompactionWindow(
                [
                    new("a", Lots.Compaction(compaction)), new("b", new Requirement(AcceptedQuantity.Saturation, saturation, null)),
                    new("c", new Requirement(AcceptedQuantity.AirVoids, null, airVoids)), new("d", new Requirement(AcceptedQuantity.WaterContentFromOptimum, -0.01, wet)),
                ], false);
            var lot = Lots.Of([]) with { Tests = [Lots.Test("t", (AcceptedQuantity.DryDensity, dry), (AcceptedQuantity.WaterContent, w))], Window = window };
            var result = LotAnalysis.Analyze(lot).Window!;
            var possible = dry < PhaseRelations.OnZeroAirVoidsLine(new WaterContent(w), 2.7, new Density(1000)).KilogramsPerCubicMeter;
            Assert.NotNull(result.Polygon);
            var inside = result.Inside.Count == 1 && possible;
            if (Contains(result.Polygon, w, dry) != inside)
            {
                // Between the drawn points of a curved edge a point may lie on the other side by a hair.
                Assert.Contains(window.Edges, edge => lot.Tests[0].Values[edge.Limits.Quantity] is { } value && Math.Abs(edge.Limits.MarginOf(value)) < 2e-3);
            }
        });

    [Fact]
    public void Edges_without_room_give_an_empty_polygon_and_an_open_side_none()
    {
        CompactionWindow Of(double minimum, double? maximum, AcceptedQuantity quantity = AcceptedQuantity.DryDensity) => new([new("edge", new Requirement(quantity, minimum, maximum))], false);
        LotResult Analyze(CompactionWindow window, double? gravity) =>
            LotAnalysis.Analyze(Lots.Of([0.97]) with { Window = window, Reference = Lots.Reference with { SpecificGravity = gravity } });
        Assert.Empty(Analyze(new([new("a", new Requirement(AcceptedQuantity.DryDensity, 1900, null)), new("b", new Requirement(AcceptedQuantity.WaterContent, 0.2, null))], false), 2.7).Window!.Polygon!);
        Assert.Null(Analyze(Of(1800, null), null).Window!.Polygon);
        Assert.NotEmpty(Analyze(Of(1800, null), 2.7).Window!.Polygon!);
        Assert.Null(Analyze(Of(0.8, null, AcceptedQuantity.Saturation), null).Window!.Polygon);
    }

    /// <summary>S = w·Gs/e at the optimum: 0.12·2.7/(2.7/1.9 − 1) = 76.95 %.</summary>
    [Theory]
    [InlineData(0.1200, true)]
    [InlineData(0.1201, true)]
    [InlineData(0.1199, false)]
    public void The_line_of_optimums_is_the_saturation_at_the_optimum(double w, bool wet)
    {
        var test = Lots.Test("t", (AcceptedQuantity.DryDensity, 1900), (AcceptedQuantity.WaterContent, w));
        Assert.Equal(0.12 * 2.7 / ((2.7 / 1.9) - 1), test.Values.SaturationAtOptimum!.Value, 1e-12);
        Assert.Equal(wet, test.IsWetOfOptimums);
    }

    [Fact]
    public void Values_give_what_follows_from_them()
    {
        var test = Lots.Test("t", (AcceptedQuantity.RelativeCompaction, 0.95), (AcceptedQuantity.WaterContentFromOptimum, 0.01));
        Assert.Equal(1805, test.Values[AcceptedQuantity.DryDensity]!.Value, 1e-9);
        Assert.Equal(0.13, test.Values[AcceptedQuantity.WaterContent]!.Value, 1e-12);
        Assert.Equal(1805 * 1.13, test.Values[AcceptedQuantity.WetDensity]!.Value, 1e-9);
        Assert.Equal((2.7 / 1.805) - 1, test.Values[AcceptedQuantity.VoidRatio]!.Value, 1e-12);
    }

    /// <summary>By hand: x 0, 1, 2, 3 and y 1, 3, 2, 4: slope 0.8, residuals of 1.8, s² 0.9, error √(0.9/5) = 0.424264, t(2) = 4.302653.</summary>
    [Fact]
    public void A_trend_is_the_line_of_least_squares_with_its_interval()
    {
        var trend = Trend.Of([(0, 1), (1, 3), (2, 2), (3, 4)])!;
        Assert.Equal(0.8, trend.Slope, 1e-12);
        Assert.Equal(1.3, trend.Intercept, 1e-12);
        Assert.Equal(Math.Sqrt(0.18), trend.StandardError, 1e-12);
        Assert.Equal(0.8 - (4.302653 * Math.Sqrt(0.18)), trend.Lower, 1e-5);
        Assert.False(trend.IsPlain);
    }

    [Fact]
    public void There_is_no_trend_of_two_tests_or_of_one_place_and_none_to_see_in_equal_results()
    {
        Assert.Null(Trend.Of([(0, 1), (1, 2)]));
        Assert.Null(Trend.Of([(1240, 1), (1240, 2), (1240, 3)]));
        Assert.False(Trend.Of([(0, 0.96), (1, 0.96), (2, 0.96)])!.IsPlain);
    }

    [Fact]
    public void A_trend_moves_and_stretches_with_places_and_results() =>
        Gen.Select(Gen.Select(Gen.Double[0, 100], Gen.Double[0.9, 1.0]).Array[4, 30], Gen.Double[0.1, 1000], Gen.Double[0.1, 100], Gen.Double[-50, 50]).Sample((points, along, scale, shift) =>
        {
            var (before, after) = (Trend.Of(points), Trend.Of([.. points.Select(point => ((point.Item1 * along) + shift, point.Item2 * scale))]));
            if (before is { } first)
            {
                Assert.Equal(first.Slope * scale / along, after!.Slope, Math.Abs(1e-9 * scale / along));
                Assert.Equal(first.Upper * scale / along, after.Upper, Math.Abs(1e-8 * scale / along));
            }
        });

    [Fact]
    public void A_summary_keeps_its_digits_far_from_0() => Gen.Select(Gen.Double[0, 1].Array[2, 50], Gen.Double[-1e6, 1e6]).Sample((values, shift) =>
    {
        var (before, after) = (SampleSummary.Of(values)!.Value, SampleSummary.Of([.. values.Select(value => value + shift)])!.Value);
        Assert.Equal(before.StandardDeviation!.Value, after.StandardDeviation!.Value, 1e-9);
    });

    private static bool Contains(IReadOnlyList<(double WaterContent, double DryDensity)> polygon, double w, double dry)
    {
        var inside = false;
        for (var (i, j) = (0, polygon.Count - 1); i < polygon.Count; j = i++)
        {
            var (a, b) = (polygon[i], polygon[j]);
            if (a.DryDensity > dry != b.DryDensity > dry && w < ((b.WaterContent - a.WaterContent) * (dry - a.DryDensity) / (b.DryDensity - a.DryDensity)) + a.WaterContent)
            {
                inside = !inside;
            }
        }

        return inside;
    }
}
