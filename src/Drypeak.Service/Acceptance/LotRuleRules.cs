using Drypeak.Service.Contracts;
using Drypeak.Service.Field;
using Drypeak.Soil.Acceptance;
using Drypeak.Soil.Acceptance.LotRules;
using Drypeak.Soil.Quantities;
using FluentValidation;

namespace Drypeak.Service.Acceptance;

/// <summary>The names of the rules of a lot, and what belongs to each.</summary>
internal static class LotRuleNames
{
    public const string EveryTest = "every-test";
    public const string Mean = "mean";
    public const string MovingMean = "moving-mean";
    public const string PercentWithinLimits = "percent-within-limits";
    public const string CharacteristicValue = "characteristic-value";
    public const string ShareOfTests = "share-of-tests";
    public const string WetOfLineOfOptimums = "wet-of-line-of-optimums";

    public static IReadOnlyList<string> All { get; } = [EveryTest, Mean, MovingMean, PercentWithinLimits, CharacteristicValue, ShareOfTests, WetOfLineOfOptimums];

    /// <summary>Whether the rule holds outcomes and not a quantity against anything.</summary>
    public static bool LooksAtOutcomes(this LotRuleContract rule) => rule is { Rule: EveryTest, Quantity: null, Minimum: null, Maximum: null };

    /// <summary>The rule of a lot. Call with rules that passed <see cref="LotRuleRules"/>.</summary>
    /// <param name="rule">The rule.</param>
    /// <param name="units">Units of its limits.</param>
    public static LotRule ToLotRule(this LotRuleContract rule, UnitSet units) =>
        rule.LooksAtOutcomes() ? new AcceptedTestsRule()
            : rule.Rule == WetOfLineOfOptimums ? new WetOfOptimumsRule(rule.Required!.Value / 100)
            : rule.ToQuantityRule(units);

    /// <summary>The rule on a quantity; where it names none it is the relative compaction.</summary>
    public static QuantityRule ToQuantityRule(this LotRuleContract rule, UnitSet units)
    {
        var quantity = rule.QuantityMeant();
        var unit = Specification.UnitOf(quantity, units);
        var limits = new Requirement(quantity, rule.Minimum * unit, rule.Maximum * unit);
        return rule.Rule switch
        {
            EveryTest => new EveryTestRule(limits),
            Mean => new MeanRule(limits),
            MovingMean => new MovingMeanRule(limits, rule.Count!.Value, rule.Floor * unit),
            PercentWithinLimits => new PercentWithinLimitsRule(limits, (rule.Required ?? 0) / 100),
            CharacteristicValue => new CharacteristicValueRule(limits, rule.Factor, rule.Risk, rule.Fraction),
            ShareOfTests => new ShareOfTestsRule(limits, (rule.Required ?? 0) / 100),
            _ => throw new ArgumentException("Not a rule on a quantity.", nameof(rule)),
        };
    }

    public static AcceptedQuantity QuantityMeant(this LotRuleContract rule) =>
        rule.Quantity is { } name ? Specification.Quantities[name] : AcceptedQuantity.RelativeCompaction;
}

/// <summary>What a rule of a lot must keep: the members that belong to it, in their ranges, and no others.</summary>
internal sealed class LotRuleRules : AbstractValidator<LotRuleContract>
{
    private const double MostFactor = 100;
    private const double LeastShare = 1e-6;

    private static readonly RequirementRules Limits = new();

    /// <param name="forPlan">Whether the rule stands in a plan: the quantity may be left out, and outcomes cannot be looked at.</param>
    /// <param name="mostTests">Most tests in a moving mean.</param>
    public LotRuleRules(bool forPlan, int mostTests)
    {
        RuleFor(rule => rule.Rule).Needed().OneOf(LotRuleNames.All, "unknown-rule");
        RuleFor(rule => rule).Custom((rule, context) => CheckLimits(rule, forPlan, context)).When(rule => LotRuleNames.All.Contains(rule.Rule ?? ""));

        RuleFor(rule => rule.Count).NotNull().When(rule => rule.Rule == LotRuleNames.MovingMean)
            .WithErrorCode("not-enough-data").WithMessage("A moving mean needs the number of consecutive tests in it: give count.");
        RuleFor(rule => rule.Count).Must(count => count is null || (count >= 2 && count <= mostTests)).When(rule => rule.Rule == LotRuleNames.MovingMean)
            .WithErrorCode("out-of-range").WithMessage((_, count) => $"A moving mean takes from 2 to {mostTests} tests; {count} was received.");
        RuleFor(rule => rule.Floor).Within(-RuleWords.Greatest, RuleWords.Greatest);
        RuleFor(rule => rule.Required).NotNull().When(rule => !forPlan && Takes(rule, nameof(LotRuleContract.Required)))
            .WithErrorCode("not-enough-data").WithMessage("The share that is required is missing: give required, in %.");
        RuleFor(rule => rule.Required).Within(0, 100, " %");
        RuleFor(rule => rule.Factor).Within(-MostFactor, MostFactor);
        RuleFor(rule => rule.Risk).Within(LeastShare, 1 - LeastShare);
        RuleFor(rule => rule.Fraction).Within(LeastShare, 1 - LeastShare);
        When(rule => rule.Rule == LotRuleNames.CharacteristicValue, () =>
        {
            RuleFor(rule => rule.Factor).NotNull().When(rule => !forPlan && rule is { Risk: null, Fraction: null })
                .WithErrorCode("not-enough-data").WithMessage("A characteristic value needs its factor: give factor, or risk and fraction.");
            RuleFor(rule => rule.Factor).Null().When(rule => rule.Risk is { } || rule.Fraction is { })
                .WithErrorCode("given-twice").WithMessage("The factor follows from risk and fraction. Leave out the factor, or these two.");
            RuleFor(rule => rule.Fraction).NotNull().When(rule => rule.Risk is { })
                .WithErrorCode("incomplete").WithMessage("A risk needs the fraction that it is for: give fraction, such as 0.9.");
            RuleFor(rule => rule.Risk).NotNull().When(rule => rule.Fraction is { })
                .WithErrorCode("incomplete").WithMessage("A fraction needs its risk: give risk, such as 0.1.");
        });

        OnlyWhereTaken(rule => rule.Count);
        OnlyWhereTaken(rule => rule.Floor);
        OnlyWhereTaken(rule => rule.Required);
        OnlyWhereTaken(rule => rule.Factor);
        OnlyWhereTaken(rule => rule.Risk);
        OnlyWhereTaken(rule => rule.Fraction);
    }

    private void OnlyWhereTaken<TValue>(System.Linq.Expressions.Expression<Func<LotRuleContract, TValue>> member)
    {
        var name = ((System.Linq.Expressions.MemberExpression)member.Body).Member.Name;
        RuleFor(member).Null().When(rule => LotRuleNames.All.Contains(rule.Rule ?? "") && !Takes(rule, name))
            .WithErrorCode("not-for-this-rule").WithMessage(rule => $"The rule \"{rule.Rule}\" does not take it. Leave it out, or choose another rule.");
    }

    private static bool Takes(LotRuleContract rule, string member) => rule.Rule switch
    {
        LotRuleNames.MovingMean => member is nameof(LotRuleContract.Count) or nameof(LotRuleContract.Floor),
        LotRuleNames.PercentWithinLimits or LotRuleNames.ShareOfTests or LotRuleNames.WetOfLineOfOptimums => member is nameof(LotRuleContract.Required),
        LotRuleNames.CharacteristicValue => member is nameof(LotRuleContract.Factor) or nameof(LotRuleContract.Risk) or nameof(LotRuleContract.Fraction),
        _ => false,
    };

    /// <summary>Quantity and limits are those of a requirement; only outcomes and the line of optimums have none.</summary>
    private static void CheckLimits(LotRuleContract rule, bool forPlan, ValidationContext<LotRuleContract> context)
    {
        void Fail(string member, string code, string message) => context.Fail(Path(context, member), code, message);
        if (rule.Rule == LotRuleNames.WetOfLineOfOptimums)
        {
            const string none = "The line of optimums is the rule's own limit. Leave this out.";
            if (forPlan)
            {
                Fail(nameof(rule.Rule), "not-for-a-plan", "A plan is about tests of one quantity; this rule looks at two. Choose another rule.");
            }

            foreach (var (member, given) in new[] { (nameof(rule.Quantity), rule.Quantity is { }), (nameof(rule.Minimum), rule.Minimum is { }), (nameof(rule.Maximum), rule.Maximum is { }) })
            {
                if (given)
                {
                    Fail(member, "not-for-this-rule", none);
                }
            }

            return;
        }

        if (rule.LooksAtOutcomes() && !forPlan)
        {
            return;
        }

        var requirement = new RequirementContract { Quantity = rule.Quantity ?? (forPlan ? "relativeCompaction" : null), Minimum = rule.Minimum, Maximum = rule.Maximum };
        foreach (var failure in Limits.Validate(requirement).Errors)
        {
            // A plan that is to be designed need not bring a limit: its own rules ask for one where they must.
            if (forPlan && failure is { ErrorCode: "not-enough-data" })
            {
                continue;
            }

            if (failure.ErrorCode == "missing-member")
            {
                Fail(failure.PropertyName, "not-enough-data", "The rule needs the quantity that it looks at: give quantity.");
            }
            else
            {
                Fail(failure.PropertyName, failure.ErrorCode, failure.ErrorMessage);
            }
        }
    }

    private static string Path(ValidationContext<LotRuleContract> context, string member) =>
        context.PropertyChain.Count == 0 ? member : $"{context.PropertyChain}.{member}";
}
