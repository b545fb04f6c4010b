using Drypeak.Figures.Drawing;
using Xunit;

namespace Drypeak.Figures.Tests;

public sealed class PaletteTests
{
    /// <summary>WCAG 2.2, success criteria 1.4.3 (text 4.5:1) and 1.4.11 (graphical objects 3:1).</summary>
    [Theory]
    [InlineData(ColorRole.Ink, 4.5)]
    [InlineData(ColorRole.Quiet, 4.5)]
    [InlineData(ColorRole.Clay, 4.5)]
    [InlineData(ColorRole.Water, 3)]
    public void What_must_be_read_stands_out_from_paper(ColorRole role, double least) =>
        Assert.True(Color.Contrast(Palette.Light[role], Palette.Light.Paper) >= least);

    [Fact]
    public void Contrast_is_21_between_black_and_white_and_1_between_equals()
    {
        Assert.Equal(21, Color.Contrast(new(0, 0, 0), new(255, 255, 255)), 1e-12);
        Assert.Equal(1, Color.Contrast(new(10, 20, 30), new(10, 20, 30)), 1e-12);
    }

    [Fact]
    public void Every_text_of_a_figure_is_in_a_color_that_can_be_read()
    {
        var texts = CompactionFigure.Draw(Charts.Full, FigureSize.Default).Parts.SelectMany(part => part.Shapes).OfType<TextRun>().ToList();
        Assert.NotEmpty(texts);
        Assert.All(texts, text => Assert.True(Color.Contrast(Palette.Light[text.Color], Palette.Light.Paper) >= 4.5, text.Text));
    }

    [Fact]
    public void A_table_of_colors_fits_an_index_of_8_bits_and_finds_each_of_its_own_entries()
    {
        var table = ColorTable.Of(Palette.Light);
        Assert.InRange(table.Entries.Count, 1, 256);
        Assert.All(table.Entries, entry => Assert.Equal(entry, table.Entries[table.NearestTo((uint)(entry.Red | (entry.Green << 8) | (entry.Blue << 16)))]));
    }
}
