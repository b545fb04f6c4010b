
namespace Drypeak.Service.Pages.Tables;

/// <summary>Reads the row that names the columns.</summary>
internal static class Header
{
    /// <summary>Whether a row is a header: it has words and no number.</summary>
    public static bool Stands(IReadOnlyList<string> cells) =>
        cells.Any(cell => cell.Any(char.IsLetter)) && !cells.Any(NumberText.IsMeantAsNumber);

    /// <summary>The columns. Each that is not understood, or stands twice, is a fault.</summary>
    public static IReadOnlyList<Column> Read(TextRow row, Separator separator, List<Fault> faults)
    {
        var cells = separator == Separator.Spaces ? CutAtSpaces(row) : row.Cells;
        var columns = new List<Column>();
        var counts = new Dictionary<ColumnKind, int>();
        for (var i = 0; i < cells.Count; i++)
        {
            var cell = ColumnNames.Read(cells[i], afterTin: columns.Exists(column => column.Kind.OfTin));
            if (cell.Kind is not { } kind)
            {
                faults.Add(new Fault("/specimens", "unknown-column", cells[i].Length == 0
                    ? $"Column {i + 1} has no name. Name it, or remove it."
                    : $"Column {i + 1}, “{NumberText.Shortened(cells[i])}”, is not one that is used here. Rename or remove it; known are {KnownNames}."));
                continue;
            }

            var place = counts[kind] = counts.GetValueOrDefault(kind) + 1;
            var tin = kind.OfTin ? (cell.Tin ?? place) - 1 : 0;
            if (tin < 0 || columns.Exists(column => column.Kind == kind && column.Tin == tin) || (!kind.OfTin && place > 1))
            {
                faults.Add(new Fault("/specimens", "repeated-column", $"{kind.Heading} stands twice, the second time in column {i + 1}. Rename or remove one."));
                continue;
            }

            columns.Add(WithUnit(new Column(kind, tin), cell.Unit, i, faults));
        }

        return columns;
    }

    /// <summary>Whether a row holds nothing but units: the second row of many sheets.</summary>
    public static bool IsRowOfUnits(IReadOnlyList<string> cells) =>
        cells.Any(cell => Unbracketed(cell).Length > 0)
        && cells.All(cell => Unbracketed(cell) is "" or "-" or "–" || Enum.GetValues<Measure>().Any(measure => ColumnUnits.Code(measure, Unbracketed(cell)) is not null));

    /// <summary>The columns with the units that stand in a row below their names.</summary>
    public static IReadOnlyList<Column> WithUnits(IReadOnlyList<Column> columns, IReadOnlyList<string> units, List<Fault> faults) =>
    [
        .. columns.Select((column, i) => i < units.Count && Unbracketed(units[i]) is { Length: > 0 } and not ("-" or "–")
            ? WithUnit(column, Unbracketed(units[i]), i, faults)
            : column),
    ];

    /// <summary>A column with the unit that its header names; a unit that it cannot have is a fault.</summary>
    public static Column WithUnit(Column column, string? written, int position, List<Fault> faults, string place = "/specimens")
    {
        if (written is null || (column.Kind.Measure == Measure.Text && written.Length == 0))
        {
            return column;
        }

        if (ColumnUnits.Code(column.Kind.Measure, written) is { } code)
        {
            return column with { Unit = code };
        }

        var known = string.Join(", ", ColumnUnits.Known(column.Kind.Measure));
        faults.Add(new Fault(place, "unknown-unit", known.Length > 0
            ? $"The unit “{NumberText.Shortened(written)}” of column {position + 1}, {column.Heading}, is none of {known}. Correct it, or leave it out: the form's unit then holds."
            : $"Column {position + 1}, {column.Heading}, has no unit; “{NumberText.Shortened(written)}” was read. Leave it out."));
        return column;
    }

    /// <summary>Two spaces part cells where there are any; else the names themselves tell where one ends.</summary>
    private static IReadOnlyList<string> CutAtSpaces(TextRow row)
    {
        var wide = row.Text.Split("  ", StringSplitOptions.RemoveEmptyEntries | StringSplitOptions.TrimEntries);
        return wide.Length > 1 ? wide : ColumnNames.CutAtNames(row.Text) ?? row.Cells;
    }

    private static string KnownNames => string.Join(", ", ColumnKind.All.Select(kind => kind.Heading));

    private static string Unbracketed(string cell) => cell.Trim('[', ']', '(', ')', ' ');
}
