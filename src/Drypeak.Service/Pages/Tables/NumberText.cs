using System.Globalization;
using System.Text.RegularExpressions;

namespace Drypeak.Service.Pages.Tables;

/// <summary>The mark before the decimals.</summary>
public enum DecimalMark
{
    Point,
    Comma,
}

/// <summary>
/// Numbers as people type them: digits with one decimal mark, a sign at most. A mark that groups thousands is refused, never dropped,
/// since the same text is another number elsewhere.
/// </summary>
internal static partial class NumberText
{
    private const int LongestShown = 40;

    /// <summary>Longer texts are no measured numbers.</summary>
    private const int LongestNumber = 30;

    /// <summary>Whether a text is meant as a number, well written or not.</summary>
    public static bool IsMeantAsNumber(string text) => MeantAsNumber().IsMatch(text);

    /// <summary>Whether a text is a number with decimals after that mark and no other reading.</summary>
    public static bool HasDecimals(string text, DecimalMark mark) =>
        (mark == DecimalMark.Point ? PointDecimals() : CommaDecimals()).IsMatch(text) && !MayGroupThousands(text);

    /// <summary>Whether a comma may as well group thousands: <c>6,021</c>. A point before three digits is read as a decimal mark, as in <c>1.702</c>.</summary>
    public static bool MayGroupThousands(string text) => CommaBeforeThree().IsMatch(text);

    /// <summary>Reads a number.</summary>
    /// <param name="text">Without surrounding spaces, not empty.</param>
    /// <param name="mark">The decimal mark; null where the texts do not tell, and then a comma that may group thousands is refused.</param>
    /// <param name="number">Finite; 0 where the text is refused.</param>
    /// <returns>Null, or a sentence on why it is refused and what to write.</returns>
    public static string? Read(string text, DecimalMark? mark, out double number)
    {
        number = 0;
        if (!IsMeantAsNumber(text) || text.Length > LongestNumber)
        {
            return $"“{Shortened(text)}” is not a number. Write digits with one decimal mark and nothing else.";
        }

        if (Grouped().IsMatch(text))
        {
            return $"“{text}” has a mark that groups thousands, which elsewhere is a decimal mark. Write it without.";
        }

        if (mark is null && MayGroupThousands(text))
        {
            var (whole, decimals) = (text.Replace(",", "", StringComparison.Ordinal), text.Replace(',', '.'));
            return $"“{text}” may mean {whole} or {decimals}. Choose the decimal mark, or write one of the two.";
        }

        if ((mark == DecimalMark.Point && text.Contains(',', StringComparison.Ordinal)) || (mark == DecimalMark.Comma && text.Contains('.', StringComparison.Ordinal)))
        {
            return mark == DecimalMark.Point
                ? $"“{text}” has a comma where the decimal mark is a point. Use one mark throughout."
                : $"“{text}” has a point where the decimal mark is a comma. Use one mark throughout.";
        }

        var plain = text.Replace(',', '.').Replace('−', '-');
        return double.TryParse(plain, NumberStyles.AllowLeadingSign | NumberStyles.AllowDecimalPoint, CultureInfo.InvariantCulture, out number)
            ? null
            : $"“{Shortened(text)}” is not a number. Write digits with one decimal mark and nothing else.";
    }

    public static string Shortened(string text) => text.Length <= LongestShown ? text : text[..LongestShown] + "…";

    [GeneratedRegex(@"^[-−+]?[0-9.,'’\u00A0\u2009\u202F ]*[0-9][0-9.,'’\u00A0\u2009\u202F ]*$")]
    private static partial Regex MeantAsNumber();

    [GeneratedRegex(@"^[-−+]?[0-9]*\.[0-9]+$")]
    private static partial Regex PointDecimals();

    [GeneratedRegex(@"^[-−+]?[0-9]*,[0-9]+$")]
    private static partial Regex CommaDecimals();

    [GeneratedRegex(@"^[-−+]?[1-9][0-9]{0,2},[0-9]{3}$")]
    private static partial Regex CommaBeforeThree();

    /// <summary>Two marks, or a space or an apostrophe between digits.</summary>
    [GeneratedRegex(@"[.,].*[.,]|[0-9]['’\u00A0\u2009\u202F ]+[0-9]")]
    private static partial Regex Grouped();
}
