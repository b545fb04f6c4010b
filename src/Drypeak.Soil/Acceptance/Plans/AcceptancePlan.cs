using Drypeak.Soil.Acceptance.LotRules;

namespace Drypeak.Soil.Acceptance.Plans;

/// <summary>How a lot is to be accepted: so many tests, and rules that must all be met. Tests are normal about the lot's true mean. Immutable, safe on any thread.</summary>
/// <param name="Rules">One or more, all on one quantity.</param>
/// <param name="Count">Tests, 1 or more.</param>
/// <param name="StandardDeviation">True standard deviation of single tests in the lot, over 0; in the unit of the rules' limits.</param>
public sealed record AcceptancePlan(IReadOnlyList<QuantityRule> Rules, int Count, double StandardDeviation)
{
    /// <summary>Tests that the rules need to say anything.</summary>
    public int LeastCount => Rules.Max(rule => rule is MovingMeanRule moving ? moving.Span : rule.LeastCount);

    /// <summary>Whether theory gives the probability of acceptance; else it is simulated.</summary>
    public bool IsExact => Exact is { };

    /// <summary>By theory; null where it has to be simulated.</summary>
    internal Func<double, double>? Exact =>
        Count < LeastCount ? _ => 0 : Rules is [{ } rule] ? rule.ExactProbability(Count, StandardDeviation) : null;

    /// <summary>Probability of acceptance at each of the true means.</summary>
    /// <param name="levels">True means.</param>
    /// <param name="seed">Of the random numbers, where it is simulated.</param>
    /// <param name="trials">1 or more, where it is simulated.</param>
    public OperatingCharacteristic At(IReadOnlyList<double> levels, int seed, int trials)
    {
        if (Exact is { } exact)
        {
            return new OperatingCharacteristic([.. levels.Select(level => new AcceptanceProbability(level, Math.Clamp(exact(level), 0, 1), 0))], null);
        }

        return new OperatingCharacteristic(PlanSimulation.Run(this, levels, seed, trials), trials);
    }
}

/// <summary>The probability of acceptance against the true mean of the lot.</summary>
/// <param name="Points">In the order of the levels asked for.</param>
/// <param name="Trials">Lots that were simulated; null where it is exact.</param>
public sealed record OperatingCharacteristic(IReadOnlyList<AcceptanceProbability> Points, int? Trials);

/// <summary>A point of the curve.</summary>
/// <param name="Level">True mean of the lot.</param>
/// <param name="Probability">Of acceptance, 0 to 1.</param>
/// <param name="StandardError">Of the probability where it was simulated; else 0.</param>
public readonly record struct AcceptanceProbability(double Level, double Probability, double StandardError);
