using CsCheck;
using Drypeak.Soil.Curves;
using Xunit;

namespace Drypeak.Soil.Tests.Curves;

/// <summary>How far points are from rising once and then falling.</summary>
public sealed class OnePeakTests
{
    /// <summary>1.82 and 1.78 share 1.80: √(2·0.02²).</summary>
    [Fact]
    public void A_dip_before_the_peak_counts_with_the_root_of_its_squares() =>
        Assert.Equal(28.284271, Departure(1750, 1820, 1780, 1860, 1770), 6);

    [Theory]
    [InlineData(new double[] { 1750, 1820, 1860, 1830, 1770 })]
    [InlineData(new double[] { 1750, 1760, 1800, 1830, 1870 })]
    [InlineData(new double[] { 1900, 1860, 1800, 1790, 1700 })]
    [InlineData(new double[] { 1800, 1800, 1800, 1800, 1800 })]
    public void Points_that_rise_once_and_then_fall_are_not_apart_from_it(double[] densities) =>
        Assert.Equal(0, Departure(densities));

    [Fact]
    public void Points_at_one_water_content_are_averaged_first() =>
        Assert.Equal(0, 1000 * OnePeak.Departure(new TestedPoints(new([new(0.10, 1800), new(0.12, 1880), new(0.12, 1820), new(0.14, 1840), new(0.16, 1790)], null, 998.2))));

    /// <summary>By brute force: each split, each part pooled over all partitions into blocks by dynamic programming.</summary>
    [Fact]
    public void The_least_sum_of_squares_is_that_of_all_splits_and_poolings() =>
        Gen.Double[1500, 2000].Array[1, 9].Sample(densities =>
        {
            var least = Enumerable.Range(0, densities.Length + 1).Min(split =>
                LeastRising(densities[..split]) + LeastRising([.. densities[split..].Reverse()]));
            Assert.Equal(Math.Sqrt(least), Departure(densities), 6);
        }, iter: 300);

    /// <summary>Rising sequences by max–min formula: value i is the greatest over starts of the least over ends of the block's mean.</summary>
    private static double LeastRising(double[] values) => Enumerable.Range(0, values.Length).Sum(i =>
    {
        var fitted = Enumerable.Range(0, i + 1).Max(from => Enumerable.Range(i, values.Length - i).Min(to => values[from..(to + 1)].Average()));
        return (values[i] - fitted) * (values[i] - fitted);
    });

    private static double Departure(params double[] densities) => 1000 * OnePeak.Departure(new TestedPoints(
        new([.. densities.Select((density, i) => new CompactionPoint(0.10 + (0.02 * i), density))], null, 998.2)));
}
