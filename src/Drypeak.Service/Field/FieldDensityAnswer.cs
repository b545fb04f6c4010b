using System.Text.Json.Serialization;
using Drypeak.Service.Contracts;
using Drypeak.Service.Laboratory;

namespace Drypeak.Service.Field;

/// <summary>What the field test says. Numbers are unrounded, in the units that the request asked for; percentages in %.</summary>
public sealed record FieldDensityAnswer
{
    /// <summary>As in the request.</summary>
    /// <example>Ternmarsh, lift 4, 1+240, 3 m left</example>
    public string? Reference { get; init; }

    /// <summary>As in the request; absent where it had none.</summary>
    [JsonIgnore(Condition = JsonIgnoreCondition.WhenWritingNull)]
    public IReadOnlyDictionary<string, string>? Identification { get; init; }

    /// <summary>As in the request.</summary>
    /// <example>sand-cone</example>
    public required string Method { get; init; }

    /// <summary>All units that were used.</summary>
    public required UnitsContract Units { get; init; }

    /// <summary>The soil in place.</summary>
    public required SoilInPlaceAnswer Test { get; init; }

    /// <summary>What it was held against; null where the request had no laboratory.</summary>
    public FieldReferenceAnswer? Laboratory { get; init; }

    /// <summary>Dry density over the reference's maximum, %; null where one is unknown.</summary>
    /// <example>95.8</example>
    public double? RelativeCompaction { get; init; }

    /// <summary>Water content less the reference's optimum, percentage points; null where one is unknown.</summary>
    /// <example>1.0</example>
    public double? WaterContentFromOptimum { get; init; }

    /// <summary>Relative density of a free-draining soil, %; null without a minimum dry density.</summary>
    /// <example>70.2</example>
    public double? RelativeDensity { get; init; }

    /// <summary>Each requirement, in the order of the request.</summary>
    public required IReadOnlyList<RequirementAnswer> Requirements { get; init; }

    /// <summary>accepted, rejected or undecided; null where nothing was required.</summary>
    /// <example>accepted</example>
    public string? Outcome { get; init; }

    /// <summary>The working, where it was asked for.</summary>
    [JsonIgnore(Condition = JsonIgnoreCondition.WhenWritingNull)]
    public IReadOnlyList<TraceStep>? Trace { get; init; }

    /// <summary>What a careful reviewer says, worst first.</summary>
    public required IReadOnlyList<FindingContract> Findings { get; init; }

    /// <summary>What to bear in mind.</summary>
    public required IReadOnlyList<string> Cautions { get; init; }

    /// <summary>Addresses of the chart.</summary>
    public required LinksContract Links { get; init; }

    /// <summary>Version and digest.</summary>
    public required ProvenanceContract Provenance { get; init; }
}

/// <summary>The soil in place; a member is null where the readings do not give it.</summary>
public sealed record SoilInPlaceAnswer
{
    /// <summary>Volume of the hole or the cylinder, in units.volume; null for a method without one.</summary>
    /// <example>1535.2</example>
    public double? Volume { get; init; }

    /// <summary>Loose density of the sand, in units.density; with the sand cone by masses.</summary>
    /// <example>1.42</example>
    public double? SandDensity { get; init; }

    /// <summary>In units.density.</summary>
    /// <example>2.033</example>
    public double? WetDensity { get; init; }

    /// <summary>% of dry mass.</summary>
    /// <example>11.8</example>
    public double? WaterContent { get; init; }

    /// <summary>In units.density.</summary>
    /// <example>1.818</example>
    public double? DryDensity { get; init; }

    /// <summary>Ratio; null without a specific gravity above what the density asks.</summary>
    /// <example>0.471</example>
    public double? VoidRatio { get; init; }

    /// <summary>%.</summary>
    /// <example>32.0</example>
    public double? Porosity { get; init; }

    /// <summary>%.</summary>
    /// <example>67.1</example>
    public double? Saturation { get; init; }

    /// <summary>% of the total volume.</summary>
    /// <example>10.5</example>
    public double? AirVoids { get; init; }

    /// <summary>The fines in place; where oversize is applied to the field.</summary>
    [JsonIgnore(Condition = JsonIgnoreCondition.WhenWritingNull)]
    public FinesAnswer? Fine { get; init; }

    /// <summary>The gauge's readings that were averaged.</summary>
    [JsonIgnore(Condition = JsonIgnoreCondition.WhenWritingNull)]
    public IReadOnlyList<ReadingsAnswer>? Readings { get; init; }

    /// <summary>The gauge's moisture offset from its oven pairs.</summary>
    [JsonIgnore(Condition = JsonIgnoreCondition.WhenWritingNull)]
    public MoistureOffsetAnswer? MoistureOffset { get; init; }
}

/// <summary>The fines of the soil in place.</summary>
/// <param name="WetDensity" example="1.98">In units.density.</param>
/// <param name="WaterContent" example="13.2">% of dry mass.</param>
/// <param name="DryDensity" example="1.75">In units.density.</param>
public sealed record FinesAnswer(double WetDensity, double WaterContent, double DryDensity);

/// <summary>Several readings of one quantity.</summary>
/// <param name="Quantity" example="wetDensity">The member of nuclearGauge.</param>
/// <param name="Count" example="2">How many.</param>
/// <param name="Mean" example="2.032">In the unit of the readings.</param>
/// <param name="StandardDeviation" example="0.0057">About the mean; null for one reading.</param>
/// <param name="StandardUncertainty" example="0.004">Of the mean, s/√n; null for one reading. Where the request gives no uncertainty of dry density or water content, it is carried into theirs.</param>
public sealed record ReadingsAnswer(string Quantity, int Count, double Mean, double? StandardDeviation, double? StandardUncertainty);

/// <summary>A gauge's moisture offset: w = w_gauge + k(100 + w_gauge)/1000, in %.</summary>
/// <param name="K" example="-5.3">Mean over the pairs of 1000(w_oven − w_gauge)/(100 + w_gauge).</param>
/// <param name="StandardUncertainty" example="0.9">Of the mean; null for one pair. Where the request gives no uncertainty of the water content, it is part of it.</param>
/// <param name="Pairs" example="3">How many.</param>
public sealed record MoistureOffsetAnswer(double K, double? StandardUncertainty, int Pairs);

/// <summary>What the field test was held against, after the correction for oversize where there was one.</summary>
/// <param name="MaximumDryDensity" example="1.99">In units.density; null where unknown.</param>
/// <param name="OptimumWaterContent" example="10.8">%.</param>
/// <param name="MinimumDryDensity" example="1.63">In units.density.</param>
/// <param name="CorrectedForOversize" example="true">Whether they hold for the material with its oversize.</param>
public sealed record FieldReferenceAnswer(double? MaximumDryDensity, double? OptimumWaterContent, double? MinimumDryDensity, bool CorrectedForOversize);
