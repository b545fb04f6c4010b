using System.Text.Json;
using Drypeak.Service.Tests.Laboratory;
using MathNet.Numerics.Distributions;
using Xunit;

namespace Drypeak.Service.Tests.Acceptance;

public sealed class AcceptancePlanTests(RunningService service)
{
    private Task<JsonElement> PlanAsync(string body) => service.AnswerAsync(Lots.AcceptancePlan, body);

    /// <summary>Φ((level − 96)·√4/2): at 95 Φ(−1) = 0.1587, at 97 Φ(1) = 0.8413 (standard normal table).</summary>
    [Fact]
    public async Task A_mean_rule_is_exact()
    {
        var answer = await PlanAsync(Lots.SoundPlan);
        Assert.Equal("exact", answer.Text("/computed"));
        Assert.True(answer.IsNull("/trials"));
        Assert.Equal([94, 95, 96, 97], answer.At("/curve").EnumerateArray().Select(point => point.Number("/level")));
        Assert.All(answer.At("/curve").EnumerateArray(), point => Assert.Equal(Normal.CDF(96, 1, point.Number("/level")), point.Number("/probabilityOfAcceptance"), 1e-12));
        Assert.Equal(0.1587, answer.Number("/producersRisk"), 5e-5);
        Assert.Equal(0.1587, answer.Number("/consumersRisk"), 5e-5);
        Assert.Contains("contractor carries a risk of 15.9 %", answer.Text("/explanation"), StringComparison.Ordinal);
        Assert.Contains("owner carries a risk of 15.9 %", answer.Text("/explanation"), StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("""{"rule":"every-test","minimum":95,"maximum":99}""")]
    [InlineData("""{"rule":"share-of-tests","minimum":95,"required":75}""")]
    [InlineData("""{"rule":"percent-within-limits","quantity":"relativeCompaction","minimum":95,"required":80}""")]
    [InlineData("""{"rule":"percent-within-limits","quantity":"relativeCompaction","minimum":93,"maximum":99,"required":80}""")]
    [InlineData("""{"rule":"characteristic-value","quantity":"relativeCompaction","minimum":95,"risk":0.1,"fraction":0.8}""")]
    public async Task One_rule_is_exact_and_two_of_it_are_simulated_near_it(string rule)
    {
        var exact = await PlanAsync(Lots.With(Lots.SoundPlan, ("/rule", rule)));
        var simulated = await PlanAsync(Lots.With(Lots.SoundPlan, ("/rule", Body.Absent), ("/rules", $"[{rule},{rule}]"), ("/seed", "4")));
        Assert.Equal(("exact", "simulated", 100_000, 4), (exact.Text("/computed"), simulated.Text("/computed"), (int)simulated.Number("/trials"), (int)simulated.Number("/seed")));
        for (var i = 0; i < 4; i++)
        {
            Assert.Equal(exact.Number($"/curve/{i}/probabilityOfAcceptance"), simulated.Number($"/curve/{i}/probabilityOfAcceptance"), (4 * simulated.Number($"/curve/{i}/standardError")) + 5e-5);
        }
    }

    [Fact]
    public async Task A_combination_is_simulated_the_same_each_time()
    {
        const string body = """{"rules":[{"rule":"mean","minimum":96},{"rule":"moving-mean","count":3,"minimum":95,"floor":92}],"count":6,"standardDeviation":1.5,"levels":[95,96,97],"acceptableLevel":98}""";
        var (first, second) = (await PlanAsync(body), await PlanAsync(body));
        Assert.Equal(first.GetRawText(), second.GetRawText());
        Assert.Equal("simulated", first.Text("/computed"));
        Assert.InRange(first.Number("/curve/0/standardError"), 1e-5, 0.0016);
        Assert.True(first.IsNull("/consumersRisk"));
    }

    /// <summary>n = ((1.6449 + 1.2816)·2/2)² = 8.56, so 9; the limit lies between what both risks allow.</summary>
    [Fact]
    public async Task A_design_finds_the_fewest_tests_and_the_limit()
    {
        var answer = await PlanAsync("""{"rule":{"rule":"mean"},"standardDeviation":2,"acceptableLevel":98,"rejectableLevel":96,"design":true,"producersRisk":0.05,"consumersRisk":0.1}""");
        Assert.Equal(9, answer.Number("/count"));
        Assert.InRange(answer.Number("/producersRisk"), 0.03, 0.05);
        Assert.InRange(answer.Number("/consumersRisk"), 0.07, 0.1);
        Assert.InRange(answer.Number("/rules/0/minimum"), 96 + (1.2815 * 2 / 3), 98 - (1.6448 * 2 / 3));
        Assert.Equal(41, answer.At("/curve").GetArrayLength());
    }

    [Theory]
    [InlineData("""{"rule":"percent-within-limits","minimum":95}""", "required")]
    [InlineData("""{"rule":"characteristic-value","minimum":95}""", "factor")]
    [InlineData("""{"rule":"share-of-tests","minimum":95}""", "required")]
    [InlineData("""{"rule":"every-test"}""", "minimum")]
    public async Task A_design_that_is_put_back_as_a_plan_keeps_its_risks(string rule, string found)
    {
        var design = await PlanAsync($$"""{"rule":{{rule}},"standardDeviation":1.5,"acceptableLevel":98,"rejectableLevel":95.5,"design":true,"mostTests":500}""");
        Assert.False(design.IsNull("/rules/0/" + found));
        var plan = await PlanAsync($$"""{"rule":{{design.At("/rules/0").GetRawText()}},"standardDeviation":1.5,"count":{{design.Number("/count")}},"acceptableLevel":98,"rejectableLevel":95.5,"levels":[96]}""");
        Assert.Equal(design.Number("/producersRisk"), plan.Number("/producersRisk"), 1e-6);
        Assert.InRange(plan.Number("/producersRisk"), 0, 0.05 + 1e-9);
        Assert.InRange(plan.Number("/consumersRisk"), 0, 0.1 + 1e-9);
    }

    [Fact]
    public async Task A_design_without_a_plan_says_so()
    {
        var answer = await PlanAsync("""{"rule":{"rule":"mean"},"standardDeviation":2,"acceptableLevel":96.1,"rejectableLevel":96,"design":true,"mostTests":50,"count":3}""");
        Assert.True(answer.IsNull("/count"));
        Assert.Equal(["limit-designed", "risk-not-met"], answer.Findings().Order());
    }

    [Fact]
    public async Task A_unit_weight_is_planned_in_its_own_unit()
    {
        var (metric, weight) = (await PlanAsync("""{"rule":{"rule":"percent-within-limits","quantity":"dryDensity","minimum":1.8,"required":85},"count":5,"standardDeviation":0.03,"levels":[1.84]}"""),
            await PlanAsync("""{"units":{"density":"kN/m3"},"rule":{"rule":"percent-within-limits","quantity":"dryDensity","minimum":17.65197,"required":85},"count":5,"standardDeviation":0.2941995,"levels":[18.044236]}"""));
        Assert.Equal(metric.Number("/curve/0/probabilityOfAcceptance"), weight.Number("/curve/0/probabilityOfAcceptance"), 1e-9);
    }

    [Theory]
    [InlineData("""{"rule":{"rule":"percent-within-limits","minimum":95,"required":85},"count":2,"standardDeviation":1,"levels":[99]}""", "too-few-tests")]
    [InlineData("""{"rule":{"rule":"mean","minimum":95},"count":4,"standardDeviation":1,"levels":[99],"acceptableLevel":94,"rejectableLevel":98}""", "levels-on-one-side")]
    public async Task A_plan_that_cannot_do_what_is_meant_has_a_finding(string body, string code) => Assert.Contains(code, (await PlanAsync(body)).Findings());

    [Theory]
    [InlineData("""{"rule":{"rule":"percent-within-limits","minimum":95,"required":100},"count":10000,"standardDeviation":1e-9,"levels":[-1e9,95,1e9]}""")]
    [InlineData("""{"rule":{"rule":"characteristic-value","minimum":0,"factor":-100},"count":2,"standardDeviation":1e9,"levels":[-1e9,0,1e9]}""")]
    [InlineData("""{"rule":{"rule":"percent-within-limits","minimum":95,"maximum":95,"required":50},"count":5,"standardDeviation":1,"levels":[95]}""")]
    [InlineData("""{"rule":{"rule":"every-test","minimum":95},"standardDeviation":1e-9,"design":true,"acceptableLevel":1e9,"rejectableLevel":-1e9}""")]
    [InlineData("""{"rule":{"rule":"characteristic-value","minimum":95},"standardDeviation":1e-6,"design":true,"acceptableLevel":1000,"rejectableLevel":-1000}""")]
    public async Task Extreme_plans_give_probabilities(string body) =>
        Assert.All((await PlanAsync(body)).At("/curve").EnumerateArray(), point => Assert.InRange(point.Number("/probabilityOfAcceptance"), 0, 1));
}
