using Drypeak.Soil.Quantities;

namespace Drypeak.Soil.Phases;

/// <summary>
/// The phase relations of soil: solids, water and air. Textbook definitions, as in ISO 14688 and ASTM D653 (from memory):
/// with Gs the specific gravity of solids, ρw the density of water, w the water content and ρd the dry density.
/// </summary>
public static class PhaseRelations
{
    /// <summary>Dry density from wet density: ρd = ρ/(1 + w), w on dry mass.</summary>
    public static Density DryDensity(Density wet, WaterContent w) => new(wet.KilogramsPerCubicMeter / (1 + w.Fraction));

    /// <summary>Wet density from dry density: ρ = ρd(1 + w).</summary>
    public static Density WetDensity(Density dry, WaterContent w) => new(dry.KilogramsPerCubicMeter * (1 + w.Fraction));

    /// <summary>Void ratio e = Gs·ρw/ρd − 1. Below 0 only where the data are impossible.</summary>
    public static double VoidRatio(Density dry, double specificGravity, Density water) =>
        (specificGravity * water.KilogramsPerCubicMeter / dry.KilogramsPerCubicMeter) - 1;

    /// <summary>Porosity n = e/(1 + e), as a fraction of the total volume.</summary>
    public static double Porosity(double voidRatio) => voidRatio / (1 + voidRatio);

    /// <summary>Degree of saturation Sr = w·Gs/e, as a fraction of the voids; over 1 only where the data are impossible, and without meaning where e is not above 0.</summary>
    public static double Saturation(WaterContent w, double voidRatio, double specificGravity) => w.Fraction * specificGravity / voidRatio;

    /// <summary>Air voids A = n(1 − Sr) = n − w·ρd/ρw, as a fraction of the total volume.</summary>
    public static double AirVoids(WaterContent w, Density dry, double specificGravity, Density water) =>
        Porosity(VoidRatio(dry, specificGravity, water)) - (w.Fraction * dry.KilogramsPerCubicMeter / water.KilogramsPerCubicMeter);

    /// <summary>Dry density on the line of a degree of saturation: ρd = Gs·ρw/(1 + w·Gs/S).</summary>
    /// <param name="w">Water content.</param>
    /// <param name="saturation">Fraction of the voids, over 0; 1 is the zero-air-voids line.</param>
    /// <param name="specificGravity">Gs.</param>
    /// <param name="water">Density of water.</param>
    public static Density OnSaturationLine(WaterContent w, double saturation, double specificGravity, Density water) =>
        new(specificGravity * water.KilogramsPerCubicMeter / (1 + (w.Fraction * specificGravity / saturation)));

    /// <summary>Dry density on the line of a share of air voids: ρd = (1 − A)·ρw/(1/Gs + w).</summary>
    /// <param name="w">Water content.</param>
    /// <param name="airVoids">Fraction of the total volume, 0 to below 1.</param>
    /// <param name="specificGravity">Gs.</param>
    /// <param name="water">Density of water.</param>
    public static Density OnAirVoidsLine(WaterContent w, double airVoids, double specificGravity, Density water) =>
        new((1 - airVoids) * water.KilogramsPerCubicMeter / ((1 / specificGravity) + w.Fraction));

    /// <summary>The zero-air-voids line: saturation 100 %.</summary>
    public static Density OnZeroAirVoidsLine(WaterContent w, double specificGravity, Density water) =>
        OnSaturationLine(w, 1, specificGravity, water);

    /// <summary>The smallest specific gravity with which a point does not lie above the zero-air-voids line: 1/Gs = ρw/ρd − w. Infinite where none does.</summary>
    public static double SmallestSpecificGravity(WaterContent w, Density dry, Density water)
    {
        var volumeOfSolids = (water.KilogramsPerCubicMeter / dry.KilogramsPerCubicMeter) - w.Fraction;
        return volumeOfSolids > 0 ? 1 / volumeOfSolids : double.PositiveInfinity;
    }
}
