using Drypeak.Soil.Quantities;

namespace Drypeak.Soil.Earthwork;

/// <summary>An optimum that is expected before any specimen was made.</summary>
/// <param name="WaterContent">Expected optimum water content.</param>
/// <param name="MaximumDryDensity">Expected maximum dry density; null where only the water content was expected.</param>
public sealed record ExpectedOptimum(WaterContent WaterContent, Density? MaximumDryDensity)
{
    /// <summary>Where the estimate stands.</summary>
    public const string EstimateSource = "Gurtug & Sridharan 2004, standard effort, fine-grained soils (from memory)";

    /// <summary>
    /// An estimate from the plastic limit: optimum 0.92·PL, maximum dry unit weight 22.68·e^(−0.0183·PL) kN/m³, for standard effort on
    /// fine-grained soils. Gurtug and Sridharan 2004 (from memory). It places specimens; it replaces no test.
    /// </summary>
    /// <param name="plasticLimit">Plastic limit, over 0.</param>
    public static ExpectedOptimum FromPlasticLimit(WaterContent plasticLimit) => new(
        new WaterContent(0.92 * plasticLimit.Fraction),
        Density.From(22.68 * Math.Exp(-0.0183 * plasticLimit.Percent), DensityUnit.KilonewtonPerCubicMeter));
}

/// <summary>Water contents for specimens around an expected optimum.</summary>
public static class SpecimenTargets
{
    /// <summary>Usual distance between neighbors, percentage points: ASTM D698 and D1557 ask for about 2 (from memory).</summary>
    public const double UsualSpacing = 2;

    /// <summary>Usual number: four are needed and five preferred by ASTM D698 and D1557 (from memory).</summary>
    public const int UsualCount = 5;

    /// <summary>The driest target is no drier than this share of the optimum.</summary>
    private const double DriestShare = 0.25;

    /// <summary>Targets at equal distances, as many dry as wet of the optimum, driest first.</summary>
    /// <param name="optimum">Expected optimum, over 0.</param>
    /// <param name="count">How many, one or more.</param>
    /// <param name="spacing">Distance between neighbors, as a fraction; narrowed where the driest would come near an oven-dry soil.</param>
    public static IReadOnlyList<WaterContent> Around(WaterContent optimum, int count, WaterContent spacing)
    {
        var half = (count - 1) / 2.0;
        var step = half == 0 ? 0 : Math.Min(spacing.Fraction, optimum.Fraction * (1 - DriestShare) / half);
        return [.. Enumerable.Range(0, count).Select(i => new WaterContent(optimum.Fraction + ((i - half) * step)))];
    }
}
