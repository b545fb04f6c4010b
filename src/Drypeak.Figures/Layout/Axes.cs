using Drypeak.Figures.Drawing;

namespace Drypeak.Figures.Layout;

/// <summary>The two axes: their lines, ticks, labels and titles, and the hairlines that lead from the ticks through the plot.</summary>
internal sealed class Axes(Plot plot, Wording wording, FigureSize size, TypeScale type, Theme theme)
{
    /// <summary>From the baseline of the density axis's title to the plot, in sizes of its text.</summary>
    private const double TitleAboveAxis = 1.2;

    /// <summary>From the axis of water content down to the baseline of its labels, px.</summary>
    public static double LabelBaseline(TypeScale type) => type.TickLength + (1.15 * type.Label);

    /// <summary>From the labels of the density axis to the axis, px.</summary>
    public static double LabelGap(TypeScale type) => type.TickLength + (0.45 * type.Label);

    /// <summary>From the heading to the plot: the title of the density axis, clear of that axis's topmost label, px.</summary>
    public static double HeightAbove(TypeScale type) => (0.5 + EmbeddedFont.Regular.Ascent + TitleAboveAxis) * type.AxisTitle;

    /// <summary>From the plot to the lower edge: the labels of water content, then the title of their axis, px.</summary>
    public static double HeightBelow(TypeScale type) =>
        LabelBaseline(type) + (EmbeddedFont.SemiBold.Descent * type.Value) + (EmbeddedFont.Regular.Ascent * type.AxisTitle) + WaterTitleDepth(type);

    public FigurePart Grid() => new("grid",
    [
        new Lines(
            [
                .. plot.WaterTicks.Values.Select(plot.Water.At).Select(Crisp).Where(x => x > plot.Area.Left).Select(x => Segment(x, plot.Area.Top, x, plot.Area.Bottom)),
                .. plot.DensityTicks.Values.Select(plot.Density.At).Select(Crisp).Where(y => y < plot.Area.Bottom).Select(y => Segment(plot.Area.Left, y, plot.Area.Right, y)),
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
                    .. plot.WaterTicks.Values.Select(plot.Water.At).Select(Crisp).Select(x => Segment(x, bottom, x, bottom + length)),
                    .. plot.WaterTicks.Halves.Select(plot.Water.At).Select(Crisp).Select(x => Segment(x, bottom, x, bottom + (length / 2))),
                    .. plot.DensityTicks.Values.Select(plot.Density.At).Select(Crisp).Select(y => Segment(left - length, y, left, y)),
                    .. plot.DensityTicks.Halves.Select(plot.Density.At).Select(Crisp).Select(y => Segment(left - (length / 2), y, left, y)),
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
            values.Select(second.InFirst).Select(plot.Density.At).Select(Crisp).Select(y => Segment(right, y, right + length, y));
        return [Segment(right, plot.Area.Bottom, right, plot.Area.Top), .. Marks(second.Ticks.Values, type.TickLength), .. Marks(second.Ticks.Halves, type.TickLength / 2)];
    }

    public void Block(LabelSpace space) =>
        space.Block(Barriers.Axes, [new(plot.Area.Left, plot.Area.Top), new(plot.Area.Left, plot.Area.Bottom), new(plot.Area.Right, plot.Area.Bottom)]);

    /// <summary>Places the titles, then the values of the result, then the labels of those ticks that leave them room.</summary>
    public void Label(LabelSpace space)
    {
        space.PlaceEach(Titles());
        if (wording.Result is { } result)
        {
            space.PlaceEach([WaterValue(result), DensityValue(result)]);
        }

        space.PlaceEach(TickLabels());
        space.PlaceEach(SecondTickLabels());
    }

    /// <summary>The titles: over the density axis, where it is read without turning one's head, and under the axis of water content.</summary>
    private IEnumerable<TextRun> Titles()
    {
        yield return Title(wording.DensityAxis, new Place(type.Margin, plot.Area.Top - (TitleAboveAxis * type.AxisTitle)), TextAnchor.Start);
        if (wording.SecondAxis is { } second)
        {
            yield return Title(second, new Place(size.Width - type.Margin, plot.Area.Top - (TitleAboveAxis * type.AxisTitle)), TextAnchor.End);
        }

        yield return Title(wording.WaterAxis, new Place(plot.Area.Right, size.Height - WaterTitleDepth(type)), TextAnchor.End);
    }

    /// <summary>A value of the result under the axis of water content.</summary>
    private TextRun WaterValue(ChartOptimum optimum)
    {
        var text = wording.BareWater(optimum);
        var half = EmbeddedFont.SemiBold.Measure(text, type.Value) / 2;
        var x = Math.Min(plot.Water.At(optimum.WaterContent), size.Width - half - 1);
        return new TextRun(text, new Place(x, plot.Area.Bottom + LabelBaseline(type)), type.Value, EmbeddedFont.SemiBold, ColorRole.Clay, TextAnchor.Middle);
    }

    /// <summary>A value of the result left of the density axis.</summary>
    private TextRun DensityValue(ChartOptimum optimum)
    {
        var place = new Place(plot.Area.Left - LabelGap(type), plot.Density.At(optimum.MaximumDryDensity) + (0.33 * type.Value));
        return new TextRun(wording.BareDensity(optimum), place, type.Value, EmbeddedFont.SemiBold, ColorRole.Clay, TextAnchor.End);
    }

    /// <summary>The labels of the ticks, those of water content first.</summary>
    private IEnumerable<TextRun> TickLabels()
    {
        foreach (var value in plot.WaterTicks.Values)
        {
            var place = new Place(plot.Water.At(value), plot.Area.Bottom + LabelBaseline(type));
            yield return TickLabel(wording.Number(plot.WaterTicks.Label(value)), place, TextAnchor.Middle);
        }

        foreach (var value in plot.DensityTicks.Values)
        {
            var place = new Place(plot.Area.Left - LabelGap(type), plot.Density.At(value) + (0.33 * type.Label));
            yield return TickLabel(wording.Number(plot.DensityTicks.Label(value)), place, TextAnchor.End);
        }
    }

    private IEnumerable<TextRun> SecondTickLabels()
    {
        foreach (var value in plot.Second?.Ticks.Values ?? [])
        {
            var place = new Place(plot.Area.Right + LabelGap(type), plot.Density.At(plot.Second!.InFirst(value)) + (0.33 * type.Label));
            yield return TickLabel(wording.Number(plot.Second.Ticks.Label(value)), place, TextAnchor.Start);
        }
    }

    private static double WaterTitleDepth(TypeScale type) => (0.5 * type.Margin) + (EmbeddedFont.Regular.Descent * type.AxisTitle);

    private TextRun Title(string text, Place at, TextAnchor anchor) => new(text, at, type.AxisTitle, EmbeddedFont.Regular, ColorRole.Ink, anchor);

    private TextRun TickLabel(string text, Place at, TextAnchor anchor) => new(text, at, type.Label, EmbeddedFont.Regular, ColorRole.Quiet, anchor);

    private static Place[] Segment(double fromX, double fromY, double toX, double toY) => [new(fromX, fromY), new(toX, toY)];

    /// <summary>A line of 1 px is sharp where its middle is the middle of a pixel.</summary>
    private static double Crisp(double coordinate) => Math.Floor(coordinate) + 0.5;
}
