using System.Text.Json;
using Xunit;

namespace Drypeak.Service.Tests.Laboratory;

public sealed class OversizeTests(RunningService service)
{
    private const string Adopted = """{"adopted":{"waterContent":14,"maximumDryDensity":1.85,"reason":"by hand"}}""";

    [Fact]
    public async Task Without_oversize_there_is_no_corrected_peak_in_the_answer() =>
        Assert.False((await service.AnswerAsync(Body.Sound)).Has("corrected"));

    /// <summary>ASTM D4718: ρdT = 1/(Pf/ρdF + Pc/(Gc·ρw)), wT = Pf·wF + Pc·wc; ρw 0.9982067 Mg/m³ at 20 °C (Tanaka et al. 2001).</summary>
    [Fact]
    public async Task The_corrected_peak_starts_from_the_fitted_optimum()
    {
        var answer = await service.AnswerAsync(Body.With("/oversize", """{"percent":9.4,"specificGravity":2.70,"waterContent":1.0}"""));
        var (w, density) = (answer.Number("/optimum/waterContent"), answer.Number("/optimum/maximumDryDensity"));
        Assert.Equal(1 / ((0.906 / density) + (0.094 / (2.70 * 0.9982067))), answer.Number("/corrected/maximumDryDensity"), 1e-7);
        Assert.Equal((0.906 * w) + (0.094 * 1.0), answer.Number("/corrected/waterContent"), 1e-9);
        Assert.EndsWith(" Mg/m³", answer.Text("/corrected/reported/maximumDryDensity"), StringComparison.Ordinal);
    }

    [Fact]
    public async Task The_corrected_peak_starts_from_an_adopted_one_where_there_is_one()
    {
        var answer = await service.AnswerAsync(Body.With(("/oversize", """{"percent":10,"specificGravity":2.65}"""), ("/curve", Adopted)));
        Assert.Equal(1 / ((0.9 / 1.85) + (0.1 / (2.65 * 0.9982067))), answer.Number("/corrected/maximumDryDensity"), 1e-7);
        Assert.Equal(12.6, answer.Number("/corrected/waterContent"), 1e-9);
    }

    [Theory]
    [InlineData("5", false)]
    [InlineData("5.1", true)]
    public async Task Oversize_above_five_percent_without_its_specific_gravity_is_not_corrected_and_found(string percent, bool found)
    {
        var answer = await service.AnswerAsync(Body.With("/oversize", $$"""{"percent":{{percent}}}"""));
        Assert.Equal(JsonValueKind.Null, answer.GetProperty("corrected").ValueKind);
        Assert.Equal(found, answer.Findings().Contains("oversize-not-corrected"));
    }

    [Theory]
    [InlineData("5", true)]
    [InlineData("5.1", false)]
    public async Task Oversize_up_to_five_percent_is_corrected_with_a_note(string percent, bool noted)
    {
        var answer = await service.AnswerAsync(Body.With("/oversize", $$"""{"percent":{{percent}},"specificGravity":2.65}"""));
        Assert.True(answer.Number("/corrected/maximumDryDensity") > answer.Number("/optimum/maximumDryDensity"));
        Assert.Equal(noted, answer.At("/findings").EnumerateArray().Any(finding => finding.Text("/severity") == "note" && finding.Text("/pointer") == "/oversize/percent"));
    }

    [Fact]
    public async Task Where_there_is_no_peak_there_is_none_to_correct()
    {
        var answer = await service.AnswerAsync(Body.With(("/specimens", """[{"waterContent":10,"dryDensity":1.7}]"""), ("/oversize", """{"percent":10,"specificGravity":2.65}""")));
        Assert.Equal(JsonValueKind.Null, answer.GetProperty("corrected").ValueKind);
    }

    /// <summary>What is reported of the corrected peak follows the method too: ASTM D698 to 0.1 lb/ft³, BS 1377-4 to 0.01 Mg/m³ and two significant figures (from memory).</summary>
    [Theory]
    [InlineData("astm-d698-a", "lb/ft3", 116.0, @"^\d+\.\d %$", @"^\d+\.\d lb/ft³$")]
    [InlineData("astm-d698-a", "Mg/m3", 1.85, @"^\d+\.\d %$", @"^\d\.\d\d Mg/m³$")]
    [InlineData("bs-1377-4-3.3", "Mg/m3", 1.85, @"^\d\d %$", @"^\d\.\d\d Mg/m³$")]
    [InlineData("bs-1377-4-3.3", "kg/m3", 1850, @"^\d\d %$", @"^\d{3}0 kg/m³$")]
    public async Task The_corrected_peak_is_reported_as_the_method_says(string method, string unit, double density, string water, string dry)
    {
        var answer = await service.AnswerAsync(Body.With(
            ("/method", $"\"{method}\""), ("/units/density", $"\"{unit}\""), ("/oversize", """{"percent":10,"specificGravity":2.65}"""),
            ("/curve", string.Create(System.Globalization.CultureInfo.InvariantCulture, $$$"""{"adopted":{"waterContent":14,"maximumDryDensity":{{{density}}},"reason":"by hand"}}"""))));
        Assert.Matches(water, answer.Text("/corrected/reported/waterContent"));
        Assert.Matches(dry, answer.Text("/corrected/reported/maximumDryDensity"));
    }

    /// <summary>ASTM D698, method A: up to 25 % on 4.75 mm.</summary>
    [Theory]
    [InlineData("25", false)]
    [InlineData("25.1", true)]
    public async Task Oversize_above_what_the_method_allows_is_computed_and_found(string percent, bool found)
    {
        var answer = await service.AnswerAsync(Body.With("/oversize", $$"""{"percent":{{percent}},"specificGravity":2.65}"""));
        Assert.Equal(found, answer.Findings().Contains("oversize-above-limit"));
        Assert.NotEqual(JsonValueKind.Null, answer.GetProperty("corrected").ValueKind);
    }
}
