using System.Buffers;
using System.Text.Json.Serialization.Metadata;
using Microsoft.Net.Http.Headers;

namespace Drypeak.Service.Hosting;

/// <summary>Reads the body of an HTTP request: the media type, the bound on its length, then <see cref="JsonReading"/>.</summary>
public static class RequestReader
{
    private const string Json = "application/json";

    /// <summary>Reads one JSON text from a request.</summary>
    /// <typeparam name="T">The contract type.</typeparam>
    /// <param name="context">The request; its body is read to the end or to the bound, and kept in memory only.</param>
    /// <param name="contract">Type information by <see cref="StrictJson"/>.</param>
    /// <param name="rules">See <see cref="JsonReading.Read{T}"/>.</param>
    /// <param name="maximumBytes">The largest body, inclusive.</param>
    /// <returns>The value, or a problem: 415, 413, 400 or 422, in this order of precedence.</returns>
    public static async Task<Read<T>> ReadAsync<T>(
        HttpContext context, JsonTypeInfo<T> contract, Func<T, IReadOnlyList<Fault>> rules, int maximumBytes)
        where T : class
    {
        if (RefuseMediaType(context.Request, IsJson, Json) is { } refused)
        {
            return refused;
        }

        return await ReadBytesAsync(context, maximumBytes) is { } body
            ? JsonReading.Read(body, contract, rules)
            : Problems.TooLarge(maximumBytes);
    }

    /// <summary>415 for a body that is encoded, has no media type, another one than expected, or is not in UTF-8; else null.</summary>
    /// <param name="request">The request.</param>
    /// <param name="isExpected">Whether a media type is the expected one.</param>
    /// <param name="expected">The expected one, for people.</param>
    /// <param name="anyCoding">Whether the body's encoding is somebody else's to judge.</param>
    public static Problem? RefuseMediaType(HttpRequest request, Func<MediaTypeHeaderValue, bool> isExpected, string expected, bool anyCoding = false)
    {
        if (!anyCoding && request.Headers.ContentEncoding.Count > 0)
        {
            return Problems.EncodedBody();
        }

        var understood = MediaTypeHeaderValue.TryParse(request.ContentType, out var type)
            && isExpected(type)
            && (!type.Charset.HasValue || HeaderUtilities.RemoveQuotes(type.Charset).Equals("utf-8", StringComparison.OrdinalIgnoreCase));
        return understood ? null : Problems.UnsupportedMediaType(expected);
    }

    /// <summary>The whole body, or null where it is longer than the bound, declared so or not.</summary>
    public static async Task<ReadOnlyMemory<byte>?> ReadBytesAsync(HttpContext context, int maximumBytes)
    {
        if (context.Request.ContentLength > maximumBytes)
        {
            return null;
        }

        var body = context.Request.BodyReader;
        var read = await body.ReadAtLeastAsync(maximumBytes + 1, context.RequestAborted);
        if (read.Buffer.Length > maximumBytes)
        {
            // Examined to the end: what is still to come is the server's to throw away.
            body.AdvanceTo(read.Buffer.End);
            return null;
        }

        var bytes = read.Buffer.ToArray();
        body.AdvanceTo(read.Buffer.End);
        return bytes;
    }

    private static bool IsJson(MediaTypeHeaderValue type) =>
        type.Type.Equals("application", StringComparison.OrdinalIgnoreCase)
        && (type.SubType.Equals("json", StringComparison.OrdinalIgnoreCase) || type.Suffix.Equals("json", StringComparison.OrdinalIgnoreCase));
}
