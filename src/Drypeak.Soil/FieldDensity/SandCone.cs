using Drypeak.Soil.FieldDensity.Review;
using Drypeak.Soil.Quantities;

namespace Drypeak.Soil.FieldDensity;

/// <summary>
/// The sand cone (ASTM D1556, AASHTO T 191, BS 1377-9): sand of known density fills the hole and the cone above it. By masses, the sand in the
/// hole is before − after − cone, and V = sand/ρs; by volumes alone, V = released − cone.
/// </summary>
public sealed record SandCone : VolumeMethod
{
    /// <summary>Sand in the hole alone.</summary>
    public Mass? SandInHole { get; init; }

    /// <summary>The jar of sand before and after, and what fills cone and plate.</summary>
    public SandPoured? Poured { get; init; }

    /// <summary>Volume of cone and plate, in place of the mass that fills them.</summary>
    public Volume? ConeVolume { get; init; }

    /// <summary>Volume of all the sand that ran out.</summary>
    public Volume? ReleasedVolume { get; init; }

    /// <summary>Loose density of the sand.</summary>
    public Density? SandDensity { get; init; }

    /// <summary>Its calibration in a container of known volume.</summary>
    public SandCalibration? Calibration { get; init; }

    /// <inheritdoc/>
    public override string Code => "sand-cone";

    /// <inheritdoc/>
    public override string Place => "/sandCone";

    /// <summary>Density of the sand, given or from its calibration; null where neither is there or the calibration has none.</summary>
    private Density? DensityOfSand(FieldSheet sheet)
    {
        if (Calibration is not { } calibration)
        {
            return SandDensity;
        }

        var place = Place + "/calibration";
        var mass = calibration.SandMass;
        if (calibration.Poured is { } poured)
        {
            var filled = poured.SandBelow(poured.ConeAndPlate, sheet, place, "sand in the container");
            if (mass is { } given && filled is { } measured)
            {
                sheet.HoldAgainst(measured.Kilograms, given.Kilograms, place + "/sandMass", "the sand in the container", sheet.ReaderMass, "before, after and cone");
            }

            mass = filled;
        }

        if (mass is not { } sand)
        {
            return null;
        }

        var density = sand / calibration.ContainerVolume;
        sheet.Step(FieldFormulas.SandDensity, "density of the sand", $"{sheet.Text(sand)}/{sheet.Text(calibration.ContainerVolume)}{sheet.MassOverVolumeFactor}", density);
        if (SandDensity is { } alsoGiven)
        {
            sheet.HoldAgainst(density.KilogramsPerCubicMeter, alsoGiven.KilogramsPerCubicMeter, Place + "/sandDensity", "the sand's density", sheet.ReaderDensity, "its calibration");
        }

        return density;
    }

    internal override MeasuredHole Measure(FieldSheet sheet)
    {
        var sandDensity = DensityOfSand(sheet);
        var byMass = VolumeByMass(sandDensity, sheet);
        var byVolumes = VolumeByVolumes(sheet);
        if (byMass is { } first && byVolumes is { } second)
        {
            sheet.HoldAgainst(first.CubicMeters, second.CubicMeters, Place + "/releasedVolume", "the volume of the hole", sheet.ReaderVolume, "the masses of sand");
        }

        return new MeasuredHole(byMass ?? byVolumes, sandDensity);
    }

    private Volume? VolumeByVolumes(FieldSheet sheet)
    {
        if (ReleasedVolume is not { } released || ConeVolume is not { } cone)
        {
            return null;
        }

        var hole = new Volume(released.CubicMeters - cone.CubicMeters);
        if (hole.CubicMeters <= 0)
        {
            sheet.Find(FieldFindingKinds.ConeOverSand, Place + "/coneVolume",
                $"The cone holds {sheet.ReaderVolume(cone.CubicMeters)}, but only {sheet.ReaderVolume(released.CubicMeters)} of sand ran out: nothing is left for the hole. Check both volumes.");
            return null;
        }

        sheet.Step(FieldFormulas.HoleBySandVolumes, "volume of the hole", $"{sheet.Text(released)} - {sheet.Text(cone)}", hole);
        return hole;
    }

    private Volume? VolumeByMass(Density? sandDensity, FieldSheet sheet)
    {
        if (sandDensity is not { } density || (SandInHole is null && Poured is null))
        {
            return null;
        }

        var sand = SandInHole;
        if (Poured is { } poured)
        {
            var filled = poured.SandBelow(MassInCone(poured, density, sheet), sheet, Place, "sand in the hole");
            if (sand is { } given && filled is { } measured)
            {
                sheet.HoldAgainst(measured.Kilograms, given.Kilograms, Place + "/sandInHole", "the sand in the hole", sheet.ReaderMass, "before, after and cone");
            }

            sand = filled;
        }

        if (sand is not { } mass)
        {
            return null;
        }

        var hole = new Volume(mass.Kilograms / density.KilogramsPerCubicMeter);
        sheet.Step(FieldFormulas.HoleBySand, "volume of the hole", $"{sheet.Text(mass)}/{sheet.Text(density)}{sheet.MassOverDensityFactor}", hole);
        return hole;
    }

    private Mass? MassInCone(SandPoured poured, Density density, FieldSheet sheet)
    {
        if (ConeVolume is not { } volume)
        {
            return poured.ConeAndPlate;
        }

        var mass = new Mass(volume.CubicMeters * density.KilogramsPerCubicMeter);
        if (poured.ConeAndPlate is { } given)
        {
            sheet.HoldAgainst(given.Kilograms, mass.Kilograms, Place + "/coneVolume", "the sand in the cone", sheet.ReaderMass, "its mass");
            return given;
        }

        sheet.Step(FieldFormulas.SandInCone, "sand in the cone", $"{sheet.Text(volume)}*{sheet.Text(density)}{sheet.VolumeTimesDensityFactor}", mass);
        return mass;
    }
}

/// <summary>The jar of sand, weighed before and after it filled what lies below it.</summary>
/// <param name="Before">Before.</param>
/// <param name="After">After.</param>
/// <param name="ConeAndPlate">The sand that fills cone and plate; null where a volume stands for it.</param>
public sealed record SandPoured(Mass Before, Mass After, Mass? ConeAndPlate)
{
    /// <summary>The sand that went below the cone; null, with a finding, where there is none, and with a fault where the cone is unknown.</summary>
    internal Mass? SandBelow(Mass? cone, FieldSheet sheet, string place, string quantity)
    {
        if (cone is not { } above)
        {
            sheet.Missing(place + "/coneAndPlate", "The sand in cone and plate is missing. Give coneAndPlate, or coneVolume.");
            return null;
        }

        var sand = Before - After - above;
        if (sand.Kilograms <= 0)
        {
            sheet.Find(FieldFindingKinds.ConeOverSand, place + "/coneAndPlate",
                $"{sheet.ReaderMass((Before - After).Kilograms)} of sand ran out, but cone and plate alone take {sheet.ReaderMass(above.Kilograms)}: nothing is left below them. Check before, after and the cone's calibration.");
            return null;
        }

        sheet.Step(FieldFormulas.SandToFill, quantity, $"{sheet.Text(Before)} - {sheet.Text(After)} - {sheet.Text(above)}", sand);
        return sand;
    }
}

/// <summary>The sand's calibration: a container of known volume filled with it.</summary>
/// <param name="ContainerVolume">Volume of the container.</param>
/// <param name="SandMass">The sand that fills it, or null.</param>
/// <param name="Poured">Weighings of the jar above it, or null.</param>
public sealed record SandCalibration(Volume ContainerVolume, Mass? SandMass, SandPoured? Poured);
