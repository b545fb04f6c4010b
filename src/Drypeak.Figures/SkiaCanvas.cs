using Drypeak.Figures.Drawing;
using SkiaSharp;

namespace Drypeak.Figures;

/// <summary>Draws a figure on a SkiaSharp canvas, for the raster and the PDF writer. For one picture, on one thread.</summary>
internal sealed class SkiaCanvas : ICanvas, IDisposable
{
    private readonly SKCanvas _canvas;
    private readonly Palette _palette;
    private readonly SKPaint _paint = new() { IsAntialias = true, StrokeCap = SKStrokeCap.Butt, StrokeJoin = SKStrokeJoin.Round };
    private readonly SKFont _regular = FontOf(EmbeddedFont.Regular);
    private readonly SKFont _semiBold = FontOf(EmbeddedFont.SemiBold);

    public SkiaCanvas(SKCanvas canvas, Palette palette)
    {
        _canvas = canvas;
        _palette = palette;
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
        foreach (var run in lines.Runs)
        {
            builder.MoveTo(PointOf(run[0]));
            foreach (var place in run.Skip(1))
            {
                builder.LineTo(PointOf(place));
            }
        }

        using var path = builder.Detach();
        using var dash = lines.Stroke.Dash.Count > 0
            ? SKPathEffect.CreateDash([.. lines.Stroke.Dash.Select(length => (float)length)], 0)
            : null;
        UseStroke(lines.Stroke);
        _paint.PathEffect = dash;
        _canvas.DrawPath(path, _paint);
        _paint.PathEffect = null;
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

    public void Draw(TextRun text)
    {
        var font = text.Face == EmbeddedFont.SemiBold ? _semiBold : _regular;
        font.Size = (float)text.Size;
        var offset = text.Anchor switch { TextAnchor.Start => 0, TextAnchor.Middle => -text.Width / 2, _ => -text.Width };

        _canvas.Save();
        _canvas.Translate(PointOf(text.At));
        _canvas.RotateDegrees((float)text.Angle);
        if (text.Halo)
        {
            // As outlines: a PDF would hold a second font for stroked letters.
            using var outlines = font.GetTextPath(text.Text, new SKPoint((float)offset, 0));
            UseStroke(new Stroke(ColorRole.Paper, text.HaloWidth));
            _canvas.DrawPath(outlines, _paint);
        }

        UseFill(text.Color);
        _canvas.DrawText(text.Text, (float)offset, 0, SKTextAlign.Left, font, _paint);
        _canvas.Restore();
    }

    public void Dispose()
    {
        _semiBold.Dispose();
        _regular.Dispose();
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

    private static SKFont FontOf(FontFace face) =>
        new(face.Typeface) { Hinting = SKFontHinting.None, LinearMetrics = true, Subpixel = true, Edging = SKFontEdging.Antialias };
}
