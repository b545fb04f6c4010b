using System.Net;
using Microsoft.AspNetCore.Builder;
using Microsoft.AspNetCore.Http;
using Xunit;

namespace Drypeak.Service.Tests.Hosting;

/// <summary>What depends on where an answer goes: charts in other pages, HTTPS through a proxy, the address for reports of vulnerabilities.</summary>
public sealed class BrowserHeadersTests
{
    private const string Proxy = "127.0.0.1";

    private static CancellationToken Stop => TestContext.Current.CancellationToken;

    [Theory]
    [InlineData("/v1/charts/any.svg", "frame-ancestors *", "cross-origin")]
    [InlineData("/kept", "frame-ancestors 'none'", "same-origin")]
    [InlineData("/v1/chartsother", "frame-ancestors 'none'", "same-origin")]
    public async Task A_chart_may_stand_in_other_pages_and_nothing_else_may(string address, string ancestors, string resources)
    {
        await using var service = await TestService.StartAsync(app => app.MapGet("/v1/charts/any.svg", () => Results.Text("<svg/>", "image/svg+xml")));
        using var answer = await service.Client.GetAsync(address, Stop);
        Assert.EndsWith(ancestors, answer.Headers.GetValues("Content-Security-Policy").Single(), StringComparison.Ordinal);
        Assert.Equal(resources, answer.Headers.GetValues("Cross-Origin-Resource-Policy").Single());
        Assert.Contains("geolocation=()", answer.Headers.GetValues("Permissions-Policy").Single(), StringComparison.Ordinal);
    }

    [Theory]
    [InlineData(Proxy, "https", "drypeak.example", true)]
    [InlineData("127.0.0.0/8", "https", "drypeak.example", true)]
    [InlineData(Proxy, "http", "drypeak.example", false)]
    [InlineData(Proxy, "https", "localhost", false)]
    [InlineData("192.0.2.0/24", "https", "drypeak.example", false)]
    [InlineData(null, "https", "drypeak.example", false)]
    public async Task Strict_transport_is_asked_for_behind_TLS_of_a_known_proxy_only(string? proxy, string scheme, string host, bool strict)
    {
        await using var service = await TestService.StartAsync(null, proxy is null ? [] : [("Proxies:0", proxy)]);
        using var request = new HttpRequestMessage(HttpMethod.Get, "/kept") { Headers = { Host = host } };
        request.Headers.Add("X-Forwarded-Proto", scheme);
        using var answer = await service.Client.SendAsync(request, Stop);
        Assert.Equal(strict, answer.Headers.Contains("Strict-Transport-Security"));
    }

    [Fact]
    public async Task A_known_proxy_tells_who_asks_and_an_unknown_one_is_not_believed()
    {
        static void Map(WebApplication app) => app.MapGet("/who", (HttpContext context) => context.Connection.RemoteIpAddress!.ToString());
        await using var known = await TestService.StartAsync(Map, ("Proxies:0", Proxy));
        await using var unknown = await TestService.StartAsync(Map);
        foreach (var (service, expected) in new[] { (known, "198.51.100.7"), (unknown, "127.0.0.1") })
        {
            using var request = new HttpRequestMessage(HttpMethod.Get, "/who");
            request.Headers.Add("X-Forwarded-For", "198.51.100.7");
            using var answer = await service.Client.SendAsync(request, Stop);
            Assert.Equal(expected, await answer.Content.ReadAsStringAsync(Stop));
        }
    }

    [Fact]
    public async Task The_address_for_reports_is_what_is_configured_and_404_without()
    {
        await using var service = await TestService.StartAsync(null, ("SecurityContact:Contact", "mailto:security@lab.example"), ("SecurityContact:Expires", "2027-06-30T00:00:00Z"));
        using var answer = await service.Client.GetAsync("/.well-known/security.txt", Stop);
        Assert.Equal("text/plain; charset=utf-8", answer.Content.Headers.ContentType?.ToString());
        Assert.Equal("Contact: mailto:security@lab.example\nExpires: 2027-06-30T00:00:00Z\n", await answer.Content.ReadAsStringAsync(Stop));

        await using var without = await TestService.StartAsync();
        Assert.Equal(HttpStatusCode.NotFound, (await without.Client.GetAsync("/.well-known/security.txt", Stop)).StatusCode);
    }

    [Theory]
    [InlineData("SecurityContact:Contact", "mailto:security@lab.example")]
    [InlineData("SecurityContact:Expires", "2027-06-30T00:00:00Z")]
    [InlineData("Proxies:0", "everyone")]
    public async Task Half_a_setting_ends_the_start(string name, string value) =>
        await Assert.ThrowsAsync<System.ComponentModel.DataAnnotations.ValidationException>(() => TestService.StartAsync(null, (name, value)));
}
