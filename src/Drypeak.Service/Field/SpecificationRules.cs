using Drypeak.Service.Contracts;
using Drypeak.Soil.Acceptance;
using Drypeak.Soil.Quantities;
using FluentValidation;

namespace Drypeak.Service.Field;

/// <summary>The rules of a specification.</summary>
internal sealed class SpecificationRules : AbstractValidator<SpecificationContract>
{
    private const int MostRequirements = 20;

    public SpecificationRules()
    {
        RuleFor(specification => specification.Requirements).Needed().Counted(MostRequirements);
        RuleForEach(specification => specification.Requirements).Needed().SetValidator(new RequirementRules());
        RuleFor(specification => specification.Decision!).SetValidator(new DecisionRules()).When(specification => specification.Decision is { });
    }

    private sealed class DecisionRules : AbstractValidator<DecisionContract>
    {
        public DecisionRules()
        {
            RuleFor(decision => decision.Rule).Needed().OneOf([Specification.Simple, Specification.Guarded], "unknown-word");
            RuleFor(decision => decision.Risk).NotNull().When(decision => decision.Rule == Specification.Guarded)
                .WithErrorCode("not-enough-data").WithMessage("A guarded decision needs its risk. Give it, such as 0.05.");
            RuleFor(decision => decision.Risk).Null().When(decision => decision.Rule == Specification.Simple)
                .WithErrorCode("not-for-this-rule").WithMessage("The simple rule has no risk. Leave it out, or decide by the guarded rule.");
            RuleFor(decision => decision.Risk).Must(risk => risk is null or (>= 1e-9 and <= 0.5)).When(decision => decision.Rule != Specification.Simple)
                .WithErrorCode("out-of-range").WithMessage((_, risk) => $"A risk is a fraction over 0 and up to 0.5; {RuleWords.Text(risk)} was received.");
        }
    }
}

/// <summary>The rules of one requirement: a quantity that is known, and possible limits the right way round.</summary>
internal sealed class RequirementRules : AbstractValidator<RequirementContract>
{
    public RequirementRules()
    {
        RuleFor(requirement => requirement.Quantity).Needed().OneOf(Specification.Quantities.Keys, "unknown-quantity");
        RuleFor(requirement => requirement.Minimum).Must((requirement, limit) => IsPossible(requirement, limit))
            .WithErrorCode("out-of-range").WithMessage((requirement, limit) => Impossible(requirement, limit));
        RuleFor(requirement => requirement.Maximum).Must((requirement, limit) => IsPossible(requirement, limit))
            .WithErrorCode("out-of-range").WithMessage((requirement, limit) => Impossible(requirement, limit));
        RuleFor(requirement => requirement.Minimum).NotNull().When(requirement => requirement.Maximum is null)
            .WithErrorCode("not-enough-data").WithMessage("A requirement needs a limit. Give minimum, maximum, or both.");
        RuleFor(requirement => requirement.Maximum).Must((requirement, maximum) => !(maximum < requirement.Minimum))
            .WithErrorCode("limits-exchanged")
            .WithMessage((requirement, maximum) => $"The maximum, {RuleWords.Text(maximum)}, is below the minimum, {RuleWords.Text(requirement.Minimum)}. Were the two exchanged?");
    }

    private static bool IsPossible(RequirementContract requirement, double? limit) =>
        limit is not { } value || requirement.Quantity is not { } name || !Specification.Quantities.TryGetValue(name, out var quantity)
        || RangeOf(quantity) is var (least, most) && value >= least && value <= most;

    private static string Impossible(RequirementContract requirement, double? limit)
    {
        var (least, most) = RangeOf(Specification.Quantities[requirement.Quantity!]);
        return $"A limit of {requirement.Quantity} lies between {RuleWords.Text(least)} and {RuleWords.Text(most)}; {RuleWords.Text(limit)} was received.";
    }

    private static (double Least, double Most) RangeOf(AcceptedQuantity quantity) => quantity switch
    {
        AcceptedQuantity.WaterContentFromOptimum or AcceptedQuantity.RelativeDensity => (-1000, 1000),
        AcceptedQuantity.Saturation or AcceptedQuantity.AirVoids => (0, 100),
        AcceptedQuantity.RelativeCompaction or AcceptedQuantity.WaterContent => (0, 1000),
        _ => (0, RuleWords.Greatest),
    };
}

/// <summary>A specification from contract to domain, and its judgements back. Call with specifications that passed the rules.</summary>
internal static class Specification
{
    public const string Simple = "simple";
    public const string Guarded = "guarded";

    /// <summary>The quantities by their names in the interface.</summary>
    public static readonly IReadOnlyDictionary<string, AcceptedQuantity> Quantities =
        Enum.GetValues<AcceptedQuantity>().ToDictionary(quantity => System.Text.Json.JsonNamingPolicy.CamelCase.ConvertName(quantity.ToString()));

    private static readonly Dictionary<AcceptedQuantity, string> Names = Quantities.ToDictionary(pair => pair.Value, pair => pair.Key);

    /// <summary>The name of a quantity in the interface.</summary>
    public static string NameOf(AcceptedQuantity quantity) => Names[quantity];

    /// <summary>The name of an outcome in the interface.</summary>
    public static string NameOf(Conformance conformance) => conformance switch { Conformance.Met => "met", Conformance.NotMet => "not-met", _ => "undecided" };

    public static IReadOnlyList<Requirement> ToRequirements(this SpecificationContract? specification, UnitSet units) =>
    [
        .. (specification?.Requirements ?? []).Select(requirement =>
        {
            var quantity = Quantities[requirement.Quantity!];
            var unit = UnitOf(quantity, units);
            return new Requirement(quantity, requirement.Minimum * unit, requirement.Maximum * unit);
        }),
    ];

    public static DecisionRule ToDecision(this SpecificationContract? specification) => new(specification?.Decision?.Risk);

    public static RequirementAnswer ToAnswer(this Judgement judged, RequirementContract given, string explanation, UnitSet units)
    {
        var unit = UnitOf(judged.Requirement.Quantity, units);
        return new RequirementAnswer(
            given.Quantity!, given.Minimum, given.Maximum, judged.Value / unit, judged.Margin / unit, judged.StandardUncertainty / unit, judged.ProbabilityOfConformance,
            NameOf(judged.Conformance), explanation);
    }

    /// <summary>The quantity's SI unit in one of the caller's: a hundredth for a percentage.</summary>
    public static double UnitOf(AcceptedQuantity quantity, UnitSet units) =>
        quantity.IsDensity() ? units.Density.InKilogramsPerCubicMeter() : quantity.IsPercent() ? 0.01 : 1;
}
