using Drypeak.Service.Hosting;

namespace Drypeak.Service;

/// <summary>A job that takes JSON and gives JSON: negotiate, read, check, compute, answer.</summary>
internal static class JsonJob
{
    private const string Json = "application/json";

    /// <summary>Maps a job whose rules need nothing of the service.</summary>
    public static RouteHandlerBuilder MapJob<TRequest, TAnswer>(
        this IEndpointRouteBuilder app, string path, Func<TRequest, IReadOnlyList<Fault>> check, Func<TRequest, TAnswer> compute, string example)
        where TRequest : class => app.MapJob(path, _ => check, compute, example);

    /// <summary>Maps a job.</summary>
    /// <param name="app">Where.</param>
    /// <param name="path">Its address.</param>
    /// <param name="rules">Makes what finds every broken rule of a request. It is called at the first request: rules are slow to make, and the start waits for none.</param>
    /// <param name="compute">The answer to a request without broken rules.</param>
    /// <param name="example">A whole request that is accepted.</param>
    public static RouteHandlerBuilder MapJob<TRequest, TAnswer>(
        this IEndpointRouteBuilder app, string path, Func<IServiceProvider, Func<TRequest, IReadOnlyList<Fault>>> rules, Func<TRequest, TAnswer> compute, string example)
        where TRequest : class
    {
        var check = new Lazy<Func<TRequest, IReadOnlyList<Fault>>>(() => rules(app.ServiceProvider));
        return app.MapPost(path, AnswerAsync).Takes<TRequest>(Json, example).Gives<TAnswer>(Json).Refuses(400, 406, 413, 415, 422);

        async Task<IResult> AnswerAsync(HttpContext context, Limits limits)
        {
            if (Negotiation.Choose(context.Request, Json) is null)
            {
                return Problems.NotAcceptable([Json]);
            }

            var request = await RequestReader.ReadAsync(context, ServiceJson.Of<TRequest>(), check.Value, limits.BodyBytes);
            return request.Succeeded ? Results.Json(compute(request.Value), ServiceJson.Of<TAnswer>()) : request.Problem;
        }
    }
}
