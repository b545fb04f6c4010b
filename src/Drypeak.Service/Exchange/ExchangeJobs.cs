using Drypeak.Service.Exchange.Batch;
using Drypeak.Service.Field;
using Drypeak.Service.Hosting;
using Drypeak.Service.Laboratory;

namespace Drypeak.Service.Exchange;

/// <summary>The jobs that files and batches bring many of: each the very job of its own address.</summary>
internal sealed class ExchangeJobs(MoistureDensityJob laboratory, FieldDensityJob inPlace)
{
    public const string MoistureDensity = "moisture-density";
    public const string FieldDensity = "field-density";

    /// <summary>The names by which a job is asked for.</summary>
    public static IReadOnlyList<string> Names { get; } = [MoistureDensity, FieldDensity];

    public MoistureDensityJob Laboratory => laboratory;

    public FieldDensityJob Field => inPlace;

    /// <summary>The jobs where there is no server that would inject them.</summary>
    public static ExchangeJobs Under(Limits limits)
    {
        var laboratory = new MoistureDensityJob(limits);
        return new ExchangeJobs(laboratory, new FieldDensityJob(laboratory, limits));
    }

    /// <summary>A job done line by line.</summary>
    public LineJob ByLine(string name) => name == MoistureDensity
        ? LineJob.Of<MoistureDensityRequest, MoistureDensityAnswer>(laboratory.Check, request => laboratory.Compute(request).Answer, answer => answer.Findings)
        : LineJob.Of<FieldDensityRequest, FieldDensityAnswer>(inPlace.Check, request => inPlace.ComputeWithChart(request).Answer, answer => answer.Findings);
}
