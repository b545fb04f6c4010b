using Drypeak.Soil.Acceptance.Statistics;

namespace Drypeak.Soil.Acceptance.LotRules;

/// <summary>The probability that a sample's mean lies k of its standard deviations or more inside one limit: noncentral t.</summary>
internal static class OneLimitProbability
{
    /// <summary>As a function of the true mean.</summary>
    public static Func<double, double> Of(Requirement limits, double k, int count, double deviation)
    {
        var root = Math.Sqrt(count);
        return level =>
        {
            var inside = limits.Minimum is { } minimum ? level - minimum : limits.Maximum!.Value - level;
            return 1 - NoncentralT.Below(k * root, count - 1, inside / deviation * root);
        };
    }
}

/// <summary>
/// The probability that a sample is accepted where its mean may lie so far from the middle between two limits, the further the smaller its
/// standard deviation: an integral over s of a difference of two normal probabilities.
/// </summary>
/// <param name="middle">Between the limits.</param>
/// <param name="count">Values in the sample.</param>
/// <param name="deviation">True standard deviation.</param>
/// <param name="most">The greatest s/σ at which a mean in the middle is accepted.</param>
/// <param name="reach">How far the mean may lie from the middle at an s/σ below that.</param>
internal sealed class TwoLimitProbability(double middle, int count, double deviation, double most, Func<double, double> reach)
{
    /// <summary>The nodes are the same for every level, and so are the reaches.</summary>
    private readonly Dictionary<double, double> _reaches = [];

    /// <summary>At a true mean.</summary>
    public double At(double level)
    {
        var standardError = deviation / Math.Sqrt(count);
        double Accepted(double y)
        {
            if (y > most)
            {
                return 0;
            }

            if (!_reaches.TryGetValue(y, out var far))
            {
                _reaches.Add(y, far = reach(y));
            }

            return far <= 0 ? 0 : NormalDistribution.Below((middle + far - level) / standardError) - NormalDistribution.Below((middle - far - level) / standardError);
        }

        return DeviationRatio.Mean(count - 1, Accepted, (most, 1 / Math.Sqrt(8.0 * count)));
    }
}
