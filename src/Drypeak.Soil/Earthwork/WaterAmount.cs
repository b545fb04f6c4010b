using Drypeak.Soil.Quantities;

namespace Drypeak.Soil.Earthwork;

/// <summary>Water by mass and by volume. Negative where it is to be lost. Immutable, safe on any thread.</summary>
/// <param name="Mass">Its mass.</param>
/// <param name="Volume">The same water by volume.</param>
public readonly record struct WaterAmount(Mass Mass, Volume Volume)
{
    /// <summary>So many kilograms of water of a density.</summary>
    public static WaterAmount Of(double kilograms, Density water) =>
        new(new Mass(kilograms), new Volume(kilograms / water.KilogramsPerCubicMeter));

    /// <summary>The water that brings dry solids from one water content to another.</summary>
    public static WaterAmount Between(Mass solids, WaterContent present, WaterContent target, Density water) =>
        Of(solids.Kilograms * (target.Fraction - present.Fraction), water);

    /// <summary>Whether so little is meant that it is the arithmetic's and not the soil's.</summary>
    /// <param name="solids">The solids that it goes into.</param>
    public bool IsNoneIn(Mass solids) => Math.Abs(Mass.Kilograms) <= 1e-9 * solids.Kilograms;

    /// <summary>Both waters together.</summary>
    public static WaterAmount operator +(WaterAmount one, WaterAmount other) =>
        new(new Mass(one.Mass.Kilograms + other.Mass.Kilograms), new Volume(one.Volume.CubicMeters + other.Volume.CubicMeters));

    /// <summary>A share of the water, or a multiple.</summary>
    public static WaterAmount operator *(WaterAmount water, double factor) =>
        new(new Mass(water.Mass.Kilograms * factor), new Volume(water.Volume.CubicMeters * factor));
}
