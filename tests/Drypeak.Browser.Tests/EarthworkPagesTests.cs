using Microsoft.Playwright;
using Xunit;
using static Drypeak.Browser.Tests.PageChecks;

namespace Drypeak.Browser.Tests;

/// <summary>The pages of planning the work, in a real browser; all that matters works with scripts off.</summary>
public sealed class EarthworkPagesTests(Browser browser)
{
    private static readonly string[] Addresses =
    [
        "/earthwork/specimen-water?demo=dry-back", "/earthwork/lift-water?demo=dry-day", "/earthwork/quantities?demo=two-areas", "/earthwork/test-locations?demo=culvert",
        "/earthwork/roller-output?demo=padfoot", "/earthwork/test-strip?demo=over-rolled", "/earthwork/lift-water",
    ];

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
    public async Task A_lift_gets_its_water_from_a_form_that_is_filled_by_its_labels(bool scripts)
    {
        await using var visit = await browser.OpenAsync(1280, scripts);
        var page = visit.Page;
        await page.GotoAsync("/");
        await page.Locator(".mast summary", new() { HasTextString = "Earthwork" }).ClickAsync();
        await page.GetByRole(AriaRole.Link, new() { Name = "Water for a lift" }).ClickAsync();
        await page.GetByLabel("Area", new() { Exact = true }).FillAsync("500");
        await page.GetByLabel("and thickness").FillAsync("0,2");
        await page.GetByLabel("Dry density", new() { Exact = true }).FillAsync("1,8");
        await page.GetByLabel("Present water content", new() { Exact = true }).FillAsync("9");
        await page.GetByLabel("When it is rolled").FillAsync("12");
        await page.GetByRole(AriaRole.Button, new() { Name = "Compute" }).ClickAsync();

        // 180 t of solids take 3 %: 5.4 t, which are 5410 L at 20 °C.
        await Assertions.Expect(page.Locator("#answer-title")).ToContainTextAsync("5410");
        await visit.AssertCleanAsync();
    }

    [Fact]
    public async Task A_fault_is_told_at_the_top_and_at_its_field_without_scripts()
    {
        await using var visit = await browser.OpenAsync(1280, scripts: false);
        var page = visit.Page;
        await page.GotoAsync("/earthwork/roller-output?demo=padfoot");
        await page.GetByLabel("Overlap of lanes").FillAsync("2.1");
        await page.GetByRole(AriaRole.Button, new() { Name = "Compute" }).ClickAsync();
        await Assertions.Expect(page.GetByRole(AriaRole.Alert)).ToContainTextAsync("Overlap of lanes");
        Assert.Equal("true", await page.GetByLabel("Overlap of lanes").GetAttributeAsync("aria-invalid"));
        Assert.StartsWith("Error:", await page.TitleAsync(), StringComparison.Ordinal);
        Assert.Equal("2.1", await page.GetByLabel("Overlap of lanes").InputValueAsync());
    }

    [Theory]
    [InlineData("/earthwork/specimen-water?demo=portions", 1)]
    [InlineData("/earthwork/lift-water?demo=dry-day", 1)]
    [InlineData("/earthwork/quantities?demo=one-borrow", 1)]
    [InlineData("/earthwork/test-locations?demo=strip", 1)]
    [InlineData("/earthwork/roller-output?demo=padfoot", 1)]
    [InlineData("/earthwork/test-strip?demo=levels-off", 1)]
    public async Task An_answer_prints_as_one_sheet_without_form_and_buttons(string address, int sheets)
    {
        await using var visit = await browser.OpenAsync(1280, scripts: false);
        var page = visit.Page;
        await page.GotoAsync(address);
        Assert.Equal(sheets, SheetsOf(await page.PdfAsync(new PagePdfOptions { PreferCSSPageSize = true })));
        await page.EmulateMediaAsync(new PageEmulateMediaOptions { Media = Media.Print });
        await Assertions.Expect(page.Locator("form.test")).ToBeHiddenAsync();
        await Assertions.Expect(page.Locator("#answer-title")).ToBeVisibleAsync();
        await Assertions.Expect(page.Locator(".mast")).ToBeHiddenAsync();
    }

    [Fact]
    public async Task Blanks_for_the_pen_stand_on_the_printed_sheet_only()
    {
        await using var visit = await browser.OpenAsync(1280, scripts: false);
        var page = visit.Page;
        await page.GotoAsync("/earthwork/test-locations?demo=strip");
        await Assertions.Expect(page.Locator("th.blank").First).ToBeHiddenAsync();
        await page.EmulateMediaAsync(new PageEmulateMediaOptions { Media = Media.Print });
        await Assertions.Expect(page.Locator("th.blank").First).ToBeVisibleAsync();
    }

    [Fact]
    public async Task The_locations_are_taken_away_as_a_table()
    {
        await using var visit = await browser.OpenAsync(1280, scripts: false);
        var page = visit.Page;
        await page.GotoAsync("/earthwork/test-locations?demo=strip");
        await Assertions.Expect(page.Locator("#answer-title")).ToHaveTextAsync("12 tests: 3 in each of 4 lifts");
        await Assertions.Expect(page.Locator(".chart .wide .mark")).ToHaveCountAsync(12);
        var download = await page.RunAndWaitForDownloadAsync(() => page.GetByRole(AriaRole.Link, new() { Name = "Locations as CSV" }).ClickAsync());
        Assert.Equal("earthwork-test-locations-locations.csv", download.SuggestedFilename);
        var lines = await File.ReadAllLinesAsync(await download.PathAsync(), TestContext.Current.CancellationToken);
        Assert.Equal(13, lines.Length);
        Assert.Equal("label,lift,station [m],offset [m]", lines[0]);
    }
}
