using System.Text.Json;
using Drypeak.Figures;
using Drypeak.Service.Charts;
using Drypeak.Service.Hosting;

namespace Drypeak.Service.Reports;

/// <summary>A kind of report.</summary>
/// <param name="Job">The name that its addresses bear: <c>/v1/reports/{job}.pdf</c>.</param>
/// <param name="Shows">What it shows, for the API description.</param>
/// <param name="Tag">The part of the API description that it belongs to.</param>
/// <param name="Example">A whole request, as JSON.</param>
/// <param name="Check">Every broken rule of a request.</param>
/// <param name="Compute">The report of a request without broken rules, with its working if asked.</param>
internal sealed record ReportKind<TRequest>(
    string Job, string Shows, string Tag, string Example, Func<TRequest, IReadOnlyList<Fault>> Check, Func<TRequest, ReportOptions, Report> Compute)
    where TRequest : class;

/// <summary>Reports: <c>POST /v1/reports/{job}.pdf</c> with the job's own request, and <c>GET</c> with the request packed in the address. Both give the same bytes.</summary>
internal static class ReportEndpoints
{
    private const string Json = "application/json";
    private const string Pdf = "application/pdf";

    /// <summary>Maps both addresses of a kind of report.</summary>
    public static void MapReport<TRequest>(this IEndpointRouteBuilder app, ReportKind<TRequest> kind)
        where TRequest : class
    {
        var path = $"/v1/reports/{kind.Job}.pdf";
        ReportOptions.Describe(app.MapMethods(path, EndpointDescription.Reading, (HttpContext context, Limits limits) => Get(context, limits, kind))
            .WithTags(kind.Tag)
            .WithName($"{kind.Job}-report")
            .WithSummary($"{kind.Shows} by its address")
            .WithDescription("The address comes from an answer's links, or from an earlier report, and holds the request. The same address gives the same bytes from the same version of the service.")
            .TakesQuery<string>(ChartAddress.Data, "The request, as an answer's links give it.", ReportAddress.Pack(JsonSerializer.Deserialize(kind.Example, ServiceJson.Of<TRequest>())!), required: true)
            .Gives<byte[]>(Pdf)
            .Refuses(400));
        ReportOptions.Describe(app.MapPost(path, (HttpContext context, Limits limits) => PostAsync(context, limits, kind))
            .WithTags(kind.Tag)
            .WithName($"{kind.Job}-report-post")
            .WithSummary(kind.Shows)
            .WithDescription("One page to be filed: identification, method, measurements, chart, result with its uncertainty, findings, cautions, lines to sign on, digest of the request, and the address that gives it again.")
            .Takes<TRequest>(Json, kind.Example)
            .Gives<byte[]>(Pdf)
            .Refuses(400, 406, 413, 415, 422));
    }

    private static IResult Get<TRequest>(HttpContext context, Limits limits, ReportKind<TRequest> kind)
        where TRequest : class
    {
        var query = context.Request.Query;
        var faults = new List<Fault>();
        var options = ReportOptions.Read(query, [ChartAddress.Data], faults);
        TRequest? request = null;
        if (query[ChartAddress.Data] is [{ Length: > 0 } data])
        {
            request = ReportAddress.Read(data, kind.Check, limits, faults);
        }
        else if (query[ChartAddress.Data].Count < 2)
        {
            faults.Add(new Fault("/" + ChartAddress.Data, "missing-parameter", "The address does not say what to report. Take it from the links of an answer, or post the request."));
        }

        return faults.Count > 0 || request is null
            ? Problems.InvalidQuery(faults)
            : new CachedBytes(Draw(kind, request, options), Pdf) { CacheControl = CachedBytes.Revalidated };
    }

    private static async Task<IResult> PostAsync<TRequest>(HttpContext context, Limits limits, ReportKind<TRequest> kind)
        where TRequest : class
    {
        if (Negotiation.Choose(context.Request, Pdf) is null)
        {
            return Problems.NotAcceptable([Pdf]);
        }

        var faults = new List<Fault>();
        var options = ReportOptions.Read(context.Request.Query, [], faults);
        if (faults.Count > 0)
        {
            return Problems.InvalidQuery(faults);
        }

        var request = await RequestReader.ReadAsync(context, ServiceJson.Of<TRequest>(), kind.Check, limits.BodyBytes);
        return request.Succeeded ? Results.Bytes(Draw(kind, request.Value, options), Pdf) : request.Problem;
    }

    private static byte[] Draw<TRequest>(ReportKind<TRequest> kind, TRequest request, ReportOptions options)
        where TRequest : class =>
        PdfWriter.Write(ReportFigure.Draw(kind.Compute(request, options), options.Paper, options.Theme));
}
