using System.Globalization;
using System.Net.Http.Headers;
using System.Text;
using System.Text.Json;
using System.Text.Json.Nodes;
using Drypeak.Service.Tests.Laboratory;
using Xunit;

namespace Drypeak.Service.Tests.Acceptance;

public sealed class LotAcceptanceTests(RunningService service)
{
    private Task<JsonElement> LotAsync(params (string Place, string Json)[] edits) => service.AnswerAsync(Lots.LotAcceptance, Lots.With(Lots.Sound, edits));

    /// <summary>Relative compactions 96, 98, 96.92 and 97, by hand: mean 96.98, s 0.8174; Q = 1.98/0.8174 is over 1.5, so all of four is within.</summary>
    [Fact]
    public async Task Every_rule_of_the_contract_is_answered()
    {
        var answer = await LotAsync();
        double[] values = [96, 98, 100 * 2.09 / 1.135 / 1.9, 97];
        var mean = values.Average();
        var s = Math.Sqrt(values.Sum(value => (value - mean) * (value - mean)) / 3);
        Assert.Equal("accepted", answer.Text("/lot/outcome"));
        Assert.Equal(["every-test", "mean", "moving-mean", "percent-within-limits", "characteristic-value"], answer.At("/lot/rules").EnumerateArray().Select(rule => rule.Text("/rule")));
        Assert.All(answer.At("/lot/rules").EnumerateArray(), rule =>
        {
            Assert.Equal("met", rule.Text("/outcome"));
            Assert.NotEqual("", rule.Text("/explanation"));
            Assert.NotEqual("", rule.Text("/basis"));
        });
        Assert.Equal((4, 4), (answer.Number("/lot/rules/0/value"), answer.Number("/lot/rules/0/limit")));
        Assert.Equal(mean, answer.Number("/lot/rules/1/value"), 1e-9);
        Assert.Equal(96, answer.Number("/lot/rules/1/limit"), 1e-9);
        Assert.Equal(Math.Min(values[..3].Average(), values[1..].Average()), answer.Number("/lot/rules/2/value"), 1e-9);
        Assert.Equal((100, 90), (answer.Number("/lot/rules/3/value"), answer.Number("/lot/rules/3/limit")));
        Assert.Equal((mean - 95) / s, answer.Number("/lot/rules/3/qualityIndex/lower"), 1e-9);
        Assert.True(answer.IsNull("/lot/rules/3/qualityIndex/upper"));
        Assert.Equal(mean - (0.8 * s), answer.Number("/lot/rules/4/value"), 1e-9);
        var statistics = answer.At("/lot/statistics").EnumerateArray().Single(known => known.Text("/quantity") == "relativeCompaction");
        Assert.Equal((4, mean, s), (statistics.Number("/count"), statistics.Number("/mean"), statistics.Number("/standardDeviation")), Near);
        Assert.Equal((values.Min(), values.Max()), (statistics.Number("/minimum"), statistics.Number("/maximum")), Near);
    }

    [Fact]
    public async Task A_test_is_given_what_follows_from_its_values()
    {
        var answer = await LotAsync();
        Assert.Equal(0.96 * 1.9, answer.Number("/tests/0/dryDensity"), 1e-9);
        Assert.Equal(98, answer.Number("/tests/1/relativeCompaction"), 1e-9);
        Assert.Equal(2.09 / 1.135, answer.Number("/tests/2/dryDensity"), 1e-9);
        Assert.Equal(1, answer.Number("/tests/0/waterContentFromOptimum"), 1e-9);
        Assert.Equal(1, answer.Number("/tests/0/requirements/0/margin"), 1e-9);
        Assert.Equal("accepted", answer.Text("/tests/0/outcome"));
    }

    [Fact]
    public async Task A_whole_field_test_comes_in_the_lots_units_and_against_the_lots_laboratory()
    {
        const string field = """{"label":"b","fieldDensity":{"units":{"mass":"kg","volume":"L","density":"kg/m3"},"method":"drive-cylinder","driveCylinder":{"volume":1},"soil":{"wet":2.09475},"waterContent":12.5}}""";
        var (values, whole) = (await LotAsync(("/units/density", "\"lb/ft3\""), ("/laboratory/maximumDryDensity", "118.6131246"), ("/waterDensity", "62.42796"), ("/tests/1", """{"label":"b","relativeCompaction":98,"waterContent":12.5}"""), ("/tests/2", """{"label":"c","relativeCompaction":97}""")),
            await LotAsync(("/units/density", "\"lb/ft3\""), ("/laboratory/maximumDryDensity", "118.6131246"), ("/waterDensity", "62.42796"), ("/tests/1", field), ("/tests/2", """{"label":"c","relativeCompaction":97}""")));
        Assert.Equal(1862 / 16.018463373960142, whole.Number("/tests/1/dryDensity"), 1e-6);
        Assert.Equal(98, whole.Number("/tests/1/relativeCompaction"), 1e-6);
        Assert.Equal(values.Number("/tests/1/saturation"), whole.Number("/tests/1/saturation"), 1e-5);
        Assert.Equal("met", whole.Text("/tests/1/requirements/0/outcome"));
    }

    [Fact]
    public async Task Several_soils_in_a_lot_have_each_their_own_laboratory()
    {
        var answer = await LotAsync(("/tests/1/laboratory", """{"maximumDryDensity":1.8,"optimumWaterContent":14}"""), ("/tests/2", $$"""{"label":"c","dryDensity":1.8,"laboratory":{"test":{{Body.Sound}} } }"""));
        var laboratory = await service.AnswerAsync(Body.Sound);
        Assert.Equal(100 * 1.862 / 1.8, answer.Number("/tests/1/relativeCompaction"), 1e-9);
        Assert.Equal(-1.5, answer.Number("/tests/1/waterContentFromOptimum"), 1e-9);
        Assert.Equal(100 * 1.8 / laboratory.Number("/optimum/maximumDryDensity"), answer.Number("/tests/2/relativeCompaction"), 1e-9);
        Assert.Equal(97, answer.Number("/tests/3/relativeCompaction"), 1e-9);
    }

    [Fact]
    public async Task Retests_and_tests_set_aside_are_shown_and_do_not_count()
    {
        var answer = await LotAsync(("/tests/0/relativeCompaction", "80"), ("/tests/3/setAside", "\"frozen\""), ("/tests/-", """{"label":"e","relativeCompaction":97,"replaces":"a"}"""));
        Assert.Equal(3, answer.Number("/lot/count"));
        Assert.Equal(["False", "True", "True", "False", "True"], answer.At("/tests").EnumerateArray().Select(test => test.At("/counts").GetBoolean().ToString()));
        Assert.Equal(("e", "frozen", "a"), (answer.Text("/tests/0/replacedBy"), answer.Text("/tests/3/setAside"), answer.Text("/tests/4/replaces")));
        Assert.Equal("rejected", answer.Text("/tests/0/outcome"));
        Assert.Equal((98 + (100 * 2.09 / 1.135 / 1.9) + 97) / 3, answer.Number("/lot/rules/1/value"), 1e-9);
        Assert.Subset(answer.Findings().ToHashSet(), new HashSet<string> { "tests-set-aside", "tests-replaced" });
        Assert.Equal("accepted", answer.Text("/lot/outcome"));
    }

    [Fact]
    public async Task A_lot_of_which_no_test_counts_is_undecided()
    {
        var answer = await service.AnswerAsync(Lots.LotAcceptance, """{"lotRules":[{"rule":"mean","quantity":"relativeCompaction","minimum":95}],"tests":[{"relativeCompaction":96,"setAside":"wet"}],"controlChart":{"quantity":"relativeCompaction","kind":"ewma"},"window":{"minimumDryDensity":1.8}}""");
        Assert.Equal("undecided", answer.Text("/lot/outcome"));
        Assert.Contains("no-test-counts", answer.Findings());
        Assert.True(answer.IsNull("/lot/rules/0/value"));
    }

    [Theory]
    [InlineData("""[{"relativeCompaction":96},{"relativeCompaction":95}]""", "accepted")]
    [InlineData("""[{"relativeCompaction":96},{"waterContent":12}]""", "undecided")]
    [InlineData("""[{"relativeCompaction":94},{"waterContent":12}]""", "rejected")]
    public async Task Without_rules_every_test_must_be_accepted(string tests, string outcome)
    {
        var answer = await service.AnswerAsync(Lots.LotAcceptance, $$"""{"specification":{"requirements":[{"quantity":"relativeCompaction","minimum":95}]},"tests":{{tests}} }""");
        Assert.Equal(outcome, answer.Text("/lot/outcome"));
        Assert.Equal(0, answer.At("/lot/rules").GetArrayLength());
    }

    [Fact]
    public async Task Without_rules_and_specification_nothing_is_decided() =>
        Assert.True((await service.AnswerAsync(Lots.LotAcceptance, """{"tests":[{"relativeCompaction":96}]}""")).IsNull("/lot/outcome"));

    [Theory]
    [InlineData("""{"rule":"percent-within-limits","quantity":"relativeCompaction","minimum":95,"required":90}""", "96,96,96", 100.0, "met", "no-spread")]
    [InlineData("""{"rule":"percent-within-limits","quantity":"relativeCompaction","minimum":95,"required":90}""", "94,94,94", 0.0, "not-met", "no-spread")]
    [InlineData("""{"rule":"percent-within-limits","quantity":"relativeCompaction","minimum":95,"required":90}""", "96,97", null, "undecided", "too-few-tests")]
    [InlineData("""{"rule":"percent-within-limits","quantity":"relativeCompaction","minimum":106,"maximum":107,"required":0}""", "90,97,103", 0.0, "met", null)]
    [InlineData("""{"rule":"moving-mean","quantity":"relativeCompaction","count":5,"minimum":96}""", "96,97,98,99", null, "undecided", "too-few-tests")]
    [InlineData("""{"rule":"moving-mean","quantity":"relativeCompaction","count":3,"minimum":96,"floor":93}""", "99,99,92.9,99", 96.96666666666667, "not-met", null)]
    [InlineData("""{"rule":"characteristic-value","quantity":"relativeCompaction","minimum":95,"factor":0.8}""", "96", null, "undecided", "too-few-tests")]
    [InlineData("""{"rule":"characteristic-value","quantity":"relativeCompaction","minimum":95,"factor":0.8}""", "96,96", 96.0, "met", "no-spread")]
    [InlineData("""{"rule":"mean","quantity":"airVoids","maximum":5}""", "96,97", null, "undecided", "quantity-missing")]
    [InlineData("""{"rule":"share-of-tests","quantity":"relativeCompaction","minimum":95,"required":75}""", "96,97,98,94", 75.0, "met", null)]
    [InlineData("""{"rule":"every-test","quantity":"relativeCompaction","minimum":95,"maximum":98}""", "96,97,98.5", 98.5, "not-met", null)]
    [InlineData("""{"rule":"wet-of-line-of-optimums","required":80}""", "96,97", null, "undecided", "quantity-missing")]
    public async Task Each_rule_knows_its_edge_cases(string rule, string values, double? value, string outcome, string? code)
    {
        var answer = await service.AnswerAsync(Lots.LotAcceptance, Lots.Of(rule, values.Split(',').Select(text => double.Parse(text, CultureInfo.InvariantCulture))));
        Assert.Equal(outcome, answer.Text("/lot/rules/0/outcome"));
        Assert.Equal(outcome switch { "met" => "accepted", "not-met" => "rejected", _ => "undecided" }, answer.Text("/lot/outcome"));
        if (value is { } known)
        {
            Assert.Equal(known, answer.Number("/lot/rules/0/value"), 1e-9);
        }
        else
        {
            Assert.True(answer.IsNull("/lot/rules/0/value"));
        }

        Assert.Equal(code is null ? [] : [code], answer.Findings().Distinct());
    }

    [Fact]
    public async Task Times_give_the_order()
    {
        var answer = await service.AnswerAsync(Lots.LotAcceptance, """
            {"tests":[{"label":"late","relativeCompaction":96,"time":"2026-05-12T15:00"},{"label":"early","relativeCompaction":97,"time":"2026-05-12T09:30"},{"label":"day before","relativeCompaction":98,"time":"2026-05-11"}],
             "controlChart":{"quantity":"relativeCompaction","kind":"individuals"}}
            """);
        Assert.Equal(["day before", "early", "late"], answer.At("/controlChart/points").EnumerateArray().Select(point => point.Text("/label")));
        Assert.Equal(["late", "early", "day before"], answer.At("/tests").EnumerateArray().Select(test => test.Text("/label")));
    }

    /// <summary>Moving ranges 2, 1.08…, 0.08…: limits are 3/1.128 of their mean from the mean.</summary>
    [Fact]
    public async Task A_control_chart_has_center_limits_and_signals()
    {
        var answer = await LotAsync();
        double[] values = [96, 98, 100 * 2.09 / 1.135 / 1.9, 97];
        var range = values.Skip(1).Zip(values, (a, b) => Math.Abs(a - b)).Average();
        Assert.Equal(values.Average(), answer.Number("/controlChart/center"), 1e-9);
        Assert.Equal(values.Average() + (3 * range * Math.Sqrt(Math.PI) / 2), answer.Number("/controlChart/upper"), 1e-9);
        Assert.Equal(range, answer.Number("/controlChart/movingRange/center"), 1e-9);
        Assert.True(answer.IsNull("/controlChart/points/0/signal"));
        var signal = await service.AnswerAsync(Lots.LotAcceptance, Lots.With(Lots.Of("""{"rule":"mean","quantity":"relativeCompaction","minimum":90}""", 97, 97.2, 96.9, 97.1, 97, 91), ("/controlChart", """{"quantity":"relativeCompaction","kind":"individuals","target":97,"standardDeviation":0.5}""")));
        Assert.Contains("Western Electric rule 1", signal.Text("/controlChart/points/5/signal"), StringComparison.Ordinal);
        Assert.Contains("out-of-control", signal.Findings());
    }

    [Fact]
    public async Task A_window_says_who_is_outside_and_by_which_edge()
    {
        var answer = await LotAsync(("/tests/0/waterContent", "11"));
        Assert.Equal(["minimumSaturation", "waterContentFromOptimum"],
            answer.At("/window/outside").EnumerateArray().Where(entry => entry.Text("/label") == "a").Select(entry => entry.Text("/edge")).Except(["maximumAirVoids"]));
        Assert.Equal(["b", "c", "d"], answer.At("/window/inside").EnumerateArray().Select(label => label.GetString()));
        Assert.All(answer.At("/window/polygon").EnumerateArray(), corner => Assert.InRange(corner[0].GetDouble(), 12 - 1e-9, 15 + 1e-9));

        // S at the optimum is 0.12·2.7/(2.7/1.9 − 1) = 76.95 %: b has 74.9, c 78.6, d 80.7.
        Assert.Equal(50, answer.Number("/window/wetOfLineOfOptimums"), 1e-9);
    }

    /// <summary>The same lot in other units, and its tests the other way round: the same answer where order has no meaning.</summary>
    [Fact]
    public async Task Units_and_order_do_not_matter()
    {
        const double lb = 16.018463373960142;
        string Pounds(double megagrams) => (megagrams * 1000 / lb).ToString("R", CultureInfo.InvariantCulture);
        var (first, other) = (await LotAsync(), await LotAsync(
            ("/units", """{"density":"lb/ft3","length":"ft"}"""), ("/laboratory/maximumDryDensity", Pounds(1.9)), ("/waterDensity", Pounds(1)), ("/tests/1/dryDensity", Pounds(1.862)), ("/tests/2/wetDensity", Pounds(2.09))));
        for (var i = 0; i < 5; i++)
        {
            Assert.Equal(1, other.Number($"/lot/rules/{i}/value") / first.Number($"/lot/rules/{i}/value"), 1e-9);
        }

        Assert.Equal(1, other.Number("/tests/2/dryDensity") * lb / 1000 / first.Number("/tests/2/dryDensity"), 1e-9);
        var turned = JsonNode.Parse(Lots.With(Lots.Sound, ("/lotRules/2", Body.Absent)))!;
        turned["tests"] = new JsonArray([.. turned["tests"]!.AsArray().Reverse().Select(test => test!.DeepClone())]);
        var backward = await service.AnswerAsync(Lots.LotAcceptance, turned.ToJsonString());
        Assert.Equal(first.Number("/lot/rules/1/value"), backward.Number("/lot/rules/1/value"), 1e-9);
        Assert.Equal(first.Number("/lot/rules/4/value"), backward.Number("/lot/rules/3/value"), 1e-9);
    }

    [Fact]
    public async Task A_guarded_specification_decides_by_the_uncertainty_of_the_tests()
    {
        var guarded = await LotAsync(("/specification/decision", """{"rule":"guarded","risk":0.05}"""), ("/uncertainty", """{"dryDensity":0.015}"""));
        Assert.Equal(("undecided", "accepted"), (guarded.Text("/tests/0/outcome"), guarded.Text("/tests/1/outcome")));
        Assert.Equal(0.015 / 1.9 * 100, guarded.Number("/tests/0/requirements/0/standardUncertainty"), 1e-6);
        Assert.Equal("undecided", guarded.Text("/lot/outcome"));
        Assert.Contains("within-guard-band", guarded.Findings());
        Assert.Contains("uncertainty-missing", (await LotAsync(("/specification/decision", """{"rule":"guarded","risk":0.05}"""))).Findings());
    }

    [Fact]
    public async Task A_trend_comes_in_the_units_of_the_stations()
    {
        var (meters, feet) = (await LotAsync(), await LotAsync(("/units/length", "\"ft\"")));
        Assert.Equal(meters.Number("/lot/trends/0/slope"), feet.Number("/lot/trends/0/slope"), 1e-9);
        Assert.Equal(("station", "lift"), (meters.Text("/lot/trends/0/along"), meters.Text("/lot/trends/1/along")));
    }

    [Theory]
    [InlineData("image/svg+xml", "svg")]
    [InlineData("image/png", "png")]
    public async Task The_picture_by_post_is_the_picture_by_its_link(string mediaType, string format)
    {
        var answer = await LotAsync();
        using var request = new HttpRequestMessage(HttpMethod.Post, Lots.LotAcceptance) { Content = new StringContent(Lots.Sound, Encoding.UTF8, new MediaTypeHeaderValue("application/json")) };
        request.Headers.Accept.Add(new MediaTypeWithQualityHeaderValue(mediaType));
        using var response = await service.Client.SendAsync(request, TestContext.Current.CancellationToken);
        var posted = await response.Content.ReadAsByteArrayAsync(TestContext.Current.CancellationToken);
        Assert.Equal(mediaType, response.Content.Headers.ContentType!.MediaType);
        Assert.Equal(posted, await service.Client.GetByteArrayAsync(answer.Text("/links/" + format), TestContext.Current.CancellationToken));
        foreach (var picture in new[] { "histogram", "window", "map" })
        {
            using var other = await service.Client.GetAsync(answer.Text($"/links/{picture}/{format}"), TestContext.Current.CancellationToken);
            Assert.True(other.IsSuccessStatusCode);
        }
    }

    [Fact]
    public async Task A_large_lot_is_answered_without_links_but_with_its_picture()
    {
        var answer = await service.AnswerAsync(Lots.LotAcceptance, Lots.Of("""{"rule":"mean","quantity":"relativeCompaction","minimum":95}""", Enumerable.Range(0, 5_000).Select(i => 96 + Math.Sin(i))));
        Assert.Equal(5_000, answer.Number("/lot/count"));
        Assert.True(answer.IsNull("/links/svg"));
        Assert.Contains("no-chart-address", answer.Findings());
    }

    private static bool Near<T>(T expected, T actual) =>
        ((System.Runtime.CompilerServices.ITuple)expected!, (System.Runtime.CompilerServices.ITuple)actual!) is var (a, b)
        && Enumerable.Range(0, a.Length).All(i => Math.Abs(Convert.ToDouble(a[i], CultureInfo.InvariantCulture) - Convert.ToDouble(b[i], CultureInfo.InvariantCulture)) < 1e-9);
}
