using Drypeak.Figures.Drawing;

namespace Drypeak.Figures.Layout;

/// <summary>The two axes: their lines, ticks, labels and titles, and the hairlines that lead from the ticks through the plot.</summary>
internal sealed class Axes(Plot plot, AxisWords words, FigureSize size, TypeScale type, Theme theme)
{
    /// <summary>From the baseline of the upper axis title to the plot, in sizes of its text.</summary>
    private const double TitleAboveAxis = 1.2;

    /// <summary>From the axis to the right down to the baseline of its labels, px.</summary>
    public static double LabelBaseline(TypeScale type) => type.TickLength + (1.15 * type.Label);

    /// <summary>From the labels of the axis upward to the axis, px.</summary>
    public static double LabelGap(TypeScale type) => type.TickLength + (0.45 * type.Label);

    /// <summary>From the heading to the plot: the title of the axis upward, clear of that axis's topmost label, px.</summary>
    public static double HeightAbove(TypeScale type) => (0.5 + EmbeddedFont.Regular.Ascent + TitleAboveAxis) * type.AxisTitle;

    /// <summary>From the plot to the lower edge: the labels of the axis to the right, then its title, px.</summary>
    public static double HeightBelow(TypeScale type) =>
        LabelBaseline(type) + (EmbeddedFont.SemiBold.Descent * type.Value) + (EmbeddedFont.Regular.Ascent * type.AxisTitle) + XTitleDepth(type);

    public FigurePart Grid() => new("grid",
    [
        new Lines(
            [
                .. Lined(plot.XTicks).Select(plot.X.At).Select(Crisp).Where(x => x > plot.Area.Left).Select(x => Segment(x, plot.Area.Top, x, plot.Area.Bottom)),
                .. Lined(plot.YTicks).Select(plot.Y.At).Select(Crisp).Where(y => y < plot.Area.Bottom).Select(y => Segment(plot.Area.Left, y, plot.Area.Right, y)),
            ],
            new Stroke(ColorRole.Rule, theme.GridWidth)),
    ]);

    public FigurePart Frame()
    {
        var (left, bottom, length) = (plot.Area.Left, plot.Area.Bottom, type.TickLength);
        return new FigurePart("axes",
        [
            new Lines(
                [
                    [new(left, plot.Area.Top), new(left, bottom), new(plot.Area.Right, bottom)],
                    .. plot.XTicks.Values.Select(plot.X.At).Select(Crisp).Select(x => Segment(x, bottom, x, bottom + length)),
                    .. plot.XTicks.Halves.Select(plot.X.At).Select(Crisp).Select(x => Segment(x, bottom, x, bottom + (length / 2))),
                    .. plot.YTicks.Values.Select(plot.Y.At).Select(Crisp).Select(y => Segment(left - length, y, left, y)),
                    .. plot.YTicks.Halves.Select(plot.Y.At).Select(Crisp).Select(y => Segment(left - (length / 2), y, left, y)),
                    .. SecondAxis(),
                ],
                new Stroke(ColorRole.Ink, 1)),
        ]);
    }

    private IEnumerable<Place[]> SecondAxis()
    {
        if (plot.Second is not { } second)
        {
            return [];
        }

        var right = plot.Area.Right;
        IEnumerable<Place[]> Marks(IEnumerable<double> values, double length) =>
            values.Select(second.ToFirst).Select(plot.Y.At).Select(Crisp).Select(y => Segment(right, y, right + length, y));
        return [Segment(right, plot.Area.Bottom, right, plot.Area.Top), .. Marks(second.Ticks.Values, type.TickLength), .. Marks(second.Ticks.Halves, type.TickLength / 2)];
    }

    public void Block(LabelSpace space) =>
        space.Block(Barriers.Axes, [new(plot.Area.Left, plot.Area.Top), new(plot.Area.Left, plot.Area.Bottom), new(plot.Area.Right, plot.Area.Bottom)]);

    /// <summary>Places the titles, then the values of the result, then the labels of those ticks that leave them room.</summary>
    public void Label(LabelSpace space)
    {
        space.PlaceEach(Titles());
        space.PlaceEach(Values());
        space.PlaceEach(TickLabels());
        space.PlaceEach(SecondTickLabels());
    }

    /// <summary>The titles: over the axis upward, where it is read without turning one's head, and under the axis to the right.</summary>
    private IEnumerable<TextRun> Titles()
    {
        yield return Title(words.Y, new Place(type.Margin, plot.Area.Top - (TitleAboveAxis * type.AxisTitle)), TextAnchor.Start);
        if (words.Second is { } second)
        {
            yield return Title(second.Title, new Place(size.Width - type.Margin, plot.Area.Top - (TitleAboveAxis * type.AxisTitle)), TextAnchor.End);
        }

        yield return Title(words.X, new Place(plot.Area.Right, size.Height - plot.Below - XTitleDepth(type)), TextAnchor.End);
    }

    /// <summary>The values of the result: under the one axis, and left of the other.</summary>
    private IEnumerable<TextRun> Values()
    {
        if (words.XValue is { } right)
        {
            var half = EmbeddedFont.SemiBold.Measure(right.Text, type.Value) / 2;
            var x = Math.Min(plot.X.At(right.At), size.Width - half - 1);
            yield return Value(right.Text, new Place(x, plot.Area.Bottom + LabelBaseline(type)), TextAnchor.Middle);
        }

        if (words.YValue is { } up)
        {
            yield return Value(up.Text, new Place(plot.Area.Left - LabelGap(type), plot.Y.At(up.At) + (0.33 * type.Value)), TextAnchor.End);
        }
    }

    /// <summary>The labels of the ticks, those of the axis to the right first.</summary>
    private IEnumerable<TextRun> TickLabels()
    {
        foreach (var value in plot.XTicks.Values)
        {
            var place = new Place(plot.X.At(value), plot.Area.Bottom + LabelBaseline(type));
            yield return TickLabel(words.Number(plot.XTicks.Label(value)), place, TextAnchor.Middle);
        }

        foreach (var value in plot.YTicks.Values)
        {
            var place = new Place(plot.Area.Left - LabelGap(type), plot.Y.At(value) + (0.33 * type.Label));
            yield return TickLabel(words.Number(plot.YTicks.Label(value)), place, TextAnchor.End);
        }
    }

    private IEnumerable<TextRun> SecondTickLabels()
    {
        foreach (var value in plot.Second?.Ticks.Values ?? [])
        {
            var place = new Place(plot.Area.Right + LabelGap(type), plot.Y.At(plot.Second!.ToFirst(value)) + (0.33 * type.Label));
            yield return TickLabel(words.Number(plot.Second.Ticks.Label(value)), place, TextAnchor.Start);
        }
    }

    /// <summary>From the baseline of the title of the axis to the right to the lower edge, or to the key, px.</summary>
    public static double XTitleDepth(TypeScale type) => (0.5 * type.Margin) + (EmbeddedFont.Regular.Descent * type.AxisTitle);

    private TextRun Title(string text, Place at, TextAnchor anchor) => new(text, at, type.AxisTitle, EmbeddedFont.Regular, ColorRole.Ink, anchor);

    private TextRun Value(string text, Place at, TextAnchor anchor) => new(text, at, type.Value, EmbeddedFont.SemiBold, ColorRole.Clay, anchor);

    private TextRun TickLabel(string text, Place at, TextAnchor anchor) => new(text, at, type.Label, EmbeddedFont.Regular, ColorRole.Quiet, anchor);

    private static IEnumerable<double> Lined(IAxisTicks ticks) => ticks.HasGrid ? ticks.Values : [];

    private static Place[] Segment(double fromX, double fromY, double toX, double toY) => [new(fromX, fromY), new(toX, toY)];

    /// <summary>A line of 1 px is sharp where its middle is the middle of a pixel.</summary>
    private static double Crisp(double coordinate) => Math.Floor(coordinate) + 0.5;
}
