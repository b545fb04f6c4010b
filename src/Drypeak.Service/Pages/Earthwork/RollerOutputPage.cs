using Drypeak.Service.Earthwork;
using Drypeak.Service.Hosting;
using Drypeak.Service.Pages.Forms;

namespace Drypeak.Service.Pages.Earthwork;

/// <summary>The page of what a roller finishes.</summary>
internal static class RollerOutputPage
{
    private static readonly NumberField Width = new("width", "Width of the drum", "/width") { UnitOf = SiteFields.Length };
    private static readonly NumberField Overlap = new("overlap", "Overlap of lanes", "/overlap") { UnitOf = SiteFields.Length };
    private static readonly NumberField Speed = new("speed", "Speed while rolling", "/speed") { UnitOf = SiteFields.Speed };
    private static readonly NumberField Passes = new("passes", "Passes", "/passes") { Hint = "over each place" };
    private static readonly NumberField Thickness = new("lift-thickness", "Compacted lift", "/liftThickness") { UnitOf = SiteFields.Length };
    private static readonly NumberField Efficiency = new("efficiency", "Efficiency", "/efficiency") { Hint = "50 minutes in the hour is 0.83" };

    public static FormPage Of(Limits limits) => new FormPage<RollerOutputRequest, RollerOutputAnswer>
    {
        Address = "/earthwork/roller-output",
        Heading = "Roller output",
        Lead = "From drum, speed and passes to what is finished in an hour.",
        WhatComesOut = "Area and compacted volume in an hour, to be matched with what the trucks bring.",
        Parts =
        [
            new("", [FormFields.Reference]) { Columns = 1 },
            new("Units", [SiteFields.Length, SiteFields.Speed, SiteFields.Area, SiteFields.BulkVolume, FormFields.DecimalMark]) { Columns = 3 },
            new("The roller", [Width, Overlap, Speed, Passes]),
            new("The lift and the hour", [Thickness, Efficiency]),
        ],
        Demonstrations =
        [
            new("padfoot", "a padfoot roller on a clay fill",
                (FormFields.Reference, "Ternmarsh, padfoot roller, reach 2"), (Width, "2.1"), (Overlap, "0.2"), (Speed, "4"), (Passes, "8"), (Thickness, "0.2"), (Efficiency, "0.75")),
        ],
        View = typeof(RollerOutputView),
        Check = new RollerOutputRules(limits).Check,
        Compute = FormAnswer.Of<RollerOutputRequest, RollerOutputAnswer>(RollerOutputJob.Compute),
        Headline = answer => Sentence(answer).ToString(),
    };

    /// <summary>The answer in a few words.</summary>
    public static SiteSentence Sentence(RollerOutputAnswer answer) => new("", SiteNumbers.Text(answer.VolumePerHour, answer.Units.BulkVolume!), "an hour");

    /// <summary>What a form rests on, for the printed sheet.</summary>
    public static IEnumerable<(string Name, string Text)> Given(FormTexts texts) => SiteSheet.Given(texts, Width, Overlap, Speed, Passes, Thickness, Efficiency);
}
