using Drypeak.Soil.FieldDensity.Review;
using Drypeak.Soil.Quantities;

namespace Drypeak.Soil.FieldDensity;

/// <summary>Water replacement in a test pit (ASTM D5030): V = water in template and pit − water in the template alone.</summary>
/// <param name="WithHole">Water that fills pit and template.</param>
/// <param name="TemplateOnly">Water that fills the template on the flat surface.</param>
public sealed record WaterReplacement(Volume WithHole, Volume TemplateOnly) : VolumeMethod
{
    /// <inheritdoc/>
    public override string Code => "water-replacement";

    /// <inheritdoc/>
    public override string Place => "/waterReplacement";

    internal override MeasuredHole Measure(FieldSheet sheet)
    {
        var pit = new Volume(WithHole.CubicMeters - TemplateOnly.CubicMeters);
        if (pit.CubicMeters <= 0)
        {
            sheet.Find(FieldFindingKinds.NoVolume, Place + "/withHole",
                $"Pit and template took {sheet.ReaderVolume(WithHole.CubicMeters)}, the template alone {sheet.ReaderVolume(TemplateOnly.CubicMeters)}: the pit has no volume. Were the two exchanged?");
            return default;
        }

        sheet.Step(FieldFormulas.HoleByWater, "volume of the pit", $"{sheet.Text(WithHole)} - {sheet.Text(TemplateOnly)}", pit);
        return new MeasuredHole(pit, null);
    }
}
