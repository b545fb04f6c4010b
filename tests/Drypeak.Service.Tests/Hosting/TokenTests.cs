using System.Security.Cryptography;
using Microsoft.AspNetCore.Builder;
using Microsoft.AspNetCore.Http;
using Microsoft.IdentityModel.JsonWebTokens;
using Microsoft.IdentityModel.Tokens;
using Xunit;

namespace Drypeak.Service.Tests.Hosting;

/// <summary>Tokens of an issuer that is found by OpenID Connect discovery, beside keys.</summary>
public sealed class TokenTests : IAsyncLifetime
{
    private const string Audience = "drypeak";

    private readonly RSA _key = RSA.Create(2048);
    private readonly RSA _otherKey = RSA.Create(2048);
    private Neighbor _issuer = null!;
    private TestService _service = null!;

    public async ValueTask InitializeAsync()
    {
        _issuer = await Neighbor.StartAsync(app =>
        {
            app.MapGet("/.well-known/openid-configuration", (HttpRequest request) => Results.Text(
                $$"""{"issuer":"http://{{request.Host}}","jwks_uri":"http://{{request.Host}}/keys"}""", "application/json"));
            app.MapGet("/keys", () =>
            {
                var key = _key.ExportParameters(includePrivateParameters: false);
                return Results.Text($$"""{"keys":[{"kty":"RSA","use":"sig","kid":"1","n":"{{Base64UrlEncoder.Encode(key.Modulus)}}","e":"{{Base64UrlEncoder.Encode(key.Exponent)}}"}]}""", "application/json");
            });
        });
        _service = await TestService.StartAsync(null, ("Access:Issuer:Authority", _issuer.Address), ("Access:Issuer:Audience", Audience));
    }

    public async ValueTask DisposeAsync()
    {
        await _service.DisposeAsync();
        await _issuer.DisposeAsync();
        _key.Dispose();
        _otherKey.Dispose();
    }

    [Theory]
    [InlineData("compute", Audience, 5, "1", "/kept", 200)]
    [InlineData("openid compute metrics", Audience, 5, "1", "/metrics", 200)]
    [InlineData("metrics", Audience, 5, "1", "/kept", 403)]
    [InlineData("computer", Audience, 5, "1", "/kept", 403)]
    [InlineData("compute", "another service", 5, "1", "/kept", 401)]
    [InlineData("compute", Audience, -60, "1", "/kept", 401)]
    [InlineData("compute", Audience, 5, "other", "/kept", 401)]
    public async Task A_token_opens_what_its_scope_says_while_it_is_valid(string scope, string audience, int minutes, string key, string address, int status)
    {
        var token = new JsonWebTokenHandler { SetDefaultTimesOnTokenCreation = false }.CreateToken(new SecurityTokenDescriptor
        {
            Issuer = _issuer.Address,
            Audience = audience,
            NotBefore = DateTime.UtcNow.AddHours(-2),
            Expires = DateTime.UtcNow.AddMinutes(minutes),
            Claims = new Dictionary<string, object> { ["sub"] = "laboratory-system", ["scope"] = scope },
            SigningCredentials = new SigningCredentials(new RsaSecurityKey(key == "1" ? _key : _otherKey) { KeyId = "1" }, SecurityAlgorithms.RsaSha256),
        });
        using var request = new HttpRequestMessage(HttpMethod.Get, address) { Headers = { { "Authorization", $"Bearer {token}" } } };
        using var answer = await _service.Client.SendAsync(request, TestContext.Current.CancellationToken);
        Assert.Equal(status, (int)answer.StatusCode);
    }
}
