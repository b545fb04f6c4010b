using MathNet.Numerics.Distributions;

namespace Drypeak.Soil.Acceptance;

/// <summary>The standard normal distribution, with its ends at infinity.</summary>
internal static class NormalDistribution
{
    /// <summary>Φ(z).</summary>
    public static double Below(double z) => z switch
    {
        double.PositiveInfinity => 1,
        double.NegativeInfinity => 0,
        _ => Normal.CDF(0, 1, z),
    };

    /// <summary>z(p): the value below which a share <paramref name="p"/> lies, over 0 and below 1.</summary>
    public static double Quantile(double p) => Normal.InvCDF(0, 1, p);
}
