using Drypeak.Soil.Acceptance;
using Drypeak.Soil.Laboratory.Review;
using Drypeak.Soil.Quantities;

namespace Drypeak.Soil.FieldDensity.Review;

/// <summary>The review of a field test, as a careful colleague would do it before the next lift covers it.</summary>
internal static class FieldReview
{
    private const double LeastSandDensity = 1250;
    private const double GreatestSandDensity = 1750;
    private const double HighCompaction = 1.05;
    private const double FarFromOptimum = 0.04;
    private const double Arithmetic = 1e-9;

    /// <summary>AASHTO T 191 (from memory): least volume of the hole, cm³, by the largest particle, mm.</summary>
    private static readonly (double Particle, double Volume)[] LeastVolumes = [(4.75, 700), (12.5, 1400), (25, 2100), (50, 2800)];

    public static IEnumerable<Finding> Of(FieldTest test, FieldResult result) =>
    [
        .. Hole(test, result.Soil),
        .. Sand(test, result.Soil),
        .. InPlaceReview.Of(test, result.Soil),
        .. AgainstReference(result.Judged),
        .. Missing(result.Soil),
        .. Requirements(test, result),
        .. Readings(test, result),
        .. test.SpecificGravity is { } gravity ? MaterialReview.SpecificGravity(gravity) : [],
        .. test.Oversize is { } oversize ? MaterialReview.Oversize(oversize, null) : [],
    ];

    private static IEnumerable<Finding> Hole(FieldTest test, SoilInPlace soil)
    {
        if (soil.Volume is not { } hole || test.Method is not (SandCone or RubberBalloon) || test.LargestParticleMillimeters is not { } particle)
        {
            yield break;
        }

        var (size, least) = LeastVolumes.FirstOrDefault(row => particle <= row.Particle * (1 + Arithmetic));
        if (size == 0)
        {
            yield return FieldFindingKinds.HoleTooSmall.At("/largestParticle",
                $"The largest particle, {ReaderText.Significant(particle)} mm, is over the {ReaderText.Significant(LeastVolumes[^1].Particle)} mm for which a hole of this method can be large enough. Use a test pit with water replacement.");
        }
        else if (hole.In(VolumeUnit.CubicCentimeter) < least * (1 - Arithmetic))
        {
            yield return FieldFindingKinds.HoleTooSmall.At(test.Method.Place,
                $"The hole holds {ReaderText.Of(hole, test.Units.Volume)}; with particles up to {ReaderText.Significant(particle)} mm it should hold at least {ReaderText.Of(Volume.From(least, VolumeUnit.CubicCentimeter), test.Units.Volume)}. Dig a larger one.");
        }
    }

    private static IEnumerable<Finding> Sand(FieldTest test, SoilInPlace soil)
    {
        if (soil.SandDensity is { KilogramsPerCubicMeter: < LeastSandDensity or > GreatestSandDensity } sand)
        {
            yield return FieldFindingKinds.SandDensityUnusual.At("/sandCone",
                $"The sand has {ReaderText.Of(sand, test.Units.Density)}; dry test sand lies between {ReaderText.Of(new Density(LeastSandDensity), test.Units.Density)} and {ReaderText.Of(new Density(GreatestSandDensity), test.Units.Density)}. Calibrate it again, and check the unit.");
        }
    }

    private static IEnumerable<Finding> AgainstReference(JudgedSoil judged)
    {
        if (judged.ValueOf(AcceptedQuantity.RelativeCompaction) is { } compaction && compaction > HighCompaction * (1 + Arithmetic))
        {
            yield return FieldFindingKinds.RelativeCompactionHigh.At("/laboratory",
                $"The relative compaction is {ReaderText.Percent(compaction)}: a wrong reference curve is likelier than so good a roller. Compare the soil with the reference's sample, or make one point on a family of curves.");
        }

        if (judged.ValueOf(AcceptedQuantity.WaterContentFromOptimum) is { } apart && Math.Abs(apart) > FarFromOptimum * (1 + Arithmetic))
        {
            yield return FieldFindingKinds.FarFromOptimum.At("/waterContent",
                $"The water content is {ReaderText.Fixed(Math.Abs(apart) * 100, 1)} percentage points {(apart < 0 ? "dry" : "wet")} of the optimum. Check it and the reference; {(apart < 0 ? "wet" : "dry")} the lift before it is rolled again.");
        }
    }

    private static IEnumerable<Finding> Readings(FieldTest test, FieldResult result)
    {
        var fromReadings = (test.Uncertainty.DryDensity is null ? [AcceptedQuantity.DryDensity] : Array.Empty<AcceptedQuantity>())
            .Concat(test.Uncertainty.WaterContent is null ? [AcceptedQuantity.WaterContent] : []);
        List<string> used = [.. fromReadings.Select(quantity => (Quantity: quantity, Uncertainty: result.Judged.StandardUncertaintyOf(quantity, test.Uncertainty)))
            .Where(item => item.Uncertainty is > 0)
            .Select(item => item.Quantity == AcceptedQuantity.DryDensity
                ? $"{ReaderText.Of(new Density(item.Uncertainty!.Value), test.Units.Density)} of the dry density"
                : $"{ReaderText.Fixed(item.Uncertainty!.Value * 100, 2)} percentage points of the water content")];
        if (used.Count > 0 && result.Soil.Effects.Count > 0 && result.Judgements.Any(judged => judged.StandardUncertainty is { }))
        {
            yield return FieldFindingKinds.UncertaintyFromReadings.At(test.Method.Place,
                $"The standard uncertainty, {string.Join(" and ", used)}, is the spread of the readings alone. The gauge's calibration is not in it. Give the uncertainty of each as a whole.");
        }
    }

    private static IEnumerable<Finding> Missing(SoilInPlace soil)
    {
        if (soil is { WaterContent: null, DryDensity: null, WetDensity: { } })
        {
            yield return FieldFindingKinds.WaterContentMissing.At("/waterContent",
                "No water content was given, so that the wet density gives no dry density. Give waterContent, tins, wetBasis or carbide.");
        }
    }

    private static IEnumerable<Finding> Requirements(FieldTest test, FieldResult result)
    {
        for (var i = 0; i < result.Judgements.Count; i++)
        {
            var judged = result.Judgements[i];
            var kind = judged.Doubt switch
            {
                Doubt.ValueUnknown => FieldFindingKinds.ValueMissing,
                Doubt.UncertaintyUnknown => FieldFindingKinds.UncertaintyMissing,
                Doubt.WithinGuardBand => FieldFindingKinds.WithinGuardBand,
                _ => null,
            };
            if (kind is not null)
            {
                yield return kind.At($"/specification/requirements/{i}", JudgementWords.Of(judged, result.Judged, test.Units));
            }
        }
    }
}
