using System.Text.Json.Serialization;
using Drypeak.Service.Contracts;

namespace Drypeak.Service.Laboratory;

/// <summary>Dry density and water content corrected for oversize, in either direction.</summary>
public sealed record OversizeCorrectionRequest : IWaterGiven
{
    /// <summary>Units; only the density matters here.</summary>
    public UnitsContract? Units { get; init; }

    /// <summary>"to-total": from the fines, as tested, to all of the material. "to-fines": from all of it, as in the field, to its fines.</summary>
    /// <example>to-total</example>
    [JsonRequired]
    public string? Direction { get; init; }

    /// <summary>Of the fines; with "to-total".</summary>
    public DensityAndWaterContract? Fine { get; init; }

    /// <summary>Of all the material; with "to-fines".</summary>
    public DensityAndWaterContract? Total { get; init; }

    /// <summary>The oversize; its specific gravity must be given here.</summary>
    [JsonRequired]
    public OversizeContract? Oversize { get; init; }

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

/// <summary>Dry density and water content of one material.</summary>
public sealed record DensityAndWaterContract
{
    /// <summary>Dry density, in units.density.</summary>
    /// <example>1.97</example>
    [JsonRequired]
    public double? DryDensity { get; init; }

    /// <summary>Water content, %.</summary>
    /// <example>12</example>
    [JsonRequired]
    public double? WaterContent { get; init; }
}

/// <summary>Both materials.</summary>
public sealed record OversizeCorrectionAnswer
{
    /// <summary>All units that were used.</summary>
    public required UnitsContract Units { get; init; }

    /// <summary>Of all the material.</summary>
    public required DensityAndWaterContract Total { get; init; }

    /// <summary>Of the fines.</summary>
    public required DensityAndWaterContract Fine { get; init; }

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
