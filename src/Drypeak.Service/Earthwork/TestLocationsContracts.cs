using System.Text.Json.Serialization;
using Drypeak.Service.Contracts;

namespace Drypeak.Service.Earthwork;

/// <summary>A programme of field tests: how many a lift, and random locations for them.</summary>
public sealed record TestLocationsRequest : EarthworkRequest
{
    /// <summary>Seed of the random numbers, a whole number of up to 18 digits: the same seed gives the same locations.</summary>
    /// <example>20260511</example>
    [JsonRequired]
    public long? Seed { get; init; }

    /// <summary>Plan of each lift.</summary>
    [JsonRequired]
    public TestAreaContract? Area { get; init; }

    /// <summary>Number of lifts.</summary>
    /// <example>6</example>
    [JsonRequired]
    public int? Lifts { get; init; }

    /// <summary>Tests of a lift; or give frequency.</summary>
    /// <example>4</example>
    public int? PerLift { get; init; }

    /// <summary>How often is tested. Counts are rounded up.</summary>
    public FrequencyContract? Frequency { get; init; }

    /// <summary>Compacted thickness of a lift, in units.length; needed for a frequency by volume.</summary>
    /// <example>0.25</example>
    public double? LiftThickness { get; init; }

    /// <summary>Lifts that are placed in a shift; needed for tests per shift.</summary>
    /// <example>2</example>
    public double? LiftsPerShift { get; init; }
}

/// <summary>Plan of a lift: a rectangle along the work, or an outline; less what is excluded.</summary>
public sealed record TestAreaContract
{
    /// <summary>Length along the work, in units.length.</summary>
    /// <example>180</example>
    public double? Length { get; init; }

    /// <summary>Width across the work, in units.length; offsets run from 0 to it.</summary>
    /// <example>12</example>
    public double? Width { get; init; }

    /// <summary>Station at which the length begins, in units.length. Default 0.</summary>
    /// <example>1200</example>
    public double? StartStation { get; init; }

    /// <summary>Corners in order, up to 100, each as [station, offset] in units.length, in place of length and width. The outline does not cross itself.</summary>
    /// <example>[[1200, 0], [1380, 0], [1380, 14], [1290, 18], [1200, 12]]</example>
    public IReadOnlyList<IReadOnlyList<double>>? Outline { get; init; }

    /// <summary>Zones without tests, up to 20; they may overlap and reach beyond the area.</summary>
    public IReadOnlyList<ExclusionContract>? Exclusions { get; init; }
}

/// <summary>A zone without tests.</summary>
public sealed record ExclusionContract
{
    /// <summary>What it is.</summary>
    /// <example>culvert</example>
    public string? Label { get; init; }

    /// <summary>Corners in order, up to 100, each as [station, offset] in units.length.</summary>
    /// <example>[[1262, 0], [1270, 0], [1270, 12], [1262, 12]]</example>
    [JsonRequired]
    public IReadOnlyList<IReadOnlyList<double>>? Outline { get; init; }
}

/// <summary>How often is tested: one of volume, area and perShift; lifts may stand by itself or beside any.</summary>
public sealed record FrequencyContract
{
    /// <summary>One test in so much compacted volume, in units.bulkVolume.</summary>
    /// <example>150</example>
    public double? Volume { get; init; }

    /// <summary>One test in so much area of a lift, in units.area.</summary>
    /// <example>500</example>
    public double? Area { get; init; }

    /// <summary>Tests in every so-manyth lift, and in the last. By itself: one test in each of them.</summary>
    /// <example>2</example>
    public int? Lifts { get; init; }

    /// <summary>Tests in a shift.</summary>
    /// <example>3</example>
    public int? PerShift { get; init; }
}

/// <summary>The programme.</summary>
public sealed record TestLocationsAnswer : EarthworkAnswer
{
    /// <summary>As in the request.</summary>
    /// <example>20260511</example>
    public long Seed { get; init; }

    /// <summary>Tests of all lifts.</summary>
    /// <example>24</example>
    public int Count { get; init; }

    /// <summary>Tests of each lift that is tested.</summary>
    /// <example>4</example>
    public int PerLift { get; init; }

    /// <summary>Lifts that are tested.</summary>
    /// <example>6</example>
    public int LiftsTested { get; init; }

    /// <summary>Area of a lift that is open to tests, in units.area.</summary>
    /// <example>2160</example>
    public double OpenArea { get; init; }

    /// <summary>The locations, by lift and station.</summary>
    public required IReadOnlyList<TestLocationAnswer> Locations { get; init; }

    /// <summary>Stations at which a lift is cut into strata of equal area, in units.length.</summary>
    /// <example>[1245, 1290, 1335]</example>
    public required IReadOnlyList<double> StratumStations { get; init; }

    /// <summary>How the number and the places were found.</summary>
    /// <example>One test in 500 m² of each lift, rounded up.</example>
    public required string Basis { get; init; }

    /// <summary>Addresses of the chart.</summary>
    [JsonPropertyOrder(1)]
    public required LinksContract Links { get; init; }
}

/// <summary>A place for a field test.</summary>
/// <param name="Label" example="L3-2">Lift and number within it.</param>
/// <param name="Lift" example="3">Number of the lift, from 1.</param>
/// <param name="Station" example="1278.4">Along the work, in units.length.</param>
/// <param name="Offset" example="7.1">Across the work, in units.length.</param>
public sealed record TestLocationAnswer(string Label, int Lift, double Station, double Offset);
