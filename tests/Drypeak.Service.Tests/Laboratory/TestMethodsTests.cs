using System.Net;
using System.Text.Json;
using Drypeak.Soil.TestMethods;
using Xunit;

namespace Drypeak.Service.Tests.Laboratory;

/// <summary><c>GET /v1/test-methods</c> and <c>/v1/test-methods/{code}</c>.</summary>
public sealed class TestMethodsTests(RunningService service)
{
    private const string Address = "/v1/test-methods";

    private static readonly string[] Values =
    [
        "moldVolume", "moldDiameter", "moldHeight", "rammerMass", "drop", "layers", "blowsPerLayer", "vibrationPerLayer", "nominalEffort",
        "largestParticle", "oversizeSieve", "oversizeLimit", "minimumSpecimens", "recommendedSpacing", "greatestSpacing",
    ];

    [Fact]
    public async Task Every_method_is_listed_in_the_order_of_the_catalogue() =>
        Assert.Equal(TestMethodCatalogue.Codes, (await ListAsync()).Select(method => method.Text("/code")));

    [Fact]
    public async Task Each_value_says_where_it_comes_from_and_whether_it_was_read() =>
        Assert.All(await ListAsync(), method =>
        {
            var values = Values.Select(method.GetProperty).Where(value => value.ValueKind != JsonValueKind.Null).ToList();
            Assert.True(values.Count >= 4);
            Assert.All(values, value =>
            {
                Assert.True(value.Number("/value") > 0);
                Assert.NotEqual("", value.Text("/source"));
                Assert.Contains(value.At("/read").ValueKind, new[] { JsonValueKind.True, JsonValueKind.False });
            });
            Assert.All(new[] { "title", "summary", "standard", "clause" }, member => Assert.NotEqual("", method.GetProperty(member).GetString()));
        });

    [Theory]
    [InlineData("astm-d698-a")]
    [InlineData("bs-1377-4-3.7")]
    [InlineData("tex-113-e")]
    public async Task One_method_by_its_code_is_its_row_of_the_list(string code)
    {
        using var response = await service.GetAsync($"{Address}/{code}");
        Assert.Equal(HttpStatusCode.OK, response.StatusCode);
        Assert.Equal((await ListAsync()).Single(method => method.Text("/code") == code).GetRawText(), await RunningService.TextOf(response));
    }

    /// <summary>ASTM D698: 943 ± 14 cm³ from memory, 101.6 mm, 305 mm and 25 blows as read; the effort worked out by itself; to 0.1 % and 0.1 lb/ft³ as read.</summary>
    [Fact]
    public async Task The_four_inch_mold_and_light_rammer_are_as_the_standard_has_them()
    {
        var method = JsonElement.Parse(await RunningService.TextOf(await service.GetAsync(Address + "/astm-d698-a")));
        Assert.Equal((943, 14, "cm³", false), (method.Number("/moldVolume/value"), method.Number("/moldVolume/tolerance"), method.Text("/moldVolume/unit"), method.At("/moldVolume/read").GetBoolean()));
        Assert.Equal((101.6, true), (method.Number("/moldDiameter/value"), method.At("/moldDiameter/read").GetBoolean()));
        Assert.True(method.IsNull("/moldDiameter/tolerance"));
        Assert.Equal((305, 3, 25), (method.Number("/drop/value"), method.Number("/layers/value"), method.Number("/blowsPerLayer/value")));
        Assert.Equal(2.495 * 9.80665 * 0.305 * 75 / 943e-6 / 1000, method.Number("/computedEffort"), 1e-9);
        Assert.Equal(600, method.Number("/nominalEffort/value"));
        Assert.Equal(("to 0.1 %", "to 0.1 lb/ft³", true), (method.Text("/reporting/waterContent"), method.Text("/reporting/dryDensity"), method.At("/reporting/read").GetBoolean()));
    }

    [Fact]
    public async Task A_vibrating_hammer_has_no_effort_and_no_rammer()
    {
        var method = JsonElement.Parse(await RunningService.TextOf(await service.GetAsync(Address + "/bs-1377-4-3.7")));
        Assert.All(new[] { "/computedEffort", "/nominalEffort", "/rammerMass", "/drop", "/blowsPerLayer" }, place => Assert.True(method.IsNull(place)));
        Assert.Equal(60, method.Number("/vibrationPerLayer/value"));
        Assert.Equal("to 2 significant figures", method.Text("/reporting/waterContent"));
    }

    [Theory]
    [InlineData("astm-d698")]
    [InlineData("ASTM-D698-A")]
    [InlineData("custom")]
    public async Task A_code_that_is_not_in_the_catalogue_is_not_found(string code)
    {
        using var response = await service.GetAsync($"{Address}/{code}");
        Assert.Equal(HttpStatusCode.NotFound, response.StatusCode);
        Assert.Equal("application/problem+json", response.Content.Headers.ContentType?.MediaType);
        Assert.Contains("/v1/test-methods", await RunningService.TextOf(response), StringComparison.Ordinal);
    }

    [Theory]
    [InlineData(Address)]
    [InlineData(Address + "/astm-d698-a")]
    public async Task The_catalogue_is_only_read(string address)
    {
        using var response = await service.PostAsync("{}", address: address);
        Assert.Equal(HttpStatusCode.MethodNotAllowed, response.StatusCode);
        Assert.Contains("GET", response.Content.Headers.Allow);
    }

    private async Task<List<JsonElement>> ListAsync() => [.. JsonElement.Parse(await RunningService.TextOf(await service.GetAsync(Address))).EnumerateArray()];
}
