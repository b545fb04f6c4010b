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
    /// <summary>t, 1000 kg</summary>
    Tonne,
    /// <summary>Short ton, 2000 lb</summary>
    ShortTon,
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
    /// <summary>US gallon, 231 in³</summary>
    Gallon,
    /// <summary>acre-foot, 43,560 ft³</summary>
    AcreFoot,
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
    /// <summary>km</summary>
    Kilometer,
    /// <summary>mi, 5280 ft</summary>
    Mile,
}

/// <summary>Units of area at the boundary. Inside, area is in m².</summary>
public enum AreaUnit
{
    /// <summary>m²</summary>
    SquareMeter,
    /// <summary>ha, 10,000 m²</summary>
    Hectare,
    /// <summary>ft²</summary>
    SquareFoot,
    /// <summary>yd²</summary>
    SquareYard,
    /// <summary>acre, 4840 yd²</summary>
    Acre,
}

/// <summary>Units of speed at the boundary. Inside, speed is in m/s.</summary>
public enum SpeedUnit
{
    /// <summary>km/h</summary>
    KilometerPerHour,
    /// <summary>mph, miles an hour</summary>
    MilePerHour,
}

/// <summary>
/// The exact size of each unit in SI, its symbol in the interface and its symbol for readers. The international pound and foot
/// are exact by definition (lb = 0.45359237 kg, ft = 0.3048 m), and with them yard, mile, acre, gallon (231 in³) and short ton (2000 lb);
/// standard gravity is 9.80665 m/s² (3rd CGPM, 1901). The acre is the international one: the survey foot is not used.
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
        MassUnit.Tonne => 1000,
        MassUnit.ShortTon => 2000 * Pound,
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
        VolumeUnit.Gallon => 231 * Foot * Foot * Foot / 1728,
        VolumeUnit.AcreFoot => 43_560 * Foot * Foot * Foot,
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
        LengthUnit.Kilometer => 1000,
        LengthUnit.Mile => 5280 * Foot,
        _ => throw new ArgumentOutOfRangeException(nameof(unit)),
    };

    /// <summary>m² in one of the unit.</summary>
    public static double InSquareMeters(this AreaUnit unit) => unit switch
    {
        AreaUnit.SquareMeter => 1,
        AreaUnit.Hectare => 10_000,
        AreaUnit.SquareFoot => Foot * Foot,
        AreaUnit.SquareYard => 9 * Foot * Foot,
        AreaUnit.Acre => 43_560 * Foot * Foot,
        _ => throw new ArgumentOutOfRangeException(nameof(unit)),
    };

    /// <summary>m/s in one of the unit.</summary>
    public static double InMetersPerSecond(this SpeedUnit unit) => unit switch
    {
        SpeedUnit.KilometerPerHour => 1000.0 / 3600,
        SpeedUnit.MilePerHour => 5280 * Foot / 3600,
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
        MassUnit.Tonne => "t",
        MassUnit.ShortTon => "short-ton",
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
        VolumeUnit.Gallon => "gal",
        VolumeUnit.AcreFoot => "acre-ft",
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
        LengthUnit.Kilometer => "km",
        LengthUnit.Mile => "mi",
        _ => throw new ArgumentOutOfRangeException(nameof(unit)),
    };

    /// <summary>The symbol in the interface, in ASCII: <c>m2</c>.</summary>
    public static string Code(this AreaUnit unit) => unit switch
    {
        AreaUnit.SquareMeter => "m2",
        AreaUnit.Hectare => "ha",
        AreaUnit.SquareFoot => "ft2",
        AreaUnit.SquareYard => "yd2",
        AreaUnit.Acre => "acre",
        _ => throw new ArgumentOutOfRangeException(nameof(unit)),
    };

    /// <summary>The symbol in the interface: <c>km/h</c>. Readers see the same.</summary>
    public static string Code(this SpeedUnit unit) => unit switch
    {
        SpeedUnit.KilometerPerHour => "km/h",
        SpeedUnit.MilePerHour => "mph",
        _ => throw new ArgumentOutOfRangeException(nameof(unit)),
    };

    /// <summary>The symbol for readers: <c>Mg/m³</c>.</summary>
    public static string Symbol(this DensityUnit unit) => Raised(unit.Code());

    /// <summary>The symbol for readers: <c>cm³</c>.</summary>
    public static string Symbol(this VolumeUnit unit) => Raised(unit.Code());

    /// <summary>The symbol for readers: <c>m²</c>.</summary>
    public static string Symbol(this AreaUnit unit) => Raised(unit.Code());

    /// <summary>The symbol for readers: <c>t</c>.</summary>
    public static string Symbol(this MassUnit unit) => unit == MassUnit.ShortTon ? "short ton" : unit.Code();

    /// <summary>The quantity's name in that unit: dry density, or dry unit weight for a unit of weight.</summary>
    public static string DryDensityName(this DensityUnit unit) =>
        unit == DensityUnit.KilonewtonPerCubicMeter ? "dry unit weight" : "dry density";

    private static string Raised(string code) => code[^1] switch
    {
        '2' => code[..^1] + "²",
        '3' => code[..^1] + "³",
        _ => code,
    };
}
