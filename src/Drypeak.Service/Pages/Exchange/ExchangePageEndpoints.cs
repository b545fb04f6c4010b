using System.Text;
using Drypeak.Service.Exchange;
using Drypeak.Service.Hosting;
using Microsoft.AspNetCore.Http.Features;
using Microsoft.Net.Http.Headers;

namespace Drypeak.Service.Pages.Exchange;

/// <summary>The page for files: one is uploaded or pasted, and what was found and computed stands on the same page. Nothing is kept.</summary>
internal static class ExchangePageEndpoints
{
    public const string Address = "/exchange";

    private const string Multipart = "multipart/form-data";

    public static void Map(IEndpointRouteBuilder app)
    {
        app.MapMethods(Address, [HttpMethods.Get, HttpMethods.Head], Open).ExcludeFromDescription();
        app.MapPost(Address, PostAsync).ExcludeFromDescription();
    }

    private static IResult Open(string? demo, ExchangeJobs jobs) => demo switch
    {
        null => Page(new ExchangeSubmission(ExchangeForm.Empty)),
        "csv" => Page(ExchangeSubmission.Of(ExchangeForm.Empty with { File = Encoding.UTF8.GetBytes(Examples.LaboratoryCsv) }, jobs)),
        "ags4" => Page(ExchangeSubmission.Of(ExchangeForm.Empty with { Kind = ExchangeKind.Ags4, File = Encoding.UTF8.GetBytes(Examples.Ags4), MaximumDryDensity = "1.86" }, jobs)),
        _ => Results.StatusCode(StatusCodes.Status404NotFound),
    };

    private static async Task<IResult> PostAsync(HttpContext context, ExchangeJobs jobs, Limits limits)
    {
        if (!MediaTypeHeaderValue.TryParse(context.Request.ContentType, out var type) || !type.MediaType.Equals(Multipart, StringComparison.OrdinalIgnoreCase))
        {
            return Problems.UnsupportedMediaType(Multipart);
        }

        // The file, once uploaded and once as text, with the fields around it.
        var bound = (2 * limits.BodyBytes) + (64 << 10);
        if (await RequestReader.ReadBytesAsync(context, bound) is not { } body)
        {
            return Problems.TooLarge(limits.BodyBytes);
        }

        context.Request.Body = new MemoryStream(body.ToArray(), writable: false);
        IFormCollection posted;
        try
        {
            posted = await context.Request.ReadFormAsync(
                new FormOptions { MemoryBufferThreshold = bound, MultipartBodyLengthLimit = bound, ValueLengthLimit = bound, BufferBodyLengthLimit = bound }, context.RequestAborted);
        }
        catch (Exception broken) when (broken is InvalidDataException or IOException)
        {
            return Problem.Of(ProblemKind.BadRequest, "The form is damaged or cut short. Send it again.");
        }

        var form = await FormOfAsync(posted, context.RequestAborted);
        return form.File.Length > limits.BodyBytes ? Problems.TooLarge(limits.BodyBytes) : Page(ExchangeSubmission.Of(form, jobs));
    }

    private static async Task<ExchangeForm> FormOfAsync(IFormCollection posted, CancellationToken stop)
    {
        ReadOnlyMemory<byte> file = Encoding.UTF8.GetBytes(posted["text"].ToString());
        if (posted.Files.GetFile("file") is { Length: > 0 } uploaded)
        {
            using var bytes = new MemoryStream();
            await uploaded.CopyToAsync(bytes, stop);
            file = bytes.ToArray();
        }

        return new ExchangeForm(
            ExchangeKind.All.FirstOrDefault(kind => kind.Code == posted["kind"].ToString()) ?? ExchangeKind.Laboratory,
            file,
            posted["maximumDryDensity"].ToString().Trim(),
            posted["replace"] == "yes");
    }

    private static PageResult<ExchangePage> Page(ExchangeSubmission submission) => new(new Dictionary<string, object?>
    {
        [nameof(ExchangePage.Submission)] = submission,
    })
    {
        Status = submission.Status,
    };
}
