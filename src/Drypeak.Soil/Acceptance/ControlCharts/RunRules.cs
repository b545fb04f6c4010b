namespace Drypeak.Soil.Acceptance.ControlCharts;

/// <summary>Published sets of rules for runs on a chart of individuals.</summary>
public enum RunRules
{
    /// <summary>A point beyond a control limit, and no run.</summary>
    LimitsOnly,
    /// <summary>The four tests of the Western Electric handbook.</summary>
    WesternElectric,
    /// <summary>The eight tests of Nelson.</summary>
    Nelson,
}

/// <summary>What each set is called, and where it stands.</summary>
public static class RunRuleSources
{
    /// <summary>The source.</summary>
    public static string Source(this RunRules rules) => rules switch
    {
        RunRules.LimitsOnly => "Shewhart 1931, control limits alone",
        RunRules.WesternElectric => "Western Electric Co., Statistical Quality Control Handbook, 1956",
        _ => "L. S. Nelson, The Shewhart control chart: tests for special causes, J. Qual. Technol. 16 (1984) 237–239",
    };
}

/// <summary>Where results in order break a run rule. The rules are written from memory of the two sources.</summary>
internal static class RunRuleSignals
{
    /// <summary>On a limit is not beyond it.</summary>
    public const double JustBeyond = 1 + 1e-9;

    /// <summary>For each result the rules that it breaks, in one text, or null. A run signals at its last point.</summary>
    /// <param name="z">Results less the center, in standard deviations.</param>
    /// <param name="rules">Which set.</param>
    /// <param name="width">The control limits, in standard deviations.</param>
    public static string?[] Of(double[] z, RunRules rules, double width)
    {
        var signals = new string?[z.Length];
        for (var i = 0; i < z.Length; i++)
        {
            List<string> broken = [];
            var (side, where) = z[i] > 0 ? (1, "above") : (-1, "below");
            if (Math.Abs(z[i]) > width * JustBeyond)
            {
                broken.Add($"{(z[i] > 0 ? "Above the upper" : "Below the lower")} control limit ({Named(rules, 1, 1)}).");
            }

            if (rules != RunRules.LimitsOnly)
            {
                var run = rules == RunRules.Nelson ? 9 : 8;
                Add(broken, CountBeyond(z, i, run, side, 0) == run, $"{run} in a row {where} the center ({Named(rules, 4, 2)}).");
                Add(broken, z[i] * side > 2 * JustBeyond && CountBeyond(z, i, 3, side, 2) >= 2, $"Two of three more than two standard deviations {where} the center ({Named(rules, 2, 5)}).");
                Add(broken, z[i] * side > JustBeyond && CountBeyond(z, i, 5, side, 1) >= 4, $"Four of five more than one standard deviation {where} the center ({Named(rules, 3, 6)}).");
            }

            if (rules == RunRules.Nelson)
            {
                Add(broken, AllSteps(z, i, 5, (_, step) => step > 0) || AllSteps(z, i, 5, (_, step) => step < 0), $"Six in a row steadily {(i > 0 && z[i] > z[i - 1] ? "rising" : "falling")} ({Named(rules, 0, 3)}).");
                Add(broken, AllSteps(z, i, 13, (before, step) => before * step < 0), $"Fourteen in a row alternately up and down ({Named(rules, 0, 4)}).");
                Add(broken, AllWithin(z, i, 15, value => Math.Abs(value) < 1), $"Fifteen in a row within one standard deviation: the limits are too wide for the results ({Named(rules, 0, 7)}).");
                Add(broken, AllWithin(z, i, 8, value => Math.Abs(value) > JustBeyond) && CountBeyond(z, i, 8, 1, 0) is > 0 and < 8, $"Eight in a row beyond one standard deviation, on both sides ({Named(rules, 0, 8)}).");
            }

            signals[i] = broken.Count == 0 ? null : string.Join(' ', broken);
        }

        return signals;
    }

    private static string Named(RunRules rules, int westernElectric, int nelson) => rules switch
    {
        RunRules.Nelson => $"Nelson test {nelson}",
        RunRules.WesternElectric => $"Western Electric rule {westernElectric}",
        _ => "Shewhart",
    };

    private static void Add(List<string> broken, bool isBroken, string text)
    {
        if (isBroken)
        {
            broken.Add(text);
        }
    }

    /// <summary>How many of the last so many results lie on one side, beyond so many standard deviations; 0 where there are not so many results.</summary>
    private static int CountBeyond(double[] z, int last, int of, int side, double beyond)
    {
        var count = 0;
        for (var i = last; last - of + 1 >= 0 && i > last - of; i--)
        {
            count += z[i] * side > beyond * JustBeyond ? 1 : 0;
        }

        return count;
    }

    private static bool AllWithin(double[] z, int last, int of, Func<double, bool> holds) =>
        last - of + 1 >= 0 && z.AsSpan(last - of + 1, of).ToArray().All(holds);

    /// <summary>Whether the last so many steps from result to result all hold, each beside the step before it.</summary>
    private static bool AllSteps(double[] z, int last, int steps, Func<double, double, bool> holds)
    {
        if (last - steps < 0)
        {
            return false;
        }

        for (var i = last; i > last - steps; i--)
        {
            var step = z[i] - z[i - 1];
            var before = i - 1 > last - steps ? z[i - 1] - z[i - 2] : -step;
            if (!holds(before, step))
            {
                return false;
            }
        }

        return true;
    }
}
