using System.Collections.Concurrent;
using MathNet.Numerics.Distributions;
using MathNet.Numerics.RootFinding;

namespace Drypeak.Soil.Acceptance.Statistics;

/// <summary>
/// Factors k of tolerance intervals of a normal distribution, mean ± k·s (ISO 16269-6:2014; G. J. Hahn and W. Q. Meeker, Statistical
/// Intervals, 1991; both from memory).
/// </summary>
public static class ToleranceFactor
{
    private static readonly ConcurrentDictionary<(int Count, double Fraction, double Confidence), double> Known = new();

    /// <summary>
    /// One limit, exact: at least <paramref name="fraction"/> of the distribution lies beyond mean − k·s with the stated confidence;
    /// k = t_confidence(n − 1, z(fraction)·√n)/√n, t that of the noncentral t distribution.
    /// </summary>
    /// <param name="count">Values in the sample, 2 or more.</param>
    /// <param name="fraction">Over 0 and below 1.</param>
    /// <param name="confidence">Over 0 and below 1.</param>
    public static double OneLimit(int count, double fraction, double confidence) =>
        NoncentralT.Quantile(confidence, count - 1, NormalDistribution.Quantile(fraction) * Math.Sqrt(count)) / Math.Sqrt(count);

    /// <summary>
    /// Two limits, exact: at least <paramref name="fraction"/> of the distribution lies within mean ± k·s with the stated confidence. Given how
    /// far the sample's mean is off, x, the interval holds the fraction if s is over r(x)/k, where Φ(x + r) − Φ(x − r) is the fraction.
    /// </summary>
    /// <param name="count">Values in the sample, 2 or more.</param>
    /// <param name="fraction">Over 0 and below 1.</param>
    /// <param name="confidence">Over 0 and below 1.</param>
    public static double TwoLimits(int count, double fraction, double confidence) =>
        Known.Count < 1_000 ? Known.GetOrAdd((count, fraction, confidence), Solve) : Solve((count, fraction, confidence));

    private static double Solve((int Count, double Fraction, double Confidence) asked)
    {
        var (count, fraction, confidence) = asked;
        var reach = 9 / Math.Sqrt(count);
        List<(double Radius, double Weight)> nodes =
        [
            .. Quadrature.Panels([0, reach / 6, reach / 3, reach / 2, reach * 3 / 4, reach])
                .Select(node => (Radius(node.Node, fraction), node.Weight * Math.Sqrt(2 * count / Math.PI) * Math.Exp(-count * node.Node * node.Node / 2))),
        ];
        double Excess(double k) => nodes.Sum(node => node.Weight * (1 - ChiSquared.CDF(count - 1, (count - 1) * node.Radius * node.Radius / (k * k)))) - confidence;
        var (low, high) = (1e-3, 8.0);
        while (Excess(high) < 0)
        {
            high *= 4;
        }

        return Brent.FindRoot(Excess, low, high, 1e-11, 200);
    }

    /// <summary>r with Φ(x + r) − Φ(x − r) = fraction, by Newton's method from the right, where the function bends down.</summary>
    private static double Radius(double x, double fraction)
    {
        var r = x - NormalDistribution.Quantile((1 - fraction) / 2);
        for (var i = 0; i < 50; i++)
        {
            var step = (NormalDistribution.Below(x + r) - NormalDistribution.Below(x - r) - fraction) / (Normal.PDF(0, 1, x + r) + Normal.PDF(0, 1, x - r));
            r -= step;
            if (Math.Abs(step) < 1e-13 * r)
            {
                break;
            }
        }

        return r;
    }
}
