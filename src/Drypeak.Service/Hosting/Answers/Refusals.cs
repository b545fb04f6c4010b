using Microsoft.AspNetCore.Diagnostics;
using Microsoft.AspNetCore.Http.Features;

namespace Drypeak.Service.Hosting;

/// <summary>Gives a problem, or a page, where no endpoint has answered: unknown addresses, wrong methods, exceptions.</summary>
internal static class Refusals
{
    /// <summary>Colon, space, CR and LF.</summary>
    private const int HeaderSeparators = 4;

    /// <summary>414 before anything else looks at a long address.</summary>
    public static Func<HttpContext, RequestDelegate, Task> LongAddresses(int maximumBytes) => (context, next) =>
    {
        var address = context.Features.GetRequiredFeature<IHttpRequestFeature>().RawTarget;
        return address.Length > maximumBytes ? Problems.AddressTooLong(maximumBytes).ExecuteAsync(context) : next(context);
    };

    /// <summary>431 for more header fields, or longer ones, than a request needs.</summary>
    public static Func<HttpContext, RequestDelegate, Task> LongHeaders(int maximumBytes, int maximumFields) => (context, next) =>
    {
        var (bytes, fields) = (0L, 0);
        foreach (var (name, values) in context.Request.Headers)
        {
            foreach (var value in values)
            {
                fields++;
                bytes += name.Length + (value?.Length ?? 0) + HeaderSeparators;
            }
        }

        return bytes > maximumBytes || fields > maximumFields ? Problems.HeadersTooLarge(maximumBytes, maximumFields).ExecuteAsync(context) : next(context);
    };

    /// <summary>Gives a bare status its body. What sets one (routing, the server) has set its header fields too, such as Allow.</summary>
    public static Func<StatusCodeContext, Task> BareStatus(Func<HttpContext, IResult> notFoundPage) => async status =>
    {
        var context = status.HttpContext;
        if (context.Response.StatusCode == StatusCodes.Status404NotFound)
        {
            context.Response.Headers.Vary = "Accept";
            if (Negotiation.Choose(context.Request, Problem.MediaType, "text/html") == "text/html")
            {
                await notFoundPage(context).ExecuteAsync(context);
                return;
            }
        }

        await Problems.OfStatus(context.Response.StatusCode).ExecuteAsync(context);
    };

    public static readonly ExceptionHandlerOptions Exceptions = new()
    {
        ExceptionHandler = AnswerException,
        // A request that broke off or broke the protocol is its sender's fault, and no error of ours to log.
        SuppressDiagnosticsCallback = failure => failure.Exception is BadHttpRequestException,
    };

    private static Task AnswerException(HttpContext context)
    {
        var problem = context.Features.Get<IExceptionHandlerFeature>()?.Error is BadHttpRequestException bad
            ? Problems.OfStatus(bad.StatusCode)
            : Problems.OfStatus(StatusCodes.Status500InternalServerError) with { TraceId = RequestLog.TraceIdentifier(context) };
        return problem.ExecuteAsync(context);
    }
}
