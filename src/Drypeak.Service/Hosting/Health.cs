using Microsoft.AspNetCore.Http.HttpResults;

namespace Drypeak.Service.Hosting;

/// <summary>Whether the process runs, and whether it should be given requests.</summary>
public static class Health
{
    public static void Map(IEndpointRouteBuilder endpoints)
    {
        endpoints.MapMethods("/health/live", EndpointDescription.Reading, Live).WithTags("Health").WithName("live")
            .Gives<HealthAnswer>("application/json", """{ "status": "live" }""");
        endpoints.MapMethods("/health/ready", EndpointDescription.Reading, Ready).WithTags("Health").WithName("ready")
            .Gives<HealthAnswer>("application/json", """{ "status": "ready" }""").Refuses(503);
    }

    /// <summary>Says that the process runs.</summary>
    private static Ok<HealthAnswer> Live() => TypedResults.Ok(new HealthAnswer("live"));

    /// <summary>Says whether new requests are welcome: 503 from the moment the service is told to stop.</summary>
    private static IResult Ready(IHostApplicationLifetime lifetime) => lifetime.ApplicationStopping.IsCancellationRequested
        ? Problems.Unavailable("The service is stopping. Ask another one, or ask again.", retryAfterSeconds: 1)
        : TypedResults.Ok(new HealthAnswer("ready"));
}

/// <summary>The state of the process.</summary>
/// <param name="Status" example="ready">live or ready.</param>
public sealed record HealthAnswer(string Status);
