using System.Text.Json.Serialization;
using Drypeak.Service.Contracts;
using Drypeak.Service.Laboratory;

namespace Drypeak.Service.Earthwork;

/// <summary>What every request about planning the work may say.</summary>
public abstract record EarthworkRequest : IWaterGiven
{
    /// <summary>One line that names the job, up to 200 characters.</summary>
    /// <example>Ternmarsh, reach 2, lift 4</example>
    [JsonPropertyOrder(-3)]
    public string? Reference { get; init; }

    /// <summary>The caller's own labels with texts, up to 30; carried unchanged into the answer.</summary>
    /// <example>{ "project": "Ternmarsh" }</example>
    [JsonPropertyOrder(-2)]
    public IReadOnlyDictionary<string, string>? Identification { get; init; }

    /// <summary>Units of the request and of the answer.</summary>
    [JsonPropertyOrder(-1)]
    public EarthworkUnitsContract? Units { get; init; }

    /// <summary>Temperature of the water, °C, 0 to 40. Default 20.</summary>
    /// <example>20</example>
    [JsonPropertyOrder(1)]
    public double? WaterTemperature { get; init; }

    /// <summary>Density of water, in units.density, in place of its temperature.</summary>
    /// <example>1.0</example>
    [JsonPropertyOrder(1)]
    public double? WaterDensity { get; init; }

    /// <summary>Whether the working is wanted.</summary>
    /// <example>false</example>
    [JsonPropertyOrder(1)]
    public bool? Trace { get; init; }

    UnitsContract? IWaterGiven.Units => Units is { } units ? new UnitsContract { Density = units.Density } : null;
}

/// <summary>What every answer about planning the work says.</summary>
public abstract record EarthworkAnswer
{
    /// <summary>As in the request.</summary>
    /// <example>Ternmarsh, reach 2, lift 4</example>
    [JsonPropertyOrder(-3)]
    public string? Reference { get; init; }

    /// <summary>As in the request.</summary>
    /// <example>{ "project": "Ternmarsh" }</example>
    [JsonPropertyOrder(-2)]
    public IReadOnlyDictionary<string, string>? Identification { get; init; }

    /// <summary>All units that were used.</summary>
    [JsonPropertyOrder(-1)]
    public required EarthworkUnitsContract Units { get; init; }

    /// <summary>The working, where it was asked for.</summary>
    [JsonPropertyOrder(1)]
    [JsonIgnore(Condition = JsonIgnoreCondition.WhenWritingNull)]
    public IReadOnlyList<TraceStep>? Trace { get; init; }

    /// <summary>What a careful reviewer says, worst first.</summary>
    [JsonPropertyOrder(1)]
    public required IReadOnlyList<FindingContract> Findings { get; init; }

    /// <summary>What to bear in mind.</summary>
    [JsonPropertyOrder(1)]
    public required IReadOnlyList<string> Cautions { get; init; }

    /// <summary>Version and digest.</summary>
    [JsonPropertyOrder(1)]
    public required ProvenanceContract Provenance { get; init; }
}

/// <summary>The units of a request about planning the work, and of its answer. Each has a default; the answer repeats all.</summary>
public sealed record EarthworkUnitsContract
{
    /// <summary>Mass of soil and water: g, kg, lb, t (1000 kg) or short-ton (2000 lb). Default g.</summary>
    /// <example>kg</example>
    public string? Mass { get; init; }

    /// <summary>Mass of moisture tins: g, kg or lb. Default: as mass where that is one of them, else g.</summary>
    /// <example>g</example>
    public string? TinMass { get; init; }

    /// <summary>Volume of molds: cm3, L, m3, in3, ft3 or yd3. Default cm3. Earth is counted in bulkVolume.</summary>
    /// <example>cm3</example>
    public string? Volume { get; init; }

    /// <summary>Density: kg/m3, Mg/m3, g/cm3, lb/ft3, or kN/m3 for unit weight (density times 9.80665 m/s²). Default Mg/m3.</summary>
    /// <example>Mg/m3</example>
    public string? Density { get; init; }

    /// <summary>Length of stations, widths and thicknesses: mm, cm, m, in or ft. Default mm.</summary>
    /// <example>m</example>
    public string? Length { get; init; }

    /// <summary>Volume of water: L, m3, gal (US, 231 in³), ft3 or acre-ft. Default L.</summary>
    /// <example>L</example>
    public string? Liquid { get; init; }

    /// <summary>Area: m2, ha, ft2, yd2 or acre (4840 yd²). Default m2.</summary>
    /// <example>m2</example>
    public string? Area { get; init; }

    /// <summary>Volume of earth: m3, L, ft3, yd3 or acre-ft (43,560 ft³). Default m3.</summary>
    /// <example>m3</example>
    public string? BulkVolume { get; init; }

    /// <summary>Speed: km/h or mph. Default km/h.</summary>
    /// <example>km/h</example>
    public string? Speed { get; init; }

    /// <summary>Distance of a haul: m, km, ft or mi. Default m.</summary>
    /// <example>m</example>
    public string? Distance { get; init; }
}

/// <summary>Water by mass and by volume.</summary>
/// <param name="Mass" example="5210">In units.mass; negative where water is to be lost.</param>
/// <param name="Liquid" example="5219">In units.liquid; negative where water is to be lost.</param>
public sealed record WaterAmountAnswer(double Mass, double Liquid);
