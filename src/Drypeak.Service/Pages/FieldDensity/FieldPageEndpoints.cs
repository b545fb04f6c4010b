using Drypeak.Service.Field;
using Drypeak.Service.Hosting;

namespace Drypeak.Service.Pages.FieldDensity;

/// <summary>The page of the field test. A form is posted, and the answer stands on the same page; nothing is kept.</summary>
internal static class FieldPageEndpoints
{
    private const string Address = "/field";

    public static void Map(IEndpointRouteBuilder app)
    {
        app.MapMethods(Address, [HttpMethods.Get, HttpMethods.Head], Open).ExcludeFromDescription();
        app.MapPost(Address, PostAsync).ExcludeFromDescription();
    }

    private static IResult Open(string? method, string? demo, FieldDensityJob job) => demo is null
        ? Page(FieldSubmission.Opened(method))
        : FieldDemonstration.All.FirstOrDefault(demonstration => demonstration.Name == demo) is { } found
            ? Page(FieldSubmission.Of(found.Texts, job))
            : Results.StatusCode(StatusCodes.Status404NotFound);

    private static async Task<IResult> PostAsync(HttpContext context, FieldDensityJob job, Limits limits)
    {
        var (posted, refusal) = await PostedForm.ReadAsync(context, limits);
        return posted is null ? refusal! : Page(FieldSubmission.Of(posted, job));
    }

    private static PageResult<FieldPage> Page(FieldSubmission submission) =>
        new(new Dictionary<string, object?> { [nameof(FieldPage.Submission)] = submission }) { Status = submission.Status };
}
