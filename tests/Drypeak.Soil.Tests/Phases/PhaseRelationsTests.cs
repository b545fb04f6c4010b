using CsCheck;
using Drypeak.Soil.Laboratory;
using Drypeak.Soil.Phases;
using Drypeak.Soil.Quantities;
using Xunit;

namespace Drypeak.Soil.Tests.Phases;

/// <summary>The phase relations as laws: they hold for any soil, not for chosen numbers.</summary>
public class PhaseRelationsTests
{
    private static readonly Gen<Soil> Soils = Gen.Select(
        Gen.Double[0.001, 0.6], Gen.Double[2.2, 3.2], Gen.Double[950, 1050], Gen.Double[0.2, 0.999],
        (w, gs, water, saturation) => new Soil(new WaterContent(w), gs, new Density(water), saturation));

    [Fact]
    public void A_worked_example_by_hand()
    {
        // Gs 2.70, ρw 1000, ρd 1800, w 15 %: e = 2700/1800 − 1 = 0.5; n = 1/3; Sr = 0.15·2.7/0.5 = 0.81; A = (1 − 0.81)/3.
        var phases = Specimen(1800, 0.15).PhasesWith(2.7, new Density(1000))!;
        Assert.Equal(0.5, phases.VoidRatio, 1e-12);
        Assert.Equal(1.0 / 3, phases.Porosity, 1e-12);
        Assert.Equal(0.81, phases.Saturation, 1e-12);
        Assert.Equal(0.19 / 3, phases.AirVoids, 1e-12);
    }

    [Fact]
    public void Dry_and_wet_density_are_each_the_others_inverse() =>
        Soils.Sample(soil =>
        {
            var dry = soil.OnLine(soil.Saturation);
            Near(dry.KilogramsPerCubicMeter, PhaseRelations.DryDensity(PhaseRelations.WetDensity(dry, soil.W), soil.W).KilogramsPerCubicMeter);
        });

    [Fact]
    public void A_point_on_a_line_of_saturation_has_that_saturation() =>
        Soils.Sample(soil => Assert.Equal(soil.Saturation, soil.At(soil.OnLine(soil.Saturation)).Saturation, 1e-10));

    [Fact]
    public void On_the_zero_air_voids_line_the_voids_are_full_and_there_is_no_air() =>
        Soils.Sample(soil =>
        {
            var phases = soil.At(PhaseRelations.OnZeroAirVoidsLine(soil.W, soil.Gs, soil.Water));
            Assert.Equal(1, phases.Saturation, 1e-10);
            Assert.Equal(0, phases.AirVoids, 1e-12);
        });

    [Fact]
    public void Air_voids_are_porosity_times_what_water_leaves() =>
        Soils.Sample(soil =>
        {
            var phases = soil.At(soil.OnLine(soil.Saturation));
            Assert.Equal(phases.Porosity * (1 - phases.Saturation), phases.AirVoids, 1e-12);
        });

    [Fact]
    public void A_point_on_a_line_of_air_voids_has_those_air_voids() =>
        Gen.Select(Soils, Gen.Double[0, 0.3]).Sample((soil, airVoids) =>
        {
            var dry = PhaseRelations.OnAirVoidsLine(soil.W, airVoids, soil.Gs, soil.Water);
            Assert.Equal(airVoids, PhaseRelations.AirVoids(soil.W, dry, soil.Gs, soil.Water), 1e-12);
        });

    [Fact]
    public void The_lines_of_full_saturation_and_of_no_air_voids_are_one() =>
        Soils.Sample(soil => Near(
            PhaseRelations.OnSaturationLine(soil.W, 1, soil.Gs, soil.Water).KilogramsPerCubicMeter,
            PhaseRelations.OnAirVoidsLine(soil.W, 0, soil.Gs, soil.Water).KilogramsPerCubicMeter));

    [Fact]
    public void Solids_water_and_air_fill_the_volume() =>
        Soils.Sample(soil =>
        {
            var dry = soil.OnLine(soil.Saturation).KilogramsPerCubicMeter;
            var solids = dry / (soil.Gs * soil.Water.KilogramsPerCubicMeter);
            var water = soil.W.Fraction * dry / soil.Water.KilogramsPerCubicMeter;
            Assert.Equal(1, solids + water + soil.At(new Density(dry)).AirVoids, 1e-12);
        });

    [Fact]
    public void A_line_falls_with_water_and_rises_with_saturation_and_specific_gravity() =>
        Soils.Sample(soil =>
        {
            var here = soil.OnLine(soil.Saturation).KilogramsPerCubicMeter;
            Assert.True((soil with { W = new WaterContent(soil.W.Fraction + 0.01) }).OnLine(soil.Saturation).KilogramsPerCubicMeter < here);
            Assert.True(soil.OnLine(soil.Saturation * 1.001).KilogramsPerCubicMeter > here);
            Assert.True((soil with { Gs = soil.Gs + 0.01 }).OnLine(soil.Saturation).KilogramsPerCubicMeter > here);
        });

    [Fact]
    public void The_smallest_specific_gravity_puts_the_point_on_the_zero_air_voids_line() =>
        Soils.Sample(soil =>
        {
            var dry = PhaseRelations.OnZeroAirVoidsLine(soil.W, soil.Gs, soil.Water);
            Near(soil.Gs, PhaseRelations.SmallestSpecificGravity(soil.W, dry, soil.Water));
        });

    [Fact]
    public void No_specific_gravity_fits_a_point_whose_water_alone_fills_the_volume() =>
        Assert.Equal(double.PositiveInfinity, PhaseRelations.SmallestSpecificGravity(new WaterContent(0.5), new Density(2100), new Density(1000)));

    [Theory]
    [InlineData(null)]
    [InlineData(1.8)] // solids of 1800 kg/m³: no voids are left
    [InlineData(1.5)]
    public void There_are_no_phases_without_solids_denser_than_the_specimen(double? specificGravity) =>
        Assert.Null(Specimen(1800, 0.1).PhasesWith(specificGravity, new Density(1000)));

    [Theory]
    [InlineData(-0.001)]
    [InlineData(40.001)]
    [InlineData(double.NaN)]
    public void The_density_of_water_is_refused_outside_0_to_40_degrees(double celsius) =>
        Assert.Throws<ArgumentOutOfRangeException>(() => WaterDensity.At(celsius));

    [Fact]
    public void Water_is_densest_near_4_degrees_and_thinner_the_warmer() =>
        Gen.Select(Gen.Double[4, 39.9], Gen.Double[0.05, 0.1]).Sample((celsius, step) =>
            Assert.True(WaterDensity.At(celsius + step).KilogramsPerCubicMeter < WaterDensity.At(celsius).KilogramsPerCubicMeter));

    private static Specimen Specimen(double dry, double w) =>
        new("1", new WaterContent(w), new Density(dry * (1 + w)), new Density(dry), null, null, null);

    private static void Near(double expected, double actual) => Assert.Equal(expected, actual, Math.Abs(expected) * 1e-12);

    private sealed record Soil(WaterContent W, double Gs, Density Water, double Saturation)
    {
        public Density OnLine(double saturation) => PhaseRelations.OnSaturationLine(W, saturation, Gs, Water);

        public Drypeak.Soil.Laboratory.Phases At(Density dry) => Specimen(dry.KilogramsPerCubicMeter, W.Fraction).PhasesWith(Gs, Water)!;
    }
}
