namespace Drypeak.Soil.Acceptance;

/// <summary>One requirement of a specification: limits to a quantity, both inclusive, in the quantity's SI unit.</summary>
/// <param name="Quantity">What is limited.</param>
/// <param name="Minimum">Lower limit, or null.</param>
/// <param name="Maximum">Upper limit, or null; not below the lower. One of the two is given.</param>
public sealed record Requirement(AcceptedQuantity Quantity, double? Minimum, double? Maximum)
{
    /// <summary>Limits near 0 have a tolerance as if they were this large, so that arithmetic's own doubt never decides.</summary>
    private const double SmallestScale = 0.01;

    private const double Arithmetic = 1e-9;

    /// <summary>How far inside the nearer limit a value lies; negative outside.</summary>
    public double MarginOf(double value) => Math.Min(value - (Minimum ?? double.NegativeInfinity), (Maximum ?? double.PositiveInfinity) - value);

    /// <summary>What counts as on the limit: 1e-9 of it.</summary>
    public double Tolerance => Arithmetic * Math.Max(SmallestScale, Math.Max(Math.Abs(Minimum ?? 0), Math.Abs(Maximum ?? 0)));

    /// <summary>The probability that the true value conforms, where the measured one is its mean and the error is normal (JCGM 106:2012, clause 7).</summary>
    /// <param name="value">The measured value.</param>
    /// <param name="standardUncertainty">Its standard uncertainty, 0 or more; 0 leaves 0 or 1.</param>
    public double ProbabilityOfConformance(double value, double standardUncertainty)
    {
        if (standardUncertainty == 0)
        {
            return MarginOf(value) >= -Tolerance ? 1 : 0;
        }

        var lower = ((Minimum ?? double.NegativeInfinity) - value) / standardUncertainty;
        var upper = ((Maximum ?? double.PositiveInfinity) - value) / standardUncertainty;

        // Both ends on the falling side: mirrored, so that a small difference is not taken between two numbers near 1.
        return lower > 0
            ? NormalDistribution.Below(-lower) - NormalDistribution.Below(-upper)
            : NormalDistribution.Below(upper) - NormalDistribution.Below(lower);
    }
}
