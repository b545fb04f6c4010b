namespace Drypeak.Soil.Curves;

/// <summary>A model whose squared residuals are to be made least.</summary>
internal interface IResiduals
{
    /// <summary>Number of residuals, at least the number of parameters.</summary>
    int Count { get; }

    /// <summary>Residuals and their derivatives.</summary>
    /// <param name="parameters">Where.</param>
    /// <param name="residuals">One a row.</param>
    /// <param name="jacobian">∂residual/∂parameter, a column a parameter, one after the other.</param>
    void Evaluate(ReadOnlySpan<double> parameters, Span<double> residuals, Span<double> jacobian);
}

/// <summary>How a minimization went.</summary>
/// <param name="IsStationary">Whether the gradient vanished; else the steps ran out.</param>
/// <param name="SumOfSquares">At the end.</param>
/// <param name="Steps">Steps tried.</param>
internal readonly record struct MinimizationOutcome(bool IsStationary, double SumOfSquares, int Steps);

/// <summary>
/// Nonlinear least squares by damped Gauss–Newton steps (K. Levenberg, Quarterly of Applied Mathematics 2 (1944) 164–168;
/// D. W. Marquardt, SIAM Journal 11 (1963) 431–441). Each step is a linear least-squares problem by reflections. Where the residuals stay large
/// such steps crawl; once they do, Newton steps take their place, with the bend of the model itself measured by differences and kept while they are quick.
/// It ends at a stationary point, where every column of the Jacobian is at right angles to the residuals, and not at a small
/// change of the sum: an answer must not depend on the way by which it was reached.
/// </summary>
internal static class GaussNewton
{
    private const int MostOnStack = 2048;

    /// <summary>A right angle to all digits that the arithmetic has, for most data.</summary>
    private const double RightAngle = 1e-11;

    /// <summary>Below this relative change the sum of squares is rounding, and the gradient decides whether a step was good.</summary>
    private const double RoundingOfSum = 1e-12;

    /// <summary>A step after which more than this share of the slope is left was slow.</summary>
    private const double Slow = 0.3;

    /// <summary>Slope from which on Newton steps are tried.</summary>
    private const double GreatestNewtonSlope = 0.03;

    /// <summary>Step of the differences of the gradient, as a share of the change in a parameter that would outweigh the residuals.</summary>
    private const double Difference = 1e-4;

    private const double FirstDamping = 1e-3;
    private const double LeastDamping = 1e-15;
    private const double GreatestDamping = 1e12;

    /// <summary>Minimizes from a starting point.</summary>
    /// <param name="model">The residuals.</param>
    /// <param name="parameters">The starting point; on return the best found.</param>
    /// <param name="longestStep">Largest change of any one parameter in a step; infinite for none.</param>
    /// <param name="mostSteps">Steps after which to give up.</param>
    /// <param name="rightAngle">Largest cosine between a column of the Jacobian and the residuals that counts as a right angle.</param>
    public static MinimizationOutcome Minimize<TModel>(
        in TModel model, Span<double> parameters, double longestStep = double.PositiveInfinity, int mostSteps = 1000, double rightAngle = RightAngle)
        where TModel : IResiduals, allows ref struct
    {
        var (count, width) = (model.Count, parameters.Length);
        var (each, rows) = ((count * (width + 1)) + width, count + width);
        var size = (2 * each) + (rows * (width + 1)) + (width * (width + 2));
        Span<double> work = size <= MostOnStack ? stackalloc double[size] : new double[size];
        var now = new Evaluation(work[..each], count, width);
        var next = new Evaluation(work.Slice(each, each), count, width);
        var matrix = work.Slice(2 * each, rows * width);
        var side = work.Slice((2 * each) + (rows * width), rows);
        var bend = work.Slice((2 * each) + (rows * (width + 1)), width * width);
        var step = work.Slice(size - (2 * width), width);
        var trial = work[(size - width)..];

        now.At(model, parameters);
        var (damping, newtonBelow, isNewton, isBendStale) = (FirstDamping, GreatestNewtonSlope, false, true);
        for (var tried = 0; tried < mostSteps; tried++)
        {
            if (now.Slope <= rightAngle)
            {
                return new(true, now.Sum, tried);
            }

            if (isNewton)
            {
                if (isBendStale)
                {
                    now.MeasureBend(model, parameters, ref next, trial, bend);
                }

                now.WriteNewtonSystem(bend, matrix, side);
            }
            else
            {
                now.WriteDampedSystem(damping, matrix, side);
            }

            var systemRows = isNewton ? width : rows;
            if (LeastSquares.Solve(matrix[..(systemRows * width)], side[..systemRows], step))
            {
                if (!Move(parameters, step, longestStep, trial))
                {
                    return new(true, now.Sum, tried);
                }

                next.At(model, trial);
                if (next.IsBetterThan(now))
                {
                    damping = isNewton ? damping : Math.Max(damping / 10, LeastDamping);
                    isBendStale = next.Slope > Slow * now.Slope;
                    isNewton |= isBendStale && next.Slope < newtonBelow;
                    trial.CopyTo(parameters);
                    var former = now;
                    now = next;
                    next = former;
                    continue;
                }
            }

            if (isNewton)
            {
                (isNewton, isBendStale, newtonBelow) = (false, true, now.Slope / 2);
            }
            else if (damping > GreatestDamping)
            {
                // The step is down to rounding and nothing improves: as stationary as the arithmetic allows.
                return new(true, now.Sum, tried);
            }
            else
            {
                damping *= 10;
            }
        }

        return new(false, now.Sum, mostSteps);
    }

    /// <summary>Goes one step, shortened so that no parameter changes by more than allowed.</summary>
    /// <returns>False where the step changes no digit.</returns>
    private static bool Move(ReadOnlySpan<double> from, ReadOnlySpan<double> step, double longest, Span<double> to)
    {
        var greatest = 0.0;
        foreach (var change in step)
        {
            greatest = Math.Max(greatest, Math.Abs(change));
        }

        var share = greatest > longest ? longest / greatest : 1;
        var moves = false;
        for (var i = 0; i < step.Length; i++)
        {
            to[i] = from[i] + (share * step[i]);
            moves |= to[i] != from[i];
        }

        return moves;
    }

    /// <summary>Residuals, Jacobian and the lengths of its columns at one place.</summary>
    private ref struct Evaluation(Span<double> work, int count, int width)
    {
        private readonly Span<double> residuals = work[..count];
        private readonly Span<double> jacobian = work.Slice(count, count * width);
        private readonly Span<double> lengths = work[^width..];

        /// <summary>Sum of squared residuals.</summary>
        public double Sum { get; private set; }

        /// <summary>Greatest cosine between a column of the Jacobian and the residuals.</summary>
        public double Slope { get; private set; }

        public void At<TModel>(in TModel model, ReadOnlySpan<double> parameters)
            where TModel : IResiduals, allows ref struct
        {
            model.Evaluate(parameters, residuals, jacobian);
            Sum = LeastSquares.Dot(residuals, residuals);
            Slope = 0;
            for (var j = 0; j < parameters.Length; j++)
            {
                var along = LeastSquares.Dot(Column(j), residuals);
                lengths[j] = LeastSquares.Length(Column(j));
                Slope = along == 0 ? Slope : Math.Max(Slope, Math.Abs(along) / (lengths[j] * Math.Sqrt(Sum)));
            }
        }

        /// <summary>Whether the sum is less or, where sums differ by rounding only, the slope.</summary>
        public readonly bool IsBetterThan(in Evaluation other) =>
            Sum < other.Sum * (1 - RoundingOfSum) || (Sum <= other.Sum * (1 + RoundingOfSum) && Slope < other.Slope);

        /// <summary>What the second derivatives of half the sum have beyond Jᵀ·J, by central differences of the gradient: the model's own bend.</summary>
        /// <param name="model">The model.</param>
        /// <param name="parameters">Where this evaluation stands.</param>
        /// <param name="beside">Room for an evaluation beside it.</param>
        /// <param name="place">Room for its parameters.</param>
        /// <param name="bend">Gets them, column by column.</param>
        public readonly void MeasureBend<TModel>(
            in TModel model, ReadOnlySpan<double> parameters, ref Evaluation beside, Span<double> place, Span<double> bend)
            where TModel : IResiduals, allows ref struct
        {
            var width = parameters.Length;
            parameters.CopyTo(place);
            bend.Clear();
            for (var j = 0; j < width; j++)
            {
                var h = Difference * Math.Sqrt(Sum) / lengths[j];
                var column = bend.Slice(j * width, width);
                place[j] = parameters[j] + h;
                beside.At(model, place);
                beside.AddGradient(1 / (2 * h), column);
                place[j] = parameters[j] - h;
                beside.At(model, place);
                beside.AddGradient(-1 / (2 * h), column);
                place[j] = parameters[j];
            }

            AddProducts(-1, width, bend);
        }

        /// <summary>Newton's equations: all second derivatives, and the gradient to be cancelled.</summary>
        public readonly void WriteNewtonSystem(ReadOnlySpan<double> bend, Span<double> matrix, Span<double> side)
        {
            var width = lengths.Length;
            bend.CopyTo(matrix);
            AddProducts(1, width, matrix);
            side.Clear();
            AddGradient(-1, side[..width]);
        }

        private readonly void AddProducts(double scale, int width, Span<double> matrix)
        {
            for (var j = 0; j < width; j++)
            {
                for (var i = 0; i < width; i++)
                {
                    matrix[(j * width) + i] += scale * LeastSquares.Dot(Column(i), Column(j));
                }
            }
        }

        private readonly void AddGradient(double scale, Span<double> sum)
        {
            for (var j = 0; j < sum.Length; j++)
            {
                sum[j] += scale * LeastSquares.Dot(Column(j), residuals);
            }
        }

        private readonly ReadOnlySpan<double> Column(int j) => jacobian.Slice(j * count, count);

        /// <summary>The linear problem of the next step: the residuals to be cancelled, and a row a parameter that holds it back.</summary>
        public readonly void WriteDampedSystem(double damping, Span<double> matrix, Span<double> side)
        {
            matrix.Clear();
            side.Clear();
            for (var i = 0; i < count; i++)
            {
                side[i] = -residuals[i];
            }

            for (var j = 0; j < lengths.Length; j++)
            {
                var column = Column(j);
                var target = matrix.Slice(j * side.Length, side.Length);
                column.CopyTo(target);
                target[count + j] = Math.Sqrt(damping) * lengths[j];
            }
        }
    }
}
