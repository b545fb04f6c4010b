using System.Globalization;
using System.Text.Json;
using Drypeak.Service.Tests.Laboratory;
using Xunit;

namespace Drypeak.Service.Tests.Field;

/// <summary>Relative density, one point on a family, and the rapid method.</summary>
public sealed class ReferenceTests(RunningService service)
{
    private const string Family = """
        [{"label":"C","optimumWaterContent":16,"maximumDryDensity":1.7,"points":[[12,1.66],[14,1.69],[18,1.69]]},
         {"label":"A","optimumWaterContent":12,"maximumDryDensity":1.9,"points":[[9,1.8325],[10.5,1.883125],[13.5,1.883125]]},
         {"label":"B","optimumWaterContent":14,"maximumDryDensity":1.8,"points":[[10,1.74],[12,1.785],[16,1.785]]}]
        """;

    [Theory]
    [InlineData("""{"dryDensity":1.6""")]
    [InlineData("""{"wetDensity":1.76,"waterContent":10""")]
    [InlineData("""{"voidRatio":0.65625""")]
    [InlineData("""{"relativeCompaction":88.888888888888886""")]
    [InlineData("""{"relativeDensity":37.5""")]
    public async Task Any_one_measure_gives_the_others(string measure)
    {
        var answer = await service.AnswerAsync(FieldJobs.RelativeDensity, measure + ""","minimumDryDensity":1.5,"maximumDryDensity":1.8,"waterDensity":1,"specificGravity":{"value":2.65,"determined":"measured"}}""");
        Assert.Equal(1.6, answer.Number("/dryDensity"), 1e-12);
        Assert.Equal(0.65625, answer.Number("/voidRatio"), 1e-12);
        Assert.Equal(100 * 1.8 / 1.6 * 0.1 / 0.3, answer.Number("/relativeDensity"), 1e-9);
        Assert.Equal(100 * 1.6 / 1.8, answer.Number("/relativeCompaction"), 1e-9);
        Assert.Empty(answer.Findings());
    }

    [Fact]
    public async Task Limits_as_void_ratios_need_no_specific_gravity()
    {
        var answer = await service.AnswerAsync(FieldJobs.RelativeDensity, """{"voidRatio":0.6,"minimumVoidRatio":0.4,"maximumVoidRatio":0.8,"trace":true}""");
        Assert.Equal(50, answer.Number("/relativeDensity"), 1e-9);
        Assert.Equal(100 * 1.4 / 1.6, answer.Number("/relativeCompaction"), 1e-9);
        Assert.True(answer.IsNull("/dryDensity"));
        Assert.All(answer.GetProperty("trace").EnumerateArray(), step => Assert.Equal(step.Number("/value"), Arithmetic.Value(step.Text("/substitution")!), 1e-9));
    }

    [Theory]
    [InlineData("1.45", true)]
    [InlineData("1.5", false)]
    [InlineData("1.8", false)]
    [InlineData("1.81", true)]
    public async Task Beyond_the_limits_it_is_computed_with_a_finding(string dry, bool found)
    {
        var answer = await service.AnswerAsync(FieldJobs.RelativeDensity, $$"""{"dryDensity":{{dry}},"minimumDryDensity":1.5,"maximumDryDensity":1.8}""");
        var d = double.Parse(dry, CultureInfo.InvariantCulture);
        Assert.Equal(100 * 1.8 / d * (d - 1.5) / 0.3, answer.Number("/relativeDensity"), 1e-9);
        Assert.Equal(found, answer.Findings().Contains("beyond-density-limits"));
        Assert.True(answer.IsNull("/voidRatio"));
    }

    /// <summary>On the parabola of B, ρ = 1.8 − 0.00375(w − 14)².</summary>
    [Theory]
    [InlineData("""{"waterContent":12,"dryDensity":1.785}""")]
    [InlineData("""{"waterContent":12,"wetDensity":1.9992}""")]
    [InlineData("""{"wetBasis":10.714285714285714,"dryDensity":1.785}""")]
    [InlineData("""{"waterContent":12,"moldAndWetSoil":5999.2,"mold":{"mass":4000,"volume":1000}}""")]
    [InlineData("""{"waterContent":13,"dryDensity":1.79625}""")]
    public async Task A_point_on_a_curve_gives_that_curve(string point)
    {
        var answer = await OnPointAsync(Family, point);
        Assert.Equal(["B"], answer.GetProperty("between").EnumerateArray().Select(label => label.GetString()));
        Assert.Equal(0, answer.Number("/blend"), 1e-9);
        Assert.Equal(14, answer.Number("/optimum/waterContent"), 1e-9);
        Assert.Equal(1.8, answer.Number("/optimum/maximumDryDensity"), 1e-9);
        Assert.True(answer.At("/usable").GetBoolean());
    }

    [Fact]
    public async Task Between_two_curves_optimum_and_maximum_are_blended_by_one_share_and_the_curve_goes_through_the_point()
    {
        var answer = await OnPointAsync(Family, """{"waterContent":11.5,"dryDensity":1.83}""");
        var blend = answer.Number("/blend");
        Assert.InRange(blend, 0.01, 0.99);
        Assert.Equal(["A", "B"], answer.GetProperty("between").EnumerateArray().Select(label => label.GetString()));
        Assert.Equal(12 + (2 * blend), answer.Number("/optimum/waterContent"), 1e-9);
        Assert.Equal(1.9 - (0.1 * blend), answer.Number("/optimum/maximumDryDensity"), 1e-9);
        Assert.Equal(100 * 11.5 / answer.Number("/optimum/waterContent"), answer.Number("/percentOfOptimum"), 1e-9);

        // In shares of its own optimum, A falls by 0.0075·12²/1.9 and B by 0.00375·14²/1.8 for each unit squared: both are parabolas.
        var share = 11.5 / answer.Number("/optimum/waterContent");
        var fall = ((1 - blend) * 0.0075 * 144 / 1.9) + (blend * 0.00375 * 196 / 1.8);
        Assert.Equal(1.83, answer.Number("/optimum/maximumDryDensity") * (1 - (fall * (share - 1) * (share - 1))), 1e-9);
    }

    [Theory]
    [InlineData("""{"waterContent":9.5,"dryDensity":1.80}""", "point-too-dry")]
    [InlineData("""{"waterContent":14.5,"dryDensity":1.82}""", "point-too-wet")]
    [InlineData("""{"waterContent":11,"dryDensity":2.0}""", "outside-family")]
    [InlineData("""{"waterContent":14,"dryDensity":1.5}""", "outside-family")]
    public async Task A_point_that_may_not_be_used_gives_no_optimum_but_the_rule_and_the_next_step(string point, string code)
    {
        var answer = await OnPointAsync(Family, point);
        Assert.True(answer.IsNull("/optimum"));
        Assert.False(answer.At("/usable").GetBoolean());
        Assert.Matches("[Cc]ompact another|whole test", answer.Finding(code).Text("/message"));
        Assert.Equal(0, answer.GetProperty("curve").GetArrayLength());
    }

    [Fact]
    public async Task Eighty_percent_of_the_optimum_is_still_usable()
    {
        var answer = await OnPointAsync(Family, """{"waterContent":11.2,"dryDensity":1.7706}""");
        Assert.Equal(80, answer.Number("/percentOfOptimum"), 1e-6);
        Assert.True(answer.At("/usable").GetBoolean());
    }

    [Fact]
    public async Task Two_curves_are_no_family()
    {
        var answer = await OnPointAsync("""[{"optimumWaterContent":12,"maximumDryDensity":1.9},{"optimumWaterContent":14,"maximumDryDensity":1.8}]""", """{"waterContent":12,"dryDensity":1.83}""");
        Assert.Contains("family-too-small", answer.Findings());
        Assert.True(answer.IsNull("/optimum"));
    }

    [Fact]
    public async Task Optima_alone_are_taken_with_an_assumed_shape_and_said_so()
    {
        var answer = await OnPointAsync("""[{"optimumWaterContent":12,"maximumDryDensity":1.9},{"optimumWaterContent":14,"maximumDryDensity":1.8},{"optimumWaterContent":16,"maximumDryDensity":1.7}]""", """{"waterContent":14,"dryDensity":1.8}""");
        Assert.Equal(14, answer.Number("/optimum/waterContent"), 1e-9);
        Assert.Contains("shape-assumed", answer.Findings());
    }

    [Fact]
    public async Task A_curve_may_be_a_whole_test_or_points_to_be_fitted()
    {
        var laboratory = await service.AnswerAsync(Body.Sound);
        var (w, density) = (laboratory.Number("/optimum/waterContent"), laboratory.Number("/optimum/maximumDryDensity"));
        var answer = await OnPointAsync($$"""
            [{"label":"test","test":{{Body.Sound}}},{"label":"points","points":[[12,1.70],[14,1.745],[16,1.76],[18,1.745],[20,1.70]]},{"label":"optimum","optimumWaterContent":18,"maximumDryDensity":1.66}]
            """, string.Create(CultureInfo.InvariantCulture, $$"""{"waterContent":{{w:R}},"dryDensity":{{density:R}}}"""));
        Assert.Equal(["test"], answer.GetProperty("between").EnumerateArray().Select(label => label.GetString()));
        Assert.Equal(w, answer.Number("/optimum/waterContent"), 1e-9);
    }

    [Fact]
    public async Task A_curve_without_a_peak_is_left_out_with_a_finding()
    {
        var answer = await OnPointAsync(Family.Replace("[{", """[{"label":"X","points":[[10,1.6],[12,1.7],[14,1.8]]},{""", StringComparison.Ordinal), """{"waterContent":12,"dryDensity":1.785}""");
        Assert.Equal("/family/0", answer.Finding("member-without-peak").Text("/pointer"));
        Assert.Equal(14, answer.Number("/optimum/waterContent"), 1e-9);
    }

    [Fact]
    public async Task The_order_of_a_family_does_not_matter()
    {
        var members = JsonElement.Parse(Family).EnumerateArray().Select(member => member.GetRawText()).Reverse();
        const string point = """{"waterContent":11.5,"dryDensity":1.83}""";
        var (first, second) = (await OnPointAsync(Family, point), await OnPointAsync($"[{string.Join(',', members)}]", point));
        Assert.Equal(first.At("/optimum").GetRawText(), second.At("/optimum").GetRawText());
    }

    /// <summary>Three points equally spaced, on 2.1 − 0.01(z − 2.5)² after conversion.</summary>
    [Theory]
    [InlineData("", -2.5, true)]
    [InlineData(""","waterContent":12""", -2.5 * 1.12, false)]
    public async Task Three_specimens_give_the_vertex_of_their_parabola_and_the_exact_ratio(string water, double fromOptimum, bool estimated)
    {
        var answer = await service.AnswerAsync(FieldJobs.RapidMethod, $$"""{"field":{"wetDensity":2.0{{water}}},"specimens":[{{Rapid(0)}},{{Rapid(4)}},{{Rapid(2)}}]}""");
        Assert.Equal(2.5, answer.Number("/peak/waterAdded"), 1e-9);
        Assert.Equal(2.1, answer.Number("/peak/convertedWetDensity"), 1e-9);
        Assert.Equal(100 * 2.0 / 2.1, answer.Number("/densityRatio"), 1e-9);
        Assert.Equal(fromOptimum, answer.Number("/waterContentFromOptimum"), 1e-9);
        Assert.Equal(estimated, answer.Findings().Contains("water-content-estimated"));
    }

    /// <summary>Full route: w = w_f + z(1 + w_f), ρd = ρ/(1 + w), through /v1/moisture-density by the parabola, then relative compaction.</summary>
    [Theory]
    [InlineData(8.0)]
    [InlineData(17.5)]
    public async Task The_density_ratio_is_the_relative_compaction_by_the_full_route(double fieldWater)
    {
        double[] added = [-1.5, 1, 3.2];
        var rapid = await service.AnswerAsync(FieldJobs.RapidMethod, string.Create(CultureInfo.InvariantCulture,
            $$"""{"field":{"wetDensity":2.03,"waterContent":{{fieldWater}}},"specimens":[{{string.Join(',', added.Select(Rapid))}}]}"""));
        var points = added.Select(z => ((fieldWater / 100) + (z / 100 * (1 + (fieldWater / 100))), Converted(z) / (1 + (fieldWater / 100)))).Select(point => (point.Item1 * 100, point.Item2));
        var laboratory = Body.WithPoints(points)[..^1] + ",\"curve\":{\"model\":\"parabola\"}}";
        var full = await service.AnswerAsync(FieldJobs.FieldDensity, string.Create(CultureInfo.InvariantCulture,
            $$"""{"method":"direct","direct":{"wetDensity":2.03},"waterContent":{{fieldWater}},"laboratory":{"test":{{laboratory}} } }"""));
        Assert.Equal(full.Number("/relativeCompaction"), rapid.Number("/densityRatio"), 1e-7);
        Assert.Equal(full.Number("/waterContentFromOptimum"), rapid.Number("/waterContentFromOptimum"), 1e-7);
    }

    [Fact]
    public async Task More_specimens_are_fitted_and_the_field_water_content_does_not_change_the_ratio()
    {
        string Request(string water) => $$"""{"field":{"wetDensity":2.0{{water}}},"specimens":[{{string.Join(',', new[] { -1.0, 0, 2, 4, 6 }.Select(Rapid))}}]}""";
        var (without, with) = (await service.AnswerAsync(FieldJobs.RapidMethod, Request("")), await service.AnswerAsync(FieldJobs.RapidMethod, Request(",\"waterContent\":12")));
        Assert.Equal(2.5, without.Number("/peak/waterAdded"), 0.3);
        Assert.Equal(without.Number("/densityRatio"), with.Number("/densityRatio"), 1e-12);
        Assert.Equal(100 * 2.0 / 2.1, without.Number("/densityRatio"), 0.5);
    }

    [Theory]
    [InlineData("0,1", "too-few-specimens")]
    [InlineData("0,1,2", "no-optimum")]
    [InlineData("3,4,5", "no-optimum")]
    [InlineData("2,2,2", "too-few-specimens")]
    public async Task Without_a_peak_between_the_specimens_there_is_no_ratio(string added, string code)
    {
        var specimens = added.Split(',').Select(z => Rapid(double.Parse(z, CultureInfo.InvariantCulture)));
        var answer = await service.AnswerAsync(FieldJobs.RapidMethod, $$"""{"field":{"wetDensity":2.0},"specimens":[{{string.Join(',', specimens)}}]}""");
        Assert.True(answer.IsNull("/peak"));
        Assert.True(answer.IsNull("/densityRatio"));
        Assert.Contains("Compact another", answer.Finding(code).Text("/message"), StringComparison.Ordinal);
    }

    private static double Converted(double z) => 2.1 - (0.01 * (z - 2.5) * (z - 2.5));

    private static string Rapid(double z) => string.Create(CultureInfo.InvariantCulture, $$"""{"waterAdded":{{z:R}},"wetDensity":{{Converted(z) * (1 + (z / 100)):R}}}""");

    private Task<JsonElement> OnPointAsync(string family, string point) => service.AnswerAsync(FieldJobs.OnePoint, $$"""{"family":{{family}},"point":{{point}}}""");
}
