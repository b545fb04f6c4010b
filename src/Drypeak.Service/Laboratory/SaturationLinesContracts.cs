using System.Text.Json.Serialization;
using Drypeak.Service.Contracts;

namespace Drypeak.Service.Laboratory;

/// <summary>Lines of equal saturation and of equal air voids in the plane of water content and dry density.</summary>
public sealed record SaturationLinesRequest : IWaterGiven
{
    /// <summary>Units; only the density matters here.</summary>
    public UnitsContract? Units { get; init; }

    /// <summary>Specific gravity of the solids.</summary>
    [JsonRequired]
    public SpecificGravityContract? SpecificGravity { get; init; }

    /// <summary>Temperature of the water, °C, 0 to 40. Default 20.</summary>
    /// <example>20</example>
    public double? WaterTemperature { get; init; }

    /// <summary>Density of water, in units.density, in place of its temperature.</summary>
    /// <example>1.0</example>
    public double? WaterDensity { get; init; }

    /// <summary>Degrees of saturation, %; over 0, to 100 (the zero-air-voids line). Up to 20. Default: 100, where no air voids are given either.</summary>
    /// <example>[100, 90]</example>
    public IReadOnlyList<double>? Saturation { get; init; }

    /// <summary>Air voids, % of the total volume; 0 to below 100. Up to 20.</summary>
    /// <example>[5]</example>
    public IReadOnlyList<double>? AirVoids { get; init; }

    /// <summary>Water contents of the points, %; up to 1,000. In place of from, to and count.</summary>
    /// <example>[8, 10, 12]</example>
    public IReadOnlyList<double>? WaterContents { get; init; }

    /// <summary>Water content of the first point, %.</summary>
    /// <example>8</example>
    public double? From { get; init; }

    /// <summary>Water content of the last point, %.</summary>
    /// <example>20</example>
    public double? To { get; init; }

    /// <summary>Number of points between and with them, 2 to 1,000.</summary>
    /// <example>25</example>
    public int? Count { get; init; }
}

/// <summary>The lines.</summary>
public sealed record SaturationLinesAnswer
{
    /// <summary>All units that were used.</summary>
    public required UnitsContract Units { get; init; }

    /// <summary>The lines, saturation first, in the order of the request.</summary>
    public required IReadOnlyList<LineAnswer> Lines { get; init; }

    /// <summary>What a careful reviewer says.</summary>
    public required IReadOnlyList<FindingContract> Findings { get; init; }

    /// <summary>Version and digest.</summary>
    public required ProvenanceContract Provenance { get; init; }

    /// <summary>What to bear in mind.</summary>
    public required IReadOnlyList<string> Cautions { get; init; }
}
