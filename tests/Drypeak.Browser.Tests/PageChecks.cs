using System.Text;
using System.Text.RegularExpressions;
using Deque.AxeCore.Playwright;
using Microsoft.Playwright;
using Xunit;

namespace Drypeak.Browser.Tests;

/// <summary>What every page of the service must keep.</summary>
internal static partial class PageChecks
{
    /// <summary>The page itself never scrolls sideways; wide tables do in their own frame.</summary>
    public static async Task AssertFitsAsync(IPage page) =>
        Assert.Equal(0, await page.EvaluateAsync<int>("Math.max(0, document.documentElement.scrollWidth - document.documentElement.clientWidth)"));

    public static async Task AssertAccessibleAsync(IPage page, string state)
    {
        var result = await page.RunAxe().WaitAsync(Browser.Patience);
        Assert.Contains(result.Passes, rule => rule.Id == "color-contrast");
        Assert.True(result.Violations.Length == 0, $"{state}: " + string.Join("; ", result.Violations.Select(
            violation => $"{violation.Id} ({violation.Help}): {string.Join(", ", violation.Nodes.Select(node => node.Html))}")));
    }

    /// <summary>Pages of a printed file.</summary>
    public static int SheetsOf(byte[] pdf) => PageObject().Count(Encoding.Latin1.GetString(pdf));

    [GeneratedRegex(@"/Type\s*/Page\b")]
    private static partial Regex PageObject();
}
