using Microsoft.Playwright;
using Xunit;
using static Drypeak.Browser.Tests.PageChecks;

namespace Drypeak.Browser.Tests;

/// <summary>The pages of the test methods, of the findings, and of the sheet with blanks, in a real browser.</summary>
public sealed class CataloguePagesTests(Browser browser)
{
    private const string Sheet = "/specimen-sheet?method=bs-1377-4-3.7&waterContents=8+10+12+14";

    private static readonly string[] Addresses = ["/test-methods", "/findings", Sheet, "/specimen-sheet?waterContents=ten"];

    [Theory]
    [InlineData(360, ColorScheme.Light)]
    [InlineData(360, ColorScheme.Dark)]
    [InlineData(1280, ColorScheme.Light)]
    [InlineData(1280, ColorScheme.Dark)]
    public async Task Axe_finds_nothing_and_nothing_is_cut_or_too_small(int width, ColorScheme scheme)
    {
        await using var visit = await browser.OpenAsync(width, scheme: scheme);
        foreach (var address in Addresses)
        {
            await visit.Page.GotoAsync(address);
            await AssertAccessibleAsync(visit.Page, address);
            await AssertFitsAsync(visit.Page);
            var smallest = await visit.Page.EvaluateAsync<double>(
                "Math.min(...[...document.querySelectorAll('body *:not(svg):not(svg *)')].filter(e => e.textContent.trim() && e.getClientRects().length).map(e => parseFloat(getComputedStyle(e).fontSize)))");
            Assert.True(smallest >= 13, $"{address}: {smallest} px");
        }

        await visit.AssertCleanAsync();
    }

    [Fact]
    public async Task At_320_px_nothing_is_cut()
    {
        await using var visit = await browser.OpenAsync(320);
        foreach (var address in Addresses)
        {
            await visit.Page.GotoAsync(address);
            await AssertFitsAsync(visit.Page);
        }
    }

    [Theory]
    [InlineData(true)]
    [InlineData(false)]
    public async Task A_sheet_is_made_of_a_method_and_water_contents_and_prints_on_one_page(bool scripts)
    {
        await using var visit = await browser.OpenAsync(1280, scripts);
        var page = visit.Page;
        await page.GotoAsync("/");
        await page.Locator(".mast summary", new() { HasTextString = "Laboratory" }).ClickAsync();
        await page.GetByRole(AriaRole.Link, new() { Name = "Blank sheet" }).ClickAsync();
        await page.GetByLabel("Test method").SelectOptionAsync("astm-d698-c");
        await page.GetByLabel("Water contents aimed at").FillAsync("9,5 11,5 13,5");
        await page.GetByRole(AriaRole.Button, new() { Name = "Make the sheet" }).ClickAsync();
        await Assertions.Expect(page.Locator("svg text", new() { HasTextString = "11.5" })).ToBeVisibleAsync();
        await Assertions.Expect(page.Locator("svg text", new() { HasTextString = "ASTM D698, method C" })).ToBeVisibleAsync();

        Assert.Equal(1, SheetsOf(await page.PdfAsync(new PagePdfOptions { PreferCSSPageSize = true })));
        await page.EmulateMediaAsync(new PageEmulateMediaOptions { Media = Media.Print });
        await Assertions.Expect(page.GetByRole(AriaRole.Button, new() { Name = "Make the sheet" })).ToBeHiddenAsync();
        await Assertions.Expect(page.Locator(".paper-sheet svg")).ToBeVisibleAsync();
        await visit.AssertCleanAsync();
    }

    [Fact]
    public async Task A_finding_on_an_answer_opens_what_it_means()
    {
        await using var visit = await browser.OpenAsync(1280);
        var page = visit.Page;
        await page.GotoAsync("/?demo=still-rising");
        await page.Locator(".finding a.kind").First.ClickAsync();
        Assert.Contains("/findings#", page.Url, StringComparison.Ordinal);
        await Assertions.Expect(page.Locator("h3:target")).ToBeInViewportAsync();
    }
}
