using System.Net;
using System.Text.Json;
using System.Text.Json.Nodes;
using CsCheck;
using Drypeak.Service.Tests.Laboratory;
using Xunit;

namespace Drypeak.Service.Tests.Charts;

/// <summary>What stands in a chart's address is the caller's: whatever it is, it is drawn or refused.</summary>
public sealed class ChartAddressTests(RunningService service)
{
    /// <summary>Of a request line of 8 KiB, method and version leave this to the address.</summary>
    private const int LongestAddress = 8192 - 15;

    private const string Letters = "ABCDEFGHIJKLMNOPQRSTUVWXYZabcdefghijklmnopqrstuvwxyz0123456789-_";

    [Theory]
    [InlineData("", "/d missing-parameter")]
    [InlineData("?d=", "/d missing-parameter")]
    [InlineData("?d", "/d missing-parameter")]
    [InlineData("?d=AA&d=AA", "/d repeated-parameter")]
    [InlineData("?d=*", "/d not-readable")]
    [InlineData("?d=A", "/d not-readable")]
    [InlineData("?d=AAAA", "/d not-readable")]
    [InlineData("?d=%00", "/d not-readable")]
    [InlineData("?data=AA", "/data unknown-parameter", "/d missing-parameter")]
    public async Task An_address_without_a_readable_chart_is_refused(string query, params string[] expected)
    {
        using var response = await service.GetAsync(ChartLink.Svg + query);
        var refusal = await Refusal.Of(response);
        Assert.Equal(400, refusal.Status);
        Assert.Equal(expected, refusal.Faults);
    }

    [Fact]
    public async Task An_address_cut_short_anywhere_is_refused()
    {
        var link = await ChartLink.OfSoundTest(service);
        for (var length = link.IndexOf("?d=", StringComparison.Ordinal) + 4; length < link.Length; length += 7)
        {
            using var response = await service.GetAsync(link[..length]);
            Assert.Equal(["/d not-readable"], (await Refusal.Of(response)).Faults);
        }
    }

    [Fact]
    public async Task An_address_with_letters_changed_is_drawn_or_refused()
    {
        var link = await ChartLink.OfSoundTest(service);
        var start = link.IndexOf("?d=", StringComparison.Ordinal) + 3;
        await Gen.Select(Gen.Int[start, link.Length - 1], Gen.Int[0, 63]).Array[1, 3].SampleAsync(async changes =>
        {
            var letters = link.ToCharArray();
            foreach (var (at, letter) in changes)
            {
                letters[at] = Letters[letter];
            }

            using var response = await service.GetAsync(new string(letters));
            if ((int)response.StatusCode != 200)
            {
                Assert.Equal(400, (await Refusal.Of(response)).Status);
            }
        }, iter: 300, threads: 1);
    }

    [Fact]
    public async Task An_address_that_would_inflate_beyond_its_bound_is_refused()
    {
        var bomb = ChartLink.Pack($$"""{"reference":"{{new string('m', 50_000_000)}}"}""");
        Assert.InRange(bomb.Length, 1, 1000);
        using var response = await service.GetAsync($"{ChartLink.Svg}?d={bomb}");
        var refusal = await Refusal.Of(response);
        Assert.Equal(400, refusal.Status);
        Assert.Equal(["/d inflates-beyond-bound"], refusal.Faults);
        Assert.Contains("262144 bytes", refusal.Message, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("null")]
    [InlineData("[]")]
    [InlineData("{}")]
    [InlineData("{\"densityUnit\":1,\"specimens\":null}")]
    [InlineData("{\"densityUnit\":1,\"specimens\":[null]}")]
    [InlineData("{\"densityUnit\":1,\"specimens\":[],\"colour\":\"red\"}")]
    [InlineData("not JSON")]
    public async Task An_address_that_holds_something_else_is_refused(string json)
    {
        using var response = await service.GetAsync($"{ChartLink.Svg}?d={ChartLink.Pack(json)}");
        var refusal = await Refusal.Of(response);
        Assert.Equal(400, refusal.Status);
        Assert.All(refusal.Errors, fault => Assert.Equal("/d", fault.Place));
    }

    [Theory]
    [InlineData("densityUnit", "17")]
    [InlineData("specimens", "[]")]
    [InlineData("specimens", """[{"waterContent":-1,"dryDensity":1.8,"label":"1","setAside":false}]""")]
    [InlineData("specimens", """[{"waterContent":1,"dryDensity":1e300,"label":"1","setAside":false}]""")]
    [InlineData("specificGravity", "0")]
    [InlineData("waterDensity", "-1")]
    [InlineData("saturation", "[0]")]
    [InlineData("airVoids", "[100]")]
    [InlineData("curve", """[{"waterContent":1e300,"dryDensity":1}]""")]
    [InlineData("optimum", """{"waterContent":1e300,"maximumDryDensity":1,"reportedWaterContent":"1","reportedMaximumDryDensity":"1"}""")]
    [InlineData("nextSpecimen", "1e200")]
    [InlineData("reference", "\"LONG\"")]
    public async Task A_forged_chart_that_cannot_be_drawn_is_refused(string member, string json)
    {
        var chart = ChartLink.Unpack(ChartLink.Data(await ChartLink.OfSoundTest(service)));
        Assert.True(chart.ContainsKey(member) || json is "[0]" or "[100]");
        chart[member] = JsonNode.Parse(json.Replace("LONG", new string('m', 201), StringComparison.Ordinal));
        foreach (var address in new[] { ChartLink.Svg, ChartLink.Png, ChartLink.Pdf })
        {
            using var response = await service.GetAsync($"{address}?d={ChartLink.Pack(chart.ToJsonString())}");
            Assert.Equal(400, (await Refusal.Of(response)).Status);
        }
    }

    [Fact]
    public async Task A_forged_chart_that_lacks_a_member_is_drawn_without_it_or_refused()
    {
        var chart = ChartLink.Unpack(ChartLink.Data(await ChartLink.OfSoundTest(service)));
        foreach (var member in chart.Select(member => member.Key))
        {
            foreach (var isNull in new[] { false, true })
            {
                var copy = chart.DeepClone().AsObject();
                copy.Remove(member);
                if (isNull)
                {
                    copy[member] = null;
                }

                using var response = await service.GetAsync($"{ChartLink.Svg}?d={ChartLink.Pack(copy.ToJsonString())}");
                var needed = member is "densityUnit" or "specimens" or "curve" or "saturation" or "airVoids" or "fieldTests";
                Assert.True(needed ? response.StatusCode == HttpStatusCode.BadRequest : response.StatusCode == HttpStatusCode.OK, $"{response.StatusCode} without {member}");
            }
        }
    }

    [Fact]
    public async Task A_forged_chart_of_any_numbers_is_drawn_or_refused()
    {
        var chart = ChartLink.Unpack(ChartLink.Data(await ChartLink.OfSoundTest(service)));
        double[] numbers = [0, 1e-9, 1e-300, 1, 1.8, 100, 1e6, 1e9, -1, 1e300];
        await Gen.Select(Gen.OneOf("optimum", "curve", "nextSpecimen", "specificGravity", "waterDensity", "specimens"), Gen.OneOf(numbers), Gen.OneOf(numbers)).SampleAsync(async forged =>
        {
            var (member, w, density) = forged;
            var copy = chart.DeepClone().AsObject();
            copy[member] = member switch
            {
                "optimum" => new JsonObject
                {
                    ["waterContent"] = w,
                    ["maximumDryDensity"] = density,
                    ["reportedWaterContent"] = "",
                    ["reportedMaximumDryDensity"] = "<&>",
                    ["waterContentInterval"] = new JsonArray(w),
                    ["maximumDryDensityInterval"] = new JsonArray(density, w, w),
                },
                "curve" => new JsonArray(new JsonObject { ["waterContent"] = w, ["dryDensity"] = density }, new JsonObject { ["waterContent"] = density, ["dryDensity"] = w }),
                "specimens" => new JsonArray(new JsonObject { ["waterContent"] = w, ["dryDensity"] = density, ["label"] = "", ["setAside"] = true }),
                _ => w,
            };
            foreach (var address in new[] { ChartLink.Svg, ChartLink.Png })
            {
                using var response = await service.GetAsync($"{address}?d={ChartLink.Pack(copy.ToJsonString())}&width=240&height=240");
                Assert.True((int)response.StatusCode is 200 or 400, $"{(int)response.StatusCode} for {copy.ToJsonString()}");
            }
        }, iter: 60, threads: 1);
    }

    [Fact]
    public async Task The_address_carries_what_the_figure_shows_and_no_weighings()
    {
        var chart = ChartLink.Unpack(ChartLink.Data(await ChartLink.OfSoundTest(service))).ToJsonString();
        Assert.DoesNotContain("6064.2", chart, StringComparison.Ordinal);
        Assert.DoesNotContain("tins", chart, StringComparison.Ordinal);
        Assert.DoesNotContain("moldAndWetSoil", chart, StringComparison.Ordinal);
    }

    [Fact]
    public async Task Sixty_specimens_have_links_that_fit_a_request_line_and_are_answered()
    {
        var answer = await service.AnswerAsync(Body.With(
            ("/specimens", $"[{string.Join(',', Enumerable.Range(0, 60).Select(i => $$"""{"label":"{{i + 1}}","moldAndWetSoil":{{6064.2 + (i * 3.1)}},"tins":[{"tin":31.2,"wet":152.41,"dry":{{141.3 - (i * 0.11)}}}]}"""))}]"),
            ("/reference", JsonSerializer.Serialize(new string('m', 200))),
            ("/lines", """{"saturation":[100,90,80],"airVoids":[5,10]}""")));
        foreach (var format in new[] { "svg", "png", "pdf" })
        {
            var link = answer.Text($"/links/{format}")! + "&width=1000&height=1000";
            Assert.InRange(link.Length, 1, LongestAddress);
            using var response = await service.GetAsync(link);
            Assert.Equal(200, (int)response.StatusCode);
        }

        Assert.DoesNotContain("no-chart-address", answer.Findings());
    }

    [Fact]
    public async Task A_chart_too_large_for_an_address_has_no_links_but_a_note_and_is_drawn_by_post()
    {
        var random = new Random(7);
        string Label(int i) => $"{i}-".PadRight(200, 'x').Replace("x", Letters[random.Next(62)].ToString(), StringComparison.Ordinal);
        var body = Body.WithSpecimens(Enumerable.Range(0, 500).Select(i => $$"""{"label":"{{Label(i)}}","waterContent":{{5 + (i * 0.031)}},"dryDensity":{{1.7 + (random.NextDouble() * 0.1)}}}"""));
        var answer = await service.AnswerAsync(body);
        Assert.Equal("note", answer.Finding("no-chart-address").Text("/severity"));
        Assert.All(answer.At("/links").EnumerateObject(), link => Assert.Equal(JsonValueKind.Null, link.Value.ValueKind));
        using var drawn = await service.PostAsync(body, accept: "image/svg+xml");
        Assert.Equal(200, (int)drawn.StatusCode);
    }

    [Fact]
    public async Task An_address_longer_than_its_bound_is_414()
    {
        using var response = await service.GetAsync($"{ChartLink.Svg}?d={new string('A', 9000)}");
        Assert.Equal(414, (await Refusal.Of(response)).Status);
    }
}
