using Drypeak.Figures.Drawing;

namespace Drypeak.Figures.Layout.Reports;

/// <summary>What was tested, the result, how sure it is, and the name: a block a line.</summary>
internal static class HeadBlocks
{
    public static IEnumerable<IReportBlock> Of(Report report, double width) =>
    [
        .. Lines(report.Kind, ReportText.Label, width),
        .. Lines(report.Result, ReportText.Result, width),
        .. Lines(report.Support, ReportText.Value with { Color = ColorRole.Quiet }, width),
        .. Lines(report.Reference, ReportText.Section, width),
    ];

    private static IEnumerable<IReportBlock> Lines(string? text, ReportText style, double width) => NoteBlocks.Of(text ?? "", style, width);
}

/// <summary>Labels with their texts, in columns: a block a row, and more than one where a text is long.</summary>
internal static class FactBlocks
{
    private const int Columns = 3;
    private const int MostLines = 20;
    private const double Gap = 18;

    /// <summary>Under a section's name.</summary>
    public static IEnumerable<IReportBlock> Of(string name, IReadOnlyList<ReportFact> facts, double width)
    {
        var column = (width - ((Columns - 1) * Gap)) / Columns;
        return facts.Count == 0 ? [] : [new SectionBlock(name), .. facts.Chunk(Columns).SelectMany(row => RowsOf(row, column))];
    }

    private static IEnumerable<IReportBlock> RowsOf(ReportFact[] facts, double column)
    {
        var lines = Array.ConvertAll(facts, fact => ReportText.Value.Wrapped(fact.Text, column));
        for (var from = 0; from == 0 || from < lines.Max(of => of.Count); from += MostLines)
        {
            yield return new FactsRow(
                from == 0 ? Array.ConvertAll(facts, fact => PlainText.Elide(PlainText.Clean(fact.Label), ReportText.Label.Face, ReportText.Label.Size, column)) : [],
                Array.ConvertAll(lines, of => of.Skip(from).Take(MostLines).ToArray()),
                column);
        }
    }

    private sealed class FactsRow(string[] labels, string[][] lines, double column) : IReportBlock
    {
        private double Top => labels.Length > 0 ? ReportText.Label.LineHeight : 0;

        public double Height(double width) => Top + (lines.Max(of => of.Length) * ReportText.Value.LineHeight) + 2;

        public void Draw(ReportPages pages)
        {
            for (var i = 0; i < lines.Length; i++)
            {
                var x = ReportPages.Left + (i * (column + Gap));
                pages.Text(labels.ElementAtOrDefault(i) ?? "", x, ReportText.Label.Baseline, ReportText.Label);
                for (var line = 0; line < lines[i].Length; line++)
                {
                    pages.Text(lines[i][line], x, Top + (line * ReportText.Value.LineHeight) + ReportText.Value.Baseline, ReportText.Value);
                }
            }
        }
    }
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

    public double Height(double width) => 40 + ReportText.Label.LineHeight;

    public void Draw(ReportPages pages)
    {
        var width = (pages.Width - ((Roles.Length - 1) * Gap)) / Roles.Length;
        for (var i = 0; i < Roles.Length; i++)
        {
            var x = ReportPages.Left + (i * (width + Gap));
            pages.Rule(x, x + width, 38, ColorRole.Ink);
            pages.Text(Roles[i], x, 40 + ReportText.Label.Baseline, ReportText.Label);
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
            ReportPages.Left, 8 + ReportText.Small.Baseline, ReportText.Small, link: address);
        var lines = Lines(pages.Width);
        for (var i = 0; i < lines.Count; i++)
        {
            pages.Text(lines[i], ReportPages.Left, 8 + ((i + 1) * step) + ReportText.Small.Baseline, ReportText.Small, link: address);
        }
    }

    private IReadOnlyList<string> Lines(double width)
    {
        var lines = address is null ? [] : ReportText.Small.Wrapped(address, width);
        return lines.Count <= MostLines ? lines : [.. lines.Take(MostLines - 1), "… and so on: the whole of it is behind this line."];
    }
}
