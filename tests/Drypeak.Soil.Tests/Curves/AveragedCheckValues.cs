using Drypeak.Soil.Curves;
using Xunit;

namespace Drypeak.Soil.Tests.Curves;

/// <summary>
/// The averaged model against figures worked out by a separate program in another language, from the definition alone, to all digits given.
/// The points are made up: their densities are round numbers near a curve. Density of water 998.2 kg/m³.
/// </summary>
public sealed class AveragedCheckValues
{
    private static readonly CompactionData A = Data(2.70, [10.0, 12.1, 13.9, 16.1, 18.0], [1750, 1820, 1860, 1830, 1770]);
    private static readonly CompactionData B = A with { SpecificGravity = null };
    private static readonly CompactionData C = Data(2.74, [6.2, 8.0, 9.9, 12.1, 14.0, 15.9], [1872, 1935, 1998, 2021, 1948, 1876]);
    private static readonly CompactionData D = Data(null, [6, 8, 10, 12, 14], [1800, 1810, 1815, 1812, 1800]);
    private static readonly CompactionData E = Data(2.70, [8, 10, 12, 14], [1700, 1760, 1820, 1870]);
    private static readonly CompactionData F = Data(2.70, [8, 10, 12, 14], [1950, 1900, 1850, 1800]);

    public static TheoryData<string, CompactionData, double[], double[], double, double> Optima => new()
    {
        { "A", A, [14.225364, 13.797271, 15.296225], [1862.056, 1841.227, 1882.885], 0.383779, 0.000119 },
        { "B", B, [14.233585, 13.521681, 15.574912], [1859.114, 1838.214, 1880.014], 0.560898, 0.000407 },
        { "C", C, [11.152576, 10.877293, 12.117113], [2025.421, 2002.889, 2047.953], 0.264430, 0.000012 },
        { "D", D, [10.399631, 8.681117, 12.066926], [1818.951, 1804.321, 1833.581], 1.332928, 0.067079 },
    };

    [Theory]
    [MemberData(nameof(Optima))]
    public void Optimum_and_intervals_come_out_to_six_decimals(
        string name, CompactionData data, double[] optimum, double[] maximum, double deviation, double chanceOutside)
    {
        Assert.NotEmpty(name);
        var fit = CompactionCurve.Analyze(data).Chosen;
        var water = fit.Optimum!.WaterContent;
        var density = fit.Optimum.MaximumDryDensity;
        Near(optimum[0], 100 * water.Value, 6);
        Near(optimum[1], 100 * water.Lower!.Value, 6);
        Near(optimum[2], 100 * water.Upper!.Value, 6);
        Near(maximum[0], density.Value, 3);
        Near(maximum[1], density.Lower!.Value, 3);
        Near(maximum[2], density.Upper!.Value, 3);
        Near(deviation, 100 * water.StandardUncertainty!.Value, 6);
        Near(chanceOutside, fit.ChanceOfPeakOutside!.Value, 6);
    }

    [Fact]
    public void The_saturation_model_has_its_share()
    {
        Near(0.639071, Share(A), 6);
        Near(0.851465, Share(C), 6);
    }

    [Fact]
    public void The_nodes_alone_and_the_mode_come_out_each_by_itself()
    {
        var points = new TestedPoints(A);
        Span<PeakNode> nodes = stackalloc PeakNode[PeakNodes.Count];
        var mixture = AveragedModel.Weigh(points, nodes);
        Near(14.221554, 100 * mixture.OfNodes.WaterContent, 6);
        Near(1.858898, mixture.OfNodes.Density, 6);
        Near(14.227515, 100 * mixture.Saturation!.Peak!.Value.WaterContent, 6);
        Near(1.863839, mixture.Saturation.Peak.Value.Density, 6);
    }

    [Fact]
    public void The_leave_one_out_predictions_come_out_at_each_point()
    {
        var predictions = CompactionCurve.Analyze(A).Chosen.Predictions;
        double[] expected = [1757.039, 1828.315, 1842.939, 1827.929, 1779.397];
        Assert.All(expected.Zip(predictions), pair => Near(pair.First, pair.Second.DryDensity, 3));
    }

    [Fact]
    public void The_curve_comes_out_at_the_points()
    {
        var fitted = CompactionCurve.Analyze(A).Chosen.Fitted;
        double[] expected = [1750.540, 1817.543, 1860.661, 1828.153, 1767.116];
        Assert.All(expected.Zip(fitted), pair => Near(pair.First, pair.Second, 3));
    }

    [Fact]
    public void The_next_specimen_comes_out_with_the_uncertainty_after_it()
    {
        var next = CompactionCurve.Analyze(B).Next!;
        Assert.Equal(0.155, next.WaterContent, 12);
        Near(0.5609, 100 * next.StandardUncertaintyNow!.Value, 4);
        Near(0.5158, 100 * next.StandardUncertaintyAfter!.Value, 4);
    }

    [Fact]
    public void Only_rising_densities_have_their_peak_outside_and_no_optimum()
    {
        var fit = CompactionCurve.Analyze(E).Chosen;
        Near(0.698539, fit.ChanceOfPeakOutside!.Value, 6);
        Assert.Null(fit.Optimum);
        Assert.Contains("70 %", fit.WhyNot, StringComparison.Ordinal);

        var points = new TestedPoints(E);
        Span<PeakNode> nodes = stackalloc PeakNode[PeakNodes.Count];
        var mixture = AveragedModel.Weigh(points, nodes);
        Near(13.535524, 100 * mixture.Peak.WaterContent, 6);
        Near(0.02294, mixture.UpperTail, 5);
    }

    [Fact]
    public void Only_falling_densities_have_their_peak_outside_and_a_saturation_model_without_one()
    {
        var fit = CompactionCurve.Analyze(F).Chosen;
        Near(0.702466, fit.ChanceOfPeakOutside!.Value, 6);
        Assert.Null(fit.Optimum);
        Assert.Null(SaturationMode.Of(new TestedPoints(F), 2.70, AveragedModel.Prior).Peak);
    }

    private static double Share(CompactionData data) =>
        CompactionCurve.Analyze(data).Chosen.Parameters.Single(parameter => parameter.Name == "shareSaturation").Value;

    /// <summary>Within half a unit of the last decimal given, and a hair for the figure's own rounding.</summary>
    private static void Near(double expected, double actual, int decimals) =>
        Assert.InRange(actual, expected - (0.51 * Math.Pow(10, -decimals)), expected + (0.51 * Math.Pow(10, -decimals)));

    private static CompactionData Data(double? specificGravity, double[] percent, double[] densities) => new(
        [.. percent.Zip(densities, (w, density) => new CompactionPoint(w / 100, density))], specificGravity, 998.2);
}
