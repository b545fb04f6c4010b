using System.Globalization;

namespace Drypeak.Service.Tests.Laboratory;

/// <summary>Works out bare arithmetic (+ - * / ^ and parentheses), as a checker with a calculator does.</summary>
internal sealed class Arithmetic
{
    private readonly string _text;
    private int _next;

    private Arithmetic(string text) => _text = text.Replace(" ", "", StringComparison.Ordinal);

    /// <exception cref="FormatException">The text is no bare arithmetic.</exception>
    public static double Of(string text)
    {
        var reading = new Arithmetic(text);
        var value = reading.Sum();
        return reading._next == reading._text.Length ? value : throw new FormatException($"{reading._text[reading._next..]} cannot stand there in {text}.");
    }

    private double Sum()
    {
        var value = Product();
        while (true)
        {
            if (Take('+'))
            {
                value += Product();
            }
            else if (Take('-'))
            {
                value -= Product();
            }
            else
            {
                return value;
            }
        }
    }

    private double Product()
    {
        var value = Power();
        while (true)
        {
            if (Take('*'))
            {
                value *= Power();
            }
            else if (Take('/'))
            {
                value /= Power();
            }
            else
            {
                return value;
            }
        }
    }

    private double Power()
    {
        var value = Single();
        return Take('^') ? Math.Pow(value, Power()) : value;
    }

    private double Single()
    {
        if (Take('-'))
        {
            return -Single();
        }

        if (Take('('))
        {
            var value = Sum();
            return Take(')') ? value : throw new FormatException($"A parenthesis is not closed in {_text}.");
        }

        var start = _next;
        while (_next < _text.Length && (char.IsAsciiDigit(_text[_next]) || _text[_next] == '.'))
        {
            _next++;
        }

        return double.Parse(_text.AsSpan(start, _next - start), NumberStyles.AllowDecimalPoint, CultureInfo.InvariantCulture);
    }

    private bool Take(char sign)
    {
        if (_next < _text.Length && _text[_next] == sign)
        {
            _next++;
            return true;
        }

        return false;
    }
}
