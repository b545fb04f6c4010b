using System.Globalization;
using System.Text.Json;

namespace Drypeak.Service.Tests.Laboratory;

/// <summary>Reads places of an answer by JSON pointer.</summary>
internal static class Answers
{
    public static JsonElement At(this JsonElement answer, string place) =>
        place.Split('/')[1..].Aggregate(answer, (value, step) => value.ValueKind == JsonValueKind.Array
            ? value[int.Parse(step, CultureInfo.InvariantCulture)]
            : value.GetProperty(step));

    public static double Number(this JsonElement answer, string place) => answer.At(place).GetDouble();

    public static string? Text(this JsonElement answer, string place) => answer.At(place).GetString();

    public static bool IsNull(this JsonElement answer, string place) => answer.At(place).ValueKind == JsonValueKind.Null;

    public static bool Has(this JsonElement answer, string member) => answer.TryGetProperty(member, out _);

    public static double[] Numbers(this JsonElement answer, string list, string member) =>
        [.. answer.At(list).EnumerateArray().Select(item => item.GetProperty(member).GetDouble())];

    /// <summary>The codes of the findings, in their order.</summary>
    public static string[] Findings(this JsonElement answer) => [.. answer.At("/findings").EnumerateArray().Select(finding => finding.Text("/code")!)];

    /// <summary>The one finding with this code.</summary>
    public static JsonElement Finding(this JsonElement answer, string code) => answer.At("/findings").EnumerateArray().Single(finding => finding.Text("/code") == code);
}
