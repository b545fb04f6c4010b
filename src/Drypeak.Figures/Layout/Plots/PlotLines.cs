using Drypeak.Figures.Drawing;

namespace Drypeak.Figures.Layout.Plots;

/// <summary>The lines of a plot, as far as they run within it, each with its name at it where there is room.</summary>
internal sealed class PlotLines(PlotChart chart, Plot plot, TypeScale type, Theme theme)
{
    private readonly List<(PlotLine Line, List<Course> Courses)> _drawn =
        [.. chart.Lines.Select(line => (line, Course.Clipped([.. line.Points.Select(plot.At)], plot.Area))).Where(drawn => drawn.Item2.Count > 0)];

    public void Block(LabelSpace space)
    {
        foreach (var (line, courses) in _drawn)
        {
            courses.ForEach(course => space.Block(line.Role == PlotLineRole.Quiet ? Barriers.PhaseLines : Barriers.Curve, course.Whole(), line));
        }
    }

    /// <summary>Places the names and draws the lines with gaps for those that stand in them.</summary>
    public FigurePart DrawLabeled(LabelSpace space, IReadOnlySet<object> keyed, ISet<object> nameless) =>
        new("lines", _drawn.ConvertAll(drawn => (Shape)DrawLabeled(drawn.Line, drawn.Courses, space, keyed, nameless)));

    private Lines DrawLabeled(PlotLine line, List<Course> courses, LabelSpace space, IReadOnlySet<object> keyed, ISet<object> nameless)
    {
        var stroke = PlotStyles.Of(line.Role, line.Dash, type, theme);
        var runs = courses.ConvertAll(course => course.Whole());
        var text = PlainText.Clean(line.Label ?? "");
        if (text.Length > 0 && !keyed.Contains(line))
        {
            var named = line.LabelAt == PlotLabelPlace.Along
                ? Along(line, courses, text, stroke, space)
                : AtEnd(line, courses, text, stroke, space) ? runs : null;
            if (named is null)
            {
                nameless.Add(line);
            }

            runs = named ?? runs;
        }

        return new Lines(runs, stroke) { Name = PlotStyles.Name(line.Role) };
    }

    /// <summary>In the longest part of the line.</summary>
    private List<IReadOnlyList<Place>>? Along(PlotLine line, List<Course> courses, string text, Stroke stroke, LabelSpace space)
    {
        var longest = courses.MaxBy(course => course.Length)!;
        return LineLabels.Place([text], line, longest, type.Label, stroke.Color, space) is { } parted
            ? [.. courses.Where(course => course != longest).Select(course => course.Whole()), .. parted]
            : null;
    }

    private bool AtEnd(PlotLine line, List<Course> courses, string text, Stroke stroke, LabelSpace space) =>
        space.Place(
            MarkLabels.Around(courses[^1].Places[^1], stroke.Width / 2, text, type.Label, stroke.Color, plot.Area.Width / 2).Select(label => label with { Name = "line-label" }),
            Barriers.All, line) is not null;
}
