using System.Globalization;
using System.Text.Json.Nodes;
using Drypeak.Service.Tests.Laboratory;

namespace Drypeak.Service.Tests.Earthwork;

/// <summary>The jobs of planning the work, and bodies for them.</summary>
internal static class EarthworkJobs
{
    public const string SpecimenWater = "/v1/earthwork/specimen-water";
    public const string LiftWater = "/v1/earthwork/lift-water";
    public const string Quantities = "/v1/earthwork/quantities";
    public const string TestLocations = "/v1/earthwork/test-locations";
    public const string RollerOutput = "/v1/earthwork/roller-output";
    public const string TestStrip = "/v1/earthwork/test-strip";

    /// <summary>A whole, sound body of each job, in round numbers.</summary>
    public static string Sound(string address) => address switch
    {
        SpecimenWater => """{"units":{"mass":"g"},"waterDensity":1,"portions":[{"label":"a","wetMass":2200,"waterContent":10,"target":14},{"label":"b","wetMass":2160,"waterContent":8,"target":16}]}""",
        LiftWater => """{"units":{"mass":"kg","length":"m"},"waterDensity":1,"area":500,"thickness":0.2,"dryDensity":1.8,"waterContent":9,"target":12,"evaporationAllowance":0.5,"tanker":3000}""",
        Quantities => """{"units":{"mass":"kg"},"waterDensity":1,"fill":{"volume":1000,"dryDensity":1.8,"waterContent":13},"borrow":{"dryDensity":1.5,"waterContent":10},"loose":{"swell":25},"truck":{"volume":12,"mass":16000},"fleet":{"loadingTime":4,"dumpTime":2,"haulSpeed":30,"returnSpeed":30,"distance":1000}}""",
        TestLocations => """{"units":{"length":"m"},"seed":7,"area":{"length":200,"width":12,"startStation":1000},"lifts":3,"frequency":{"volume":150},"liftThickness":0.25}""",
        RollerOutput => """{"units":{"length":"m"},"width":2,"overlap":0.2,"speed":5,"liftThickness":0.25,"passes":6,"efficiency":0.8}""",
        TestStrip => """{"readings":[{"passes":2,"dryDensity":[1.70,1.71,1.69]},{"passes":4,"dryDensity":[1.79,1.80,1.78]},{"passes":6,"dryDensity":[1.825,1.835,1.815]},{"passes":8,"dryDensity":[1.838,1.848,1.828]}],"leastGain":0.01}""",
        _ => throw new ArgumentOutOfRangeException(nameof(address)),
    };

    /// <summary>The sound body with values set, added, or taken out where the text is <see cref="Body.Absent"/>.</summary>
    public static string With(string address, params ReadOnlySpan<(string Place, string Json)> edits)
    {
        var document = JsonNode.Parse(Sound(address))!;
        foreach (var (place, json) in edits)
        {
            var steps = place.Split('/')[1..];
            var parent = steps[..^1].Aggregate(document, (node, step) => node is JsonArray list ? list[int.Parse(step, CultureInfo.InvariantCulture)]! : node[step] ??= new JsonObject());
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
}
