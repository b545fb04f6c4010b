using Drypeak.Service.Pages.Forms;

namespace Drypeak.Service.Pages.Earthwork;

/// <summary>What a printed sheet repeats of the form, since the form itself is not printed.</summary>
internal static class SiteSheet
{
    /// <summary>Label, text and unit of each field that was filled.</summary>
    public static IEnumerable<(string Name, string Text)> Given(FormTexts texts, params IEnumerable<NumberField> fields) =>
        fields.Where(texts.Holds).Select(field => (Name(field.Label), $"{texts[field].Trim()}\u202F{UnitOf(field, texts)}".TrimEnd('\u202F')));

    private static string UnitOf(NumberField field, FormTexts texts) =>
        field.Unit ?? field.UnitOf?.Choices.FirstOrDefault(choice => choice.Value == texts[field.UnitOf])?.Text ?? "";

    /// <summary>A label by itself: what joins it to its neighbor in the form is dropped.</summary>
    private static string Name(string label) =>
        label.Split(' ', 2) is ["or" or "and", var rest] ? char.ToUpperInvariant(rest[0]) + rest[1..] : char.ToUpperInvariant(label[0]) + label[1..];
}
