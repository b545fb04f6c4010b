using Drypeak.Soil.FieldDensity;

namespace Drypeak.Soil.Acceptance;

/// <summary>
/// A compaction window as a polygon. In the plane of water content and <em>specific volume</em> v = 1/ρd every edge is a straight line:
/// a saturation S is v = 1/(Gs·ρw) + w/(S·ρw), a share of air voids A is v = (1/Gs + w)/((1 − A)·ρw), a dry density or a relative compaction is
/// v constant. So the window is a convex polygon there, and is cut out of a large one edge by edge.
/// </summary>
internal static class WindowPolygon
{
    /// <summary>No soil is wetter.</summary>
    private const double WettestWater = 10;

    /// <summary>No soil lies between less and more than these, kg/m³.</summary>
    private static readonly (double Least, double Most) Densities = (50, 20_000);

    private const int PointsOnACurve = 12;

    /// <summary>The corners, with points between where an edge is curved in dry density.</summary>
    /// <param name="window">The window.</param>
    /// <param name="reference">The lot's reference.</param>
    /// <returns>Water content as a fraction and dry density in kg/m³; empty where the edges leave nothing, null where they do not close or need what is unknown.</returns>
    public static IReadOnlyList<(double WaterContent, double DryDensity)>? Of(CompactionWindow window, JudgedSoil reference)
    {
        List<(double W, double V)> corners = [(0, 1 / Densities.Most), (WettestWater, 1 / Densities.Most), (WettestWater, 1 / Densities.Least), (0, 1 / Densities.Least)];
        if (HalfPlanes(window, reference) is not { } halfPlanes)
        {
            return null;
        }

        corners = halfPlanes.Aggregate(corners, Cut);
        return corners.Count < 3 ? []
            : corners.Any(corner => corner.W >= WettestWater || corner.V >= 1 / Densities.Least || corner.V <= 1 / Densities.Most) ? null
            : [.. Drawn(corners)];
    }

    /// <summary>A point lies inside where a·w + b·v ≤ c.</summary>
    private readonly record struct HalfPlane(double A, double B, double C)
    {
        public double Outside((double W, double V) point) => (A * point.W) + (B * point.V) - C;
    }

    /// <summary>Every edge, and the zero-air-voids line where the specific gravity is known; null where an edge needs what is unknown.</summary>
    private static List<HalfPlane>? HalfPlanes(CompactionWindow window, JudgedSoil reference)
    {
        var water = reference.WaterDensity;
        List<HalfPlane> all = [];
        if (reference.SpecificGravity is { } gravity)
        {
            all.Add(DrierThan(gravity, 1));
        }

        foreach (var limits in window.Edges.Select(edge => edge.Limits))
        {
            double? scale = limits.Quantity switch
            {
                AcceptedQuantity.DryDensity => 1,
                AcceptedQuantity.RelativeCompaction => reference.ReferenceDensity,
                AcceptedQuantity.WaterContent => 0,
                AcceptedQuantity.WaterContentFromOptimum => reference.ReferenceWater,
                _ => reference.SpecificGravity,
            };
            if (scale is not { } known)
            {
                return null;
            }

            all.AddRange(limits.Quantity switch
            {
                AcceptedQuantity.DryDensity or AcceptedQuantity.RelativeCompaction => Sides(limits, least => new(0, 1, 1 / (least * known)), most => new(0, -1, -1 / (most * known))),
                AcceptedQuantity.WaterContent or AcceptedQuantity.WaterContentFromOptimum => Sides(limits, least => new(-1, 0, -(least + known)), most => new(1, 0, most + known)),
                AcceptedQuantity.Saturation => Sides(limits, least => WetterThan(known, least), most => DrierThan(known, most)),
                AcceptedQuantity.AirVoids => Sides(limits, least => MoreAirThan(known, least), most => LessAirThan(known, most)),
                _ => throw new ArgumentOutOfRangeException(nameof(window), limits.Quantity, "Not an edge."),
            });
        }

        if (window.WetOfOptimums)
        {
            if (TestValues.Of(reference).SaturationAtOptimum is not { } line)
            {
                return null;
            }

            all.Add(WetterThan(reference.SpecificGravity!.Value, line));
        }

        return all;

        // A saturation of 0 asks nothing.
        HalfPlane WetterThan(double gs, double saturation) => saturation <= 0 ? new(-1, 0, 0) : new(-1 / (saturation * water), 1, 1 / (gs * water));
        HalfPlane DrierThan(double gs, double saturation) => saturation <= 0 ? new(1, 0, 0) : new(1 / (saturation * water), -1, -1 / (gs * water));
        HalfPlane LessAirThan(double gs, double airVoids) => airVoids >= 1 ? new(-1, 0, 0) : new(-1 / ((1 - airVoids) * water), 1, 1 / (gs * (1 - airVoids) * water));
        HalfPlane MoreAirThan(double gs, double airVoids) => airVoids >= 1 ? new(1, 0, -1) : new(1 / ((1 - airVoids) * water), -1, -1 / (gs * (1 - airVoids) * water));
    }

    private static IEnumerable<HalfPlane> Sides(Requirement limits, Func<double, HalfPlane> ofMinimum, Func<double, HalfPlane> ofMaximum)
    {
        if (limits.Minimum is { } minimum)
        {
            yield return ofMinimum(minimum);
        }

        if (limits.Maximum is { } maximum)
        {
            yield return ofMaximum(maximum);
        }
    }

    /// <summary>I. E. Sutherland and G. W. Hodgman, Reentrant polygon clipping, Comm. ACM 17 (1974) 32–42: one edge at a time.</summary>
    private static List<(double W, double V)> Cut(List<(double W, double V)> corners, HalfPlane half)
    {
        List<(double W, double V)> kept = [];
        for (var i = 0; i < corners.Count; i++)
        {
            var (here, next) = (corners[i], corners[(i + 1) % corners.Count]);
            var (outside, outsideNext) = (half.Outside(here), half.Outside(next));
            if (outside <= 0)
            {
                kept.Add(here);
            }

            if (outside <= 0 != outsideNext <= 0)
            {
                var share = outside / (outside - outsideNext);
                kept.Add((here.W + (share * (next.W - here.W)), here.V + (share * (next.V - here.V))));
            }
        }

        return kept;
    }

    /// <summary>In dry density; an edge along which both change is a curve there and gets points between its corners.</summary>
    private static IEnumerable<(double WaterContent, double DryDensity)> Drawn(List<(double W, double V)> corners)
    {
        for (var i = 0; i < corners.Count; i++)
        {
            var (here, next) = (corners[i], corners[(i + 1) % corners.Count]);
            var curved = Math.Abs(next.W - here.W) > 1e-9 && Math.Abs(next.V - here.V) > 1e-9 * here.V;
            var points = curved ? PointsOnACurve : 1;
            for (var k = 0; k < points; k++)
            {
                var share = k / (double)points;
                yield return (here.W + (share * (next.W - here.W)), 1 / (here.V + (share * (next.V - here.V))));
            }
        }
    }
}
