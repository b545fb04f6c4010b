using Drypeak.Soil.Quantities;

namespace Drypeak.Figures.Layout;

/// <summary>The ranges of the two axes: everything measured or reported with room about it, and no more.</summary>
/// <param name="WaterContent">%.</param>
/// <param name="DryDensity">In the chart's unit.</param>
internal sealed record View(Interval WaterContent, Interval DryDensity)
{
    private const double RoomBeside = 0.07;
    private const double RoomBelow = 0.09;
    private const double RoomAbove = 0.14;

    /// <summary>Where the zero-air-voids line should have come into view, as a share of the range of water content.</summary>
    private const double WetPartWithLine = 0.85;

    /// <summary>By how much of the range of density the view grows for it at most.</summary>
    private const double MostGrowthForLine = 0.4;

    public static View Of(CompactionChart chart, PhaseLines lines)
    {
        // What a soil compacts to: it sets the range only where nothing else does.
        var typical = new Density(1800).In(chart.DensityUnit);
        var water = Range(Marked(chart).Select(point => point.WaterContent), fallback: 12);
        var density = Range(Marked(chart).Select(point => point.DryDensity), typical);
        if (chart.NextSpecimen is { } next)
        {
            water = water.With(next);
        }

        // A curve that runs away between or beyond its points must not press them flat.
        var reach = new Interval(density.From - (density.Span / 2), density.To + (density.Span / 2));
        foreach (var point in chart.Curve)
        {
            water = water.With(point.WaterContent);
            density = density.With(reach.Clamp(point.DryDensity));
        }

        water = water.AtLeast(Math.Max(2, Magnitude(water) * 1e-3));
        density = density.AtLeast(Math.Max(typical * 0.03, Magnitude(density) * 1e-3));
        water = Padded(water, RoomBeside, RoomBeside);
        density = Padded(density, RoomBelow, RoomAbove);
        return new View(water, WithZeroAirVoids(density, lines.ZeroAirVoidsAt(water.From + (water.Span * WetPartWithLine))));
    }

    private static IEnumerable<ChartPoint> Marked(CompactionChart chart) =>
        chart.Specimens.Select(specimen => specimen.Point)
            .Concat(chart.Optima.Select(optimum => optimum.Point));

    private static Interval Range(IEnumerable<double> values, double fallback)
    {
        Interval? range = null;
        foreach (var value in values)
        {
            range = range?.With(value) ?? Interval.Of(value);
        }

        return range ?? Interval.Of(fallback);
    }

    private static double Magnitude(Interval range) => Math.Max(Math.Abs(range.From), Math.Abs(range.To));

    /// <summary>Room at both ends, but not below 0 for what cannot be negative.</summary>
    private static Interval Padded(Interval range, double before, double after)
    {
        var from = range.From - (range.Span * before);
        return new Interval(range.From >= 0 ? Math.Max(0, from) : from, range.To + (range.Span * after));
    }

    /// <summary>A zero-air-voids line a little above the points comes into view; one far above stays out.</summary>
    private static Interval WithZeroAirVoids(Interval density, double? zeroAirVoids) =>
        zeroAirVoids is { } line && line < density.To + (density.Span * MostGrowthForLine) ? density.With(line) : density;
}
