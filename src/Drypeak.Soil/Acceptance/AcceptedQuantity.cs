namespace Drypeak.Soil.Acceptance;

/// <summary>A quantity that a specification may set limits to.</summary>
public enum AcceptedQuantity
{
    /// <summary>Dry density over the reference's maximum dry density; a fraction.</summary>
    RelativeCompaction,
    /// <summary>kg/m³.</summary>
    DryDensity,
    /// <summary>kg/m³.</summary>
    WetDensity,
    /// <summary>On dry mass; a fraction.</summary>
    WaterContent,
    /// <summary>Water content less the reference's optimum; a fraction, negative on the dry side.</summary>
    WaterContentFromOptimum,
    /// <summary>Degree of saturation; a fraction of the voids.</summary>
    Saturation,
    /// <summary>A fraction of the total volume.</summary>
    AirVoids,
    /// <summary>Relative density of a free-draining soil; a fraction.</summary>
    RelativeDensity,
    /// <summary>Volume of voids over volume of solids.</summary>
    VoidRatio,
}

/// <summary>What kind of number a quantity is.</summary>
public static class AcceptedQuantities
{
    /// <summary>Whether it is a density, kept in kg/m³.</summary>
    public static bool IsDensity(this AcceptedQuantity quantity) => quantity is AcceptedQuantity.DryDensity or AcceptedQuantity.WetDensity;

    /// <summary>Whether it is kept as a fraction and written in %.</summary>
    public static bool IsPercent(this AcceptedQuantity quantity) => !quantity.IsDensity() && quantity != AcceptedQuantity.VoidRatio;

    /// <summary>As it stands in a sentence: <c>relative compaction</c>.</summary>
    public static string Words(this AcceptedQuantity quantity) => quantity switch
    {
        AcceptedQuantity.RelativeCompaction => "relative compaction",
        AcceptedQuantity.DryDensity => "dry density",
        AcceptedQuantity.WetDensity => "wet density",
        AcceptedQuantity.WaterContent => "water content",
        AcceptedQuantity.WaterContentFromOptimum => "water content from the optimum",
        AcceptedQuantity.Saturation => "degree of saturation",
        AcceptedQuantity.AirVoids => "air voids",
        AcceptedQuantity.RelativeDensity => "relative density",
        AcceptedQuantity.VoidRatio => "void ratio",
        _ => throw new ArgumentOutOfRangeException(nameof(quantity)),
    };
}
