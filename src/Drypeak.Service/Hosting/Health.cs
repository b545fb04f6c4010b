using Microsoft.AspNetCore.Http.HttpResults;

namespace Drypeak.Service.Hosting;

/// <summary>Whether the process runs, and whether it should be given requests. Both answer without a key, and however busy the service is.</summary>
public static class Health
{
    public static void Map(IEndpointRouteBuilder endpoints)
    {
        endpoints.MapMethods("/health/live", EndpointDescription.Reading, Live).WithTags("Health").WithName("live").AllowAnonymous().DisableRateLimiting()
            .Gives<HealthAnswer>("application/json", """{ "status": "live" }""");
        endpoints.MapMethods("/health/ready", EndpointDescription.Reading, Ready).WithTags("Health").WithName("ready").AllowAnonymous().DisableRateLimiting()
            .Gives<HealthAnswer>("application/json", """{ "status": "ready" }""").Refuses(503);
    }

    /// <summary>Says that the process runs.</summary>
    private static Ok<HealthAnswer> Live() => TypedResults.Ok(new HealthAnswer("live"));

    /// <summary>Says whether new requests are welcome: 503 until the program is warm, and from the moment it is told to stop.</summary>
    private static IResult Ready(HttpContext context)
    {
        var readiness = context.RequestServices.GetRequiredService<Readiness>();
        return readiness.IsStopping ? Problems.Unavailable("The service is stopping. Ask another one, or ask again.", retryAfterSeconds: 1)
            : !readiness.IsWarm ? Problems.Unavailable("The service is warming up. It answers already, but more slowly; ask again.", retryAfterSeconds: 1)
            : TypedResults.Ok(new HealthAnswer("ready"));
    }
}

/// <summary>The state of the process.</summary>
/// <param name="Status" example="ready">live or ready.</param>
public sealed record HealthAnswer(string Status);
