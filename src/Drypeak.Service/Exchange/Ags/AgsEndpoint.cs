using System.Globalization;
using Drypeak.Service.Exchange.Files;
using Drypeak.Service.Hosting;
using Microsoft.AspNetCore.WebUtilities;
using Microsoft.Net.Http.Headers;

namespace Drypeak.Service.Exchange.Ags;

/// <summary><c>POST /v1/exchange/ags4</c>: a file in; what was found and computed, or the file with the results in their places, out.</summary>
internal static class AgsEndpoint
{
    private const string Json = "application/json";
    private const string Plain = "text/plain";
    private const string Multipart = "multipart/form-data";
    private const string Replace = "replace";
    private const string MaximumDryDensity = "maximumDryDensity";

    private static readonly string[] Offered = [Json, Plain];

    public static void MapAgs(this IEndpointRouteBuilder app) => app.MapPost("/v1/exchange/ags4", ComputeAsync)
        .WithTags("Exchange")
        .WithName("exchange-ags4")
        .WithSummary("An AGS4 file, computed")
        .WithDescription(
            "Compaction tests (CMPG with CMPT) and field densities (IDEN) of an AGS4 file, editions 4.0.4 to 4.2. Out by Accept: as JSON what was found and computed; as text/plain the file with "
            + "CMPG_MAXD and CMPG_MCOP in their places and every other line as it came, byte for byte. A file that breaks a rule of form where it matters is refused with line and group; elsewhere it is a finding. "
            + "AGS4 keeps two decimals of a density and two figures of a water content, no wet density and no reason for a point set aside: keep the JSON where these matter.")
        .Takes<string>(Plain, Examples.Ags4)
        .Gives<AgsAnswer>(Json)
        .Gives<string>(Plain)
        .TakesQuery<bool>(Replace, "Whether results that stand in the file and differ from the computed ones are replaced. Default: false, they are kept with a finding.", "true")
        .TakesQuery<double>(MaximumDryDensity, "What the field tests are held against, Mg/m3.", "1.93")
        .Refuses(406, 413, 415)
        .RefusesFiles();

    private static async Task<IResult> ComputeAsync(HttpContext context, AgsJob job, Limits limits)
    {
        if (Negotiation.Choose(context.Request, Offered) is not { } mediaType)
        {
            return Problems.NotAcceptable(Offered);
        }

        var faults = new List<Fault>();
        var options = OptionsOf(context.Request.Query, faults);
        if (faults.Count > 0)
        {
            return Problems.InvalidQuery(faults);
        }

        if (context.Request.Headers.ContentEncoding.Count > 0)
        {
            return Problems.EncodedBody();
        }

        if (!MediaTypeHeaderValue.TryParse(context.Request.ContentType, out var type) || !(IsOf(type, Plain) || IsOf(type, Multipart)))
        {
            return Problems.UnsupportedMediaType($"{Plain} or one part of {Multipart}");
        }

        if (await RequestReader.ReadBytesAsync(context, limits.BodyBytes) is not { } body)
        {
            return Problems.TooLarge(limits.BodyBytes);
        }

        if (IsOf(type, Multipart))
        {
            if (await OnlyPartAsync(body, type, context.RequestAborted) is not { } part)
            {
                return Problem.Of(ProblemKind.BadRequest, $"Send one file as the one part of {Multipart}, or the bare file as {Plain}.");
            }

            body = part;
        }

        context.Response.Headers.Vary = "Accept";
        var outcome = job.Compute(body, options);
        return outcome.Answer is not { } answer ? outcome.Refusal!
            : mediaType == Json ? Results.Json(answer, ServiceJson.Of<AgsAnswer>())
            : Results.Bytes(outcome.File, Plain);
    }

    private static bool IsOf(MediaTypeHeaderValue type, string expected) => type.MediaType.Equals(expected, StringComparison.OrdinalIgnoreCase);

    private static async Task<ReadOnlyMemory<byte>?> OnlyPartAsync(ReadOnlyMemory<byte> body, MediaTypeHeaderValue type, CancellationToken stop)
    {
        var boundary = HeaderUtilities.RemoveQuotes(type.Boundary);
        if (boundary.Length == 0)
        {
            return null;
        }

        var reader = new MultipartReader(boundary.ToString(), new MemoryStream(body.ToArray(), writable: false)) { BodyLengthLimit = null };
        try
        {
            if (await reader.ReadNextSectionAsync(stop) is not { } section)
            {
                return null;
            }

            using var part = new MemoryStream();
            await section.Body.CopyToAsync(part, stop);
            return await reader.ReadNextSectionAsync(stop) is null ? (ReadOnlyMemory<byte>?)part.ToArray() : null;
        }
        catch (Exception broken) when (broken is IOException or InvalidDataException)
        {
            // Cut short, or no multipart at all: the sender is told what is expected.
            return null;
        }
    }

    private static AgsOptions OptionsOf(IQueryCollection query, List<Fault> faults)
    {
        var options = AgsOptions.Default;
        foreach (var (name, values) in query)
        {
            switch (name)
            {
                case Replace when values is ["true" or "false"]:
                    options = options with { Replace = values == "true" };
                    break;
                case Replace:
                    faults.Add(new Fault("/" + Replace, "invalid-parameter", $"{Replace} is true or false, once; \"{Received.Shorten(values.ToString())}\" was received."));
                    break;
                case MaximumDryDensity when values is [{ } text] && double.TryParse(text, NumberStyles.AllowDecimalPoint, CultureInfo.InvariantCulture, out var density) && density is > 0.1 and < 10:
                    options = options with { MaximumDryDensity = density };
                    break;
                case MaximumDryDensity:
                    faults.Add(new Fault("/" + MaximumDryDensity, "invalid-parameter", $"{MaximumDryDensity} is a density in Mg/m3 between 0.1 and 10, once; \"{Received.Shorten(values.ToString())}\" was received."));
                    break;
                default:
                    faults.Add(new Fault("/" + Received.Shorten(name), "unknown-parameter", $"The address takes the parameters {Replace} and {MaximumDryDensity}. Leave this one out."));
                    break;
            }
        }

        return options;
    }
}
