using MathNet.Numerics;

namespace Drypeak.Soil.Acceptance.Statistics;

/// <summary>
/// The ratio y = s/σ of a sample's standard deviation to that of the normal distribution it came from: √ν·y is a chi variable with ν degrees
/// of freedom. Whatever a sample's mean and standard deviation decide together is an integral over it.
/// </summary>
internal static class DeviationRatio
{
    /// <summary>Beyond this many standard deviations of y on either side less than 1e-16 is left.</summary>
    private const double Tails = 9;

    private const int Panels = 10;

    /// <summary>Mean of a function over y, for a function between 0 and 1.</summary>
    /// <param name="degreesOfFreedom">ν, 1 or more.</param>
    /// <param name="function">Of y.</param>
    /// <param name="steps">Where the function rises or falls steeply, and over which width; may be empty.</param>
    /// <returns>Good to about 1e-12.</returns>
    public static double Mean(int degreesOfFreedom, Func<double, double> function, params ReadOnlySpan<(double At, double Width)> steps)
    {
        var spread = Tails / Math.Sqrt(2.0 * degreesOfFreedom);
        var (low, high) = (Math.Max(0, 1 - (1.5 * spread)), 1 + (1.5 * spread));
        var breaks = new SortedSet<double>(Enumerable.Range(0, Panels + 1).Select(i => low + ((high - low) * i / Panels)));
        foreach (var (at, width) in steps)
        {
            foreach (var away in (ReadOnlySpan<double>)[-9, -6, -3, -1.5, 0, 1.5, 3, 6, 9])
            {
                if (at + (away * width) is var place && place > low && place < high)
                {
                    breaks.Add(place);
                }
            }
        }

        // Divided by the sum of its own weights, so that what rounding does to the density's factor cancels.
        var (sum, weights) = (0.0, 0.0);
        var logarithmOfFactor = Math.Log(2) + (degreesOfFreedom / 2.0 * Math.Log(degreesOfFreedom / 2.0)) - SpecialFunctions.GammaLn(degreesOfFreedom / 2.0);
        foreach (var (y, width) in Quadrature.Panels([.. breaks]))
        {
            var weight = width * Math.Exp(logarithmOfFactor + ((degreesOfFreedom - 1) * Math.Log(y)) - (degreesOfFreedom * y * y / 2));
            weights += weight;
            sum += weight * function(y);
        }

        return Math.Clamp(sum / weights, 0, 1);
    }
}
