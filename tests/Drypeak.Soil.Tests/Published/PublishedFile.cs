using System.Text.Json;

namespace Drypeak.Soil.Tests.Published;

/// <summary>The check values in <c>tests/Published</c>. They stand there as they were published, each with its source; nothing is corrected.</summary>
internal static class PublishedFile
{
    private static readonly JsonElement Laboratory = Read("laboratory.json");

    /// <summary>A file as a whole.</summary>
    public static JsonElement Read(string name)
    {
        using var document = JsonDocument.Parse(File.ReadAllText(Repository.At("tests", "Published", name)));
        return document.RootElement.Clone();
    }

    /// <summary>The data of a compaction test.</summary>
    public static JsonElement Case(string id) => Entry("cases", id).GetProperty("data");

    /// <summary>An entry of one of the laboratory file's lists.</summary>
    public static JsonElement Entry(string list, string id) =>
        Laboratory.GetProperty(list).EnumerateArray().Single(entry => entry.GetProperty("id").GetString() == id);

    /// <summary>A number of the element.</summary>
    public static double Number(this JsonElement element, string member) => element.GetProperty(member).GetDouble();

    /// <summary>A list of numbers of the element.</summary>
    public static double[] Numbers(this JsonElement element, string member) =>
        [.. element.GetProperty(member).EnumerateArray().Select(number => number.GetDouble())];

    /// <summary>A list of three numbers each: tin, tin + wet, tin + dry.</summary>
    public static double[][] Triples(this JsonElement list) =>
        [.. list.EnumerateArray().Select(triple => triple.EnumerateArray().Select(number => number.GetDouble()).ToArray())];

    /// <summary>The published answers of the element.</summary>
    public static JsonElement Answers(this JsonElement element) => element.GetProperty("published");
}
