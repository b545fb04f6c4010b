using System.Globalization;
using System.Text.Json;
using CsCheck;
using Xunit;

namespace Drypeak.Service.Tests.Laboratory;

/// <summary>Whatever is sent, the answer is an answer: never a failure of the service, never a number that is none.</summary>
public sealed class FuzzTests(RunningService service)
{
    private static readonly string[] Fragments =
    [
        "{", "}", "[", "]", ",", ":", "\"", "\\", "\\u0000", "\\ud800", "null", "true", "0", "-", "-0", "1e308", "1e-308", "1e999", "5e-324", "0.1", "1e9", "-1",
        "\"waterContent\":0,", "\"setAside\":\"x\",", "\"model\":\"cubic\"", "\"label\":\"1\",", "é", "\u2028", "\t", " ",
    ];

    /// <summary>Values at and beyond the edges of what is possible.</summary>
    private static readonly string[] Values =
    [
        "0", "-0.0", "1e-9", "1e-10", "1e9", "1e10", "99.999999999", "100", "1000", "1e-300", "1e300", "0.5", "12", "1.8", "null", "\"\"", "[]", "{}",
        "\"custom\"", "\"saturation\"", "\"lb/ft3\"", "\"kN/m3\"", "\"yd3\"", "\"x\"", "true", "[1]", "[100,90]",
    ];

    private static readonly string[] ValuePlaces =
    [
        "/reference", "/method", "/units/mass", "/units/tinMass", "/units/volume", "/units/density", "/units/length", "/mold/mass", "/mold/volume", "/mold/diameter",
        "/mold/height", "/mold/empty", "/mold/withWater", "/specificGravity/value", "/waterTemperature", "/waterDensity", "/specimens/0/moldAndWetSoil",
        "/specimens/1/tins/0/tin", "/specimens/1/tins/0/wet", "/specimens/1/tins/0/dry", "/specimens/2/waterContent", "/specimens/2/tins", "/specimens/2/setAside",
        "/specimens/3/wetDensity", "/specimens/3/dryDensity", "/specimens/3/moldAndWetSoil", "/specimens/4/label", "/trace", "/lines", "/curve", "/oversize",
    ];

    [Fact]
    public Task A_text_cut_and_stuffed_at_random_is_refused_or_answered() =>
        Gen.Select(Gen.Int[0, Body.Sound.Length - 1], Gen.Int[0, 12], Gen.OneOf(Fragments)).Array[1, 3]
            .SampleAsync(cuts => Holds(cuts.Aggregate(Body.Sound, (text, cut) =>
            {
                var at = Math.Min(cut.Item1, text.Length);
                return text[..at] + cut.Item3 + text[Math.Min(at + cut.Item2, text.Length)..];
            })), iter: 400, threads: 1);

    [Fact]
    public Task A_sound_test_with_extreme_values_is_refused_or_answered() =>
        Gen.Select(Gen.OneOf(ValuePlaces), Gen.OneOf(Values)).Array[1, 4]
            .SampleAsync(edits => Holds(Body.With([.. edits.DistinctBy(edit => edit.Item1)])), iter: 400, threads: 1);

    [Fact]
    public Task Any_specimens_with_possible_values_are_answered()
    {
        var point = Gen.Select(Gen.Double[0, 60], Gen.Double[0.2, 3]);
        return Gen.Select(point.Array[1, 9], Gen.Double[0.5, 4], Gen.OneOf("auto", "averaged", "saturation", "parabola", "cubic", "spline"))
            .SampleAsync(async test =>
            {
                var (points, gravity, model) = test;
                var body = Body.With(
                    ("/specimens", $"[{string.Join(',', points.Select(Body.Point))}]"),
                    ("/specificGravity/value", gravity.ToString("R", CultureInfo.InvariantCulture)),
                    ("/curve", $$"""{"model":"{{model}}"}"""),
                    ("/oversize", """{"percent":12,"specificGravity":2.6}"""),
                    ("/trace", "true"));
                Assert.Equal(200, await Holds(body));
            }, iter: 200, threads: 1);
    }

    /// <summary>The status, when all that must hold of any answer has been seen to hold.</summary>
    private async Task<int> Holds(string body)
    {
        using var response = await service.PostAsync(body);
        var text = await RunningService.TextOf(response);
        Assert.True((int)response.StatusCode is 200 or 400 or 422, $"{(int)response.StatusCode} for {body}: {text}");
        if ((int)response.StatusCode == 200)
        {
            AssertFinite(JsonElement.Parse(text), body);
        }
        else
        {
            await Refusal.Of(response);
        }

        return (int)response.StatusCode;
    }

    private static void AssertFinite(JsonElement value, string body)
    {
        switch (value.ValueKind)
        {
            case JsonValueKind.Number:
                Assert.True(double.IsFinite(value.GetDouble()), $"{value} for {body}");
                break;
            case JsonValueKind.Array:
                value.EnumerateArray().ToList().ForEach(item => AssertFinite(item, body));
                break;
            case JsonValueKind.Object:
                value.EnumerateObject().ToList().ForEach(member => AssertFinite(member.Value, body));
                break;
        }
    }
}
