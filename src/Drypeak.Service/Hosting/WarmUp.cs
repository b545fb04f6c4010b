using System.Text;

namespace Drypeak.Service.Hosting;

/// <summary>
/// Makes the program warm once it listens: each operation that has a whole example answers it, in each media type that it gives. Thus what
/// is compiled and loaded at first use (rules, curves, fonts, writers) is there before the first caller, and the start itself waits for nothing.
/// </summary>
/// <remarks>The endpoints are called directly: nothing is logged, counted or limited, no key is needed, and nothing touches the network.</remarks>
internal sealed partial class WarmUp(
    EndpointDataSource endpoints, IServiceScopeFactory scopes, Readiness readiness, IHostApplicationLifetime lifetime, ILogger<WarmUp> log) : IHostedService
{
    /// <summary>Whoever asks at once is answered first: compiling for both at the same time would make both slow.</summary>
    private static readonly TimeSpan HeadStart = TimeSpan.FromMilliseconds(100);

    public Task StartAsync(CancellationToken cancellationToken)
    {
        lifetime.ApplicationStarted.Register(() => _ = Task.Run(RehearseAsync, CancellationToken.None));
        return Task.CompletedTask;
    }

    public Task StopAsync(CancellationToken cancellationToken) => Task.CompletedTask;

    private async Task RehearseAsync()
    {
        Meters.Rehearse();
        await Task.Delay(HeadStart);
        foreach (var endpoint in endpoints.Endpoints.OfType<RouteEndpoint>().Where(HasExample))
        {
            foreach (var answer in endpoint.Metadata.OfType<EndpointDescription.Body>().Where(body => body.Status == StatusCodes.Status200OK))
            {
                await AskAsync(endpoint, answer.MediaType);
            }
        }

        readiness.IsWarm = true;
    }

    private static bool HasExample(RouteEndpoint endpoint) => endpoint.RoutePattern.Parameters.Count == 0
        && (ExampleBody(endpoint) is { Example: { } } || endpoint.Metadata.OfType<EndpointDescription.Query>().Any(query => query.Required));

    private static EndpointDescription.Body? ExampleBody(RouteEndpoint endpoint) =>
        endpoint.Metadata.OfType<EndpointDescription.Body>().FirstOrDefault(body => body.Status == 0);

    private async Task AskAsync(RouteEndpoint endpoint, string accept)
    {
        if (readiness.IsStopping)
        {
            return;
        }

        try
        {
            await using var scope = scopes.CreateAsyncScope();
            await endpoint.RequestDelegate!(RequestOf(endpoint, accept, scope.ServiceProvider));
        }
        catch (Exception failure) when (!readiness.IsStopping)
        {
            // A caller will meet the same failure and be told of it; the other endpoints must not stay cold for it.
            LogFailure(log, endpoint.RoutePattern.RawText, accept, failure);
        }
        catch (ObjectDisposedException)
        {
            // The service is stopping, and has taken away what the rehearsal needs.
        }
    }

    private static DefaultHttpContext RequestOf(RouteEndpoint endpoint, string accept, IServiceProvider services)
    {
        var context = new DefaultHttpContext { RequestServices = services };
        context.SetEndpoint(endpoint);
        var request = context.Request;
        request.Path = endpoint.RoutePattern.RawText;
        request.Headers.Accept = accept;
        request.QueryString = QueryString.Create(endpoint.Metadata.OfType<EndpointDescription.Query>().Where(query => query.Required)
            .Select(query => KeyValuePair.Create(query.Name, (string?)query.Example())));
        request.Method = HttpMethods.Get;
        if (ExampleBody(endpoint) is { Example: { } example, MediaType: var mediaType })
        {
            var bytes = Encoding.UTF8.GetBytes(example);
            request.Method = HttpMethods.Post;
            request.ContentType = mediaType;
            request.ContentLength = bytes.Length;
            request.Body = new MemoryStream(bytes);
        }

        return context;
    }

    [LoggerMessage(LogLevel.Error, "The example of {Address} for {Accept} failed while the program warmed up.")]
    private static partial void LogFailure(ILogger log, string? address, string accept, Exception failure);
}
