namespace Drypeak.Soil.Curves;

/// <summary>One supposed optimum with one pair of leg shapes, its level and scales integrated out.</summary>
internal struct PeakNode
{
    /// <summary>The supposed optimum, fraction.</summary>
    public double Peak;

    /// <summary>ln of the prior of the optimum, p(x).</summary>
    public double LogPrior;

    /// <summary>ln of the weight by the points and all other priors; the prior of the optimum is not in it.</summary>
    public double LogWeight;

    /// <summary>Mean of the maximum dry density given the node, Mg/m³.</summary>
    public double Level;

    /// <summary>Variance of the level given the node.</summary>
    public double LevelVariance;

    /// <summary>Relative weight once it is known which nodes count; 0 outside the tested range.</summary>
    public double Weight;

    /// <summary>Place among <see cref="LegShapes.Pairs"/>.</summary>
    public int Pair;

    public NodeLeg Dry;
    public NodeLeg Wet;

    /// <summary>Density that the node's shape loses from its peak to a water content, for the scale 1, and the leg on which that lies.</summary>
    public readonly double DropAt(double waterContent, TestedPoints points, out NodeLeg leg)
    {
        var fromPeak = waterContent - Peak;
        leg = fromPeak < 0 ? Dry : Wet;
        return (fromPeak < 0 ? LegShapes.DryOfPair : LegShapes.WetOfPair)[Pair].Drop(Math.Abs(fromPeak), points.SaturationSlope, points.RelativeDensity);
    }
}

/// <summary>A leg of a node.</summary>
/// <param name="Scale">β̂, its mean scale.</param>
/// <param name="ScaleVariance">q.</param>
/// <param name="Drops">S1 = ΣE/N.</param>
internal readonly record struct NodeLeg(double Scale, double ScaleVariance, double Drops)
{
    public static NodeLeg From(in LegSums sums, double level) => new(sums.Scale(level), sums.ScaleVariance, sums.Drops);
}

/// <summary>
/// The optimum's posterior on a grid: places of the peak × pairs of leg shapes. Everything else is integrated in closed form,
/// so that there is no iteration and no matrix.
/// </summary>
internal static class PeakNodes
{
    public const int Places = 41;
    public const int Count = Places * 8;

    /// <summary>The grid reaches this share of the range beyond it on either side.</summary>
    private const double Overhang = 0.25;

    /// <summary>Deviation of the prior of the optimum about the middle of the range, as a share of the range.</summary>
    private const double PriorWidth = 0.3;

    /// <summary>Air voids at a peak, as a share of the volume: mean and deviation.</summary>
    private const double AirVoids = 0.09, AirVoidsDeviation = 0.12;

    /// <summary>Deviation of the maximum about the highest density where the specific gravity is not known, Mg/m³.</summary>
    private const double LevelDeviation = 0.3;

    /// <summary>Prior probability of the saturation component.</summary>
    public const double SaturationShare = 0.05;

    /// <summary>Distance between two places of the grid.</summary>
    public static double Spacing(TestedPoints points) => points.Range * (1 + (2 * Overhang)) / (Places - 1);

    /// <summary>ln p(x).</summary>
    public static double LogPrior(TestedPoints points, double peak)
    {
        var fromMiddle = (peak - ((points.Driest + points.Wettest) / 2)) / (PriorWidth * points.Range);
        return -0.5 * fromMiddle * fromMiddle;
    }

    /// <summary>Fills the nodes, place by place and pair by pair.</summary>
    public static void Fill(TestedPoints points, Span<PeakNode> nodes)
    {
        Span<LegSums> dry = stackalloc LegSums[LegShapes.Dry.Length];
        Span<LegSums> wet = stackalloc LegSums[LegShapes.Wet.Length];
        var (spacing, first) = (Spacing(points), points.Driest - (Overhang * points.Range));
        for (var place = 0; place < Places; place++)
        {
            var peak = first + (spacing * place);
            var split = SplitAt(points.WaterContents, peak);
            SumLegs(LegShapes.Dry, points, peak, ..split, dry);
            SumLegs(LegShapes.Wet, points, peak, split.., wet);
            var prior = LogPrior(points, peak);
            var level = LevelPrior.At(points, peak);
            for (var pair = 0; pair < LegShapes.Pairs.Length; pair++)
            {
                ref var node = ref nodes[(place * LegShapes.Pairs.Length) + pair];
                node.Peak = peak;
                node.LogPrior = prior;
                node.Pair = pair;
                Weigh(ref node, dry[LegShapes.Pairs[pair].Dry], wet[LegShapes.Pairs[pair].Wet], level, points);
            }
        }
    }

    /// <summary>Number of points drier than a water content.</summary>
    public static int SplitAt(ReadOnlySpan<double> waterContents, double peak)
    {
        var split = 0;
        while (split < waterContents.Length && waterContents[split] < peak)
        {
            split++;
        }

        return split;
    }

    private static void SumLegs(LegShape[] shapes, TestedPoints points, double peak, Range side, Span<LegSums> sums)
    {
        var waterContents = points.WaterContents.AsSpan(side);
        var densities = points.Densities.AsSpan(side);
        for (var i = 0; i < shapes.Length; i++)
        {
            sums[i] = LegSums.Over(shapes[i], peak, waterContents, densities, points.HighestDensity, points.WaterDensity);
        }
    }

    private static void Weigh(ref PeakNode node, in LegSums dry, in LegSums wet, in LevelPrior prior, TestedPoints points)
    {
        var information = dry.Information + wet.Information + prior.Precision;
        var score = dry.Score + wet.Score + (prior.Mean * prior.Precision);
        var squares = dry.Squares + wet.Squares + (prior.Mean * prior.Mean * prior.Precision);
        var level = score / information;
        var determinant = Math.Log(dry.Determinant * wet.Determinant * information / prior.Precision)
            + dry.LogDeterminant + wet.LogDeterminant;
        node.LogWeight = LogPairPriors[node.Pair]
            + (points.SpecificGravity is null ? 0 : LogWithoutSaturation)
            - (0.5 * (squares - (score * level) + determinant));
        node.Level = points.HighestDensity + level;
        node.LevelVariance = 1 / information;
        node.Dry = NodeLeg.From(dry, level);
        node.Wet = NodeLeg.From(wet, level);
    }

    private static readonly double LogWithoutSaturation = Math.Log(1 - SaturationShare);

    private static readonly double[] LogPairPriors = [.. LegShapes.Pairs.Select(pair => Math.Log(pair.Prior / Places))];

    /// <summary>What is known of the maximum before the points speak, as a distance above the highest density.</summary>
    private readonly record struct LevelPrior(double Mean, double Precision)
    {
        public static LevelPrior At(TestedPoints points, double peak)
        {
            if (points.SpecificGravity is not { } gs)
            {
                return new(0, 1 / (LevelDeviation * LevelDeviation));
            }

            // A place of the grid may lie below no water at all; the line must not run away there.
            var solidsAndWater = points.ZeroAirVoids(Math.Max(peak, -0.5 / gs));
            var deviation = AirVoidsDeviation * solidsAndWater;
            return new(((1 - AirVoids) * solidsAndWater) - points.HighestDensity, 1 / (deviation * deviation));
        }
    }
}
