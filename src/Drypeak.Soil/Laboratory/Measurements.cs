using Drypeak.Soil.Quantities;

namespace Drypeak.Soil.Laboratory;

/// <summary>A moisture tin's three weighings; tin and soil together.</summary>
/// <param name="Tin">Empty tin.</param>
/// <param name="TinAndWetSoil">Before the oven.</param>
/// <param name="TinAndDrySoil">After the oven; more than the tin, not more than before the oven.</param>
public sealed record MoistureTin(Mass Tin, Mass TinAndWetSoil, Mass TinAndDrySoil)
{
    /// <summary>Mass of water over mass of dry solids.</summary>
    public WaterContent WaterContent => new((TinAndWetSoil - TinAndDrySoil).Kilograms / (TinAndDrySoil - Tin).Kilograms);
}

/// <summary>A mold filled with water to find its volume.</summary>
/// <param name="Empty">Mass of the empty mold, with the cover plate where one was used.</param>
/// <param name="WithWater">Mass of the mold full of water, with the same plate.</param>
/// <param name="Plate">Mass of the cover plate that is in both, or null where it is in neither.</param>
/// <param name="Water">Density of the water in it.</param>
public sealed record WaterFilling(Mass Empty, Mass WithWater, Mass? Plate, Density Water)
{
    /// <summary>Mass of water over its density.</summary>
    public Volume Volume => new((WithWater - Empty).Kilograms / Water.KilogramsPerCubicMeter);

    /// <summary>Mass of the mold alone.</summary>
    public Mass MoldMass => Plate is { } plate ? Empty - plate : Empty;
}

/// <summary>What is known of a mold. Whatever is given twice must agree.</summary>
public sealed record Mold
{
    /// <summary>Mass of the empty mold, as weighed together with the soil later.</summary>
    public Mass? Mass { get; init; }

    /// <summary>Volume, where it was measured or is known.</summary>
    public Volume? Volume { get; init; }

    /// <summary>Inside diameter.</summary>
    public MeasuredLength? Diameter { get; init; }

    /// <summary>Inside height, without the collar.</summary>
    public MeasuredLength? Height { get; init; }

    /// <summary>A calibration by water.</summary>
    public WaterFilling? WaterFilling { get; init; }

    /// <summary>The mass to take off mold and wet soil, or null where unknown.</summary>
    public Mass? EmptyMass => Mass ?? WaterFilling?.MoldMass;

    /// <summary>This mold with what it leaves out taken from another: the test's mold under a specimen's own.</summary>
    public Mold Over(Mold? other)
    {
        if (other is null)
        {
            return this;
        }

        var bringsVolume = Volume is not null || (Diameter is not null && Height is not null) || WaterFilling is not null;
        return new Mold
        {
            Mass = Mass ?? WaterFilling?.MoldMass ?? other.EmptyMass,
            Volume = bringsVolume ? Volume : other.Volume,
            Diameter = Diameter ?? (bringsVolume ? null : other.Diameter),
            Height = Height ?? (bringsVolume ? null : other.Height),
            WaterFilling = bringsVolume ? WaterFilling : other.WaterFilling,
        };
    }
}

/// <summary>One specimen as it came from the balance, at whichever stage its data begin. Whatever is given twice must agree.</summary>
public sealed record SpecimenMeasurement
{
    /// <summary>The caller's name for it; unique within the test.</summary>
    public required string Label { get; init; }

    /// <summary>Mass of mold and wet soil together.</summary>
    public Mass? MoldAndWetSoil { get; init; }

    /// <summary>Mass of the wet soil alone.</summary>
    public Mass? WetMass { get; init; }

    /// <summary>Wet (bulk) density.</summary>
    public Density? WetDensity { get; init; }

    /// <summary>Dry density.</summary>
    public Density? DryDensity { get; init; }

    /// <summary>The specimen's own mold, over the test's.</summary>
    public Mold? Mold { get; init; }

    /// <summary>How far below the mold's rim the soil ends, or null where it fills the mold.</summary>
    public MeasuredLength? DepthBelowRim { get; init; }

    /// <summary>Moisture tins; the water content is the mean over them.</summary>
    public IReadOnlyList<MoistureTin> Tins { get; init; } = [];

    /// <summary>Water content as a number on dry mass.</summary>
    public WaterContent? WaterContent { get; init; }

    /// <summary>Water content converted from a number on wet mass.</summary>
    public WaterContent? WaterContentFromWetBasis { get; init; }

    /// <summary>Water content converted from a calcium-carbide tester's reading.</summary>
    public WaterContent? WaterContentFromCarbide { get; init; }

    /// <summary>Why the point is not fitted, or null where it is.</summary>
    public string? SetAside { get; init; }

    /// <summary>The water content in every way that it was found.</summary>
    internal MeasuredWater Water => new(Tins, WaterContent, WaterContentFromWetBasis, WaterContentFromCarbide);
}

/// <summary>The calcium-carbide tester.</summary>
public static class CarbideTester
{
    /// <summary>Water content from a dial reading in % of wet mass; a half sample's reading counts twice.</summary>
    /// <param name="reading">%, 0 or more; below 100 after doubling.</param>
    /// <param name="halfSample">Whether half the usual mass of soil was used.</param>
    /// <remarks>AASHTO T 217: w = 100·r/(100 − r).</remarks>
    public static WaterContent WaterContent(double reading, bool halfSample) =>
        Quantities.WaterContent.FromPercentOfWetMass(halfSample ? 2 * reading : reading);
}
