using Drypeak.Figures.Drawing;

namespace Drypeak.Figures.Layout.Reports;

/// <summary>A table, a block a row, so that it can go on over pages.</summary>
internal static class TableBlocks
{
    public static IEnumerable<IReportBlock> Of(ReportTable? table)
    {
        if (table is null or { Rows.Count: 0 })
        {
            return [];
        }

        var head = new TableHead(table);
        return [head, .. table.Rows.Select(row => new TableRow(row, head)), .. table.Notes.Select(note => new NoteBlock(note, ReportText.Small))];
    }

    private sealed class TableHead(ReportTable table) : IReportBlock
    {
        public int Columns => table.Columns.Count;

        public double Height(double width) => 8 + ReportText.Section.LineHeight + ReportText.Label.LineHeight + 6;

        public void Draw(ReportPages pages)
        {
            pages.Rule(ReportPages.Left, pages.Right, 4);
            pages.Text(table.Title, ReportPages.Left, 8 + ReportText.Section.LineHeight - 4, ReportText.Section);
            var baseline = 8 + ReportText.Section.LineHeight + ReportText.Label.LineHeight - 2;
            for (var i = 0; i < Columns; i++)
            {
                pages.Text(table.Columns[i], X(i, pages), baseline, ReportText.Label, Anchor(i));
            }

            pages.Rule(ReportPages.Left, pages.Right, baseline + 5);
        }

        public double X(int column, ReportPages pages) => column == 0 ? ReportPages.Left : ReportPages.Left + (pages.Width * (column + 1) / Columns);

        public static TextAnchor Anchor(int column) => column == 0 ? TextAnchor.Start : TextAnchor.End;
    }

    private sealed class TableRow(IReadOnlyList<string> cells, TableHead head) : IReportBlock
    {
        public IReportBlock? Head => head;

        public double Height(double width) => ReportText.Value.LineHeight;

        public void Draw(ReportPages pages)
        {
            for (var i = 0; i < cells.Count; i++)
            {
                var room = (pages.Width / head.Columns) - 6;
                pages.Text(PlainText.Elide(PlainText.Clean(cells[i]), ReportText.Value.Face, ReportText.Value.Size, room), head.X(i, pages), 13, ReportText.Value, TableHead.Anchor(i));
            }
        }
    }
}

/// <summary>A sentence over as many lines as it needs.</summary>
internal sealed class NoteBlock(string text, ReportText style) : IReportBlock
{
    public double Height(double width) => (style.Wrapped(text, width).Count * style.LineHeight) + 2;

    public void Draw(ReportPages pages)
    {
        var lines = style.Wrapped(text, pages.Width);
        for (var i = 0; i < lines.Count; i++)
        {
            pages.Text(lines[i], ReportPages.Left, ((i + 1) * style.LineHeight) - 3, style);
        }
    }
}

/// <summary>The name of what follows.</summary>
internal sealed class SectionBlock(string name) : IReportBlock
{
    public double Height(double width) => 8 + ReportText.Section.LineHeight;

    public void Draw(ReportPages pages)
    {
        pages.Rule(ReportPages.Left, pages.Right, 4);
        pages.Text(name, ReportPages.Left, 8 + ReportText.Section.LineHeight - 4, ReportText.Section);
    }
}

/// <summary>Sentences under a section's name.</summary>
internal static class NoteBlocks
{
    public static IEnumerable<IReportBlock> Of(string name, IReadOnlyList<string> notes) =>
        notes.Count == 0 ? [] : [new SectionBlock(name), .. notes.Select(note => new NoteBlock(note, ReportText.Note))];
}

/// <summary>What a reviewer says: the severity as a word, what to do, and the rule.</summary>
internal static class FindingBlocks
{
    public static IEnumerable<IReportBlock> Of(IReadOnlyList<ReportFinding> findings) =>
        [new SectionBlock("Findings"), .. findings.Count == 0 ? [new NoteBlock("None: nothing in the test speaks against the result.", ReportText.Note)] : findings.Select(finding => (IReportBlock)new FindingBlock(finding))];

    private sealed class FindingBlock(ReportFinding finding) : IReportBlock
    {
        private const double SeverityWidth = 58;

        public double Height(double width) => (Lines(width).Sum(line => line.Style.LineHeight)) + 3;

        public void Draw(ReportPages pages)
        {
            pages.Text(finding.Severity, ReportPages.Left, ReportText.Note.LineHeight - 3, new ReportText(ReportText.Note.Size, EmbeddedFont.SemiBold, finding.Severity == "note" ? ColorRole.Ink : ColorRole.Clay));
            var down = 0.0;
            foreach (var (text, style) in Lines(pages.Width))
            {
                down += style.LineHeight;
                pages.Text(text, ReportPages.Left + SeverityWidth, down - 3, style);
            }
        }

        private IEnumerable<(string Text, ReportText Style)> Lines(double width) =>
        [
            .. ReportText.Note.Wrapped(finding.Message, width - SeverityWidth).Select(line => (line, ReportText.Note)),
            .. ReportText.Small.Wrapped(finding.Basis, width - SeverityWidth).Select(line => (line, ReportText.Small)),
        ];
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
            var baseline = ReportText.Note.LineHeight - 3;
            var value = new ReportText(ReportText.Note.Size, EmbeddedFont.SemiBold);
            pages.Text(PlainText.Clean(step.Value), pages.Right, baseline, value, TextAnchor.End);
            var room = pages.Width - value.Face.Measure(step.Value, value.Size) - 16;
            pages.Text(PlainText.Elide(PlainText.Clean(step.Quantity), ReportText.Note.Face, ReportText.Note.Size, room), ReportPages.Left, baseline, ReportText.Note);
            var lines = Lines(pages.Width);
            for (var i = 0; i < lines.Count; i++)
            {
                pages.Text(lines[i], ReportPages.Left, ReportText.Note.LineHeight + ((i + 1) * ReportText.Small.LineHeight) - 3, ReportText.Small);
            }
        }

        private IReadOnlyList<string> Lines(double width) =>
            ReportText.Small.Wrapped(string.Join(" ", ((string?[])[step.Formula, step.Substitution is { } numbers ? $"= {numbers}" : null, $"({step.Source})"]).OfType<string>()), width);
    }
}
