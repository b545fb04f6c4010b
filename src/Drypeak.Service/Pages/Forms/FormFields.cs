using Drypeak.Service.Contracts;
using Drypeak.Soil.Quantities;

namespace Drypeak.Service.Pages.Forms;

/// <summary>The fields that many forms have.</summary>
internal static class FormFields
{
    public static readonly TextField Reference = new("reference", "Reference", "/reference");
    public static readonly ChoiceField MassUnit = new("mass-unit", "Masses in", "/units/mass", Codes(UnitNames.Mass.Keys));
    public static readonly ChoiceField TinUnit = new("tin-unit", "Tins weighed in", "/units/tinMass", Codes(UnitNames.Mass.Keys));
    public static readonly ChoiceField VolumeUnit = new("volume-unit", "Volumes in", "/units/volume", [.. UnitNames.Volume.Select(unit => new Choice(unit.Key, unit.Value.Symbol()))]);
    public static readonly ChoiceField DensityUnit = new("density-unit", "Densities in", "/units/density", [.. UnitNames.Density.Select(unit => new Choice(unit.Key, unit.Value.Symbol()))]) { Otherwise = "Mg/m3" };
    public static readonly ChoiceField LengthUnit = new("length-unit", "Lengths in", "/units/length", Codes(UnitNames.Length.Keys));

    /// <summary>It fills no place: it tells how numbers are read.</summary>
    public static readonly ChoiceField DecimalMark = new("decimal-mark", "Decimal mark", "", [new("found", "as found"), new("point", "point, 1.5"), new("comma", "comma, 1,5")]);

    public static readonly CheckField Working = new("working", "Show the working", "/trace");

    /// <summary>Whether the specific gravity beside it was measured.</summary>
    public static readonly ChoiceField Determined = new("determined", "How it is known", "/specificGravity/determined", [new("assumed", "assumed"), new("measured", "measured")])
    {
        OnlyWith = ["specific-gravity"],
    };

    public static readonly NumberField SpecificGravity = new("specific-gravity", "Specific gravity", "/specificGravity/value") { Beside = Determined };

    public static readonly NumberField WaterTemperature = new("water-temperature", "Water temperature", "/waterTemperature") { Unit = "°C", Hint = "20 where nothing is given" };

    public static IReadOnlyList<Choice> Codes(IEnumerable<string> codes) => [.. codes.Select(code => new Choice(code, code))];
}
