using Drypeak.Soil.Quantities;
using Drypeak.Soil.TestMethods;

namespace Drypeak.Soil.Laboratory.Review;

/// <summary>Whether the molds are those of the method: their volumes, and their dimensions where they are given.</summary>
internal static class MoldReview
{
    /// <summary>Where no tolerance of the method is at hand, a volume off by more than this share is said (common practice, no source).</summary>
    private const double UsualTolerance = 0.02;

    private const double Arithmetic = 1e-9;

    public static IEnumerable<Finding> Of(ReviewedTest review) => review.Test.Method is { } method
        ? [.. Volumes(review, method), .. Dimensions(review.Test, method)]
        : [];

    private static IEnumerable<Finding> Volumes(ReviewedTest review, TestMethod method)
    {
        var (asked, units) = (method.MoldVolume, review.Test.Units);
        var tolerance = asked.Tolerance?.CubicMeters ?? (UsualTolerance * asked.Value.CubicMeters);
        var molds = review.Result.Specimens
            .Select((specimen, i) => (specimen.MoldVolume, Place: review.Test.Specimens[i].Mold is null ? "/mold" : ReviewedTest.PlaceOf(i) + "/mold"))
            .Where(item => item.MoldVolume is { }).DistinctBy(item => item.Place);
        foreach (var (volume, place) in molds)
        {
            var off = volume!.Value.CubicMeters - asked.Value.CubicMeters;
            if (Math.Abs(off) <= tolerance * (1 + Arithmetic))
            {
                continue;
            }

            yield return asked.Tolerance is { } allowed
                ? FindingKinds.MoldOutsideTolerance.At(place,
                    $"The mold holds {ReaderText.Of(volume.Value, units.Volume)}; {method.Title} asks for {ReaderText.Of(asked.Value, units.Volume)} ± {ReaderText.Of(allowed, units.Volume)}. Calibrate it; check volume and unit.",
                    basis: method.Cite(asked.Source))
                : FindingKinds.MoldOutsideTolerance.At(place,
                    $"The mold holds {ReaderText.Of(volume.Value, units.Volume)}, {ReaderText.Percent(off / asked.Value.CubicMeters)} off the {ReaderText.Of(asked.Value, units.Volume)} of {method.Title}; no tolerance of the method is at hand. Check volume and unit, and that the method is the one meant.",
                    Severity.Note, $"{method.Cite(asked.Source)}; more than {ReaderText.Percent(UsualTolerance, 0)} off: common practice, no source");
        }
    }

    /// <summary>Each mold as it is given, the test's and the specimens' own: what it does not say itself is not held against it.</summary>
    private static IEnumerable<Finding> Dimensions(MoistureDensityTest test, TestMethod method)
    {
        var molds = test.Specimens.Select((specimen, i) => (specimen.Mold, Place: ReviewedTest.PlaceOf(i) + "/mold")).Prepend((test.Mold, "/mold"));
        foreach (var (mold, place) in molds)
        {
            if (Dimension(mold?.Diameter, "diameter", place, method.MoldDiameter) is { } wide)
            {
                yield return wide;
            }

            if (Dimension(mold?.Height, "height", place, method.MoldHeight) is { } high)
            {
                yield return high;
            }
        }

        Finding? Dimension(MeasuredLength? measured, string name, string place, Sourced<Length>? asked)
        {
            if (measured is null || asked is not { Value: var nominal, Tolerance: { } tolerance }
                || Math.Abs(measured.Value.Meters - nominal.Meters) <= tolerance.Meters * (1 + Arithmetic))
            {
                return null;
            }

            var unit = test.Units.Length;
            return FindingKinds.MoldOutsideTolerance.At($"{place}/{name}{(measured.Given is null ? "s" : "")}",
                $"The mold's {name} is {ReaderText.Of(measured.Value, unit)}; {method.Title} asks for {ReaderText.Of(nominal, unit)} ± {ReaderText.Of(tolerance, unit)}. Measure it again; a worn mold is replaced.",
                basis: method.Cite(asked.Source));
        }
    }
}
