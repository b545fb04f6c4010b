using System.Text;
using Xunit;

namespace Drypeak.Service.Tests.Laboratory;

/// <summary>400: a body that is no JSON, or does not have the members of the contract.</summary>
public sealed class FaultsOfFormTests(RunningService service)
{
    [Theory]
    [InlineData("", " empty-body")]
    [InlineData(" \n", " empty-body")]
    [InlineData("null", " wrong-type")]
    [InlineData("[]", " wrong-type")]
    [InlineData("7", " wrong-type")]
    [InlineData("\"specimens\"", " wrong-type")]
    [InlineData("{}", "/specimens missing-member")]
    [InlineData("{", " syntax")]
    [InlineData("{\"specimens\":[", "/specimens/0 syntax")]
    [InlineData("{\"specimens\":[{\"label\":\"1\"},]}", "/specimens/1 syntax")]
    [InlineData("{'specimens':[]}", " syntax")]
    [InlineData("{specimens:[]}", " syntax")]
    [InlineData("{\"specimens\":[]} {}", " syntax")]
    [InlineData("{\"waterTemperature\": NaN}", "/waterTemperature syntax")]
    [InlineData("{\"waterTemperature\": -Infinity}", "/waterTemperature syntax")]
    [InlineData("{\"waterTemperature\": 20,5}", " syntax")]
    [InlineData("{\"waterTemperature\": .5}", "/waterTemperature syntax")]
    [InlineData("{\"waterTemperature\": 020}", "/waterTemperature syntax")]
    [InlineData("{\"waterTemperature\": 0x14}", "/waterTemperature syntax")]
    [InlineData("{\"reference\": \"a\tb\"}", "/reference syntax")]
    [InlineData("{\"reference\": \"\\x\"}", "/reference syntax")]
    [InlineData("{\"reference\": \"\\ud800\"}", "/reference lone-surrogate")]
    [InlineData("{\"\\udc00\": 1}", " lone-surrogate")]
    [InlineData("// a comment\n{}", " syntax")]
    [InlineData("specimen\tmass\n1\t6064.2", " syntax")]
    public async Task A_body_that_is_no_object_in_JSON_is_refused_at_the_place_where_it_breaks(string body, string expected)
    {
        var refusal = await service.RefusalAsync(body);
        Assert.Equal(400, refusal.Status);
        Assert.Equal([expected], refusal.Faults);
    }

    [Fact]
    public async Task Bytes_that_are_not_UTF_8_are_refused()
    {
        using var content = RunningService.Json("");
        using var body = new ByteArrayContent([.. "{\"reference\":\"M"u8, 0xFC, .. "ller\",\"specimens\":[]}"u8]) { Headers = { ContentType = content.Headers.ContentType } };
        using var response = await service.Client.PostAsync(new Uri(RunningService.MoistureDensity, UriKind.Relative), body, TestContext.Current.CancellationToken);
        var refusal = await Refusal.Of(response);
        Assert.Equal(400, refusal.Status);
        Assert.Equal([" invalid-utf-8"], refusal.Faults);
    }

    [Fact]
    public async Task A_body_nested_beyond_the_bound_is_refused_and_not_followed()
    {
        var refusal = await service.RefusalAsync(new StringBuilder("{\"specimens\":").Append('[', 100_000).ToString());
        Assert.Equal(400, refusal.Status);
        Assert.Equal("too-deep", Assert.Single(refusal.Errors).Code);
    }

    [Theory]
    [InlineData("/colour", "1", null)]
    [InlineData("/Specimens", "[]", "specimens")]
    [InlineData("/referense", "\"x\"", "reference")]
    [InlineData("/units/tinmass", "\"g\"", "tinMass")]
    [InlineData("/units/liquid", "\"L\"", null)]
    [InlineData("/mold/vollume", "943", "volume")]
    [InlineData("/specificGravity/values", "2.7", "value")]
    [InlineData("/specimens/1/watercontent", "12", "waterContent")]
    [InlineData("/specimens/1/moldAndWetSoils", "12", "moldAndWetSoil")]
    [InlineData("/specimens/4/setaside", "\"torn\"", "setAside")]
    [InlineData("/specimens/0/tins/0/drry", "130", "dry")]
    [InlineData("/specimens/0/tins/0/mass", "130", null)]
    public async Task An_unknown_member_is_named_with_the_member_that_was_probably_meant(string place, string json, string? meant)
    {
        var refusal = await service.RefusalAsync(Body.With(place, json));
        Assert.Equal(400, refusal.Status);
        Assert.Equal([$"{place} unknown-member"], refusal.Faults);
        Assert.EndsWith(meant is null ? "." : $"Did you mean \"{meant}\"?", refusal.Message, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("/specimens/0/mold", """{"volume":943,"hight":116}""", "/specimens/0/mold/hight")]
    [InlineData("/specimens/0/carbide", """{"reading":9.1,"half":true}""", "/specimens/0/carbide/half")]
    [InlineData("/oversize", """{"percent":9,"gravity":2.7}""", "/oversize/gravity")]
    [InlineData("/particlesAbove", """{"sieve":4.75,"percent":9,"passing":91}""", "/particlesAbove/passing")]
    [InlineData("/curve", """{"name":"auto"}""", "/curve/name")]
    [InlineData("/curve", """{"adopted":{"waterContent":14,"maximumDryDensity":1.86,"reason":"by hand","by":"me"}}""", "/curve/adopted/by")]
    [InlineData("/lines", """{"zeroAirVoids":true}""", "/lines/zeroAirVoids")]
    [InlineData("/uncertainty", """{"balance":0.1}""", "/uncertainty/balance")]
    [InlineData("/effort", """{"rammerMass":2500,"drop":305,"layers":3,"blows":25,"height":305}""", "/effort/height")]
    public async Task An_unknown_member_is_found_in_every_block(string place, string json, string expected)
    {
        var refusal = await service.RefusalAsync(Body.With(("/method", "\"custom\""), (place, json)));
        Assert.Equal(400, refusal.Status);
        Assert.Equal([$"{expected} unknown-member"], refusal.Faults);
    }

    [Theory]
    [InlineData("/specimens", Body.Absent, "/specimens")]
    [InlineData("/specimens/2/tins/0/tin", Body.Absent, "/specimens/2/tins/0/tin")]
    [InlineData("/specimens/2/tins/0/wet", Body.Absent, "/specimens/2/tins/0/wet")]
    [InlineData("/specimens/2/tins/0/dry", Body.Absent, "/specimens/2/tins/0/dry")]
    [InlineData("/specimens/2/carbide", """{"halfSample":true}""", "/specimens/2/carbide/reading")]
    [InlineData("/specificGravity/value", Body.Absent, "/specificGravity/value")]
    [InlineData("/oversize", """{"specificGravity":2.7}""", "/oversize/percent")]
    [InlineData("/particlesAbove", """{"percent":12}""", "/particlesAbove/sieve")]
    [InlineData("/particlesAbove", """{"sieve":4.75}""", "/particlesAbove/percent")]
    [InlineData("/effort", """{"drop":305,"layers":3,"blows":25}""", "/effort/rammerMass")]
    [InlineData("/effort", """{"rammerMass":2500,"layers":3,"blows":25}""", "/effort/drop")]
    [InlineData("/effort", """{"rammerMass":2500,"drop":305,"blows":25}""", "/effort/layers")]
    [InlineData("/effort", """{"rammerMass":2500,"drop":305,"layers":3}""", "/effort/blows")]
    [InlineData("/curve", """{"adopted":{"maximumDryDensity":1.86,"reason":"by hand"}}""", "/curve/adopted/waterContent")]
    [InlineData("/curve", """{"adopted":{"waterContent":14,"reason":"by hand"}}""", "/curve/adopted/maximumDryDensity")]
    [InlineData("/curve", """{"adopted":{"waterContent":14,"maximumDryDensity":1.86}}""", "/curve/adopted/reason")]
    public async Task A_missing_member_is_refused_at_its_own_place(string place, string json, string expected)
    {
        var refusal = await service.RefusalAsync(Body.With(("/method", "\"custom\""), (place, json)));
        Assert.Equal(400, refusal.Status);
        Assert.Equal([$"{expected} missing-member"], refusal.Faults);
        Assert.Contains($"\"{expected[(expected.LastIndexOf('/') + 1)..]}\" is missing. Give it", refusal.Message, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("\"mass\": 4250.0", "\"mass\": 4250.0, \"mass\": 4250.0", "/mold/mass")]
    [InlineData("\"wet\": 143.0", "\"wet\": 143.0, \"w\\u0065t\": 143.5", "/specimens/1/tins/0/wet")]
    [InlineData("\"label\": \"3\"", "\"label\": \"3\", \"label\": \"3a\"", "/specimens/2/label")]
    [InlineData("\"method\":", "\"units\": {}, \"method\":", "/units")]
    public async Task A_member_that_stands_twice_is_refused(string text, string twice, string expected)
    {
        var refusal = await service.RefusalAsync(Body.Sound.Replace(text, twice, StringComparison.Ordinal));
        Assert.Equal(400, refusal.Status);
        Assert.Equal([$"{expected} repeated-member"], refusal.Faults);
    }

    [Theory]
    [InlineData("/specimens", "null")]
    [InlineData("/specimens/2", "null")]
    [InlineData("/specimens/0/tins/0", "null")]
    [InlineData("/specimens/0/tins/0/dry", "null")]
    [InlineData("/specificGravity/value", "null")]
    [InlineData("/lines", """{"saturation":[100,null]}""", "/lines/saturation/1")]
    [InlineData("/lines", """{"airVoids":[null]}""", "/lines/airVoids/0")]
    [InlineData("/identification", """{"project":null}""", "/identification/project")]
    [InlineData("/curve", """{"adopted":{"waterContent":14,"maximumDryDensity":1.86,"reason":null}}""", "/curve/adopted/reason")]
    public async Task Null_is_refused_in_lists_and_where_a_value_is_needed(string place, string json, string? expected = null)
    {
        var refusal = await service.RefusalAsync(Body.With(place, json));
        Assert.Equal(400, refusal.Status);
        Assert.Equal([$"{expected ?? place} null-not-allowed"], refusal.Faults);
    }

    [Theory]
    [InlineData("/reference", "null")]
    [InlineData("/method", "null")]
    [InlineData("/units", "null")]
    [InlineData("/units/tinMass", "null")]
    [InlineData("/specificGravity", "null")]
    [InlineData("/specimens/1/label", "null")]
    [InlineData("/specimens/1/setAside", "null")]
    [InlineData("/specimens/1/waterContent", "null")]
    [InlineData("/curve", """{"model":null,"adopted":null}""")]
    [InlineData("/trace", "null")]
    public async Task Null_is_as_good_as_nothing_where_a_member_is_optional(string place, string json) =>
        Assert.NotEqual(default, (await service.AnswerAsync(Body.With(place, json))).GetProperty("optimum"));

    [Theory]
    [InlineData("/reference", "7", "a text")]
    [InlineData("/method", "[]", "a text")]
    [InlineData("/units", "\"SI\"", "an object")]
    [InlineData("/units/mass", "1", "a text")]
    [InlineData("/mold", "[]", "an object")]
    [InlineData("/mold/volume", "\"943.0\"", "a number")]
    [InlineData("/mold/volume", "\"943,0\"", "a number")]
    [InlineData("/mold/volume", "true", "a number")]
    [InlineData("/mold/volume", "{\"value\":943}", "a number")]
    [InlineData("/specificGravity", "2.70", "an object")]
    [InlineData("/specimens", "{}", "a list")]
    [InlineData("/specimens/0", "\"1\"", "an object")]
    [InlineData("/specimens/0/label", "1", "a text")]
    [InlineData("/specimens/0/tins", "{}", "a list")]
    [InlineData("/specimens/0/tins/0", "[30,140,130]", "an object")]
    [InlineData("/specimens/0/tins/0/dry", "[130]", "a number")]
    [InlineData("/specimens/0/setAside", "true", "a text")]
    [InlineData("/identification", "[\"a\"]", "an object")]
    [InlineData("/curve", "\"auto\"", "an object")]
    [InlineData("/lines", "[90]", "an object")]
    [InlineData("/trace", "\"true\"", "true or false")]
    [InlineData("/trace", "1", "true or false")]
    [InlineData("/waterTemperature", "\"20\"", "a number")]
    public async Task A_value_of_another_type_is_refused_with_the_type_expected(string place, string json, string type)
    {
        var refusal = await service.RefusalAsync(Body.With(place, json));
        Assert.Equal(400, refusal.Status);
        Assert.Equal([$"{place} wrong-type"], refusal.Faults);
        Assert.Contains($"Expected {type}, received ", refusal.Message, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("/effort", """{"rammerMass":2500,"drop":305,"layers":2.5,"blows":25}""", "/effort/layers wrong-type")]
    [InlineData("/effort", """{"rammerMass":2500,"drop":305,"layers":3,"blows":99999999999}""", "/effort/blows number-out-of-range")]
    [InlineData("/specimens/0/carbide", """{"reading":9.1,"halfSample":"yes"}""", "/specimens/0/carbide/halfSample wrong-type")]
    [InlineData("/lines", """{"saturation":90}""", "/lines/saturation wrong-type")]
    [InlineData("/lines", """{"saturation":["90"]}""", "/lines/saturation/0 wrong-type")]
    [InlineData("/identification", """{"project":1}""", "/identification/project wrong-type")]
    [InlineData("/waterTemperature", "1e999", "/waterTemperature number-out-of-range")]
    [InlineData("/waterTemperature", "-1e999", "/waterTemperature number-out-of-range")]
    [InlineData("/specimens/0/tins/0/dry", "1e400", "/specimens/0/tins/0/dry number-out-of-range")]
    [InlineData("/lines", """{"airVoids":[5,1e309]}""", "/lines/airVoids/1 number-out-of-range")]
    public async Task Whole_numbers_truths_items_and_numbers_beyond_all_range_are_looked_at_too(string place, string json, string expected)
    {
        var refusal = await service.RefusalAsync(Body.With(("/method", "\"custom\""), (place, json)));
        Assert.Equal(400, refusal.Status);
        Assert.Equal([expected], refusal.Faults);
    }
}
