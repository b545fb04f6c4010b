using System.Text.Json;
using Drypeak.Service.Tests.Laboratory;
using Xunit;

namespace Drypeak.Service.Tests.Field;

/// <summary>The spread of a gauge's readings where the request gives no uncertainty, to the first order (JCGM 100:2008, 4.2.3 and 5.1.2). Expected values are worked out by hand below.</summary>
public sealed class ReadingsUncertaintyTests(RunningService service)
{
    private const string Requirements = """{"quantity":"dryDensity","minimum":1.7},{"quantity":"waterContent","maximum":15},{"quantity":"wetDensity","minimum":1.9},{"quantity":"relativeCompaction","minimum":90}""";

    /// <summary>s/√n of 2.0 and 2.1 is 0.05; of 12 and 14 %, 1 %; the offset's is 0 since there is none.</summary>
    [Fact]
    public async Task The_means_of_wet_density_and_water_content_are_carried_into_the_dry_density()
    {
        var answer = await JudgedAsync("""{"wetDensity":[2.0,2.1],"waterContent":[12,14]}""");
        var (wet, w, ofWet, ofWater) = (2.05, 0.13, 0.05, 0.01);
        Assert.Equal(Root(ofWet / (1 + w), wet / ((1 + w) * (1 + w)) * ofWater), answer.Number("/requirements/0/standardUncertainty"), 1e-7);
        Assert.Equal(100 * ofWater, answer.Number("/requirements/1/standardUncertainty"), 1e-7);

        // The wet density is what was read: its water content does not move it.
        Assert.Equal(ofWet, answer.Number("/requirements/2/standardUncertainty"), 1e-7);
        Assert.Equal(answer.Number("/requirements/0/standardUncertainty") / 1.9 * 100, answer.Number("/requirements/3/standardUncertainty"), 1e-7);
        Assert.Equal("/nuclearGauge", answer.Finding("uncertainty-from-readings").Text("/pointer"));
        Assert.InRange(answer.Number("/requirements/0/probabilityOfConformance"), 0.9, 1);
    }

    /// <summary>With the mass of water read, ρd = ρ − ρm exactly, and so u² = u(ρ)² + u(ρm)²: the correlation through the water content falls out.</summary>
    [Fact]
    public async Task A_mass_of_water_per_volume_is_taken_off_the_wet_density_with_its_own_spread()
    {
        var answer = await JudgedAsync("""{"wetDensity":[2.0,2.1],"waterDensity":[0.22,0.26]}""");
        Assert.Equal(Root(0.05, 0.02), answer.Number("/requirements/0/standardUncertainty"), 1e-7);
        var (wet, water) = (2.05, 0.24);
        var dry = wet - water;
        Assert.Equal(100 * Root(water / (dry * dry) * 0.05, wet / (dry * dry) * 0.02), answer.Number("/requirements/1/standardUncertainty"), 1e-6);
    }

    /// <summary>K of the pairs: 1000(11 − 12)/112 = −8.92857 and 1000(13.5 − 14)/114 = −4.38596; mean −6.65727, s/√2 = 2.27130. One reading: only K is uncertain.</summary>
    [Fact]
    public async Task The_offset_of_the_oven_pairs_brings_its_uncertainty()
    {
        var answer = await JudgedAsync("""{"wetDensity":[2.05],"waterContent":[13],"ovenPairs":[{"gauge":12,"oven":11},{"gauge":14,"oven":13.5}]}""");
        Assert.Equal(2.27130, answer.Number("/test/moistureOffset/standardUncertainty"), 1e-5);
        Assert.Equal(2.27130 * 113 / 1000, answer.Number("/requirements/1/standardUncertainty"), 1e-5);
    }

    [Fact]
    public async Task A_given_uncertainty_stands_for_the_whole()
    {
        var answer = await JudgedAsync("""{"wetDensity":[2.0,2.1],"waterContent":[12,14]}""", """{"dryDensity":0.015,"waterContent":0.3}""");
        Assert.Equal(0.015, answer.Number("/requirements/0/standardUncertainty"), 1e-9);
        Assert.Equal(0.3, answer.Number("/requirements/1/standardUncertainty"), 1e-9);
        Assert.DoesNotContain("uncertainty-from-readings", answer.Findings());
    }

    /// <summary>One reading has no spread, and two that are the same show none: neither says that the value is certain.</summary>
    [Theory]
    [InlineData("""{"wetDensity":[2.05],"waterContent":[13]}""")]
    [InlineData("""{"wetDensity":[2.05,2.05],"waterContent":[13,13]}""")]
    public async Task Readings_without_a_spread_give_no_uncertainty(string gauge)
    {
        var answer = await JudgedAsync(gauge);
        Assert.All(answer.GetProperty("requirements").EnumerateArray(), requirement => Assert.True(requirement.IsNull("/probabilityOfConformance")));
        Assert.DoesNotContain("uncertainty-from-readings", answer.Findings());
    }

    /// <summary>The oven's water content is used, and the gauge's spread is none of it.</summary>
    [Fact]
    public async Task Beside_the_oven_only_the_wet_density_brings_its_spread()
    {
        var answer = await JudgedAsync("""{"wetDensity":[2.0,2.1],"waterContent":[12,14]}""", null, "\"waterContent\":13,");
        Assert.Equal(0.05 / 1.13, answer.Number("/requirements/0/standardUncertainty"), 1e-7);
        Assert.True(answer.IsNull("/requirements/1/standardUncertainty"));
    }

    private static double Root(params double[] parts) => Math.Sqrt(parts.Sum(part => part * part));

    private Task<JsonElement> JudgedAsync(string gauge, string? uncertainty = null, string further = "") => service.AnswerAsync(FieldJobs.FieldDensity, $$"""
        { "method": "nuclear-gauge", "nuclearGauge": {{gauge}}, {{further}} "laboratory": { "maximumDryDensity": 1.9 },
          "specification": { "requirements": [{{Requirements}}] }{{(uncertainty is null ? "" : ", \"uncertainty\": " + uncertainty)}} }
        """);
}
