using System.Text.Json.Serialization;
using Drypeak.Service.Contracts;

namespace Drypeak.Service.Earthwork;

/// <summary>Water for a lift, from its present water content to its target.</summary>
public sealed record LiftWaterRequest : EarthworkRequest, IWaterContentGiven
{
    /// <summary>Volume of the lift, in units.bulkVolume; or give area and thickness.</summary>
    /// <example>300</example>
    public double? Volume { get; init; }

    /// <summary>Surface of the lift, in units.area.</summary>
    /// <example>1500</example>
    public double? Area { get; init; }

    /// <summary>Thickness of the lift, in units.length.</summary>
    /// <example>0.2</example>
    public double? Thickness { get; init; }

    /// <summary>Dry density of the lift as its volume is counted, in units.density.</summary>
    /// <example>1.78</example>
    [JsonRequired]
    public double? DryDensity { get; init; }

    /// <summary>Present water content, % of dry mass.</summary>
    /// <example>9.5</example>
    public double? WaterContent { get; init; }

    /// <summary>Moisture tins, up to 20; the water content is the mean over them.</summary>
    public IReadOnlyList<TinContract>? Tins { get; init; }

    /// <summary>Present water content, % of wet mass.</summary>
    /// <example>8.7</example>
    public double? WetBasis { get; init; }

    /// <summary>Present water content by a calcium-carbide tester.</summary>
    public CarbideContract? Carbide { get; init; }

    /// <summary>Water content that the lift is to have when it is rolled, %.</summary>
    /// <example>13</example>
    [JsonRequired]
    public double? Target { get; init; }

    /// <summary>Allowance for evaporation, percentage points of water content added to the target. Default 0.</summary>
    /// <example>0.5</example>
    public double? EvaporationAllowance { get; init; }

    /// <summary>Evaporation as a rate over hours, in place of the allowance; needs the area.</summary>
    public EvaporationContract? Evaporation { get; init; }

    /// <summary>Volume of a tanker, in units.liquid.</summary>
    /// <example>10000</example>
    public double? Tanker { get; init; }

    /// <summary>Standard uncertainties, where the water is to have one.</summary>
    public LiftUncertaintyContract? Uncertainty { get; init; }
}

/// <summary>Evaporation from the surface before rolling.</summary>
public sealed record EvaporationContract
{
    /// <summary>Depth of water that evaporates in an hour, in units.length.</summary>
    /// <example>0.0006</example>
    [JsonRequired]
    public double? Rate { get; init; }

    /// <summary>Hours from wetting to rolling.</summary>
    /// <example>3</example>
    [JsonRequired]
    public double? Hours { get; init; }
}

/// <summary>Standard uncertainties of a lift.</summary>
public sealed record LiftUncertaintyContract
{
    /// <summary>Of the present water content, percentage points.</summary>
    /// <example>0.4</example>
    public double? WaterContent { get; init; }

    /// <summary>Of the target, percentage points: how well it has to be met.</summary>
    /// <example>0.3</example>
    public double? Target { get; init; }

    /// <summary>Of the dry density, in units.density.</summary>
    /// <example>0.02</example>
    public double? DryDensity { get; init; }
}

/// <summary>Water for a lift.</summary>
public sealed record LiftWaterAnswer : EarthworkAnswer
{
    /// <summary>Volume of the lift, in units.bulkVolume.</summary>
    /// <example>300</example>
    public double Volume { get; init; }

    /// <summary>Dry mass of the lift, in units.mass.</summary>
    /// <example>534000</example>
    public double DryMass { get; init; }

    /// <summary>Water for each unit of volume of the lift; negative where it is to be lost.</summary>
    public required WaterAmountAnswer PerVolume { get; init; }

    /// <summary>Water for each unit of area, the rate at which it is sprayed; null where the area is not known.</summary>
    public WaterAmountAnswer? PerArea { get; init; }

    /// <summary>Water for all of the lift; negative where it is to be lost.</summary>
    public required WaterAmountAnswer Total { get; init; }

    /// <summary>Tanker loads, rounded up; 0 where water is to be lost; null without a tanker.</summary>
    /// <example>3</example>
    public double? TankerLoads { get; init; }

    /// <summary>Standard uncertainty of the water; null where none was stated.</summary>
    public LiftUncertaintyAnswer? Uncertainty { get; init; }
}

/// <summary>Standard uncertainty of the water for a lift, to first order.</summary>
/// <param name="PerVolume">For each unit of volume.</param>
/// <param name="Total">For all of the lift.</param>
public sealed record LiftUncertaintyAnswer(WaterAmountAnswer PerVolume, WaterAmountAnswer Total);
