namespace Drypeak.Service.Hosting;

/// <summary>A kind of problem: what RFC 9457 calls its type, with the title and status that never vary within it.</summary>
/// <param name="Name">Stable name in kebab-case.</param>
/// <param name="Status">HTTP status.</param>
/// <param name="Title">The same for each problem of the kind.</param>
public sealed record ProblemKind(string Name, int Status, string Title)
{
    /// <summary>The kind as an absolute URI. It names the kind and opens no page, so it holds wherever the service runs.</summary>
    public string Uri => $"urn:drypeak:problem:{Name}";

    public static readonly ProblemKind InvalidForm = new("invalid-form", 400, "The request does not have the form of the contract");
    public static readonly ProblemKind InvalidQuery = new("invalid-query", 400, "The address has parameters that cannot be taken");
    public static readonly ProblemKind BadRequest = new("bad-request", 400, "The request cannot be read");
    public static readonly ProblemKind Unauthorized = new("unauthorized", 401, "The request needs a key");
    public static readonly ProblemKind Forbidden = new("forbidden", 403, "The key does not open this address");
    public static readonly ProblemKind NotFound = new("not-found", 404, "There is nothing at this address");
    public static readonly ProblemKind MethodNotAllowed = new("method-not-allowed", 405, "The address does not take this method");
    public static readonly ProblemKind NotAcceptable = new("not-acceptable", 406, "None of the accepted media types can be given");
    public static readonly ProblemKind RequestTimeout = new("request-timeout", 408, "The request came too slowly");
    public static readonly ProblemKind TooLarge = new("too-large", 413, "The request is too large");
    public static readonly ProblemKind AddressTooLong = new("address-too-long", 414, "The address is too long");
    public static readonly ProblemKind UnsupportedMediaType = new("unsupported-media-type", 415, "The media type of the request is not understood");
    public static readonly ProblemKind InvalidValues = new("invalid-values", 422, "The request has values that cannot be computed with");
    public static readonly ProblemKind TooManyRequests = new("too-many-requests", 429, "Too many requests");
    public static readonly ProblemKind HeadersTooLarge = new("headers-too-large", 431, "The header fields are too large");
    public static readonly ProblemKind Internal = new("internal", 500, "The service has failed");
    public static readonly ProblemKind Unavailable = new("unavailable", 503, "The service cannot answer now");

    /// <summary>Every kind, in the order of its status.</summary>
    public static readonly IReadOnlyList<ProblemKind> All =
    [
        InvalidForm, InvalidQuery, BadRequest, Unauthorized, Forbidden, NotFound, MethodNotAllowed, NotAcceptable, RequestTimeout, TooLarge,
        AddressTooLong, UnsupportedMediaType, InvalidValues, TooManyRequests, HeadersTooLarge, Internal, Unavailable,
    ];

    /// <summary>The kind that stands for a status which something outside our endpoints has set.</summary>
    public static ProblemKind OfStatus(int status) => status switch
    {
        400 => BadRequest,
        >= 500 and not 503 => Internal,
        _ => All.FirstOrDefault(kind => kind.Status == status)
            ?? new ProblemKind($"status-{status}", status, "The request was refused"),
    };
}
