using Drypeak.Service.Hosting;

namespace Drypeak.Service.Charts;

/// <summary>Pictures by address: <c>GET /v1/charts/{job}.{svg|png|pdf}?d=…</c>. They are drawn from the address; nothing is fitted.</summary>
internal static class ChartEndpoints
{
    private const string Data = "d";

    public static void MapCharts(this IEndpointRouteBuilder app)
    {
        var charts = app.MapGroup("/v1/charts").WithTags("Charts");
        foreach (var format in ChartFormat.All)
        {
            var chart = charts.MapMethods($"/{ChartAddress.MoistureDensity}.{format.Suffix}", EndpointDescription.Reading, (HttpContext context, ChartRules rules, Limits limits) => Draw(context, rules, limits, format))
                .WithName($"moisture-density-chart-{format.Suffix}")
                .WithSummary($"The chart of a laboratory test as {format.Suffix.ToUpperInvariant()}")
                .WithDescription("The address comes from an answer's links and holds all that the picture shows. The same address gives the same bytes, with a strong ETag.")
                .TakesQuery<string>(Data, "The chart, as an answer's links give it.", () => ExampleChart.Address, required: true)
                .Gives<byte[]>(format.MediaType)
                .Refuses(400);
            ChartOptions.Describe(chart, format);
        }
    }

    private static IResult Draw(HttpContext context, ChartRules rules, Limits limits, ChartFormat format)
    {
        var query = context.Request.Query;
        var faults = new List<Fault>();
        var options = ChartOptions.Read(query, format, [Data], faults);
        if (query[Data] is not [{ Length: > 0 } data])
        {
            if (query[Data].Count < 2)
            {
                faults.Add(new Fault("/" + Data, "missing-parameter", "The address does not say what to draw. Take it from the links of an answer."));
            }

            return Problems.InvalidQuery(faults);
        }

        faults.AddRange(ChartAddress.Decode(data, rules, limits.UnpackedAddressBytes, out var chart));
        return faults.Count > 0
            ? Problems.InvalidQuery(faults)
            : new CachedBytes(format.Draw(chart!, options), format.MediaType);
    }
}
