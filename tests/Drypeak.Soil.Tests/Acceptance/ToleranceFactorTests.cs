using System.Globalization;
using CsCheck;
using Drypeak.Soil.Acceptance.Statistics;
using Drypeak.Soil.Tests.Published;
using MathNet.Numerics.Distributions;
using Xunit;

namespace Drypeak.Soil.Tests.Acceptance;

/// <summary>The noncentral t distribution and the factors that stand on it.</summary>
public sealed class ToleranceFactorTests
{
    private static readonly System.Text.Json.JsonElement Table = PublishedFile.Read("tolerance-factors.json");

    /// <summary>The handbook computed its column of 99 % exactly, and that of 90 % by an approximation that the quoting library holds to 0.002 as well.</summary>
    [Theory]
    [InlineData("oneLimit99", 0.99, 0.0005)]
    [InlineData("oneLimit90", 0.90, 0.002)]
    public void One_limit_is_the_published_table(string column, double fraction, double tolerance) =>
        Assert.All(Table.GetProperty(column).EnumerateObject(), entry =>
            Assert.Equal(entry.Value.GetDouble(), ToleranceFactor.OneLimit(int.Parse(entry.Name, CultureInfo.InvariantCulture), fraction, 0.95), tolerance + 1e-9));

    /// <summary>
    /// D. B. Owen, Factors for one-sided tolerance limits, SCR-607 (1963): 2.065 for 50 tests, as quoted with all digits by groskwik/Owen. The
    /// others are the exact factors of Odeh and Owen (1980), from memory; the handbook above prints 3.408, 3.007 and 2.583 for three of them.
    /// </summary>
    [Theory]
    [InlineData(50, 0.95, 2.064993399768, 1e-7)]
    [InlineData(3, 0.90, 6.155, 0.0005)]
    [InlineData(5, 0.90, 3.407, 0.0005)]
    [InlineData(6, 0.90, 3.006, 0.0005)]
    [InlineData(8, 0.90, 2.582, 0.0005)]
    [InlineData(10, 0.90, 2.355, 0.0005)]
    [InlineData(2, 0.95, 26.260, 0.0005)]
    [InlineData(10, 0.95, 2.911, 0.0005)]
    [InlineData(30, 0.95, 2.220, 0.0005)]
    public void One_limit_is_exact(int count, double fraction, double factor, double tolerance) =>
        Assert.Equal(factor, ToleranceFactor.OneLimit(count, fraction, 0.95), tolerance);

    [Fact]
    public void Two_limits_are_the_published_table()
    {
        double[] fractions = [0.90, 0.95, 0.99];
        Assert.All(Table.GetProperty("twoLimits").EnumerateObject(), entry => Digits.Printed(
            [.. entry.Value.EnumerateArray().Select(k => k.GetDouble())],
            fractions.Select(fraction => ToleranceFactor.TwoLimits(int.Parse(entry.Name, CultureInfo.InvariantCulture), fraction, 0.95)), 2));
    }

    /// <summary>Without noncentrality it is Student's distribution, which MathNet has, if only to 5e-9 near 0.</summary>
    [Fact]
    public void Without_noncentrality_it_is_students_t() =>
        Gen.Select(Gen.Double[0.05, 30], Gen.Int[1, 2_000]).Sample((t, degrees) => Assert.Equal(StudentT.CDF(0, 1, degrees, t), NoncentralT.Below(t, degrees, 0), 1e-10));

    /// <summary>With one degree of freedom and t = 0, and in the mirror: P(T ≤ 0) = Φ(−δ), P(T ≤ t; δ) = 1 − P(T ≤ −t; −δ).</summary>
    [Fact]
    public void Mirrored_it_is_the_rest() =>
        Gen.Select(Gen.Double[-60, 60], Gen.Int[1, 500], Gen.Double[-40, 40]).Sample((t, degrees, delta) =>
            Assert.Equal(1 - NoncentralT.Below(-t, degrees, -delta), NoncentralT.Below(t, degrees, delta), 1e-11));

    [Fact]
    public void A_quantile_is_where_its_share_lies_below() =>
        Gen.Select(Gen.Double[1e-4, 1 - 1e-4], Gen.Int[1, 3_000], Gen.Double[-60, 60]).Sample((p, degrees, delta) =>
            Assert.Equal(p, NoncentralT.Below(NoncentralT.Quantile(p, degrees, delta), degrees, delta), 1e-9), iter: 50);

    [Theory]
    [InlineData(20_000, 0.9, 0.05)]
    [InlineData(20_000, 0.5, 0.5)]
    public void A_large_lot_has_nearly_the_normal_quantile(int count, double fraction, double risk) =>
        Assert.Equal(Normal.InvCDF(0, 1, fraction), ToleranceFactor.OneLimit(count, fraction, risk), 0.02);
}
