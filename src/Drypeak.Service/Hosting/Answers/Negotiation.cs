using Microsoft.AspNetCore.Http.Headers;
using Microsoft.Net.Http.Headers;

namespace Drypeak.Service.Hosting;

/// <summary>Chooses a media type by Accept (RFC 9110, section 12.5.1).</summary>
public static class Negotiation
{
    /// <summary>
    /// The offered type that the request prefers, the earlier one where it does not care; null where it accepts none (then
    /// <see cref="Problems.NotAcceptable"/> is the answer). Each offer has the quality of the most specific range that
    /// covers it. Without Accept, or with one that cannot be read, the first is given.
    /// </summary>
    /// <remarks>Whoever chooses by Accept says so: <c>Vary: Accept</c>.</remarks>
    public static string? Choose(HttpRequest request, params ReadOnlySpan<string> offered)
    {
        var accepted = new RequestHeaders(request.Headers).Accept;
        if (accepted.Count == 0)
        {
            return offered[0];
        }

        string? best = null;
        var bestQuality = 0.0;
        foreach (var offer in offered)
        {
            var quality = Quality(MediaTypeHeaderValue.Parse(offer), accepted);
            if (quality > bestQuality)
            {
                (best, bestQuality) = (offer, quality);
            }
        }

        return best;
    }

    private static double Quality(MediaTypeHeaderValue offer, IEnumerable<MediaTypeHeaderValue> accepted) => accepted
        .Where(offer.IsSubsetOf)
        .OrderByDescending(range => range.MatchesAllTypes ? 0 : range.MatchesAllSubTypes ? 1 : 2 + range.Parameters.Count)
        .Select(range => range.Quality ?? 1)
        .FirstOrDefault();
}
