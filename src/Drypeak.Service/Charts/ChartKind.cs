using System.Text.Json.Serialization.Metadata;
using Drypeak.Figures;
using Drypeak.Service.Contracts;
using Drypeak.Service.Hosting;

namespace Drypeak.Service.Charts;

/// <summary>A kind of chart: how it is written into an address, what it must keep, and how it is drawn.</summary>
/// <typeparam name="TChart">What its figure shows.</typeparam>
/// <param name="Job">The name that its addresses bear: <c>/v1/charts/{job}.svg</c>.</param>
/// <param name="Shows">What the picture shows, for the API description: <c>The chart of a laboratory test</c>.</param>
/// <param name="Example">A chart for the API description.</param>
internal sealed record ChartKind<TChart>(string Job, string Shows, TChart Example)
    where TChart : class
{
    /// <summary>How the chart is written.</summary>
    public JsonTypeInfo<TChart> Json { get; } = ServiceJson.Of<TChart>();

    /// <summary>What may be asked of the picture in an address.</summary>
    public required IReadOnlyList<ChartParameter> Parameters { get; init; }

    /// <summary>Every broken rule of a chart that stands in an address, at the places of the chart.</summary>
    public required Func<TChart, IReadOnlyList<Fault>> Check { get; init; }

    /// <summary>Why a chart cannot be drawn so, or null.</summary>
    public required Func<TChart, FigureOptions, string?> Refusal { get; init; }

    /// <summary>The figure of a chart that can be drawn.</summary>
    public required Func<TChart, FigureOptions, Figure> Draw { get; init; }

    /// <summary>The picture in a format.</summary>
    public byte[] Picture(TChart chart, ChartFormat format, ChartOptions options) => format.Write(Draw(chart, options.Figure), options.Scale);

    /// <summary>Every broken rule of a chart from an address, at the place of the address; what only the figure knows is asked last.</summary>
    public IReadOnlyList<Fault> CheckAddress(TChart chart)
    {
        var faults = Check(chart);
        return faults.Count > 0 ? [.. faults.Select(fault => fault with { Place = "/d", Message = $"At {fault.Place} of the chart: {fault.Message}" })]
            : Refusal(chart, new FigureOptions()) is { } refusal ? [new Fault("/d", "not-drawable", refusal)]
            : [];
    }

    /// <summary>The addresses of a chart's pictures; none where the service would not answer them.</summary>
    /// <param name="chart">The chart.</param>
    /// <param name="limits">The longest address.</param>
    /// <param name="whyNot">Why there are none, or null.</param>
    public LinksContract LinksOf(TChart chart, Limits limits, out Finding? whyNot)
    {
        var data = ChartAddress.Encode(chart, Json);
        whyNot = CheckAddress(chart) is [var fault, ..] ? ChartAddress.NoAddress.At("", $"The chart cannot be drawn, so no links are given. {fault.Message}")
            : data.Length + ChartAddress.RoomForTheRest > limits.AddressBytes ? ChartAddress.NoAddress.At("", "The chart holds more than an address can carry, so no links are given. Post the request with Accept: image/svg+xml, image/png or application/pdf to get the picture.")
            : null;
        var given = whyNot is null;
        string? Link(string suffix) => given ? $"/v1/charts/{Job}.{suffix}?{ChartAddress.Data}={data}" : null;
        return new LinksContract { Svg = Link("svg"), Png = Link("png"), Pdf = Link("pdf") };
    }
}

/// <summary>The kinds of charts by what their figures show.</summary>
internal static class ChartKind
{
    /// <summary>A chart of dry density against water content.</summary>
    public static ChartKind<CompactionChart> Compaction(string job, string shows, Limits limits)
    {
        var rules = new Lazy<CompactionChartRules>(() => new(limits));
        return new ChartKind<CompactionChart>(job, shows, ExampleChart.Compaction)
        {
            Parameters = ChartParameters.OfCompaction,
            Check = chart => rules.Value.Validate(chart).ToFaults(),
            Refusal = CompactionFigure.Refusal,
            Draw = CompactionFigure.Draw,
        };
    }

    /// <summary>A chart of any two quantities.</summary>
    public static ChartKind<PlotChart> Plot(string job, string shows, Limits limits)
    {
        var rules = new Lazy<PlotChartRules>(() => new(limits));
        return new ChartKind<PlotChart>(job, shows, ExampleChart.Plot)
        {
            Parameters = ChartParameters.OfAny,
            Check = chart => rules.Value.Validate(chart).ToFaults(),
            Refusal = PlotFigure.Refusal,
            Draw = PlotFigure.Draw,
        };
    }
}
