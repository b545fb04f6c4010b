using Microsoft.AspNetCore.DataProtection.KeyManagement;
using Microsoft.AspNetCore.Http.Features;
using Serilog;

namespace Drypeak.Service.Hosting;

/// <summary>All that surrounds the jobs: limits, log, refusals, security, health, description. Two calls in Program.cs.</summary>
public static class DrypeakHosting
{
    /// <summary>Kestrel's own bound, above ours, so that a long address is refused by a problem and not by the bare server.</summary>
    private const int ServersRequestLineBytes = 32 << 10;

    /// <summary>Registers what the service stands on. <see cref="Limits"/> can be injected afterwards.</summary>
    /// <exception cref="System.ComponentModel.DataAnnotations.ValidationException">A limit in the configuration lies outside its range.</exception>
    public static WebApplicationBuilder AddDrypeakHosting(this WebApplicationBuilder builder)
    {
        var limits = Limits.From(builder.Configuration);
        builder.Services.AddSingleton(limits);
        builder.Services.AddSerilog(RequestLog.Configure);
        builder.Services.AddApiDescription();
        builder.Services.Configure<HostOptions>(host => host.ShutdownTimeout = TimeSpan.FromSeconds(limits.ShutdownSeconds));
        builder.Services.Configure<KeyManagementOptions>(keys => keys.XmlRepository = new MemoryKeys());
        builder.Services.Configure<FormOptions>(forms => KeepInMemory(forms, limits));
        builder.WebHost.ConfigureKestrel(server =>
        {
            server.AddServerHeader = false;
            server.Limits.MaxRequestLineSize = ServersRequestLineBytes;
            // Each endpoint has its own bound, and a batch has none.
            server.Limits.MaxRequestBodySize = null;
            server.Limits.MaxConcurrentConnections = limits.Connections == 0 ? null : limits.Connections;
        });
        return builder;
    }

    /// <summary>Puts everything around the endpoints. To be called before they are mapped.</summary>
    /// <param name="app">The application.</param>
    /// <param name="notFoundPage">The page for an unknown address, for who accepts <c>text/html</c>; it sets no status of its own.</param>
    public static WebApplication UseDrypeakHosting(this WebApplication app, Func<HttpContext, IResult> notFoundPage)
    {
        app.Use(SecurityHeaders.Add);
        RequestLog.Use(app);
        app.UseExceptionHandler(Refusals.Exceptions);
        app.Use(Refusals.LongAddresses(app.Services.GetRequiredService<Limits>().AddressBytes));
        app.UseStatusCodePages(Refusals.BareStatus(notFoundPage));
        ApiReference.Use(app);
        Health.Map(app);
        return app;
    }

    /// <summary>Form posts never touch the disk: an upload is kept in memory, up to the bound of a body.</summary>
    private static void KeepInMemory(FormOptions forms, Limits limits)
    {
        forms.MemoryBufferThreshold = limits.BodyBytes;
        forms.MultipartBodyLengthLimit = limits.BodyBytes;
        forms.BufferBodyLengthLimit = limits.BodyBytes;
        forms.ValueLengthLimit = limits.BodyBytes;
    }
}
