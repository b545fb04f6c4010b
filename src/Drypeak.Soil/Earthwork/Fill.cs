using Drypeak.Soil.Quantities;

namespace Drypeak.Soil.Earthwork;

/// <summary>The fill that is to be built.</summary>
/// <param name="Volume">Compacted, over 0.</param>
/// <param name="DryDensity">Compacted.</param>
/// <param name="WaterContent">That it is to have; null where no water is asked about.</param>
public sealed record Fill(Volume Volume, Density DryDensity, WaterContent? WaterContent)
{
    /// <summary>Its solids, which borrow, truck and fill share.</summary>
    public Mass DryMass => new(Volume.CubicMeters * DryDensity.KilogramsPerCubicMeter);
}

/// <summary>Soil in the bank, before it is dug.</summary>
/// <param name="Label">What the borrow area is called.</param>
/// <param name="DryDensity">In the bank.</param>
/// <param name="WaterContent">In the bank.</param>
/// <param name="Capacity">Bank volume that it can give; null without a bound.</param>
/// <param name="HaulDistance">To the fill; null where it does not matter.</param>
/// <param name="Share">Share of the fill's solids that it is to give, as a fraction; null where the nearest gives first.</param>
public sealed record BorrowArea(string Label, Density DryDensity, WaterContent WaterContent, Volume? Capacity, Length? HaulDistance, double? Share);

/// <summary>Soil as it lies in a truck: by its density or by its swell.</summary>
/// <param name="DryDensity">Loose; null where the swell or the wet density says it.</param>
/// <param name="WetDensity">Loose; null where another says it.</param>
/// <param name="Swell">Growth of the bank volume, as a fraction of it; over −1.</param>
/// <param name="WaterContent">Loose; null where it is the borrow's.</param>
public sealed record LooseSoil(Density? DryDensity, Density? WetDensity, double? Swell, WaterContent? WaterContent)
{
    /// <summary>Water content in the truck.</summary>
    public WaterContent WaterContentOf(BorrowArea area) => WaterContent ?? area.WaterContent;

    /// <summary>Dry density in the truck: given, or from the wet one, or from the bank's by swell.</summary>
    public Density DryDensityOf(BorrowArea area) => this switch
    {
        { DryDensity: { } dry } => dry,
        { WetDensity: { } wet } => new Density(wet.KilogramsPerCubicMeter / (1 + WaterContentOf(area).Fraction)),
        _ => new Density(area.DryDensity.KilogramsPerCubicMeter / (1 + Swell!.Value)),
    };
}

/// <summary>What one truck takes at most.</summary>
/// <param name="Volume">Loose; null without a bound.</param>
/// <param name="Mass">Wet; null without a bound.</param>
public sealed record Truck(Volume? Volume, Mass? Mass);

/// <summary>What one borrow area gives.</summary>
/// <param name="Area">The area.</param>
/// <param name="DryMass">Solids taken from it.</param>
/// <param name="Loose">As it is hauled; null where nothing is known of it.</param>
public sealed record Draw(BorrowArea Area, Mass DryMass, LooseSoil? Loose)
{
    /// <summary>Bank volume: dry mass over the bank's dry density.</summary>
    public Volume BankVolume => new(DryMass.Kilograms / Area.DryDensity.KilogramsPerCubicMeter);

    /// <summary>Water in the bank.</summary>
    public Mass WaterMass => new(DryMass.Kilograms * Area.WaterContent.Fraction);

    /// <summary>Soil and water in the bank.</summary>
    public Mass WetMass => new(DryMass.Kilograms * (1 + Area.WaterContent.Fraction));

    /// <summary>Volume in trucks.</summary>
    public Volume? LooseVolume => Loose is null ? null : new Volume(DryMass.Kilograms / Loose.DryDensityOf(Area).KilogramsPerCubicMeter);

    /// <summary>Soil and water in trucks.</summary>
    public Mass HauledMass => new(DryMass.Kilograms * (1 + (Loose?.WaterContentOf(Area) ?? Area.WaterContent).Fraction));

    /// <summary>Bank volume that stays in the area; null without a capacity.</summary>
    public Volume? CapacityLeft => Area.Capacity is { } capacity ? new Volume(Math.Max(0, capacity.CubicMeters - BankVolume.CubicMeters)) : null;

    /// <summary>Water that brings it to the fill's water content.</summary>
    public WaterAmount ToAdd(WaterContent ofFill, Density water) => WaterAmount.Between(DryMass, Area.WaterContent, ofFill, water);
}
