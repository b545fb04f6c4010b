using System.Text.Json.Serialization;

namespace Drypeak.Service.Earthwork;

/// <summary>A roller at work.</summary>
public sealed record RollerOutputRequest : EarthworkRequest
{
    /// <summary>Width of the drum, in units.length.</summary>
    /// <example>2.1</example>
    [JsonRequired]
    public double? Width { get; init; }

    /// <summary>Overlap of neighboring lanes, in units.length. Default 0.</summary>
    /// <example>0.2</example>
    public double? Overlap { get; init; }

    /// <summary>Speed while rolling, in units.speed.</summary>
    /// <example>4</example>
    [JsonRequired]
    public double? Speed { get; init; }

    /// <summary>Compacted thickness of the lift, in units.length.</summary>
    /// <example>0.2</example>
    [JsonRequired]
    public double? LiftThickness { get; init; }

    /// <summary>Passes over each place.</summary>
    /// <example>8</example>
    [JsonRequired]
    public int? Passes { get; init; }

    /// <summary>Share of the hour that is spent rolling, a fraction over 0 and up to 1. Default 1.</summary>
    /// <example>0.75</example>
    public double? Efficiency { get; init; }
}

/// <summary>What the roller finishes.</summary>
public sealed record RollerOutputAnswer : EarthworkAnswer
{
    /// <summary>Width that a lane adds, in units.length.</summary>
    /// <example>1.9</example>
    public double EffectiveWidth { get; init; }

    /// <summary>The efficiency that was used, a fraction.</summary>
    /// <example>0.75</example>
    public double Efficiency { get; init; }

    /// <summary>Finished area in an hour, in units.area.</summary>
    /// <example>712.5</example>
    public double AreaPerHour { get; init; }

    /// <summary>Finished, compacted volume in an hour, in units.bulkVolume.</summary>
    /// <example>142.5</example>
    public double VolumePerHour { get; init; }
}
