using Drypeak.Soil.Laboratory;
using Drypeak.Soil.Quantities;
using Xunit;
using static Drypeak.Soil.Tests.Laboratory.Ternmarsh;

namespace Drypeak.Soil.Tests.Laboratory;

/// <summary>First-order propagation to one specimen, against the same on paper.</summary>
public class SpecimenUncertaintyTests
{
    private static readonly MoistureDensityTest Given = Points((10, 1770), (12, 1830), (14, 1850), (16, 1830));

    private static readonly MoistureDensityTest InTheMold = Given.WithEach(specimen => specimen with
    {
        DryDensity = null,
        MoldAndWetSoil = new Mass(4.246 + (specimen.DryDensity!.Value.KilogramsPerCubicMeter * (1 + specimen.WaterContent!.Value.Fraction) * 943e-6)),
    }) with
    {
        Mold = Weighed.Mold,
    };

    [Fact]
    public void Nothing_is_told_where_nothing_is_uncertain() => Assert.Empty(Of(Given, new MeasurementUncertainty()));

    [Fact]
    public void What_is_given_of_the_points_themselves_is_theirs()
    {
        var its = Of(Given, new MeasurementUncertainty { WaterContent = WaterContent.FromPercent(0.3), DryDensity = new Density(12) });
        Assert.Equal(4, its.Count);
        Assert.All(its.Values, uncertainty =>
        {
            Assert.Equal(0.003, uncertainty.WaterContent, 1e-9);
            Assert.Equal(12, uncertainty.DryDensity, 1e-6);
        });
    }

    [Fact]
    public void Volume_water_and_mass_add_in_quadrature()
    {
        var volume = 943e-6;
        var uncertainty = new MeasurementUncertainty { Volume = new Volume(0.01 * volume), WaterContent = WaterContent.FromPercent(0.5), Mass = new Mass(0.002) };
        var its = Of(InTheMold, uncertainty)["3"];
        // ρd = (M − M0)/(V·(1 + w)): the two weighings, the volume and the water content, each as its relative part.
        var weighing = 0.002 * Math.Sqrt(2) / (1850 * 1.14 * volume);
        var expected = 1850 * Math.Sqrt((weighing * weighing) + (0.01 * 0.01) + Math.Pow(0.005 / 1.14, 2));
        Assert.Equal(expected, its.DryDensity, expected * 1e-3);
        Assert.Equal(0.005, its.WaterContent, 1e-9);
    }

    private static IReadOnlyDictionary<string, SpecimenUncertainty> Of(MoistureDensityTest test, MeasurementUncertainty uncertainty)
    {
        var given = test with { Uncertainty = uncertainty };
        return SpecimenUncertainty.Of(given, [.. MoistureDensity.Reduce(given, []).OfType<Specimen>()]);
    }
}
