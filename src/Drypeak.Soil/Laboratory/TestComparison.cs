using Drypeak.Soil.Curves;

namespace Drypeak.Soil.Laboratory;

/// <summary>A water content and a dry density, as a difference or a limit.</summary>
/// <param name="WaterContent">Fraction.</param>
/// <param name="MaximumDryDensity">kg/m³.</param>
public sealed record PeakDifference(double WaterContent, double MaximumDryDensity)
{
    /// <summary>Whether each part is no greater than its limit.</summary>
    public (bool WaterContent, bool MaximumDryDensity) Within(PeakDifference limit) =>
        (Within(WaterContent, limit.WaterContent), Within(MaximumDryDensity, limit.MaximumDryDensity));

    private static bool Within(double difference, double limit) => Math.Abs(difference) <= limit * (1 + 1e-9);
}

/// <summary>A standard's statement of how far two tests of one soil may differ.</summary>
/// <param name="Conditions">Who made the two tests.</param>
/// <param name="Limit">For these two.</param>
/// <param name="Basis">The standard.</param>
public sealed record PrecisionStatement(string Conditions, PeakDifference Limit, string Basis);

/// <summary>Two tests of one soil held against one another.</summary>
/// <param name="Difference">Second less first.</param>
/// <param name="Allowed">What the two uncertainties allow at 95 %; null where one has none.</param>
/// <param name="Statements">What the standards allow.</param>
public sealed record TestComparison(PeakDifference Difference, PeakDifference? Allowed, IReadOnlyList<PrecisionStatement> Statements)
{
    /// <summary>Two-sided 95 % of a normal difference.</summary>
    private const double Quantile = 1.959963984540054;

    /// <summary>Compares two peaks.</summary>
    /// <returns>
    /// The difference allowed is 1.96·√(u₁² + u₂²), the two tests taken as independent (ISO/IEC Guide 98-3, and ISO 13528's zeta score, from memory).
    /// The standards' limits are AASHTO T 99's: 10 % of the mean optimum and 35 kg/m³ for one operator, 15 % and 72 kg/m³ for two laboratories (from memory).
    /// </returns>
    public static TestComparison Of(FittedOptimum first, FittedOptimum second)
    {
        var meanWater = (first.WaterContent.Value + second.WaterContent.Value) / 2;
        return new TestComparison(
            new PeakDifference(second.WaterContent.Value - first.WaterContent.Value, second.MaximumDryDensity.Value - first.MaximumDryDensity.Value),
            Allow(first.WaterContent, second.WaterContent) is { } water && Allow(first.MaximumDryDensity, second.MaximumDryDensity) is { } density
                ? new PeakDifference(water, density)
                : null,
            [
                new PrecisionStatement("single operator", new PeakDifference(0.10 * meanWater, 35), "AASHTO T 99, precision (from memory)"),
                new PrecisionStatement("two laboratories", new PeakDifference(0.15 * meanWater, 72), "AASHTO T 99, precision (from memory)"),
            ]);
    }

    private static double? Allow(Estimate first, Estimate second) =>
        first.StandardUncertainty is { } one && second.StandardUncertainty is { } other ? Quantile * Math.Sqrt((one * one) + (other * other)) : null;
}
