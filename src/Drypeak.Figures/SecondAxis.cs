using Drypeak.Soil.Quantities;

namespace Drypeak.Figures;

/// <summary>What a second axis at the right shows: the density in another unit, or the void ratio.</summary>
/// <param name="Unit">The unit; null for the void ratio.</param>
public sealed record SecondAxis(DensityUnit? Unit)
{
    /// <summary>Void ratio, from the specific gravity of solids.</summary>
    public static SecondAxis VoidRatio { get; } = new((DensityUnit?)null);

    /// <summary>Every axis that there is.</summary>
    public static IReadOnlyList<SecondAxis> All { get; } = [.. Enum.GetValues<DensityUnit>().Select(unit => new SecondAxis(unit)), VoidRatio];

    /// <summary>Its name in an address: the unit's, or <c>void-ratio</c>.</summary>
    public string Name => Unit?.Code() ?? "void-ratio";
}
