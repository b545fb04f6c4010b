using Drypeak.Figures;
using Drypeak.Service.Charts;
using Drypeak.Soil.Earthwork;
using Drypeak.Soil.Quantities;

namespace Drypeak.Service.Earthwork;

/// <summary>The plan of a test programme: outline, zones without tests, strata, locations of all lifts.</summary>
internal static class TestLocationsChart
{
    /// <summary>A plan longer than this multiple of its width would be a thread at one scale.</summary>
    private const double LongestAtOneScale = 4;

    /// <summary>Above this many strata their lines hide the locations.</summary>
    private const int MostStrataDrawn = 60;

    private static readonly MarkShape[] ShapesOfLifts = [MarkShape.Disc, MarkShape.Square, MarkShape.Diamond, MarkShape.Triangle];

    public static PlotChart Of(TestLocationsRequest request, TestProgramme programme, EarthworkUnits units)
    {
        var (outline, zones) = (programme.Area.Outline, programme.Area.Exclusions);
        var locations = programme.Locations().ToList();
        var (stations, offsets) = (outline.Corners.Select(corner => corner.Station).ToList(), outline.Corners.Select(corner => corner.Offset).ToList());
        var atOneScale = stations.Max() - stations.Min() <= LongestAtOneScale * (offsets.Max() - offsets.Min())
            && offsets.Max() - offsets.Min() <= LongestAtOneScale * (stations.Max() - stations.Min());
        var strata = programme.PerLift <= MostStrataDrawn ? Enumerable.Range(1, programme.PerLift - 1).Select(i => (double)i / programme.PerLift) : [];
        var (tests, lifts) = (Counted(locations.Count, "test"), Counted(programme.LiftsTested, "lift"));
        return new PlotChart
        {
            Title = programme.LiftsTested == 1 ? $"{tests} in one lift" : $"{tests}: {programme.PerLift} in each of {lifts}",
            Subtitle = $"Seed {programme.Seed}, one in each stratum of equal area" + (atOneScale ? "" : "; offsets at a larger scale than stations"),
            Reference = request.Reference,
            Description = $"Plan of the locations of {tests} in {lifts}, from station {Said(stations.Min())} to {Said(stations.Max())}, with the outline, {Counted(zones.Count, "zone")} without tests, and the lines between strata.",
            X = new PlotAxis($"Station ({units.Length.Code()})"),
            Y = new PlotAxis($"Offset ({units.Length.Code()})"),
            SameScale = atOneScale,
            Areas = [.. zones.Select((zone, i) => new PlotArea([.. zone.Corners.Select(At)], PlotAreaRole.Bar, request.Area!.Exclusions![i].Label ?? "no tests"))],
            Lines =
            [
                new PlotLine([.. outline.Corners.Append(outline.Corners[0]).Select(At)], PlotLineRole.Reference),
                .. strata.Select(share => new PlotLine([At(programme.Area.At(share, 0)), At(programme.Area.At(share, 1))], PlotLineRole.Quiet) { Dash = PlotDash.Dotted }),
            ],
            Marks = [.. locations.Select(location => Mark(location, At(location.Point)))],
        };

        PlotPoint At(PlanPoint point) => new(ChartNumbers.Drawn(new Length(point.Station).In(units.Length)), ChartNumbers.Drawn(new Length(point.Offset).In(units.Length)));
        string Said(double meters) => ReaderText.Of(new Length(meters), units.Length);
    }

    private static PlotMark Mark(TestLocation location, PlotPoint at) =>
        new(at.X, at.Y, MarkRole.Measured, location.Label, ShapesOfLifts[(location.Lift - 1) % ShapesOfLifts.Length]);

    private static string Counted(int count, string noun) => count == 1 ? $"1 {noun}" : $"{count} {noun}s";
}
