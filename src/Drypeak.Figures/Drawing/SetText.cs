using System.Text;

namespace Drypeak.Figures.Drawing;

/// <summary>A piece of a line that one face sets.</summary>
/// <param name="Text">In the order of reading.</param>
/// <param name="Face">The fallback that sets it, or null for the main face.</param>
/// <param name="Shaped">Its glyphs in the fallback; null for the main face.</param>
/// <param name="Width">em.</param>
internal sealed record TextPiece(string Text, FallbackFace? Face, ShapedText? Shaped, double Width);

/// <summary>
/// A line with letters that its face lacks: in pieces from left to right, each in a face that has its letters. A letter that no embedded
/// face has is written as its code, so that nothing is lost in silence.
/// </summary>
internal static class SetText
{
    /// <summary>The pieces from left to right.</summary>
    public static IReadOnlyList<TextPiece> Of(string text, FontFace face)
    {
        var pieces = new List<TextPiece>();
        foreach (var run in ReadingOrder.Of(text))
        {
            var ofRun = Split(run.Text, face).Select(part => part.Face is { } fallback
                ? Fallback(part.Text, fallback, run.RightToLeft)
                : new TextPiece(part.Text, null, null, face.MeasureOwn(part.Text)));
            pieces.AddRange(run.RightToLeft ? ofRun.Reverse() : ofRun);
        }

        return pieces;
    }

    /// <summary>Whether some embedded face has each letter.</summary>
    public static bool IsCovered(string text, FontFace face) => text.EnumerateRunes().All(rune => face.Has(rune) || FaceOf(rune) is { });

    private static TextPiece Fallback(string text, FallbackFace fallback, bool rightToLeft)
    {
        var shaped = fallback.Shape(text, rightToLeft);
        return new TextPiece(text, fallback, shaped, shaped.Width);
    }

    private static List<(string Text, FallbackFace? Face)> Split(string text, FontFace main)
    {
        var parts = new List<(StringBuilder Text, FallbackFace? Face)>();
        foreach (var rune in text.EnumerateRunes())
        {
            var last = parts.Count > 0 ? parts[^1].Face : null;
            var (letters, face) = last is { } current && (Joins(rune) || Rune.IsWhiteSpace(rune)) && current.Has(rune.Value) ? (rune.ToString(), current)
                : main.Has(rune) ? (rune.ToString(), null)
                : FaceOf(rune) is { } other ? (rune.ToString(), other)
                : Joins(rune) ? ("", last)
                : ($"U+{rune.Value:X4}", null);
            if (parts.Count == 0 || last != face)
            {
                parts.Add((new StringBuilder(), face));
            }

            parts[^1].Text.Append(letters);
        }

        return parts.ConvertAll(part => (part.Text.ToString(), part.Face));
    }

    /// <summary>Accents, vowel signs and joiners belong to the letter before them.</summary>
    private static bool Joins(Rune rune) => Rune.GetUnicodeCategory(rune) is
        System.Globalization.UnicodeCategory.NonSpacingMark or System.Globalization.UnicodeCategory.SpacingCombiningMark
        or System.Globalization.UnicodeCategory.EnclosingMark or System.Globalization.UnicodeCategory.Format;

    private static FallbackFace? FaceOf(Rune rune)
    {
        foreach (var face in FallbackFace.All)
        {
            if (face.Value.Has(rune.Value))
            {
                return face.Value;
            }
        }

        return null;
    }
}
