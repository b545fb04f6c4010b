using Drypeak.Soil.Quantities;
using static Drypeak.Soil.Laboratory.Review.ReviewedTest;

namespace Drypeak.Soil.Laboratory.Review;

/// <summary>Whether the specimens bracket the peak: how many, how far apart, on which side.</summary>
internal static class CoverageReview
{
    private const int UsualMinimum = 4;
    private const double UsualGreatestSpacing = 4;

    /// <summary>Above this chance of a peak outside the tested range the optimum is not bracketed.</summary>
    private const double EdgeChance = 0.15;

    public static IEnumerable<Finding> Of(ReviewedTest review) =>
        [.. TooFew(review), .. Spacing(review), .. Peak(review)];

    private static IEnumerable<Finding> TooFew(ReviewedTest review)
    {
        var method = review.Test.Method;
        var needed = method?.MinimumSpecimens?.Value ?? UsualMinimum;
        var kept = review.Kept.Count;
        if (kept < needed)
        {
            var who = method?.MinimumSpecimens is { } ? method.Title + " asks" : "A compaction curve asks";
            yield return FindingKinds.TooFewSpecimens.At("/specimens",
                $"{who} for at least {needed} specimens; {kept} {(kept == 1 ? "is" : "are")} kept. Make {needed - kept} more, so that two stand on each side of the optimum.",
                kept < 3 ? Severity.Error : Severity.Warning,
                method?.MinimumSpecimens is { } asked ? method.Cite(asked.Source) : null);
        }
    }

    private static IEnumerable<Finding> Spacing(ReviewedTest review)
    {
        var method = review.Test.Method;
        var methods = method?.GreatestSpacingPercent;
        var greatest = methods?.Value ?? UsualGreatestSpacing;
        var sorted = review.Sorted;
        for (var i = 1; i < sorted.Count; i++)
        {
            var (drier, wetter) = (sorted[i - 1].Specimen, sorted[i].Specimen);
            var apart = wetter.WaterContent.Percent - drier.WaterContent.Percent;
            if (apart > greatest * (1 + 1e-9))
            {
                yield return FindingKinds.WideSpacing.At(PlaceOf(sorted[i].Index),
                    $"Specimens {drier.Label} and {wetter.Label} are {ReaderText.Fixed(apart, 1)} % water apart ({ReaderText.Of(drier.WaterContent)} and {ReaderText.Of(wetter.WaterContent)}), where {ReaderText.Significant(greatest)} % is the most. Make a specimen between them.",
                    methods is null ? Severity.Note : Severity.Warning,
                    methods is null ? null : method!.Cite(methods.Source));
            }
        }
    }

    private static IEnumerable<Finding> Peak(ReviewedTest review)
    {
        if (review.Result.Curve is not { } curve || review.Optimum is not { } optimum)
        {
            yield return FindingKinds.NoOptimum.At("/specimens",
                ((review.Result.Curve?.Chosen.WhyNot is { } why ? why + " " : "No specimen is kept. ") + Missing(review)).TrimEnd());
            yield break;
        }

        if (curve.Chosen.ChanceOfPeakOutside is > EdgeChance and var chance)
        {
            yield return FindingKinds.OptimumAtEdge.At("/specimens",
                $"The chance that the peak lies outside the tested range is {ReaderText.Percent(chance, 0)}; over {ReaderText.Percent(EdgeChance, 0)} it is not bracketed. {Missing(review)}");
        }

        var dry = review.Kept.Count(item => item.Specimen.WaterContent.Fraction < optimum.WaterContent.Value);
        var wet = review.Kept.Count(item => item.Specimen.WaterContent.Fraction > optimum.WaterContent.Value);
        foreach (var (side, count) in new[] { ("dry", dry), ("wet", wet) })
        {
            if (count < 2)
            {
                yield return FindingKinds.FewOnASide.At("/specimens",
                    $"{(count == 0 ? "No specimen stands" : "Only one specimen stands")} {side} of the optimum, {ReaderText.Of(new WaterContent(optimum.WaterContent.Value))}. Make another {(side == "dry" ? "drier" : "wetter")} than it.");
            }
        }
    }

    /// <summary>Which specimens would bracket the peak.</summary>
    private static string Missing(ReviewedTest review)
    {
        if (review.Sorted is not { Count: >= 2 } sorted)
        {
            return "Make specimens at several water contents, about 2 % apart.";
        }

        var highest = sorted.MaxBy(item => item.Specimen.DryDensity.KilogramsPerCubicMeter).Specimen;
        return highest.WaterContent == sorted[^1].Specimen.WaterContent
            ? $"Make specimens wetter than {ReaderText.Of(sorted[^1].Specimen.WaterContent)}, until dry density has fallen twice."
            : highest.WaterContent == sorted[0].Specimen.WaterContent
                ? $"Make specimens drier than {ReaderText.Of(sorted[0].Specimen.WaterContent)}, until dry density has fallen twice."
                : "Make specimens on both sides of the densest.";
    }
}
