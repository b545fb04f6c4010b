using Drypeak.Figures;
using Drypeak.Service.Charts;
using Drypeak.Service.Hosting;

namespace Drypeak.Service.Laboratory;

/// <summary><c>POST /v1/moisture-density</c>: a laboratory test in, its curve out; as JSON, or as its picture by Accept.</summary>
internal static class MoistureDensityEndpoint
{
    private const string Json = "application/json";

    private static readonly string[] Offered = [Json, .. ChartFormat.All.Select(format => format.MediaType)];

    public static void MapMoistureDensity(this IEndpointRouteBuilder app)
    {
        var endpoint = app.MapPost("/v1/moisture-density", ComputeAsync)
            .WithTags("Laboratory")
            .WithName("moisture-density")
            .WithSummary("Reduce a laboratory compaction test and fit its curve")
            .WithDescription("From weighings, or any later stage, to specimens, curve, optimum with its uncertainty, findings and chart. With Accept: image/svg+xml, image/png or application/pdf the chart itself is the answer.")
            .Takes<MoistureDensityRequest>(Json, Examples.MoistureDensityRequest)
            .Gives<MoistureDensityAnswer>(Json)
            .Refuses(400, 406, 413, 415, 422);
        foreach (var format in ChartFormat.All)
        {
            endpoint.Gives<byte[]>(format.MediaType);
        }
    }

    private static async Task<IResult> ComputeAsync(HttpContext context, MoistureDensityJob job, Limits limits)
    {
        if (Negotiation.Choose(context.Request, Offered) is not { } mediaType)
        {
            return Problems.NotAcceptable(Offered);
        }

        var options = QueryOf(context.Request.Query, mediaType, out var faults);
        if (faults.Count > 0)
        {
            return Problems.InvalidQuery(faults);
        }

        var request = await RequestReader.ReadAsync(context, ServiceJson.Of<MoistureDensityRequest>(), job.Check, limits.BodyBytes);
        if (!request.Succeeded)
        {
            return request.Problem;
        }

        var outcome = job.Compute(request.Value);
        context.Response.Headers.Vary = "Accept";
        if (options is not { } picture)
        {
            return Results.Json(outcome.Answer, ServiceJson.Of<MoistureDensityAnswer>());
        }

        return CompactionFigure.Refusal(outcome.Chart, picture.Options.Size) is { } refusal
            ? Problems.InvalidValues([new Fault("", "not-drawable", refusal + " Check the values and their units; with Accept: application/json they are answered.")])
            : Results.Bytes(picture.Format.Draw(outcome.Chart, picture.Options), mediaType);
    }

    /// <summary>The picture asked for, or null where the answer is JSON; then the query has no parameters.</summary>
    private static (ChartFormat Format, ChartOptions Options)? QueryOf(IQueryCollection query, string mediaType, out List<Fault> faults)
    {
        faults = [];
        if (ChartFormat.All.FirstOrDefault(format => format.MediaType == mediaType) is { } format)
        {
            return (format, ChartOptions.Read(query, format, [], faults));
        }

        faults.AddRange(query.Keys.Select(name => new Fault("/" + (name.Length > 40 ? name[..40] + "…" : name), "unknown-parameter", "A JSON answer takes no parameters in the address. Leave it out.")));
        return null;
    }
}
