using System.Net.Http.Headers;
using System.Text.RegularExpressions;
using Drypeak.Service.Tests.Laboratory;
using Xunit;

namespace Drypeak.Service.Tests.Hosting;

/// <summary>What is counted, and that nothing which was sent is among it.</summary>
public sealed partial class ObservationTests(RunningService service)
{
    /// <summary>Stands in every place where a text can be sent.</summary>
    private const string Secret = "Ternmarsh-never-to-be-counted";

    [Fact]
    public async Task A_test_counts_its_job_its_model_and_its_findings()
    {
        var before = await ScrapeAsync();
        await service.AnswerAsync(Body.With(("/curve", """{"model":"cubic"}"""), ("/specificGravity/determined", "\"assumed\"")));
        await service.RefusalAsync("{}");
        var after = await ScrapeAsync();
        AssertMore(before, after, "drypeak_jobs_total", "operation=\"moisture-density\",outcome=\"answered\"");
        AssertMore(before, after, "drypeak_jobs_total", "operation=\"moisture-density\",outcome=\"refused\"");
        AssertMore(before, after, "drypeak_curves_total", "model=\"cubic\",outcome=\"optimum\"");
        AssertMore(before, after, "drypeak_findings_total", "code=\"specific-gravity-assumed\"");
    }

    [Fact]
    public async Task A_picture_counts_its_bytes()
    {
        var before = await ScrapeAsync();
        using var picture = await service.PostAsync(Body.Sound, "image/png");
        Assert.True(picture.IsSuccessStatusCode);
        AssertMore(before, await ScrapeAsync(), "drypeak_picture_size_bytes_count", "type=\"image/png\"");
    }

    [Fact]
    public async Task Nothing_that_was_sent_is_in_what_is_counted()
    {
        await service.AnswerAsync(Body.With(("/reference", $"\"{Secret}\""), ("/specimens/0/label", $"\"{Secret}\""), ("/identification", $$"""{"project":"{{Secret}}"}""")));
        await service.RefusalAsync($$"""{"{{Secret}}":"{{Secret}}"}""");
        using var unknown = await service.GetAsync($"/{Secret}?{Secret}={Secret}");
        using var method = new HttpRequestMessage(new HttpMethod("NEVER"), "/");
        using var strange = await service.Client.SendAsync(method, TestContext.Current.CancellationToken);
        var metrics = await ScrapeAsync();
        Assert.DoesNotContain(Secret, metrics, StringComparison.Ordinal);
        Assert.DoesNotContain("NEVER", metrics, StringComparison.Ordinal);
    }

    [Fact]
    public async Task OpenMetrics_is_given_where_it_is_asked_for()
    {
        using var request = new HttpRequestMessage(HttpMethod.Get, "/metrics");
        request.Headers.Accept.Add(MediaTypeWithQualityHeaderValue.Parse("application/openmetrics-text; version=1.0.0"));
        using var answer = await service.Client.SendAsync(request, TestContext.Current.CancellationToken);
        Assert.Equal("application/openmetrics-text", answer.Content.Headers.ContentType?.MediaType);
        Assert.EndsWith("# EOF\n", await RunningService.TextOf(answer), StringComparison.Ordinal);
    }

    private Task<string> ScrapeAsync() => service.Client.GetStringAsync("/metrics", TestContext.Current.CancellationToken);

    private static void AssertMore(string before, string after, string name, string labels) =>
        Assert.True(Value(after, name, labels) > Value(before, name, labels), $"{name}{{{labels}}} did not grow:\n{after}");

    private static double Value(string metrics, string name, string labels) => metrics.Split('\n')
        .Where(line => line.StartsWith(name + "{", StringComparison.Ordinal) && line.Contains(labels, StringComparison.Ordinal))
        .Sum(line => double.Parse(LastNumber().Match(line).Value, System.Globalization.CultureInfo.InvariantCulture));

    [GeneratedRegex("(?<=} )[0-9.eE+-]+")]
    private static partial Regex LastNumber();
}
