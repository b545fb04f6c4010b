using Drypeak.Figures.Drawing;
using Drypeak.Figures.Layout;
using Drypeak.Figures.Layout.Plots;

namespace Drypeak.Figures;

/// <summary>
/// The figure of any two quantities: results in order, a histogram, a family of curves, a map. Reading <see cref="Draw"/> is reading the picture.
/// </summary>
public static class PlotFigure
{
    /// <summary>Why a figure cannot be drawn, as a sentence that gives the bound and the value; null where it can.</summary>
    /// <param name="chart">What to show.</param>
    /// <param name="options">How to draw it.</param>
    public static string? Refusal(PlotChart chart, FigureOptions options) => PlotBounds.Refusal(chart, options);

    /// <summary>The same for a figure drawn in the usual manner.</summary>
    /// <param name="chart">What to show.</param>
    /// <param name="size">px.</param>
    public static string? Refusal(PlotChart chart, FigureSize size) => Refusal(chart, new FigureOptions { Size = size });

    /// <summary>Lays the figure out. Equal charts and options give equal figures.</summary>
    /// <param name="chart">What to show.</param>
    /// <param name="options">How to draw it; of these size, theme and title count, for a plot's words are its own.</param>
    /// <exception cref="ArgumentException">The chart or an option is outside its bounds; the message is that of <see cref="Refusal(PlotChart, FigureOptions)"/>.</exception>
    public static Figure Draw(PlotChart chart, FigureOptions options)
    {
        if (Refusal(chart, options) is { } refusal)
        {
            throw new ArgumentException(refusal);
        }

        // What finds no room for its name stands in the key, which takes room itself: hence again, until all have theirs.
        var keyed = new HashSet<object>(ReferenceEqualityComparer.Instance);
        while (true)
        {
            var (figure, nameless) = Lay(chart, options, keyed);
            if (nameless.IsSubsetOf(keyed))
            {
                return figure;
            }

            keyed.UnionWith(nameless);
        }
    }

    private static (Figure Figure, IReadOnlySet<object> Nameless) Lay(PlotChart chart, FigureOptions options, IReadOnlySet<object> keyed)
    {
        var (size, theme) = (options.Size, options.Theme);
        var type = new TypeScale(size);
        var wording = new PlotWording(chart, options);
        var heading = Heading.Lay(wording.Heading, size, type);
        var key = Key.Lay(PlotKey.Of(chart, keyed, type, theme), wording.Axes.X, size, type);
        var plot = Plot.Lay(PlotView.Of(chart), heading.Bottom, key.Height, wording.Axes, size, type);

        var axes = new Axes(plot, wording.Axes, size, type, theme);
        var areas = new PlotAreas(chart, plot, type);
        var lines = new PlotLines(chart, plot, type, theme);
        var limits = new PlotLimits(chart, plot, type, theme);
        var marks = new PlotMarks(chart, plot, type);

        var space = new LabelSpace(new Area(0, 0, size.Width, size.Height).Grown(-1));
        axes.Block(space);
        lines.Block(space);
        limits.Block(space);
        marks.Block(space);

        // In the order of importance: what comes later takes the room that is left.
        var nameless = new HashSet<object>(ReferenceEqualityComparer.Instance);
        space.PlaceEach(heading.Runs);
        space.PlaceEach(key.Texts);
        axes.Label(space);
        marks.LabelResults(space);
        limits.Label(space, keyed, nameless);
        var drawnLines = lines.DrawLabeled(space, keyed, nameless);
        areas.Label(space, keyed, nameless);
        marks.LabelOthers(space);

        return (
            new Figure(size, wording.Title, wording.Description, theme.Palette,
            [
                axes.Grid(),
                areas.Draw(),
                drawnLines,
                limits.Draw(),
                axes.Frame(),
                marks.Draw(),
                key.Draw(),
                new FigurePart("text", space.Placed),
            ]),
            nameless);
    }
}
