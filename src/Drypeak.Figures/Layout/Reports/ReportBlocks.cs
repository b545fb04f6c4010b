using Drypeak.Figures.Drawing;

namespace Drypeak.Figures.Layout.Reports;

/// <summary>What was tested, the result, how sure it is, and the name.</summary>
internal sealed class HeadBlock(Report report) : IReportBlock
{
    public double Height(double width) => Lines(width).Sum(line => line.Style.LineHeight) + 6;

    public void Draw(ReportPages pages)
    {
        var down = 0.0;
        foreach (var (text, style) in Lines(pages.Width))
        {
            down += style.LineHeight;
            pages.Text(text, ReportPages.Left, down - (0.3 * style.Size), style);
        }
    }

    private IEnumerable<(string Text, ReportText Style)> Lines(double width)
    {
        IEnumerable<(string, ReportText)> Of(string? text, ReportText style) =>
            string.IsNullOrWhiteSpace(text) ? [] : style.Wrapped(text, width).Select(line => (line, style));
        return [.. Of(report.Kind, ReportText.Label), .. Of(report.Result, ReportText.Result), .. Of(report.Support, ReportText.Value with { Color = ColorRole.Quiet }), .. Of(report.Reference, ReportText.Section)];
    }
}

/// <summary>Labels with their texts, in columns, under a section's name where it has one.</summary>
internal sealed class FactsBlock(string? title, IReadOnlyList<ReportFact> facts, int columns) : IReportBlock
{
    private const double Gap = 18;
    private const double Above = 8;

    public double Height(double width) =>
        facts.Count == 0 ? 0 : Above + (title is null ? 0 : ReportText.Section.LineHeight) + Rows(ColumnWidth(width)).Sum(row => RowHeight(row.Max(fact => fact.Lines.Count)));

    public void Draw(ReportPages pages)
    {
        if (facts.Count == 0)
        {
            return;
        }

        var width = ColumnWidth(pages.Width);
        pages.Rule(ReportPages.Left, pages.Right, Above / 2);
        var down = Above;
        if (title is not null)
        {
            down += ReportText.Section.LineHeight;
            pages.Text(title, ReportPages.Left, down - 4, ReportText.Section);
        }

        foreach (var row in Rows(width))
        {
            for (var i = 0; i < row.Length; i++)
            {
                var x = ReportPages.Left + (i * (width + Gap));
                pages.Text(PlainText.Elide(PlainText.Clean(row[i].Label), ReportText.Label.Face, ReportText.Label.Size, width), x, down + 11, ReportText.Label);
                for (var line = 0; line < row[i].Lines.Count; line++)
                {
                    pages.Text(row[i].Lines[line], x, down + 11 + ((line + 1) * (ReportText.Value.LineHeight - 1)), ReportText.Value);
                }
            }

            down += RowHeight(row.Max(fact => fact.Lines.Count));
        }
    }

    private double ColumnWidth(double width) => (width - ((columns - 1) * Gap)) / columns;

    private static double RowHeight(int lines) => ReportText.Label.LineHeight + (lines * (ReportText.Value.LineHeight - 1)) + 4;

    private IEnumerable<(string Label, IReadOnlyList<string> Lines)[]> Rows(double width) =>
        facts.Select(fact => (fact.Label, ReportText.Value.Wrapped(fact.Text, width))).Chunk(columns);
}

/// <summary>The picture, as wide as the page allows.</summary>
internal sealed class PictureBlock(Func<FigureOptions, Figure> picture, double height, Theme theme) : IReportBlock
{
    /// <summary>Above and below, px.</summary>
    public const double Gap = 12;

    public double Height(double width) => height + Gap;

    public void Draw(ReportPages pages)
    {
        var size = new FigureSize((int)pages.Width, (int)height);
        pages.Picture(picture(new FigureOptions { Size = size, Theme = theme, SaysResult = false }), ReportPages.Left, Gap / 2);
    }
}

/// <summary>Lines to sign on.</summary>
internal sealed class SignatureBlock : IReportBlock
{
    private static readonly string[] Roles = ["Tested by, date", "Checked by, date", "Approved by, date"];
    private const double Gap = 24;

    public double Height(double width) => 58;

    public void Draw(ReportPages pages)
    {
        var width = (pages.Width - ((Roles.Length - 1) * Gap)) / Roles.Length;
        for (var i = 0; i < Roles.Length; i++)
        {
            var x = ReportPages.Left + (i * (width + Gap));
            pages.Rule(x, x + width, 38, ColorRole.Ink);
            pages.Text(Roles[i], x, 51, ReportText.Label);
        }
    }
}

/// <summary>How this report is had again: its address, written out as far as it is not too long, and behind the line in full.</summary>
internal sealed class AddressBlock(string? address) : IReportBlock
{
    private const int MostLines = 6;

    public double Height(double width) => 8 + ReportText.Small.LineHeight + (Lines(width).Count * ReportText.Small.LineHeight);

    public void Draw(ReportPages pages)
    {
        var step = ReportText.Small.LineHeight;
        pages.Text(
            address is null ? "The request is too long for an address: to have this report again, post it again." : "This report again, at the address of the service:",
            ReportPages.Left, 8 + step - 3, ReportText.Small, link: address);
        var lines = Lines(pages.Width);
        for (var i = 0; i < lines.Count; i++)
        {
            pages.Text(lines[i], ReportPages.Left, 8 + ((i + 2) * step) - 3, ReportText.Small, link: address);
        }
    }

    private IReadOnlyList<string> Lines(double width)
    {
        var lines = address is null ? [] : ReportText.Small.Wrapped(address, width);
        return lines.Count <= MostLines ? lines : [.. lines.Take(MostLines - 1), "… and so on: the whole of it is behind this line."];
    }
}
