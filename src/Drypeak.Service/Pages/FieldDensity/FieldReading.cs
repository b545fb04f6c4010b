using System.Text.Json.Nodes;
using Drypeak.Service.Field;
using Drypeak.Service.Pages.Tables;

namespace Drypeak.Service.Pages.FieldDensity;

/// <summary>What was understood of a field form: the request as JSON, the same that a program posts, and which field filled which place of it.</summary>
public sealed class FieldReading
{
    private readonly Dictionary<string, FormField> _fieldOf = new(StringComparer.Ordinal);
    private readonly List<(FormField Field, string Advice)> _unreadable = [];
    private readonly Func<FormField, string> _text;
    private readonly DecimalMark? _mark;

    private FieldReading(Func<FormField, string> text)
    {
        _text = text;
        Method = FieldTestFields.Methods.FirstOrDefault(method => method.Code == text(FieldTestFields.Method)) ?? FieldTestFields.Methods[0];
        _mark = MarkOf(text);
        Build();
    }

    /// <summary>The method, with its fields.</summary>
    public MethodFields Method { get; }

    /// <summary>The request.</summary>
    public JsonObject Request { get; } = [];

    /// <summary>Fields whose text could not be read, each with a sentence.</summary>
    public IReadOnlyList<(FormField Field, string Advice)> Unreadable => _unreadable;

    public static FieldReading Of(Func<FormField, string> text) => new(text);

    /// <summary>The field that fills a place of the request, or the nearest that does.</summary>
    public FormField FieldOf(string place)
    {
        for (var at = place; at.Length > 0; at = at[..at.LastIndexOf('/')])
        {
            var found = _fieldOf.GetValueOrDefault(at)
                ?? Shown.FirstOrDefault(field => field.Place == at)
                ?? Shown.FirstOrDefault(field => field.Place.StartsWith(at + "/", StringComparison.Ordinal));
            if (found is not null)
            {
                return found;
            }
        }

        return Method.Readings[0];
    }

    private IEnumerable<FormField> Shown => [.. Method.Readings, .. FieldTestFields.SharedNumbers, .. FieldTestFields.Words];

    private void Build()
    {
        Put(FieldTestFields.Method.Place, Method.Code);
        foreach (var field in FieldTestFields.Words.Where(field => field != FieldTestFields.Method && _text(field).Length > 0 && Belongs(field)))
        {
            Put(field.Place, _text(field));
        }

        foreach (var field in Method.Readings.Concat(FieldTestFields.SharedNumbers).Where(field => Filled(field) && Belongs(field)))
        {
            PutNumber(field);
        }

        PutRequirements();
        if (_text(FieldTestFields.Working) == "yes")
        {
            Put(FieldTestFields.Working.Place, true);
        }
    }

    /// <summary>A choice counts only beside what it is about; soil only where it is weighed; a rule only with a requirement.</summary>
    private bool Belongs(FormField field) =>
        field == FieldTestFields.Determined ? Filled(FieldTestFields.Gravity)
        : field == FieldTestFields.OversizeApply ? Filled(FieldTestFields.OversizePercent)
        : field == FieldTestFields.Rule || field == FieldTestFields.Risk ? FieldTestFields.Limits.Any(limit => Filled(limit.Field))
        : !field.Place.StartsWith("/soil/", StringComparison.Ordinal) || FieldMethodNames.WeighsSoil(Method.Code);

    private bool Filled(FormField field) => !string.IsNullOrWhiteSpace(_text(field));

    private void PutNumber(FormField field)
    {
        if (field.IsList())
        {
            var numbers = _text(field).Split([' ', ';', '\t', '\n'], StringSplitOptions.RemoveEmptyEntries | StringSplitOptions.TrimEntries).Select(text => Number(field, text)).ToList();
            if (numbers.TrueForAll(number => number is { }))
            {
                Put(field.Place, new JsonArray([.. numbers.Select(number => (JsonNode)number!.Value)]));
            }
        }
        else if (Number(field, _text(field).Trim()) is { } number)
        {
            Put(field.Place, number);
        }
    }

    private void PutRequirements()
    {
        var requirements = new JsonArray();
        foreach (var limits in FieldTestFields.Limits.Where(limit => Filled(limit.Field)).GroupBy(limit => limit.Quantity))
        {
            var requirement = new JsonObject { ["quantity"] = limits.Key };
            foreach (var limit in limits)
            {
                var member = limit.IsMinimum ? "minimum" : "maximum";
                _fieldOf[$"/specification/requirements/{requirements.Count}/{member}"] = limit.Field;
                if (Number(limit.Field, _text(limit.Field).Trim()) is { } number)
                {
                    requirement[member] = number;
                }
            }

            requirements.Add(requirement);
        }

        if (requirements.Count > 0)
        {
            Put("/specification/requirements", requirements);
        }
    }

    private double? Number(FormField field, string text)
    {
        if (NumberText.Read(text, _mark, out var number) is not { } advice)
        {
            return number;
        }

        _unreadable.Add((field, advice.Replace(" below the table", "", StringComparison.Ordinal)));
        return null;
    }

    /// <summary>Sets a value at a pointer, making the objects and lists on the way.</summary>
    private void Put(string place, JsonNode value)
    {
        var steps = place.Split('/')[1..];
        JsonNode at = Request;
        for (var i = 0; i < steps.Length - 1; i++)
        {
            var child = at is JsonArray list ? list.ElementAtOrDefault(0) : at[steps[i]];
            if (child is null)
            {
                child = steps[i + 1] == "0" ? new JsonArray() : new JsonObject();
                if (at is JsonArray items)
                {
                    items.Add(child);
                }
                else
                {
                    at[steps[i]] = child;
                }
            }

            at = child;
        }

        at[steps[^1]] = value;
    }

    private static DecimalMark? MarkOf(Func<FormField, string> text) => text(FieldTestFields.DecimalMark) switch
    {
        "point" => DecimalMark.Point,
        "comma" => DecimalMark.Comma,
        _ => FieldTestFields.All.Except(FieldTestFields.Words).SelectMany(field => text(field).Split(' ', StringSplitOptions.RemoveEmptyEntries)).ToList() is var typed
            && typed.Exists(number => NumberText.HasDecimals(number, DecimalMark.Point)) ? DecimalMark.Point
            : typed.Exists(number => NumberText.HasDecimals(number, DecimalMark.Comma)) ? DecimalMark.Comma
            : null,
    };
}
