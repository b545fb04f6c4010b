namespace Drypeak.Soil.Acceptance.Statistics;

/// <summary>A sample in five numbers, each in the unit of its values.</summary>
/// <param name="Count">How many, 1 or more.</param>
/// <param name="Mean">The arithmetic mean.</param>
/// <param name="StandardDeviation">About the mean, by n − 1; null for one value; exactly 0 where the values differ by arithmetic alone.</param>
/// <param name="Minimum">The least.</param>
/// <param name="Maximum">The greatest.</param>
public readonly record struct SampleSummary(int Count, double Mean, double? StandardDeviation, double Minimum, double Maximum)
{
    /// <summary>Values closer together than this, relative to their size, are the same value written in another unit.</summary>
    private const double Arithmetic = 1e-12;

    /// <summary>The summary of values; null where there are none. In two passes, so that nearly equal values keep their digits.</summary>
    public static SampleSummary? Of(IReadOnlyList<double> values)
    {
        if (values.Count == 0)
        {
            return null;
        }

        var (least, greatest, sum) = (values[0], values[0], 0.0);
        foreach (var value in values)
        {
            (least, greatest, sum) = (Math.Min(least, value), Math.Max(greatest, value), sum + value);
        }

        var mean = sum / values.Count;
        if (greatest - least <= Arithmetic * Math.Max(Math.Abs(least), Math.Abs(greatest)))
        {
            return new SampleSummary(values.Count, mean, values.Count > 1 ? 0 : null, least, greatest);
        }

        var squares = 0.0;
        foreach (var value in values)
        {
            squares += (value - mean) * (value - mean);
        }

        return new SampleSummary(values.Count, mean, Math.Sqrt(squares / (values.Count - 1)), least, greatest);
    }
}
