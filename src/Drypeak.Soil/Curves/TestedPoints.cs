namespace Drypeak.Soil.Curves;

/// <summary>
/// The points of a test in the order the kernels want them: by water content, then by density, so that no answer
/// depends on the order in which they came. Densities in Mg/m³, the scale of the models' constants.
/// </summary>
internal sealed class TestedPoints
{
    /// <summary>Water contents nearer than this (0.0001 %) cannot be told apart by any oven.</summary>
    private const double SameWaterContent = 1e-6;

    /// <summary>Arithmetic's own doubt about which side of a line a point lies on, relative.</summary>
    private const double Rounding = 1e-9;

    private const double KilogramsInMegagram = 1000;

    private readonly int[] places;

    public TestedPoints(CompactionData data)
        : this(Sorted(data.Points), data.SpecificGravity, data.WaterDensity / KilogramsInMegagram)
    {
    }

    private TestedPoints((double W, double Y, int Place)[] sorted, double? specificGravity, double waterDensity)
    {
        WaterContents = new double[sorted.Length];
        Densities = new double[sorted.Length];
        places = new int[sorted.Length];
        for (var i = 0; i < sorted.Length; i++)
        {
            (WaterContents[i], Densities[i], places[i]) = sorted[i];
        }

        Distinct = NumberDistinct(WaterContents);
        WaterDensity = waterDensity;
        SpecificGravity = specificGravity;
        HighestDensity = Densities.Max();
        for (var i = 0; i < Count && !AnyAboveZeroAirVoids; i++)
        {
            AnyAboveZeroAirVoids = IsAboveZeroAirVoids(WaterContents[i], Densities[i]);
        }
    }

    /// <summary>Fractions, rising.</summary>
    public double[] WaterContents { get; }

    /// <summary>Dry densities in Mg/m³, in the order of <see cref="WaterContents"/>.</summary>
    public double[] Densities { get; }

    /// <summary>Mg/m³.</summary>
    public double WaterDensity { get; }

    public double? SpecificGravity { get; }

    /// <summary>y0, Mg/m³.</summary>
    public double HighestDensity { get; }

    /// <summary>c = y0/ρw.</summary>
    public double RelativeDensity => HighestDensity / WaterDensity;

    /// <summary>b = y0²/ρw, the slope of a line of saturation at the highest density, Mg/m³.</summary>
    public double SaturationSlope => HighestDensity * RelativeDensity;

    public bool AnyAboveZeroAirVoids { get; }

    public int Count => WaterContents.Length;

    public double Driest => WaterContents[0];

    public double Wettest => WaterContents[^1];

    public double Range => Wettest - Driest;

    /// <summary>Whether the water contents differ at all, so that a curve means something.</summary>
    public bool HasRange => DistinctCount > 1;

    public bool Covers(double waterContent) => waterContent >= Driest && waterContent <= Wettest;

    /// <summary>Dry density on the zero-air-voids line, Mg/m³; infinite where the specific gravity is not known.</summary>
    public double ZeroAirVoids(double waterContent) =>
        SpecificGravity is { } gs ? WaterDensity / ((1 / gs) + waterContent) : double.PositiveInfinity;

    public bool IsAboveZeroAirVoids(double waterContent, double density) =>
        density > ZeroAirVoids(waterContent) * (1 + Rounding);

    /// <summary>The points but one.</summary>
    public TestedPoints Without(int left)
    {
        var kept = new (double W, double Y, int Place)[Count - 1];
        for (var i = 0; i < kept.Length; i++)
        {
            var from = i < left ? i : i + 1;
            kept[i] = (WaterContents[from], Densities[from], i);
        }

        return new(kept, SpecificGravity, WaterDensity);
    }

    /// <summary>Mg/m³ to kg/m³.</summary>
    public static double ToKilograms(double density) => density * KilogramsInMegagram;

    /// <summary>Values that stand in the order of water content, in the order in which the points came.</summary>
    public T[] InOrderGiven<T>(ReadOnlySpan<T> values)
    {
        var given = new T[values.Length];
        for (var i = 0; i < values.Length; i++)
        {
            given[places[i]] = values[i];
        }

        return given;
    }

    /// <summary>For each point, the number of its water content, counted from 0 over those that can be told apart.</summary>
    public int[] Distinct { get; }

    /// <summary>How many water contents can be told apart.</summary>
    public int DistinctCount => Distinct[^1] + 1;

    private static (double W, double Y, int Place)[] Sorted(IReadOnlyList<CompactionPoint> points)
    {
        var sorted = new (double W, double Y, int Place)[points.Count];
        for (var i = 0; i < sorted.Length; i++)
        {
            sorted[i] = (points[i].WaterContent, points[i].DryDensity / KilogramsInMegagram, i);
        }

        Array.Sort(sorted);
        return sorted;
    }

    private static int[] NumberDistinct(ReadOnlySpan<double> waterContents)
    {
        var numbers = new int[waterContents.Length];
        for (var i = 1; i < numbers.Length; i++)
        {
            var isNew = waterContents[i] - waterContents[i - 1] > SameWaterContent;
            numbers[i] = numbers[i - 1] + (isNew ? 1 : 0);
        }

        return numbers;
    }
}
