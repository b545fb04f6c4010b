using System.Globalization;
using Drypeak.Service.Pages.Forms;
using Drypeak.Service.Pages.Tables;
using Microsoft.Extensions.Primitives;

namespace Drypeak.Service.Pages.Laboratory;

/// <summary>The laboratory form as it was typed: texts by field. Unknown fields are not kept. Immutable, safe on any thread.</summary>
public sealed class TestForm
{
    /// <summary>Rows of an untouched grid.</summary>
    private const int FewestRows = 6;

    /// <summary>Rows that a grid may have; longer tables are pasted.</summary>
    public const int MostRows = 100;

    /// <summary>Name of the button that asks for a longer grid.</summary>
    public const string MoreRows = "more-rows";

    private readonly Dictionary<string, string> _texts;

    private TestForm(Dictionary<string, string> texts) => _texts = texts;

    /// <summary>An untouched form.</summary>
    public static TestForm Empty { get; } = new([]);

    /// <summary>The columns of the grid, in order.</summary>
    public static IReadOnlyList<Column> GridColumns { get; } =
    [
        new(ColumnKind.Specimen), new(ColumnKind.MoldAndWetSoil), new(ColumnKind.Tin), new(ColumnKind.TinAndWet), new(ColumnKind.TinAndDry),
        new(ColumnKind.WaterContent), new(ColumnKind.WetDensity), new(ColumnKind.DryDensity), new(ColumnKind.SetAside),
    ];

    /// <summary>The texts of every field that is not left as it was, by name and in a fixed order.</summary>
    public IEnumerable<KeyValuePair<string, string>> Texts => _texts.OrderBy(text => text.Key, StringComparer.Ordinal);

    /// <summary>What a field holds.</summary>
    public string this[FormField field] => _texts.GetValueOrDefault(field.Name, field.Otherwise);

    /// <summary>What a cell of the grid holds.</summary>
    public string this[CellAt cell] => _texts.GetValueOrDefault(CellName(cell), "");

    /// <summary>Rows that the grid shows: all that hold anything, one more to fill, and at least as many as were asked for.</summary>
    public int GridRows
    {
        get
        {
            var asked = int.TryParse(this[TestFields.GridRows], NumberStyles.None, CultureInfo.InvariantCulture, out var rows) ? rows : FewestRows;
            return Math.Clamp(Math.Max(asked, LastFilledRow + 2), FewestRows, MostRows);
        }
    }

    /// <summary>The rows of the grid that hold anything.</summary>
    public IReadOnlyList<int> FilledRows =>
        [.. Enumerable.Range(0, LastFilledRow + 1).Where(row => Enumerable.Range(0, GridColumns.Count).Any(column => !string.IsNullOrWhiteSpace(this[new CellAt(row, column)])))];

    private int LastFilledRow { get; init; } = -1;

    /// <summary>The name of a cell of the grid in the posted form, and its identifier in the page.</summary>
    public static string CellName(CellAt cell) => string.Create(CultureInfo.InvariantCulture, $"cell-{cell.Row}-{cell.Column}");

    /// <summary>Keeps the fields that the form has, as they were typed.</summary>
    public static TestForm From(IEnumerable<KeyValuePair<string, StringValues>> posted)
    {
        var texts = new Dictionary<string, string>(StringComparer.Ordinal);
        var lastRow = -1;
        foreach (var (name, values) in posted)
        {
            var text = values.ToString();
            var cell = CellOf(name);
            var field = TestFields.All.FirstOrDefault(field => field.Name == name);
            if (text.Length > 0 && text != field?.Otherwise && (field is not null || cell is not null))
            {
                texts[name] = text;
                lastRow = Math.Max(lastRow, cell?.Row ?? -1);
            }
        }

        return new TestForm(texts) { LastFilledRow = lastRow };
    }

    /// <summary>The same form with a longer grid.</summary>
    public TestForm WithMoreRows() => new(new(_texts, StringComparer.Ordinal)
    {
        [TestFields.GridRows.Name] = Math.Min(GridRows + FewestRows, MostRows).ToString(CultureInfo.InvariantCulture),
    })
    {
        LastFilledRow = LastFilledRow,
    };

    private static CellAt? CellOf(string name) =>
        name.Split('-') is ["cell", var row, var column]
        && int.TryParse(row, NumberStyles.None, CultureInfo.InvariantCulture, out var r) && r < MostRows
        && int.TryParse(column, NumberStyles.None, CultureInfo.InvariantCulture, out var c) && c < GridColumns.Count
        && CellName(new CellAt(r, c)) == name
            ? new CellAt(r, c)
            : null;
}
