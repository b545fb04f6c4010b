using Drypeak.Service.Contracts;
using Drypeak.Service.Laboratory;
using Drypeak.Soil.Quantities;

namespace Drypeak.Service.Pages.Tables;

/// <summary>A cell of a sheet.</summary>
/// <param name="Row">From 0, as in <see cref="SpecimenSheet.Rows"/>.</param>
/// <param name="Column">From 0, as in <see cref="SpecimenSheet.Columns"/>.</param>
public readonly record struct CellAt(int Row, int Column);

/// <summary>
/// Specimens read from a sheet of cells, a row a specimen. A cell that cannot be read is a fault and leaves its member out; the others
/// stand. Each member of the request can be traced to its cell.
/// </summary>
public sealed class SpecimenSheet
{
    private readonly Dictionary<string, CellAt> _cells = new(StringComparer.Ordinal);
    private readonly List<Fault> _faults = [];
    private readonly UnitSet _units;
    private readonly DecimalMark? _mark;

    private SpecimenSheet(IReadOnlyList<Column> columns, IReadOnlyList<IReadOnlyList<string>> rows, UnitSet units, DecimalMark? mark)
    {
        (Columns, Rows, _units, _mark) = (columns, rows, units, mark);
        Specimens = [.. rows.Select((_, row) => Read(row))];
    }

    public IReadOnlyList<Column> Columns { get; }

    /// <summary>The cells of each specimen, without surrounding spaces; a row may be shorter than the columns.</summary>
    public IReadOnlyList<IReadOnlyList<string>> Rows { get; }

    public IReadOnlyList<SpecimenContract> Specimens { get; }

    /// <summary>Cells that could not be read, each at the pointer of the member it was for.</summary>
    public IReadOnlyList<Fault> Faults => _faults;

    /// <summary>Reads the rows.</summary>
    /// <param name="columns">What the columns hold.</param>
    /// <param name="rows">A row a specimen, none of them empty.</param>
    /// <param name="units">The form's units: the request is stated in these.</param>
    /// <param name="mark">The decimal mark, or null where it is not known.</param>
    public static SpecimenSheet Read(IReadOnlyList<Column> columns, IReadOnlyList<IReadOnlyList<string>> rows, UnitSet units, DecimalMark? mark) =>
        new(columns, rows, units, mark);

    /// <summary>The cell that a place in the request came from; null where none did.</summary>
    /// <param name="place">JSON pointer, such as <c>/specimens/2/tins/0/dry</c>.</param>
    public CellAt? CellOf(string place) => _cells.TryGetValue(place, out var cell) ? cell : null;

    /// <summary>The specimen as a reader knows it: its label, or its position.</summary>
    public string NameOf(int row) => Specimens[row].Label ?? $"{row + 1}";

    private SpecimenContract Read(int row)
    {
        var tins = ReadTins(row);
        var mold = (Mass: Number(row, ColumnKind.MoldMass), Volume: Number(row, ColumnKind.MoldVolume));
        return new SpecimenContract
        {
            Label = Text(row, ColumnKind.Specimen),
            MoldAndWetSoil = Number(row, ColumnKind.MoldAndWetSoil),
            Mold = mold is (null, null) ? null : new MoldContract { Mass = mold.Mass, Volume = mold.Volume },
            DepthBelowRim = Number(row, ColumnKind.DepthBelowRim),
            WetMass = Number(row, ColumnKind.WetMass),
            WetDensity = Number(row, ColumnKind.WetDensity),
            DryDensity = Number(row, ColumnKind.DryDensity),
            WaterContent = Number(row, ColumnKind.WaterContent),
            WetBasis = Number(row, ColumnKind.WetBasis),
            Tins = tins.Count > 0 ? tins : null,
            SetAside = ReasonToSetAside(row),
        };
    }

    /// <summary>The tins of which anything was weighed, in order; an unused tin's cells are empty.</summary>
    private List<TinContract> ReadTins(int row)
    {
        var tins = new List<TinContract>();
        foreach (var tin in Columns.Where(column => column.Kind.OfTin).Select(column => column.Tin).Distinct().Order())
        {
            if (Enumerable.Range(0, Columns.Count).Any(column => Columns[column].Kind.OfTin && Columns[column].Tin == tin && Cell(row, column).Length > 0))
            {
                tins.Add(new TinContract
                {
                    Tin = Number(row, ColumnKind.Tin, tin, tins.Count),
                    Wet = Number(row, ColumnKind.TinAndWet, tin, tins.Count),
                    Dry = Number(row, ColumnKind.TinAndDry, tin, tins.Count),
                });
            }
        }

        return tins;
    }

    private double? Number(int row, ColumnKind kind, int tin = 0, int position = 0)
    {
        if (Find(row, kind, tin, position) is not { } cell || Cell(row, cell.Column) is not { Length: > 0 } text)
        {
            return null;
        }

        if (NumberText.Read(text, _mark, out var number) is { } refusal)
        {
            _faults.Add(new Fault(Place(row, kind, position), "not-a-number", refusal));
            return null;
        }

        return ColumnUnits.InFormUnits(number, Columns[cell.Column], _units);
    }

    private string? Text(int row, ColumnKind kind) =>
        Find(row, kind, 0, 0) is { } cell && Cell(row, cell.Column) is { Length: > 0 } text ? text : null;

    /// <summary>Any text is a reason, except one that may mean that the specimen is kept.</summary>
    private string? ReasonToSetAside(int row)
    {
        var reason = Text(row, ColumnKind.SetAside);
        if (reason?.ToLowerInvariant() is not ("no" or "n" or "0" or "false" or "-" or "–"))
        {
            return reason;
        }

        _faults.Add(new Fault(Place(row, ColumnKind.SetAside, 0), "unclear-reason",
            $"“{reason}” may mean that the specimen is kept. Leave the cell empty to keep it, or write why it is set aside."));
        return null;
    }

    /// <summary>The cell of a column, which is remembered as where the member came from.</summary>
    private CellAt? Find(int row, ColumnKind kind, int tin, int position)
    {
        for (var column = 0; column < Columns.Count; column++)
        {
            if (Columns[column].Kind == kind && Columns[column].Tin == tin)
            {
                var cell = new CellAt(row, column);
                _cells.TryAdd(Place(row, kind, position), cell);
                return cell;
            }
        }

        return null;
    }

    private static string Place(int row, ColumnKind kind, int position) =>
        $"/specimens/{row}/{kind.Member.Replace("{tin}", $"{position}", StringComparison.Ordinal)}";

    private string Cell(int row, int column) => column < Rows[row].Count ? Rows[row][column] : "";
}
