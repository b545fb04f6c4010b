using System.Globalization;
using System.Text.Json;
using Xunit;

namespace Drypeak.Service.Tests.Laboratory;

/// <summary><c>POST /v1/saturation-lines</c>: ρd = Gs·ρw/(1 + w·Gs/S), and ρd = (1 − A)·ρw/(1/Gs + w).</summary>
public sealed class SaturationLinesTests(RunningService service)
{
    private const string Address = "/v1/saturation-lines";

    /// <summary>Soil compaction review notes, worked example 2: water of 62.4 lb/ft³.</summary>
    [Fact]
    public async Task Z1_the_zero_air_voids_line_in_pounds_per_cubic_foot()
    {
        var published = PublishedCases.Of("zeroAirVoids", "Z1");
        await HoldsAsync(published, "lb/ft3", published.Number("/water_lb_ft3"), 1);
    }

    /// <summary>A laboratory sheet (as P15): water of 1 g/cm³.</summary>
    [Fact]
    public async Task Z3_the_zero_air_voids_line_in_grams_per_cubic_centimeter()
    {
        var published = PublishedCases.Of("zeroAirVoids", "Z3");
        await HoldsAsync(published, "g/cm3", published.Number("/water_g_cm3"), 2);
    }

    [Fact]
    public async Task Saturation_comes_first_and_each_line_in_the_order_of_the_request()
    {
        var answer = await service.AnswerAsync(Address, """{"specificGravity":{"value":2.7,"determined":"measured"},"waterDensity":1,"airVoids":[5,0],"saturation":[80,100],"waterContents":[16,8]}""");
        Assert.Equal(
            [("saturation", 80.0), ("saturation", 100.0), ("airVoids", 5.0), ("airVoids", 0.0)],
            answer.At("/lines").EnumerateArray().Select(line => (line.Text("/kind")!, line.Number("/value"))));
        Assert.Equal(2.7 / (1 + (0.16 * 2.7 / 0.8)), answer.Number("/lines/0/points/0/1"), 1e-12);
        Assert.Equal(0.95 / ((1 / 2.7) + 0.08), answer.Number("/lines/2/points/1/1"), 1e-12);
        // No air voids are full saturation.
        Assert.Equal(answer.Number("/lines/1/points/0/1"), answer.Number("/lines/3/points/0/1"), 1e-12);
        Assert.Equal([16.0, 8.0], answer.At("/lines/0/points").EnumerateArray().Select(point => point[0].GetDouble()));
        Assert.Empty(answer.Findings());
    }

    [Fact]
    public async Task From_to_and_count_give_points_at_equal_steps_with_both_ends()
    {
        var answer = await service.AnswerAsync(Address, Sound(""" "from":8,"to":8.7,"count":8 """));
        var points = answer.At("/lines/0/points").EnumerateArray().Select(point => point[0].GetDouble()).ToList();
        Assert.Equal(8, points.Count);
        Assert.Equal((8, 8.7), (points[0], points[^1]));
        Assert.All(Enumerable.Range(0, 8), i => Assert.Equal(8 + (0.1 * i), points[i], 1e-12));
    }

    [Theory]
    [InlineData("", "saturation", 100)]
    [InlineData(""" "airVoids":[10], """, "airVoids", 10)]
    public async Task Where_no_line_is_named_it_is_the_zero_air_voids_line(string lines, string kind, double value)
    {
        var answer = await service.AnswerAsync(Address, Sound(lines + """ "waterContents":[10] """));
        var line = Assert.Single(answer.At("/lines").EnumerateArray());
        Assert.Equal((kind, value), (line.Text("/kind"), line.Number("/value")));
    }

    [Fact]
    public async Task An_assumed_or_unusual_specific_gravity_is_found()
    {
        var answer = await service.AnswerAsync(Address, """{"specificGravity":{"value":3.3},"waterContents":[10]}""");
        Assert.Equal(["specific-gravity-unusual", "specific-gravity-assumed"], answer.Findings());
    }

    [Fact]
    public async Task The_bounds_themselves_are_taken()
    {
        var twenty = List(Enumerable.Range(1, 20).Select(i => i * 5.0));
        var answer = await service.AnswerAsync(Address, Sound($$""" "saturation":{{twenty}},"airVoids":{{List(Enumerable.Range(0, 20).Select(i => i * 4.9))}},"from":0,"to":1000,"count":1000 """));
        Assert.Equal(40, answer.At("/lines").GetArrayLength());
        Assert.All(answer.At("/lines").EnumerateArray(), line => Assert.Equal(1000, line.At("/points").GetArrayLength()));
        Assert.Equal(1000, (await service.AnswerAsync(Address, Sound($$""" "waterContents":{{List(Enumerable.Range(0, 1000).Select(i => i * 0.5))}} """))).At("/lines/0/points").GetArrayLength());
    }

    public static TheoryData<string, int, string[]> Faults => new()
    {
        { """{"waterContents":[10]}""", 400, ["/specificGravity missing-member"] },
        { """{"specificGravity":{},"waterContents":[10]}""", 400, ["/specificGravity/value missing-member"] },
        { Sound(""" "waterContents":[10,null] """), 400, ["/waterContents/1 null-not-allowed"] },
        { Sound(""" "waterContents":[10],"step":1 """), 400, ["/step unknown-member"] },
        { Sound(""" "from":8,"to":20,"count":2.5 """), 400, ["/count wrong-type"] },
        { Sound(""" "saturation":[90] """), 422, ["/waterContents incomplete"] },
        { Sound(""" "waterContents":[] """), 422, ["/waterContents empty-list"] },
        { Sound(""" "waterContents":[10,-1] """), 422, ["/waterContents/1 out-of-range"] },
        { Sound(""" "waterContents":[1000.1] """), 422, ["/waterContents/0 out-of-range"] },
        { Sound(""" "waterContents":[10],"from":8,"to":20,"count":5 """), 422, ["/waterContents incomplete"] },
        { Sound(""" "from":8,"to":20 """), 422, ["/count incomplete"] },
        { Sound(""" "from":8,"count":5 """), 422, ["/count incomplete"] },
        { Sound(""" "from":20,"to":20,"count":5 """), 422, ["/to not-over-from"] },
        { Sound(""" "from":-1,"to":20,"count":5 """), 422, ["/from out-of-range"] },
        { Sound(""" "from":8,"to":1001,"count":5 """), 422, ["/to out-of-range"] },
        { Sound(""" "from":8,"to":20,"count":1 """), 422, ["/count out-of-range"] },
        { Sound(""" "from":8,"to":20,"count":1001 """), 422, ["/count out-of-range"] },
        { Sound($$""" "waterContents":{{List(Enumerable.Repeat(10.0, 1001))}} """), 422, ["/waterContents too-many"] },
        { Sound($$""" "waterContents":[10],"saturation":{{List(Enumerable.Repeat(90.0, 21))}} """), 422, ["/saturation too-many"] },
        { Sound($$""" "waterContents":[10],"airVoids":{{List(Enumerable.Repeat(5.0, 21))}} """), 422, ["/airVoids too-many"] },
        { Sound(""" "waterContents":[10],"saturation":[100,0],"airVoids":[5,100] """), 422, ["/saturation/1 out-of-range", "/airVoids/1 out-of-range"] },
        { Sound(""" "waterContents":[10],"saturation":[100.1],"airVoids":[-0.1] """), 422, ["/saturation/0 out-of-range", "/airVoids/0 out-of-range"] },
        { """{"units":{"density":"psi"},"specificGravity":{"value":0},"waterTemperature":50,"waterContents":[10]}""", 422, ["/units/density unknown-unit", "/specificGravity/value out-of-range", "/waterTemperature out-of-range"] },
    };

    [Theory]
    [MemberData(nameof(Faults))]
    public async Task A_fault_is_refused_at_its_place(string body, int status, string[] faults)
    {
        var refusal = await service.RefusalAsync(Address, body);
        Assert.Equal(status, refusal.Status);
        Assert.Equal(faults, refusal.Faults);
    }

    private async Task HoldsAsync(JsonElement published, string unit, double water, int decimals)
    {
        var values = published.At("/published").EnumerateObject().Select(item => (W: item.Name, Density: item.Value.GetDouble())).ToList();
        var answer = await service.AnswerAsync(Address, string.Create(CultureInfo.InvariantCulture,
            $$"""{"units":{"density":"{{unit}}"},"specificGravity":{"value":{{published.Number("/Gs")}}},"waterDensity":{{water}},"waterContents":[{{string.Join(',', values.Select(item => item.W))}}]}"""));
        Assert.All(values.Select((item, i) => (item.Density, Line: answer.Number($"/lines/0/points/{i}/1"))), item =>
            Assert.True(item.Line.Prints(item.Density, decimals), $"{item.Line} where {item.Density} is published."));
    }

    private static string Sound(string rest) => $$"""{"specificGravity":{"value":2.7,"determined":"measured"},{{rest}}}""";

    private static string List(IEnumerable<double> values) => "[" + string.Join(',', values.Select(value => value.ToString("R", CultureInfo.InvariantCulture))) + "]";
}
