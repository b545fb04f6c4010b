using Drypeak.Soil.Acceptance.Statistics;
using Drypeak.Soil.Quantities;

namespace Drypeak.Soil.Acceptance.LotRules;

/// <summary>The tests of a lot that count, in order, as the rules look at them. Not for several threads.</summary>
/// <param name="tests">Neither set aside nor replaced.</param>
/// <param name="units">The units that texts speak.</param>
internal sealed class LotSample(IReadOnlyList<LotTest> tests, UnitSet units)
{
    private readonly Dictionary<AcceptedQuantity, KnownValues> _known = [];

    public IReadOnlyList<LotTest> Tests => tests;

    public UnitSet Units => units;

    /// <summary>The values of a quantity, and who has none.</summary>
    public KnownValues Of(AcceptedQuantity quantity)
    {
        if (!_known.TryGetValue(quantity, out var known))
        {
            known = new KnownValues(
                [.. tests.Where(test => test.Values[quantity] is { })],
                [.. tests.Select(test => test.Values[quantity]).OfType<double>()],
                [.. tests.Where(test => test.Values[quantity] is null).Select(test => test.Label)]);
            _known.Add(quantity, known);
        }

        return known;
    }
}

/// <summary>The values of one quantity in a lot.</summary>
/// <param name="Tests">The tests that have one, in order.</param>
/// <param name="Values">Theirs, in the quantity's SI unit.</param>
/// <param name="Missing">Labels of the tests without.</param>
internal sealed record KnownValues(IReadOnlyList<LotTest> Tests, double[] Values, IReadOnlyList<string> Missing)
{
    /// <summary>How many values there are.</summary>
    public int Count => Values.Length;

    /// <summary>Their summary; null where there are none.</summary>
    public SampleSummary? Summary { get; } = SampleSummary.Of(Values);
}

/// <summary>Labels in a sentence.</summary>
internal static class Labels
{
    private const int Most = 5;

    /// <summary><c>Tests 3, 7 and 9</c>; beyond five, how many more.</summary>
    public static string Listed(IReadOnlyList<string> labels, string noun)
    {
        var start = char.ToUpperInvariant(noun[0]) + noun[1..];
        return labels.Count switch
        {
            1 => $"{start} {labels[0]}",
            <= Most => $"{start}s {string.Join(", ", labels.Take(labels.Count - 1))} and {labels[^1]}",
            _ => $"{start}s {string.Join(", ", labels.Take(Most))} and {labels.Count - Most} more",
        };
    }
}
