using System.IO.Pipelines;
using System.Text.Json.Nodes;
using Drypeak.Service.Hosting;
using Microsoft.AspNetCore.Http.Features;
using Microsoft.AspNetCore.Server.Kestrel.Core;
using Microsoft.AspNetCore.Server.Kestrel.Core.Features;

namespace Drypeak.Service.Exchange.Batch;

/// <summary><c>POST /v1/{job}/batch</c>: one JSON text a line in, one a line out, in order and while the body still comes.</summary>
internal static partial class BatchEndpoints
{
    private const string LinesOfJson = "application/x-ndjson";
    private const string Summary = "summary";

    /// <summary>A caller may pause, waiting for a test or for its own disk; one who does nothing for so long is gone.</summary>
    private static readonly MinDataRate Patience = new(bytesPerSecond: 1, gracePeriod: TimeSpan.FromMinutes(10));

    public static void MapBatches(this IEndpointRouteBuilder app)
    {
        Map(app, ExchangeJobs.MoistureDensity, "Laboratory", Examples.MoistureDensityRequest);
        Map(app, ExchangeJobs.FieldDensity, "Field", Examples.FieldDensityRequest);
    }

    private static void Map(IEndpointRouteBuilder app, string job, string tag, string example)
    {
        var line = app.ServiceProvider.GetRequiredService<ExchangeJobs>().ByLine(job);
        app.MapPost($"/v1/{job}/batch", (HttpContext context, Limits limits, IHostApplicationLifetime lifetime, ILoggerFactory logs) =>
                AnswerAsync(context, line, limits, lifetime, logs.CreateLogger(typeof(BatchEndpoints))))
            .WithTags(tag)
            .WithName(job + "-batch")
            .WithSummary($"Many {job} requests, one a line")
            .WithDescription(
                $"Each line is a request of /v1/{job} and is answered by one line, in order, while the body still comes. A line that is refused is answered in its place by its problem, "
                + "with the line's number; blank lines are passed over and counted. The body may be of any length, a line up to 64 KiB. gzip and br are understood both ways. "
                + "Take the answers while you send: the service reads on only as fast as they are taken.")
            .Takes<string>(LinesOfJson, OneLine(example) + "\n" + OneLine(example) + "\n")
            .Gives<string>(LinesOfJson)
            .TakesQuery<bool>(Summary, "Whether the last line sums up: lines read, blank, answered, refused.", "true")
            .Refuses(400, 406, 415);
    }

    private static string OneLine(string json) => JsonNode.Parse(json)!.ToJsonString();

    private static async Task<IResult> AnswerAsync(HttpContext context, LineJob job, Limits limits, IHostApplicationLifetime lifetime, ILogger log)
    {
        var (request, response) = (context.Request, context.Response);
        if (Negotiation.Choose(request, LinesOfJson) is null)
        {
            return Problems.NotAcceptable([LinesOfJson]);
        }

        var faults = FaultsOf(request.Query);
        if (faults.Count > 0)
        {
            return Problems.InvalidQuery(faults);
        }

        if (RequestReader.RefuseMediaType(request, type => type.MediaType.Equals(LinesOfJson, StringComparison.OrdinalIgnoreCase), LinesOfJson, anyCoding: true) is { } refused)
        {
            return refused;
        }

        if (BodyCoding.Decoded(request) is not { } source)
        {
            return BatchProblems.UnknownCoding();
        }

        BePatient(context);
        response.ContentType = LinesOfJson;
        response.Headers.Vary = "Accept-Encoding";
        response.Headers.CacheControl = "no-store";
        var coding = BodyCoding.Chosen(request);
        if (coding is not null)
        {
            response.Headers.ContentEncoding = coding;
        }

        // The header fields leave at once, so that the caller knows that it may go on sending.
        await response.StartAsync(context.RequestAborted);
        await response.BodyWriter.FlushAsync(context.RequestAborted);

        using var stop = new CancellationTokenSource();
        await using var stopping = lifetime.ApplicationStopping.Register(() => stop.CancelAfter(TimeSpan.FromSeconds(limits.ShutdownSeconds / 2.0)));
        await using var encoded = coding is null ? null : BodyCoding.Encode(response.Body, coding);
        var run = new BatchRun(job, limits, (exception, trace) => LineFailed(log, exception, trace));
        try
        {
            await run.RunAsync(source, encoded is null ? response.BodyWriter : PipeWriter.Create(encoded, new StreamPipeWriterOptions(leaveOpen: true)),
                request.Query[Summary] == "true", stop.Token, context.RequestAborted);
        }
        catch (Exception) when (context.RequestAborted.IsCancellationRequested)
        {
            // The caller is gone, and nobody is left to be told. What it has taken is whole, line by line.
        }

        return Results.Empty;
    }

    private static List<Fault> FaultsOf(IQueryCollection query)
    {
        var faults = new List<Fault>();
        foreach (var (name, values) in query)
        {
            if (name != Summary)
            {
                faults.Add(new Fault("/" + Received.Shorten(name), "unknown-parameter", $"A batch takes the parameter {Summary} only. Leave this one out."));
            }
            else if (values is not ["true" or "false"])
            {
                faults.Add(new Fault("/" + Summary, "invalid-parameter", $"{Summary} is true or false, once; \"{Received.Shorten(values.ToString())}\" was received."));
            }
        }

        return faults;
    }

    private static void BePatient(HttpContext context)
    {
        if (context.Features.Get<IHttpMinRequestBodyDataRateFeature>() is { } requests)
        {
            requests.MinDataRate = Patience;
        }

        if (context.Features.Get<IHttpMinResponseDataRateFeature>() is { } responses)
        {
            responses.MinDataRate = Patience;
        }

        context.Features.Get<IHttpMaxRequestBodySizeFeature>()!.MaxRequestBodySize = null;
    }

    [LoggerMessage(LogLevel.Error, "A line of a batch has failed; its problem has the trace identifier {Trace}")]
    private static partial void LineFailed(ILogger log, Exception exception, string trace);
}
