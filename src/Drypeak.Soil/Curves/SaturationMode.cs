using MathNet.Numerics.RootFinding;

namespace Drypeak.Soil.Curves;

/// <summary>What is known of a Li–Sego curve before the points speak: normal, in the logarithms (of the odds for Sm).</summary>
/// <param name="OfSaturation">Deviation of logit Sm, about the odds of 91 %.</param>
/// <param name="OfWetEnd">Deviation of ln wm, about 1.05 times the greatest water content.</param>
/// <param name="OfShape">Deviation of ln n, about 6.</param>
/// <param name="OfDryLeg">Deviation of ln p, about 0.4 times the greatest water content.</param>
/// <param name="Noise">Standard deviation of a point about the curve, Mg/m³.</param>
internal readonly record struct SaturationPrior(double OfSaturation, double OfWetEnd, double OfShape, double OfDryLeg, double Noise)
{
    private static readonly double LogOddsOfSaturation = Math.Log(0.91 / 0.09);
    private static readonly double LogShape = Math.Log(6);

    /// <summary>Centres of (logit Sm, ln wm, ln n, ln p).</summary>
    public static void Centers(double greatestWaterContent, Span<double> centers)
    {
        centers[0] = LogOddsOfSaturation;
        centers[1] = Math.Log(1.05 * greatestWaterContent);
        centers[2] = LogShape;
        centers[3] = Math.Log(0.4 * greatestWaterContent);
    }

    /// <summary>Deviation of a parameter, in the order of the curve's parameters.</summary>
    public double Deviation(int parameter) => parameter switch
    {
        0 => OfSaturation,
        1 => OfWetEnd,
        2 => OfShape,
        _ => OfDryLeg,
    };
}

/// <summary>The peak of a curve with its variances.</summary>
/// <param name="WaterContent">Fraction.</param>
/// <param name="Density">Mg/m³.</param>
/// <param name="WaterContentVariance">Of the water content.</param>
/// <param name="DensityVariance">Of the density, (Mg/m³)².</param>
internal readonly record struct PeakEstimate(double WaterContent, double Density, double WaterContentVariance, double DensityVariance);

/// <summary>The most probable Li–Sego curve for some points and priors, and how sure it is (normal about the mode).</summary>
internal sealed class SaturationMode
{
    private const int Parameters = LiSegoCurve.Parameters;

    /// <summary>Step of the differences in water content.</summary>
    private const double Step = 2e-4;

    /// <summary>√½ of it: a difference of slopes over this step is a second difference of densities over that one, without its loss of digits.</summary>
    private const double CurvatureStep = 1.4142135623730951e-4;

    /// <summary>Intervals of the range that are searched for a peak; no Li–Sego curve has two within one.</summary>
    private const int SearchIntervals = 32;

    private const double PeakAccuracy = 1e-13;
    private const double LongestStep = 1;

    /// <summary>Where the gradient counts as vanished, for a fit to all digits and for a prediction to a hundredth of the noise.</summary>
    private const double RightAngle = 1e-12, NearRightAngle = 1e-4;

    private const int MostSteps = 1000;

    private readonly double[] parameters = new double[Parameters];
    private readonly double[] inverse = new double[Parameters * Parameters];

    private SaturationMode(TestedPoints points, double specificGravity, in SaturationPrior prior, ReadOnlySpan<double> start, double rightAngle)
    {
        start.CopyTo(parameters);
        var residuals = new Residuals(points, specificGravity, prior);
        SumOfSquares = GaussNewton.Minimize(residuals, parameters, LongestStep, MostSteps, rightAngle).SumOfSquares;
        LogDeterminant = residuals.InvertInformation(parameters, inverse);
        Curve = new LiSegoCurve(parameters, specificGravity, points.WaterDensity);
    }

    public LiSegoCurve Curve { get; }

    /// <summary>logit Sm, ln wm, ln n, ln p.</summary>
    public ReadOnlySpan<double> Values => parameters;

    /// <summary>χ² at the mode, the priors' squares included.</summary>
    public double SumOfSquares { get; }

    /// <summary>ln det of the covariance.</summary>
    public double LogDeterminant { get; }

    /// <summary>The highest place of the curve over the tested range, or null where that is at an end.</summary>
    public PeakEstimate? Peak { get; private set; }

    /// <summary>Fits the points from the priors' centers.</summary>
    public static SaturationMode Of(TestedPoints points, double specificGravity, in SaturationPrior prior)
    {
        Span<double> centers = stackalloc double[Parameters];
        SaturationPrior.Centers(points.Wettest, centers);
        var mode = new SaturationMode(points, specificGravity, prior, centers, RightAngle);
        mode.Peak = mode.FindPeak(points);
        return mode;
    }

    /// <summary>Fits other points from where this fit ended, to a hundredth of the noise, without looking for a peak.</summary>
    public SaturationMode Refit(TestedPoints others, double specificGravity, in SaturationPrior prior) =>
        new(others, specificGravity, prior, parameters, NearRightAngle);

    /// <summary>Variance of a function of the parameters with this gradient.</summary>
    public double Variance(ReadOnlySpan<double> gradient) => LeastSquares.Variance(inverse, gradient);

    /// <summary>Variance of one parameter.</summary>
    public double Variance(int parameter)
    {
        Span<double> gradient = stackalloc double[Parameters];
        gradient[parameter] = 1;
        return Variance(gradient);
    }

    private PeakEstimate? FindPeak(TestedPoints points)
    {
        var (found, highest) = (double.NaN, Math.Max(Curve.Density(points.Driest), Curve.Density(points.Wettest)));
        var (left, slopeLeft) = (points.Driest, Curve.Slope(points.Driest));
        for (var i = 1; i <= SearchIntervals; i++)
        {
            var right = points.Driest + (points.Range * i / SearchIntervals);
            var slopeRight = Curve.Slope(right);
            if (slopeLeft > 0 && slopeRight <= 0 && Brent.TryFindRoot(Curve.Slope, left, right, PeakAccuracy, 100, out var top) && Curve.Density(top) > highest)
            {
                (found, highest) = (top, Curve.Density(top));
            }

            (left, slopeLeft) = (right, slopeRight);
        }

        return double.IsNaN(found) ? null : WithVariances(found);
    }

    /// <summary>Delta method: the peak moves by −(∂²ρ/∂w∂θ)/(∂²ρ/∂w²), its density by ∂ρ/∂θ.</summary>
    private PeakEstimate? WithVariances(double top)
    {
        Span<double> atTop = stackalloc double[Parameters];
        Span<double> drier = stackalloc double[Parameters];
        Span<double> wetter = stackalloc double[Parameters];
        var density = Curve.Density(top, atTop);
        Curve.Density(top + Step, wetter);
        Curve.Density(top - Step, drier);
        var curvature = (Curve.Slope(top + CurvatureStep) - Curve.Slope(top - CurvatureStep)) / (2 * CurvatureStep);
        if (!(curvature < 0))
        {
            return null;
        }

        for (var j = 0; j < Parameters; j++)
        {
            wetter[j] = -(wetter[j] - drier[j]) / (2 * Step * curvature);
        }

        return new(top, density, Variance(wetter), Variance(atTop));
    }

    /// <summary>Misfits of the points in units of the noise, then of the parameters in units of their priors' deviations.</summary>
    private readonly struct Residuals(TestedPoints points, double specificGravity, SaturationPrior prior) : IResiduals
    {
        public int Count => points.Count + Parameters;

        public void Evaluate(ReadOnlySpan<double> parameters, Span<double> residuals, Span<double> jacobian)
        {
            var curve = new LiSegoCurve(parameters, specificGravity, points.WaterDensity);
            var count = points.Count;
            Span<double> gradient = stackalloc double[Parameters];
            jacobian.Clear();
            for (var i = 0; i < count; i++)
            {
                residuals[i] = (curve.Density(points.WaterContents[i], gradient) - points.Densities[i]) / prior.Noise;
                for (var j = 0; j < Parameters; j++)
                {
                    jacobian[(j * Count) + i] = gradient[j] / prior.Noise;
                }
            }

            SaturationPrior.Centers(points.Wettest, gradient);
            for (var j = 0; j < Parameters; j++)
            {
                residuals[count + j] = (parameters[j] - gradient[j]) / prior.Deviation(j);
                jacobian[(j * Count) + count + j] = 1 / prior.Deviation(j);
            }
        }

        /// <summary>Inverse of the triangle whose square is the information at the mode.</summary>
        /// <returns>ln det of the covariance.</returns>
        public double InvertInformation(ReadOnlySpan<double> mode, Span<double> inverse)
        {
            Span<double> step = stackalloc double[Parameters];
            var work = new double[Count * (Parameters + 1)];
            var residuals = work.AsSpan(0, Count);
            var jacobian = work.AsSpan(Count);
            Evaluate(mode, residuals, jacobian);
            LeastSquares.Solve(jacobian, residuals, step);
            LeastSquares.InvertTriangle(jacobian, Count, inverse);
            var logDeterminant = 0.0;
            for (var j = 0; j < Parameters; j++)
            {
                logDeterminant += 2 * Math.Log(Math.Abs(inverse[(j * Parameters) + j]));
            }

            return logDeterminant;
        }
    }
}
