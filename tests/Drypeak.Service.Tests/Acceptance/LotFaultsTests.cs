using Drypeak.Service.Tests.Laboratory;
using Xunit;

namespace Drypeak.Service.Tests.Acceptance;

/// <summary>Bad bodies of lots and plans: each has the status, the place and the code of its fault, and no other.</summary>
public sealed class LotFaultsTests(RunningService service)
{
    [Theory]
    // Form: 400.
    [InlineData("/tests", Body.Absent, 400, "/tests missing-member")]
    [InlineData("/tests", "null", 400, "/tests null-not-allowed")]
    [InlineData("/tests/0", "null", 400, "/tests/0 null-not-allowed")]
    [InlineData("/tests/1/density", "1.8", 400, "/tests/1/density unknown-member")]
    [InlineData("/tests/1/dryDensity", "\"1.8\"", 400, "/tests/1/dryDensity wrong-type")]
    [InlineData("/tests/1/lift", "1.5", 400, "/tests/1/lift wrong-type")]
    [InlineData("/lotRules/1/rule", Body.Absent, 400, "/lotRules/1/rule missing-member")]
    [InlineData("/lotRules/2/count", "\"3\"", 400, "/lotRules/2/count wrong-type")]
    [InlineData("/controlChart/kind", Body.Absent, 400, "/controlChart/kind missing-member")]
    [InlineData("/window/waterContentFromOptimum", "3", 400, "/window/waterContentFromOptimum wrong-type")]
    [InlineData("/tests/0/fieldDensity", "{}", 400, "/tests/0/fieldDensity/method missing-member")]
    [InlineData("/specification", "{}", 400, "/specification/requirements missing-member")]
    // Values: 422.
    [InlineData("/tests", "[]", 422, "/tests empty-list")]
    [InlineData("/lotRules", "[]", 422, "/lotRules empty-list")]
    [InlineData("/lotRules/1/rule", "\"average\"", 422, "/lotRules/1/rule unknown-rule")]
    [InlineData("/lotRules/1/quantity", Body.Absent, 422, "/lotRules/1/quantity not-enough-data")]
    [InlineData("/lotRules/1/quantity", "\"density\"", 422, "/lotRules/1/quantity unknown-quantity")]
    [InlineData("/lotRules/1/minimum", Body.Absent, 422, "/lotRules/1/minimum not-enough-data")]
    [InlineData("/lotRules/1/maximum", "90", 422, "/lotRules/1/maximum limits-exchanged")]
    [InlineData("/lotRules/1/minimum", "-1", 422, "/lotRules/1/minimum out-of-range")]
    [InlineData("/lotRules/1/count", "3", 422, "/lotRules/1/count not-for-this-rule")]
    [InlineData("/lotRules/2/count", "1", 422, "/lotRules/2/count out-of-range")]
    [InlineData("/lotRules/2/count", Body.Absent, 422, "/lotRules/2/count not-enough-data")]
    [InlineData("/lotRules/3/required", "101", 422, "/lotRules/3/required out-of-range")]
    [InlineData("/lotRules/3/required", Body.Absent, 422, "/lotRules/3/required not-enough-data")]
    [InlineData("/lotRules/4/factor", Body.Absent, 422, "/lotRules/4/factor not-enough-data")]
    [InlineData("/lotRules/4/risk", "0.1", 422, "/lotRules/4/factor given-twice; /lotRules/4/fraction incomplete")]
    [InlineData("/lotRules/4", """{"rule":"characteristic-value","quantity":"relativeCompaction","minimum":95,"risk":0,"fraction":1}""", 422, "/lotRules/4/risk out-of-range; /lotRules/4/fraction out-of-range")]
    [InlineData("/lotRules/0", """{"rule":"wet-of-line-of-optimums","required":80,"minimum":1}""", 422, "/lotRules/0/minimum not-for-this-rule")]
    [InlineData("/specification", Body.Absent, 422, "/lotRules/0 not-enough-data")]
    [InlineData("/tests/0", "{}", 422, "/tests/0 not-enough-data")]
    [InlineData("/tests/0/relativeCompaction", "0", 422, "/tests/0/relativeCompaction not-positive")]
    [InlineData("/tests/0/relativeCompaction", "1001", 422, "/tests/0/relativeCompaction out-of-range")]
    [InlineData("/tests/1/dryDensity", "-1", 422, "/tests/1/dryDensity not-positive")]
    [InlineData("/tests/1/waterContent", "-1", 422, "/tests/1/waterContent out-of-range")]
    [InlineData("/tests/1/wetBasis", "5", 422, "/tests/1/wetBasis contradiction")]
    [InlineData("/tests/1/relativeCompaction", "97", 422, "/tests/1/relativeCompaction contradiction")]
    [InlineData("/tests/2/dryDensity", "1.9", 422, "/tests/2/wetDensity contradiction")]
    [InlineData("/tests/1/waterContentFromOptimum", "1", 422, "/tests/1/waterContentFromOptimum contradiction")]
    [InlineData("/tests/1/label", "\"a\"", 422, "/tests/1/label repeated-label")]
    [InlineData("/tests/1/label", "\" \"", 422, "/tests/1/label blank")]
    [InlineData("/tests/0/label", "\"2\"", 200, "")]
    [InlineData("/tests/1/replaces", "\"z\"", 422, "/tests/1/replaces unknown-label")]
    [InlineData("/tests/1/replaces", "\"b\"", 422, "/tests/1/replaces replaces-itself")]
    [InlineData("/tests/1/setAside", "\"\"", 422, "/tests/1/setAside blank")]
    [InlineData("/tests/1/time", "\"2026-05-12\"", 422, "/tests/0/time incomplete; /tests/2/time incomplete; /tests/3/time incomplete")]
    [InlineData("/tests/1/fieldDensity", """{"method":"direct","direct":{"dryDensity":1.8}}""", 422, "/tests/1/fieldDensity given-twice")]
    [InlineData("/tests/1", """{"fieldDensity":{"method":"direct","direct":{"dryDensity":-1}}}""", 422, "/tests/1/fieldDensity/direct/dryDensity not-positive")]
    [InlineData("/tests/1/laboratory", """{"test":{"specimens":[]}}""", 422, "/tests/1/laboratory/test/specimens empty-list")]
    [InlineData("/tests/1/lift", "20000", 422, "/tests/1/lift out-of-range")]
    [InlineData("/controlChart/kind", "\"shewhart\"", 422, "/controlChart/kind unknown-word")]
    [InlineData("/controlChart/weight", "0.2", 422, "/controlChart/weight not-for-this-kind")]
    [InlineData("/controlChart/standardDeviation", "0", 422, "/controlChart/standardDeviation not-positive")]
    [InlineData("/window", "{}", 422, "/window not-enough-data")]
    [InlineData("/window/waterContentFromOptimum", "[3, 0]", 422, "/window/waterContentFromOptimum not-a-range")]
    [InlineData("/window/waterContentFromOptimum", "[0]", 422, "/window/waterContentFromOptimum not-a-range")]
    [InlineData("/window/maximumSaturation", "70", 422, "/window/maximumSaturation limits-exchanged")]
    [InlineData("/window/minimumSaturation", "120", 422, "/window/minimumSaturation out-of-range")]
    [InlineData("/toleranceInterval", """{"fraction":1}""", 422, "/toleranceInterval/fraction out-of-range")]
    [InlineData("/waterDensity", "2", 422, "/waterDensity out-of-range")]
    [InlineData("/units/density", "\"oz\"", 422, "/units/density unknown-unit")]
    public async Task A_bad_lot_is_refused_at_its_place(string place, string json, int status, string faults) =>
        await AssertRefusedAsync(Lots.LotAcceptance, Lots.With(Lots.Sound, (place, json)), status, faults);

    [Theory]
    [InlineData("""[{"label":"a","relativeCompaction":96},{"label":"b","relativeCompaction":96,"replaces":"a"},{"label":"c","relativeCompaction":96,"replaces":"a"}]""", "/tests/2/replaces replaced-twice")]
    [InlineData("""[{"label":"a","relativeCompaction":96,"replaces":"b"},{"label":"b","relativeCompaction":96,"replaces":"a"}]""", "/tests/0/replaces replaces-in-a-circle; /tests/1/replaces replaces-in-a-circle")]
    [InlineData("""[{"label":"a","relativeCompaction":96},{"label":"b","relativeCompaction":96,"replaces":"a","setAside":"wet"}]""", "/tests/1/replaces retest-set-aside")]
    [InlineData("""[{"relativeCompaction":96},{"label":"3","relativeCompaction":96},{"relativeCompaction":96}]""", "/tests/2/label repeated-label")]
    [InlineData("""[{"relativeCompaction":96,"time":"2026-05-12T10:00"},{"relativeCompaction":96,"time":"2026-05-12T10:00Z"}]""", "/tests/1/time mixed-offsets")]
    [InlineData("""[{"relativeCompaction":96,"time":"12.5.2026"}]""", "/tests/0/time not-a-time")]
    public async Task Tests_that_do_not_fit_each_other_are_refused(string tests, string faults) =>
        await AssertRefusedAsync(Lots.LotAcceptance, $$"""{"tests":{{tests}} }""", 422, faults);

    [Theory]
    [InlineData("/standardDeviation", Body.Absent, 400, "/standardDeviation missing-member")]
    [InlineData("/standardDeviation", "0", 422, "/standardDeviation not-positive")]
    [InlineData("/count", "2.5", 400, "/count wrong-type")]
    [InlineData("/count", "0", 422, "/count out-of-range")]
    [InlineData("/count", Body.Absent, 422, "/count not-enough-data")]
    [InlineData("/rule", Body.Absent, 422, "/rule not-enough-data")]
    [InlineData("/rules", """[{"rule":"mean","minimum":95}]""", 422, "/rules given-twice")]
    [InlineData("/rule/minimum", Body.Absent, 422, "/rule/minimum not-enough-data")]
    [InlineData("/rule", """{"rule":"percent-within-limits","minimum":95}""", 422, "/rule/required not-enough-data")]
    [InlineData("/rule", """{"rule":"characteristic-value","minimum":95}""", 422, "/rule/factor not-enough-data")]
    [InlineData("/rule", """{"rule":"wet-of-line-of-optimums","required":80}""", 422, "/rule/rule not-for-a-plan")]
    [InlineData("/levels", "[]", 422, "/levels empty-list")]
    [InlineData("/levels", "[null]", 400, "/levels/0 null-not-allowed")]
    [InlineData("/levels", "[1e10]", 422, "/levels/0 out-of-range")]
    [InlineData("/trials", "1000", 422, "/trials out-of-range")]
    [InlineData("/seed", "-1", 422, "/seed negative")]
    [InlineData("/producersRisk", "0.05", 422, "/producersRisk not-without-design")]
    [InlineData("/design", "\"yes\"", 400, "/design wrong-type")]
    public async Task A_bad_plan_is_refused_at_its_place(string place, string json, int status, string faults) =>
        await AssertRefusedAsync(Lots.AcceptancePlan, Lots.With(Lots.SoundPlan, (place, json)), status, faults);

    [Theory]
    [InlineData("""{"rule":"mean"},"acceptableLevel":97""", "/rejectableLevel not-enough-data")]
    [InlineData("""{"rule":"mean"},"acceptableLevel":97,"rejectableLevel":97""", "/rejectableLevel levels-equal")]
    [InlineData("""{"rule":"mean","maximum":96},"acceptableLevel":97,"rejectableLevel":95""", "/rule/maximum not-for-a-design")]
    [InlineData("""{"rule":"percent-within-limits"},"acceptableLevel":97,"rejectableLevel":95""", "/rule/minimum not-enough-data")]
    [InlineData("""{"rule":"moving-mean","count":3,"minimum":95},"acceptableLevel":97,"rejectableLevel":95""", "/rule/rule not-for-a-design")]
    [InlineData("""{"rule":"mean"},"acceptableLevel":97,"rejectableLevel":95,"consumersRisk":0.6""", "/consumersRisk out-of-range")]
    public async Task A_design_says_what_it_needs(string rule, string faults) =>
        await AssertRefusedAsync(Lots.AcceptancePlan, $$"""{"design":true,"standardDeviation":2,"rule":{{rule}} }""", 422, faults);

    [Theory]
    [InlineData("""[{"rule":"mean","minimum":95},{"rule":"mean","quantity":"airVoids","maximum":5}]""", "6", "/rules several-quantities")]
    [InlineData("""[{"rule":"mean","minimum":95},{"rule":"every-test","minimum":93}]""", "2000", "/count out-of-range")]
    public async Task A_simulated_plan_has_its_bounds(string rules, string count, string faults) =>
        await AssertRefusedAsync(Lots.AcceptancePlan, $$"""{"rules":{{rules}},"count":{{count}},"standardDeviation":2}""", 422, faults);

    [Fact]
    public async Task Every_fault_is_told_at_once()
    {
        var refusal = await service.RefusalAsync(Lots.LotAcceptance, Lots.With(Lots.Sound,
            ("/units/density", "\"stone\""), ("/lotRules/1/minimum", "-1"), ("/tests/0/relativeCompaction", "-1"), ("/tests/3/label", "\"a\""), ("/window/minimumSaturation", "200")));
        Assert.Equal(
            ["/units/density unknown-unit", "/lotRules/1/minimum out-of-range", "/tests/0/relativeCompaction not-positive", "/tests/3/label repeated-label", "/window/minimumSaturation out-of-range"],
            refusal.Faults);
    }

    [Fact]
    public async Task More_tests_than_the_bound_are_refused()
    {
        var body = Lots.Of("""{"rule":"mean","quantity":"relativeCompaction","minimum":95}""", Enumerable.Repeat(96.0, 20_001));
        await AssertRefusedAsync(Lots.LotAcceptance, body, 422, "/tests too-many");
    }

    private async Task AssertRefusedAsync(string address, string body, int status, string faults)
    {
        if (status == 200)
        {
            await service.AnswerAsync(address, body);
            return;
        }

        var refusal = await service.RefusalAsync(address, body);
        Assert.Equal((status, faults), (refusal.Status, string.Join("; ", refusal.Faults)));
    }
}
