using System.Net;
using System.Net.Sockets;
using Microsoft.AspNetCore.Builder;
using Xunit;

namespace Drypeak.Service.Tests.Hosting;

public sealed class ShutdownTests
{
    [Fact]
    public async Task A_request_begun_is_answered_and_an_idle_connection_does_not_hold_the_end()
    {
        var begun = new TaskCompletionSource();
        var release = new TaskCompletionSource();
        await using var service = await TestService.StartAsync(app => app.MapGet("/slow", async () =>
        {
            begun.SetResult();
            await release.Task;
            return "answered";
        }));
        using var idle = new TcpClient();
        await idle.ConnectAsync(IPAddress.Loopback, service.Client.BaseAddress!.Port, TestContext.Current.CancellationToken);

        var answer = service.Client.GetStringAsync("/slow", TestContext.Current.CancellationToken);
        await begun.Task;
        var stopped = service.StopAsync();
        Assert.False(stopped.IsCompleted);
        release.SetResult();

        Assert.Equal("answered", await answer);
        await stopped.WaitAsync(TimeSpan.FromSeconds(5), TestContext.Current.CancellationToken);
    }
}
