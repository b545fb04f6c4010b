using System.Buffers.Text;
using System.IO.Compression;
using System.Text;
using System.Text.Json.Nodes;
using Drypeak.Service.Tests.Laboratory;

namespace Drypeak.Service.Tests.Charts;

/// <summary>Chart addresses as a caller sees them: JSON in Brotli in base64url.</summary>
internal static class ChartLink
{
    public const string Svg = "/v1/charts/moisture-density.svg";
    public const string Png = "/v1/charts/moisture-density.png";
    public const string Pdf = "/v1/charts/moisture-density.pdf";

    public static string Data(string link) => link[(link.IndexOf("?d=", StringComparison.Ordinal) + 3)..];

    public static string Pack(string json)
    {
        using var packed = new MemoryStream();
        using (var brotli = new BrotliStream(packed, CompressionLevel.Optimal))
        {
            brotli.Write(Encoding.UTF8.GetBytes(json));
        }

        return Base64Url.EncodeToString(packed.ToArray());
    }

    public static JsonObject Unpack(string data)
    {
        using var brotli = new BrotliStream(new MemoryStream(Base64Url.DecodeFromChars(data)), CompressionMode.Decompress);
        return JsonNode.Parse(brotli)!.AsObject();
    }

    /// <summary>The address of the sound test's chart as SVG.</summary>
    public static async Task<string> OfSoundTest(RunningService service, string format = "svg") =>
        (await service.AnswerAsync(Body.Sound)).Text($"/links/{format}")!;
}
