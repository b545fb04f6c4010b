using System.Text.RegularExpressions;

namespace Drypeak.Service.Pages.Forms;

/// <summary>The rules speak of the request's members; a form calls them by its labels.</summary>
internal sealed partial class MemberWords
{
    private readonly Dictionary<string, string> _labels = new(StringComparer.Ordinal);

    public MemberWords(IEnumerable<FormField> fields)
    {
        foreach (var field in fields.Where(field => field.Place.Length > 0))
        {
            Name(field.Place, field.Label);
            foreach (var column in field is TableField table ? table.Columns : [])
            {
                Name("/" + column.Member, column.Heading);
            }
        }
    }

    /// <summary>The message with each member's name that a field fills replaced by the field's label.</summary>
    public string InWordsOfTheForm(string message) =>
        MemberName().Replace(message, member => _labels.TryGetValue(member.Value, out var label) ? $"“{label}”" : member.Value);

    /// <summary>A member may be called by its own name, or with the one that holds it: <c>before</c>, <c>sandCone.before</c>. The first field of a name has it.</summary>
    private void Name(string place, string label)
    {
        var steps = place.Split('/');
        if (steps[^1].Any(char.IsAsciiLetterUpper))
        {
            _labels.TryAdd(steps[^1], label);
        }

        if (steps.Length > 2)
        {
            _labels.TryAdd($"{steps[^2]}.{steps[^1]}", label);
        }
    }

    [GeneratedRegex(@"\b[a-z]+[A-Za-z]*(?:\.[a-z][A-Za-z]*)?\b")]
    private static partial Regex MemberName();
}
