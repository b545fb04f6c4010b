using System.ComponentModel.DataAnnotations;
using System.Globalization;

namespace Drypeak.Service.Hosting;

/// <summary>
/// Where to report a vulnerability: <c>/.well-known/security.txt</c> (RFC 9116), from the section <c>SecurityContact</c> of the
/// configuration; 404 where none is configured. Whoever runs the service writes the date, so that every replica gives the same bytes.
/// </summary>
internal sealed record SecurityContact
{
    public const string Section = "SecurityContact";

    /// <summary>An address as a URI: <c>mailto:</c>, <c>https:</c> or <c>tel:</c>.</summary>
    public string Contact { get; init; } = "";

    /// <summary>Until when the address holds, such as <c>2027-06-30T00:00:00Z</c> (RFC 3339); RFC 9116 advises less than a year ahead.</summary>
    public string Expires { get; init; } = "";

    /// <exception cref="ValidationException">One of the two is missing or has another form.</exception>
    public static SecurityContact? From(IConfiguration configuration)
    {
        if (configuration.GetSection(Section) is not { } section || !section.Exists())
        {
            return null;
        }

        var settings = section.Get<SecurityContact>(binder => binder.ErrorOnUnknownConfiguration = true)!;
        var isWhole = Uri.TryCreate(settings.Contact, UriKind.Absolute, out var address) && address.Scheme is "mailto" or "https" or "tel"
            && DateTimeOffset.TryParseExact(settings.Expires, "yyyy-MM-ddTHH:mm:ssK", CultureInfo.InvariantCulture, DateTimeStyles.AssumeUniversal, out _);
        return isWhole ? settings : throw new ValidationException($"{Section} needs Contact, a URI such as mailto:security@lab.example, and Expires, such as 2027-06-30T00:00:00Z.");
    }

    public static void Map(IEndpointRouteBuilder app, SecurityContact? contact) =>
        app.MapGet("/.well-known/security.txt", () => contact is null
                ? Results.StatusCode(StatusCodes.Status404NotFound)
                : Results.Text($"Contact: {contact.Contact}\nExpires: {contact.Expires}\n", "text/plain; charset=utf-8"))
            .AllowAnonymous().DisableRateLimiting().WithTags("Description").WithName("security-contact")
            .WithSummary("Where to report a vulnerability")
            .WithDescription("As RFC 9116 has it; 404 where whoever runs the service has named nobody.")
            .Gives<string>("text/plain").Refuses(404);
}
