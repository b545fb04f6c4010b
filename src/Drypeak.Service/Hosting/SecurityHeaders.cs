namespace Drypeak.Service.Hosting;

/// <summary>Header fields that keep a browser from doing with an answer what it is not meant for. They stand on every answer.</summary>
internal static class SecurityHeaders
{
    private const string ContentSecurityPolicy =
        "default-src 'none'; script-src 'self'; style-src 'self'; img-src 'self'; font-src 'self'; connect-src 'self'; "
        + "base-uri 'none'; form-action 'self'; frame-ancestors 'none'";

    /// <summary>The API reference's style sheet carries its icons as data addresses; nothing else here does.</summary>
    private static readonly string ReferencePolicy =
        ContentSecurityPolicy.Replace("img-src 'self'", "img-src 'self' data:", StringComparison.Ordinal);

    public static Task Add(HttpContext context, RequestDelegate next)
    {
        // At the start of the answer, since whoever answers an exception clears what was set before.
        context.Response.OnStarting(static state =>
        {
            var (request, headers) = (((HttpContext)state).Request, ((HttpContext)state).Response.Headers);
            headers.XContentTypeOptions = "nosniff";
            headers.ContentSecurityPolicy = request.Path.StartsWithSegments(ApiReference.Address) ? ReferencePolicy : ContentSecurityPolicy;
            headers["Referrer-Policy"] = "no-referrer";
            return Task.CompletedTask;
        }, context);
        return next(context);
    }
}
