using Drypeak.Figures.Drawing;

namespace Drypeak.Figures.Layout.Plots;

/// <summary>The ranges of a plot: all that is drawn with room about it, or as the chart asks.</summary>
internal static class PlotView
{
    private const double Room = 0.06;

    /// <summary>A range no wider than this share of its numbers would have ticks that cannot be told apart.</summary>
    private const double LeastSpan = 1e-6;

    /// <summary>Most letters of a named place, in widths of a digit.</summary>
    private const int LongestName = 16;

    public static View Of(PlotChart chart) => new(
        Range(chart.X, chart.Marks.Select(mark => mark.X).Concat(Limits(chart, upright: true)), Points(chart).Select(point => point.X)),
        Range(chart.Y, chart.Marks.Select(mark => mark.Y).Concat(Limits(chart, upright: false)), Points(chart).Select(point => point.Y)))
    {
        XNames = Names(chart.X),
        YNames = Names(chart.Y),
        SameScale = chart.SameScale,
    };

    private static IEnumerable<PlotPoint> Points(PlotChart chart) => chart.Lines.SelectMany(line => line.Points).Concat(chart.Areas.SelectMany(area => area.Corners));

    private static IEnumerable<double> Limits(PlotChart chart, bool upright) => chart.Limits.Where(limit => limit.Upright == upright).Select(limit => limit.Value);

    /// <summary>A fixed end holds against lines and areas, which are cut there, but nothing marked may be lost.</summary>
    private static Interval Range(PlotAxis axis, IEnumerable<double> marked, IEnumerable<double> drawn)
    {
        var positions = (axis.Positions ?? []).Select(position => position.At);
        var must = Interval.Of(marked.Concat(positions));
        var all = Interval.Of(drawn) is { } others ? must?.With(others.From).With(others.To) ?? others : must;
        var free = all ?? Interval.Of(axis.From ?? axis.To ?? 0);
        free = free.AtLeast(Math.Max(free.Magnitude * LeastSpan, free.Span > 0 ? 0 : Math.Max(free.Magnitude * 0.1, 1e-3)));
        free = axis.Positions is null ? free.Padded(Room, Room) : new Interval(free.From - 0.6, free.To + 0.6);

        var from = axis.From is { } begin ? Math.Min(begin, must?.From ?? begin) : free.From;
        var to = axis.To is { } end ? Math.Max(end, must?.To ?? end) : free.To;

        // One end may be fixed beyond all that is drawn.
        var least = Math.Max(new Interval(from, to).Magnitude * LeastSpan, 1e-9);
        return to - from >= least ? new Interval(from, to) : axis.From is { } ? new Interval(from, from + Math.Max(1, from * 0.1)) : new Interval(to - Math.Max(1, Math.Abs(to) * 0.1), to);
    }

    private static NamedTicks? Names(PlotAxis axis) => axis.Positions is { Count: > 0 } positions
        ? new NamedTicks([.. positions.Select(position => (position.At, PlainText.Elide(PlainText.Clean(position.Name), EmbeddedFont.Regular, 1, LongestName * 0.5)))])
        : null;
}
