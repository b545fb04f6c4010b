using System.Text.RegularExpressions;
using Microsoft.Playwright;
using Xunit;
using static Drypeak.Browser.Tests.PageChecks;

namespace Drypeak.Browser.Tests;

/// <summary>The pages of lots and plans in a real browser: scripts on and off, on a phone and on a desk.</summary>
public sealed partial class LotPagesTests(Browser browser)
{
    public static TheoryData<int, bool> Browsers => new() { { 360, true }, { 360, false }, { 1280, true }, { 1280, false } };

    [Theory]
    [MemberData(nameof(Browsers))]
    public async Task A_pasted_lot_is_corrected_and_decided(int width, bool scripts)
    {
        await using var visit = await browser.OpenAsync(width, scripts);
        var page = visit.Page;
        await page.GotoAsync("/lot");
        var tests = page.GetByLabel("Tests", new() { Exact = true });
        await tests.FillAsync("Test\tRelative compaction\n1\t97,2\n2\t9S,4\n3\t96,8\n4\t97,9");
        await page.GetByLabel("Mean, at least").FillAsync("96");
        await page.GetByLabel("Percent within limits: limit, at least").FillAsync("95");
        await page.GetByLabel("of the lot, at least").FillAsync("85");
        await page.GetByRole(AriaRole.Button, new() { Name = "Decide" }).ClickAsync();
        await Assertions.Expect(page).ToHaveTitleAsync(ErrorFirst());
        await page.GetByRole(AriaRole.Alert).GetByRole(AriaRole.Link).ClickAsync();
        await Assertions.Expect(tests).ToBeFocusedAsync();

        await tests.FillAsync("Test\tRelative compaction\n1\t97,2\n2\t95,4\n3\t96,8\n4\t97,9");
        await page.GetByRole(AriaRole.Button, new() { Name = "Decide" }).ClickAsync();
        await Assertions.Expect(page.Locator("#answer h2")).ToHaveTextAsync("Accepted");
        await Assertions.Expect(page.Locator("#answer .chart svg:visible")).ToHaveCountAsync(2);
        await AssertFitsAsync(page);
        await visit.AssertCleanAsync();
    }

    [Theory]
    [MemberData(nameof(Browsers))]
    public async Task A_plan_says_its_risks_and_a_design_finds_the_tests(int width, bool scripts)
    {
        await using var visit = await browser.OpenAsync(width, scripts);
        var page = visit.Page;
        await page.GotoAsync("/plan");
        await page.GetByLabel("Limit, at least").FillAsync("95");
        await page.GetByLabel("Share required").FillAsync("85");
        await page.GetByLabel("Tests in a lot").FillAsync("6");
        await page.GetByLabel("Standard deviation within a lot").FillAsync("1.8");
        await page.GetByLabel("A lot with this true level").FillAsync("98");
        await page.GetByLabel("and one with this rejected").FillAsync("95.5");
        await page.GetByRole(AriaRole.Button, new() { Name = "Compute" }).ClickAsync();
        await Assertions.Expect(page.Locator("#answer h2")).ToContainTextAsync("producer’s risk 9.9 %");

        await page.GetByRole(AriaRole.Link, new() { Name = "The fewest tests for two risks" }).ClickAsync();
        await page.GetByLabel("Rule", new() { Exact = true }).SelectOptionAsync("mean");
        await page.GetByLabel("Standard deviation within a lot").FillAsync("1.8");
        await page.GetByLabel("A lot with this true level").FillAsync("98");
        await page.GetByLabel("and one with this rejected").FillAsync("96");
        await page.GetByRole(AriaRole.Button, new() { Name = "Compute" }).ClickAsync();
        await Assertions.Expect(page.Locator("#answer h2")).ToContainTextAsync("7 tests");
        await AssertFitsAsync(page);
        await visit.AssertCleanAsync();
    }

    [Theory]
    [InlineData("/lot")]
    [InlineData("/lot?demo=accepted")]
    [InlineData("/lot?demo=rejected")]
    [InlineData("/plan")]
    [InlineData("/plan?demo=design")]
    public async Task Each_page_is_accessible_and_fits_a_phone_in_light_and_dark(string address)
    {
        foreach (var (width, scheme) in new[] { (360, ColorScheme.Light), (1280, ColorScheme.Dark) })
        {
            await using var visit = await browser.OpenAsync(width, scheme: scheme);
            await visit.Page.GotoAsync(address);
            await AssertFitsAsync(visit.Page);
            await AssertAccessibleAsync(visit.Page, $"{address} at {width}, {scheme}");
            await visit.AssertCleanAsync();
        }
    }

    [Fact]
    public async Task A_decision_prints_without_form_and_navigation()
    {
        await using var visit = await browser.OpenAsync(1280);
        await visit.Page.GotoAsync("/lot?demo=accepted");
        await visit.Page.EmulateMediaAsync(new() { Media = Media.Print });
        await Assertions.Expect(visit.Page.Locator("form.test")).ToBeHiddenAsync();
        await Assertions.Expect(visit.Page.Locator("#answer h2")).ToBeVisibleAsync();
        Assert.InRange(SheetsOf(await visit.Page.PdfAsync(new() { PreferCSSPageSize = true })), 1, 4);
    }

    [GeneratedRegex("^Error:")]
    private static partial Regex ErrorFirst();
}
