using System.Diagnostics;
using System.Net;
using System.Net.Sockets;
using System.Text;
using Xunit;

namespace Drypeak.Operations.Tests;

/// <summary>Many who send a byte now and then, and one who sends as everyone should.</summary>
public sealed class SlowClientsTests
{
    private const int SlowClients = 500;

    private static CancellationToken Stop => TestContext.Current.CancellationToken;

    [Fact]
    public async Task Five_hundred_slow_clients_do_not_stop_a_healthy_one()
    {
        using var service = await ServiceProcess.StartAsync();
        var slow = new List<TcpClient>();
        try
        {
            for (var i = 0; i < SlowClients; i++)
            {
                var client = new TcpClient();
                await client.ConnectAsync(IPAddress.Loopback, service.Port, Stop);
                // Half of them are slow with their header fields, half with their body.
                var begun = i % 2 == 0 ? "POST /v1/moisture-density HTTP/1.1\r\nHost: a\r\nX-" : "POST /v1/moisture-density HTTP/1.1\r\nHost: a\r\nContent-Type: application/json\r\nContent-Length: 60000\r\n\r\n{";
                await client.GetStream().WriteAsync(Encoding.ASCII.GetBytes(begun), Stop);
                slow.Add(client);
            }

            using var healthy = new HttpClient { BaseAddress = service.Address, Timeout = TimeSpan.FromSeconds(10) };
            var longest = TimeSpan.Zero;
            for (var i = 0; i < 50; i++)
            {
                var began = Stopwatch.StartNew();
                using var body = new StringContent(Requests.Example("moisture-density"), Encoding.UTF8, "application/json");
                using var answer = await healthy.PostAsync("/v1/moisture-density", body, Stop);
                Assert.Equal(HttpStatusCode.OK, answer.StatusCode);
                longest = began.Elapsed > longest ? began.Elapsed : longest;
            }

            TestContext.Current.TestOutputHelper?.WriteLine($"the longest of 50 answers took {longest.TotalMilliseconds:0} ms beside {SlowClients} slow clients");
            Assert.InRange(longest.TotalSeconds, 0, 2);
        }
        finally
        {
            slow.ForEach(client => client.Dispose());
        }
    }
}
