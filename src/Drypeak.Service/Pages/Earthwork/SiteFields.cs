using Drypeak.Service.Contracts;
using Drypeak.Service.Earthwork;
using Drypeak.Service.Pages.Forms;
using Drypeak.Soil.Quantities;

namespace Drypeak.Service.Pages.Earthwork;

/// <summary>The fields that several pages of planning the work have: units as sites use them.</summary>
internal static class SiteFields
{
    public static readonly ChoiceField Mass = new("mass-unit", "Masses in", "/units/mass", [.. EarthworkUnitNames.Mass.Select(unit => new Choice(unit.Key, unit.Value.Symbol()))]) { Otherwise = "t" };
    public static readonly ChoiceField Liquid = new("liquid-unit", "Water in", "/units/liquid", [.. EarthworkUnitNames.Liquid.Select(unit => new Choice(unit.Key, unit.Value.Symbol()))]);
    public static readonly ChoiceField Area = new("area-unit", "Areas in", "/units/area", [.. EarthworkUnitNames.Area.Select(unit => new Choice(unit.Key, unit.Value.Symbol()))]);
    public static readonly ChoiceField BulkVolume = new("bulk-volume-unit", "Volumes of earth in", "/units/bulkVolume", [.. EarthworkUnitNames.BulkVolume.Select(unit => new Choice(unit.Key, unit.Value.Symbol()))]);
    public static readonly ChoiceField Length = new("length-unit", "Lengths in", "/units/length", FormFields.Codes(UnitNames.Length.Keys)) { Otherwise = "m" };
    public static readonly ChoiceField Speed = new("speed-unit", "Speeds in", "/units/speed", FormFields.Codes(EarthworkUnitNames.Speed.Keys));
    public static readonly ChoiceField Distance = new("distance-unit", "Distances in", "/units/distance", FormFields.Codes(EarthworkUnitNames.Distance.Keys));

    /// <summary>The density of water follows from it.</summary>
    public static readonly NumberField WaterTemperature = new("water-temperature", "Temperature of the water", "/waterTemperature") { Unit = "°C", Hint = "20 where it is left open" };
}
