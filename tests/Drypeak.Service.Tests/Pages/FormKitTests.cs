using System.Net;
using AngleSharp.Dom;
using AngleSharp.Html.Dom;
using Xunit;

namespace Drypeak.Service.Tests.Pages;

/// <summary>What every page with a form keeps, whatever it asks for.</summary>
public sealed class FormKitTests(PageService service) : IClassFixture<PageService>
{
    /// <summary>Every page of the kit.</summary>
    public static TheoryData<string> Addresses =>
    [
        "/field", "/relative-density", "/one-point", "/rapid-method",
        "/earthwork/specimen-water", "/earthwork/lift-water", "/earthwork/quantities", "/earthwork/test-locations", "/earthwork/roller-output", "/earthwork/test-strip",
    ];

    [Theory]
    [MemberData(nameof(Addresses))]
    public async Task Every_demonstration_is_answered_and_its_link_gives_the_same_page(string address)
    {
        var (_, first) = await service.GetAsync(address);
        var demonstrations = first.QuerySelectorAll(".demos a").Select(Target).ToList();
        Assert.NotEmpty(demonstrations);
        foreach (var demonstration in demonstrations)
        {
            var (response, page) = await service.GetAsync(demonstration);
            Assert.Equal(HttpStatusCode.OK, response.StatusCode);
            Assert.NotNull(page.GetElementById("answer"));
            Assert.Distinct(page.QuerySelectorAll("[id]").Select(element => element.Id));
            var (_, again) = await service.GetAsync(Target(page.QuerySelector(".away a")!));
            Assert.Equal(page.Body!.InnerHtml, again.Body!.InnerHtml);
        }
    }

    [Theory]
    [MemberData(nameof(Addresses))]
    public async Task Every_control_has_a_label_and_one_heading_says_what_the_page_is(string address)
    {
        var (_, page) = await service.GetAsync(address);
        Assert.Single(page.QuerySelectorAll("h1"));
        Assert.All(page.QuerySelectorAll("input:not([type=hidden]), select, textarea"), control =>
            Assert.True(control.HasAttribute("aria-label") || page.QuerySelector($"label[for='{control.Id}']") is not null || control.Closest("label") is not null, control.OuterHtml));
    }

    [Theory]
    [MemberData(nameof(Addresses))]
    public async Task A_saved_request_opens_the_form_and_the_answer_again(string address)
    {
        var (_, first) = await service.GetAsync(address);
        foreach (var demonstration in first.QuerySelectorAll(".demos a").Select(Target))
        {
            var (_, page) = await service.GetAsync(demonstration);
            var link = page.QuerySelectorAll(".away a").Single(link => link.TextContent == "Request as JSON").GetAttribute("href")!;
            var request = await service.Client.GetStringAsync(link, TestContext.Current.CancellationToken);
            var (response, opened) = await service.PostAsync(address, ("saved-request", request));
            Assert.Equal(HttpStatusCode.OK, response.StatusCode);
            Assert.Equal(page.QuerySelector("#answer .version")!.TextContent, opened.QuerySelector("#answer .version")!.TextContent);
        }
    }

    [Theory]
    [MemberData(nameof(Addresses))]
    public async Task A_request_that_the_page_cannot_show_whole_is_refused_and_named(string address)
    {
        var (response, page) = await service.PostAsync(address, ("saved-request", """{"reference":"x","nobody":{"knows":1}}"""));
        Assert.Equal(HttpStatusCode.BadRequest, response.StatusCode);
        Assert.Contains("/nobody/knows", page.QuerySelector("[role=alert]")!.TextContent, StringComparison.Ordinal);
        var (broken, _) = await service.PostAsync(address, ("saved-request", "not JSON"));
        Assert.Equal(HttpStatusCode.BadRequest, broken.StatusCode);
    }

    [Theory]
    [MemberData(nameof(Addresses))]
    public async Task An_empty_form_is_refused_with_links_to_the_fields_that_lack(string address)
    {
        var (response, page) = await service.PostAsync(address);
        Assert.Equal(HttpStatusCode.UnprocessableEntity, response.StatusCode);
        Assert.StartsWith("Error:", page.Title, StringComparison.Ordinal);
        var links = page.QuerySelectorAll("[role=alert] a").ToList();
        Assert.NotEmpty(links);
        Assert.All(links, link => Assert.Equal("true", page.QuerySelector(link.GetAttribute("href")!)!.GetAttribute("aria-invalid")));
    }

    [Theory]
    [MemberData(nameof(Addresses))]
    public async Task A_damaged_link_is_said_and_the_form_stays_usable(string address)
    {
        var (response, page) = await service.GetAsync(address + "?test=abc");
        Assert.Equal(HttpStatusCode.BadRequest, response.StatusCode);
        Assert.Contains("damaged or cut short", page.QuerySelector("[role=alert]")!.TextContent, StringComparison.Ordinal);
        Assert.NotNull(page.QuerySelector("form.test button.main"));
    }

    private static string Target(IElement link) => ((IHtmlAnchorElement)link).GetAttribute("href")!.Split('#')[0];
}
