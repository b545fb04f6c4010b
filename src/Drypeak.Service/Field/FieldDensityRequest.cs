using System.Text.Json.Serialization;
using Drypeak.Service.Contracts;
using Drypeak.Service.Laboratory;

namespace Drypeak.Service.Field;

/// <summary>A field density test, from readings, with what it is held against.</summary>
public sealed record FieldDensityRequest : IWaterGiven, IWaterContentGiven
{
    /// <summary>One line that names the test, up to 200 characters.</summary>
    /// <example>Ternmarsh, lift 4, 1+240, 3 m left</example>
    public string? Reference { get; init; }

    /// <summary>Up to 30 labels of the caller's own with texts, carried unchanged into the answer.</summary>
    public IReadOnlyDictionary<string, string>? Identification { get; init; }

    /// <summary>Units of the request and of the answer.</summary>
    public UnitsContract? Units { get; init; }

    /// <summary>sand-cone, rubber-balloon, drive-cylinder, water-replacement, nuclear-gauge or direct; the block of that name goes with it.</summary>
    /// <example>sand-cone</example>
    [JsonRequired]
    public string? Method { get; init; }

    /// <summary>With method "sand-cone".</summary>
    public SandConeContract? SandCone { get; init; }

    /// <summary>With method "rubber-balloon".</summary>
    public RubberBalloonContract? RubberBalloon { get; init; }

    /// <summary>With method "drive-cylinder".</summary>
    public DriveCylinderContract? DriveCylinder { get; init; }

    /// <summary>With method "water-replacement".</summary>
    public WaterReplacementContract? WaterReplacement { get; init; }

    /// <summary>With method "nuclear-gauge".</summary>
    public NuclearGaugeContract? NuclearGauge { get; init; }

    /// <summary>With method "direct".</summary>
    public DirectContract? Direct { get; init; }

    /// <summary>The soil out of the hole or the cylinder.</summary>
    public SoilContract? Soil { get; init; }

    /// <summary>Water content, % of dry mass.</summary>
    /// <example>11.8</example>
    public double? WaterContent { get; init; }

    /// <summary>Moisture tins, up to 20; the water content is the mean over them.</summary>
    public IReadOnlyList<TinContract>? Tins { get; init; }

    /// <summary>Water content, % of wet mass.</summary>
    /// <example>10.6</example>
    public double? WetBasis { get; init; }

    /// <summary>Water content by a calcium-carbide tester.</summary>
    public CarbideContract? Carbide { get; init; }

    /// <summary>Specific gravity of the solids. Without it there is no void ratio, no saturation, no air voids.</summary>
    public SpecificGravityContract? SpecificGravity { get; init; }

    /// <summary>Temperature of the water, °C, 0 to 40. Default 20.</summary>
    /// <example>20</example>
    public double? WaterTemperature { get; init; }

    /// <summary>Density of water, in units.density, in place of its temperature.</summary>
    /// <example>1.0</example>
    public double? WaterDensity { get; init; }

    /// <summary>The largest particle in the hole, mm: the hole must be large enough for it.</summary>
    /// <example>12.5</example>
    public double? LargestParticle { get; init; }

    /// <summary>Oversize in the soil of the hole.</summary>
    public FieldOversizeContract? Oversize { get; init; }

    /// <summary>What the test is held against.</summary>
    public LaboratoryContract? Laboratory { get; init; }

    /// <summary>Standard uncertainties of the field's values, carried to the first order.</summary>
    public FieldUncertaintyContract? Uncertainty { get; init; }

    /// <summary>What is required, and how it is decided.</summary>
    public SpecificationContract? Specification { get; init; }

    /// <summary>Whether the working is wanted: each step of the arithmetic with its numbers.</summary>
    /// <example>false</example>
    public bool? Trace { get; init; }
}

/// <summary>The soil out of the hole, in units.mass.</summary>
public sealed record SoilContract
{
    /// <summary>Wet soil alone.</summary>
    /// <example>3120.5</example>
    public double? Wet { get; init; }

    /// <summary>Container and wet soil; with the container.</summary>
    /// <example>3370.5</example>
    public double? ContainerAndWet { get; init; }

    /// <summary>The empty container.</summary>
    /// <example>250.0</example>
    public double? Container { get; init; }

    /// <summary>The same soil dried, alone; it may stand for a water content.</summary>
    /// <example>2791.1</example>
    public double? Dry { get; init; }
}

/// <summary>Oversize particles in the soil of the hole.</summary>
public sealed record FieldOversizeContract : OversizeContract
{
    /// <summary>"laboratory": the reference is corrected to the field's oversize. "field": the field is corrected to its fines. Default: laboratory.</summary>
    /// <example>laboratory</example>
    public string? Apply { get; init; }
}

/// <summary>What the laboratory says of the soil: values, or a whole test that is computed with the request.</summary>
public sealed record LaboratoryContract
{
    /// <summary>Maximum dry density, in units.density.</summary>
    /// <example>1.93</example>
    public double? MaximumDryDensity { get; init; }

    /// <summary>Optimum water content, %.</summary>
    /// <example>12.1</example>
    public double? OptimumWaterContent { get; init; }

    /// <summary>Minimum dry density of a free-draining soil, in units.density.</summary>
    /// <example>1.55</example>
    public double? MinimumDryDensity { get; init; }

    /// <summary>Standard uncertainties of the two.</summary>
    public LaboratoryUncertaintyContract? Uncertainty { get; init; }

    /// <summary>A whole moisture-density request in their place; its uncertainty comes along.</summary>
    public MoistureDensityRequest? Test { get; init; }
}

/// <summary>Standard uncertainties of the reference.</summary>
public sealed record LaboratoryUncertaintyContract
{
    /// <summary>Of the maximum dry density, in units.density.</summary>
    /// <example>0.010</example>
    public double? MaximumDryDensity { get; init; }

    /// <summary>Of the optimum water content, percentage points.</summary>
    /// <example>0.3</example>
    public double? OptimumWaterContent { get; init; }
}

/// <summary>Standard uncertainties of the field's values, each of the value as a whole and independent of the others. Where dry density or water content has none, the spread of a gauge's readings and pairs stands for it.</summary>
public sealed record FieldUncertaintyContract
{
    /// <summary>Of the dry density, in units.density.</summary>
    /// <example>0.015</example>
    public double? DryDensity { get; init; }

    /// <summary>Of the water content, percentage points.</summary>
    /// <example>0.3</example>
    public double? WaterContent { get; init; }

    /// <summary>Of the specific gravity.</summary>
    /// <example>0.02</example>
    public double? SpecificGravity { get; init; }
}
