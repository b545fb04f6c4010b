using System.Text.Json.Serialization;
using Drypeak.Service.Contracts;
using Drypeak.Service.Laboratory;

namespace Drypeak.Service.Field;

/// <summary>A state of a free-draining soil and its two limits. One measure is given; the others follow.</summary>
public sealed record RelativeDensityRequest : IWaterGiven, IWaterContentGiven
{
    /// <summary>One line that names the test, up to 200 characters.</summary>
    /// <example>Ternmarsh, drainage blanket, 0+450</example>
    public string? Reference { get; init; }

    /// <summary>Up to 30 labels of the caller's own with texts, carried unchanged into the answer.</summary>
    public IReadOnlyDictionary<string, string>? Identification { get; init; }

    /// <summary>Units; density, and tinMass where tins are given.</summary>
    public UnitsContract? Units { get; init; }

    /// <summary>The state, by its dry density, in units.density.</summary>
    /// <example>1.72</example>
    public double? DryDensity { get; init; }

    /// <summary>The state, by its void ratio.</summary>
    /// <example>0.541</example>
    public double? VoidRatio { get; init; }

    /// <summary>The state, by its wet density, in units.density; with a water content.</summary>
    /// <example>1.86</example>
    public double? WetDensity { get; init; }

    /// <summary>Water content, % of dry mass; with the wet density.</summary>
    /// <example>8</example>
    public double? WaterContent { get; init; }

    /// <summary>Moisture tins, up to 20; the water content is the mean over them.</summary>
    public IReadOnlyList<TinContract>? Tins { get; init; }

    /// <summary>Water content, % of wet mass.</summary>
    /// <example>7.4</example>
    public double? WetBasis { get; init; }

    /// <summary>Water content by a calcium-carbide tester.</summary>
    public CarbideContract? Carbide { get; init; }

    /// <summary>The state, by its relative compaction, %.</summary>
    /// <example>95</example>
    public double? RelativeCompaction { get; init; }

    /// <summary>The state, by its relative density, %.</summary>
    /// <example>70</example>
    public double? RelativeDensity { get; init; }

    /// <summary>Loosest state, in units.density; with maximumDryDensity.</summary>
    /// <example>1.54</example>
    public double? MinimumDryDensity { get; init; }

    /// <summary>Densest state, in units.density; with minimumDryDensity.</summary>
    /// <example>1.81</example>
    public double? MaximumDryDensity { get; init; }

    /// <summary>Densest state as a void ratio; with maximumVoidRatio, in place of the densities.</summary>
    /// <example>0.464</example>
    public double? MinimumVoidRatio { get; init; }

    /// <summary>Loosest state as a void ratio; with minimumVoidRatio.</summary>
    /// <example>0.721</example>
    public double? MaximumVoidRatio { get; init; }

    /// <summary>Specific gravity of the solids: needed only between a density and a void ratio.</summary>
    public SpecificGravityContract? SpecificGravity { get; init; }

    /// <summary>Temperature of the water, °C, 0 to 40. Default 20.</summary>
    /// <example>20</example>
    public double? WaterTemperature { get; init; }

    /// <summary>Density of water, in units.density, in place of its temperature.</summary>
    /// <example>1.0</example>
    public double? WaterDensity { get; init; }

    /// <summary>Whether the working is wanted.</summary>
    /// <example>false</example>
    public bool? Trace { get; init; }
}

/// <summary>Every measure of the state.</summary>
public sealed record RelativeDensityAnswer
{
    /// <summary>As in the request.</summary>
    /// <example>Ternmarsh, drainage blanket, 0+450</example>
    public string? Reference { get; init; }

    /// <summary>As in the request; absent where it had none.</summary>
    [JsonIgnore(Condition = JsonIgnoreCondition.WhenWritingNull)]
    public IReadOnlyDictionary<string, string>? Identification { get; init; }

    /// <summary>All units that were used.</summary>
    public required UnitsContract Units { get; init; }

    /// <summary>In units.density; null where void ratios alone are known.</summary>
    /// <example>1.72</example>
    public double? DryDensity { get; init; }

    /// <summary>Ratio; null where densities alone are known.</summary>
    /// <example>0.541</example>
    public double? VoidRatio { get; init; }

    /// <summary>%; below 0 or over 100 beyond the limits.</summary>
    /// <example>70.2</example>
    public required double RelativeDensity { get; init; }

    /// <summary>%.</summary>
    /// <example>95.0</example>
    public required double RelativeCompaction { get; init; }

    /// <summary>The working, where it was asked for.</summary>
    [JsonIgnore(Condition = JsonIgnoreCondition.WhenWritingNull)]
    public IReadOnlyList<TraceStep>? Trace { get; init; }

    /// <summary>What a careful reviewer says.</summary>
    public required IReadOnlyList<FindingContract> Findings { get; init; }

    /// <summary>Version and digest.</summary>
    public required ProvenanceContract Provenance { get; init; }

    /// <summary>What to bear in mind.</summary>
    public required IReadOnlyList<string> Cautions { get; init; }
}
