using Drypeak.Soil.Acceptance;
using Drypeak.Soil.Laboratory;
using Drypeak.Soil.Quantities;

namespace Drypeak.Soil.FieldDensity;

/// <summary>A field density test as it came from the field. Immutable, safe on any thread.</summary>
public sealed record FieldTest
{
    /// <summary>How it was made.</summary>
    public required FieldMethod Method { get; init; }

    /// <summary>The soil out of the hole, or null where none was weighed.</summary>
    public SoilWeighed? Soil { get; init; }

    /// <summary>Its water content, in every way that it was found.</summary>
    public required MeasuredWater Water { get; init; }

    /// <summary>Specific gravity of the solids, or null: then no void ratio, no saturation.</summary>
    public SpecificGravity? SpecificGravity { get; init; }

    /// <summary>Density of the water in the soil.</summary>
    public required Density WaterDensity { get; init; }

    /// <summary>The largest particle in the hole, mm, or null.</summary>
    public double? LargestParticleMillimeters { get; init; }

    /// <summary>The oversize in the soil of the hole, or null.</summary>
    public Oversize? Oversize { get; init; }

    /// <summary>Whether the field's value is corrected to its fines; else the laboratory's to the field's oversize.</summary>
    public bool OnFines { get; init; }

    /// <summary>What it is held against.</summary>
    public ReferenceValues Reference { get; init; } = new();

    /// <summary>Standard uncertainties, or null.</summary>
    public FieldUncertainty Uncertainty { get; init; } = new();

    /// <summary>The specification; may be empty.</summary>
    public IReadOnlyList<Requirement> Requirements { get; init; } = [];

    /// <summary>How it is decided.</summary>
    public DecisionRule Decision { get; init; } = DecisionRule.Simple;

    /// <summary>The units that texts speak.</summary>
    public UnitSet Units { get; init; } = new();
}

/// <summary>The soil out of the hole or the cylinder.</summary>
/// <param name="ContainerAndWet">Container and wet soil, or null.</param>
/// <param name="Container">The empty container, or null.</param>
/// <param name="Wet">Wet soil alone, or null.</param>
/// <param name="Dry">The same soil dried, alone, or null.</param>
public sealed record SoilWeighed(Mass? ContainerAndWet, Mass? Container, Mass? Wet, Mass? Dry);

/// <summary>Standard uncertainties of what a field test is judged by; null where one is taken as exact, or unknown.</summary>
public sealed record FieldUncertainty
{
    /// <summary>Of the field dry density.</summary>
    public Density? DryDensity { get; init; }

    /// <summary>Of the field water content.</summary>
    public WaterContent? WaterContent { get; init; }

    /// <summary>Of the specific gravity.</summary>
    public double? SpecificGravity { get; init; }

    /// <summary>Of the reference's maximum dry density.</summary>
    public Density? MaximumDryDensity { get; init; }

    /// <summary>Of the reference's optimum water content.</summary>
    public WaterContent? OptimumWaterContent { get; init; }
}

/// <summary>What the laboratory says of the soil; null where it says nothing.</summary>
public sealed record ReferenceValues
{
    /// <summary>Maximum dry density.</summary>
    public Density? MaximumDryDensity { get; init; }

    /// <summary>Optimum water content.</summary>
    public WaterContent? OptimumWaterContent { get; init; }

    /// <summary>Minimum dry density of a free-draining soil.</summary>
    public Density? MinimumDryDensity { get; init; }

    /// <summary>Whether the laboratory has already corrected them for oversize.</summary>
    public bool CorrectedForOversize { get; init; }
}
