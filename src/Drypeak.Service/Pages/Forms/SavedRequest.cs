using System.Globalization;
using System.Text.Json;
using System.Text.Json.Nodes;
using Drypeak.Service.Hosting;
using Microsoft.Extensions.Primitives;

namespace Drypeak.Service.Pages.Forms;

/// <summary>A request as a program posts it, brought back into the fields of a page: what <see cref="FormReading"/> does, the other way.</summary>
internal static class SavedRequest
{
    /// <summary>Name of the field that a saved request is pasted into.</summary>
    public const string Parameter = "saved-request";

    /// <summary>The form that gives the request; or a sentence on why the page cannot show it. Nothing of the request is dropped.</summary>
    public static (FormTexts? Texts, string? Advice) Open(FormPage page, string json)
    {
        if (Parsed(json) is not { } request)
        {
            return (null, "It is not a request in JSON. Paste the whole text of a file that was saved from this page.");
        }

        // A choice that fills no place of the request only tells in which fields it is typed: the first that can hold it all is taken.
        var variants = page.Variant is { Place.Length: 0 } variant ? variant.Choices.Select(choice => ((FormField?)variant, choice.Value)) : [(null, "")];
        var tried = variants.Select(chosen => Filled(page, request, chosen)).ToList();
        var (texts, lost) = tried.Find(attempt => attempt.Lost.Count == 0) is { Texts: { } } whole ? whole : tried[0];
        return lost.Count == 0 ? (texts, null) : (null, $"This page has no field for {string.Join(", ", lost.Take(5))}. Send the request to the address for programs, or take that out of it.");
    }

    private static (FormTexts Texts, List<string> Lost) Filled(FormPage page, JsonObject request, (FormField? Field, string Value) chosen)
    {
        var shown = FormTexts.From(page.Fields, chosen.Field is null ? [] : [KeyValuePair.Create(chosen.Field.Name, new StringValues(chosen.Value))]);
        var texts = FormTexts.From(page.Fields, page.PartsOf(page.Variant is { Place.Length: > 0 } variant ? FormTexts.From([variant], [KeyValuePair.Create(variant.Name, new StringValues(TextOf(variant, request)))]) : shown)
            .SelectMany(part => part.Fields).SelectMany(field => field is NumberField { Beside: { } beside } ? new[] { field, beside } : [field])
            .Concat([.. page.Variant is { } shownBy ? [shownBy] : Array.Empty<FormField>(), FormFields.Working])
            .Select(field => KeyValuePair.Create(field.Name, new StringValues(field == chosen.Field ? chosen.Value : TextOf(field, request))))
            .Where(text => text.Value.ToString().Length > 0));
        var reread = FormReading.Of(page, texts);
        return (texts, [.. Leaves(request, Places.Whole).Where(leaf => !JsonNode.DeepEquals(leaf.Value, At(reread.Request, leaf.Place))).Select(leaf => leaf.Place)]);
    }

    private static JsonObject? Parsed(string json)
    {
        try
        {
            return JsonNode.Parse(json, documentOptions: new JsonDocumentOptions { MaxDepth = StrictJson.MaximumDepth, AllowDuplicateProperties = false }) as JsonObject;
        }
        catch (JsonException)
        {
            return null;
        }
    }

    private static string TextOf(FormField field, JsonObject request) => (field, field.Place.Length == 0 ? null : At(request, field.Place)) switch
    {
        (_, null) => "",
        (CheckField, JsonValue value) => value.TryGetValue<bool>(out var ticked) && ticked ? CheckField.Ticked : "",
        (CheckField, JsonObject) => CheckField.Ticked,
        (NumbersField, JsonArray list) => string.Join(' ', list.Select(Text)),
        (TableField table, JsonArray list) => Table(table, list),
        (DocumentField, { } part) => part.ToJsonString(),
        (_, JsonValue value) => Text(value),
        _ => "",
    };

    private static string Table(TableField table, JsonArray list)
    {
        var rows = list.SelectMany(item => Enumerable.Range(0, RowsOf(table, item)).Select(row => table.Columns
            .Select(column => row > 0 && column == table.GroupedBy ? "" : Text(At(item, "/" + column.Member.Replace("+", row.ToString(CultureInfo.InvariantCulture), StringComparison.Ordinal)))).ToList())).ToList();
        var used = table.Columns.Where((_, i) => rows.Exists(row => row[i].Length > 0)).ToList();
        return string.Join('\n', rows.Select(row => string.Join('\t', table.Columns.Index().Where(column => used.Contains(column.Item)).Select(column => row[column.Index])))
            .Prepend(string.Join('\t', used.Select(column => column.Heading))));
    }

    /// <summary>An item has as many rows as the longest list in it that the columns name.</summary>
    private static int RowsOf(TableField table, JsonNode? item) => table.GroupedBy is null ? 1
        : Math.Max(1, table.Columns.Where(column => column.Member.Contains('+', StringComparison.Ordinal)).Max(column => (At(item, "/" + column.Member.Split("/+")[0]) as JsonArray)?.Count ?? 0));

    private static string Text(JsonNode? value) => value switch
    {
        null => "",
        JsonValue number when number.GetValueKind() == JsonValueKind.Number => number.GetValue<double>().ToString("0.###############", CultureInfo.InvariantCulture),
        JsonValue text when text.GetValueKind() == JsonValueKind.String => text.GetValue<string>(),
        _ => "",
    };

    private static JsonNode? At(JsonNode? node, string place) => place.Split('/').Skip(1).Aggregate(node, (at, step) => at switch
    {
        JsonArray list when step.StartsWith('[') => list.FirstOrDefault(item => item is JsonObject && step[1..^1].Split('=', 2) is [var name, var text] && Text(item[name]) == text),
        JsonArray list => int.TryParse(step, NumberStyles.None, CultureInfo.InvariantCulture, out var position) ? list.ElementAtOrDefault(position) : null,
        JsonObject item => item[step],
        _ => null,
    });

    private static IEnumerable<(string Place, JsonNode? Value)> Leaves(JsonNode? node, string place) => node switch
    {
        JsonObject item => item.SelectMany(member => Leaves(member.Value, Places.Member(place, member.Key))),
        JsonArray list => list.Index().SelectMany(item => Leaves(item.Item, Places.Item(place, item.Index))),
        _ => [(place, node)],
    };
}
