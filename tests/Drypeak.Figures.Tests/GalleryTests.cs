using System.Globalization;
using SkiaSharp;
using Xunit;

namespace Drypeak.Figures.Tests;

/// <summary>
/// The gallery of reviewed pictures: for each an SVG, compared letter by letter, and a PNG, compared as an image. A change of drawing is seen
/// in <c>Golden/index.html</c>: the new pictures are written beside the tests' program, to be put in the old ones' place if they are better.
/// </summary>
public sealed class GalleryTests
{
    /// <summary>A channel may differ by so much, and so large a share of the pixels by more: another version of the drawing library smooths edges a little otherwise.</summary>
    private const int Tolerance = 48;
    private const double MostDiffering = 0.002;

    private static readonly string Folder = Path.Combine(AppContext.BaseDirectory, "Golden");

    private static readonly IReadOnlyDictionary<string, Func<Figure>> Pictures = SvgWriterTests.Reviewed
        .Select(reviewed => (reviewed.Key, Draw: (Func<Figure>)(() => CompactionFigure.Draw(reviewed.Value.Chart, reviewed.Value.Options))))
        .Concat(PlotCharts.ByName.Select(plot => (Key: "plot-" + plot.Key, Draw: (Func<Figure>)(() => PlotFigure.Draw(plot.Value, new FigureOptions())))))
        .ToDictionary(picture => picture.Key, picture => picture.Draw);

    public static TheoryData<string> Names => [.. Pictures.Keys];

    [Theory]
    [MemberData(nameof(Names))]
    public void A_picture_looks_as_reviewed(string name)
    {
        var png = PngWriter.Write(Pictures[name]());
        var reviewed = Path.Combine(Folder, $"{name}.png");
        File.WriteAllBytes(Path.ChangeExtension(reviewed, ".actual.png"), png);
        using var expected = SKBitmap.Decode(reviewed);
        Assert.True(expected is not null, $"{reviewed} is missing.");
        using var actual = SKBitmap.Decode(png);
        Assert.Equal((expected.Width, expected.Height), (actual.Width, actual.Height));
        var differing = expected.Pixels.Zip(actual.Pixels).Count(pair =>
            Math.Abs(pair.First.Red - pair.Second.Red) > Tolerance || Math.Abs(pair.First.Green - pair.Second.Green) > Tolerance || Math.Abs(pair.First.Blue - pair.Second.Blue) > Tolerance);
        Assert.InRange(differing / (double)(expected.Width * expected.Height), 0, MostDiffering);
    }

    [Fact]
    public void The_comparison_sees_a_mark_that_has_moved()
    {
        using var before = SKBitmap.Decode(PngWriter.Write(CompactionFigure.Draw(Charts.Ternmarsh, FigureSize.Default)));
        using var after = SKBitmap.Decode(PngWriter.Write(CompactionFigure.Draw(Charts.Ternmarsh with { Optimum = Charts.Ternmarsh.Optimum! with { WaterContent = 14.3 } }, FigureSize.Default)));
        var differing = before.Pixels.Zip(after.Pixels).Count(pair => Math.Abs(pair.First.Green - pair.Second.Green) > Tolerance);
        Assert.True(differing / (960.0 * 640) > MostDiffering / 2, differing.ToString(CultureInfo.InvariantCulture));
    }

    [Fact]
    public void The_page_of_the_gallery_shows_every_picture_in_both_formats()
    {
        var page = File.ReadAllText(Path.Combine(Folder, "index.html"));
        Assert.All(Pictures.Keys, name =>
        {
            Assert.Contains($"src=\"{name}.svg\"", page, StringComparison.Ordinal);
            Assert.Contains($"src=\"{name}.png\"", page, StringComparison.Ordinal);
        });
    }
}
