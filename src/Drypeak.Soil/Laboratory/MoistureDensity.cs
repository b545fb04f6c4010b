using Drypeak.Soil.Curves;
using Drypeak.Soil.Laboratory.Review;
using Drypeak.Soil.Quantities;

namespace Drypeak.Soil.Laboratory;

/// <summary>The laboratory compaction test: weighings to specimens, specimens to a curve, all of it reviewed.</summary>
public static class MoistureDensity
{
    /// <summary>Reduces every specimen.</summary>
    /// <param name="test">The test.</param>
    /// <param name="faults">Receives each contradiction, and what is missing.</param>
    /// <returns>The specimens in the order given, null in the place of one that could not be reduced.</returns>
    public static IReadOnlyList<Specimen?> Reduce(MoistureDensityTest test, ICollection<Fault> faults) =>
        [.. test.Specimens.Select((measured, i) => SpecimenReduction.Reduce(measured, test.Mold, $"/specimens/{i}", test.Units, faults))];

    /// <summary>Fits the curve and reviews the test.</summary>
    /// <param name="test">The test.</param>
    /// <param name="specimens">Its specimens, as <see cref="Reduce"/> gave them without a fault.</param>
    public static MoistureDensityResult Analyze(MoistureDensityTest test, IReadOnlyList<Specimen> specimens)
    {
        var data = KeptPoints(specimens, test.SpecificGravity?.Value, test.WaterDensity);
        var curve = data.Points.Count > 0 ? CompactionCurve.Analyze(data, test.Model) : null;
        var result = new MoistureDensityResult
        {
            Specimens = specimens,
            Curve = curve,
            Propagated = curve?.Chosen.Optimum is { } && test.Uncertainty is { } ? UncertaintyPropagation.Carry(test, specimens, curve.Chosen.Model) : null,
            Corrected = Correct(test, curve?.Chosen.Optimum),
            Findings = [],
        };
        return result with { Findings = TestReview.Of(test, result) };
    }

    /// <summary>The points that are fitted: all but those set aside.</summary>
    public static CompactionData KeptPoints(IEnumerable<Specimen> specimens, double? specificGravity, Density water) => new(
        [.. specimens.Where(specimen => specimen.SetAside is null)
            .Select(specimen => new CompactionPoint(specimen.WaterContent.Fraction, specimen.DryDensity.KilogramsPerCubicMeter))],
        specificGravity,
        water.KilogramsPerCubicMeter);

    /// <summary>The peak that is reported, adopted before fitted, corrected for oversize.</summary>
    private static DensityAndWater? Correct(MoistureDensityTest test, FittedOptimum? fitted)
    {
        if (test.Oversize is not { SpecificGravity: { } gravity } oversize)
        {
            return null;
        }

        var peak = test.Adopted is { } adopted ? new DensityAndWater(adopted.MaximumDryDensity, adopted.WaterContent)
            : fitted is { } ? new DensityAndWater(new Density(fitted.MaximumDryDensity.Value), new WaterContent(fitted.WaterContent.Value))
            : (DensityAndWater?)null;
        return peak is { } fines ? OversizeCorrection.ToTotal(fines, oversize.Fraction, gravity, oversize.WaterContent, test.WaterDensity) : null;
    }
}
