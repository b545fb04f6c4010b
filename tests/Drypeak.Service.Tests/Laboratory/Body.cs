using System.Globalization;
using System.Text.Json.Nodes;

namespace Drypeak.Service.Tests.Laboratory;

/// <summary>Bodies for the tests: one sound test from Ternmarsh, and that test with places changed.</summary>
internal static class Body
{
    /// <summary>Stands for the value of a member that is to be taken out.</summary>
    public const string Absent = "absent";

    /// <summary>Five specimens with round water contents: 10, 12, 14, 16 and 18 %.</summary>
    public const string Sound = """
        {
          "reference": "Ternmarsh, borrow area 2, sample 1",
          "method": "astm-d698-a",
          "units": { "mass": "g", "volume": "cm3", "density": "Mg/m3" },
          "mold": { "mass": 4250.0, "volume": 943.0 },
          "specificGravity": { "value": 2.70, "determined": "measured" },
          "specimens": [
            { "label": "1", "moldAndWetSoil": 6064.2, "tins": [ { "tin": 30.0, "wet": 140.0, "dry": 130.0 } ] },
            { "label": "2", "moldAndWetSoil": 6173.3, "tins": [ { "tin": 31.0, "wet": 143.0, "dry": 131.0 } ] },
            { "label": "3", "moldAndWetSoil": 6250.6, "tins": [ { "tin": 32.0, "wet": 146.0, "dry": 132.0 } ] },
            { "label": "4", "moldAndWetSoil": 6251.8, "tins": [ { "tin": 33.0, "wet": 149.0, "dry": 133.0 } ] },
            { "label": "5", "moldAndWetSoil": 6219.5, "tins": [ { "tin": 34.0, "wet": 152.0, "dry": 134.0 } ] }
          ]
        }
        """;

    /// <summary>The sound test with values set (or added, or taken out) at the places of JSON pointers.</summary>
    public static string With(params ReadOnlySpan<(string Place, string Json)> edits)
    {
        var document = JsonNode.Parse(Sound)!;
        foreach (var (place, json) in edits)
        {
            Set(document, place, json);
        }

        return document.ToJsonString();
    }

    /// <summary>The sound test with one value set at a place.</summary>
    public static string With(string place, string json) => With((place, json));

    /// <summary>The sound test with other specimens.</summary>
    public static string WithSpecimens(params IEnumerable<string> specimens) => With("/specimens", $"[{string.Join(',', specimens)}]");

    /// <summary>The sound test with specimens that begin at water content, %, and dry density, Mg/m³.</summary>
    public static string WithPoints(params IEnumerable<(double WaterContent, double DryDensity)> points) => WithSpecimens(points.Select(Point));

    /// <summary>A specimen that begins at water content and dry density.</summary>
    public static string Point((double WaterContent, double DryDensity) point) =>
        string.Create(CultureInfo.InvariantCulture, $$"""{"waterContent":{{point.WaterContent:R}},"dryDensity":{{point.DryDensity:R}}}""");

    private static void Set(JsonNode document, string place, string json)
    {
        var steps = place.Split('/')[1..];
        var parent = steps[..^1].Aggregate(document, (node, step) => node is JsonArray list ? list[int.Parse(step, CultureInfo.InvariantCulture)]! : node[step]!);
        switch (parent, json)
        {
            case (JsonObject members, Absent):
                members.Remove(steps[^1]);
                break;
            case (JsonObject members, _):
                members[steps[^1]] = JsonNode.Parse(json);
                break;
            case (JsonArray list, Absent):
                list.RemoveAt(int.Parse(steps[^1], CultureInfo.InvariantCulture));
                break;
            case (JsonArray list, _) when steps[^1] == "-":
                list.Add(JsonNode.Parse(json));
                break;
            case (JsonArray list, _):
                list[int.Parse(steps[^1], CultureInfo.InvariantCulture)] = JsonNode.Parse(json);
                break;
        }
    }
}
