using Drypeak.Soil.Quantities;

namespace Drypeak.Soil.Laboratory;

/// <summary>
/// The volume of a mold, and of the soil in it where the soil does not fill it. What is given twice must agree to
/// <see cref="SpecimenReduction.DensityTolerance"/>, or it is a fault that says by how much.
/// </summary>
public static class MoldVolumes
{
    /// <summary>The mold's volume: as given, by water, or from its dimensions; null where unknown.</summary>
    /// <param name="mold">The mold, or null.</param>
    /// <param name="place">JSON pointer of the mold, for faults.</param>
    /// <param name="units">The units that faults speak.</param>
    /// <param name="faults">Receives each contradiction, once.</param>
    public static Volume? Of(Mold? mold, string place, UnitSet units, ICollection<Fault> faults)
    {
        if (mold is null)
        {
            return null;
        }

        CheckReadings(mold.Diameter, "diameter", place + "/diameters", units, faults);
        CheckReadings(mold.Height, "height", place + "/heights", units, faults);
        ReadOnlySpan<(Volume? Volume, string Name)> ways =
        [
            (mold.Volume, "the volume given"),
            (mold.WaterFilling?.Volume, "the water that fills it"),
            (mold is { Diameter: { } diameter, Height: { } height } ? Volume.OfCylinder(diameter.Value, height.Value) : null, "diameter and height"),
        ];

        (Volume Volume, string Name)? first = null;
        foreach (var (volume, name) in ways)
        {
            if (volume is not { } other)
            {
                continue;
            }

            if (first is not { } taken)
            {
                first = (other, name);
            }
            else if (Apart(other.CubicMeters, taken.Volume.CubicMeters, taken.Volume.CubicMeters) is { } apart)
            {
                AddOnce(faults, new Fault(place, "contradiction",
                    $"By {taken.Name} the mold holds {ReaderText.Of(taken.Volume, units.Volume)}, by {name} {ReaderText.Of(other, units.Volume)}: {Allowed(apart)} Correct one, or leave one out."));
            }
        }

        return first?.Volume;
    }

    /// <summary>
    /// The volume of the soil in a mold: all of it, or V·(h − z)/h where the soil ends at a depth z below the rim, as after a vibrating hammer
    /// (geometry of a cylinder; BS 1377-4:1990 cl. 3.7 measures so, from memory).
    /// </summary>
    /// <param name="measured">The specimen.</param>
    /// <param name="mold">Its mold, or null.</param>
    /// <param name="volume">The mold's volume, or null where unknown.</param>
    /// <param name="place">JSON pointer of the specimen, for faults.</param>
    /// <param name="units">The units that faults speak.</param>
    /// <param name="faults">Receives what contradicts and what is missing.</param>
    public static Volume? OfSoil(SpecimenMeasurement measured, Mold? mold, Volume? volume, string place, UnitSet units, ICollection<Fault> faults)
    {
        if (volume is not { } whole || measured.DepthBelowRim is not { } depth)
        {
            return volume;
        }

        var member = place + (depth.Given is null ? "/depthsBelowRim" : "/depthBelowRim");
        if (mold?.Height?.Value is not { } height)
        {
            faults.Add(new Fault(member, "not-enough-data", "A depth below the rim needs the mold's diameter and height. Give both, for the test or for the specimen."));
            return null;
        }

        if (depth is { Given: { } given, Mean: { } mean } && Apart(mean.Meters, given.Meters, height.Meters) is { } apart)
        {
            faults.Add(new Fault(place + "/depthsBelowRim", "contradiction",
                $"The depth below the rim given is {ReaderText.Of(given, units.Length)}, but the mean of its readings {ReaderText.Of(mean, units.Length)}: on the mold's height that is {Allowed(apart)} Correct one, or leave one out."));
        }

        if (depth.Value.Meters >= height.Meters)
        {
            faults.Add(new Fault(member, "contradiction",
                $"The soil ends {ReaderText.Of(depth.Value, units.Length)} below the rim of a mold {ReaderText.Of(height, units.Length)} high: nothing is left of it. Check both, and their unit."));
            return null;
        }

        return new Volume(whole.CubicMeters * (1 - (depth.Value.Meters / height.Meters)));
    }

    private static void CheckReadings(MeasuredLength? length, string name, string place, UnitSet units, ICollection<Fault> faults)
    {
        if (length is { Given: { } given, Mean: { } mean } && Apart(mean.Meters, given.Meters, given.Meters) is { } apart)
        {
            AddOnce(faults, new Fault(place, "contradiction",
                $"The {name} given is {ReaderText.Of(given, units.Length)}, but the mean of its readings {ReaderText.Of(mean, units.Length)}: {Allowed(apart)} Correct one, or leave one out."));
        }
    }

    /// <summary>How far two values are apart, as a share of a measure; null where they agree.</summary>
    private static double? Apart(double one, double other, double measure)
    {
        var apart = Math.Abs(one - other) / measure;
        return apart > SpecimenReduction.DensityTolerance * (1 + SpecimenReduction.Arithmetic) ? apart : null;
    }

    private static string Allowed(double apart) =>
        $"{ReaderText.Percent(apart, 2)} apart, where {ReaderText.Percent(SpecimenReduction.DensityTolerance)} is allowed.";

    /// <summary>A mold that all specimens share is complained of once.</summary>
    private static void AddOnce(ICollection<Fault> faults, Fault fault)
    {
        if (!faults.Contains(fault))
        {
            faults.Add(fault);
        }
    }
}
