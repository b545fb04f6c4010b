using System.Text;
using System.Text.RegularExpressions;
using Xunit;

namespace Drypeak.Figures.Tests;

public sealed partial class PdfWriterTests
{
    [Fact]
    public void The_same_figure_is_the_same_bytes()
    {
        var figure = CompactionFigure.Draw(Charts.Full, FigureSize.Default);
        Assert.Equal(PdfWriter.Write(figure), PdfWriter.Write(CompactionFigure.Draw(Charts.Full, FigureSize.Default)));
    }

    [Fact]
    public void A_figure_is_one_page_in_its_true_size_with_a_title_and_a_fixed_date()
    {
        var pdf = Written(Charts.WithoutOptimum, new FigureSize(480, 320));
        Assert.StartsWith("%PDF-1.", pdf, StringComparison.Ordinal);
        Assert.Contains("/MediaBox [0 0 360 240]", pdf, StringComparison.Ordinal);
        Assert.Contains("/Title (No optimum within the tested range)", pdf, StringComparison.Ordinal);
        Assert.Contains("/CreationDate (D:20000101000000", pdf, StringComparison.Ordinal);
        Assert.Contains("/ModDate (D:20000101000000", pdf, StringComparison.Ordinal);
        Assert.Contains("/Count 1", pdf, StringComparison.Ordinal);
    }

    [Fact]
    public void A_figure_with_all_that_it_can_show_takes_less_than_60_kB()
    {
        var chart = Charts.Full with { Reference = "Ternmarsh, Höhe +1,20 m, côté sud, ladrón, maçã, łąka, ΔH ≤ 5 %" };
        Assert.InRange(PdfWriter.Write(CompactionFigure.Draw(chart, FigureSize.Default)).Length, 1, 60_000);
    }

    [Fact]
    public void Every_font_of_a_usual_figure_is_a_cut_one_and_embedded()
    {
        var pdf = Written(Charts.Full, FigureSize.Default);
        var names = FontName().Matches(pdf).Select(match => match.Groups[1].Value).Distinct().Order().ToList();
        Assert.Equal(["DrypeakCutSans-Regular", "DrypeakCutSans-SemiBold"], names);
        Assert.Equal(2, FontFile().Count(pdf));
    }

    [Fact]
    public void A_text_with_letters_that_the_cut_font_lacks_is_set_in_the_whole_font()
    {
        const string cyrillic = "Насыпь";
        Assert.True(EmbeddedFont.Regular.Covers(cyrillic));
        Assert.False(EmbeddedFont.Regular.Cut!.Covers(cyrillic));
        var pdf = Written(Charts.Full with { Reference = cyrillic }, FigureSize.Default);
        Assert.Contains(FontName().Matches(pdf), match => match.Groups[1].Value == "SourceSans3-Regular");
    }

    [Theory]
    [InlineData(400)]
    [InlineData(600)]
    public void A_cut_font_sets_its_letters_as_wide_as_the_whole_font(int weight)
    {
        var face = weight == 400 ? EmbeddedFont.Regular : EmbeddedFont.SemiBold;
        var letters = Enumerable.Range(0x20, 0x2300 - 0x20).Select(value => ((char)value).ToString()).Where(face.Cut!.Covers).ToList();
        Assert.True(letters.Count > 300);
        Assert.All(letters, letter => Assert.Equal(face.Measure(letter, 1000), face.Cut!.Measure(letter, 1000), 1e-3));
    }

    /// <summary>SIL Open Font License 1.1, condition 3: a modified version must not use the reserved name; condition 2: it carries notice and license.</summary>
    [Fact]
    public void A_cut_font_is_not_called_by_the_reserved_name_and_names_its_license()
    {
        foreach (var cut in new[] { EmbeddedFont.Regular.Cut!, EmbeddedFont.SemiBold.Cut! })
        {
            Assert.Equal("Drypeak Cut Sans", cut.Typeface.FamilyName);
            Assert.DoesNotContain("Source", cut.Typeface.PostScriptName, StringComparison.Ordinal);
            var names = Encoding.BigEndianUnicode.GetString(cut.Typeface.GetTableData(0x6E616D65))
                + Encoding.BigEndianUnicode.GetString(cut.Typeface.GetTableData(0x6E616D65).AsSpan(1));
            Assert.Contains("SIL Open Font License, Version 1.1", names, StringComparison.Ordinal);
            Assert.Contains("Adobe", names, StringComparison.Ordinal);
        }
    }

    private static string Written(CompactionChart chart, FigureSize size) => Encoding.Latin1.GetString(PdfWriter.Write(CompactionFigure.Draw(chart, size)));

    [GeneratedRegex(@"/FontName /[A-Z]{6}\+([\w-]+)")]
    private static partial Regex FontName();

    [GeneratedRegex(@"/FontFile2 \d")]
    private static partial Regex FontFile();
}
