using CsCheck;
using Drypeak.Soil.Laboratory;
using Drypeak.Soil.Quantities;
using Xunit;
using static Drypeak.Soil.Tests.Laboratory.Ternmarsh;

namespace Drypeak.Soil.Tests.Laboratory;

/// <summary>A mold by several readings of its dimensions, and soil that ends below its rim.</summary>
public class MoldVolumeTests
{
    private static readonly SpecimenMeasurement Full = new() { Label = "1", WetMass = Grams(1980), WaterContent = WaterContent.FromPercent(10) };
    private static readonly Mold Cylinder = new() { Diameter = Readings(151.9, 152.0, 152.1), Height = Readings(126.9, 127.1) };

    [Fact]
    public void The_mean_of_the_readings_makes_the_volume()
    {
        var specimen = Reduce(Full, Cylinder);
        Assert.Equal(Math.PI / 4 * 0.152 * 0.152 * 0.127, specimen.MoldVolume!.Value.CubicMeters, 1e-15);
        Assert.Equal(specimen.MoldVolume, specimen.SoilVolume);
    }

    [Fact]
    public void A_number_given_beside_readings_is_what_counts()
    {
        var specimen = Reduce(Full, Cylinder with { Diameter = Cylinder.Diameter! with { Given = new Length(0.1521) } });
        Assert.Equal(Math.PI / 4 * 0.1521 * 0.1521 * 0.127, specimen.MoldVolume!.Value.CubicMeters, 1e-15);
    }

    /// <summary>π/4·d²·(h − z): a cylinder less high by the depth, 127 − 4.2 mm.</summary>
    [Fact]
    public void Soil_that_ends_below_the_rim_fills_the_rest_of_the_cylinder()
    {
        var specimen = Reduce(Full with { DepthBelowRim = Readings(4.1, 4.4, 4.1) }, Cylinder);
        var soil = Math.PI / 4 * 0.152 * 0.152 * 0.1228;
        Assert.Equal(soil, specimen.SoilVolume!.Value.CubicMeters, 1e-15);
        Assert.Equal(1.98 / soil, specimen.WetDensity.KilogramsPerCubicMeter, 1e-9);
        Assert.Equal(Math.PI / 4 * 0.152 * 0.152 * 0.127, specimen.MoldVolume!.Value.CubicMeters, 1e-15);
    }

    [Fact]
    public void A_volume_measured_otherwise_is_lessened_in_the_same_proportion()
    {
        var calibrated = Volume.OfCylinder(new Length(0.152), new Length(0.127)).CubicMeters * 1.001;
        var specimen = Reduce(Full with { DepthBelowRim = new Length(0.0127) }, Cylinder with { Volume = new Volume(calibrated) });
        Assert.Equal(calibrated * 0.9, specimen.SoilVolume!.Value.CubicMeters, 1e-15);
    }

    [Fact]
    public void Density_rises_with_the_depth_and_is_the_molds_own_at_none() =>
        Gen.Select(Gen.Double[0.1, 0.2], Gen.Double[0.0, 0.09], Gen.Double[0.001, 0.009]).Sample((height, depth, more) =>
        {
            double Density(double z) => Reduce(Full with { DepthBelowRim = new Length(z) }, new Mold { Diameter = new Length(0.15), Height = new Length(height) }).WetDensity.KilogramsPerCubicMeter;
            Assert.True(Density(depth + more) > Density(depth));
            Assert.Equal(1.98 / Volume.OfCylinder(new Length(0.15), new Length(height)).CubicMeters, Density(0), 1e-9);
        });

    [Fact]
    public void A_depth_without_the_molds_height_is_missing_data_at_the_depth()
    {
        var fault = FaultOf(Full with { DepthBelowRim = Readings(3) }, new Mold { Volume = new Volume(0.0023) });
        Assert.Equal(("/specimens/0/depthsBelowRim", "not-enough-data"), (fault.Place, fault.Code));
    }

    [Theory]
    [InlineData(0.127)]
    [InlineData(0.2)]
    public void Nothing_is_left_of_soil_that_ends_below_the_bottom(double depth)
    {
        var fault = FaultOf(Full with { DepthBelowRim = new Length(depth) }, Cylinder);
        Assert.Equal(("/specimens/0/depthBelowRim", "contradiction"), (fault.Place, fault.Code));
        Assert.Contains("127 mm", fault.Message, StringComparison.Ordinal);
    }

    /// <summary>One error of the mold's volume is one error of the soil's in proportion, so that the density's share stays the same.</summary>
    [Fact]
    public void The_uncertainty_of_the_volume_is_carried_to_soil_below_the_rim()
    {
        var test = Weighed with
        {
            Mold = new Mold { Mass = Weighed.Mold!.Mass, Diameter = new Length(0.1016), Height = new Length(0.11632) },
            Uncertainty = new MeasurementUncertainty { Volume = Volume.From(3, VolumeUnit.CubicCentimeter) },
        };
        double Relative(MoistureDensityTest any) => Bench.Analyze(any) is { Propagated: { } propagated, Curve.Chosen.Optimum: { } optimum }
            ? propagated.MaximumDryDensity / optimum.MaximumDryDensity.Value
            : double.NaN;
        var below = test.WithEach(specimen => specimen with { DepthBelowRim = new Length(0.004) });
        Assert.Equal(Relative(test), Relative(below), 0.02 * Relative(test));
    }

    [Fact]
    public void Measured_lengths_are_equal_where_every_reading_is()
    {
        Assert.Equal(Readings(1, 2), Readings(1, 2));
        Assert.Equal(Readings(1, 2).GetHashCode(), Readings(1, 2).GetHashCode());
        Assert.NotEqual(Readings(1, 2), Readings(2, 1));
        Assert.NotEqual(Readings(1), new Length(0.001));
    }

    private static MeasuredLength Readings(params double[] millimeters) => new() { Readings = [.. millimeters.Select(reading => Length.From(reading, LengthUnit.Millimeter))] };

    private static Specimen Reduce(SpecimenMeasurement specimen, Mold mold) => Bench.Reduce(Clay with { Specimens = [specimen], Mold = mold })[0];

    private static Fault FaultOf(SpecimenMeasurement specimen, Mold mold) => Assert.Single(Bench.FaultsOf(Clay with { Specimens = [specimen], Mold = mold }));
}
