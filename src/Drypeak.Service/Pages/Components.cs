using System.Text.Encodings.Web;
using System.Text.Unicode;

namespace Drypeak.Service.Pages;

/// <summary>What the components are given: they compute nothing and fetch nothing, so it is only the encoder.</summary>
internal static class Components
{
    /// <summary>Letters of every language stand as themselves: the pages are UTF-8. What HTML reserves is still escaped.</summary>
    public static IServiceProvider Services { get; } =
        new ServiceCollection().AddSingleton(HtmlEncoder.Create(UnicodeRanges.All)).BuildServiceProvider();
}
