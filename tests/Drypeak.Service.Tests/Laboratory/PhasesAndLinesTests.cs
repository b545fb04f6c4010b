using System.Text.Json;
using Xunit;

namespace Drypeak.Service.Tests.Laboratory;

public sealed class PhasesAndLinesTests(RunningService service)
{
    /// <summary>Density of water at 20 °C, Mg/m³: Tanaka et al. 2001 (CIPM), table.</summary>
    private const double Water = 0.9982067;

    /// <summary>e = Gs·ρw/ρd − 1, n = e/(1 + e), Sr = w·Gs/e, A = n·(1 − Sr).</summary>
    [Fact]
    public async Task Void_ratio_porosity_saturation_and_air_voids_follow_from_the_phases()
    {
        var specimen = (await service.AnswerAsync(Body.WithSpecimens("""{"waterContent":14,"dryDensity":1.8}"""))).At("/specimens/0");
        var voidRatio = (2.70 * Water / 1.8) - 1;
        var (porosity, saturation) = (voidRatio / (1 + voidRatio), 0.14 * 2.70 / voidRatio);
        Assert.Equal(voidRatio, specimen.Number("/voidRatio"), 1e-6);
        Assert.Equal(100 * porosity, specimen.Number("/porosity"), 1e-4);
        Assert.Equal(100 * saturation, specimen.Number("/saturation"), 1e-4);
        Assert.Equal(100 * porosity * (1 - saturation), specimen.Number("/airVoids"), 1e-4);
        Assert.Equal(1.8 * 1.14, specimen.Number("/wetDensity"), 1e-12);
    }

    [Fact]
    public async Task Without_a_specific_gravity_there_are_no_phases_and_no_lines_and_the_answer_says_so()
    {
        var answer = await service.AnswerAsync(Body.With(("/specificGravity", Body.Absent), ("/lines", """{"saturation":[90],"airVoids":[5]}""")));
        Assert.All(answer.At("/specimens").EnumerateArray(), specimen =>
            Assert.All(new[] { "voidRatio", "porosity", "saturation", "airVoids" }, name => Assert.Equal(JsonValueKind.Null, specimen.GetProperty(name).ValueKind)));
        Assert.Equal(0, answer.At("/zeroAirVoids").GetArrayLength());
        Assert.Equal(0, answer.At("/lines").GetArrayLength());
        Assert.True(answer.IsNull("/optimum/saturation"));
        Assert.False(answer.IsNull("/optimum/waterContent"));
        Assert.Contains("specific-gravity-missing", answer.Findings());
    }

    [Theory]
    [InlineData("\"waterTemperature\":20", Water)]
    [InlineData("\"waterTemperature\":4", 0.9999749)]
    [InlineData("\"waterDensity\":1.0", 1.0)]
    public async Task The_zero_air_voids_line_lies_where_the_water_fills_all_voids(string water, double density)
    {
        var answer = await service.AnswerAsync(Body.Sound.Replace("\"specificGravity\"", water + ", \"specificGravity\"", StringComparison.Ordinal));
        var points = answer.At("/zeroAirVoids").EnumerateArray().Select(point => (W: point[0].GetDouble(), Dry: point[1].GetDouble())).ToList();
        Assert.True(points.Count >= 20);
        Assert.All(points, point => Assert.Equal(2.70 * density / (1 + (2.70 * point.W / 100)), point.Dry, 1e-6));
        Assert.True(points[0].W <= 10 && points[^1].W >= 18);
        Assert.Equal(points.OrderBy(point => point.W), points);
    }

    [Fact]
    public async Task The_lines_asked_for_come_in_their_order_and_lie_where_they_should()
    {
        var lines = (await service.AnswerAsync(Body.With("/lines", """{"saturation":[80,100,90],"airVoids":[10,0]}"""))).At("/lines").EnumerateArray().ToList();
        Assert.Equal([("saturation", 80.0), ("saturation", 100), ("saturation", 90), ("airVoids", 10), ("airVoids", 0)], lines.Select(line => (line.Text("/kind"), line.Number("/value"))));
        Assert.All(lines, line => Assert.All(line.At("/points").EnumerateArray(), point =>
        {
            var (w, value) = (point[0].GetDouble() / 100, line.Number("/value") / 100);
            var expected = line.Text("/kind") == "saturation" ? 2.70 * Water / (1 + (w * 2.70 / value)) : 2.70 * Water * (1 - value) / (1 + (w * 2.70));
            Assert.Equal(expected, point[1].GetDouble(), 1e-6);
        }));
        Assert.Equal(lines[1].At("/points").GetRawText(), (await service.AnswerAsync(Body.Sound)).At("/zeroAirVoids").GetRawText());
    }

    [Fact]
    public async Task A_dry_density_at_or_above_that_of_the_solids_has_no_phases_and_is_found()
    {
        var answer = await service.AnswerAsync(Body.WithSpecimens("""{"waterContent":1,"dryDensity":2.75}"""));
        Assert.True(answer.IsNull("/specimens/0/voidRatio"));
        Assert.Equal("/specimens/0", answer.Finding("density-above-solids").Text("/pointer"));
    }
}
