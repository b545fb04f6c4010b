using Drypeak.Service.Hosting;

namespace Drypeak.Service.Charts;

/// <summary>Pictures by address: <c>GET /v1/charts/{job}.{svg|png|pdf}?d=…</c>. They are drawn from the address; nothing is fitted.</summary>
internal static class ChartEndpoints
{
    /// <summary>Maps the addresses of a kind of chart, one a format.</summary>
    public static void MapChart<TChart>(this IEndpointRouteBuilder app, ChartKind<TChart> kind)
        where TChart : class
    {
        foreach (var format in ChartFormat.All)
        {
            var chart = app.MapMethods($"/v1/charts/{kind.Job}.{format.Suffix}", EndpointDescription.Reading, (HttpContext context, Limits limits) => Draw(context, limits, kind, format))
                .WithTags("Charts")
                .WithName($"{kind.Job}-chart-{format.Suffix}")
                .WithSummary($"{kind.Shows} as {format.Suffix.ToUpperInvariant()}")
                .WithDescription("The address comes from an answer's links and holds all that the picture shows. The same address gives the same bytes, with a strong ETag.")
                .TakesQuery<string>(ChartAddress.Data, "The chart, as an answer's links give it.", () => ChartAddress.Encode(kind.Example, kind.Json), required: true)
                .Gives<byte[]>(format.MediaType)
                .Refuses(400);
            ChartOptions.Describe(chart, kind.Parameters, [format]);
        }
    }

    private static IResult Draw<TChart>(HttpContext context, Limits limits, ChartKind<TChart> kind, ChartFormat format)
        where TChart : class
    {
        var query = context.Request.Query;
        var faults = new List<Fault>();
        var options = ChartOptions.Read(query, kind.Parameters, format, limits, [ChartAddress.Data], faults);
        if (query[ChartAddress.Data] is not [{ Length: > 0 } data])
        {
            if (query[ChartAddress.Data].Count < 2)
            {
                faults.Add(new Fault("/" + ChartAddress.Data, "missing-parameter", "The address does not say what to draw. Take it from the links of an answer."));
            }

            return Problems.InvalidQuery(faults);
        }

        faults.AddRange(ChartAddress.Decode(data, kind, limits.UnpackedAddressBytes, out var chart));
        if (faults.Count == 0 && kind.Refusal(chart!, options.Figure) is { } refusal)
        {
            faults.Add(new Fault("", "not-drawable", refusal));
        }

        return faults.Count > 0
            ? Problems.InvalidQuery(faults)
            : new CachedBytes(kind.Picture(chart!, format, options), format.MediaType);
    }
}
