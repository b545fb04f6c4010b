using Drypeak.Soil.Quantities;
using Drypeak.Soil.TestMethods;

namespace Drypeak.Soil.Laboratory.Review;

/// <summary>What is wrong with solids, particles and oversize, against the method and in themselves. Places are those of a laboratory request.</summary>
public static class MaterialReview
{
    private const double LeastSpecificGravity = 2.2;
    private const double GreatestSpecificGravity = 3.2;

    internal static IEnumerable<Finding> Of(ReviewedTest review) =>
        [.. (review.Test.SpecificGravity is { } gravity ? SpecificGravity(gravity) : NoSpecificGravity()), .. MoldReview.Of(review), .. Particles(review.Test), .. (review.Test.Oversize is { } oversize ? Oversize(oversize, review.Test.Method) : []), .. Method(review.Test)];

    /// <summary>What is said of a specific gravity.</summary>
    public static IEnumerable<Finding> SpecificGravity(SpecificGravity gravity)
    {
        if (gravity.Value is < LeastSpecificGravity or > GreatestSpecificGravity)
        {
            yield return FindingKinds.SpecificGravityUnusual.At("/specificGravity/value",
                $"The specific gravity is {ReaderText.Significant(gravity.Value)}; mineral soils lie between {ReaderText.Significant(LeastSpecificGravity)} and {ReaderText.Significant(GreatestSpecificGravity)}. Check it; keep it if the soil is organic or holds heavy minerals.");
        }

        if (!gravity.Measured)
        {
            yield return FindingKinds.SpecificGravityAssumed.At("/specificGravity",
                $"The specific gravity of {ReaderText.Significant(gravity.Value)} is assumed: saturations and lines are only as good as that.");
        }
    }

    private static IEnumerable<Finding> NoSpecificGravity() =>
    [
        FindingKinds.SpecificGravityMissing.At("",
            "No specific gravity was given: there are no saturations, no lines and no saturation model, and no check against the zero-air-voids line. Give it, marked as assumed if it was not measured."),
    ];

    private static IEnumerable<Finding> Particles(MoistureDensityTest test)
    {
        if (test is { Method: { OversizeSieveMillimeters.Value: var sieve, OversizeLimitPercent: { Value: var limit, Source: var source } } method, ParticlesAbove: { } particles }
            && particles.SieveMillimeters >= sieve && particles.Fraction * 100 > limit * (1 + 1e-9))
        {
            yield return FindingKinds.ParticlesAboveLimit.At("/particlesAbove",
                $"{ReaderText.Percent(particles.Fraction)} of the material stays on {ReaderText.Significant(particles.SieveMillimeters)} mm; {method.Title} allows {ReaderText.Significant(limit)} % on {ReaderText.Significant(sieve)} mm. Use the method for coarser material.",
                basis: method.Cite(source));
        }
    }

    /// <summary>What is said of a share of oversize.</summary>
    /// <param name="oversize">The oversize.</param>
    /// <param name="method">The method whose limit holds, or null: then the correction's own.</param>
    public static IEnumerable<Finding> Oversize(Oversize oversize, TestMethod? method)
    {
        var methods = method?.OversizeLimitPercent?.Value / 100;
        var limit = methods ?? OversizeCorrection.LargestShare(oversize.SieveMillimeters ?? method?.OversizeSieveMillimeters?.Value);
        if (oversize.Fraction > limit * (1 + 1e-9))
        {
            yield return FindingKinds.OversizeAboveLimit.At("/oversize/percent",
                $"Oversize is {ReaderText.Percent(oversize.Fraction)} of the dry mass; {(methods is null ? "the correction" : method!.Title)} is valid to {ReaderText.Percent(limit, 0)}. The corrected values are outside the procedure: use a larger mold or another method.",
                basis: method?.OversizeLimitPercent is { } asked ? method.Cite(asked.Source) : null);
        }

        if (method is not null && oversize is { SpecificGravity: { }, Fraction: > 0 } && OutsideMethod(oversize, method) is { } outside)
        {
            yield return outside;
        }

        if (oversize.Fraction > OversizeCorrection.NeededAbove * (1 + 1e-9))
        {
            if (oversize.SpecificGravity is null)
            {
                yield return FindingKinds.OversizeNotCorrected.At("/oversize",
                    $"Oversize is {ReaderText.Percent(oversize.Fraction)} of the dry mass, over {ReaderText.Percent(OversizeCorrection.NeededAbove, 0)}, and was not corrected for: give its bulk specific gravity.");
            }
        }
        else if (oversize.SpecificGravity is { })
        {
            yield return FindingKinds.OversizeSmall.At("/oversize/percent",
                $"Oversize is {ReaderText.Percent(oversize.Fraction)} of the dry mass: up to {ReaderText.Percent(OversizeCorrection.NeededAbove, 0)} the standards ask for no correction. It is computed all the same.");
        }
    }

    /// <summary>Whether the method has a procedure for this oversize at all.</summary>
    private static Finding? OutsideMethod(Oversize oversize, TestMethod method)
    {
        if (method.OversizeLimitPercent is null)
        {
            return FindingKinds.OversizeOutsideMethod.At("/oversize",
                $"{method.Title} has no procedure for oversize that is at hand: the corrected values are ASTM D4718's. Agree on them, and report them as outside the method.",
                basis: $"No procedure for oversize in the catalogue's row of {method.Title}; ASTM D4718");
        }

        return method.OversizeSieveMillimeters is { } asked && oversize.SieveMillimeters is { } sieve && Math.Abs(sieve - asked.Value) > 0.01 * asked.Value
            ? FindingKinds.OversizeOutsideMethod.At("/oversize/sieve",
                $"The oversize was parted on {ReaderText.Significant(sieve)} mm; {method.Title} parts it on {ReaderText.Significant(asked.Value)} mm. Name the method that goes with the sieve, or report the corrected values as outside it.",
                Severity.Warning, method.Cite(asked.Source))
            : null;
    }

    private static IEnumerable<Finding> Method(MoistureDensityTest test)
    {
        if (test.Method is null && !test.IsCustomMethod)
        {
            yield return FindingKinds.MethodNotGiven.At("", "No test method was named, so nothing of a method was checked. Name it to have mold, spacing, particles and reporting checked.");
        }
    }
}
