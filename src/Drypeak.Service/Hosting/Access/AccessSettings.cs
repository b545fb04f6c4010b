using System.ComponentModel.DataAnnotations;
using System.Net;
using System.Text.RegularExpressions;

namespace Drypeak.Service.Hosting;

/// <summary>
/// Who may ask: the section <c>Access</c> of the configuration. Without keys and without an issuer everyone may, and the service then
/// listens on loopback addresses only, unless <see cref="AllowOpen"/> says otherwise.
/// </summary>
public sealed partial record AccessSettings
{
    public const string Section = "Access";

    private const int KeysOfOneName = 2;

    /// <summary>Listen beyond loopback though everyone may ask: because a firewall, a container's network or a proxy guards the address.</summary>
    public bool AllowOpen { get; init; }

    /// <summary>Keys. Two of the same name are valid at once, so that a key can be changed without a gap.</summary>
    public IReadOnlyList<KeySettings> Keys { get; init; } = [];

    /// <summary>Who issues tokens that are taken too, or null.</summary>
    public IssuerSettings? Issuer { get; init; }

    /// <summary>Origins whose pages may read answers in a browser (CORS), such as <c>https://lab.example</c>. None by default.</summary>
    public IReadOnlyList<string> AllowedOrigins { get; init; } = [];

    /// <summary>Whether a caller must show who they are.</summary>
    public bool IsControlled => Keys.Count > 0 || Issuer is { };

    /// <summary>The settings of a configuration.</summary>
    /// <exception cref="ValidationException">A setting cannot be meant so; the message says which and what to write.</exception>
    /// <exception cref="InvalidOperationException">The section has a name that is no setting.</exception>
    public static AccessSettings From(IConfiguration configuration)
    {
        var settings = configuration.GetSection(Section).Get<AccessSettings>(binder => binder.ErrorOnUnknownConfiguration = true) ?? new AccessSettings();
        return settings.Faults().FirstOrDefault() is { } fault ? throw new ValidationException($"{Section}: {fault}") : settings;
    }

    /// <summary>Ends the start where the service would be open to a network without having been told so.</summary>
    /// <exception cref="InvalidOperationException">It would.</exception>
    public void RefuseOpenAddress(EndPoint? address)
    {
        if (address is IPEndPoint { Address: var ip } && !IPAddress.IsLoopback(ip) && !IsControlled && !AllowOpen)
        {
            throw new InvalidOperationException(
                $"Without keys the service listens on loopback addresses only, not on {address}. Configure {Section}:Keys or {Section}:Issuer, "
                + $"or set {Section}:{nameof(AllowOpen)} to true ({Section}__{nameof(AllowOpen)}=true) where something else guards the address.");
        }
    }

    private IEnumerable<string> Faults()
    {
        foreach (var key in Keys)
        {
            if (string.IsNullOrWhiteSpace(key.Name))
            {
                yield return "Give each key a name; it stands in the log in place of the key.";
            }

            if (!Sha256().IsMatch(key.Sha256))
            {
                yield return $"The key {key.Name} needs its SHA-256 as 64 hexadecimal digits, and never itself: printf %s \"$KEY\" | sha256sum";
            }

            if (Scopes.Of(key.Scopes).Except(Scopes.All).ToList() is [var unknown, ..] || !Scopes.Of(key.Scopes).Any())
            {
                yield return $"The key {key.Name} needs scopes, some of {string.Join(" ", Scopes.All)}, parted by spaces; \"{key.Scopes}\" was given.";
            }
        }

        foreach (var name in Keys.GroupBy(key => key.Name).Where(keys => keys.Count() > KeysOfOneName).Select(keys => keys.Key))
        {
            yield return $"Up to {KeysOfOneName} keys may have the name {name}: the old one and the new one while it is changed.";
        }

        if (Issuer is { } issuer && (!Uri.TryCreate(issuer.Authority, UriKind.Absolute, out _) || string.IsNullOrWhiteSpace(issuer.Audience)))
        {
            yield return "An issuer needs Authority, its address, and Audience, the name that its tokens have for this service.";
        }

        foreach (var origin in AllowedOrigins.Where(origin => !Uri.TryCreate(origin, UriKind.Absolute, out var uri) || uri.GetLeftPart(UriPartial.Authority) != origin))
        {
            yield return $"An origin is scheme, host and port, such as https://lab.example; \"{origin}\" was given.";
        }
    }

    [GeneratedRegex("^[0-9a-fA-F]{64}$")]
    private static partial Regex Sha256();
}

/// <summary>A key: who holds it and what it opens.</summary>
public sealed record KeySettings
{
    /// <summary>Who holds it, for the log.</summary>
    public string Name { get; init; } = "";

    /// <summary>
    /// SHA-256 of the key, in hexadecimal. A fast digest is right here, since a key is 256 bits from a random generator
    /// (<c>openssl rand -base64 32</c>) and no word that could be guessed: slowness would protect nothing, and cost each request.
    /// </summary>
    public string Sha256 { get; init; } = "";

    /// <summary>What it opens, parted by spaces. Default: <c>compute batch</c>.</summary>
    public string Scopes { get; init; } = $"{Hosting.Scopes.Compute} {Hosting.Scopes.Batch}";
}

/// <summary>Who issues bearer tokens (RFC 9068, signed JWT), by OpenID Connect discovery.</summary>
public sealed record IssuerSettings
{
    /// <summary>Its address; <c>/.well-known/openid-configuration</c> is read below it. HTTPS, except on loopback.</summary>
    public string Authority { get; init; } = "";

    /// <summary>What its tokens call this service.</summary>
    public string Audience { get; init; } = "";
}
