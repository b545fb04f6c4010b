using System.Buffers;
using System.Buffers.Text;
using System.IO.Compression;
using System.Text.Json;
using System.Text.Json.Serialization.Metadata;
using Drypeak.Figures;
using Drypeak.Service.Contracts;
using Drypeak.Service.Hosting;
using Drypeak.Soil.Laboratory.Review;

namespace Drypeak.Service.Charts;

/// <summary>
/// A chart's address holds the whole chart: JSON, compressed (Brotli, RFC 7932), in base64url (RFC 4648), as the query's <c>d</c>.
/// It carries what the figure shows, so that a GET draws and does not fit.
/// </summary>
internal static class ChartAddress
{
    public const string MoistureDensity = "moisture-density";

    /// <summary>Room in the address for its path and the picture's size.</summary>
    private const int RoomForTheRest = 120;

    private static readonly JsonTypeInfo<CompactionChart> Json = ServiceJson.Of<CompactionChart>();

    private const int BrotliQuality = 5;
    private const int BrotliWindow = 18;

    /// <summary>Said where no address is given.</summary>
    public static FindingKind NoAddress { get; } = new("no-chart-address", Severity.Note,
        "There is no address that would give the chart.",
        "An address that is cut short by a server or a browser, or that is refused, would open no picture.",
        "Where the chart is large, post the request with Accept: image/svg+xml, image/png or application/pdf. Where its numbers cannot be drawn, check them and their units.",
        "RFC 9110 section 4.1: request lines of 8000 bytes are the most to count on");

    /// <summary>The addresses of a chart's pictures; none where the service would not answer them.</summary>
    /// <param name="job">The chart's job.</param>
    /// <param name="chart">The chart.</param>
    /// <param name="limits">Bounds of an address and of what it may hold.</param>
    /// <param name="whyNot">Why there are none, or null.</param>
    public static LinksContract LinksFor(string job, CompactionChart chart, Limits limits, out Finding? whyNot)
    {
        var data = Encode(chart);
        whyNot = new ChartRules(limits).Check(chart) is [var fault, ..] ? NoAddress.At("", $"The chart cannot be drawn, so no links are given. {fault.Message}")
            : data.Length + RoomForTheRest > limits.AddressBytes ? NoAddress.At("", "The chart holds more than an address can carry, so no links are given. Post the request with Accept: image/svg+xml, image/png or application/pdf to get the picture.")
            : null;
        var given = whyNot is null;
        string? Link(string suffix) => given ? $"/v1/charts/{job}.{suffix}?d={data}" : null;
        return new LinksContract { Svg = Link("svg"), Png = Link("png"), Pdf = Link("pdf") };
    }

    /// <summary>The chart as the text of an address.</summary>
    public static string Encode(CompactionChart chart)
    {
        var json = JsonSerializer.SerializeToUtf8Bytes(chart, Json);
        var packed = new byte[BrotliEncoder.GetMaxCompressedLength(json.Length)];
        return BrotliEncoder.TryCompress(json, packed, out var length, BrotliQuality, BrotliWindow)
            ? Base64Url.EncodeToString(packed.AsSpan(0, length))
            : throw new InvalidOperationException("A buffer of the greatest compressed length was too small.");
    }

    /// <summary>The chart in an address's text.</summary>
    /// <param name="data">The query's <c>d</c>.</param>
    /// <param name="limits">Bounds of what it may hold.</param>
    /// <param name="chart">The chart, or null where there is a fault.</param>
    /// <returns>Every fault; empty where the chart can be drawn.</returns>
    public static IReadOnlyList<Fault> Decode(string data, Limits limits, out CompactionChart? chart)
    {
        chart = null;
        var packed = new byte[Base64Url.GetMaxDecodedLength(data.Length)];
        if (!Base64Url.IsValid(data) || !Base64Url.TryDecodeFromChars(data, packed, out var packedLength))
        {
            return [Damaged("d is not base64url")];
        }

        var inflated = new byte[limits.UnpackedAddressBytes];
        using var decoder = new BrotliDecoder();
        var status = decoder.Decompress(packed.AsSpan(0, packedLength), inflated, out var consumed, out var length);
        if (status == OperationStatus.DestinationTooSmall)
        {
            return [new Fault("/d", "inflates-beyond-bound", $"The address inflates beyond {limits.UnpackedAddressBytes} bytes. Post the request itself with Accept: image/svg+xml instead.")];
        }

        if (status != OperationStatus.Done || consumed != packedLength)
        {
            return [Damaged("d does not unpack")];
        }

        try
        {
            chart = JsonSerializer.Deserialize(inflated.AsSpan(0, length), Json);
        }
        catch (JsonException)
        {
            return [Damaged("d holds no chart")];
        }

        return chart is null ? [Damaged("d holds no chart")] : new ChartRules(limits).Check(chart);
    }

    private static Fault Damaged(string how) =>
        new("/d", "not-readable", $"The address is damaged or cut short: {how}. Take the link as an answer gave it.");
}
