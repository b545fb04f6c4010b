using Drypeak.Soil.Acceptance;
using Drypeak.Soil.Laboratory.Workings;

namespace Drypeak.Soil.FieldDensity;

/// <summary>What a field test says.</summary>
/// <param name="Soil">The soil in place.</param>
/// <param name="Judged">The same beside its reference.</param>
/// <param name="Judgements">Each requirement, in the order of the specification.</param>
/// <param name="Outcome">Of the test; null where nothing was required.</param>
/// <param name="Working">Each step of the arithmetic.</param>
/// <param name="Findings">What a careful reviewer says, worst first.</param>
public sealed record FieldResult(
    SoilInPlace Soil,
    JudgedSoil Judged,
    IReadOnlyList<Judgement> Judgements,
    TestOutcome? Outcome,
    IReadOnlyList<WorkingStep> Working,
    IReadOnlyList<Finding> Findings);
