using Drypeak.Figures.Drawing;
using Drypeak.Figures.Layout;

namespace Drypeak.Figures;

/// <summary>
/// The compaction figure: dry density against water content. Reading <see cref="Draw(CompactionChart, FigureOptions)"/> is reading the picture.
/// </summary>
public static class CompactionFigure
{
    /// <summary>Why a figure cannot be drawn, as a sentence that gives the bound and the value; null where it can.</summary>
    /// <param name="chart">What to show.</param>
    /// <param name="options">How to draw it.</param>
    public static string? Refusal(CompactionChart chart, FigureOptions options) => ChartBounds.Refusal(chart, options);

    /// <summary>The same for a figure drawn in the usual manner.</summary>
    /// <param name="chart">What to show.</param>
    /// <param name="size">px.</param>
    public static string? Refusal(CompactionChart chart, FigureSize size) => Refusal(chart, new FigureOptions { Size = size });

    /// <summary>Lays the figure out in the usual manner. Equal charts and sizes give equal figures.</summary>
    /// <param name="chart">What to show.</param>
    /// <param name="size">px.</param>
    /// <exception cref="ArgumentException">The chart or the size is outside its bounds; the message is that of <see cref="Refusal(CompactionChart, FigureOptions)"/>.</exception>
    public static Figure Draw(CompactionChart chart, FigureSize size) => Draw(chart, new FigureOptions { Size = size });

    /// <summary>Lays the figure out. Equal charts and options give equal figures.</summary>
    /// <param name="chart">What to show.</param>
    /// <param name="options">How to draw it.</param>
    /// <exception cref="ArgumentException">The chart or an option is outside its bounds; the message is that of <see cref="Refusal(CompactionChart, FigureOptions)"/>.</exception>
    public static Figure Draw(CompactionChart chart, FigureOptions options)
    {
        if (Refusal(chart, options) is { } refusal)
        {
            throw new ArgumentException(refusal);
        }

        // What finds no room for its name stands in the key, which takes room itself: hence again, until all have theirs.
        var (wording, lines) = (new Wording(chart, options), PhaseLines.Of(chart, options));
        var keyed = new HashSet<object>(ReferenceEqualityComparer.Instance);
        while (true)
        {
            var (figure, nameless) = Lay(chart, options, wording, lines, keyed);
            if (nameless.IsSubsetOf(keyed))
            {
                return figure;
            }

            keyed.UnionWith(nameless);
        }
    }

    private static (Figure Figure, IReadOnlySet<object> Nameless) Lay(CompactionChart chart, FigureOptions options, Wording wording, PhaseLines lines, IReadOnlySet<object> keyed)
    {
        var (size, theme) = (options.Size, options.Theme);
        var type = new TypeScale(size);
        var words = wording.Axes;
        var heading = Heading.Lay(wording.Heading, size, type);
        var key = Key.Lay(CompactionKey.Of(chart, lines, wording, keyed, type, theme), words.X, size, type);
        var plot = Plot.Lay(CompactionView.Of(chart, lines), heading.Bottom, key.Height, words, size, type);

        var axes = new Axes(plot, words, size, type, theme);
        var phaseLines = new PhaseLineMarks(lines, plot, type, theme);
        var models = new ModelLines(chart, options, wording, plot, type);
        var curve = new CurveLine(chart, plot, type);
        var specimens = new SpecimenMarks(chart, wording, plot, type);
        var zone = new AcceptanceZone(chart, plot, type);
        var fieldTests = new FieldTestMarks(chart, wording, plot, type);
        var optima = new OptimumMarks(chart, wording, plot, type, theme);

        var space = new LabelSpace(new Area(0, 0, size.Width, size.Height).Grown(-1));
        axes.Block(space);
        phaseLines.Block(space);
        models.Block(space);
        curve.Block(space);
        specimens.Block(space);
        fieldTests.Block(space);
        optima.Block(space);

        // In the order of importance: what comes later takes the room that is left.
        var nameless = new HashSet<object>(ReferenceEqualityComparer.Instance);
        space.PlaceEach(heading.Runs);
        space.PlaceEach(key.Texts);
        axes.Label(space);
        fieldTests.Label(space);
        optima.Label(space);
        zone.Label(space, keyed, nameless);
        var next = NextSpecimenMark.Draw(chart.NextSpecimen, wording, plot, type, space);
        specimens.Label(space);
        var labeledLines = phaseLines.DrawLabeled(space, keyed, nameless);
        var labeledModels = models.DrawLabeled(space, keyed, nameless);

        return (
            new Figure(size, wording.Title, wording.Description, theme.Palette,
            [
                zone.Draw(),
                curve.DrawBand(),
                axes.Grid(),
                labeledLines,
                labeledModels,
                curve.Draw(),
                axes.Frame(),
                next,
                optima.Leaders(),
                specimens.Draw(),
                optima.Draw(),
                fieldTests.Draw(),
                key.Draw(),
                new FigurePart("text", space.Placed),
            ]),
            nameless);
    }
}
