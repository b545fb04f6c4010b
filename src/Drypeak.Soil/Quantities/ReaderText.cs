using System.Globalization;

namespace Drypeak.Soil.Quantities;

/// <summary>Quantities as they stand in a sentence: few digits, invariant culture, a thin reading of the number, never the number itself.</summary>
public static class ReaderText
{
    /// <summary>A density with the decimals that a reader can use in that unit: <c>1.832 Mg/m³</c>.</summary>
    public static string Of(Density density, DensityUnit unit)
    {
        var decimals = unit switch
        {
            DensityUnit.KilogramPerCubicMeter => 0,
            DensityUnit.PoundPerCubicFoot => 1,
            DensityUnit.KilonewtonPerCubicMeter => 2,
            _ => 3,
        };
        return $"{Fixed(density.In(unit), decimals)} {unit.Symbol()}";
    }

    /// <summary>A water content: <c>13.94 %</c>.</summary>
    public static string Of(WaterContent w) => $"{Fixed(w.Percent, 2)} %";

    /// <summary>A volume: <c>943.3 cm³</c>.</summary>
    public static string Of(Volume volume, VolumeUnit unit) => $"{Significant(volume.In(unit))} {unit.Symbol()}";

    /// <summary>A mass: <c>6021.4 g</c>.</summary>
    public static string Of(Mass mass, MassUnit unit) => $"{Significant(mass.In(unit))} {unit.Code()}";

    /// <summary>A length: <c>116.4 mm</c>.</summary>
    public static string Of(Length length, LengthUnit unit) => $"{Significant(length.In(unit))} {unit.Code()}";

    /// <summary>A fraction as percent: <c>3.1 %</c>.</summary>
    public static string Percent(double fraction, int decimals = 1) => $"{Fixed(fraction * 100, decimals)} %";

    /// <summary>A plain number with a given number of decimals and a real minus.</summary>
    public static string Fixed(double value, int decimals) =>
        value.ToString("F" + decimals.ToString(CultureInfo.InvariantCulture), CultureInfo.InvariantCulture).Replace('-', '−');

    /// <summary>A plain number to five significant digits.</summary>
    public static string Significant(double value) => value.ToString("G5", CultureInfo.InvariantCulture).Replace('-', '−');
}
