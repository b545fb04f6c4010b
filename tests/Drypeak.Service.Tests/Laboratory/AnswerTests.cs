using System.Text;
using System.Text.Json;
using System.Text.Json.Nodes;
using Xunit;

namespace Drypeak.Service.Tests.Laboratory;

public sealed class AnswerTests(RunningService service, SecondInstance another)
{
    [Fact]
    public async Task The_services_own_example_is_answered_without_an_error_or_a_warning()
    {
        using var stream = typeof(Program).Assembly.GetManifestResourceStream("Drypeak.Service.Examples.moisture-density.json")!;
        using var reader = new StreamReader(stream, Encoding.UTF8);
        var answer = await service.AnswerAsync(await reader.ReadToEndAsync(TestContext.Current.CancellationToken));
        Assert.False(answer.IsNull("/optimum"));
        Assert.DoesNotContain(answer.At("/findings").EnumerateArray(), finding => finding.Text("/severity") is "error" or "warning");
    }

    [Fact]
    public async Task Reference_and_identification_come_back_unchanged()
    {
        const string identification = """{"project":"Ternmarsh embankment","sämple/1":"\"7\" <b> & ~ ☂ 𝕏","when":"","ünit\\x":" a  b "}""";
        var answer = await service.AnswerAsync(Body.With(("/reference", "\" Füllung <7> \""), ("/identification", identification)));
        Assert.Equal(" Füllung <7> ", answer.Text("/reference"));
        Assert.True(JsonNode.DeepEquals(JsonNode.Parse(identification), JsonNode.Parse(answer.At("/identification").GetRawText())));
        Assert.False((await service.AnswerAsync(Body.Sound)).Has("identification"));
    }

    [Fact]
    public async Task Specimens_come_back_in_the_order_of_the_request_which_does_not_matter_to_the_rest()
    {
        var document = JsonNode.Parse(Body.Sound)!;
        var specimens = document["specimens"]!.AsArray();
        specimens.Insert(0, specimens[4]!.DeepClone());
        specimens.RemoveAt(5);
        specimens.Add(specimens[2]!.DeepClone());
        specimens.RemoveAt(2);
        var (sound, shuffled) = (await service.AnswerAsync(Body.Sound), await service.AnswerAsync(document.ToJsonString()));
        Assert.Equal(["5", "1", "3", "4", "2"], shuffled.At("/specimens").EnumerateArray().Select(specimen => specimen.Text("/label")));
        Assert.Equal(["5", "1", "3", "4", "2"], shuffled.At("/curve/residuals").EnumerateArray().Select(residual => residual.Text("/label")));
        foreach (var place in new[] { "/optimum/waterContent", "/optimum/maximumDryDensity", "/curve/leaveOneOutError", "/optimum/uncertainty/waterContent/standard" })
        {
            Assert.Equal(sound.Number(place), shuffled.Number(place), Math.Abs(sound.Number(place)) * 1e-9);
        }
    }

    [Fact]
    public async Task The_same_request_has_the_same_bytes_from_any_instance()
    {
        var body = Body.With(("/uncertainty", """{"mass":0.5,"volume":1.5}"""), ("/trace", "true"), ("/lines", """{"airVoids":[5]}"""));
        using var first = await service.PostAsync(body);
        using var again = await service.PostAsync(body);
        using var elsewhere = await another.PostAsync(body);
        Assert.Equal(await RunningService.TextOf(first), await RunningService.TextOf(again));
        Assert.Equal(await RunningService.TextOf(first), await RunningService.TextOf(elsewhere));
    }

    [Fact]
    public async Task The_digest_is_that_of_the_test_and_not_of_its_white_space_or_the_order_of_its_members()
    {
        var document = JsonNode.Parse(Body.Sound)!.AsObject();
        var reversed = new JsonObject(document.Reverse().Select(member => KeyValuePair.Create(member.Key, member.Value?.DeepClone())));
        var digest = await DigestOf(Body.Sound);
        Assert.Matches("^sha256:[0-9a-f]{64}$", digest);
        Assert.Equal(digest, await DigestOf(document.ToJsonString(new JsonSerializerOptions { WriteIndented = true, IndentSize = 7 })));
        Assert.Equal(digest, await DigestOf(reversed.ToJsonString()));
        Assert.Equal(digest, await DigestOf(Body.Sound.Replace("943.0", "9.43e2", StringComparison.Ordinal).Replace("\"label\"", "\"l\\u0061bel\"", StringComparison.Ordinal)));
        Assert.NotEqual(digest, await DigestOf(Body.With("/mold/volume", "943.1")));
        Assert.NotEqual(digest, await DigestOf(Body.With("/reference", "\"another\"")));
    }

    private async Task<string> DigestOf(string body) => (await service.AnswerAsync(body)).Text("/provenance/inputDigest")!;

    [Fact]
    public async Task The_answer_names_the_version_of_the_service() =>
        Assert.Matches(@"^\d+\.\d+\.\d+$", (await service.AnswerAsync(Body.Sound)).Text("/provenance/version"));

    [Fact]
    public async Task The_cautions_say_whose_the_decision_is_and_name_the_carbides_gas_where_one_was_used()
    {
        var plain = (await service.AnswerAsync(Body.Sound)).At("/cautions").EnumerateArray().Select(caution => caution.GetString()!).ToList();
        var carbide = (await service.AnswerAsync(Body.WithSpecimens("""{"wetDensity":1.9,"carbide":{"reading":9.1}}"""))).At("/cautions").EnumerateArray().Select(caution => caution.GetString()!).ToList();
        Assert.Contains(plain, caution => caution.Contains("engineer", StringComparison.Ordinal));
        Assert.DoesNotContain(plain, caution => caution.Contains("carbide", StringComparison.Ordinal));
        Assert.Contains(carbide, caution => caution.Contains("flammable gas", StringComparison.Ordinal));
    }

    [Fact]
    public async Task Every_finding_has_a_code_a_severity_a_message_a_place_and_a_basis_worst_first()
    {
        var answer = await service.AnswerAsync(Body.With(
            ("/specificGravity", """{"value":3.4}"""), ("/mold/volume", "960"), ("/specimens/1/setAside", "\"torn\""), ("/specimens/2", Body.Point((14, 0.2)))));
        var severities = answer.At("/findings").EnumerateArray().Select(finding => finding.Text("/severity")!).ToList();
        Assert.Equal(["error", "note", "warning"], severities.Distinct().Order());
        Assert.Equal(severities.OrderBy(severity => Array.IndexOf(["error", "warning", "note"], severity)), severities);
        Assert.All(answer.At("/findings").EnumerateArray(), finding =>
        {
            Assert.Equal(["code", "severity", "message", "pointer", "basis"], finding.EnumerateObject().Select(member => member.Name));
            Assert.EndsWith(".", finding.Text("/message"), StringComparison.Ordinal);
            Assert.NotEqual("", finding.Text("/basis"));
        });
    }

    [Fact]
    public async Task Sixty_four_tests_at_once_are_all_answered_alike()
    {
        var responses = await Task.WhenAll(Enumerable.Range(0, 64).Select(_ => service.PostAsync(Body.Sound)));
        var texts = await Task.WhenAll(responses.Select(RunningService.TextOf));
        Assert.All(responses, response => Assert.Equal(200, (int)response.StatusCode));
        Assert.Single(texts.Distinct());
        Array.ForEach(responses, response => response.Dispose());
    }
}
