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

    /// <summary>Said where no address is given.</summary>
    public static FindingKind NoAddress { get; } = new("no-chart-address", Severity.Note,
        "There is no address that would give the chart.",
        "An address that is cut short by a server or a browser, or that is refused, would open no picture.",
        "Where the chart is large, post the request with Accept: image/svg+xml, image/png or application/pdf. Where its numbers cannot be drawn, check them and their units.",
        "RFC 9110 section 4.1: request lines of 8000 bytes are the most to count on");

    /// <summary>The addresses of a chart's pictures; none where the service would not answer them.</summary>
    /// <param name="job">The chart's job.</param>
    /// <param name="chart">The chart.</param>
    /// <param name="rules">What it must keep to be drawn.</param>
    /// <param name="addressBytes">The longest address.</param>
    /// <param name="whyNot">Why there are none, or null.</param>
    public static LinksContract LinksFor(string job, CompactionChart chart, ChartRules rules, int addressBytes, out Finding? whyNot)
    {
        var data = Encode(chart);
        whyNot = rules.Check(chart) is [var fault, ..] ? NoAddress.At("", $"The chart cannot be drawn, so no links are given. {fault.Message}")
            : data.Length + RoomForTheRest > addressBytes ? NoAddress.At("", "The chart holds more than an address can carry, so no links are given. Post the request with Accept: image/svg+xml, image/png or application/pdf to get the picture.")
            : null;
        var given = whyNot is null;
        string? Link(string suffix) => given ? $"/v1/charts/{job}.{suffix}?d={data}" : null;
        return new LinksContract { Svg = Link("svg"), Png = Link("png"), Pdf = Link("pdf") };
    }

    /// <summary>The chart as the text of an address.</summary>
    public static string Encode(CompactionChart chart) => PackedText.Pack(JsonSerializer.SerializeToUtf8Bytes(chart, Json));

    /// <summary>The chart in an address's text.</summary>
    /// <param name="data">The query's <c>d</c>.</param>
    /// <param name="rules">What it must keep to be drawn.</param>
    /// <param name="unpackedBytes">Bytes that it may unpack to.</param>
    /// <param name="chart">The chart, or null where there is a fault.</param>
    /// <returns>Every fault; empty where the chart can be drawn.</returns>
    public static IReadOnlyList<Fault> Decode(string data, ChartRules rules, int unpackedBytes, out CompactionChart? chart)
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
            chart = JsonSerializer.Deserialize(json.Span, Json);
        }
        catch (JsonException)
        {
            return [Damaged("d holds no chart")];
        }

        return chart is null ? [Damaged("d holds no chart")] : rules.Check(chart);
    }

    private static Fault Damaged(string how) =>
        new("/d", "not-readable", $"The address is damaged or cut short: {how}. Take the link as an answer gave it.");
}
