namespace Drypeak.Service.Hosting;

/// <summary>What an endpoint says of itself in the API description, where its signature does not: it reads its body itself.</summary>
public static class EndpointDescription
{
    private const string LinesOfJson = "application/x-ndjson";

    /// <summary>
    /// The methods of an address to read from: GET and, as RFC 9110, section 9.1, asks, HEAD. To be given to <c>MapMethods</c>
    /// where the handler is written: the compiler then generates its call, and the start need not.
    /// </summary>
    public static IReadOnlyList<string> Reading { get; } = [HttpMethods.Get, HttpMethods.Head];

    /// <summary>The request's body, with a whole example that the endpoint accepts. Lines of JSON are a stream: see <see cref="StreamedBody"/>.</summary>
    public static RouteHandlerBuilder Takes<T>(this RouteHandlerBuilder endpoint, string mediaType, string example)
    {
        endpoint.WithMetadata(new Body(0, mediaType, typeof(T), example));
        return mediaType == LinesOfJson ? endpoint.WithMetadata(new StreamedBody()).RequireAuthorization(Scopes.Batch) : endpoint;
    }

    /// <summary>A media type in which the endpoint answers with 200; JSON with an example. To be called once for each media type.</summary>
    public static RouteHandlerBuilder Gives<T>(this RouteHandlerBuilder endpoint, string mediaType, string? example = null) =>
        endpoint.WithMetadata(new Body(StatusCodes.Status200OK, mediaType, typeof(T), example));

    /// <summary>Statuses by which the endpoint refuses; each comes as a problem.</summary>
    public static RouteHandlerBuilder Refuses(this RouteHandlerBuilder endpoint, params int[] statuses) =>
        endpoint.WithMetadata([.. statuses.Select(status => new Body(status, Problem.MediaType, typeof(Problem), null))]);

    /// <summary>A parameter of the query that the endpoint reads itself.</summary>
    public static RouteHandlerBuilder TakesQuery<T>(this RouteHandlerBuilder endpoint, string name, string description, string example, bool required = false) =>
        endpoint.TakesQuery<T>(name, description, () => example, required);

    /// <summary>The same, with an example that is made only when somebody wants to see it.</summary>
    public static RouteHandlerBuilder TakesQuery<T>(this RouteHandlerBuilder endpoint, string name, string description, Func<string> example, bool required = false) =>
        endpoint.WithMetadata(new Query(name, typeof(T), description, example, required));

    internal sealed record Body(int Status, string MediaType, Type Type, string? Example);

    internal sealed record Query(string Name, Type Type, string Description, Func<string> Example, bool Required);
}
