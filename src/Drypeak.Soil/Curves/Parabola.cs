namespace Drypeak.Soil.Curves;

/// <summary>The least-squares parabola.</summary>
internal static class Parabola
{
    /// <summary>Of the polynomial.</summary>
    public const int Degree = 2;

    private const string TooFew = "A parabola needs three points at different water contents.";

    /// <summary>Fits the points.</summary>
    public static FittedCurve Fit(TestedPoints points)
    {
        if (Polynomial.Fit(points, Degree) is not { } fit)
        {
            return Candidate.NotFitted(CurveModel.Parabola, TooFew);
        }

        var optimum = Polynomial.FallingRoot(0, 2 * fit.Coefficients[2], fit.Coefficients[1]) is { } t
            && Candidate.IsPeak(points, fit, fit.WaterContent(t))
                ? Optimum(fit, t)
                : null;
        return Candidate.Complete(CurveModel.Parabola, points, fit, optimum, fit.Predictions(points)) with
        {
            Parameters = fit.Parameters(),
            DegreesOfFreedom = fit.DegreesOfFreedom,
        };
    }

    private static FittedOptimum Optimum(Polynomial fit, double t)
    {
        if (fit.DegreesOfFreedom == 0)
        {
            return Intervals.Unknown(fit.WaterContent(t), fit.At(t));
        }

        // Delta method: t = −c1/(2·c2) moves by −1/(2·c2) a unit of c1 and by −2t/(2·c2) a unit of c2.
        var move = -1 / (2 * fit.Coefficients[2]);
        var peak = new PeakEstimate(
            fit.WaterContent(t),
            fit.At(t),
            fit.NoiseVariance * fit.UnitVariance([0, move, 2 * t * move]) * fit.Unit * fit.Unit,
            fit.NoiseVariance * fit.UnitVariance([1, t, t * t]));
        var (lower, upper) = Fieller(fit);
        var optimum = Intervals.Symmetric(peak, Intervals.Student(fit.DegreesOfFreedom));
        // Points on the parabola itself leave an interval of no length, whose ends rounding could put on one side of the vertex.
        return optimum with
        {
            WaterContent = optimum.WaterContent with
            {
                Lower = lower is { } low ? Math.Min(low, optimum.WaterContent.Value) : null,
                Upper = upper is { } high ? Math.Max(high, optimum.WaterContent.Value) : null,
            },
        };
    }

    /// <summary>
    /// The interval of the vertex by E. C. Fieller's theorem (Some problems in interval estimation, Journal of the Royal Statistical Society B 16
    /// (1954) 175–185): all t at which the slope c1 + 2·c2·t cannot be told from 0. Null where that is not one bounded interval,
    /// because the points do not show that the parabola bends.
    /// </summary>
    private static (double? Lower, double? Upper) Fieller(Polynomial fit)
    {
        var student = Intervals.Student(fit.DegreesOfFreedom);
        var limit = student * student * fit.NoiseVariance;
        var (b, c) = (fit.Coefficients[1], 2 * fit.Coefficients[2]);
        var square = (c * c) - (limit * 4 * fit.UnitCovariance(2, 2));
        var linear = (b * c) - (limit * 2 * fit.UnitCovariance(1, 2));
        var constant = (b * b) - (limit * fit.UnitCovariance(1, 1));
        if (!(square > 0))
        {
            return (null, null);
        }

        var (center, reach) = (-linear / square, Math.Sqrt(Math.Max(0, (linear * linear) - (square * constant))) / square);
        return (fit.WaterContent(center - reach), fit.WaterContent(center + reach));
    }
}
