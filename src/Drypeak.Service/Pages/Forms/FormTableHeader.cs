using Drypeak.Service.Pages.Tables;

namespace Drypeak.Service.Pages.Forms;

/// <summary>Tells which column of a pasted table is which: by the names in its first row, or by the order that the form gives.</summary>
/// <param name="table">The field, with the columns that it may have.</param>
/// <param name="faults">Where what is not understood is added.</param>
internal sealed class FormTableHeader(TableField table, List<Fault> faults)
{
    /// <summary>Whether a row is a header: it has words and no number.</summary>
    public static bool Stands(TextRow row) => Header.Stands(row.Cells);

    /// <summary>The columns that the header names.</summary>
    public IReadOnlyList<Column> Read(TextRow row, Separator separator)
    {
        var columns = new List<Column>();
        foreach (var (i, cell) in CellsOf(row, separator).Index())
        {
            var (kind, unit) = ColumnNames.Find(cell, table.Columns);
            if (kind is null)
            {
                Refuse("unknown-column", $"Column {i + 1}, “{NumberText.Shortened(cell)}”, is not one that is used here. Rename or remove it; known are {Known}.");
            }
            else if (columns.Exists(column => column.Kind == kind))
            {
                Refuse("repeated-column", $"{kind.Heading} stands twice, the second time in column {i + 1}. Rename or remove one.");
            }
            else
            {
                columns.Add(Header.WithUnit(new Column(kind), unit, i, faults, table.Place));
            }
        }

        return columns;
    }

    /// <summary>Without a header: the form's columns, as many as the table has.</summary>
    public IReadOnlyList<Column> ByOrder(int count)
    {
        if (count <= table.Columns.Count)
        {
            return [.. table.Columns.Take(count).Select(kind => new Column(kind))];
        }

        Refuse("unknown-columns", $"The table has no header and {count} columns; without one it has up to {table.Columns.Count}: {Known}. Remove what is too much, or name the columns.");
        return [];
    }

    private string Known => string.Join(", ", table.Columns.Select(kind => kind.Heading));

    /// <summary>Two spaces part the names where there are any; else the longest runs of words that are names.</summary>
    private IReadOnlyList<string> CellsOf(TextRow row, Separator separator)
    {
        if (separator != Separator.Spaces)
        {
            return row.Cells;
        }

        var wide = row.Text.Split("  ", StringSplitOptions.RemoveEmptyEntries | StringSplitOptions.TrimEntries);
        return wide.Length > 1 ? wide : ColumnNames.CutAt(row.Text, words => ColumnNames.Find(words, table.Columns).Kind is not null) ?? row.Cells;
    }

    private void Refuse(string code, string message) => faults.Add(new Fault(table.Place, code, message));
}
