using System.Globalization;
using System.Text.Json.Nodes;

namespace Drypeak.Service.Pages.Forms;

/// <summary>Builds a request's JSON by the places of a form's fields, making objects and lists on the way.</summary>
internal sealed class RequestWriter
{
    /// <summary>The request so far.</summary>
    public JsonObject Request { get; } = [];

    /// <summary>Sets a value at a place, see <see cref="FormField.Place"/>, and gives the place's JSON pointer. A null value makes only what holds it.</summary>
    public string Put(string place, JsonNode? value)
    {
        var steps = place.Split('/')[1..];
        var pointer = "";
        JsonNode at = Request;
        for (var i = 0; i < steps.Length; i++)
        {
            var step = at is JsonArray list ? Position(list, steps[i]) : steps[i];
            pointer += "/" + step;
            if (i < steps.Length - 1)
            {
                at = Child(at, step) ?? Set(at, step, IsOfList(steps[i + 1]) ? new JsonArray() : new JsonObject());
            }
            else if (value is not null)
            {
                Set(at, step, value);
            }
        }

        return pointer;
    }

    private static bool IsOfList(string step) => step.StartsWith('[') || char.IsAsciiDigit(step[0]);

    /// <summary>The position of the item that a step such as <c>[quantity=airVoids]</c> names, which is made where there is none.</summary>
    private static string Position(JsonArray list, string step)
    {
        if (!step.StartsWith('['))
        {
            return step;
        }

        var (member, text) = step[1..^1].Split('=', 2) is [var name, var named] ? (name, named) : throw new ArgumentException($"The step {step} is none.");
        var position = list.Index().FirstOrDefault(item => item.Item is JsonObject known && (string?)known[member] == text, (list.Count, null)).Item1;
        if (position == list.Count)
        {
            list.Add((JsonNode)new JsonObject { [member] = text });
        }

        return position.ToString(CultureInfo.InvariantCulture);
    }

    private static JsonNode? Child(JsonNode at, string step) =>
        at is JsonArray list ? list.ElementAtOrDefault(Number(step)) : at[step];

    private static JsonNode Set(JsonNode at, string step, JsonNode value)
    {
        if (at is not JsonArray list)
        {
            at[step] = value;
            return value;
        }

        // An item that was left empty before one that is filled stays a null, which the reader refuses at its place.
        while (list.Count <= Number(step))
        {
            list.Add((JsonNode?)null);
        }

        list[Number(step)] = value;
        return value;
    }

    private static int Number(string step) => int.Parse(step, CultureInfo.InvariantCulture);
}
