using System.Security.Cryptography;
using Microsoft.Net.Http.Headers;

namespace Drypeak.Service.Hosting;

/// <summary>
/// Bytes that anyone may keep: with a strong ETag, which is their SHA-256, and answered by 304 to who has them already
/// (RFC 9110, sections 8.8.3 and 13.1.2).
/// </summary>
/// <param name="Bytes">The body.</param>
/// <param name="MediaType">Its Content-Type.</param>
public sealed record CachedBytes(ReadOnlyMemory<byte> Bytes, string MediaType) : IResult
{
    /// <summary>For what its address determines for ever, such as a chart.</summary>
    public const string ForEver = "public, max-age=31536000, immutable";

    /// <summary>For what another version of the service may give otherwise: to be kept, but asked about each time.</summary>
    public const string Revalidated = "public, no-cache";

    /// <summary>Cache-Control of the answer and of a 304.</summary>
    public string CacheControl { get; init; } = ForEver;

    /// <summary>Vary of the answer and of a 304; null where the address alone decides.</summary>
    public string? Vary { get; init; }

    /// <summary>The ETag, with its quotes.</summary>
    public string EntityTag => $"\"{Convert.ToHexStringLower(SHA256.HashData(Bytes.Span))}\"";

    public async Task ExecuteAsync(HttpContext httpContext)
    {
        var (request, response) = (httpContext.Request, httpContext.Response);
        var tag = EntityTag;
        response.Headers.ETag = tag;
        response.Headers.CacheControl = CacheControl;
        if (Vary is not null)
        {
            response.Headers.Vary = Vary;
        }

        if ((HttpMethods.IsGet(request.Method) || HttpMethods.IsHead(request.Method)) && IsKnown(request, tag))
        {
            response.StatusCode = StatusCodes.Status304NotModified;
            return;
        }

        response.ContentType = MediaType;
        response.ContentLength = Bytes.Length;
        if (!HttpMethods.IsHead(request.Method))
        {
            await response.Body.WriteAsync(Bytes, httpContext.RequestAborted);
        }
    }

    private static bool IsKnown(HttpRequest request, string tag)
    {
        var ours = EntityTagHeaderValue.Parse(tag);
        return request.GetTypedHeaders().IfNoneMatch
            .Any(theirs => theirs.Equals(EntityTagHeaderValue.Any) || theirs.Compare(ours, useStrongComparison: false));
    }
}
