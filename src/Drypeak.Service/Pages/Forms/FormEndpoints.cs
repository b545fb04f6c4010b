using Drypeak.Service.Hosting;

namespace Drypeak.Service.Pages.Forms;

/// <summary>
/// The addresses of a page with a form. A form is posted, or comes in the address; either way the answer stands on the same page, or is
/// taken away as a file. Nothing is kept: what is not in the request does not exist.
/// </summary>
internal static class FormEndpoints
{
    private static readonly string[] Reading = [HttpMethods.Get, HttpMethods.Head];

    public static void MapForm(this IEndpointRouteBuilder app, FormPage page)
    {
        app.MapMethods(page.Address, Reading, (HttpRequest request, Limits limits) => Open(request.Query, page, limits)).ExcludeFromDescription();
        app.MapPost(page.Address, (HttpContext context, Limits limits) => PostAsync(context, page, limits, submission => Page(submission, limits))).ExcludeFromDescription();
        foreach (var file in page.Files)
        {
            app.MapMethods(file.AddressOn(page), Reading, (HttpRequest request, Limits limits) => File(FromAddress(request.Query, page, limits), file, limits)).ExcludeFromDescription();
            app.MapPost(file.AddressOn(page), (HttpContext context, Limits limits) => PostAsync(context, page, limits, submission => File(submission, file, limits))).ExcludeFromDescription();
        }
    }

    private static IResult Open(IQueryCollection query, FormPage page, Limits limits)
    {
        if (query.ContainsKey(FormAddress.Parameter))
        {
            return Page(FromAddress(query, page, limits), limits);
        }

        if (query["demo"].ToString() is { Length: > 0 } demo)
        {
            return page.Demonstrations.FirstOrDefault(demonstration => demonstration.Name == demo) is { } found
                ? Page(page.Submit(TextsOf(found, page)), limits)
                : Results.StatusCode(StatusCodes.Status404NotFound);
        }

        return Page(FormSubmission.Opened(page, FormTexts.From(page.Variant is { } variant ? [variant] : [], query)), limits);
    }

    private static FormTexts TextsOf(FormDemonstration demonstration, FormPage page) =>
        FormTexts.From(page.Fields, demonstration.Texts.Select(text => KeyValuePair.Create(text.Field.Name, new Microsoft.Extensions.Primitives.StringValues(text.Text))));

    private static FormSubmission FromAddress(IQueryCollection query, FormPage page, Limits limits) =>
        FormAddress.Read(query[FormAddress.Parameter].ToString(), limits.UnpackedAddressBytes) is { } texts
            ? page.Submit(FormTexts.From(page.Fields, texts))
            : FormSubmission.Refused(page, "Link", "It is damaged or cut short, so that nothing in it can be read. Copy the whole link, or fill the form in again.");

    private static async Task<IResult> PostAsync(HttpContext context, FormPage page, Limits limits, Func<FormSubmission, IResult> answer)
    {
        var (posted, refusal) = await PostedForm.ReadAsync(context, limits);
        if (posted is null)
        {
            return refusal!;
        }

        if (!posted.ContainsKey(SavedRequest.Parameter))
        {
            return answer(page.Submit(FormTexts.From(page.Fields, posted)));
        }

        var (opened, advice) = SavedRequest.Open(page, posted[SavedRequest.Parameter].ToString());
        return answer(opened is null ? FormSubmission.Refused(page, "Saved request", advice!) : page.Submit(opened));
    }

    private static PageResult<FormPageView> Page(FormSubmission submission, Limits limits) => new(new Dictionary<string, object?>
    {
        [nameof(FormPageView.Submission)] = submission with
        {
            Query = submission.Answer is null ? null : FormAddress.QueryOf(submission.Texts.Texts, limits.AddressBytes),
        },
    })
    {
        Status = submission.Status,
    };

    /// <summary>The file where there is an answer, else the page that says what is wrong.</summary>
    private static IResult File(FormSubmission submission, FormFile file, Limits limits) => submission.Answer is null
        ? Page(submission, limits)
        : Results.File(file.Bytes(submission).ToArray(), file.MediaType, file.NameOn(submission.Page));
}
