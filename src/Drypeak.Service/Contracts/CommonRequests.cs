using System.Text.Json.Serialization;

namespace Drypeak.Service.Contracts;

/// <summary>The units of a request, and of its answer. Each has a default; the answer repeats all that were used.</summary>
public sealed record UnitsContract
{
    /// <summary>Mass of mold and soil: g, kg or lb. Default g.</summary>
    /// <example>g</example>
    public string? Mass { get; init; }

    /// <summary>Mass of moisture tins: g, kg or lb. Default: as mass.</summary>
    /// <example>g</example>
    public string? TinMass { get; init; }

    /// <summary>Volume: cm3, L, m3, in3, ft3 or yd3. Default cm3.</summary>
    /// <example>cm3</example>
    public string? Volume { get; init; }

    /// <summary>Density: kg/m3, Mg/m3, g/cm3, lb/ft3, or kN/m3 for unit weight (density times 9.80665 m/s²). Default Mg/m3.</summary>
    /// <example>Mg/m3</example>
    public string? Density { get; init; }

    /// <summary>Length: mm, cm, m, in or ft. Default mm.</summary>
    /// <example>mm</example>
    public string? Length { get; init; }
}

/// <summary>Specific gravity of the solids.</summary>
public sealed record SpecificGravityContract
{
    /// <summary>Specific gravity (dimensionless), over 0.</summary>
    /// <example>2.68</example>
    [JsonRequired]
    public double? Value { get; init; }

    /// <summary>"measured" on this soil, or "assumed". Default: assumed.</summary>
    /// <example>measured</example>
    public string? Determined { get; init; }
}

/// <summary>A moisture tin's three weighings, in units.tinMass.</summary>
public sealed record TinContract
{
    /// <summary>Empty tin.</summary>
    /// <example>31.2</example>
    [JsonRequired]
    public double? Tin { get; init; }

    /// <summary>Tin and wet soil.</summary>
    /// <example>152.4</example>
    [JsonRequired]
    public double? Wet { get; init; }

    /// <summary>Tin and dry soil, after the oven.</summary>
    /// <example>141.0</example>
    [JsonRequired]
    public double? Dry { get; init; }
}

/// <summary>A calcium-carbide tester's reading.</summary>
public sealed record CarbideContract
{
    /// <summary>Dial reading, % of wet mass.</summary>
    /// <example>10.7</example>
    [JsonRequired]
    public double? Reading { get; init; }

    /// <summary>Whether half the usual mass of soil was used: the reading then counts twice. Default: false.</summary>
    /// <example>false</example>
    public bool? HalfSample { get; init; }
}

/// <summary>A mold. Its volume is given, or follows from diameter and height, or from the water that fills it.</summary>
public sealed record MoldContract
{
    /// <summary>Mass of the empty mold, in units.mass.</summary>
    /// <example>4250.0</example>
    public double? Mass { get; init; }

    /// <summary>Volume, in units.volume.</summary>
    /// <example>943.3</example>
    public double? Volume { get; init; }

    /// <summary>Inside diameter, in units.length.</summary>
    /// <example>101.6</example>
    public double? Diameter { get; init; }

    /// <summary>Several readings of the inside diameter, up to 20; their mean counts. Beside diameter they must agree with it to 0.2 %.</summary>
    /// <example>[101.58, 101.63, 101.6]</example>
    public IReadOnlyList<double>? Diameters { get; init; }

    /// <summary>Inside height, in units.length.</summary>
    /// <example>116.4</example>
    public double? Height { get; init; }

    /// <summary>Several readings of the inside height, up to 20; their mean counts. Beside height they must agree with it to 0.2 %.</summary>
    /// <example>[116.4, 116.5, 116.3]</example>
    public IReadOnlyList<double>? Heights { get; init; }

    /// <summary>By water: mass of the empty mold, with the plate where one is used, in units.mass.</summary>
    /// <example>4250.0</example>
    public double? Empty { get; init; }

    /// <summary>By water: mass of the mold full of water, with the same plate, in units.mass.</summary>
    /// <example>5191.6</example>
    public double? WithWater { get; init; }

    /// <summary>By water: mass of the cover plate that is in both, in units.mass.</summary>
    /// <example>310.5</example>
    public double? Plate { get; init; }

    /// <summary>By water: its temperature, °C, 0 to 40. Default 20.</summary>
    /// <example>22</example>
    public double? WaterTemperature { get; init; }
}

/// <summary>Oversize particles removed before the test.</summary>
public record OversizeContract
{
    /// <summary>Their share of the total dry mass, %, 0 to below 100.</summary>
    /// <example>9.4</example>
    [JsonRequired]
    public double? Percent { get; init; }

    /// <summary>Their bulk specific gravity (dimensionless).</summary>
    /// <example>2.70</example>
    public double? SpecificGravity { get; init; }

    /// <summary>Their water content, %. Default 0.</summary>
    /// <example>1.0</example>
    public double? WaterContent { get; init; }

    /// <summary>The sieve that parted them, mm.</summary>
    /// <example>4.75</example>
    public double? Sieve { get; init; }
}
