using System.Text.Json;
using Xunit;

namespace Drypeak.Service.Tests.Laboratory;

public sealed class FindingKindsTests(RunningService service)
{
    /// <summary>The codes that laboratories' systems are written against: a code may be added, none may change.</summary>
    private static readonly string[] Codes =
    [
        "too-few-specimens", "few-on-a-side", "wide-spacing", "no-optimum", "optimum-at-edge", "above-zero-air-voids", "impossible-density", "density-above-solids",
        "specific-gravity-unusual", "specific-gravity-assumed", "specific-gravity-missing", "mixed-units", "fractions-for-percent", "repeated-values", "peak-adopted",
        "wet-leg-not-parallel", "saturation-at-optimum-unusual", "two-peaks", "point-far-off", "tins-disagree", "mold-outside-tolerance", "particles-above-limit",
        "oversize-above-limit", "oversize-not-corrected", "models-disagree", "specimen-set-aside", "method-not-given", "effort-outside-range",
    ];

    /// <summary>A change to the sound test that provokes the finding, and one that comes near and does not.</summary>
    [Theory]
    [InlineData("too-few-specimens", "/specimens/4", Body.Absent, "/specimens/4/label", "\"e\"", "/specimens/3")]
    [InlineData("wide-spacing", "/specimens/4/tins/0/wet", "155", "/specimens/4/tins/0/wet", "153.9")]
    [InlineData("above-zero-air-voids", "/specificGravity/value", "2.52", "/specificGravity/value", "2.65")]
    [InlineData("impossible-density", "/mold/volume", "500", "/mold/volume", "800")]
    [InlineData("density-above-solids", "/specificGravity/value", "1.8", "/specificGravity/value", "2.0")]
    [InlineData("specific-gravity-unusual", "/specificGravity/value", "3.3", "/specificGravity/value", "3.2")]
    [InlineData("specific-gravity-assumed", "/specificGravity/determined", Body.Absent, "/specificGravity/determined", "\"measured\"")]
    [InlineData("specific-gravity-missing", "/specificGravity", Body.Absent, "/specificGravity", "{\"value\":2.7}")]
    [InlineData("mixed-units", "/specimens/2/mold", "{\"volume\":0.943}", "/specimens/2/mold", "{\"volume\":943}")]
    [InlineData("repeated-values", "/specimens/1/moldAndWetSoil", "6064.2", "/specimens/1/moldAndWetSoil", "6064.3")]
    [InlineData("peak-adopted", "/curve", "{\"adopted\":{\"waterContent\":14,\"maximumDryDensity\":1.86,\"reason\":\"by hand\"}}", "/curve", "{\"model\":\"auto\"}")]
    [InlineData("point-far-off", "/specimens/2/moldAndWetSoil", "6100", "/specimens/2/moldAndWetSoil", "6240")]
    [InlineData("tins-disagree", "/specimens/0/tins/-", "{\"tin\":0,\"wet\":111.1,\"dry\":100}", "/specimens/0/tins/-", "{\"tin\":0,\"wet\":110.9,\"dry\":100}")]
    [InlineData("mold-outside-tolerance", "/mold/volume", "958", "/mold/volume", "956")]
    [InlineData("particles-above-limit", "/particlesAbove", "{\"sieve\":4.75,\"percent\":30}", "/particlesAbove", "{\"sieve\":4.75,\"percent\":20}")]
    [InlineData("oversize-above-limit", "/oversize", "{\"percent\":30,\"specificGravity\":2.65}", "/oversize", "{\"percent\":20,\"specificGravity\":2.65}")]
    [InlineData("oversize-outside-method", "/oversize", "{\"percent\":20,\"specificGravity\":2.65,\"sieve\":19}", "/oversize", "{\"percent\":20,\"specificGravity\":2.65,\"sieve\":4.75}")]
    [InlineData("oversize-not-corrected", "/oversize", "{\"percent\":6}", "/oversize", "{\"percent\":6,\"specificGravity\":2.65}")]
    [InlineData("specimen-set-aside", "/specimens/0/setAside", "\"torn\"", "/specimens/0/setAside", "null")]
    [InlineData("method-not-given", "/method", "null", "/method", "\"custom\"")]
    public async Task A_fault_in_the_test_is_found_and_what_comes_near_it_is_not(
        string code, string place, string json, string nearPlace, string nearJson, string? alsoAbsent = null)
    {
        var provoking = alsoAbsent is null ? Body.With(place, json) : Body.With((place, json), (alsoAbsent, Body.Absent));
        Assert.Contains(code, (await service.AnswerAsync(provoking)).Findings());
        Assert.DoesNotContain(code, (await service.AnswerAsync(Body.With(nearPlace, nearJson))).Findings());
    }

    [Fact]
    public async Task The_catalogue_holds_every_code_with_what_it_means_why_it_matters_and_what_to_do()
    {
        using var response = await service.GetAsync("/v1/findings");
        var kinds = JsonElement.Parse(await RunningService.TextOf(response)).EnumerateArray().ToList();
        var listed = kinds.Select(kind => kind.Text("/code")!).ToList();
        Assert.Empty(Codes.Except(listed));
        Assert.Contains("no-chart-address", listed);
        Assert.Distinct(listed);
        Assert.All(kinds, kind =>
        {
            Assert.Contains(kind.Text("/severity"), new[] { "error", "warning", "note" });
            Assert.All(new[] { "meaning", "why", "remedy", "basis" }, name => Assert.NotEqual("", kind.GetProperty(name).GetString()));
        });
    }

    [Fact]
    public async Task The_sound_test_gives_a_careful_reviewer_nothing_to_ask() =>
        Assert.DoesNotContain((await service.AnswerAsync(Body.Sound)).At("/findings").EnumerateArray(), finding => finding.Text("/severity") is "error" or "warning");
}
