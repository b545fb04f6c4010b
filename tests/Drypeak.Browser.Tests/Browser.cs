using Microsoft.AspNetCore.Mvc.Testing;
using Microsoft.Playwright;
using Xunit;

[assembly: AssemblyFixture(typeof(Drypeak.Browser.Tests.Browser))]

namespace Drypeak.Browser.Tests;

/// <summary>The service on a real port, and one Chromium that opens it. Each test has a context of its own.</summary>
public sealed class Browser : IAsyncLifetime
{
    /// <summary>Longer than anything here takes; a browser that hangs fails its test, and not the whole run.</summary>
    public static readonly TimeSpan Patience = TimeSpan.FromSeconds(30);

    private static readonly string[] Arguments =
    [
        "--no-sandbox", "--disable-gpu", "--disable-quic", "--no-first-run", "--disable-background-networking", "--disable-component-update", "--disable-sync",
    ];

    private readonly WebApplicationFactory<Program> _service = new();
    private IPlaywright? _playwright;
    private IBrowser? _chromium;

    /// <summary>The service's own address.</summary>
    public Uri Address => _service.ClientOptions.BaseAddress;

    public async ValueTask InitializeAsync()
    {
        _service.UseKestrel(0);
        _service.StartServer();
        _playwright = await Playwright.CreateAsync().WaitAsync(Patience);
        _chromium = await _playwright.Chromium.LaunchAsync(new BrowserTypeLaunchOptions
        {
            ExecutablePath = Environment.GetEnvironmentVariable("CHROMIUM") ?? "/usr/bin/chromium",
            Args = Arguments,
        }).WaitAsync(Patience);
    }

    public async ValueTask DisposeAsync()
    {
        if (_chromium is not null)
        {
            await _chromium.DisposeAsync();
        }

        _playwright?.Dispose();
        await _service.DisposeAsync();
    }

    /// <summary>A new, empty browser at the service's address.</summary>
    public async Task<Visit> OpenAsync(int width, bool scripts = true, ColorScheme scheme = ColorScheme.Light)
    {
        var context = await _chromium!.NewContextAsync(new BrowserNewContextOptions
        {
            BaseURL = Address.ToString(),
            ViewportSize = new ViewportSize { Width = width, Height = 800 },
            JavaScriptEnabled = scripts,
            ColorScheme = scheme,
        }).WaitAsync(Patience);
        context.SetDefaultTimeout((float)Patience.TotalMilliseconds);
        return new Visit(context, await context.NewPageAsync().WaitAsync(Patience), Address);
    }
}

/// <summary>One visitor: a page, with what it asked for and what it complained of.</summary>
public sealed class Visit : IAsyncDisposable
{
    private readonly IBrowserContext _context;

    public Visit(IBrowserContext context, IPage page, Uri address)
    {
        (_context, Page) = (context, page);
        page.Request += (_, request) =>
        {
            if (!request.Url.StartsWith(address.ToString(), StringComparison.Ordinal))
            {
                Elsewhere.Add(request.Url);
            }
        };
        page.Console += (_, message) =>
        {
            // The browser reports the status of a refused form as if it were a fault of the page.
            if (message.Type == "error" && !message.Text.Contains("the server responded with a status of 4", StringComparison.Ordinal))
            {
                Complaints.Add(message.Text);
            }
        };
        page.PageError += (_, error) => Complaints.Add(error);
    }

    public IPage Page { get; }

    /// <summary>Addresses outside the service that were asked for.</summary>
    public List<string> Elsewhere { get; } = [];

    /// <summary>What the browser's console reports as errors: a breach of the content security policy among them.</summary>
    public List<string> Complaints { get; } = [];

    /// <summary>Holds what is true of every visit: nothing from elsewhere, no complaint, no cookie.</summary>
    public async Task AssertCleanAsync()
    {
        Assert.Empty(Elsewhere);
        Assert.Empty(Complaints);
        Assert.Empty(await _context.CookiesAsync());
    }

    public async ValueTask DisposeAsync() => await _context.CloseAsync();
}
