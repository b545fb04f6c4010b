using System.Globalization;
using System.Text.Json;
using Drypeak.Service.Tests.Laboratory;
using Xunit;

namespace Drypeak.Service.Tests.Field;

public sealed class FieldDensityTests(RunningService service)
{
    private const double SoundDry = 3120.5 / ((6420.0 - 2710 - 1530) / 1.42) / 1.12;

    [Fact]
    public async Task A_sand_cone_gives_the_soil_in_place_and_each_ratio()
    {
        var answer = await AnswerAsync(FieldJobs.Sound);
        Assert.Equal(2180 / 1.42, answer.Number("/test/volume"), 1e-9);
        Assert.Equal(SoundDry, answer.Number("/test/dryDensity"), 1e-12);
        Assert.Equal(100 * SoundDry / 1.90, answer.Number("/relativeCompaction"), 1e-9);
        Assert.Equal(-0.5, answer.Number("/waterContentFromOptimum"), 1e-9);

        // ρw 0.9982067 Mg/m³ at 20 °C (Tanaka et al. 2001).
        var e = (2.68 * 0.9982067 / SoundDry) - 1;
        Assert.Equal(e, answer.Number("/test/voidRatio"), 1e-6);
        Assert.Equal(100 * e / (1 + e), answer.Number("/test/porosity"), 1e-5);
        Assert.Equal(12 * 2.68 / e, answer.Number("/test/saturation"), 1e-4);
        Assert.Equal((100 * e / (1 + e)) - (12 * SoundDry / 0.9982067), answer.Number("/test/airVoids"), 1e-4);
        Assert.Equal("sand-cone", answer.Text("/method"));
        Assert.True(answer.IsNull("/relativeDensity"));
        Assert.False(answer.At("/laboratory/correctedForOversize").GetBoolean());
    }

    /// <summary>The same hole of 1000 cm³ and 2000 g of soil, by every form of every method.</summary>
    [Theory]
    [InlineData("sand-cone", "sandCone", """{"sandInHole":1420,"sandDensity":1.42}""")]
    [InlineData("sand-cone", "sandCone", """{"before":4000,"after":1080,"coneAndPlate":1500,"sandDensity":1.42}""")]
    [InlineData("sand-cone", "sandCone", """{"before":4000,"after":1160,"coneVolume":1000,"sandDensity":1.42}""")]
    [InlineData("sand-cone", "sandCone", """{"sandInHole":1420,"calibration":{"containerVolume":2000,"sandMass":2840}}""")]
    [InlineData("sand-cone", "sandCone", """{"sandInHole":1420,"calibration":{"containerVolume":2000,"before":6000,"after":1660,"coneAndPlate":1500}}""")]
    [InlineData("sand-cone", "sandCone", """{"releasedVolume":2077,"coneVolume":1077}""")]
    [InlineData("sand-cone", "sandCone", """{"releasedVolume":2000,"coneVolume":1000,"sandInHole":1420,"sandDensity":1.42}""")]
    [InlineData("rubber-balloon", "rubberBalloon", """{"initialReading":120,"finalReading":1120}""")]
    [InlineData("drive-cylinder", "driveCylinder", """{"volume":1000}""")]
    [InlineData("water-replacement", "waterReplacement", """{"withHole":1700,"templateOnly":700}""")]
    public async Task Every_form_of_a_volume_gives_the_same_density(string method, string member, string block)
    {
        var answer = await AnswerAsync(FieldJobs.By(method, member, block, ("/soil", """{"wet":2000}"""), ("/waterContent", "25")));
        Assert.Equal(1000, answer.Number("/test/volume"), 1e-9);
        Assert.Equal(2.0, answer.Number("/test/wetDensity"), 1e-12);
        Assert.Equal(1.6, answer.Number("/test/dryDensity"), 1e-12);
    }

    [Fact]
    public async Task A_cylinder_has_its_volume_from_diameter_and_height()
    {
        var answer = await AnswerAsync(FieldJobs.By("drive-cylinder", "driveCylinder", """{"diameter":100,"height":127.3}"""));
        Assert.Equal(Math.PI * 100 * 100 * 127.3 / 4 / 1000, answer.Number("/test/volume"), 1e-9);
    }

    [Theory]
    [InlineData("""{"wet":2000}""", "/waterContent", "25")]
    [InlineData("""{"containerAndWet":2250,"container":250}""", "/waterContent", "25")]
    [InlineData("""{"wet":2000}""", "/wetBasis", "20")]
    [InlineData("""{"wet":2000}""", "/carbide", """{"reading":20}""")]
    [InlineData("""{"wet":2000}""", "/carbide", """{"reading":10,"halfSample":true}""")]
    [InlineData("""{"wet":2000}""", "/tins", """[{"tin":30,"wet":155,"dry":130},{"tin":20,"wet":145,"dry":120}]""")]
    [InlineData("""{"wet":2000,"dry":1600}""", "/trace", "false")]
    [InlineData("""{"dry":1600}""", "/waterContent", "25")]
    public async Task Every_form_of_soil_and_water_content_gives_the_same_dry_density(string soil, string place, string water)
    {
        var answer = await AnswerAsync(FieldJobs.By("drive-cylinder", "driveCylinder", """{"volume":1000}""", ("/waterContent", Body.Absent), ("/soil", soil), (place, water)));
        Assert.Equal(25, answer.Number("/test/waterContent"), 1e-9);
        Assert.Equal(2.0, answer.Number("/test/wetDensity"), 1e-12);
        Assert.Equal(1.6, answer.Number("/test/dryDensity"), 1e-12);
    }

    [Theory]
    [InlineData("""{"wetDensity":2.0}""", "25")]
    [InlineData("""{"dryDensity":1.6}""", "25")]
    [InlineData("""{"wetDensity":2.0,"dryDensity":1.6}""", Body.Absent)]
    public async Task Densities_may_be_given_directly(string block, string water)
    {
        var answer = await AnswerAsync(FieldJobs.By("direct", "direct", block, ("/soil", Body.Absent), ("/waterContent", water)));
        Assert.Equal((25, 2.0, 1.6), (Math.Round(answer.Number("/test/waterContent"), 9), Math.Round(answer.Number("/test/wetDensity"), 12), Math.Round(answer.Number("/test/dryDensity"), 12)));
        Assert.True(answer.IsNull("/test/volume"));
    }

    [Fact]
    public async Task A_dry_density_alone_is_enough_for_the_relative_compaction()
    {
        var answer = await AnswerAsync(FieldJobs.By("direct", "direct", """{"dryDensity":1.805}""", ("/soil", Body.Absent), ("/waterContent", Body.Absent)));
        Assert.Equal(95, answer.Number("/relativeCompaction"), 1e-9);
        Assert.True(answer.IsNull("/waterContentFromOptimum"));
        Assert.Equal(["met", "undecided"], Outcomes(answer));
        Assert.Equal("undecided", answer.Text("/outcome"));
        Assert.Contains("water content", answer.Text("/requirements/1/explanation"), StringComparison.Ordinal);
    }

    /// <summary>K = 1000(w_oven − w_gauge)/(100 + w_gauge) of each pair, its mean; w = w_gauge + K(100 + w_gauge)/1000.</summary>
    [Fact]
    public async Task A_gauge_is_averaged_and_corrected_by_its_oven_pairs()
    {
        var answer = await AnswerAsync(FieldJobs.By("nuclear-gauge", "nuclearGauge",
            """{"wetDensity":[2.0,2.1],"waterContent":[12,14],"ovenPairs":[{"gauge":12,"oven":11},{"gauge":14,"oven":13.5}]}""",
            ("/soil", Body.Absent), ("/waterContent", Body.Absent)));
        var (first, second) = (1000 * -1 / 112.0, 1000 * -0.5 / 114.0);
        var k = (first + second) / 2;
        Assert.Equal(k, answer.Number("/test/moistureOffset/k"), 1e-9);
        Assert.Equal(Math.Abs(first - second) / 2, answer.Number("/test/moistureOffset/standardUncertainty"), 1e-9);
        var w = 13 + (k * 113 / 1000);
        Assert.Equal(w, answer.Number("/test/waterContent"), 1e-9);
        Assert.Equal(2.05 / (1 + (w / 100)), answer.Number("/test/dryDensity"), 1e-9);
        Assert.Equal(0.1 / Math.Sqrt(2), answer.Number("/test/readings/0/standardDeviation"), 1e-9);
        Assert.Equal(0.05, answer.Number("/test/readings/0/standardUncertainty"), 1e-9);
        Assert.Contains("licensed", answer.At("/cautions").GetRawText(), StringComparison.Ordinal);
    }

    [Fact]
    public async Task A_gauge_may_give_water_per_volume()
    {
        var answer = await AnswerAsync(FieldJobs.By("nuclear-gauge", "nuclearGauge", """{"wetDensity":[2.0],"waterDensity":[0.4]}""", ("/soil", Body.Absent), ("/waterContent", Body.Absent)));
        Assert.Equal(25, answer.Number("/test/waterContent"), 1e-9);
        Assert.Equal(1.6, answer.Number("/test/dryDensity"), 1e-12);
        Assert.True(answer.IsNull("/test/readings/0/standardDeviation"));
    }

    [Theory]
    [InlineData("13", false)]
    [InlineData("13.1", true)]
    public async Task Where_oven_and_gauge_both_speak_the_oven_stands_and_a_large_difference_is_found(string oven, bool found)
    {
        var answer = await AnswerAsync(FieldJobs.By("nuclear-gauge", "nuclearGauge", """{"wetDensity":[2.0],"waterContent":[12]}""", ("/soil", Body.Absent), ("/waterContent", oven)));
        Assert.Equal(double.Parse(oven, CultureInfo.InvariantCulture), answer.Number("/test/waterContent"), 1e-9);
        Assert.Equal(found, answer.Findings().Contains("gauge-and-oven-apart"));
    }

    /// <summary>ASTM D4718: ρdT = 1/(Pf/ρdF + Pc/(Gc·ρw)), wT = Pf·wF + Pc·wc; and back for the field.</summary>
    [Fact]
    public async Task Oversize_corrects_the_laboratory_or_the_field()
    {
        const string oversize = """{"percent":20,"specificGravity":2.65,"waterContent":1.5,"apply":"APPLY"}""";
        var laboratory = await AnswerAsync(FieldJobs.With(("/oversize", oversize.Replace("APPLY", "laboratory", StringComparison.Ordinal)), ("/waterDensity", "1")));
        var total = 1 / ((0.8 / 1.90) + (0.2 / 2.65));
        Assert.Equal(total, laboratory.Number("/laboratory/maximumDryDensity"), 1e-9);
        Assert.Equal((0.8 * 12.5) + (0.2 * 1.5), laboratory.Number("/laboratory/optimumWaterContent"), 1e-9);
        Assert.Equal(100 * SoundDry / total, laboratory.Number("/relativeCompaction"), 1e-9);
        Assert.True(laboratory.At("/laboratory/correctedForOversize").GetBoolean());
        Assert.False(laboratory.GetProperty("test").Has("fine"));

        var field = await AnswerAsync(FieldJobs.With(("/oversize", oversize.Replace("APPLY", "field", StringComparison.Ordinal)), ("/waterDensity", "1")));
        var fines = 0.8 / ((1 / SoundDry) - (0.2 / 2.65));
        Assert.Equal(fines, field.Number("/test/fine/dryDensity"), 1e-9);
        Assert.Equal((12 - (0.2 * 1.5)) / 0.8, field.Number("/test/fine/waterContent"), 1e-9);
        Assert.Equal(SoundDry, field.Number("/test/dryDensity"), 1e-12);
        Assert.Equal(100 * fines / 1.90, field.Number("/relativeCompaction"), 1e-9);
        Assert.Equal(((12 - (0.2 * 1.5)) / 0.8) - 12.5, field.Number("/waterContentFromOptimum"), 1e-9);
        Assert.False(field.At("/laboratory/correctedForOversize").GetBoolean());
        Assert.Equal(1.90, field.Number("/laboratory/maximumDryDensity"), 1e-12);
    }

    [Fact]
    public async Task A_minimum_dry_density_gives_the_relative_density()
    {
        var answer = await AnswerAsync(FieldJobs.With(("/laboratory/minimumDryDensity", "1.55")));
        Assert.Equal(100 * 1.90 / SoundDry * (SoundDry - 1.55) / (1.90 - 1.55), answer.Number("/relativeDensity"), 1e-9);
    }

    [Fact]
    public async Task An_embedded_laboratory_test_brings_its_peak_its_uncertainty_and_its_findings()
    {
        var laboratory = await service.AnswerAsync(Body.Sound);
        var answer = await AnswerAsync(FieldJobs.With(("/laboratory", $$"""{"test":{{Body.Sound}}}"""), ("/uncertainty", Body.Absent)));
        var (maximum, standard) = (laboratory.Number("/optimum/maximumDryDensity"), laboratory.Number("/optimum/uncertainty/maximumDryDensity/standard"));
        Assert.Equal(maximum, answer.Number("/laboratory/maximumDryDensity"), 1e-12);
        Assert.Equal(laboratory.Number("/optimum/waterContent"), answer.Number("/laboratory/optimumWaterContent"), 1e-12);
        Assert.Equal(100 * SoundDry / maximum / maximum * standard, answer.Number("/requirements/0/standardUncertainty"), 1e-6);
        Assert.All(laboratory.Findings(), code => Assert.Contains(code, answer.Findings()));
    }

    [Fact]
    public async Task An_embedded_test_in_other_units_is_the_same_reference()
    {
        var other = Body.With("/units", """{"mass":"g","volume":"cm3","density":"lb/ft3"}""");
        var (first, second) = (await AnswerAsync(FieldJobs.With(("/laboratory", $$"""{"test":{{Body.Sound}}}"""))), await AnswerAsync(FieldJobs.With(("/laboratory", $$"""{"test":{{other}}}"""))));
        Assert.Equal(first.Number("/laboratory/maximumDryDensity"), second.Number("/laboratory/maximumDryDensity"), 1e-9);
    }

    [Fact]
    public async Task An_embedded_test_without_a_peak_leaves_the_requirement_undecided()
    {
        var answer = await AnswerAsync(FieldJobs.With(("/laboratory", $$"""{"test":{{Body.WithPoints((10, 1.7), (12, 1.75))}}}""")));
        Assert.Contains("reference-without-peak", answer.Findings());
        Assert.Equal(["undecided", "undecided"], Outcomes(answer));
        Assert.True(answer.IsNull("/relativeCompaction"));
    }

    [Fact]
    public async Task Without_a_specification_there_is_no_outcome()
    {
        var answer = await AnswerAsync(FieldJobs.With(("/specification", Body.Absent)));
        Assert.Equal(0, answer.GetProperty("requirements").GetArrayLength());
        Assert.True(answer.IsNull("/outcome"));
    }

    /// <summary>One body in metric and in pounds and feet: exact factors, so the ratios agree to the arithmetic.</summary>
    [Fact]
    public async Task Units_do_not_matter()
    {
        const double pound = 453.59237, foot = 28316.846592;
        string Number(double value) => value.ToString("R", CultureInfo.InvariantCulture);
        var metric = await AnswerAsync(FieldJobs.Sound);
        var other = await AnswerAsync(FieldJobs.With(
            ("/units", """{"mass":"lb","volume":"ft3","density":"lb/ft3"}"""),
            ("/sandCone", $$"""{"before":{{Number(6420 / pound)}},"after":{{Number(2710 / pound)}},"coneAndPlate":{{Number(1530 / pound)}},"sandDensity":{{Number(1.42 * foot / pound)}}}"""),
            ("/soil/wet", Number(3120.5 / pound)),
            ("/laboratory/maximumDryDensity", Number(1.90 * foot / pound)),
            ("/laboratory/uncertainty/maximumDryDensity", Number(0.010 * foot / pound)),
            ("/uncertainty/dryDensity", Number(0.015 * foot / pound))));
        foreach (var place in new[] { "/relativeCompaction", "/test/saturation", "/test/airVoids", "/requirements/0/standardUncertainty", "/requirements/0/probabilityOfConformance" })
        {
            Assert.Equal(metric.Number(place), other.Number(place), 1e-7);
        }

        Assert.Equal(metric.Number("/test/dryDensity") * foot / pound, other.Number("/test/dryDensity"), 1e-9);
    }

    [Theory]
    [InlineData(FieldJobs.Sound)]
    [InlineData("""{"method":"sand-cone","units":{"mass":"lb","volume":"in3","density":"lb/ft3"},"sandCone":{"before":12,"after":4,"coneVolume":40,"calibration":{"containerVolume":60,"sandMass":3.2}},"soil":{"containerAndWet":10,"container":1},"tins":[{"tin":30,"wet":155,"dry":130},{"tin":20,"wet":145,"dry":121}],"oversize":{"percent":20,"specificGravity":2.6,"apply":"field"},"laboratory":{"maximumDryDensity":120,"minimumDryDensity":90}}""")]
    [InlineData("""{"method":"nuclear-gauge","units":{"density":"kN/m3"},"nuclearGauge":{"wetDensity":[19,20],"waterDensity":[2,2.2],"ovenPairs":[{"gauge":12,"oven":11}]},"oversize":{"percent":20,"specificGravity":2.6},"laboratory":{"maximumDryDensity":19,"optimumWaterContent":12}}""")]
    [InlineData("""{"method":"drive-cylinder","driveCylinder":{"diameter":4,"height":5},"units":{"length":"in"},"soil":{"dry":1600,"wet":2000}}""")]
    [InlineData("""{"method":"rubber-balloon","rubberBalloon":{"initialReading":1,"finalReading":900},"soil":{"dry":1600},"wetBasis":12}""")]
    public async Task Each_step_of_the_working_gives_its_value_again(string body)
    {
        var answer = await AnswerAsync(body[..body.LastIndexOf('}')] + ",\"trace\":true}");
        var steps = answer.GetProperty("trace").EnumerateArray().ToList();
        Assert.NotEmpty(steps);
        foreach (var step in steps)
        {
            var value = step.Number("/value");
            Assert.Equal(value, Arithmetic.Value(step.Text("/substitution")!), 1e-9 * Math.Max(1, Math.Abs(value)));
            Assert.StartsWith("<math", step.Text("/mathml"), StringComparison.Ordinal);
            Assert.NotEqual("", step.Text("/source"));
        }
    }

    /// <summary>A change that provokes the finding, and its twin that comes near and does not.</summary>
    [Theory]
    [InlineData("cone-over-sand", "/sandCone/coneAndPlate", "3710", "3500")]
    [InlineData("sand-density-unusual", "/sandCone/sandDensity", "1.80", "1.74")]
    [InlineData("sand-density-unusual", "/sandCone/sandDensity", "1.24", "1.26")]
    [InlineData("hole-too-small", "/largestParticle", "20", "12.5")]
    [InlineData("hole-too-small", "/largestParticle", "60", "4")]
    [InlineData("above-zero-air-voids", "/waterContent", "24", "20")]
    [InlineData("relative-compaction-high", "/laboratory/maximumDryDensity", "1.72", "1.74")]
    [InlineData("far-from-optimum", "/laboratory/optimumWaterContent", "16.1", "16.0")]
    [InlineData("water-content-missing", "/waterContent", "null", "12")]
    [InlineData("value-missing", "/laboratory", "{}", """{"maximumDryDensity":1.9,"optimumWaterContent":12}""")]
    [InlineData("uncertainty-missing", "/specification/decision", """{"rule":"guarded","risk":0.05}""", """{"rule":"simple"}""", true)]
    [InlineData("oversize-not-corrected", "/oversize", """{"percent":6}""", """{"percent":5}""")]
    [InlineData("specific-gravity-assumed", "/specificGravity", """{"value":2.68}""", """{"value":2.68,"determined":"measured"}""")]
    [InlineData("density-above-solids", "/soil/wet", "5000", "3000")]
    [InlineData("impossible-density", "/soil/wet", "312.05", "900")]
    public async Task A_finding_is_raised_where_it_belongs_and_not_near_it(string code, string place, string provoking, string near, bool withoutUncertainty = false)
    {
        string Edited(string json) => withoutUncertainty
            ? FieldJobs.With((place, json), ("/uncertainty", Body.Absent), ("/laboratory/uncertainty", Body.Absent))
            : FieldJobs.With((place, json == "null" ? Body.Absent : json));
        Assert.Contains(code, (await AnswerAsync(Edited(provoking))).Findings());
        Assert.DoesNotContain(code, (await AnswerAsync(Edited(near))).Findings());
    }

    [Theory]
    [InlineData("rubber-balloon", "rubberBalloon", """{"initialReading":1200,"finalReading":300}""")]
    [InlineData("water-replacement", "waterReplacement", """{"withHole":700,"templateOnly":700}""")]
    public async Task A_hole_without_a_volume_is_found_and_decides_nothing(string method, string member, string block)
    {
        var answer = await AnswerAsync(FieldJobs.By(method, member, block));
        Assert.Contains("no-volume", answer.Findings());
        Assert.True(answer.IsNull("/test/wetDensity"));
        Assert.Equal("undecided", answer.Text("/outcome"));
    }

    [Fact]
    public async Task Every_finding_is_listed_with_its_meaning()
    {
        using var response = await service.GetAsync("/v1/findings");
        var listed = JsonElement.Parse(await RunningService.TextOf(response)).EnumerateArray().Select(kind => kind.Text("/code")).ToList();
        Assert.Subset(listed.ToHashSet(), new HashSet<string?> { "cone-over-sand", "hole-too-small", "within-guard-band", "outside-family", "point-too-dry", "water-content-estimated" });
        Assert.Equal(listed.Count, listed.Distinct().Count());
    }

    [Fact]
    public async Task The_same_test_has_the_same_bytes()
    {
        using var first = await service.PostAsync(FieldJobs.Sound, address: FieldJobs.FieldDensity);
        using var second = await service.PostAsync(FieldJobs.Sound, address: FieldJobs.FieldDensity);
        Assert.Equal(await RunningService.TextOf(first), await RunningService.TextOf(second));
    }

    private Task<JsonElement> AnswerAsync(string body) => service.AnswerAsync(FieldJobs.FieldDensity, body);

    private static IEnumerable<string?> Outcomes(JsonElement answer) => answer.GetProperty("requirements").EnumerateArray().Select(requirement => requirement.Text("/outcome"));
}
