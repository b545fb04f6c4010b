using System.Text;
using Drypeak.Service.Earthwork;
using Drypeak.Service.Pages.Forms;
using Drypeak.Service.Pages.Tables;

namespace Drypeak.Service.Pages.Earthwork;

/// <summary>The page of a test programme.</summary>
internal static class TestLocationsPage
{
    private static readonly NumberField Seed = new("seed", "Seed", "/seed") { Hint = "any whole number, such as a date: it gives the same locations again" };
    private static readonly NumberField Lifts = new("lifts", "Lifts", "/lifts");
    private static readonly NumberField Thickness = new("lift-thickness", "Thickness of a lift", "/liftThickness") { UnitOf = SiteFields.Length, Hint = "for tests by volume" };
    private static readonly NumberField Length = new("area-length", "Length", "/area/length") { UnitOf = SiteFields.Length };
    private static readonly NumberField Width = new("area-width", "Width", "/area/width") { UnitOf = SiteFields.Length };
    private static readonly NumberField Start = new("start-station", "From station", "/area/startStation") { UnitOf = SiteFields.Length };

    private static readonly TableField Outline = new("outline", "or corners in order, a row each", "/area/outline",
        [new ColumnKind("Station", Measure.Ratio, "0"), new ColumnKind("Offset", Measure.Ratio, "1")])
    {
        Row = "Corner",
        Lines = 5,
    };

    private static readonly ColumnKind Zone = new("Zone", Measure.Text, "label");

    private static readonly TableField Exclusions = new("exclusions", "Zones without tests, a row a corner", "/area/exclusions",
        [Zone, new ColumnKind("Station", Measure.Ratio, "outline/+/0"), new ColumnKind("Offset", Measure.Ratio, "outline/+/1")])
    {
        GroupedBy = Zone,
        Lines = 5,
        Example = "Zone\tStation\tOffset\nculvert\t1262\t-1\n\t1270\t-1\n\t1270\t20\n\t1262\t20",
    };

    private static readonly NumberField PerLift = new("per-lift", "Tests of each lift", "/perLift");
    private static readonly NumberField ByVolume = new("every-volume", "or one in so much volume", "/frequency/volume") { UnitOf = SiteFields.BulkVolume };
    private static readonly NumberField ByArea = new("every-area", "or one in so much area", "/frequency/area") { UnitOf = SiteFields.Area };
    private static readonly NumberField PerShift = new("per-shift", "or tests of a shift", "/frequency/perShift");
    private static readonly NumberField LiftsPerShift = new("lifts-per-shift", "which places so many lifts", "/liftsPerShift");
    private static readonly NumberField EveryLifts = new("every-lifts", "Only in every so-manyth lift", "/frequency/lifts") { Hint = "and in the last" };

    public static FormPage Of(TestLocationsJob job) => new FormPage<TestLocationsRequest, TestLocationsAnswer>
    {
        Address = "/earthwork/test-locations",
        Heading = "Test locations",
        Lead = "From how often is tested to where: random, spread evenly, and the same again from its seed.",
        Action = "Draw the locations",
        WhatComesOut = "How many tests each lift needs, a location for each by station and offset, a plan, and a table to take away or to print with blanks.",
        Parts =
        [
            new("", [FormFields.Reference, Seed]),
            new("Units", [SiteFields.Length, SiteFields.Area, SiteFields.BulkVolume, FormFields.DecimalMark]) { Columns = 3 },
            new("The area", [Length, Width, Start]) { Columns = 3 },
            new("", [Outline, Exclusions]) { Columns = 1 },
            new("The lifts", [Lifts, Thickness]),
            new("How many tests", [PerLift, ByVolume, ByArea, EveryLifts, PerShift, LiftsPerShift]),
        ],
        Demonstrations =
        [
            new("culvert", "six lifts around a culvert",
                (FormFields.Reference, "Ternmarsh, reach 2, lifts 1 to 6"), (Seed, "20260511"), (Outline, "Station\tOffset\n1200\t0\n1380\t0\n1380\t14\n1290\t18\n1200\t12"),
                (Exclusions, "Zone\tStation\tOffset\nculvert\t1262\t-1\n\t1270\t-1\n\t1270\t20\n\t1262\t20"), (Lifts, "6"), (Thickness, "0.25"), (ByVolume, "150")),
            new("strip", "a straight reach, every second lift",
                (FormFields.Reference, "Ternmarsh, reach 4"), (Seed, "44"), (Length, "400"), (Width, "9"), (Start, "2400"), (Lifts, "8"), (PerLift, "3"), (EveryLifts, "2")),
        ],
        View = typeof(TestLocationsView),
        Check = job.Check,
        Compute = FormAnswer.Of<TestLocationsRequest, TestLocationsAnswer, Figures.PlotChart>(job.Compute, job.Chart),
        Headline = answer => Sentence(answer).ToString(),
        MoreFiles =
        [
            new Forms.FormFile("locations.csv", "Locations as CSV", submission => Encoding.UTF8.GetBytes(TestLocationsTable.Text((TestLocationsAnswer)submission.Answer!)), "text/csv; charset=utf-8"),
        ],
    };

    /// <summary>The answer in a few words.</summary>
    public static SiteSentence Sentence(TestLocationsAnswer answer) => new(
        "", answer.Count == 1 ? "1 test:" : $"{answer.Count} tests:", answer.LiftsTested == 1 ? $"{answer.PerLift} in one lift" : $"{answer.PerLift} in each of {answer.LiftsTested} lifts");
}
