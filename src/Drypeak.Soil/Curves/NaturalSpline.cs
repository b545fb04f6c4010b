namespace Drypeak.Soil.Curves;

/// <summary>
/// The natural cubic spline through points, one a water content (points at the same one are averaged). With the second derivatives γ at the
/// inner knots, R·γ = Qᵀ·y, R tridiagonal; K = Q·R⁻¹·Qᵀ is the roughness that the spline makes least.
/// </summary>
/// <remarks>P. J. Green, B. W. Silverman, Nonparametric Regression and Generalized Linear Models (1994), chapter 2 (from memory).</remarks>
internal sealed class NaturalSpline : ICurve
{
    /// <summary>A peak this near to a knot, as a share of the interval, may be found from either side.</summary>
    private const double AtKnot = 1e-9;

    private readonly double[] x, y, gamma;
    private readonly int[] counts;

    // R = L·D·Lᵀ, L with ones on its diagonal and these below it.
    private readonly double[] pivots, lower;

    /// <param name="points">Points at three or more water contents.</param>
    public NaturalSpline(TestedPoints points)
    {
        var knots = points.DistinctCount;
        (x, y, counts) = (new double[knots], new double[knots], new int[knots]);
        for (var i = 0; i < points.Count; i++)
        {
            var knot = points.Distinct[i];
            counts[knot]++;
            x[knot] += (points.WaterContents[i] - x[knot]) / counts[knot];
            y[knot] += (points.Densities[i] - y[knot]) / counts[knot];
        }

        (pivots, lower) = Factor();
        gamma = new double[knots];
        for (var j = 1; j < knots - 1; j++)
        {
            gamma[j] = Slope(j) - Slope(j - 1);
        }

        SolveInner(gamma);
    }

    public int Knots => x.Length;

    /// <summary>Points at a knot.</summary>
    public int CountAt(int knot) => counts[knot];

    /// <summary>Mean density at a knot, Mg/m³.</summary>
    public double DensityAt(int knot) => y[knot];

    public double Density(double waterContent)
    {
        var k = Interval(waterContent);
        var h = x[k + 1] - x[k];
        var (a, b) = ((x[k + 1] - waterContent) / h, (waterContent - x[k]) / h);
        return (a * y[k]) + (b * y[k + 1]) + (h * h / 6 * ((((a * a * a) - a) * gamma[k]) + (((b * b * b) - b) * gamma[k + 1])));
    }

    /// <summary>The places between the first and the last knot at which the spline has a maximum, in order.</summary>
    public List<double> Peaks()
    {
        var peaks = new List<double>();
        for (var k = 0; k < Knots - 1; k++)
        {
            var h = x[k + 1] - x[k];
            var start = Slope(k) - (h / 6 * ((2 * gamma[k]) + gamma[k + 1]));
            if (Polynomial.FallingRoot(h * (gamma[k + 1] - gamma[k]) / 2, h * gamma[k], start) is { } u and >= -AtKnot and <= 1 + AtKnot)
            {
                var peak = x[k] + (h * u);
                if (peaks.Count == 0 || peak - peaks[^1] > AtKnot * (x[^1] - x[0]))
                {
                    peaks.Add(peak);
                }
            }
        }

        return peaks;
    }

    /// <summary>Second derivative.</summary>
    public double Curvature(double waterContent)
    {
        var k = Interval(waterContent);
        var b = (waterContent - x[k]) / (x[k + 1] - x[k]);
        return gamma[k] + (b * (gamma[k + 1] - gamma[k]));
    }

    /// <summary>Variances of the spline and of its slope at a place, where every point has independent noise of variance 1.</summary>
    public (double OfDensity, double OfSlope) UnitVariances(double waterContent)
    {
        var k = Interval(waterContent);
        var h = x[k + 1] - x[k];
        var (a, b) = ((x[k + 1] - waterContent) / h, (waterContent - x[k]) / h);
        return (
            UnitVariance(k, a, b, h * h / 6 * ((a * a * a) - a), h * h / 6 * ((b * b * b) - b)),
            UnitVariance(k, -1 / h, 1 / h, -h / 6 * ((3 * a * a) - 1), h / 6 * ((3 * b * b) - 1)));
    }

    /// <summary>
    /// For each knot, what the spline through the others says there. Without a refit: of all values there, the others' own spline has the one that makes
    /// the roughness yᵀ·K·y least, so that y_i less it is (K·y)_i/K_ii.
    /// </summary>
    public double[] WithoutEach()
    {
        var predictions = new double[Knots];
        var (own, next, afterNext) = InverseBand();
        for (var i = 0; i < Knots; i++)
        {
            // Row i of Q, whose inner columns are i − 1, i and i + 1; those of the ends do not exist, and count 0.
            var before = i >= 2 ? 1 / (x[i] - x[i - 1]) : 0;
            var after = i < Knots - 2 ? 1 / (x[i + 1] - x[i]) : 0;
            var at = i > 0 && i < Knots - 1 ? (-1 / (x[i] - x[i - 1])) - (1 / (x[i + 1] - x[i])) : 0;
            var (left, right) = (Math.Max(i - 1, 0), Math.Min(i + 1, Knots - 1));
            var force = (before * gamma[left]) + (at * gamma[i]) + (after * gamma[right]);
            var stiffness = (before * before * own[left]) + (at * at * own[i]) + (after * after * own[right])
                + (2 * ((before * at * next[left]) + (at * after * next[i]) + (before * after * afterNext[left])));
            predictions[i] = y[i] - (force / stiffness);
        }

        return predictions;
    }

    private int Interval(double waterContent)
    {
        var found = Array.BinarySearch(x, waterContent);
        return Math.Clamp(found >= 0 ? found : ~found - 1, 0, Knots - 2);
    }

    private double Slope(int k) => (y[k + 1] - y[k]) / (x[k + 1] - x[k]);

    private (double[] Pivots, double[] Lower) Factor()
    {
        var (d, l) = (new double[Knots], new double[Knots]);
        for (var j = 1; j < Knots - 1; j++)
        {
            var link = (x[j] - x[j - 1]) / 6;
            d[j] = (x[j + 1] - x[j - 1]) / 3;
            if (j > 1)
            {
                l[j - 1] = link / d[j - 1];
                d[j] -= l[j - 1] * link;
            }
        }

        return (d, l);
    }

    /// <summary>R⁻¹·v over the inner knots, in place; the ends of <paramref name="v"/> are left alone.</summary>
    private void SolveInner(Span<double> v)
    {
        for (var j = 2; j < Knots - 1; j++)
        {
            v[j] -= lower[j - 1] * v[j - 1];
        }

        for (var j = Knots - 2; j >= 1; j--)
        {
            v[j] = (v[j] / pivots[j]) - (j < Knots - 2 ? lower[j] * v[j + 1] : 0);
        }
    }

    /// <summary>The entries (j, j), (j, j + 1) and (j, j + 2) of R⁻¹, from the last row up.</summary>
    private (double[] Own, double[] Next, double[] AfterNext) InverseBand()
    {
        var (own, next, afterNext) = (new double[Knots], new double[Knots], new double[Knots]);
        for (var j = Knots - 2; j >= 1; j--)
        {
            own[j] = (1 / pivots[j]) + (lower[j] * lower[j] * own[j + 1]);
            next[j] = -lower[j] * own[j + 1];
            afterNext[j] = -lower[j] * next[j + 1];
        }

        return (own, next, afterNext);
    }

    /// <summary>Variance of left·y_k + right·y_(k+1) + bendLeft·γ_k + bendRight·γ_(k+1).</summary>
    private double UnitVariance(int k, double left, double right, double bendLeft, double bendRight)
    {
        // The functional's weights on y: its own, and Q·R⁻¹ of those on γ.
        Span<double> bend = Knots <= 64 ? stackalloc double[Knots] : new double[Knots];
        bend.Clear();
        (bend[k], bend[k + 1]) = (bendLeft, bendRight);
        (bend[0], bend[^1]) = (0, 0);
        SolveInner(bend);
        var sum = 0.0;
        for (var i = 0; i < Knots; i++)
        {
            var before = i > 0 ? (bend[i - 1] - bend[i]) / (x[i] - x[i - 1]) : 0;
            var after = i < Knots - 1 ? (bend[i + 1] - bend[i]) / (x[i + 1] - x[i]) : 0;
            var weight = before + after + (i == k ? left : 0) + (i == k + 1 ? right : 0);
            sum += weight * weight / counts[i];
        }

        return sum;
    }
}
