using System.ComponentModel.DataAnnotations;
using System.Globalization;
using System.Net;
using System.Security.Cryptography;
using System.Text;
using Drypeak.Service.Hosting;
using Microsoft.AspNetCore.Builder;
using Microsoft.Extensions.Configuration;
using Xunit;

namespace Drypeak.Service.Tests.Hosting;

/// <summary>Who may ask what, with keys.</summary>
public sealed class AccessTests
{
    private const string Old = "old-key-of-the-laboratory";
    private const string New = "new-key-of-the-laboratory";
    private const string Scraper = "key-of-the-scraper";

    private static readonly (string, string)[] Keys =
    [
        ("Access:Keys:0:Name", "laboratory"), ("Access:Keys:0:Sha256", Digest(Old)),
        ("Access:Keys:1:Name", "laboratory"), ("Access:Keys:1:Sha256", Digest(New)), ("Access:Keys:1:Scopes", "compute"),
        ("Access:Keys:2:Name", "scraper"), ("Access:Keys:2:Sha256", Digest(Scraper)), ("Access:Keys:2:Scopes", "metrics"),
    ];

    private static CancellationToken Stop => TestContext.Current.CancellationToken;

    [Theory]
    [InlineData(null, "/kept", 401)]
    [InlineData("Bearer " + Old, "/kept", 200)]
    [InlineData("Bearer " + New, "/kept", 200)]
    [InlineData("bearer " + New, "/kept", 200)]
    [InlineData("Bearer " + Old, "/batch", 200)]
    [InlineData("Bearer " + New, "/batch", 403)]
    [InlineData("Bearer " + New, "/metrics", 403)]
    [InlineData("Bearer " + Scraper, "/metrics", 200)]
    [InlineData("Bearer " + Scraper, "/kept", 403)]
    [InlineData("Bearer old-key-of-the-laborator", "/kept", 401)]
    [InlineData("Bearer", "/kept", 401)]
    [InlineData("Bearer a.b.c", "/kept", 401)]
    [InlineData(Old, "/kept", 401)]
    [InlineData("Basic !!", "/kept", 401)]
    [InlineData("Basic b25lLXdvcmQ=", "/kept", 401)]
    [InlineData(null, "/metrics", 401)]
    [InlineData(null, "/nothing", 401)]
    [InlineData(null, "/health/live", 200)]
    [InlineData(null, "/health/ready", 200)]
    [InlineData(null, "/openapi/v1.json", 200)]
    [InlineData(null, "/.well-known/security.txt", 404)]
    public async Task A_key_opens_what_its_scopes_say_and_nothing_else(string? authorization, string address, int status)
    {
        await using var service = await StartAsync();
        using var answer = await GetAsync(service, address, authorization);
        Assert.Equal(status, (int)answer.StatusCode);
        if (status >= 400)
        {
            Assert.Equal(Problem.MediaType, answer.Content.Headers.ContentType?.MediaType);
        }

        Assert.Equal(status == 401 ? "Bearer" : null, answer.Headers.WwwAuthenticate.FirstOrDefault()?.Scheme);
    }

    [Fact]
    public async Task A_browser_is_asked_for_the_key_by_its_own_dialog_and_gives_it_as_a_password()
    {
        await using var service = await StartAsync();
        using var asked = await GetAsync(service, "/kept", null, "text/html");
        Assert.Equal(["Bearer", "Basic"], asked.Headers.WwwAuthenticate.Select(challenge => challenge.Scheme));
        using var given = await GetAsync(service, "/kept", "Basic " + Convert.ToBase64String(Encoding.UTF8.GetBytes("anyone:" + Old)));
        Assert.Equal(HttpStatusCode.OK, given.StatusCode);
        Assert.False(given.Headers.Contains("Set-Cookie"));
    }

    [Fact]
    public async Task Without_keys_everyone_may_all()
    {
        await using var service = await TestService.StartAsync(app => app.MapGet("/batch", () => "many").RequireAuthorization("batch"));
        foreach (var address in new[] { "/kept", "/batch", "/metrics" })
        {
            using var answer = await GetAsync(service, address, null);
            Assert.Equal(HttpStatusCode.OK, answer.StatusCode);
        }
    }

    [Fact]
    public async Task Other_origins_read_answers_only_where_they_are_configured()
    {
        await using var closed = await TestService.StartAsync();
        Assert.Null(await AllowedOriginAsync(closed, "https://lab.example"));
        await using var service = await TestService.StartAsync(null, ("Access:AllowedOrigins:0", "https://lab.example"));
        Assert.Equal("https://lab.example", await AllowedOriginAsync(service, "https://lab.example"));
        Assert.Null(await AllowedOriginAsync(service, "https://other.example"));
    }

    [Theory]
    [InlineData("127.0.0.1", true)]
    [InlineData("::1", true)]
    [InlineData("0.0.0.0", false)]
    [InlineData("::", false)]
    [InlineData("192.0.2.1", false)]
    public void An_open_service_listens_on_loopback_only_unless_it_is_told(string address, bool listens)
    {
        var endpoint = new IPEndPoint(IPAddress.Parse(address), 80);
        if (!listens)
        {
            Assert.Contains("Access__AllowOpen=true", Assert.Throws<InvalidOperationException>(() => new AccessSettings().RefuseOpenAddress(endpoint)).Message, StringComparison.Ordinal);
        }

        new AccessSettings { AllowOpen = true }.RefuseOpenAddress(endpoint);
        new AccessSettings { Keys = [new KeySettings()] }.RefuseOpenAddress(endpoint);
    }

    [Theory]
    [InlineData("http://0.0.0.0:0")]
    [InlineData("http://*:0")]
    [InlineData("http://[::]:0")]
    public async Task The_start_ends_where_an_open_service_was_given_a_public_address(string url)
    {
        await using var app = WebApplication.CreateBuilder([$"--urls={url}"]).AddDrypeakHosting().Build();
        await Assert.ThrowsAsync<InvalidOperationException>(() => app.StartAsync(Stop));
    }

    [Theory]
    [InlineData("Access:Keys:0:Name", "", "name")]
    [InlineData("Access:Keys:0:Sha256", "old-key-of-the-laboratory", "sha256sum")]
    [InlineData("Access:Keys:0:Scopes", "compute everything", "compute batch metrics")]
    [InlineData("Access:Keys:0:Scopes", " ", "compute batch metrics")]
    [InlineData("Access:Keys:2:Name", "laboratory", "Up to 2")]
    [InlineData("Access:Issuer:Authority", "here", "Audience")]
    [InlineData("Access:AllowedOrigins:0", "https://lab.example/page", "origin")]
    public void Settings_that_cannot_be_meant_so_end_the_start_and_say_what_to_write(string name, string value, string advice)
    {
        var entries = Keys.ToDictionary(entry => entry.Item1, entry => (string?)entry.Item2);
        entries[name] = value;
        var configuration = new ConfigurationBuilder().AddInMemoryCollection(entries).Build();
        Assert.Contains(advice, Assert.Throws<ValidationException>(() => AccessSettings.From(configuration)).Message, StringComparison.Ordinal);
    }

    private static Task<TestService> StartAsync() => TestService.StartAsync(app => app.MapGet("/batch", () => "many").RequireAuthorization("batch"), Keys);

    private static async Task<HttpResponseMessage> GetAsync(TestService service, string address, string? authorization, string? accept = null)
    {
        using var request = new HttpRequestMessage(HttpMethod.Get, address);
        request.Headers.TryAddWithoutValidation("Authorization", authorization);
        request.Headers.TryAddWithoutValidation("Accept", accept);
        return await service.Client.SendAsync(request, Stop);
    }

    private static async Task<string?> AllowedOriginAsync(TestService service, string origin)
    {
        using var request = new HttpRequestMessage(HttpMethod.Get, "/kept") { Headers = { { "Origin", origin } } };
        using var answer = await service.Client.SendAsync(request, Stop);
        return answer.Headers.TryGetValues("Access-Control-Allow-Origin", out var allowed) ? allowed.Single() : null;
    }

    private static string Digest(string key) => Convert.ToHexString(SHA256.HashData(Encoding.UTF8.GetBytes(key))).ToLower(CultureInfo.InvariantCulture);
}
