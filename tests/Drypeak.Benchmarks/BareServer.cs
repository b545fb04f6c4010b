using Microsoft.AspNetCore.Builder;
using Microsoft.AspNetCore.Hosting;
using Microsoft.AspNetCore.Http;
using Microsoft.Extensions.DependencyInjection;

namespace Drypeak.Benchmarks;

/// <summary>The floor: Kestrel alone, which gives each body back as it came and computes nothing.</summary>
internal static class BareServer
{
    public static async Task RunAsync(string url)
    {
        var builder = WebApplication.CreateEmptyBuilder(new WebApplicationOptions());
        builder.WebHost.UseKestrelCore().UseUrls(url);
        builder.Services.AddRoutingCore();
        await using var app = builder.Build();
        app.UseRouting();
        app.MapPost("/{**path}", async (HttpContext context) =>
        {
            context.Response.ContentType = "application/json";
            await context.Request.Body.CopyToAsync(context.Response.Body, context.RequestAborted);
        });
        await app.RunAsync();
    }
}
