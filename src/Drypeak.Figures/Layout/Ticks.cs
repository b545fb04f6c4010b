using System.Globalization;

namespace Drypeak.Figures.Layout;

/// <summary>
/// The round values at which an axis is marked: multiples of 1, 2, 2.5 or 5 times a power of ten. They are counted in whole steps, so that
/// no value drifts by rounding, and written with as many decimals as the step has.
/// </summary>
internal sealed class Ticks : IAxisTicks
{
    private static readonly double[] Mantissas = [1, 2, 2.5, 5];

    private readonly double _mantissa;
    private readonly int _exponent;
    private readonly long _first;
    private readonly long _last;

    private Ticks(double mantissa, int exponent, Interval range)
    {
        _mantissa = mantissa;
        _exponent = exponent;
        Decimals = Math.Max(0, (mantissa == 2.5 ? 1 : 0) - exponent);

        // A value at the very end of the range counts, though division may miss it in the last digits.
        const double tolerance = 1e-9;
        _first = (long)Math.Ceiling((range.From / Step) - tolerance);
        _last = (long)Math.Floor((range.To / Step) + tolerance);
    }

    /// <summary>Distance between two values.</summary>
    public double Step => _exponent < 0 ? _mantissa / Math.Pow(10, -_exponent) : _mantissa * Math.Pow(10, _exponent);

    /// <summary>Decimals of the labels.</summary>
    public int Decimals { get; }

    public IEnumerable<double> Values
    {
        get
        {
            for (var count = _first; count <= _last; count++)
            {
                yield return count * Step;
            }
        }
    }

    /// <summary>The values halfway between, for unlabeled ticks.</summary>
    public IEnumerable<double> Halves
    {
        get
        {
            for (var count = _first; count < _last; count++)
            {
                yield return (count + 0.5) * Step;
            }
        }
    }

    /// <summary>The finest ticks of which no more than <paramref name="most"/> (at least 1) fit into the range.</summary>
    public static Ticks Within(Interval range, double most)
    {
        var exponent = (int)Math.Floor(Math.Log10(range.Span / most));
        while (true)
        {
            foreach (var mantissa in Mantissas)
            {
                var ticks = new Ticks(mantissa, exponent, range);
                if (range.Span / ticks.Step <= most)
                {
                    return ticks;
                }
            }

            exponent++;
        }
    }

    public bool HasGrid => true;

    public string Label(double value) => Format(value, Decimals);

    /// <summary>A number for readers: fixed decimals, a real minus, a zero without sign.</summary>
    public static string Format(double value, int decimals)
    {
        var text = value.ToString("F" + decimals.ToString(CultureInfo.InvariantCulture), CultureInfo.InvariantCulture);
        return text.AsSpan().TrimStart('-').ContainsAnyExcept('0', '.') ? text.Replace('-', '−') : text.TrimStart('-');
    }
}
