using System.Text.Json.Serialization;
using Drypeak.Service.Contracts;
using Drypeak.Service.Laboratory;

namespace Drypeak.Service.Field;

/// <summary>The rapid method: field soil compacted at fill water content and with water added.</summary>
public sealed record RapidMethodRequest
{
    /// <summary>One line that names the test, up to 200 characters.</summary>
    /// <example>Ternmarsh, lift 4, 1+240</example>
    public string? Reference { get; init; }

    /// <summary>Up to 30 labels of the caller's own with texts, carried unchanged into the answer.</summary>
    public IReadOnlyDictionary<string, string>? Identification { get; init; }

    /// <summary>Units of the request and of the answer.</summary>
    public UnitsContract? Units { get; init; }

    /// <summary>The soil in place.</summary>
    [JsonRequired]
    public RapidFieldContract? Field { get; init; }

    /// <summary>The specimens, in any order; three or more for a peak.</summary>
    [JsonRequired]
    public IReadOnlyList<RapidSpecimenContract>? Specimens { get; init; }

    /// <summary>Whether the working is wanted: each step of the arithmetic with its numbers.</summary>
    /// <example>false</example>
    public bool? Trace { get; init; }
}

/// <summary>The soil in place.</summary>
public sealed record RapidFieldContract : IWaterContentGiven
{
    /// <summary>Wet density, in units.density.</summary>
    /// <example>2.06</example>
    [JsonRequired]
    public double? WetDensity { get; init; }

    /// <summary>Water content, % of dry mass, once it is known.</summary>
    /// <example>12.4</example>
    public double? WaterContent { get; init; }

    /// <summary>Moisture tins, up to 20; the water content is the mean over them.</summary>
    public IReadOnlyList<TinContract>? Tins { get; init; }

    /// <summary>Water content, % of wet mass.</summary>
    /// <example>11.0</example>
    public double? WetBasis { get; init; }

    /// <summary>Water content by a calcium-carbide tester.</summary>
    public CarbideContract? Carbide { get; init; }
}

/// <summary>A specimen of the field soil.</summary>
public sealed record RapidSpecimenContract
{
    /// <summary>Water added, % of the wet mass at fill water content; negative where the soil was dried.</summary>
    /// <example>2</example>
    [JsonRequired]
    public double? WaterAdded { get; init; }

    /// <summary>Wet density as compacted, in units.density.</summary>
    /// <example>2.13</example>
    [JsonRequired]
    public double? WetDensity { get; init; }
}

/// <summary>What the rapid method says.</summary>
public sealed record RapidMethodAnswer
{
    /// <summary>As in the request.</summary>
    /// <example>Ternmarsh, lift 4, 1+240</example>
    public string? Reference { get; init; }

    /// <summary>As in the request; absent where it had none.</summary>
    [JsonIgnore(Condition = JsonIgnoreCondition.WhenWritingNull)]
    public IReadOnlyDictionary<string, string>? Identification { get; init; }

    /// <summary>All units that were used.</summary>
    public required UnitsContract Units { get; init; }

    /// <summary>The specimens, in the order of the request.</summary>
    public required IReadOnlyList<RapidSpecimenAnswer> Specimens { get; init; }

    /// <summary>Peak of the converted wet densities; null where the specimens show none.</summary>
    public RapidPeakAnswer? Peak { get; init; }

    /// <summary>Field wet density over the peak, %: the relative compaction; null without a peak.</summary>
    /// <example>97.8</example>
    public double? DensityRatio { get; init; }

    /// <summary>Field less optimum water content, percentage points; an estimate until the field water content is known; null without a peak.</summary>
    /// <example>-1.6</example>
    public double? WaterContentFromOptimum { get; init; }

    /// <summary>The working, where it was asked for.</summary>
    [JsonIgnore(Condition = JsonIgnoreCondition.WhenWritingNull)]
    public IReadOnlyList<TraceStep>? Trace { get; init; }

    /// <summary>What a careful reviewer says, worst first.</summary>
    public required IReadOnlyList<FindingContract> Findings { get; init; }

    /// <summary>Addresses of the chart.</summary>
    public required LinksContract Links { get; init; }

    /// <summary>Version and digest.</summary>
    public required ProvenanceContract Provenance { get; init; }

    /// <summary>What to bear in mind.</summary>
    public required IReadOnlyList<string> Cautions { get; init; }
}

/// <summary>A specimen, converted.</summary>
/// <param name="WaterAdded" example="2">% of the wet mass at fill water content.</param>
/// <param name="WetDensity" example="2.13">In units.density.</param>
/// <param name="ConvertedWetDensity" example="2.088">Wet density at fill water content: over 1 + z/100.</param>
public sealed record RapidSpecimenAnswer(double WaterAdded, double WetDensity, double ConvertedWetDensity);

/// <summary>Peak of the converted wet densities.</summary>
/// <param name="WaterAdded" example="1.4">% of the wet mass at fill water content.</param>
/// <param name="ConvertedWetDensity" example="2.106">In units.density.</param>
public sealed record RapidPeakAnswer(double WaterAdded, double ConvertedWetDensity);
