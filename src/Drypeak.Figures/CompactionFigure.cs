using Drypeak.Figures.Drawing;
using Drypeak.Figures.Layout;

namespace Drypeak.Figures;

/// <summary>
/// The compaction figure: dry density against water content. Reading <see cref="Draw"/> is reading the picture.
/// </summary>
public static class CompactionFigure
{
    /// <summary>Above this many specimens their labels would say nothing.</summary>
    private const int MostLabeledSpecimens = 40;

    /// <summary>Why a figure cannot be drawn, as a sentence that gives the bound and the value; null where it can.</summary>
    /// <param name="chart">What to show.</param>
    /// <param name="size">px.</param>
    public static string? Refusal(CompactionChart chart, FigureSize size) => ChartBounds.Refusal(chart, size);

    /// <summary>Lays the figure out. Equal charts and sizes give equal figures.</summary>
    /// <param name="chart">What to show.</param>
    /// <param name="size">px.</param>
    /// <exception cref="ArgumentException">The chart or the size is outside its bounds; the message is that of <see cref="Refusal"/>.</exception>
    public static Figure Draw(CompactionChart chart, FigureSize size)
    {
        if (Refusal(chart, size) is { } refusal)
        {
            throw new ArgumentException(refusal);
        }

        var type = new TypeScale(size);
        var wording = new Wording(chart);
        var lines = PhaseLines.Of(chart);
        var heading = Heading.Lay(wording, size, type);
        var densityValues = wording.Result is { } shown ? [wording.BareDensity(shown)] : Array.Empty<string>();
        var plot = Plot.Lay(View.Of(chart, lines), heading.Bottom, densityValues, size, type);
        var axes = new Axes(plot, wording, size, type);
        var space = new LabelSpace(new Area(0, 0, size.Width, size.Height).Grown(-1));

        var specimens = new SpecimenMarks(chart, plot, type);
        var optima = new OptimumMarks(chart, wording, plot, type);
        var curve = Course.Clipped([.. chart.Curve.Select(plot.At)], plot.Area).Select(course => course.Whole()).ToList();
        var courses = lines.All.Select(line => (Line: line, Course: PhaseLines.Drawn(line, plot))).Where(drawn => drawn.Course is not null).ToList();

        specimens.Block(space);
        optima.Block(space);
        curve.ForEach(run => space.Block(Barriers.Curve, run));
        courses.ForEach(drawn => space.Block(Barriers.PhaseLines, drawn.Course!.Whole(), drawn.Line));
        space.Block(Barriers.Axes, [new(plot.Area.Left, plot.Area.Top), new(plot.Area.Left, plot.Area.Bottom), new(plot.Area.Right, plot.Area.Bottom)]);

        Always(heading.Runs);
        Always(axes.Titles());
        if (wording.Result is { } result)
        {
            Always([axes.WaterValue(result), axes.DensityValue(result)]);
        }

        Always(axes.TickLabels());
        optima.Label(space);
        var next = NextSpecimenMark.Draw(chart.NextSpecimen, plot, type, space);
        var phaseLines = courses.ConvertAll(drawn => new Lines(
            LineLabels.Place(drawn.Line, drawn.Course!, type.Label, drawn.Line.Stroke(type).Color, space),
            drawn.Line.Stroke(type))
        { Name = drawn.Line.Name });
        if (chart.Specimens.Count <= MostLabeledSpecimens)
        {
            specimens.Label(space);
        }

        return new Figure(size, $"{wording.Headline.First} {wording.Headline.Second}", wording.Description, Palette.Light,
        [
            axes.Grid(),
            new FigurePart("lines", phaseLines),
            new FigurePart("curve", curve.Count == 0 ? [] : [new Lines(curve, new Stroke(ColorRole.Water, 2 * type.Unit))]),
            axes.Frame(),
            next,
            optima.Leaders(),
            specimens.Draw(),
            optima.Draw(),
            new FigurePart("text", space.Placed),
        ]);

        void Always(IEnumerable<TextRun> texts)
        {
            foreach (var text in texts)
            {
                space.Place([text], Barriers.None);
            }
        }
    }
}
