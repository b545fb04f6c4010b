using Drypeak.Figures.Drawing;

namespace Drypeak.Figures.Layout;

/// <summary>The rectangle between the axes, and where numbers stand in it.</summary>
internal sealed class Plot
{
    private const double LeastTickDistanceUpward = 44;
    private const double LeastTickDistanceToTheRight = 80;

    /// <summary>More ticks than this do not make a value easier to read.</summary>
    private const double MostTicks = 12;

    private Plot(Area area, double below, View view, IAxisTicks xTicks, IAxisTicks yTicks, SecondScale? second)
    {
        Area = area;
        Below = below;
        X = new LinearScale(view.X, area.Left, area.Right);
        Y = new LinearScale(view.Y, area.Bottom, area.Top);
        XTicks = xTicks;
        YTicks = yTicks;
        Second = second;
    }

    public Area Area { get; }

    /// <summary>px under the titles of the axes that are kept for the key.</summary>
    public double Below { get; }

    public LinearScale X { get; }

    public LinearScale Y { get; }

    public IAxisTicks XTicks { get; }

    public IAxisTicks YTicks { get; }

    /// <summary>The axis upward once more in another unit, or null.</summary>
    public SecondScale? Second { get; }

    public Place At(DataPoint point) => new(X.At(point.X), Y.At(point.Y));

    public Place At(ChartPoint point) => At(point.Data);

    public Place At(PlotPoint point) => At(new DataPoint(point.X, point.Y));

    /// <summary>The rectangle that the heading, the ticks and the titles of the axes leave.</summary>
    /// <param name="view">The ranges.</param>
    /// <param name="headingBottom">px from the top.</param>
    /// <param name="below">px that the key takes under the titles of the axes.</param>
    /// <param name="words">For the width of the labels.</param>
    /// <param name="size">The picture's size.</param>
    /// <param name="type">Sizes of text and marks.</param>
    public static Plot Lay(View view, double headingBottom, double below, AxisWords words, FigureSize size, TypeScale type)
    {
        var plot = LayAsIs(view, headingBottom, below, words, size, type);
        if (!view.SameScale)
        {
            return plot;
        }

        // The labels of the wider range may need another margin, which changes the shape a little: hence twice.
        plot = LayAsIs(view.Shaped(plot.Area), headingBottom, below, words, size, type);
        var shaped = view.Shaped(plot.Area);
        return new Plot(plot.Area, below, shaped, XTicksOf(shaped, plot.Area.Width, words, type), YTicksOf(shaped, MostUpward(plot.Area.Height, type)), plot.Second);
    }

    private static Plot LayAsIs(View view, double headingBottom, double below, AxisWords words, FigureSize size, TypeScale type)
    {
        var top = headingBottom + Axes.HeightAbove(type);
        var bottom = size.Height - Axes.HeightBelow(type) - below;
        var mostTicks = MostUpward(bottom - top, type);
        var yTicks = YTicksOf(view, mostTicks);
        var second = words.Second is { } axis ? SecondScale.Of(view.Y, axis, mostTicks) : null;

        var labelWidth = LabelWidths(yTicks, words, type)
            .Append(words.YValue is { } value ? EmbeddedFont.SemiBold.Measure(value.Text, type.Value) : 0)
            .Max();
        var left = Math.Round(Math.Min(type.Margin + labelWidth + Axes.LabelGap(type), size.Width * 0.45)) + 0.5;
        var rightLabels = second is null ? 0 : Math.Min(LabelWidths(second.Ticks, words, type).DefaultIfEmpty(0).Max() + Axes.LabelGap(type), size.Width * 0.25);
        var right = Math.Floor(size.Width - type.Margin - rightLabels);
        return new Plot(
            new Area(left, Math.Ceiling(top) + 0.5, right, Math.Floor(bottom) - 0.5), below, view, XTicksOf(view, right - left, words, type), yTicks, second);
    }

    private static double MostUpward(double height, TypeScale type) => Math.Clamp(height / (LeastTickDistanceUpward * type.Unit), 1, MostTicks);

    private static IAxisTicks YTicksOf(View view, double most) => view.YNames is { } names ? names : Ticks.Within(view.Y, most);

    private static IAxisTicks XTicksOf(View view, double width, AxisWords words, TypeScale type) => view.XNames is { } names ? names : RoomyTicks(view.X, width, words, type);

    private static IEnumerable<double> LabelWidths(IAxisTicks ticks, AxisWords words, TypeScale type) =>
        ticks.Values.Select(value => EmbeddedFont.Regular.Measure(words.Number(ticks.Label(value)), type.Label));

    /// <summary>As fine as the labels leave room between them.</summary>
    private static Ticks RoomyTicks(Interval range, double width, AxisWords words, TypeScale type)
    {
        var most = Math.Clamp(width / (LeastTickDistanceToTheRight * type.Unit), 1, MostTicks);
        while (true)
        {
            var ticks = Ticks.Within(range, most);
            var widest = LabelWidths(ticks, words, type).DefaultIfEmpty(0).Max();
            var distance = width * ticks.Step / range.Span;
            if (distance >= widest + type.Label || most <= 1)
            {
                return ticks;
            }

            most = Math.Max(1, most * 0.75);
        }
    }
}
