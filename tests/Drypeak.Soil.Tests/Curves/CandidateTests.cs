using CsCheck;
using Drypeak.Soil.Curves;
using MathNet.Numerics.Interpolation;
using Xunit;

namespace Drypeak.Soil.Tests.Curves;

/// <summary>Parabola, cubic and spline against published figures and against MathNet's own fits.</summary>
public sealed class CandidateTests
{
    private static readonly double[] Percent = [8.2, 10.1, 11.9, 14.2, 15.8, 17.9];
    private static readonly double[] Densities = [1772, 1841, 1893, 1902, 1861, 1797];

    /// <summary>University laboratory report on standard and modified compaction: least-squares parabola of its rounded table, published with 13 digits.</summary>
    [Fact]
    public void The_parabola_of_a_published_table_has_its_thirteen_digits()
    {
        var fit = Fit(CurveModel.Parabola, Points([5.7775, 7.798, 9.2015, 11.729], [3976, 4230, 4336, 4120]));
        Relative(1828.04962020967, Parameter(fit, "constant"), 1e-13);
        Relative(540.266661437199, Parameter(fit, "linear"), 1e-13);
        Relative(-29.3675579330298, Parameter(fit, "quadratic"), 1e-13);
    }

    /// <summary>After B. M. Das and N. Sivakugan, Fundamentals of Geotechnical Engineering, 5th ed.: vertex through three points, 11 digits. 1 kN/m³ = 1000/9.80665 kg/m³.</summary>
    [Fact]
    public void The_vertex_through_three_published_points_has_its_eleven_digits()
    {
        const double kilonewton = 1000 / 9.80665;
        var fit = Fit(CurveModel.Parabola, Points([12, 14, 16], [16.87 * kilonewton, 17.11 * kilonewton, 16.74 * kilonewton]));
        Relative(13.7868852459, 100 * fit.Optimum!.WaterContent.Value, 1e-11);
        Relative(17.11346311475, fit.Optimum.MaximumDryDensity.Value / kilonewton, 1e-11);
        Assert.Null(fit.Optimum.WaterContent.StandardUncertainty);
    }

    [Theory]
    [InlineData(CurveModel.Parabola, 2)]
    [InlineData(CurveModel.Cubic, 3)]
    public void Coefficients_agree_with_the_library_s_fit(CurveModel model, int degree)
    {
        var expected = MathNet.Numerics.Fit.Polynomial(Percent, Densities, degree, MathNet.Numerics.LinearRegression.DirectRegressionMethod.QR);
        var fit = Fit(model, Points(Percent, Densities));
        Assert.All(expected.Zip(fit.Parameters), pair => Relative(pair.First, pair.Second.Value, 1e-9));
    }

    [Fact]
    public void The_spline_agrees_with_the_library_s_natural_spline()
    {
        var expected = CubicSpline.InterpolateNatural(Percent, Densities);
        var spline = new NaturalSpline(new TestedPoints(Points(Percent, Densities)));
        Assert.All(MathNet.Numerics.Generate.LinearSpaced(50, Percent[0], Percent[^1]), w => Relative(expected.Interpolate(w), 1000 * spline.Density(w / 100), 1e-12));
    }

    [Theory]
    [InlineData(CurveModel.Parabola)]
    [InlineData(CurveModel.Cubic)]
    [InlineData(CurveModel.Spline)]
    public void Leave_one_out_in_closed_form_is_what_refits_give(CurveModel model) =>
        Gen.Select(Gen.Double[-20, 20].Array[6], Gen.Double[-0.5, 0.5].Array[6]).Sample((noise, shift) =>
        {
            var percent = Percent.Zip(shift, (w, by) => w + by).ToArray();
            var densities = Densities.Zip(noise, (density, by) => density + by).ToArray();
            var predictions = Fit(model, Points(percent, densities)).Predictions;
            for (var i = 0; i < percent.Length; i++)
            {
                var (w, density) = (percent.Where((_, j) => j != i).ToArray(), densities.Where((_, j) => j != i).ToArray());
                Relative(Refit(model, w, density, percent[i]), predictions[i].DryDensity, 1e-8);
            }
        }, iter: 50);

    [Fact]
    public void Points_at_one_water_content_predict_each_other_on_a_spline()
    {
        var fit = Fit(CurveModel.Spline, Points([10, 12, 12, 14, 16], [1800, 1850, 1862, 1840, 1790]));
        Assert.Equal(1862, fit.Predictions[1].DryDensity, 9);
        Assert.Equal(1850, fit.Predictions[2].DryDensity, 9);
        Assert.Equal(1856, fit.Fitted[1], 9);
        Assert.Equal(1, fit.DegreesOfFreedom);
    }

    /// <summary>Fieller's statement itself: at the ends of the interval the slope divided by its standard error is Student's quantile.</summary>
    [Fact]
    public void At_the_ends_of_the_parabola_s_interval_the_slope_is_just_told_from_zero()
    {
        var points = new TestedPoints(Points(Percent, Densities));
        var fit = Polynomial.Fit(points, 2)!;
        var interval = Parabola.Fit(points).Optimum!.WaterContent;
        foreach (var end in new[] { interval.Lower!.Value, interval.Upper!.Value })
        {
            var t = fit.Scaled(end);
            var slope = fit.Coefficients[1] + (2 * fit.Coefficients[2] * t);
            var error = Math.Sqrt(fit.NoiseVariance * fit.UnitVariance([0, 1, 2 * t]));
            Relative(Intervals.Student(fit.DegreesOfFreedom), Math.Abs(slope / error), 1e-9);
        }
    }

    /// <summary>Student's t, upper 2.5 %: 12.706, 4.303, 3.182, 2.776 for 1 to 4 degrees of freedom (any table of the distribution).</summary>
    [Theory]
    [InlineData(1, 12.706)]
    [InlineData(2, 4.303)]
    [InlineData(3, 3.182)]
    [InlineData(4, 2.776)]
    public void Student_s_quantiles_are_those_of_the_tables(int degreesOfFreedom, double quantile) =>
        Assert.Equal(quantile, Intervals.Student(degreesOfFreedom), 3);

    [Fact]
    public void A_parabola_whose_bend_is_not_shown_has_no_bounded_interval()
    {
        var fit = Fit(CurveModel.Parabola, Points([10, 12, 14, 16], [1800, 1830, 1800, 1830.5]));
        Assert.Null(fit.Optimum?.WaterContent.Lower);
        var bent = Fit(CurveModel.Parabola, Points([10, 12, 14, 16], [1800, 1806, 1801, 1799]));
        Assert.NotNull(bent.Optimum);
        Assert.NotNull(bent.Optimum.WaterContent.StandardUncertainty);
        Assert.Null(bent.Optimum.WaterContent.Lower);
    }

    [Fact]
    public void A_parabola_that_opens_upward_has_no_optimum()
    {
        var fit = Fit(CurveModel.Parabola, Points([10, 12, 14, 16], [1850, 1800, 1795, 1840]));
        Assert.Null(fit.Optimum);
        Assert.False(fit.Admissible);
        Assert.Contains("no maximum", fit.WhyNot, StringComparison.Ordinal);
    }

    [Fact]
    public void A_cubic_needs_five_points() =>
        Assert.Contains("five points", Fit(CurveModel.Cubic, Points([10, 12, 14, 16], [1800, 1850, 1860, 1810])).WhyNot, StringComparison.Ordinal);

    [Fact]
    public void Points_at_two_water_contents_have_no_parabola_and_no_spline()
    {
        var data = Points([10, 10, 14, 14], [1800, 1810, 1850, 1840]);
        Assert.Empty(Fit(CurveModel.Parabola, data).Fitted);
        Assert.Empty(Fit(CurveModel.Spline, data).Fitted);
    }

    [Fact]
    public void A_spline_with_two_peaks_says_so()
    {
        var fit = Fit(CurveModel.Spline, Points([8, 10, 12, 14, 16, 18], [1750, 1840, 1790, 1795, 1850, 1760]));
        Assert.False(fit.Admissible);
        Assert.Contains("2 peaks", fit.WhyNot, StringComparison.Ordinal);
    }

    [Fact]
    public void A_spline_s_peak_exactly_at_a_point_is_found()
    {
        var fit = Fit(CurveModel.Spline, Points([10, 12, 14, 16, 18], [1780, 1830, 1850, 1830, 1780]));
        Assert.Equal(0.14, fit.Optimum!.WaterContent.Value, 12);
        Assert.True(fit.Admissible);
    }

    /// <summary>The cubic 1900 − 3t² − 0.4t³, t the water content above 13 %: its top is at t = 0.</summary>
    [Fact]
    public void A_planted_cubic_is_found_with_no_uncertainty()
    {
        double[] percent = [9, 11, 12, 14, 15, 16];
        var fit = Fit(CurveModel.Cubic, Points(percent, [.. percent.Select(w => 1900 - (3 * Math.Pow(w - 13, 2)) - (0.4 * Math.Pow(w - 13, 3)))]));
        Assert.Equal(0.13, fit.Optimum!.WaterContent.Value, 12);
        Assert.Equal(1900, fit.Optimum.MaximumDryDensity.Value, 9);
        Assert.Equal(0, fit.Optimum.WaterContent.StandardUncertainty!.Value, 9);
    }

    [Fact]
    public void A_curve_above_the_zero_air_voids_line_is_not_admissible_and_drawn_along_it()
    {
        var data = Points([10, 12, 14, 18], [1700, 1840, 1900, 1775]) with { SpecificGravity = 2.62 };
        var points = new TestedPoints(data);
        Assert.False(points.AnyAboveZeroAirVoids);
        var fit = Fit(CurveModel.Parabola, data);
        Assert.False(fit.Admissible);
        Assert.Contains("zero-air-voids", fit.WhyNot, StringComparison.Ordinal);
        Assert.All(fit.Curve, point => Assert.False(points.IsAboveZeroAirVoids(point.WaterContent, point.DryDensity / 1000)));
    }

    private static double Refit(CurveModel model, double[] percent, double[] densities, double at) => model switch
    {
        CurveModel.Parabola => MathNet.Numerics.Fit.PolynomialFunc(percent, densities, 2)(at),
        CurveModel.Cubic => MathNet.Numerics.Fit.PolynomialFunc(percent, densities, 3)(at),
        _ => NaturalAt(percent, densities, at),
    };

    /// <summary>Natural splines go on as straight lines beyond their ends; the library's goes on as its last cubic.</summary>
    private static double NaturalAt(double[] percent, double[] densities, double at)
    {
        var spline = CubicSpline.InterpolateNatural(percent, densities);
        var end = Math.Clamp(at, percent.Min(), percent.Max());
        return spline.Interpolate(end) + ((at - end) * spline.Differentiate(end));
    }

    private static FittedCurve Fit(CurveModel model, CompactionData data) => CompactionCurve.Analyze(data, model).Chosen;

    private static double Parameter(FittedCurve fit, string name) => fit.Parameters.Single(parameter => parameter.Name == name).Value;

    private static void Relative(double expected, double actual, double tolerance) =>
        Assert.InRange(actual, expected - (Math.Abs(expected) * tolerance), expected + (Math.Abs(expected) * tolerance));

    private static CompactionData Points(double[] percent, double[] densities) =>
        new([.. percent.Zip(densities, (w, density) => new CompactionPoint(w / 100, density))], null, 998.2);
}
