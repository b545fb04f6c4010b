using Drypeak.Service.Charts;
using Drypeak.Service.Hosting;

namespace Drypeak.Service;

/// <summary>An answer with the chart that it can be looked at as.</summary>
/// <param name="Answer">As JSON.</param>
/// <param name="Chart">What its picture shows; null where it leaves nothing to draw.</param>
internal readonly record struct Charted<TAnswer, TChart>(TAnswer Answer, TChart? Chart)
    where TChart : class;

/// <summary>An answer as another text than JSON, such as a table.</summary>
/// <param name="MediaType">As in Accept.</param>
/// <param name="Parameters">Of the media type, each after a semicolon.</param>
/// <param name="Write">The text.</param>
internal sealed record TextForm<TAnswer>(string MediaType, string Parameters, Func<TAnswer, string> Write);

/// <summary>A job that takes JSON and gives JSON, or its picture: negotiate, read, check, compute, answer.</summary>
internal static class JsonJob
{
    private const string Json = "application/json";

    private static readonly string[] JsonOrPicture = [Json, .. ChartFormat.All.Select(format => format.MediaType)];

    /// <summary>Maps a job that gives JSON.</summary>
    /// <param name="app">Where.</param>
    /// <param name="path">Its address.</param>
    /// <param name="check">Every broken rule of a request.</param>
    /// <param name="compute">The answer to a request without broken rules.</param>
    /// <param name="example">A whole request that is accepted.</param>
    public static RouteHandlerBuilder MapJob<TRequest, TAnswer>(
        this IEndpointRouteBuilder app, string path, Func<TRequest, IReadOnlyList<Fault>> check, Func<TRequest, TAnswer> compute, string example)
        where TRequest : class
    {
        return app.MapPost(path, AnswerAsync).Takes<TRequest>(Json, example).Gives<TAnswer>(Json).Refuses(400, 406, 413, 415, 422);

        async Task<IResult> AnswerAsync(HttpContext context, Limits limits)
        {
            if (Negotiation.Choose(context.Request, Json) is null)
            {
                return Problems.NotAcceptable([Json]);
            }

            var request = await RequestReader.ReadAsync(context, ServiceJson.Of<TRequest>(), check, limits.BodyBytes);
            return request.Succeeded ? Results.Json(compute(request.Value), ServiceJson.Of<TAnswer>()) : request.Problem;
        }
    }

    /// <summary>
    /// Maps a job that gives JSON, or by Accept its picture, and the picture's addresses. The picture has the bytes of the answer's links;
    /// its options stand in the query.
    /// </summary>
    /// <param name="app">Where.</param>
    /// <param name="path">Its address.</param>
    /// <param name="check">Every broken rule of a request.</param>
    /// <param name="compute">The answer to a request without broken rules, and its chart.</param>
    /// <param name="example">A whole request that is accepted.</param>
    /// <param name="kind">The kind of its chart.</param>
    /// <param name="text">A text that may be asked for as well; null: none.</param>
    /// <param name="bodyBytes">The largest body, where it is not the usual one.</param>
    public static RouteHandlerBuilder MapJob<TRequest, TAnswer, TChart>(
        this IEndpointRouteBuilder app, string path, Func<TRequest, IReadOnlyList<Fault>> check, Func<TRequest, Charted<TAnswer, TChart>> compute, string example, ChartKind<TChart> kind, TextForm<TAnswer>? text = null, int? bodyBytes = null)
        where TRequest : class
        where TChart : class
    {
        string[] offered = text is null ? JsonOrPicture : [.. JsonOrPicture, text.MediaType];
        app.MapChart(kind);
        var job = app.MapPost(path, AnswerAsync).Takes<TRequest>(Json, example).Gives<TAnswer>(Json).Refuses(400, 406, 413, 415, 422);
        ChartOptions.Describe(job, kind.Parameters, ChartFormat.All);
        foreach (var format in ChartFormat.All)
        {
            job.Gives<byte[]>(format.MediaType);
        }

        return text is null ? job : job.Gives<string>(text.MediaType);

        async Task<IResult> AnswerAsync(HttpContext context, Limits limits)
        {
            if (Negotiation.Choose(context.Request, offered) is not { } mediaType)
            {
                return Problems.NotAcceptable(offered);
            }

            var faults = new List<Fault>();
            var format = ChartFormat.All.FirstOrDefault(format => format.MediaType == mediaType);
            var options = format is null ? WithoutParameters(context.Request.Query, faults) : ChartOptions.Read(context.Request.Query, kind.Parameters, format, limits, [], faults);
            if (faults.Count > 0)
            {
                return Problems.InvalidQuery(faults);
            }

            var request = await RequestReader.ReadAsync(context, ServiceJson.Of<TRequest>(), check, bodyBytes ?? limits.BodyBytes);
            if (!request.Succeeded)
            {
                return request.Problem;
            }

            var (answer, chart) = compute(request.Value);
            context.Response.Headers.Vary = "Accept";
            return format is { } && options is { } ? Picture(chart, format, options)
                : mediaType == text?.MediaType ? Results.Text(text.Write(answer), text.MediaType + text.Parameters)
                : Results.Json(answer, ServiceJson.Of<TAnswer>());
        }

        IResult Picture(TChart? chart, ChartFormat format, ChartOptions options) =>
            (chart is null ? "The answer leaves nothing to draw." : kind.Refusal(chart, options.Figure)) is { } refusal
                ? Problems.InvalidValues([new Fault("", "not-drawable", refusal + " Check the values and their units; with Accept: application/json they are answered.")])
                : Results.Bytes(kind.Picture(chart!, format, options), format.MediaType);
    }

    private static ChartOptions? WithoutParameters(IQueryCollection query, List<Fault> faults)
    {
        faults.AddRange(query.Keys.Select(name => new Fault("/" + ChartOptions.Shortened(name), "unknown-parameter", "A JSON answer takes no parameters in the address. Leave it out.")));
        return null;
    }
}
