using System.Globalization;
using System.Text;
using Drypeak.Service.Contracts;
using Drypeak.Service.Hosting;
using Drypeak.Soil.Earthwork;
using Drypeak.Soil.Quantities;

namespace Drypeak.Service.Earthwork;

/// <summary><c>POST /v1/earthwork/test-locations</c>: the programme as JSON, or its locations as CSV by Accept.</summary>
internal sealed class TestLocationsJob(Limits limits)
{
    private const string Json = "application/json";
    private const string Csv = "text/csv";
    private static readonly string[] Offered = [Json, Csv];

    private readonly TestLocationsRules _rules = new(limits);

    public static void Map(IEndpointRouteBuilder app) =>
        app.MapPost(EarthworkJob.Address + "test-locations", AnswerAsync)
            .WithTags("Earthwork")
            .WithName("test-locations")
            .WithSummary("How many field tests, and where")
            .WithDescription("Tests of a fill by number or by frequency, and stratified random locations for them from a stated seed: the same seed gives the same locations. With Accept: text/csv the locations are the answer.")
            .Takes<TestLocationsRequest>(Json, Examples.TestLocationsRequest)
            .Gives<TestLocationsAnswer>(Json)
            .Gives<string>(Csv)
            .Refuses(400, 406, 413, 415, 422);

    /// <summary>Every broken rule; empty where the request can be computed.</summary>
    public IReadOnlyList<Fault> Check(TestLocationsRequest request) => _rules.Check(request);

    /// <summary>Computes a request that passed <see cref="Check"/>.</summary>
    public static TestLocationsAnswer Compute(TestLocationsRequest request)
    {
        var units = request.Units.ToUnits();
        var area = request.ToArea();
        var programme = request.ToProgramme(area);
        double InUnit(double meters) => new Length(meters).In(units.Length);
        return new TestLocationsAnswer
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
            Links = new LinksContract(),
            Trace = EarthworkJob.TraceOf(request, () => programme.Working(request.CountedBy(area), RectangleOf(request, units), units)),
            Findings = programme.Review(request.LiftThickness is { } thickness ? Length.From(thickness, units.Length) : null, units).ToContract(request),
            Cautions = EarthworkCautions.OfTestProgramme,
            Provenance = ProvenanceContract.Of(request),
        };
    }

    /// <summary>The locations as a table: comma, decimal point, the unit in the header.</summary>
    public static string ToCsv(TestLocationsAnswer answer)
    {
        var csv = new StringBuilder($"label,lift,station [{answer.Units.Length}],offset [{answer.Units.Length}]\r\n");
        foreach (var location in answer.Locations)
        {
            csv.Append(CultureInfo.InvariantCulture, $"{location.Label},{location.Lift},{location.Station:R},{location.Offset:R}\r\n");
        }

        return csv.ToString();
    }

    private static async Task<IResult> AnswerAsync(HttpContext context, TestLocationsJob job, Limits limits)
    {
        if (Negotiation.Choose(context.Request, Offered) is not { } mediaType)
        {
            return Problems.NotAcceptable(Offered);
        }

        var request = await RequestReader.ReadAsync(context, ServiceJson.Of<TestLocationsRequest>(), job.Check, limits.BodyBytes);
        if (!request.Succeeded)
        {
            return request.Problem;
        }

        context.Response.Headers.Vary = "Accept";
        var answer = Compute(request.Value);
        return mediaType == Csv
            ? Results.Text(ToCsv(answer), "text/csv; charset=utf-8; header=present")
            : Results.Json(answer, ServiceJson.Of<TestLocationsAnswer>());
    }

    private static (Length Length, Length Width)? RectangleOf(TestLocationsRequest request, EarthworkUnits units) =>
        request.Area is { Length: { } length, Width: { } width, Exclusions: null } ? (Length.From(length, units.Length), Length.From(width, units.Length)) : null;
}
