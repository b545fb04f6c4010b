using CsCheck;
using Drypeak.Soil.Quantities;
using Xunit;

namespace Drypeak.Figures.Tests;

public sealed class LabelTests
{
    [Fact]
    public void No_two_texts_overlap_and_none_leaves_the_picture_or_is_too_small()
    {
        Gen.Select(Charts.Any, Charts.Size).Sample(AssertReadable, iter: 300);
    }

    [Theory]
    [InlineData(240, 240)]
    [InlineData(320, 240)]
    [InlineData(960, 640)]
    [InlineData(2400, 2400)]
    public void Texts_keep_apart_however_much_is_asked_for(int width, int height)
    {
        var crowded = Charts.Full with
        {
            Specimens = [.. Enumerable.Range(0, 500).Select(i => new ChartSpecimen(8 + (i % 50 / 5.0), 1.60 + (i % 23 * 0.01), $"S{i}", i % 9 == 0))],
            Saturation = [.. Enumerable.Range(1, 20).Select(i => i * 5.0)],
            AirVoids = [.. Enumerable.Range(1, 20).Select(i => i * 1.5)],
        };
        AssertReadable(crowded, new FigureSize(width, height));
    }

    [Fact]
    public void Every_line_of_a_usual_figure_is_labeled()
    {
        var texts = SvgPicture.Of(Charts.Ternmarsh, FigureSize.Default).Texts.ToList();
        Assert.Superset(new HashSet<string>(["zero air voids", "saturation 90 %", "saturation 80 %", "air voids 5 %", "air voids 10 %"]), texts.ToHashSet());
    }

    [Fact]
    public void Every_mark_of_a_usual_figure_is_labeled()
    {
        var texts = SvgPicture.Of(Charts.Full, FigureSize.Default).Texts.ToList();
        string[] expected = ["1", "2", "3", "4", "5", "6, set aside", "adopted", "fitted: 1.83 Mg/m³ at 14.1 %", "corrected for oversize: 1.88 Mg/m³ at 12.9 %", "next specimen 14.5 %"];
        Assert.Superset(expected.ToHashSet(), texts.ToHashSet());
    }

    [Fact]
    public void A_long_reference_is_elided_to_the_picture()
    {
        var chart = Charts.Ternmarsh with { Reference = string.Join(' ', Enumerable.Repeat("embankment", 18)) };
        var reference = Assert.Single(SvgPicture.Of(chart, new FigureSize(480, 320)).Texts, text => text.StartsWith("embankment", StringComparison.Ordinal));
        Assert.EndsWith("…", reference, StringComparison.Ordinal);
        Assert.InRange(reference.Length, 40, 100);
    }

    [Fact]
    public void Texts_keep_apart_in_every_language_and_under_any_title()
    {
        Gen.Select(Charts.Any, Charts.Size, Gen.Int[0, Language.All.Count - 1], Gen.OneOf("", "Ternmarsh", new string('M', 200), "\u202E<&\">\n中")).Sample(
            (chart, size, language, title) => AssertReadable(chart, new FigureOptions { Size = size, Language = Language.All[language], Title = title, Second = title.Length == 0 ? null : language == 0 && chart.SpecificGravity is { } ? SecondAxis.VoidRatio : new SecondAxis((DensityUnit)language) }), iter: 200);
    }

    private static void AssertReadable(CompactionChart chart, FigureSize size) => AssertReadable(chart, new FigureOptions { Size = size });

    private static void AssertReadable(CompactionChart chart, FigureOptions options) =>
        SvgPicture.Read(SvgWriter.Write(CompactionFigure.Draw(chart, options))).AssertReadable(options.Size);
}
