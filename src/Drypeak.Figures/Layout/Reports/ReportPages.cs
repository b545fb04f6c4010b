using Drypeak.Figures.Drawing;

namespace Drypeak.Figures.Layout.Reports;

/// <summary>A part of a report that stands on one page.</summary>
internal interface IReportBlock
{
    /// <summary>How much of the page it takes, px.</summary>
    double Height(double width);

    /// <summary>Draws it with its top at <see cref="ReportPages.Y"/>.</summary>
    void Draw(ReportPages pages);

    /// <summary>What is drawn again where a page begins with this block, such as the heads of a table's columns; null: nothing.</summary>
    IReportBlock? Head => null;
}

/// <summary>Pages that are written from top to bottom, with a line at the foot of each. For one report, on one thread.</summary>
internal sealed class ReportPages
{
    public const double Margin = 50;
    private const double FootHeight = 30;
    private const double FootSize = 9.5;

    /// <summary>A page has its own ground: ink for a tint of it would be wasted.</summary>
    private static readonly Color White = new(255, 255, 255);

    private readonly Report _report;
    private readonly Paper _paper;
    private readonly Theme _theme;
    private readonly List<(List<Shape> Rules, List<FigurePart> Pictures, List<Shape> Text)> _pages = [];

    public ReportPages(Report report, Paper paper, Theme theme)
    {
        (_report, _paper, _theme) = (report, paper, theme);
        Turn();
    }

    /// <summary>Where the writing goes on, px from the top.</summary>
    public double Y { get; private set; }

    public static double Left => Margin;

    public double Width => _paper.Size.Width - (2 * Margin);

    public double Right => _paper.Size.Width - Margin;

    /// <summary>What a page has room for, px.</summary>
    public double HeightOfPage => Bottom - Margin;

    private double Bottom => _paper.Size.Height - Margin - FootHeight;

    /// <summary>Draws each block where there is room for it, turning pages as needed.</summary>
    public void Write(IReadOnlyList<IReportBlock> blocks)
    {
        foreach (var block in blocks)
        {
            var height = block.Height(Width);
            if (Y + height > Bottom && Y > Margin)
            {
                Turn();
                if (block.Head is { } head)
                {
                    head.Draw(this);
                    Y += head.Height(Width);
                }
            }

            block.Draw(this);
            Y += height;
        }
    }

    /// <summary>Begins a page.</summary>
    public void Turn()
    {
        _pages.Add(([], [], []));
        Y = Margin;
    }

    /// <summary>Writes a line of text.</summary>
    /// <param name="text">The text, clean.</param>
    /// <param name="x">Where it is anchored.</param>
    /// <param name="down">Its baseline under the top of the block.</param>
    /// <param name="style">Its looks.</param>
    /// <param name="anchor">How it is anchored.</param>
    /// <param name="link">An address that it leads to, or null.</param>
    public void Text(string text, double x, double down, ReportText style, TextAnchor anchor = TextAnchor.Start, string? link = null)
    {
        if (text.Length > 0)
        {
            _pages[^1].Text.Add(new TextRun(text, new Place(x, Y + down), style.Size, style.Face, style.Color, anchor) { Link = link });
        }
    }

    /// <summary>Draws a line across a part of the page.</summary>
    public void Rule(double from, double to, double down, ColorRole color = ColorRole.Rule, double width = 0.8) =>
        _pages[^1].Rules.Add(new Lines([[new Place(from, Y + down), new Place(to, Y + down)]], new Stroke(color, width)));

    /// <summary>Sets a picture onto the page with its upper left corner at a place.</summary>
    public void Picture(Figure figure, double x, double down) =>
        _pages[^1].Pictures.AddRange(figure.Parts.Select(part => part with { Shapes = [.. part.Shapes.Select(shape => shape.Moved(x, Y + down))] }));

    /// <summary>The pages, each with its foot.</summary>
    public IReadOnlyList<Figure> Finished() =>
    [
        .. _pages.Select((page, i) => new Figure(_paper.Size, _report.Result, $"{_report.Kind}. {_report.Result}.", _theme.Palette with { Paper = White },
        [
            new FigurePart("rules", page.Rules),
            .. page.Pictures,
            new FigurePart("text", page.Text),
            Foot(i + 1),
        ])),
    ];

    private FigurePart Foot(int number)
    {
        var y = _paper.Size.Height - Margin;
        var style = new ReportText(FootSize, EmbeddedFont.Regular, ColorRole.Quiet);
        var count = $"page {number} of {_pages.Count}";
        var room = Width - style.Face.Measure(count, FootSize) - 20;
        return new FigurePart("foot",
        [
            new Lines([[new Place(Left, y - 14), new Place(Right, y - 14)]], new Stroke(ColorRole.Rule, 0.8)),
            new TextRun(PlainText.Elide(_report.Provenance, style.Face, FootSize, room), new Place(Left, y), FootSize, style.Face, style.Color),
            new TextRun(count, new Place(Right, y), FootSize, style.Face, style.Color, TextAnchor.End),
        ]);
    }
}

/// <summary>How a text of a report looks.</summary>
internal readonly record struct ReportText(double Size, FontFace Face, ColorRole Color = ColorRole.Ink)
{
    public static ReportText Result => new(21, EmbeddedFont.SemiBold);

    public static ReportText Section => new(12, EmbeddedFont.SemiBold);

    public static ReportText Value => new(12, EmbeddedFont.Regular);

    public static ReportText Label => new(10.5, EmbeddedFont.Regular, ColorRole.Quiet);

    public static ReportText Note => new(10.5, EmbeddedFont.Regular);

    public static ReportText Small => new(9.5, EmbeddedFont.Regular, ColorRole.Quiet);

    /// <summary>From the font's ascent to its descent, so that no two lines share room.</summary>
    public double LineHeight => Math.Ceiling((Face.Ascent + Face.Descent) * Size);

    /// <summary>From the top of a line to where its letters stand.</summary>
    public double Baseline => Face.Ascent * Size;

    /// <summary>The text in lines no wider than so many px.</summary>
    public IReadOnlyList<string> Wrapped(string text, double width) => PlainText.Wrap(PlainText.Clean(text), Face, Size, width);
}
