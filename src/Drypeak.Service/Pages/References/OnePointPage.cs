using Drypeak.Service.Field;
using Drypeak.Service.Hosting;
using Drypeak.Service.Pages.FieldDensity;
using Drypeak.Service.Pages.Forms;
using Drypeak.Service.Pages.Tables;

namespace Drypeak.Service.Pages.References;

/// <summary>The page of one point: a compacted point chooses a curve of a family, or one between two.</summary>
internal static class OnePointPage
{
    private const string InTable = "table";
    private const string AsTests = "tests";

    private static readonly ColumnKind Curve = new("Curve", Measure.Text, "label");

    private static readonly ChoiceField FamilyGiven = new("family-given", "How the family is given", "", [new(InTable, "Curves in a table"), new(AsTests, "Whole laboratory tests")]);

    private static readonly TableField Family = new("family", "Curves", "/family",
    [
        Curve, new("Optimum water content", Measure.Percent, "optimumWaterContent"), new("Maximum dry density", Measure.Density, "maximumDryDensity"),
        new("Water content", Measure.Percent, "points/+/0"), new("Dry density", Measure.Density, "points/+/1"),
    ])
    {
        Lines = 9,
        Row = "Row",
        GroupedBy = Curve,
        Hint = "A row a curve with its optimum; or with points, a row each: the curve's name and its optimum need to stand in its first row only. The header may leave out what is not given.",
    };

    private static readonly NumberField Water = new("water-content", "Water content", "/point/waterContent") { Unit = "%" };
    private static readonly NumberField Wet = new("wet-density", "Wet density", "/point/wetDensity") { UnitOf = FormFields.DensityUnit };
    private static readonly NumberField Dry = new("dry-density", "or dry density", "/point/dryDensity") { UnitOf = FormFields.DensityUnit };
    private static readonly NumberField Full = new("mold-and-wet-soil", "or mold and wet soil", "/point/moldAndWetSoil") { UnitOf = FormFields.MassUnit };
    private static readonly NumberField Mold = new("mold-mass", "with the mass of the mold", "/point/mold/mass") { UnitOf = FormFields.MassUnit };
    private static readonly NumberField MoldVolume = new("mold-volume", "and its volume", "/point/mold/volume") { UnitOf = FormFields.VolumeUnit };

    private static DocumentField Tests(Limits limits) => new("family-tests", "Laboratory tests, a line each", "/family", new LaboratoryTestText(limits).ReadFamily)
    {
        Hint = "The link of each from the laboratory page, or the request saved there; at least three.",
    };

    public static FormPage Of(OnePointJob job, Limits limits) => new FormPage<OnePointRequest, OnePointAnswer>
    {
        Address = "/one-point",
        Heading = "One point on a family of curves",
        Lead = "One compacted point of the soil in the lift chooses the curve that it is held against.",
        Action = "Choose",
        WhatComesOut = "Optimum and maximum of the curve through the point, between which two curves of the family it lies, and whether the rules allow to use it.",
        Variant = FamilyGiven,
        Parts =
        [
            new("", [FormFields.Reference]) { Columns = 1 },
            new("Units", [FormFields.DensityUnit, FormFields.MassUnit, FormFields.VolumeUnit, FormFields.TinUnit, FormFields.DecimalMark]) { Columns = 3 },
            new("The point", [Water, Wet, Dry, Full, Mold, MoldVolume]),
            new("The family", [Family]) { Columns = 1, When = texts => texts[FamilyGiven] != AsTests },
            new("The family", [Tests(limits)]) { Columns = 1, When = texts => texts[FamilyGiven] == AsTests },
            new("Water content in other ways", [WaterFields.Tins("/point/tins"), .. WaterFields.OtherWays("/point")]) { UnderMore = true },
        ],
        Demonstrations =
        [
            new("between", "a point between two curves", (FormFields.Reference, "Ternmarsh, lift 4, 1+240"), (Water, "12.9"), (Wet, "2.0"), (Family, Curves)),
            new("optima", "a family of which only the optima are known", (FormFields.Reference, "Ternmarsh, lift 4, 1+240"), (Water, "12.9"), (Wet, "2.0"), (Family, "A 11.8 1.93\nB 13.9 1.83\nC 16.6 1.73\nD 19.5 1.64")),
            new("too-dry", "a point too dry to choose", (FormFields.Reference, "Ternmarsh, lift 5, 0+720"), (Water, "10.2"), (Dry, "1.70"), (Family, Curves)),
        ],
        View = typeof(OnePointView),
        Check = job.Check,
        Compute = FormAnswer.Of<OnePointRequest, OnePointAnswer, Figures.PlotChart>(job.Compute, job.Chart),
        Headline = answer => answer.Optimum is { } optimum && ReferenceWords.Reported(optimum.MaximumDryDensity, optimum.WaterContent, answer.Units) is var reported
            ? $"{reported.Density} at {reported.WaterContent}"
            : "No curve chosen",
    };

    private const string Curves = """
        Curve	Optimum water content	Maximum dry density	Water content	Dry density
        A	11.8	1.93	8.0	1.83
        			10.0	1.90
        			13.5	1.90
        B	13.9	1.83	9.8	1.74
        			12.0	1.805
        			16.0	1.80
        C	16.6	1.73	12.5	1.66
        			14.6	1.712
        			18.8	1.70
        D	19.5	1.64	15.0	1.58
        			17.3	1.625
        			21.9	1.61
        """;
}
