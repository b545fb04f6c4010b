using System.Collections.Frozen;
using System.Globalization;
using System.Text.RegularExpressions;

namespace Drypeak.Service.Pages.Tables;

/// <summary>A header cell taken apart.</summary>
/// <param name="Kind">The column, or null where the words name none.</param>
/// <param name="Tin">The number of the tin that the words give, from 1; null where they give none.</param>
/// <param name="Unit">The unit as written, in brackets or after a comma or slash; null where there is none.</param>
internal readonly record struct HeaderCell(ColumnKind? Kind, int? Tin, string? Unit);

/// <summary>The names of the columns, in the trade's words and as the contract's members. Case, spaces and punctuation do not matter.</summary>
internal static partial class ColumnNames
{
    /// <summary>Words that tell nothing apart here: every mass is of soil, every weight is a mass.</summary>
    private static readonly FrozenSet<string> Fillers = FrozenSet.Create(StringComparer.Ordinal,
        "and", "plus", "of", "the", "with", "on", "in", "soil", "mass", "weight", "wt");

    private static readonly FrozenDictionary<string, string> Synonyms = new Dictionary<string, string>(StringComparer.Ordinal)
    {
        ["mould"] = "mold",
        ["can"] = "tin",
        ["container"] = "tin",
        ["tins"] = "tin",
        ["moist"] = "wet",
        ["bulk"] = "wet",
        ["moisture"] = "water",
    }.ToFrozenDictionary(StringComparer.Ordinal);

    private static readonly FrozenDictionary<string, ColumnKind> Kinds = new Dictionary<string, ColumnKind>(StringComparer.Ordinal)
    {
        ["specimen"] = ColumnKind.Specimen,
        ["specimen no"] = ColumnKind.Specimen,
        ["specimen number"] = ColumnKind.Specimen,
        ["specimen label"] = ColumnKind.Specimen,
        ["label"] = ColumnKind.Specimen,
        ["no"] = ColumnKind.Specimen,
        ["number"] = ColumnKind.Specimen,
        ["point"] = ColumnKind.Specimen,
        ["mold wet"] = ColumnKind.MoldAndWetSoil,
        ["wet mold"] = ColumnKind.MoldAndWetSoil,
        ["mold"] = ColumnKind.MoldMass,
        ["empty mold"] = ColumnKind.MoldMass,
        ["mold empty"] = ColumnKind.MoldMass,
        ["mold volume"] = ColumnKind.MoldVolume,
        ["volume mold"] = ColumnKind.MoldVolume,
        ["depth below rim"] = ColumnKind.DepthBelowRim,
        ["below rim"] = ColumnKind.DepthBelowRim,
        ["wet"] = ColumnKind.WetMass,
        ["wet density"] = ColumnKind.WetDensity,
        ["wet unit"] = ColumnKind.WetDensity,
        ["dry density"] = ColumnKind.DryDensity,
        ["dry unit"] = ColumnKind.DryDensity,
        ["water content"] = ColumnKind.WaterContent,
        ["water"] = ColumnKind.WaterContent,
        ["w"] = ColumnKind.WaterContent,
        ["water content wet"] = ColumnKind.WetBasis,
        ["wet basis"] = ColumnKind.WetBasis,
        ["tin"] = ColumnKind.Tin,
        ["empty tin"] = ColumnKind.Tin,
        ["tin empty"] = ColumnKind.Tin,
        ["tin wet"] = ColumnKind.TinAndWet,
        ["wet tin"] = ColumnKind.TinAndWet,
        ["tin dry"] = ColumnKind.TinAndDry,
        ["dry tin"] = ColumnKind.TinAndDry,
        ["set aside"] = ColumnKind.SetAside,
    }.ToFrozenDictionary(StringComparer.Ordinal);

    /// <summary>Takes a header cell apart.</summary>
    /// <param name="text">As pasted.</param>
    /// <param name="afterTin">Whether a column of a tin stands to the left: a bare <c>wet</c> or <c>dry</c> is then the tin's.</param>
    public static HeaderCell Read(string text, bool afterTin)
    {
        var unit = UnitPart().Match(text);
        var words = Words(UnitPart().Replace(text, " "));
        var tin = words.Find(word => char.IsAsciiDigit(word[0])) is { } number && int.TryParse(number, NumberStyles.None, CultureInfo.InvariantCulture, out var counted)
            ? counted
            : (int?)null;
        words.RemoveAll(word => char.IsAsciiDigit(word[0]));
        var kind = (string.Join(' ', words), afterTin) switch
        {
            ("wet", true) => ColumnKind.TinAndWet,
            ("dry", true) => ColumnKind.TinAndDry,
            ("wet" or "dry", false) => null,
            _ => Kinds.GetValueOrDefault(Name(words)),
        };
        return new HeaderCell(kind, tin, unit.Success ? unit.Groups["unit"].Value.Trim() : null);
    }

    /// <summary>
    /// Cuts a header whose cells are parted by single spaces: at each place the longest run of words that is a name. Null where words are
    /// left over.
    /// </summary>
    public static IReadOnlyList<string>? CutAtNames(string line) =>
        CutAt(line, words => !words.EndsWith('+') && !words.StartsWith('+') && Read(words, afterTin: true).Kind is not null);

    /// <summary>The same for names of any kind.</summary>
    public static IReadOnlyList<string>? CutAt(string line, Func<string, bool> isName)
    {
        var words = line.Split(' ', StringSplitOptions.RemoveEmptyEntries);
        var cells = new List<string>();
        for (var start = 0; start < words.Length;)
        {
            var end = words.Length;
            while (end > start && !isName(string.Join(' ', words[start..end])))
            {
                end--;
            }

            if (end == start)
            {
                return null;
            }

            cells.Add(string.Join(' ', words[start..end]));
            start = end;
        }

        return cells;
    }

    /// <summary>Which of some columns a header cell names, by its heading or by the contract's member, and the unit as written.</summary>
    public static (ColumnKind? Kind, string? Unit) Find(string text, IReadOnlyList<ColumnKind> columns)
    {
        var unit = UnitPart().Match(text);
        var name = Name(Words(UnitPart().Replace(text, " ")));
        return (columns.FirstOrDefault(kind => name == Name(Words(kind.Heading)) || name == Name(Words(kind.Member))), unit.Success ? unit.Groups["unit"].Value.Trim() : null);
    }

    private static string Name(IEnumerable<string> words) => string.Join(' ', words.Where(word => !Fillers.Contains(word)));

    private static List<string> Words(string text) =>
    [
        .. Word().Matches(HumpInCamelCase().Replace(text, "$1 $2"))
            .Select(word => word.Value.ToLowerInvariant())
            .Select(word => Synonyms.GetValueOrDefault(word, word)),
    ];

    /// <summary>A unit in brackets, or a known one after a comma or a slash at the end.</summary>
    [GeneratedRegex(@"[\[(](?<unit>[^\])]*)[\])]|[,/]\s*(?<unit>%|k?g|lbs?|mm|cm|cm[3³]|(?:k?g|Mg|t|lb|kN)/(?:c?m|ft)[3³])\s*$")]
    private static partial Regex UnitPart();

    [GeneratedRegex("([a-z])([A-Z])")]
    private static partial Regex HumpInCamelCase();

    [GeneratedRegex(@"\p{L}+|[0-9]+")]
    private static partial Regex Word();
}
