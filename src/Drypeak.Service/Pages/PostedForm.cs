using Drypeak.Service.Hosting;
using Microsoft.AspNetCore.Http.Features;

namespace Drypeak.Service.Pages;

/// <summary>A form as a browser posts it, read within the bounds of the service.</summary>
internal static class PostedForm
{
    /// <summary>Fields of the largest grid and some more.</summary>
    private const int MostFields = 2000;

    private const string FormType = "application/x-www-form-urlencoded";

    /// <summary>The form; or null with the problem that says why there is none.</summary>
    public static async Task<(IFormCollection? Form, Problem? Refusal)> ReadAsync(HttpContext context, Limits limits)
    {
        if (!(context.Request.ContentType ?? "").StartsWith(FormType, StringComparison.OrdinalIgnoreCase))
        {
            return (null, Problems.UnsupportedMediaType(FormType));
        }

        if (await RequestReader.ReadBytesAsync(context, limits.BodyBytes) is not { } body)
        {
            return (null, Problems.TooLarge(limits.BodyBytes));
        }

        // Read to its bound first, so that who sends too much hears it and is not cut off; the form is read from what came.
        context.Request.Body = new MemoryStream(body.ToArray(), writable: false);
        try
        {
            return (await context.Request.ReadFormAsync(new FormOptions { ValueCountLimit = MostFields, ValueLengthLimit = limits.BodyBytes }, context.RequestAborted), null);
        }
        catch (InvalidDataException)
        {
            return (null, Problems.TooLarge(limits.BodyBytes));
        }
    }
}
