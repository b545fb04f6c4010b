using Drypeak.Service.Pages.Forms;
using Drypeak.Service.Pages.Tables;
using Drypeak.Soil.TestMethods;

namespace Drypeak.Service.Pages.Laboratory;

/// <summary>The fields of the laboratory form.</summary>
internal static class TestFields
{
    public static readonly FormField Reference = FormFields.Reference;
    public static readonly FormField Method = new ChoiceField("method", "Test method", "/method",
        [new("", "not named"), .. TestMethodCatalogue.All.Select(method => new Choice(method.Code, method.Title, method.Standard))]);

    public static readonly ChoiceField MassUnit = new("mass-unit", "Unit of mass", "/units/mass", FormFields.MassUnit.Choices);
    public static readonly ChoiceField TinUnit = FormFields.TinUnit;
    public static readonly ChoiceField VolumeUnit = new("volume-unit", "Unit of volume", "/units/volume", FormFields.VolumeUnit.Choices);
    public static readonly ChoiceField DensityUnit = FormFields.DensityUnit;
    public static readonly ChoiceField LengthUnit = new("length-unit", "Unit of length", "/units/length", FormFields.LengthUnit.Choices);
    public static readonly FormField MoldMass = new NumberField("mold-mass", "Mass of the mold", "/mold/mass") { Beside = MassUnit };
    public static readonly FormField MoldVolume = new NumberField("mold-volume", "Volume of the mold", "/mold/volume") { Beside = VolumeUnit };
    public static readonly FormField MoldDiameter = new NumberField("mold-diameter", "Inside diameter", "/mold/diameter") { Beside = LengthUnit };
    public static readonly FormField MoldHeight = new NumberField("mold-height", "Inside height", "/mold/height") { Hint = "in the same unit" };
    public static readonly ChoiceField Determined = FormFields.Determined;
    public static readonly FormField SpecificGravity = FormFields.SpecificGravity with { Hint = "Of the solids. It gives saturations and the zero-air-voids line." };
    public static readonly FormField Table = new TableField("table", "Table of specimens", "/specimens", ColumnKind.All)
    {
        Lines = 8,
        Example = "Specimen\tMold + wet soil\tTin\tTin + wet soil\tTin + dry soil",
        Hint = "Pasted with its header from a spreadsheet, or typed with spaces, commas or semicolons between.",
    };

    public static readonly ChoiceField DecimalMark = FormFields.DecimalMark;
    public static readonly FormField WaterTemperature = new NumberField("water-temperature", "Water temperature", "/waterTemperature") { Unit = "°C", Hint = "20 where nothing is given" };
    public static readonly FormField CurveModel = new ChoiceField("curve-model", "Curve", "/curve/model",
    [
        new("auto", "as the data allow"), new("averaged", "averaged over curves"), new("saturation", "anchored in saturation"),
        new("parabola", "parabola"), new("cubic", "cubic"), new("spline", "spline through the points"),
    ]);

    public static readonly FormField SaturationLines = new NumbersField("saturation-lines", "Lines of saturation", "/lines/saturation") { Unit = "%", Hint = "such as 90 80" };
    public static readonly FormField AirVoidsLines = new NumbersField("air-voids-lines", "Lines of air voids", "/lines/airVoids") { Unit = "%", Hint = "such as 5 10" };
    public static readonly FormField OversizePercent = new NumberField("oversize-percent", "Share of the dry mass", "/oversize/percent") { Unit = "%" };
    public static readonly FormField OversizeGravity = new NumberField("oversize-gravity", "Gs of the particles, bulk", "/oversize/specificGravity");
    public static readonly FormField OversizeWater = new NumberField("oversize-water", "Their water content", "/oversize/waterContent") { Unit = "%" };
    public static readonly FormField OversizeSieve = new NumberField("oversize-sieve", "Retained on the sieve", "/oversize/sieve") { Unit = "mm" };
    public static readonly FormField AdoptedWater = new NumberField("adopted-water", "Adopted optimum water content", "/curve/adopted/waterContent") { Unit = "%" };
    public static readonly FormField AdoptedDensity = new NumberField("adopted-density", "Adopted maximum dry density", "/curve/adopted/maximumDryDensity") { Hint = "in the unit of densities" };
    public static readonly FormField AdoptedReason = new TextField("adopted-reason", "Reason for it", "/curve/adopted/reason") { Hint = "is reported with it, beside the fitted peak" };
    public static readonly FormField Working = FormFields.Working;

    /// <summary>Rows that the grid shows at least.</summary>
    public static readonly FormField GridRows = new TextField("grid-rows", "", "");

    public static IReadOnlyList<FormField> All { get; } =
    [
        Reference, Method, MassUnit, TinUnit, VolumeUnit, DensityUnit, LengthUnit, MoldMass, MoldVolume, MoldDiameter, MoldHeight,
        SpecificGravity, Determined, Table, DecimalMark, WaterTemperature, CurveModel, SaturationLines, AirVoidsLines,
        OversizePercent, OversizeGravity, OversizeWater, OversizeSieve, AdoptedWater, AdoptedDensity, AdoptedReason, Working, GridRows,
    ];

    /// <summary>The fields that are folded away until they are wrong.</summary>
    public static IReadOnlyList<FormField> UnderMore { get; } =
    [
        CurveModel, WaterTemperature, SaturationLines, AirVoidsLines, OversizePercent, OversizeSieve, OversizeGravity, OversizeWater,
        MoldDiameter, MoldHeight, LengthUnit, AdoptedDensity, AdoptedWater, AdoptedReason,
    ];

    private static readonly Dictionary<string, FormField> ByPlace = All.Where(field => field.Place.Length > 0).ToDictionary(field => field.Place);

    /// <summary>The field that fills a place of the request, or the place that holds it; the table where no field does.</summary>
    public static FormField Of(string place)
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
