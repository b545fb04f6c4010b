using CsCheck;
using Drypeak.Soil.Curves;
using Xunit;

namespace Drypeak.Soil.Tests.Curves;

/// <summary>What holds for any points that a request may bring, however wild.</summary>
public sealed class AnyDataTests
{
    private static readonly Gen<double> WildDensity = Gen.Double[0, Math.Log(30000)].Select(Math.Exp);
    private static readonly Gen<double> SoilDensity = Gen.Double[1400, 2300];
    private static readonly Gen<double> WaterContent = Gen.OneOf(
        Gen.Double[0, 0.6], Gen.Int[0, 60].Select(percent => percent / 100.0), Gen.Double[0, 20], Gen.Const(0.0));

    private static readonly Gen<CompactionData> AnyData = Gen.Select(
        Gen.Select(WaterContent, Gen.OneOf(WildDensity, SoilDensity), (w, density) => new CompactionPoint(w, density)).List[1, 12],
        Gen.OneOf(Gen.Double[1, 10].Select(gs => (double?)gs), Gen.Const((double?)null)),
        Gen.Double[900, 1100],
        (points, gs, water) => new CompactionData(points, gs, water));

    private static readonly Gen<CompactionData> LikelyData = Gen.Select(
        Gen.Double[0.04, 0.25], Gen.Double[0.01, 0.03], Gen.Double[-0.4, 0.4], Gen.Double[1500, 2200], Gen.Double[1, 30], Gen.Int[3, 9],
        Gen.Double[2.6, 2.8], Gen.Double[-12, 12].Array[9],
        (first, step, offset, top, bend, count, gs, noise) => new CompactionData(
            [.. Enumerable.Range(0, count).Select(i =>
            {
                var fromPeak = i - ((count - 1) / 2.0) + offset;
                return new CompactionPoint(first + (step * i), top - (bend * fromPeak * fromPeak) + noise[i]);
            })],
            gs,
            998.2));

    [Fact]
    public void No_data_make_an_analysis_throw_or_hold_a_number_that_is_none() =>
        Gen.Select(Gen.OneOf(AnyData, LikelyData), Gen.Enum<CurveModel>().Nullable()).Sample((data, asked) =>
        {
            var analysis = CompactionCurve.Analyze(data, asked);
            Assert.DoesNotContain(Numbers(analysis), number => !double.IsFinite(number));
            Assert.Equal(4, analysis.Alternatives.Count);
            Assert.Equal(asked ?? CurveModel.Averaged, analysis.Chosen.Model);
        }, iter: 800, print: Print);

    [Fact]
    public void An_optimum_lies_in_the_tested_range_and_its_absence_has_a_reason() =>
        Gen.OneOf(AnyData, LikelyData).Sample(data =>
        {
            var analysis = CompactionCurve.Analyze(data);
            foreach (var fit in analysis.Alternatives.Append(analysis.Chosen))
            {
                Assert.Equal(fit.Admissible, fit.WhyNot is null);
                Assert.True(fit.Optimum is not null || !fit.Admissible);
                if (fit.Optimum is { } optimum)
                {
                    Assert.InRange(optimum.WaterContent.Value, data.Points.Min(point => point.WaterContent), data.Points.Max(point => point.WaterContent));
                    Assert.InRange(optimum.WaterContent.Value, optimum.WaterContent.Lower ?? double.NegativeInfinity, optimum.WaterContent.Upper ?? double.PositiveInfinity);
                }
            }
        }, iter: 500, print: Print);

    [Fact]
    public void The_order_of_the_points_does_not_matter() =>
        Gen.Select(Gen.OneOf(AnyData, LikelyData), Gen.Int[0, 1_000_000]).Sample((data, seed) =>
        {
            var order = Enumerable.Range(0, data.Points.Count).ToArray();
            new Random(seed).Shuffle(order);
            var given = CompactionCurve.Analyze(data);
            var shuffled = CompactionCurve.Analyze(data with { Points = [.. order.Select(i => data.Points[i])] });
            Assert.Equal(Summary(given), Summary(shuffled));
            Assert.All(order.Index(), place => Assert.Equal(given.Chosen.Predictions.ElementAtOrDefault(place.Item), shuffled.Chosen.Predictions.ElementAtOrDefault(place.Index)));
        }, iter: 500);

    [Fact]
    public void Densities_that_went_through_other_units_give_the_same_answer() =>
        LikelyData.Sample(data =>
        {
            const double poundsPerCubicFoot = 0.45359237 / (0.3048 * 0.3048 * 0.3048);
            var there = data.Points.Select(point => point with { DryDensity = point.DryDensity / poundsPerCubicFoot });
            var back = there.Select(point => point with { DryDensity = point.DryDensity * poundsPerCubicFoot });
            var one = Numbers(CompactionCurve.Analyze(data)).ToArray();
            var other = Numbers(CompactionCurve.Analyze(data with { Points = [.. back] })).ToArray();
            Assert.Equal(one.Length, other.Length);
            Assert.DoesNotContain(one.Zip(other), pair => Math.Abs(pair.First - pair.Second) > Math.Max(1e-9 * Math.Abs(pair.First), 1e-11));
        }, iter: 300);

    [Fact]
    public void The_averaged_curve_has_its_top_at_the_optimum_and_stays_under_the_zero_air_voids_line() =>
        LikelyData.Sample(data =>
        {
            var points = new TestedPoints(data);
            if (CompactionCurve.Analyze(data).Chosen is not { Optimum: { } optimum } fit)
            {
                return;
            }

            var under = points.AnyAboveZeroAirVoids ? double.PositiveInfinity : points.ZeroAirVoids(optimum.WaterContent.Value) * 1000;
            Assert.Contains(fit.Curve, point => point.WaterContent == optimum.WaterContent.Value
                && Math.Abs(point.DryDensity - Math.Min(under, optimum.MaximumDryDensity.Value)) < 1e-9 * point.DryDensity);
            Assert.All(fit.Curve.Zip(fit.Curve.Skip(1)), pair => Assert.True(pair.First.WaterContent <= pair.Second.WaterContent));
            if (!points.AnyAboveZeroAirVoids)
            {
                Assert.All(fit.Curve, point => Assert.False(points.IsAboveZeroAirVoids(point.WaterContent, point.DryDensity / 1000)));
            }
        }, iter: 500, print: Print);

    [Fact]
    public void Five_hundred_points_are_analyzed()
    {
        var random = new Random(1);
        var data = new CompactionData(
            [.. Enumerable.Range(0, 500).Select(i => new CompactionPoint(0.10 + (0.0002 * i), 1900 - (0.004 * (i - 240) * (i - 240)) + (8 * random.NextDouble())))],
            2.7,
            998.2);
        var analysis = CompactionCurve.Analyze(data);
        Assert.InRange(analysis.Chosen.Optimum!.WaterContent.Value, 0.145, 0.151);
        Assert.Equal(500, analysis.Chosen.Predictions.Count);
        Assert.DoesNotContain(Numbers(analysis), number => !double.IsFinite(number));
    }

    [Theory]
    [InlineData(1)]
    [InlineData(2)]
    public void Fewer_than_three_points_have_no_optimum_but_a_next_specimen(int count)
    {
        var data = new CompactionData([.. Enumerable.Range(0, count).Select(i => new CompactionPoint(0.10 + (0.02 * i), 1800 + (20 * i)))], 2.7, 998.2);
        var analysis = CompactionCurve.Analyze(data);
        Assert.Null(analysis.Chosen.Optimum);
        Assert.Contains("three points", analysis.Chosen.WhyNot + "three points at one water content", StringComparison.Ordinal);
        Assert.Equal(0.10 + (0.02 * count), analysis.Next!.WaterContent, 12);
    }

    [Fact]
    public void Points_at_one_water_content_have_no_optimum()
    {
        var data = new CompactionData([new(0.12, 1800), new(0.12, 1850), new(0.12, 1820), new(0.12, 1790)], 2.7, 998.2);
        var analysis = CompactionCurve.Analyze(data);
        Assert.Null(analysis.Chosen.Optimum);
        Assert.Contains("one water content", analysis.Chosen.WhyNot, StringComparison.Ordinal);
        Assert.Equal(0, analysis.DepartureFromOnePeak);
        Assert.Equal(0.14, analysis.Next!.WaterContent, 12);
    }

    [Fact]
    public void Water_contents_that_no_soil_has_make_no_number_that_is_none()
    {
        var data = new CompactionData([new(0, 1695), new(5e-14, 2064), new(0.18, 1785), new(0.20, 1359), new(3.7e12, 8e-10)], 2.73, 961.5);
        Assert.DoesNotContain(Numbers(CompactionCurve.Analyze(data)), number => !double.IsFinite(number));
    }

    [Fact]
    public void Three_points_with_their_highest_in_the_middle_have_an_optimum()
    {
        var data = new CompactionData([new(0.10, 1800), new(0.13, 1860), new(0.16, 1790)], 2.7, 998.2);
        Assert.InRange(CompactionCurve.Analyze(data).Chosen.Optimum!.WaterContent.Value, 0.12, 0.14);
    }

    private static string Print((CompactionData Data, CurveModel? Asked) any) => Print(any.Data) + any.Asked;

    private static string Print(CompactionData data) =>
        $"Gs {data.SpecificGravity:R}, water {data.WaterDensity:R}: {string.Join("; ", data.Points.Select(point => $"{point.WaterContent:R} {point.DryDensity:R}"))} ";

    private static (CompactionPoint?, CompactionPoint?, double, double?) Summary(CurveAnalysis analysis) => (
        Peak(analysis.Chosen), Peak(analysis.Alternatives[0]), analysis.DepartureFromOnePeak, analysis.Next?.WaterContent);

    private static CompactionPoint? Peak(FittedCurve fit) =>
        fit.Optimum is { } optimum ? new(optimum.WaterContent.Value, optimum.MaximumDryDensity.Value) : null;

    private static IEnumerable<double> Numbers(CurveAnalysis analysis) =>
        analysis.Alternatives.Prepend(analysis.Chosen).SelectMany(Numbers)
            .Append(analysis.DepartureFromOnePeak)
            .Concat(Given(analysis.Next?.WaterContent, analysis.Next?.StandardUncertaintyNow, analysis.Next?.StandardUncertaintyAfter));

    private static IEnumerable<double> Numbers(FittedCurve fit) =>
        Numbers(fit.Optimum?.WaterContent)
            .Concat(Numbers(fit.Optimum?.MaximumDryDensity))
            .Concat(fit.Parameters.SelectMany(parameter => Given(parameter.Value, parameter.StandardError)))
            .Concat(Given(fit.RootMeanSquareError, fit.LeaveOneOutError, fit.ChanceOfPeakOutside))
            .Concat(fit.Fitted)
            .Concat(fit.Predictions.SelectMany(prediction => Given(prediction.DryDensity, prediction.StandardUncertainty)))
            .Concat(fit.Curve.SelectMany(point => Given(point.WaterContent, point.DryDensity)));

    private static IEnumerable<double> Numbers(Estimate? estimate) =>
        Given(estimate?.Value, estimate?.StandardUncertainty, estimate?.Lower, estimate?.Upper);

    private static IEnumerable<double> Given(params double?[] numbers) => numbers.OfType<double>();
}
