using Drypeak.Soil.Quantities;

namespace Drypeak.Soil.TestMethods;

/// <summary>
/// The work that falling rammers put into a unit volume of soil, kept in kJ/m³ (the same number as kN·m/m³). Positive for a real
/// test; the default is 0. Immutable, safe on any thread.
/// </summary>
/// <param name="KilojoulesPerCubicMeter">kJ/m³.</param>
public readonly record struct CompactiveEffort(double KilojoulesPerCubicMeter)
{
    /// <summary>kJ/m³ in one ft·lbf/in³, exact: a foot of work with standard gravity on a pound, over a cubic inch.</summary>
    internal static readonly double FootPoundForcePerCubicInch =
        LengthUnit.Foot.InMeters() * MassUnit.Pound.InKilograms() * UnitTable.StandardGravity
        / VolumeUnit.CubicInch.InCubicMeters() / 1000;

    /// <summary>
    /// Weight of the rammer times its drop, times the blows on all layers, over the volume of the mold: m·g·h·layers·blows/V with
    /// standard gravity. Work against friction and what the base absorbs are not taken off, as in the published nominal figures.
    /// </summary>
    /// <param name="rammer">Falling mass, above 0.</param>
    /// <param name="drop">Free fall, above 0.</param>
    /// <param name="layers">Layers in the mold, 1 or more.</param>
    /// <param name="blowsPerLayer">Blows on each layer, 1 or more.</param>
    /// <param name="mold">Volume of the mold without its collar, above 0.</param>
    /// <exception cref="ArgumentOutOfRangeException">An argument is zero or below.</exception>
    public static CompactiveEffort Of(Mass rammer, Length drop, int layers, int blowsPerLayer, Volume mold)
    {
        ArgumentOutOfRangeException.ThrowIfNegativeOrZero(rammer.Kilograms, nameof(rammer));
        ArgumentOutOfRangeException.ThrowIfNegativeOrZero(drop.Meters, nameof(drop));
        ArgumentOutOfRangeException.ThrowIfNegativeOrZero(layers);
        ArgumentOutOfRangeException.ThrowIfNegativeOrZero(blowsPerLayer);
        ArgumentOutOfRangeException.ThrowIfNegativeOrZero(mold.CubicMeters, nameof(mold));

        var joulesPerBlow = rammer.Kilograms * UnitTable.StandardGravity * drop.Meters;
        return new CompactiveEffort(joulesPerBlow * layers * blowsPerLayer / mold.CubicMeters / 1000);
    }
}
