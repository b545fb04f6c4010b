using System.Collections.Concurrent;
using MathNet.Numerics.Distributions;

namespace Drypeak.Soil.Curves;

/// <summary>Intervals of 95 % coverage.</summary>
internal static class Intervals
{
    private const double UpperTail = 0.025;

    /// <summary>The quantile of the normal that leaves 2.5 % above.</summary>
    public static readonly double Normal = MathNet.Numerics.Distributions.Normal.InvCDF(0, 1, 1 - UpperTail);

    // Quantiles of t cost more than a fit; a test asks for the same few again and again.
    private static readonly ConcurrentDictionary<int, double> StudentQuantiles = new();

    /// <summary>The quantile of Student's t that leaves 2.5 % above.</summary>
    /// <param name="degreesOfFreedom">1 or more.</param>
    public static double Student(int degreesOfFreedom) =>
        StudentQuantiles.GetOrAdd(degreesOfFreedom, static dof => StudentT.InvCDF(0, 1, dof, 1 - UpperTail));

    /// <summary>A peak whose errors are normal with known variances, as an optimum in kg/m³.</summary>
    public static FittedOptimum Normally(in PeakEstimate peak) => Symmetric(peak, Normal);

    /// <summary>A peak with intervals of so many standard uncertainties on either side, in kg/m³.</summary>
    public static FittedOptimum Symmetric(in PeakEstimate peak, double quantile) => new(
        Symmetric(peak.WaterContent, Math.Sqrt(peak.WaterContentVariance), quantile),
        Symmetric(TestedPoints.ToKilograms(peak.Density), TestedPoints.ToKilograms(Math.Sqrt(peak.DensityVariance)), quantile));

    /// <summary>A peak of which no uncertainty can be told, in kg/m³.</summary>
    public static FittedOptimum Unknown(double waterContent, double density) => new(
        new(waterContent, null, null, null), new(TestedPoints.ToKilograms(density), null, null, null));

    private static Estimate Symmetric(double value, double deviation, double quantile) =>
        new(value, deviation, value - (quantile * deviation), value + (quantile * deviation));
}
