using System.Text.Json.Serialization;
using Drypeak.Service.Contracts;

namespace Drypeak.Service.Laboratory;

/// <summary>A laboratory compaction test, from any stage between weighings and dry densities.</summary>
public sealed record MoistureDensityRequest : IWaterGiven
{
    /// <summary>One line that names the test, up to 200 characters.</summary>
    /// <example>Ternmarsh, borrow area 7, sample 3</example>
    public string? Reference { get; init; }

    /// <summary>Up to 30 labels of the caller's own with texts, carried unchanged into the answer.</summary>
    public IReadOnlyDictionary<string, string>? Identification { get; init; }

    /// <summary>Code of the test method, as listed at /v1/test-methods, or "custom". Optional.</summary>
    /// <example>astm-d698-a</example>
    public string? Method { get; init; }

    /// <summary>Rammer, drop, layers and blows; with method "custom" only.</summary>
    public EffortContract? Effort { get; init; }

    /// <summary>Units of the request and of the answer.</summary>
    public UnitsContract? Units { get; init; }

    /// <summary>The mold, where the specimens bring none of their own.</summary>
    public MoldContract? Mold { get; init; }

    /// <summary>Specific gravity of the solids. Without it there are no saturations and no lines.</summary>
    public SpecificGravityContract? SpecificGravity { get; init; }

    /// <summary>Temperature of the water, °C, 0 to 40. Default 20.</summary>
    /// <example>20</example>
    public double? WaterTemperature { get; init; }

    /// <summary>Density of water, in units.density, in place of its temperature.</summary>
    /// <example>1.0</example>
    public double? WaterDensity { get; init; }

    /// <summary>The specimens, in any order; 1 to 500.</summary>
    [JsonRequired]
    public IReadOnlyList<SpecimenContract>? Specimens { get; init; }

    /// <summary>Oversize particles to correct for.</summary>
    public OversizeContract? Oversize { get; init; }

    /// <summary>What stays on a sieve of the material that was compacted.</summary>
    public ParticlesAboveContract? ParticlesAbove { get; init; }

    /// <summary>The curve that is wanted.</summary>
    public CurveRequest? Curve { get; init; }

    /// <summary>Lines wanted beside the zero-air-voids line.</summary>
    public LinesRequest? Lines { get; init; }

    /// <summary>Standard uncertainties of the measurements, carried to the optimum.</summary>
    public UncertaintyRequest? Uncertainty { get; init; }

    /// <summary>Whether the working is wanted: each step of the arithmetic with its numbers.</summary>
    /// <example>false</example>
    public bool? Trace { get; init; }
}

/// <summary>One specimen. Its data may begin at any stage; whatever is given twice must agree.</summary>
public sealed record SpecimenContract : IWaterContentGiven
{
    /// <summary>Name, unique in the test, up to 200 characters. Default: its position, from 1.</summary>
    /// <example>1</example>
    public string? Label { get; init; }

    /// <summary>Mass of mold and wet soil, in units.mass.</summary>
    /// <example>6021.4</example>
    public double? MoldAndWetSoil { get; init; }

    /// <summary>The specimen's own mold; what it leaves out is the test's.</summary>
    public MoldContract? Mold { get; init; }

    /// <summary>How far below the mold's rim the soil ends, in units.length, as after a vibrating hammer: its volume is then V·(h − z)/h. The mold needs diameter and height.</summary>
    /// <example>3.2</example>
    public double? DepthBelowRim { get; init; }

    /// <summary>Several readings of that depth, up to 20; their mean counts. Beside depthBelowRim they must agree with it.</summary>
    /// <example>[3.1, 3.3, 3.2]</example>
    public IReadOnlyList<double>? DepthsBelowRim { get; init; }

    /// <summary>Mass of the wet soil alone, in units.mass.</summary>
    /// <example>1771.4</example>
    public double? WetMass { get; init; }

    /// <summary>Wet density, in units.density.</summary>
    /// <example>1.878</example>
    public double? WetDensity { get; init; }

    /// <summary>Dry density, in units.density.</summary>
    /// <example>1.702</example>
    public double? DryDensity { get; init; }

    /// <summary>Water content, % of dry mass.</summary>
    /// <example>10.4</example>
    public double? WaterContent { get; init; }

    /// <summary>Moisture tins, up to 20; the water content is the mean over them.</summary>
    public IReadOnlyList<TinContract>? Tins { get; init; }

    /// <summary>Water content, % of wet mass.</summary>
    /// <example>9.4</example>
    public double? WetBasis { get; init; }

    /// <summary>Water content by a calcium-carbide tester.</summary>
    public CarbideContract? Carbide { get; init; }

    /// <summary>Why the point is not fitted. It is reported and drawn all the same.</summary>
    /// <example>mold not full</example>
    public string? SetAside { get; init; }
}

/// <summary>The compaction of a method of the caller's own.</summary>
public sealed record EffortContract
{
    /// <summary>Mass of the rammer, in units.mass.</summary>
    /// <example>2500</example>
    [JsonRequired]
    public double? RammerMass { get; init; }

    /// <summary>Height of fall, in units.length.</summary>
    /// <example>305</example>
    [JsonRequired]
    public double? Drop { get; init; }

    /// <summary>Number of layers.</summary>
    /// <example>3</example>
    [JsonRequired]
    public int? Layers { get; init; }

    /// <summary>Blows on each layer.</summary>
    /// <example>25</example>
    [JsonRequired]
    public int? Blows { get; init; }
}

/// <summary>Large particles in the compacted material.</summary>
public sealed record ParticlesAboveContract
{
    /// <summary>Sieve opening, mm.</summary>
    /// <example>4.75</example>
    [JsonRequired]
    public double? Sieve { get; init; }

    /// <summary>Retained on it, % of dry mass.</summary>
    /// <example>12</example>
    [JsonRequired]
    public double? Percent { get; init; }
}

/// <summary>The curve that is wanted.</summary>
public sealed record CurveRequest
{
    /// <summary>auto, averaged, saturation, parabola, cubic or spline. Default auto.</summary>
    /// <example>auto</example>
    public string? Model { get; init; }

    /// <summary>An engineer's own peak, reported beside the fitted one.</summary>
    public AdoptedRequest? Adopted { get; init; }
}

/// <summary>An engineer's own peak.</summary>
public sealed record AdoptedRequest
{
    /// <summary>Optimum water content, %.</summary>
    /// <example>14.0</example>
    [JsonRequired]
    public double? WaterContent { get; init; }

    /// <summary>Maximum dry density, in units.density.</summary>
    /// <example>1.84</example>
    [JsonRequired]
    public double? MaximumDryDensity { get; init; }

    /// <summary>Why; not blank.</summary>
    /// <example>drawn by hand through the wet leg</example>
    [JsonRequired]
    public string? Reason { get; init; }
}

/// <summary>Lines wanted beside the zero-air-voids line.</summary>
public sealed record LinesRequest
{
    /// <summary>Degrees of saturation, %; over 0, to 100. Up to 20.</summary>
    /// <example>[100, 90, 80]</example>
    public IReadOnlyList<double>? Saturation { get; init; }

    /// <summary>Air voids, % of the total volume; 0 to below 100. Up to 20.</summary>
    /// <example>[5, 10]</example>
    public IReadOnlyList<double>? AirVoids { get; init; }
}

/// <summary>Standard uncertainties of the measurements, in the request's units. The mold's volume is one quantity for all its specimens.</summary>
public sealed record UncertaintyRequest
{
    /// <summary>Of each weighing of mold and soil, in units.mass.</summary>
    /// <example>0.5</example>
    public double? Mass { get; init; }

    /// <summary>Of each weighing of a tin, in units.tinMass.</summary>
    /// <example>0.02</example>
    public double? TinMass { get; init; }

    /// <summary>Of the mold's volume, in units.volume.</summary>
    /// <example>1.5</example>
    public double? Volume { get; init; }

    /// <summary>Of each water content, percentage points.</summary>
    /// <example>0.15</example>
    public double? WaterContent { get; init; }

    /// <summary>Of each dry density, in units.density.</summary>
    /// <example>0.005</example>
    public double? DryDensity { get; init; }

    /// <summary>Of the specific gravity.</summary>
    /// <example>0.02</example>
    public double? SpecificGravity { get; init; }
}
