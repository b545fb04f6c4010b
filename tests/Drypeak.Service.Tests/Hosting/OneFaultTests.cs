using System.Text.Json;
using System.Text.Json.Nodes;
using Drypeak.Service.Tests.Laboratory;
using Xunit;

namespace Drypeak.Service.Tests.Hosting;

/// <summary>One fault of form in a right request is one fault in the answer: no rule adds what only follows from it.</summary>
public sealed class OneFaultTests(RunningService service)
{
    [Fact]
    public async Task Each_member_of_a_right_request_that_is_mistyped_gives_that_fault_alone() =>
        await AssertFaults(Mistyped(Example()).Select(each => (each.Text, new[] { $"{each.Place} wrong-type" })));

    [Fact]
    public async Task Each_member_of_a_right_request_that_is_misspelled_gives_no_fault_but_of_its_name() =>
        await AssertFaults(Misspelled(Example()).Select(each => (each.Text, new[] { $"{each.Place[..^1]} unknown-member", $"{each.Place} missing-member" })));

    /// <summary>Sends each text; its faults have to be some of those that are allowed, the first of them among them.</summary>
    private async Task AssertFaults(IEnumerable<(string Text, string[] Allowed)> requests)
    {
        var wrong = new List<string>();
        foreach (var (text, allowed) in requests)
        {
            using var response = await service.PostAsync(text);
            var answer = JsonElement.Parse(await RunningService.TextOf(response));
            string[] faults = answer.TryGetProperty("errors", out var errors)
                ? [.. errors.EnumerateArray().Select(fault => $"{fault.GetProperty("pointer")} {fault.GetProperty("code")}")]
                : [];
            if ((int)response.StatusCode != 400 || !faults.Contains(allowed[0]) || faults.Except(allowed).Any())
            {
                wrong.Add($"{allowed[0]}: {(int)response.StatusCode} {string.Join("; ", faults)}");
            }
        }

        Assert.Equal("", string.Join("\n", wrong));
    }

    private static JsonNode Example()
    {
        using var stream = typeof(Program).Assembly.GetManifestResourceStream("Drypeak.Service.Examples.moisture-density.json")!;
        return JsonNode.Parse(stream)!;
    }

    /// <summary>The document once for each value in it, with a value there that no contract has in that place.</summary>
    private static IEnumerable<(string Place, string Text)> Mistyped(JsonNode document)
    {
        foreach (var (place, value) in Values(document, ""))
        {
            JsonNode substitute = value is JsonValue && value.GetValueKind() == JsonValueKind.Number ? "12.4" : 5;
            if (place.Length == 0)
            {
                yield return (place, substitute.ToJsonString());
                continue;
            }

            value.ReplaceWith(substitute);
            yield return (place, document.ToJsonString());
            substitute.ReplaceWith(value);
        }
    }

    /// <summary>The document once for each member, with the last letter of its name left out.</summary>
    private static IEnumerable<(string Place, string Text)> Misspelled(JsonNode document)
    {
        foreach (var (place, value) in Values(document, "").Where(each => each.Value.Parent is JsonObject))
        {
            var (parent, name) = (value.Parent!.AsObject(), value.GetPropertyName());
            parent.Remove(name);
            parent.Add(name[..^1], value);
            yield return (place, document.ToJsonString());
            parent.Remove(name[..^1]);
            parent.Add(name, value);
        }
    }

    private static List<(string Place, JsonNode Value)> Values(JsonNode node, string place)
    {
        IEnumerable<(string Place, JsonNode? Value)> children = node switch
        {
            JsonObject members => members.Select(member => ($"{place}/{member.Key}", member.Value)),
            JsonArray items => items.Select((item, index) => ($"{place}/{index}", item)),
            _ => [],
        };
        return [(place, node), .. children.Where(child => child.Value is not null).SelectMany(child => Values(child.Value!, child.Place))];
    }
}
