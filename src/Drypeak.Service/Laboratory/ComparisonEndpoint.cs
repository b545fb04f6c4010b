namespace Drypeak.Service.Laboratory;

/// <summary><c>POST /v1/comparison</c>: two tests of one soil held against one another.</summary>
internal static class ComparisonEndpoint
{
    public static void MapComparison(this IEndpointRouteBuilder app) =>
        app.MapJob<ComparisonRequest, ComparisonAnswer>(
                "/v1/comparison", app.ServiceProvider.GetRequiredService<ComparisonJob>().Check, ComparisonJob.Compute, Examples.ComparisonRequest)
            .WithTags("Laboratory")
            .WithName("comparison")
            .WithSummary("Compare two tests of one soil")
            .WithDescription("The difference of optimum and maximum, second less first, beside what the two uncertainties and the standards allow.");
}
