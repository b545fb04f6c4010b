using System.Diagnostics;
using System.Net;
using System.Net.Http.Headers;
using Xunit;

namespace Drypeak.Operations.Tests;

/// <summary>Two replicas behind nginx, by the configuration that is deployed, under load.</summary>
public sealed class ReplicasTests : IAsyncLifetime
{
    private const int Clients = 8;

    private readonly string _folder = Directory.CreateTempSubdirectory("drypeak-nginx-").FullName;
    private readonly ServiceProcess[] _replicas = new ServiceProcess[2];
    private readonly int _port = ServiceProcess.FreePort();
    private Process? _nginx;

    private static CancellationToken Stop => TestContext.Current.CancellationToken;

    public async ValueTask InitializeAsync()
    {
        Tool.Needs("nginx");
        for (var i = 0; i < _replicas.Length; i++)
        {
            _replicas[i] = await ServiceProcess.StartAsync();
        }

        var deployed = (await File.ReadAllTextAsync(Repository.File("deploy/nginx/drypeak.conf"), Stop))
            .Replace("drypeak-1:8080", $"127.0.0.1:{_replicas[0].Port}", StringComparison.Ordinal)
            .Replace("drypeak-2:8080", $"127.0.0.1:{_replicas[1].Port}", StringComparison.Ordinal)
            .Replace("listen 80;", $"listen 127.0.0.1:{_port};", StringComparison.Ordinal);
        var around = $$"""
            daemon off; pid {{_folder}}/pid; error_log {{_folder}}/error.log;
            events { }
            http {
                access_log off;
                client_body_temp_path {{_folder}}/body; proxy_temp_path {{_folder}}/proxy; fastcgi_temp_path {{_folder}}/f; uwsgi_temp_path {{_folder}}/u; scgi_temp_path {{_folder}}/s;
                {{deployed}}
            }
            """;
        var configuration = Path.Combine(_folder, "nginx.conf");
        await File.WriteAllTextAsync(configuration, around, Stop);
        _nginx = Tool.Start("nginx", "-c", configuration);
        using var client = new HttpClient();
        while (true)
        {
            try
            {
                using var answer = await client.GetAsync(new Uri($"http://127.0.0.1:{_port}/health/live"), Stop);
                return;
            }
            catch (HttpRequestException) when (!_nginx.HasExited)
            {
                await Task.Delay(20, Stop);
            }
        }
    }

    public ValueTask DisposeAsync()
    {
        _nginx?.Kill(entireProcessTree: true);
        _nginx?.Dispose();
        Array.ForEach(_replicas, replica => replica?.Dispose());
        Directory.Delete(_folder, recursive: true);
        return ValueTask.CompletedTask;
    }

    [Fact]
    public async Task A_rolling_restart_under_load_fails_no_request()
    {
        using var load = Load.Start(_port, Clients);
        for (var i = 0; i < _replicas.Length; i++)
        {
            await load.MoreAsync(100);
            Assert.Equal(0, await _replicas[i].StopAsync());
            await load.MoreAsync(100);
            _replicas[i] = await ServiceProcess.StartAsync(_replicas[i].Port);
            await load.MoreAsync(100);
        }

        var (answered, failed) = await load.EndAsync();
        TestContext.Current.TestOutputHelper?.WriteLine($"{answered} answered, {failed.Count} failed");
        Assert.Empty(failed);
        Assert.True(answered >= 600);
    }

    [Fact]
    public async Task A_killed_replica_fails_only_what_it_had_in_work_and_all_of_it_succeeds_when_sent_again()
    {
        using var load = Load.Start(_port, Clients);
        await load.MoreAsync(200);
        _replicas[0].Kill();
        await load.MoreAsync(200);
        var (answered, failed) = await load.EndAsync();
        TestContext.Current.TestOutputHelper?.WriteLine($"{answered} answered, {failed.Count} failed");
        // nginx sends again what got no answer; what had begun to be answered may break off, at most one for each client.
        Assert.InRange(failed.Count, 0, Clients);

        using var client = new HttpClient { BaseAddress = new Uri($"http://127.0.0.1:{_port}") };
        foreach (var _ in failed)
        {
            using var again = await Load.SendAsync(client, Stop);
            Assert.Equal(HttpStatusCode.OK, again.StatusCode);
        }
    }

    [Fact]
    public async Task The_counts_of_a_replica_are_not_shown_through_the_common_address()
    {
        using var client = new HttpClient();
        using var answer = await client.GetAsync(new Uri($"http://127.0.0.1:{_port}/metrics"), Stop);
        Assert.Equal(HttpStatusCode.NotFound, answer.StatusCode);
    }

    /// <summary>Clients that post the same test again and again until they are told to end.</summary>
    private sealed class Load : IDisposable
    {
        private static readonly byte[] Test = System.Text.Encoding.UTF8.GetBytes(Requests.Example("moisture-density"));

        private readonly CancellationTokenSource _end = new();
        private readonly List<string> _failed = [];
        private readonly HttpClient _client;
        private Task[] _clients = [];
        private int _answered;

        private Load(int port) => _client = new HttpClient { BaseAddress = new Uri($"http://127.0.0.1:{port}") };

        public static Load Start(int port, int clients)
        {
            var load = new Load(port);
            load._clients = [.. Enumerable.Range(0, clients).Select(_ => Task.Run(load.RunAsync))];
            return load;
        }

        public static Task<HttpResponseMessage> SendAsync(HttpClient client, CancellationToken stop)
        {
            var body = new ByteArrayContent(Test);
            body.Headers.ContentType = new MediaTypeHeaderValue("application/json");
            return client.PostAsync("/v1/moisture-density", body, stop);
        }

        /// <summary>Waits until so many more requests were answered.</summary>
        public async Task MoreAsync(int requests)
        {
            var until = _answered + requests;
            using var patience = new CancellationTokenSource(TimeSpan.FromSeconds(60));
            while (Volatile.Read(ref _answered) < until)
            {
                await Task.Delay(10, patience.Token);
            }
        }

        public async Task<(int Answered, IReadOnlyList<string> Failed)> EndAsync()
        {
            await _end.CancelAsync();
            await Task.WhenAll(_clients);
            return (_answered, _failed);
        }

        public void Dispose()
        {
            _end.Cancel();
            _client.Dispose();
            _end.Dispose();
        }

        private async Task RunAsync()
        {
            while (!_end.IsCancellationRequested)
            {
                string? failure;
                try
                {
                    using var answer = await SendAsync(_client, Stop);
                    failure = answer.StatusCode == HttpStatusCode.OK ? null : $"{(int)answer.StatusCode} {await answer.Content.ReadAsStringAsync(Stop)}";
                }
                catch (HttpRequestException broken)
                {
                    failure = broken.Message;
                }

                if (failure is null)
                {
                    Interlocked.Increment(ref _answered);
                }
                else
                {
                    lock (_failed)
                    {
                        _failed.Add(failure);
                    }
                }
            }
        }
    }
}
