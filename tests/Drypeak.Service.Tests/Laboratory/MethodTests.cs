using System.Text.Json;
using Drypeak.Soil.TestMethods;
using Xunit;

namespace Drypeak.Service.Tests.Laboratory;

public sealed class MethodTests(RunningService service)
{
    private const string Effort = """{"rammerMass":2495,"drop":304.8,"layers":3,"blows":25}""";

    /// <summary>The codes that laboratories' systems are written against: a code may be added, none may change.</summary>
    public static TheoryData<string> Codes =>
    [
        "astm-d698-a", "astm-d698-b", "astm-d698-c", "astm-d1557-a", "astm-d1557-b", "astm-d1557-c",
        "aashto-t99-a", "aashto-t99-b", "aashto-t99-c", "aashto-t99-d", "aashto-t180-a", "aashto-t180-b", "aashto-t180-c", "aashto-t180-d",
        "bs-1377-4-3.3", "bs-1377-4-3.4", "bs-1377-4-3.5", "bs-1377-4-3.6", "bs-1377-4-3.7",
        "en-13286-2-standard-a", "en-13286-2-standard-b", "en-13286-2-modified-a", "en-13286-2-modified-b",
        "as-1289-5.1.1-a", "as-1289-5.1.1-b", "as-1289-5.2.1-a", "as-1289-5.2.1-b",
        "is-2720-7-small", "is-2720-7-large", "is-2720-8-small", "is-2720-8-large",
        "jis-a-1210-a", "jis-a-1210-b", "jis-a-1210-c", "jis-a-1210-d", "jis-a-1210-e",
        "nf-p94-093-normal", "nf-p94-093-modified", "nf-p94-093-normal-cbr", "nf-p94-093-modified-cbr",
        "nbr-7182", "tex-114-e-1", "tex-114-e-2", "tex-114-e-3", "tex-113-e", "custom",
    ];

    [Theory]
    [MemberData(nameof(Codes))]
    public async Task Every_code_is_accepted_and_comes_back_with_its_title(string code)
    {
        var answer = await service.AnswerAsync(Body.With("/method", $"\"{code}\""));
        Assert.Equal(code, answer.Text("/method/code"));
        Assert.NotEqual("", answer.Text("/method/title"));
        Assert.DoesNotContain("method-not-given", answer.Findings());
    }

    [Fact]
    public void No_code_of_the_catalogue_is_unknown_to_those_who_wrote_the_contract() =>
        Assert.Equal(Codes.Select(row => row.Data).Order(), TestMethodCatalogue.Codes.Append("custom").Order());

    [Theory]
    [InlineData(Body.Absent)]
    [InlineData("null")]
    public async Task Without_a_method_nothing_of_a_method_is_checked_and_a_note_says_so(string method)
    {
        var answer = await service.AnswerAsync(Body.With(("/method", method), ("/mold/volume", "900"), ("/particlesAbove", """{"sieve":20,"percent":80}""")));
        Assert.True(answer.IsNull("/method"));
        Assert.Equal("note", answer.Finding("method-not-given").Text("/severity"));
        Assert.DoesNotContain("mold-outside-tolerance", answer.Findings());
        Assert.DoesNotContain("particles-above-limit", answer.Findings());
    }

    /// <summary>943 ± 14 cm³: ASTM D698 (from memory).</summary>
    [Theory]
    [InlineData("957", false)]
    [InlineData("957.1", true)]
    [InlineData("929", false)]
    [InlineData("928.9", true)]
    public async Task A_mold_outside_the_methods_tolerance_is_found(string volume, bool found)
    {
        var answer = await service.AnswerAsync(Body.With("/mold/volume", volume));
        Assert.Equal(found, answer.Findings().Contains("mold-outside-tolerance"));
    }

    /// <summary>25 % on 4.75 mm: ASTM D698, method A.</summary>
    [Theory]
    [InlineData("4.75", "25", false)]
    [InlineData("4.75", "25.1", true)]
    [InlineData("20", "26", true)]
    [InlineData("2", "60", false)]
    public async Task Particles_above_the_methods_sieve_are_held_against_its_limit(string sieve, string percent, bool found)
    {
        var answer = await service.AnswerAsync(Body.With("/particlesAbove", $$"""{"sieve":{{sieve}},"percent":{{percent}}}"""));
        Assert.Equal(found, answer.Findings().Contains("particles-above-limit"));
    }

    /// <summary>m·g·h·layers·blows/V = 2.495·9.80665·0.3048·3·25/943e-6 J/m³.</summary>
    [Fact]
    public async Task The_effort_of_a_custom_method_is_computed_in_kilojoules_a_cubic_meter()
    {
        var answer = await service.AnswerAsync(Body.With(("/method", "\"custom\""), ("/effort", Effort)));
        Assert.Equal(2.495 * 9.80665 * 0.3048 * 75 / 943e-6 / 1000, answer.Number("/method/effort/computed"), 1e-9);
        Assert.True(answer.IsNull("/method/effort/nominal"));
    }

    [Fact]
    public async Task The_effort_is_read_in_the_units_of_the_request()
    {
        var metric = await service.AnswerAsync(Body.With(("/method", "\"custom\""), ("/effort", Effort)));
        var inches = await service.AnswerAsync(Body.With(("/method", "\"custom\""), ("/units/length", "\"in\""), ("/effort", """{"rammerMass":2495,"drop":12,"layers":3,"blows":25}""")));
        Assert.Equal(metric.Number("/method/effort/computed"), inches.Number("/method/effort/computed"), 1e-9);
    }

    [Fact]
    public async Task Without_a_molds_volume_there_is_no_effort_to_compute()
    {
        var answer = await service.AnswerAsync(Body.With(
            ("/method", "\"custom\""), ("/effort", Effort), ("/specimens", """[{"waterContent":10,"dryDensity":1.7}]""")));
        Assert.True(answer.IsNull("/method/effort/computed"));
    }

    /// <summary>600 and 2700 kN·m/m³: titles of ASTM D698 and D1557.</summary>
    [Theory]
    [InlineData("astm-d698-a", 600)]
    [InlineData("astm-d1557-c", 2700)]
    public async Task A_published_method_shows_its_computed_and_its_nominal_effort(string code, double nominal)
    {
        var effort = (await service.AnswerAsync(Body.With("/method", JsonSerializer.Serialize(code)))).At("/method/effort");
        Assert.Equal(nominal, effort.Number("/nominal"));
        Assert.InRange(effort.Number("/computed"), nominal * 0.97, nominal * 1.03);
    }
}
