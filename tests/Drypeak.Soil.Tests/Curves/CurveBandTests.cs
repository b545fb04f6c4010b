using CsCheck;
using Drypeak.Soil.Curves;
using Drypeak.Soil.Tests.Curves.Accuracy;
using MathNet.Numerics.Distributions;
using Xunit;

namespace Drypeak.Soil.Tests.Curves;

/// <summary>The pointwise interval of a fitted curve.</summary>
public sealed class CurveBandTests
{
    /// <summary>
    /// Student's band is exact for a true parabola with normal noise of the densities: over 4,000 tests 95 % at a place is known to 0.35 %; three such.
    /// </summary>
    [Fact]
    public void On_a_true_parabola_its_band_holds_the_curve_in_95_of_100_tests_at_every_place()
    {
        const int trials = 4000;
        var random = new Random(11);
        int[] places = [0, 8, 16, 27, 32];
        var held = new int[places.Length];
        static double Truth(double w) => 1850 - (4.2e4 * (w - 0.14) * (w - 0.14));
        for (var trial = 0; trial < trials; trial++)
        {
            var points = Enumerable.Range(0, 6).Select(i => 0.10 + (0.015 * i)).Select(w => new CompactionPoint(w, Truth(w) + Normal.Sample(random, 0, 8)));
            var band = CompactionCurve.BandOf(new CompactionData([.. points], null, 998.2), CurveModel.Parabola)!;
            for (var i = 0; i < places.Length; i++)
            {
                var (w, lower, upper) = band[places[i]];
                held[i] += lower <= Truth(w) && Truth(w) <= upper ? 1 : 0;
            }
        }

        Assert.All(held, count => Assert.InRange(count / (double)trials, 0.939, 0.961));
    }

    /// <summary>The averaged model on soils that it does not contain: a share over all places of all tests, families and numbers of points.</summary>
    [Theory]
    [InlineData("a")]
    [InlineData("b")]
    [InlineData("c")]
    [InlineData("d")]
    public void The_averaged_models_band_holds_the_true_curve_nearly_always_and_is_no_wider_than_it_must(string letter)
    {
        var family = SoilFamily.Main.Single(candidate => candidate.Letter == letter);
        var random = new Random(3);
        var (held, places) = (0, 0);
        foreach (var points in (int[])[4, 5, 6])
        {
            for (var i = 0; i < 150; i++)
            {
                var soil = family.Draw(random);
                foreach (var (w, lower, upper) in CompactionCurve.BandOf(soil.Test(points, random), CurveModel.Averaged) ?? [])
                {
                    var truth = 1000 * soil.Density(w);
                    held += lower <= truth && truth <= upper ? 1 : 0;
                    places++;
                }
            }
        }

        Assert.InRange(held / (double)places, 0.95, 0.999);
    }

    [Fact]
    public void The_band_holds_the_curve_that_is_drawn_and_at_the_peak_it_is_about_the_interval_of_the_maximum()
    {
        var random = new Random(8);
        foreach (var family in SoilFamily.Main)
        {
            var test = family.Draw(random).Test(6, random);
            var chosen = CompactionCurve.Analyze(test).Chosen;
            var band = CompactionCurve.BandOf(test, CurveModel.Averaged)!;
            Assert.Equal((chosen.Curve[0].WaterContent, chosen.Curve[^1].WaterContent), (band[0].WaterContent, band[^1].WaterContent));
            foreach (var (w, lower, upper) in band)
            {
                var drawn = chosen.Curve.First(point => point.WaterContent >= w - 1e-12).DryDensity;
                Assert.InRange(drawn, lower - 1e-6, upper + 1e-6);
            }

            var (peak, maximum) = (chosen.Optimum!.WaterContent.Value, chosen.Optimum.MaximumDryDensity);
            var at = band.MinBy(point => Math.Abs(point.WaterContent - peak));
            Assert.InRange((at.Upper - at.Lower) / (maximum.Upper!.Value - maximum.Lower!.Value), 0.6, 1.6);
        }
    }

    [Fact]
    public void There_is_no_band_where_nothing_supports_one()
    {
        CompactionData Data(params (double W, double Density)[] points) => new([.. points.Select(point => new CompactionPoint(point.W, point.Density))], null, 998.2);
        var three = Data((0.10, 1750), (0.12, 1800), (0.14, 1770));
        Assert.Null(CompactionCurve.BandOf(three, CurveModel.Parabola));
        Assert.Null(CompactionCurve.BandOf(three, CurveModel.Cubic));
        Assert.Null(CompactionCurve.BandOf(three, CurveModel.Saturation));
        Assert.NotNull(CompactionCurve.BandOf(three, CurveModel.Averaged));
        Assert.Null(CompactionCurve.BandOf(Data((0.10, 1750), (0.12, 1800)), CurveModel.Averaged));
        Assert.Null(CompactionCurve.BandOf(Data((0.10, 1700), (0.12, 1760), (0.14, 1820), (0.16, 1880)), CurveModel.Averaged));
    }

    [Fact]
    public void A_band_is_finite_in_order_and_does_not_depend_on_the_order_of_the_points()
    {
        Gen.Select(Gen.Select(Gen.Double[0, 0.4], Gen.Double[900, 2500], (w, density) => new CompactionPoint(w, density)).Array[1, 12], Gen.Double[2.4, 3].Nullable(), Gen.Enum<CurveModel>()).Sample((points, gravity, model) =>
        {
            var band = CompactionCurve.BandOf(new CompactionData(points, gravity, 998.2), model);
            var reversed = CompactionCurve.BandOf(new CompactionData([.. points.Reverse()], gravity, 998.2), model);
            Assert.Equal(band is null, reversed is null);
            for (var i = 0; i < (band?.Count ?? 0); i++)
            {
                Assert.True(double.IsFinite(band![i].Lower) && double.IsFinite(band[i].Upper));
                Assert.True(band[i].Lower <= band[i].Upper);
                Assert.Equal(band[i].Upper, reversed![i].Upper, 1e-6 * Math.Abs(band[i].Upper) + 1e-6);
            }
        }, iter: 400);
    }
}
