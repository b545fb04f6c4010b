using CsCheck;
using Drypeak.Soil.Earthwork;
using Drypeak.Soil.Quantities;
using Xunit;

namespace Drypeak.Soil.Tests.Earthwork;

public sealed class TestStripTests
{
    private static readonly EarthworkUnits Units = new(new UnitSet());

    private static readonly Gen<GrowthCurve> AnyCurve =
        from limit in Gen.Double[1700, 2200]
        from reserve in Gen.Double[50, 500]
        from passes in Gen.Double[0.8, 8]
        select new GrowthCurve(limit, reserve, passes);

    [Fact]
    public void Readings_on_a_growth_curve_give_it_back() => AnyCurve.Sample(curve =>
    {
        var fitted = GrowthCurve.Fit([.. new[] { 2.0, 4, 6, 8, 12 }.Select(passes => (passes, curve.At(passes)))])!;
        Assert.Equal(curve.Passes, fitted.Passes, 1e-6 * curve.Passes);
        Assert.Equal(curve.Limit, fitted.Limit, 1e-6 * curve.Limit);
        Assert.Equal(curve.Reserve, fitted.Reserve, 1e-5 * curve.Reserve);
    });

    [Fact]
    public void One_pass_more_gains_less_than_the_amount_after_the_passes_needed_and_not_before() =>
        Gen.Select(AnyCurve, Gen.Double[0.1, 30]).Sample((curve, amount) =>
        {
            var needed = curve.PassesUntilGainBelow(amount);
            Assert.True(curve.GainAfter(needed) < amount * (1 + 1e-8));
            Assert.True(needed == 1 || curve.GainAfter(needed - 1) >= amount * (1 - 1e-8));
            Assert.Equal(curve.GainAfter(needed), curve.At(needed + 1) - curve.At(needed), 1e-9);
        });

    [Fact]
    public void Order_and_units_of_the_readings_do_not_matter() =>
        Gen.Select(AnyCurve, Gen.Double[-15, 15].Array[12], Gen.Int[0, 1000]).Sample((curve, noise, turn) =>
        {
            var readings = noise.Select((off, i) => ((double)(2 + (2 * (i / 3))), curve.At(2 + (2 * (i / 3))) + off)).ToList();
            var scaled = readings.OrderBy(reading => (reading.Item2 * turn) % 17).Select(reading => (reading.Item1, reading.Item2 * (1 + 1e-15))).ToList();
            var (one, other) = (GrowthCurve.Fit(readings), GrowthCurve.Fit(scaled));
            Assert.Equal(one is null, other is null);
            if (one is { } first && other is { } second)
            {
                Assert.Equal(first.At(5), second.At(5), 1e-9 * first.Limit);
                Assert.Equal(first.GainAfter(8), second.GainAfter(8), 1e-9 * first.Limit);
            }
        });

    [Fact]
    public void The_target_is_the_mean_of_what_was_read_from_the_passes_needed_on()
    {
        var strip = new TestStrip([Stage(2, 1700, 1710), Stage(4, 1800, 1790), Stage(6, 1830, 1826), Stage(8, 1836, 1840), Stage(10, 1842, 1838)], new Density(10));
        Assert.Equal(6, strip.PassesNeeded);
        Assert.Equal((1830 + 1826 + 1836 + 1840 + 1842 + 1838) / 6.0, strip.Target!.DryDensity.KilogramsPerCubicMeter, 1e-9);
        Assert.Equal(6, strip.Target.Readings);
    }

    [Theory]
    [InlineData("too-few-passes", new double[] { 1700, 1780 })]
    [InlineData("still-gaining", new double[] { 1700, 1740, 1780 })]
    [InlineData("density-falls", new double[] { 1700, 1800, 1830, 1780 })]
    [InlineData("no-growth", new double[] { 1800, 1780, 1760 })]
    [InlineData("no-growth", new double[] { 1800, 1800, 1800 })]
    public void What_a_strip_lacks_is_found(string code, double[] means)
    {
        var findings = Review([.. means.Select((mean, i) => Stage(2 * (i + 1), mean - 3, mean, mean + 3))]);
        Assert.Contains(code, findings);
        Assert.DoesNotContain("too-few-readings", findings);
    }

    [Fact]
    public void Readings_after_a_fall_are_left_out_of_curve_and_target()
    {
        StripStage[] growing = [Stage(2, 1700, 1704, 1696), Stage(4, 1790, 1794, 1786), Stage(6, 1822, 1826, 1818), Stage(8, 1832, 1836, 1828)];
        var (before, after) = (new TestStrip(growing, new Density(12)), new TestStrip([.. growing, Stage(10, 1790, 1786, 1794), Stage(12, 1850, 1846, 1854)], new Density(12)));
        Assert.Equal(before.Curve, after.Curve);
        Assert.Equal(before.Target, after.Target);
        Assert.Equal(before.PassesNeeded, after.PassesNeeded);
    }

    [Fact]
    public void A_strip_that_levels_off_gives_a_careful_reviewer_nothing_to_ask() =>
        Assert.Empty(Review([Stage(2, 1700, 1704, 1696), Stage(4, 1790, 1794, 1786), Stage(6, 1822, 1826, 1818), Stage(8, 1832, 1836, 1828)]));

    [Fact]
    public void A_fall_within_the_spread_is_none() =>
        Assert.Empty(Review([Stage(2, 1700, 1704, 1696), Stage(4, 1790, 1794, 1786), Stage(6, 1826, 1856, 1796), Stage(8, 1812, 1842, 1782)]));

    [Fact]
    public void Single_readings_are_found() => Assert.Contains("too-few-readings", Review([Stage(2, 1700), Stage(4, 1790), Stage(6, 1822), Stage(8, 1832)]));

    private static StripStage Stage(int passes, params double[] densities) => new(passes, [.. densities.Select(density => new Density(density))]);

    private static List<string> Review(IReadOnlyList<StripStage> stages) =>
        [.. new TestStrip(stages, new Density(12)).Review(_ => "", Units).Select(finding => finding.Code)];
}
