using System.Collections.Concurrent;
using System.Text;
using Microsoft.AspNetCore.Builder;
using Microsoft.AspNetCore.Http;
using Xunit;

namespace Drypeak.Service.Tests.Hosting;

/// <summary>Traces go to a collector where one is configured, carry the caller's on, and hold nothing of what was asked.</summary>
public sealed class TraceExportTests
{
    private const string Trace = "0af7651916cd43dd8448eb211c80319c";
    private const string Secret = "never-to-be-sent";

    [Fact]
    public async Task A_span_of_the_caller_s_trace_is_sent_without_the_query()
    {
        var received = new ConcurrentQueue<byte[]>();
        await using var collector = await Neighbor.StartAsync(app => app.MapPost("/v1/traces", async (HttpRequest request) =>
        {
            using var body = new MemoryStream();
            await request.Body.CopyToAsync(body);
            received.Enqueue(body.ToArray());
        }));
        await using (var service = await TestService.StartAsync(null, ("OTEL_EXPORTER_OTLP_ENDPOINT", collector.Address), ("OTEL_EXPORTER_OTLP_PROTOCOL", "http/protobuf")))
        {
            using var request = new HttpRequestMessage(HttpMethod.Get, $"/kept?d={Secret}");
            request.Headers.Add("traceparent", $"00-{Trace}-b7ad6b7169203331-01");
            using var answer = await service.Client.SendAsync(request, TestContext.Current.CancellationToken);
            await service.StopAsync();
        }

        // The service sends what is left when it ends.
        var sent = received.SelectMany(body => body).ToArray();
        Assert.True(sent.AsSpan().IndexOf(Convert.FromHexString(Trace)) >= 0);
        Assert.True(sent.AsSpan().IndexOf("drypeak"u8) >= 0);
        Assert.True(sent.AsSpan().IndexOf("/kept"u8) >= 0);
        Assert.True(sent.AsSpan().IndexOf(Encoding.UTF8.GetBytes(Secret)) < 0);
    }
}
