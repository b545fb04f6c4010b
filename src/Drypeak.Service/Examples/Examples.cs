using System.Text;
using System.Text.Json;
using Drypeak.Service.Charts;
using Drypeak.Service.Hosting;
using Drypeak.Service.Laboratory;

namespace Drypeak.Service;

/// <summary>Whole examples from Ternmarsh, an invented flood embankment: they stand in the API description and behind the pages' demo.</summary>
internal static class Examples
{
    /// <summary>A laboratory test of five specimens, as JSON.</summary>
    public static string MoistureDensityRequest { get; } = Text("moisture-density.json");

    /// <summary>The same soil tested by two laboratories, as JSON.</summary>
    public static string ComparisonRequest { get; } = Text("comparison.json");

    /// <summary>Lines for a chart, as JSON.</summary>
    public static string SaturationLinesRequest { get; } = Text("saturation-lines.json");

    /// <summary>The fines of a stony fill corrected to all of it, as JSON.</summary>
    public static string OversizeCorrectionRequest { get; } = Text("oversize-correction.json");

    /// <summary>One soil at standard and modified effort, as JSON.</summary>
    public static string EffortSeriesRequest { get; } = Text("effort-series.json");

    private static string Text(string name)
    {
        using var stream = typeof(Examples).Assembly.GetManifestResourceStream($"Drypeak.Service.Examples.{name}")
            ?? throw new InvalidOperationException($"The example {name} is not in the program.");
        using var reader = new StreamReader(stream, Encoding.UTF8);
        return reader.ReadToEnd();
    }
}

/// <summary>The address of the example's chart.</summary>
internal static class ExampleChart
{
    /// <summary>The query's <c>d</c>.</summary>
    public static string Address { get; } = ChartAddress.Encode(
        new MoistureDensityJob(new Limits()).Compute(
            JsonSerializer.Deserialize(Examples.MoistureDensityRequest, ServiceJson.Of<MoistureDensityRequest>())!).Chart);
}
