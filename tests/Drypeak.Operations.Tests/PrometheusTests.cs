using System.Diagnostics;
using System.Net;
using System.Net.Http.Headers;
using System.Text;
using System.Text.Json;
using Xunit;

namespace Drypeak.Operations.Tests;

/// <summary>A real Prometheus scrapes a real service; what the dashboard and the alerts ask is asked there.</summary>
public sealed class PrometheusTests : IAsyncLifetime
{
    private readonly string _folder = Directory.CreateTempSubdirectory("drypeak-prometheus-").FullName;
    private readonly HttpClient _client = new();
    private ServiceProcess _service = null!;
    private Process? _prometheus;

    private static CancellationToken Stop => TestContext.Current.CancellationToken;

    public async ValueTask InitializeAsync()
    {
        Tool.Needs("prometheus");
        _service = await ServiceProcess.StartAsync();
        var port = ServiceProcess.FreePort();
        var configuration = (await File.ReadAllTextAsync(Repository.File("deploy/prometheus/prometheus.yaml"), Stop))
            .Replace("\"drypeak-1:8080\", \"drypeak-2:8080\"", $"\"127.0.0.1:{_service.Port}\"", StringComparison.Ordinal)
            .Replace("15s", "1s", StringComparison.Ordinal);
        await File.WriteAllTextAsync(Path.Combine(_folder, "prometheus.yaml"), configuration, Stop);
        File.Copy(Repository.File("deploy/prometheus/alerts.yaml"), Path.Combine(_folder, "alerts.yaml"));
        _prometheus = Tool.Start("prometheus", $"--config.file={_folder}/prometheus.yaml", $"--storage.tsdb.path={_folder}/data", $"--web.listen-address=127.0.0.1:{port}");
        _client.BaseAddress = new Uri($"http://127.0.0.1:{port}");
    }

    public async ValueTask DisposeAsync()
    {
        _client.Dispose();
        if (_prometheus is { })
        {
            _prometheus.Kill();
            await _prometheus.WaitForExitAsync(CancellationToken.None);
            _prometheus.Dispose();
        }

        _service?.Dispose();
        Directory.Delete(_folder, recursive: true);
    }

    [Fact]
    public async Task What_the_service_counts_is_what_Prometheus_answers()
    {
        using (var client = new HttpClient { BaseAddress = _service.Address })
        {
            for (var i = 0; i < 7; i++)
            {
                using var body = new StringContent(Requests.Example("moisture-density"), Encoding.UTF8, "application/json");
                body.Headers.ContentType = new MediaTypeHeaderValue("application/json");
                using var answer = await client.PostAsync("/v1/moisture-density", body, Stop);
                Assert.True(answer.IsSuccessStatusCode);
            }

            using var refused = await client.PostAsync("/v1/moisture-density", new StringContent("{", Encoding.UTF8, "application/json"), Stop);
        }

        // The examples that warmed the program are not among the seven.
        Assert.Equal(7, await ValueAsync("""sum(drypeak_jobs_total{job="drypeak",operation="moisture-density",outcome="answered"})""", value => value >= 7));
        Assert.Equal(1, await ValueAsync("""sum(drypeak_jobs_total{job="drypeak",operation="moisture-density",outcome="refused"})""", value => value >= 1));
        Assert.Equal(7, await ValueAsync("""sum(drypeak_curves_total{outcome="optimum"})""", value => value >= 7));
        Assert.Equal(1, await ValueAsync("""up{job="drypeak"}""", value => value >= 1));
    }

    [Fact]
    public async Task Every_question_of_the_dashboard_and_of_the_alerts_is_understood_and_names_what_is_counted()
    {
        await ValueAsync("""up{job="drypeak"}""", value => value >= 1);
        using var dashboard = JsonDocument.Parse(await File.ReadAllTextAsync(Repository.File("deploy/prometheus/dashboard.json"), Stop));
        var questions = dashboard.RootElement.GetProperty("panels").EnumerateArray()
            .SelectMany(panel => panel.GetProperty("targets").EnumerateArray()).Select(target => target.GetProperty("expr").GetString()!)
            .Concat(File.ReadLines(Repository.File("deploy/prometheus/alerts.yaml")).Where(line => line.TrimStart().StartsWith("expr: ", StringComparison.Ordinal)).Select(line => line.Trim()["expr: ".Length..]))
            .ToList();
        Assert.True(questions.Count > 15);
        foreach (var question in questions)
        {
            Assert.Equal("success", (await AskAsync(question)).GetProperty("status").GetString());
        }

        // What only grows when something happens is not there yet; what is always there proves the names.
        foreach (var name in new[] { "http_server_active_requests", "http_server_request_duration_seconds_bucket", "dotnet_process_memory_working_set_bytes", "dotnet_gc_last_collection_memory_committed_size_bytes", "dotnet_process_cpu_time_seconds_total" })
        {
            Assert.Contains(questions, question => question.Contains(name, StringComparison.Ordinal));
            Assert.True(await ValueAsync($"count({name})", value => value >= 1) >= 1, name);
        }
    }

    private async Task<JsonElement> AskAsync(string query)
    {
        using var answer = await _client.GetAsync(new Uri($"/api/v1/query?query={Uri.EscapeDataString(query)}", UriKind.Relative), Stop);
        if (answer.StatusCode == HttpStatusCode.ServiceUnavailable)
        {
            throw new HttpRequestException("Prometheus listens, and is not ready yet.");
        }

        return JsonSerializer.Deserialize<JsonElement>(await answer.Content.ReadAsStringAsync(Stop));
    }

    /// <summary>The value of a query, asked until it is what it should become, for up to 30 s.</summary>
    private async Task<double> ValueAsync(string query, Func<double, bool> isReached)
    {
        var last = double.NaN;
        for (var began = Stopwatch.StartNew(); began.Elapsed < TimeSpan.FromSeconds(30); await Task.Delay(200, Stop))
        {
            try
            {
                var result = (await AskAsync(query)).GetProperty("data").GetProperty("result");
                if (result.GetArrayLength() > 0)
                {
                    last = double.Parse(result[0].GetProperty("value")[1].GetString()!, System.Globalization.CultureInfo.InvariantCulture);
                    if (isReached(last))
                    {
                        return last;
                    }
                }
            }
            catch (HttpRequestException)
            {
                // Prometheus does not listen yet, or is still starting.
            }
        }

        return last;
    }
}
