using System.Globalization;
using System.Text;

namespace Drypeak.Figures.Drawing;

/// <summary>
/// The runs of a line in the order in which they stand from left to right. The Unicode bidirectional algorithm (UAX #9, from memory) for a
/// line that begins at the left and has no marks of direction, which <see cref="PlainText.Clean"/> takes out: rules W2 to W7, N1, N2, I1 and L2.
/// </summary>
internal static class ReadingOrder
{
    private enum Kind
    {
        Left,
        Right,
        ArabicLetter,
        Number,
        ArabicNumber,
        Separator,
        Terminator,
        Mark,
        Neutral,
    }

    /// <summary>A run of one direction.</summary>
    /// <param name="Text">In the order of reading.</param>
    /// <param name="RightToLeft">Whether it is read from the right.</param>
    public readonly record struct Run(string Text, bool RightToLeft);

    /// <summary>The runs from left to right.</summary>
    public static IReadOnlyList<Run> Of(string text)
    {
        var runes = text.EnumerateRunes().ToArray();
        var levels = Levels([.. runes.Select(KindOf)]);
        var runs = new List<(string Text, int Level)>();
        for (var start = 0; start < runes.Length;)
        {
            var end = start;
            while (end < runes.Length && levels[end] == levels[start])
            {
                end++;
            }

            runs.Add((string.Concat(runes[start..end].Select(rune => rune.ToString())), levels[start]));
            start = end;
        }

        // L2: first what lies deeper, then all that stands in a text from the right.
        Reverse(runs, 2);
        Reverse(runs, 1);
        return [.. runs.Select(run => new Run(run.Text, run.Level % 2 == 1))];
    }

    private static void Reverse(List<(string Text, int Level)> runs, int level)
    {
        for (var start = 0; start < runs.Count; start++)
        {
            var end = start;
            while (end < runs.Count && runs[end].Level >= level)
            {
                end++;
            }

            if (end > start)
            {
                runs.Reverse(start, end - start);
                start = end;
            }
        }
    }

    private static int[] Levels(Kind[] kinds)
    {
        ResolveNumbers(kinds);
        ResolveNeutrals(kinds);
        return Array.ConvertAll(kinds, kind => kind switch { Kind.Left => 0, Kind.Right => 1, _ => 2 });
    }

    /// <summary>W1 to W7: marks go with their letter, separators within numbers and signs beside them with the number, and a number after Latin is Latin.</summary>
    private static void ResolveNumbers(Kind[] kinds)
    {
        var strong = Kind.Left;
        for (var i = 0; i < kinds.Length; i++)
        {
            if (kinds[i] == Kind.Mark)
            {
                kinds[i] = i > 0 ? kinds[i - 1] : Kind.Neutral;
            }

            if (kinds[i] is Kind.Left or Kind.Right or Kind.ArabicLetter)
            {
                strong = kinds[i];
            }
            else if (kinds[i] == Kind.Number && strong == Kind.ArabicLetter)
            {
                kinds[i] = Kind.ArabicNumber;
            }
        }

        for (var i = 1; i < kinds.Length - 1; i++)
        {
            if (kinds[i] == Kind.Separator && kinds[i - 1] == kinds[i + 1] && kinds[i - 1] is Kind.Number or Kind.ArabicNumber)
            {
                kinds[i] = kinds[i - 1];
            }
        }

        for (var i = 0; i < kinds.Length; i++)
        {
            var end = i;
            while (end < kinds.Length && kinds[end] == Kind.Terminator)
            {
                end++;
            }

            if (end > i && ((i > 0 && kinds[i - 1] == Kind.Number) || (end < kinds.Length && kinds[end] == Kind.Number)))
            {
                Array.Fill(kinds, Kind.Number, i, end - i);
            }

            i = Math.Max(i, end - 1);
        }

        strong = Kind.Left;
        for (var i = 0; i < kinds.Length; i++)
        {
            kinds[i] = kinds[i] switch
            {
                Kind.ArabicLetter => Kind.Right,
                Kind.Separator or Kind.Terminator => Kind.Neutral,
                Kind.Number when strong == Kind.Left => Kind.Left,
                var other => other,
            };
            if (kinds[i] is Kind.Left or Kind.Right)
            {
                strong = kinds[i];
            }
        }
    }

    /// <summary>N1, N2: what stands between two of one direction takes it, and else that of the line. A number counts as from the right.</summary>
    private static void ResolveNeutrals(Kind[] kinds)
    {
        for (var start = 0; start < kinds.Length; start++)
        {
            if (kinds[start] != Kind.Neutral)
            {
                continue;
            }

            var end = start;
            while (end < kinds.Length && kinds[end] == Kind.Neutral)
            {
                end++;
            }

            var fromRight = start > 0 && kinds[start - 1] != Kind.Left && end < kinds.Length && kinds[end] != Kind.Left;
            Array.Fill(kinds, fromRight ? Kind.Right : Kind.Left, start, end - start);
            start = end - 1;
        }
    }

    private static Kind KindOf(Rune rune) => rune.Value switch
    {
        >= '0' and <= '9' or (>= 0x06F0 and <= 0x06F9) or 0x00B2 or 0x00B3 or 0x00B9 or (>= 0x2070 and <= 0x2089) => Kind.Number,
        (>= 0x0660 and <= 0x0669) or 0x066B or 0x066C => Kind.ArabicNumber,
        '.' or ',' or ':' or '/' or '+' or '-' or 0x00A0 or 0x202F or 0x060C or 0x2212 => Kind.Separator,
        '%' or '#' or '$' or 0x00B0 or 0x2030 or 0x2032 or 0x2033 or 0x066A or 0x20AC or 0x00A3 => Kind.Terminator,
        _ when Rune.GetUnicodeCategory(rune) is UnicodeCategory.NonSpacingMark or UnicodeCategory.EnclosingMark or UnicodeCategory.Format => Kind.Mark,
        (>= 0x0590 and <= 0x05FF) or (>= 0x07C0 and <= 0x085F) or (>= 0xFB1D and <= 0xFB4F) => Kind.Right,
        (>= 0x0600 and <= 0x07BF) or (>= 0x0860 and <= 0x08FF) or (>= 0xFB50 and <= 0xFDFF) or (>= 0xFE70 and <= 0xFEFF) => Kind.ArabicLetter,
        _ when Rune.IsLetterOrDigit(rune) || Rune.GetUnicodeCategory(rune) is UnicodeCategory.SpacingCombiningMark => Kind.Left,
        _ => Kind.Neutral,
    };
}
