using Drypeak.Soil.FieldDensity.Review;
using Drypeak.Soil.Laboratory;
using Drypeak.Soil.Laboratory.Workings;
using Drypeak.Soil.Phases;
using Drypeak.Soil.Quantities;

namespace Drypeak.Soil.FieldDensity;

/// <summary>The soil in place, as far as the readings go; null for what they do not give.</summary>
public sealed record SoilInPlace
{
    /// <summary>Volume of the hole or the cylinder.</summary>
    public Volume? Volume { get; init; }

    /// <summary>Loose density of the sand.</summary>
    public Density? SandDensity { get; init; }

    /// <summary>Wet density.</summary>
    public Density? WetDensity { get; init; }

    /// <summary>Water content.</summary>
    public WaterContent? WaterContent { get; init; }

    /// <summary>Dry density.</summary>
    public Density? DryDensity { get; init; }

    /// <summary>Readings that were averaged.</summary>
    public IReadOnlyList<ReadingSpread> Readings { get; init; } = [];

    /// <summary>The gauge's moisture offset.</summary>
    public MoistureOffset? Offset { get; init; }

    /// <summary>What the spread of the readings does to wet density and water content.</summary>
    public IReadOnlyList<ReadingEffect> Effects { get; init; } = [];
}

/// <summary>
/// From readings to dry density: ρ = m/V, ρd = ρ/(1 + w) with w on dry mass, never ρ·(1 − w). What is given twice must agree; what the
/// readings do not give stays unknown.
/// </summary>
internal static class FieldReduction
{
    /// <summary>A gauge's water content and an oven's may be this far apart before it is said, as a fraction.</summary>
    private const double GaugeTolerance = 0.01;

    /// <summary>The oven stands where gauge and oven both speak.</summary>
    public static SoilInPlace Reduce(FieldTest test, FieldSheet sheet)
    {
        var given = test.Water.Reduce("", sheet.Faults);
        ShowWater(test, given, sheet);
        return test.Method switch
        {
            VolumeMethod method => OfVolume(test, method, given, sheet),
            DensityMethod method => OfDensity(test, method, given, sheet),
            _ => throw new ArgumentOutOfRangeException(nameof(test), test.Method, "Not a method."),
        };
    }

    private static SoilInPlace OfVolume(FieldTest test, VolumeMethod method, WaterContent? given, FieldSheet sheet)
    {
        var (volume, sandDensity) = method.Measure(sheet);
        var wetMass = WetMass(test.Soil, sheet);
        var w = WaterWithMasses(given, wetMass, test.Soil?.Dry, sheet);
        Density? wet = null;
        if (volume is { } hole && wetMass is { } mass)
        {
            wet = mass / hole;
            sheet.Step(Formulas.WetDensity, "wet density", $"{sheet.Text(mass)}/{sheet.Text(hole)}{sheet.MassOverVolumeFactor}", wet.Value);
        }

        Density? dry = null;
        if (wet is null && volume is { } space && test.Soil?.Dry is { } dryMass)
        {
            dry = dryMass / space;
            sheet.Step(FieldFormulas.DryDensityByMass, "dry density", $"{sheet.Text(dryMass)}/{sheet.Text(space)}{sheet.MassOverVolumeFactor}", dry.Value);
        }

        return Completed(new SoilInPlace { Volume = volume, SandDensity = sandDensity, WetDensity = wet, WaterContent = w, DryDensity = dry }, sheet);
    }

    private static SoilInPlace OfDensity(FieldTest test, DensityMethod method, WaterContent? given, FieldSheet sheet)
    {
        var read = method.Read(sheet);
        var oven = WaterWithMasses(given, test.Soil is { } soil ? WetMass(soil, sheet) : null, test.Soil?.Dry, sheet);
        if (oven is { } byOven && read.WaterContent is { } byGauge && Math.Abs(byOven.Fraction - byGauge.Fraction) is var apart && apart > GaugeTolerance * (1 + 1e-9))
        {
            sheet.Find(FieldFindingKinds.GaugeAndOvenApart, method.Place,
                $"The gauge says {ReaderText.Of(byGauge)} water, the oven {ReaderText.Of(byOven)}: {ReaderText.Fixed(apart * 100, 1)} percentage points apart. The oven's is used. Check the gauge's standard count and its moisture offset.");
        }

        var w = oven ?? read.WaterContent;
        if (w is { Fraction: < 0 } negative)
        {
            sheet.Contradiction(method.Place + "/ovenPairs",
                $"With the moisture offset the water content comes to {ReaderText.Of(negative)}, below 0. Check the pairs of gauge and oven.");
        }

        if (w is null && read is { WetDensity: { } bothWet, DryDensity: { } bothDry })
        {
            w = new WaterContent((bothWet.KilogramsPerCubicMeter / bothDry.KilogramsPerCubicMeter) - 1);
            if (w.Value.Fraction < 0)
            {
                sheet.Contradiction(method.Place + "/dryDensity",
                    $"The dry density, {sheet.ReaderDensity(bothDry.KilogramsPerCubicMeter)}, is greater than the wet density, {sheet.ReaderDensity(bothWet.KilogramsPerCubicMeter)}. Correct one of them.");
            }

            sheet.Step(Formulas.WaterContentFromDensities, "water content", $"100*({sheet.Text(bothWet)}/{sheet.Text(bothDry)} - 1)", w.Value);
        }

        if (read is { WetDensity: { } wet, DryDensity: { } dry } && w is { } known)
        {
            sheet.HoldAgainst(PhaseRelations.DryDensity(wet, known).KilogramsPerCubicMeter, dry.KilogramsPerCubicMeter, method.Place + "/dryDensity",
                "the dry density", sheet.ReaderDensity, "wet density and water content");
        }

        return Completed(
            new SoilInPlace
            {
                WetDensity = read.WetDensity,
                WaterContent = w,
                DryDensity = read.WetDensity is null || w is null ? read.DryDensity : null,
                Readings = read.Readings,
                Offset = read.Offset,
                Effects = oven is null ? read.Effects : [.. read.Effects.Where(effect => effect.WetDensity != 0).Select(effect => effect with { WaterContent = 0 })],
            },
            sheet);
    }

    /// <summary>Dry density from wet, or wet from dry, where the water content is known.</summary>
    private static SoilInPlace Completed(SoilInPlace soil, FieldSheet sheet)
    {
        if (soil is { WetDensity: { } wet, DryDensity: null, WaterContent: { } w })
        {
            var dry = PhaseRelations.DryDensity(wet, w);
            sheet.Step(Formulas.DryDensity, "dry density", $"{sheet.Text(wet)}/(1 + {FieldSheet.Text(w)}/100)", dry);
            return soil with { DryDensity = dry };
        }

        if (soil is { WetDensity: null, DryDensity: { } known, WaterContent: { } water })
        {
            var derived = PhaseRelations.WetDensity(known, water);
            sheet.Step(Formulas.WetFromDry, "wet density", $"{sheet.Text(known)}*(1 + {FieldSheet.Text(water)}/100)", derived);
            return soil with { WetDensity = derived };
        }

        return soil;
    }

    private static Mass? WetMass(SoilWeighed? soil, FieldSheet sheet)
    {
        if (soil is not { ContainerAndWet: { } full, Container: { } empty })
        {
            return soil?.Wet;
        }

        var mass = full - empty;
        if (mass.Kilograms <= 0)
        {
            sheet.Contradiction("/soil/containerAndWet",
                $"Container and wet soil, {sheet.ReaderMass(full.Kilograms)}, are not heavier than the empty container, {sheet.ReaderMass(empty.Kilograms)}. Look for a mass in another unit.");
            return null;
        }

        sheet.Step(Formulas.WetMass, "mass of wet soil", $"{sheet.Text(full)} - {sheet.Text(empty)}", mass);
        if (soil.Wet is { } given)
        {
            sheet.HoldAgainst(mass.Kilograms, given.Kilograms, "/soil/wet", "the wet soil", sheet.ReaderMass, "container and soil");
        }

        return mass;
    }

    private static WaterContent? WaterWithMasses(WaterContent? given, Mass? wet, Mass? dry, FieldSheet sheet)
    {
        if (wet is not { } wetMass || dry is not { } dryMass)
        {
            return given;
        }

        var w = new WaterContent((wetMass.Kilograms / dryMass.Kilograms) - 1);
        if (w.Fraction < 0)
        {
            sheet.Contradiction("/soil/dry",
                $"The dry soil, {sheet.ReaderMass(dryMass.Kilograms)}, is heavier than the wet soil, {sheet.ReaderMass(wetMass.Kilograms)}. Were the two exchanged?");
            return null;
        }

        MeasuredWater.RefuseBeyondRange(w, "/soil/dry", sheet.Faults);
        if (given is { } other)
        {
            MeasuredWater.RefuseApart(other, "the water content given", w, "wet and dry mass", "/soil/dry", sheet.Faults);
            return other;
        }

        sheet.Step(FieldFormulas.WaterByMasses, "water content", $"100*({sheet.Text(wetMass)}/{sheet.Text(dryMass)} - 1)", w);
        return w;
    }

    private static void ShowWater(FieldTest test, WaterContent? given, FieldSheet sheet)
    {
        if (given is not { } w)
        {
            return;
        }

        var tins = test.Water.Tins;
        for (var i = 0; i < tins.Count; i++)
        {
            string In(Mass mass) => WorkingNumbers.Number(mass.In(test.Units.TinMass));
            sheet.Step(Formulas.WaterContentOfTin, tins.Count > 1 ? $"water content of tin {i + 1}" : "water content",
                $"100*({In(tins[i].TinAndWetSoil)} - {In(tins[i].TinAndDrySoil)})/({In(tins[i].TinAndDrySoil)} - {In(tins[i].Tin)})", tins[i].WaterContent);
        }

        if (tins.Count > 1)
        {
            sheet.Step(Formulas.MeanOfTins, "water content", $"({string.Join(" + ", tins.Select(tin => FieldSheet.Text(tin.WaterContent)))})/{tins.Count}", w);
        }
        else if (tins.Count == 0 && test.Water.Given is null)
        {
            var reading = 100 * w.Fraction / (1 + w.Fraction);
            sheet.Step(Formulas.WaterContentFromWetBasis, "water content", $"100*{FieldSheet.Text(reading)}/(100 - {FieldSheet.Text(reading)})", w);
        }
    }
}
