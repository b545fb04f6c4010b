using System.Globalization;
using CsCheck;
using Xunit;

namespace Drypeak.Service.Tests.Laboratory;

/// <summary><c>POST /v1/oversize-correction</c>: ρdT = 100/(Pf/ρdF + Pc/(Gc·ρw)), wT = (Pf·wF + Pc·wc)/100, and back (ASTM D4718; AASHTO T 99 annex / T 224).</summary>
public sealed class OversizeCorrectionTests(RunningService service)
{
    private const string Address = "/v1/oversize-correction";
    private static readonly string[] UnitsOfDensity = ["Mg/m3", "kg/m3", "lb/ft3", "kN/m3"];
    private const string Stones = """{"percent":18,"specificGravity":2.66,"waterContent":1.2,"sieve":4.75}""";

    /// <summary>Smith and Smith, Elements of Soil Mechanics (attribution not certain); as published, to 0.01 Mg/m³ and 1 %.</summary>
    [Fact]
    public async Task O2_dry_oversize_of_10_percent()
    {
        var published = PublishedCases.Of("oversize", "O2");
        var answer = await service.AnswerAsync(Address, ToTotal(published, published.Number("/dryF"), published.Number("/Gc"), "Mg/m3", published.Number("/rho_w")));
        Assert.True(answer.Number("/total/dryDensity").Prints(published.Number("/published/dryT"), 2));
        Assert.True(answer.Number("/total/waterContent").Prints(published.Number("/published/wT"), 0));
        Assert.True(answer.Number("/total/dryDensity").Prints(published.Number("/exact/dryT"), 4));
    }

    /// <summary>North Dakota Department of Transportation field manual, T 224, rev. 16 June 2011, p. 1-2: water contents only; the density here is any.</summary>
    [Fact]
    public async Task O3_water_contents_mix_by_dry_mass()
    {
        var published = PublishedCases.Of("oversize", "O3");
        var answer = await service.AnswerAsync(Address, ToTotal(published, 1.9, 2.65, "Mg/m3", 1));
        Assert.True(answer.Number("/total/waterContent").Prints(published.Number("/published/wT"), 1));
    }

    /// <summary>FROM MEMORY, not read: western states field operating procedure for T 99/T 180, annex A; water of 62.4 lb/ft³.</summary>
    [Fact]
    public async Task O4_from_memory_27_percent_in_pounds_per_cubic_foot()
    {
        var published = PublishedCases.Of("oversize", "O4");
        var answer = await service.AnswerAsync(Address, ToTotal(published, published.Number("/dryF"), published.Number("/Gc"), "lb/ft3", 62.4));
        Assert.True(answer.Number("/total/dryDensity").Prints(published.Number("/published/dryT"), 1));
        Assert.True(answer.Number("/total/waterContent").Prints(published.Number("/published/wT"), 1));
        Assert.Equal("lb/ft3", answer.Text("/units/density"));
    }

    [Fact]
    public async Task What_goes_to_the_total_comes_back_to_the_fines() =>
        await Gen.Select(Gen.Double[1.3, 2.3], Gen.Double[2, 40], Gen.Double[0.1, 60], Gen.Double[2.3, 3.2], Gen.Double[0, 5], Gen.Int[0, 3].Select(i => UnitsOfDensity[i]))
            .SampleAsync(async (dry, w, percent, gravity, coarse, unit) =>
            {
                var oversize = Text($$"""{"percent":{{percent:R}},"specificGravity":{{gravity:R}},"waterContent":{{coarse:R}}}""");
                var given = dry * unit switch { "kg/m3" => 1000, "lb/ft3" => 62.4, "kN/m3" => 9.8, _ => 1 };
                var total = await service.AnswerAsync(Address, Text($$"""{"units":{"density":"{{unit}}"},"direction":"to-total","fine":{"dryDensity":{{given:R}},"waterContent":{{w:R}}},"oversize":{{oversize}}}"""));
                var back = await service.AnswerAsync(Address, $$"""{"units":{"density":"{{unit}}"},"direction":"to-fines","total":{{total.At("/total").GetRawText()}},"oversize":{{oversize}}}""");
                Assert.Equal(given, back.Number("/fine/dryDensity"), given * 1e-12);
                Assert.Equal(w, back.Number("/fine/waterContent"), 1e-12 * (w + (percent * coarse)));
            }, iter: 40, threads: 1);

    [Fact]
    public async Task What_was_given_is_repeated_as_it_was_given()
    {
        var answer = await service.AnswerAsync(Address, $$"""{"direction":"to-fines","total":{"dryDensity":1.97,"waterContent":12.1},"oversize":{{Stones}}}""");
        Assert.Equal(1.97, answer.Number("/total/dryDensity"));
        Assert.Equal(12.1, answer.Number("/total/waterContent"));
    }

    /// <summary>Over 5 % needed, to 40 % on 4.75 mm, to 30 % on 19 mm: ASTM D4718.</summary>
    [Theory]
    [InlineData("5", "4.75", "oversize-small")]
    [InlineData("5.1", "4.75", null)]
    [InlineData("40", "4.75", null)]
    [InlineData("40.1", "4.75", "oversize-above-limit")]
    [InlineData("30", "19", null)]
    [InlineData("30.1", "19", "oversize-above-limit")]
    [InlineData("30.1", "null", "oversize-above-limit")]
    public async Task Beyond_the_limits_it_is_computed_and_found(string percent, string sieve, string? code)
    {
        var answer = await service.AnswerAsync(Address, $$"""{"direction":"to-total","fine":{"dryDensity":1.86,"waterContent":14},"oversize":{"percent":{{percent}},"specificGravity":2.65,"sieve":{{sieve}} } }""");
        Assert.Equal(code is null ? [] : [code], answer.Findings());
        Assert.True(answer.Number("/total/dryDensity") > 1.86);
    }

    [Theory]
    [InlineData("""{"dryDensity":2.7,"waterContent":10}""", """{"percent":90,"specificGravity":2.2}""")]
    [InlineData("""{"dryDensity":1.9,"waterContent":0.4}""", """{"percent":30,"specificGravity":2.65,"waterContent":2}""")]
    public async Task A_total_that_leaves_nothing_for_the_fines_is_refused(string total, string oversize)
    {
        var refusal = await service.RefusalAsync(Address, $$"""{"direction":"to-fines","total":{{total}},"oversize":{{oversize}}}""");
        Assert.Equal(422, refusal.Status);
        Assert.Equal(["/total oversize-fills-all"], refusal.Faults);
    }

    [Theory]
    [InlineData("to-total", "fine")]
    [InlineData("to-fines", "total")]
    public async Task The_working_of_either_direction_can_be_followed(string direction, string given)
    {
        var answer = await service.AnswerAsync(Address, $$"""{"direction":"{{direction}}","{{given}}":{"dryDensity":1.97,"waterContent":12},"oversize":{{Stones}},"trace":true}""");
        var trace = answer.At("/trace").EnumerateArray().ToList();
        Assert.Equal(2, trace.Count);
        Assert.All(trace, step => Assert.Equal(step.Number("/value"), Arithmetic.Value(step.Text("/substitution")!), 1e-9));
        var result = direction == "to-total" ? "/total" : "/fine";
        Assert.Equal(answer.Number(result + "/dryDensity"), trace[0].Number("/value"));
        Assert.Equal(answer.Number(result + "/waterContent"), trace[1].Number("/value"));
    }

    [Theory]
    [InlineData("""{"fine":{"dryDensity":1.9,"waterContent":10},"oversize":{"percent":10,"specificGravity":2.6}}""", 400, "/direction missing-member")]
    [InlineData("""{"direction":"to-total","fine":{"dryDensity":1.9,"waterContent":10}}""", 400, "/oversize missing-member")]
    [InlineData("""{"direction":"to-total","fine":{"dryDensity":1.9},"oversize":{"percent":10,"specificGravity":2.6}}""", 400, "/fine/waterContent missing-member")]
    [InlineData("""{"direction":"to-total","fines":{},"fine":{"dryDensity":1.9,"waterContent":10},"oversize":{"percent":10,"specificGravity":2.6}}""", 400, "/fines unknown-member")]
    [InlineData("""{"direction":"both","fine":{"dryDensity":1.9,"waterContent":10},"oversize":{"percent":10,"specificGravity":2.6}}""", 422, "/direction unknown-word")]
    [InlineData("""{"direction":"to-total","oversize":{"percent":10,"specificGravity":2.6}}""", 422, "/fine incomplete")]
    [InlineData("""{"direction":"to-fines","oversize":{"percent":10,"specificGravity":2.6}}""", 422, "/total incomplete")]
    [InlineData("""{"direction":"to-total","fine":{"dryDensity":1.9,"waterContent":10},"total":{"dryDensity":1.9,"waterContent":10},"oversize":{"percent":10,"specificGravity":2.6}}""", 422, "/total not-for-this-direction")]
    [InlineData("""{"direction":"to-total","fine":{"dryDensity":1.9,"waterContent":10},"oversize":{"percent":10}}""", 422, "/oversize/specificGravity incomplete")]
    [InlineData("""{"direction":"to-total","fine":{"dryDensity":1.9,"waterContent":10},"oversize":{"percent":100,"specificGravity":2.6}}""", 422, "/oversize/percent out-of-range")]
    [InlineData("""{"direction":"to-total","fine":{"dryDensity":0,"waterContent":10},"oversize":{"percent":10,"specificGravity":2.6}}""", 422, "/fine/dryDensity not-positive")]
    [InlineData("""{"direction":"to-total","fine":{"dryDensity":1.9,"waterContent":-1},"oversize":{"percent":10,"specificGravity":2.6}}""", 422, "/fine/waterContent out-of-range")]
    [InlineData("""{"direction":"to-total","fine":{"dryDensity":1.9,"waterContent":10},"oversize":{"percent":10,"specificGravity":0}}""", 422, "/oversize/specificGravity out-of-range")]
    public async Task A_fault_is_refused_at_its_place(string body, int status, string fault)
    {
        var refusal = await service.RefusalAsync(Address, body);
        Assert.Equal(status, refusal.Status);
        Assert.Equal([fault], refusal.Faults);
    }

    private static string Text(FormattableString json) => json.ToString(CultureInfo.InvariantCulture);

    private static string ToTotal(System.Text.Json.JsonElement published, double dry, double gravity, string unit, double water) => Text($$"""
        {
          "units": { "density": "{{unit}}" }, "waterDensity": {{water}}, "direction": "to-total",
          "fine": { "dryDensity": {{dry}}, "waterContent": {{published.Number("/wF")}} },
          "oversize": { "percent": {{published.Number("/PC")}}, "specificGravity": {{gravity}}, "waterContent": {{published.Number("/wC")}} }
        }
        """);
}
