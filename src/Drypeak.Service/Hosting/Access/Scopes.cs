using System.Security.Claims;

namespace Drypeak.Service.Hosting;

/// <summary>What a caller may do. The names are those of the <c>scope</c> of a token (RFC 8693, section 4.2), parted by spaces.</summary>
internal static class Scopes
{
    /// <summary>One request after another: jobs, charts, catalogues, pages.</summary>
    public const string Compute = "compute";

    /// <summary>Streams of many tests.</summary>
    public const string Batch = "batch";

    /// <summary>Counts and durations for those who run the service.</summary>
    public const string Metrics = "metrics";

    public static readonly IReadOnlyList<string> All = [Compute, Batch, Metrics];

    private static readonly string[] Claims = ["scope", "scp"];

    public static IEnumerable<string> Of(string text) => text.Split(' ', StringSplitOptions.RemoveEmptyEntries);

    public static bool Has(ClaimsPrincipal caller, string scope) =>
        caller.Claims.Where(claim => Claims.Contains(claim.Type)).SelectMany(claim => Of(claim.Value)).Contains(scope);
}
