using System.Diagnostics;
using System.Globalization;
using Drypeak.Figures;
using Drypeak.Figures.Drawing;
using Drypeak.Soil.Quantities;
using SkiaSharp;

namespace Drypeak.Benchmarks;

/// <summary>What a figure of five specimens costs, in one run: SVG, PNG beside a bare drawing of the same picture, PDF, and memory over many.</summary>
internal static class FigureCosts
{
    private const int Rounds = 9;

    private static CompactionChart Chart { get; } = new()
    {
        Reference = "Ternmarsh, borrow area 7, sample 3",
        DensityUnit = DensityUnit.MegagramPerCubicMeter,
        Specimens = [new(9.8, 1.712, "1", false), new(11.7, 1.782, "2", false), new(13.2, 1.826, "3", false), new(15.4, 1.811, "4", false), new(17.3, 1.757, "5", false)],
        Curve = [.. Enumerable.Range(0, 66).Select(i => 9.8 + (7.5 * i / 65)).Select(w => new ChartPoint(w, Peaked(w)))],
        Band = [.. Enumerable.Range(0, 33).Select(i => 9.8 + (7.5 * i / 32)).Select(w => new ChartBandPoint(w, Peaked(w) - 0.02, Peaked(w) + 0.02))],
        Optimum = new(14.1, 1.826, "14.1 %", "1.83 Mg/m³", [13.6, 14.6], [1.813, 1.839]),
        SpecificGravity = 2.68,
        WaterDensity = 998.2,
        Saturation = [90, 80],
        AirVoids = [5],
    };

    /// <summary>Measures and prints; gives the PNG's milliseconds for the script to set beside another program's.</summary>
    public static void Run()
    {
        var options = new FigureOptions();
        var figure = CompactionFigure.Draw(Chart, options);
        var svg = Milliseconds(500, () => SvgWriter.Write(CompactionFigure.Draw(Chart, options)));
        var (png, bare) = Beside(60, () => PngWriter.Write(figure), () => Bare(figure));
        var whole = Milliseconds(60, () => PngWriter.Write(CompactionFigure.Draw(Chart, options)));
        var pdf = Milliseconds(60, () => PdfWriter.Write(CompactionFigure.Draw(Chart, options)));
        Say($"Processor milliseconds, medians of {Rounds}. SVG, laid out and written: {svg:0.000} ms, {SvgWriter.Write(figure).Length} bytes");
        Say($"PNG 960x640, written: {png:0.00} ms, {PngWriter.Write(figure).Length} bytes; a bare SkiaSharp drawing and encode of the same picture: {bare:0.00} ms, {Bare(figure).Length} bytes; ratio {png / bare:0.00}");
        Say($"PNG, laid out and written: {whole:0.00} ms");
        Say($"PDF, laid out and written: {pdf:0.00} ms, {PdfWriter.Write(figure).Length} bytes");
        Memory(options);
    }

    private static void Memory(FigureOptions options)
    {
        for (var i = 0; i < 5; i++)
        {
            for (var chart = 0; chart < 2000; chart++)
            {
                var figure = CompactionFigure.Draw(Chart with { Reference = $"Ternmarsh {i}-{chart}" }, options);
                _ = SvgWriter.Write(figure);
                _ = PngWriter.Write(figure);
                if (chart % 10 == 0)
                {
                    _ = PdfWriter.Write(figure);
                }
            }

            GC.Collect();
            GC.WaitForPendingFinalizers();
            GC.Collect();
            using var process = Process.GetCurrentProcess();
            Say($"after {2000 * (i + 1)} charts: {process.WorkingSet64 / 1048576} MiB resident, {GC.GetTotalMemory(false) / 1048576.0:0.0} MiB managed");
        }
    }

    /// <summary>The same shapes by nothing but the drawing library, encoded by itself with its quickest filter that keeps the file small.</summary>
    private static byte[] Bare(Figure figure)
    {
        using var surface = SKSurface.Create(new SKImageInfo(figure.Size.Width, figure.Size.Height, SKColorType.Rgba8888, SKAlphaType.Opaque));
        var canvas = surface.Canvas;
        using var paint = new SKPaint { IsAntialias = true, StrokeJoin = SKStrokeJoin.Round };
        canvas.Clear(Of(figure.Palette.Paper));
        foreach (var shape in figure.Parts.SelectMany(part => part.Shapes))
        {
            switch (shape)
            {
                case Lines lines:
                    using (var builder = new SKPathBuilder())
                    {
                        foreach (var run in lines.Runs)
                        {
                            builder.AddPoly([.. run.Select(Of)], close: false);
                        }

                        using var path = builder.Detach();
                        Stroke(lines.Stroke);
                        using var dash = lines.Stroke.Dash.Count > 0 ? SKPathEffect.CreateDash([.. lines.Stroke.Dash.Select(length => (float)length)], 0) : null;
                        paint.PathEffect = dash;
                        canvas.DrawPath(path, paint);
                        paint.PathEffect = null;
                    }

                    break;
                case Disc disc:
                    Fill(disc.Fill ?? ColorRole.Ink, 1);
                    canvas.DrawCircle(Of(disc.Center), (float)disc.Radius, paint);
                    break;
                case Polygon polygon:
                    using (var builder = new SKPathBuilder())
                    {
                        builder.AddPoly([.. polygon.Corners.Select(Of)], close: true);
                        using var path = builder.Detach();
                        Fill(polygon.Fill ?? ColorRole.Ink, polygon.Opacity);
                        canvas.DrawPath(path, paint);
                    }

                    break;
                case TextRun text:
                    var font = text.Face.Weight == 400 ? Regular : SemiBold;
                    font.Size = (float)text.Size;
                    canvas.Save();
                    canvas.Translate(Of(text.At));
                    canvas.RotateDegrees((float)text.Angle);
                    var align = text.Anchor switch { TextAnchor.Start => SKTextAlign.Left, TextAnchor.Middle => SKTextAlign.Center, _ => SKTextAlign.Right };
                    if (text.Halo)
                    {
                        Stroke(new Stroke(ColorRole.Paper, 0.3 * text.Size));
                        canvas.DrawText(text.Text, 0, 0, align, font, paint);
                    }

                    Fill(text.Color, 1);
                    canvas.DrawText(text.Text, 0, 0, align, font, paint);
                    canvas.Restore();
                    break;
            }
        }

        using var pixels = surface.PeekPixels() ?? throw new InvalidOperationException("The picture cannot be read.");
        using var data = pixels.Encode(new SKPngEncoderOptions(SKPngEncoderFilterFlags.Up, 3));
        return data?.ToArray() ?? throw new InvalidOperationException("The picture was not encoded.");

        void Fill(ColorRole role, double opacity)
        {
            paint.Style = SKPaintStyle.Fill;
            paint.Color = Of(figure.Palette[role]).WithAlpha((byte)(255 * opacity));
        }

        void Stroke(Stroke stroke)
        {
            paint.Style = SKPaintStyle.Stroke;
            paint.StrokeWidth = (float)stroke.Width;
            paint.Color = Of(figure.Palette[stroke.Color]);
        }
    }

    private static SKFont Regular { get; } = Font(EmbeddedFont.Regular);

    private static SKFont SemiBold { get; } = Font(EmbeddedFont.SemiBold);

    private static SKFont Font(FontFace face) => new(SKTypeface.FromData(SKData.CreateCopy(face.File.Span))) { Subpixel = true, Hinting = SKFontHinting.None, Edging = SKFontEdging.Antialias };

    private static SKColor Of(Color color) => new(color.Red, color.Green, color.Blue);

    private static SKPoint Of(Place place) => new((float)place.X, (float)place.Y);

    private static double Peaked(double w) => 1.826 - (0.0063 * (w - 14.1) * (w - 14.1));

    /// <summary>Both in turn, so that what else the machine does meets both alike.</summary>
    private static (double One, double Other) Beside(int times, Action one, Action other)
    {
        var (ofOne, ofOther) = (new List<double>(), new List<double>());
        for (var round = 0; round <= Rounds; round++)
        {
            ofOne.Add(Once(times, one));
            ofOther.Add(Once(times, other));
        }

        return (Median(ofOne.Skip(1)), Median(ofOther.Skip(1)));
    }

    /// <summary>Median over rounds, the first of which warms up.</summary>
    private static double Milliseconds(int times, Action action) =>
        Median(Enumerable.Range(0, Rounds + 3).Select(_ => Once(times, action)).ToList().Skip(3));

    /// <summary>By the processor's time, which other work on the machine does not lengthen much.</summary>
    private static double Once(int times, Action action)
    {
        var before = Environment.CpuUsage.TotalTime;
        for (var i = 0; i < times; i++)
        {
            action();
        }

        return (Environment.CpuUsage.TotalTime - before).TotalMilliseconds / times;
    }

    private static double Median(IEnumerable<double> values) => values.Order().ElementAt(Rounds / 2);

    private static void Say(FormattableString text) => Console.WriteLine(text.ToString(CultureInfo.InvariantCulture));
}
