using System.Globalization;
using Drypeak.Service.Contracts;
using Drypeak.Service.Earthwork;

namespace Drypeak.Service.Pages.Earthwork;

/// <summary>Numbers as a sheet for the site shows them: no exponent, thousands parted by a narrow space, as many digits as a site can use.</summary>
internal static class SiteNumbers
{
    private const int Digits = 4;
    private const string NarrowSpace = "\u202F";

    private static readonly NumberFormatInfo Grouped = new() { NumberGroupSeparator = NarrowSpace, NumberDecimalSeparator = ".", NegativeSign = "−" };

    /// <summary>To four digits, but whole where it has more.</summary>
    public static string Text(double value)
    {
        var decimals = value == 0 ? 0 : Math.Clamp(Digits - 1 - (int)Math.Floor(Math.Log10(Math.Abs(value))), 0, 6);
        var rounded = Math.Round(value, decimals);
        return (rounded == 0 ? 0 : rounded).ToString(Math.Abs(rounded) >= 10_000 ? "N0" : "0.######", Grouped);
    }

    /// <summary>With its unit.</summary>
    public static string Text(double value, string unit) => Text(value) + NarrowSpace + Symbol(unit);

    /// <summary>Water by volume and by mass.</summary>
    public static string Text(WaterAmountAnswer water, EarthworkUnitsContract units) => $"{Text(water.Liquid, units.Liquid!)} ({Text(water.Mass, units.Mass!)})";

    /// <summary>Percent, to a tenth.</summary>
    public static string Percent(double value) => Math.Round(value, 1).ToString("0.0", Grouped) + NarrowSpace + "%";

    /// <summary>A number as it was given, in full.</summary>
    public static string Given(double? value) => RuleWords.Text(value).Replace('-', '−');

    /// <summary>A unit's code as readers write it.</summary>
    public static string Symbol(string code) => code switch
    {
        "short-ton" => "short ton",
        _ => code[^1] switch { '2' => code[..^1] + "²", '3' => code[..^1] + "³", _ => code },
    };
}
