using Drypeak.Figures.Drawing;

namespace Drypeak.Figures.Layout;

/// <summary>The lines of saturation and air voids as they run through the plot, each with its label in it where there is room.</summary>
internal sealed class PhaseLineMarks(PhaseLines lines, Plot plot, TypeScale type, Theme theme)
{
    private const int Samples = 96;

    private readonly List<(PhaseLine Line, Course Course)> _drawn = [.. lines.All.SelectMany(line => Courses(line, plot).Select(course => (line, course)))];

    public void Block(LabelSpace space) => _drawn.ForEach(drawn => space.Block(Barriers.PhaseLines, drawn.Course.Whole(), drawn.Line));

    /// <summary>Places the labels and draws the lines with gaps for them.</summary>
    /// <param name="space">The room that is left.</param>
    /// <param name="keyed">Lines whose names stand in the key.</param>
    /// <param name="nameless">Receives the lines whose names found no room.</param>
    public FigurePart DrawLabeled(LabelSpace space, IReadOnlySet<object> keyed, ISet<object> nameless) =>
        new("lines", _drawn.ConvertAll(drawn => DrawLabeled(drawn.Line, drawn.Course, space, keyed, nameless)));

    private Lines DrawLabeled(PhaseLine line, Course course, LabelSpace space, IReadOnlySet<object> keyed, ISet<object> nameless)
    {
        var stroke = line.Stroke(type, theme);
        var parted = keyed.Contains(line) ? null : LineLabels.Place(line.Labels, line, course, type.Label, stroke.Color, space);
        if (parted is null)
        {
            nameless.Add(line);
        }

        return new Lines(parted ?? [course.Whole()], stroke) { Name = line.Name };
    }

    /// <summary>Over the axis of water content, from 0 on. Density falls as water rises, so a line comes into the plot once or not at all.</summary>
    private static List<Course> Courses(PhaseLine line, Plot plot)
    {
        var range = plot.X.Range;
        var from = Math.Max(0, range.From);
        return from >= range.To ? [] : Course.Clipped(
            [.. Enumerable.Range(0, Samples + 1)
                .Select(sample => from + ((range.To - from) * sample / Samples))
                .Select(water => plot.At(new ChartPoint(water, line.DryDensityAt(water))))],
            plot.Area);
    }
}
