using Drypeak.Service.Earthwork;
using Drypeak.Service.Pages.Forms;
using Drypeak.Service.Pages.Tables;

namespace Drypeak.Service.Pages.Earthwork;

/// <summary>The page of a trial strip.</summary>
internal static class TestStripPage
{
    private static readonly ColumnKind Passes = new("Passes", Measure.Ratio, "passes");

    private static readonly TableField Readings = new("readings", "Readings, a row each", "/readings", [Passes, new ColumnKind("Dry density", Measure.Density, "dryDensity/+")])
    {
        GroupedBy = Passes,
        Lines = 10,
        Example = "Passes\tDry density\n2\t1.661\n2\t1.684\n4\t1.748",
    };

    private static readonly NumberField LeastGain = new("least-gain", "Least gain of a pass", "/leastGain") { UnitOf = FormFields.DensityUnit, Hint = "a pass that gains less is not worth making" };

    public static FormPage Of(TestStripJob job) => new FormPage<TestStripRequest, TestStripAnswer>
    {
        Address = "/earthwork/test-strip",
        Heading = "Trial strip",
        Lead = "From densities after rising numbers of passes to the passes that are worth making.",
        WhatComesOut = "The growth curve, the passes after which another gains less than you state, and the density that they reach, with its spread.",
        Parts =
        [
            new("", [FormFields.Reference]) { Columns = 1 },
            new("Units", [FormFields.DensityUnit, FormFields.DecimalMark]),
            new("Densities by passes", [Readings]) { Columns = 1, Note = "Rows of one number of passes stand together." },
            new("What counts", [LeastGain]),
        ],
        Demonstrations =
        [
            new("levels-off", "a strip that levels off",
                (FormFields.Reference, "Ternmarsh, trial strip at station 1150"), (LeastGain, "0.008"),
                (Readings, "Passes\tDry density\n2\t1.661\n2\t1.684\n2\t1.672\n4\t1.748\n4\t1.733\n4\t1.757\n6\t1.781\n6\t1.796\n6\t1.788\n8\t1.812\n8\t1.799\n8\t1.806\n10\t1.815\n10\t1.808\n10\t1.821")),
            new("over-rolled", "a strip that was rolled too often",
                (FormFields.Reference, "Ternmarsh, trial strip at station 1180"), (LeastGain, "0.008"),
                (Readings, "Passes\tDry density\n2\t1.668\n2\t1.675\n2\t1.671\n4\t1.761\n4\t1.752\n4\t1.758\n6\t1.798\n6\t1.804\n6\t1.801\n8\t1.772\n8\t1.765\n8\t1.769")),
        ],
        View = typeof(TestStripView),
        Check = job.Check,
        Compute = FormAnswer.Of<TestStripRequest, TestStripAnswer, Figures.PlotChart>(job.Compute, job.Chart),
        Headline = answer => Sentence(answer).ToString(),
    };

    /// <summary>The answer in a few words.</summary>
    public static SiteSentence Sentence(TestStripAnswer answer) => answer switch
    {
        { Passes: { } passes } => new SiteSentence("", passes == 1 ? "1 pass" : $"{passes} passes", answer.Target is { } target ? $"to {SiteNumbers.Text(target.DryDensity, answer.Units.Density!)}" : ""),
        { Curve: { } } => new SiteSentence("More than", $"{answer.Stages.Last(stage => stage.Fitted is { }).Passes} passes", ""),
        _ => new SiteSentence("", "No growth curve", "from these readings"),
    };
}
