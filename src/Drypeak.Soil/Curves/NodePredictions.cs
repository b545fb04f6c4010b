namespace Drypeak.Soil.Curves;

/// <summary>
/// Leave-one-out predictions of the averaged model without a refit: within a node everything is normal, so that a point is taken out by
/// the precision H of the prediction from all others, and the node's weight is divided by the density that it gave the point.
/// The saturation model is left out: its normal approximation breaks where one point carries it.
/// </summary>
internal static class NodePredictions
{
    /// <summary>Nodes less probable than this factor below the best change no digit: exp(−40).</summary>
    private const double Negligible = 40;

    private const int MostOnStack = 64;

    public static LeaveOneOut Of(TestedPoints points, ReadOnlySpan<PeakNode> nodes)
    {
        var count = points.Count;
        Span<double> work = count <= MostOnStack ? stackalloc double[2 * count] : new double[2 * count];
        var predictions = work[..count];
        var deviations = work[count..];
        Span<WithoutPoint> without = stackalloc WithoutPoint[nodes.Length];
        for (var i = 0; i < count; i++)
        {
            var kept = 0;
            foreach (ref readonly var node in nodes)
            {
                if (points.Covers(node.Peak))
                {
                    without[kept++] = WithoutPoint.Of(node, points, i);
                }
            }

            (var offset, deviations[i]) = Mix(without[..kept]);
            predictions[i] = points.Densities[i] + offset;
        }

        return LeaveOneOut.From(points, predictions, deviations);
    }

    private static (double Offset, double Deviation) Mix(ReadOnlySpan<WithoutPoint> nodes)
    {
        var greatest = double.NegativeInfinity;
        foreach (ref readonly var node in nodes)
        {
            greatest = Math.Max(greatest, node.LogWeight);
        }

        double total = 0, first = 0, second = 0;
        foreach (ref readonly var node in nodes)
        {
            if (node.LogWeight < greatest - Negligible)
            {
                continue;
            }

            var weight = Math.Exp(node.LogWeight - greatest) * Math.Sqrt(node.Variance);
            total += weight;
            first += weight * node.Offset;
            second += weight * (node.Variance + (node.Offset * node.Offset));
        }

        var mean = first / total;
        return (mean, Math.Sqrt((second / total) - (mean * mean)));
    }

    /// <summary>A node's prediction of a point from the others.</summary>
    /// <param name="LogWeight">ln of the node's weight without the point, less ½ ln of the variance.</param>
    /// <param name="Offset">m − y_i, Mg/m³.</param>
    /// <param name="Variance">1/H.</param>
    private readonly record struct WithoutPoint(double LogWeight, double Offset, double Variance)
    {
        public static WithoutPoint Of(in PeakNode node, TestedPoints points, int i)
        {
            var drop = node.DropAt(points.WaterContents[i], points, out var leg);
            var weight = 1 / LegSums.NoiseVariance(drop);
            var misfit = (points.Densities[i] - node.Level + (leg.Scale * drop)) * weight;
            var dropWeight = drop * weight;
            var onLevel = (1 - (leg.ScaleVariance * leg.Drops * drop)) * weight;
            var variance = 1 / (weight - (leg.ScaleVariance * dropWeight * dropWeight) - (onLevel * onLevel * node.LevelVariance));
            return new(node.LogWeight + node.LogPrior + (0.5 * misfit * misfit * variance), -misfit * variance, variance);
        }
    }
}
