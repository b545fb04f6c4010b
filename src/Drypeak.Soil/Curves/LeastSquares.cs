namespace Drypeak.Soil.Curves;

/// <summary>
/// Linear least squares by Householder reflections (G. H. Golub, Numerical methods for solving linear least squares
/// problems, Numerische Mathematik 7 (1965) 206–216): the matrix itself is reduced, never its normal equations, so that
/// the digits lost are those of its condition and not of its square.
/// </summary>
internal static class LeastSquares
{
    /// <summary>A column that the others leave less than this of, relative, cannot be told from them.</summary>
    private const double Dependent = 1e-12;

    /// <summary>Solves min ‖A·x − b‖ in place.</summary>
    /// <param name="a">A, column by column, at least as many rows as columns; on return its upper triangle is R.</param>
    /// <param name="b">Right-hand side, one entry a row; on return Qᵀb, whose entries from the number of columns on are what no x explains.</param>
    /// <param name="x">The solution, one entry a column.</param>
    /// <returns>False where a column depends on the others; then <paramref name="x"/> means nothing.</returns>
    public static bool Solve(Span<double> a, Span<double> b, Span<double> x)
    {
        var rows = b.Length;
        for (var k = 0; k < x.Length; k++)
        {
            var column = a.Slice(k * rows, rows);
            var whole = Length(column);
            var below = column[k..];
            var length = Length(below);
            if (!(length > Dependent * whole))
            {
                return false;
            }

            // Reflect the column onto its first axis, away from its own sign so that nothing cancels.
            var onAxis = below[0] > 0 ? -length : length;
            below[0] -= onAxis;
            var scale = 1 / (onAxis * below[0]);
            for (var j = k + 1; j < x.Length; j++)
            {
                Reflect(a.Slice((j * rows) + k, rows - k), below, scale);
            }

            Reflect(b[k..], below, scale);
            below[0] = onAxis;
        }

        for (var k = x.Length - 1; k >= 0; k--)
        {
            var sum = b[k];
            for (var j = k + 1; j < x.Length; j++)
            {
                sum -= a[(j * rows) + k] * x[j];
            }

            x[k] = sum / a[(k * rows) + k];
        }

        return true;
    }

    /// <summary>The inverse of R after <see cref="Solve"/>: the covariance of x for unit noise is inverse · inverseᵀ.</summary>
    /// <param name="r">What <see cref="Solve"/> left in <c>a</c>.</param>
    /// <param name="rows">Rows of <c>a</c>.</param>
    /// <param name="inverse">Row by row, columns × columns, upper triangle.</param>
    public static void InvertTriangle(ReadOnlySpan<double> r, int rows, Span<double> inverse)
    {
        var columns = r.Length / rows;
        inverse.Clear();
        for (var j = 0; j < columns; j++)
        {
            inverse[(j * columns) + j] = 1 / r[(j * rows) + j];
            for (var i = j - 1; i >= 0; i--)
            {
                var sum = 0.0;
                for (var k = i + 1; k <= j; k++)
                {
                    sum += r[(k * rows) + i] * inverse[(k * columns) + j];
                }

                inverse[(i * columns) + j] = -sum / r[(i * rows) + i];
            }
        }
    }

    /// <summary>Variance of a linear function of x for unit noise: ‖inverseᵀ·weights‖².</summary>
    /// <param name="inverse">From <see cref="InvertTriangle"/>.</param>
    /// <param name="weights">The function's weights, one a column.</param>
    public static double Variance(ReadOnlySpan<double> inverse, ReadOnlySpan<double> weights) =>
        Covariance(inverse, weights, weights);

    /// <summary>Covariance of two linear functions of x for unit noise.</summary>
    public static double Covariance(ReadOnlySpan<double> inverse, ReadOnlySpan<double> first, ReadOnlySpan<double> second)
    {
        var columns = first.Length;
        var sum = 0.0;
        for (var j = 0; j < columns; j++)
        {
            double one = 0, two = 0;
            for (var i = 0; i <= j; i++)
            {
                one += inverse[(i * columns) + j] * first[i];
                two += inverse[(i * columns) + j] * second[i];
            }

            sum += one * two;
        }

        return sum;
    }

    /// <summary>Euclidean length.</summary>
    public static double Length(ReadOnlySpan<double> vector) => Math.Sqrt(Dot(vector, vector));

    /// <summary>Inner product.</summary>
    public static double Dot(ReadOnlySpan<double> first, ReadOnlySpan<double> second)
    {
        var sum = 0.0;
        for (var i = 0; i < first.Length; i++)
        {
            sum += first[i] * second[i];
        }

        return sum;
    }

    private static void Reflect(Span<double> column, ReadOnlySpan<double> reflector, double scale)
    {
        var dot = Dot(column, reflector) * scale;
        for (var i = 0; i < column.Length; i++)
        {
            column[i] += dot * reflector[i];
        }
    }
}
