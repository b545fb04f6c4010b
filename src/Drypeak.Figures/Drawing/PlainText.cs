using System.Globalization;
using System.Text;

namespace Drypeak.Figures.Drawing;

/// <summary>Texts from outside made fit for one line of any format.</summary>
internal static class PlainText
{
    private const char Replacement = '\uFFFD';
    private const string Ellipsis = "…";

    /// <summary>
    /// One line without anything that XML 1.0 forbids (section 2.2) or that would turn the direction of what follows: line breaks and tabs
    /// become a space, other control and direction characters go, lone surrogates and noncharacters become U+FFFD.
    /// </summary>
    public static string Clean(string text)
    {
        var clean = new StringBuilder(text.Length);
        foreach (var rune in text.EnumerateRunes())
        {
            // EnumerateRunes gives U+FFFD for a lone surrogate.
            if (rune.Value is '\t' or '\n' or '\r' or 0x2028 or 0x2029)
            {
                clean.Append(' ');
            }
            else if (Rune.IsControl(rune) || IsDirection(rune.Value))
            {
                continue;
            }
            else if ((rune.Value & 0xFFFE) == 0xFFFE)
            {
                clean.Append(Replacement);
            }
            else
            {
                clean.Append(rune);
            }
        }

        return clean.ToString().Trim();
    }

    /// <summary>The text, or as much of it with an ellipsis as fits into <paramref name="width"/> px; empty where not even that does. Letters are never cut from their accents.</summary>
    public static string Elide(string text, FontFace face, double size, double width)
    {
        if (face.Measure(text, size) <= width)
        {
            return text;
        }

        var starts = StringInfo.ParseCombiningCharacters(text);
        string Shortened(int kept) => string.Concat(text.AsSpan(0, starts[kept]).TrimEnd(), Ellipsis);
        var (fits, fails) = (0, starts.Length);
        while (fails - fits > 1)
        {
            var middle = (fits + fails) / 2;
            (fits, fails) = face.Measure(Shortened(middle), size) <= width ? (middle, fails) : (fits, middle);
        }

        return fits > 0 ? Shortened(fits) : "";
    }

    /// <summary>The text in lines no wider than <paramref name="width"/> px: broken at spaces, and within a word only where it is wider than a line. Nothing is left out but the spaces at the breaks.</summary>
    public static IReadOnlyList<string> Wrap(string text, FontFace face, double size, double width)
    {
        var lines = new List<string>();
        var line = "";
        foreach (var word in text.Split(' ', StringSplitOptions.RemoveEmptyEntries))
        {
            var longer = line.Length == 0 ? word : $"{line} {word}";
            if (face.Measure(longer, size) <= width)
            {
                line = longer;
                continue;
            }

            if (line.Length > 0)
            {
                lines.Add(line);
            }

            line = word;
            while (face.Measure(line, size) > width && Fitting(line, face, size, width) is var fitting && fitting < line.Length)
            {
                lines.Add(line[..fitting]);
                line = line[fitting..];
            }
        }

        if (line.Length > 0)
        {
            lines.Add(line);
        }

        return lines;
    }

    /// <summary>How much of a word fits into a line: at least one letter with its accents.</summary>
    private static int Fitting(string word, FontFace face, double size, double width)
    {
        var starts = StringInfo.ParseCombiningCharacters(word);
        var (low, high) = (1, starts.Length);
        while (low < high)
        {
            var middle = (low + high + 1) / 2;
            (low, high) = face.Measure(word[..(middle == starts.Length ? word.Length : starts[middle])], size) <= width ? (middle, high) : (low, middle - 1);
        }

        return low == starts.Length ? word.Length : starts[low];
    }

    private static bool IsDirection(int value) => value is 0x200E or 0x200F or (>= 0x202A and <= 0x202E) or (>= 0x2066 and <= 0x2069);
}
