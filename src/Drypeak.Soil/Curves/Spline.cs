using System.Globalization;

namespace Drypeak.Soil.Curves;

/// <summary>
/// The natural cubic spline through the points: what a hand draws. It has no residuals that could tell its noise, so that its uncertainty is that of
/// independent points with the noise that the averaged model assumes, carried to the peak by the delta method.
/// </summary>
internal static class Spline
{
    private const string TooFew = "A spline with a peak needs three points at different water contents.";

    /// <summary>Fits the points.</summary>
    public static FittedCurve Fit(TestedPoints points)
    {
        if (points.DistinctCount < AveragedModel.FewestPoints)
        {
            return Candidate.NotFitted(CurveModel.Spline, TooFew);
        }

        var spline = new NaturalSpline(points);
        var peaks = spline.Peaks();
        peaks.RemoveAll(peak => peak <= points.Driest || peak >= points.Wettest);
        double? top = null;
        foreach (var peak in peaks)
        {
            top = top is { } best && spline.Density(best) >= spline.Density(peak) ? best : peak;
        }

        var optimum = top is { } highest && Candidate.IsPeak(points, spline, highest) ? Optimum(spline, highest) : null;
        var objection = peaks.Count > 1
            ? string.Create(CultureInfo.InvariantCulture, $"The spline has {peaks.Count} peaks inside the tested range.")
            : null;
        return Candidate.Complete(CurveModel.Spline, points, spline, optimum, Predictions(points, spline), objection) with
        {
            DegreesOfFreedom = points.Count - spline.Knots,
        };
    }

    private static FittedOptimum Optimum(NaturalSpline spline, double peak)
    {
        var (ofDensity, ofSlope) = spline.UnitVariances(peak);
        var curvature = spline.Curvature(peak);
        var noise = LegSums.Noise * LegSums.Noise;
        return Intervals.Normally(new(peak, spline.Density(peak), noise * ofSlope / (curvature * curvature), noise * ofDensity));
    }

    /// <summary>A point that shares its water content is predicted by those that it shares it with.</summary>
    private static LeaveOneOut Predictions(TestedPoints points, NaturalSpline spline)
    {
        var withoutKnot = spline.WithoutEach();
        var predictions = new double[points.Count];
        for (var i = 0; i < predictions.Length; i++)
        {
            var knot = points.Distinct[i];
            var count = spline.CountAt(knot);
            predictions[i] = count == 1
                ? withoutKnot[knot]
                : spline.DensityAt(knot) + ((spline.DensityAt(knot) - points.Densities[i]) / (count - 1));
        }

        return LeaveOneOut.From(points, predictions, []);
    }
}
