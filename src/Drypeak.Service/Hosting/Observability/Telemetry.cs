using System.Net.Mime;
using Microsoft.AspNetCore.RateLimiting;
using OpenTelemetry.Metrics;
using OpenTelemetry.Resources;
using OpenTelemetry.Trace;

namespace Drypeak.Service.Hosting;

/// <summary>
/// Metrics and traces by OpenTelemetry. Metrics are scraped at <c>/metrics</c> (Prometheus text, OpenMetrics by Accept); traces are made
/// and sent only where <c>OTEL_EXPORTER_OTLP_ENDPOINT</c> names a collector. A caller's trace (W3C Trace Context) is carried on.
/// </summary>
internal static class Telemetry
{
    private const string CollectorSetting = "OTEL_EXPORTER_OTLP_ENDPOINT";

    private static readonly string[] FrameworkMeters =
        ["Microsoft.AspNetCore.Hosting", "Microsoft.AspNetCore.Server.Kestrel", "Microsoft.AspNetCore.RateLimiting", "System.Runtime"];

    public static void Add(WebApplicationBuilder builder)
    {
        var telemetry = builder.Services.AddOpenTelemetry()
            .ConfigureResource(resource => resource.AddService("drypeak", serviceVersion: ServiceVersion.Text, autoGenerateServiceInstanceId: false))
            .WithMetrics(metrics => metrics
                .AddMeter([Meters.Name, .. FrameworkMeters])
                .AddPrometheusExporter(exporter => exporter.ScrapeResponseCacheDurationMilliseconds = 0));
        if (builder.Configuration[CollectorSetting] is { Length: > 0 })
        {
            // What a span is about (route, method, status) is written only where this is switched on.
            AppContext.SetSwitch("Microsoft.AspNetCore.Hosting.SuppressActivityOpenTelemetryData", false);
            telemetry.WithTracing(traces => traces.AddSource(Meters.Name, "Microsoft.AspNetCore").AddProcessor(new WithoutQuery()).AddOtlpExporter());
        }
    }

    public static void Map(WebApplication app)
    {
        var scrape = ((IApplicationBuilder)app).New().UseOpenTelemetryPrometheusScrapingEndpoint(_ => true).Build();
        app.MapGet("/metrics", IResult () => new Scraped(scrape)).WithTags("Health").WithName("metrics").DisableRateLimiting().RequireAuthorization(Scopes.Metrics)
            .WithSummary("Counts and durations for Prometheus")
            .WithDescription("No label holds anything that was sent. OpenMetrics by Accept: application/openmetrics-text.")
            .Gives<string>(MediaTypeNames.Text.Plain);
    }

    /// <summary>Counts what each job and chart has answered, and how large the pictures are.</summary>
    public static async Task Count(HttpContext context, RequestDelegate next)
    {
        await next(context);
        if (context.GetEndpoint() is { } endpoint && endpoint.Metadata.GetMetadata<EndpointDescription.Body>() is { }
            && endpoint.Metadata.GetMetadata<DisableRateLimitingAttribute>() is null
            && endpoint.Metadata.GetMetadata<IEndpointNameMetadata>() is { EndpointName: var name })
        {
            Meters.Job(name, context.Response.StatusCode);
        }

        if (context.Response is { StatusCode: StatusCodes.Status200OK, ContentLength: { } bytes, ContentType: { } type }
            && (type.StartsWith("image/", StringComparison.Ordinal) || type == "application/pdf"))
        {
            Meters.Picture(type, bytes);
        }
    }

    /// <summary>What the exporter writes, as the answer of an endpoint that stands in the description.</summary>
    private sealed record Scraped(RequestDelegate Scrape) : IResult
    {
        public Task ExecuteAsync(HttpContext httpContext) => Scrape(httpContext);
    }
}
