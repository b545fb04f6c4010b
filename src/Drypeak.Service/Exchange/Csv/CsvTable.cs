using Drypeak.Service.Contracts;
using Drypeak.Service.Exchange.Files;
using Drypeak.Service.Pages.Tables;
using Drypeak.Soil.Quantities;

namespace Drypeak.Service.Exchange.Csv;

/// <summary>
/// A CSV file with its columns understood: which is which, in which units, with which decimal mark. A cell that cannot be
/// read is a fault at its line and column, and all of them are found. Nothing is repaired: a file with two decimal marks,
/// or with marks that group thousands, is refused.
/// </summary>
internal sealed class CsvTable
{
    private readonly DecimalMark? _mark;
    private readonly List<FileFault> _faults;

    private CsvTable(IReadOnlyList<FoundColumn> columns, IReadOnlyList<CsvRow> rows, DecimalMark? mark, List<FileFault> faults)
    {
        (Columns, Rows, _mark, _faults) = (columns, rows, mark, faults);
        Units = new UnitsContract
        {
            Mass = UnitOf(Measure.Mass),
            TinMass = UnitOf(Measure.TinMass),
            Volume = UnitOf(Measure.Volume),
            Density = UnitOf(Measure.Density),
            Length = UnitOf(Measure.Length),
        };
        UnitSet = Units.ToUnitSet();
    }

    public IReadOnlyList<FoundColumn> Columns { get; }

    public IReadOnlyList<CsvRow> Rows { get; }

    /// <summary>The units of requests and answers: of each kind, the first that the header names.</summary>
    public UnitsContract Units { get; }

    public UnitSet UnitSet { get; }

    public DecimalMark? Mark => _mark;

    /// <summary>Reads a file. There is no table where its columns are at fault.</summary>
    public static CsvTable? Read(ReadOnlySpan<byte> bytes, IReadOnlyList<CsvColumn> known, List<FileFault> faults)
    {
        var rows = CsvText.Read(bytes, faults);
        if (faults.Count > 0)
        {
            return null;
        }

        if (rows.Count == 0)
        {
            faults.Add(CsvText.Fault(1, 1, "empty-file", $"The file has no rows. Give a header, such as {string.Join(',', known.Take(3).Select(column => column.Name))}, and rows below it."));
            return null;
        }

        var columns = Header(rows[0], known, faults);
        var body = rows.Skip(1).ToList();
        if (body.Count > 0 && Tables.IsRowOfUnits(body[0].Cells))
        {
            columns = [.. columns.Select(column => Tables.Unbracketed(Cell(body[0], column)) is { Length: > 0 } unit and not ("-" or "–") ? WithUnit(column, unit, body[0].Line, faults) : column)];
            body.RemoveAt(0);
        }

        foreach (var row in body.Where(row => row.Cells.Skip(rows[0].Cells.Count).Any(cell => cell.Length > 0)))
        {
            faults.Add(CsvText.Fault(row.Line, rows[0].Cells.Count + 1, "too-many-cells",
                $"The row has {row.Cells.Count} cells, the header {rows[0].Cells.Count}. Look for a separator or a decimal comma that parts a cell in two, and put such cells in quotation marks."));
        }

        if (body.Count == 0)
        {
            faults.Add(CsvText.Fault(rows[0].Line, 1, "empty-file", "The file has a header and no rows below it. Give a row for each specimen, or each test."));
        }

        return faults.Count > 0 ? null : new CsvTable(columns, body, MarkOf(columns, body), faults);
    }

    public FoundColumn? Find(string name) => Columns.FirstOrDefault(column => column.Column.Name == name);

    /// <summary>The text of a row's cell; null where it is empty, or where there is no such column.</summary>
    public string? Text(CsvRow row, string name) => Find(name) is { } column && Cell(row, column) is { Length: > 0 } text ? text : null;

    /// <summary>The number of a row's cell in the units of the request; null where it is empty, or a fault.</summary>
    public double? Number(CsvRow row, string name)
    {
        if (Find(name) is not { } column || Plain(Cell(row, column)) is not { Length: > 0 } text)
        {
            return null;
        }

        if (NumberText.Read(text, _mark, out var number) is { } refusal)
        {
            _faults.Add(CsvText.Fault(row.Line, column.Position + 1, "not-a-number", refusal));
            return null;
        }

        return ColumnUnits.InFormUnits(number, AsTableColumn(column), UnitSet);
    }

    /// <summary>
    /// What there is to say where a computed column stands in the file with another number than was computed now: it is put right, and
    /// said. Null where there is no such number, or the same.
    /// </summary>
    public FileFinding? Replaced(CsvRow row, CsvColumn computed, double? now)
    {
        if (Find(computed.Name) is not { } column || Plain(Cell(row, column)) is not { Length: > 0 } text || NumberText.Read(text, _mark, out var number) is not null
            || (now is { } value && Math.Abs(ColumnUnits.InFormUnits(number, AsTableColumn(column), UnitSet) - value) <= 1e-9 * Math.Abs(value)))
        {
            return null;
        }

        return FileFinding.Of("computed-anew", Severity.Note, row.Line,
            $"{computed.Name} is {NumberText.Shortened(text)} in the file; computed it is {(now is { } anew ? CsvText.Number(anew) : "not there")}. The computed one counts.");
    }

    public static string Cell(CsvRow row, FoundColumn column) => column.Position < row.Cells.Count ? row.Cells[column.Position] : "";

    /// <summary>A cell as the tables of the pages take it: without an exponent.</summary>
    public static string Plain(string cell) => CsvText.WithoutExponent(cell);

    /// <summary>The column as the tables of the pages know it.</summary>
    public static Column AsTableColumn(FoundColumn column) =>
        new(column.Column.OfSpecimen ?? new ColumnKind(column.Column.Name, column.Column.Measure, column.Column.Name), column.Tin, column.Unit);

    private string? UnitOf(Measure measure) => Columns.FirstOrDefault(column => column.Column.Measure == measure && column.Unit is not null)?.Unit;

    private static List<FoundColumn> Header(CsvRow header, IReadOnlyList<CsvColumn> known, List<FileFault> faults)
    {
        var columns = new List<FoundColumn>();
        for (var i = 0; i < header.Cells.Count; i++)
        {
            var cell = header.Cells[i];
            var (column, tin, unit) = CsvHeader.Read(cell, known, columns.Exists(found => found.Column.OfSpecimen is { OfTin: true }));
            if (column is null)
            {
                faults.Add(CsvText.Fault(header.Line, i + 1, "unknown-column", cell.Length == 0
                    ? "The column has no name. Name it, or remove it."
                    : $"“{NumberText.Shortened(cell)}” is no column of this job. Rename or remove it; known are {string.Join(", ", known.Select(each => each.Name))}."));
                continue;
            }

            var ofTin = column.OfSpecimen is { OfTin: true };
            var number = ofTin ? (tin ?? (columns.Count(found => found.Column == column) + 1)) - 1 : 0;
            if (number < 0 || columns.Exists(found => found.Column == column && found.Tin == number))
            {
                faults.Add(CsvText.Fault(header.Line, i + 1, "repeated-column", $"{column.Name} stands twice, the second time here. Rename or remove one."));
                continue;
            }

            var found = new FoundColumn(column, i, number, null);
            columns.Add(string.IsNullOrEmpty(unit) ? found : WithUnit(found, unit, header.Line, faults));
        }

        return columns;
    }

    private static FoundColumn WithUnit(FoundColumn column, string written, int line, List<FileFault> faults)
    {
        if (ColumnUnits.Code(column.Column.Measure, written) is { } code)
        {
            return column with { Unit = code };
        }

        var units = string.Join(", ", ColumnUnits.Known(column.Column.Measure));
        faults.Add(CsvText.Fault(line, column.Position + 1, "unknown-unit", units.Length > 0
            ? $"“{NumberText.Shortened(written)}” is no unit of {column.Column.Name}; there are {units}. Correct it, or leave it out: the default then holds."
            : $"{column.Column.Name} has no unit; “{NumberText.Shortened(written)}” was read. Leave it out."));
        return column;
    }

    /// <summary>The mark that most numbers of the file show; those that show the other are refused in their cells. Null where none shows any.</summary>
    private static DecimalMark? MarkOf(IReadOnlyList<FoundColumn> columns, IReadOnlyList<CsvRow> rows)
    {
        var cells = columns.Where(column => column.Column.IsNumber).SelectMany(column => rows.Select(row => Plain(Cell(row, column)))).ToList();
        var (points, commas) = (cells.Count(cell => NumberText.HasDecimals(cell, DecimalMark.Point)), cells.Count(cell => NumberText.HasDecimals(cell, DecimalMark.Comma)));
        return (points, commas) is (0, 0) ? null : points >= commas ? DecimalMark.Point : DecimalMark.Comma;
    }

    /// <summary>What the tables of the pages know of a row of units.</summary>
    private static class Tables
    {
        public static bool IsRowOfUnits(IReadOnlyList<string> cells) => Drypeak.Service.Pages.Tables.Header.IsRowOfUnits(cells);

        public static string Unbracketed(string cell) => cell.Trim('[', ']', '(', ')', ' ');
    }
}
