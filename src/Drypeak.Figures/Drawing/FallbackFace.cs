using System.Runtime.InteropServices;
using HarfBuzzSharp;
using SkiaSharp;

namespace Drypeak.Figures.Drawing;

/// <summary>Glyphs of a text with their places, in em from its left end.</summary>
/// <param name="Glyphs">Of the face, from left to right.</param>
/// <param name="Places">Of each, em; y downward.</param>
/// <param name="Width">em.</param>
internal sealed record ShapedText(ushort[] Glyphs, SKPoint[] Places, double Width);

/// <summary>
/// A face for letters that the main font lacks, with the joining and stacking that their script needs. It is read when it is needed first.
/// Immutable, safe on any thread.
/// </summary>
internal sealed class FallbackFace : IDisposable
{
    private const int UnitsPerEm = 1000;

    private readonly GCHandle _file;
    private readonly Blob _blob;
    private readonly Face _face;
    private readonly Font _font;
    private readonly Lock _shaping = new();

    private FallbackFace(byte[] file)
    {
        using var data = SKData.CreateCopy(file);
        Typeface = SKTypeface.FromData(data) ?? throw new InvalidOperationException("A fallback font cannot be read.");
        _file = GCHandle.Alloc(file, GCHandleType.Pinned);
        _blob = new Blob(_file.AddrOfPinnedObject(), file.Length, MemoryMode.ReadOnly);
        _face = new Face(_blob, 0);
        _font = new Font(_face);
        _font.SetScale(UnitsPerEm, UnitsPerEm);
    }

    public SKTypeface Typeface { get; }

    /// <summary>In the order in which they are asked for a letter.</summary>
    public static IReadOnlyList<Lazy<FallbackFace>> All { get; } =
        [.. ((string[])["Arabic", "Hebrew", "Devanagari", "Thai", "Han"]).Select(script => new Lazy<FallbackFace>(() => new FallbackFace(EmbeddedFont.Read($"Fallback-{script}.ttf"))))];

    public bool Has(int codePoint) => _font.TryGetNominalGlyph((uint)codePoint, out _);

    /// <summary>The text in this face.</summary>
    public ShapedText Shape(string text, bool rightToLeft)
    {
        using var buffer = new HarfBuzzSharp.Buffer();
        buffer.AddUtf16(text);
        buffer.GuessSegmentProperties();
        buffer.Direction = rightToLeft ? Direction.RightToLeft : Direction.LeftToRight;
        lock (_shaping)
        {
            _font.Shape(buffer);
        }

        var (infos, positions) = (buffer.GlyphInfos, buffer.GlyphPositions);
        var (glyphs, places) = (new ushort[infos.Length], new SKPoint[infos.Length]);
        var x = 0;
        for (var i = 0; i < infos.Length; i++)
        {
            glyphs[i] = (ushort)infos[i].Codepoint;
            places[i] = new SKPoint((x + positions[i].XOffset) / (float)UnitsPerEm, -positions[i].YOffset / (float)UnitsPerEm);
            x += positions[i].XAdvance;
        }

        return new ShapedText(glyphs, places, x / (double)UnitsPerEm);
    }

    public void Dispose()
    {
        _font.Dispose();
        _face.Dispose();
        _blob.Dispose();
        _file.Free();
        Typeface.Dispose();
    }
}
