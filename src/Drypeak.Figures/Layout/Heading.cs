using Drypeak.Figures.Drawing;

namespace Drypeak.Figures.Layout;

/// <summary>The lines over the plot: the title, then what is said more quietly.</summary>
/// <param name="Runs">The lines as texts with their places.</param>
/// <param name="Bottom">Where the heading ends, px from the top.</param>
internal sealed record Heading(IReadOnlyList<TextRun> Runs, double Bottom)
{
    /// <summary>Between two lines, px: readers of SVG round the height of a line up.</summary>
    private const double LineGap = 1.5;

    /// <summary>Below this height a picture has room for one line under the title, px.</summary>
    private const int TallEnoughForTwo = 420;

    public static Heading Lay(HeadingWords words, FigureSize size, TypeScale type)
    {
        var width = size.Width - (2 * type.Margin);
        var runs = new List<TextRun>();
        var top = type.Margin * 0.6;

        var (lines, titleSize) = Title(words, width, type);
        foreach (var line in lines.Where(line => line.Length > 0))
        {
            Add(line, titleSize, EmbeddedFont.SemiBold, ColorRole.Ink);
        }

        foreach (var line in Subtitles(words, width, size, type))
        {
            Add(line, type.Subtitle, EmbeddedFont.Regular, ColorRole.Quiet);
        }

        return new Heading(runs, top);

        void Add(string text, double textSize, FontFace face, ColorRole color)
        {
            runs.Add(new TextRun(text, new Place(type.Margin, top + (face.Ascent * textSize)), textSize, face, color));
            top += ((face.Ascent + face.Descent) * textSize) + LineGap;
        }
    }

    /// <summary>One line if it fits with little shrinking, else two, as large as they fit; a text too long even so is elided.</summary>
    private static (IReadOnlyList<string> Lines, double Size) Title(HeadingWords words, double width, TypeScale type)
    {
        const double step = 0.5;
        var least = Math.Max(type.Title * 0.8, TypeScale.LeastText);
        var size = type.Title;
        while (size > least && !Fits(words.Title, size))
        {
            size = Math.Max(least, size - step);
        }

        if (words.Halves is not { } halves || Fits(words.Title, size))
        {
            return ([PlainText.Elide(words.Title, EmbeddedFont.SemiBold, size, width)], size);
        }

        for (size = type.Title; size >= TypeScale.LeastText; size -= step)
        {
            if (Fits(halves.First, size) && Fits(halves.Second, size))
            {
                return ([halves.First, halves.Second], size);
            }
        }

        string Short(string text) => PlainText.Elide(text, EmbeddedFont.SemiBold, TypeScale.LeastText, width);
        return ([Short(halves.First), Short(halves.Second)], TypeScale.LeastText);

        bool Fits(string text, double size) => EmbeddedFont.SemiBold.Measure(text, size) <= width;
    }

    private static IEnumerable<string> Subtitles(HeadingWords words, double width, FigureSize size, TypeScale type)
    {
        var lines = words.Subtitles.Select(Joined).Where(line => line.Length > 0).ToList();
        var joined = Joined(lines);
        if (lines.Count == 2 && Fits(joined))
        {
            return [joined];
        }

        return lines.Take(size.Height >= TallEnoughForTwo ? 2 : 1)
            .Select(line => PlainText.Elide(line, EmbeddedFont.Regular, type.Subtitle, width))
            .Where(line => line.Length > 0);

        bool Fits(string text) => EmbeddedFont.Regular.Measure(text, type.Subtitle) <= width;

        static string Joined(IEnumerable<string> texts) => string.Join("  ·  ", texts.Where(text => text.Length > 0));
    }
}
