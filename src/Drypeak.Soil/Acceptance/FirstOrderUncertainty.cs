namespace Drypeak.Soil.Acceptance;

/// <summary>
/// The law of propagation of uncertainty to first order, for independent inputs (JCGM 100:2008, 5.1.2): u² = Σ (∂f/∂xᵢ·uᵢ)². The slopes
/// are central differences, good to about 1e-10 of the value for the smooth formulas of this domain.
/// </summary>
public static class FirstOrderUncertainty
{
    /// <summary>Near the cube root of the arithmetic's precision, where a central difference is at its best.</summary>
    private const double Step = 6e-6;

    /// <summary>An input nearer to 0 than this is moved as if it were this large: a water content of 1 %, and far below any density.</summary>
    private const double SmallestScale = 0.01;

    /// <summary>Standard uncertainty of a function's value.</summary>
    /// <param name="function">Of the inputs, all about their values; null where it has no value.</param>
    /// <param name="inputs">Value and standard uncertainty of each input; null for what is not known.</param>
    /// <returns>Null where the function has no value, or depends on no input whose uncertainty is known.</returns>
    public static double? Of(Func<double?[], double?> function, IReadOnlyList<(double? Value, double? StandardUncertainty)> inputs)
    {
        double? variance = null;
        double?[] values = [.. inputs.Select(input => input.Value)];
        for (var i = 0; i < inputs.Count; i++)
        {
            if (inputs[i] is not ({ } value, { } uncertainty))
            {
                continue;
            }

            var step = Step * Math.Max(Math.Abs(value), SmallestScale);
            var (above, below) = (At(i, value + step), At(i, value - step));
            if (above is { } high && below is { } low && high != low)
            {
                var part = (high - low) / (2 * step) * uncertainty;
                variance = (variance ?? 0) + (part * part);
            }
        }

        return variance is { } sum ? Math.Sqrt(sum) : null;

        double? At(int i, double value)
        {
            var moved = (double?[])values.Clone();
            moved[i] = value;
            return function(moved);
        }
    }
}
