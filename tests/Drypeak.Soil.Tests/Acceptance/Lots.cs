using Drypeak.Soil.Acceptance;
using Drypeak.Soil.Acceptance.LotRules;
using Drypeak.Soil.FieldDensity;
using Drypeak.Soil.Quantities;

namespace Drypeak.Soil.Tests.Acceptance;

/// <summary>Lots for tests.</summary>
internal static class Lots
{
    /// <summary>A lot of relative compactions, as fractions, labelled from 1.</summary>
    public static Lot Of(IEnumerable<double> compactions, params IReadOnlyList<LotRule> rules) => new()
    {
        Tests = [.. compactions.Select((value, i) => Test($"{i + 1}", (AcceptedQuantity.RelativeCompaction, value)))],
        Rules = rules,
        Reference = Reference,
    };

    public static JudgedSoil Reference { get; } = new()
    {
        WaterDensity = 1000,
        MaximumDryDensity = 1900,
        OptimumWaterContent = 0.12,
        SpecificGravity = 2.7,
    };

    public static LotTest Test(string label, params ReadOnlySpan<(AcceptedQuantity Quantity, double Value)> values)
    {
        var given = new Dictionary<AcceptedQuantity, double>();
        foreach (var (quantity, value) in values)
        {
            given.Add(quantity, value);
        }

        return new LotTest { Label = label, Values = TestValues.Complete(given, Reference, _ => "", new UnitSet(), []) };
    }

    public static Requirement Compaction(double? minimum, double? maximum = null) => new(AcceptedQuantity.RelativeCompaction, minimum, maximum);

    public static LotJudgement Judged(this LotRule rule, params IEnumerable<double> compactions) => LotAnalysis.Analyze(Of(compactions, rule)).Rules[0];
}
