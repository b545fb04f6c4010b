using System.Text.Json;
using Drypeak.Service.Exchange.Files;
using Drypeak.Service.Field;
using Drypeak.Service.Hosting;
using Drypeak.Service.Laboratory;

namespace Drypeak.Service.Exchange.Csv;

/// <summary>A file of laboratory tests computed.</summary>
/// <param name="Tests">The answers, in the order of the tests' first rows.</param>
/// <param name="Findings">What there is to say about the file as such.</param>
public sealed record LaboratoryFileAnswer(IReadOnlyList<MoistureDensityAnswer> Tests, IReadOnlyList<FileFinding> Findings);

/// <summary>A file of field tests computed.</summary>
/// <param name="Tests">The answers, a test a row.</param>
/// <param name="Findings">What there is to say about the file as such.</param>
public sealed record FieldFileAnswer(IReadOnlyList<FieldDensityAnswer> Tests, IReadOnlyList<FileFinding> Findings);

/// <summary><c>POST /v1/exchange/csv?job=…</c>: a file of tests in; the same file with what was computed, or the answers, out.</summary>
internal static class CsvEndpoint
{
    public const string Csv = "text/csv";
    private const string Json = "application/json";
    private const string LinesOfJson = "application/x-ndjson";
    private const string Job = "job";

    private static readonly string[] Offered = [Csv, Json, LinesOfJson];

    public static void MapCsv(this IEndpointRouteBuilder app)
    {
        app.MapPost("/v1/exchange/csv", ComputeAsync)
            .WithTags("Exchange")
            .WithName("exchange-csv")
            .WithSummary("A CSV file of tests, computed")
            .WithDescription(
                "One row a specimen (job=moisture-density) or one row a field test with known densities (job=field-density). Header cells are the contract's names, or the trade's words, with "
                + "the unit in square brackets or in a second row. Comma, semicolon or tab; decimal point or comma, one of them throughout; UTF-8. "
                + "Out by Accept: the file with the computed columns filled, or the answers as JSON, whole or one a line. The columns are described at the address in Link.")
            .TakesQuery<string>(Job, $"Which tests the rows are: {string.Join(" or ", ExchangeJobs.Names)}.", ExchangeJobs.MoistureDensity, required: true)
            .Takes<string>(Csv, Examples.LaboratoryCsv)
            .Gives<string>(Csv)
            .Gives<LaboratoryFileAnswer>(Json)
            .Gives<string>(LinesOfJson)
            .Refuses(406, 413, 415)
            .RefusesFiles();
        CsvMetadata.Map(app);
    }

    private static async Task<IResult> ComputeAsync(HttpContext context, ExchangeJobs jobs, Limits limits)
    {
        if (Negotiation.Choose(context.Request, Offered) is not { } mediaType)
        {
            return Problems.NotAcceptable(Offered);
        }

        if (JobOf(context.Request.Query, out var job) is { Count: > 0 } faults)
        {
            return Problems.InvalidQuery(faults);
        }

        if (RequestReader.RefuseMediaType(context.Request, type => type.MediaType.Equals(Csv, StringComparison.OrdinalIgnoreCase), Csv) is { } refused)
        {
            return refused;
        }

        if (await RequestReader.ReadBytesAsync(context, limits.BodyBytes) is not { } body)
        {
            return Problems.TooLarge(limits.BodyBytes);
        }

        context.Response.Headers.Vary = "Accept";
        return job == ExchangeJobs.MoistureDensity
            ? Answer(context, LaboratoryCsv.Compute(body.Span, jobs.Laboratory), job, mediaType, file => Results.Json(new LaboratoryFileAnswer(file.Tests, file.Findings), ServiceJson.Of<LaboratoryFileAnswer>()))
            : Answer(context, FieldCsv.Compute(body.Span, jobs.Field), job, mediaType, file => Results.Json(new FieldFileAnswer(file.Tests, file.Findings), ServiceJson.Of<FieldFileAnswer>()));
    }

    private static IResult Answer<TAnswer>(HttpContext context, CsvOutcome<TAnswer> outcome, string job, string mediaType, Func<CsvFile<TAnswer>, IResult> whole)
    {
        if (outcome.File is not { } file)
        {
            return outcome.Refusal!;
        }

        if (mediaType == Csv)
        {
            context.Response.Headers.Link = $"<{CsvMetadata.AddressOf(job)}>; rel=\"describedby\"; type=\"{CsvMetadata.MediaType}\"";
            return Results.Bytes(file.Write(), Csv + "; charset=utf-8; header=present");
        }

        return mediaType == Json ? whole(file) : Results.Bytes(ByLine(file.Tests), LinesOfJson);
    }

    /// <summary>Answers as JSON, one a line.</summary>
    public static byte[] ByLine<TAnswer>(IEnumerable<TAnswer> answers)
    {
        using var lines = new MemoryStream();
        foreach (var answer in answers)
        {
            JsonSerializer.Serialize(lines, answer, ServiceJson.Of<TAnswer>());
            lines.WriteByte((byte)'\n');
        }

        return lines.ToArray();
    }

    private static List<Fault> JobOf(IQueryCollection query, out string job)
    {
        var faults = query.Keys.Where(name => name != Job)
            .Select(name => new Fault("/" + Received.Shorten(name), "unknown-parameter", $"The address takes the parameter {Job} only. Leave this one out.")).ToList();
        job = query[Job].ToString();
        if (query[Job].Count == 0)
        {
            faults.Add(new Fault("/" + Job, "missing-parameter", $"Say which tests the rows are: {Job}={string.Join($" or {Job}=", ExchangeJobs.Names)}."));
        }
        else if (!ExchangeJobs.Names.Contains(job))
        {
            faults.Add(new Fault("/" + Job, "invalid-parameter", $"{Job} is one of {string.Join(", ", ExchangeJobs.Names)}; \"{Received.Shorten(job)}\" was received."));
        }

        return faults;
    }
}
