using Drypeak.Service.Hosting;
using Drypeak.Service.Laboratory;
using Drypeak.Service.Pages.Forms;

namespace Drypeak.Service.Pages.Laboratory;

/// <summary>
/// The laboratory page. A form is posted, or comes in the address; either way the answer stands on the same page, or is taken away as a
/// file. Nothing is kept: what is not in the request does not exist.
/// </summary>
internal static class LaboratoryPageEndpoints
{
    private static readonly string[] Reading = [HttpMethods.Get, HttpMethods.Head];

    public static void Map(IEndpointRouteBuilder app)
    {
        app.MapMethods("/", Reading, Open).ExcludeFromDescription();
        app.MapPost("/", (HttpContext context, MoistureDensityJob job, Limits limits) => PostAsync(context, job, limits, Page)).ExcludeFromDescription();
        foreach (var file in TestFile.All)
        {
            app.MapMethods(file.Address, Reading, (string? test, MoistureDensityJob job, Limits limits) => Page(Opened(test, job, limits), limits, file)).ExcludeFromDescription();
            app.MapPost(file.Address, (HttpContext context, MoistureDensityJob job, Limits limits) =>
                PostAsync(context, job, limits, (submission, limits) => Page(submission, limits, file))).ExcludeFromDescription();
        }
    }

    private static IResult Open(string? test, string? demo, MoistureDensityJob job, Limits limits) => (test, demo) switch
    {
        ({ }, _) => Page(Opened(test, job, limits), limits),
        (_, { } name) => Demonstration.Find(name) is { } demonstration
            ? Page(Submission.Of(demonstration.Form, job), limits)
            : Results.StatusCode(StatusCodes.Status404NotFound),
        _ => Page(Submission.Opened(TestForm.Empty), limits),
    };

    private static Submission Opened(string? test, MoistureDensityJob job, Limits limits) =>
        FormAddress.Read(test ?? "", limits.UnpackedAddressBytes) is { } texts
            ? Submission.Of(TestForm.From(texts), job)
            : Submission.Refused("The link is damaged or cut short, so the test in it cannot be read. Copy the whole link, or type the test in again.");

    private static async Task<IResult> PostAsync(HttpContext context, MoistureDensityJob job, Limits limits, Func<Submission, Limits, IResult> answer)
    {
        var (posted, refusal) = await PostedForm.ReadAsync(context, limits);
        if (posted is null)
        {
            return refusal!;
        }

        var form = TestForm.From(posted);
        return answer(posted.ContainsKey(TestForm.MoreRows) ? Submission.Opened(form.WithMoreRows()) : Submission.Of(form, job), limits);
    }

    private static IResult Page(Submission submission, Limits limits) => new PageResult<LaboratoryPage>(new Dictionary<string, object?>
    {
        [nameof(LaboratoryPage.Submission)] = submission,
        [nameof(LaboratoryPage.Query)] = submission.Answer is null ? null : FormAddress.QueryOf(submission.Form.Texts, limits.AddressBytes),
    })
    {
        Status = submission.Status,
    };

    /// <summary>The file where there is an answer, else the page that says what is wrong.</summary>
    private static IResult Page(Submission submission, Limits limits, TestFile file) => submission is { Answer: { } answer, Reading: { } reading }
        ? Results.File(file.Write(reading.Request, answer), file.MediaType, file.Name)
        : Page(submission, limits);
}
