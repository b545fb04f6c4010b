using System.Globalization;
using Drypeak.Soil.Laboratory;
using Drypeak.Soil.Phases;
using Drypeak.Soil.Quantities;
using Drypeak.Soil.TestMethods;

namespace Drypeak.Soil.Tests.Laboratory;

/// <summary>Made-up tests on the silty clay of the Ternmarsh flood embankment. A careful reviewer passes each of them without a word.</summary>
internal static class Ternmarsh
{
    /// <summary>Five specimens in the four-inch mold, by ASTM D698 A: masses in g, one tin each.</summary>
    public static MoistureDensityTest Weighed { get; } = Test(
    [
        Weighing("1", 6049.2, 24.61, 146.33, 135.52),
        Weighing("2", 6161.8, 23.94, 151.87, 138.24),
        Weighing("3", 6243.1, 25.10, 158.42, 142.05),
        Weighing("4", 6245.6, 24.37, 149.96, 132.73),
        Weighing("5", 6212.3, 24.88, 155.71, 135.66),
    ]) with
    {
        Mold = new Mold { Mass = Grams(4246.0), Volume = Volume.From(943.0, VolumeUnit.CubicCentimeter) },
    };

    /// <summary>The same soil, beginning at dry densities.</summary>
    public static MoistureDensityTest Clay { get; } = Points((9.8, 1742), (11.9, 1815), (14.0, 1858), (15.9, 1829), (18.1, 1765));

    /// <summary>A test that begins at water contents in % and dry densities in kg/m³; labels count from 1.</summary>
    public static MoistureDensityTest Points(params (double W, double Dry)[] points) => Test(
        [.. points.Select((point, i) => new SpecimenMeasurement
        {
            Label = (i + 1).ToString(CultureInfo.InvariantCulture),
            WaterContent = WaterContent.FromPercent(point.W),
            DryDensity = new Density(point.Dry),
        })]);

    /// <summary>The test with one of its specimens changed.</summary>
    public static MoistureDensityTest With(this MoistureDensityTest test, int index, Func<SpecimenMeasurement, SpecimenMeasurement> change) =>
        test with { Specimens = [.. test.Specimens.Select((specimen, i) => i == index ? change(specimen) : specimen)] };

    /// <summary>The test with all of its specimens changed.</summary>
    public static MoistureDensityTest WithEach(this MoistureDensityTest test, Func<SpecimenMeasurement, SpecimenMeasurement> change) =>
        test with { Specimens = [.. test.Specimens.Select(change)] };

    public static Mass Grams(double grams) => Mass.From(grams, MassUnit.Gram);

    public static MoistureTin Tin(double tin, double wet, double dry) => new(Grams(tin), Grams(wet), Grams(dry));

    private static SpecimenMeasurement Weighing(string label, double full, double tin, double wet, double dry) => new()
    {
        Label = label,
        MoldAndWetSoil = Grams(full),
        Tins = [Tin(tin, wet, dry)],
    };

    private static MoistureDensityTest Test(SpecimenMeasurement[] specimens) => new()
    {
        Method = TestMethodCatalogue.Find("astm-d698-a"),
        SpecificGravity = new SpecificGravity(2.70, Measured: true),
        WaterDensity = WaterDensity.At(20),
        WaterTemperature = 20,
        Specimens = specimens,
    };
}
