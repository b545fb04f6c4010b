using Microsoft.AspNetCore.Authentication;
using Microsoft.AspNetCore.Authentication.JwtBearer;
using Microsoft.AspNetCore.Authorization;

namespace Drypeak.Service.Hosting;

/// <summary>
/// Puts <see cref="AccessSettings"/> into effect. Each endpoint needs the scope <c>compute</c> unless it asks for another
/// (<c>RequireAuthorization(Scopes.Batch)</c>) or for none (<c>AllowAnonymous</c>). Where access is open, everyone has every scope.
/// </summary>
internal static class AccessControl
{
    private const string Any = "KeyOrToken";

    public static void Add(IServiceCollection services, AccessSettings access)
    {
        services.AddSingleton(access);
        services.AddAuthorization(options =>
        {
            options.FallbackPolicy = Policy(Scopes.Compute);
            options.DefaultPolicy = Policy(Scopes.Compute);
            options.AddPolicy(Scopes.Batch, Policy(Scopes.Batch));
            options.AddPolicy(Scopes.Metrics, Policy(Scopes.Metrics));
        });
        if (access.IsControlled)
        {
            AddSchemes(services, access);
        }

        if (access.AllowedOrigins.Count > 0)
        {
            services.AddCors(cors => cors.AddDefaultPolicy(policy => policy
                .WithOrigins([.. access.AllowedOrigins]).WithMethods("GET", "HEAD", "POST").WithHeaders("Accept", "Authorization", "Content-Type", "traceparent").WithExposedHeaders("ETag", "Retry-After")));
        }

        AuthorizationPolicy Policy(string scope) => new AuthorizationPolicyBuilder()
            .RequireAssertion(context => !access.IsControlled || Scopes.Has(context.User, scope)).Build();
    }

    public static void Use(WebApplication app, AccessSettings access)
    {
        if (access.AllowedOrigins.Count > 0)
        {
            app.UseCors();
        }

        if (access.IsControlled)
        {
            app.UseAuthentication();
        }

        app.UseAuthorization();
    }

    private static void AddSchemes(IServiceCollection services, AccessSettings access)
    {
        var schemes = services.AddAuthentication(Any)
            .AddScheme<AuthenticationSchemeOptions, KeyAuthentication>(KeyAuthentication.SchemeName, null)
            .AddPolicyScheme(Any, null, any => any.ForwardDefaultSelector = context =>
                access.Issuer is { } && IsToken(context.Request.Headers.Authorization) ? JwtBearerDefaults.AuthenticationScheme : KeyAuthentication.SchemeName);
        if (access.Issuer is { } issuer)
        {
            schemes.AddJwtBearer(token =>
            {
                token.Authority = issuer.Authority;
                token.Audience = issuer.Audience;
                token.RequireHttpsMetadata = !new Uri(issuer.Authority).IsLoopback;
                token.MapInboundClaims = false;
                token.TokenValidationParameters.NameClaimType = "sub";
            });
        }
    }

    /// <summary>A signed token has three parts and two points between them (RFC 7515, section 3.1); a key has none.</summary>
    private static bool IsToken(string? authorization) => authorization is { } text && text.Count(letter => letter == '.') == 2;
}
