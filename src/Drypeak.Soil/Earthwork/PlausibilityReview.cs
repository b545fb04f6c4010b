using Drypeak.Soil.Laboratory.Review;
using Drypeak.Soil.Quantities;

namespace Drypeak.Soil.Earthwork;

/// <summary>Findings that several jobs share: numbers that are possible, and not likely.</summary>
internal static class PlausibilityReview
{
    /// <summary>More water than this share of the dry mass does not go into a lift at once: common practice, no source.</summary>
    public const double MostAtOnce = 0.05;

    private const double LeastDryDensity = 300;
    private const double GreatestDryDensity = 2800;
    private const double ThinnestLift = 0.05;
    private const double ThickestLift = 1;
    private const double Arithmetic = 1e-9;

    /// <summary>Water contents that are all below 1 % look like fractions.</summary>
    public static IEnumerable<Finding> Fractions(IEnumerable<WaterContent> waterContents, string place)
    {
        var percents = waterContents.Select(w => w.Percent).ToList();
        if (percents.Count >= 2 && percents.All(percent => percent < 1) && percents.Max() is > 0 and var greatest)
        {
            yield return FindingKinds.FractionsForPercent.At(place,
                $"All water contents are below 1 %: the greatest is {ReaderText.Fixed(greatest, 3)} %. They look like fractions; give percent ({ReaderText.Fixed(greatest * 100, 1)} for {ReaderText.Fixed(greatest, 3)}).");
        }
    }

    /// <summary>A dry density that no soil has.</summary>
    public static IEnumerable<Finding> DryDensity(Density density, string place, EarthworkUnits units)
    {
        if (density.KilogramsPerCubicMeter is < LeastDryDensity * (1 - Arithmetic) or > GreatestDryDensity * (1 + Arithmetic))
        {
            yield return FindingKinds.ImpossibleDensity.At(place,
                $"The dry density is {ReaderText.Of(density, units.Density)}; soil lies between {ReaderText.Of(new Density(LeastDryDensity), units.Density)} and {ReaderText.Of(new Density(GreatestDryDensity), units.Density)}. Check the value and its unit.");
        }
    }

    /// <summary>A lift that is hardly one.</summary>
    public static IEnumerable<Finding> Thickness(Length thickness, string place, EarthworkUnits units)
    {
        if (thickness.Meters is < ThinnestLift * (1 - Arithmetic) or > ThickestLift * (1 + Arithmetic))
        {
            yield return EarthworkFindingKinds.LiftThicknessUnusual.At(place,
                $"The lift is {ReaderText.Of(thickness, units.Length)} thick; lifts lie between {ReaderText.Of(new Length(ThinnestLift), units.Length)} and {ReaderText.Of(new Length(ThickestLift), units.Length)}. Check the number and its unit.");
        }
    }
}
