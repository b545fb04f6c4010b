namespace Drypeak.Soil.Quantities;

/// <summary>The units that a caller speaks about earthwork: those of the laboratory, and those that only a site needs. The default is the house's.</summary>
/// <param name="Basic">Mass, tins, density and length. Masses may be tonnes here.</param>
/// <param name="Liquid">Of water by volume.</param>
/// <param name="Area">Of surfaces.</param>
/// <param name="BulkVolume">Of earth in bank, truck or fill.</param>
/// <param name="Speed">Of rollers and trucks.</param>
/// <param name="Distance">Of a haul.</param>
public sealed record EarthworkUnits(
    UnitSet Basic,
    VolumeUnit Liquid = VolumeUnit.Liter,
    AreaUnit Area = AreaUnit.SquareMeter,
    VolumeUnit BulkVolume = VolumeUnit.CubicMeter,
    SpeedUnit Speed = SpeedUnit.KilometerPerHour,
    LengthUnit Distance = LengthUnit.Meter)
{
    /// <summary>Of soil and water by weight.</summary>
    public MassUnit Mass => Basic.Mass;

    /// <summary>Of soil and water.</summary>
    public DensityUnit Density => Basic.Density;

    /// <summary>Of widths, stations and thicknesses.</summary>
    public LengthUnit Length => Basic.Length;
}
