using Drypeak.Soil.Laboratory;
using Drypeak.Soil.Quantities;
using Xunit;
using static Drypeak.Soil.Tests.Laboratory.Ternmarsh;

namespace Drypeak.Soil.Tests.Laboratory;

/// <summary>A specimen may begin at any stage. By hand: 1,980 g in 1,000 cm³ with 10 % water are 1,980 kg/m³ wet and 1,800 kg/m³ dry.</summary>
public class SpecimenReductionTests
{
    private static readonly Mold Liter = new() { Mass = Grams(4000), Volume = Volume.From(1, VolumeUnit.Liter) };
    private static readonly SpecimenMeasurement Nothing = new() { Label = "1" };
    private static readonly SpecimenMeasurement Water = Nothing with { WaterContent = WaterContent.FromPercent(10) };

    public static TheoryData<string, SpecimenMeasurement> Stages => new()
    {
        { "mold and wet soil", Water with { MoldAndWetSoil = Grams(5980) } },
        { "wet mass", Water with { WetMass = Grams(1980) } },
        { "wet density", Water with { WetDensity = new Density(1980) } },
        { "dry density", Water with { DryDensity = new Density(1800) } },
        { "wet and dry density", Nothing with { WetDensity = new Density(1980), DryDensity = new Density(1800) } },
        { "wet mass and dry density", Nothing with { WetMass = Grams(1980), DryDensity = new Density(1800) } },
        { "one tin", Nothing with { WetMass = Grams(1980), Tins = [Tin(20, 130, 120)] } },
        { "two tins, 9 and 11 %", Nothing with { WetMass = Grams(1980), Tins = [Tin(20, 129, 120), Tin(20, 131, 120)] } },
        { "number on wet mass", Nothing with { WetMass = Grams(1980), WaterContentFromWetBasis = WaterContent.FromPercentOfWetMass(100.0 / 11) } },
        { "carbide tester", Nothing with { WetMass = Grams(1980), WaterContentFromCarbide = CarbideTester.WaterContent(100.0 / 11, halfSample: false) } },
        { "carbide tester, half a sample", Nothing with { WetMass = Grams(1980), WaterContentFromCarbide = CarbideTester.WaterContent(50.0 / 11, halfSample: true) } },
        { "every stage at once", Water with { MoldAndWetSoil = Grams(5980), WetMass = Grams(1980), WetDensity = new Density(1980), DryDensity = new Density(1800), Tins = [Tin(20, 130, 120)] } },
    };

    [Theory]
    [MemberData(nameof(Stages))]
    public void Every_stage_leads_to_the_same_specimen(string stage, SpecimenMeasurement measured)
    {
        Assert.NotEmpty(stage);
        var specimen = Reduce(measured, Liter);
        Assert.Equal(10, specimen.WaterContent.Percent, 1e-10);
        Assert.Equal(1980, specimen.WetDensity.KilogramsPerCubicMeter, 1e-9);
        Assert.Equal(1800, specimen.DryDensity.KilogramsPerCubicMeter, 1e-9);
    }

    [Fact]
    public void The_water_content_is_the_mean_over_tins_not_over_their_masses()
    {
        // 10 % on 100 g and 20 % on 10 g: the mean is 15 %, the pooled masses would say 10.9 %.
        var specimen = Reduce(Nothing with { WetMass = Grams(1980), Tins = [Tin(20, 130, 120), Tin(20, 32, 30)] }, Liter);
        Assert.Equal(15, specimen.WaterContent.Percent, 1e-10);
    }

    public static TheoryData<string, Mold> Molds => new()
    {
        { "volume", Liter },
        { "diameter and height", new() { Mass = Grams(4000), Diameter = new Length(0.1), Height = new Length(0.004 / (Math.PI * 0.01)) } },
        { "water, without a plate", new() { WaterFilling = new(Grams(4000), Grams(4998), null, new Density(998)) } },
        { "water, with a plate", new() { WaterFilling = new(Grams(4310), Grams(5308), Grams(310), new Density(998)) } },
        { "water, the mass given as well", new() { Mass = Grams(4000), WaterFilling = new(Grams(4000), Grams(4998), null, new Density(998)) } },
    };

    [Theory]
    [MemberData(nameof(Molds))]
    public void A_mold_is_known_by_volume_by_dimensions_or_by_water(string way, Mold mold)
    {
        Assert.NotEmpty(way);
        var specimen = Reduce(Water with { MoldAndWetSoil = Grams(5980) }, mold);
        Assert.Equal(1000, specimen.MoldVolume!.Value.In(VolumeUnit.CubicCentimeter), 1e-9);
        Assert.Equal(1800, specimen.DryDensity.KilogramsPerCubicMeter, 1e-9);
    }

    [Fact]
    public void A_specimens_own_mold_stands_over_the_tests()
    {
        var own = new Mold { Mass = Grams(3000), Volume = Volume.From(2, VolumeUnit.Liter) };
        var specimen = Reduce(Water with { MoldAndWetSoil = Grams(6960), Mold = own }, Liter);
        Assert.Equal(1800, specimen.DryDensity.KilogramsPerCubicMeter, 1e-9);
        Assert.Equal(2, specimen.MoldVolume!.Value.In(VolumeUnit.Liter), 1e-12);
    }

    [Fact]
    public void What_a_specimens_own_mold_leaves_out_is_the_tests()
    {
        var lighter = Reduce(Water with { MoldAndWetSoil = Grams(5480), Mold = new Mold { Mass = Grams(3500) } }, Liter);
        Assert.Equal(1800, lighter.DryDensity.KilogramsPerCubicMeter, 1e-9);
        var larger = Reduce(Water with { MoldAndWetSoil = Grams(7960), Mold = new Mold { Volume = Volume.From(2, VolumeUnit.Liter) } }, Liter);
        Assert.Equal(1800, larger.DryDensity.KilogramsPerCubicMeter, 1e-9);
    }

    [Fact]
    public void A_volume_of_the_specimens_own_is_not_held_against_the_dimensions_of_the_tests()
    {
        var test = new Mold { Mass = Grams(4000), Diameter = new Length(0.1), Height = new Length(0.12) };
        var specimen = Reduce(Water with { MoldAndWetSoil = Grams(5980), Mold = new Mold { Volume = Volume.From(1, VolumeUnit.Liter) } }, test);
        Assert.Equal(1, specimen.MoldVolume!.Value.In(VolumeUnit.Liter), 1e-12);
    }

    [Fact]
    public void Without_masses_no_mold_is_named()
    {
        var specimen = Reduce(Water with { DryDensity = new Density(1800) }, Liter);
        Assert.Null(specimen.MoldVolume);
    }

    public static TheoryData<string, SpecimenMeasurement, Mold?, string, string> Missing => new()
    {
        { "water content", Nothing with { WetDensity = new Density(1980) }, Liter, "not-enough-data", "water content" },
        { "any density", Water, Liter, "not-enough-data", "Nothing gives the density" },
        { "mass of the mold", Water with { MoldAndWetSoil = Grams(5980) }, Liter with { Mass = null }, "not-enough-data", "mass of the mold" },
        { "mold", Water with { MoldAndWetSoil = Grams(5980) }, null, "not-enough-data", "mass of the mold" },
        { "volume", Water with { WetMass = Grams(1980) }, new Mold { Mass = Grams(4000) }, "not-enough-data", "volume" },
        { "mold for a wet mass", Water with { WetMass = Grams(1980) }, null, "not-enough-data", "volume of the mold" },
        { "height", Water with { WetMass = Grams(1980) }, new Mold { Diameter = new Length(0.1) }, "not-enough-data", "mold.height" },
    };

    [Theory]
    [MemberData(nameof(Missing))]
    public void What_is_missing_is_a_fault_that_names_it(string what, SpecimenMeasurement measured, Mold? mold, string code, string words)
    {
        Assert.NotEmpty(what);
        var fault = Assert.Single(FaultsOf(measured, mold));
        Assert.Equal("/specimens/0", fault.Place);
        Assert.Equal(code, fault.Code);
        Assert.Contains(words, fault.Message, StringComparison.Ordinal);
    }

    public static TheoryData<string, SpecimenMeasurement, string> BeyondRange => new()
    {
        { "tins", Nothing with { WetMass = Grams(1980), Tins = [Tin(20, 1131, 120)] }, "/specimens/0/tins" },
        { "number on wet mass", Nothing with { WetMass = Grams(1980), WaterContentFromWetBasis = WaterContent.FromPercentOfWetMass(91) }, "/specimens/0/wetBasis" },
        { "wet and dry density", Nothing with { WetDensity = new Density(1980), DryDensity = new Density(179) }, "/specimens/0/dryDensity" },
        { "dry density, millions of times a soil's", Water with { WetMass = new Mass(1.2e7) }, "/specimens/0" },
        { "dry density, a millionth of a soil's", Water with { WetMass = new Mass(1e-9) }, "/specimens/0" },
    };

    [Theory]
    [MemberData(nameof(BeyondRange))]
    public void A_value_that_no_slip_of_units_explains_is_refused_at_its_place(string what, SpecimenMeasurement measured, string place)
    {
        Assert.NotEmpty(what);
        var fault = Assert.Single(FaultsOf(measured, Liter));
        Assert.Equal((place, "out-of-range"), (fault.Place, fault.Code));
        Assert.Matches(@"\d", fault.Message);
    }

    [Fact]
    public void A_slip_of_units_by_a_million_is_left_to_the_findings()
    {
        var cubicMeters = Liter with { Volume = new Volume(1000) };
        Assert.Equal(1.8e-3, Reduce(Water with { WetMass = Grams(1980) }, cubicMeters).DryDensity.KilogramsPerCubicMeter, 1e-12);
        Assert.Equal(10, Reduce(Nothing with { WetMass = Grams(1980), Tins = [Tin(20, 1120, 120)] }, Liter).WaterContent.Fraction, 1e-12);
    }

    [Fact]
    public void A_full_mold_no_heavier_than_the_empty_one_is_a_contradiction_with_both_masses()
    {
        var fault = Assert.Single(FaultsOf(Water with { MoldAndWetSoil = Grams(4000) }, Liter));
        Assert.Equal(("/specimens/0/moldAndWetSoil", "contradiction"), (fault.Place, fault.Code));
        Assert.Contains("4000 g", fault.Message, StringComparison.Ordinal);
    }

    [Fact]
    public void A_dry_density_above_the_wet_one_is_a_contradiction_with_both()
    {
        var fault = Assert.Single(FaultsOf(Nothing with { WetDensity = new Density(1700), DryDensity = new Density(1800) }, null));
        Assert.Equal(("/specimens/0/dryDensity", "contradiction"), (fault.Place, fault.Code));
        Assert.Contains("1.800 Mg/m³", fault.Message, StringComparison.Ordinal);
        Assert.Contains("1.700 Mg/m³", fault.Message, StringComparison.Ordinal);
    }

    [Fact]
    public void A_specimen_that_cannot_be_reduced_leaves_its_place_and_the_others_stand()
    {
        var faults = new List<Fault>();
        var specimens = MoistureDensity.Reduce(Clay.With(2, specimen => specimen with { DryDensity = null }), faults);
        Assert.Equal([false, false, true, false, false], specimens.Select(specimen => specimen is null));
        Assert.Equal("/specimens/2", Assert.Single(faults).Place);
    }

    private static Specimen Reduce(SpecimenMeasurement measured, Mold? mold) => Assert.Single(Bench.Reduce(Clay with { Specimens = [measured], Mold = mold }));

    private static IReadOnlyList<Fault> FaultsOf(SpecimenMeasurement measured, Mold? mold) => Bench.FaultsOf(Clay with { Specimens = [measured], Mold = mold });
}
