using System.Globalization;
using System.Text.Json.Nodes;
using Drypeak.Service.Contracts;
using Drypeak.Service.Hosting;
using Drypeak.Service.Pages.Tables;
using Drypeak.Soil.Quantities;

namespace Drypeak.Service.Pages.Forms;

/// <summary>
/// A table pasted into a form, read by its header or, without one, by the order of the field's columns. Nothing is repaired: what has
/// two readings is refused, and says what to write.
/// </summary>
public sealed class FormTable
{
    private const int MostRows = 20_000;

    private readonly TableField _field;
    private readonly List<(string Place, JsonNode Value)> _values = [];
    private readonly List<Fault> _faults = [];
    private readonly Dictionary<string, (int Row, int Column)> _cells = new(StringComparer.Ordinal);

    private FormTable(TableField field) => _field = field;

    /// <summary>The columns, in the order of the table.</summary>
    public IReadOnlyList<Column> Columns { get; private set; } = [];

    /// <summary>The cells of each row, without surrounding spaces; a row may be shorter than the columns.</summary>
    public IReadOnlyList<IReadOnlyList<string>> Rows { get; private set; } = [];

    /// <summary>Places of the request with their values, in the order of the table.</summary>
    internal IReadOnlyList<(string Place, JsonNode Value)> Values => _values;

    /// <summary>What could not be read, each at its place in the request; the whole table's are at the field's.</summary>
    internal IReadOnlyList<Fault> Faults => _faults;

    internal static FormTable Read(TableField field, string text, FormTexts texts, DecimalMark? chosen)
    {
        var table = new FormTable(field);
        table.ReadText(text, UnitsOf(texts), chosen);
        return table;
    }

    /// <summary>The row that a place of the request is in, from 0; null where it is in none.</summary>
    public int? RowOf(string place)
    {
        for (var at = place; at.Length > _field.Place.Length; at = Places.Parent(at)!)
        {
            if (_cells.TryGetValue(at, out var cell) || TryFirstWithin(at, out cell))
            {
                return cell.Row;
            }
        }

        return null;
    }

    /// <summary>Row and column of a place, such as <c>Test 4, Water content</c>; null where it is in no row.</summary>
    public string? NameOf(string place) => RowOf(place) is not { } row ? null
        : $"{_field.Row} {row + 1}" + (_cells.TryGetValue(place, out var cell) ? $", {Columns[cell.Column].Heading}" : "");

    private bool TryFirstWithin(string place, out (int Row, int Column) cell)
    {
        var within = _cells.Where(known => Places.IsWithin(known.Key, place)).Select(known => known.Value).ToList();
        cell = within.Count > 0 ? within.Min() : default;
        return within.Count > 0;
    }

    private void ReadText(string text, UnitSet units, DecimalMark? chosen)
    {
        var separator = TableText.FindSeparator(text);
        var rows = TableText.Split(text, separator, out var unclosed);
        if (unclosed is { } line)
        {
            Refuse("unclosed-quotation", $"A quotation mark is opened in line {line} and not closed. Close it, or remove it.");
            return;
        }

        if (rows.Count is 0 or > MostRows)
        {
            Refuse("too-large", rows.Count == 0 ? "The table has no rows. Paste one or more." : $"The table may have up to {MostRows} rows; it has {rows.Count}.");
            return;
        }

        var header = new FormTableHeader(_field, _faults);
        Columns = FormTableHeader.Stands(rows[0]) ? header.Read(rows[0], separator) : header.ByOrder(rows.Max(row => row.Cells.Count));
        Rows = [.. rows.Skip(FormTableHeader.Stands(rows[0]) ? 1 : 0).Select(row => row.Cells)];
        if (_faults.Count > 0 || Columns.Count == 0)
        {
            return;
        }

        if (Rows.Count == 0)
        {
            Refuse("empty-table", "The table has a header and nothing below it. Paste the rows too.");
            return;
        }

        ReadRows(units, chosen ?? MostShown());
    }

    private void ReadRows(UnitSet units, DecimalMark? mark)
    {
        var (item, inItem) = (-1, 0);
        string? group = null;
        for (var row = 0; row < Rows.Count; row++)
        {
            var named = _field.GroupedBy is { } by ? Rows[row].ElementAtOrDefault(Columns.Index().First(column => column.Item.Kind == by).Index) : null;
            var goesOn = _field.GroupedBy is { } && item >= 0 && (string.IsNullOrEmpty(named) || named == group);
            (item, inItem, group) = goesOn ? (item, inItem + 1, group) : (item + 1, 0, named);
            ReadRow(row, $"{_field.Place}/{item}", inItem, units, mark);
        }
    }

    private void ReadRow(int row, string item, int inItem, UnitSet units, DecimalMark? mark)
    {
        var cells = Rows[row];
        _cells.TryAdd(item, (row, 0));
        if (cells.Skip(Columns.Count).Any(cell => cell.Length > 0))
        {
            _faults.Add(new Fault(item, "too-many-cells", $"It has {cells.Count} cells, but the table has {Columns.Count} columns. Look for a mark that parts a cell in two."));
        }

        for (var i = 0; i < Columns.Count && i < cells.Count; i++)
        {
            var (column, text) = (Columns[i], cells[i]);
            var place = $"{item}/{column.Kind.Member.Replace("+", inItem.ToString(CultureInfo.InvariantCulture), StringComparison.Ordinal)}";
            if (text.Length == 0)
            {
                _cells.TryAdd(place, (row, i));
                continue;
            }

            // What belongs to the whole item may stand in each of its rows, if it is the same.
            if (_cells.TryGetValue(place, out var before) && before.Row != row && Rows[before.Row][i] is { Length: > 0 } said)
            {
                if (said != text)
                {
                    _faults.Add(new Fault(place, "contradiction", $"“{NumberText.Shortened(text)}” stands in row {row + 1} and “{NumberText.Shortened(said)}” in row {before.Row + 1} of the same {_field.GroupedBy!.Heading.ToLowerInvariant()}. Give it once."));
                }

                continue;
            }

            _cells[place] = (row, i);

            if (column.Kind.Measure == Measure.Text)
            {
                _values.Add((place, text));
            }
            else if (NumberText.Read(text, mark, out var number) is { } refusal)
            {
                _faults.Add(new Fault(place, "not-a-number", refusal));
            }
            else
            {
                _values.Add((place, ColumnUnits.InFormUnits(number, column, units)));
            }
        }
    }

    /// <summary>The mark that most of the numbers show. A number that shows the other one is then refused in its own cell.</summary>
    private DecimalMark? MostShown()
    {
        var numbers = Rows.SelectMany(row => row.Take(Columns.Count).Where((_, i) => Columns[i].Kind.Measure != Measure.Text)).ToList();
        var (points, commas) = (numbers.Count(cell => NumberText.HasDecimals(cell, DecimalMark.Point)), numbers.Count(cell => NumberText.HasDecimals(cell, DecimalMark.Comma)));
        return (points, commas) is (0, 0) ? null : points >= commas ? DecimalMark.Point : DecimalMark.Comma;
    }

    private void Refuse(string code, string message) => _faults.Add(new Fault(_field.Place, code, message));

    /// <summary>The form's units; a unit that is none is a fault of its own, and the cells are then read as if nothing had been chosen.</summary>
    private static UnitSet UnitsOf(FormTexts texts)
    {
        return new UnitsContract
        {
            Mass = Known(FormFields.MassUnit, UnitNames.Mass.ContainsKey),
            TinMass = texts.IsUntouched(FormFields.TinUnit) ? null : Known(FormFields.TinUnit, UnitNames.Mass.ContainsKey),
            Volume = Known(FormFields.VolumeUnit, UnitNames.Volume.ContainsKey),
            Density = Known(FormFields.DensityUnit, UnitNames.Density.ContainsKey),
            Length = Known(FormFields.LengthUnit, UnitNames.Length.ContainsKey),
        }.ToUnitSet();

        string? Known(FormField field, Func<string, bool> isUnit) => isUnit(texts[field]) ? texts[field] : null;
    }
}
