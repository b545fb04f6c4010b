using System.Text.RegularExpressions;
using Microsoft.Playwright;
using Xunit;
using static Drypeak.Browser.Tests.PageChecks;

namespace Drypeak.Browser.Tests;

/// <summary>The laboratory page in a real browser.</summary>
public sealed partial class LaboratoryPageTests(Browser browser)
{
    private const string Table = "Specimen\tMold + wet soil\tTin\tTin + wet soil\tTin + dry soil\n"
        + "1\t6027\t29.42\t138.80\t129.06\n2\t6137\t33.51\t180.20\t164.53\n3\t6212\t29.04\t142.42\t128.82\n4\t6218\t32.80\t152.84\t136.50\n5\t6186\t33.28\t149.91\t132.18";

    public static TheoryData<int, bool> Browsers => new() { { 360, true }, { 360, false }, { 1280, true }, { 1280, false } };

    [Theory]
    [MemberData(nameof(Browsers))]
    public async Task A_pasted_table_is_refused_corrected_and_answered(int width, bool scripts)
    {
        await using var visit = await browser.OpenAsync(width, scripts);
        var page = visit.Page;
        await page.GotoAsync("/");
        await page.GetByLabel("Mass of the mold").FillAsync("4250");
        await page.GetByLabel("Volume of the mold").FillAsync("943.3");
        await page.GetByLabel("Specific gravity").FillAsync("2.68");
        await page.GetByLabel("Table of specimens").FillAsync(Table.Replace("6212", "6212 g", StringComparison.Ordinal));
        await page.GetByRole(AriaRole.Button, new() { Name = "Compute" }).ClickAsync();

        await Assertions.Expect(page).ToHaveTitleAsync(ErrorFirst());
        var link = page.GetByRole(AriaRole.Alert).GetByRole(AriaRole.Link);
        await Assertions.Expect(link).ToContainTextAsync("Specimen 3, Mold + wet soil");
        await link.ClickAsync();
        await Assertions.Expect(page.GetByLabel("Table of specimens")).ToBeFocusedAsync();
        await Assertions.Expect(page.GetByLabel("Mass of the mold")).ToHaveValueAsync("4250");

        await page.GetByLabel("Table of specimens").FillAsync(Table);
        await page.GetByRole(AriaRole.Button, new() { Name = "Compute" }).ClickAsync();
        await Assertions.Expect(page.Locator("#answer h2")).ToContainTextAsync("Maximum dry density 1.83 Mg/m³ at");
        await AssertChartAsync(page);
        await AssertFitsAsync(page);
        await visit.AssertCleanAsync();
    }

    [Theory]
    [MemberData(nameof(Browsers))]
    public async Task A_demo_is_one_click_away(int width, bool scripts)
    {
        await using var visit = await browser.OpenAsync(width, scripts);
        await visit.Page.GotoAsync("/");
        await visit.Page.GetByRole(AriaRole.Link, new() { Name = "five specimens from their weighings" }).ClickAsync();
        await Assertions.Expect(visit.Page.Locator("#answer h2")).ToContainTextAsync("Maximum dry density");
        await AssertChartAsync(visit.Page);
        await AssertFitsAsync(visit.Page);
        await visit.AssertCleanAsync();
    }

    [Fact]
    public async Task A_posted_answer_has_its_own_address_that_brings_it_back()
    {
        await using var visit = await browser.OpenAsync(1280);
        await visit.Page.GotoAsync("/");
        await visit.Page.GetByLabel("Table of specimens").FillAsync("10.1 1.71\n12.0 1.79\n13.8 1.83\n15.9 1.80\n18.0 1.74");
        await visit.Page.GetByRole(AriaRole.Button, new() { Name = "Compute" }).ClickAsync();
        var sentence = await visit.Page.Locator("#answer h2").TextContentAsync();
        Assert.Contains("/?test=", visit.Page.Url, StringComparison.Ordinal);

        await visit.Page.ReloadAsync();
        await Assertions.Expect(visit.Page.Locator("#answer h2")).ToHaveTextAsync(sentence!);
        await Assertions.Expect(visit.Page.GetByLabel("Table of specimens")).ToHaveValueAsync("10.1 1.71\n12.0 1.79\n13.8 1.83\n15.9 1.80\n18.0 1.74");
    }

    [Theory]
    [InlineData(360, ColorScheme.Light)]
    [InlineData(360, ColorScheme.Dark)]
    [InlineData(1280, ColorScheme.Light)]
    [InlineData(1280, ColorScheme.Dark)]
    public async Task Axe_finds_nothing_in_any_state(int width, ColorScheme scheme)
    {
        await using var visit = await browser.OpenAsync(width, scheme: scheme);
        var page = visit.Page;
        await page.GotoAsync("/");
        await AssertAccessibleAsync(page, "form");

        foreach (var summary in await page.Locator("summary").AllAsync())
        {
            await summary.ClickAsync();
        }

        await AssertAccessibleAsync(page, "form, all open");

        await page.GetByLabel("Mass of the mold").FillAsync("heavy");
        await page.GetByLabel("Table of specimens").FillAsync("Specimen\tMold + wet soil\tWater content\n1\tabc\t10\n2\t6100\tx");
        await page.GetByRole(AriaRole.Button, new() { Name = "Compute" }).ClickAsync();
        await Assertions.Expect(page.GetByRole(AriaRole.Alert)).ToBeVisibleAsync();
        await AssertAccessibleAsync(page, "errors");

        await page.GotoAsync("/");
        await page.Locator("details.grid summary").ClickAsync();
        await page.Locator("#cell-0-5").FillAsync("ten");
        await page.GetByRole(AriaRole.Button, new() { Name = "Compute" }).ClickAsync();
        await AssertAccessibleAsync(page, "an error in the grid");

        foreach (var demo in new[] { "/?demo=weighings", "/?demo=still-rising", "/?demo=stones" })
        {
            await page.GotoAsync(demo);
            await page.Locator(".readback summary").ClickAsync();
            await AssertAccessibleAsync(page, demo);
        }

        await page.GotoAsync("/no-such-page");
        await AssertAccessibleAsync(page, "not found");
    }

    [Fact]
    public async Task A_test_is_computed_by_the_keyboard_alone()
    {
        await using var visit = await browser.OpenAsync(1280, scripts: false);
        var page = visit.Page;
        await page.GotoAsync("/");
        await page.Keyboard.PressAsync("Tab");
        await Assertions.Expect(page.GetByRole(AriaRole.Link, new() { Name = "Skip to the page" })).ToBeFocusedAsync();
        await page.Keyboard.PressAsync("Enter");
        await TypeIntoAsync(page, "reference", "Ternmarsh, by keyboard");
        await TypeIntoAsync(page, "mold-mass", "4250");
        await TypeIntoAsync(page, "mold-volume", "943.3");
        await TypeIntoAsync(page, "table", "1 6027 29.42 138.80 129.06\n2 6137 33.51 180.20 164.53\n3 6212 29.04 142.42 128.82\n4 6218 32.80 152.84 136.50");
        await TabToAsync(page, "button.main");
        var outline = await page.EvaluateAsync<string>("getComputedStyle(document.activeElement).outlineStyle");
        Assert.Equal("solid", outline);
        await page.Keyboard.PressAsync("Enter");
        await Assertions.Expect(page.Locator("#answer .reference")).ToHaveTextAsync("Ternmarsh, by keyboard");
    }

    [Theory]
    [InlineData(true)]
    [InlineData(false)]
    public async Task Enter_in_a_field_computes(bool scripts)
    {
        await using var visit = await browser.OpenAsync(1280, scripts);
        await visit.Page.GotoAsync("/");
        await visit.Page.GetByLabel("Table of specimens").FillAsync("10.1 1.71\n12.0 1.79\n13.8 1.83\n15.9 1.80");
        await visit.Page.GetByLabel("Reference").PressAsync("Enter");
        await Assertions.Expect(visit.Page.Locator("#answer h2")).ToBeVisibleAsync();
    }

    [Fact]
    public async Task The_grid_is_moved_in_by_arrows_and_takes_a_pasted_block()
    {
        await using var visit = await browser.OpenAsync(1280);
        var page = visit.Page;
        await page.GotoAsync("/");
        await page.Locator("details.grid summary").ClickAsync();
        await page.Locator("#cell-0-5").FocusAsync();
        await page.Keyboard.TypeAsync("10.1");
        await page.Keyboard.PressAsync("Enter");
        await Assertions.Expect(page.Locator("#cell-1-5")).ToBeFocusedAsync();
        await page.Keyboard.PressAsync("ArrowUp");
        await Assertions.Expect(page.Locator("#cell-0-5")).ToBeFocusedAsync();
        await page.Keyboard.PressAsync("End");
        await page.Keyboard.PressAsync("ArrowRight");
        await Assertions.Expect(page.Locator("#cell-0-6")).ToBeFocusedAsync();

        await PasteAsync(page, "#cell-1-5", "12.0\t\t1.79\n13.8\t\t1.83\n15.9\t\t1.80\n18.0\t\t1.74\n19.0\t\t1.70\n20.0\t\t1.67\n21.0\t\t1.63\n");
        await page.Locator("#cell-0-7").FillAsync("1.71");
        await Assertions.Expect(page.Locator("#cell-7-7")).ToHaveValueAsync("1.63");
        await page.GetByRole(AriaRole.Button, new() { Name = "Compute" }).ClickAsync();
        await Assertions.Expect(page.Locator(".specimens tbody tr")).ToHaveCountAsync(8);
        await visit.AssertCleanAsync();
    }

    [Fact]
    public async Task A_block_wider_than_the_grid_goes_to_the_table()
    {
        await using var visit = await browser.OpenAsync(1280);
        var page = visit.Page;
        await page.GotoAsync("/");
        await page.Locator("details.grid summary").ClickAsync();
        await PasteAsync(page, "#cell-0-5", Table);
        await Assertions.Expect(page.GetByLabel("Table of specimens")).ToHaveValueAsync(Table);
        await Assertions.Expect(page.Locator("#cell-0-5")).ToHaveValueAsync("");
    }

    [Theory]
    [InlineData("/?demo=weighings")]
    [InlineData("/?demo=stones")]
    public async Task A_usual_test_prints_on_one_sheet(string address)
    {
        await using var visit = await browser.OpenAsync(1280);
        await visit.Page.GotoAsync(address);
        var pdf = await visit.Page.PdfAsync(new PagePdfOptions { Format = "A4", PreferCSSPageSize = true });
        Assert.Equal(1, SheetsOf(pdf));
    }

    [Fact]
    public async Task Print_has_the_answer_and_no_form_navigation_or_button()
    {
        await using var visit = await browser.OpenAsync(1280);
        var page = visit.Page;
        await page.GotoAsync("/?demo=weighings");
        await page.EmulateMediaAsync(new PageEmulateMediaOptions { Media = Media.Print });
        foreach (var hidden in new[] { "nav", "button", "input", "textarea", "select", "footer", ".away", ".skip" })
        {
            foreach (var element in await page.Locator(hidden).AllAsync())
            {
                await Assertions.Expect(element).ToBeHiddenAsync();
            }
        }

        await Assertions.Expect(page.Locator("#answer h2")).ToBeVisibleAsync();
        await AssertChartAsync(page);
    }

    [Theory]
    [InlineData("/")]
    [InlineData("/?demo=weighings")]
    [InlineData("/?demo=still-rising")]
    public async Task At_320_px_and_at_twice_the_text_nothing_is_cut(string address)
    {
        await using var visit = await browser.OpenAsync(320);
        await visit.Page.GotoAsync(address);
        await AssertFitsAsync(visit.Page);
        await visit.Page.EvaluateAsync("document.documentElement.style.setProperty('font-size', '34px')");
        await visit.Page.SetViewportSizeAsync(640, 800);
        await AssertFitsAsync(visit.Page);
    }

    [Theory]
    [InlineData(360, 44)]
    [InlineData(1280, 24)]
    public async Task Targets_are_large_enough(int width, int least)
    {
        await using var visit = await browser.OpenAsync(width);
        var page = visit.Page;
        await page.GotoAsync("/?demo=still-rising");
        foreach (var summary in await page.Locator("summary").AllAsync())
        {
            await summary.ClickAsync();
        }

        foreach (var control in await page.Locator("input[type=text]:visible, select:visible, textarea:visible, button:visible, summary:visible, .check:visible, .away a:visible").AllAsync())
        {
            var box = await control.BoundingBoxAsync();
            var text = await control.TextContentAsync();

            // A link in running text is as high as its line (WCAG 2.2, 2.5.8, exception "inline").
            if (text != "Link to this answer")
            {
                Assert.True(box!.Height >= least - 0.5, $"{await control.GetAttributeAsync("id")} {text}: {box.Height} px");
            }
        }
    }

    [Fact]
    public async Task No_text_of_a_page_is_under_13_px()
    {
        foreach (var width in new[] { 360, 1280 })
        {
            await using var visit = await browser.OpenAsync(width);
            await visit.Page.GotoAsync("/?demo=still-rising");
            var smallest = await visit.Page.EvaluateAsync<double>(
                "Math.min(...[...document.querySelectorAll('body *:not(svg):not(svg *)')].filter(e => e.textContent.trim() && e.getClientRects().length).map(e => parseFloat(getComputedStyle(e).fontSize)))");
            Assert.True(smallest >= 13, $"{smallest} px at {width} px");
        }
    }

    private static async Task AssertChartAsync(IPage page)
    {
        var chart = page.Locator(".chart svg:visible");
        await Assertions.Expect(chart).ToHaveCountAsync(1);
        await Assertions.Expect(chart.Locator("title")).ToContainTextAsync("Maximum dry density");
        Assert.True(await chart.Locator("[data-x]").CountAsync() >= 5);
        Assert.True((await chart.BoundingBoxAsync())!.Width > 250);
    }

    private static async Task TypeIntoAsync(IPage page, string id, string text)
    {
        await TabToAsync(page, "#" + id);
        await page.Keyboard.TypeAsync(text);
    }

    private static async Task TabToAsync(IPage page, string selector)
    {
        for (var presses = 0; presses < 100; presses++)
        {
            await page.Keyboard.PressAsync("Tab");
            if (await page.Locator(selector + ":focus").CountAsync() == 1)
            {
                return;
            }
        }

        Assert.Fail($"{selector} is not reached by Tab.");
    }

    private static async Task PasteAsync(IPage page, string selector, string text) => await page.Locator(selector).EvaluateAsync(
        """
        (input, text) => {
          input.focus();
          const data = new DataTransfer();
          data.setData('text/plain', text);
          input.dispatchEvent(new ClipboardEvent('paste', { clipboardData: data, bubbles: true, cancelable: true }));
        }
        """, text);

    [GeneratedRegex("^Error:")]
    private static partial Regex ErrorFirst();
}
