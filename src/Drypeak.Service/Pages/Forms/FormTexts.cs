using Microsoft.Extensions.Primitives;

namespace Drypeak.Service.Pages.Forms;

/// <summary>A form as it was typed: texts by field. Fields that a page does not have are not kept. Immutable, safe on any thread.</summary>
public sealed class FormTexts
{
    private readonly Dictionary<string, string> _texts;

    private FormTexts(Dictionary<string, string> texts) => _texts = texts;

    /// <summary>An untouched form.</summary>
    public static FormTexts Empty { get; } = new([]);

    /// <summary>The texts of every field that is not left as it was, by name and in a fixed order.</summary>
    public IEnumerable<KeyValuePair<string, string>> Texts => _texts.OrderBy(text => text.Key, StringComparer.Ordinal);

    /// <summary>What a field holds.</summary>
    public string this[FormField field] => _texts.GetValueOrDefault(field.Name, field.Otherwise);

    /// <summary>Whether a field holds anything but spaces.</summary>
    public bool Holds(FormField field) => !string.IsNullOrWhiteSpace(this[field]);

    /// <summary>Whether a field was left as it was.</summary>
    public bool IsUntouched(FormField field) => !_texts.ContainsKey(field.Name);

    /// <summary>Keeps what belongs to the fields, as it was typed.</summary>
    public static FormTexts From(IEnumerable<FormField> fields, IEnumerable<KeyValuePair<string, StringValues>> posted)
    {
        var known = fields.ToDictionary(field => field.Name, StringComparer.Ordinal);
        return new FormTexts(posted
            .Where(text => known.TryGetValue(text.Key, out var field) && text.Value.ToString() is { Length: > 0 } typed && typed != field.Otherwise)
            .ToDictionary(text => text.Key, text => text.Value.ToString(), StringComparer.Ordinal));
    }
}
