using Drypeak.Soil.Tests.Laboratory;
using Xunit;

namespace Drypeak.Soil.Tests.Published;

/// <summary>
/// Mistakes that stand in published answers: ρ·(1 − w) for ρ/(1 + w), and water content on wet mass. Each is far enough from the right
/// value on these data that a slip would show.
/// </summary>
public class PublishedMistakes
{
    public static TheoryData<string> Tests => [.. PublishedTests.All.Except(["P13"])]; // P13 begins at dry densities

    [Theory]
    [MemberData(nameof(Tests))]
    public void Dry_density_is_wet_over_one_plus_w_never_wet_times_one_less_w(string id) =>
        Assert.All(Bench.Reduce(PublishedTests.Of(id)), specimen =>
        {
            var (wet, dry, w) = (specimen.WetDensity.KilogramsPerCubicMeter, specimen.DryDensity.KilogramsPerCubicMeter, specimen.WaterContent.Fraction);
            Assert.Equal(wet / (1 + w), dry, dry * 1e-12);
            Assert.True(dry > 1.003 * wet * (1 - w));
        });

    [Theory]
    [InlineData("P05")]
    [InlineData("P06")]
    [InlineData("P15")]
    [InlineData("P17c")]
    public void Water_content_is_on_dry_mass_never_on_wet_mass(string id)
    {
        var test = PublishedTests.Of(id);
        Assert.All(test.Specimens.Zip(Bench.Reduce(test)), pair =>
        {
            var tins = pair.First.Tins;
            var onWetMass = tins.Average(tin => (tin.TinAndWetSoil - tin.TinAndDrySoil).Kilograms / (tin.TinAndWetSoil - tin.Tin).Kilograms);
            Assert.True(pair.Second.WaterContent.Fraction > onWetMass + 0.003);
            Assert.Equal(
                tins.Average(tin => (tin.TinAndWetSoil.Kilograms - tin.TinAndDrySoil.Kilograms) / (tin.TinAndDrySoil.Kilograms - tin.Tin.Kilograms)),
                pair.Second.WaterContent.Fraction,
                1e-12);
        });
    }
}
