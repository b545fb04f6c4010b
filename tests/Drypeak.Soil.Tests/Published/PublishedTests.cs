using System.Globalization;
using System.Text.Json;
using Drypeak.Soil.Laboratory;
using Drypeak.Soil.Quantities;
using static Drypeak.Soil.Tests.Published.PublishedFile;

namespace Drypeak.Soil.Tests.Published;

/// <summary>The published compaction tests as the service takes them, in the units in which they were printed.</summary>
internal static class PublishedTests
{
    /// <summary>By the number of the case. Each begins where its source does: at weighings, at densities, or at points.</summary>
    public static MoistureDensityTest Of(string id) => id switch
    {
        "P02" => WeighedInMold(Case(id), "mould_plus_wet_g", MassUnit.Gram, WaterContents(Case(id))),
        "P05" => Trials(Case(id)),
        "P06" => WeighedInMold(Case(id), "mould_plus_wet_g", MassUnit.Gram, TinsInPairs(Case(id))),
        "P09" => Densities(Case(id)),
        "P10" => WetMasses(Case(id), "wet_kg", MassUnit.Kilogram, new Mold { Volume = Volume.From(Case(id).Number("volume_cm3"), VolumeUnit.CubicCentimeter) }, new UnitSet(Mass: MassUnit.Kilogram, Density: DensityUnit.KilogramPerCubicMeter)),
        "P11" => WetMasses(Case(id), "wet_lb", MassUnit.Pound, new Mold { Volume = Volume.From(Case(id).Number("volume_ft3"), VolumeUnit.CubicFoot) }, new UnitSet(Mass: MassUnit.Pound, Volume: VolumeUnit.CubicFoot, Density: DensityUnit.PoundPerCubicFoot)),
        "P13" => UnitWeights(Case(id)),
        "P15" => WeighedInMold(Case(id), "mould_plus_wet", MassUnit.Gram, OneTinEach(Case(id))),
        "P17c" => PoundsAndGrams(Case(id)),
        _ => throw new ArgumentOutOfRangeException(nameof(id), id, "No such case."),
    };

    /// <summary>Every compaction test of the file.</summary>
    public static IReadOnlyList<string> All { get; } = ["P02", "P05", "P06", "P09", "P10", "P11", "P13", "P15", "P17c"];

    private static MoistureDensityTest WeighedInMold(JsonElement data, string masses, MassUnit unit, SpecimenMeasurement[] waters)
    {
        var full = data.Numbers(masses);
        return Test(data, [.. waters.Select((water, i) => water with { MoldAndWetSoil = Mass.From(full[i], unit) })]) with
        {
            Mold = new Mold
            {
                Mass = Mass.From(data.Number("mould_g"), unit),
                Volume = Volume.From(data.Number("volume_cm3"), VolumeUnit.CubicCentimeter),
            },
            Oversize = data.TryGetProperty("oversize", out var oversize)
                ? new Oversize(oversize.Number("percent") / 100, oversize.Number("Gs"), WaterContent.FromPercent(oversize.Number("w_percent")), null)
                : null,
        };
    }

    private static MoistureDensityTest Trials(JsonElement data)
    {
        var full = data.Numbers("mould_plus_wet_kg");
        return Test(data, [.. TinsInPairs(data).Select((tins, i) => tins with { MoldAndWetSoil = Mass.From(full[i], MassUnit.Kilogram) })]) with
        {
            Mold = new Mold
            {
                Mass = Mass.From(data.Number("mould_kg"), MassUnit.Kilogram),
                Diameter = Length.From(data.Number("diameter_mm"), LengthUnit.Millimeter),
                Height = Length.From(data.Number("height_mm"), LengthUnit.Millimeter),
            },
            Units = new UnitSet(Mass: MassUnit.Kilogram, Density: DensityUnit.KilonewtonPerCubicMeter),
        };
    }

    private static MoistureDensityTest Densities(JsonElement data)
    {
        var wet = data.Numbers("bulk");
        return Test(data, [.. WaterContents(data).Select((water, i) => water with { WetDensity = Density.From(wet[i], DensityUnit.GramPerCubicCentimeter) })]);
    }

    private static MoistureDensityTest WetMasses(JsonElement data, string masses, MassUnit unit, Mold mold, UnitSet units)
    {
        var wet = data.Numbers(masses);
        return Test(data, [.. WaterContents(data).Select((water, i) => water with { WetMass = Mass.From(wet[i], unit) })]) with { Mold = mold, Units = units };
    }

    private static MoistureDensityTest UnitWeights(JsonElement data)
    {
        var dry = data.Numbers("dry");
        return Test(data, [.. WaterContents(data).Select((water, i) => water with { DryDensity = Density.From(dry[i], DensityUnit.KilonewtonPerCubicMeter) })]) with
        {
            Units = new UnitSet(Density: DensityUnit.KilonewtonPerCubicMeter),
        };
    }

    private static MoistureDensityTest PoundsAndGrams(JsonElement data) => Test(data,
    [
        new SpecimenMeasurement
        {
            Label = "1",
            MoldAndWetSoil = Mass.From(data.Number("mold_plus_wet_lb"), MassUnit.Pound),
            Tins = [Tin([data.Number("tin_g"), data.Number("tin_wet_g"), data.Number("tin_dry_g")])],
        },
    ]) with
    {
        Mold = new Mold { Mass = Mass.From(data.Number("mold_lb"), MassUnit.Pound), Volume = Volume.From(data.Number("volume_ft3"), VolumeUnit.CubicFoot) },
        Units = new UnitSet(Mass: MassUnit.Pound, TinMass: MassUnit.Gram, Volume: VolumeUnit.CubicFoot, Density: DensityUnit.PoundPerCubicFoot),
    };

    /// <summary>Published work takes 1 g/cm³ for water; a specific gravity that a source states counts as measured.</summary>
    private static MoistureDensityTest Test(JsonElement data, SpecimenMeasurement[] specimens) => new()
    {
        WaterDensity = new Density(1000),
        SpecificGravity = data.TryGetProperty("Gs", out var gs) ? new SpecificGravity(gs.GetDouble(), Measured: true) : null,
        Specimens = specimens,
    };

    private static SpecimenMeasurement[] WaterContents(JsonElement data) =>
        [.. data.Numbers("w").Select((w, i) => Labeled(i) with { WaterContent = WaterContent.FromPercent(w) })];

    private static SpecimenMeasurement[] OneTinEach(JsonElement data) =>
        [.. data.GetProperty("tins").Triples().Select((tin, i) => Labeled(i) with { Tins = [Tin(tin)] })];

    private static SpecimenMeasurement[] TinsInPairs(JsonElement data) =>
        [.. data.GetProperty("tins").EnumerateArray().Select((pair, i) => Labeled(i) with { Tins = [.. pair.Triples().Select(Tin)] })];

    private static SpecimenMeasurement Labeled(int index) => new() { Label = (index + 1).ToString(CultureInfo.InvariantCulture) };

    /// <summary>Tin, tin + wet, tin + dry, in g.</summary>
    public static MoistureTin Tin(double[] masses) =>
        new(Mass.From(masses[0], MassUnit.Gram), Mass.From(masses[1], MassUnit.Gram), Mass.From(masses[2], MassUnit.Gram));
}
