using Drypeak.Figures;
using Drypeak.Service.Charts;
using Drypeak.Service.Contracts;
using Drypeak.Service.Hosting;
using Drypeak.Soil.Earthwork;
using Drypeak.Soil.Quantities;

namespace Drypeak.Service.Earthwork;

/// <summary><c>POST /v1/earthwork/test-locations</c>: the programme as JSON, its locations as CSV, or its plan, by Accept.</summary>
internal sealed class TestLocationsJob(Limits limits)
{
    private readonly Lazy<TestLocationsRules> _rules = new(() => new(limits));

    /// <summary>The kind of its chart.</summary>
    public ChartKind<PlotChart> Chart { get; } = ChartKind.Plot("test-locations", "The plan of a test programme", limits);

    public static void Map(IEndpointRouteBuilder app)
    {
        var job = app.ServiceProvider.GetRequiredService<TestLocationsJob>();
        app.MapJob<TestLocationsRequest, TestLocationsAnswer, PlotChart>(EarthworkJob.Address + "test-locations", job.Check, job.Compute, Examples.TestLocationsRequest, job.Chart, TestLocationsTable.Csv)
            .WithTags("Earthwork")
            .WithName("test-locations")
            .WithSummary("How many field tests, and where")
            .WithDescription("Tests of a fill by number or by frequency, and stratified random locations for them from a stated seed: the same seed gives the same locations. With Accept: text/csv the locations are the answer; with image/svg+xml, image/png or application/pdf their plan.");
    }

    /// <summary>Every broken rule; empty where the request can be computed.</summary>
    public IReadOnlyList<Fault> Check(TestLocationsRequest request) => _rules.Value.Check(request);

    /// <summary>Computes a request that passed <see cref="Check"/>.</summary>
    public Charted<TestLocationsAnswer, PlotChart> Compute(TestLocationsRequest request)
    {
        var units = request.Units.ToUnits();
        var area = request.ToArea();
        var programme = request.ToProgramme(area);
        double InUnit(double meters) => new Length(meters).In(units.Length);
        var chart = TestLocationsChart.Of(request, programme, units);
        var links = Chart.LinksOf(chart, limits, out var whyNoLink);
        var findings = programme.Review(request.LiftThickness is { } thickness ? Length.From(thickness, units.Length) : null, units);
        var answer = new TestLocationsAnswer
        {
            Reference = request.Reference,
            Identification = request.Identification,
            Units = units.ToContract(),
            Seed = programme.Seed,
            Count = (int)programme.Tests,
            PerLift = programme.PerLift,
            LiftsTested = programme.LiftsTested,
            OpenArea = new Area(area.SquareMeters).In(units.Area),
            Locations = [.. programme.Locations().Select(location => new TestLocationAnswer(location.Label, location.Lift, InUnit(location.Point.Station), InUnit(location.Point.Offset)))],
            StratumStations = [.. programme.StratumStations().Select(InUnit)],
            Basis = request.Basis(programme),
            Links = links,
            Trace = EarthworkJob.TraceOf(request, () => programme.Working(request.CountedBy(area), RectangleOf(request, units), units)),
            Findings = (whyNoLink is null ? findings : findings.Append(whyNoLink)).ToContract(request),
            Cautions = EarthworkCautions.OfTestProgramme,
            Provenance = ProvenanceContract.Of(request),
        };
        return new Charted<TestLocationsAnswer, PlotChart>(answer, chart);
    }

    private static (Length Length, Length Width)? RectangleOf(TestLocationsRequest request, EarthworkUnits units) =>
        request.Area is { Length: { } length, Width: { } width, Exclusions: null } ? (Length.From(length, units.Length), Length.From(width, units.Length)) : null;
}
