using System.Text.Json;
using System.Text.Json.Nodes;
using Drypeak.Service.Hosting;
using Drypeak.Service.Laboratory;
using Drypeak.Service.Pages.Forms;
using Drypeak.Service.Pages.Laboratory;
using Microsoft.AspNetCore.WebUtilities;

namespace Drypeak.Service.Pages.FieldDensity;

/// <summary>A laboratory test as a technician has it: the link of the laboratory page's answer, or the request that was saved there.</summary>
/// <param name="limits">How much a link may hold.</param>
internal sealed class LaboratoryTestText(Limits limits)
{
    /// <summary>The request; or a sentence on why there is none.</summary>
    public (JsonNode? Test, string? Advice) Read(string text)
    {
        var (request, advice) = text.StartsWith('{') ? OfJson(text) : OfLink(text);
        return (request, advice);
    }

    /// <summary>Several, one a line.</summary>
    public (JsonNode? Members, string? Advice) ReadFamily(string text)
    {
        var members = new JsonArray();
        foreach (var (i, line) in text.ReplaceLineEndings("\n").Split('\n', StringSplitOptions.TrimEntries | StringSplitOptions.RemoveEmptyEntries).Index())
        {
            if (Read(line) is not ({ } test, null))
            {
                return (null, $"Line {i + 1}: {Read(line).Advice}");
            }

            // The test's own name tells the curves apart, where it is another for each.
            var name = (string?)test["reference"] ?? "";
            var member = new JsonObject { ["test"] = test };
            if (name.Length > 0 && !members.Any(known => (string?)known!["label"] == name))
            {
                member["label"] = name;
            }

            members.Add((JsonNode)member);
        }

        return (members, null);
    }

    private static (JsonNode? Request, string? Advice) OfJson(string text)
    {
        try
        {
            var request = JsonNode.Parse(text, documentOptions: new JsonDocumentOptions { MaxDepth = StrictJson.MaximumDepth, AllowDuplicateProperties = false });
            return request is JsonObject { } test && test.ContainsKey("provenance")
                ? (null, "This is the answer to a laboratory test. Paste its request, or the link of its page.")
                : (request, null);
        }
        catch (JsonException)
        {
            return (null, "It is not JSON, or only a part of it. Paste the whole text of the saved request.");
        }
    }

    private (JsonNode? Request, string? Advice) OfLink(string text)
    {
        var query = QueryHelpers.ParseQuery(text.Contains('?', StringComparison.Ordinal) ? text[text.IndexOf('?', StringComparison.Ordinal)..].Split('#')[0] : "");
        var form = query.TryGetValue("demo", out var demo) ? Demonstration.Find(demo.ToString())?.Form
            : FormAddress.Read(query.GetValueOrDefault(FormAddress.Parameter).ToString(), limits.UnpackedAddressBytes) is { } texts ? TestForm.From(texts)
            : null;
        if (form is null)
        {
            return (null, "It is neither the link of a laboratory test nor a request in JSON. Open the test on the laboratory page, and copy “Link to this answer”.");
        }

        var reading = TestReading.Of(form);
        return reading.Unreadable.Count + reading.Missing.Count > 0
            ? (null, "The laboratory test in the link is not complete. Open it on the laboratory page, correct it there, and copy the link again.")
            : (JsonNode.Parse(JsonSerializer.Serialize(reading.Request, ServiceJson.Of<MoistureDensityRequest>())), null);
    }
}
