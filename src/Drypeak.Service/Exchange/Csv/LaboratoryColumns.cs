using Drypeak.Service.Laboratory;
using Drypeak.Service.Pages.Tables;

namespace Drypeak.Service.Exchange.Csv;

/// <summary>A row of a laboratory test as it is written: what was given with what was computed.</summary>
internal sealed record LaboratoryRow(MoistureDensityRequest Request, MoistureDensityAnswer Answer, int Index)
{
    public SpecimenContract Given => Request.Specimens![Index];

    public SpecimenAnswer Computed => Answer.Specimens[Index];

    public bool IsFirst => Index == 0;
}

/// <summary>The columns of laboratory tests, a row a specimen.</summary>
internal static class LaboratoryColumns
{
    public static readonly CsvColumn Reference = new("reference", Measure.Text, "Names the test; rows with the same reference are one test, an empty cell continues the test above.") { Words = ["test", "sample", "sample reference"] };
    public static readonly CsvColumn Method = new("method", Measure.Text, "Code of the test method; may stand on the test's first row only.") { Words = ["test method"] };
    public static readonly CsvColumn Label = new("label", Measure.Text, "Names the specimen; its position in the test where the cell is empty.") { OfSpecimen = ColumnKind.Specimen };
    public static readonly CsvColumn MoldMass = new("moldMass", Measure.Mass, "Mass of the empty mold; may stand on the test's first row only.") { OfSpecimen = ColumnKind.MoldMass };
    public static readonly CsvColumn MoldVolume = new("moldVolume", Measure.Volume, "Volume of the mold; may stand on the test's first row only.") { OfSpecimen = ColumnKind.MoldVolume };
    public static readonly CsvColumn MoldAndWetSoil = new("moldAndWetSoil", Measure.Mass, "Mass of mold and wet soil.") { OfSpecimen = ColumnKind.MoldAndWetSoil };
    public static readonly CsvColumn DepthBelowRim = new("depthBelowRim", Measure.Length, "Depth of the soil's surface below the mold's rim.") { OfSpecimen = ColumnKind.DepthBelowRim };
    public static readonly CsvColumn Tin = new("tin", Measure.TinMass, "Mass of the empty moisture tin.") { OfSpecimen = ColumnKind.Tin };
    public static readonly CsvColumn TinAndWet = new("tinAndWet", Measure.TinMass, "Mass of tin and wet soil.") { OfSpecimen = ColumnKind.TinAndWet };
    public static readonly CsvColumn TinAndDry = new("tinAndDry", Measure.TinMass, "Mass of tin and dry soil.") { OfSpecimen = ColumnKind.TinAndDry };
    public static readonly CsvColumn WetMass = new("wetMass", Measure.Mass, "Mass of the wet soil alone.") { OfSpecimen = ColumnKind.WetMass };
    public static readonly CsvColumn WetDensity = new("wetDensity", Measure.Density, "Wet density.") { OfSpecimen = ColumnKind.WetDensity };
    public static readonly CsvColumn DryDensity = new("dryDensity", Measure.Density, "Dry density.") { OfSpecimen = ColumnKind.DryDensity };
    public static readonly CsvColumn WaterContent = new("waterContent", Measure.Percent, "Water content, % of dry mass.") { OfSpecimen = ColumnKind.WaterContent };
    public static readonly CsvColumn WetBasis = new("wetBasis", Measure.Percent, "Water content, % of wet mass.") { OfSpecimen = ColumnKind.WetBasis };
    public static readonly CsvColumn SpecificGravity = new("specificGravity", Measure.Text, "Specific gravity of the solids, taken as assumed; may stand on the test's first row only.") { IsNumber = true, Words = ["gs", "specific gravity of solids"] };
    public static readonly CsvColumn SetAside = new("setAside", Measure.Text, "Why the specimen is not fitted; empty where it is.") { OfSpecimen = ColumnKind.SetAside };

    private static readonly CsvColumn VoidRatio = new("voidRatio", Measure.Text, "Void ratio.") { IsNumber = true, IsComputed = true };
    private static readonly CsvColumn Porosity = new("porosity", Measure.Percent, "Porosity.") { IsComputed = true };
    private static readonly CsvColumn Saturation = new("saturation", Measure.Percent, "Degree of saturation.") { IsComputed = true, Words = ["degree of saturation"] };
    private static readonly CsvColumn AirVoids = new("airVoids", Measure.Percent, "Air voids, % of the total volume.") { IsComputed = true };
    public static readonly CsvColumn OptimumWaterContent = new("optimumWaterContent", Measure.Percent, "Optimum water content, on the test's first row.") { IsComputed = true };
    public static readonly CsvColumn MaximumDryDensity = new("maximumDryDensity", Measure.Density, "Maximum dry density, on the test's first row.") { IsComputed = true };
    private static readonly CsvColumn Model = new("model", Measure.Text, "The curve's model, on the test's first row.") { IsComputed = true };
    private static readonly CsvColumn Findings = new("findings", Measure.Text, "Codes of the test's findings, worst first, on its first row.") { IsComputed = true };

    /// <summary>Everything that a file may have.</summary>
    public static IReadOnlyList<CsvColumn> All { get; } =
    [
        Reference, Method, Label, MoldMass, MoldVolume, MoldAndWetSoil, DepthBelowRim, Tin, TinAndWet, TinAndDry, WetMass, WetDensity, DryDensity, WaterContent,
        WetBasis, SpecificGravity, SetAside, VoidRatio, Porosity, Saturation, AirVoids, OptimumWaterContent, MaximumDryDensity, Model, Findings,
    ];

    /// <summary>The columns that are always written, tins apart, with what stands in each.</summary>
    public static IReadOnlyList<(CsvColumn Column, Func<LaboratoryRow, string?> Value)> Before { get; } =
    [
        (Reference, row => Text(row.Answer.Reference)),
        (Method, row => row.IsFirst ? Text(row.Request.Method) : null),
        (Label, row => Text(row.Computed.Label)),
        (MoldMass, row => Number(row.Given.Mold?.Mass ?? (row.IsFirst ? row.Request.Mold?.Mass : null))),
        (MoldVolume, row => Number(row.Given.Mold?.Volume ?? (row.IsFirst ? row.Request.Mold?.Volume : null))),
        (MoldAndWetSoil, row => Number(row.Given.MoldAndWetSoil)),
    ];

    /// <inheritdoc cref="Before"/>
    public static IReadOnlyList<(CsvColumn Column, Func<LaboratoryRow, string?> Value)> AfterTins { get; } =
    [
        (WetMass, row => Number(row.Given.WetMass)),
        (WetDensity, row => Number(row.Computed.WetDensity)),
        (DryDensity, row => Number(row.Computed.DryDensity)),
        (WaterContent, row => Number(row.Computed.WaterContent)),
        (SpecificGravity, row => row.IsFirst ? Number(row.Request.SpecificGravity?.Value) : null),
        (SetAside, row => Text(row.Computed.SetAside)),
        (OptimumWaterContent, row => row.IsFirst ? Number(row.Answer.Optimum?.WaterContent) : null),
        (MaximumDryDensity, row => row.IsFirst ? Number(row.Answer.Optimum?.MaximumDryDensity) : null),
        (Model, row => row.IsFirst ? row.Answer.Curve?.Model : null),
        (Findings, row => row.IsFirst ? string.Join(' ', row.Answer.Findings.Select(finding => finding.Code)) : null),
    ];

    /// <summary>Columns written only where a test of the file has anything in them.</summary>
    public static IReadOnlyList<(CsvColumn Column, Func<LaboratoryRow, string?> Value)> Seldom { get; } =
    [
        (DepthBelowRim, row => Number(row.Given.DepthBelowRim)),
        (WetBasis, row => Number(row.Given.WetBasis)),
    ];

    /// <summary>A tin's three cells.</summary>
    public static IReadOnlyList<(CsvColumn Column, Func<TinContractOf, string?> Value)> OfTin { get; } =
    [
        (Tin, of => Number(of.Tin?.Tin)), (TinAndWet, of => Number(of.Tin?.Wet)), (TinAndDry, of => Number(of.Tin?.Dry)),
    ];

    /// <summary>A specimen's tin, where it has that many.</summary>
    public sealed record TinContractOf(LaboratoryRow Row, int Number)
    {
        public Contracts.TinContract? Tin => Row.Given.Tins is { } tins && Number < tins.Count ? tins[Number] : null;
    }

    private static string? Text(string? text) => CsvText.Guarded(text);

    private static string? Number(double? value) => value is { } number ? CsvText.Number(number) : null;
}
