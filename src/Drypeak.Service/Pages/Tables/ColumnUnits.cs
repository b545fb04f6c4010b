using System.Globalization;
using Drypeak.Service.Contracts;
using Drypeak.Soil.Quantities;

namespace Drypeak.Service.Pages.Tables;

/// <summary>The units that a header may name, and what they make of a cell.</summary>
internal static class ColumnUnits
{
    /// <summary>Other spellings of the units' codes, in lower case and with plain digits.</summary>
    private static readonly Dictionary<string, string> Spellings = new(StringComparer.Ordinal)
    {
        ["gram"] = "g",
        ["grams"] = "g",
        ["lbs"] = "lb",
        ["cc"] = "cm3",
        ["ml"] = "cm3",
        ["l"] = "L",
        ["mg/m3"] = "Mg/m3",
        ["t/m3"] = "Mg/m3",
        ["g/cc"] = "g/cm3",
        ["g/ml"] = "g/cm3",
        ["pcf"] = "lb/ft3",
        ["kn/m3"] = "kN/m3",
        ["percent"] = "%",
    };

    /// <summary>The unit's code, or null where the measure has no such unit.</summary>
    public static string? Code(Measure measure, string written)
    {
        var plain = written.Trim().ToLowerInvariant().Replace("³", "3", StringComparison.Ordinal).Replace("^3", "3", StringComparison.Ordinal).Replace(" ", "", StringComparison.Ordinal);
        var code = Spellings.GetValueOrDefault(plain, plain);
        return Known(measure).Contains(code) ? code : null;
    }

    /// <summary>The units that a measure may have.</summary>
    public static IEnumerable<string> Known(Measure measure) => measure switch
    {
        Measure.Mass or Measure.TinMass => UnitNames.Mass.Keys,
        Measure.Volume => UnitNames.Volume.Keys,
        Measure.Length => UnitNames.Length.Keys,
        Measure.Density => UnitNames.Density.Keys,
        Measure.Percent => ["%"],
        _ => [],
    };

    /// <summary>The form's unit of a measure.</summary>
    public static string Of(Measure measure, UnitSet units) => measure switch
    {
        Measure.Mass => units.Mass.Code(),
        Measure.TinMass => units.TinMass.Code(),
        Measure.Volume => units.Volume.Code(),
        Measure.Length => units.Length.Code(),
        Measure.Density => units.Density.Code(),
        Measure.Percent => "%",
        _ => "",
    };

    /// <summary>A unit's code as readers write it.</summary>
    public static string Symbol(string code) => code.EndsWith('3') ? code[..^1] + "³" : code;

    /// <summary>A number of the column's own unit in the form's unit.</summary>
    public static double InFormUnits(double number, Column column, UnitSet units)
    {
        if (column.Unit is not { } unit || unit == Of(column.Kind.Measure, units))
        {
            return number;
        }

        var converted = column.Kind.Measure switch
        {
            Measure.Mass => Mass.From(number, UnitNames.Mass[unit]).In(units.Mass),
            Measure.TinMass => Mass.From(number, UnitNames.Mass[unit]).In(units.TinMass),
            Measure.Volume => Volume.From(number, UnitNames.Volume[unit]).In(units.Volume),
            Measure.Length => Length.From(number, UnitNames.Length[unit]).In(units.Length),
            Measure.Density => Density.From(number, UnitNames.Density[unit]).In(units.Density),
            _ => number,
        };

        // Fifteen digits are all that a double is sure to hold: 6.0214 kg shall read 6021.4 g, not 6021.400000000001 g.
        return double.Parse(converted.ToString("G15", CultureInfo.InvariantCulture), CultureInfo.InvariantCulture);
    }
}
