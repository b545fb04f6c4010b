using System.Diagnostics;
using System.Net;
using System.Text;
using Xunit;

namespace Drypeak.Operations.Tests;

/// <summary>How the program starts: warm when it says that it is ready, by a user who may write nowhere, and within bounded memory.</summary>
public sealed class StartTests
{
    private static CancellationToken Stop => TestContext.Current.CancellationToken;

    [Fact]
    public async Task When_the_program_says_that_it_is_ready_its_first_answer_takes_no_longer_than_a_warm_one_by_much()
    {
        using var service = await ServiceProcess.StartAsync();
        using var client = new HttpClient { BaseAddress = service.Address };
        var first = await TimeAsync(client);
        var later = new List<double>();
        for (var i = 0; i < 20; i++)
        {
            later.Add(await TimeAsync(client));
        }

        TestContext.Current.TestOutputHelper?.WriteLine($"first {first:0.0} ms, then {later.Order().ElementAt(10):0.0} ms");
        // Cold, the first takes some 400 ms; the connection and the client's own first use are in these, too.
        Assert.InRange(first, 0, 250);
    }

    [Fact]
    public async Task The_program_answers_every_kind_of_request_as_a_user_who_may_write_nowhere()
    {
        Tool.Needs("setpriv");
        Assert.SkipUnless(Environment.UserName == "root", "Only root can become another user.");
        var port = ServiceProcess.FreePort();
        var (code, _) = await Tool.RunAsync("setpriv", "--reuid=65534", "--regid=65534", "--clear-groups", "test", "-r", typeof(Program).Assembly.Location);
        Assert.SkipUnless(code == 0, $"Another user may not read {typeof(Program).Assembly.Location}.");
        // nobody, with no home and no temporary folder: what is written anyway fails, and what fails is seen.
        using var process = Tool.Start("setpriv", "--reuid=65534", "--regid=65534", "--clear-groups", "--no-new-privs",
            "env", "-i", "PATH=/usr/local/bin:/usr/bin:/bin", "HOME=/nonexistent", "TMPDIR=/nonexistent", "DOTNET_EnableDiagnostics=0", "DOTNET_CLI_HOME=/nonexistent",
            "dotnet", typeof(Program).Assembly.Location, "--urls", $"http://127.0.0.1:{port}");
        try
        {
            using var client = new HttpClient { BaseAddress = new Uri($"http://127.0.0.1:{port}") };
            while (!await IsReadyAsync(client) && !process.HasExited)
            {
                await Task.Delay(50, Stop);
            }

            foreach (var accept in new[] { "application/json", "image/svg+xml", "image/png", "application/pdf" })
            {
                using var request = new HttpRequestMessage(HttpMethod.Post, "/v1/moisture-density") { Content = new StringContent(Requests.Example("moisture-density"), Encoding.UTF8, "application/json"), Headers = { { "Accept", accept } } };
                using var answer = await client.SendAsync(request, Stop);
                Assert.Equal(HttpStatusCode.OK, answer.StatusCode);
            }

            using var upload = new MultipartFormDataContent { { new ByteArrayContent(new byte[500_000]), "file", "upload.txt" } };
            using var posted = await client.PostAsync("/", upload, Stop);
            Assert.InRange((int)posted.StatusCode, 200, 499);
            using var page = await client.GetAsync("/", Stop);
            Assert.Equal(HttpStatusCode.OK, page.StatusCode);
        }
        finally
        {
            process.Kill(entireProcessTree: true);
        }
    }

    [Fact]
    public async Task Under_the_documented_heap_limit_the_largest_requests_are_answered_or_refused_and_the_memory_stays_within()
    {
        using var service = await ServiceProcess.StartAsync(0, ("DOTNET_GCHeapHardLimit", "0x18000000"));
        using var client = new HttpClient { BaseAddress = service.Address };
        var largest = await LargestAsync();
        var answers = await Task.WhenAll(Enumerable.Range(0, 100).Select(async i =>
        {
            using var request = new HttpRequestMessage(HttpMethod.Post, i % 10 == 0 ? "/v1/moisture-density?width=2400&height=2400&scale=2" : "/v1/moisture-density") { Content = new StringContent(largest, Encoding.UTF8, "application/json") };
            request.Headers.Add("Accept", i % 10 == 0 ? "image/png" : "application/json");
            using var answer = await client.SendAsync(request, Stop);
            return answer.StatusCode;
        }));
        TestContext.Current.TestOutputHelper?.WriteLine($"{string.Join(", ", answers.CountBy(status => status))}; {service.Memory >> 20} MiB");
        Assert.All(answers, status => Assert.Contains(status, new[] { HttpStatusCode.OK, HttpStatusCode.ServiceUnavailable }));
        Assert.InRange(service.Memory, 0, 512 << 20);
    }

    /// <summary>A test of as many specimens as are taken.</summary>
    private static Task<string> LargestAsync() => Task.FromResult($$"""
        {"specimens":[{{string.Join(',', Enumerable.Range(0, 500).Select(i => string.Create(System.Globalization.CultureInfo.InvariantCulture, $$"""{"waterContent":{{5 + (i * 0.04):0.00}},"dryDensity":{{1.9 - (Math.Pow(i - 250, 2) * 3e-6):0.0000}}}""")))}}]}
        """);

    private static async Task<double> TimeAsync(HttpClient client)
    {
        var began = Stopwatch.StartNew();
        using var body = new StringContent(Requests.Example("moisture-density"), Encoding.UTF8, "application/json");
        using var answer = await client.PostAsync("/v1/moisture-density", body, Stop);
        answer.EnsureSuccessStatusCode();
        await answer.Content.ReadAsByteArrayAsync(Stop);
        return began.Elapsed.TotalMilliseconds;
    }

    private static async Task<bool> IsReadyAsync(HttpClient client)
    {
        try
        {
            using var answer = await client.GetAsync("/health/ready", Stop);
            return answer.IsSuccessStatusCode;
        }
        catch (HttpRequestException)
        {
            return false;
        }
    }
}
