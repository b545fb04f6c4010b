using System.Globalization;
using Xunit;

namespace Drypeak.Service.Tests.Laboratory;

/// <summary><c>POST /v1/effort-series</c>: optimum and maximum are straight over the logarithm of effort between two tests (common practice, no source).</summary>
public sealed class EffortSeriesTests(RunningService service)
{
    private const string Address = "/v1/effort-series";

    /// <summary>Effort of ASTM D698, method A, worked out by itself: 2.495 kg · 9.80665 m/s² · 0.305 m · 3 · 25 / 943 cm³, kJ/m³.</summary>
    private const double Standard = 2.495 * 9.80665 * 0.305 * 75 / 943e-6 / 1000;

    /// <summary>The same of ASTM D1557, method A.</summary>
    private const double Modified = 4.536 * 9.80665 * 0.4572 * 125 / 943e-6 / 1000;

    private static readonly string Light = Test("\"astm-d698-a\"", (10, 1.749), (12, 1.821), (14, 1.861), (16, 1.83), (18, 1.77));
    private static readonly string Heavy = Test("\"astm-d1557-a\"", (7, 1.905), (9, 1.968), (11, 1.995), (13, 1.945), (15, 1.875));

    [Fact]
    public async Task The_line_holds_each_tests_own_optimum_in_order_of_effort()
    {
        var answer = await service.AnswerAsync(Address, $$"""{"tests":[{{Heavy}},{{Light}}]}""");
        var optima = new[] { await service.AnswerAsync(Light), await service.AnswerAsync(Heavy) };
        Assert.Equal([Standard, Modified], answer.Numbers("/line", "effort"), Near(1e-9));
        Assert.Equal(optima.Select(test => test.Number("/optimum/waterContent")), answer.Numbers("/line", "waterContent"), Near(1e-12));
        Assert.Equal(optima.Select(test => test.Number("/optimum/maximumDryDensity")), answer.Numbers("/line", "maximumDryDensity"), Near(1e-12));
        Assert.Equal(optima.Select(test => test.Number("/optimum/saturation")), answer.Numbers("/line", "saturation"), Near(1e-9));
        Assert.Empty(answer.At("/at").EnumerateArray());
    }

    [Fact]
    public async Task At_the_ends_it_is_the_tests_themselves_and_halfway_in_the_logarithm_their_mean()
    {
        var at = new[] { Standard, Math.Sqrt(Standard * Modified), Modified };
        var answer = await service.AnswerAsync(Address, Series([Light, Heavy], at));
        Assert.DoesNotContain("effort-outside-range", answer.Findings());
        foreach (var member in new[] { "waterContent", "maximumDryDensity" })
        {
            var (line, points) = (answer.Numbers("/line", member), answer.Numbers("/at", member));
            Assert.Equal([line[0], (line[0] + line[1]) / 2, line[1]], points, Near(1e-9));
        }

        Assert.Equal(at, answer.Numbers("/at", "effort"));
        Assert.All(answer.Numbers("/at", "saturation"), saturation => Assert.InRange(saturation, 70, 100));
    }

    [Theory]
    [InlineData(400)]
    [InlineData(4000)]
    public async Task Beyond_the_tests_the_line_goes_on_with_a_finding_at_the_effort(double effort)
    {
        var answer = await service.AnswerAsync(Address, Series([Light, Heavy], [1000, effort]));
        var finding = answer.Finding("effort-outside-range");
        Assert.Equal("/at/1", finding.Text("/pointer"));
        Assert.Equal("warning", finding.Text("/severity"));
        var (line, beyond) = (answer.Numbers("/line", "maximumDryDensity"), answer.Number("/at/1/maximumDryDensity"));
        var share = Math.Log(effort / Standard) / Math.Log(Modified / Standard);
        Assert.Equal(line[0] + (share * (line[1] - line[0])), beyond, 1e-9);
    }

    [Fact]
    public async Task Units_are_those_of_the_first_test_and_the_line_has_its_units()
    {
        var pounds = Light.Replace("\"method\"", "\"units\":{\"density\":\"lb/ft3\"},\"curve\":{\"model\":\"parabola\"},\"method\"", StringComparison.Ordinal)
            .Replace("1.749", "109.2", StringComparison.Ordinal).Replace("1.821", "113.7", StringComparison.Ordinal).Replace("1.861", "116.2", StringComparison.Ordinal)
            .Replace("1.83", "114.2", StringComparison.Ordinal).Replace("1.77", "110.5", StringComparison.Ordinal);
        var answer = await service.AnswerAsync(Address, $$"""{"tests":[{{pounds}},{{Heavy}}],"at":[1200]}""");
        Assert.Equal("lb/ft3", answer.Text("/units/density"));
        Assert.All(answer.Numbers("/line", "maximumDryDensity").Concat(answer.Numbers("/at", "maximumDryDensity")), density => Assert.InRange(density, 114, 127));
    }

    [Fact]
    public async Task A_custom_effort_takes_its_place_in_the_line()
    {
        var own = Test("""
            "custom","effort":{"rammerMass":3500,"drop":400,"layers":4,"blows":25},"mold":{"volume":943}
            """, (9, 1.84), (11, 1.90), (13, 1.925), (15, 1.885), (17, 1.82)).Replace("\"dryDensity\":1.925", "\"wetMass\":2051.3", StringComparison.Ordinal);
        var answer = await service.AnswerAsync(Address, Series([Light, Heavy, own], [800]));
        Assert.Equal(3.5 * 9.80665 * 0.4 * 100 / 943e-6 / 1000, answer.Numbers("/line", "effort")[1], 1e-9);
        Assert.InRange(answer.Number("/at/0/waterContent"), answer.Numbers("/line", "waterContent")[1], answer.Numbers("/line", "waterContent")[0]);
    }

    [Fact]
    public async Task A_test_without_an_optimum_is_left_out_and_says_why()
    {
        var rising = Test("\"astm-d1557-a\"", (7, 1.80), (9, 1.86), (11, 1.92), (13, 1.98));
        var answer = await service.AnswerAsync(Address, Series([Light, rising], [1000]));
        Assert.Single(answer.At("/line").EnumerateArray());
        Assert.Empty(answer.At("/at").EnumerateArray());
        Assert.Equal("/tests/1/specimens", answer.Finding("no-optimum").Text("/pointer"));
    }

    public static TheoryData<string, int, string[]> Faults => new()
    {
        { "{}", 400, ["/tests missing-member"] },
        { $$"""{"tests":[{{Light}},{"method":"astm-d1557-a"}]}""", 400, ["/tests/1/specimens missing-member"] },
        { $$"""{"tests":[{{Light}}]}""", 422, ["/tests out-of-range"] },
        { $$"""{"tests":[{{string.Join(',', Enumerable.Repeat(Light, 21))}}]}""", 422, ["/tests out-of-range"] },
        { $$"""{"tests":[{{Light}},{{Light}}]}""", 422, ["/tests/1/method repeated-effort"] },
        { $$"""{"tests":[{{Light}},{{Test("null", (7, 1.9), (9, 1.96), (11, 1.99), (13, 1.94))}}]}""", 422, ["/tests/1/method effort-unknown"] },
        { $$"""{"tests":[{{Light}},{{Test("\"custom\"", (7, 1.9), (9, 1.96), (11, 1.99), (13, 1.94))}}]}""", 422, ["/tests/1/method effort-unknown"] },
        { $$"""{"tests":[{{Light}},{{Test("\"bs-1377-4-3.7\"", (7, 1.9), (9, 1.96), (11, 1.99), (13, 1.94))}}]}""", 422, ["/tests/1/method effort-unknown"] },
        { Series([Light, Heavy], [0, 1000, 1e6]), 422, ["/at/0 out-of-range", "/at/2 out-of-range"] },
        { Series([Light, Heavy], Enumerable.Repeat(1000.0, 101)), 422, ["/at too-many"] },
        { $$"""{"tests":[{{Light}},{{Heavy.Replace("1.905", "-1.905", StringComparison.Ordinal)}}]}""", 422, ["/tests/1/specimens/0/dryDensity not-positive"] },
    };

    [Theory]
    [MemberData(nameof(Faults))]
    public async Task A_fault_is_refused_at_its_place(string body, int status, string[] faults)
    {
        var refusal = await service.RefusalAsync(Address, body);
        Assert.Equal(status, refusal.Status);
        Assert.Equal(faults, refusal.Faults);
    }

    private static string Test(string method, params (double WaterContent, double DryDensity)[] points) =>
        $$"""{"method":{{method}},"specificGravity":{"value":2.7,"determined":"measured"},"specimens":[{{string.Join(',', points.Select(Body.Point))}}]}""";

    private static string Series(IEnumerable<string> tests, IEnumerable<double> at) =>
        $$"""{"tests":[{{string.Join(',', tests)}}],"at":[{{string.Join(',', at.Select(effort => effort.ToString("R", CultureInfo.InvariantCulture)))}}]}""";

    /// <summary>Equal but for arithmetic, relative to the value.</summary>
    private static Func<double, double, bool> Near(double tolerance) => (one, other) => Math.Abs(one - other) <= tolerance * Math.Abs(one);
}
