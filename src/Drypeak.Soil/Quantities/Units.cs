namespace Drypeak.Soil.Quantities;

/// <summary>Units of density and unit weight at the boundary. Inside, density is in kg/m³.</summary>
public enum DensityUnit
{
    /// <summary>kg/m³</summary>
    KilogramPerCubicMeter,
    /// <summary>Mg/m³</summary>
    MegagramPerCubicMeter,
    /// <summary>g/cm³</summary>
    GramPerCubicCentimeter,
    /// <summary>lb/ft³</summary>
    PoundPerCubicFoot,
    /// <summary>Unit weight, kN/m³: density times standard gravity.</summary>
    KilonewtonPerCubicMeter,
}

/// <summary>Units of mass at the boundary. Inside, mass is in kg.</summary>
public enum MassUnit
{
    /// <summary>g</summary>
    Gram,
    /// <summary>kg</summary>
    Kilogram,
    /// <summary>lb (avoirdupois)</summary>
    Pound,
}

/// <summary>Units of volume at the boundary. Inside, volume is in m³.</summary>
public enum VolumeUnit
{
    /// <summary>cm³</summary>
    CubicCentimeter,
    /// <summary>L</summary>
    Liter,
    /// <summary>m³</summary>
    CubicMeter,
    /// <summary>in³</summary>
    CubicInch,
    /// <summary>ft³</summary>
    CubicFoot,
    /// <summary>yd³</summary>
    CubicYard,
}

/// <summary>Units of length at the boundary. Inside, length is in m.</summary>
public enum LengthUnit
{
    /// <summary>mm</summary>
    Millimeter,
    /// <summary>cm</summary>
    Centimeter,
    /// <summary>m</summary>
    Meter,
    /// <summary>in</summary>
    Inch,
    /// <summary>ft</summary>
    Foot,
}

/// <summary>
/// The exact size of each unit in SI, its symbol in the interface and its symbol for readers. The international pound and foot
/// are exact by definition (lb = 0.45359237 kg, ft = 0.3048 m); standard gravity is 9.80665 m/s² (3rd CGPM, 1901).
/// </summary>
public static class UnitTable
{
    /// <summary>Standard gravity, m/s².</summary>
    public const double StandardGravity = 9.80665;

    private const double Foot = 0.3048;
    private const double Pound = 0.45359237;

    /// <summary>kg/m³ in one of the unit.</summary>
    public static double InKilogramsPerCubicMeter(this DensityUnit unit) => unit switch
    {
        DensityUnit.KilogramPerCubicMeter => 1,
        DensityUnit.MegagramPerCubicMeter or DensityUnit.GramPerCubicCentimeter => 1000,
        DensityUnit.PoundPerCubicFoot => Pound / (Foot * Foot * Foot),
        DensityUnit.KilonewtonPerCubicMeter => 1000 / StandardGravity,
        _ => throw new ArgumentOutOfRangeException(nameof(unit)),
    };

    /// <summary>kg in one of the unit.</summary>
    public static double InKilograms(this MassUnit unit) => unit switch
    {
        MassUnit.Gram => 1e-3,
        MassUnit.Kilogram => 1,
        MassUnit.Pound => Pound,
        _ => throw new ArgumentOutOfRangeException(nameof(unit)),
    };

    /// <summary>m³ in one of the unit.</summary>
    public static double InCubicMeters(this VolumeUnit unit) => unit switch
    {
        VolumeUnit.CubicCentimeter => 1e-6,
        VolumeUnit.Liter => 1e-3,
        VolumeUnit.CubicMeter => 1,
        VolumeUnit.CubicInch => Foot * Foot * Foot / 1728,
        VolumeUnit.CubicFoot => Foot * Foot * Foot,
        VolumeUnit.CubicYard => 27 * Foot * Foot * Foot,
        _ => throw new ArgumentOutOfRangeException(nameof(unit)),
    };

    /// <summary>m in one of the unit.</summary>
    public static double InMeters(this LengthUnit unit) => unit switch
    {
        LengthUnit.Millimeter => 1e-3,
        LengthUnit.Centimeter => 1e-2,
        LengthUnit.Meter => 1,
        LengthUnit.Inch => Foot / 12,
        LengthUnit.Foot => Foot,
        _ => throw new ArgumentOutOfRangeException(nameof(unit)),
    };

    /// <summary>The symbol in the interface, in ASCII: <c>Mg/m3</c>.</summary>
    public static string Code(this DensityUnit unit) => unit switch
    {
        DensityUnit.KilogramPerCubicMeter => "kg/m3",
        DensityUnit.MegagramPerCubicMeter => "Mg/m3",
        DensityUnit.GramPerCubicCentimeter => "g/cm3",
        DensityUnit.PoundPerCubicFoot => "lb/ft3",
        DensityUnit.KilonewtonPerCubicMeter => "kN/m3",
        _ => throw new ArgumentOutOfRangeException(nameof(unit)),
    };

    /// <summary>The symbol in the interface, in ASCII: <c>g</c>.</summary>
    public static string Code(this MassUnit unit) => unit switch
    {
        MassUnit.Gram => "g",
        MassUnit.Kilogram => "kg",
        MassUnit.Pound => "lb",
        _ => throw new ArgumentOutOfRangeException(nameof(unit)),
    };

    /// <summary>The symbol in the interface, in ASCII: <c>cm3</c>.</summary>
    public static string Code(this VolumeUnit unit) => unit switch
    {
        VolumeUnit.CubicCentimeter => "cm3",
        VolumeUnit.Liter => "L",
        VolumeUnit.CubicMeter => "m3",
        VolumeUnit.CubicInch => "in3",
        VolumeUnit.CubicFoot => "ft3",
        VolumeUnit.CubicYard => "yd3",
        _ => throw new ArgumentOutOfRangeException(nameof(unit)),
    };

    /// <summary>The symbol in the interface, in ASCII: <c>mm</c>.</summary>
    public static string Code(this LengthUnit unit) => unit switch
    {
        LengthUnit.Millimeter => "mm",
        LengthUnit.Centimeter => "cm",
        LengthUnit.Meter => "m",
        LengthUnit.Inch => "in",
        LengthUnit.Foot => "ft",
        _ => throw new ArgumentOutOfRangeException(nameof(unit)),
    };

    /// <summary>The symbol for readers: <c>Mg/m³</c>.</summary>
    public static string Symbol(this DensityUnit unit) => Raised(unit.Code());

    /// <summary>The symbol for readers: <c>cm³</c>.</summary>
    public static string Symbol(this VolumeUnit unit) => Raised(unit.Code());

    /// <summary>The quantity's name in that unit: dry density, or dry unit weight for a unit of weight.</summary>
    public static string DryDensityName(this DensityUnit unit) =>
        unit == DensityUnit.KilonewtonPerCubicMeter ? "dry unit weight" : "dry density";

    private static string Raised(string code) => code.EndsWith('3') ? code[..^1] + "³" : code;
}
