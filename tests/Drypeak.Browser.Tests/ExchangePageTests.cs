using System.Text;
using Microsoft.Playwright;
using Xunit;

namespace Drypeak.Browser.Tests;

public sealed class ExchangePageTests(Browser browser)
{
    [Theory]
    [InlineData(360, ColorScheme.Light)]
    [InlineData(1280, ColorScheme.Light)]
    [InlineData(1280, ColorScheme.Dark)]
    public async Task The_page_is_accessible_and_fits_empty_answered_and_refused(int width, ColorScheme scheme)
    {
        await using var visit = await browser.OpenAsync(width, scheme: scheme);
        foreach (var (state, address) in new[] { ("empty", "/exchange"), ("CSV", "/exchange?demo=csv"), ("AGS4", "/exchange?demo=ags4") })
        {
            await visit.Page.GotoAsync(address);
            await PageChecks.AssertFitsAsync(visit.Page);
            await PageChecks.AssertAccessibleAsync(visit.Page, state);
        }

        await visit.Page.GotoAsync("/exchange");
        await visit.Page.FillAsync("#text", "waterContent,colour\n10,red\n");
        await visit.Page.ClickAsync("button.main");
        Assert.StartsWith("Error:", await visit.Page.TitleAsync(), StringComparison.Ordinal);
        await PageChecks.AssertFitsAsync(visit.Page);
        await PageChecks.AssertAccessibleAsync(visit.Page, "refused");
    }

    [Fact]
    public async Task A_file_is_uploaded_and_taken_away_without_scripts()
    {
        await using var visit = await browser.OpenAsync(1280, scripts: false);
        await visit.Page.GotoAsync("/exchange");
        await visit.Page.SetInputFilesAsync("#file", new FilePayload
        {
            Name = "tests.csv",
            MimeType = "text/csv",
            Buffer = Encoding.UTF8.GetBytes("reference;waterContent [%];dryDensity [Mg/m3]\r\nB;10,5;1,75\r\nB;12;1,82\r\nB;14;1,86\r\nB;16;1,83\r\n"),
        });
        await visit.Page.ClickAsync("button.main");
        Assert.Equal("1 compaction test computed.", await visit.Page.InnerTextAsync("#answer h2"));

        var download = await visit.Page.RunAndWaitForDownloadAsync(() => visit.Page.ClickAsync("#answer .away a"));
        Assert.Equal("computed.csv", download.SuggestedFilename);
        await using var file = await download.CreateReadStreamAsync();
        using var reader = new StreamReader(file);
        Assert.StartsWith("reference,method,label,", await reader.ReadLineAsync(TestContext.Current.CancellationToken), StringComparison.Ordinal);
    }
}
