using Drypeak.Soil.Phases;
using Drypeak.Soil.Quantities;

namespace Drypeak.Soil.Laboratory;

/// <summary>A specimen's reduced quantities.</summary>
/// <param name="Label">The caller's name for it.</param>
/// <param name="WaterContent">On dry mass.</param>
/// <param name="WetDensity">Wet density.</param>
/// <param name="DryDensity">Dry density.</param>
/// <param name="MoldVolume">Volume of the mold, where the data begin with masses.</param>
/// <param name="SoilVolume">Volume of the soil, where the data begin with masses: the mold's, less what stays empty below its rim.</param>
/// <param name="SetAside">Why the point is not fitted, or null where it is.</param>
public sealed record Specimen(
    string Label,
    WaterContent WaterContent,
    Density WetDensity,
    Density DryDensity,
    Volume? MoldVolume,
    Volume? SoilVolume,
    string? SetAside)
{
    /// <summary>The phases of the specimen, or null where the density of solids is unknown or not above the dry density.</summary>
    public Phases? PhasesWith(double? specificGravity, Density water)
    {
        if (specificGravity is not { } gs || PhaseRelations.VoidRatio(DryDensity, gs, water) is not (> 0 and var voidRatio))
        {
            return null;
        }

        return new Phases(
            voidRatio,
            PhaseRelations.Porosity(voidRatio),
            PhaseRelations.Saturation(WaterContent, voidRatio, gs),
            PhaseRelations.AirVoids(WaterContent, DryDensity, gs, water));
    }
}

/// <summary>What a specimen's volume consists of; fractions, not percent.</summary>
/// <param name="VoidRatio">Volume of voids over volume of solids.</param>
/// <param name="Porosity">Volume of voids over total volume.</param>
/// <param name="Saturation">Volume of water over volume of voids; over 1 where the point lies above the zero-air-voids line.</param>
/// <param name="AirVoids">Volume of air over total volume; below 0 where the point lies above the zero-air-voids line.</param>
public sealed record Phases(double VoidRatio, double Porosity, double Saturation, double AirVoids);
