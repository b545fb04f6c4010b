using System.Globalization;
using CsCheck;
using Drypeak.Soil.Acceptance.Statistics;
using Drypeak.Soil.Tests.Published;
using MathNet.Numerics;
using Xunit;

namespace Drypeak.Soil.Tests.Acceptance;

public sealed class PercentWithinLimitsTests
{
    /// <summary>
    /// FHWA T 5080.12, table 1B: the printed Q gives its PWL to within what half a digit of Q moves it. A column for several n is for one
    /// within it. Two misprinted cells are left out in the file: n = 15 to 18 at 62 %, and the other one the file does not name.
    /// </summary>
    [Fact]
    public void The_quality_index_is_the_published_table()
    {
        var compared = 0;
        foreach (var column in PublishedFile.Read("percent-within-limits.json").GetProperty("Q").EnumerateObject())
        {
            var ends = column.Name.Split('-').Select(n => int.Parse(n, CultureInfo.InvariantCulture)).ToList();
            foreach (var row in column.Value.EnumerateObject())
            {
                var share = double.Parse(row.Name, CultureInfo.InvariantCulture) / 100;
                var (low, high) = (PercentWithinLimits.QualityIndexOf(share, ends[^1]), PercentWithinLimits.QualityIndexOf(share, ends[0]));
                Assert.InRange(row.Value.GetDouble(), Math.Min(low, high) - 0.00501, Math.Max(low, high) + 0.00501);
                compared++;
            }
        }

        Assert.Equal(125, compared);
    }

    /// <summary>MathNet's regularized incomplete beta, n 3 to 100.</summary>
    [Fact]
    public void The_share_is_the_regularized_beta()
    {
        for (var n = 3; n <= 100; n++)
        {
            for (var q = -3.0; q <= 3; q += 0.05)
            {
                var x = Math.Clamp(0.5 - (q * Math.Sqrt(n) / (2 * (n - 1))), 0, 1);
                Assert.Equal(1 - SpecialFunctions.BetaRegularized((n / 2.0) - 1, (n / 2.0) - 1, x), PercentWithinLimits.OfOneLimit(q, n), 1e-14);
            }
        }
    }

    /// <summary>n = 4: the beta distribution is uniform, and the share ½ + Q/3. n = 3: the arc sine, ½ + asin(Q√3/2)/π.</summary>
    [Fact]
    public void Of_three_and_four_the_share_has_a_closed_form() => Gen.Double[-1.1, 1.1].Sample(q =>
    {
        Assert.Equal(0.5 + (q / 3), PercentWithinLimits.OfOneLimit(q, 4), 1e-12);
        Assert.Equal(0.5 + (Math.Asin(q * Math.Sqrt(3) / 2) / Math.PI), PercentWithinLimits.OfOneLimit(q, 3), 1e-9);
    });

    [Fact]
    public void A_share_turned_round_is_itself() => Gen.Select(Gen.Double[0.001, 0.999], Gen.Int[3, 5_000]).Sample((share, n) =>
        Assert.Equal(share, PercentWithinLimits.OfOneLimit(PercentWithinLimits.QualityIndexOf(share, n), n), 1e-9));

    [Fact]
    public void Two_limits_give_the_sum_less_one_and_never_less_than_nothing() =>
        Gen.Select(Gen.Double[-4, 4], Gen.Double[-4, 4], Gen.Int[3, 200]).Sample((lower, upper, n) =>
        {
            var share = PercentWithinLimits.Of(lower, upper, n);
            Assert.InRange(share, 0, 1);
            Assert.Equal(Math.Max(0, PercentWithinLimits.OfOneLimit(lower, n) + PercentWithinLimits.OfOneLimit(upper, n) - 1), share, 1e-15);
        });
}
