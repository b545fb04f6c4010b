using CsCheck;
using Drypeak.Soil.Acceptance;
using Drypeak.Soil.FieldDensity;
using Drypeak.Soil.Laboratory;
using Drypeak.Soil.Quantities;
using Xunit;

namespace Drypeak.Soil.Tests.FieldDensity;

public sealed class FieldLawTests
{
    private static readonly MeasuredWater NoWater = new([], null, null, null);

    private static readonly Gen<JudgedSoil> Stony =
        from dry in Gen.Double[1500, 2300]
        from w in Gen.Double[0.05, 0.25]
        from most in Gen.Double[1600, 2200]
        from share in Gen.Double[0.01, 0.35]
        from gravity in Gen.Double[2.5, 2.8]
        select new JudgedSoil
        {
            DryDensity = dry,
            WaterContent = w,
            MaximumDryDensity = most,
            OptimumWaterContent = 0.12,
            WaterDensity = 1000,
            Oversize = new Oversize(share, gravity, new WaterContent(0.01), 19),
        };

    /// <summary>
    /// Both corrections keep the order of densities, so that they agree on 100 % of the maximum: the total is denser than the corrected
    /// reference exactly where the fines are denser than the laboratory's. Below 100 % the two ratios differ, since the stones dilute the lack.
    /// </summary>
    [Fact]
    public void Corrected_on_either_side_a_soil_reaches_the_maximum_or_does_not() => Stony.Where(soil => (soil with { OnFines = true }).Fines is { }).Sample(soil =>
    {
        var onTotal = soil.ValueOf(AcceptedQuantity.RelativeCompaction)!.Value;
        var onFines = (soil with { OnFines = true }).ValueOf(AcceptedQuantity.RelativeCompaction)!.Value;
        Assert.True(Math.Abs(onTotal - 1) < 1e-9 || onTotal > 1 == onFines > 1, $"{onTotal} and {onFines}");
        Assert.True(Math.Abs(onTotal - 1) <= Math.Abs(onFines - 1) + 1e-9);
    });

    [Fact]
    public void Dry_of_the_optimum_on_one_side_is_dry_on_the_other() => Stony.Where(soil => (soil with { OnFines = true }).Fines is { }).Sample(soil =>
    {
        var onTotal = soil.ValueOf(AcceptedQuantity.WaterContentFromOptimum)!.Value;
        var onFines = (soil with { OnFines = true }).ValueOf(AcceptedQuantity.WaterContentFromOptimum)!.Value;
        Assert.Equal(onTotal, onFines * (1 - soil.Oversize!.Fraction), 1e-12);
    });

    [Fact]
    public void Twice_the_soil_out_of_twice_the_hole_is_the_same_soil() =>
        Gen.Select(Gen.Double[0.5, 5], Gen.Double[0.3, 3], Gen.Double[0, 0.4], Gen.Double[0.1, 10]).Sample((mass, volume, w, scale) =>
        {
            var (one, other) = (Reduced(mass, volume, w), Reduced(mass * scale, volume * scale, w));
            Assert.Equal(1, one.DryDensity!.Value.KilogramsPerCubicMeter / other.DryDensity!.Value.KilogramsPerCubicMeter, 1e-12);
        });

    [Fact]
    public void Sand_and_balloon_on_one_hole_agree() =>
        Gen.Select(Gen.Double[0.5, 5], Gen.Double[0.001, 0.01], Gen.Double[1300, 1700], Gen.Double[0.5, 2]).Sample((mass, volume, sand, cone) =>
        {
            var bySand = Reduced(new SandCone { Poured = new SandPoured(new Mass(20 + cone + (sand * volume)), new Mass(20), new Mass(cone)), SandDensity = new Density(sand) }, mass, 0.1);
            var byBalloon = Reduced(new RubberBalloon(new Volume(0.0002), new Volume(0.0002 + volume)), mass, 0.1);
            Assert.Equal(1, bySand.DryDensity!.Value.KilogramsPerCubicMeter / byBalloon.DryDensity!.Value.KilogramsPerCubicMeter, 1e-9);
        });

    /// <summary>A gauge with an offset from pairs reads what the oven would have read on those pairs, where they agree among themselves.</summary>
    [Fact]
    public void An_offset_brings_its_own_pair_to_the_oven() =>
        Gen.Select(Gen.Double[0.02, 0.4], Gen.Double[0.02, 0.4]).Sample((gauge, oven) =>
            Assert.Equal(oven, MoistureOffset.Of([new OvenPair(new WaterContent(gauge), new WaterContent(oven))]).Applied(new WaterContent(gauge)).Fraction, 1e-12));

    /// <summary>First order against trials (JCGM 101:2008): readings drawn anew about their means, 20,000 times from a stated seed. A standard deviation of so many is good to 0.5 %.</summary>
    [Theory]
    [InlineData(true)]
    [InlineData(false)]
    public void The_readings_spread_is_carried_as_trials_carry_it(bool asMassOfWater)
    {
        double[] wet = [2010, 2040, 2026], water = asMassOfWater ? [221, 232, 226] : [0.121, 0.128, 0.126];
        OvenPair[] pairs = [new(new(0.12), new(0.112)), new(new(0.14), new(0.135)), new(new(0.13), new(0.124))];
        JudgedSoil Judged(double[] densities, double[] waters, OvenPair[] offsets) => FieldAnalysis.Analyze(
            new FieldTest
            {
                Method = new NuclearGauge
                {
                    WetDensity = [.. densities.Select(density => new Density(density))],
                    WaterDensity = asMassOfWater ? [.. waters.Select(density => new Density(density))] : [],
                    WaterContent = asMassOfWater ? [] : [.. waters.Select(w => new WaterContent(w))],
                    OvenPairs = offsets,
                },
                Water = NoWater,
                WaterDensity = new Density(998.2),
                Reference = new ReferenceValues { MaximumDryDensity = new Density(1900), OptimumWaterContent = new WaterContent(0.12) },
            }, [])!.Judged;

        var judged = Judged(wet, water, pairs);
        var (ofWet, ofWater, offset) = (ReadingSpread.Of("", true, wet), ReadingSpread.Of("", false, water), MoistureOffset.Of(pairs));
        var random = new MathNet.Numerics.Random.MersenneTwister(20_240_602);
        double Drawn(double mean, double u) => MathNet.Numerics.Distributions.Normal.Sample(random, mean, u);
        var trials = Enumerable.Range(0, 20_000).Select(_ =>
        {
            // A pair that gives exactly the drawn offset: K = 1000(o − g)/(100 + g) with g = 10 %.
            var k = Drawn(offset.K, offset.StandardUncertainty!.Value);
            return Judged([Drawn(ofWet.Mean, ofWet.StandardUncertainty!.Value)], [Drawn(ofWater.Mean, ofWater.StandardUncertainty!.Value)], [new(new(0.10), new(0.10 + (k * 1.1 / 1000)))]);
        }).ToList();
        foreach (var quantity in new[] { AcceptedQuantity.DryDensity, AcceptedQuantity.WaterContent, AcceptedQuantity.WetDensity, AcceptedQuantity.RelativeCompaction, AcceptedQuantity.WaterContentFromOptimum })
        {
            var values = trials.Select(trial => trial.ValueOf(quantity)!.Value).ToList();
            var mean = values.Average();
            var deviation = Math.Sqrt(values.Sum(value => (value - mean) * (value - mean)) / (values.Count - 1));
            Assert.Equal(1, judged.StandardUncertaintyOf(quantity, new FieldUncertainty())!.Value / deviation, 0.025);
        }
    }

    private static SoilInPlace Reduced(double kilograms, double liters, double w) => Reduced(new DriveCylinder(new Volume(liters / 1000), null, null), kilograms, w);

    private static SoilInPlace Reduced(FieldMethod method, double kilograms, double w)
    {
        var faults = new List<Fault>();
        var result = FieldAnalysis.Analyze(
            new FieldTest
            {
                Method = method,
                Soil = new SoilWeighed(null, null, new Mass(kilograms), null),
                Water = NoWater with { Given = new WaterContent(w) },
                WaterDensity = new Density(998.2),
            }, faults);
        Assert.Empty(faults);
        return result!.Soil;
    }
}
