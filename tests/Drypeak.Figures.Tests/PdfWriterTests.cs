using System.Text;
using Xunit;

namespace Drypeak.Figures.Tests;

public sealed class PdfWriterTests
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
        var pdf = Encoding.Latin1.GetString(PdfWriter.Write(CompactionFigure.Draw(Charts.WithoutOptimum, new FigureSize(480, 320))));
        Assert.StartsWith("%PDF-1.", pdf, StringComparison.Ordinal);
        Assert.Contains("/MediaBox [0 0 360 240]", pdf, StringComparison.Ordinal);
        Assert.Contains("/Title (No optimum within the tested range)", pdf, StringComparison.Ordinal);
        Assert.Contains("/CreationDate (D:20000101000000", pdf, StringComparison.Ordinal);
        Assert.Contains("/Count 1", pdf, StringComparison.Ordinal);
    }
}
