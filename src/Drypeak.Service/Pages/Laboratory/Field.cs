namespace Drypeak.Service.Pages.Laboratory;

/// <summary>A field of the laboratory form.</summary>
/// <param name="Name">Its name in the posted form, and its identifier in the page.</param>
/// <param name="Label">What it is called.</param>
/// <param name="Place">JSON pointer of the member of the request that it fills.</param>
/// <param name="Otherwise">What it holds before anything is chosen.</param>
public sealed record Field(string Name, string Label, string Place, string Otherwise = "")
{
    public static readonly Field Reference = new("reference", "Reference", "/reference");
    public static readonly Field Method = new("method", "Test method", "/method");
    public static readonly Field MassUnit = new("mass-unit", "Unit of mass", "/units/mass", "g");
    public static readonly Field TinUnit = new("tin-unit", "Tins weighed in", "/units/tinMass", "g");
    public static readonly Field VolumeUnit = new("volume-unit", "Unit of volume", "/units/volume", "cm3");
    public static readonly Field DensityUnit = new("density-unit", "Densities in", "/units/density", "Mg/m3");
    public static readonly Field LengthUnit = new("length-unit", "Unit of length", "/units/length", "mm");
    public static readonly Field MoldMass = new("mold-mass", "Mass of the mold", "/mold/mass");
    public static readonly Field MoldVolume = new("mold-volume", "Volume of the mold", "/mold/volume");
    public static readonly Field MoldDiameter = new("mold-diameter", "Inside diameter", "/mold/diameter");
    public static readonly Field MoldHeight = new("mold-height", "Inside height", "/mold/height");
    public static readonly Field SpecificGravity = new("specific-gravity", "Specific gravity", "/specificGravity/value");
    public static readonly Field Determined = new("determined", "How it is known", "/specificGravity/determined", "assumed");
    public static readonly Field Table = new("table", "Table of specimens", "/specimens");
    public static readonly Field DecimalMark = new("decimal-mark", "Decimal mark", "", "found");
    public static readonly Field WaterTemperature = new("water-temperature", "Water temperature", "/waterTemperature");
    public static readonly Field CurveModel = new("curve-model", "Curve", "/curve/model", "auto");
    public static readonly Field SaturationLines = new("saturation-lines", "Lines of saturation", "/lines/saturation");
    public static readonly Field AirVoidsLines = new("air-voids-lines", "Lines of air voids", "/lines/airVoids");
    public static readonly Field OversizePercent = new("oversize-percent", "Share of the dry mass", "/oversize/percent");
    public static readonly Field OversizeGravity = new("oversize-gravity", "Gs of the particles, bulk", "/oversize/specificGravity");
    public static readonly Field OversizeWater = new("oversize-water", "Their water content", "/oversize/waterContent");
    public static readonly Field OversizeSieve = new("oversize-sieve", "Retained on the sieve", "/oversize/sieve");
    public static readonly Field AdoptedWater = new("adopted-water", "Adopted optimum water content", "/curve/adopted/waterContent");
    public static readonly Field AdoptedDensity = new("adopted-density", "Adopted maximum dry density", "/curve/adopted/maximumDryDensity");
    public static readonly Field AdoptedReason = new("adopted-reason", "Reason for it", "/curve/adopted/reason");
    public static readonly Field Working = new("working", "Show the working", "/trace");

    /// <summary>Rows that the grid shows at least.</summary>
    public static readonly Field GridRows = new("grid-rows", "", "");

    public static IReadOnlyList<Field> All { get; } =
    [
        Reference, Method, MassUnit, TinUnit, VolumeUnit, DensityUnit, LengthUnit, MoldMass, MoldVolume, MoldDiameter, MoldHeight,
        SpecificGravity, Determined, Table, DecimalMark, WaterTemperature, CurveModel, SaturationLines, AirVoidsLines,
        OversizePercent, OversizeGravity, OversizeWater, OversizeSieve, AdoptedWater, AdoptedDensity, AdoptedReason, Working, GridRows,
    ];

    private static readonly Dictionary<string, Field> ByPlace = All.Where(field => field.Place.Length > 0).ToDictionary(field => field.Place);

    /// <summary>Identifier of the sentence that says what is wrong with it.</summary>
    public string FaultId => Name + "-fault";

    /// <summary>Identifier of the hint below it.</summary>
    public string HintId => Name + "-hint";

    /// <summary>The field that fills a place of the request, or the place that holds it; the table where no field does.</summary>
    public static Field Of(string place)
    {
        for (var at = place; at.Length > 0; at = at[..at.LastIndexOf('/')])
        {
            if (ByPlace.TryGetValue(at, out var field) || (field = All.FirstOrDefault(field => field.Place.StartsWith(at + "/", StringComparison.Ordinal))) is not null)
            {
                return field;
            }
        }

        return Table;
    }
}
