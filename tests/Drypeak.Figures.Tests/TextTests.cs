using CsCheck;
using Drypeak.Figures.Drawing;
using Drypeak.Figures.Layout;
using SkiaSharp;
using Xunit;

namespace Drypeak.Figures.Tests;

public sealed class TextTests
{
    [Theory]
    [InlineData("a\tb\r\nc", "a b  c")]
    [InlineData("  \u0000bell\u0007 \u0085", "bell")]
    [InlineData("\u202Egnp.exe", "gnp.exe")]
    [InlineData("\uFFFE\uFFFF", "\uFFFD\uFFFD")]
    [InlineData("😀 مرحبا", "😀 مرحبا")]
    public void A_text_is_cleaned_to_one_line_that_any_format_can_hold(string text, string expected) =>
        Assert.Equal(expected, PlainText.Clean(text));

    [Fact]
    public void A_lone_surrogate_becomes_the_replacement_character() =>
        Assert.Equal("lone \uFFFD surrogate", PlainText.Clean("lone \uD83D surrogate"));

    [Fact]
    public void An_elided_text_fits_and_is_as_long_as_fits()
    {
        Gen.Select(Gen.String[Gen.Char[' ', '~'], 0, 60], Gen.Double[0, 300]).Sample((text, width) =>
        {
            var elided = PlainText.Elide(text, EmbeddedFont.Regular, 13, width);
            Assert.True(EmbeddedFont.Regular.Measure(elided, 13) <= width);
            Assert.True(elided == text || elided.Length == 0 || text.StartsWith(elided[..^1], StringComparison.Ordinal));
            Assert.True(elided == text || WithOneMoreLetter(text, elided) > width, "One more letter would have fitted.");
        });
    }

    /// <summary>Width with one more letter of the text. Spaces before the ellipsis are left out, so the next letter is looked for behind them.</summary>
    private static double WithOneMoreLetter(string text, string elided)
    {
        var kept = Math.Max(0, elided.Length - 1);
        while (text[kept] == ' ')
        {
            kept++;
        }

        return EmbeddedFont.Regular.Measure(string.Concat(text.AsSpan(0, kept + 1), "…"), 13);
    }

    [Fact]
    public void An_accent_is_never_cut_from_its_letter()
    {
        var text = string.Concat(Enumerable.Repeat("e\u0301", 40));
        var elided = PlainText.Elide(text, EmbeddedFont.Regular, 13, 100);
        Assert.EndsWith("e\u0301…", elided, StringComparison.Ordinal);
    }

    [Fact]
    public void Text_is_measured_as_the_drawing_library_sets_it()
    {
        using var font = new SKFont(EmbeddedFont.SemiBold.Typeface, 21) { Hinting = SKFontHinting.None, LinearMetrics = true, Subpixel = true };
        const string text = "Maximum dry density 1.83 Mg/m³ at 13.9 % water";
        Assert.Equal(font.MeasureText(text), EmbeddedFont.SemiBold.Measure(text, 21), 0.01);
    }

    [Fact]
    public void The_font_has_every_letter_that_figures_write_themselves()
    {
        const string letters = "abcdefghijklmnopqrstuvwxyzABCDEFGHIJKLMNOPQRSTUVWXYZ0123456789 .,:/%()³−–±×·…ργ²½≤≥";
        Assert.True(EmbeddedFont.Regular.Covers(letters));
        Assert.True(EmbeddedFont.SemiBold.Covers(letters));
        Assert.False(EmbeddedFont.Regular.Covers("中"));
    }

    [Fact]
    public void The_fonts_license_comes_with_it() =>
        Assert.Contains("SIL OPEN FONT LICENSE Version 1.1", EmbeddedFont.License, StringComparison.Ordinal);

    [Theory]
    [InlineData(-0.0001, 2, "0.00")]
    [InlineData(-1.5, 1, "−1.5")]
    [InlineData(30000, 0, "30000")]
    [InlineData(1.005, 2, "1.00")]
    public void Numbers_are_written_for_readers(double value, int decimals, string expected) =>
        Assert.Equal(expected, Ticks.Format(value, decimals));
}
