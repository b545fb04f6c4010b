using Microsoft.AspNetCore.Builder;
using Microsoft.AspNetCore.Hosting;
using Microsoft.Extensions.Logging;

namespace Drypeak.Service.Tests.Hosting;

/// <summary>Another server of this machine that the service asks or tells: an issuer of tokens, a collector of traces.</summary>
internal sealed class Neighbor : IAsyncDisposable
{
    private readonly WebApplication _app;

    private Neighbor(WebApplication app) => _app = app;

    public string Address => _app.Urls.Single();

    public static async Task<Neighbor> StartAsync(Action<WebApplication> map)
    {
        var builder = WebApplication.CreateSlimBuilder();
        builder.Logging.ClearProviders();
        builder.WebHost.UseUrls("http://127.0.0.1:0");
        var app = builder.Build();
        map(app);
        await app.StartAsync();
        return new Neighbor(app);
    }

    public ValueTask DisposeAsync() => _app.DisposeAsync();
}
