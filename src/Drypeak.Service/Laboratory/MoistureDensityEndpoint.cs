namespace Drypeak.Service.Laboratory;

/// <summary><c>POST /v1/moisture-density</c>: a laboratory test in, its curve out; as JSON, or as its picture by Accept.</summary>
internal static class MoistureDensityEndpoint
{
    public static void MapMoistureDensity(this IEndpointRouteBuilder app)
    {
        var job = app.ServiceProvider.GetRequiredService<MoistureDensityJob>();
        app.MapJob<MoistureDensityRequest, MoistureDensityAnswer, Figures.CompactionChart>(
                "/v1/moisture-density", job.Check, job.Compute, Examples.MoistureDensityRequest, job.Chart)
            .WithTags("Laboratory")
            .WithName("moisture-density")
            .WithSummary("Reduce a laboratory compaction test and fit its curve")
            .WithDescription("From weighings, or any later stage, to specimens, curve, optimum with its uncertainty, findings and chart. With Accept: image/svg+xml, image/png or application/pdf the chart itself is the answer; the parameters are the chart's.");
    }
}
