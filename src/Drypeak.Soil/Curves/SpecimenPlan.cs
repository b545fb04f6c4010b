using System.Globalization;

namespace Drypeak.Soil.Curves;

/// <summary>
/// Where one more specimen tells most. While the peak is not bracketed (two specimens on each side of the optimum, as the test standards ask)
/// it goes where one is missing; then to where it would lessen the optimum's variance most, by the covariance over the nodes of the
/// optimum and of the density that would be found there.
/// </summary>
internal static class SpecimenPlan
{
    /// <summary>Water contents are planned in steps of 0.5 %.</summary>
    private const double Step = 0.005;

    /// <summary>The usual distance between specimens, and how far beyond the tested range one is looked for. Common practice, no source.</summary>
    private const double UsualSpacing = 0.02;

    /// <summary>On the side of the peak that lacks one, a specimen nearer to it than this could end up on the other.</summary>
    private const double ClearOfPeak = 0.01;

    /// <summary>A water content nearer than this to one tested repeats it.</summary>
    private const double Repeats = 0.0025;

    /// <summary>
    /// With the peak bracketed, a specimen that would lessen the standard uncertainty by less than this is not asked for: 0.025 % water, by which an
    /// interval of four standard uncertainties shortens by the 0.1 % to which an optimum is reported.
    /// </summary>
    private const double LeastGain = 0.00025;

    private const int EnoughOnASide = 2;

    /// <summary>Bounds the work where the range is absurdly wide: the steps grow.</summary>
    private const int MostCandidates = 64;

    /// <summary>Nodes less probable than this, relative to the best, change no digit of the plan.</summary>
    private const double Negligible = 1e-6;

    /// <summary>The plan for points through which no curve can be drawn yet.</summary>
    public static NextSpecimen Start(TestedPoints points)
    {
        var falls = points.HasRange && points.Densities[^1] < points.Densities[0];
        return Beyond(points, wetter: !falls, string.Create(
            CultureInfo.InvariantCulture,
            $"A curve needs at least {AveragedModel.FewestPoints} specimens at different water contents; the density {(falls ? "falls" : "may rise")} to the wet side, so the next is {(falls ? "drier" : "wetter")} than those tested."));
    }

    /// <summary>The plan for a fitted curve, or null where one more specimen would gain little.</summary>
    public static NextSpecimen? Next(TestedPoints points, ReadOnlySpan<PeakNode> nodes, in PeakMixture mixture)
    {
        if (mixture.ChanceOutside > AveragedModel.GreatestChanceOutside)
        {
            var wetter = mixture.ChanceWetter >= mixture.ChanceDrier;
            return Beyond(points, wetter, string.Create(
                CultureInfo.InvariantCulture,
                $"The peak is probably {(wetter ? "wetter than the wettest" : "drier than the driest")} specimen (chance {100 * (wetter ? mixture.ChanceWetter : mixture.ChanceDrier):0} %): bracket it first."));
        }

        var drier = PeakNodes.SplitAt(points.WaterContents, mixture.Peak.WaterContent);
        var window = Window.For(mixture.Peak.WaterContent, drier, points.Count - drier);
        var now = Math.Sqrt(mixture.OfNodes.WaterContentVariance);
        var (best, after) = Best(points, nodes, mixture.OfNodes, window);
        if (window.IsBracketed && now - after < LeastGain)
        {
            return null;
        }

        return new(best, now, after, string.Create(
            CultureInfo.InvariantCulture,
            $"{window.Reason}: a specimen at {100 * best:0.0} % should bring the standard uncertainty of the optimum from {100 * now:0.00} to {100 * after:0.00} % water."));
    }

    private static NextSpecimen Beyond(TestedPoints points, bool wetter, string reason)
    {
        var drier = Math.Max(0, OnStep(points.Driest - UsualSpacing));
        return wetter || Repeated(points, drier)
            ? new(OnStep(points.Wettest + UsualSpacing), null, null, reason)
            : new(drier, null, null, reason);
    }

    private static (double WaterContent, double Deviation) Best(
        TestedPoints points, ReadOnlySpan<PeakNode> nodes, in PeakEstimate now, in Window window)
    {
        Span<int> counted = stackalloc int[nodes.Length];
        counted = Counted(nodes, counted);
        var first = Math.Max(0, Math.Ceiling((points.Driest - UsualSpacing) / Step));
        var last = Math.Floor((points.Wettest + UsualSpacing) / Step);
        var stride = 1 + Math.Floor((last - first) / MostCandidates);
        var (best, least, isWanted) = (double.NaN, double.PositiveInfinity, false);
        for (var k = first; k <= last; k += stride)
        {
            var candidate = OnStep(k * Step);
            var wanted = window.Holds(candidate) && !Repeated(points, candidate);
            if (isWanted && !wanted)
            {
                continue;
            }

            // What is wanted goes before what is not; among equals the lesser variance.
            var variance = VarianceAfter(candidate, points, nodes, counted, now);
            if (variance < least || (wanted && !isWanted))
            {
                (best, least, isWanted) = (candidate, variance, wanted);
            }
        }

        return (best, Math.Sqrt(Math.Max(0, least)));
    }

    /// <summary>Variance of the optimum expected after one more specimen: Var(x) − Cov(x, y)²/Var(y).</summary>
    private static double VarianceAfter(
        double waterContent, TestedPoints points, ReadOnlySpan<PeakNode> nodes, ReadOnlySpan<int> counted, in PeakEstimate now)
    {
        double total = 0, first = 0, second = 0, covariance = 0;
        foreach (var i in counted)
        {
            ref readonly var node = ref nodes[i];
            var drop = node.DropAt(waterContent, points, out var leg);
            var onLevel = 1 - (leg.ScaleVariance * leg.Drops * drop);
            var variance = (leg.ScaleVariance * drop * drop) + (node.LevelVariance * onLevel * onLevel) + LegSums.NoiseVariance(drop);
            var density = node.Level - (leg.Scale * drop) - points.HighestDensity;
            total += node.Weight;
            first += node.Weight * density;
            second += node.Weight * (variance + (density * density));
            covariance += node.Weight * (node.Peak - now.WaterContent) * density;
        }

        var ofDensity = (second / total) - (first / total * (first / total));
        return now.WaterContentVariance - (covariance / total * (covariance / total) / ofDensity);
    }

    private static Span<int> Counted(ReadOnlySpan<PeakNode> nodes, Span<int> counted)
    {
        var count = 0;
        for (var i = 0; i < nodes.Length; i++)
        {
            if (nodes[i].Weight > Negligible)
            {
                counted[count++] = i;
            }
        }

        return counted[..count];
    }

    private static double OnStep(double waterContent) => Math.Round(waterContent / Step) / (1 / Step);

    private static bool Repeated(TestedPoints points, double waterContent)
    {
        foreach (var tested in points.WaterContents)
        {
            if (Math.Abs(tested - waterContent) < Repeats)
            {
                return true;
            }
        }

        return false;
    }

    /// <summary>Where the next specimen is wanted: on the side that lacks one, else anywhere.</summary>
    private readonly record struct Window(double From, double To, string Reason)
    {
        public bool IsBracketed => Reason == Bracketed;

        private const string Bracketed = "The peak is bracketed";

        public bool Holds(double waterContent) => waterContent >= From && waterContent <= To;

        public static Window For(double peak, int drier, int wetter) => (drier >= EnoughOnASide, wetter >= EnoughOnASide) switch
        {
            (true, true) => new(double.NegativeInfinity, double.PositiveInfinity, Bracketed),
            (false, true) => new(double.NegativeInfinity, peak - ClearOfPeak, "Only one specimen is drier than the optimum"),
            (true, false) => new(peak + ClearOfPeak, double.PositiveInfinity, "Only one specimen is wetter than the optimum"),
            _ => new(double.NegativeInfinity, double.PositiveInfinity, "Fewer than two specimens stand on each side of the optimum"),
        };
    }
}
