using Drypeak.Soil.Curves;
using Drypeak.Soil.Laboratory;
using Drypeak.Soil.Quantities;
using Xunit;
using static Drypeak.Soil.Tests.Laboratory.Ternmarsh;

namespace Drypeak.Soil.Tests.Laboratory;

/// <summary>
/// The propagation by trials against what first-order analysis gives on paper. A standard deviation from 2,000 trials is itself uncertain by
/// 1/√4000 = 1.6 %: the tolerances are three times that. The parabola is asked for where its peak has a closed form.
/// </summary>
public class UncertaintyPropagationTests
{
    private const double ThreeSigma = 0.048;

    /// <summary>A vertex at 14 % and 1,850 kg/m³; the parabola goes through all five points.</summary>
    private static readonly MoistureDensityTest Exact =
        Points((10, 1850 - (16 * 5)), (12, 1850 - (4 * 5)), (14, 1850), (16, 1850 - (4 * 5)), (18, 1850 - (16 * 5))) with { Model = CurveModel.Parabola };

    private static readonly MoistureDensityTest InTheMold = Exact.WithEach(specimen => specimen with
    {
        DryDensity = null,
        MoldAndWetSoil = new Mass(4.246 + (specimen.DryDensity!.Value.KilogramsPerCubicMeter * (1 + specimen.WaterContent!.Value.Fraction) * 943e-6)),
    }) with
    {
        Mold = Weighed.Mold,
    };

    [Fact]
    public void An_uncertain_volume_scales_the_whole_curve_and_leaves_the_optimum_where_it_is()
    {
        var propagated = Propagate(InTheMold, new MeasurementUncertainty { Volume = Volume.From(4.715, VolumeUnit.CubicCentimeter) });
        // 4.715 of 943 cm³ are 0.5 %: of 1,850 kg/m³ 9.25.
        Near(9.25, propagated.MaximumDryDensity);
        Assert.Equal(0, propagated.WaterContent, 1e-12);
        Assert.Equal(("volume", 1.0), (Assert.Single(propagated.Contributions).Quantity, propagated.Contributions[0].OfMaximumDryDensity));
    }

    [Fact]
    public void The_empty_molds_mass_is_one_error_and_each_full_ones_its_own()
    {
        // The shared error moves all wet densities by u/V, each own error its point only: with the parabola's weights c of the
        // maximum, Σc = 1 and Σc² = 17/35, and dry = wet/1.14 nearly.
        var u = Grams(5);
        var perVolume = u.Kilograms / 943e-6 / 1.14;
        Near(perVolume * Math.Sqrt(1 + (17.0 / 35)), Propagate(InTheMold, new MeasurementUncertainty { Mass = u }).MaximumDryDensity, 0.06);
    }

    [Fact]
    public void The_molds_error_is_there_also_where_the_driest_specimen_was_weighed_without_it()
    {
        var u = new MeasurementUncertainty { Mass = Grams(5) };
        var (all, allButOne) = (InTheMold, InTheMold.With(0, specimen => specimen with { WetMass = specimen.MoldAndWetSoil - Grams(4246), MoldAndWetSoil = null }));
        // In units of u/V: √(1 + 17/35) = 1.22 with the shared error in all five, 1.29 with it in four, 0.70 without it.
        Near(Propagate(all, u).MaximumDryDensity, Propagate(allButOne, u).MaximumDryDensity, 0.12);
    }

    [Fact]
    public void Independent_errors_of_density_reach_the_vertex_as_least_squares_says()
    {
        // Five points at t = −2 … 2 in steps of 2 %, ρ = a + bt + ct²: var(b) = σ²/10, t0 = −b/(2c), c = −20 kg/m³ a step squared;
        // var(a) = 17σ²/35 at the vertex t = 0.
        var propagated = Propagate(Exact, new MeasurementUncertainty { DryDensity = new Density(3) });
        Near(3 * Math.Sqrt(17.0 / 35), propagated.MaximumDryDensity);
        Near(3 / Math.Sqrt(10) / 40 * 0.02, propagated.WaterContent);
    }

    [Fact]
    public void An_uncertain_water_content_moves_the_points_sideways_only_where_density_was_given()
    {
        // At slope s a sideways error u acts as a density error s·u: s = −2·20·t a step of 0.02. First order: var(b) = Σt²s²u²/100.
        var u = 0.001;
        var perPoint = new[] { -2, -1, 0, 1, 2 }.Sum(t => t * t * Math.Pow(40 * t / 0.02 * u, 2)) / 100;
        Near(Math.Sqrt(perPoint) / 40 * 0.02, Propagate(Exact, new MeasurementUncertainty { WaterContent = new WaterContent(u) }).WaterContent, 0.06);
    }

    [Fact]
    public void Tins_bring_the_uncertainty_of_their_masses_to_the_water_content()
    {
        // w = (m2 − m3)/(m3 − m1) with 100 g of dry soil: u(w)² = u²·(1 + (1 + w)² + w²)/0.1². As a given u(w) of that size, point by point.
        var u = Grams(0.05);
        var tins = Exact.WithEach(specimen => specimen with
        {
            WaterContent = null,
            Tins = [new MoistureTin(new Mass(0.02), new Mass(0.12 + (0.1 * specimen.WaterContent!.Value.Fraction)), new Mass(0.12))],
        });
        var w = 0.14;
        var ofWater = u.Kilograms * Math.Sqrt(1 + ((1 + w) * (1 + w)) + (w * w)) / 0.1;
        var byMasses = Propagate(tins, new MeasurementUncertainty { TinMass = u });
        var byWater = Propagate(Exact, new MeasurementUncertainty { WaterContent = new WaterContent(ofWater) });
        Near(byWater.WaterContent, byMasses.WaterContent, 0.08);
        Assert.Equal("tinMass", Assert.Single(byMasses.Contributions).Quantity);
    }

    [Fact]
    public void The_uncertainty_of_the_specific_gravity_concerns_only_models_that_use_it()
    {
        var u = new MeasurementUncertainty { SpecificGravity = 0.03 };
        Assert.Equal(0, Propagate(Exact, u).MaximumDryDensity, 1e-9);
        Assert.True(Propagate(Clay with { Model = CurveModel.Saturation }, u).MaximumDryDensity > 0);
    }

    [Fact]
    public void Shares_are_one_together_greatest_first_and_the_dominant_measurement_leads()
    {
        var propagated = Propagate(InTheMold, new MeasurementUncertainty { Mass = Grams(0.1), Volume = Volume.From(5, VolumeUnit.CubicCentimeter), DryDensity = new Density(2) });
        Assert.Equal(1, propagated.Contributions.Sum(contribution => contribution.Share), 1e-12);
        Assert.Equal(1, propagated.Contributions.Sum(contribution => contribution.OfWaterContent), 1e-12);
        Assert.Equal(1, propagated.Contributions.Sum(contribution => contribution.OfMaximumDryDensity), 1e-12);
        Assert.All(propagated.Contributions, contribution => Assert.InRange(contribution.Share, 0, 1));
        Assert.Equal(propagated.Contributions.OrderByDescending(contribution => contribution.Share), propagated.Contributions);
        // Maximum: 0.53 % of 1,850 is 9.8 by the volume, 2·√(17/35) = 1.4 by the densities. The optimum is the densities' alone.
        Assert.Equal("volume", propagated.Contributions.MaxBy(contribution => contribution.OfMaximumDryDensity)!.Quantity);
        Assert.Equal("dryDensity", propagated.Contributions.MaxBy(contribution => contribution.OfWaterContent)!.Quantity);
    }

    [Fact]
    public void Without_an_uncertainty_over_zero_nothing_is_propagated()
    {
        Assert.Null(Bench.Analyze(Clay).Propagated);
        Assert.Null(Bench.Analyze(Clay with { Uncertainty = new MeasurementUncertainty() }).Propagated);
        Assert.Null(Bench.Analyze(Clay with { Uncertainty = new MeasurementUncertainty { DryDensity = new Density(0), WaterContent = new WaterContent(0) } }).Propagated);
    }

    [Fact]
    public void Without_an_optimum_nothing_is_propagated() =>
        Assert.Null(Bench.Analyze(Points((8, 1700), (10, 1760), (12, 1820), (14, 1870)) with { Uncertainty = new MeasurementUncertainty { DryDensity = new Density(3) } }).Propagated);

    [Fact]
    public void The_trials_are_stated()
    {
        Assert.Equal(UncertaintyPropagation.UsualTrials, Propagate(Exact, new MeasurementUncertainty { DryDensity = new Density(3) }).Trials);
        // Errors as large as the curve is high leave some trials without a peak: these are not counted.
        var wild = Propagate(Exact, new MeasurementUncertainty { DryDensity = new Density(80) });
        Assert.InRange(wild.Trials, UncertaintyPropagation.UsualTrials / 2, UncertaintyPropagation.UsualTrials - 1);
    }

    [Fact]
    public void Many_specimens_get_fewer_trials_but_never_fewer_than_the_least()
    {
        var many = Points([.. Enumerable.Range(0, 100).Select(i => (10 + (i * 0.08), 1850 - (5 * Math.Pow((i * 0.08) - 4, 2))))]) with { Model = CurveModel.Parabola };
        Assert.Equal(400, Propagate(many, new MeasurementUncertainty { DryDensity = new Density(3) }).Trials);
        Assert.True(UncertaintyPropagation.FewestTrials >= 200);
    }

    [Fact]
    public void Neither_order_nor_units_nor_repetition_change_it()
    {
        var test = Weighed with
        {
            Uncertainty = new MeasurementUncertainty { Mass = Grams(1), TinMass = Grams(0.01), Volume = Volume.From(2, VolumeUnit.CubicCentimeter), WaterContent = new WaterContent(0.001), SpecificGravity = 0.02 },
        };
        var once = Bench.Analyze(test).Propagated!;
        var reversed = Bench.Analyze(test with { Specimens = [.. test.Specimens.Reverse()] }).Propagated!;
        var pounds = Bench.Analyze(test.WithEach(specimen => specimen with { MoldAndWetSoil = InPounds(specimen.MoldAndWetSoil!.Value) }) with
        {
            Mold = new Mold { Mass = InPounds(test.Mold!.Mass!.Value), Volume = Volume.From(test.Mold.Volume!.Value.In(VolumeUnit.CubicFoot), VolumeUnit.CubicFoot) },
        }).Propagated!;
        Assert.Equal(NumbersWithin.Of(once), NumbersWithin.Of(reversed));
        Assert.Equal(NumbersWithin.Of(once), NumbersWithin.Of(Bench.Analyze(test).Propagated));
        Near(once.WaterContent, pounds.WaterContent, 1e-9);
        Near(once.MaximumDryDensity, pounds.MaximumDryDensity, 1e-9);

        static Mass InPounds(Mass mass) => Mass.From(mass.In(MassUnit.Pound), MassUnit.Pound);
    }

    [Fact]
    public void The_optimum_stays_the_fitted_one_and_its_uncertainty_grows_in_quadrature()
    {
        var bare = Bench.Analyze(Clay).Optimum!;
        var result = Bench.Analyze(Clay with { Uncertainty = new MeasurementUncertainty { DryDensity = new Density(6) } });
        var wider = result.Optimum!;
        Assert.Equal(bare.WaterContent.Value, wider.WaterContent.Value);
        Assert.Equal(bare.MaximumDryDensity.Value, wider.MaximumDryDensity.Value);
        Near(Math.Sqrt(Math.Pow(bare.MaximumDryDensity.StandardUncertainty!.Value, 2) + Math.Pow(result.Propagated!.MaximumDryDensity, 2)), wider.MaximumDryDensity.StandardUncertainty!.Value, 1e-12);
        Assert.True(wider.WaterContent.Lower < bare.WaterContent.Lower && wider.WaterContent.Upper > bare.WaterContent.Upper);
        Assert.True(wider.MaximumDryDensity.Lower < bare.MaximumDryDensity.Lower && wider.MaximumDryDensity.Upper > bare.MaximumDryDensity.Upper);
    }

    private static PropagatedUncertainty Propagate(MoistureDensityTest test, MeasurementUncertainty uncertainty) =>
        Bench.Analyze(test with { Uncertainty = uncertainty }).Propagated!;

    private static void Near(double expected, double actual, double share = ThreeSigma) => Assert.Equal(expected, actual, expected * share);
}
