using System.Diagnostics;
using OpenTelemetry;

namespace Drypeak.Service.Hosting;

/// <summary>Takes the query out of a span before it is sent: a chart's address holds the whole test.</summary>
internal sealed class WithoutQuery : BaseProcessor<Activity>
{
    private static readonly string[] Holding = ["url.query", "url.full", "http.url", "http.target"];

    public override void OnEnd(Activity data)
    {
        foreach (var name in Holding)
        {
            data.SetTag(name, null);
        }
    }
}
