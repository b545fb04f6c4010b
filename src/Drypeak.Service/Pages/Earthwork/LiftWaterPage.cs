using Drypeak.Service.Earthwork;
using Drypeak.Service.Hosting;
using Drypeak.Service.Pages.Forms;

namespace Drypeak.Service.Pages.Earthwork;

/// <summary>The page of the water for a lift.</summary>
internal static class LiftWaterPage
{
    private static readonly ChoiceField Mass = SiteFields.Mass with { Otherwise = "kg" };
    private static readonly NumberField Area = new("area", "Area", "/area") { UnitOf = SiteFields.Area };
    private static readonly NumberField Thickness = new("thickness", "and thickness", "/thickness") { UnitOf = SiteFields.Length };
    private static readonly NumberField Volume = new("volume", "or volume", "/volume") { UnitOf = SiteFields.BulkVolume };
    private static readonly NumberField DryDensity = new("dry-density", "Dry density", "/dryDensity") { UnitOf = FormFields.DensityUnit, Hint = "as the volume is counted" };
    private static readonly NumberField Present = new("water-content", "Present water content", "/waterContent") { Unit = "%", Hint = "on dry mass" };
    private static readonly NumberField Target = new("target", "When it is rolled", "/target") { Unit = "%" };
    private static readonly NumberField Allowance = new("allowance", "Allowance", "/evaporationAllowance") { Unit = "%", Hint = "points added to the target" };
    private static readonly NumberField Rate = new("evaporation-rate", "or rate an hour", "/evaporation/rate") { UnitOf = SiteFields.Length, Hint = "depth of water" };
    private static readonly NumberField Hours = new("evaporation-hours", "over", "/evaporation/hours") { Unit = "h", Hint = "until it is rolled" };
    private static readonly NumberField Tanker = new("tanker", "Tanker", "/tanker") { UnitOf = SiteFields.Liquid };
    private static readonly NumberField PresentUncertainty = new("water-uncertainty", "± present water content", "/uncertainty/waterContent") { Unit = "%" };
    private static readonly NumberField TargetUncertainty = new("target-uncertainty", "± target", "/uncertainty/target") { Unit = "%" };
    private static readonly NumberField DensityUncertainty = new("density-uncertainty", "± dry density", "/uncertainty/dryDensity") { UnitOf = FormFields.DensityUnit };

    public static FormPage Of(Limits limits) => new FormPage<LiftWaterRequest, LiftWaterAnswer>
    {
        Address = "/earthwork/lift-water",
        Heading = "Water for a lift",
        Lead = "From a lift as it lies to the water that it needs before it is rolled.",
        WhatComesOut = "Water for each cubic meter, for each square meter to spray, in all and in tanker loads; or the water that it has to lose.",
        Parts =
        [
            new("", [FormFields.Reference]) { Columns = 1 },
            new("Units", [SiteFields.Liquid, Mass, FormFields.DensityUnit, SiteFields.Length, SiteFields.Area, SiteFields.BulkVolume, FormFields.DecimalMark]) { Columns = 3 },
            new("The lift", [Area, Thickness, Volume, DryDensity]),
            new("Water content", [Present, Target]),
            new("Evaporation until it is rolled", [Allowance, Rate, Hours]) { Columns = 3 },
            new("Tanker", [Tanker]),
            new("Present water content in other ways", [WaterFields.Tins("/tins"), .. WaterFields.OtherWays("")]) { UnderMore = true },
            new("Standard uncertainties", [PresentUncertainty, TargetUncertainty, DensityUncertainty]) { UnderMore = true, Columns = 3 },
            new("Water temperature", [SiteFields.WaterTemperature]) { UnderMore = true },
        ],
        Demonstrations =
        [
            new("dry-day", "a lift on a dry, windy day",
                (FormFields.Reference, "Ternmarsh, reach 2, lift 4"), (Area, "1500"), (Thickness, "0.2"), (DryDensity, "1.78"), (Present, "11.2"), (Target, "13.5"),
                (Rate, "0.0006"), (Hours, "3"), (Tanker, "8000"), (PresentUncertainty, "0.4")),
            new("too-wet", "a lift after rain, which has to dry",
                (FormFields.Reference, "Ternmarsh, reach 3, lift 2"), (Volume, "420"), (DryDensity, "1.74"), (Present, "16.8"), (Target, "14.5"), (Tanker, "8000")),
        ],
        View = typeof(LiftWaterView),
        Check = new LiftWaterRules(limits).Check,
        Compute = FormAnswer.Of<LiftWaterRequest, LiftWaterAnswer>(LiftWaterJob.Compute),
        Headline = answer => Sentence(answer).ToString(),
    };

    /// <summary>The answer in a few words.</summary>
    public static SiteSentence Sentence(LiftWaterAnswer answer) => answer.Total.Mass switch
    {
        < 0 => new SiteSentence("", SiteNumbers.Text(-answer.Total.Liquid, answer.Units.Liquid!), "of water to lose"),
        0 => new SiteSentence("", "No water", "to add"),
        _ => new SiteSentence("", SiteNumbers.Text(answer.Total.Liquid, answer.Units.Liquid!), "of water to add"),
    };

    /// <summary>What a form rests on, for the printed sheet.</summary>
    public static IEnumerable<(string Name, string Text)> Given(FormTexts texts) => SiteSheet.Given(texts,
        Area, Thickness, Volume, DryDensity, Present, Target with { Label = "Water content when it is rolled" },
        Allowance with { Label = "Allowance for evaporation" }, Rate with { Label = "Evaporation an hour" }, Hours with { Label = "Hours until it is rolled" }, Tanker);
}
