using System.ComponentModel.DataAnnotations;
using System.Net;
using Microsoft.AspNetCore.HttpOverrides;

namespace Drypeak.Service.Hosting;

/// <summary>
/// Proxies that are believed when they say who asked and by which scheme (<c>X-Forwarded-For</c>, <c>X-Forwarded-Proto</c>): the list
/// <c>Proxies</c> of the configuration, addresses or networks such as <c>10.0.0.0/8</c>. None by default, and nobody else is ever believed.
/// </summary>
internal static class TrustedProxies
{
    public const string Section = "Proxies";

    /// <exception cref="ValidationException">An entry is neither an address nor a network.</exception>
    public static void Use(WebApplication app)
    {
        var listed = app.Configuration.GetSection(Section).Get<string[]>() ?? [];
        if (listed.Length == 0)
        {
            return;
        }

        var options = new ForwardedHeadersOptions { ForwardedHeaders = ForwardedHeaders.XForwardedFor | ForwardedHeaders.XForwardedProto, ForwardLimit = null };
        options.KnownProxies.Clear();
        options.KnownIPNetworks.Clear();
        foreach (var entry in listed)
        {
            options.KnownIPNetworks.Add(NetworkOf(entry));
        }

        app.UseForwardedHeaders(options);
    }

    private static System.Net.IPNetwork NetworkOf(string entry) =>
        System.Net.IPNetwork.TryParse(entry, out var network) ? network
        : IPAddress.TryParse(entry, out var address) ? new System.Net.IPNetwork(address, 8 * address.GetAddressBytes().Length)
        : throw new ValidationException($"{Section}: \"{entry}\" is neither an address nor a network such as 10.0.0.0/8.");
}
