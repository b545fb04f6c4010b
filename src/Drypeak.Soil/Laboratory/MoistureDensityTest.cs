using Drypeak.Soil.Curves;
using Drypeak.Soil.Quantities;
using Drypeak.Soil.TestMethods;

namespace Drypeak.Soil.Laboratory;

/// <summary>The specific gravity of the solids.</summary>
/// <param name="Value">Gs; over 0.</param>
/// <param name="Measured">Whether it was measured on this soil, or only assumed.</param>
public sealed record SpecificGravity(double Value, bool Measured);

/// <summary>The compaction of a method of the caller's own.</summary>
/// <param name="Rammer">Mass of the rammer.</param>
/// <param name="Drop">Height of fall.</param>
/// <param name="Layers">Number of layers.</param>
/// <param name="BlowsPerLayer">Blows on each layer.</param>
public sealed record CustomEffort(Mass Rammer, Length Drop, int Layers, int BlowsPerLayer);

/// <summary>The particles too large for the mold, removed before the test.</summary>
/// <param name="Fraction">Their share of the total dry mass, 0 to below 1.</param>
/// <param name="SpecificGravity">Their bulk specific gravity, or null where unknown.</param>
/// <param name="WaterContent">Their water content.</param>
/// <param name="SieveMillimeters">The sieve that parted them, mm, or null.</param>
public sealed record Oversize(double Fraction, double? SpecificGravity, WaterContent WaterContent, double? SieveMillimeters);

/// <summary>What stays on a sieve of the material that was compacted.</summary>
/// <param name="SieveMillimeters">Opening, mm.</param>
/// <param name="Fraction">Share of the dry mass, 0 to 1.</param>
public sealed record ParticlesAbove(double SieveMillimeters, double Fraction);

/// <summary>An engineer's own peak.</summary>
/// <param name="WaterContent">Optimum water content.</param>
/// <param name="MaximumDryDensity">Maximum dry density.</param>
/// <param name="Reason">Why; not blank.</param>
public sealed record AdoptedPeak(WaterContent WaterContent, Density MaximumDryDensity, string Reason);

/// <summary>A laboratory compaction test, as it came from the balance. Immutable, safe on any thread.</summary>
public sealed record MoistureDensityTest
{
    /// <summary>The test method, or null where none is named or it is the caller's own.</summary>
    public TestMethod? Method { get; init; }

    /// <summary>Whether the method is the caller's own.</summary>
    public bool IsCustomMethod { get; init; }

    /// <summary>The compaction of a method of the caller's own, or null.</summary>
    public CustomEffort? CustomEffort { get; init; }

    /// <summary>The test's mold, where the specimens bring none.</summary>
    public Mold? Mold { get; init; }

    /// <summary>Specific gravity of the solids, or null: then no phases, no lines.</summary>
    public SpecificGravity? SpecificGravity { get; init; }

    /// <summary>Density of the water in the soil.</summary>
    public required Density WaterDensity { get; init; }

    /// <summary>Temperature that <see cref="WaterDensity"/> was taken at, °C; null where the density was given.</summary>
    public double? WaterTemperature { get; init; }

    /// <summary>The specimens, in any order; at least one.</summary>
    public required IReadOnlyList<SpecimenMeasurement> Specimens { get; init; }

    /// <summary>Oversize particles to correct for, or null.</summary>
    public Oversize? Oversize { get; init; }

    /// <summary>Large particles in the compacted material, or null.</summary>
    public ParticlesAbove? ParticlesAbove { get; init; }

    /// <summary>The model asked for; null is <c>auto</c>.</summary>
    public CurveModel? Model { get; init; }

    /// <summary>An engineer's own peak, or null.</summary>
    public AdoptedPeak? Adopted { get; init; }

    /// <summary>Standard uncertainties of the measurements, or null.</summary>
    public MeasurementUncertainty? Uncertainty { get; init; }

    /// <summary>The units that texts speak.</summary>
    public UnitSet Units { get; init; } = new();
}

/// <summary>Standard uncertainties of the measurements; null or 0 where one is taken as exact.</summary>
public sealed record MeasurementUncertainty
{
    /// <summary>Of each weighing of mold and soil, independent.</summary>
    public Mass? Mass { get; init; }

    /// <summary>Of each weighing of a tin, independent.</summary>
    public Mass? TinMass { get; init; }

    /// <summary>Of the mold's volume, one error shared by all specimens of the mold.</summary>
    public Volume? Volume { get; init; }

    /// <summary>Of each specimen's water content, independent, over what the tins' masses bring.</summary>
    public WaterContent? WaterContent { get; init; }

    /// <summary>Of each specimen's dry density, independent, over what the weighings bring.</summary>
    public Density? DryDensity { get; init; }

    /// <summary>Of the specific gravity.</summary>
    public double? SpecificGravity { get; init; }
}
