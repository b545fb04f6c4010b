using Drypeak.Soil.Curves;
using Drypeak.Soil.Quantities;

namespace Drypeak.Soil.Laboratory.Review;

/// <summary>The review of a laboratory test, as a careful colleague would do it.</summary>
public static class TestReview
{
    /// <summary>All findings on a test and its result, worst first; in the order of the review within a severity.</summary>
    public static IReadOnlyList<Finding> Of(MoistureDensityTest test, MoistureDensityResult result)
    {
        var reviewed = new ReviewedTest(test, result);
        return
        [
            .. SpecimenReview.Of(reviewed)
                .Concat(CoverageReview.Of(reviewed))
                .Concat(CurveReview.Of(reviewed))
                .Concat(MaterialReview.Of(reviewed))
                .OrderBy(finding => finding.Severity),
        ];
    }
}

/// <summary>A test beside its result, with what the parts of the review share.</summary>
/// <param name="Test">The test.</param>
/// <param name="Result">Its result, without findings.</param>
internal sealed record ReviewedTest(MoistureDensityTest Test, MoistureDensityResult Result)
{
    /// <summary>The specimens kept, each with its position in the request.</summary>
    public IReadOnlyList<(Specimen Specimen, int Index)> Kept { get; } =
        [.. Result.Specimens.Select((specimen, i) => (specimen, i)).Where(item => item.specimen.SetAside is null)];

    /// <summary>The specimens kept in order of water content, then of dry density: what is said of them does not hang on the order of the request.</summary>
    public IReadOnlyList<(Specimen Specimen, int Index)> Sorted =>
        [.. Kept.OrderBy(item => item.Specimen.WaterContent.Fraction).ThenBy(item => item.Specimen.DryDensity.KilogramsPerCubicMeter)];

    /// <summary>The fitted peak, or null.</summary>
    public FittedOptimum? Optimum => Result.Optimum;

    /// <summary>JSON pointer of a specimen.</summary>
    public static string PlaceOf(int index) => $"/specimens/{index}";

    /// <summary>A density in the caller's unit.</summary>
    public string Text(double kilogramsPerCubicMeter) => ReaderText.Of(new Density(kilogramsPerCubicMeter), Test.Units.Density);
}
