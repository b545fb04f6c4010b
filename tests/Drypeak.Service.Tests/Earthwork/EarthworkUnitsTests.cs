using System.Globalization;
using System.Text.Json;
using Drypeak.Service.Tests.Laboratory;
using Xunit;

namespace Drypeak.Service.Tests.Earthwork;

/// <summary>The same work asked for in other units is the same work.</summary>
public sealed class EarthworkUnitsTests(RunningService service)
{
    private const double Foot = 0.3048;
    private const double CubicFoot = Foot * Foot * Foot;
    private const double Pound = 0.45359237;
    private const double Gallon = 231 * CubicFoot / 1728;

    private static readonly Dictionary<string, (string Unit, double Size)> Densities = new() { ["kg/m3"] = ("kg/m3", 1), ["lb/ft3"] = ("lb/ft3", Pound / CubicFoot), ["kN/m3"] = ("kN/m3", 1000 / 9.80665) };
    private static readonly Dictionary<string, double> Masses = new() { ["g"] = 1e-3, ["kg"] = 1, ["lb"] = Pound, ["t"] = 1000, ["short-ton"] = 2000 * Pound };
    private static readonly Dictionary<string, double> Volumes = new() { ["m3"] = 1, ["L"] = 1e-3, ["ft3"] = CubicFoot, ["yd3"] = 27 * CubicFoot, ["acre-ft"] = 43560 * CubicFoot, ["gal"] = Gallon };
    private static readonly Dictionary<string, double> Areas = new() { ["m2"] = 1, ["ha"] = 1e4, ["ft2"] = Foot * Foot, ["yd2"] = 9 * Foot * Foot, ["acre"] = 43560 * Foot * Foot };
    private static readonly Dictionary<string, double> Lengths = new() { ["mm"] = 1e-3, ["cm"] = 1e-2, ["m"] = 1, ["in"] = Foot / 12, ["ft"] = Foot, ["km"] = 1000, ["mi"] = 5280 * Foot };
    private static readonly Dictionary<string, double> Speeds = new() { ["km/h"] = 1 / 3.6, ["mph"] = 5280 * Foot / 3600 };

    [Theory]
    [InlineData("kg", "kg/m3", "m3", "m3", "m2", "m")]
    [InlineData("lb", "lb/ft3", "yd3", "gal", "yd2", "in")]
    [InlineData("short-ton", "lb/ft3", "acre-ft", "acre-ft", "acre", "ft")]
    [InlineData("t", "kN/m3", "ft3", "ft3", "ha", "cm")]
    [InlineData("g", "kN/m3", "L", "L", "ft2", "mm")]
    public async Task Water_for_a_lift(string mass, string density, string bulk, string liquid, string area, string length)
    {
        var answer = await service.AnswerAsync(EarthworkJobs.LiftWater, $$"""
            {"units":{"mass":"{{mass}}","density":"{{density}}","bulkVolume":"{{bulk}}","liquid":"{{liquid}}","area":"{{area}}","length":"{{length}}"},"waterDensity":{{T(1000 / Densities[density].Size)}},
             "area":{{T(500 / Areas[area])}},"thickness":{{T(0.2 / Lengths[length])}},"dryDensity":{{T(1800 / Densities[density].Size)}},"waterContent":9,"target":12,"evaporation":{"rate":{{T(0.0006 / Lengths[length])}},"hours":3},
             "tanker":{{T(3 / Volumes[liquid])}},"uncertainty":{"dryDensity":{{T(20 / Densities[density].Size)}}} }
            """);
        AssertSi(6300, answer.Number("/total/mass") * Masses[mass]);
        AssertSi(6.3, answer.Number("/total/liquid") * Volumes[liquid]);
        AssertSi(63, answer.Number("/perVolume/mass") * Masses[mass] / Volumes[bulk]);
        AssertSi(0.0126, answer.Number("/perArea/liquid") * Volumes[liquid] / Areas[area]);
        AssertSi(60, answer.Number("/uncertainty/total/mass") * Masses[mass]);
        Assert.Equal(3, answer.Number("/tankerLoads"));
        Assert.Empty(answer.Findings());
    }

    [Theory]
    [InlineData("kg", "kg/m3", "m3", "m", "km/h")]
    [InlineData("lb", "lb/ft3", "yd3", "ft", "mph")]
    [InlineData("t", "kN/m3", "acre-ft", "km", "km/h")]
    [InlineData("short-ton", "lb/ft3", "ft3", "mi", "mph")]
    public async Task Quantities_and_haulage(string mass, string density, string bulk, string distance, string speed)
    {
        var answer = await service.AnswerAsync(EarthworkJobs.Quantities, $$"""
            {"units":{"mass":"{{mass}}","density":"{{density}}","bulkVolume":"{{bulk}}","distance":"{{distance}}","speed":"{{speed}}"},"trace":true,
             "fill":{"volume":{{T(1000 / Volumes[bulk])}},"dryDensity":{{T(1800 / Densities[density].Size)}},"waterContent":13},"borrow":{"wetDensity":{{T(1650 / Densities[density].Size)}},"waterContent":10},
             "loose":{"wetDensity":{{T(1320 / Densities[density].Size)}}},"truck":{"volume":{{T(12 / Volumes[bulk])}},"mass":{{T(16000 / Masses[mass])}} },
             "fleet":{"loadingTime":4,"dumpTime":2,"haulSpeed":{{T(30 / 3.6 / Speeds[speed])}},"returnSpeed":{{T(30 / 3.6 / Speeds[speed])}},"distance":{{T(1000 / Lengths[distance])}} } }
            """);
        AssertSi(1.8e6, answer.Number("/dryMass") * Masses[mass]);
        AssertSi(1200, answer.Number("/borrow/volume") * Volumes[bulk]);
        AssertSi(1500, answer.Number("/loose/volume") * Volumes[bulk]);
        AssertSi(54000, answer.Number("/water/toAdd/mass") * Masses[mass]);
        AssertSi(45, answer.Number("/water/perBorrowVolume/mass") * Masses[mass] / Volumes[bulk]);
        AssertSi(20, answer.Number("/shrinkage/ofFill"));
        AssertSi(10, answer.Number("/fleet/0/cycleTime"));
        Assert.Equal((125, 124), (answer.Number("/truckloads/byVolume"), answer.Number("/truckloads/byMass")));
        Assert.All(answer.GetProperty("trace").EnumerateArray().Where(step => step.Text("/substitution") is { }), step =>
            Assert.Equal(step.Number("/value"), Arithmetic.Value(step.Text("/substitution")!), 1e-9 * Math.Max(1, Math.Abs(step.Number("/value")))));
    }

    [Theory]
    [InlineData("m", "m2", "m3")]
    [InlineData("ft", "yd2", "yd3")]
    [InlineData("in", "acre", "acre-ft")]
    [InlineData("mm", "ha", "L")]
    public async Task Test_locations(string length, string area, string bulk)
    {
        async Task<JsonElement> InAsync(string l, string a, string v, string frequency) => await service.AnswerAsync(EarthworkJobs.TestLocations, $$"""
            {"units":{"length":"{{l}}","area":"{{a}}","bulkVolume":"{{v}}"},"seed":11,"lifts":3,"liftThickness":{{T(0.25 / Lengths[l])}},"frequency":{{frequency}},
             "area":{"outline":[{{Corner(1000, 0, l)}},{{Corner(1100, -4, l)}},{{Corner(1180, 14, l)}},{{Corner(1010, 12, l)}}],"exclusions":[{"outline":[{{Corner(1050, -9, l)}},{{Corner(1060, -9, l)}},{{Corner(1060, 30, l)}}] } ] } }
            """);
        foreach (var (inSi, inUnit) in new[] { ("""{"volume":50}""", $$"""{"volume":{{T(50 / Volumes[bulk])}}}"""), ("""{"area":200}""", $$"""{"area":{{T(200 / Areas[area])}}}""") })
        {
            var (one, other) = (await InAsync("m", "m2", "m3", inSi), await InAsync(length, area, bulk, inUnit));
            Assert.Equal(one.Number("/count"), other.Number("/count"));
            AssertSi(one.Number("/openArea"), other.Number("/openArea") * Areas[area]);
            Assert.All(one.Numbers("/locations", "station").Zip(other.Numbers("/locations", "station")), pair => Assert.Equal(pair.First, pair.Second * Lengths[length], 1e-9 * pair.First));
            Assert.All(one.Numbers("/locations", "offset").Zip(other.Numbers("/locations", "offset")), pair => Assert.Equal(pair.First, pair.Second * Lengths[length], 1e-7));
        }
    }

    private static string Corner(double station, double offset, string length) => $"[{T(station / Lengths[length])},{T(offset / Lengths[length])}]";

    private static void AssertSi(double expected, double actual) => Assert.Equal(expected, actual, 1e-9 * Math.Abs(expected));

    private static string T(double number) => number.ToString("R", CultureInfo.InvariantCulture);
}
