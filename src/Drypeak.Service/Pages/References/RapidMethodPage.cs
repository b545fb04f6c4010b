using Drypeak.Service.Field;
using Drypeak.Service.Pages.Forms;
using Drypeak.Service.Pages.Tables;

namespace Drypeak.Service.Pages.References;

/// <summary>The page of the rapid method: the density ratio of a lift before the oven has spoken.</summary>
internal static class RapidMethodPage
{
    private static readonly NumberField Wet = new("wet-density", "Wet density in place", "/field/wetDensity") { UnitOf = FormFields.DensityUnit };
    private static readonly NumberField Water = new("water-content", "Water content in place", "/field/waterContent") { Unit = "%", Hint = "once it is known; the density ratio does not need it" };
    private static readonly TableField Specimens = new("specimens", "Specimens of the field's soil", "/specimens",
        [new ColumnKind("Water added", Measure.Percent, "waterAdded"), new ColumnKind("Wet density", Measure.Density, "wetDensity")])
    {
        Lines = 5,
        Row = "Specimen",
        Hint = "Water added in % of the wet mass at fill water content, negative where the soil was dried; then the wet density as compacted. Three or more.",
    };

    public static FormPage Of(RapidMethodJob job) => new FormPage<RapidMethodRequest, RapidMethodAnswer>
    {
        Address = "/rapid-method",
        Heading = "Rapid method",
        Lead = "The relative compaction of a lift within the hour, before any water content is known.",
        WhatComesOut = "The density ratio, which is exactly the relative compaction, and how far the lift is from the optimum; with the curve through the converted wet densities.",
        Parts =
        [
            new("", [FormFields.Reference]) { Columns = 1 },
            new("Units", [FormFields.DensityUnit, FormFields.TinUnit, FormFields.DecimalMark]) { Columns = 3 },
            new("The lift", [Wet, Water]),
            new("Specimens", [Specimens]) { Columns = 1 },
            new("Water content in other ways", [WaterFields.Tins("/field/tins"), .. WaterFields.OtherWays("/field")]) { UnderMore = true },
        ],
        Demonstrations =
        [
            new("three", "three specimens, the water content still in the oven", (FormFields.Reference, "Ternmarsh, lift 4, 1+240"), (Wet, "2.033"), (Specimens, "0 2.045\n2 2.129\n4 2.132")),
            new("known", "four specimens and the water content known", (FormFields.Reference, "Ternmarsh, lift 7, 0+960"), (Wet, "2.012"), (Water, "15.1"), (Specimens, "-3 1.968\n-1 2.041\n0 2.060\n2 2.058")),
            new("rising", "specimens that show no peak", (FormFields.Reference, "Ternmarsh, lift 7, 1+010"), (Wet, "1.94"), (Specimens, "0 1.95\n2 2.03\n4 2.13")),
        ],
        View = typeof(RapidMethodView),
        Check = job.Check,
        Compute = FormAnswer.Of<RapidMethodRequest, RapidMethodAnswer, Figures.PlotChart>(job.Compute, job.Chart),
        Headline = answer => answer.DensityRatio is { } ratio ? $"Density ratio {ReferenceWords.Percent(ratio)}" : "No peak",
    };
}
