using Drypeak.Soil.Laboratory;
using Drypeak.Soil.Quantities;
using Xunit;
using static Drypeak.Soil.Tests.Laboratory.Ternmarsh;

namespace Drypeak.Soil.Tests.Laboratory;

/// <summary>
/// Whatever is given twice must agree: densities, masses and volumes to 0.2 %, water contents to 0.1 percentage points. The limit itself still
/// agrees, to 1e-9 of it.
/// </summary>
public class GivenTwiceTests
{
    private const double JustWithin = 1 + 9e-10;
    private const double JustBeyond = 1 + 2e-9;

    private static readonly Mold Liter = new() { Mass = Grams(4000), Volume = Volume.From(1, VolumeUnit.Liter) };
    private static readonly Mold InMold = new() { Mass = Grams(4000), Diameter = new Length(0.1), Height = new Length(0.12) };
    private static readonly SpecimenMeasurement Base = new() { Label = "1", WetMass = Grams(1980), WaterContent = WaterContent.FromPercent(10) };

    /// <summary>What is given twice, its place, and the specimen and mold in which the second differs from the first by so large a share of the limit.</summary>
    public static TheoryData<string, string, Func<double, (SpecimenMeasurement Specimen, Mold Mold)>> Pairs => new()
    {
        { "wet mass against mold and wet soil", "/specimens/0/wetMass", limits => (Base with { MoldAndWetSoil = Grams(5980), WetMass = new Mass(1.98 * (1 + (0.002 * limits))) }, Liter) },
        { "wet density against mass and volume", "/specimens/0/wetDensity", limits => (Base with { WetDensity = new Density(1980 * (1 + (0.002 * limits))) }, Liter) },
        { "dry density against wet density and water", "/specimens/0/dryDensity", limits => (Base with { DryDensity = new Density(1800 * (1 + (0.002 * limits))) }, Liter) },
        { "dimensions against volume", "/mold", limits => (Base, Liter with { Diameter = new Length(0.1), Height = new Length(0.004 / (Math.PI * 0.01) * (1 + (0.002 * limits))) }) },
        { "readings of the diameter against the diameter", "/mold/diameters", limits => (Base, InMold with { Diameter = Readings(0.1, 0.1 * (1 + (0.002 * limits))) }) },
        { "readings of the height against the height", "/mold/heights", limits => (Base, InMold with { Height = Readings(0.12, 0.12 * (1 + (0.002 * limits))) }) },
        { "readings of the depth against the depth, by the mold's height", "/specimens/0/depthsBelowRim", limits => (Base with { DepthBelowRim = Readings(0.003, 0.003 + (0.12 * 0.002 * limits)) }, InMold) },
        { "water filling against volume", "/mold", limits => (Base, Liter with { WaterFilling = new WaterFilling(new Mass(4), new Mass(4 + (1 + (0.002 * limits))), null, new Density(1000)) }) },
        { "water content against tins", "/specimens/0/waterContent", limits => (Base with { Tins = [Tin(20, 130, 120)], WaterContent = new WaterContent(0.1 + (0.001 * limits)) }, Liter) },
        { "number on wet mass against water content", "/specimens/0/wetBasis", limits => (Base with { WaterContentFromWetBasis = new WaterContent(0.1 + (0.001 * limits)) }, Liter) },
        { "carbide against water content", "/specimens/0/carbide", limits => (Base with { WaterContentFromCarbide = new WaterContent(0.1 + (0.001 * limits)) }, Liter) },
    };

    [Theory]
    [MemberData(nameof(Pairs))]
    public void At_the_limit_the_two_agree(string what, string place, Func<double, (SpecimenMeasurement Specimen, Mold Mold)> differing)
    {
        Assert.NotEmpty(what + place);
        Assert.Empty(FaultsOf(differing(JustWithin)));
        Assert.Empty(FaultsOf(differing(-JustWithin)));
    }

    [Theory]
    [MemberData(nameof(Pairs))]
    public void Beyond_the_limit_the_two_contradict_each_other_at_the_place_of_the_second(
        string what, string place, Func<double, (SpecimenMeasurement Specimen, Mold Mold)> differing)
    {
        Assert.NotEmpty(what);
        foreach (var limits in new[] { JustBeyond, -JustBeyond })
        {
            var fault = Assert.Single(FaultsOf(differing(limits)));
            Assert.Equal((place, "contradiction"), (fault.Place, fault.Code));
        }
    }

    [Theory]
    [MemberData(nameof(Pairs))]
    public void The_message_says_by_how_much_and_what_is_allowed(
        string what, string place, Func<double, (SpecimenMeasurement Specimen, Mold Mold)> differing)
    {
        Assert.NotEmpty(place);
        var message = Assert.Single(FaultsOf(differing(3))).Message;
        var (apart, allowed) = what.Contains("water content", StringComparison.Ordinal) ? ("0.30 percentage points apart", "0.1 is allowed") : ("0.60 % apart", "0.2 % is allowed");
        Assert.Contains(apart, message, StringComparison.Ordinal);
        Assert.Contains(allowed, message, StringComparison.Ordinal);
    }

    [Fact]
    public void The_message_speaks_the_callers_units()
    {
        var message = Assert.Single(Bench.FaultsOf(Clay with
        {
            Specimens = [Base with { WetDensity = new Density(2200) }],
            Mold = Liter,
            Units = new UnitSet(Density: DensityUnit.PoundPerCubicFoot),
        })).Message;
        Assert.Contains("123.6 lb/ft³", message, StringComparison.Ordinal);
        Assert.Contains("137.3 lb/ft³", message, StringComparison.Ordinal);
        Assert.Contains("11.11 % apart", message, StringComparison.Ordinal);
    }

    [Fact]
    public void All_contradictions_of_a_test_come_at_once()
    {
        var twice = Base with { WetDensity = new Density(2200), Tins = [Tin(20, 140, 120)] };
        var faults = Bench.FaultsOf(Clay with { Specimens = [twice, twice with { Label = "2" }], Mold = Liter });
        Assert.Equal(
            ["/specimens/0/waterContent", "/specimens/0/wetDensity", "/specimens/1/waterContent", "/specimens/1/wetDensity"],
            faults.Select(fault => fault.Place));
    }

    [Fact]
    public void A_contradiction_in_the_tests_mold_is_said_once_for_all_its_specimens()
    {
        var mold = Liter with { Diameter = new Length(0.1), Height = new Length(0.14) };
        var fault = Assert.Single(Bench.FaultsOf(Clay with { Specimens = [Base, Base with { Label = "2" }], Mold = mold }));
        Assert.Equal("/mold", fault.Place);
    }

    [Fact]
    public void A_contradiction_in_a_specimens_own_mold_stands_at_that_mold()
    {
        var own = Base with { Mold = Liter with { Diameter = new Length(0.1), Height = new Length(0.14) } };
        Assert.Equal("/specimens/0/mold", Assert.Single(Bench.FaultsOf(Clay with { Specimens = [own], Mold = Liter })).Place);
    }

    /// <summary>A length, and two readings whose mean is another.</summary>
    private static MeasuredLength Readings(double given, double mean) => new() { Given = new Length(given), Readings = [new Length(mean * 0.999), new Length(mean * 1.001)] };

    private static IReadOnlyList<Fault> FaultsOf((SpecimenMeasurement Specimen, Mold Mold) given) =>
        Bench.FaultsOf(Clay with { Specimens = [given.Specimen], Mold = given.Mold });
}
