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
    /// <param name="size">px.</param>
    public static string? Refusal(CompactionChart chart, FigureSize size) => ChartBounds.Refusal(chart, size);

    /// <summary>Lays the figure out in the usual manner. Equal charts and sizes give equal figures.</summary>
    /// <param name="chart">What to show.</param>
    /// <param name="size">px.</param>
    /// <exception cref="ArgumentException">The chart or the size is outside its bounds; the message is that of <see cref="Refusal"/>.</exception>
    public static Figure Draw(CompactionChart chart, FigureSize size) => Draw(chart, new FigureOptions { Size = size });

    /// <summary>Lays the figure out. Equal charts and options give equal figures.</summary>
    /// <param name="chart">What to show.</param>
    /// <param name="options">How to draw it.</param>
    /// <exception cref="ArgumentException">The chart or the size is outside its bounds; the message is that of <see cref="Refusal"/>.</exception>
    public static Figure Draw(CompactionChart chart, FigureOptions options)
    {
        var (size, theme) = (options.Size, options.Theme);
        if (Refusal(chart, size) is { } refusal)
        {
            throw new ArgumentException(refusal);
        }

        var type = new TypeScale(size);
        var wording = new Wording(chart, options);
        var lines = PhaseLines.Of(chart, options);
        var heading = Heading.Lay(wording.Heading, size, type);
        var plot = Plot.Lay(CompactionView.Of(chart, lines), heading.Bottom, below: 0, wording.Axes, size, type);

        var axes = new Axes(plot, wording.Axes, size, type, theme);
        var phaseLines = new PhaseLineMarks(lines, plot, type, theme);
        var curve = new CurveLine(chart, plot, type);
        var specimens = new SpecimenMarks(chart, wording, plot, type);
        var zone = new AcceptanceZone(chart, plot, type);
        var fieldTests = new FieldTestMarks(chart, wording, plot, type);
        var optima = new OptimumMarks(chart, wording, plot, type, theme);

        var space = new LabelSpace(new Area(0, 0, size.Width, size.Height).Grown(-1));
        axes.Block(space);
        phaseLines.Block(space);
        curve.Block(space);
        specimens.Block(space);
        fieldTests.Block(space);
        optima.Block(space);

        // In the order of importance: what comes later takes the room that is left.
        space.PlaceEach(heading.Runs);
        axes.Label(space);
        fieldTests.Label(space);
        optima.Label(space);
        zone.Label(space);
        var next = NextSpecimenMark.Draw(chart.NextSpecimen, wording, plot, type, space);
        var labeledLines = phaseLines.DrawLabeled(space);
        specimens.Label(space);

        return new Figure(size, wording.Title, wording.Description, theme.Palette,
        [
            axes.Grid(),
            zone.Draw(),
            labeledLines,
            curve.Draw(),
            axes.Frame(),
            next,
            optima.Leaders(),
            specimens.Draw(),
            optima.Draw(),
            fieldTests.Draw(),
            new FigurePart("text", space.Placed),
        ]);
    }
}
