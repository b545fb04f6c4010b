using Drypeak.Soil.Phases;
using Drypeak.Soil.Quantities;
using static Drypeak.Soil.Laboratory.Review.ReviewedTest;

namespace Drypeak.Soil.Laboratory.Review;

/// <summary>What is wrong with single specimens: impossible values, wrong units, readings typed twice, tins that disagree.</summary>
internal static class SpecimenReview
{
    private const double LeastDryDensity = 300;
    private const double GreatestDryDensity = 2800;

    /// <summary>A ratio within this fraction of a unit's factor is taken for it: densities of one test spread by up to about a fifth.</summary>
    private const double RatioTolerance = 0.2;

    /// <summary>Room for the arithmetic on the zero-air-voids line itself.</summary>
    private const double OnTheLine = 1e-9;

    /// <summary>A point above the line by less than this fraction is within what the choice of the water's density alone moves it (998.2 or 1000 kg/m³).</summary>
    private const double WithinRounding = 0.002;

    private static readonly (double Factor, string Text)[] UnitRatios =
    [
        (1000, "1000: grams for kilograms, or kilograms for grams"),
        (453.59237, "453.6: grams for pounds, or pounds for grams"),
        (62.42796, "62.4: lb/ft³ for g/cm³, or g/cm³ for lb/ft³"),
    ];

    public static IEnumerable<Finding> Of(ReviewedTest review) =>
        [.. MixedUnits(review), .. FractionsForPercent(review), .. Densities(review), .. AboveZeroAirVoids(review), .. TinsDisagree(review), .. RepeatedValues(review), .. SetAside(review)];

    private static IEnumerable<Finding> MixedUnits(ReviewedTest review)
    {
        if (review.Kept.Count < 3)
        {
            yield break;
        }

        foreach (var (specimen, index) in review.Kept)
        {
            var others = Median(review.Kept.Where(item => item.Index != index).Select(item => item.Specimen.DryDensity.KilogramsPerCubicMeter));
            var ratio = specimen.DryDensity.KilogramsPerCubicMeter / others;
            foreach (var (factor, text) in UnitRatios)
            {
                var stretched = Math.Max(ratio, 1 / ratio);
                if (Math.Abs((stretched / factor) - 1) < RatioTolerance)
                {
                    yield return FindingKinds.MixedUnits.At(PlaceOf(index),
                        $"Specimen {specimen.Label} has a dry density of {review.Text(specimen.DryDensity.KilogramsPerCubicMeter)}, the others about {review.Text(others)}: {ReaderText.Significant(stretched)} times apart, near {text}. Write its values in the units of the rest.");
                    break;
                }
            }
        }
    }

    private static IEnumerable<Finding> FractionsForPercent(ReviewedTest review)
    {
        var typed = review.Kept.Where(item => review.Test.Specimens[item.Index] is { Tins.Count: 0 }).Select(item => item.Specimen.WaterContent.Percent).ToList();
        if (typed.Count >= 2 && typed.Count == review.Kept.Count && typed.All(percent => percent < 1) && typed.Any(percent => percent > 0))
        {
            yield return FindingKinds.FractionsForPercent.At("/specimens",
                $"All water contents are below 1 %: the greatest is {ReaderText.Fixed(typed.Max(), 3)} %. They look like fractions; give percent ({ReaderText.Fixed(typed.Max() * 100, 1)} for {ReaderText.Fixed(typed.Max(), 3)}).");
        }
    }

    private static IEnumerable<Finding> Densities(ReviewedTest review)
    {
        foreach (var (specimen, index) in review.Kept)
        {
            var dry = specimen.DryDensity.KilogramsPerCubicMeter;
            if (dry is < LeastDryDensity or > GreatestDryDensity)
            {
                yield return FindingKinds.ImpossibleDensity.At(PlaceOf(index),
                    $"Specimen {specimen.Label} has a dry density of {review.Text(dry)}; compacted soil lies between {review.Text(LeastDryDensity)} and {review.Text(GreatestDryDensity)}. Check the mold's volume, the masses and the units.");
            }

            if (review.Test.SpecificGravity is { } gravity && dry >= gravity.Value * review.Test.WaterDensity.KilogramsPerCubicMeter)
            {
                yield return FindingKinds.DensityAboveSolids.At(PlaceOf(index),
                    $"Specimen {specimen.Label} has a dry density of {review.Text(dry)}, not below the {review.Text(gravity.Value * review.Test.WaterDensity.KilogramsPerCubicMeter)} of its solids (specific gravity {ReaderText.Significant(gravity.Value)}). Check volume, masses and specific gravity.");
            }
        }
    }

    private static IEnumerable<Finding> AboveZeroAirVoids(ReviewedTest review)
    {
        if (review.Test.SpecificGravity is not { } gravity)
        {
            yield break;
        }

        var water = review.Test.WaterDensity;
        var fitsAll = review.Kept.Select(item => PhaseRelations.SmallestSpecificGravity(item.Specimen.WaterContent, item.Specimen.DryDensity, water)).DefaultIfEmpty(0).Max();
        foreach (var (specimen, index) in review.Kept)
        {
            var limit = PhaseRelations.OnZeroAirVoidsLine(specimen.WaterContent, gravity.Value, water).KilogramsPerCubicMeter;
            var dry = specimen.DryDensity.KilogramsPerCubicMeter;
            if (dry <= limit * (1 + OnTheLine) || dry >= gravity.Value * water.KilogramsPerCubicMeter)
            {
                continue;
            }

            var saturation = specimen.PhasesWith(gravity.Value, water)?.Saturation;
            var start = $"Specimen {specimen.Label} lies above the zero-air-voids line: {review.Text(dry)} where {review.Text(limit)} is the most at {ReaderText.Of(specimen.WaterContent)} water"
                + (saturation is { } sr ? $" (saturation {ReaderText.Percent(sr)}). " : ". ");
            yield return dry <= limit * (1 + WithinRounding)
                ? FindingKinds.AboveZeroAirVoids.At(PlaceOf(index), start + $"That is within {ReaderText.Percent(WithinRounding)}, which rounding or the density of water can bring. Look at the weighings.", Severity.Note)
                : gravity.Measured
                ? FindingKinds.AboveZeroAirVoids.At(PlaceOf(index), start + "Check its weighings, the mold and the specific gravity.", Severity.Error)
                : FindingKinds.AboveZeroAirVoids.At(PlaceOf(index), start + (double.IsFinite(fitsAll)
                    ? $"The specific gravity of {ReaderText.Significant(gravity.Value)} is assumed: all points would fit from {ReaderText.Significant(fitsAll)} on. Measure it, or check the weighings."
                    : "No specific gravity would fit it. Check its weighings and the mold."), Severity.Warning);
        }
    }

    private static IEnumerable<Finding> TinsDisagree(ReviewedTest review)
    {
        for (var i = 0; i < review.Test.Specimens.Count; i++)
        {
            var specimen = review.Test.Specimens[i];
            if (specimen.Tins.Count < 2)
            {
                continue;
            }

            var contents = specimen.Tins.Select(tin => tin.WaterContent.Percent).ToList();
            var apart = contents.Max() - contents.Min();
            if (apart > Math.Max(1, 0.078 * contents.Average()))
            {
                yield return FindingKinds.TinsDisagree.At(PlaceOf(i) + "/tins",
                    $"The tins of specimen {specimen.Label} say {ReaderText.Fixed(contents.Min(), 2)} to {ReaderText.Fixed(contents.Max(), 2)} % water: {ReaderText.Fixed(apart, 2)} percentage points apart. Check the weighings.");
            }
        }
    }

    private static IEnumerable<Finding> RepeatedValues(ReviewedTest review)
    {
        var tins = review.Test.Specimens.SelectMany((specimen, i) => specimen.Tins.Select((tin, j) => (tin, place: $"{PlaceOf(i)}/tins/{j}", specimen.Label)));
        foreach (var same in tins.GroupBy(item => item.tin).Where(group => group.Count() > 1))
        {
            yield return FindingKinds.RepeatedValues.At(same.Last().place,
                $"The same three masses of a tin stand at {Listed(same.Select(item => $"specimen {item.Label}"))}. Compare with the sheet.");
        }

        var bodies = review.Test.Specimens.Select((specimen, i) => (specimen, i)).Where(item => (item.specimen.MoldAndWetSoil ?? item.specimen.WetMass) is { });
        foreach (var same in bodies.GroupBy(item => (item.specimen.MoldAndWetSoil, item.specimen.WetMass, item.specimen.Mold)).Where(group => group.Count() > 1))
        {
            var sameWater = same.Select(item => review.Result.Specimens[item.i].WaterContent).Distinct().Count() == 1;
            yield return FindingKinds.RepeatedValues.At(PlaceOf(same.Last().i),
                $"The same mass of wet soil stands at {Listed(same.Select(item => $"specimen {item.specimen.Label}"))}{(sameWater ? ", with the same water content" : "")}. Compare with the sheet.",
                sameWater ? Severity.Warning : Severity.Note);
        }
    }

    private static IEnumerable<Finding> SetAside(ReviewedTest review) =>
        review.Result.Specimens.Select((specimen, i) => (specimen, i)).Where(item => item.specimen.SetAside is { })
            .Select(item => FindingKinds.SpecimenSetAside.At(PlaceOf(item.i) + "/setAside",
                $"Specimen {item.specimen.Label} ({review.Text(item.specimen.DryDensity.KilogramsPerCubicMeter)} at {ReaderText.Of(item.specimen.WaterContent)}) is set aside: {item.specimen.SetAside}. It is drawn, not fitted."));

    private static double Median(IEnumerable<double> values)
    {
        var sorted = values.Order().ToList();
        return sorted.Count % 2 == 1 ? sorted[sorted.Count / 2] : (sorted[(sorted.Count / 2) - 1] + sorted[sorted.Count / 2]) / 2;
    }

    private static string Listed(IEnumerable<string> names) => string.Join(" and ", names);
}
