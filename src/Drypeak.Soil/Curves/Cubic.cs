namespace Drypeak.Soil.Curves;

/// <summary>The least-squares cubic, from five points: with four it would pass through all of them and say nothing of their scatter.</summary>
internal static class Cubic
{
    /// <summary>Of the polynomial.</summary>
    public const int Degree = 3;
    private const int FewestPoints = 5;

    private const string TooFew = "A cubic needs five points, at four or more different water contents.";

    /// <summary>Fits the points.</summary>
    public static FittedCurve Fit(TestedPoints points)
    {
        if (points.Count < FewestPoints || Polynomial.Fit(points, Degree) is not { } fit)
        {
            return Candidate.NotFitted(CurveModel.Cubic, TooFew);
        }

        var c = fit.Coefficients;
        var optimum = Polynomial.FallingRoot(3 * c[3], 2 * c[2], c[1]) is { } t && Candidate.IsPeak(points, fit, fit.WaterContent(t))
            ? Optimum(fit, t)
            : null;
        return Candidate.Complete(CurveModel.Cubic, points, fit, optimum, fit.Predictions(points)) with
        {
            Parameters = fit.Parameters(),
            DegreesOfFreedom = fit.DegreesOfFreedom,
        };
    }

    /// <summary>Delta method with Student's t: the slope's error at the peak over the curvature, and the error of the curve there.</summary>
    private static FittedOptimum Optimum(Polynomial fit, double t)
    {
        var curvature = (2 * fit.Coefficients[2]) + (6 * fit.Coefficients[3] * t);
        var move = -1 / curvature;
        var peak = new PeakEstimate(
            fit.WaterContent(t),
            fit.At(t),
            fit.NoiseVariance * fit.UnitVariance([0, move, 2 * t * move, 3 * t * t * move]) * fit.Unit * fit.Unit,
            fit.NoiseVariance * fit.UnitVariance([1, t, t * t, t * t * t]));
        return Intervals.Symmetric(peak, Intervals.Student(fit.DegreesOfFreedom));
    }
}
