namespace Drypeak.Soil.Curves;

/// <summary>
/// A least-squares polynomial in t, the water content scaled so that the tested range is −1 to 1: a raw water content would cost
/// four digits already for a parabola. Densities in Mg/m³ above their mean.
/// </summary>
internal sealed class Polynomial : ICurve
{
    /// <summary>A point of which the rest of the fit says less than this cannot be taken out.</summary>
    private const double LeastFreedom = 1e-9;

    private readonly double middle, half, mean;
    private readonly double[] coefficients;
    private readonly double[] inverse;

    private Polynomial(double[] waterContents, double[] densities, int degree)
    {
        var (driest, wettest) = (waterContents.Min(), waterContents.Max());
        (middle, half) = ((driest + wettest) / 2, (wettest - driest) / 2);
        mean = densities.Average();
        coefficients = new double[degree + 1];
        inverse = new double[coefficients.Length * coefficients.Length];
        DegreesOfFreedom = densities.Length - coefficients.Length;
    }

    /// <summary>Points less coefficients.</summary>
    public int DegreesOfFreedom { get; }

    /// <summary>Variance of a point about the curve, (Mg/m³)²; not a number where no degree of freedom is left.</summary>
    public double NoiseVariance { get; private set; }

    /// <summary>Coefficients of 1, t, t², …</summary>
    public ReadOnlySpan<double> Coefficients => coefficients;

    /// <summary>Fits, or returns null where the water contents are too few or too near for the degree.</summary>
    public static Polynomial? Fit(TestedPoints points, int degree) =>
        points.DistinctCount > degree ? Fit(points.WaterContents, points.Densities, degree) : null;

    /// <summary>Fits any values, or returns null where the water contents are too few or too near for the degree.</summary>
    public static Polynomial? Fit(double[] waterContents, double[] densities, int degree)
    {
        var fit = new Polynomial(waterContents, densities, degree);
        return fit.Solve(waterContents, densities) ? fit : null;
    }

    /// <summary>t of a water content.</summary>
    public double Scaled(double waterContent) => (waterContent - middle) / half;

    /// <summary>The water content at t.</summary>
    public double WaterContent(double t) => middle + (half * t);

    /// <summary>Half the tested range: water content for one unit of t.</summary>
    public double Unit => half;

    public double Density(double waterContent) => At(Scaled(waterContent));

    /// <summary>Mg/m³ at t.</summary>
    public double At(double t)
    {
        var sum = 0.0;
        for (var k = coefficients.Length - 1; k >= 0; k--)
        {
            sum = (sum * t) + coefficients[k];
        }

        return mean + sum;
    }

    /// <summary>Variance of a linear function of the coefficients, for noise of variance 1.</summary>
    public double UnitVariance(ReadOnlySpan<double> weights) => LeastSquares.Variance(inverse, weights);

    /// <summary>Covariance of two coefficients, for noise of variance 1.</summary>
    public double UnitCovariance(int first, int second)
    {
        Span<double> one = stackalloc double[coefficients.Length];
        Span<double> two = stackalloc double[coefficients.Length];
        (one[first], two[second]) = (1, 1);
        return LeastSquares.Covariance(inverse, one, two);
    }

    /// <summary>1, t, t², … at t.</summary>
    public static void Powers(double t, Span<double> powers)
    {
        powers[0] = 1;
        for (var k = 1; k < powers.Length; k++)
        {
            powers[k] = powers[k - 1] * t;
        }
    }

    /// <summary>Leave-one-out in closed form: the residual over 1 − h, h the point's leverage.</summary>
    public LeaveOneOut Predictions(TestedPoints points)
    {
        Span<double> powers = stackalloc double[coefficients.Length];
        var predictions = new double[points.Count];
        for (var i = 0; i < predictions.Length; i++)
        {
            var t = Scaled(points.WaterContents[i]);
            Powers(t, powers);
            var free = 1 - UnitVariance(powers);
            if (free < LeastFreedom)
            {
                return LeaveOneOut.Impossible;
            }

            predictions[i] = points.Densities[i] - ((points.Densities[i] - At(t)) / free);
        }

        return LeaveOneOut.From(points, predictions, []);
    }

    /// <summary>The coefficient of w^k, w unscaled, with its standard error (not a number where no degree of freedom is left).</summary>
    public (double Value, double StandardError) Unscaled(int k)
    {
        // ((w − middle)/half)^j holds C(j, k)·(−middle)^(j−k)/half^j of w^k.
        Span<double> weights = stackalloc double[coefficients.Length];
        weights.Clear();
        var value = k == 0 ? mean : 0;
        double binomial = 1;
        for (var j = k; j < coefficients.Length; j++)
        {
            weights[j] = binomial * Math.Pow(-middle, j - k) / Math.Pow(half, j);
            value += weights[j] * coefficients[j];
            binomial = binomial * (j + 1) / (j + 1 - k);
        }

        return (value, Math.Sqrt(NoiseVariance * UnitVariance(weights)));
    }

    /// <summary>The coefficients for water content in %, densities in kg/m³, with standard errors.</summary>
    public CurveParameter[] Parameters()
    {
        var parameters = new CurveParameter[coefficients.Length];
        for (var k = 0; k < parameters.Length; k++)
        {
            var (value, error) = Unscaled(k);
            var (name, unit, meaning) = Names[k];
            var scale = TestedPoints.ToKilograms(1) / Math.Pow(100, k);
            parameters[k] = new(name, scale * value, unit, DegreesOfFreedom > 0 ? scale * error : null, meaning);
        }

        return parameters;
    }

    /// <summary>The place where α·u² + β·u + δ goes from above 0 to below, by the form that does not cancel; null where it does so nowhere.</summary>
    public static double? FallingRoot(double alpha, double beta, double delta)
    {
        var discriminant = (beta * beta) - (4 * alpha * delta);
        if (!(discriminant > 0))
        {
            return null;
        }

        var root = Math.Sqrt(discriminant);
        return beta < 0 ? 2 * delta / (root - beta)
            : alpha != 0 ? (-beta - root) / (2 * alpha)
            : null;
    }

    private bool Solve(double[] waterContents, double[] densities)
    {
        var (rows, columns) = (densities.Length, coefficients.Length);
        var size = rows * (columns + 1);
        Span<double> work = size <= 512 ? stackalloc double[size] : new double[size];
        var matrix = work[..(rows * columns)];
        var side = work[(rows * columns)..];
        Span<double> powers = stackalloc double[columns];
        for (var i = 0; i < rows; i++)
        {
            Powers(Scaled(waterContents[i]), powers);
            for (var k = 0; k < columns; k++)
            {
                matrix[(k * rows) + i] = powers[k];
            }

            side[i] = densities[i] - mean;
        }

        if (!LeastSquares.Solve(matrix, side, coefficients))
        {
            return false;
        }

        LeastSquares.InvertTriangle(matrix, rows, inverse);
        var left = side[columns..];
        NoiseVariance = LeastSquares.Dot(left, left) / DegreesOfFreedom;
        return true;
    }

    private static readonly (string Name, string Unit, string Meaning)[] Names =
    [
        ("constant", "kg/m³", "Coefficient of 1; the water content w in %."),
        ("linear", "kg/m³ per %", "Coefficient of w; the water content w in %."),
        ("quadratic", "kg/m³ per %²", "Coefficient of w²; the water content w in %."),
        ("cubic", "kg/m³ per %³", "Coefficient of w³; the water content w in %."),
    ];
}
