namespace Drypeak.Soil.Quantities;

/// <summary>The units that a caller speaks: numbers come and go in these, and texts name them. The default is the house's.</summary>
/// <param name="Mass">Of mold and soil.</param>
/// <param name="TinMass">Of moisture tins.</param>
/// <param name="Volume">Of molds.</param>
/// <param name="Density">Of soil and water.</param>
/// <param name="Length">Of molds.</param>
public sealed record UnitSet(
    MassUnit Mass = MassUnit.Gram,
    MassUnit TinMass = MassUnit.Gram,
    VolumeUnit Volume = VolumeUnit.CubicCentimeter,
    DensityUnit Density = DensityUnit.MegagramPerCubicMeter,
    LengthUnit Length = LengthUnit.Millimeter);
