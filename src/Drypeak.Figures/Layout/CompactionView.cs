using Drypeak.Soil.Quantities;

namespace Drypeak.Figures.Layout;

/// <summary>The ranges of a compaction figure: everything measured or reported with room about it, and no more.</summary>
internal static class CompactionView
{
    private const double RoomBeside = 0.07;
    private const double RoomBelow = 0.09;
    private const double RoomAbove = 0.14;

    /// <summary>By how much of the range of density the view grows for the band at most, on either side.</summary>
    private const double BandReach = 0.1;

    /// <summary>Where the zero-air-voids line should have come into view, as a share of the range of water content.</summary>
    private const double WetPartWithLine = 0.85;

    /// <summary>By how much of the range of density the view grows for it at most.</summary>
    private const double MostGrowthForLine = 0.4;

    public static View Of(CompactionChart chart, PhaseLines lines)
    {
        // What a soil compacts to: it sets the range only where nothing else does.
        var typical = new Density(1800).In(chart.DensityUnit);
        var water = Interval.Of(Marked(chart).Select(point => point.WaterContent)) ?? Interval.Of(12);
        var density = Interval.Of(Marked(chart).Select(point => point.DryDensity)) ?? Interval.Of(typical);
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

        // The band where it is narrow; where it widens it may be cut.
        var reachOfBand = new Interval(density.From - (density.Span * BandReach), density.To + (density.Span * BandReach));
        foreach (var point in chart.Band ?? [])
        {
            density = density.With(reachOfBand.Clamp(point.Lower)).With(reachOfBand.Clamp(point.Upper));
        }

        // As much of the zone as its tests and the curve are near to.
        var reachAcross = new Interval(water.From - (water.Span / 4), water.To + (water.Span / 4));
        foreach (var corner in chart.Zone?.Corners ?? [])
        {
            water = water.With(reachAcross.Clamp(corner.WaterContent));
            density = density.With(reach.Clamp(corner.DryDensity));
        }

        water = water.AtLeast(Math.Max(2, water.Magnitude * 1e-3));
        density = density.AtLeast(Math.Max(typical * 0.03, density.Magnitude * 1e-3));
        water = water.Padded(RoomBeside, RoomBeside);
        density = density.Padded(RoomBelow, RoomAbove);
        return new View(water, WithZeroAirVoids(density, lines.ZeroAirVoidsAt(water.From + (water.Span * WetPartWithLine))));
    }

    private static IEnumerable<ChartPoint> Marked(CompactionChart chart) =>
        chart.Specimens.Select(specimen => specimen.Point)
            .Concat(chart.Optima.Select(optimum => optimum.Point))
            .Concat(chart.FieldTests.Select(test => test.Point));

    /// <summary>A zero-air-voids line a little above the points comes into view; one far above stays out.</summary>
    private static Interval WithZeroAirVoids(Interval density, double? zeroAirVoids) =>
        zeroAirVoids is { } line && line < density.To + (density.Span * MostGrowthForLine) ? density.With(line) : density;
}
