using System.Globalization;
using System.Net;
using System.Net.Sockets;
using System.Threading.RateLimiting;

namespace Drypeak.Service.Hosting;

/// <summary>How often each caller may ask: a bucket that fills by so many requests a second. Who finds it empty is told when to come back (429).</summary>
internal static class CallerRates
{
    /// <summary>A network of IPv6 is one caller: it is what a household or a server is given whole.</summary>
    private const int Ipv6NetworkBytes = 8;

    public static void Add(IServiceCollection services, Limits limits) => services.AddRateLimiter(rates =>
    {
        rates.GlobalLimiter = PartitionedRateLimiter.Create<HttpContext, string>(context => RateLimitPartition.GetTokenBucketLimiter(
            CallerOf(context), _ => new TokenBucketRateLimiterOptions
            {
                TokensPerPeriod = limits.RequestsPerSecond,
                TokenLimit = Math.Max(limits.RequestBurst, limits.RequestsPerSecond),
                ReplenishmentPeriod = TimeSpan.FromSeconds(1),
            }));
        rates.OnRejected = async (rejected, _) =>
        {
            Meters.Refused("too-many");
            var wait = rejected.Lease.TryGetMetadata(MetadataName.RetryAfter, out var retryAfter) ? retryAfter : TimeSpan.FromSeconds(1);
            await Problems.TooMany(Math.Max(1, (int)Math.Ceiling(wait.TotalSeconds))).ExecuteAsync(rejected.HttpContext);
        };
    });

    /// <summary>Who asks: the name of the key where there is one, else the network address.</summary>
    internal static string CallerOf(HttpContext context)
    {
        if (context.User.Identity is { IsAuthenticated: true, Name: { } name })
        {
            return "key " + name;
        }

        var address = context.Connection.RemoteIpAddress ?? IPAddress.None;
        address = address.IsIPv4MappedToIPv6 ? address.MapToIPv4() : address;
        return address.AddressFamily == AddressFamily.InterNetworkV6 && !IPAddress.IsLoopback(address)
            ? string.Create(CultureInfo.InvariantCulture, $"{Convert.ToHexString(address.GetAddressBytes().AsSpan(0, Ipv6NetworkBytes))}/64")
            : address.ToString();
    }
}
