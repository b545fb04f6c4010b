using System.Text.Json.Serialization;

namespace Drypeak.Service.Field;

/// <summary>The sand cone: masses of sand in units.mass, volumes in units.volume.</summary>
public sealed record SandConeContract
{
    /// <summary>Sand in the hole alone, in place of the three weighings.</summary>
    /// <example>2180.0</example>
    public double? SandInHole { get; init; }

    /// <summary>The jar before.</summary>
    /// <example>6420.0</example>
    public double? Before { get; init; }

    /// <summary>The jar after.</summary>
    /// <example>2710.0</example>
    public double? After { get; init; }

    /// <summary>The sand that fills cone and plate.</summary>
    /// <example>1530.0</example>
    public double? ConeAndPlate { get; init; }

    /// <summary>Loose density of the sand, in units.density.</summary>
    /// <example>1.42</example>
    public double? SandDensity { get; init; }

    /// <summary>The sand's calibration, in place of its density.</summary>
    public SandCalibrationContract? Calibration { get; init; }

    /// <summary>By volumes: all the sand that ran out.</summary>
    /// <example>2612</example>
    public double? ReleasedVolume { get; init; }

    /// <summary>Volume of cone and plate; by volumes, or in place of the mass that fills them.</summary>
    /// <example>1077</example>
    public double? ConeVolume { get; init; }
}

/// <summary>A container of known volume filled with the sand.</summary>
public sealed record SandCalibrationContract
{
    /// <summary>Volume of the container, in units.volume.</summary>
    /// <example>2000</example>
    [JsonRequired]
    public double? ContainerVolume { get; init; }

    /// <summary>The sand that fills it, in units.mass.</summary>
    /// <example>2840</example>
    public double? SandMass { get; init; }

    /// <summary>The jar before, in units.mass; with after and coneAndPlate in place of sandMass.</summary>
    /// <example>6900</example>
    public double? Before { get; init; }

    /// <summary>The jar after, in units.mass.</summary>
    /// <example>2530</example>
    public double? After { get; init; }

    /// <summary>The sand that fills cone and plate, in units.mass.</summary>
    /// <example>1530</example>
    public double? ConeAndPlate { get; init; }
}

/// <summary>The rubber balloon, in units.volume.</summary>
public sealed record RubberBalloonContract
{
    /// <summary>Reading on the flat surface.</summary>
    /// <example>120</example>
    [JsonRequired]
    public double? InitialReading { get; init; }

    /// <summary>Reading in the hole.</summary>
    /// <example>1655</example>
    [JsonRequired]
    public double? FinalReading { get; init; }
}

/// <summary>The drive cylinder or core cutter: its volume, or its inside dimensions.</summary>
public sealed record DriveCylinderContract
{
    /// <summary>Volume, in units.volume.</summary>
    /// <example>1000</example>
    public double? Volume { get; init; }

    /// <summary>Inside diameter, in units.length.</summary>
    /// <example>100</example>
    public double? Diameter { get; init; }

    /// <summary>Height, in units.length.</summary>
    /// <example>127.3</example>
    public double? Height { get; init; }
}

/// <summary>Water replacement in a test pit, in units.volume.</summary>
public sealed record WaterReplacementContract
{
    /// <summary>Water that fills pit and template.</summary>
    /// <example>41200</example>
    [JsonRequired]
    public double? WithHole { get; init; }

    /// <summary>Water that fills the template on the flat surface.</summary>
    /// <example>11700</example>
    [JsonRequired]
    public double? TemplateOnly { get; init; }
}

/// <summary>The nuclear gauge: one reading of each or several, which are averaged.</summary>
public sealed record NuclearGaugeContract
{
    /// <summary>Wet density, in units.density; up to 20 readings.</summary>
    /// <example>[2.028, 2.036]</example>
    [JsonRequired]
    public IReadOnlyList<double>? WetDensity { get; init; }

    /// <summary>Water content, % of dry mass; up to 20 readings.</summary>
    /// <example>[12.1, 12.4]</example>
    public IReadOnlyList<double>? WaterContent { get; init; }

    /// <summary>Mass of water per volume, in units.density; up to 20 readings.</summary>
    /// <example>[0.218, 0.222]</example>
    public IReadOnlyList<double>? WaterDensity { get; init; }

    /// <summary>Gauge and oven on the same soil, for the moisture offset; up to 20 pairs.</summary>
    public IReadOnlyList<OvenPairContract>? OvenPairs { get; init; }
}

/// <summary>Water contents of one soil by gauge and by oven, %.</summary>
public sealed record OvenPairContract
{
    /// <summary>By the gauge.</summary>
    /// <example>12.6</example>
    [JsonRequired]
    public double? Gauge { get; init; }

    /// <summary>By the oven.</summary>
    /// <example>12.0</example>
    [JsonRequired]
    public double? Oven { get; init; }
}

/// <summary>A density found elsewhere, in units.density.</summary>
public sealed record DirectContract
{
    /// <summary>Wet density.</summary>
    /// <example>2.03</example>
    public double? WetDensity { get; init; }

    /// <summary>Dry density.</summary>
    /// <example>1.816</example>
    public double? DryDensity { get; init; }
}
