using Drypeak.Soil.Quantities;

namespace Drypeak.Soil.TestMethods;

/// <summary>
/// One published way to compact a soil, with one mold: apparatus, soil, specimens and how the result is reported. Every value names
/// its source; a value that is null is one that the method leaves open, or that was not at hand. Immutable, safe on any thread.
/// </summary>
public sealed record TestMethod
{
    /// <summary>The code of the interface: <c>astm-d698-a</c>.</summary>
    public required string Code { get; init; }

    /// <summary>The standard: <c>ASTM D698</c>.</summary>
    public required string Standard { get; init; }

    /// <summary>The clause, method or mold within the standard: <c>method A</c>.</summary>
    public required string Clause { get; init; }

    /// <summary>What the method is called in a sentence: <c>ASTM D698, method A</c>.</summary>
    public string Title => $"{Standard}, {Clause}";

    /// <summary>What sets this row apart, for a reader who does not know the letters.</summary>
    public required string Summary { get; init; }

    /// <summary>Volume of the mold without collar; from <see cref="MoldDiameter"/> and <see cref="MoldHeight"/> where the method gives only those.</summary>
    public required Sourced<Volume> MoldVolume { get; init; }

    /// <summary>Inner diameter of the mold.</summary>
    public Sourced<Length>? MoldDiameter { get; init; }

    /// <summary>Height of the mold without collar.</summary>
    public Sourced<Length>? MoldHeight { get; init; }

    /// <summary>Falling mass; null for a vibrating hammer.</summary>
    public Sourced<Mass>? RammerMass { get; init; }

    /// <summary>Free fall of the rammer; null for a vibrating hammer.</summary>
    public Sourced<Length>? Drop { get; init; }

    /// <summary>Layers in the mold.</summary>
    public required Sourced<int> Layers { get; init; }

    /// <summary>Blows on each layer; null for a vibrating hammer.</summary>
    public Sourced<int>? BlowsPerLayer { get; init; }

    /// <summary>Seconds of vibration on each layer; null for a rammer.</summary>
    public Sourced<double>? VibrationSecondsPerLayer { get; init; }

    /// <summary>The rounded figure that the standard prints. It is for comparison only: <see cref="Effort"/> is what the apparatus does.</summary>
    public Sourced<CompactiveEffort>? NominalEffort { get; init; }

    /// <summary>The sieve that all soil in the mold has passed, mm.</summary>
    public Sourced<double>? LargestParticleMillimeters { get; init; }

    /// <summary>The sieve on which <see cref="OversizeLimitPercent"/> is counted, mm.</summary>
    public Sourced<double>? OversizeSieveMillimeters { get; init; }

    /// <summary>The most oversize with which the method may be used, in % of the total dry mass.</summary>
    public Sourced<double>? OversizeLimitPercent { get; init; }

    /// <summary>The fewest specimens of a complete test.</summary>
    public Sourced<int>? MinimumSpecimens { get; init; }

    /// <summary>Advised difference of water content between neighboring specimens, in percentage points.</summary>
    public Sourced<double>? RecommendedSpacingPercent { get; init; }

    /// <summary>Greatest difference of water content between neighboring specimens, in percentage points.</summary>
    public Sourced<double>? GreatestSpacingPercent { get; init; }

    /// <summary>How the method rounds a reported result; null where it says nothing, and <see cref="TestMethods.Reporting"/> has its defaults.</summary>
    public ReportingRule? Reporting { get; init; }

    /// <summary>The method as the basis of a finding, with the document that a value of it comes from, and the reservation where there is one.</summary>
    /// <param name="source">Source of the value.</param>
    public string Cite(ValueSource source) => (source.Origin == Standard ? Title : $"{Title}; {source.Origin}") + (source.Read ? "" : " (from memory)");

    /// <summary>What the rammer does to the soil, from mass, drop, layers, blows and volume as nominal; null for a vibrating hammer.</summary>
    public CompactiveEffort? Effort => RammerMass is { } rammer && Drop is { } drop && BlowsPerLayer is { } blows
        ? CompactiveEffort.Of(rammer.Value, drop.Value, Layers.Value, blows.Value, MoldVolume.Value)
        : null;
}
