using System.Collections.Frozen;
using System.Text.Json;
using System.Text.Json.Serialization;

namespace Drypeak.Service.Exchange.Ags;

/// <summary>A heading as the published dictionary has it.</summary>
/// <param name="Name">Its name.</param>
/// <param name="IsKey">Whether it is a part of the row's key.</param>
/// <param name="IsRequired">Whether it must not be empty.</param>
/// <param name="Type">Its data type.</param>
/// <param name="Unit">Its unit, or an empty text.</param>
/// <param name="Since">The first edition that has it.</param>
internal sealed record AgsHeading(string Name, bool IsKey, bool IsRequired, string Type, string Unit, string Since)
{
    /// <summary>Reads <c>CMPG_MAXD O 2DP Mg/m3</c>, with the edition at the end where it is not the first.</summary>
    public static AgsHeading Parse(string text) => text.Split(' ') is [var name, var status, var type, var unit, .. var since]
        ? new AgsHeading(name, status.Contains('K'), status.Contains('R'), type, unit == "-" ? "" : unit, since is [var edition] ? edition : "4.0.4")
        : throw new FormatException($"The dictionary has the heading \"{text}\".");
}

/// <summary>A group as the published dictionary has it.</summary>
internal sealed record AgsGroupDefinition(string Name, string? Parent, IReadOnlyList<AgsHeading> Headings)
{
    public IEnumerable<string> Keys => Headings.Where(heading => heading.IsKey).Select(heading => heading.Name);

    public AgsHeading? Find(string heading) => Headings.FirstOrDefault(each => each.Name == heading);
}

/// <summary>The groups and headings that are known here: one data file, after the dictionary that is published with the standard.</summary>
internal static class AgsDictionary
{
    private static readonly AgsDictionaryFile Data = Load();

    private static readonly FrozenDictionary<string, AgsGroupDefinition> Groups = Data.Groups
        .Select(group => new AgsGroupDefinition(group.Group, group.Parent, [.. group.Headings.Select(AgsHeading.Parse)]))
        .ToFrozenDictionary(group => group.Name, StringComparer.Ordinal);

    public static IReadOnlyList<string> Editions => Data.Editions;

    public static IEnumerable<AgsGroupDefinition> All => Groups.Values;

    public static AgsGroupDefinition? Find(string group) => Groups.GetValueOrDefault(group);

    /// <summary>Whether a data type is one of the standard's; those with a count (2DP, 3SF, 1SCI) are known by their form.</summary>
    public static bool IsType(string type) => Data.Types.Contains(type) || AgsValue.HasCount(type);

    /// <summary>Whether the dictionary itself lists a code for a heading.</summary>
    public static bool IsCode(string heading, string code) => Data.Codes.GetValueOrDefault(heading)?.Contains(code, StringComparer.OrdinalIgnoreCase) is true;

    private static AgsDictionaryFile Load()
    {
        using var stream = typeof(AgsDictionary).Assembly.GetManifestResourceStream("Drypeak.Service.Exchange.Ags.ags4-headings.json")
            ?? throw new InvalidOperationException("The dictionary is not in the program.");
        return JsonSerializer.Deserialize(stream, AgsDictionaryJson.Default.AgsDictionaryFile)!;
    }
}

internal sealed record AgsDictionaryFile(
    string Source, IReadOnlyList<string> Editions, IReadOnlyList<string> Types, IReadOnlyDictionary<string, IReadOnlyList<string>> Codes, IReadOnlyList<AgsDictionaryGroup> Groups);

internal sealed record AgsDictionaryGroup(string Group, string? Parent, IReadOnlyList<string> Headings);

[JsonSourceGenerationOptions(PropertyNamingPolicy = JsonKnownNamingPolicy.CamelCase)]
[JsonSerializable(typeof(AgsDictionaryFile))]
internal sealed partial class AgsDictionaryJson : JsonSerializerContext;
