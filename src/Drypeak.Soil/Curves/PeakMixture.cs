using MathNet.Numerics;

namespace Drypeak.Soil.Curves;

/// <summary>
/// The averaged model's posterior of the optimum: the nodes that lie within the tested range, weighed against each other and
/// against the saturation model's mode. Mg/m³ and fractions.
/// </summary>
internal readonly ref struct PeakMixture
{
    /// <summary>Tail left below the interval of the optimum; calibrated on simulated soils, like the two that follow.</summary>
    private const double LowerTail = 0.10;

    /// <summary>Tail left above, while the optimum is known well: kinks are missed on the wet side.</summary>
    private const double LeastUpperTail = 0.010;

    /// <summary>The upper tail grows to the lower one between these uncertainties, in mean spacings of the points.</summary>
    private const double WellKnown = 0.30, PoorlyKnown = 0.45;

    /// <summary>ln of the greatest odds of the saturation model against the best node that are still told apart: beyond it exp overflows.</summary>
    private const double GreatestLogOdds = 600;

    private readonly TestedPoints points;
    private readonly Span<PeakNode> nodes;

    public PeakMixture(TestedPoints points, Span<PeakNode> nodes, SaturationMode? saturation)
    {
        this.points = points;
        this.nodes = nodes;
        Saturation = saturation;
        var logSaturation = LogWeightOfSaturation();
        (ChanceDrier, ChanceWetter, ChanceOutside) = ChancesOutside(logSaturation);
        (SaturationWeight, Total) = WeighInside(logSaturation);

        OfNodes = Moments(0);
        Peak = Moments(SaturationWeight);
    }

    public SaturationMode? Saturation { get; }

    /// <summary>Weight of the saturation model's mode, in the units of <see cref="Total"/>; 0 where it has no peak inside.</summary>
    public double SaturationWeight { get; }

    /// <summary>Sum of all weights.</summary>
    public double Total { get; }

    /// <summary>Optimum and maximum with their variances.</summary>
    public PeakEstimate Peak { get; }

    /// <summary>The same by the nodes alone.</summary>
    public PeakEstimate OfNodes { get; }

    /// <summary>Chance that the peak lies outside the tested range, before any preference for its middle.</summary>
    public double ChanceOutside { get; }

    /// <summary>The nodes' part of <see cref="ChanceOutside"/> on the dry side.</summary>
    public double ChanceDrier { get; }

    /// <summary>The nodes' part of <see cref="ChanceOutside"/> on the wet side.</summary>
    public double ChanceWetter { get; }

    /// <summary>The tail left above the interval of the optimum.</summary>
    public double UpperTail
    {
        get
        {
            var spacings = Math.Sqrt(Peak.WaterContentVariance) * (points.Count - 1) / points.Range;
            var share = Math.Clamp((spacings - WellKnown) / (PoorlyKnown - WellKnown), 0, 1);
            return LeastUpperTail + (share * (LowerTail - LeastUpperTail));
        }
    }

    /// <summary>The interval of the optimum, with 95 % coverage on the soils on which its tails were calibrated.</summary>
    public (double Lower, double Upper) Interval()
    {
        Span<double> masses = stackalloc double[PeakNodes.Places];
        masses.Clear();
        for (var i = 0; i < nodes.Length; i++)
        {
            masses[i / LegShapes.Pairs.Length] += nodes[i].Weight;
        }

        var whole = OfModeBelow(points.Wettest) - OfModeBelow(points.Driest);
        for (var place = 0; place < masses.Length; place++)
        {
            var (left, right) = Cell(place);
            whole += masses[place] * (right - left) / PeakNodes.Spacing(points);
        }

        return (Quantile(masses, whole, LowerTail), Quantile(masses, whole, 1 - UpperTail));
    }

    /// <summary>Weight of a pair of leg shapes, in the units of <see cref="Total"/>.</summary>
    public double WeightOf(int pair)
    {
        var sum = 0.0;
        for (var i = pair; i < nodes.Length; i += LegShapes.Pairs.Length)
        {
            sum += nodes[i].Weight;
        }

        return sum;
    }

    /// <summary>ln L_s − p(x_s) of the saturation model by Laplace's approximation; −∞ where there is no such model.</summary>
    private double LogWeightOfSaturation()
    {
        if (Saturation is null)
        {
            return double.NegativeInfinity;
        }

        var logDeviations = 0.0;
        for (var j = 0; j < LiSegoCurve.Parameters; j++)
        {
            logDeviations += Math.Log(AveragedModel.Prior.Deviation(j));
        }

        return Math.Log(PeakNodes.SaturationShare) - (0.5 * Saturation.SumOfSquares)
            - (points.Count * Math.Log(AveragedModel.Prior.Noise)) + (0.5 * Saturation.LogDeterminant) - logDeviations;
    }

    private (double Drier, double Wetter, double Outside) ChancesOutside(double logSaturation)
    {
        var greatest = logSaturation;
        foreach (ref readonly var node in nodes)
        {
            greatest = Math.Max(greatest, node.LogWeight);
        }

        double drier = 0, inside = 0, wetter = 0;
        foreach (ref readonly var node in nodes)
        {
            var weight = Math.Exp(node.LogWeight - greatest);
            if (node.Peak < points.Driest)
            {
                drier += weight;
            }
            else if (node.Peak > points.Wettest)
            {
                wetter += weight;
            }
            else
            {
                inside += weight;
            }
        }

        var saturation = Math.Exp(logSaturation - greatest);
        var total = drier + inside + wetter + saturation;
        var outside = drier + wetter + (Saturation is { Peak: null } ? saturation : 0);
        return (drier / total, wetter / total, outside / total);
    }

    private (double Saturation, double Total) WeighInside(double logSaturation)
    {
        var logMode = Saturation?.Peak is { } peak
            ? logSaturation + PeakNodes.LogPrior(points, peak.WaterContent)
            : double.NegativeInfinity;
        var greatest = double.NegativeInfinity;
        foreach (ref readonly var node in nodes)
        {
            if (points.Covers(node.Peak))
            {
                greatest = Math.Max(greatest, node.LogWeight + node.LogPrior);
            }
        }

        var saturation = Math.Exp(Math.Min(logMode - greatest, GreatestLogOdds));
        var total = saturation;
        foreach (ref var node in nodes)
        {
            node.Weight = points.Covers(node.Peak) ? Math.Exp(node.LogWeight + node.LogPrior - greatest) : 0;
            total += node.Weight;
        }

        return (saturation, total);
    }

    /// <summary>Means and variances over the nodes and, with this weight, the saturation model's mode.</summary>
    private PeakEstimate Moments(double saturationWeight)
    {
        var top = Saturation?.Peak ?? default;
        var total = saturationWeight;
        var (peak, density) = (saturationWeight * top.WaterContent, saturationWeight * top.Density);
        foreach (ref readonly var node in nodes)
        {
            total += node.Weight;
            peak += node.Weight * node.Peak;
            density += node.Weight * node.Level;
        }

        (peak, density) = (peak / total, density / total);
        var ofPeak = saturationWeight * (top.WaterContentVariance + Square(top.WaterContent - peak));
        var ofDensity = saturationWeight * (top.DensityVariance + Square(top.Density - density));
        foreach (ref readonly var node in nodes)
        {
            ofPeak += node.Weight * Square(node.Peak - peak);
            ofDensity += node.Weight * (node.LevelVariance + Square(node.Level - density));
        }

        return new(peak, density, ofPeak / total, ofDensity / total);
    }

    /// <summary>
    /// The water content below which a share of the posterior lies: a place's mass spread evenly over its cell, the mode's as its normal,
    /// both cut off at the ends of the tested range.
    /// </summary>
    private double Quantile(ReadOnlySpan<double> masses, double whole, double share)
    {
        var spacing = PeakNodes.Spacing(points);
        var (toGo, below) = ((share * whole) + OfModeBelow(points.Driest), 0.0);
        for (var place = 0; place < masses.Length; place++)
        {
            var (left, right) = Cell(place);
            var slope = masses[place] / spacing;
            if (left < right && below + (slope * (right - left)) + OfModeBelow(right) >= toGo)
            {
                return Crossing(left, right, below, slope, toGo);
            }

            below += slope * (right - left);
        }

        return points.Wettest;
    }

    /// <summary>The cell of a place, cut off at the ends of the tested range; empty beyond them.</summary>
    private (double Left, double Right) Cell(int place)
    {
        var (center, half) = (nodes[place * LegShapes.Pairs.Length].Peak, PeakNodes.Spacing(points) / 2);
        var left = Math.Clamp(center - half, points.Driest, points.Wettest);
        return (left, Math.Clamp(center + half, left, points.Wettest));
    }

    /// <summary>Halves a cell until no digit is left: the distribution is continuous and rises.</summary>
    private double Crossing(double left, double right, double below, double slope, double toGo)
    {
        var (lower, upper) = (left, right);
        while (lower + ((upper - lower) / 2) is var middle && middle > lower && middle < upper)
        {
            if (below + (slope * (middle - left)) + OfModeBelow(middle) < toGo)
            {
                lower = middle;
            }
            else
            {
                upper = middle;
            }
        }

        return upper;
    }

    /// <summary>Mass of the mode below a water content, as a normal.</summary>
    private double OfModeBelow(double waterContent) => Saturation?.Peak is { } top
        ? SaturationWeight * 0.5 * SpecialFunctions.Erfc((top.WaterContent - waterContent) / Math.Sqrt(2 * top.WaterContentVariance))
        : 0;

    private static double Square(double value) => value * value;
}
