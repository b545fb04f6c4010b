using MathNet.Numerics;
using MathNet.Numerics.Distributions;

namespace Drypeak.Soil.Acceptance.Statistics;

/// <summary>
/// The estimated share of a lot within its limits, from the mean and the standard deviation of a sample of 3 or more (the standard deviation
/// method: FHWA Technical Advisory T 5080.12; AASHTO R 9). Of one limit at Q sample standard deviations from the mean, the share on the good
/// side is 1 − I_x(n/2 − 1, n/2 − 1), x = ½ − Q·√n/(2(n − 1)) held between 0 and 1; with two limits both shares count, less one.
/// </summary>
public static class PercentWithinLimits
{
    /// <summary>The least sample that the estimate is defined for.</summary>
    public const int LeastCount = 3;

    /// <summary>The share on the good side of one limit.</summary>
    /// <param name="qualityIndex">Q: how many sample standard deviations the mean lies inside the limit; negative outside.</param>
    /// <param name="count">n, 3 or more.</param>
    /// <returns>A fraction.</returns>
    public static double OfOneLimit(double qualityIndex, int count)
    {
        var x = 0.5 - (qualityIndex * Math.Sqrt(count) / (2 * (count - 1)));
        return x <= 0 ? 1 : x >= 1 ? 0 : 1 - SpecialFunctions.BetaRegularized((count / 2.0) - 1, (count / 2.0) - 1, x);
    }

    /// <summary>The share within the limits that there are, never below 0.</summary>
    /// <param name="lower">Q of the lower limit, or null.</param>
    /// <param name="upper">Q of the upper limit, or null.</param>
    /// <param name="count">n, 3 or more.</param>
    public static double Of(double? lower, double? upper, int count) =>
        Math.Max(0, (lower is { } low ? OfOneLimit(low, count) : 1) + (upper is { } high ? OfOneLimit(high, count) : 1) - 1);

    /// <summary>The Q at which one limit gives a share: the estimate turned round.</summary>
    /// <param name="share">Over 0 and up to 1.</param>
    /// <param name="count">n, 3 or more.</param>
    public static double QualityIndexOf(double share, int count)
    {
        var x = share >= 1 ? 0 : Beta.InvCDF((count / 2.0) - 1, (count / 2.0) - 1, 1 - share);
        return (0.5 - x) * 2 * (count - 1) / Math.Sqrt(count);
    }
}
