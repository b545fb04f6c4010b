using MathNet.Numerics.RootFinding;

namespace Drypeak.Soil.Acceptance.Statistics;

/// <summary>
/// The noncentral t distribution: of (Z + δ)/y with Z standard normal and y = √(χ²/ν) independent of it. It is how far a sample's mean lies
/// from a limit in sample standard deviations, times √n: δ = √n·(μ − limit)/σ, ν = n − 1. P(T ≤ t) is the mean of Φ(t·y − δ) over y
/// (Johnson, Kotz and Balakrishnan, Continuous Univariate Distributions 2, chapter 31; from memory).
/// </summary>
public static class NoncentralT
{
    /// <summary>P(T ≤ t).</summary>
    /// <param name="t">Any number, or an infinity.</param>
    /// <param name="degreesOfFreedom">ν, 1 or more.</param>
    /// <param name="noncentrality">δ, finite.</param>
    public static double Below(double t, int degreesOfFreedom, double noncentrality) => t switch
    {
        double.PositiveInfinity => 1,
        double.NegativeInfinity => 0,
        0 => NormalDistribution.Below(-noncentrality),
        _ => DeviationRatio.Mean(degreesOfFreedom, y => NormalDistribution.Below((t * y) - noncentrality), (noncentrality / t, 1 / Math.Abs(t))),
    };

    /// <summary>The t below which a share <paramref name="p"/> lies.</summary>
    /// <param name="p">Over 0 and below 1; 1e-6 to 1 − 1e-6 in good accuracy.</param>
    /// <param name="degreesOfFreedom">ν, 1 or more.</param>
    /// <param name="noncentrality">δ, finite.</param>
    public static double Quantile(double p, int degreesOfFreedom, double noncentrality)
    {
        double Excess(double t) => Below(t, degreesOfFreedom, noncentrality) - p;
        var (low, high) = (noncentrality - 1, noncentrality + 1);
        for (var step = 1.0; Excess(low) > 0; step *= 2)
        {
            low -= step;
        }

        for (var step = 1.0; Excess(high) < 0; step *= 2)
        {
            high += step;
        }

        return Brent.FindRoot(Excess, low, high, 1e-12 * Math.Max(1, Math.Abs(noncentrality)), 200);
    }
}
