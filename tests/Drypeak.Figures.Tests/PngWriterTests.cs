using System.Buffers.Binary;
using Drypeak.Figures.Drawing;
using SkiaSharp;
using Xunit;

namespace Drypeak.Figures.Tests;

public sealed class PngWriterTests
{
    [Theory]
    [InlineData(960, 640, 1)]
    [InlineData(240, 240, 2)]
    [InlineData(321, 777, 1.5)]
    [InlineData(480, 320, 0.5)]
    public void A_picture_has_the_size_asked_for_and_the_resolution_of_its_scale(int width, int height, double scale)
    {
        var png = PngWriter.Write(CompactionFigure.Draw(Charts.Full, new FigureSize(width, height)), scale);
        using var picture = SKBitmap.Decode(png);
        Assert.Equal((Math.Round(width * scale), Math.Round(height * scale)), (picture.Width, picture.Height));

        var resolution = png.AsSpan(png.AsSpan().IndexOf("pHYs"u8) + 4);
        Assert.Equal(96 * scale / 0.0254, BinaryPrimitives.ReadInt32BigEndian(resolution), 0.5);
        Assert.Equal(1, resolution[8]);
    }

    [Theory]
    [InlineData(960, 640, 1)]
    [InlineData(480, 320, 2)]
    [InlineData(1600, 900, 1)]
    public void Marks_stand_where_the_SVG_has_them(int width, int height, double scale)
    {
        // Alone, so that no line or label of the same color comes near a mark.
        var chart = Charts.Ternmarsh with { Specimens = [.. Charts.Ternmarsh.Specimens.Select(specimen => specimen with { Label = null })], Curve = [], Optimum = null, SpecificGravity = null };
        var figure = CompactionFigure.Draw(chart, new FigureSize(width, height));
        using var picture = SKBitmap.Decode(PngWriter.Write(figure, scale));
        var marks = SvgPicture.Read(SvgWriter.Write(figure)).OfClass("specimen").ToList();
        Assert.Equal(5, marks.Count);
        foreach (var mark in marks)
        {
            var (x, y) = (SvgPicture.Number(mark, "cx"), SvgPicture.Number(mark, "cy"));
            var (seenX, seenY) = CenterOfInk(picture, x * scale, y * scale, (SvgPicture.Number(mark, "r") + 2) * scale);
            Assert.Equal(x, seenX / scale, 0.5);
            Assert.Equal(y, seenY / scale, 0.5);
        }
    }

    [Fact]
    public void Every_role_keeps_its_exact_color()
    {
        using var picture = SKBitmap.Decode(PngWriter.Write(CompactionFigure.Draw(Charts.Full, new FigureSize(960, 640)), 2));
        var seen = picture.Pixels.Distinct().ToHashSet();
        foreach (var role in new[] { ColorRole.Paper, ColorRole.Ink, ColorRole.Quiet, ColorRole.Water, ColorRole.Clay })
        {
            var color = Palette.Light[role];
            Assert.Contains(new SKColor(color.Red, color.Green, color.Blue), seen);
        }
    }

    [Fact]
    public void The_same_figure_is_the_same_bytes_and_less_than_60_kB()
    {
        var png = PngWriter.Write(CompactionFigure.Draw(Charts.Full, FigureSize.Default));
        Assert.Equal(png, PngWriter.Write(CompactionFigure.Draw(Charts.Full, FigureSize.Default)));
        Assert.InRange(png.Length, 1, 60_000);
    }

    [Theory]
    [InlineData(0.49)]
    [InlineData(4.01)]
    [InlineData(double.NaN)]
    public void A_scale_out_of_bounds_is_refused(double scale)
    {
        var figure = CompactionFigure.Draw(Charts.Ternmarsh, FigureSize.Default);
        Assert.Equal("scale", Assert.Throws<ArgumentOutOfRangeException>(() => PngWriter.Write(figure, scale)).ParamName);
    }

    [Fact]
    public void A_picture_of_too_many_pixels_is_refused_before_it_is_drawn()
    {
        Assert.Null(PngWriter.Refusal(new FigureSize(2400, 2400), 2));
        Assert.Equal("A picture must have no more than 24000000 pixels, not 7200 by 7200.", PngWriter.Refusal(new FigureSize(2400, 2400), 3));
    }

    /// <summary>The middle of the dark pixels near a place, each weighted by its darkness.</summary>
    private static (double X, double Y) CenterOfInk(SKBitmap picture, double nearX, double nearY, double within)
    {
        var (sum, sumX, sumY) = (0.0, 0.0, 0.0);
        for (var y = (int)(nearY - within); y <= nearY + within; y++)
        {
            for (var x = (int)(nearX - within); x <= nearX + within; x++)
            {
                // Grid lines are lighter than this.
                var darkness = Math.Max(0, 170 - picture.GetPixel(x, y).Red);
                sum += darkness;
                sumX += darkness * (x + 0.5);
                sumY += darkness * (y + 0.5);
            }
        }

        Assert.True(sum > 0, "There is no mark.");
        return (sumX / sum, sumY / sum);
    }
}
