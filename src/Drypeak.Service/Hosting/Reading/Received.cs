using System.Globalization;
using System.Text.Json;

namespace Drypeak.Service.Hosting;

/// <summary>Says in a few words what a request held, never more than a line of it.</summary>
internal static class Received
{
    private const int LongestEcho = 40;

    /// <summary>"the number 12", "the text "abc"", "an object", ...</summary>
    public static string Describe(JsonElement value) => value.ValueKind switch
    {
        JsonValueKind.Number => $"the number {Shorten(value.GetRawText())}",
        JsonValueKind.String => $"the text \"{Shorten(value.GetString()!)}\"",
        JsonValueKind.True => "true",
        JsonValueKind.False => "false",
        JsonValueKind.Null => "null",
        JsonValueKind.Array => "a list",
        _ => "an object",
    };

    /// <summary>At most 40 characters, never half of a surrogate pair; control characters are left out.</summary>
    public static string Shorten(string text)
    {
        var head = text.Length > 2 * LongestEcho ? text[..(2 * LongestEcho)] : text;
        var letters = StringInfo.GetTextElementEnumerator(head);
        var kept = new System.Text.StringBuilder(LongestEcho);
        while (letters.MoveNext())
        {
            var letter = letters.GetTextElement();
            if (kept.Length + letter.Length > LongestEcho)
            {
                return $"{kept}\u2026";
            }

            if (!char.IsControl(letter[0]))
            {
                kept.Append(letter);
            }
        }

        return head.Length < text.Length ? $"{kept}\u2026" : kept.ToString();
    }
}
