using System.Globalization;
using System.Text.Json;
using Drypeak.Service.Tests.Laboratory;
using Xunit;

namespace Drypeak.Service.Tests.Earthwork;

public sealed class EarthworkAnswersTests(RunningService service)
{
    public static TheoryData<string> Jobs =>
    [
        EarthworkJobs.SpecimenWater, EarthworkJobs.LiftWater, EarthworkJobs.Quantities, EarthworkJobs.TestLocations, EarthworkJobs.RollerOutput, EarthworkJobs.TestStrip,
    ];

    [Theory]
    [MemberData(nameof(Jobs))]
    public async Task An_answer_carries_what_every_answer_carries(string address)
    {
        var answer = await service.AnswerAsync(address, EarthworkJobs.With(address, ("/reference", "\"Ternmarsh, reach 2\""), ("/identification", """{"project":"Ternmarsh"}""")));
        Assert.Equal("Ternmarsh, reach 2", answer.Text("/reference"));
        Assert.Equal("Ternmarsh", answer.Text("/identification/project"));
        Assert.Equal(
            ["area", "bulkVolume", "density", "distance", "length", "liquid", "mass", "speed", "tinMass", "volume"],
            answer.GetProperty("units").EnumerateObject().Where(unit => unit.Value.ValueKind == JsonValueKind.String).Select(unit => unit.Name).Order(StringComparer.Ordinal));
        Assert.StartsWith("sha256:", answer.Text("/provenance/inputDigest"), StringComparison.Ordinal);
        Assert.Contains(answer.GetProperty("cautions").EnumerateArray(), caution => caution.GetString()!.Contains("Local codes", StringComparison.Ordinal));
        Assert.False(answer.Has("trace"));
        Assert.DoesNotContain(answer.At("/findings").EnumerateArray(), finding => finding.Text("/severity") is "error" or "warning");
    }

    [Theory]
    [MemberData(nameof(Jobs))]
    public async Task Each_step_of_the_working_can_be_followed_by_hand(string address)
    {
        var answer = await service.AnswerAsync(address, EarthworkJobs.With(address, ("/trace", "true")));
        var steps = answer.GetProperty("trace").EnumerateArray().ToList();
        Assert.True(steps.Count >= 3);
        Assert.All(steps, step =>
        {
            if (step.Text("/substitution") is { } substitution)
            {
                Assert.Equal(step.Number("/value"), Arithmetic.Value(substitution), 1e-9 * Math.Max(1, Math.Abs(step.Number("/value"))));
            }

            Assert.NotEqual("", step.Text("/source"));
            Assert.StartsWith("<math", step.Text("/mathml"), StringComparison.Ordinal);
        });
    }

    [Fact]
    public async Task Specimens_get_water_by_mass_and_volume()
    {
        var answer = await service.AnswerAsync(EarthworkJobs.SpecimenWater, EarthworkJobs.Sound(EarthworkJobs.SpecimenWater));
        Assert.Equal([2000.0, 2000.0], answer.Numbers("/portions", "dryMass"), Close);
        Assert.Equal([2280.0, 2320.0], answer.Numbers("/portions", "finalMass"), Close);
        Assert.Equal(80, answer.Number("/portions/0/waterToAdd/mass"), 1e-9);
        Assert.Equal(0.08, answer.Number("/portions/0/waterToAdd/liquid"), 1e-12);
    }

    [Fact]
    public async Task Equal_portions_are_one_mass_and_a_list_of_targets()
    {
        var answer = await service.AnswerAsync(EarthworkJobs.SpecimenWater, """{"waterDensity":1,"wetMass":2200,"waterContent":10,"targets":[8,10,12]}""");
        Assert.Equal([8.0, 10.0, 12.0], answer.Numbers("/portions", "target"));
        Assert.Equal(["1", "2", "3"], answer.GetProperty("portions").EnumerateArray().Select(portion => portion.Text("/label")));
        Assert.Equal([-40.0, 0.0, 40.0], answer.GetProperty("portions").EnumerateArray().Select(portion => portion.Number("/waterToAdd/mass")), Close);
        var dryBack = answer.Finding("dry-back");
        Assert.Equal("/targets/0", dryBack.Text("/pointer"));
        Assert.Contains("2160 g", dryBack.Text("/message"), StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("""{"optimumWaterContent":14}""", new[] { 10.0, 12, 14, 16, 18 })]
    [InlineData("""{"optimumWaterContent":14,"count":4,"spacing":1.5}""", new[] { 11.75, 13.25, 14.75, 16.25 })]
    [InlineData("""{"plasticLimit":20}""", new[] { 14.4, 16.4, 18.4, 20.4, 22.4 })]
    public async Task Targets_are_proposed_around_an_expected_optimum_and_said_to_be(string expected, double[] targets)
    {
        var answer = await service.AnswerAsync(EarthworkJobs.SpecimenWater, $$"""{"wetMass":2200,"waterContent":5,"trace":true,"expected":{{expected}}}""");
        Assert.All(answer.GetProperty("trace").EnumerateArray(), step => Assert.Equal(step.Number("/value"), Arithmetic.Value(step.Text("/substitution")!), 1e-9 * Math.Max(1, Math.Abs(step.Number("/value")))));
        Assert.Equal(targets, answer.Numbers("/portions", "target"), Close);
        var fromLimit = expected.Contains("plastic", StringComparison.Ordinal);
        Assert.Equal(fromLimit, answer.Finding("targets-proposed").Text("/basis")!.Contains("Gurtug", StringComparison.Ordinal));
        Assert.Equal(fromLimit, answer.Text("/expected/basis")!.Contains("from memory", StringComparison.Ordinal));
        Assert.Equal(fromLimit, !answer.IsNull("/expected/maximumDryDensity"));
    }

    /// <summary>By hand: 100 m³ at 1.8 Mg/m³ are 180 t of solids; 12 + 0.5 − 9 = 3.5 % of them are 6300 kg.</summary>
    [Fact]
    public async Task A_lift_gets_water_for_each_cubic_meter_in_all_by_area_and_by_tanker()
    {
        var answer = await service.AnswerAsync(EarthworkJobs.LiftWater, EarthworkJobs.Sound(EarthworkJobs.LiftWater));
        Assert.Equal(6300, answer.Number("/total/mass"), 1e-6);
        Assert.Equal(6300, answer.Number("/total/liquid"), 1e-6);
        Assert.Equal(63, answer.Number("/perVolume/mass"), 1e-9);
        Assert.Equal(12.6, answer.Number("/perArea/liquid"), 1e-9);
        Assert.Equal(3, answer.Number("/tankerLoads"));
        Assert.True(answer.IsNull("/uncertainty"));
    }

    [Fact]
    public async Task A_lift_that_is_too_wet_has_water_to_lose_and_no_loads()
    {
        var answer = await service.AnswerAsync(EarthworkJobs.LiftWater, EarthworkJobs.With(EarthworkJobs.LiftWater, ("/waterContent", "15")));
        Assert.Equal(-4500, answer.Number("/total/mass"), 1e-6);
        Assert.Equal(0, answer.Number("/tankerLoads"));
        Assert.Equal("/target", answer.Finding("water-to-lose").Text("/pointer"));
    }

    /// <summary>0.6 mm an hour over 3 hours on 500 m² are 0.9 m³; 0.4 points of 180 t are 720 kg.</summary>
    [Fact]
    public async Task Evaporation_may_be_a_rate_and_uncertain_water_contents_make_the_water_uncertain()
    {
        var answer = await service.AnswerAsync(EarthworkJobs.LiftWater, EarthworkJobs.With(EarthworkJobs.LiftWater,
            ("/evaporationAllowance", Body.Absent), ("/evaporation", """{"rate":0.0006,"hours":3}"""), ("/uncertainty", """{"waterContent":0.4}""")));
        Assert.Equal(5400 + 900, answer.Number("/total/mass"), 1e-6);
        Assert.Equal(720, answer.Number("/uncertainty/total/mass"), 1e-9);
        Assert.Equal(7.2, answer.Number("/uncertainty/perVolume/liquid"), 1e-9);
    }

    /// <summary>By hand: 1800 t of solids; bank 1200 m³, loose 1500 m³, wet 1980 t; water 3 % of 1800 t; 125 loads of 12 m³, 123.75 of 16 t.</summary>
    [Fact]
    public async Task Quantities_of_one_borrow()
    {
        var answer = await service.AnswerAsync(EarthworkJobs.Quantities, EarthworkJobs.Sound(EarthworkJobs.Quantities));
        Assert.Equal(1_800_000, answer.Number("/dryMass"), 1e-3);
        Assert.Equal(1200, answer.Number("/borrow/volume"), 1e-9);
        Assert.Equal(1_980_000, answer.Number("/borrow/wetMass"), 1e-3);
        Assert.Equal(180_000, answer.Number("/borrow/waterMass"), 1e-3);
        Assert.Equal(1500, answer.Number("/loose/volume"), 1e-9);
        Assert.Equal(54_000, answer.Number("/water/toAdd/mass"), 1e-3);
        Assert.Equal(45, answer.Number("/water/perBorrowVolume/mass"), 1e-9);
        Assert.Equal(54, answer.Number("/water/perFillVolume/liquid"), 1e-9);
        Assert.Equal(100 / 6.0, answer.Number("/shrinkage/ofBorrow"), 1e-9);
        Assert.Equal(20, answer.Number("/shrinkage/ofFill"), 1e-9);
        Assert.Equal((25, 20), (Math.Round(answer.Number("/swell"), 9), Math.Round(answer.Number("/swellOfLoose"), 9)));
        Assert.Equal((125, 124, "volume"), (answer.Number("/truckloads/byVolume"), answer.Number("/truckloads/byMass"), answer.Text("/truckloads/governing")));
        Assert.Equal(10, answer.Number("/fleet/0/cycleTime"), 1e-9); // 4 + 2 + 2 + 2 minutes
        Assert.Equal((3, "trucks", 15), (answer.Number("/fleet/0/trucksToBalance"), answer.Text("/fleet/0/waits"), answer.Number("/fleet/0/loadsPerHour")));
        Assert.Equal(125 / 15.0, answer.Number("/fleet/0/hours"), 1e-9);
        Assert.True(answer.IsNull("/borrowAreas"));
        Assert.Equal(0, answer.Number("/fillNotServed"));
    }

    [Fact]
    public async Task A_loose_density_may_be_wet_at_the_water_content_of_the_truck()
    {
        string With(string loose) => EarthworkJobs.With(EarthworkJobs.Quantities, ("/loose", loose));
        Assert.Equal(1500, (await service.AnswerAsync(EarthworkJobs.Quantities, With("""{"wetDensity":1.32}"""))).Number("/loose/volume"), 1e-9);
        var dried = await service.AnswerAsync(EarthworkJobs.Quantities, With("""{"wetDensity":1.296,"waterContent":8}"""));
        Assert.Equal(1500, dried.Number("/loose/volume"), 1e-9);
        Assert.Equal(1_800_000 * 1.08, dried.Number("/loose/wetMass"), 1e-3);
        Assert.Contains("dries-in-haul", dried.Findings());
    }

    [Fact]
    public async Task The_nearest_borrow_area_gives_first_and_what_is_short_is_said()
    {
        const string fill = """ "waterDensity":1,"units":{"mass":"t","distance":"km"},"fill":{"volume":1000,"dryDensity":1.8,"waterContent":12},"truck":{"volume":10},"loose":{"swell":20} """;
        var answer = await service.AnswerAsync(EarthworkJobs.Quantities, $$"""
            { {{fill}}, "borrowAreas":[{"label":"far","dryDensity":1.6,"waterContent":14,"capacity":700,"haulDistance":3},{"label":"near","dryDensity":1.5,"waterContent":9,"capacity":400,"haulDistance":1}] }
            """);
        Assert.Equal([700.0, 400.0], answer.Numbers("/borrowAreas", "volume"), Close);
        Assert.Equal([0.0, 0.0], answer.Numbers("/borrowAreas", "capacityLeft"), Close);
        Assert.Equal((1800 - 1120 - 600) / 1.8, answer.Number("/fillNotServed"), 1e-9);
        Assert.Equal((84 + 48, "volume"), (answer.Number("/truckloads/byVolume"), answer.Text("/truckloads/governing")));
        Assert.Equal(["borrow-short", "water-both-ways"], answer.Findings());
        Assert.Equal((1120 * -0.02) + (600 * 0.03), answer.Number("/water/toAdd/mass"), 1e-9);

        var shared = await service.AnswerAsync(EarthworkJobs.Quantities, $$"""
            { {{fill}}, "borrowAreas":[{"dryDensity":1.6,"waterContent":9,"share":75},{"dryDensity":1.5,"waterContent":9,"share":25}] }
            """);
        Assert.Equal([75.0, 25.0], shared.Numbers("/borrowAreas", "share"), Close);
        Assert.Equal([1350 / 1.6, 450 / 1.5], shared.Numbers("/borrowAreas", "volume"), Close);
    }

    [Fact]
    public async Task The_same_strip_in_other_units_and_order_says_the_same()
    {
        var metric = await service.AnswerAsync(EarthworkJobs.TestStrip, EarthworkJobs.Sound(EarthworkJobs.TestStrip));
        const double pound = 0.45359237 / (0.3048 * 0.3048 * 0.3048) / 1000;
        string List(params double[] densities) => string.Join(',', densities.Select(density => (density / pound).ToString("R", CultureInfo.InvariantCulture)));
        var imperial = await service.AnswerAsync(EarthworkJobs.TestStrip, $$"""
            {"units":{"density":"lb/ft3"},"leastGain":{{List(0.01)}},"readings":[
              {"passes":8,"dryDensity":[{{List(1.848, 1.838, 1.828)}}]},{"passes":2,"dryDensity":[{{List(1.69, 1.70, 1.71)}}]},
              {"passes":6,"dryDensity":[{{List(1.825, 1.835, 1.815)}}]},{"passes":4,"dryDensity":[{{List(1.78, 1.79, 1.80)}}]}]}
            """);
        Assert.Equal(metric.Number("/passes"), imperial.Number("/passes"));
        foreach (var place in (string[])["/target/dryDensity", "/target/standardDeviation", "/curve/limit", "/curve/reserve", "/curve/rootMeanSquareError", "/stages/3/gainOfOneMore"])
        {
            Assert.Equal(metric.Number(place), imperial.Number(place) * pound, 1e-9 * metric.Number(place));
        }

        Assert.Equal(metric.Number("/curve/scale"), imperial.Number("/curve/scale"), 1e-9 * metric.Number("/curve/scale"));
    }

    [Fact]
    public async Task A_strip_may_be_read_wet()
    {
        var answer = await service.AnswerAsync(EarthworkJobs.TestStrip, """{"leastGain":0.01,"readings":[{"passes":2,"wetDensity":[1.98,2.0],"waterContent":10}]}""");
        Assert.Equal([1.8, 2.0 / 1.1], answer.GetProperty("stages")[0].GetProperty("dryDensities").EnumerateArray().Select(density => density.GetDouble()), Close);
        Assert.True(answer.IsNull("/curve"));
        Assert.True(answer.IsNull("/passes"));
        Assert.Equal(["too-few-passes", "too-few-readings"], answer.Findings());
    }

    [Fact]
    public async Task A_roller_without_an_efficiency_rolls_all_of_the_hour_and_it_is_said()
    {
        var answer = await service.AnswerAsync(EarthworkJobs.RollerOutput, EarthworkJobs.With(EarthworkJobs.RollerOutput, ("/efficiency", Body.Absent)));
        Assert.Equal(1500, answer.Number("/areaPerHour"), 1e-9);
        Assert.Equal(375, answer.Number("/volumePerHour"), 1e-9);
        Assert.Equal(["efficiency-not-given"], answer.Findings());
    }

    /// <summary>A change to the sound body that provokes a finding, and one that comes near and does not.</summary>
    [Theory]
    [InlineData(EarthworkJobs.SpecimenWater, "dry-back", "/portions/0/target", "9.9", "10")]
    [InlineData(EarthworkJobs.LiftWater, "water-to-lose", "/waterContent", "12.6", "12.5")]
    [InlineData(EarthworkJobs.LiftWater, "much-water", "/target", "13.6", "13.5")]
    [InlineData(EarthworkJobs.LiftWater, "lift-thickness-unusual", "/thickness", "1.01", "1")]
    [InlineData(EarthworkJobs.LiftWater, "lift-thickness-unusual", "/thickness", "0.049", "0.05")]
    [InlineData(EarthworkJobs.LiftWater, "impossible-density", "/dryDensity", "2.81", "2.8")]
    [InlineData(EarthworkJobs.LiftWater, "bulk-volume-unit-not-given", "/units/volume", "\"yd3\"", "null")]
    [InlineData(EarthworkJobs.Quantities, "water-to-lose", "/borrow/waterContent", "13.1", "13")]
    [InlineData(EarthworkJobs.Quantities, "fill-looser-than-borrow", "/borrow/dryDensity", "1.81", "1.8")]
    [InlineData(EarthworkJobs.Quantities, "loose-denser-than-bank", "/loose", """{"dryDensity":1.51}""", """{"dryDensity":1.5}""")]
    [InlineData(EarthworkJobs.Quantities, "loose-density-missing", "/loose", Body.Absent, """{"swell":0}""")]
    [InlineData(EarthworkJobs.Quantities, "efficiency-not-given", "/fleet/efficiency", Body.Absent, "0.8")]
    [InlineData(EarthworkJobs.TestLocations, "area-small", "/area", """{"length":3,"width":3}""", """{"length":5,"width":2}""")]
    [InlineData(EarthworkJobs.TestLocations, "lift-thickness-unusual", "/liftThickness", "2", "0.3")]
    [InlineData(EarthworkJobs.RollerOutput, "roller-fast", "/speed", "12.1", "12")]
    [InlineData(EarthworkJobs.TestStrip, "too-few-readings", "/readings/0/dryDensity", "[1.7,1.7]", "[1.69,1.7,1.71]")]
    [InlineData(EarthworkJobs.TestStrip, "density-falls", "/readings/3/dryDensity", "[1.80,1.79,1.81]", "[1.82,1.81,1.83]")]
    [InlineData(EarthworkJobs.TestStrip, "still-gaining", "/leastGain", "0.001", "0.01")]
    public async Task What_is_not_likely_is_found_and_what_comes_near_it_is_not(string address, string code, string place, string json, string nearJson)
    {
        Assert.Contains(code, (await service.AnswerAsync(address, EarthworkJobs.With(address, (place, json)))).Findings());
        Assert.DoesNotContain(code, (await service.AnswerAsync(address, EarthworkJobs.With(address, (place, nearJson)))).Findings());
    }

    [Fact]
    public async Task Fractions_for_percent_are_found() =>
        Assert.Contains("fractions-for-percent", (await service.AnswerAsync(EarthworkJobs.LiftWater, EarthworkJobs.With(EarthworkJobs.LiftWater, ("/waterContent", "0.09"), ("/target", "0.12")))).Findings());

    /// <summary>Hot tins and carbide gas come with their caution.</summary>
    [Fact]
    public async Task How_the_water_content_was_found_brings_its_caution()
    {
        var answer = await service.AnswerAsync(EarthworkJobs.LiftWater, EarthworkJobs.With(EarthworkJobs.LiftWater, ("/waterContent", Body.Absent), ("/carbide", """{"reading":8.3}""")));
        Assert.Contains(answer.GetProperty("cautions").EnumerateArray(), caution => caution.GetString()!.Contains("flammable", StringComparison.Ordinal));
        Assert.Equal(100 * 8.3 / 91.7, (await service.AnswerAsync(EarthworkJobs.SpecimenWater, """{"wetMass":1000,"carbide":{"reading":8.3},"targets":[12]}""")).Number("/portions/0/waterContent"), 1e-9);
    }

    private static bool Close(double expected, double actual) => Math.Abs(expected - actual) < 1e-9;
}
