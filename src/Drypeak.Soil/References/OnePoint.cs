using Drypeak.Soil.Curves;
using Drypeak.Soil.Quantities;
using MathNet.Numerics.RootFinding;

namespace Drypeak.Soil.References;

/// <summary>What one point says of a family.</summary>
public sealed record OnePointResult
{
    /// <summary>Optimum of the curve through the point, or null where it may not be used.</summary>
    public CompactionPoint? Optimum { get; init; }

    /// <summary>The neighbours, the denser first; one where the point lies on a curve; none outside the family.</summary>
    public IReadOnlyList<FamilyCurve> Between { get; init; } = [];

    /// <summary>The second neighbour's share, 0 to 1; null outside the family.</summary>
    public double? Blend { get; init; }

    /// <summary>The point's water content over the optimum, as a fraction; null outside the family.</summary>
    public double? ShareOfOptimum { get; init; }

    /// <summary>The blended curve, in order of water content; empty where it may not be used.</summary>
    public IReadOnlyList<CompactionPoint> Curve { get; init; } = [];

    /// <summary>What a careful reviewer says, worst first.</summary>
    public required IReadOnlyList<Finding> Findings { get; init; }
}

/// <summary>
/// One point and a family of curves (AASHTO T 272, R 75): the curve through the point, shaped like its two neighbours. Optimum, maximum and
/// shape are blended by one parameter, which is solved for. Between the dry legs the answer is one; wet of the optimum the curves run together,
/// so that the point must lie at 80 to 100 % of the optimum that it selects.
/// </summary>
public static class OnePoint
{
    /// <summary>The fewest curves of a family.</summary>
    public const int FewestCurves = 3;

    /// <summary>The driest point that may be used, as a share of the optimum.</summary>
    public const double Driest = 0.8;

    private const double Arithmetic = 1e-9;
    private const double Precision = 1e-13;
    private const int MostSteps = 200;
    private const int DrawnPoints = 41;

    /// <summary>The curve through a point.</summary>
    /// <param name="family">The curves, in any order.</param>
    /// <param name="point">The point: water content as a fraction, dry density in kg/m³.</param>
    /// <param name="unit">The unit that texts speak.</param>
    public static OnePointResult Select(IReadOnlyList<FamilyCurve> family, CompactionPoint point, DensityUnit unit)
    {
        FamilyCurve[] sorted = [.. family.OrderByDescending(curve => curve.Optimum.DryDensity).ThenBy(curve => curve.Optimum.WaterContent)];
        var findings = OfFamily(sorted).ToList();
        if (Blends(sorted, point).OrderByDescending(IsUsable).FirstOrDefault() is not { } blend)
        {
            findings.Add(Outside(sorted, point, unit));
            return Answer(null);
        }

        if (!IsUsable(blend))
        {
            findings.Add(OffSide(blend));
        }

        return Answer(blend);

        OnePointResult Answer(BlendedCurve? found)
        {
            var usable = found is { } curve && IsUsable(curve) && sorted.Length >= FewestCurves;
            return new OnePointResult
            {
                Optimum = usable ? found!.Optimum : null,
                Between = found?.Neighbours ?? [],
                Blend = found?.Blend,
                ShareOfOptimum = found?.ShareOf(point),
                Curve = usable ? found!.Drawn(DrawnPoints) : [],
                Findings = [.. findings.OrderBy(finding => finding.Severity)],
            };
        }

        bool IsUsable(BlendedCurve curve) => curve.ShareOf(point) is var share && share >= Driest * (1 - Arithmetic) && share <= 1 + Arithmetic;

        Finding OffSide(BlendedCurve curve)
        {
            var share = curve.ShareOf(point);
            var text = $"The point lies at {ReaderText.Percent(share)} of the optimum water content that it selects";
            return share < 1
                ? ReferenceFindingKinds.PointTooDry.At("/point", $"{text}, below {ReaderText.Percent(Driest, 0)}. Add water and compact another.")
                : ReferenceFindingKinds.PointTooWet.At("/point", $"{text}: wet of it. Dry the soil and compact another.");
        }
    }

    /// <summary>Every curve through the point: the members that it lies on, then one between each two neighbours that it lies between.</summary>
    private static IEnumerable<BlendedCurve> Blends(FamilyCurve[] sorted, CompactionPoint point)
    {
        var on = sorted.Where(curve => Math.Abs((curve.DensityAt(point.WaterContent) / point.DryDensity) - 1) <= Arithmetic).ToList();
        foreach (var curve in on)
        {
            yield return new BlendedCurve(curve, curve, 0);
        }

        foreach (var (denser, lighter) in sorted.Zip(sorted.Skip(1)))
        {
            if (on.Contains(denser) || on.Contains(lighter))
            {
                continue;
            }

            double Apart(double blend) => new BlendedCurve(denser, lighter, blend).DensityAt(point.WaterContent) - point.DryDensity;
            if (Apart(0) > 0 != Apart(1) > 0 && Brent.TryFindRoot(Apart, 0, 1, Precision, MostSteps, out var root))
            {
                yield return new BlendedCurve(denser, lighter, root);
            }
        }
    }

    private static IEnumerable<Finding> OfFamily(FamilyCurve[] sorted)
    {
        if (sorted.Length < FewestCurves)
        {
            yield return ReferenceFindingKinds.FamilyTooSmall.At("/family",
                $"The family has {sorted.Length} {(sorted.Length == 1 ? "curve" : "curves")} that can be used; at least {FewestCurves} are needed. Add more of the same origin, or make a whole test.");
        }

        if (sorted.Where(curve => curve.IsAssumed).Select(curve => curve.Label).ToList() is { Count: > 0 } assumed)
        {
            yield return ReferenceFindingKinds.ShapeAssumed.At("/family",
                $"Of {string.Join(", ", assumed)} only the optimum is given; the shape of the dry side is assumed. Give points, or whole tests.");
        }

        foreach (var (denser, lighter) in sorted.Zip(sorted.Skip(1)))
        {
            if (lighter.Optimum.WaterContent < denser.Optimum.WaterContent)
            {
                yield return ReferenceFindingKinds.FamilyOutOfOrder.At("/family",
                    $"{denser.Label} is denser than {lighter.Label}, yet its optimum is wetter: {ReaderText.Of(new WaterContent(denser.Optimum.WaterContent))} against {ReaderText.Of(new WaterContent(lighter.Optimum.WaterContent))}. Check both; leave out the one that does not belong.");
            }
        }
    }

    private static Finding Outside(FamilyCurve[] sorted, CompactionPoint point, DensityUnit unit)
    {
        var where = sorted.Length == 0 ? "there is no curve to hold it against"
            : $"at its water content the family lies between {ReaderText.Of(new Density(sorted.Min(curve => curve.DensityAt(point.WaterContent))), unit)} and {ReaderText.Of(new Density(sorted.Max(curve => curve.DensityAt(point.WaterContent))), unit)}";
        return ReferenceFindingKinds.OutsideFamily.At("/point",
            $"The point, {ReaderText.Of(new Density(point.DryDensity), unit)} at {ReaderText.Of(new WaterContent(point.WaterContent))}, lies outside the family: {where}. Make a whole test of this soil.");
    }

    /// <summary>A curve between two neighbours; with both the same, that one.</summary>
    private sealed record BlendedCurve(FamilyCurve Denser, FamilyCurve Lighter, double Blend)
    {
        public CompactionPoint Optimum { get; } = new(
            Between(Denser.Optimum.WaterContent, Lighter.Optimum.WaterContent, Blend), Between(Denser.Optimum.DryDensity, Lighter.Optimum.DryDensity, Blend));

        public IReadOnlyList<FamilyCurve> Neighbours => ReferenceEquals(Denser, Lighter) ? [Denser] : [Denser, Lighter];

        public double ShareOf(CompactionPoint point) => point.WaterContent / Optimum.WaterContent;

        public double DensityAt(double waterContent) => AtShare(waterContent / Optimum.WaterContent);

        public IReadOnlyList<CompactionPoint> Drawn(int count)
        {
            var (from, to) = (Math.Min(Denser.From, Lighter.From), Math.Max(Denser.To, Lighter.To));
            return
            [
                .. Enumerable.Range(0, count).Select(i => Between(from, to, i / (count - 1.0)))
                    .Select(share => new CompactionPoint(share * Optimum.WaterContent, AtShare(share))),
            ];
        }

        private double AtShare(double share) => Optimum.DryDensity * Between(Denser.ShapeAt(share), Lighter.ShapeAt(share), Blend);

        private static double Between(double first, double second, double blend) => first + (blend * (second - first));
    }
}
