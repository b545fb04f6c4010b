using Drypeak.Soil.Acceptance.Statistics;
using MathNet.Numerics.Distributions;

namespace Drypeak.Soil.Acceptance;

/// <summary>
/// A straight line through the results along the work, by least squares, with the interval of its slope: slope ± t(97.5 %; n − 2)·s(slope)
/// (N. R. Draper and H. Smith, Applied Regression Analysis, chapter 1; from memory).
/// </summary>
/// <param name="Count">Tests in it, 3 or more.</param>
/// <param name="Slope">Change of the quantity for each unit along.</param>
/// <param name="Intercept">The line at 0 along.</param>
/// <param name="StandardError">Of the slope.</param>
/// <param name="Lower">Lower end of the slope's 95 % interval.</param>
/// <param name="Upper">Upper end.</param>
public sealed record Trend(int Count, double Slope, double Intercept, double StandardError, double Lower, double Upper)
{
    /// <summary>Confidence of the interval.</summary>
    public const double Coverage = 0.95;

    /// <summary>Whether the interval leaves 0 out: the results change along the work by more than their scatter explains.</summary>
    public bool IsPlain => Lower > 0 || Upper < 0;

    /// <summary>The line; null with fewer than three points, or where all stand at one place.</summary>
    /// <param name="points">Place along and value.</param>
    public static Trend? Of(IReadOnlyList<(double Along, double Value)> points)
    {
        if (points.Count < 3)
        {
            return null;
        }

        var (middle, mean) = (points.Average(point => point.Along), points.Average(point => point.Value));
        var (squares, products, deviations) = (0.0, 0.0, 0.0);
        foreach (var (along, value) in points)
        {
            squares += (along - middle) * (along - middle);
            products += (along - middle) * (value - mean);
        }

        var farthest = points.Max(point => Math.Abs(point.Along));
        if (squares <= points.Count * Math.Pow(1e-9 * farthest, 2))
        {
            return null;
        }

        if (SampleSummary.Of([.. points.Select(point => point.Value)]) is { StandardDeviation: 0 })
        {
            return new Trend(points.Count, 0, mean, 0, 0, 0);
        }

        var slope = products / squares;
        foreach (var (along, value) in points)
        {
            var off = value - mean - (slope * (along - middle));
            deviations += off * off;
        }

        // MathNet's quantile throws far in the tail at one degree of freedom; 97.5 % is not far.
        var error = Math.Sqrt(deviations / (points.Count - 2) / squares);
        var reach = StudentT.InvCDF(0, 1, points.Count - 2, (1 + Coverage) / 2) * error;
        return new Trend(points.Count, slope, mean - (slope * middle), error, slope - reach, slope + reach);
    }
}
