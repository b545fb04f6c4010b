using System.Text.Json;
using System.Text.Json.Serialization.Metadata;
using Drypeak.Service.Hosting;
using Drypeak.Soil.Laboratory.Review;

namespace Drypeak.Service.Charts;

/// <summary>
/// A chart's address holds the whole chart: JSON, compressed (Brotli, RFC 7932), in base64url (RFC 4648), as the query's <c>d</c>.
/// It carries what the figure shows, so that a GET draws and does not fit.
/// </summary>
internal static class ChartAddress
{
    /// <summary>The query's parameter that holds the chart.</summary>
    public const string Data = "d";

    /// <summary>Room in the address for its path and the picture's size.</summary>
    public const int RoomForTheRest = 120;

    /// <summary>Said where no address is given.</summary>
    public static FindingKind NoAddress { get; } = new("no-chart-address", Severity.Note,
        "There is no address that would give the chart.",
        "An address that is cut short by a server or a browser, or that is refused, would open no picture.",
        "Where the chart is large, post the request with Accept: image/svg+xml, image/png or application/pdf. Where its numbers cannot be drawn, check them and their units.",
        "RFC 9110 section 4.1: request lines of 8000 bytes are the most to count on");

    /// <summary>The chart as the text of an address.</summary>
    public static string Encode<TChart>(TChart chart, JsonTypeInfo<TChart> json) => PackedText.Pack(JsonSerializer.SerializeToUtf8Bytes(chart, json));

    /// <summary>The chart in an address's text.</summary>
    /// <param name="data">The query's <see cref="Data"/>.</param>
    /// <param name="kind">What it must be, and keep to be drawn.</param>
    /// <param name="unpackedBytes">Bytes that it may unpack to.</param>
    /// <param name="chart">The chart, or null where there is a fault.</param>
    /// <returns>Every fault; empty where the chart can be drawn.</returns>
    public static IReadOnlyList<Fault> Decode<TChart>(string data, ChartKind<TChart> kind, int unpackedBytes, out TChart? chart)
        where TChart : class
    {
        chart = null;
        switch (PackedText.Unpack(data, unpackedBytes, out var json))
        {
            case PackedText.Outcome.TooLarge:
                return [new Fault("/d", "inflates-beyond-bound", $"The address inflates beyond {unpackedBytes} bytes. Post the request itself with Accept: image/svg+xml instead.")];
            case PackedText.Outcome.Damaged:
                return [Damaged("d does not unpack")];
        }

        try
        {
            chart = JsonSerializer.Deserialize(json.Span, kind.Json);
        }
        catch (JsonException)
        {
            return [Damaged("d holds no chart")];
        }

        return chart is null ? [Damaged("d holds no chart")] : kind.CheckAddress(chart);
    }

    private static Fault Damaged(string how) =>
        new("/d", "not-readable", $"The address is damaged or cut short: {how}. Take the link as an answer gave it.");
}
