using Drypeak.Soil.Curves;
using MathNet.Numerics.Distributions;
using MathNet.Numerics.Random;

namespace Drypeak.Soil.Laboratory;

/// <summary>How much of the propagated variance one measured quantity brings.</summary>
/// <param name="Quantity">As in the request: <c>mass</c>, <c>volume</c>, ….</param>
/// <param name="Share">0 to 1, the mean over optimum and maximum; all shares together are 1.</param>
/// <param name="OfWaterContent">Its share of the optimum water content's variance.</param>
/// <param name="OfMaximumDryDensity">Its share of the maximum dry density's variance.</param>
public sealed record UncertaintyContribution(string Quantity, double Share, double OfWaterContent, double OfMaximumDryDensity);

/// <summary>The measurements' uncertainties, carried to the optimum.</summary>
/// <param name="Trials">Trials that gave an optimum.</param>
/// <param name="WaterContent">Standard uncertainty of the optimum water content from the measurements alone, fraction.</param>
/// <param name="MaximumDryDensity">Standard uncertainty of the maximum dry density from the measurements alone, kg/m³.</param>
/// <param name="Contributions">Greatest first.</param>
public sealed record PropagatedUncertainty(int Trials, double WaterContent, double MaximumDryDensity, IReadOnlyList<UncertaintyContribution> Contributions)
{
    private const double NormalQuantile = 1.959963984540054;

    /// <summary>The peak with the curve's own uncertainty and the measurements' together, the two taken as independent.</summary>
    public FittedOptimum Widen(FittedOptimum optimum) =>
        new(Widen(optimum.WaterContent, WaterContent), Widen(optimum.MaximumDryDensity, MaximumDryDensity));

    /// <summary>Variances add; each end of the 95 % interval moves out by the measurements' own half length, in quadrature.</summary>
    private static Estimate Widen(Estimate estimate, double measurements)
    {
        var further = NormalQuantile * measurements;
        return estimate with
        {
            StandardUncertainty = Hypotenuse(estimate.StandardUncertainty ?? 0, measurements),
            Lower = estimate.Value - Hypotenuse(estimate.Value - (estimate.Lower ?? estimate.Value), further),
            Upper = estimate.Value + Hypotenuse((estimate.Upper ?? estimate.Value) - estimate.Value, further),
        };
    }

    private static double Hypotenuse(double a, double b) => b == 0 ? a : Math.Sqrt((a * a) + (b * b));
}

/// <summary>
/// Monte Carlo propagation (JCGM 101:2008) of the measurements' standard uncertainties through the whole chain: weighings, volume, tins,
/// specific gravity, to the peak of the chosen model. Errors are normal and independent, but the mold's volume and the empty mold's
/// mass, each one error for all specimens of that mold.
/// </summary>
/// <remarks>
/// The draws are the same for every test (a fixed seed) and are dealt to the specimens in order of water content: neither the order
/// nor the units of a request change the answer. Shares come from the same trials, as the squared regression of the peak on each draw.
/// </remarks>
public static class UncertaintyPropagation
{
    /// <summary>Trials for a usual test; a test of many specimens gets fewer, at least <see cref="FewestTrials"/>.</summary>
    public const int UsualTrials = 2000;

    /// <summary>Fewest trials.</summary>
    public const int FewestTrials = 200;

    private const int Seed = 20250101;
    private const int TrialsTimesSpecimens = 40_000;

    /// <summary>Carries the uncertainties to the peak.</summary>
    /// <param name="test">The test, with uncertainties.</param>
    /// <param name="specimens">Its reduced specimens, in the order of the request.</param>
    /// <param name="model">The model whose peak it is.</param>
    /// <returns>Null where no uncertainty is over 0, or fewer than half of the trials have a peak.</returns>
    public static PropagatedUncertainty? Carry(MoistureDensityTest test, IReadOnlyList<Specimen> specimens, CurveModel model)
    {
        var chain = new PerturbedChain(test, specimens);
        if (chain.Inputs.Count == 0)
        {
            return null;
        }

        var trials = Math.Clamp(TrialsTimesSpecimens / chain.SpecimenCount, FewestTrials, UsualTrials);
        var draws = new double[trials][];
        var peaks = new List<(double Water, double Density, int Trial)>(trials);
        var random = new MersenneTwister(Seed, false);
        for (var trial = 0; trial < trials; trial++)
        {
            draws[trial] = new double[chain.Inputs.Count];
            Normal.Samples(random, draws[trial], 0, 1);
            if (CompactionCurve.PeakOf(chain.Points(draws[trial]), model) is { } peak)
            {
                peaks.Add((peak.WaterContent, peak.DryDensity, trial));
            }
        }

        return peaks.Count * 2 < trials ? null : Summarize(chain.Inputs, draws, peaks);
    }

    private static PropagatedUncertainty Summarize(
        IReadOnlyList<string> inputs, double[][] draws, List<(double Water, double Density, int Trial)> peaks)
    {
        var meanWater = peaks.Average(peak => peak.Water);
        var meanDensity = peaks.Average(peak => peak.Density);
        var varianceWater = peaks.Sum(peak => Square(peak.Water - meanWater)) / (peaks.Count - 1);
        var varianceDensity = peaks.Sum(peak => Square(peak.Density - meanDensity)) / (peaks.Count - 1);

        var ofWater = new Dictionary<string, double>();
        var ofDensity = new Dictionary<string, double>();
        for (var input = 0; input < inputs.Count; input++)
        {
            var water = peaks.Average(peak => draws[peak.Trial][input] * (peak.Water - meanWater));
            var density = peaks.Average(peak => draws[peak.Trial][input] * (peak.Density - meanDensity));
            // A squared regression of pure chance is the variance over the trials; it is taken off.
            Add(ofWater, inputs[input], Square(water) - (varianceWater / peaks.Count));
            Add(ofDensity, inputs[input], Square(density) - (varianceDensity / peaks.Count));
        }

        var (sharesWater, sharesDensity) = (Shares(ofWater), Shares(ofDensity));
        return new PropagatedUncertainty(peaks.Count, Math.Sqrt(varianceWater), Math.Sqrt(varianceDensity),
        [
            .. ofWater.Keys
                .Select(quantity => new UncertaintyContribution(quantity, (sharesWater[quantity] + sharesDensity[quantity]) / 2, sharesWater[quantity], sharesDensity[quantity]))
                .OrderByDescending(contribution => contribution.Share).ThenBy(contribution => contribution.Quantity, StringComparer.Ordinal),
        ]);
    }

    private static void Add(Dictionary<string, double> sums, string quantity, double value) =>
        sums[quantity] = sums.GetValueOrDefault(quantity) + value;

    private static Dictionary<string, double> Shares(Dictionary<string, double> variances)
    {
        var total = variances.Values.Sum(variance => Math.Max(variance, 0));
        return variances.ToDictionary(item => item.Key, item => total > 0 ? Math.Max(item.Value, 0) / total : 1.0 / variances.Count);
    }

    private static double Square(double value) => value * value;
}
