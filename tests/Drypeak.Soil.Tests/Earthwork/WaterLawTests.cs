using CsCheck;
using Drypeak.Soil.Earthwork;
using Drypeak.Soil.Quantities;
using Xunit;

namespace Drypeak.Soil.Tests.Earthwork;

/// <summary>Water for specimens and lifts: solids and water are neither lost nor gained.</summary>
public sealed class WaterLawTests
{
    private static readonly Density Water = new(998.2071);
    private static readonly EarthworkUnits Units = new(new UnitSet());

    private static readonly Gen<Portion> AnyPortion =
        from mass in Gen.Double[0.01, 50]
        from present in Gen.Double[0, 0.6]
        from target in Gen.Double[0, 0.6]
        select new Portion("1", new Mass(mass), new WaterContent(present), new WaterContent(target));

    private static readonly Gen<Lift> AnyLift =
        from volume in Gen.Double[0.1, 1e6]
        from thickness in Gen.Double[0.05, 1]
        from density in Gen.Double[1000, 2300]
        from present in Gen.Double[0, 0.4]
        from target in Gen.Double[0, 0.4]
        from depth in Gen.Double[0, 0.01]
        select new Lift
        {
            Volume = new Volume(volume),
            Area = new Area(volume / thickness),
            DryDensity = new Density(density),
            Present = new WaterContent(present),
            Target = new WaterContent(target),
            EvaporatedDepth = new Length(depth),
        };

    [Fact]
    public void What_the_balance_shows_in_the_end_is_what_it_showed_and_the_water_added() => AnyPortion.Sample(portion =>
        AssertRelative(portion.FinalMass.Kilograms, portion.WetMass.Kilograms + portion.ToAdd(Water).Mass.Kilograms, portion.WetMass.Kilograms));

    [Fact]
    public void The_final_portion_has_its_target() => AnyPortion.Sample(portion =>
        AssertRelative(portion.Target.Fraction, (portion.FinalMass.Kilograms / portion.DryMass.Kilograms) - 1, 1));

    [Fact]
    public void Wetting_and_drying_back_gives_the_water_back() => AnyPortion.Sample(portion =>
    {
        var back = new Portion("2", portion.FinalMass, portion.Target, portion.Present);
        AssertRelative(0, portion.ToAdd(Water).Mass.Kilograms + back.ToAdd(Water).Mass.Kilograms, portion.WetMass.Kilograms);
        AssertRelative(portion.DryMass.Kilograms, back.DryMass.Kilograms, portion.DryMass.Kilograms);
    });

    [Fact]
    public void A_portion_at_its_target_needs_nothing_and_nothing_is_said() => AnyPortion.Sample(portion =>
    {
        var ready = portion with { Target = portion.Present };
        Assert.Equal(0, ready.ToAdd(Water).Mass.Kilograms);
        Assert.DoesNotContain(SpecimenWater.Review([ready], Water, _ => "", Units), finding => finding.Code == EarthworkFindingKinds.DryBack.Code);
    });

    [Fact]
    public void Wet_basis_taken_for_dry_basis_would_give_another_water() =>
        // 15 % of wet mass is 17.647 % of dry mass ("Lecture notes on wet-basis and dry-basis moisture", case MC1 of Published/field.json).
        Assert.Equal(0.17647, WaterContent.FromPercentOfWetMass(15).Fraction, 5e-6);

    [Fact]
    public void Solids_water_present_and_water_added_make_the_wetted_lift() => AnyLift.Sample(lift =>
    {
        var result = LiftWater.Compute(lift, Water);
        var evaporated = lift.Area!.Value.SquareMeters * lift.EvaporatedDepth.Meters * Water.KilogramsPerCubicMeter;
        var present = result.DryMass.Kilograms * lift.Present.Fraction;
        var wanted = result.DryMass.Kilograms * lift.Target.Fraction;
        AssertRelative(wanted, present + result.Total.Mass.Kilograms - evaporated, result.DryMass.Kilograms + evaporated);
        AssertRelative(result.Total.Mass.Kilograms, result.PerArea!.Value.Mass.Kilograms * lift.Area.Value.SquareMeters, result.DryMass.Kilograms);
        AssertRelative(result.Total.Mass.Kilograms, result.PerVolume.Mass.Kilograms * lift.Volume.CubicMeters, result.DryMass.Kilograms);
        AssertRelative(result.Total.Mass.Kilograms, result.Total.Volume.CubicMeters * Water.KilogramsPerCubicMeter, result.DryMass.Kilograms);
    });

    [Fact]
    public void Twice_the_lift_takes_twice_the_water_and_each_cubic_meter_as_much() => Gen.Select(AnyLift, Gen.Double[0.1, 10]).Sample((lift, scale) =>
    {
        var larger = lift with { Volume = new Volume(lift.Volume.CubicMeters * scale), Area = new Area(lift.Area!.Value.SquareMeters * scale) };
        var (one, other) = (LiftWater.Compute(lift, Water), LiftWater.Compute(larger, Water));
        AssertRelative(one.Total.Mass.Kilograms * scale, other.Total.Mass.Kilograms, other.DryMass.Kilograms);
        AssertRelative(one.PerVolume.Mass.Kilograms, other.PerVolume.Mass.Kilograms, lift.DryDensity.KilogramsPerCubicMeter);
    });

    [Fact]
    public void The_uncertainty_to_first_order_is_the_change_that_a_small_change_makes() => AnyLift.Sample(lift =>
    {
        const double small = 1e-6;
        var uncertain = LiftWater.Compute(lift with { UncertaintyOfPresent = new WaterContent(small) }, Water);
        var moved = LiftWater.Compute(lift with { Present = new WaterContent(lift.Present.Fraction + small) }, Water);
        Assert.Equal(uncertain.StandardUncertainty!.Value.Mass.Kilograms, uncertain.Total.Mass.Kilograms - moved.Total.Mass.Kilograms, 1e-9 * uncertain.DryMass.Kilograms);
        Assert.Null(LiftWater.Compute(lift, Water).StandardUncertainty);
    });

    [Fact]
    public void Independent_uncertainties_add_in_squares()
    {
        var lift = new Lift { Volume = new Volume(100), DryDensity = new Density(1800), Present = new WaterContent(0.1), Target = new WaterContent(0.14) };
        var both = lift with { UncertaintyOfPresent = new WaterContent(0.003), UncertaintyOfTarget = new WaterContent(0.004), UncertaintyOfDryDensity = new Density(30) };
        // 180 t of solids: 0.54 t and 0.72 t by the water contents, 100·0.04·30 kg = 0.12 t by the density.
        Assert.Equal(Math.Sqrt((540 * 540) + (720 * 720) + (120 * 120)), LiftWater.Compute(both, Water).StandardUncertainty!.Value.Mass.Kilograms, 1e-9);
    }

    [Theory]
    [InlineData(0.14, 8, 1)]    // 8 m³ of water in one tanker of 8
    [InlineData(0.14, 7.9, 2)]
    [InlineData(0.14, 2.6666666666666665, 3)] // a third of it, as far as a double goes
    [InlineData(0.10, 8, 0)]
    [InlineData(0.05, 8, 0)]
    public void Tankers_are_rounded_up_and_none_comes_to_a_lift_that_has_to_dry(double target, double tanker, double loads)
    {
        var lift = new Lift { Volume = new Volume(100), DryDensity = new Density(2000), Present = new WaterContent(0.1), Target = new WaterContent(target), Tanker = new Volume(tanker) };
        Assert.Equal(loads, LiftWater.Compute(lift, new Density(1000)).TankerLoads);
    }

    [Fact]
    public void Targets_stand_at_equal_distances_with_the_optimum_in_their_middle() =>
        Gen.Select(Gen.Double[0.02, 0.5], Gen.Int[1, 20], Gen.Double[0.005, 0.05]).Sample((optimum, count, spacing) =>
        {
            var targets = SpecimenTargets.Around(new WaterContent(optimum), count, new WaterContent(spacing)).Select(target => target.Fraction).ToList();
            Assert.Equal(count, targets.Count);
            Assert.Equal(optimum, targets.Average(), 1e-12);
            Assert.True(targets[0] >= (0.25 * optimum) - 1e-12);
            var steps = targets.Zip(targets.Skip(1), (one, next) => next - one).ToList();
            Assert.All(steps, step => Assert.Equal(steps[0], step, 1e-12));
            Assert.All(steps, step => Assert.InRange(step, 0, spacing + 1e-12));
        });

    /// <summary>Gurtug and Sridharan 2004, from memory: 0.92·20 and 22.68·e^(−0.366); no value of the paper's own was at hand.</summary>
    [Fact]
    public void A_plastic_limit_gives_the_estimate_of_its_formula()
    {
        var expected = ExpectedOptimum.FromPlasticLimit(WaterContent.FromPercent(20));
        Assert.Equal(18.4, expected.WaterContent.Percent, 1e-12);
        Assert.Equal(22.68 * Math.Exp(-0.366), expected.MaximumDryDensity!.Value.In(DensityUnit.KilonewtonPerCubicMeter), 1e-12);
    }

    private static void AssertRelative(double expected, double actual, double scale) => Assert.Equal(expected, actual, 1e-12 * scale);
}
