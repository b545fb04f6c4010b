using MathNet.Numerics.Integration;

namespace Drypeak.Soil.Acceptance.Statistics;

/// <summary>Nodes and weights of an integral over the distribution of a sample's standard deviation.</summary>
internal static class Quadrature
{
    private static readonly GaussLegendreRule Rule = new(-1, 1, 20);

    /// <summary>The nodes of a Gauss-Legendre rule of 20 points on each panel between neighboring breaks, with their weights.</summary>
    /// <param name="breaks">In rising order.</param>
    public static IEnumerable<(double Node, double Weight)> Panels(IReadOnlyList<double> breaks)
    {
        for (var panel = 1; panel < breaks.Count; panel++)
        {
            var half = (breaks[panel] - breaks[panel - 1]) / 2;
            var middle = (breaks[panel] + breaks[panel - 1]) / 2;
            for (var i = 0; half > 0 && i < Rule.Order; i++)
            {
                yield return (middle + (half * Rule.Abscissas[i]), half * Rule.Weights[i]);
            }
        }
    }
}
