using System.Text.RegularExpressions;
using Microsoft.Playwright;
using Xunit;
using static Drypeak.Browser.Tests.PageChecks;

namespace Drypeak.Browser.Tests;

/// <summary>The pages of the field test and of its references in a real browser: scripts on and off, on a phone and on a desk.</summary>
public sealed partial class FieldPagesTests(Browser browser)
{
    public static TheoryData<int, bool> Browsers => new() { { 360, true }, { 360, false }, { 1280, true }, { 1280, false } };

    private static readonly string[] Answered =
    [
        "/field?demo=accepted", "/field?demo=rejected", "/field?demo=undecided", "/field?demo=on-its-curve",
        "/one-point?demo=between", "/one-point?demo=too-dry", "/rapid-method?demo=known", "/rapid-method?demo=rising", "/relative-density?demo=loose",
    ];

    [Theory]
    [MemberData(nameof(Browsers))]
    public async Task A_lift_is_rejected_corrected_and_accepted(int width, bool scripts)
    {
        await using var visit = await browser.OpenAsync(width, scripts);
        var page = visit.Page;
        await page.GotoAsync("/field");
        await page.GetByRole(AriaRole.Link, new() { Name = "Drive cylinder" }).ClickAsync();
        await page.GetByLabel("Volume", new() { Exact = true }).FillAsync("1000");
        await page.GetByLabel("Wet soil out of the hole").FillAsync("1,99x");
        await page.GetByLabel("Moisture tins").FillAsync("31.2 152.4 137.9");
        await page.GetByLabel("Maximum dry density", new() { Exact = true }).FillAsync("1.83");
        await page.GetByLabel("Relative compaction at least").FillAsync("95");
        await page.GetByRole(AriaRole.Button, new() { Name = "Decide" }).ClickAsync();

        await Assertions.Expect(page).ToHaveTitleAsync(ErrorFirst());
        await page.GetByRole(AriaRole.Alert).GetByRole(AriaRole.Link).ClickAsync();
        await Assertions.Expect(page.GetByLabel("Wet soil out of the hole")).ToBeFocusedAsync();
        await page.GetByLabel("Wet soil out of the hole").FillAsync("1890");
        await page.GetByRole(AriaRole.Button, new() { Name = "Decide" }).ClickAsync();
        await Assertions.Expect(page.Locator("#answer h2")).ToHaveTextAsync("Rejected");
        await Assertions.Expect(page.Locator("#answer h2")).ToBeInViewportAsync();
        await Assertions.Expect(page.Locator("#answer .corrected")).ToContainTextAsync("Roll the lift again");

        await page.GetByLabel("Wet soil out of the hole").FillAsync("2010");
        await page.GetByRole(AriaRole.Button, new() { Name = "Decide" }).ClickAsync();
        await Assertions.Expect(page.Locator("#answer h2")).ToHaveTextAsync("Accepted");
        await AssertChartAsync(page);
        await AssertFitsAsync(page);
        await visit.AssertCleanAsync();
    }

    [Theory]
    [MemberData(nameof(Browsers))]
    public async Task A_lift_is_held_against_the_link_of_its_laboratory_test(int width, bool scripts)
    {
        await using var visit = await browser.OpenAsync(width, scripts);
        var page = visit.Page;
        await page.GotoAsync("/?demo=weighings");
        var link = await page.GetByRole(AriaRole.Link, new() { Name = "Link to this answer" }).GetAttributeAsync("href");
        await page.GotoAsync("/field?method=direct");
        await page.GetByLabel("or dry density").FillAsync("1.79");
        await page.GetByLabel("Water content", new() { Exact = true }).FillAsync("13");
        await page.GetByLabel("or a whole laboratory test").FillAsync("https://ternmarsh.example" + link);
        await page.GetByLabel("Relative compaction at least").FillAsync("95");
        await page.GetByRole(AriaRole.Button, new() { Name = "Decide" }).ClickAsync();
        await Assertions.Expect(page.Locator("#answer h2")).ToHaveTextAsync("Accepted");

        // The laboratory's five specimens and the field test.
        await Assertions.Expect(page.Locator(".chart svg:visible [data-x]")).ToHaveCountAsync(6);
        await AssertFitsAsync(page);
        await visit.AssertCleanAsync();
    }

    [Theory]
    [MemberData(nameof(Browsers))]
    public async Task One_point_chooses_a_curve_of_a_pasted_family(int width, bool scripts)
    {
        await using var visit = await browser.OpenAsync(width, scripts);
        var page = visit.Page;
        await page.GotoAsync("/one-point");
        await page.GetByLabel("Water content", new() { Exact = true }).FillAsync("12,9");
        await page.GetByLabel("Wet density", new() { Exact = true }).FillAsync("2,0");
        await page.GetByLabel("Curves", new() { Exact = true }).FillAsync("Curve\tOptimum water content\tMaximum dry density [kg/m3]\nA\t11,8\t1930\nB\t13,9\t183O\nC\t16,6\t1730");
        await page.GetByRole(AriaRole.Button, new() { Name = "Choose" }).ClickAsync();
        var wrong = page.GetByRole(AriaRole.Alert).GetByRole(AriaRole.Link);
        await Assertions.Expect(wrong).ToContainTextAsync("Row 2, Maximum dry density");
        await wrong.ClickAsync();
        await Assertions.Expect(page.GetByLabel("Curves", new() { Exact = true })).ToBeFocusedAsync();
        await page.GetByLabel("Curves", new() { Exact = true }).FillAsync("Curve\tOptimum water content\tMaximum dry density [kg/m3]\nA\t11,8\t1930\nB\t13,9\t1830\nC\t16,6\t1730");
        await page.GetByRole(AriaRole.Button, new() { Name = "Choose" }).ClickAsync();
        await Assertions.Expect(page.Locator("#answer h2")).ToContainTextAsync("Maximum dry density 1.");
        await Assertions.Expect(page.Locator("#answer .sure")).ToContainTextAsync("Between B and C");
        await AssertChartAsync(page);
        await AssertFitsAsync(page);
        await visit.AssertCleanAsync();
    }

    [Theory]
    [MemberData(nameof(Browsers))]
    public async Task The_rapid_method_answers_from_three_specimens(int width, bool scripts)
    {
        await using var visit = await browser.OpenAsync(width, scripts);
        var page = visit.Page;
        await page.GotoAsync("/rapid-method");
        await page.GetByLabel("Wet density in place").FillAsync("2.033");
        await page.GetByLabel("Specimens of the field's soil").FillAsync("0 2.045\n2 2.129\n4 2.132");
        await page.GetByLabel("Show the working").CheckAsync();
        await page.GetByRole(AriaRole.Button, new() { Name = "Compute" }).ClickAsync();
        await Assertions.Expect(page.Locator("#answer h2")).ToContainTextAsync("Density ratio 97.4 %");
        await Assertions.Expect(page.Locator(".working li")).ToHaveCountAsync(7);
        await AssertChartAsync(page);
        await AssertFitsAsync(page);
        await visit.AssertCleanAsync();
    }

    [Theory]
    [MemberData(nameof(Browsers))]
    public async Task Relative_density_and_compaction_stand_side_by_side(int width, bool scripts)
    {
        await using var visit = await browser.OpenAsync(width, scripts);
        var page = visit.Page;
        await page.GotoAsync("/relative-density");
        await page.GetByLabel("Dry density", new() { Exact = true }).FillAsync("1.68");
        await page.GetByLabel("Minimum dry density").FillAsync("1.49");
        await page.GetByLabel("Maximum dry density").FillAsync("1.78");
        await page.GetByRole(AriaRole.Button, new() { Name = "Compute" }).ClickAsync();

        // (1.78/1.68)(1.68 − 1.49)/(1.78 − 1.49) = 69.4 %, 1.68/1.78 = 94.4 %.
        await Assertions.Expect(page.Locator("#answer h2")).ToHaveTextAsync("Relative density 69.4 %, relative compaction 94.4 %");
        await AssertFitsAsync(page);
        await visit.AssertCleanAsync();
    }

    [Fact]
    public async Task A_unit_follows_its_choice_with_scripts_and_is_left_out_without()
    {
        await using (var visit = await browser.OpenAsync(1280))
        {
            await visit.Page.GotoAsync("/rapid-method");
            await visit.Page.GetByLabel("Densities in").SelectOptionAsync("lb/ft3");
            await Assertions.Expect(visit.Page.Locator("#wet-density-unit-name")).ToHaveTextAsync("lb/ft³");
        }

        await using var without = await browser.OpenAsync(1280, scripts: false);
        await without.Page.GotoAsync("/rapid-method");
        await Assertions.Expect(without.Page.Locator("#wet-density-unit-name")).ToBeHiddenAsync();
    }

    [Theory]
    [InlineData(360, ColorScheme.Light)]
    [InlineData(1280, ColorScheme.Dark)]
    public async Task Axe_finds_nothing_and_nothing_is_cut_or_too_small(int width, ColorScheme scheme)
    {
        await using var visit = await browser.OpenAsync(width, scheme: scheme);
        foreach (var address in (string[])[.. Answered, "/field", "/one-point?family-given=tests", "/rapid-method", "/relative-density"])
        {
            await visit.Page.GotoAsync(address);
            foreach (var summary in await visit.Page.Locator("main summary").AllAsync())
            {
                await summary.ClickAsync();
            }

            await AssertAccessibleAsync(visit.Page, address);
            await AssertFitsAsync(visit.Page);
            var smallest = await visit.Page.EvaluateAsync<double>(
                "Math.min(...[...document.querySelectorAll('body *:not(svg):not(svg *)')].filter(e => e.textContent.trim() && e.getClientRects().length).map(e => parseFloat(getComputedStyle(e).fontSize)))");
            Assert.True(smallest >= 13, $"{address}: {smallest} px");
        }

        await visit.Page.GotoAsync("/field");
        await visit.Page.GetByRole(AriaRole.Button, new() { Name = "Decide" }).ClickAsync();
        await Assertions.Expect(visit.Page.GetByRole(AriaRole.Alert)).ToBeVisibleAsync();
        await AssertAccessibleAsync(visit.Page, "errors");
        await visit.AssertCleanAsync();
    }

    [Fact]
    public async Task At_320_px_nothing_is_cut_and_every_answer_prints_without_form_or_navigation_on_two_sheets_at_most()
    {
        await using var visit = await browser.OpenAsync(320);
        foreach (var address in Answered)
        {
            await visit.Page.GotoAsync(address);
            await AssertFitsAsync(visit.Page);
            Assert.InRange(SheetsOf(await visit.Page.PdfAsync(new PagePdfOptions { Format = "A4", PreferCSSPageSize = true })), 1, 2);
        }

        await visit.Page.EmulateMediaAsync(new PageEmulateMediaOptions { Media = Media.Print });
        foreach (var hidden in new[] { "nav", "button", "input", "textarea", "select", "footer", ".away", ".skip" })
        {
            foreach (var element in await visit.Page.Locator(hidden).AllAsync())
            {
                await Assertions.Expect(element).ToBeHiddenAsync();
            }
        }

        await Assertions.Expect(visit.Page.Locator("#answer h2")).ToBeVisibleAsync();
    }

    private static async Task AssertChartAsync(IPage page)
    {
        var chart = page.Locator(".chart svg:visible");
        await Assertions.Expect(chart).ToHaveCountAsync(1);
        Assert.True((await chart.BoundingBoxAsync())!.Width > 250);

        // The page's own styles must not reach into the picture: its marks stay filled.
        var hollow = await chart.Locator("[data-x]:not([fill=none])").EvaluateAllAsync<int>("marks => marks.filter(mark => getComputedStyle(mark).fill === 'none').length");
        Assert.Equal(0, hollow);
    }

    [GeneratedRegex("^Error:")]
    private static partial Regex ErrorFirst();
}
