using System.Net;
using System.Net.Sockets;
using System.Text;
using Drypeak.Service.Hosting;
using Microsoft.AspNetCore.Builder;
using Microsoft.AspNetCore.Http;
using Xunit;

namespace Drypeak.Service.Tests.Hosting;

/// <summary>Each bound on how much, how fast and how often, at a service that was given a small one.</summary>
public sealed class CapacityTests
{
    private static CancellationToken Stop => TestContext.Current.CancellationToken;

    [Fact]
    public async Task Who_finds_the_queue_full_is_told_to_come_back_and_who_waits_is_answered_in_turn()
    {
        using var gate = new Gate();
        await using var service = await TestService.StartAsync(gate.Map, ("Limits:RequestsAtOnce", "1"), ("Limits:RequestsWaiting", "1"));
        var first = service.Client.GetAsync("/gate", Stop);
        await gate.EnteredAsync(1);
        var others = new[] { service.Client.GetAsync("/gate", Stop), service.Client.GetAsync("/gate", Stop) };
        // One of them has the place in the queue, and cannot be answered yet.
        var turnedAway = await Task.WhenAny(others);
        using var refusal = await turnedAway;
        Assert.Equal(HttpStatusCode.ServiceUnavailable, refusal.StatusCode);
        Assert.Equal(Problem.MediaType, refusal.Content.Headers.ContentType?.MediaType);
        Assert.Equal(TimeSpan.FromSeconds(1), refusal.Headers.RetryAfter?.Delta);
        Assert.Equal(HttpStatusCode.OK, (await service.Client.GetAsync("/health/ready", Stop)).StatusCode);
        Assert.Equal(HttpStatusCode.OK, (await service.Client.GetAsync("/metrics", Stop)).StatusCode);

        gate.Open();
        Assert.Equal(HttpStatusCode.OK, (await first).StatusCode);
        Assert.Equal(HttpStatusCode.OK, (await others.Single(each => each != turnedAway)).StatusCode);
    }

    [Fact]
    public async Task Whose_turn_does_not_come_in_time_is_told_to_come_back()
    {
        using var gate = new Gate();
        await using var service = await TestService.StartAsync(gate.Map, ("Limits:RequestsAtOnce", "1"), ("Limits:RequestSeconds", "1"));
        var first = service.Client.GetAsync("/gate", Stop);
        await gate.EnteredAsync(1);
        using var second = await service.Client.GetAsync("/gate", Stop);
        Assert.Equal(HttpStatusCode.ServiceUnavailable, second.StatusCode);
        gate.Open();
        Assert.Equal(HttpStatusCode.OK, (await first).StatusCode);
    }

    [Fact]
    public async Task Sixty_four_requests_are_answered_at_once_by_default()
    {
        using var gate = new Gate();
        await using var service = await TestService.StartAsync(gate.Map);
        var requests = Enumerable.Range(0, 64).Select(_ => service.Client.GetAsync("/gate", Stop)).ToList();
        await gate.EnteredAsync(64);
        gate.Open();
        Assert.All(await Task.WhenAll(requests), answer => Assert.Equal(HttpStatusCode.OK, answer.StatusCode));
    }

    [Fact]
    public async Task Bodies_that_do_not_come_hold_up_nobody_whose_body_is_there()
    {
        await using var service = await TestService.StartAsync(null, ("Limits:RequestsAtOnce", "1"), ("Limits:RequestsWaiting", "0"));
        var slow = new List<TcpClient>();
        for (var i = 0; i < 50; i++)
        {
            slow.Add(await SendAsync(service, "POST /weighings HTTP/1.1\r\nHost: a\r\nContent-Type: application/json\r\nContent-Length: 100\r\n\r\n{"));
        }

        using var body = new StringContent("""{"portions":[{"label":"1","wet":152.4,"dry":141.0}],"balance":31.2}""", Encoding.UTF8, "application/json");
        Assert.Equal(HttpStatusCode.OK, (await service.Client.PostAsync("/weighings", body, Stop)).StatusCode);
        slow.ForEach(each => each.Dispose());
    }

    [Theory]
    [InlineData("Limits:RequestSeconds", "1")]
    [InlineData("Limits:SlowSeconds", "2")]
    public async Task A_body_that_comes_too_slowly_is_408(string limit, string seconds)
    {
        await using var service = await TestService.StartAsync(null, (limit, seconds));
        using var slow = await SendAsync(service, "POST /weighings HTTP/1.1\r\nHost: a\r\nContent-Type: application/json\r\nContent-Length: 100\r\n\r\n{");
        Assert.StartsWith("HTTP/1.1 408 ", await ReadAsync(slow), StringComparison.Ordinal);
    }

    [Fact]
    public async Task Header_fields_that_do_not_come_end_the_connection()
    {
        await using var service = await TestService.StartAsync(null, ("Limits:HeaderSeconds", "1"));
        using var slow = await SendAsync(service, "GET /kept HTTP/1.1\r\nHost: a\r\nX-");
        Assert.StartsWith("HTTP/1.1 408 ", await ReadAsync(slow), StringComparison.Ordinal);
    }

    [Fact]
    public async Task An_idle_connection_is_closed()
    {
        await using var service = await TestService.StartAsync(null, ("Limits:IdleSeconds", "1"));
        using var idle = await SendAsync(service, "HEAD /health/live HTTP/1.1\r\nHost: a\r\n\r\n");
        Assert.StartsWith("HTTP/1.1 200 ", await ReadAsync(idle), StringComparison.Ordinal);
    }

    [Fact]
    public async Task One_connection_too_many_is_closed()
    {
        await using var service = await TestService.StartAsync(null, ("Limits:Connections", "10"));
        service.Client.Dispose();
        var open = new List<TcpClient>();
        for (var i = 0; i < 10; i++)
        {
            open.Add(await SendAsync(service, ""));
        }

        using var last = await SendAsync(service, "GET /health/live HTTP/1.1\r\nHost: a\r\nConnection: close\r\n\r\n");
        Assert.Equal("", await ReadAsync(last));
        open.ForEach(each => each.Dispose());
    }

    [Theory]
    [InlineData("Limits:HeaderBytes", "2048", 1, 3000)]
    [InlineData("Limits:HeaderFields", "10", 15, 1)]
    public async Task Too_many_or_too_long_header_fields_are_431(string limit, string value, int fields, int length)
    {
        await using var service = await TestService.StartAsync(null, (limit, value));
        using var request = new HttpRequestMessage(HttpMethod.Get, "/kept");
        for (var i = 0; i < fields; i++)
        {
            request.Headers.Add($"X-{i}", new string('a', length));
        }

        using var answer = await service.Client.SendAsync(request, Stop);
        Assert.Equal(HttpStatusCode.RequestHeaderFieldsTooLarge, answer.StatusCode);
        Assert.Equal(Problem.MediaType, answer.Content.Headers.ContentType?.MediaType);
    }

    [Fact]
    public async Task A_caller_who_asks_too_often_is_429_until_the_time_that_is_told()
    {
        await using var service = await TestService.StartAsync(null, ("Limits:RequestsPerSecond", "1"), ("Limits:RequestBurst", "3"));
        HttpResponseMessage refused;
        do
        {
            refused = await service.Client.GetAsync("/kept", Stop);
        }
        while (refused.IsSuccessStatusCode);
        Assert.Equal(HttpStatusCode.TooManyRequests, refused.StatusCode);
        Assert.Equal(Problem.MediaType, refused.Content.Headers.ContentType?.MediaType);
        Assert.InRange(refused.Headers.RetryAfter!.Delta!.Value.TotalSeconds, 1, 3);
        Assert.Equal(HttpStatusCode.OK, (await service.Client.GetAsync("/health/live", Stop)).StatusCode);
    }

    [Fact]
    public async Task Nobody_is_429_by_default()
    {
        await using var service = await TestService.StartAsync();
        var answers = await Task.WhenAll(Enumerable.Range(0, 300).Select(_ => service.Client.GetAsync("/kept", Stop)));
        Assert.All(answers, answer => Assert.Equal(HttpStatusCode.OK, answer.StatusCode));
    }

    private static async Task<TcpClient> SendAsync(TestService service, string text)
    {
        var connection = new TcpClient();
        await connection.ConnectAsync(IPAddress.Loopback, service.Port, Stop);
        await connection.GetStream().WriteAsync(Encoding.ASCII.GetBytes(text), Stop);
        return connection;
    }

    /// <summary>All that comes until the service closes the connection.</summary>
    private static async Task<string> ReadAsync(TcpClient connection)
    {
        using var reader = new StreamReader(connection.GetStream());
        try
        {
            return await reader.ReadToEndAsync(Stop).WaitAsync(TimeSpan.FromSeconds(20), Stop);
        }
        catch (IOException)
        {
            return "";
        }
    }

    /// <summary>An endpoint that answers when it is told to.</summary>
    private sealed class Gate : IDisposable
    {
        private readonly TaskCompletionSource _open = new();
        private readonly SemaphoreSlim _entered = new(0);

        public void Map(WebApplication app) => app.MapGet("/gate", async (HttpContext context) =>
        {
            _entered.Release();
            await _open.Task.WaitAsync(context.RequestAborted);
            return "open";
        });

        public async Task EnteredAsync(int requests)
        {
            for (var i = 0; i < requests; i++)
            {
                await _entered.WaitAsync(TimeSpan.FromSeconds(20), Stop);
            }
        }

        public void Open() => _open.SetResult();

        public void Dispose() => _entered.Dispose();
    }
}
