using Drypeak.Service.Acceptance;
using Drypeak.Soil.Quantities;

namespace Drypeak.Service.Pages.Acceptance;

/// <summary>The sentences of a plan as a page shows them.</summary>
internal static class PlanWords
{
    /// <summary>The risks, or the number of tests that was found.</summary>
    public static string Headline(AcceptancePlanAnswer answer) => answer switch
    {
        { Count: null } => "No plan keeps both risks",
        { ProducersRisk: { } producers, ConsumersRisk: { } consumers } => $"{Tests(answer)}: producer’s risk {ReaderText.Percent(producers)}, consumer’s risk {ReaderText.Percent(consumers)}",
        { ProducersRisk: { } producers } => $"{Tests(answer)}: producer’s risk {ReaderText.Percent(producers)}",
        { ConsumersRisk: { } consumers } => $"{Tests(answer)}: consumer’s risk {ReaderText.Percent(consumers)}",
        _ => $"{Tests(answer)} a lot",
    };

    /// <summary>The number that goes with a rule, where a design found it.</summary>
    public static string? Number(LotRuleContract rule) => rule switch
    {
        { Rule: LotRuleNames.CharacteristicValue, Factor: { } factor } => $"k = {ReaderText.Fixed(factor, 3)}",
        { Rule: LotRuleNames.PercentWithinLimits or LotRuleNames.ShareOfTests, Required: { } required } => $"{ReaderText.Fixed(required, 1)} % required",
        { Minimum: { } minimum } => $"at least {ReaderText.Significant(minimum)}",
        { Maximum: { } maximum } => $"at most {ReaderText.Significant(maximum)}",
        _ => null,
    };

    /// <summary>The number of tests.</summary>
    public static string Tests(AcceptancePlanAnswer answer) => answer.Count == 1 ? "1 test" : $"{answer.Count} tests";
}
