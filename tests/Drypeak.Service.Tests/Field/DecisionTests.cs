using System.Globalization;
using System.Text.Json;
using Drypeak.Service.Tests.Laboratory;
using Xunit;

namespace Drypeak.Service.Tests.Field;

/// <summary>Requirements, decision rules and probabilities (ISO/IEC 17025:2017, 7.8.6; JCGM 106:2012). Φ and z below are from tables of the normal distribution.</summary>
public sealed class DecisionTests(RunningService service)
{
    /// <summary>Limits are inclusive: 95 % of 2.0 is 1.9, which arithmetic may miss by its last digit.</summary>
    [Theory]
    [InlineData("1.9", "met", 0)]
    [InlineData("1.91", "met", 0.5)]
    [InlineData("1.8999", "not-met", -0.005)]
    public async Task A_limit_is_inclusive_and_the_margin_has_a_sign(string dry, string outcome, double margin)
    {
        var answer = await JudgedAsync(dry, """{"quantity":"relativeCompaction","minimum":95}""", null);
        Assert.Equal(outcome, answer.Text("/requirements/0/outcome"));
        Assert.Equal(margin, answer.Number("/requirements/0/margin"), 1e-9);
        Assert.Equal(outcome == "met" ? "accepted" : "rejected", answer.Text("/outcome"));
        Assert.True(answer.IsNull("/requirements/0/probabilityOfConformance"));
        Assert.True(answer.IsNull("/requirements/0/maximum"));
    }

    /// <summary>Φ(1) = 0.8413447, Φ(−1) = 0.1586553, Φ(2) = 0.9772499.</summary>
    [Theory]
    [InlineData("1.92", """{"quantity":"relativeCompaction","minimum":95}""", 0.841344746)]
    [InlineData("1.88", """{"quantity":"relativeCompaction","minimum":95}""", 0.158655254)]
    [InlineData("1.90", """{"quantity":"relativeCompaction","maximum":96}""", 0.841344746)]
    [InlineData("1.92", """{"quantity":"relativeCompaction","minimum":95,"maximum":98}""", 0.818594614)]
    [InlineData("1.92", """{"quantity":"dryDensity","minimum":1.88}""", 0.977249868)]
    public async Task The_probability_of_conformance_is_the_normal_distributions(string dry, string requirement, double expected)
    {
        var answer = await JudgedAsync(dry, requirement, null, """{"dryDensity":0.02}""");
        Assert.Equal(expected, answer.Number("/requirements/0/probabilityOfConformance"), 1e-8);
    }

    /// <summary>z(0.95) = 1.6448536; with u = 1 % the band is 1.645 % on both sides of 95 %.</summary>
    [Theory]
    [InlineData("1.932896", "undecided")]
    [InlineData("1.932898", "met")]
    [InlineData("1.9330", "met")]
    [InlineData("1.9000", "undecided")]
    [InlineData("1.867104", "undecided")]
    [InlineData("1.867102", "not-met")]
    [InlineData("1.8670", "not-met")]
    public async Task A_guarded_decision_has_a_band_on_both_sides_of_the_limit(string dry, string outcome)
    {
        var answer = await JudgedAsync(dry, """{"quantity":"relativeCompaction","minimum":95}""", """{"rule":"guarded","risk":0.05}""", """{"dryDensity":0.02}""");
        Assert.Equal(outcome, answer.Text("/requirements/0/outcome"));
        Assert.Equal(outcome switch { "met" => "accepted", "not-met" => "rejected", _ => "undecided" }, answer.Text("/outcome"));
        if (outcome == "undecided")
        {
            Assert.Contains("another test", answer.Finding("within-guard-band").Text("/message"), StringComparison.Ordinal);
            Assert.Contains("another test", answer.Text("/requirements/0/explanation"), StringComparison.Ordinal);
        }
    }

    [Fact]
    public async Task At_a_risk_of_one_half_a_guarded_decision_is_the_simple_one()
    {
        Assert.Equal("met", (await JudgedAsync("1.9", """{"quantity":"relativeCompaction","minimum":95}""", """{"rule":"guarded","risk":0.5}""", """{"dryDensity":0.02}""")).Text("/requirements/0/outcome"));
        Assert.Equal("not-met", (await JudgedAsync("1.8999", """{"quantity":"relativeCompaction","minimum":95}""", """{"rule":"guarded","risk":0.5}""", """{"dryDensity":0.02}""")).Text("/requirements/0/outcome"));
    }

    [Fact]
    public async Task A_guarded_decision_without_an_uncertainty_is_undecided_with_a_finding()
    {
        var answer = await JudgedAsync("1.99", """{"quantity":"relativeCompaction","minimum":95}""", """{"rule":"guarded","risk":0.05}""");
        Assert.Equal("undecided", answer.Text("/outcome"));
        Assert.Equal("/specification/requirements/0", answer.Finding("uncertainty-missing").Text("/pointer"));
        Assert.Equal(4.5, answer.Number("/requirements/0/margin"), 1e-9);
    }

    [Fact]
    public async Task An_uncertainty_of_nothing_leaves_no_doubt()
    {
        var answer = await JudgedAsync("1.9", """{"quantity":"relativeCompaction","minimum":95}""", """{"rule":"guarded","risk":0.05}""", """{"dryDensity":0}""");
        Assert.Equal("met", answer.Text("/requirements/0/outcome"));
        Assert.Equal(1, answer.Number("/requirements/0/probabilityOfConformance"));
    }

    /// <summary>By hand: u(RC) = RC·√((u/ρd)² + (U/ρmax)²), u(Δw) = √(0.3² + 0.4²), u(ρ) = √((1 + w)²u² + ρd²u_w²).</summary>
    [Fact]
    public async Task Uncertainties_of_field_and_laboratory_are_carried_to_first_order()
    {
        var answer = await service.AnswerAsync(FieldJobs.FieldDensity, """
            { "method": "direct", "direct": { "dryDensity": 1.9 }, "waterContent": 10, "waterDensity": 1, "specificGravity": { "value": 2.7 },
              "laboratory": { "maximumDryDensity": 2.0, "optimumWaterContent": 11, "minimumDryDensity": 1.5, "uncertainty": { "maximumDryDensity": 0.01, "optimumWaterContent": 0.4 } },
              "uncertainty": { "dryDensity": 0.02, "waterContent": 0.3 },
              "specification": { "requirements": [
                { "quantity": "relativeCompaction", "minimum": 90 }, { "quantity": "waterContentFromOptimum", "minimum": -3 }, { "quantity": "wetDensity", "minimum": 1.9 },
                { "quantity": "dryDensity", "minimum": 1.8 }, { "quantity": "waterContent", "maximum": 12 }, { "quantity": "voidRatio", "maximum": 0.6 },
                { "quantity": "saturation", "minimum": 60 }, { "quantity": "airVoids", "maximum": 15 }, { "quantity": "relativeDensity", "minimum": 70 } ] } }
            """);
        var (d, w, most, least, gs) = (1.9, 0.10, 2.0, 1.5, 2.7);
        var e = (gs / d) - 1;
        var slopeOfSaturation = w * gs * gs / (d * d * e * e);
        double Root(params double[] parts) => Math.Sqrt(parts.Sum(part => part * part));
        double[] expected =
        [
            100 * d / most * Root(0.02 / d, 0.01 / most),
            Root(0.3, 0.4),
            Root(1.1 * 0.02, d * 0.003),
            0.02,
            0.3,
            gs / (d * d) * 0.02,
            100 * Root(slopeOfSaturation * 0.02, gs / e * 0.003),
            100 * Root(((1 / gs) + w) * 0.02, d * 0.003),
            100 * Root(most * least / (d * d) / (most - least) * 0.02, least * (d - least) / (d * Math.Pow(most - least, 2)) * 0.01),
        ];
        Assert.All(expected, (standard, i) => Assert.Equal(standard, answer.Number($"/requirements/{i}/standardUncertainty"), 1e-7));
        Assert.Equal(9, answer.GetProperty("requirements").EnumerateArray().Count(requirement => requirement.Text("/outcome") == "met"));
    }

    [Fact]
    public async Task A_missed_requirement_rejects_whatever_the_others_say()
    {
        var answer = await JudgedAsync("1.8", """{"quantity":"relativeCompaction","minimum":95},{"quantity":"saturation","minimum":80},{"quantity":"dryDensity","minimum":1.7}""", null);
        Assert.Equal(["not-met", "undecided", "met"], answer.GetProperty("requirements").EnumerateArray().Select(item => item.Text("/outcome")));
        Assert.Equal("rejected", answer.Text("/outcome"));
        Assert.Contains("specific gravity", answer.Finding("value-missing").Text("/message"), StringComparison.Ordinal);
    }

    [Fact]
    public async Task An_explanation_says_by_how_much()
    {
        var answer = await JudgedAsync("1.88", """{"quantity":"relativeCompaction","minimum":95}""", null);
        Assert.Equal("The relative compaction is 94.0 %, 1.00 below the minimum of 95.0 %.", answer.Text("/requirements/0/explanation"));
    }

    private Task<JsonElement> JudgedAsync(string dry, string requirements, string? decision, string? uncertainty = null) =>
        service.AnswerAsync(FieldJobs.FieldDensity, string.Create(CultureInfo.InvariantCulture, $$"""
            { "method": "direct", "direct": { "dryDensity": {{dry}} }, "waterContent": 10, "laboratory": { "maximumDryDensity": 2.0, "optimumWaterContent": 11 },
              "specification": { "requirements": [{{requirements}}]{{(decision is null ? "" : ",\"decision\":" + decision)}} }{{(uncertainty is null ? "" : ",\"uncertainty\":" + uncertainty)}} }
            """));
}
