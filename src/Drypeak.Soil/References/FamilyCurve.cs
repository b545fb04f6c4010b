using Drypeak.Soil.Curves;
using MathNet.Numerics.Interpolation;

namespace Drypeak.Soil.References;

/// <summary>
/// One curve of a family, in the form in which neighbours are blended: its optimum, and its shape as the density's share of the maximum over the
/// water content's share of the optimum. The shape goes through the curve's points and its optimum; with fewer than three of both it is assumed.
/// Immutable, safe on any thread.
/// </summary>
public sealed class FamilyCurve
{
    /// <summary>Fall of the assumed shape (common practice, no source): 3 % of the maximum at 80 % of the optimum.</summary>
    private const double AssumedFall = 0.8;

    /// <summary>Where an assumed shape is drawn, as shares of the optimum.</summary>
    private const double AssumedFrom = 0.75;
    private const double AssumedTo = 1.1;

    /// <summary>Shares nearer than this are one point.</summary>
    private const double SamePoint = 1e-9;

    private const int FewestKnots = 3;

    private readonly CubicSpline? _shape;

    /// <summary>A curve.</summary>
    /// <param name="label">The caller's name.</param>
    /// <param name="optimum">Its optimum; both over 0.</param>
    /// <param name="points">Points of it, in any order; may be empty.</param>
    public FamilyCurve(string label, CompactionPoint optimum, IReadOnlyList<CompactionPoint> points)
    {
        (Label, Optimum) = (label, optimum);
        var knots = Knots(optimum, points);
        if (knots.Count < FewestKnots)
        {
            (From, To) = (AssumedFrom, AssumedTo);
            return;
        }

        (From, To) = (knots[0].X, knots[^1].X);

        // Ended as parabolas: three points, or any number on a parabola, give that parabola.
        _shape = CubicSpline.InterpolateBoundariesSorted(
            [.. knots.Select(knot => knot.X)], [.. knots.Select(knot => knot.Y)],
            SplineBoundaryCondition.ParabolicallyTerminated, 0, SplineBoundaryCondition.ParabolicallyTerminated, 0);
    }

    /// <summary>The caller's name.</summary>
    public string Label { get; }

    /// <summary>Optimum water content and maximum dry density.</summary>
    public CompactionPoint Optimum { get; }

    /// <summary>Driest share of the optimum that the points reach.</summary>
    public double From { get; }

    /// <summary>Wettest share of the optimum that the points reach.</summary>
    public double To { get; }

    /// <summary>Whether the shape is assumed, for want of points.</summary>
    public bool IsAssumed => _shape is null;

    /// <summary>The density's share of the maximum at a share of the optimum water content; straight on beyond the points.</summary>
    public double ShapeAt(double share)
    {
        if (_shape is null)
        {
            return 1 - (AssumedFall * (share - 1) * (share - 1));
        }

        var inside = Math.Clamp(share, From, To);
        var value = _shape.Interpolate(inside);
        return share == inside ? value : value + (_shape.Differentiate(inside) * (share - inside));
    }

    /// <summary>Dry density at a water content, kg/m³.</summary>
    public double DensityAt(double waterContent) => Optimum.DryDensity * ShapeAt(waterContent / Optimum.WaterContent);

    private static List<(double X, double Y)> Knots(CompactionPoint optimum, IReadOnlyList<CompactionPoint> points)
    {
        var knots = new List<(double X, double Y)>();
        var peak = (X: 1.0, Y: 1.0);
        foreach (var knot in points.Select(point => (X: point.WaterContent / optimum.WaterContent, Y: point.DryDensity / optimum.DryDensity)).Append(peak).OrderBy(knot => knot.X))
        {
            if (knots.Count == 0 || knot.X - knots[^1].X > SamePoint)
            {
                knots.Add(knot);
            }
        }

        return knots;
    }
}
