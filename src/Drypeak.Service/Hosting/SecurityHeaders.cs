using System.Net;

namespace Drypeak.Service.Hosting;

/// <summary>Header fields that keep a browser from doing with an answer what it is not meant for. They stand on every answer.</summary>
internal static class SecurityHeaders
{
    private const string ContentSecurityPolicy =
        "default-src 'none'; script-src 'self'; style-src 'self'; img-src 'self'; font-src 'self'; connect-src 'self'; "
        + "base-uri 'none'; form-action 'self'; frame-ancestors 'none'";

    /// <summary>A chart is made to stand in other programs' pages. It loads nothing and runs nothing.</summary>
    private const string ChartPolicy = "default-src 'none'; base-uri 'none'; form-action 'none'; frame-ancestors *";

    private const string ChartsAddress = "/v1/charts";

    /// <summary>The pages use no power of the browser's that asks for permission.</summary>
    private const string PermissionsPolicy = "camera=(), display-capture=(), geolocation=(), microphone=(), payment=(), usb=()";

    private const string OneYear = "max-age=31536000";

    /// <summary>The API reference's style sheet carries its icons as data addresses; nothing else here does.</summary>
    private static readonly string ReferencePolicy =
        ContentSecurityPolicy.Replace("img-src 'self'", "img-src 'self' data:", StringComparison.Ordinal);

    public static Task Add(HttpContext context, RequestDelegate next)
    {
        // At the start of the answer, since whoever answers an exception clears what was set before.
        context.Response.OnStarting(static state =>
        {
            var context = (HttpContext)state;
            var (request, headers) = (context.Request, context.Response.Headers);
            var isChart = request.Path.StartsWithSegments(ChartsAddress);
            headers.XContentTypeOptions = "nosniff";
            headers.ContentSecurityPolicy = isChart ? ChartPolicy
                : request.Path.StartsWithSegments(ApiReference.Address) ? ReferencePolicy
                : ContentSecurityPolicy;
            headers["Referrer-Policy"] = "no-referrer";
            headers["Permissions-Policy"] = PermissionsPolicy;
            headers["Cross-Origin-Resource-Policy"] = isChart ? "cross-origin" : "same-origin";
            headers["Cross-Origin-Opener-Policy"] = "same-origin";
            if (request.IsHttps && !IsThisMachine(request.Host.Host))
            {
                headers.StrictTransportSecurity = OneYear;
            }

            return Task.CompletedTask;
        }, context);
        return next(context);
    }

    /// <summary>A browser would keep to HTTPS for all that runs on the developer's machine, whatever the port.</summary>
    private static bool IsThisMachine(string host) => host == "localhost" || (IPAddress.TryParse(host, out var address) && IPAddress.IsLoopback(address));
}
