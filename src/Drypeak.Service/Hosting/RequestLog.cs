using System.Diagnostics;
using Serilog;
using Serilog.Events;
using Serilog.Formatting.Compact;

namespace Drypeak.Service.Hosting;

/// <summary>The log: compact JSON on standard output, one line a request, nothing of what was sent or asked.</summary>
internal static class RequestLog
{
    private const int LongestPath = 200;

    private const string Template = "{RequestMethod:l} {RequestPath:l} answered {StatusCode} in {Elapsed:0.000} ms";

    public static void Configure(LoggerConfiguration log) => log
        .MinimumLevel.Information()
        .MinimumLevel.Override("Microsoft", LogEventLevel.Warning)
        .MinimumLevel.Override("Microsoft.Hosting.Lifetime", LogEventLevel.Information)
        // Keys are kept in memory and protect nothing: that they are not encrypted on disk needs no warning.
        .MinimumLevel.Override("Microsoft.AspNetCore.DataProtection", LogEventLevel.Error)
        .WriteTo.Console(new RenderedCompactJsonFormatter());

    public static void Use(IApplicationBuilder app) => app.UseSerilogRequestLogging(options =>
    {
        options.MessageTemplate = Template;
        options.GetMessageTemplateProperties = (http, path, elapsed, status) =>
        [
            new LogEventProperty("RequestMethod", new ScalarValue(Received.Shorten(http.Request.Method))),
            new LogEventProperty("RequestPath", new ScalarValue(path.Length > LongestPath ? path[..LongestPath] : path)),
            new LogEventProperty("StatusCode", new ScalarValue(status)),
            new LogEventProperty("Elapsed", new ScalarValue(elapsed)),
        ];
        options.GetLevel = (_, _, exception) => exception is null ? LogEventLevel.Information : LogEventLevel.Error;
        options.EnrichDiagnosticContext = (context, http) =>
        {
            // Lengths as declared: null where a body comes or goes in chunks.
            context.Set("RequestBytes", http.Request.ContentLength);
            context.Set("ResponseBytes", http.Response.ContentLength);
            context.Set("TraceIdentifier", TraceIdentifier(http));
            if (http.User.Identity is { IsAuthenticated: true, Name: { } name })
            {
                context.Set("Caller", name);
            }
        };
    });

    /// <summary>What finds a request in the log: the trace of the caller (W3C Trace Context) where it sent one, else one of our own.</summary>
    public static string TraceIdentifier(HttpContext context) =>
        Activity.Current?.TraceId.ToHexString() ?? context.TraceIdentifier;
}
