using System.Text.Json.Serialization;
using Drypeak.Service.Contracts;

namespace Drypeak.Service.Earthwork;

/// <summary>Bank, loose and compacted volumes of a fill, the water it needs, and its haulage.</summary>
public sealed record QuantitiesRequest : EarthworkRequest
{
    /// <summary>The fill that is to be built.</summary>
    [JsonRequired]
    public FillContract? Fill { get; init; }

    /// <summary>The soil in the bank; or give several borrowAreas.</summary>
    public BorrowContract? Borrow { get; init; }

    /// <summary>Several borrow areas, up to 100: each gives its share, or the nearest gives first.</summary>
    public IReadOnlyList<BorrowAreaContract>? BorrowAreas { get; init; }

    /// <summary>The soil as it lies in a truck.</summary>
    public LooseContract? Loose { get; init; }

    /// <summary>What one truck takes.</summary>
    public TruckContract? Truck { get; init; }

    /// <summary>Trucks that run between one loader and the fill.</summary>
    public FleetContract? Fleet { get; init; }
}

/// <summary>The fill that is to be built.</summary>
public sealed record FillContract : IWaterContentGiven
{
    /// <summary>Compacted volume, in units.bulkVolume.</summary>
    /// <example>75000</example>
    [JsonRequired]
    public double? Volume { get; init; }

    /// <summary>Compacted dry density, in units.density.</summary>
    /// <example>1.79</example>
    [JsonRequired]
    public double? DryDensity { get; init; }

    /// <summary>Water content that it is to have, %; without it no water to add is given.</summary>
    /// <example>13</example>
    public double? WaterContent { get; init; }

    /// <summary>Moisture tins, up to 20; the water content is the mean over them.</summary>
    public IReadOnlyList<TinContract>? Tins { get; init; }

    /// <summary>Water content, % of wet mass.</summary>
    /// <example>11.5</example>
    public double? WetBasis { get; init; }

    /// <summary>Water content by a calcium-carbide tester.</summary>
    public CarbideContract? Carbide { get; init; }
}

/// <summary>Soil in the bank: its wet or its dry density, and its water content.</summary>
public record BorrowContract : IWaterContentGiven
{
    /// <summary>Wet density in the bank, in units.density.</summary>
    /// <example>1.54</example>
    public double? WetDensity { get; init; }

    /// <summary>Dry density in the bank, in units.density.</summary>
    /// <example>1.426</example>
    public double? DryDensity { get; init; }

    /// <summary>Water content in the bank, % of dry mass; 0 for dry soil.</summary>
    /// <example>8</example>
    public double? WaterContent { get; init; }

    /// <summary>Moisture tins, up to 20; the water content is the mean over them.</summary>
    public IReadOnlyList<TinContract>? Tins { get; init; }

    /// <summary>Water content, % of wet mass.</summary>
    /// <example>7.4</example>
    public double? WetBasis { get; init; }

    /// <summary>Water content by a calcium-carbide tester.</summary>
    public CarbideContract? Carbide { get; init; }
}

/// <summary>One of several borrow areas.</summary>
public sealed record BorrowAreaContract : BorrowContract
{
    /// <summary>What it is called; its position where absent.</summary>
    /// <example>borrow area 7</example>
    public string? Label { get; init; }

    /// <summary>Bank volume that it can give, in units.bulkVolume; without it there is no bound.</summary>
    /// <example>40000</example>
    public double? Capacity { get; init; }

    /// <summary>Distance to the fill, in units.distance. The nearest gives first where no shares are given.</summary>
    /// <example>850</example>
    public double? HaulDistance { get; init; }

    /// <summary>Share of the fill's dry mass that it is to give, %. Every area has one or none has; together 100.</summary>
    /// <example>60</example>
    public double? Share { get; init; }
}

/// <summary>Soil as it lies in a truck: one of wetDensity, dryDensity and swell.</summary>
public sealed record LooseContract : IWaterContentGiven
{
    /// <summary>Loose wet density, in units.density.</summary>
    /// <example>1.3</example>
    public double? WetDensity { get; init; }

    /// <summary>Loose dry density, in units.density.</summary>
    /// <example>1.2</example>
    public double? DryDensity { get; init; }

    /// <summary>Growth of the bank volume on digging, % of the bank volume.</summary>
    /// <example>20</example>
    public double? Swell { get; init; }

    /// <summary>Water content in the truck, %. Default: the borrow's.</summary>
    /// <example>8</example>
    public double? WaterContent { get; init; }

    /// <summary>Moisture tins, up to 20; the water content is the mean over them.</summary>
    public IReadOnlyList<TinContract>? Tins { get; init; }

    /// <summary>Water content, % of wet mass.</summary>
    /// <example>7.4</example>
    public double? WetBasis { get; init; }

    /// <summary>Water content by a calcium-carbide tester.</summary>
    public CarbideContract? Carbide { get; init; }
}

/// <summary>What one truck takes at most: by volume, by mass, or by both.</summary>
public sealed record TruckContract
{
    /// <summary>Loose volume, in units.bulkVolume.</summary>
    /// <example>14</example>
    public double? Volume { get; init; }

    /// <summary>Wet mass, in units.mass.</summary>
    /// <example>20000</example>
    public double? Mass { get; init; }
}

/// <summary>Trucks that run between one loader and the fill. Times are in minutes.</summary>
public sealed record FleetContract
{
    /// <summary>To load one truck, minutes.</summary>
    /// <example>4</example>
    [JsonRequired]
    public double? LoadingTime { get; init; }

    /// <summary>To turn and dump, minutes.</summary>
    /// <example>2</example>
    [JsonRequired]
    public double? DumpTime { get; init; }

    /// <summary>Speed loaded, in units.speed.</summary>
    /// <example>25</example>
    [JsonRequired]
    public double? HaulSpeed { get; init; }

    /// <summary>Speed empty, in units.speed.</summary>
    /// <example>35</example>
    [JsonRequired]
    public double? ReturnSpeed { get; init; }

    /// <summary>Distance from loader to fill, in units.distance; borrow areas have their own.</summary>
    /// <example>1200</example>
    public double? Distance { get; init; }

    /// <summary>Trucks that run. Default: as many as balance the loader.</summary>
    /// <example>4</example>
    public int? Trucks { get; init; }

    /// <summary>Share of the hour that is worked, a fraction over 0 and up to 1. Default 1.</summary>
    /// <example>0.83</example>
    public double? Efficiency { get; init; }
}

/// <summary>Bank, loose and compacted quantities.</summary>
public sealed record QuantitiesAnswer : EarthworkAnswer
{
    /// <summary>Dry mass of the fill, in units.mass: the same in bank, truck and fill.</summary>
    /// <example>134250000</example>
    public double DryMass { get; init; }

    /// <summary>In the bank, all areas together.</summary>
    public required BorrowAnswer Borrow { get; init; }

    /// <summary>In trucks; null where nothing is known of the loose soil.</summary>
    public LooseAnswer? Loose { get; init; }

    /// <summary>Water from the borrow's to the fill's water content.</summary>
    public required FillWaterAnswer Water { get; init; }

    /// <summary>Bank volume less fill volume, by both definitions.</summary>
    public required ShrinkageAnswer Shrinkage { get; init; }

    /// <summary>Growth of the bank volume on digging, % of the bank volume; null where nothing is known of the loose soil.</summary>
    /// <example>20</example>
    public double? Swell { get; init; }

    /// <summary>The same growth in % of the loose volume.</summary>
    /// <example>16.7</example>
    public double? SwellOfLoose { get; init; }

    /// <summary>Truck loads; null without a truck, or where they cannot be counted.</summary>
    public TruckloadsAnswer? Truckloads { get; init; }

    /// <summary>Each of several borrow areas, in the order of the request; null where there is one borrow.</summary>
    public IReadOnlyList<BorrowAreaAnswer>? BorrowAreas { get; init; }

    /// <summary>Fill that no borrow area serves, in units.bulkVolume; 0 where all is served.</summary>
    /// <example>0</example>
    public double FillNotServed { get; init; }

    /// <summary>One round of a truck from each borrow area that gives soil; null without a fleet.</summary>
    public IReadOnlyList<FleetCycleAnswer>? Fleet { get; init; }
}

/// <summary>Soil in the bank.</summary>
/// <param name="Volume" example="94149.35">Bank volume, in units.bulkVolume.</param>
/// <param name="WetMass" example="144990000">Soil and water, in units.mass.</param>
/// <param name="WaterMass" example="10740000">Water, in units.mass.</param>
public sealed record BorrowAnswer(double Volume, double WetMass, double WaterMass);

/// <summary>Soil in trucks.</summary>
/// <param name="Volume" example="112979.2">Loose volume, in units.bulkVolume.</param>
/// <param name="WetMass" example="144990000">Soil and water, in units.mass.</param>
public sealed record LooseAnswer(double Volume, double WetMass);

/// <summary>Water of the fill.</summary>
/// <param name="ToAdd">In all; negative where it is to be lost; null without the fill's water content.</param>
/// <param name="PerBorrowVolume">For each unit of bank volume.</param>
/// <param name="PerFillVolume">For each unit of fill volume.</param>
public sealed record FillWaterAnswer(WaterAmountAnswer? ToAdd, WaterAmountAnswer? PerBorrowVolume, WaterAmountAnswer? PerFillVolume);

/// <summary>Shrinkage from bank to fill, by both definitions; negative where the fill takes more room.</summary>
/// <param name="OfBorrow" example="20.34">(bank − fill)/bank, %.</param>
/// <param name="OfFill" example="25.53">(bank − fill)/fill, %.</param>
public sealed record ShrinkageAnswer(double OfBorrow, double OfFill);

/// <summary>Truck loads.</summary>
/// <param name="ByVolume" example="8070">Loads by loose volume, rounded up; null where it is not known.</param>
/// <param name="ByMass" example="7250">Loads by wet mass, rounded up; null where the truck has no such bound.</param>
/// <param name="Governing" example="volume">The bound that is reached first: "volume" or "mass".</param>
public sealed record TruckloadsAnswer(double? ByVolume, double? ByMass, string Governing);

/// <summary>What one borrow area gives.</summary>
/// <param name="Label" example="borrow area 7">As in the request, or the position.</param>
/// <param name="Share" example="60">Its share of the fill's dry mass, %.</param>
/// <param name="DryMass" example="80550000">Solids, in units.mass.</param>
/// <param name="Volume" example="56489.6">Bank volume, in units.bulkVolume.</param>
/// <param name="WetMass" example="86994000">Soil and water, in units.mass.</param>
/// <param name="WaterMass" example="6444000">Water, in units.mass.</param>
/// <param name="FillVolume" example="45000">Fill that it makes, in units.bulkVolume.</param>
/// <param name="LooseVolume" example="67787.5">Volume in trucks, in units.bulkVolume; null where nothing is known of it.</param>
/// <param name="CapacityLeft" example="3510.4">Bank volume that stays, in units.bulkVolume; null without a capacity.</param>
/// <param name="ToAdd">Water to its fill; null without the fill's water content.</param>
/// <param name="Truckloads">Its loads; null where they cannot be counted.</param>
public sealed record BorrowAreaAnswer(
    string Label, double Share, double DryMass, double Volume, double WetMass, double WaterMass, double FillVolume, double? LooseVolume, double? CapacityLeft,
    WaterAmountAnswer? ToAdd, TruckloadsAnswer? Truckloads);

/// <summary>One round of a truck. Times are in minutes.</summary>
/// <param name="Label" example="borrow area 7">The borrow area.</param>
/// <param name="Distance" example="850">From loader to fill, in units.distance.</param>
/// <param name="LoadingTime" example="4">Loading, minutes.</param>
/// <param name="HaulTime" example="2.04">Loaded, minutes.</param>
/// <param name="DumpTime" example="2">Turning and dumping, minutes.</param>
/// <param name="ReturnTime" example="1.46">Empty, minutes.</param>
/// <param name="CycleTime" example="9.5">All of the round, minutes.</param>
/// <param name="TrucksToBalance" example="3">Whole trucks that keep one loader at work.</param>
/// <param name="Trucks" example="3">Trucks that run.</param>
/// <param name="Waits" example="trucks">Who waits: "loader", "trucks", or "none".</param>
/// <param name="LoadsPerHour" example="12.45">Loads in an hour.</param>
/// <param name="Hours" example="388">Hours for its loads; null where they cannot be counted.</param>
public sealed record FleetCycleAnswer(
    string Label, double Distance, double LoadingTime, double HaulTime, double DumpTime, double ReturnTime, double CycleTime,
    double TrucksToBalance, double Trucks, string Waits, double LoadsPerHour, double? Hours);
