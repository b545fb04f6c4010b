using System.Globalization;
using System.Text.Json.Nodes;
using Drypeak.Service.Tests.Laboratory;

namespace Drypeak.Service.Tests.Field;

/// <summary>The field's jobs of the running service, and bodies for them.</summary>
internal static class FieldJobs
{
    public const string FieldDensity = "/v1/field-density";
    public const string RelativeDensity = "/v1/relative-density";
    public const string OnePoint = "/v1/one-point";
    public const string RapidMethod = "/v1/rapid-method";

    /// <summary>A sand cone test of Ternmarsh with everything that belongs to one.</summary>
    public const string Sound = """
        {
          "reference": "Ternmarsh, lift 4, 1+240",
          "units": { "mass": "g", "volume": "cm3", "density": "Mg/m3" },
          "method": "sand-cone",
          "sandCone": { "before": 6420, "after": 2710, "coneAndPlate": 1530, "sandDensity": 1.42 },
          "soil": { "wet": 3120.5 },
          "waterContent": 12,
          "specificGravity": { "value": 2.68, "determined": "measured" },
          "laboratory": { "maximumDryDensity": 1.90, "optimumWaterContent": 12.5, "uncertainty": { "maximumDryDensity": 0.010, "optimumWaterContent": 0.3 } },
          "uncertainty": { "dryDensity": 0.015, "waterContent": 0.3 },
          "specification": { "requirements": [ { "quantity": "relativeCompaction", "minimum": 95 }, { "quantity": "waterContentFromOptimum", "minimum": -2, "maximum": 2 } ] }
        }
        """;

    /// <summary>The sound test with members set, or taken out where the text is <see cref="Body.Absent"/>.</summary>
    public static string With(params ReadOnlySpan<(string Place, string Json)> edits)
    {
        var document = JsonNode.Parse(Sound)!;
        foreach (var (place, json) in edits)
        {
            var steps = place.Split('/')[1..];
            var parent = steps[..^1].Aggregate(document, (node, step) => node is JsonArray list ? list[int.Parse(step, CultureInfo.InvariantCulture)]! : node[step]!);
            if (json == Body.Absent)
            {
                parent.AsObject().Remove(steps[^1]);
            }
            else if (parent is JsonArray items)
            {
                items[int.Parse(steps[^1], CultureInfo.InvariantCulture)] = JsonNode.Parse(json);
            }
            else
            {
                parent[steps[^1]] = JsonNode.Parse(json);
            }
        }

        return document.ToJsonString();
    }

    /// <summary>The sound test by another method.</summary>
    public static string By(string method, string member, string block, params ReadOnlySpan<(string Place, string Json)> edits)
    {
        (string, string)[] all = [("/method", $"\"{method}\""), ("/sandCone", Body.Absent), ("/" + member, block), .. edits];
        return With(all);
    }
}
