using System.Net;
using Drypeak.Service.Hosting;
using Microsoft.AspNetCore.Builder;
using Microsoft.AspNetCore.Hosting;
using Microsoft.AspNetCore.Http;
using Microsoft.Extensions.Configuration;
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

    public int Port => new Uri(app.Urls.Single()).Port;

    public IServiceProvider Services => app.Services;

    /// <summary>Starts on a free port of this machine, and waits until it is ready.</summary>
    /// <param name="map">Further endpoints.</param>
    /// <param name="settings">Configuration, as <c>Limits:Specimens</c>.</param>
    public static async Task<TestService> StartAsync(Action<WebApplication>? map = null, params (string Name, string Value)[] settings)
    {
        var builder = WebApplication.CreateBuilder(new WebApplicationOptions { EnvironmentName = "Production" });
        builder.Configuration.AddInMemoryCollection(settings.Select(setting => KeyValuePair.Create(setting.Name, (string?)setting.Value)));
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
        var service = new TestService(app);
        HttpStatusCode ready;
        do
        {
            using var answer = await service.Client.GetAsync("/health/ready");
            ready = answer.StatusCode;
        }
        while (ready != HttpStatusCode.OK);
        return service;
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
