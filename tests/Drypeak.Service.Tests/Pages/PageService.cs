using AngleSharp.Html.Dom;
using AngleSharp.Html.Parser;
using Drypeak.Service.Tests.Laboratory;
using Microsoft.AspNetCore.Mvc.Testing;
using Xunit;

namespace Drypeak.Service.Tests.Pages;

/// <summary>The service on a real port, seen as a browser without scripts would see it.</summary>
public sealed class PageService : IDisposable
{
    private readonly WebApplicationFactory<Program> _service = new();

    public PageService()
    {
        lock (RunningService.Starting)
        {
            _service.UseKestrel(0);
            _service.StartServer();
        }

        Client = _service.CreateClient(new WebApplicationFactoryClientOptions { BaseAddress = _service.ClientOptions.BaseAddress, AllowAutoRedirect = false, HandleCookies = false });
        Client.DefaultRequestHeaders.Accept.ParseAdd("text/html");
    }

    public HttpClient Client { get; }

    public void Dispose()
    {
        Client.Dispose();
        _service.Dispose();
    }

    /// <summary>Posts a form's fields.</summary>
    public async Task<(HttpResponseMessage Response, IHtmlDocument Page)> PostAsync(string address, params (string Name, string Text)[] fields)
    {
        using var body = new FormUrlEncodedContent(fields.Select(field => KeyValuePair.Create(field.Name, field.Text)));
        return await ReadAsync(await Client.PostAsync(address, body, TestContext.Current.CancellationToken));
    }

    public async Task<(HttpResponseMessage Response, IHtmlDocument Page)> GetAsync(string address) =>
        await ReadAsync(await Client.GetAsync(address, TestContext.Current.CancellationToken));

    private static async Task<(HttpResponseMessage Response, IHtmlDocument Page)> ReadAsync(HttpResponseMessage response) =>
        (response, new HtmlParser().ParseDocument(await response.Content.ReadAsStringAsync(TestContext.Current.CancellationToken)));
}
