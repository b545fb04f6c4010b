using Drypeak.Soil.Quantities;

namespace Drypeak.Soil.Laboratory;

/// <summary>Dry density and water content of one material.</summary>
/// <param name="DryDensity">Dry density.</param>
/// <param name="WaterContent">Water content.</param>
public readonly record struct DensityAndWater(Density DryDensity, WaterContent WaterContent);

/// <summary>
/// The correction for oversize particles: ASTM D4718 and AASHTO T 99 annex / T 224. With Pc and Pf the shares of oversize and fines in
/// the total dry mass, Gc the bulk specific gravity of the oversize: ρdT = 1/(Pf/ρdF + Pc/(Gc·ρw)); wT = Pf·wF + Pc·wc.
/// </summary>
public static class OversizeCorrection
{
    /// <summary>Below this share the standards ask for no correction, unless the agency does (ASTM D4718).</summary>
    public const double NeededAbove = 0.05;

    /// <summary>From the fines, as tested, to the total material.</summary>
    /// <param name="fines">Of the fine fraction.</param>
    /// <param name="share">Pc, 0 to below 1.</param>
    /// <param name="specificGravity">Gc, over 0.</param>
    /// <param name="oversizeWater">wc.</param>
    /// <param name="water">Density of water.</param>
    public static DensityAndWater ToTotal(DensityAndWater fines, double share, double specificGravity, WaterContent oversizeWater, Density water)
    {
        var solidOversize = specificGravity * water.KilogramsPerCubicMeter;
        return new DensityAndWater(
            new Density(1 / (((1 - share) / fines.DryDensity.KilogramsPerCubicMeter) + (share / solidOversize))),
            new WaterContent(((1 - share) * fines.WaterContent.Fraction) + (share * oversizeWater.Fraction)));
    }

    /// <summary>From the total material, as in the field, to its fines. The inverse of <see cref="ToTotal"/>.</summary>
    /// <param name="total">Of the total material.</param>
    /// <param name="share">Pc, 0 to below 1.</param>
    /// <param name="specificGravity">Gc, over 0.</param>
    /// <param name="oversizeWater">wc.</param>
    /// <param name="water">Density of water.</param>
    /// <returns>The fines, or null where the oversize alone would fill the volume or hold more than all the water.</returns>
    public static DensityAndWater? ToFines(DensityAndWater total, double share, double specificGravity, WaterContent oversizeWater, Density water)
    {
        var solidOversize = specificGravity * water.KilogramsPerCubicMeter;
        var volumeOfFines = (1 / total.DryDensity.KilogramsPerCubicMeter) - (share / solidOversize);
        var waterOfFines = total.WaterContent.Fraction - (share * oversizeWater.Fraction);
        return volumeOfFines > 0 && waterOfFines >= 0
            ? new DensityAndWater(new Density((1 - share) / volumeOfFines), new WaterContent(waterOfFines / (1 - share)))
            : null;
    }

    /// <summary>The largest share for which the procedure holds: 40 % on 4.75 mm, 30 % on 19 mm (ASTM D4718; AASHTO T 99 annex); 30 % where the sieve is unknown or coarser.</summary>
    public static double LargestShare(double? sieveMillimeters) => sieveMillimeters is <= 9.5 ? 0.40 : 0.30;
}
