namespace Drypeak.Soil.Curves;

/// <summary>
/// The averaged curve with its components aligned at their peaks, so that it passes through the optimum and has its maximum there.
/// A leg depends on the distance from its peak only: aligned, all nodes of one shape are one leg.
/// Where no point lies above the zero-air-voids line, it is kept under it.
/// </summary>
internal readonly ref struct AlignedCurve : ICurve
{
    /// <summary>Numbers that it keeps: one a leg shape.</summary>
    public static readonly int Scales = LegShapes.Dry.Length + LegShapes.Wet.Length;

    private readonly TestedPoints points;
    private readonly PeakEstimate peak;
    private readonly ReadOnlySpan<double> dryScales, wetScales;
    private readonly SaturationMode? saturation;
    private readonly double saturationShare;

    /// <param name="points">The points.</param>
    /// <param name="nodes">The nodes, weighed.</param>
    /// <param name="mixture">Their mixture.</param>
    /// <param name="scales">Room for <see cref="Scales"/> numbers, which the curve keeps.</param>
    public AlignedCurve(TestedPoints points, ReadOnlySpan<PeakNode> nodes, in PeakMixture mixture, Span<double> scales)
    {
        this.points = points;
        peak = mixture.Peak;
        saturationShare = mixture.SaturationWeight / mixture.Total;
        saturation = saturationShare > 0 ? mixture.Saturation : null;

        scales.Clear();
        var wet = scales[LegShapes.Dry.Length..];
        foreach (ref readonly var node in nodes)
        {
            var pair = LegShapes.Pairs[node.Pair];
            scales[pair.Dry] += node.Weight / mixture.Total * node.Dry.Scale;
            wet[pair.Wet] += node.Weight / mixture.Total * node.Wet.Scale;
        }

        dryScales = scales[..LegShapes.Dry.Length];
        wetScales = wet;
    }

    public double Density(double waterContent)
    {
        var fromPeak = waterContent - peak.WaterContent;
        var shapes = fromPeak < 0 ? LegShapes.Dry : LegShapes.Wet;
        var scales = fromPeak < 0 ? dryScales : wetScales;
        var drop = 0.0;
        for (var i = 0; i < shapes.Length; i++)
        {
            drop += scales[i] * shapes[i].Drop(Math.Abs(fromPeak), points.SaturationSlope, points.RelativeDensity);
        }

        if (saturation?.Peak is { } top)
        {
            drop += saturationShare * (top.Density - saturation.Curve.Density(top.WaterContent + fromPeak));
        }

        var density = peak.Density - drop;
        return points.AnyAboveZeroAirVoids ? density : Math.Min(density, points.ZeroAirVoids(waterContent));
    }
}

/// <summary>
/// The plain mean over all nodes, those beyond the tested range included: what can be drawn where the peak lies probably outside.
/// </summary>
internal readonly ref struct PlainCurve : ICurve
{
    private readonly TestedPoints points;
    private readonly ReadOnlySpan<PeakNode> nodes;
    private readonly double greatest;

    public PlainCurve(TestedPoints points, ReadOnlySpan<PeakNode> nodes)
    {
        this.points = points;
        this.nodes = nodes;
        greatest = double.NegativeInfinity;
        foreach (ref readonly var node in nodes)
        {
            greatest = Math.Max(greatest, node.LogWeight);
        }
    }

    public double Density(double waterContent)
    {
        double sum = 0, total = 0;
        foreach (ref readonly var node in nodes)
        {
            var weight = Math.Exp(node.LogWeight - greatest);
            var drop = node.DropAt(waterContent, points, out var leg);
            sum += weight * (node.Level - (leg.Scale * drop));
            total += weight;
        }

        var density = sum / total;
        return points.AnyAboveZeroAirVoids ? density : Math.Min(density, points.ZeroAirVoids(waterContent));
    }
}
