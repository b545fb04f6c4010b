using Drypeak.Soil.FieldDensity.Review;
using Drypeak.Soil.Quantities;

namespace Drypeak.Soil.FieldDensity;

/// <summary>The rubber balloon (ASTM D2167): a membrane full of water is pressed into the hole; V = final − initial reading.</summary>
/// <param name="InitialReading">On the flat surface, before the hole.</param>
/// <param name="FinalReading">In the hole.</param>
public sealed record RubberBalloon(Volume InitialReading, Volume FinalReading) : VolumeMethod
{
    /// <inheritdoc/>
    public override string Code => "rubber-balloon";

    /// <inheritdoc/>
    public override string Place => "/rubberBalloon";

    internal override MeasuredHole Measure(FieldSheet sheet)
    {
        var hole = new Volume(FinalReading.CubicMeters - InitialReading.CubicMeters);
        if (hole.CubicMeters <= 0)
        {
            sheet.Find(FieldFindingKinds.NoVolume, Place + "/finalReading",
                $"The reading in the hole, {sheet.ReaderVolume(FinalReading.CubicMeters)}, is not over the one before it, {sheet.ReaderVolume(InitialReading.CubicMeters)}: the hole has no volume. Were the two exchanged?");
            return default;
        }

        sheet.Step(FieldFormulas.HoleByBalloon, "volume of the hole", $"{sheet.Text(FinalReading)} - {sheet.Text(InitialReading)}", hole);
        return new MeasuredHole(hole, null);
    }
}
