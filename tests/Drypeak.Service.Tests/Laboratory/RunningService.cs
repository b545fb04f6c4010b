using System.Net;
using System.Net.Http.Headers;
using System.Text;
using System.Text.Json;
using Drypeak.Service.Tests.Laboratory;
using Microsoft.AspNetCore.Hosting;
using Microsoft.AspNetCore.Mvc.Testing;
using Serilog;
using Xunit;

[assembly: AssemblyFixture(typeof(RunningService))]
[assembly: AssemblyFixture(typeof(SecondInstance))]

namespace Drypeak.Service.Tests.Laboratory;

/// <summary>The service on a port of its own, as a client meets it. One for all the tests: it keeps nothing.</summary>
public class RunningService : IDisposable
{
    public const string MoistureDensity = "/v1/moisture-density";

    /// <summary>Held while a service starts: two that start at once in one process take each other's settings.</summary>
    internal static readonly Lock Starting = new();

    private readonly QuietService _service = new();

    public RunningService()
    {
        lock (Starting)
        {
            _service.UseKestrel(0);
            _service.StartServer();
        }

        Client = new HttpClient(new SocketsHttpHandler { AllowAutoRedirect = false, UseCookies = false })
        {
            BaseAddress = _service.ClientOptions.BaseAddress,
        };
    }

    public HttpClient Client { get; }

    /// <summary>Posts a laboratory test and gives whatever is answered.</summary>
    public async Task<HttpResponseMessage> PostAsync(string body, string? accept = null, string address = MoistureDensity)
    {
        using var request = new HttpRequestMessage(HttpMethod.Post, address) { Content = Json(body) };
        if (accept is not null)
        {
            request.Headers.TryAddWithoutValidation("Accept", accept);
        }

        return await Client.SendAsync(request, TestContext.Current.CancellationToken);
    }

    /// <summary>Posts a laboratory test that has to be computed.</summary>
    public Task<JsonElement> AnswerAsync(string body) => AnswerAsync(MoistureDensity, body);

    /// <summary>Posts a job that has to be computed.</summary>
    public async Task<JsonElement> AnswerAsync(string address, string body)
    {
        using var response = await PostAsync(body, address: address);
        var text = await TextOf(response);
        Assert.True(response.StatusCode == HttpStatusCode.OK, text);
        Assert.Equal("application/json", response.Content.Headers.ContentType?.MediaType);
        return JsonElement.Parse(text);
    }

    /// <summary>Posts a laboratory test that has to be refused.</summary>
    public Task<Refusal> RefusalAsync(string body) => RefusalAsync(MoistureDensity, body);

    /// <summary>Posts a job that has to be refused.</summary>
    public async Task<Refusal> RefusalAsync(string address, string body)
    {
        using var response = await PostAsync(body, address: address);
        return await Refusal.Of(response);
    }

    public Task<HttpResponseMessage> GetAsync(string address) => Client.GetAsync(new Uri(address, UriKind.Relative), TestContext.Current.CancellationToken);

    public Task<byte[]> BytesAsync(string address) => Client.GetByteArrayAsync(new Uri(address, UriKind.Relative), TestContext.Current.CancellationToken);

    public static Task<string> TextOf(HttpResponseMessage response) => response.Content.ReadAsStringAsync(TestContext.Current.CancellationToken);

    public static ByteArrayContent Json(string body) => new(Encoding.UTF8.GetBytes(body))
    {
        Headers = { ContentType = new MediaTypeHeaderValue("application/json") },
    };

    public void Dispose()
    {
        Client.Dispose();
        _service.Dispose();
        GC.SuppressFinalize(this);
    }

    /// <summary>As in production, but for the log.</summary>
    private sealed class QuietService : WebApplicationFactory<Program>
    {
        protected override void ConfigureWebHost(IWebHostBuilder builder) =>
            builder.UseEnvironment("Production").ConfigureServices(services => services.AddSerilog(log => log.MinimumLevel.Fatal()));
    }
}

/// <summary>Another instance of the same program, for what must not depend on the instance. Started before the tests, since two starts at once disturb each other.</summary>
public sealed class SecondInstance : RunningService;
