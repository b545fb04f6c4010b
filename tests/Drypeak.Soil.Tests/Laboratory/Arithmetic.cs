using System.Globalization;

namespace Drypeak.Soil.Tests.Laboratory;

/// <summary>A pocket calculator of the tests' own: numbers, + - * / ^ and parentheses, read left to right with the usual precedence.</summary>
internal sealed class Arithmetic
{
    private readonly string _text;
    private int _at;

    private Arithmetic(string text) => _text = text.Replace(" ", "", StringComparison.Ordinal);

    /// <exception cref="FormatException">The text is not bare arithmetic.</exception>
    public static double Value(string text)
    {
        var reading = new Arithmetic(text);
        var value = reading.Sum();
        return reading._at == reading._text.Length ? value : throw reading.Unexpected();
    }

    private double Sum()
    {
        var value = Product();
        while (Next() is '+' or '-')
        {
            value = _text[_at++] == '+' ? value + Product() : value - Product();
        }

        return value;
    }

    private double Product()
    {
        var value = Power();
        while (Next() is '*' or '/')
        {
            value = _text[_at++] == '*' ? value * Power() : value / Power();
        }

        return value;
    }

    private double Power()
    {
        var value = Operand();
        if (Next() != '^')
        {
            return value;
        }

        _at++;
        return Math.Pow(value, Power());
    }

    private double Operand()
    {
        if (Next() == '(')
        {
            _at++;
            var value = Sum();
            return Next() == ')' ? Skip(value) : throw Unexpected();
        }

        var start = _at;
        _at += Next() == '-' ? 1 : 0;
        while (Next() is (>= '0' and <= '9') or '.')
        {
            _at++;
        }

        return double.TryParse(_text.AsSpan(start, _at - start), NumberStyles.Float, CultureInfo.InvariantCulture, out var number) ? number : throw Unexpected();
    }

    private double Skip(double value)
    {
        _at++;
        return value;
    }

    private char? Next() => _at < _text.Length ? _text[_at] : null;

    private FormatException Unexpected() => new($"Not bare arithmetic at {_at}: {_text}");
}
