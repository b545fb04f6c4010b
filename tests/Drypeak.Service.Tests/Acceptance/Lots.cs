using System.Globalization;
using System.Text.Json.Nodes;
using Drypeak.Service.Tests.Laboratory;

namespace Drypeak.Service.Tests.Acceptance;

/// <summary>The lots' jobs of the running service, and bodies for them.</summary>
internal static class Lots
{
    public const string LotAcceptance = "/v1/lot-acceptance";
    public const string AcceptancePlan = "/v1/acceptance-plan";

    /// <summary>A lot of Ternmarsh with everything that belongs to one.</summary>
    public const string Sound = """
        {
          "reference": "Ternmarsh, lot 12",
          "units": { "density": "Mg/m3", "length": "m" },
          "laboratory": { "maximumDryDensity": 1.9, "optimumWaterContent": 12 },
          "specificGravity": { "value": 2.7, "determined": "measured" },
          "waterDensity": 1,
          "specification": { "requirements": [ { "quantity": "relativeCompaction", "minimum": 95 } ] },
          "lotRules": [
            { "rule": "every-test" },
            { "rule": "mean", "quantity": "relativeCompaction", "minimum": 96 },
            { "rule": "moving-mean", "quantity": "relativeCompaction", "count": 3, "minimum": 96, "floor": 93 },
            { "rule": "percent-within-limits", "quantity": "relativeCompaction", "minimum": 95, "maximum": null, "required": 90 },
            { "rule": "characteristic-value", "quantity": "relativeCompaction", "minimum": 95, "factor": 0.8 }
          ],
          "tests": [
            { "label": "a", "relativeCompaction": 96, "waterContent": 13, "station": 0, "offset": 1, "lift": 1 },
            { "label": "b", "dryDensity": 1.862, "waterContent": 12.5, "station": 10, "offset": 3, "lift": 1 },
            { "label": "c", "wetDensity": 2.09, "waterContent": 13.5, "station": 20, "offset": 2, "lift": 2 },
            { "label": "d", "relativeCompaction": 97, "waterContent": 14, "station": 30, "offset": 4, "lift": 2 }
          ],
          "controlChart": { "quantity": "relativeCompaction", "kind": "individuals" },
          "window": { "minimumRelativeCompaction": 95, "minimumSaturation": 74, "maximumAirVoids": 10, "waterContentFromOptimum": [0, 3] }
        }
        """;

    public const string SoundPlan = """
        { "rule": { "rule": "mean", "quantity": "relativeCompaction", "minimum": 96 }, "count": 4, "standardDeviation": 2, "levels": [94, 95, 96, 97], "acceptableLevel": 97, "rejectableLevel": 95 }
        """;

    /// <summary>A body with members set, added to a list (<c>-</c>), or taken out where the text is <see cref="Body.Absent"/>.</summary>
    public static string With(string sound, params ReadOnlySpan<(string Place, string Json)> edits)
    {
        var document = JsonNode.Parse(sound)!;
        foreach (var (place, json) in edits)
        {
            var steps = place.Split('/')[1..];
            var parent = steps[..^1].Aggregate(document, (node, step) => node is JsonArray list ? list[int.Parse(step, CultureInfo.InvariantCulture)]! : node[step]!);
            switch (parent)
            {
                case JsonArray items when steps[^1] == "-":
                    items.Add(JsonNode.Parse(json));
                    break;
                case JsonArray items when json == Body.Absent:
                    items.RemoveAt(int.Parse(steps[^1], CultureInfo.InvariantCulture));
                    break;
                case JsonArray items:
                    items[int.Parse(steps[^1], CultureInfo.InvariantCulture)] = JsonNode.Parse(json);
                    break;
                default:
                    if (json == Body.Absent)
                    {
                        parent.AsObject().Remove(steps[^1]);
                    }
                    else
                    {
                        parent[steps[^1]] = JsonNode.Parse(json);
                    }

                    break;
            }
        }

        return document.ToJsonString();
    }

    /// <summary>A lot of relative compactions with one rule.</summary>
    public static string Of(string rule, params IEnumerable<double> compactions) =>
        $$"""{"lotRules":[{{rule}}],"tests":[{{string.Join(',', compactions.Select(value => string.Create(CultureInfo.InvariantCulture, $$"""{"relativeCompaction":{{value:R}}}""")))}}]}""";
}
