using System.Text.Json.Serialization;
using Drypeak.Service.Contracts;

namespace Drypeak.Service.Laboratory;

/// <summary>Tests of one soil at different compactive efforts.</summary>
public sealed record EffortSeriesRequest
{
    /// <summary>Two to twenty tests, each a whole moisture-density request with a method or an effort.</summary>
    [JsonRequired]
    public IReadOnlyList<MoistureDensityRequest>? Tests { get; init; }

    /// <summary>Efforts at which the optimum is wanted, kJ/m³. Up to 100.</summary>
    /// <example>[1200]</example>
    public IReadOnlyList<double>? At { get; init; }
}

/// <summary>The line of optimums.</summary>
public sealed record EffortSeriesAnswer
{
    /// <summary>Units: those of the first test.</summary>
    public required UnitsContract Units { get; init; }

    /// <summary>The optimum of each test that has one, in order of effort.</summary>
    public required IReadOnlyList<EffortPointAnswer> Line { get; init; }

    /// <summary>The optimum at each effort asked for, straight over the logarithm of effort; empty where fewer than two tests have one.</summary>
    public required IReadOnlyList<EffortPointAnswer> At { get; init; }

    /// <summary>What a careful reviewer says; a pointer into a test begins with /tests/ and its position.</summary>
    public required IReadOnlyList<FindingContract> Findings { get; init; }

    /// <summary>Version and digest.</summary>
    public required ProvenanceContract Provenance { get; init; }

    /// <summary>What to bear in mind.</summary>
    public required IReadOnlyList<string> Cautions { get; init; }
}

/// <summary>An optimum at an effort.</summary>
/// <param name="Effort" example="593.5">Compactive effort, kJ/m³.</param>
/// <param name="WaterContent" example="14.2">Optimum water content, %.</param>
/// <param name="MaximumDryDensity" example="1.864">In units.density.</param>
/// <param name="Saturation" example="85.8">There, %; null without a specific gravity.</param>
public sealed record EffortPointAnswer(double Effort, double WaterContent, double MaximumDryDensity, double? Saturation);
