using Drypeak.Figures.Drawing;
using Xunit;

namespace Drypeak.Figures.Tests;

public sealed class PaletteTests
{
    [Fact]
    public void Contrast_is_21_between_black_and_white_and_1_between_equals()
    {
        Assert.Equal(21, Color.Contrast(new(0, 0, 0), new(255, 255, 255)), 1e-12);
        Assert.Equal(1, Color.Contrast(new(10, 20, 30), new(10, 20, 30)), 1e-12);
    }

    [Fact]
    public void A_table_of_colors_fits_an_index_of_8_bits_and_finds_each_of_its_own_entries()
    {
        var table = ColorTable.Of(Palette.Light);
        Assert.InRange(table.Entries.Count, 1, 256);
        Assert.All(table.Entries, entry => Assert.Equal(entry, table.Entries[table.NearestTo((uint)(entry.Red | (entry.Green << 8) | (entry.Blue << 16)))]));
    }
}
