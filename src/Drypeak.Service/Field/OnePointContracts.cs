using System.Text.Json.Serialization;
using Drypeak.Service.Contracts;
using Drypeak.Service.Laboratory;

namespace Drypeak.Service.Field;

/// <summary>One compacted point of a soil, and a family of curves.</summary>
public sealed record OnePointRequest
{
    /// <summary>One line that names the point, up to 200 characters.</summary>
    /// <example>Ternmarsh, lift 4, 1+240</example>
    public string? Reference { get; init; }

    /// <summary>Up to 30 labels of the caller's own with texts, carried unchanged into the answer.</summary>
    public IReadOnlyDictionary<string, string>? Identification { get; init; }

    /// <summary>Units of the request and of the answer.</summary>
    public UnitsContract? Units { get; init; }

    /// <summary>The curves, in any order; 1 to 50, of which at least three must be usable.</summary>
    [JsonRequired]
    public IReadOnlyList<FamilyMemberContract>? Family { get; init; }

    /// <summary>The point.</summary>
    [JsonRequired]
    public OnePointContract? Point { get; init; }

    /// <summary>Whether the working is wanted: each step of the arithmetic with its numbers.</summary>
    /// <example>false</example>
    public bool? Trace { get; init; }
}

/// <summary>A curve of the family: by its optimum, by its points, by both, or as a whole laboratory test.</summary>
public sealed record FamilyMemberContract
{
    /// <summary>Name, unique in the family. Default: its position, from 1.</summary>
    /// <example>B</example>
    public string? Label { get; init; }

    /// <summary>Optimum water content, %; with maximumDryDensity. Without both they are fitted to the points.</summary>
    /// <example>13.9</example>
    public double? OptimumWaterContent { get; init; }

    /// <summary>Maximum dry density, in units.density.</summary>
    /// <example>1.83</example>
    public double? MaximumDryDensity { get; init; }

    /// <summary>Points of the curve as [water content in %, dry density in units.density].</summary>
    public IReadOnlyList<double[]>? Points { get; init; }

    /// <summary>A whole moisture-density request in place of all that.</summary>
    public MoistureDensityRequest? Test { get; init; }
}

/// <summary>A compacted point; its data may begin at any stage, as a specimen's.</summary>
public sealed record OnePointContract : IWaterContentGiven
{
    /// <summary>Water content, % of dry mass.</summary>
    /// <example>12.6</example>
    public double? WaterContent { get; init; }

    /// <summary>Moisture tins, up to 20; the water content is the mean over them.</summary>
    public IReadOnlyList<TinContract>? Tins { get; init; }

    /// <summary>Water content, % of wet mass.</summary>
    /// <example>11.2</example>
    public double? WetBasis { get; init; }

    /// <summary>Water content by a calcium-carbide tester.</summary>
    public CarbideContract? Carbide { get; init; }

    /// <summary>Wet density, in units.density.</summary>
    /// <example>2.03</example>
    public double? WetDensity { get; init; }

    /// <summary>Dry density, in units.density.</summary>
    /// <example>1.80</example>
    public double? DryDensity { get; init; }

    /// <summary>Mass of mold and wet soil, in units.mass; with the mold.</summary>
    /// <example>6165</example>
    public double? MoldAndWetSoil { get; init; }

    /// <summary>The mold.</summary>
    public MoldContract? Mold { get; init; }
}

/// <summary>The curve through the point.</summary>
public sealed record OnePointAnswer
{
    /// <summary>As in the request.</summary>
    /// <example>Ternmarsh, lift 4, 1+240</example>
    public string? Reference { get; init; }

    /// <summary>As in the request; absent where it had none.</summary>
    [JsonIgnore(Condition = JsonIgnoreCondition.WhenWritingNull)]
    public IReadOnlyDictionary<string, string>? Identification { get; init; }

    /// <summary>All units that were used.</summary>
    public required UnitsContract Units { get; init; }

    /// <summary>The point, reduced.</summary>
    public required DensityAndWaterContract Point { get; init; }

    /// <summary>Optimum of the curve through the point; null where it may not be used.</summary>
    public SelectedOptimumAnswer? Optimum { get; init; }

    /// <summary>Labels of the two neighbours, the denser first; one where the point lies on a curve; none outside the family.</summary>
    /// <example>["B", "C"]</example>
    public required IReadOnlyList<string> Between { get; init; }

    /// <summary>The second neighbour's share, 0 to 1; null outside the family.</summary>
    /// <example>0.4</example>
    public double? Blend { get; init; }

    /// <summary>The point's water content over the optimum that it selects, %; null outside the family.</summary>
    /// <example>92.1</example>
    public double? PercentOfOptimum { get; init; }

    /// <summary>Whether the optimum may be used; if not, a finding says which rule is broken and what to do.</summary>
    /// <example>true</example>
    public required bool Usable { get; init; }

    /// <summary>The curve through the point as [water content, dry density]; empty where it may not be used.</summary>
    public required IReadOnlyList<double[]> Curve { get; init; }

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

/// <summary>An optimum found on a family.</summary>
/// <param name="WaterContent" example="13.7">%.</param>
/// <param name="MaximumDryDensity" example="1.836">In units.density.</param>
public sealed record SelectedOptimumAnswer(double WaterContent, double MaximumDryDensity);
