using CsCheck;
using Drypeak.Soil.Laboratory;
using Drypeak.Soil.Quantities;
using Xunit;

namespace Drypeak.Soil.Tests.Laboratory;

/// <summary>The correction for oversize (ASTM D4718; AASHTO T 99 annex / T 224). Published cases stand beside the other published ones.</summary>
public class OversizeCorrectionTests
{
    private static readonly Density Water = new(998.2);

    private static readonly Gen<(DensityAndWater Fines, double Share, double Gravity, WaterContent Coarse)> Any = Gen.Select(
        Gen.Double[1300, 2300], Gen.Double[0.02, 0.4], Gen.Double[0.001, 0.6], Gen.Double[2.3, 3.2], Gen.Double[0, 0.05],
        (dry, w, share, gravity, coarse) => (new DensityAndWater(new Density(dry), new WaterContent(w)), share, gravity, new WaterContent(coarse)));

    [Fact]
    public void What_is_corrected_to_the_total_comes_back_to_the_fines() =>
        Any.Sample((fines, share, gravity, coarse) =>
        {
            var total = OversizeCorrection.ToTotal(fines, share, gravity, coarse, Water);
            var back = OversizeCorrection.ToFines(total, share, gravity, coarse, Water)!.Value;
            Assert.Equal(fines.DryDensity.KilogramsPerCubicMeter, back.DryDensity.KilogramsPerCubicMeter, 1e-8);
            Assert.Equal(fines.WaterContent.Fraction, back.WaterContent.Fraction, 1e-12);
        });

    [Fact]
    public void The_total_lies_between_the_fines_and_the_oversize() =>
        Any.Sample((fines, share, gravity, coarse) =>
        {
            var total = OversizeCorrection.ToTotal(fines, share, gravity, coarse, Water);
            Assert.InRange(total.DryDensity.KilogramsPerCubicMeter, Math.Min(fines.DryDensity.KilogramsPerCubicMeter, gravity * 998.2), Math.Max(fines.DryDensity.KilogramsPerCubicMeter, gravity * 998.2));
            Assert.InRange(total.WaterContent.Fraction, Math.Min(coarse.Fraction, fines.WaterContent.Fraction), Math.Max(coarse.Fraction, fines.WaterContent.Fraction));
        });

    [Fact]
    public void Volumes_add_and_masses_add() =>
        Any.Sample((fines, share, gravity, coarse) =>
        {
            // A tonne of dry solids: its volume is that of its fines and that of its stones.
            var total = OversizeCorrection.ToTotal(fines, share, gravity, coarse, Water);
            Assert.Equal(
                (1000 * (1 - share) / fines.DryDensity.KilogramsPerCubicMeter) + (1000 * share / (gravity * 998.2)),
                1000 / total.DryDensity.KilogramsPerCubicMeter,
                1e-12);
        });

    [Fact]
    public void No_oversize_changes_nothing()
    {
        var fines = new DensityAndWater(new Density(1858), new WaterContent(0.14));
        var total = OversizeCorrection.ToTotal(fines, 0, 2.65, new WaterContent(0.02), Water);
        Assert.Equal(1858, total.DryDensity.KilogramsPerCubicMeter, 1e-9);
        Assert.Equal(0.14, total.WaterContent.Fraction, 1e-15);
    }

    [Theory]
    [InlineData(2700, 0.1)] // denser than its stones at this share
    [InlineData(1900, 0.004)] // less water than the stones alone hold
    public void There_are_no_fines_where_the_oversize_would_be_everything(double dry, double w) =>
        Assert.Null(OversizeCorrection.ToFines(new DensityAndWater(new Density(dry), new WaterContent(w)), 0.99, 2.65, new WaterContent(0.01), Water));

    [Theory]
    [InlineData(4.75, 0.40)] // ASTM D4718; AASHTO T 99 annex
    [InlineData(19.0, 0.30)]
    [InlineData(37.5, 0.30)]
    [InlineData(null, 0.30)]
    public void The_procedure_holds_to_so_large_a_share(double? sieve, double share) =>
        Assert.Equal(share, OversizeCorrection.LargestShare(sieve));

    [Fact]
    public void A_test_without_a_peak_or_without_the_gravity_of_its_oversize_has_no_corrected_peak()
    {
        var oversize = new Oversize(0.1, 2.65, new WaterContent(0.01), 4.75);
        Assert.NotNull(Bench.Analyze(Ternmarsh.Clay with { Oversize = oversize }).Corrected);
        Assert.Null(Bench.Analyze(Ternmarsh.Clay with { Oversize = oversize with { SpecificGravity = null } }).Corrected);
        Assert.Null(Bench.Analyze(Ternmarsh.Points((10, 1700), (12, 1770), (14, 1840)) with { Oversize = oversize }).Corrected);
        Assert.Null(Bench.Analyze(Ternmarsh.Clay).Corrected);
    }

    [Fact]
    public void An_adopted_peak_is_what_is_corrected()
    {
        var adopted = new AdoptedPeak(WaterContent.FromPercent(13), new Density(1900), "drawn by hand");
        var corrected = Bench.Analyze(Ternmarsh.Clay with { Adopted = adopted, Oversize = new Oversize(0.1, 2.65, new WaterContent(0.01), 4.75) }).Corrected!.Value;
        // 1/(0.9/1900 + 0.1/(2.65·998.207)) = 1955.08 kg/m³; 0.9·13 + 0.1·1 = 11.8 %.
        Assert.Equal(1955.08, corrected.DryDensity.KilogramsPerCubicMeter, 0.005);
        Assert.Equal(11.8, corrected.WaterContent.Percent, 1e-10);
    }
}
