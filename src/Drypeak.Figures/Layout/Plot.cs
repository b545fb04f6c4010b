using Drypeak.Figures.Drawing;

namespace Drypeak.Figures.Layout;

/// <summary>The rectangle between the axes, and where numbers stand in it.</summary>
internal sealed class Plot
{
    private const double LeastDensityTickDistance = 44;
    private const double LeastWaterTickDistance = 80;

    /// <summary>More ticks than this do not make a value easier to read.</summary>
    private const double MostTicks = 12;

    private Plot(Area area, View view, Ticks waterTicks, Ticks densityTicks, SecondScale? second)
    {
        Area = area;
        Water = new LinearScale(view.WaterContent, area.Left, area.Right);
        Density = new LinearScale(view.DryDensity, area.Bottom, area.Top);
        WaterTicks = waterTicks;
        DensityTicks = densityTicks;
        Second = second;
    }

    public Area Area { get; }

    public LinearScale Water { get; }

    public LinearScale Density { get; }

    public Ticks WaterTicks { get; }

    public Ticks DensityTicks { get; }

    /// <summary>The density once more in another unit, or null.</summary>
    public SecondScale? Second { get; }

    public Place At(ChartPoint point) => new(Water.At(point.WaterContent), Density.At(point.DryDensity));

    /// <summary>The rectangle that the heading, the ticks and the titles of the axes leave.</summary>
    /// <param name="view">The ranges.</param>
    /// <param name="headingBottom">px from the top.</param>
    /// <param name="wording">For the value of the result, which stands among the labels of the density axis.</param>
    /// <param name="size">The picture's size.</param>
    /// <param name="type">Sizes of text and marks.</param>
    public static Plot Lay(View view, double headingBottom, Wording wording, FigureSize size, TypeScale type)
    {
        var top = headingBottom + Axes.HeightAbove(type);
        var bottom = size.Height - Axes.HeightBelow(type);
        var mostTicks = Math.Clamp((bottom - top) / (LeastDensityTickDistance * type.Unit), 1, MostTicks);
        var densityTicks = Ticks.Within(view.DryDensity, mostTicks);
        var second = wording.SecondUnitRatio is { } ratio ? SecondScale.Of(view.DryDensity, ratio, mostTicks) : null;

        var labelWidth = LabelWidths(densityTicks, wording, type)
            .Append(wording.Result is { } result ? EmbeddedFont.SemiBold.Measure(wording.BareDensity(result), type.Value) : 0)
            .Max();
        var left = Math.Round(Math.Min(type.Margin + labelWidth + Axes.LabelGap(type), size.Width * 0.45)) + 0.5;
        var rightLabels = second is null ? 0 : Math.Min(LabelWidths(second.Ticks, wording, type).DefaultIfEmpty(0).Max() + Axes.LabelGap(type), size.Width * 0.25);
        var right = Math.Floor(size.Width - type.Margin - rightLabels);
        var waterTicks = WaterTicksWithin(view.WaterContent, right - left, type);
        return new Plot(new Area(left, Math.Ceiling(top) + 0.5, right, Math.Floor(bottom) - 0.5), view, waterTicks, densityTicks, second);
    }

    private static IEnumerable<double> LabelWidths(Ticks ticks, Wording wording, TypeScale type) =>
        ticks.Values.Select(value => EmbeddedFont.Regular.Measure(wording.Number(ticks.Label(value)), type.Label));

    /// <summary>As fine as the labels leave room between them.</summary>
    private static Ticks WaterTicksWithin(Interval range, double width, TypeScale type)
    {
        var most = Math.Clamp(width / (LeastWaterTickDistance * type.Unit), 1, MostTicks);
        while (true)
        {
            var ticks = Ticks.Within(range, most);
            var widest = ticks.Values.Select(value => EmbeddedFont.Regular.Measure(ticks.Label(value), type.Label)).DefaultIfEmpty(0).Max();
            var distance = width * ticks.Step / range.Span;
            if (distance >= widest + type.Label || most <= 1)
            {
                return ticks;
            }

            most = Math.Max(1, most * 0.75);
        }
    }
}
