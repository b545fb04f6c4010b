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
