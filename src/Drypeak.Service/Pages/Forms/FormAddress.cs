using System.Text;
using Drypeak.Service.Hosting;
using Microsoft.AspNetCore.Http.Extensions;
using Microsoft.AspNetCore.WebUtilities;
using Microsoft.Extensions.Primitives;

namespace Drypeak.Service.Pages.Forms;

/// <summary>
/// The address that is the document: a form as it was typed (application/x-www-form-urlencoded), packed, in the query. Opened, it gives
/// the same form and the same answer.
/// </summary>
internal static class FormAddress
{
    /// <summary>Name of the query's parameter.</summary>
    public const string Parameter = "test";

    /// <summary>Room in the address for the longest path.</summary>
    private const int RoomForThePath = 60;

    /// <summary>The query that brings a form back, without its question mark; null where it would be longer than an address may be.</summary>
    public static string? QueryOf(IEnumerable<KeyValuePair<string, string>> texts, int addressBytes)
    {
        var query = $"{Parameter}={PackedText.Pack(Encoding.UTF8.GetBytes(new QueryBuilder(texts).ToString()))}";
        return query.Length + RoomForThePath <= addressBytes ? query : null;
    }

    /// <summary>The texts in an address; null where it is damaged, or unpacks to more than a form may have.</summary>
    public static IReadOnlyDictionary<string, StringValues>? Read(string data, int unpackedBytes) =>
        PackedText.Unpack(data, unpackedBytes, out var text) == PackedText.Outcome.Unpacked
            ? QueryHelpers.ParseQuery(Encoding.UTF8.GetString(text.Span))
            : null;
}
