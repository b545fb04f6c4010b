using System.Buffers;
using System.Buffers.Text;
using System.IO.Compression;
using System.Text;
using Microsoft.AspNetCore.Http.Extensions;
using Microsoft.AspNetCore.WebUtilities;

namespace Drypeak.Service.Pages.Laboratory;

/// <summary>
/// The address that is the document: the form as it was typed (application/x-www-form-urlencoded), compressed (Brotli, RFC 7932), in
/// base64url (RFC 4648), as the query's <c>test</c>. Opened, it gives the same form and the same answer.
/// </summary>
internal static class FormAddress
{
    public const string Parameter = "test";

    /// <summary>Room in the address for the longest path.</summary>
    private const int RoomForThePath = 60;

    private const int BrotliQuality = 9;
    private const int BrotliWindow = 18;

    /// <summary>The query that brings a form back, without its question mark; null where it would be longer than an address may be.</summary>
    public static string? QueryOf(TestForm form, int addressBytes)
    {
        var text = Encoding.UTF8.GetBytes(new QueryBuilder(form.Texts).ToString());
        var packed = new byte[BrotliEncoder.GetMaxCompressedLength(text.Length)];
        if (!BrotliEncoder.TryCompress(text, packed, out var length, BrotliQuality, BrotliWindow))
        {
            throw new InvalidOperationException("A buffer of the greatest compressed length was too small.");
        }

        var query = $"{Parameter}={Base64Url.EncodeToString(packed.AsSpan(0, length))}";
        return query.Length + RoomForThePath <= addressBytes ? query : null;
    }

    /// <summary>The form in an address; null where it is damaged, or unpacks to more than a form may have.</summary>
    public static TestForm? Read(string data, int unpackedBytes)
    {
        var packed = new byte[Base64Url.GetMaxDecodedLength(data.Length)];
        if (!Base64Url.IsValid(data) || !Base64Url.TryDecodeFromChars(data, packed, out var packedLength))
        {
            return null;
        }

        var text = new byte[unpackedBytes];
        using var decoder = new BrotliDecoder();
        var status = decoder.Decompress(packed.AsSpan(0, packedLength), text, out var consumed, out var length);
        return status == OperationStatus.Done && consumed == packedLength
            ? TestForm.From(QueryHelpers.ParseQuery(Encoding.UTF8.GetString(text, 0, length)))
            : null;
    }
}
