using System.Text.Encodings.Web;
using System.Text.Json;
using System.Text.Json.Serialization;
using Drypeak.Service.Hosting;

namespace Drypeak.Service.Exchange.Files;

/// <summary>One thing for which a file cannot be taken, and where it stands.</summary>
public sealed record FileFault
{
    /// <summary>Line of the file, from 1. A row or a quoted cell of several lines counts where it begins.</summary>
    /// <example>7</example>
    [JsonIgnore(Condition = JsonIgnoreCondition.WhenWritingNull)]
    public int? Line { get; init; }

    /// <summary>Of a parameter of the address: <c>/</c> and its name.</summary>
    /// <example>/job</example>
    [JsonIgnore(Condition = JsonIgnoreCondition.WhenWritingNull)]
    [JsonPropertyName("pointer")]
    public string? Place { get; init; }

    /// <summary>In CSV: the column, from 1; the row's first where the fault is in no cell.</summary>
    /// <example>5</example>
    [JsonIgnore(Condition = JsonIgnoreCondition.WhenWritingNull)]
    public int? Column { get; init; }

    /// <summary>In AGS4: the group, or an empty text outside of any.</summary>
    /// <example>CMPT</example>
    [JsonIgnore(Condition = JsonIgnoreCondition.WhenWritingNull)]
    public string? Group { get; init; }

    /// <summary>Stable code in kebab-case.</summary>
    /// <example>not-a-number</example>
    public required string Code { get; init; }

    /// <summary>What was received, and what to do.</summary>
    /// <example>“12.x” is not a number. Write digits with one decimal mark and nothing else.</example>
    public required string Message { get; init; }
}

/// <summary>What there is to say about a file that was taken.</summary>
/// <param name="Code" example="heading-unknown">Stable code.</param>
/// <param name="Severity" example="note">error, warning or note.</param>
/// <param name="Message" example="GEOL is not read here; its 12 rows are carried through.">A sentence, and what to do.</param>
/// <param name="Line" example="41">Line of the file, from 1.</param>
public sealed record FileFinding(string Code, string Severity, string Message, int Line)
{
    internal static FileFinding Of(string code, Severity severity, int line, string message) => new(code, severity.ToString().ToLowerInvariant(), message, line);
}

/// <summary>A file refused (RFC 9457), with every fault at its line. It is its own HTTP answer.</summary>
public sealed record FileProblem : IResult
{
    /// <summary>Stable absolute URI of the kind of problem.</summary>
    /// <example>urn:drypeak:problem:invalid-values</example>
    public required string Type { get; init; }

    /// <summary>Title of the kind of problem; the same each time.</summary>
    /// <example>The request has values that cannot be computed with</example>
    public required string Title { get; init; }

    /// <summary>The HTTP status of the answer.</summary>
    /// <example>422</example>
    public required int Status { get; init; }

    /// <summary>What to do about it.</summary>
    /// <example>Correct the places listed under errors and send the file again.</example>
    public required string Detail { get; init; }

    /// <summary>Every fault found, in the order of the file.</summary>
    public required IReadOnlyList<FileFault> Errors { get; init; }

    internal static FileProblem Of(ProblemKind kind, IReadOnlyList<FileFault> faults) => new()
    {
        Type = kind.Uri,
        Title = kind.Title,
        Status = kind.Status,
        Detail = faults.Count > Problems.MaximumFaults
            ? $"Correct the places listed under errors and send the file again; only the first {Problems.MaximumFaults} are listed."
            : "Correct the places listed under errors and send the file again.",
        Errors = [.. faults.OrderBy(fault => fault.Line).ThenBy(fault => fault.Column).Take(Problems.MaximumFaults)],
    };

    internal byte[] ToJson() => JsonSerializer.SerializeToUtf8Bytes(this, FileProblemJson.Relaxed.FileProblem);

    public Task ExecuteAsync(HttpContext httpContext)
    {
        httpContext.Response.StatusCode = Status;
        return Results.Bytes(ToJson(), Problem.MediaType).ExecuteAsync(httpContext);
    }
}

/// <summary>How an endpoint that takes files says so in the API description.</summary>
internal static class FileEndpoints
{
    /// <summary>Refusals that name line and column, or line and group; those of the address name a pointer instead.</summary>
    public static RouteHandlerBuilder RefusesFiles(this RouteHandlerBuilder endpoint) => endpoint.WithMetadata(
        new EndpointDescription.Body(StatusCodes.Status400BadRequest, Problem.MediaType, typeof(FileProblem), null),
        new EndpointDescription.Body(StatusCodes.Status422UnprocessableEntity, Problem.MediaType, typeof(FileProblem), null));
}

[JsonSourceGenerationOptions(PropertyNamingPolicy = JsonKnownNamingPolicy.CamelCase)]
[JsonSerializable(typeof(FileProblem))]
internal sealed partial class FileProblemJson : JsonSerializerContext
{
    public static readonly FileProblemJson Relaxed = new(new JsonSerializerOptions
    {
        PropertyNamingPolicy = JsonNamingPolicy.CamelCase,
        Encoder = JavaScriptEncoder.UnsafeRelaxedJsonEscaping,
    });
}
