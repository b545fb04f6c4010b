using System.Diagnostics;
using System.Diagnostics.Metrics;

namespace Drypeak.Service.Hosting;

/// <summary>
/// What the service counts beyond what the framework does. Each label has a handful of values that stand in the program: names of models,
/// codes of findings. Nothing that was sent becomes one.
/// </summary>
internal static class Meters
{
    public const string Name = "Drypeak";

    /// <summary>Spans of the work inside a request.</summary>
    public static readonly ActivitySource Activities = new(Name);

    private static readonly Meter Meter = new(Name, ServiceVersion.Text);
    private static readonly Counter<long> Curves = Meter.CreateCounter<long>("drypeak.curves", "{curve}", "Curves fitted, by the model chosen and whether it has an optimum.");
    private static readonly Counter<long> Findings = Meter.CreateCounter<long>("drypeak.findings", "{finding}", "Findings given, by code and severity.");
    private static readonly Counter<long> Jobs = Meter.CreateCounter<long>("drypeak.jobs", "{request}", "Requests by job and outcome: answered, refused, failed.");
    private static readonly Histogram<long> Pictures = Meter.CreateHistogram("drypeak.picture.size", "By", "Bytes of pictures and reports given, by media type.",
        advice: new InstrumentAdvice<long> { HistogramBucketBoundaries = [2_000, 5_000, 10_000, 20_000, 50_000, 100_000, 200_000, 500_000, 1_000_000, 5_000_000] });
    private static readonly UpDownCounter<long> Queue = Meter.CreateUpDownCounter<long>("drypeak.requests.waiting", "{request}", "Requests that wait for their turn.");
    private static readonly Counter<long> Refusals = Meter.CreateCounter<long>("drypeak.requests.turned_away", "{request}", "Requests turned away, by reason: busy, too-many, too-slow.");

    private static readonly AsyncLocal<bool> Rehearsing = new();

    /// <summary>From here on nothing that this flow does is counted: it is a rehearsal.</summary>
    public static void Rehearse() => Rehearsing.Value = true;

    public static void Curve(string model, bool hasOptimum) => Count(Curves, new("model", model), new("outcome", hasOptimum ? "optimum" : "no-optimum"));

    public static void Finding(string code, string severity) => Count(Findings, new("code", code), new("severity", severity));

    public static void Job(string job, int status) =>
        Count(Jobs, new("operation", job), new("outcome", status switch { < 400 => "answered", < 500 => "refused", _ => "failed" }));

    public static void Picture(string mediaType, long bytes) => Pictures.Record(bytes, new KeyValuePair<string, object?>("type", mediaType));

    public static void Refused(string reason) => Count(Refusals, new KeyValuePair<string, object?>("reason", reason));

    /// <summary>Counts a request as waiting until it is disposed of.</summary>
    public static IDisposable Waiting()
    {
        Queue.Add(1);
        return new Left();
    }

    private static void Count(Counter<long> counter, params ReadOnlySpan<KeyValuePair<string, object?>> labels)
    {
        if (!Rehearsing.Value)
        {
            counter.Add(1, labels);
        }
    }

    private sealed class Left : IDisposable
    {
        public void Dispose() => Queue.Add(-1);
    }
}
