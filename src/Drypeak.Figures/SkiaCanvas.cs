using Drypeak.Figures.Drawing;
using Drypeak.Figures.Layout;
using SkiaSharp;

namespace Drypeak.Figures;

/// <summary>Draws a figure on a SkiaSharp canvas, for the raster and the PDF writer. For one picture, on one thread.</summary>
internal sealed class SkiaCanvas : ICanvas, IDisposable
{
    /// <summary>Between corners of a halo's outline, em.</summary>
    private const float CornerDistance = 0.15f;

    private readonly SKCanvas _canvas;
    private readonly Palette _palette;
    private readonly SKPaint _paint = new() { IsAntialias = true, StrokeCap = SKStrokeCap.Butt, StrokeJoin = SKStrokeJoin.Round };
    private readonly Dictionary<FontFace, SKFont> _fonts = [];
    private readonly bool _holdsFonts;

    /// <param name="canvas">Where to draw.</param>
    /// <param name="palette">The colors of the roles.</param>
    /// <param name="holdsFonts">Whether what is written holds the fonts that it uses: then a cut one is used where it has the letters.</param>
    public SkiaCanvas(SKCanvas canvas, Palette palette, bool holdsFonts = false)
    {
        _canvas = canvas;
        _palette = palette;
        _holdsFonts = holdsFonts;
        canvas.Clear(ColorOf(ColorRole.Paper));
    }

    public void Begin(string part)
    {
        // Parts are a matter of documents that can be restyled.
    }

    public void End()
    {
    }

    public void Draw(Lines lines)
    {
        using var builder = new SKPathBuilder();
        foreach (var run in lines.Stroke.Dash.Count > 0 ? lines.Runs.SelectMany(run => Dashed(run, lines.Stroke.Dash)) : lines.Runs)
        {
            builder.MoveTo(PointOf(run[0]));
            foreach (var place in run.Skip(1))
            {
                builder.LineTo(PointOf(place));
            }
        }

        using var path = builder.Detach();
        UseStroke(lines.Stroke);
        _canvas.DrawPath(path, _paint);
    }

    public void Draw(Disc disc)
    {
        if (disc.Fill is { } fill)
        {
            UseFill(fill);
            _canvas.DrawCircle(PointOf(disc.Center), (float)disc.Radius, _paint);
        }

        if (disc.Stroke is { } stroke)
        {
            UseStroke(stroke);
            _canvas.DrawCircle(PointOf(disc.Center), (float)disc.Radius, _paint);
        }
    }

    public void Draw(Polygon polygon)
    {
        using var builder = new SKPathBuilder();
        builder.AddPoly([.. polygon.Corners.Select(PointOf)], close: true);
        using var path = builder.Detach();
        if (polygon.Fill is { } fill)
        {
            UseFill(fill);
            _paint.Color = ColorOf(fill).WithAlpha((byte)Math.Round(255 * polygon.Opacity));
            _canvas.DrawPath(path, _paint);
        }

        if (polygon.Edge is { Dash.Count: > 0 } dashed)
        {
            Draw(new Lines([[.. polygon.Corners, polygon.Corners[0]]], dashed));
        }
        else if (polygon.Edge is { } edge)
        {
            UseStroke(edge);
            _canvas.DrawPath(path, _paint);
        }
    }

    public void Draw(TextRun text)
    {
        var offset = text.Anchor switch { TextAnchor.Start => 0, TextAnchor.Middle => -text.Width / 2, _ => -text.Width };

        _canvas.Save();
        _canvas.Translate(PointOf(text.At));
        _canvas.RotateDegrees((float)text.Angle);
        if (_holdsFonts && text.Link is { } link)
        {
            using var address = SKData.CreateCopy(System.Text.Encoding.ASCII.GetBytes(link + "\0"));
            _canvas.DrawUrlAnnotation(new SKRect((float)offset, (float)-text.Size, (float)(offset + text.Width), (float)(0.3 * text.Size)), address);
        }

        if (text.Face.Covers(text.Text))
        {
            DrawOwn(text, text.Text, (float)offset);
        }
        else
        {
            foreach (var piece in SetText.Of(text.Text, text.Face))
            {
                if (piece is { Face: { } face, Shaped: { } shaped })
                {
                    DrawShaped(text, face, shaped, (float)offset);
                }
                else
                {
                    DrawOwn(text, piece.Text, (float)offset);
                }

                offset += piece.Width * text.Size;
            }
        }

        _canvas.Restore();
    }

    private void DrawOwn(TextRun text, string letters, float offset)
    {
        var font = FontFor(text.Face, letters);
        font.Size = (float)text.Size;
        if (text.Halo)
        {
            using var outline = CoarseOutline(letters, font, offset);
            UseStroke(new Stroke(ColorRole.Paper, text.HaloWidth));
            _canvas.DrawPath(outline, _paint);
        }

        UseFill(text.Color);
        _canvas.DrawText(letters, offset, 0, SKTextAlign.Left, font, _paint);
    }

    private void DrawShaped(TextRun text, FallbackFace face, ShapedText shaped, float offset)
    {
        using var font = FontOf(face.Typeface);
        font.Size = (float)text.Size;
        using var builder = new SKTextBlobBuilder();
        builder.AddPositionedRun(shaped.Glyphs, font, Array.ConvertAll(shaped.Places, place => new SKPoint(place.X * font.Size, place.Y * font.Size)));
        using var blob = builder.Build();
        if (blob is null)
        {
            return;
        }

        if (text.Halo)
        {
            UseStroke(new Stroke(ColorRole.Paper, text.HaloWidth));
            _canvas.DrawText(blob, offset, 0, _paint);
        }

        UseFill(text.Color);
        _canvas.DrawText(blob, offset, 0, _paint);
    }

    public void Dispose()
    {
        foreach (var font in _fonts.Values)
        {
            font.Dispose();
        }

        _paint.Dispose();
    }

    private void UseFill(ColorRole role)
    {
        _paint.Style = SKPaintStyle.Fill;
        _paint.Color = ColorOf(role);
    }

    private void UseStroke(Stroke stroke)
    {
        _paint.Style = SKPaintStyle.Stroke;
        _paint.StrokeWidth = (float)stroke.Width;
        _paint.Color = ColorOf(stroke.Color);
    }

    private SKColor ColorOf(ColorRole role) => new(_palette[role].Red, _palette[role].Green, _palette[role].Blue);

    private static SKPoint PointOf(Place place) => new((float)place.X, (float)place.Y);

    /// <summary>The dashes of a run. The drawing library's own come as a filled rectangle each, at twice the numbers.</summary>
    private static IEnumerable<IReadOnlyList<Place>> Dashed(IReadOnlyList<Place> run, IReadOnlyList<double> pattern)
    {
        var course = new Course(run);
        for (var (start, i) = (0.0, 0); start < course.Length; start += pattern[i++ % pattern.Count])
        {
            if (i % 2 == 0)
            {
                yield return course.Part(start, Math.Min(start + pattern[i % pattern.Count], course.Length));
            }
        }
    }

    /// <summary>
    /// The letters' outline as polygons, for their halo. As outlines, because a PDF would hold a second font for stroked letters; with few
    /// corners at round numbers, because their curves would take most of its bytes, and the halo is wider than what is lost.
    /// </summary>
    private static SKPath CoarseOutline(string text, SKFont font, float offset)
    {
        using var letters = font.GetTextPath(text, new SKPoint(offset, 0));
        using var contours = new SKPathMeasure(letters, forceClosed: true);
        using var outline = new SKPathBuilder();
        do
        {
            var corners = new SKPoint[Math.Max(3, (int)Math.Ceiling(contours.Length / (font.Size * CornerDistance)))];
            for (var i = 0; i < corners.Length; i++)
            {
                var corner = contours.GetPosition(contours.Length * i / corners.Length);
                corners[i] = new SKPoint(Rounded(corner.X), Rounded(corner.Y));
            }

            outline.AddPoly(corners, close: true);
        }
        while (contours.NextContour());
        return outline.Detach();
    }

    private static float Rounded(float coordinate) => MathF.Round(coordinate * 4) / 4;

    private SKFont FontFor(FontFace whole, string letters)
    {
        var face = _holdsFonts && whole.Cut is { } cut && cut.Covers(letters) ? cut : whole;
        if (!_fonts.TryGetValue(face, out var font))
        {
            font = FontOf(face.Typeface);
            _fonts.Add(face, font);
        }

        return font;
    }

    private static SKFont FontOf(SKTypeface typeface) =>
        new(typeface) { Hinting = SKFontHinting.None, LinearMetrics = true, Subpixel = true, Edging = SKFontEdging.Antialias };
}
