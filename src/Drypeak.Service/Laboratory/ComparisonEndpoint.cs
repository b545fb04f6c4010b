using Drypeak.Service.Hosting;

namespace Drypeak.Service.Laboratory;

/// <summary><c>POST /v1/comparison</c>: two tests of one soil held against one another.</summary>
internal static class ComparisonEndpoint
{
    public static void MapComparison(this IEndpointRouteBuilder app) =>
        app.MapPost("/v1/comparison", CompareAsync)
            .WithTags("Laboratory")
            .WithName("comparison")
            .WithSummary("Compare two tests of one soil")
            .WithDescription("The difference of optimum and maximum, second less first, beside what the two uncertainties and the standards allow.")
            .Takes<ComparisonRequest>("application/json", Examples.ComparisonRequest)
            .Gives<ComparisonAnswer>("application/json")
            .Refuses(400, 406, 413, 415, 422);

    private static async Task<IResult> CompareAsync(HttpContext context, ComparisonJob job, Limits limits)
    {
        if (Negotiation.Choose(context.Request, "application/json") is null)
        {
            return Problems.NotAcceptable(["application/json"]);
        }

        var request = await RequestReader.ReadAsync(context, ServiceJson.Of<ComparisonRequest>(), job.Check, limits.BodyBytes);
        return request.Succeeded
            ? Results.Json(ComparisonJob.Compute(request.Value), ServiceJson.Of<ComparisonAnswer>())
            : request.Problem;
    }
}
