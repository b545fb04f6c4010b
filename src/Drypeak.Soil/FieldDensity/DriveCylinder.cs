using Drypeak.Soil.Laboratory.Workings;
using Drypeak.Soil.Quantities;

namespace Drypeak.Soil.FieldDensity;

/// <summary>The drive cylinder or core cutter (ASTM D2937; BS 1377-9): a thin tube is driven and trimmed; its volume is given or V = π·d²·h/4.</summary>
/// <param name="Volume">Volume, or null.</param>
/// <param name="Diameter">Inside diameter, or null; with the height.</param>
/// <param name="Height">Height, or null.</param>
public sealed record DriveCylinder(Volume? Volume, Length? Diameter, Length? Height) : VolumeMethod
{
    /// <inheritdoc/>
    public override string Code => "drive-cylinder";

    /// <inheritdoc/>
    public override string Place => "/driveCylinder";

    internal override MeasuredHole Measure(FieldSheet sheet)
    {
        if (Diameter is not { } diameter || Height is not { } height)
        {
            return new MeasuredHole(Volume, null);
        }

        var cylinder = Quantities.Volume.OfCylinder(diameter, height);
        var inMeters = sheet.Units.Length.InMeters();
        sheet.Step(FieldFormulas.VolumeOfCylinder, "volume of the cylinder",
            $"{WorkingNumbers.Number(Math.PI)}*{WorkingNumbers.Number(diameter.In(sheet.Units.Length))}^2*{WorkingNumbers.Number(height.In(sheet.Units.Length))}/4{FieldSheet.Factor(inMeters * inMeters * inMeters / sheet.Units.Volume.InCubicMeters())}",
            cylinder);
        if (Volume is { } given)
        {
            sheet.HoldAgainst(cylinder.CubicMeters, given.CubicMeters, Place + "/volume", "the volume", sheet.ReaderVolume, "diameter and height");
        }

        return new MeasuredHole(Volume ?? cylinder, null);
    }
}
