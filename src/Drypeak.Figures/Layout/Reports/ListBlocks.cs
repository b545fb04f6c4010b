using Drypeak.Figures.Drawing;

namespace Drypeak.Figures.Layout.Reports;

/// <summary>A table, a block a row, so that it can go on over pages.</summary>
internal static class TableBlocks
{
    public static IEnumerable<IReportBlock> Of(ReportTable? table, double width)
    {
        if (table is null or { Rows.Count: 0 })
        {
            return [];
        }

        var head = new TableHead(table);
        return [head, .. table.Rows.Select(row => new TableRow(row, head)), .. table.Notes.SelectMany(note => NoteBlocks.Of(note, ReportText.Small, width))];
    }

    private sealed class TableHead(ReportTable table) : IReportBlock
    {
        public int Columns => table.Columns.Count;

        public double Height(double width) => 8 + ReportText.Section.LineHeight + ReportText.Label.LineHeight + 6;

        public void Draw(ReportPages pages)
        {
            pages.Rule(ReportPages.Left, pages.Right, 4);
            pages.Text(table.Title, ReportPages.Left, 8 + ReportText.Section.Baseline, ReportText.Section);
            var top = 8 + ReportText.Section.LineHeight;
            for (var i = 0; i < Columns; i++)
            {
                pages.Text(table.Columns[i], X(i, pages), top + ReportText.Label.Baseline, ReportText.Label, Anchor(i));
            }

            pages.Rule(ReportPages.Left, pages.Right, top + ReportText.Label.LineHeight + 2);
        }

        /// <summary>Of a column of numbers; the first one, of names, is twice as wide.</summary>
        public double ColumnWidth(double width) => width / (Columns + 1);

        public double X(int column, ReportPages pages) => column == 0 ? ReportPages.Left : ReportPages.Left + (ColumnWidth(pages.Width) * (column + 2));

        public static TextAnchor Anchor(int column) => column == 0 ? TextAnchor.Start : TextAnchor.End;
    }

    private sealed class TableRow(IReadOnlyList<string> cells, TableHead head) : IReportBlock
    {
        public IReportBlock? Head => head;

        public double Height(double width) => ReportText.Value.LineHeight * Cells(width).Max(cell => Math.Max(1, cell.Count));

        public void Draw(ReportPages pages)
        {
            var wrapped = Cells(pages.Width);
            for (var i = 0; i < wrapped.Count; i++)
            {
                for (var line = 0; line < wrapped[i].Count; line++)
                {
                    pages.Text(wrapped[i][line], head.X(i, pages), ReportText.Value.Baseline + (line * ReportText.Value.LineHeight), ReportText.Value, TableHead.Anchor(i));
                }
            }
        }

        private List<IReadOnlyList<string>> Cells(double width) =>
            [.. cells.Select((cell, i) => ReportText.Value.Wrapped(cell, ((i == 0 ? 2 : 1) * head.ColumnWidth(width)) - 6))];
    }
}

/// <summary>A line of text, with a word before it where it begins something.</summary>
internal sealed class LineBlock(string text, ReportText style, double indent = 0, (string Text, ReportText Style)? word = null) : IReportBlock
{
    private double Baseline => Math.Max(style.Baseline, word?.Style.Baseline ?? 0);

    public double Height(double width) => Math.Max(style.LineHeight, word?.Style.LineHeight ?? 0);

    public void Draw(ReportPages pages)
    {
        if (word is { } before)
        {
            pages.Text(before.Text, ReportPages.Left, Baseline, before.Style);
        }

        pages.Text(text, ReportPages.Left + indent, Baseline, style);
    }
}

/// <summary>The name of what follows.</summary>
internal sealed class SectionBlock(string name) : IReportBlock
{
    public double Height(double width) => 8 + ReportText.Section.LineHeight;

    public void Draw(ReportPages pages)
    {
        pages.Rule(ReportPages.Left, pages.Right, 4);
        pages.Text(name, ReportPages.Left, 8 + ReportText.Section.Baseline, ReportText.Section);
    }
}

/// <summary>Sentences, under a section's name where they have one: a block a line.</summary>
internal static class NoteBlocks
{
    public static IEnumerable<IReportBlock> Of(string name, IReadOnlyList<string> notes, double width) =>
        notes.Count == 0 ? [] : [new SectionBlock(name), .. notes.SelectMany(note => Of(note, ReportText.Note, width))];

    public static IEnumerable<IReportBlock> Of(string note, ReportText style, double width) => style.Wrapped(note, width).Select(line => new LineBlock(line, style));
}

/// <summary>What a reviewer says: the severity as a word, what to do, and the rule.</summary>
internal static class FindingBlocks
{
    private const double SeverityWidth = 58;

    public static IEnumerable<IReportBlock> Of(IReadOnlyList<ReportFinding> findings, double width) => findings.Count == 0
        ? NoteBlocks.Of("Findings", ["None: nothing in the test speaks against the result."], width)
        : [new SectionBlock("Findings"), .. findings.SelectMany(finding => Of(finding, width - SeverityWidth))];

    private static IEnumerable<IReportBlock> Of(ReportFinding finding, double width)
    {
        var severity = new ReportText(ReportText.Note.Size, EmbeddedFont.SemiBold, finding.Severity == "note" ? ColorRole.Ink : ColorRole.Clay);
        var lines = ReportText.Note.Wrapped(finding.Message, width).Select(line => (line, ReportText.Note))
            .Concat(ReportText.Small.Wrapped(finding.Basis, width).Select(line => (line, ReportText.Small)));
        return lines.Select((line, i) => new LineBlock(line.line, line.Item2, SeverityWidth, i == 0 ? (finding.Severity, severity) : null));
    }
}

/// <summary>The arithmetic, step by step: what, its value, and how it comes about.</summary>
internal static class WorkingBlocks
{
    public static IReadOnlyList<IReportBlock> Of(IReadOnlyList<ReportStep> steps) => [new SectionBlock("Working"), .. steps.Select(step => new StepBlock(step))];

    private sealed class StepBlock(ReportStep step) : IReportBlock
    {
        public double Height(double width) => ReportText.Note.LineHeight + (Lines(width).Count * ReportText.Small.LineHeight) + 3;

        public void Draw(ReportPages pages)
        {
            var baseline = ReportText.Note.Baseline;
            var value = new ReportText(ReportText.Note.Size, EmbeddedFont.SemiBold);
            pages.Text(PlainText.Clean(step.Value), pages.Right, baseline, value, TextAnchor.End);
            var room = pages.Width - value.Face.Measure(step.Value, value.Size) - 16;
            pages.Text(PlainText.Elide(PlainText.Clean(step.Quantity), ReportText.Note.Face, ReportText.Note.Size, room), ReportPages.Left, baseline, ReportText.Note);
            var lines = Lines(pages.Width);
            for (var i = 0; i < lines.Count; i++)
            {
                pages.Text(lines[i], ReportPages.Left, ReportText.Note.LineHeight + (i * ReportText.Small.LineHeight) + ReportText.Small.Baseline, ReportText.Small);
            }
        }

        private IReadOnlyList<string> Lines(double width) =>
            ReportText.Small.Wrapped(string.Join(" ", ((string?[])[step.Formula, step.Substitution is { } numbers ? $"= {numbers}" : null, $"({step.Source})"]).OfType<string>()), width);
    }
}
