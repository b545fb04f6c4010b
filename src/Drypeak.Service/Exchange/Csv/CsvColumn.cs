using System.Text.RegularExpressions;
using Drypeak.Service.Pages.Tables;

namespace Drypeak.Service.Exchange.Csv;

/// <summary>A column that a file may have.</summary>
/// <param name="Name">The contract's name of it.</param>
/// <param name="Measure">What its cells are, which decides their units.</param>
/// <param name="Meaning">What it holds, for the metadata.</param>
internal sealed record CsvColumn(string Name, Measure Measure, string Meaning)
{
    /// <summary>Whether its cells are numbers: all that have a unit, and ratios.</summary>
    public bool IsNumber { get; init; } = Measure != Measure.Text;

    /// <summary>Whether it is only written, and computed anew where it is read.</summary>
    public bool IsComputed { get; init; }

    /// <summary>Its place in a specimen, for the columns that the tables of the pages have too.</summary>
    public ColumnKind? OfSpecimen { get; init; }

    /// <summary>The words by which others call it, in lower case; its own name is always understood.</summary>
    public IReadOnlyList<string> Words { get; init; } = [];
}

/// <summary>A column of a file that was read.</summary>
/// <param name="Column">Which.</param>
/// <param name="Position">From 0.</param>
/// <param name="Tin">Number of the tin, from 0; 0 for other columns.</param>
/// <param name="Unit">The code of its unit; null where the file names none, and then the default holds.</param>
internal sealed record FoundColumn(CsvColumn Column, int Position, int Tin, string? Unit);

/// <summary>Understands header cells: <c>dryDensity [Mg/m3]</c>, <c>Dry density (t/m³)</c>, <c>Tin 2 + wet soil, g</c>.</summary>
internal static partial class CsvHeader
{
    /// <summary>The column that a header cell names, with its tin and its unit as written.</summary>
    /// <param name="cell">The cell.</param>
    /// <param name="columns">The columns of the job.</param>
    /// <param name="afterTin">Whether a tin's column stands to the left.</param>
    public static (CsvColumn? Column, int? Tin, string? Unit) Read(string cell, IReadOnlyList<CsvColumn> columns, bool afterTin)
    {
        var unit = Unit().Match(cell);
        var written = unit.Success ? unit.Groups["unit"].Value.Trim() : null;
        var name = (unit.Success ? cell[..unit.Index] : cell).Trim();
        var words = Hump().Replace(name, "$1 $2").ToLowerInvariant().Replace("moisture", "water", StringComparison.Ordinal);
        words = string.Join(' ', words.Split([' ', '_', '-', '.'], StringSplitOptions.RemoveEmptyEntries));
        if (columns.FirstOrDefault(column => column.Name == name) is { } exact)
        {
            return (exact, null, written);
        }

        if (columns.FirstOrDefault(column => column.Words.Contains(words) || string.Equals(Hump().Replace(column.Name, "$1 $2"), words, StringComparison.OrdinalIgnoreCase)) is { } known)
        {
            return (known, null, written);
        }

        var inTables = ColumnNames.Read(cell, afterTin);
        return (columns.FirstOrDefault(column => column.OfSpecimen is { } kind && kind == inTables.Kind), inTables.Tin, inTables.Unit);
    }

    [GeneratedRegex(@"[\[(](?<unit>[^\])]*)[\])]\s*\z")]
    private static partial Regex Unit();

    [GeneratedRegex("([a-z])([A-Z])")]
    private static partial Regex Hump();
}
