using Drypeak.Service.Field;
using Drypeak.Service.Pages.Forms;

namespace Drypeak.Service.Pages.References;

/// <summary>The page of relative density: a free-draining soil between its loosest and its densest state.</summary>
internal static class RelativeDensityPage
{
    private static readonly NumberField Dry = new("dry-density", "Dry density", "/dryDensity") { UnitOf = FormFields.DensityUnit };
    private static readonly NumberField VoidRatio = new("void-ratio", "or void ratio", "/voidRatio");
    private static readonly NumberField Wet = new("wet-density", "or wet density", "/wetDensity") { UnitOf = FormFields.DensityUnit };
    private static readonly NumberField Water = new("water-content", "with its water content", "/waterContent") { Unit = "%" };
    private static readonly NumberField Compaction = new("relative-compaction", "or relative compaction", "/relativeCompaction") { Unit = "%" };
    private static readonly NumberField Relative = new("relative-density", "or relative density", "/relativeDensity") { Unit = "%" };
    private static readonly NumberField Least = new("minimum-dry-density", "Minimum dry density", "/minimumDryDensity") { UnitOf = FormFields.DensityUnit };
    private static readonly NumberField Most = new("maximum-dry-density", "Maximum dry density", "/maximumDryDensity") { UnitOf = FormFields.DensityUnit };
    private static readonly NumberField LeastVoids = new("minimum-void-ratio", "or minimum void ratio", "/minimumVoidRatio");
    private static readonly NumberField MostVoids = new("maximum-void-ratio", "and maximum void ratio", "/maximumVoidRatio");

    public static FormPage Of(RelativeDensityJob job) => new FormPage<RelativeDensityRequest, RelativeDensityAnswer>
    {
        Address = "/relative-density",
        Heading = "Relative density",
        Lead = "Any one measure of a free-draining soil, with its loosest and its densest state, gives all the others.",
        WhatComesOut = "Relative density and relative compaction side by side, with the dry density and the void ratio that go with them.",
        Parts =
        [
            new("", [FormFields.Reference]) { Columns = 1 },
            new("Units", [FormFields.DensityUnit, FormFields.TinUnit, FormFields.DecimalMark]) { Columns = 3 },
            new("The soil, by one measure", [Dry, VoidRatio, Wet, Water, Compaction, Relative]),
            new("Its loosest and its densest state", [Least, Most, LeastVoids, MostVoids]),
            new("Solids", [FormFields.SpecificGravity with { Hint = "needed only between a density and a void ratio" }]),
            new("Water content in other ways", [WaterFields.Tins("/tins"), .. WaterFields.OtherWays(""), FormFields.WaterTemperature]) { UnderMore = true },
        ],
        Demonstrations =
        [
            new("drain", "the sand of a drainage blanket", (FormFields.Reference, "Ternmarsh, drainage blanket, 0+450"), (Dry, "1.68"), (Least, "1.49"), (Most, "1.78"), (FormFields.SpecificGravity, "2.66"), (FormFields.Determined, "measured")),
            new("required", "which density is 70 % relative density", (Relative, "70"), (Least, "1.49"), (Most, "1.78")),
            new("loose", "a test looser than the loosest state", (Wet, "1.52"), (Water, "4.5"), (Least, "1.49"), (Most, "1.78")),
        ],
        View = typeof(RelativeDensityView),
        Check = job.Check,
        Compute = FormAnswer.Of<RelativeDensityRequest, RelativeDensityAnswer>(RelativeDensityJob.Compute),
        Headline = answer => $"Relative density {ReferenceWords.Percent(answer.RelativeDensity)}",
    };
}
