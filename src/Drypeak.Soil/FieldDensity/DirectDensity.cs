using Drypeak.Soil.Quantities;

namespace Drypeak.Soil.FieldDensity;

/// <summary>A density that was found elsewhere, by any method.</summary>
/// <param name="WetDensity">Wet density, or null.</param>
/// <param name="DryDensity">Dry density, or null.</param>
public sealed record DirectDensity(Density? WetDensity, Density? DryDensity) : DensityMethod
{
    /// <inheritdoc/>
    public override string Code => "direct";

    /// <inheritdoc/>
    public override string Place => "/direct";

    internal override MeasuredInPlace Read(FieldSheet sheet) => new(WetDensity, DryDensity, null);
}
