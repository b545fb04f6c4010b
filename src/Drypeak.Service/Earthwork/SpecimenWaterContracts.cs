using System.Text.Json.Serialization;
using Drypeak.Service.Contracts;

namespace Drypeak.Service.Earthwork;

/// <summary>Water for the specimens of a compaction test: portions, each with its own mass, or equal ones of one soil.</summary>
public sealed record SpecimenWaterRequest : EarthworkRequest, IWaterContentGiven
{
    /// <summary>The portions; or give wetMass, and one water content for all.</summary>
    public IReadOnlyList<PortionContract>? Portions { get; init; }

    /// <summary>Wet mass of each portion where all are alike, in units.mass.</summary>
    /// <example>2600</example>
    public double? WetMass { get; init; }

    /// <summary>Present water content of all, % of dry mass.</summary>
    /// <example>8.4</example>
    public double? WaterContent { get; init; }

    /// <summary>Moisture tins, up to 20; the water content is the mean over them.</summary>
    public IReadOnlyList<TinContract>? Tins { get; init; }

    /// <summary>Present water content, % of wet mass.</summary>
    /// <example>7.7</example>
    public double? WetBasis { get; init; }

    /// <summary>Present water content by a calcium-carbide tester.</summary>
    public CarbideContract? Carbide { get; init; }

    /// <summary>Target water contents, %, one a portion; with wetMass.</summary>
    /// <example>[10, 12, 14, 16, 18]</example>
    public IReadOnlyList<double>? Targets { get; init; }

    /// <summary>An optimum that is expected, in place of targets: they are then proposed around it.</summary>
    public ExpectedContract? Expected { get; init; }
}

/// <summary>A portion of soil for one specimen.</summary>
public sealed record PortionContract : IWaterContentGiven
{
    /// <summary>What it is called; its position where absent.</summary>
    /// <example>1</example>
    public string? Label { get; init; }

    /// <summary>Wet mass now, in units.mass.</summary>
    /// <example>2600</example>
    [JsonRequired]
    public double? WetMass { get; init; }

    /// <summary>Water content now, % of dry mass.</summary>
    /// <example>8.4</example>
    public double? WaterContent { get; init; }

    /// <summary>Moisture tins, up to 20; the water content is the mean over them.</summary>
    public IReadOnlyList<TinContract>? Tins { get; init; }

    /// <summary>Water content now, % of wet mass.</summary>
    /// <example>7.7</example>
    public double? WetBasis { get; init; }

    /// <summary>Water content now by a calcium-carbide tester.</summary>
    public CarbideContract? Carbide { get; init; }

    /// <summary>Target water content, %. Every portion has one, or none has and expected is given.</summary>
    /// <example>12</example>
    public double? Target { get; init; }
}

/// <summary>An optimum that is expected: as a number, or by the plastic limit.</summary>
public sealed record ExpectedContract
{
    /// <summary>Expected optimum water content, %.</summary>
    /// <example>14</example>
    public double? OptimumWaterContent { get; init; }

    /// <summary>Plastic limit, %: the optimum is then estimated from it (Gurtug and Sridharan 2004, standard effort).</summary>
    /// <example>18</example>
    public double? PlasticLimit { get; init; }

    /// <summary>How many targets, with wetMass; 1 to 20. Default 5. With portions there is one for each.</summary>
    /// <example>5</example>
    public int? Count { get; init; }

    /// <summary>Distance between targets, percentage points. Default 2.</summary>
    /// <example>2</example>
    public double? Spacing { get; init; }
}

/// <summary>Water for each portion.</summary>
public sealed record SpecimenWaterAnswer : EarthworkAnswer
{
    /// <summary>The portions, in the order of the request.</summary>
    public required IReadOnlyList<PortionAnswer> Portions { get; init; }

    /// <summary>The optimum that the targets were placed around; null where they were given.</summary>
    public ExpectedAnswer? Expected { get; init; }
}

/// <summary>A portion and its water.</summary>
/// <param name="Label" example="1">As in the request, or the position.</param>
/// <param name="WetMass" example="2600">Wet mass now, in units.mass.</param>
/// <param name="WaterContent" example="8.4">Water content now, %.</param>
/// <param name="Target" example="12">Target water content, %.</param>
/// <param name="DryMass" example="2398.5">Dry mass, in units.mass.</param>
/// <param name="WaterToAdd">Water to add; negative where the portion is to be dried back.</param>
/// <param name="FinalMass" example="2686.3">Mass once the water is in, in units.mass.</param>
public sealed record PortionAnswer(string Label, double WetMass, double WaterContent, double Target, double DryMass, WaterAmountAnswer WaterToAdd, double FinalMass);

/// <summary>An expected optimum.</summary>
/// <param name="OptimumWaterContent" example="16.56">Expected optimum water content, %.</param>
/// <param name="MaximumDryDensity" example="1.664">Estimated maximum dry density, in units.density; null where only the water content was expected.</param>
/// <param name="Basis" example="Gurtug &amp; Sridharan 2004, standard effort, fine-grained soils (from memory)">Where it stands.</param>
public sealed record ExpectedAnswer(double OptimumWaterContent, double? MaximumDryDensity, string Basis);
