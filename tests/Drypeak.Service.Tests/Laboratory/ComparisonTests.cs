using System.Text.Json;
using Xunit;

namespace Drypeak.Service.Tests.Laboratory;

/// <summary><c>POST /v1/comparison</c>: the second test less the first, against 1.96·√(u₁² + u₂²) (ISO/IEC Guide 98-3, and ISO 13528's zeta score, from memory).</summary>
public sealed class ComparisonTests(RunningService service)
{
    private const string Address = "/v1/comparison";
    private const double Quantile = 1.959963984540054;

    private static readonly string First = Test((10, 1.749), (12, 1.821), (14, 1.861), (16, 1.83), (18, 1.77));
    private static readonly string Second = Test((10.3, 1.742), (12.4, 1.825), (14.2, 1.854), (16.1, 1.829), (18.3, 1.758));
    private static readonly string Elsewhere = Test((6, 1.95), (8, 2.03), (10, 2.07), (12, 2.04), (14, 1.98));
    private static readonly string WithoutOptimum = Test((10, 1.70), (12, 1.76), (14, 1.82), (16, 1.88));

    [Fact]
    public async Task The_difference_is_the_second_less_the_first_and_what_is_allowed_comes_from_both_uncertainties()
    {
        var (first, second, answer) = await CompareAsync(First, Second);
        foreach (var member in new[] { "waterContent", "maximumDryDensity" })
        {
            var difference = second.Number("/optimum/" + member) - first.Number("/optimum/" + member);
            var (u1, u2) = (first.Number($"/optimum/uncertainty/{member}/standard"), second.Number($"/optimum/uncertainty/{member}/standard"));
            Assert.Equal(difference, answer.Number("/difference/" + member), 1e-12);
            Assert.Equal(Quantile * Math.Sqrt((u1 * u1) + (u2 * u2)), answer.Number("/allowed/" + member), 1e-12);
            Assert.Equal(Math.Abs(difference) <= answer.Number("/allowed/" + member), answer.At("/agree/" + member).GetBoolean());
            Assert.True(answer.At("/agree/" + member).GetBoolean());
        }

        Assert.Equal(first.At("/optimum").GetRawText(), answer.At("/optima/0").GetRawText());
        Assert.Equal(second.At("/optimum").GetRawText(), answer.At("/optima/1").GetRawText());
    }

    [Fact]
    public async Task Two_soils_do_not_agree()
    {
        var (_, _, answer) = await CompareAsync(First, Elsewhere);
        Assert.False(answer.At("/agree/waterContent").GetBoolean());
        Assert.False(answer.At("/agree/maximumDryDensity").GetBoolean());
        Assert.All(answer.At("/precision").EnumerateArray(), statement => Assert.False(statement.At("/agree/maximumDryDensity").GetBoolean()));
    }

    [Fact]
    public async Task The_other_way_round_only_the_signs_of_the_difference_change()
    {
        var (_, _, forward) = await CompareAsync(First, Second);
        var (_, _, back) = await CompareAsync(Second, First);
        foreach (var member in new[] { "waterContent", "maximumDryDensity" })
        {
            Assert.Equal(-forward.Number("/difference/" + member), back.Number("/difference/" + member));
            Assert.Equal(forward.Number("/allowed/" + member), back.Number("/allowed/" + member), 1e-15);
        }

        Assert.Equal(forward.At("/agree").GetRawText(), back.At("/agree").GetRawText());
    }

    [Fact]
    public async Task A_test_against_itself_differs_by_nothing_and_agrees()
    {
        var (_, _, answer) = await CompareAsync(First, First);
        Assert.Equal((0, 0), (answer.Number("/difference/waterContent"), answer.Number("/difference/maximumDryDensity")));
        Assert.True(answer.At("/agree/waterContent").GetBoolean() && answer.At("/agree/maximumDryDensity").GetBoolean());
    }

    [Fact]
    public async Task Units_are_those_of_the_first_test_whatever_the_second_has()
    {
        var kilograms = Units(Second, "kg/m3", 1000);
        var (_, _, mixed) = await CompareAsync(First, kilograms);
        var (_, _, same) = await CompareAsync(First, Second);
        Assert.Equal("Mg/m3", mixed.Text("/units/density"));
        Assert.Equal(same.Number("/difference/maximumDryDensity"), mixed.Number("/difference/maximumDryDensity"), 1e-9);
        Assert.Equal(same.Number("/optima/1/maximumDryDensity"), mixed.Number("/optima/1/maximumDryDensity"), 1e-9);

        var (_, _, turned) = await CompareAsync(kilograms, First);
        Assert.Equal("kg/m3", turned.Text("/units/density"));
        Assert.Equal(-1000 * same.Number("/difference/maximumDryDensity"), turned.Number("/difference/maximumDryDensity"), 1e-6);
    }

    /// <summary>AASHTO T 99, precision: 10 % of the mean optimum and 35 kg/m³ for one operator, 15 % and 72 kg/m³ for two laboratories (from memory).</summary>
    [Fact]
    public async Task The_standards_limits_stand_beside_it()
    {
        var (first, second, answer) = await CompareAsync(First, Second);
        var mean = (first.Number("/optimum/waterContent") + second.Number("/optimum/waterContent")) / 2;
        var limits = answer.At("/precision").EnumerateArray().Select(statement => (statement.Text("/conditions")!, statement.Number("/limit/waterContent"), statement.Number("/limit/maximumDryDensity"))).ToList();
        Assert.Equal(["single operator", "two laboratories"], limits.Select(limit => limit.Item1));
        Assert.Equal(0.10 * mean, limits[0].Item2, 1e-9);
        Assert.Equal(0.15 * mean, limits[1].Item2, 1e-9);
        Assert.Equal([0.035, 0.072], limits.Select(limit => Math.Round(limit.Item3, 12)));
    }

    [Fact]
    public async Task Where_a_test_has_no_optimum_nothing_is_compared()
    {
        var (_, _, answer) = await CompareAsync(First, WithoutOptimum);
        Assert.All(new[] { "/difference", "/allowed", "/agree", "/optima/1" }, place => Assert.True(answer.IsNull(place)));
        Assert.False(answer.IsNull("/optima/0"));
        Assert.Empty(answer.At("/precision").EnumerateArray());
        Assert.Equal("/tests/1/specimens", answer.Finding("no-optimum").Text("/pointer"));
    }

    [Fact]
    public async Task Where_an_uncertainty_is_unknown_the_difference_stands_without_a_judgment()
    {
        // Three points on a parabola leave nothing to tell its uncertainty by.
        var bare = Test((12, 1.82), (14, 1.86), (16, 1.83)).Replace("\"method\"", "\"curve\":{\"model\":\"parabola\"},\"method\"", StringComparison.Ordinal);
        var (_, _, answer) = await CompareAsync(First, bare);
        Assert.False(answer.IsNull("/difference"));
        Assert.True(answer.IsNull("/allowed"));
        Assert.True(answer.IsNull("/agree"));
    }

    public static TheoryData<string, int, string[]> Faults => new()
    {
        { "{}", 400, ["/tests missing-member"] },
        { $$"""{"tests":[{{First}},null]}""", 400, ["/tests/1 null-not-allowed"] },
        { $$"""{"tests":[{{First}},{}]}""", 400, ["/tests/1/specimens missing-member"] },
        { $$"""{"tests":[{{First}}]}""", 422, ["/tests not-two"] },
        { $$"""{"tests":[{{First}},{{First}},{{First}}]}""", 422, ["/tests not-two"] },
        { $$"""{"tests":[{{First.Replace("astm-d698-a", "astm-d698-z", StringComparison.Ordinal)}},{{First.Replace("1.749", "0", StringComparison.Ordinal)}}]}""", 422, ["/tests/0/method unknown-method", "/tests/1/specimens/0/dryDensity not-positive"] },
    };

    [Theory]
    [MemberData(nameof(Faults))]
    public async Task A_fault_is_refused_at_its_place(string body, int status, string[] faults)
    {
        var refusal = await service.RefusalAsync(Address, body);
        Assert.Equal(status, refusal.Status);
        Assert.Equal(faults, refusal.Faults);
    }

    private async Task<(JsonElement First, JsonElement Second, JsonElement Answer)> CompareAsync(string first, string second) =>
        (await service.AnswerAsync(first), await service.AnswerAsync(second), await service.AnswerAsync(Address, $$"""{"tests":[{{first}},{{second}}]}"""));

    private static string Test(params (double WaterContent, double DryDensity)[] points) =>
        $$"""{"method":"astm-d698-a","specificGravity":{"value":2.7,"determined":"measured"},"specimens":[{{string.Join(',', points.Select(Body.Point))}}]}""";

    private static string Units(string test, string unit, double factor)
    {
        var node = System.Text.Json.Nodes.JsonNode.Parse(test)!;
        node["units"] = System.Text.Json.Nodes.JsonNode.Parse($$"""{"density":"{{unit}}"}""");
        foreach (var specimen in node["specimens"]!.AsArray())
        {
            specimen!["dryDensity"] = specimen["dryDensity"]!.GetValue<double>() * factor;
        }

        return node.ToJsonString();
    }
}
