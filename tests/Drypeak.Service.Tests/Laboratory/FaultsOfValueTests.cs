using System.Text.Json;
using Xunit;

namespace Drypeak.Service.Tests.Laboratory;

/// <summary>422: well formed, but no test could have given these values.</summary>
public sealed class FaultsOfValueTests(RunningService service)
{
    [Theory]
    [InlineData("/units/mass", "\"oz\"", "unknown-unit")]
    [InlineData("/units/tinMass", "\"gram\"", "unknown-unit")]
    [InlineData("/units/volume", "\"ml\"", "unknown-unit")]
    [InlineData("/units/density", "\"t/m3\"", "unknown-unit")]
    [InlineData("/units/density", "\"mg/m3\"", "unknown-unit")]
    [InlineData("/units/length", "\"inch\"", "unknown-unit")]
    [InlineData("/units/mass", "\"\"", "unknown-unit")]
    [InlineData("/method", "\"astm-d698\"", "unknown-method")]
    [InlineData("/method", "\"ASTM-D698-A\"", "unknown-method")]
    [InlineData("/method", "\"\"", "unknown-method")]
    [InlineData("/specificGravity/determined", "\"guessed\"", "unknown-word")]
    [InlineData("/curve", """{"model":"quartic"}""", "unknown-model", "/curve/model")]
    [InlineData("/curve", """{"model":"Parabola"}""", "unknown-model", "/curve/model")]
    public async Task A_word_that_is_not_one_of_those_known_is_refused_with_all_of_those(string place, string json, string code, string? at = null)
    {
        var refusal = await service.RefusalAsync(Body.With(place, json));
        Assert.Equal(422, refusal.Status);
        Assert.Equal([$"{at ?? place} {code}"], refusal.Faults);
        Assert.StartsWith("It must be one of ", refusal.Message, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("/mold/mass", "-1", "negative")]
    [InlineData("/mold/mass", "1e10", "negative")]
    [InlineData("/mold/volume", "0", "not-positive")]
    [InlineData("/mold/volume", "-943", "not-positive")]
    [InlineData("/mold/volume", "1e300", "not-positive")]
    [InlineData("/mold/volume", "1e-300", "not-positive")]
    [InlineData("/specificGravity/value", "0", "out-of-range")]
    [InlineData("/specificGravity/value", "-2.7", "out-of-range")]
    [InlineData("/specificGravity/value", "27", "out-of-range")]
    [InlineData("/waterTemperature", "-0.1", "out-of-range")]
    [InlineData("/waterTemperature", "40.1", "out-of-range")]
    [InlineData("/waterDensity", "998.2", "out-of-range")]
    [InlineData("/waterDensity", "62.3", "out-of-range")]
    [InlineData("/waterDensity", "0", "out-of-range")]
    [InlineData("/specimens/1/moldAndWetSoil", "0", "not-positive")]
    [InlineData("/specimens/1/moldAndWetSoil", "-6173.3", "not-positive")]
    [InlineData("/specimens/1/wetMass", "-1", "not-positive")]
    [InlineData("/specimens/1/wetDensity", "0", "not-positive")]
    [InlineData("/specimens/1/dryDensity", "-1.7", "not-positive")]
    [InlineData("/specimens/1/waterContent", "-0.1", "out-of-range")]
    [InlineData("/specimens/1/waterContent", "1000.1", "out-of-range")]
    [InlineData("/specimens/1/wetBasis", "100", "out-of-range")]
    [InlineData("/specimens/1/wetBasis", "-1", "out-of-range")]
    [InlineData("/specimens/1/tins/0/tin", "-1", "negative")]
    [InlineData("/specimens/1/tins/0/wet", "0", "not-positive")]
    [InlineData("/specimens/1/tins/0/wet", "-143", "not-positive")]
    [InlineData("/specimens/1/tins/0/dry", "0", "not-positive")]
    [InlineData("/specimens/1/tins/0/dry", "-131", "not-positive")]
    [InlineData("/specimens/1/tins", "[]", "empty-list")]
    [InlineData("/specimens", "[]", "empty-list")]
    [InlineData("/specimens/1/label", "\"\"", "blank")]
    [InlineData("/specimens/1/label", "\" \\t\"", "blank")]
    [InlineData("/specimens/1/label", "\"1\"", "repeated-label")]
    [InlineData("/specimens/1/setAside", "\" \"", "blank")]
    public async Task A_number_or_text_outside_its_possible_range_is_refused_at_its_place(string place, string json, string code)
    {
        var refusal = await service.RefusalAsync(Body.With(place, json));
        Assert.Equal(422, refusal.Status);
        Assert.Equal([$"{place} {code}"], refusal.Faults);
    }

    [Theory]
    [InlineData("/specimens/1/tins/0/dry", "143.1", "dry-over-wet", "143.1", "143")]
    [InlineData("/specimens/1/tins/0/dry", "31", "dry-not-over-tin", "31")]
    [InlineData("/specimens/1/tins/0/dry", "30.9", "dry-not-over-tin", "30.9", "31")]
    [InlineData("/specimens/1/tins/0/tin", "143", "dry-not-over-tin", "131", "143")]
    [InlineData("/specimens/1/tins/0/wet", "12", "dry-over-wet", "131", "12")]
    public async Task A_tin_that_cannot_have_been_weighed_so_is_refused_with_both_masses(string place, string json, string code, params string[] masses)
    {
        var refusal = await service.RefusalAsync(Body.With(place, json));
        Assert.Equal(422, refusal.Status);
        Assert.Equal([$"/specimens/1/tins/0/dry {code}"], refusal.Faults);
        Assert.All(masses, mass => Assert.Contains(mass, refusal.Message, StringComparison.Ordinal));
    }

    [Theory]
    [InlineData("/specimens/1/carbide", """{"reading":-1}""", "/specimens/1/carbide/reading out-of-range")]
    [InlineData("/specimens/1/carbide", """{"reading":100}""", "/specimens/1/carbide/reading out-of-range")]
    [InlineData("/specimens/1/carbide", """{"reading":50,"halfSample":true}""", "/specimens/1/carbide/reading out-of-range")]
    [InlineData("/oversize", """{"percent":100}""", "/oversize/percent out-of-range")]
    [InlineData("/oversize", """{"percent":-1}""", "/oversize/percent out-of-range")]
    [InlineData("/oversize", """{"percent":9,"specificGravity":0}""", "/oversize/specificGravity out-of-range")]
    [InlineData("/oversize", """{"percent":9,"waterContent":-1}""", "/oversize/waterContent out-of-range")]
    [InlineData("/oversize", """{"percent":9,"sieve":0}""", "/oversize/sieve not-positive")]
    [InlineData("/particlesAbove", """{"sieve":0,"percent":9}""", "/particlesAbove/sieve not-positive")]
    [InlineData("/particlesAbove", """{"sieve":4.75,"percent":101}""", "/particlesAbove/percent out-of-range")]
    [InlineData("/effort", """{"rammerMass":0,"drop":305,"layers":3,"blows":25}""", "/effort/rammerMass not-positive")]
    [InlineData("/effort", """{"rammerMass":2500,"drop":-305,"layers":3,"blows":25}""", "/effort/drop not-positive")]
    [InlineData("/effort", """{"rammerMass":2500,"drop":305,"layers":0,"blows":25}""", "/effort/layers out-of-range")]
    [InlineData("/effort", """{"rammerMass":2500,"drop":305,"layers":3,"blows":0}""", "/effort/blows out-of-range")]
    [InlineData("/curve", """{"adopted":{"waterContent":14,"maximumDryDensity":1.86,"reason":" "}}""", "/curve/adopted/reason blank")]
    [InlineData("/curve", """{"adopted":{"waterContent":-14,"maximumDryDensity":1.86,"reason":"by hand"}}""", "/curve/adopted/waterContent out-of-range")]
    [InlineData("/curve", """{"adopted":{"waterContent":14,"maximumDryDensity":0,"reason":"by hand"}}""", "/curve/adopted/maximumDryDensity not-positive")]
    [InlineData("/lines", """{"saturation":[100,0]}""", "/lines/saturation/1 out-of-range")]
    [InlineData("/lines", """{"saturation":[100.1]}""", "/lines/saturation/0 out-of-range")]
    [InlineData("/lines", """{"airVoids":[100]}""", "/lines/airVoids/0 out-of-range")]
    [InlineData("/lines", """{"airVoids":[-5]}""", "/lines/airVoids/0 out-of-range")]
    [InlineData("/uncertainty", """{"mass":-0.5}""", "/uncertainty/mass negative")]
    [InlineData("/uncertainty", """{"tinMass":-0.5}""", "/uncertainty/tinMass negative")]
    [InlineData("/uncertainty", """{"volume":-0.5}""", "/uncertainty/volume negative")]
    [InlineData("/uncertainty", """{"dryDensity":-0.5}""", "/uncertainty/dryDensity negative")]
    [InlineData("/uncertainty", """{"waterContent":-0.5}""", "/uncertainty/waterContent out-of-range")]
    [InlineData("/uncertainty", """{"specificGravity":-0.5}""", "/uncertainty/specificGravity out-of-range")]
    public async Task A_value_out_of_range_is_found_in_every_block(string place, string json, string expected)
    {
        var refusal = await service.RefusalAsync(Body.With(("/method", "\"custom\""), (place, json)));
        Assert.Equal(422, refusal.Status);
        Assert.Equal([expected], refusal.Faults);
    }

    [Theory]
    [InlineData("""{"mass":4250,"diameter":101.6}""", "/mold/height incomplete")]
    [InlineData("""{"mass":4250,"height":116.4}""", "/mold/diameter incomplete")]
    [InlineData("""{"empty":4250}""", "/mold/withWater incomplete")]
    [InlineData("""{"withWater":5191.6}""", "/mold/empty incomplete")]
    [InlineData("""{"mass":4250,"volume":943,"plate":300}""", "/mold/empty incomplete", "/mold/withWater incomplete")]
    [InlineData("""{"empty":4250,"withWater":4250}""", "/mold/withWater water-not-over-empty")]
    [InlineData("""{"empty":250,"withWater":1191.6,"plate":300}""", "/mold/plate plate-over-empty")]
    [InlineData("""{"empty":4250,"withWater":5191.6,"waterTemperature":60}""", "/mold/waterTemperature out-of-range")]
    [InlineData("""{"empty":-4250,"withWater":5191.6,"plate":300}""", "/mold/empty not-positive")]
    [InlineData("""{"empty":4250,"withWater":-5191.6}""", "/mold/withWater not-positive")]
    public async Task A_mold_that_is_half_described_or_impossible_is_refused(string mold, params string[] expected)
    {
        var refusal = await service.RefusalAsync(Body.With("/mold", mold));
        Assert.Equal(422, refusal.Status);
        Assert.Equal(expected.Order(), refusal.Faults.Order());
        var ofSpecimen = await service.RefusalAsync(Body.With("/specimens/3/mold", mold));
        Assert.Equal(expected.Select(fault => "/specimens/3" + fault).Order(), ofSpecimen.Faults.Order());
    }

    [Theory]
    [InlineData("/mold", Body.Absent, "/mold")]
    [InlineData("/mold/mass", Body.Absent, "/mold/mass")]
    [InlineData("/mold/volume", Body.Absent, "/mold/volume")]
    [InlineData("/specimens/1/tins", Body.Absent, "/specimens/1")]
    [InlineData("/specimens/1/moldAndWetSoil", Body.Absent, "/specimens/1")]
    [InlineData("/specimens/1", "{}", "/specimens/1")]
    [InlineData("/specimens/1", """{"waterContent":12}""", "/specimens/1")]
    [InlineData("/specimens/1", """{"dryDensity":1.8}""", "/specimens/1")]
    public async Task What_is_needed_and_not_given_is_said_once_where_it_is_to_be_added(string place, string json, string expected)
    {
        var refusal = await service.RefusalAsync(Body.With(place, json));
        Assert.Equal(422, refusal.Status);
        Assert.Equal([$"{expected} not-enough-data"], refusal.Faults);
        Assert.Contains(" give ", refusal.Message, StringComparison.OrdinalIgnoreCase);
    }

    [Theory]
    [InlineData("astm-d698-a")]
    [InlineData(null)]
    public async Task An_effort_beside_another_method_than_custom_is_refused(string? method)
    {
        var refusal = await service.RefusalAsync(Body.With(
            ("/method", method is null ? "null" : $"\"{method}\""), ("/effort", """{"rammerMass":2500,"drop":305,"layers":3,"blows":25}""")));
        Assert.Equal(422, refusal.Status);
        Assert.Equal(["/effort not-for-this-method"], refusal.Faults);
    }

    [Theory]
    [InlineData("/reference", 200)]
    [InlineData("/specimens/1/label", 200)]
    [InlineData("/specimens/1/setAside", 1000)]
    public async Task A_text_may_be_as_long_as_its_bound_and_no_longer(string place, int bound)
    {
        await service.AnswerAsync(Body.With(place, JsonSerializer.Serialize(new string('m', bound))));
        var refusal = await service.RefusalAsync(Body.With(place, JsonSerializer.Serialize(new string('m', bound + 1))));
        Assert.Equal(422, refusal.Status);
        Assert.Equal([$"{place} too-long"], refusal.Faults);
        Assert.Contains($"up to {bound} characters; it has {bound + 1}", refusal.Message, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("depth", "depth")]
    [InlineData("depth [m]", "depth [m]")]
    [InlineData("a.b/c~d", "a.b~1c~0d")]
    public async Task A_text_of_the_identification_that_is_too_long_is_refused_at_its_own_label(string label, string step)
    {
        var refusal = await service.RefusalAsync(Body.With("/identification", JsonSerializer.Serialize(new Dictionary<string, string> { [label] = new('m', 1001) })));
        Assert.Equal(422, refusal.Status);
        Assert.Equal([$"/identification/{step} too-long"], refusal.Faults);
    }

    [Fact]
    public async Task An_identification_has_up_to_thirty_labels_of_up_to_two_hundred_letters()
    {
        static string Labels(int count, int letters) => JsonSerializer.Serialize(Enumerable.Range(0, count).ToDictionary(i => $"{i}".PadLeft(letters, 'm'), _ => "x"));
        await service.AnswerAsync(Body.With("/identification", Labels(30, 200)));
        Assert.Equal(["/identification too-many"], (await service.RefusalAsync(Body.With("/identification", Labels(31, 2)))).Faults);
        Assert.Equal("too-long", Assert.Single((await service.RefusalAsync(Body.With("/identification", Labels(1, 201)))).Errors).Code);
    }

    [Fact]
    public async Task A_test_has_up_to_five_hundred_specimens_and_a_specimen_up_to_twenty_tins()
    {
        static string Specimens(int count) => Body.WithPoints(Enumerable.Range(0, count).Select(i => (10 + (i * 0.01), 1.7)));
        await service.AnswerAsync(Specimens(500));
        var tooMany = await service.RefusalAsync(Specimens(501));
        Assert.Equal(422, tooMany.Status);
        Assert.Equal(["/specimens too-many"], tooMany.Faults);

        static string Tins(int count) => Body.With("/specimens/0/tins", $"[{string.Join(',', Enumerable.Range(1, count).Select(i => $$"""{"tin":{{i}},"wet":{{i + 110}},"dry":{{i + 100}}}"""))}]");
        await service.AnswerAsync(Tins(20));
        Assert.Equal(["/specimens/0/tins too-many"], (await service.RefusalAsync(Tins(21))).Faults);
    }

    [Fact]
    public async Task A_chart_has_up_to_twenty_lines_of_each_kind()
    {
        static string Lines(int count) => Body.With("/lines", $$"""{"saturation":[{{string.Join(',', Enumerable.Range(51, count))}}],"airVoids":[{{string.Join(',', Enumerable.Range(1, count))}}]}""");
        Assert.Equal(40, (await service.AnswerAsync(Lines(20))).GetProperty("lines").GetArrayLength());
        Assert.Equal(["/lines/saturation too-many", "/lines/airVoids too-many"], (await service.RefusalAsync(Lines(21))).Faults);
    }

    [Theory]
    [InlineData("\"a\"", "\"b\"", "\"a\"", "/specimens/2/label")]
    [InlineData("\"2\"", "null", "null", "/specimens/1/label")]
    [InlineData("null", "\"1\"", "null", "/specimens/1/label")]
    public async Task A_label_may_not_repeat_another_nor_the_position_that_stands_for_a_missing_one(string first, string second, string third, string expected)
    {
        var refusal = await service.RefusalAsync(Body.With(("/specimens/0/label", first), ("/specimens/1/label", second), ("/specimens/2/label", third)));
        Assert.Equal(422, refusal.Status);
        Assert.Equal([$"{expected} repeated-label"], refusal.Faults);
    }

    [Fact]
    public async Task Labels_that_differ_in_case_or_space_are_different()
    {
        var answer = await service.AnswerAsync(Body.With(("/specimens/0/label", "\"a\""), ("/specimens/1/label", "\"A\""), ("/specimens/2/label", "\"a \"")));
        Assert.Equal(["a", "A", "a "], answer.GetProperty("specimens").EnumerateArray().Take(3).Select(specimen => specimen.GetProperty("label").GetString()));
    }
}
