using Drypeak.Soil.Curves;
using Xunit;

namespace Drypeak.Soil.Tests.Curves;

/// <summary>The Li–Sego curve, its derivatives, and its fit by weak priors.</summary>
public sealed class SaturationModelTests
{
    private const double SpecificGravity = 2.70;
    private const double Water = 0.9982;

    /// <summary>logit 0.90, ln 0.19, ln 7, ln 0.07.</summary>
    private static readonly double[] Planted = [Math.Log(0.90 / 0.10), Math.Log(0.19), Math.Log(7), Math.Log(0.07)];

    private static readonly double[] WaterContents = [0.08, 0.10, 0.12, 0.14, 0.16, 0.18, 0.20];

    [Fact]
    public void Derivatives_are_those_of_the_curve()
    {
        const double step = 1e-6;
        Span<double> gradient = stackalloc double[4];
        foreach (var w in WaterContents)
        {
            new LiSegoCurve(Planted, SpecificGravity, Water).Density(w, gradient);
            for (var j = 0; j < 4; j++)
            {
                double[] above = [.. Planted], below = [.. Planted];
                above[j] += step;
                below[j] -= step;
                var difference = (new LiSegoCurve(above, SpecificGravity, Water).Density(w) - new LiSegoCurve(below, SpecificGravity, Water).Density(w)) / (2 * step);
                Assert.Equal(difference, gradient[j], 7);
            }
        }
    }

    [Fact]
    public void The_slope_is_that_of_the_curve_which_stays_below_its_greatest_saturation()
    {
        var curve = new LiSegoCurve(Planted, SpecificGravity, Water);
        foreach (var w in WaterContents)
        {
            const double step = 1e-6;
            Assert.Equal((curve.Density(w + step) - curve.Density(w - step)) / (2 * step), curve.Slope(w), 6);
            Assert.True(curve.Density(w) <= (Water / ((1 / SpecificGravity) + (w / 0.90))) * (1 + 1e-12));
        }
    }

    [Fact]
    public void A_dry_soil_has_a_finite_density()
    {
        var curve = new LiSegoCurve(Planted, SpecificGravity, Water);
        Assert.InRange(curve.Density(0), 0.5, SpecificGravity * Water);
        Assert.Equal(curve.Density(1e-5), curve.Density(0));
    }

    /// <summary>Without noise and with priors too wide to pull, the planted curve and with it its optimum come back.</summary>
    [Fact]
    public void A_planted_optimum_is_found_to_a_millionth()
    {
        var planted = new LiSegoCurve(Planted, SpecificGravity, Water);
        var top = WaterContents[0];
        for (var w = 0.10; w < 0.18; w += 1e-6)
        {
            top = planted.Density(w) > planted.Density(top) ? w : top;
        }

        var data = new CompactionData([.. WaterContents.Select(w => new CompactionPoint(w, 1000 * planted.Density(w)))], SpecificGravity, 1000 * Water);
        var mode = SaturationMode.Of(new TestedPoints(data), SpecificGravity, new SaturationPrior(1e6, 1e6, 1e6, 1e6, 1e-3));
        Assert.Equal(top, mode.Peak!.Value.WaterContent, 1.5e-6);
        Assert.Equal(planted.Density(top), mode.Peak.Value.Density, 1e-9);
        Assert.All(Planted.Zip(mode.Values.ToArray()), pair => Assert.Equal(pair.First, pair.Second, 1e-6));
    }

    [Fact]
    public void Without_specific_gravity_it_says_that_it_is_missing()
    {
        var fit = CompactionCurve.Analyze(Data(null), CurveModel.Saturation).Chosen;
        Assert.Null(fit.Optimum);
        Assert.Contains("specific gravity is missing", fit.WhyNot, StringComparison.Ordinal);
    }

    [Fact]
    public void Its_parameters_carry_units_and_standard_errors()
    {
        var fit = CompactionCurve.Analyze(Data(SpecificGravity), CurveModel.Saturation).Chosen;
        Assert.Equal(["greatestSaturation", "wetEnd", "shape", "dryLeg"], fit.Parameters.Select(parameter => parameter.Name));
        Assert.Equal(["%", "%", "", "%"], fit.Parameters.Select(parameter => parameter.Unit));
        Assert.All(fit.Parameters, parameter => Assert.InRange(parameter.StandardError!.Value, 0, double.MaxValue));
        Assert.InRange(fit.Parameters[0].Value, 80, 98);
    }

    [Fact]
    public void Its_leave_one_out_predictions_are_those_of_refits()
    {
        var data = Data(SpecificGravity);
        var predictions = CompactionCurve.Analyze(data, CurveModel.Saturation).Chosen.Predictions;
        for (var i = 0; i < data.Points.Count; i++)
        {
            var others = new TestedPoints(data with { Points = [.. data.Points.Where((_, j) => j != i)] });
            var refit = SaturationMode.Of(others, SpecificGravity, new SaturationPrior(0.45, 0.2, 0.8, 0.8, 0.010));
            Assert.Equal(1000 * refit.Curve.Density(data.Points[i].WaterContent), predictions[i].DryDensity, 0.1);
        }
    }

    [Fact]
    public void With_many_points_its_predictions_are_near_those_of_refits()
    {
        var data = new CompactionData(
            [.. Enumerable.Range(0, 20).Select(i => new CompactionPoint(0.08 + (0.006 * i), 1000 * new LiSegoCurve(Planted, SpecificGravity, Water).Density(0.08 + (0.006 * i)) + (8 * Math.Sin(5.0 * i))))],
            SpecificGravity,
            1000 * Water);
        var predictions = CompactionCurve.Analyze(data, CurveModel.Saturation).Chosen.Predictions;
        for (var i = 1; i < 19; i++)
        {
            var others = new TestedPoints(data with { Points = [.. data.Points.Where((_, j) => j != i)] });
            var refit = SaturationMode.Of(others, SpecificGravity, new SaturationPrior(0.45, 0.2, 0.8, 0.8, 0.010));
            Assert.Equal(1000 * refit.Curve.Density(data.Points[i].WaterContent), predictions[i].DryDensity, 0.5);
        }
    }

    /// <summary>Steep points far from any such curve: the residuals stay large, where plain Gauss–Newton steps crawl.</summary>
    [Fact]
    public void It_ends_at_a_stationary_point_on_hard_data()
    {
        var points = new TestedPoints(new CompactionData([new(0.086, 1637), new(0.106, 1802), new(0.125, 2003), new(0.149, 1932), new(0.167, 1655)], 2.69, 998.2));
        var prior = new SaturationPrior(0.45, 0.2, 0.8, 0.8, 0.010);
        var mode = SaturationMode.Of(points, 2.69, prior);
        for (var j = 0; j < 4; j++)
        {
            double[] aside = mode.Values.ToArray();
            double[] other = mode.Values.ToArray();
            (aside[j], other[j]) = (aside[j] + 1e-4, other[j] - 1e-4);
            Assert.True(mode.SumOfSquares < SumOfSquares(points, prior, aside));
            Assert.Equal(SumOfSquares(points, prior, aside), SumOfSquares(points, prior, other), 1e-4);
        }
    }

    [Theory]
    [InlineData(CurveModel.Saturation)]
    [InlineData(CurveModel.Averaged)]
    public void The_peak_alone_is_the_optimum_of_the_analysis(CurveModel model)
    {
        var optimum = CompactionCurve.Analyze(Data(SpecificGravity), model).Chosen.Optimum!;
        Assert.Equal(new CompactionPoint(optimum.WaterContent.Value, optimum.MaximumDryDensity.Value), CompactionCurve.PeakOf(Data(SpecificGravity), model));
    }

    private static double SumOfSquares(TestedPoints points, SaturationPrior prior, double[] parameters)
    {
        var curve = new LiSegoCurve(parameters, points.SpecificGravity!.Value, points.WaterDensity);
        double[] centers = [Math.Log(0.91 / 0.09), Math.Log(1.05 * points.Wettest), Math.Log(6), Math.Log(0.4 * points.Wettest)];
        return points.WaterContents.Zip(points.Densities, (w, density) => Math.Pow((curve.Density(w) - density) / prior.Noise, 2)).Sum()
            + Enumerable.Range(0, 4).Sum(j => Math.Pow((parameters[j] - centers[j]) / prior.Deviation(j), 2));
    }

    private static CompactionData Data(double? specificGravity) => new(
        [new(0.101, 1752), new(0.119, 1817), new(0.142, 1858), new(0.161, 1828), new(0.179, 1771)], specificGravity, 1000 * Water);
}
