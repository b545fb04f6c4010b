using Drypeak.Soil.Quantities;
using Drypeak.Soil.TestMethods;

namespace Drypeak.Figures;

/// <summary>A laboratory sheet to be filled in by hand: for which method, and how many specimens at which water contents. Immutable, safe on any thread.</summary>
public sealed record LaboratorySheet
{
    /// <summary>Most specimens that a page has columns for.</summary>
    public const int MostSpecimens = 8;

    /// <summary>What names the test, printed at the top; null leaves the line blank.</summary>
    public string? Reference { get; init; }

    /// <summary>The method whose apparatus is printed; null leaves its lines blank.</summary>
    public TestMethod? Method { get; init; }

    /// <summary>A column each: the water content aimed at, %; null where it is left blank. 1 to <see cref="MostSpecimens"/>.</summary>
    public required IReadOnlyList<double?> WaterContents { get; init; }

    /// <summary>The unit in which mold and soil are weighed. Tins are weighed in g.</summary>
    public MassUnit MassUnit { get; init; }
}
