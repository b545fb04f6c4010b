using System.Text;
using Drypeak.Service.Hosting;
using Microsoft.AspNetCore.Http.Extensions;
using Microsoft.AspNetCore.WebUtilities;

namespace Drypeak.Service.Pages.Laboratory;

/// <summary>
/// The address that is the document: the form as it was typed (application/x-www-form-urlencoded), packed, as the query's <c>test</c>. Opened, it gives the same form and the same answer.
/// </summary>
internal static class FormAddress
{
    public const string Parameter = "test";

    /// <summary>Room in the address for the longest path.</summary>
    private const int RoomForThePath = 60;

    /// <summary>The query that brings a form back, without its question mark; null where it would be longer than an address may be.</summary>
    public static string? QueryOf(TestForm form, int addressBytes)
    {
        var query = $"{Parameter}={PackedText.Pack(Encoding.UTF8.GetBytes(new QueryBuilder(form.Texts).ToString()))}";
        return query.Length + RoomForThePath <= addressBytes ? query : null;
    }

    /// <summary>The form in an address; null where it is damaged, or unpacks to more than a form may have.</summary>
    public static TestForm? Read(string data, int unpackedBytes) =>
        PackedText.Unpack(data, unpackedBytes, out var text) == PackedText.Outcome.Unpacked
            ? TestForm.From(QueryHelpers.ParseQuery(Encoding.UTF8.GetString(text.Span)))
            : null;
}
