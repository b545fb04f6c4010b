using System.Globalization;

namespace Drypeak.Service.Hosting;

/// <summary>The refusals of the service, each with the sentence that says how to correct the request.</summary>
public static class Problems
{
    /// <summary>A request lists at most so many faults, so that a bad body cannot ask for a large answer.</summary>
    public const int MaximumFaults = 200;

    /// <summary>400: the body is no JSON, or does not have the members of the contract.</summary>
    public static Problem InvalidForm(IReadOnlyList<Fault> faults) => WithFaults(ProblemKind.InvalidForm, faults);

    /// <summary>422: well formed, but nothing can be computed from these values.</summary>
    public static Problem InvalidValues(IReadOnlyList<Fault> faults) => WithFaults(ProblemKind.InvalidValues, faults);

    /// <summary>400: unknown, repeated or impossible parameters of an address; the place of a fault is <c>/</c> and the parameter's name.</summary>
    public static Problem InvalidQuery(IReadOnlyList<Fault> faults) => WithFaults(ProblemKind.InvalidQuery, faults);

    /// <summary>404: the address is right in form, but names nothing.</summary>
    public static Problem NotFound(string detail) => Problem.Of(ProblemKind.NotFound, detail);

    /// <summary>406, with the media types that could be had.</summary>
    public static Problem NotAcceptable(IReadOnlyList<string> offered) =>
        Problem.Of(ProblemKind.NotAcceptable, $"Ask for one of these in Accept: {string.Join(", ", offered)}.")
            with
        { Headers = new Dictionary<string, string> { ["Vary"] = "Accept" } };

    /// <summary>413, with the bound in bytes.</summary>
    public static Problem TooLarge(long maximumBytes) =>
        Problem.Of(ProblemKind.TooLarge, string.Create(CultureInfo.InvariantCulture, $"The body may have up to {maximumBytes} bytes here. Send fewer tests or specimens at once."));

    /// <summary>414, with the bound in bytes.</summary>
    public static Problem AddressTooLong(int maximumBytes) =>
        Problem.Of(ProblemKind.AddressTooLong, string.Create(CultureInfo.InvariantCulture, $"An address may have up to {maximumBytes} bytes. Send the data by POST instead."));

    /// <summary>431, with both bounds.</summary>
    public static Problem HeadersTooLarge(int maximumBytes, int maximumFields) =>
        Problem.Of(ProblemKind.HeadersTooLarge, string.Create(CultureInfo.InvariantCulture, $"A request may have up to {maximumFields} header fields with up to {maximumBytes} bytes together. Leave out what the service does not need, such as cookies."));

    /// <summary>429 with Retry-After: this caller asks more often than the configuration allows.</summary>
    public static Problem TooMany(int retryAfterSeconds) => OfStatus(StatusCodes.Status429TooManyRequests)
        with
    { Headers = RetryAfter(retryAfterSeconds) };

    /// <summary>415: another media type, another character set, or none.</summary>
    public static Problem UnsupportedMediaType(string expected) =>
        Problem.Of(ProblemKind.UnsupportedMediaType, $"Send the body as {expected}, in UTF-8, and say so in Content-Type.")
            with
        { Headers = new Dictionary<string, string> { ["Accept"] = expected } };

    /// <summary>415: a compressed body. RFC 9110, section 15.5.16, answers with the encodings that are understood.</summary>
    public static Problem EncodedBody() =>
        Problem.Of(ProblemKind.UnsupportedMediaType, "Send the body without Content-Encoding.")
            with
        { Headers = new Dictionary<string, string> { ["Accept-Encoding"] = "identity" } };

    /// <summary>503 with Retry-After: another replica, or this one a little later, will answer.</summary>
    public static Problem Unavailable(string detail, int retryAfterSeconds) =>
        Problem.Of(ProblemKind.Unavailable, detail)
            with
        { Headers = RetryAfter(retryAfterSeconds) };

    /// <summary>The problem for a status that routing or the server has set, with a sentence of general advice.</summary>
    public static Problem OfStatus(int status) => Problem.Of(ProblemKind.OfStatus(status), status switch
    {
        401 => "Send a key as Authorization: Bearer KEY, or a token of the issuer that the service trusts.",
        403 => "The key does not open this address. Ask whoever runs the service for one whose scopes do.",
        404 => "Look at the address: the addresses of the service are listed at /openapi/v1.json and explained at /reference.",
        405 => "Use one of the methods listed in Allow.",
        406 => "Ask for application/json in Accept.",
        408 => "Send the body without long pauses, or in smaller pieces of work.",
        413 => "Send a smaller body.",
        415 => "Send the body as a media type that /reference lists for the address, and say so in Content-Type.",
        429 => "Wait as long as Retry-After says and send the request again.",
        503 => "Send the request again in a moment.",
        >= 500 => "The fault is ours. Report the trace identifier with the time of the request.",
        _ => "Look at the request line, the header fields and the length of the body.",
    });

    private static Dictionary<string, string> RetryAfter(int seconds) => new() { ["Retry-After"] = seconds.ToString(CultureInfo.InvariantCulture) };

    private static Problem WithFaults(ProblemKind kind, IReadOnlyList<Fault> faults)
    {
        var detail = faults.Count switch
        {
            1 => "Correct the place listed under errors and send the request again.",
            <= MaximumFaults => string.Create(CultureInfo.InvariantCulture, $"Correct the {faults.Count} places listed under errors and send the request again."),
            _ => string.Create(CultureInfo.InvariantCulture, $"Correct the places listed under errors and send the request again; only the first {MaximumFaults} are listed."),
        };
        return Problem.Of(kind, detail, faults.Count <= MaximumFaults ? faults : [.. faults.Take(MaximumFaults)]);
    }
}
