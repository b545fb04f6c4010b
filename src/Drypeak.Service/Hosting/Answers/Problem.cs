using System.Text.Encodings.Web;
using System.Text.Json;
using System.Text.Json.Serialization;

namespace Drypeak.Service.Hosting;

/// <summary>A refusal as <c>application/problem+json</c> (RFC 9457). It is its own HTTP answer.</summary>
public sealed record Problem : IResult
{
    public const string MediaType = "application/problem+json";

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
    /// <example>Correct the place listed under errors and send the request again.</example>
    public required string Detail { get; init; }

    /// <summary>Every fault found, in the order of the request; empty where the fault lies in no place of the body.</summary>
    public IReadOnlyList<Fault> Errors { get; init; } = [];

    /// <summary>In a batch: the line that was refused, counted from 1.</summary>
    /// <example>7</example>
    [JsonIgnore(Condition = JsonIgnoreCondition.WhenWritingNull)]
    public long? Line { get; init; }

    /// <summary>Where the service has failed: what finds the request in its log.</summary>
    /// <example>4bf92f3577b34da6a3ce929d0e0e4736</example>
    [JsonIgnore(Condition = JsonIgnoreCondition.WhenWritingNull)]
    public string? TraceId { get; init; }

    /// <summary>HTTP header fields that belong to the refusal, such as Allow.</summary>
    [JsonIgnore]
    public IReadOnlyDictionary<string, string> Headers { get; init; } = new Dictionary<string, string>();

    public static Problem Of(ProblemKind kind, string detail, IReadOnlyList<Fault>? errors = null) => new()
    {
        Type = kind.Uri,
        Title = kind.Title,
        Status = kind.Status,
        Detail = detail,
        Errors = errors ?? [],
    };

    /// <summary>The problem as one line of JSON in UTF-8, without a line break.</summary>
    public byte[] ToJson() => JsonSerializer.SerializeToUtf8Bytes(this, ProblemJson.Relaxed.Problem);

    public async Task ExecuteAsync(HttpContext httpContext)
    {
        var json = ToJson();
        var response = httpContext.Response;
        response.StatusCode = Status;
        response.ContentType = MediaType;
        response.ContentLength = json.Length;
        foreach (var (name, value) in Headers)
        {
            response.Headers[name] = value;
        }

        await response.Body.WriteAsync(json, httpContext.RequestAborted);
    }
}

[JsonSourceGenerationOptions(PropertyNamingPolicy = JsonKnownNamingPolicy.CamelCase)]
[JsonSerializable(typeof(Problem))]
internal sealed partial class ProblemJson : JsonSerializerContext
{
    /// <summary>Quotes and letters beyond ASCII stay readable: the answer is JSON by its media type and is never sniffed as a page.</summary>
    public static readonly ProblemJson Relaxed = new(new JsonSerializerOptions
    {
        PropertyNamingPolicy = JsonNamingPolicy.CamelCase,
        Encoder = JavaScriptEncoder.UnsafeRelaxedJsonEscaping,
    });
}
