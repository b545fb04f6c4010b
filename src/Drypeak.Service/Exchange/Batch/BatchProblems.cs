using System.Globalization;
using Drypeak.Service.Hosting;

namespace Drypeak.Service.Exchange.Batch;

/// <summary>The problems that only a batch has. Each stands on a line of its own, with the number of the line of the body.</summary>
internal static class BatchProblems
{
    public static Problem LineTooLong(int maximumBytes) => Problem.Of(ProblemKind.TooLarge, string.Create(
        CultureInfo.InvariantCulture, $"A line may have up to {maximumBytes} bytes here. Send this test by itself, or with fewer specimens; the other lines go on."));

    /// <summary>503: the service is being stopped, and has answered all the lines that it has read.</summary>
    public static Problem Stopping() => Problem.Of(ProblemKind.Unavailable,
        "The service is stopping. The lines above this one are answered; send this one and those after it again, to another replica or a little later.");

    /// <summary>413: the body expands without end.</summary>
    public static Problem ExpandsTooFar() => Problem.Of(ProblemKind.TooLarge, string.Create(
        CultureInfo.InvariantCulture, $"The compressed body expands more than {BodyCoding.LargestExpansion} fold, beyond what tests do. The lines above this one are answered; send the rest with less compression."));

    /// <summary>400: the compressed body is damaged, or ends too early.</summary>
    public static Problem DamagedCoding() => Problem.Of(ProblemKind.BadRequest,
        "The compressed body is damaged or cut short in this line. The lines above it are answered; compress and send the rest again.");

    /// <summary>415: a compression that is not understood.</summary>
    public static Problem UnknownCoding() => Problem.Of(ProblemKind.UnsupportedMediaType,
        "Compress the body by gzip or br, once, or not at all, and say so in Content-Encoding.")
        with
    { Headers = new Dictionary<string, string> { ["Accept-Encoding"] = "gzip, br" } };
}
