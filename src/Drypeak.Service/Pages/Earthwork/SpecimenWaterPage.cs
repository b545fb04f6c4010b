using Drypeak.Service.Earthwork;
using Drypeak.Service.Hosting;
using Drypeak.Service.Pages.Forms;
using Drypeak.Service.Pages.Tables;

namespace Drypeak.Service.Pages.Earthwork;

/// <summary>The page of the water for specimens.</summary>
internal static class SpecimenWaterPage
{
    private static readonly ChoiceField Liquid = SiteFields.Liquid with { Label = "Water by volume in" };

    private static readonly TableField Portions = new("portions", "Portions, a row each", "/portions",
    [
        new ColumnKind("Portion", Measure.Text, "label"), ColumnKind.WetMass, ColumnKind.WaterContent, new ColumnKind("Target", Measure.Percent, "target"),
    ])
    {
        Row = "Portion",
        Example = "Portion\tWet mass\tWater content\tTarget\n1\t2600\t9.4\t10\n2\t2600\t9.4\t12",
    };

    private static readonly NumberField WetMass = new("wet-mass", "Wet mass of each", "/wetMass") { UnitOf = FormFields.MassUnit };
    private static readonly NumberField Present = new("water-content", "Present water content", "/waterContent") { Unit = "%", Hint = "on dry mass" };
    private static readonly NumbersField Targets = new("targets", "Targets", "/targets") { Unit = "%", Hint = "with spaces between; or expect an optimum" };
    private static readonly NumberField Optimum = new("expected-optimum", "Expected optimum", "/expected/optimumWaterContent") { Unit = "%" };
    private static readonly NumberField PlasticLimit = new("plastic-limit", "or plastic limit", "/expected/plasticLimit") { Unit = "%", Hint = "the optimum is estimated from it" };
    private static readonly NumberField Number = new("target-count", "How many targets", "/expected/count") { Hint = "5 where it is left open" };
    private static readonly NumberField Spacing = new("target-spacing", "Distance between them", "/expected/spacing") { Unit = "%", Hint = "2 where it is left open" };

    public static FormPage Of(Limits limits) => new FormPage<SpecimenWaterRequest, SpecimenWaterAnswer>
    {
        Address = "/earthwork/specimen-water",
        Heading = "Water for specimens",
        Lead = "From portions as they are to the water that brings each to its target.",
        WhatComesOut = "Water for each portion by volume and by mass, and what the balance shows when it is in: a sheet with blanks for the bench.",
        Parts =
        [
            new("", [FormFields.Reference]) { Columns = 1 },
            new("Units", [FormFields.MassUnit, Liquid, FormFields.DecimalMark]) { Columns = 3 },
            new("Portions, each its own", [Portions]) { Columns = 1, Note = "Leave the targets out where an optimum is expected below." },
            new("or portions that are alike", [WetMass, Present, Targets]),
            new("or an optimum that is expected, in place of targets", [Optimum, PlasticLimit, Number, Spacing]),
            new("Present water content of all in other ways", [WaterFields.Tins("/tins"), .. WaterFields.OtherWays("")]) { UnderMore = true },
            new("Water temperature", [SiteFields.WaterTemperature]) { UnderMore = true },
        ],
        Demonstrations =
        [
            new("portions", "five portions, two of them wetter",
                (FormFields.Reference, "Ternmarsh, borrow area 7, sample 3"),
                (Portions, "Portion\tWet mass\tWater content\tTarget\n1\t2600\t9.4\t10\n2\t2600\t9.4\t12\n3\t2600\t9.4\t14\n4\t2580\t9.8\t16\n5\t2580\t9.8\t18")),
            new("estimate", "targets from a plastic limit",
                (FormFields.Reference, "Ternmarsh, borrow area 9, sample 1"), (WetMass, "2600"), (Present, "11.5"), (PlasticLimit, "17")),
            new("dry-back", "soil wetter than its driest target",
                (FormFields.Reference, "Ternmarsh, borrow area 9, sample 2"), (WetMass, "2600"), (Present, "12.8"), (Targets, "11 13 15 17 19")),
        ],
        View = typeof(SpecimenWaterView),
        Check = new SpecimenWaterRules(limits).Check,
        Compute = FormAnswer.Of<SpecimenWaterRequest, SpecimenWaterAnswer>(SpecimenWaterJob.Compute),
        Headline = answer => Sentence(answer).ToString(),
    };

    /// <summary>The answer in a few words.</summary>
    public static SiteSentence Sentence(SpecimenWaterAnswer answer)
    {
        var most = answer.Portions.MaxBy(portion => portion.WaterToAdd.Mass)!;
        return most.WaterToAdd.Mass > 0
            ? new SiteSentence("Up to", SiteNumbers.Text(most.WaterToAdd.Mass, answer.Units.Mass!), "of water to a portion")
            : new SiteSentence("", "No water", "to add to any portion");
    }
}
