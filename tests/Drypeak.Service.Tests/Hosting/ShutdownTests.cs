using System.Net;
using System.Net.Sockets;
using Drypeak.Service.Hosting;
using Microsoft.AspNetCore.Builder;
using Microsoft.Extensions.DependencyInjection;
using Microsoft.Extensions.Hosting;
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

    [Fact]
    public async Task A_service_that_was_told_to_stop_is_not_ready_and_says_when_to_ask_again()
    {
        await using var service = await TestService.StartAsync();
        service.Services.GetRequiredService<IHostApplicationLifetime>().StopApplication();
        using var response = await service.Client.GetAsync("/health/ready", TestContext.Current.CancellationToken);
        Assert.Equal(HttpStatusCode.ServiceUnavailable, response.StatusCode);
        Assert.Equal(TimeSpan.FromSeconds(1), response.Headers.RetryAfter?.Delta);
        Assert.Equal(Problem.MediaType, response.Content.Headers.ContentType?.MediaType);
    }
}
