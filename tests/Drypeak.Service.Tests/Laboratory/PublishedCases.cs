using System.Text.Json;
using Drypeak.Service.Tests.Documents;

namespace Drypeak.Service.Tests.Laboratory;

/// <summary>Entries of <c>tests/Published/laboratory.json</c>; each has its source beside it there.</summary>
internal static class PublishedCases
{
    private static readonly JsonElement Laboratory = JsonElement.Parse(File.ReadAllText(Repository.File("tests/Published/laboratory.json")));

    public static JsonElement Of(string list, string id) => Laboratory.GetProperty(list).EnumerateArray().Single(entry => entry.Text("/id") == id);

    /// <summary>Whether a value, rounded as the published one is printed, is that one: it may be half a unit of the last place off.</summary>
    public static bool Prints(this double value, double published, int decimals) => Math.Abs(value - published) <= (0.5 * Math.Pow(10, -decimals)) + 1e-9;
}
