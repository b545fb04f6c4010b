using Drypeak.Soil.Phases;
using Drypeak.Soil.Quantities;

namespace Drypeak.Soil.Laboratory;

/// <summary>
/// From weighings to dry density: ρ = m/V, ρd = ρ/(1 + w) with w on dry mass (ASTM D698-12 § 11; BS 1377-4:1990 cl. 3.3.5; from memory).
/// A specimen may begin at any stage. What is given at two stages must agree, or it is a fault that says by how much.
/// </summary>
public static class SpecimenReduction
{
    /// <summary>Densities and volumes given twice may differ by this fraction.</summary>
    public const double DensityTolerance = 0.002;

    /// <summary>The least dry density that is taken, kg/m³: below a soil's by a factor of a million (m³ for cm³), which a finding can still explain.</summary>
    public const double LeastDryDensity = 1e-3;

    /// <summary>The greatest dry density that is taken, kg/m³: above a soil's by a factor of a million.</summary>
    public const double GreatestDryDensity = 1e10;

    /// <summary>Room for the arithmetic at an inclusive limit.</summary>
    internal const double Arithmetic = 1e-9;

    /// <summary>Reduces one specimen.</summary>
    /// <param name="measured">The specimen.</param>
    /// <param name="testMold">The test's mold, or null.</param>
    /// <param name="place">JSON pointer of the specimen, for faults.</param>
    /// <param name="units">The units that faults speak.</param>
    /// <param name="faults">Receives each contradiction, and what is missing.</param>
    /// <returns>The specimen, or null where there is a fault.</returns>
    public static Specimen? Reduce(SpecimenMeasurement measured, Mold? testMold, string place, UnitSet units, ICollection<Fault> faults)
    {
        var before = faults.Count;
        var mold = measured.Mold?.Over(testMold) ?? testMold;
        var moldPlace = measured.Mold is null ? "/mold" : place + "/mold";

        var givenWater = measured.Water.Reduce(place, faults);
        var moldVolume = MoldVolumes.Of(mold, moldPlace, units, faults);
        var volume = MoldVolumes.OfSoil(measured, mold, moldVolume, place, units, faults);
        var wetMass = WetMassOf(measured, mold, place, units, faults);
        var massDensity = wetMass is { } mass && volume is { } v ? mass / v : (Density?)null;
        var wet = Agreeing(
            [(massDensity, "mass and volume", ""), (measured.WetDensity, "the wet density given", "/wetDensity")],
            "wet density", place, units, faults);

        if (givenWater is null && wet is { } && measured.DryDensity is { } dryGiven)
        {
            givenWater = new WaterContent((wet.Value.KilogramsPerCubicMeter / dryGiven.KilogramsPerCubicMeter) - 1);
            if (givenWater.Value.Fraction < 0)
            {
                faults.Add(new Fault(place + "/dryDensity", "contradiction",
                    $"The dry density, {ReaderText.Of(dryGiven, units.Density)}, is greater than the wet density, {ReaderText.Of(wet.Value, units.Density)}. Correct one of them."));
            }

            MeasuredWater.RefuseBeyondRange(givenWater.Value, place + "/dryDensity", faults);
        }

        if (faults.Count > before)
        {
            return null;
        }

        if (givenWater is not { } w)
        {
            faults.Add(new Fault(place, "not-enough-data",
                "The water content is missing. Give waterContent, tins, wetBasis or carbide; or a wet and a dry density."));
            return null;
        }

        var dry = Agreeing(
            [(wet is { } wetDensity ? PhaseRelations.DryDensity(wetDensity, w) : null, "wet density and water content", ""),
             (measured.DryDensity, "the dry density given", "/dryDensity")],
            "dry density", place, units, faults);
        if (faults.Count > before)
        {
            return null;
        }

        if (dry is not { } dryDensity)
        {
            faults.Add(new Fault(place, "not-enough-data", Missing(measured, mold, wetMass, volume)));
            return null;
        }

        if (dryDensity.KilogramsPerCubicMeter is < LeastDryDensity or > GreatestDryDensity)
        {
            faults.Add(new Fault(place, "out-of-range",
                $"The dry density comes to {ReaderText.Significant(dryDensity.In(units.Density))} {units.Density.Symbol()}, millions of times from any soil's. Check mass and volume and their units."));
            return null;
        }

        return new Specimen(measured.Label, w, wet ?? PhaseRelations.WetDensity(dryDensity, w), dryDensity,
            massDensity is null ? null : moldVolume, massDensity is null ? null : volume, measured.SetAside);
    }

    private static Mass? WetMassOf(SpecimenMeasurement measured, Mold? mold, string place, UnitSet units, ICollection<Fault> faults)
    {
        var byDifference = measured.MoldAndWetSoil is { } full && mold?.EmptyMass is { } empty ? full - empty : (Mass?)null;
        if (byDifference is { Kilograms: <= 0 } and { } difference)
        {
            faults.Add(new Fault(place + "/moldAndWetSoil", "contradiction",
                $"Mold and wet soil, {ReaderText.Of(measured.MoldAndWetSoil!.Value, units.Mass)}, are not heavier than the empty mold, {ReaderText.Of(mold!.EmptyMass!.Value, units.Mass)}. Look for a mass in another unit."));
            return null;
        }

        if (byDifference is { } derived && measured.WetMass is { } given
            && Math.Abs((given.Kilograms / derived.Kilograms) - 1) is var apart && apart > DensityTolerance * (1 + Arithmetic))
        {
            faults.Add(new Fault(place + "/wetMass", "contradiction",
                $"The wet mass given is {ReaderText.Of(given, units.Mass)}, but mold and wet soil less the mold are {ReaderText.Of(derived, units.Mass)}: {ReaderText.Percent(apart, 2)} apart, where {ReaderText.Percent(DensityTolerance)} is allowed. Correct one, or leave one out."));
        }

        return byDifference ?? measured.WetMass;
    }

    /// <summary>The first density of those given, each of the others held against it.</summary>
    private static Density? Agreeing(
        ReadOnlySpan<(Density? Density, string Name, string Member)> ways, string quantity, string place, UnitSet units, ICollection<Fault> faults)
    {
        (Density Density, string Name)? first = null;
        foreach (var (density, name, member) in ways)
        {
            if (density is not { } other)
            {
                continue;
            }

            if (first is not { } taken)
            {
                first = (other, name);
            }
            else if (Math.Abs((other.KilogramsPerCubicMeter / taken.Density.KilogramsPerCubicMeter) - 1) is var apart && apart > DensityTolerance * (1 + Arithmetic))
            {
                faults.Add(new Fault(place + member, "contradiction",
                    $"The {quantity} is {ReaderText.Of(taken.Density, units.Density)} by {taken.Name}, but {name} is {ReaderText.Of(other, units.Density)}: {ReaderText.Percent(apart, 2)} apart, where {ReaderText.Percent(DensityTolerance)} is allowed. Correct one, or leave one out."));
            }
        }

        return first?.Density;
    }

    private static string Missing(SpecimenMeasurement measured, Mold? mold, Mass? wetMass, Volume? volume) => (measured.MoldAndWetSoil, wetMass, volume) switch
    {
        ({ }, null, _) => "The mass of the mold is missing: give mold.mass, for the test or for the specimen.",
        (_, { }, null) => mold is null
            ? "The volume of the mold is missing: give mold.volume, or mold.diameter and mold.height."
            : "The mold's volume is missing: give mold.volume, mold.diameter and mold.height, or mold.empty and mold.withWater.",
        _ => "Nothing gives the density: give moldAndWetSoil or wetMass (with a mold), wetDensity or dryDensity.",
    };
}
