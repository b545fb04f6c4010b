using CsCheck;
using Drypeak.Soil.Earthwork;
using Drypeak.Soil.Quantities;
using Xunit;

namespace Drypeak.Soil.Tests.Earthwork;

/// <summary>Bank, truck and fill hold the same solids, and water is neither lost nor gained.</summary>
public sealed class QuantitiesLawTests
{
    private static readonly Density Water = new(998.2071);

    private static readonly Gen<Fill> AnyFill =
        from volume in Gen.Double[1, 1e6]
        from density in Gen.Double[1200, 2300]
        from w in Gen.Double[0.02, 0.3]
        select new Fill(new Volume(volume), new Density(density), new WaterContent(w));

    private static readonly Gen<BorrowArea> AnyArea =
        from density in Gen.Double[1000, 2300]
        from w in Gen.Double[0, 0.4]
        from capacity in Gen.Double[1, 1e6]
        from distance in Gen.Double[100, 5000]
        select new BorrowArea("a", new Density(density), new WaterContent(w), new Volume(capacity), new Length(distance), null);

    private static readonly Gen<LooseSoil> AnyLoose = Gen.OneOf(
        Gen.Double[0, 0.6].Select(swell => new LooseSoil(null, null, swell, null)),
        Gen.Double[900, 1600].Select(dry => new LooseSoil(new Density(dry), null, null, null)),
        Gen.Double[900, 1600].Select(wet => new LooseSoil(null, new Density(wet), null, null)));

    private static readonly Gen<EarthQuantities> AnyQuantities =
        Gen.Select(AnyFill, AnyArea.Array[1, 5], AnyLoose).Select((fill, areas, loose) =>
            new EarthQuantities(fill, BorrowPlan.Draw(fill.DryMass, areas, loose, out var missing), missing, null, Water));

    [Fact]
    public void Bank_truck_and_fill_hold_the_same_solids() => AnyQuantities.Sample(quantities =>
    {
        var solids = quantities.Fill.DryMass.Kilograms;
        var drawn = quantities.Draws.Sum(draw => draw.DryMass.Kilograms);
        AssertRelative(solids, drawn + quantities.MissingSolids.Kilograms, solids);
        AssertRelative(drawn, quantities.Draws.Sum(draw => draw.BankVolume.CubicMeters * draw.Area.DryDensity.KilogramsPerCubicMeter), solids);
        AssertRelative(drawn, quantities.Draws.Sum(draw => draw.LooseVolume!.Value.CubicMeters * draw.Loose!.DryDensityOf(draw.Area).KilogramsPerCubicMeter), solids);
        AssertRelative(drawn, quantities.FillServed.CubicMeters * quantities.Fill.DryDensity.KilogramsPerCubicMeter, solids);
        AssertRelative(quantities.Fill.Volume.CubicMeters, quantities.FillServed.CubicMeters + quantities.FillMissing.CubicMeters, quantities.Fill.Volume.CubicMeters);
    });

    [Fact]
    public void Water_in_the_bank_and_water_added_are_the_water_in_the_fill() => AnyQuantities.Sample(quantities =>
    {
        var inFill = quantities.FillServed.CubicMeters * quantities.Fill.DryDensity.KilogramsPerCubicMeter * quantities.Fill.WaterContent!.Value.Fraction;
        AssertRelative(inFill, quantities.WaterMass.Kilograms + quantities.ToAdd!.Value.Mass.Kilograms, quantities.Fill.DryMass.Kilograms);
        AssertRelative(quantities.WetMass.Kilograms, quantities.WaterMass.Kilograms + quantities.Draws.Sum(draw => draw.DryMass.Kilograms), quantities.WetMass.Kilograms);
    });

    [Fact]
    public void The_two_definitions_of_shrinkage_and_of_swell_are_two_ratios_of_one_difference() => AnyQuantities.Sample(quantities =>
    {
        AssertRelative(1, (1 - quantities.ShrinkageOfBorrow) * (1 + quantities.ShrinkageOfFill), 1);
        AssertRelative(1, (1 - quantities.SwellOfLoose!.Value) * (1 + quantities.SwellOfBank!.Value), 1);
        AssertRelative(quantities.ShrinkageOfBorrow * quantities.BankVolume.CubicMeters, quantities.ShrinkageOfFill * quantities.FillServed.CubicMeters, quantities.BankVolume.CubicMeters);
    });

    [Fact]
    public void All_quantities_grow_with_the_fill_and_ratios_do_not() => Gen.Select(AnyFill, AnyArea, AnyLoose, Gen.Double[0.01, 100]).Sample((fill, area, loose, scale) =>
    {
        var endless = area with { Capacity = null };
        EarthQuantities Of(Fill of) => new(of, BorrowPlan.Draw(of.DryMass, [endless], loose, out var missing), missing, null, Water);
        var (one, other) = (Of(fill), Of(fill with { Volume = new Volume(fill.Volume.CubicMeters * scale) }));
        AssertRelative(one.BankVolume.CubicMeters * scale, other.BankVolume.CubicMeters, other.BankVolume.CubicMeters);
        AssertRelative(one.ToAdd!.Value.Mass.Kilograms * scale, other.ToAdd!.Value.Mass.Kilograms, other.Fill.DryMass.Kilograms);
        AssertRelative(one.ShrinkageOfBorrow, other.ShrinkageOfBorrow, 1);
        AssertRelative(one.SwellOfBank!.Value, other.SwellOfBank!.Value, 1);
    });

    [Fact]
    public void No_area_gives_more_than_it_has_and_a_farther_one_gives_only_once_the_nearer_are_empty() => AnyQuantities.Sample(quantities =>
    {
        Assert.All(quantities.Draws, draw => Assert.True(draw.BankVolume.CubicMeters <= draw.Area.Capacity!.Value.CubicMeters * (1 + 1e-12)));
        var byDistance = quantities.Draws.OrderBy(draw => draw.Area.HaulDistance!.Value.Meters).ToList();
        var firstLeft = byDistance.FindIndex(draw => draw.CapacityLeft!.Value.CubicMeters > 1e-9 * draw.Area.Capacity!.Value.CubicMeters);
        Assert.All(byDistance.Skip(firstLeft < 0 ? byDistance.Count : firstLeft + 1), draw => Assert.True(draw.DryMass.Kilograms <= 1e-9 * quantities.Fill.DryMass.Kilograms));
    });

    [Fact]
    public void Shares_are_kept_where_capacities_allow()
    {
        BorrowArea[] areas =
        [
            new("near", new Density(1600), new WaterContent(0.1), null, new Length(100), 0.25),
            new("far", new Density(1700), new WaterContent(0.1), new Volume(100), new Length(900), 0.75),
        ];
        var draws = BorrowPlan.Draw(new Mass(400_000), areas, null, out var missing);
        Assert.Equal(100_000, draws[0].DryMass.Kilograms, 1e-6);
        Assert.Equal(170_000, draws[1].DryMass.Kilograms, 1e-6);
        Assert.Equal(130_000, missing.Kilograms, 1e-6);
    }

    [Theory]
    [InlineData(10, 20_000, 12, 9, "volume")]   // 120 m³ loose, 162 t wet
    [InlineData(12, 10_000, 10, 17, "mass")]
    [InlineData(10, 13_500, 12, 12, "volume")]  // both are filled at once
    [InlineData(11, 16_000, 11, 11, "volume")]  // 10.9 and 10.1 loads: volume fills up first
    [InlineData(11.9, 15_000, 11, 11, "mass")]  // 10.08 and 10.8 loads
    public void The_bound_that_is_reached_first_governs(double volume, double mass, double byVolume, double byMass, string governing)
    {
        // 100 m³ of bank at 1.5 Mg/m³ dry and 8 %: 150 t of solids, 162 t wet; swell 20 %.
        var area = new BorrowArea("a", new Density(1500), new WaterContent(0.08), null, null, null);
        var loads = Truckloads.Sum([Truckloads.Of(new Draw(area, new Mass(150_000), new LooseSoil(null, null, 0.2, null)), new Truck(new Volume(volume), new Mass(mass)))])!;
        Assert.Equal((byVolume, byMass, governing), (loads.ByVolume, loads.ByMass, loads.VolumeGoverns ? "volume" : "mass"));
        Assert.Equal(Math.Max(byVolume, byMass), loads.Needed);
    }

    [Fact]
    public void Trucks_balance_a_loader_when_their_round_is_so_many_loadings()
    {
        var fleet = new Fleet(240, 120, Speed.From(30, SpeedUnit.KilometerPerHour), Speed.From(30, SpeedUnit.KilometerPerHour), null, 1);
        var cycle = fleet.Over(new Length(3000)); // 6 min each way: 4 + 6 + 2 + 6 = 18 min, of which 4 are loading
        Assert.Equal(1080, cycle.Seconds, 1e-9);
        Assert.Equal(4.5, cycle.BalancedTrucks, 1e-12);
        Assert.Equal(5, cycle.TrucksToBalance);
        Assert.Equal((15.0, FleetWait.Trucks), (cycle.LoadsPerHour, cycle.Waits));
        var fewer = (fleet with { Trucks = 3, Efficiency = 0.5 }).Over(new Length(3000));
        Assert.Equal(FleetWait.Loader, fewer.Waits);
        Assert.Equal(5, fewer.LoadsPerHour, 1e-12); // 3 trucks, 3.33 rounds an hour each, half of the hour
    }

    [Theory]
    [InlineData(2.5, 3)]
    [InlineData(3, 3)]
    [InlineData(3.000000001, 3)]
    [InlineData(3.00000001, 4)]
    [InlineData(2.9999999999, 3)]
    [InlineData(0.2, 1)]
    [InlineData(0, 0)]
    public void A_count_is_rounded_up_unless_it_is_whole_up_to_the_arithmetic(double quotient, double count) => Assert.Equal(count, Count.RoundedUp(quotient));

    private static void AssertRelative(double expected, double actual, double scale) => Assert.Equal(expected, actual, 1e-12 * Math.Abs(scale));
}
