using Drypeak.Soil.Acceptance.LotRules;
using Drypeak.Soil.Acceptance.Statistics;
using MathNet.Numerics.Distributions;
using MathNet.Numerics.Random;

namespace Drypeak.Soil.Acceptance.Plans;

/// <summary>
/// Probability of acceptance by trials: lots of normal tests are drawn from a stated seed and judged by the very rules that judge real lots.
/// All levels see the same lots, moved: the curve is as smooth as one lot's fate.
/// </summary>
public static class PlanSimulation
{
    /// <summary>Judges so many lots at each level.</summary>
    /// <param name="plan">The plan.</param>
    /// <param name="levels">True means.</param>
    /// <param name="seed">The same seed gives the same numbers.</param>
    /// <param name="trials">1 or more.</param>
    public static IReadOnlyList<AcceptanceProbability> Run(AcceptancePlan plan, IReadOnlyList<double> levels, int seed, int trials)
    {
        var (count, sigma) = (plan.Count, plan.StandardDeviation);
        SampleAcceptance[] rules = [.. plan.Rules.Select(rule => rule.AcceptanceOf(count))];
        var looksAtEach = plan.Rules.Any(rule => rule.LooksAtEachValue);
        var (standard, values) = (new double[count], new double[looksAtEach ? count : 0]);
        var accepted = new int[levels.Count];
        var random = new MersenneTwister(seed, false);
        for (var trial = 0; trial < trials; trial++)
        {
            Normal.Samples(random, standard, 0, 1);
            var summary = SampleSummary.Of(standard)!.Value;
            for (var i = 0; i < accepted.Length; i++)
            {
                var level = levels[i];
                for (var k = 0; k < values.Length; k++)
                {
                    values[k] = level + (sigma * standard[k]);
                }

                var moved = new SampleSummary(count, level + (sigma * summary.Mean), sigma * summary.StandardDeviation, level + (sigma * summary.Minimum), level + (sigma * summary.Maximum));
                accepted[i] += Array.TrueForAll(rules, accepts => accepts(in moved, values)) ? 1 : 0;
            }
        }

        return
        [
            .. levels.Select((level, i) =>
            {
                var share = accepted[i] / (double)trials;
                return new AcceptanceProbability(level, share, Math.Sqrt(share * (1 - share) / trials));
            }),
        ];
    }
}
