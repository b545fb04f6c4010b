using System.Text;
using SkiaSharp;

namespace Drypeak.Figures.Drawing;

/// <summary>
/// One face of the embedded font, with its advances in a table: text is measured alike for every format, and without a call into the
/// drawing library. Advances are unhinted and without kerning, as the raster and PDF writers draw them. Immutable, safe on any thread.
/// </summary>
public sealed class FontFace
{
    /// <summary>Code points below this are in the table: Latin, Greek, Cyrillic, punctuation, super- and subscripts, arrows, operators.</summary>
    private const int TableLength = 0x2300;

    private readonly float[] _advances;

    internal FontFace(int weight, byte[] file)
    {
        Weight = weight;
        File = file;
        using var data = SKData.CreateCopy(file);
        Typeface = SKTypeface.FromData(data) ?? throw new InvalidOperationException("The embedded font cannot be read.");
        using var font = new SKFont(Typeface, 1000) { Hinting = SKFontHinting.None, LinearMetrics = true, Subpixel = true };
        Ascent = -font.Metrics.Ascent / 1000;
        Descent = font.Metrics.Descent / 1000;
        _advances = ReadAdvances(font);
    }

    /// <summary>The family's name.</summary>
    public static string Family => "Source Sans 3";

    /// <summary>Weight, as CSS counts it: 400 regular, 600 semibold.</summary>
    public int Weight { get; }

    /// <summary>The font file, TrueType.</summary>
    public ReadOnlyMemory<byte> File { get; }

    /// <summary>The same letters, but only those that figures usually need: for a format that holds its fonts whole. Null where the face itself is cut.</summary>
    internal FontFace? Cut { get; init; }

    /// <summary>Height of a line above its baseline, em.</summary>
    internal double Ascent { get; }

    /// <summary>Depth of a line below its baseline, em.</summary>
    internal double Descent { get; }

    internal SKTypeface Typeface { get; }

    /// <summary>Width of a line of text at a size in px; letters that the font lacks are set by others (<see cref="SetText"/>).</summary>
    internal double Measure(string text, double size) =>
        size * (Covers(text) ? MeasureOwn(text) : SetText.Of(text, this).Sum(piece => piece.Width));

    /// <summary>Width in em of a text of which the font has every letter.</summary>
    internal double MeasureOwn(string text)
    {
        var em = 0.0;
        foreach (var rune in text.EnumerateRunes())
        {
            em += _advances[rune.Value];
        }

        return em;
    }

    /// <summary>Whether the font has every letter of the text.</summary>
    internal bool Covers(string text)
    {
        foreach (var rune in text.EnumerateRunes())
        {
            if (!Has(rune))
            {
                return false;
            }
        }

        return true;
    }

    internal bool Has(Rune rune) => rune.Value < TableLength && !float.IsNaN(_advances[rune.Value]);

    private static float[] ReadAdvances(SKFont font)
    {
        var codePoints = Enumerable.Range(0, TableLength).ToArray();
        var glyphs = Array.ConvertAll(codePoints, font.GetGlyph);
        var widths = font.GetGlyphWidths(glyphs);
        return Array.ConvertAll(codePoints, codePoint => glyphs[codePoint] == 0 ? float.NaN : widths[codePoint] / 1000);
    }
}
