using System.Net.Http.Headers;
using System.Text;
using System.Text.Json.Nodes;
using System.Text.RegularExpressions;
using Drypeak.Service.Tests.Laboratory;
using Xunit;

namespace Drypeak.Service.Tests.Documents;

/// <summary>What the README shows is what the service does.</summary>
public sealed partial class ReadmeTests(RunningService service)
{
    [Fact]
    public async Task The_request_of_the_readme_gives_the_answer_of_the_readme()
    {
        var readme = await File.ReadAllTextAsync(Repository.File("README.md"), TestContext.Current.CancellationToken);
        var shown = CurlAndAnswer().Match(readme);
        Assert.True(shown.Success, "The README has no curl with its answer.");

        using var body = new StringContent(shown.Groups["body"].Value, Encoding.UTF8, new MediaTypeHeaderValue("application/json"));
        using var answer = await service.Client.PostAsync(shown.Groups["path"].Value, body, TestContext.Current.CancellationToken);
        answer.EnsureSuccessStatusCode();
        var actual = JsonNode.Parse(await answer.Content.ReadAsStringAsync(TestContext.Current.CancellationToken))!["optimum"];

        // Another processor may round the last digits otherwise.
        AssertSame(JsonNode.Parse(shown.Groups["answer"].Value), actual, "");
    }

    private static void AssertSame(JsonNode? expected, JsonNode? actual, string place)
    {
        switch (expected)
        {
            case JsonObject members:
                Assert.Equal(members.Select(member => member.Key), actual!.AsObject().Select(member => member.Key));
                foreach (var (name, value) in members)
                {
                    AssertSame(value, actual[name], $"{place}/{name}");
                }

                break;
            case JsonArray items:
                Assert.Equal(items.Count, actual!.AsArray().Count);
                for (var i = 0; i < items.Count; i++)
                {
                    AssertSame(items[i], actual[i], $"{place}/{i}");
                }

                break;
            case JsonValue value when value.TryGetValue<double>(out var number):
                Assert.True(Math.Abs((actual!.GetValue<double>() / number) - 1) < 1e-9, $"{place}: {number} in the README, {actual} in the answer.");
                break;
            default:
                Assert.Equal(expected?.ToJsonString(), actual?.ToJsonString());
                break;
        }
    }

    [GeneratedRegex(@"curl -s http://localhost:5000(?<path>\S+) [^\n]*-d '(?<body>.*?)' \| jq \.optimum\n```\n\n```json\n(?<answer>.*?)\n```", RegexOptions.Singleline)]
    private static partial Regex CurlAndAnswer();
}
