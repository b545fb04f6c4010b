using System.Text;
using Microsoft.AspNetCore.Components;
using Microsoft.AspNetCore.Components.Web;

namespace Drypeak.Service.Pages;

/// <summary>A component rendered to HTML, whole, with no state behind it: no circuit, no token, no cookie.</summary>
/// <typeparam name="TComponent">The page.</typeparam>
/// <param name="Parameters">The page's parameters by name.</param>
internal sealed record PageResult<TComponent>(IReadOnlyDictionary<string, object?> Parameters) : IResult
    where TComponent : IComponent
{
    /// <summary>HTTP status; null leaves the one that is set.</summary>
    public int? Status { get; init; }

    public async Task ExecuteAsync(HttpContext httpContext)
    {
        await using var renderer = new HtmlRenderer(Components.Services, httpContext.RequestServices.GetRequiredService<ILoggerFactory>());
        var html = await renderer.Dispatcher.InvokeAsync(async () =>
        {
            var page = await renderer.RenderComponentAsync<TComponent>(ParameterView.FromDictionary(new Dictionary<string, object?>(Parameters)));
            return page.ToHtmlString();
        });
        var bytes = Encoding.UTF8.GetBytes(html);
        var response = httpContext.Response;
        response.StatusCode = Status ?? response.StatusCode;
        response.ContentType = "text/html; charset=utf-8";
        response.Headers.CacheControl = "no-cache";
        response.ContentLength = bytes.Length;
        if (!HttpMethods.IsHead(httpContext.Request.Method))
        {
            await response.Body.WriteAsync(bytes, httpContext.RequestAborted);
        }
    }
}
