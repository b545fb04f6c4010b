using Drypeak.Soil.Phases;
using Drypeak.Soil.Quantities;
using static Drypeak.Soil.Laboratory.Review.ReviewedTest;

namespace Drypeak.Soil.Laboratory.Review;

/// <summary>What is wrong with the curve as a whole.</summary>
internal static class CurveReview
{
    /// <summary>kg/m³; over it the points follow no single curve.</summary>
    private const double GreatestDeparture = 20;

    /// <summary>kg/m³; an inner point so far from its prediction can be told among few, if the prediction is no wild guess.</summary>
    private const double FarOff = 60;

    /// <summary>The same in standard uncertainties of the prediction.</summary>
    private const double FarOffAmongFew = 2.5;

    /// <summary>From six points on, in standard uncertainties of the prediction.</summary>
    private const double FarOffAmongMany = 3;

    private const int Many = 6;
    private const double WaterContentsApart = 0.005;
    private const double DensitiesApart = 20;
    private const double LeastSlopeRatio = 1.0 / 3;
    private const double GreatestSlopeRatio = 3;
    private const double LeastSaturation = 0.75;
    private const double GreatestSaturation = 0.95;

    public static IEnumerable<Finding> Of(ReviewedTest review) =>
        [.. TwoPeaks(review), .. FarOffPoints(review), .. WetLeg(review), .. SaturationAtOptimum(review), .. Models(review), .. Adopted(review)];

    private static IEnumerable<Finding> TwoPeaks(ReviewedTest review)
    {
        if (review.Result.Curve is { DepartureFromOnePeak: > GreatestDeparture and var departure })
        {
            yield return FindingKinds.TwoPeaks.At("/specimens",
                $"The points do not rise once and then fall: they are {review.Text(departure)} from any such sequence, where {review.Text(GreatestDeparture)} is the most. Look for a specimen that does not belong, or repeat the test.");
        }
    }

    private static IEnumerable<Finding> FarOffPoints(ReviewedTest review)
    {
        if (review.Result.Curve is not { } curve || curve.Chosen.Predictions.Count != review.Kept.Count)
        {
            yield break;
        }

        var (driest, wettest) = (review.Sorted[0].Index, review.Sorted[^1].Index);
        for (var i = 0; i < review.Kept.Count; i++)
        {
            var (specimen, index) = review.Kept[i];
            var prediction = curve.Chosen.Predictions[i];
            var off = Math.Abs(specimen.DryDensity.KilogramsPerCubicMeter - prediction.DryDensity);
            var inner = index != driest && index != wettest;
            var apart = prediction.StandardUncertainty is > 0 and var u ? off / u : 0;
            var told = review.Kept.Count >= Many ? apart > FarOffAmongMany : inner && off > FarOff && apart > FarOffAmongFew;
            if (told)
            {
                yield return FindingKinds.PointFarOff.At(PlaceOf(index),
                    $"Specimen {specimen.Label} has {review.Text(specimen.DryDensity.KilogramsPerCubicMeter)}, where the others say {review.Text(prediction.DryDensity)}: {review.Text(off)} apart. Check its weighings, and make it again.");
            }
        }
    }

    private static IEnumerable<Finding> WetLeg(ReviewedTest review)
    {
        if (review.Test.SpecificGravity is not { } gravity || review.Optimum is not { } optimum)
        {
            yield break;
        }

        var wet = review.Sorted.Where(item => item.Specimen.WaterContent.Fraction > optimum.WaterContent.Value).ToList();
        if (wet.Count < 2)
        {
            yield break;
        }

        var (first, last) = (wet[^2].Specimen, wet[^1].Specimen);
        var run = last.WaterContent.Fraction - first.WaterContent.Fraction;
        if (run <= 0)
        {
            yield break;
        }

        double Line(WaterContent w) => PhaseRelations.OnZeroAirVoidsLine(w, gravity.Value, review.Test.WaterDensity).KilogramsPerCubicMeter;
        var fall = first.DryDensity.KilogramsPerCubicMeter - last.DryDensity.KilogramsPerCubicMeter;
        var ratio = fall / (Line(first.WaterContent) - Line(last.WaterContent));
        if (ratio is < LeastSlopeRatio or > GreatestSlopeRatio)
        {
            yield return FindingKinds.WetLegNotParallel.At(PlaceOf(wet[^1].Index),
                $"Between specimens {first.Label} and {last.Label} dry density falls {ReaderText.Fixed(ratio, 1)} times as fast as the zero-air-voids line; wet of the optimum the two are roughly parallel. Check the wettest specimens and the specific gravity.");
        }
    }

    private static IEnumerable<Finding> SaturationAtOptimum(ReviewedTest review)
    {
        if (review.Test.SpecificGravity is not { } gravity || review.Optimum is not { } optimum)
        {
            yield break;
        }

        var w = new WaterContent(optimum.WaterContent.Value);
        var voidRatio = PhaseRelations.VoidRatio(new Density(optimum.MaximumDryDensity.Value), gravity.Value, review.Test.WaterDensity);
        if (voidRatio > 0 && PhaseRelations.Saturation(w, voidRatio, gravity.Value) is (< LeastSaturation or > GreatestSaturation) and var saturation)
        {
            yield return FindingKinds.SaturationAtOptimumUnusual.At("/specificGravity",
                $"At the optimum the saturation is {ReaderText.Percent(saturation)}; most soils have {ReaderText.Percent(LeastSaturation, 0)} to {ReaderText.Percent(GreatestSaturation, 0)}. Check the specific gravity and the mold's volume.");
        }
    }

    private static IEnumerable<Finding> Models(ReviewedTest review)
    {
        if (review.Optimum is not { } optimum)
        {
            yield break;
        }

        var others = review.Result.Curve!.Alternatives.Where(model => model is { Admissible: true, Optimum: { } }).ToList();
        var apart = others.Select(model => (model.Model,
            Water: Math.Abs(model.Optimum!.WaterContent.Value - optimum.WaterContent.Value),
            Density: Math.Abs(model.Optimum.MaximumDryDensity.Value - optimum.MaximumDryDensity.Value))).ToList();
        if (apart.Any(model => model.Water > WaterContentsApart || model.Density > DensitiesApart))
        {
            var furthest = apart.MaxBy(model => Math.Max(model.Water / WaterContentsApart, model.Density / DensitiesApart));
            yield return FindingKinds.ModelsDisagree.At("/curve/model",
                $"The {NameOf(furthest.Model)} has its peak {ReaderText.Fixed(furthest.Water * 100, 2)} % water and {review.Text(furthest.Density)} from the one reported. The choice of the curve matters here: make the suggested specimen.");
        }
    }

    private static string NameOf(Curves.CurveModel model) =>
        model is Curves.CurveModel.Averaged or Curves.CurveModel.Saturation ? model.ToString().ToLowerInvariant() + " curve" : model.ToString().ToLowerInvariant();

    private static IEnumerable<Finding> Adopted(ReviewedTest review)
    {
        if (review.Test.Adopted is not { } adopted)
        {
            yield break;
        }

        if (review.Optimum is not { } fitted)
        {
            yield return FindingKinds.PeakAdopted.At("/curve/adopted",
                $"The peak reported, {review.Text(adopted.MaximumDryDensity.KilogramsPerCubicMeter)} at {ReaderText.Of(adopted.WaterContent)}, is adopted: {adopted.Reason}. The points give no peak to hold it against.", Severity.Warning);
            yield break;
        }

        var water = adopted.WaterContent.Fraction - fitted.WaterContent.Value;
        var density = adopted.MaximumDryDensity.KilogramsPerCubicMeter - fitted.MaximumDryDensity.Value;
        var large = Beyond(water, fitted.WaterContent.StandardUncertainty) || Beyond(density, fitted.MaximumDryDensity.StandardUncertainty);
        yield return FindingKinds.PeakAdopted.At("/curve/adopted",
            $"The peak reported, {review.Text(adopted.MaximumDryDensity.KilogramsPerCubicMeter)} at {ReaderText.Of(adopted.WaterContent)}, is adopted: {adopted.Reason}. It differs from the fitted one by {Signed(water * 100, 2)} % water{Against(fitted.WaterContent.StandardUncertainty is { } uw ? $"{ReaderText.Fixed(uw * 100, 2)} %" : null)} and by {(density < 0 ? "−" : "+")}{review.Text(Math.Abs(density))}{Against(fitted.MaximumDryDensity.StandardUncertainty is { } ud ? review.Text(ud) : null)}.",
            large ? Severity.Warning : Severity.Note);

        static bool Beyond(double difference, double? uncertainty) => uncertainty is { } u && Math.Abs(difference) > 2 * u;
        static string Against(string? uncertainty) => uncertainty is null ? "" : $" (standard uncertainty {uncertainty})";
        static string Signed(double value, int decimals) => (value < 0 ? "" : "+") + ReaderText.Fixed(value, decimals);
    }
}
