using Drypeak.Figures.Drawing;

namespace Drypeak.Figures.Layout;

/// <summary>A page that is written from top to bottom: each call draws its part below the last one. For one figure, on one thread.</summary>
internal sealed class SheetPage(FigureSize size)
{
    private const double Margin = 57;
    private const double Gap = 24;
    private const double LineHeight = 27;
    private const double LabelSize = 11;
    private const double ValueSize = 12.5;
    private const double NoteSize = 11;

    private readonly List<Shape> _text = [];
    private readonly List<IReadOnlyList<Place>> _hairlines = [];
    private readonly List<IReadOnlyList<Place>> _rules = [];

    /// <summary>Where the writing goes on, px from the top.</summary>
    public double Y { get; private set; } = Margin;

    public static double Left => Margin;

    public double Width => size.Width - (2 * Margin);

    private double Right => size.Width - Margin;

    public IReadOnlyList<FigurePart> Parts =>
    [
        new("lines", [new Lines(_hairlines, new Stroke(ColorRole.Quiet, 0.6)), new Lines(_rules, new Stroke(ColorRole.Ink, 1.1))]),
        new("text", _text),
    ];

    /// <summary>What the sheet is, and for which method.</summary>
    public void Heading(string title, string method, string summary)
    {
        Y += 20;
        var heading = Write(title, Left, 22, EmbeddedFont.SemiBold);
        Write(PlainText.Elide(method, EmbeddedFont.SemiBold, 15, Width - heading - Gap), Right, 15, EmbeddedFont.SemiBold, anchor: TextAnchor.End);
        Y += 20;
        Write(summary, Right, LabelSize, EmbeddedFont.Regular, ColorRole.Quiet, TextAnchor.End);
        Y += 2;
    }

    /// <summary>The name of what follows, over a line across the page.</summary>
    public void Section(string name)
    {
        Y += 15;
        Rule(Y);
        Y += 17;
        Write(name, Left, ValueSize, EmbeddedFont.SemiBold);
    }

    /// <summary>Labels with a line to write on, or with what is written there already, in so many columns.</summary>
    public void Blanks(int columns, IReadOnlyList<(string Label, string Value)> blanks)
    {
        var width = (Width - ((columns - 1) * Gap)) / columns;
        foreach (var row in blanks.Chunk(columns))
        {
            Y += LineHeight;
            for (var i = 0; i < row.Length; i++)
            {
                var x = Left + (i * (width + Gap));
                var start = x + Write(row[i].Label, x, LabelSize, EmbeddedFont.Regular, ColorRole.Quiet) + 6;
                _hairlines.Add([new Place(start, Y + 2.5), new Place(x + width, Y + 2.5)]);
                if (row[i].Value.Length > 0)
                {
                    Write(PlainText.Elide(row[i].Value, EmbeddedFont.Regular, ValueSize, x + width - start), start, ValueSize, EmbeddedFont.Regular);
                }
            }
        }
    }

    /// <summary>What the method says, each under its name, in so many columns.</summary>
    public void Facts(int columns, IReadOnlyList<(string Label, string Value)> facts)
    {
        var width = (Width - ((columns - 1) * Gap)) / columns;
        foreach (var row in facts.Chunk(columns))
        {
            Y += 19;
            for (var i = 0; i < row.Length; i++)
            {
                Write(row[i].Label, Left + (i * (width + Gap)), LabelSize, EmbeddedFont.Regular, ColorRole.Quiet);
            }

            Y += 18;
            for (var i = 0; i < row.Length; i++)
            {
                Write(PlainText.Elide(row[i].Value, EmbeddedFont.Regular, ValueSize, width), Left + (i * (width + Gap)), ValueSize, EmbeddedFont.Regular);
            }
        }
    }

    /// <summary>Sentences, a line each.</summary>
    public void Notes(IReadOnlyList<string> notes)
    {
        Y += 10;
        foreach (var note in notes)
        {
            Y += 16;
            Write(note, Left, NoteSize, EmbeddedFont.Regular, ColorRole.Quiet);
        }
    }

    /// <summary>The last line of the page.</summary>
    public void Foot(string text)
    {
        Y = size.Height - Margin;
        Write(text, Left, 10, EmbeddedFont.Regular, ColorRole.Quiet);
    }

    /// <summary>Goes down the page.</summary>
    public void Down(double px) => Y += px;

    /// <summary>A hairline between two places.</summary>
    public void Hairline(Place from, Place to) => _hairlines.Add([from, to]);

    /// <summary>A line across the page.</summary>
    public void Rule(double y) => _rules.Add([new Place(Left, y), new Place(Right, y)]);

    /// <summary>Writes on the line at <see cref="Y"/> and says how wide it came out.</summary>
    public double Write(string text, double x, double fontSize, FontFace face, ColorRole color = ColorRole.Ink, TextAnchor anchor = TextAnchor.Start)
    {
        if (text.Length == 0)
        {
            return 0;
        }

        var run = new TextRun(text, new Place(x, Y), fontSize, face, color, anchor);
        _text.Add(run);
        return run.Width;
    }
}
