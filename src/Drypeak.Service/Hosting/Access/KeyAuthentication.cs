using System.Buffers.Text;
using System.Net.Http.Headers;
using System.Security.Claims;
using System.Security.Cryptography;
using System.Text;
using System.Text.Encodings.Web;
using Microsoft.AspNetCore.Authentication;
using Microsoft.Extensions.Options;

namespace Drypeak.Service.Hosting;

/// <summary>
/// Tells by a key who asks: <c>Authorization: Bearer KEY</c> (RFC 6750) from programs, or as the password of <c>Basic</c> (RFC 7617) from
/// browsers, whose own dialog then opens the pages without a cookie.
/// </summary>
internal sealed class KeyAuthentication(
    IOptionsMonitor<AuthenticationSchemeOptions> options, ILoggerFactory logger, UrlEncoder encoder, AccessSettings access)
    : AuthenticationHandler<AuthenticationSchemeOptions>(options, logger, encoder)
{
    public const string SchemeName = "Key";

    private readonly (byte[] Digest, KeySettings Key)[] _keys = [.. access.Keys.Select(key => (Convert.FromHexString(key.Sha256), key))];

    protected override Task<AuthenticateResult> HandleAuthenticateAsync() => Task.FromResult(
        KeyIn(Request.Headers.Authorization) is not { } shown ? AuthenticateResult.NoResult()
        : Find(shown) is { } key ? AuthenticateResult.Success(new AuthenticationTicket(Caller(key), Scheme.Name))
        : AuthenticateResult.Fail("The key is not known."));

    protected override Task HandleChallengeAsync(AuthenticationProperties properties)
    {
        Response.StatusCode = StatusCodes.Status401Unauthorized;
        Response.Headers.Append("WWW-Authenticate", "Bearer realm=\"Drypeak\"");
        // Only who asks for a page has a dialog to type a key into.
        if (Negotiation.Choose(Request, Problem.MediaType, "text/html") == "text/html")
        {
            Response.Headers.Append("WWW-Authenticate", "Basic realm=\"Drypeak\", charset=\"UTF-8\"");
        }

        return Task.CompletedTask;
    }

    private static string? KeyIn(string? authorization) => AuthenticationHeaderValue.TryParse(authorization, out var shown) ? shown.Scheme.ToUpperInvariant() switch
    {
        "BEARER" => shown.Parameter,
        "BASIC" => PasswordIn(shown.Parameter),
        _ => null,
    } : null;

    private static string? PasswordIn(string? pair)
    {
        var bytes = new byte[Base64.GetMaxDecodedFromUtf8Length(pair?.Length ?? 0)];
        return Convert.TryFromBase64String(pair ?? "", bytes, out var length) && Encoding.UTF8.GetString(bytes, 0, length).Split(':', 2) is [_, var password]
            ? password
            : null;
    }

    /// <summary>The key whose digest is that of what was shown. All are compared, and each in constant time, so that the time tells nothing.</summary>
    private KeySettings? Find(string shown)
    {
        Span<byte> digest = stackalloc byte[SHA256.HashSizeInBytes];
        SHA256.HashData(Encoding.UTF8.GetBytes(shown), digest);
        KeySettings? found = null;
        foreach (var (known, key) in _keys)
        {
            found = CryptographicOperations.FixedTimeEquals(known, digest) ? key : found;
        }

        return found;
    }

    private ClaimsPrincipal Caller(KeySettings key) =>
        new(new ClaimsIdentity([new Claim("name", key.Name), new Claim("scope", key.Scopes)], Scheme.Name, "name", null));
}
