namespace Drypeak.Soil.Curves;

/// <summary>How far a fitted curve is known at a water content.</summary>
/// <param name="WaterContent">Fraction.</param>
/// <param name="Lower">Lower end of the pointwise 95 % interval of the curve, kg/m³.</param>
/// <param name="Upper">Upper end, kg/m³.</param>
public readonly record struct BandPoint(double WaterContent, double Lower, double Upper);

/// <summary>
/// The pointwise 95 % interval of a fitted curve over the tested range: of the curve itself, not of a further specimen. It holds for each
/// water content alone, not for all at once.
/// </summary>
internal static class CurveBand
{
    private const int Steps = 32;

    /// <summary>
    /// Of the averaged model: the spread of its nodes about the curve drawn, each with its own uncertainty of level and scale, in as many
    /// deviations as its interval of the maximum. On simulated soils tested with care it holds the true curve at 99 % of all places: the model
    /// allows each point the noise of a usual laboratory. Null where the peak lies probably outside.
    /// </summary>
    public static BandPoint[]? OfAveraged(TestedPoints points)
    {
        Span<PeakNode> nodes = stackalloc PeakNode[PeakNodes.Count];
        var mixture = AveragedModel.Weigh(points, nodes);
        if (mixture.ChanceOutside > AveragedModel.GreatestChanceOutside)
        {
            return null;
        }

        var curve = new AlignedCurve(points, nodes, mixture, stackalloc double[AlignedCurve.Scales]);
        Span<double> gradient = stackalloc double[LiSegoCurve.Parameters];
        var band = new BandPoint[Steps + 1];
        for (var i = 0; i <= Steps; i++)
        {
            var w = WaterContent(points, i);
            var density = curve.Density(w);
            var squares = 0.0;
            foreach (ref readonly var node in nodes)
            {
                if (node.Weight > NegligibleShare * mixture.Total)
                {
                    squares += node.Weight * SquareOf(node, points, w, density);
                }
            }

            if (mixture is { SaturationWeight: > 0, Saturation: { } saturation })
            {
                var off = saturation.Curve.Density(w, gradient) - density;
                squares += mixture.SaturationWeight * (saturation.Variance(gradient) + (off * off));
            }

            band[i] = Point(points, w, density, AveragedModel.HalfLength * Math.Sqrt(squares / mixture.Total));
        }

        return band;
    }

    /// <summary>Of a polynomial: from its coefficients' covariance, with Student's t. Null without a degree of freedom.</summary>
    public static BandPoint[]? Of(TestedPoints points, Polynomial? fit)
    {
        if (fit is null or { DegreesOfFreedom: 0 })
        {
            return null;
        }

        var quantile = Intervals.Student(fit.DegreesOfFreedom);
        return Band(points, w =>
        {
            Span<double> powers = stackalloc double[fit.Coefficients.Length];
            Polynomial.Powers(fit.Scaled(w), powers);
            return (fit.Density(w), quantile * Math.Sqrt(fit.NoiseVariance * fit.UnitVariance(powers)));
        });
    }

    /// <summary>Of the saturation model: normal, from the information at the mode.</summary>
    public static BandPoint[] Of(TestedPoints points, SaturationMode mode) => Band(points, w =>
    {
        Span<double> gradient = stackalloc double[LiSegoCurve.Parameters];
        var density = mode.Curve.Density(w, gradient);
        return (density, Intervals.Normal * Math.Sqrt(mode.Variance(gradient)));
    });

    /// <summary>Of the spline: normal, by the noise that the averaged model assumes of each point.</summary>
    public static BandPoint[] Of(TestedPoints points, NaturalSpline spline) =>
        Band(points, w => (spline.Density(w), Intervals.Normal * LegSums.Noise * Math.Sqrt(spline.UnitVariances(w).OfDensity)));

    /// <summary>Nodes with less than this share of the weight move the band by less than a thousandth of its width.</summary>
    private const double NegligibleShare = 1e-6;

    /// <summary>Square about the curve drawn that a node expects at a water content.</summary>
    private static double SquareOf(in PeakNode node, TestedPoints points, double waterContent, double density)
    {
        var drop = node.DropAt(waterContent, points, out var leg);
        var off = node.Level - (leg.Scale * drop) - density;

        // The scale's mean moves with the level by q·S1: what the level gains, the drop takes back in part.
        var onLevel = 1 - (leg.ScaleVariance * leg.Drops * drop);
        return (off * off) + (onLevel * onLevel * node.LevelVariance) + (leg.ScaleVariance * drop * drop);
    }

    private static BandPoint[] Band(TestedPoints points, Func<double, (double Density, double Half)> at)
    {
        var band = new BandPoint[Steps + 1];
        for (var i = 0; i <= Steps; i++)
        {
            var w = WaterContent(points, i);
            var (density, half) = at(w);
            band[i] = Point(points, w, density, half);
        }

        return band;
    }

    private static double WaterContent(TestedPoints points, int step) => step == Steps ? points.Wettest : points.Driest + (points.Range * step / Steps);

    /// <summary>Under the zero-air-voids line, where all points are and the curve is drawn under it.</summary>
    private static BandPoint Point(TestedPoints points, double waterContent, double density, double half)
    {
        var top = points.AnyAboveZeroAirVoids ? double.PositiveInfinity : points.ZeroAirVoids(waterContent);
        return new(waterContent, TestedPoints.ToKilograms(Math.Min(density, top) - half), TestedPoints.ToKilograms(Math.Min(density + half, top)));
    }
}
