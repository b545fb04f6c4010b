namespace Drypeak.Soil.Quantities;

/// <summary>A density (wet, dry, of water or of sand), kept in kg/m³. Any finite number; the default is 0. Immutable, safe on any thread.</summary>
/// <param name="KilogramsPerCubicMeter">kg/m³.</param>
public readonly record struct Density(double KilogramsPerCubicMeter)
{
    /// <summary>The density that <paramref name="value"/> of <paramref name="unit"/> is.</summary>
    public static Density From(double value, DensityUnit unit) => new(value * unit.InKilogramsPerCubicMeter());

    /// <summary>The number of <paramref name="unit"/>.</summary>
    public double In(DensityUnit unit) => KilogramsPerCubicMeter / unit.InKilogramsPerCubicMeter();
}

/// <summary>A mass, kept in kg. Any finite number; the default is 0. Immutable, safe on any thread.</summary>
/// <param name="Kilograms">kg.</param>
public readonly record struct Mass(double Kilograms)
{
    /// <summary>The mass that <paramref name="value"/> of <paramref name="unit"/> is.</summary>
    public static Mass From(double value, MassUnit unit) => new(value * unit.InKilograms());

    /// <summary>The number of <paramref name="unit"/>.</summary>
    public double In(MassUnit unit) => Kilograms / unit.InKilograms();

    /// <summary>The difference of two masses, as of a full and an empty vessel.</summary>
    public static Mass operator -(Mass full, Mass empty) => new(full.Kilograms - empty.Kilograms);

    /// <summary>A density: mass over volume.</summary>
    public static Density operator /(Mass mass, Volume volume) => new(mass.Kilograms / volume.CubicMeters);
}

/// <summary>A volume, kept in m³. Any finite number; the default is 0. Immutable, safe on any thread.</summary>
/// <param name="CubicMeters">m³.</param>
public readonly record struct Volume(double CubicMeters)
{
    /// <summary>The volume that <paramref name="value"/> of <paramref name="unit"/> is.</summary>
    public static Volume From(double value, VolumeUnit unit) => new(value * unit.InCubicMeters());

    /// <summary>The number of <paramref name="unit"/>.</summary>
    public double In(VolumeUnit unit) => CubicMeters / unit.InCubicMeters();

    /// <summary>The volume of a cylinder.</summary>
    public static Volume OfCylinder(Length diameter, Length height) =>
        new(Math.PI / 4 * diameter.Meters * diameter.Meters * height.Meters);
}

/// <summary>A length, kept in m. Any finite number; the default is 0. Immutable, safe on any thread.</summary>
/// <param name="Meters">m.</param>
public readonly record struct Length(double Meters)
{
    /// <summary>The length that <paramref name="value"/> of <paramref name="unit"/> is.</summary>
    public static Length From(double value, LengthUnit unit) => new(value * unit.InMeters());

    /// <summary>The number of <paramref name="unit"/>.</summary>
    public double In(LengthUnit unit) => Meters / unit.InMeters();
}

/// <summary>An area, kept in m². Any finite number; the default is 0. Immutable, safe on any thread.</summary>
/// <param name="SquareMeters">m².</param>
public readonly record struct Area(double SquareMeters)
{
    /// <summary>The area that <paramref name="value"/> of <paramref name="unit"/> is.</summary>
    public static Area From(double value, AreaUnit unit) => new(value * unit.InSquareMeters());

    /// <summary>The number of <paramref name="unit"/>.</summary>
    public double In(AreaUnit unit) => SquareMeters / unit.InSquareMeters();
}

/// <summary>A speed, kept in m/s. Any finite number; the default is 0. Immutable, safe on any thread.</summary>
/// <param name="MetersPerSecond">m/s.</param>
public readonly record struct Speed(double MetersPerSecond)
{
    /// <summary>The speed that <paramref name="value"/> of <paramref name="unit"/> is.</summary>
    public static Speed From(double value, SpeedUnit unit) => new(value * unit.InMetersPerSecond());

    /// <summary>The number of <paramref name="unit"/>.</summary>
    public double In(SpeedUnit unit) => MetersPerSecond / unit.InMetersPerSecond();
}

/// <summary>
/// A water content: mass of water over mass of dry solids (never over wet mass), kept as a fraction. 0 or more for a real soil,
/// and over 1 for some clays and peats. The default is 0. Immutable, safe on any thread.
/// </summary>
/// <param name="Fraction">kg of water to a kg of dry solids.</param>
public readonly record struct WaterContent(double Fraction)
{
    /// <summary>In percent of dry mass.</summary>
    public double Percent => Fraction * 100;

    /// <summary>The water content that <paramref name="percent"/> of dry mass is.</summary>
    public static WaterContent FromPercent(double percent) => new(percent / 100);

    /// <summary>The water content whose share of the <em>wet</em> mass is <paramref name="percent"/>; it must be below 100.</summary>
    public static WaterContent FromPercentOfWetMass(double percent) => new(percent / (100 - percent));
}
