using Drypeak.Soil.Quantities;

namespace Drypeak.Soil.FieldDensity;

/// <summary>How a field test was made, with its readings: one record a method. Immutable, safe on any thread.</summary>
public abstract record FieldMethod
{
    private protected FieldMethod()
    {
    }

    /// <summary>The method's code in the interface: <c>sand-cone</c>.</summary>
    public abstract string Code { get; }

    /// <summary>Where the method's block stands in the request.</summary>
    public abstract string Place { get; }
}

/// <summary>A method that finds the volume of a hole or of a specimen; the soil out of it is weighed.</summary>
public abstract record VolumeMethod : FieldMethod
{
    private protected VolumeMethod()
    {
    }

    /// <summary>Measures the hole; a fault or a finding on the sheet says why it has no volume.</summary>
    internal abstract MeasuredHole Measure(FieldSheet sheet);
}

/// <summary>A hole or a cylinder as measured.</summary>
/// <param name="Volume">Its volume, or null where it has none.</param>
/// <param name="SandDensity">Of the sand that filled it, or null.</param>
internal readonly record struct MeasuredHole(Volume? Volume, Density? SandDensity);

/// <summary>A method that gives densities, with no soil weighed.</summary>
public abstract record DensityMethod : FieldMethod
{
    private protected DensityMethod()
    {
    }

    /// <summary>What the method says of the soil in place.</summary>
    internal abstract MeasuredInPlace Read(FieldSheet sheet);
}

/// <summary>What a density method reads; null where it says nothing.</summary>
/// <param name="WetDensity">Wet density.</param>
/// <param name="DryDensity">Dry density.</param>
/// <param name="WaterContent">Water content, with its offset where one is known.</param>
public sealed record MeasuredInPlace(Density? WetDensity, Density? DryDensity, WaterContent? WaterContent)
{
    /// <summary>The readings that were averaged, where there were several.</summary>
    public IReadOnlyList<ReadingSpread> Readings { get; init; } = [];

    /// <summary>The moisture offset, or null where no oven pairs were given.</summary>
    public MoistureOffset? Offset { get; init; }

    /// <summary>What the spread of readings does to the two, each independent of the others.</summary>
    public IReadOnlyList<ReadingEffect> Effects { get; init; } = [];
}

/// <summary>
/// What one standard uncertainty of a mean of readings does to the soil in place, to the first order (JCGM 100:2008, 5.1.2). One reading may move
/// both: they are then correlated, which two uncertainties side by side would not say.
/// </summary>
/// <param name="WetDensity">Change of the wet density, kg/m³.</param>
/// <param name="WaterContent">Change of the water content, as a fraction.</param>
public readonly record struct ReadingEffect(double WetDensity, double WaterContent);

/// <summary>Several readings of one quantity.</summary>
/// <param name="Quantity">The member's name: <c>wetDensity</c>, <c>waterContent</c>, <c>waterDensity</c>.</param>
/// <param name="IsDensity">Whether the numbers are in kg/m³; else fractions.</param>
/// <param name="Count">How many; 1 or more.</param>
/// <param name="Mean">Their mean.</param>
/// <param name="StandardDeviation">About the mean; null for one reading.</param>
public sealed record ReadingSpread(string Quantity, bool IsDensity, int Count, double Mean, double? StandardDeviation)
{
    /// <summary>Of the mean (JCGM 100:2008, 4.2.3); null for one reading.</summary>
    public double? StandardUncertainty => StandardDeviation / Math.Sqrt(Count);

    /// <summary>The spread of readings; at least one.</summary>
    public static ReadingSpread Of(string quantity, bool isDensity, IReadOnlyList<double> readings)
    {
        var mean = readings.Average();
        double? deviation = readings.Count > 1
            ? Math.Sqrt(readings.Sum(reading => (reading - mean) * (reading - mean)) / (readings.Count - 1))
            : null;
        return new ReadingSpread(quantity, isDensity, readings.Count, mean, deviation);
    }
}
