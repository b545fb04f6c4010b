using CsCheck;
using Drypeak.Soil.Curves;
using Drypeak.Soil.Quantities;
using Drypeak.Soil.References;
using Xunit;

namespace Drypeak.Soil.Tests.References;

public sealed class ReferenceLawTests
{
    private const DensityUnit Unit = DensityUnit.KilogramPerCubicMeter;

    private static readonly IReadOnlyList<FamilyCurve> Family =
    [
        Curve("A", 0.12, 1900), Curve("B", 0.14, 1800), Curve("C", 0.16, 1700), Curve("D", 0.185, 1600),
    ];

    private static readonly Gen<RapidSpecimen[]> Peaked =
        from top in Gen.Double[0.005, 0.025]
        from most in Gen.Double[1900, 2200]
        from fall in Gen.Double[30_000, 120_000]
        select new[] { -0.01, 0.015, 0.04 }.Select(z => new RapidSpecimen(z, new Density((most - (fall * (z - top) * (z - top))) * (1 + z)))).ToArray();

    [Fact]
    public void A_point_on_a_member_gives_that_member() =>
        Gen.Select(Gen.Int[0, 3], Gen.Double[0.8, 1]).Sample((member, share) =>
        {
            var curve = Family[member];
            var w = curve.Optimum.WaterContent * share;
            var result = OnePoint.Select(Family, new CompactionPoint(w, curve.DensityAt(w)), Unit);
            Assert.Equal(curve.Optimum, result.Optimum);
            Assert.Equal([curve], result.Between);
            Assert.Equal(share, result.ShareOfOptimum!.Value, 1e-12);
        });

    [Fact]
    public void The_curve_between_two_goes_through_the_point() =>
        Gen.Select(Gen.Int[0, 2], Gen.Double[0.01, 0.99], Gen.Double[0.8, 1]).Sample((first, blend, share) =>
        {
            var (denser, lighter) = (Family[first], Family[first + 1]);
            double Between(double one, double other) => one + (blend * (other - one));
            var (w, most) = (Between(denser.Optimum.WaterContent, lighter.Optimum.WaterContent), Between(denser.Optimum.DryDensity, lighter.Optimum.DryDensity));
            var point = new CompactionPoint(share * w, most * Between(denser.ShapeAt(share), lighter.ShapeAt(share)));
            var result = OnePoint.Select(Family, point, Unit);
            Assert.Equal(blend, result.Blend!.Value, 1e-9);
            Assert.Equal(w, result.Optimum!.Value.WaterContent, 1e-10);
            Assert.Equal(most, result.Optimum.Value.DryDensity, 1e-6);
        });

    [Fact]
    public void Shifting_densities_by_a_unit_shifts_the_optimum_by_it() =>
        Gen.Select(Gen.Double[0.2, 5], Gen.Double[1.01, 1.04]).Sample((scale, above) =>
        {
            List<FamilyCurve> scaled = [.. Family.Select(curve => Curve(curve.Label, curve.Optimum.WaterContent, curve.Optimum.DryDensity * scale))];
            var point = new CompactionPoint(0.128, 1700 * above);
            var (one, other) = (OnePoint.Select(Family, point, Unit), OnePoint.Select(scaled, point with { DryDensity = point.DryDensity * scale }, Unit));
            Assert.Equal(one.Optimum!.Value.WaterContent, other.Optimum!.Value.WaterContent, 1e-9);
            Assert.Equal(one.Optimum.Value.DryDensity * scale, other.Optimum.Value.DryDensity, 1e-6);
        });

    /// <summary>Dry density is the converted wet density over 1 + w whatever w is: the ratio of wet densities is that of dry ones.</summary>
    [Fact]
    public void The_rapid_ratio_is_the_relative_compaction_by_the_full_route() =>
        Gen.Select(Peaked, Gen.Double[0.05, 0.3], Gen.Double[1800, 2200]).Sample((specimens, w, field) =>
        {
            var rapid = RapidMethod.Compute(new Density(field), new WaterContent(w), specimens, Unit);
            var points = specimens.Select(specimen => new CompactionPoint(w + (specimen.WaterAdded * (1 + w)), specimen.Converted.KilogramsPerCubicMeter / (1 + w)));
            var peak = CompactionCurve.PeakOf(new CompactionData([.. points], null, 1000), CurveModel.Parabola)!.Value;
            Assert.Equal(field / (1 + w) / peak.DryDensity, rapid.DensityRatio!.Value, 1e-9);
            Assert.Equal(w - peak.WaterContent, rapid.WaterContentFromOptimum!.Value, 1e-9);
        });

    private static readonly Gen<RapidSpecimen[]> WellPeaked =
        from top in Gen.Double[0.01, 0.025]
        from most in Gen.Double[1900, 2200]
        from fall in Gen.Double[60_000, 150_000]
        from count in Gen.Int[4, 7]
        from noise in Gen.Double[-3, 3].Array[count]
        select Enumerable.Range(0, count).Select(i => -0.02 + (0.075 * i / (count - 1)))
            .Select((z, i) => new RapidSpecimen(z, new Density((most - (fall * (z - top) * (z - top)) + noise[i]) * (1 + z)))).ToArray();

    /// <summary>
    /// Four and more specimens are fitted as the laboratory fits them. Its fit knows water contents and dry densities, the rapid method only
    /// their shares of the wet mass: the two see one soil on two scales, and agree to 0.1 % of the ratio and 0.3 points of the water.
    /// </summary>
    [Fact]
    public void With_four_specimens_and_more_the_rapid_ratio_is_that_of_the_laboratory_s_fit() =>
        Gen.Select(WellPeaked, Gen.Double[0.08, 0.2], Gen.Double[1800, 2200]).Sample((specimens, w, field) =>
        {
            var rapid = RapidMethod.Compute(new Density(field), new WaterContent(w), specimens, Unit);
            var points = specimens.Select(specimen => new CompactionPoint(w + (specimen.WaterAdded * (1 + w)), specimen.Converted.KilogramsPerCubicMeter / (1 + w)));
            var peak = CompactionCurve.PeakOf(new CompactionData([.. points], null, 1000), CurveModel.Averaged);
            Assert.True(peak is { } && rapid.DensityRatio is { }, "no peak");
            Assert.Equal(1, field / (1 + w) / peak.Value.DryDensity / rapid.DensityRatio.Value, 1e-3);
            Assert.Equal(w - peak.Value.WaterContent, rapid.WaterContentFromOptimum!.Value, 3e-3);
        }, iter: 60);

    [Fact]
    public void The_rapid_ratio_does_not_hang_on_the_order_nor_on_the_unit_nor_on_the_water_content() =>
        Gen.Select(Peaked, Gen.Double[0.05, 0.3], Gen.Double[0.1, 10]).Sample((specimens, w, scale) =>
        {
            var one = RapidMethod.Compute(new Density(2000), new WaterContent(w), specimens, Unit).DensityRatio!.Value;
            var reversed = RapidMethod.Compute(new Density(2000), null, [.. specimens.Reverse()], Unit).DensityRatio!.Value;
            var scaled = RapidMethod.Compute(new Density(2000 * scale), null, [.. specimens.Select(specimen => specimen with { WetDensity = new Density(specimen.WetDensity.KilogramsPerCubicMeter * scale) })], Unit).DensityRatio!.Value;
            Assert.Equal(one, reversed, 1e-12);
            Assert.Equal(one, scaled, 1e-9);
        });

    [Fact]
    public void Relative_density_and_relative_compaction_give_each_other() =>
        Gen.Select(Gen.Double[1200, 1600], Gen.Double[20, 600], Gen.Double[-0.2, 1.2]).Sample((least, above, relative) =>
        {
            var limits = DensityLimits.OfDensities(least, least + above);
            var volume = limits.VolumeOfRelativeDensity(relative);
            Assert.Equal(relative, limits.RelativeDensityAt(volume), 1e-9);
            Assert.Equal(volume, limits.VolumeOfRelativeCompaction(limits.RelativeCompactionAt(volume)), 1e-12);

            // RC = R0/(1 − Dr(1 − R0)) with R0 the ratio of the limits (Lee and Singh's starting point; from memory).
            var r0 = least / (least + above);
            Assert.Equal(r0 / (1 - (relative * (1 - r0))), limits.RelativeCompactionAt(volume), 1e-9);
        });

    private static FamilyCurve Curve(string label, double optimum, double most) => new(label, new CompactionPoint(optimum, most),
        [.. new[] { 0.7, 0.85, 1.12 }.Select(share => new CompactionPoint(share * optimum, most * (1 - (0.9 * (share - 1) * (share - 1)))))]);
}
