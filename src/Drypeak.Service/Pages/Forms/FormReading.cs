using System.Text.Json.Nodes;
using Drypeak.Service.Hosting;
using Drypeak.Service.Pages.Tables;

namespace Drypeak.Service.Pages.Forms;

/// <summary>
/// What was understood of a form: the request as JSON, the same that a program posts, and which field filled which place of it. A text
/// that cannot be read leaves its member out; the others stand, so that all that is wrong can be said at once.
/// </summary>
public sealed class FormReading
{
    /// <summary>Codes of faults that say only that something is missing: on the page a sentence about the field says it better.</summary>
    private static readonly HashSet<string> Missing = ["missing-member"];

    private readonly RequestWriter _writer = new();
    private readonly Dictionary<string, FormField> _fieldOf = new(StringComparer.Ordinal);
    private readonly Dictionary<string, FormTable> _tables = new(StringComparer.Ordinal);
    private readonly List<(string Place, FormFault Fault)> _unreadable = [];
    private readonly FormTexts _texts;
    private readonly DecimalMark? _chosen;
    private readonly DecimalMark? _usual;
    private readonly IReadOnlyList<FormField> _shown;
    private readonly MemberWords _words;

    private FormReading(FormPage page, FormTexts texts)
    {
        _texts = texts;
        _shown = [.. new FormField?[] { page.Variant }.OfType<FormField>(), .. page.PartsOf(texts).SelectMany(part => part.Fields).SelectMany(WithBeside), FormFields.Working];
        _words = new MemberWords(_shown);
        _chosen = texts[FormFields.DecimalMark] switch { "point" => DecimalMark.Point, "comma" => DecimalMark.Comma, _ => null };
        _usual = _chosen ?? UsualMark();
        foreach (var field in _shown.Where(field => field.Place.Length > 0 && texts.Holds(field) && Counts(field)))
        {
            Read(field, texts[field].Trim());
        }
    }

    /// <summary>The request.</summary>
    public JsonObject Request => _writer.Request;

    /// <summary>What could not be read.</summary>
    public IReadOnlyList<FormFault> Unreadable => [.. _unreadable.Select(item => item.Fault)];

    public static FormReading Of(FormPage page, FormTexts texts) => new(page, texts);

    /// <summary>A message of the rules or of a review, with the request's members called as the form calls them.</summary>
    public string InWordsOfTheForm(string message) => _words.InWordsOfTheForm(message);

    /// <summary>How a pasted table was understood; null where the field is empty.</summary>
    public FormTable? TableOf(TableField field) => _tables.GetValueOrDefault(field.Name);

    /// <summary>The field that fills a place of the request, or the nearest that does, and what the place is called on the page.</summary>
    public (FormField Field, string Name) FieldOf(string place)
    {
        for (var at = place; at.Length > 0; at = Places.Parent(at)!)
        {
            var field = _fieldOf.GetValueOrDefault(at)
                ?? _shown.FirstOrDefault(field => field.Place == at)
                ?? _shown.FirstOrDefault(field => field.Place.StartsWith(at + "/", StringComparison.Ordinal));
            if (field is not null)
            {
                return (field, field is TableField table && _tables.GetValueOrDefault(table.Name)?.NameOf(place) is { } name ? name : field.Label);
            }
        }

        var first = _shown.First(field => field is not ChoiceField and not TextField);
        return (first, first.Label);
    }

    /// <summary>All that is wrong, from the top of the form to its end: what could not be read, then the broken rules that do not merely follow from it.</summary>
    internal IReadOnlyList<FormFault> AllFaults(IReadOnlyList<Fault> broken) =>
    [
        .. Unreadable.Concat(broken.Where(fault => !_unreadable.Exists(known => Places.IsWithin(known.Place, fault.Place) || Places.IsWithin(fault.Place, known.Place))).Select(Brought))
            .Distinct().OrderBy(fault => _shown.Index().First(field => field.Item == fault.Field).Index).ThenBy(fault => fault.Row),
    ];

    private FormFault Brought(Fault fault)
    {
        var (field, name) = FieldOf(fault.Place);
        var row = field is TableField table && _tables.GetValueOrDefault(table.Name)?.RowOf(fault.Place) is { } at ? at : -1;
        var advice = Missing.Contains(fault.Code) ? "It is missing, and nothing can be computed without it. Give it." : _words.InWordsOfTheForm(fault.Message);
        return new FormFault(field.Name, field, name, advice, row);
    }

    private static IEnumerable<FormField> WithBeside(FormField field) => field is NumberField { Beside: { } beside } ? [field, beside] : [field];

    private bool Counts(FormField field) => field.OnlyWith.Count == 0 || _shown.Any(other => field.OnlyWith.Contains(other.Name) && _texts.Holds(other));

    private void Read(FormField field, string text)
    {
        switch (field)
        {
            case NumberField when Number(field, text, _usual) is { } number:
                Put(field, number);
                break;
            case NumbersField when Numbers(field, text) is { } numbers:
                Put(field, new JsonArray([.. numbers.Select(number => (JsonNode)number)]));
                break;
            case CheckField check when text == CheckField.Ticked:
                Put(check, check.Place.EndsWith(']') ? null : true);
                break;
            case ChoiceField choice when choice.Choices.FirstOrDefault(known => known.Value == text)?.Flag is { } flag:
                Put(choice, flag);
                break;
            case TextField or ChoiceField:
                Put(field, text);
                break;
            case TableField table:
                ReadTable(table);
                break;
            case DocumentField document:
                var (part, advice) = document.Read(text);
                Put(field, part, advice);
                break;
            default:
                break;
        }
    }

    private void Put(FormField field, JsonNode? value, string? advice = null)
    {
        var pointer = _writer.Put(field.Place, value);
        _fieldOf[pointer] = field;
        if (advice is not null)
        {
            _unreadable.Add((pointer, new FormFault(field.Name, field, field.Label, advice)));
        }
    }

    private void ReadTable(TableField field)
    {
        var table = FormTable.Read(field, _texts[field], _texts, _chosen);
        _tables[field.Name] = table;
        _fieldOf[field.Place] = field;
        foreach (var (place, value) in table.Values)
        {
            _writer.Put(place, value);
        }

        foreach (var fault in table.Faults)
        {
            _unreadable.Add((fault.Place, new FormFault(field.Name, field, table.NameOf(fault.Place) ?? field.Label, fault.Message, table.RowOf(fault.Place) ?? -1)));
        }
    }

    private double? Number(FormField field, string text, DecimalMark? otherwise)
    {
        if (NumberText.Read(text, _chosen ?? MarkOfItself(text) ?? otherwise, out var number) is not { } advice)
        {
            return number;
        }

        Put(field, null, advice);
        return null;
    }

    /// <summary>Numbers with spaces or semicolons between them; a comma parts them only before a space.</summary>
    private List<double>? Numbers(FormField field, string text)
    {
        var numbers = new List<double>();
        foreach (var part in text.Split([' ', ';', '\t', '\n', '\r'], StringSplitOptions.RemoveEmptyEntries).Select(part => part.TrimEnd(',')).Where(part => part.Length > 0))
        {
            if (part.Contains(',', StringComparison.Ordinal) && _usual != DecimalMark.Comma)
            {
                Put(field, null, $"“{NumberText.Shortened(part)}” may be one number or two. Put a space between two, and write decimals with a point.");
                return null;
            }

            if (Number(field, part, _usual ?? DecimalMark.Point) is not { } number)
            {
                return null;
            }

            numbers.Add(number);
        }

        return numbers;
    }

    /// <summary>A field stands alone, so that either mark is understood in it.</summary>
    private static DecimalMark? MarkOfItself(string text) =>
        NumberText.HasDecimals(text, DecimalMark.Comma) ? DecimalMark.Comma : NumberText.HasDecimals(text, DecimalMark.Point) ? DecimalMark.Point : null;

    /// <summary>The mark that the form's numbers show, where they all show the same: it decides what a comma before three digits is.</summary>
    private DecimalMark? UsualMark()
    {
        var marks = _shown.Where(field => field is NumberField or NumbersField).SelectMany(field => _texts[field].Split(' ')).Select(MarkOfItself).OfType<DecimalMark>().Distinct().ToList();
        return marks.Count == 1 ? marks[0] : null;
    }
}
