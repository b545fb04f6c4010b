using Drypeak.Soil.Acceptance.LotRules;

namespace Drypeak.Soil.Acceptance.ControlCharts;

/// <summary>The chart of the differences between neighbors that goes with one of individuals.</summary>
/// <param name="Center">Mean of the moving ranges.</param>
/// <param name="Upper">D₄ times it.</param>
/// <param name="Ranges">One less than there are results.</param>
public sealed record MovingRangeChart(double Center, double Upper, IReadOnlyList<double> Ranges)
{
    /// <summary>Mean of the range of two values from a normal distribution, in its standard deviations: 2/√π = 1.128.</summary>
    public static readonly double D2 = 2 / Math.Sqrt(Math.PI);

    /// <summary>Standard deviation of that range: √(2 − 4/π) = 0.853.</summary>
    public static readonly double D3 = Math.Sqrt(2 - (4 / Math.PI));

    /// <summary>1 + 3·d₃/d₂ = 3.267.</summary>
    public static readonly double D4 = 1 + (3 * D3 / D2);

    /// <summary>The chart; null with fewer than two results.</summary>
    internal static MovingRangeChart? Of(KnownValues known)
    {
        if (known.Count < 2)
        {
            return null;
        }

        double[] ranges = [.. known.Values.Skip(1).Zip(known.Values, (here, before) => Math.Abs(here - before))];
        var mean = ranges.Average();
        return new MovingRangeChart(mean, D4 * mean, ranges);
    }
}
