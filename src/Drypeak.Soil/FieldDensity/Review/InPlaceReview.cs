using Drypeak.Soil.Laboratory.Review;
using Drypeak.Soil.Phases;
using Drypeak.Soil.Quantities;

namespace Drypeak.Soil.FieldDensity.Review;

/// <summary>Whether any soil could lie in place as the readings say.</summary>
internal static class InPlaceReview
{
    private const double LeastDryDensity = 300;
    private const double GreatestDryDensity = 2800;

    /// <summary>Above the zero-air-voids line by less than this, a point may still lie on it: rounding, or the density of water.</summary>
    private const double WithinRounding = 0.002;

    private const double Arithmetic = 1e-9;

    public static IEnumerable<Finding> Of(FieldTest test, SoilInPlace soil)
    {
        if (soil.DryDensity is not { } dry)
        {
            yield break;
        }

        string Text(double density) => ReaderText.Of(new Density(density), test.Units.Density);
        if (dry.KilogramsPerCubicMeter is < LeastDryDensity or > GreatestDryDensity)
        {
            yield return FindingKinds.ImpossibleDensity.At(test.Method.Place,
                $"The dry density in place is {Text(dry.KilogramsPerCubicMeter)}; compacted soil lies between {Text(LeastDryDensity)} and {Text(GreatestDryDensity)}. Check volume, masses and units.");
        }

        if (test.SpecificGravity is not { } gravity)
        {
            yield break;
        }

        var solids = gravity.Value * test.WaterDensity.KilogramsPerCubicMeter;
        if (dry.KilogramsPerCubicMeter >= solids)
        {
            yield return FindingKinds.DensityAboveSolids.At(test.Method.Place,
                $"The dry density in place is {Text(dry.KilogramsPerCubicMeter)}, not below the {Text(solids)} of its solids. Check volume, masses and specific gravity.");
        }
        else if (soil.WaterContent is { } w
            && PhaseRelations.OnZeroAirVoidsLine(w, gravity.Value, test.WaterDensity).KilogramsPerCubicMeter is var most
            && dry.KilogramsPerCubicMeter > most * (1 + Arithmetic))
        {
            var slight = dry.KilogramsPerCubicMeter <= most * (1 + WithinRounding);
            yield return FindingKinds.AboveZeroAirVoids.At(test.Method.Place,
                $"The soil in place lies above the zero-air-voids line: {Text(dry.KilogramsPerCubicMeter)} where {Text(most)} is the most at {ReaderText.Of(w)} water. "
                    + (slight ? "That is within what rounding or the density of water can bring. Look at the readings."
                        : gravity.Measured ? "Check volume, masses, water content and specific gravity."
                        : $"The specific gravity of {ReaderText.Significant(gravity.Value)} is assumed: measure it, or check the readings."),
                slight ? Severity.Note : gravity.Measured ? Severity.Error : Severity.Warning);
        }
    }
}
