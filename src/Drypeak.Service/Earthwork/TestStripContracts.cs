using System.Text.Json.Serialization;
using Drypeak.Service.Contracts;

namespace Drypeak.Service.Earthwork;

/// <summary>A trial strip: densities after rising numbers of passes.</summary>
public sealed record TestStripRequest : EarthworkRequest
{
    /// <summary>Readings by number of passes, in any order; three numbers or more for a curve.</summary>
    [JsonRequired]
    public IReadOnlyList<StripReadingsContract>? Readings { get; init; }

    /// <summary>The gain of dry density below which another pass is not worth making, in units.density.</summary>
    /// <example>0.01</example>
    [JsonRequired]
    public double? LeastGain { get; init; }
}

/// <summary>Readings after one number of passes.</summary>
public sealed record StripReadingsContract : IWaterContentGiven
{
    /// <summary>Passes of the roller over each place.</summary>
    /// <example>4</example>
    [JsonRequired]
    public int? Passes { get; init; }

    /// <summary>Dry densities, up to 100, in units.density; or give wetDensity and a water content.</summary>
    /// <example>[1.79, 1.81, 1.8]</example>
    public IReadOnlyList<double>? DryDensity { get; init; }

    /// <summary>Wet densities, up to 100, in units.density, all at the one water content that stands beside them.</summary>
    /// <example>[2.02, 2.04, 2.03]</example>
    public IReadOnlyList<double>? WetDensity { get; init; }

    /// <summary>Water content, % of dry mass; with wetDensity.</summary>
    /// <example>12.6</example>
    public double? WaterContent { get; init; }

    /// <summary>Moisture tins, up to 20; the water content is the mean over them.</summary>
    public IReadOnlyList<TinContract>? Tins { get; init; }

    /// <summary>Water content, % of wet mass.</summary>
    /// <example>11.2</example>
    public double? WetBasis { get; init; }

    /// <summary>Water content by a calcium-carbide tester.</summary>
    public CarbideContract? Carbide { get; init; }
}

/// <summary>What a trial strip says.</summary>
public sealed record TestStripAnswer : EarthworkAnswer
{
    /// <summary>The stages of the strip, by passes.</summary>
    public required IReadOnlyList<StripStageAnswer> Stages { get; init; }

    /// <summary>The growth curve; null with fewer than three numbers of passes, or where density does not grow. Readings after a fall of density are left out.</summary>
    public GrowthCurveAnswer? Curve { get; init; }

    /// <summary>Passes after which one more gains less than leastGain; null without a curve, or where they lie beyond the passes over which density grew.</summary>
    /// <example>8</example>
    public int? Passes { get; init; }

    /// <summary>The density that the strip says can be reached; null where the passes are not known.</summary>
    public StripTargetAnswer? Target { get; init; }

    /// <summary>Addresses of the chart.</summary>
    [JsonPropertyOrder(1)]
    public required LinksContract Links { get; init; }
}

/// <summary>Readings after one number of passes.</summary>
/// <param name="Passes" example="4">Passes over each place.</param>
/// <param name="Count" example="3">Readings.</param>
/// <param name="DryDensities" example="[1.79, 1.81, 1.8]">Dry densities, in units.density.</param>
/// <param name="WaterContent" example="12.6">Water content, %; null where none was given.</param>
/// <param name="Mean" example="1.8">Mean dry density, in units.density.</param>
/// <param name="StandardDeviation" example="0.01">Sample standard deviation, in units.density; null for one reading.</param>
/// <param name="Fitted" example="1.803">Dry density of the growth curve, in units.density; null without one, and after density has fallen.</param>
/// <param name="GainOfOneMore" example="0.016">What one pass more gains by the curve, in units.density; null as fitted is.</param>
public sealed record StripStageAnswer(
    int Passes, int Count, IReadOnlyList<double> DryDensities, double? WaterContent, double Mean, double? StandardDeviation, double? Fitted, double? GainOfOneMore);

/// <summary>Dry density against passes: limit − reserve·e^(−passes/scale).</summary>
/// <param name="Limit" example="1.89">Dry density that is approached, in units.density.</param>
/// <param name="Reserve" example="0.21">What is gained from no pass on, in units.density.</param>
/// <param name="Scale" example="4.8">Passes in which the distance to the limit falls to 1/e.</param>
/// <param name="RootMeanSquareError" example="0.008">Of the readings about the curve, in units.density.</param>
/// <param name="Points" example="[[2, 1.752], [8, 1.85]]">The curve as points of passes and dry density.</param>
public sealed record GrowthCurveAnswer(double Limit, double Reserve, double Scale, double RootMeanSquareError, IReadOnlyList<double[]> Points);

/// <summary>The density that a strip says can be reached.</summary>
/// <param name="DryDensity" example="1.86">Mean of the readings from the passes needed on, in units.density.</param>
/// <param name="Count" example="6">Readings.</param>
/// <param name="StandardDeviation" example="0.009">Their sample standard deviation, in units.density; null for one reading.</param>
/// <param name="CoefficientOfVariation" example="0.48">Standard deviation over the mean, %; null for one reading.</param>
public sealed record StripTargetAnswer(double DryDensity, int Count, double? StandardDeviation, double? CoefficientOfVariation);
