using Drypeak.Soil.Quantities;

namespace Drypeak.Service.Pages.Tables;

/// <summary>How a pasted table was understood.</summary>
/// <param name="Separator">What parts its cells.</param>
/// <param name="DecimalMark">The mark before decimals; null where no number has any.</param>
/// <param name="HasHeader">Whether it names its columns; else the order is the one documented for their number.</param>
/// <param name="SpecimensAcross">Whether it has a column, not a row, for each specimen.</param>
public sealed record TableShape(Separator Separator, DecimalMark? DecimalMark, bool HasHeader, bool SpecimensAcross);

/// <summary>A pasted table, read.</summary>
/// <param name="Shape">How it was understood.</param>
/// <param name="Sheet">Its specimens; null where its columns could not be understood.</param>
/// <param name="Faults">All that could not be read, each at a place in the request: the whole table's are at <c>/specimens</c>.</param>
public sealed record TableReading(TableShape Shape, SpecimenSheet? Sheet, IReadOnlyList<Fault> Faults);

/// <summary>Reads a pasted table of specimens. Nothing is repaired: what has two readings is refused, and says what to write.</summary>
public static class TableReader
{
    /// <summary>Rows that are read; a test may have fewer, which its rules say.</summary>
    private const int MostRows = 2000;

    private const int MostColumns = 100;

    /// <summary>Reads the table.</summary>
    /// <param name="text">As pasted.</param>
    /// <param name="units">The form's units.</param>
    /// <param name="chosenMark">The decimal mark where the user has chosen one, else null.</param>
    public static TableReading Read(string text, UnitSet units, DecimalMark? chosenMark = null)
    {
        var separator = TableText.FindSeparator(text);
        var rows = TableText.Split(text, separator, out var unclosed);
        var shape = new TableShape(separator, chosenMark, false, false);
        if (unclosed is { } line)
        {
            return Refused(shape, "unclosed-quotation", $"A quotation mark is opened in line {line} and not closed. Close it, or remove it.");
        }

        if (rows.Count is 0 or > MostRows || rows.Max(row => row.Cells.Count) > MostColumns)
        {
            return rows.Count == 0
                ? Refused(shape, "empty-table", "The table has no rows. Paste a row for each specimen.")
                : Refused(shape, "too-large", $"The table may have up to {MostRows} rows and {MostColumns} columns.");
        }

        var across = HasSpecimensAcross(rows);
        if (across)
        {
            rows = Turned(rows);
        }

        var faults = new List<Fault>();
        var hasHeader = Header.Stands(rows[0].Cells);
        var columns = hasHeader ? Header.Read(rows[0], separator, faults) : DefaultColumns(rows, faults);
        List<IReadOnlyList<string>> cells = [.. rows.Skip(hasHeader ? 1 : 0).Select(row => row.Cells)];
        if (hasHeader && cells.Count > 0 && Header.IsRowOfUnits(cells[0]))
        {
            columns = Header.WithUnits(columns, cells[0], faults);
            cells.RemoveAt(0);
        }

        if (columns.Count > 0 && columns[^1].Kind == ColumnKind.SetAside && separator == Separator.Spaces)
        {
            cells = cells.ConvertAll(row => WithLastCellsJoined(row, columns.Count));
        }

        var mark = chosenMark ?? FindMark(columns, cells);
        shape = new TableShape(separator, mark, hasHeader, across);
        if (faults.Count > 0)
        {
            return new TableReading(shape, null, faults);
        }

        if (cells.Count == 0)
        {
            return Refused(shape, "empty-table", "The table has a header and no specimens below it. Paste a row for each specimen.");
        }

        var sheet = SpecimenSheet.Read(columns, cells, units, mark);
        for (var row = 0; row < cells.Count; row++)
        {
            if (cells[row].Skip(columns.Count).Any(cell => cell.Length > 0))
            {
                faults.Add(new Fault($"/specimens/{row}", "too-many-cells",
                    $"It has {cells[row].Count} cells, but the table has {columns.Count} columns. Look for a mark that parts a cell in two."));
            }
        }

        return new TableReading(shape, sheet, [.. sheet.Faults, .. faults]);
    }

    /// <summary>Whether every row, not every column, begins with a name.</summary>
    private static bool HasSpecimensAcross(IReadOnlyList<TextRow> rows)
    {
        return rows.Count > 1 && rows.All(row => IsName(row.Cells[0])) && rows[0].Cells.Count > 1 && !IsName(rows[0].Cells[1]);

        static bool IsName(string cell) => ColumnNames.Read(cell, afterTin: true).Kind is not null;
    }

    /// <summary>The columns meant where the table names none: by how many there are.</summary>
    private static IReadOnlyList<Column> DefaultColumns(IReadOnlyList<TextRow> rows, List<Fault> faults)
    {
        var count = rows.Max(row => row.Cells.Count);
        if (DefaultOrder.Of(count) is { } columns)
        {
            return columns;
        }

        faults.Add(new Fault("/specimens", "unknown-columns",
            $"The table has no header and {(count == 1 ? "one column" : $"{count} columns")}: which is which cannot be told. Add a header such as {string.Join(", ", DefaultOrder.Of(5)!.Select(column => column.Heading))}."));
        return [];
    }

    /// <summary>
    /// The mark that most of the numbers show. A number that shows the other one is then refused in its own cell. Null where none shows
    /// any: then a comma that may group thousands is refused.
    /// </summary>
    private static DecimalMark? FindMark(IReadOnlyList<Column> columns, List<IReadOnlyList<string>> rows)
    {
        var (points, commas) = (0, 0);
        foreach (var cell in rows.SelectMany(row => row.Take(columns.Count).Where((_, i) => columns[i].Kind.Measure != Measure.Text)))
        {
            points += NumberText.HasDecimals(cell, DecimalMark.Point) ? 1 : 0;
            commas += NumberText.HasDecimals(cell, DecimalMark.Comma) ? 1 : 0;
        }

        return (points, commas) is (0, 0) ? null : points >= commas ? DecimalMark.Point : DecimalMark.Comma;
    }

    /// <summary>A reason of several words, cut apart at its spaces.</summary>
    private static IReadOnlyList<string> WithLastCellsJoined(IReadOnlyList<string> row, int columns) =>
        row.Count <= columns ? row : [.. row.Take(columns - 1), string.Join(' ', row.Skip(columns - 1))];

    private static List<TextRow> Turned(IReadOnlyList<TextRow> rows) =>
    [
        .. Enumerable.Range(0, rows.Max(row => row.Cells.Count))
            .Select(column => rows.Select(row => column < row.Cells.Count ? row.Cells[column] : "").ToList())
            .Where(cells => cells.Exists(cell => cell.Length > 0))
            .Select((cells, i) => new TextRow(i + 1, string.Join('\t', cells), cells)),
    ];

    private static TableReading Refused(TableShape shape, string code, string message) =>
        new(shape, null, [new Fault("/specimens", code, message)]);
}
