using Microsoft.AspNetCore.DataProtection.KeyManagement;
using Microsoft.AspNetCore.Http.Features;
using Serilog;

namespace Drypeak.Service.Hosting;

/// <summary>All that surrounds the jobs: limits, log, refusals, security, health, description. Two calls in Program.cs.</summary>
public static class DrypeakHosting
{
    /// <summary>Registers what the service stands on. <see cref="Limits"/> can be injected afterwards.</summary>
    /// <exception cref="System.ComponentModel.DataAnnotations.ValidationException">A setting in the configuration is out of its range.</exception>
    public static WebApplicationBuilder AddDrypeakHosting(this WebApplicationBuilder builder)
    {
        var limits = Limits.From(builder.Configuration);
        var access = AccessSettings.From(builder.Configuration);
        builder.Services.AddSingleton(limits).AddSingleton<Capacity>().AddSingleton<Readiness>().AddHostedService<WarmUp>();
        builder.Services.AddSerilog(RequestLog.Configure);
        builder.Services.AddApiDescription();
        AccessControl.Add(builder.Services, access);
        Telemetry.Add(builder);
        if (limits.RequestsPerSecond > 0)
        {
            CallerRates.Add(builder.Services, limits);
        }

        builder.Services.Configure<HostOptions>(host => host.ShutdownTimeout = TimeSpan.FromSeconds(limits.ShutdownSeconds));
        builder.Services.Configure<KeyManagementOptions>(keys => keys.XmlRepository = new MemoryKeys());
        builder.Services.Configure<FormOptions>(forms => KeepInMemory(forms, limits));
        builder.WebHost.ConfigureKestrel(server =>
        {
            ServerLimits.Apply(server, limits);
            server.ConfigureEndpointDefaults(endpoint => access.RefuseOpenAddress(endpoint.EndPoint));
        });
        return builder;
    }

    /// <summary>Puts everything around the endpoints. To be called before they are mapped.</summary>
    /// <param name="app">The application.</param>
    /// <param name="notFoundPage">The page for an unknown address, for who accepts <c>text/html</c>; it sets no status of its own.</param>
    public static WebApplication UseDrypeakHosting(this WebApplication app, Func<HttpContext, IResult> notFoundPage)
    {
        var limits = app.Services.GetRequiredService<Limits>();
        TrustedProxies.Use(app);
        app.Use(SecurityHeaders.Add);
        RequestLog.Use(app);
        app.Use(Telemetry.Count);
        app.UseExceptionHandler(Refusals.Exceptions);
        app.Use(Refusals.LongAddresses(limits.AddressBytes));
        app.Use(Refusals.LongHeaders(limits.HeaderBytes, limits.HeaderFields));
        app.UseStatusCodePages(Refusals.BareStatus(notFoundPage));
        AccessControl.Use(app, app.Services.GetRequiredService<AccessSettings>());
        if (limits.RequestsPerSecond > 0)
        {
            app.UseRateLimiter();
        }

        ApiReference.Use(app);
        app.Use(app.Services.GetRequiredService<Capacity>().PassAsync);
        Health.Map(app);
        Telemetry.Map(app);
        SecurityContact.Map(app, SecurityContact.From(app.Configuration));
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
