using System.Globalization;
using System.Numerics;

namespace Drypeak.Soil.TestMethods;

/// <summary>
/// To which place a reported value is rounded: to a step (0.1, 0.01, 10) or to a count of significant figures. Halves go to the even
/// digit, the rounding method of ASTM E29. The arithmetic is exact over the whole range of finite numbers: a double is a fraction of
/// whole numbers, and so is a decimal step. Immutable, safe on any thread.
/// </summary>
public abstract record Rounding
{
    private Rounding()
    {
    }

    /// <summary>To the nearest multiple of <paramref name="step"/>, written with the step's own decimals.</summary>
    /// <param name="step">Above 0; <c>0.10m</c> has two decimals, <c>0.1m</c> one.</param>
    /// <exception cref="ArgumentOutOfRangeException">The step is zero or below.</exception>
    public static Rounding ToStep(decimal step)
    {
        ArgumentOutOfRangeException.ThrowIfNegativeOrZero(step);
        return new Step(step);
    }

    /// <summary>To so many significant figures: 13.9 to two is 14, 0.0966 is 0.097, 9.96 is 10.</summary>
    /// <param name="figures">1 to 17, all that a double has.</param>
    /// <exception cref="ArgumentOutOfRangeException">The count is outside 1 to 17.</exception>
    public static Rounding ToSignificantFigures(int figures)
    {
        ArgumentOutOfRangeException.ThrowIfLessThan(figures, 1);
        ArgumentOutOfRangeException.ThrowIfGreaterThan(figures, 17);
        return new SignificantFigures(figures);
    }

    /// <summary>The rounded number as text: decimal point, no grouping, no exponent, no sign on zero.</summary>
    /// <param name="value">Any finite number.</param>
    /// <exception cref="ArgumentOutOfRangeException">The value is NaN or infinite.</exception>
    public string Apply(double value)
    {
        if (!double.IsFinite(value))
        {
            throw new ArgumentOutOfRangeException(nameof(value), value, "Only a finite number can be reported.");
        }

        return ApplyToFinite(value);
    }

    /// <summary>The rule in words: <c>to 0.1 lb/ft³</c>, <c>to 2 significant figures</c>.</summary>
    /// <param name="unitSymbol">The symbol for readers: <c>%</c>, <c>Mg/m³</c>.</param>
    public string Describe(string unitSymbol) => this switch
    {
        Step step => string.Create(CultureInfo.InvariantCulture, $"to {step.Size} {unitSymbol}"),
        SignificantFigures figures => string.Create(CultureInfo.InvariantCulture, $"to {figures.Count} significant figures"),
        _ => throw new InvalidOperationException("There is no third kind of rounding."),
    };

    private protected abstract string ApplyToFinite(double value);

    private sealed record Step(decimal Size) : Rounding
    {
        private protected override string ApplyToFinite(double value)
        {
            var digits = new BigInteger(Size * PowerOfTen(Size.Scale));
            return Text(Multiple(value, digits, Size.Scale) * digits, Size.Scale);
        }

        private static decimal PowerOfTen(int exponent) => (decimal)BigInteger.Pow(10, exponent);
    }

    private sealed record SignificantFigures(int Count) : Rounding
    {
        private protected override string ApplyToFinite(double value)
        {
            var decimals = Count - 1 - LeadingPlace(value);
            var rounded = Multiple(value, BigInteger.One, decimals);
            if (BigInteger.Abs(rounded) == BigInteger.Pow(10, Count))
            {
                // 9.96 has become 10.0: one figure too many, and the last one is a zero.
                rounded /= 10;
                decimals--;
            }

            return Text(rounded, decimals);
        }

        /// <summary>The power of ten of the first digit. Seventeen digits tell every double from a power of ten below which it lies.</summary>
        private static int LeadingPlace(double value)
        {
            var text = value.ToString("E16", CultureInfo.InvariantCulture);
            var exponent = text.AsSpan(text.IndexOf('E', StringComparison.Ordinal) + 1);
            return int.Parse(exponent, NumberStyles.AllowLeadingSign, CultureInfo.InvariantCulture);
        }
    }

    /// <summary>How many steps of <paramref name="digits"/> · 10^−<paramref name="decimals"/> are nearest to the value, a half going to the even count.</summary>
    private static BigInteger Multiple(double value, BigInteger digits, int decimals)
    {
        var (numerator, denominator) = Fraction(Math.Abs(value));
        numerator *= BigInteger.Pow(10, Math.Max(decimals, 0));
        denominator *= digits * BigInteger.Pow(10, Math.Max(-decimals, 0));

        var count = BigInteger.DivRem(numerator, denominator, out var remainder);
        var beyondHalf = (2 * remainder) - denominator;
        var up = CountsAsHalf(BigInteger.Abs(beyondHalf), numerator, denominator) ? !count.IsEven : beyondHalf.Sign > 0;
        return (up ? count + 1 : count) * Math.Sign(value);
    }

    /// <summary>
    /// Whether the value is a half but for arithmetic: within 1e-9 of itself. Never more than a thousandth of a step, or a value of many
    /// steps would be drawn to a half that it does not stand on.
    /// </summary>
    /// <param name="distance">Twice the distance from the half, over <paramref name="denominator"/> in steps.</param>
    /// <param name="numerator">The value in steps, over <paramref name="denominator"/>.</param>
    /// <param name="denominator">Above 0.</param>
    private static bool CountsAsHalf(BigInteger distance, BigInteger numerator, BigInteger denominator) =>
        distance * 1_000_000_000 <= 2 * numerator && distance * 1_000 <= 2 * denominator;

    /// <summary>The exact fraction that a double of 0 or more is.</summary>
    private static (BigInteger Numerator, BigInteger Denominator) Fraction(double value)
    {
        const int mantissaBits = 52;
        const int exponentBias = 1075;
        var bits = BitConverter.DoubleToInt64Bits(value);
        var mantissa = bits & ((1L << mantissaBits) - 1);
        var exponent = (int)(bits >> mantissaBits);
        var isNormal = exponent != 0;
        var significand = new BigInteger(isNormal ? mantissa | (1L << mantissaBits) : mantissa);
        var power = (isNormal ? exponent : 1) - exponentBias;
        return power < 0 ? (significand, BigInteger.One << -power) : (significand << power, BigInteger.One);
    }

    /// <summary>The number <paramref name="digits"/> · 10^−<paramref name="decimals"/>, with all its decimals.</summary>
    private static string Text(BigInteger digits, int decimals)
    {
        if (decimals <= 0)
        {
            return (digits * BigInteger.Pow(10, -decimals)).ToString(CultureInfo.InvariantCulture);
        }

        var text = BigInteger.Abs(digits).ToString(CultureInfo.InvariantCulture).PadLeft(decimals + 1, '0');
        return $"{(digits.Sign < 0 ? "-" : "")}{text[..^decimals]}.{text[^decimals..]}";
    }
}
