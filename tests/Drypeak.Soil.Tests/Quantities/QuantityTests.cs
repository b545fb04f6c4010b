using CsCheck;
using Drypeak.Soil.Laboratory;
using Drypeak.Soil.Quantities;
using Xunit;

namespace Drypeak.Soil.Tests.Quantities;

public class QuantityTests
{
    [Fact]
    public void A_density_is_mass_over_volume() =>
        Assert.Equal(1887.5, ((new Mass(6.2) - new Mass(4.69)) / new Volume(0.0008)).KilogramsPerCubicMeter, 1e-9);

    [Fact]
    public void A_cylinder_of_105_by_115_5_millimeters_holds_a_liter() => // BS 1377-4, one-liter mold
        Assert.Equal(1000.1, Volume.OfCylinder(Length.From(105, LengthUnit.Millimeter), Length.From(115.5, LengthUnit.Millimeter)).In(VolumeUnit.CubicCentimeter), 0.05);

    [Fact]
    public void A_water_content_on_wet_mass_becomes_one_on_dry_mass_and_comes_back() =>
        Gen.Double[0.01, 99].Sample(r =>
        {
            var w = WaterContent.FromPercentOfWetMass(r);
            Assert.True(w.Percent > r);
            Assert.Equal(r, 100 * w.Fraction / (1 + w.Fraction), 1e-11);
        });

    [Theory]
    [InlineData(12, false, 13.636363636363637)] // AASHTO T 217: w = 100·r/(100 − r)
    [InlineData(6, true, 13.636363636363637)]
    [InlineData(0, false, 0)]
    public void A_carbide_reading_is_on_wet_mass_and_counts_twice_for_a_half_sample(double reading, bool half, double percent) =>
        Assert.Equal(percent, CarbideTester.WaterContent(reading, half).Percent, 1e-12);

    [Theory]
    [InlineData(DensityUnit.MegagramPerCubicMeter, "1.832 Mg/m³")]
    [InlineData(DensityUnit.GramPerCubicCentimeter, "1.832 g/cm³")]
    [InlineData(DensityUnit.KilogramPerCubicMeter, "1832 kg/m³")]
    [InlineData(DensityUnit.PoundPerCubicFoot, "114.3 lb/ft³")]
    [InlineData(DensityUnit.KilonewtonPerCubicMeter, "17.96 kN/m³")]
    public void A_density_in_a_sentence_has_the_decimals_of_its_unit(DensityUnit unit, string text) =>
        Assert.Equal(text, ReaderText.Of(new Density(1831.7), unit));

    [Fact]
    public void Numbers_in_a_sentence_have_a_point_and_a_real_minus()
    {
        Assert.Equal("13.94 %", ReaderText.Of(new WaterContent(0.1394)));
        Assert.Equal("943.3 cm³", ReaderText.Of(Volume.From(943.3, VolumeUnit.CubicCentimeter), VolumeUnit.CubicCentimeter));
        Assert.Equal("6021.4 g", ReaderText.Of(Mass.From(6021.4, MassUnit.Gram), MassUnit.Gram));
        Assert.Equal("3.1 %", ReaderText.Percent(0.031));
        Assert.Equal("−0.50", ReaderText.Fixed(-0.5, 2));
        Assert.Equal("−2.68", ReaderText.Significant(-2.68));
    }
}
