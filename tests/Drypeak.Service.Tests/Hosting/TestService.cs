using Drypeak.Service.Hosting;
using Microsoft.AspNetCore.Builder;
using Microsoft.AspNetCore.Hosting;
using Microsoft.AspNetCore.Http;
using Serilog;

namespace Drypeak.Service.Tests.Hosting;

/// <summary>The hosting around a few small endpoints, on a real port of a real server.</summary>
public sealed class TestService : IAsyncDisposable
{
    public const int MaximumBytes = 2000;
    public const string Page = "<!doctype html><title>Not here</title>";

    private readonly WebApplication app;

    private TestService(WebApplication app)
    {
        this.app = app;
        Client = new HttpClient(new SocketsHttpHandler { AllowAutoRedirect = false, UseCookies = false }) { BaseAddress = new Uri(app.Urls.Single()) };
    }

    public HttpClient Client { get; }

    public IServiceProvider Services => app.Services;

    public static async Task<TestService> StartAsync(Action<WebApplication>? map = null)
    {
        var builder = WebApplication.CreateBuilder(new WebApplicationOptions { EnvironmentName = "Production" });
        builder.AddDrypeakHosting();
        builder.Services.AddSerilog(log => log.MinimumLevel.Fatal());
        builder.WebHost.UseUrls("http://127.0.0.1:0");
        var app = builder.Build();
        app.UseDrypeakHosting(_ => Results.Content(Page, "text/html"));
        app.MapPost("/weighings", (Delegate)Weigh);
        app.MapGet("/failure", string () => throw new InvalidOperationException("a secret"));
        app.MapGet("/kept", () => new CachedBytes("kept"u8.ToArray(), "text/plain") { Vary = "Accept" });
        map?.Invoke(app);
        await app.StartAsync();
        return new TestService(app);
    }

    public Task StopAsync() => app.StopAsync();

    public async ValueTask DisposeAsync()
    {
        Client.Dispose();
        await app.DisposeAsync();
    }

    private static async Task<IResult> Weigh(HttpContext context)
    {
        var read = await RequestReader.ReadAsync(context, WeighingContract.Json, WeighingRules.Check, MaximumBytes);
        return read.Succeeded ? TypedResults.Ok(read.Value.Portions.Count) : read.Problem;
    }
}
