using Drypeak.Service.Contracts;
using Drypeak.Service.Hosting;
using Drypeak.Soil.Acceptance.Plans;
using Drypeak.Soil.Quantities;
using FluentValidation;

namespace Drypeak.Service.Acceptance;

/// <summary>All that a plan must keep to be computed.</summary>
internal sealed class AcceptancePlanRules : AbstractValidator<AcceptancePlanRequest>
{
    public const int MostTests = 10_000;
    public const int MostSimulatedTests = 1_000;
    public const int LeastTrials = 100_000;
    private const int MostTrials = 1_000_000;
    private const int MostRules = 20;
    private const int MostLevels = 200;

    /// <summary>Values that a simulation may draw and look at, levels counted: some seconds of work.</summary>
    private const double MostWork = 2e9;

    private const double LeastRisk = 1e-4;

    public AcceptancePlanRules(Limits limits)
    {
        RuleFor(request => request.Reference).AtMost(limits.NameCharacters);
        RuleFor(request => request.Units!).SetValidator(new UnitsRules()).When(request => request.Units is { });
        RuleFor(request => request.Rule).NotNull().When(request => request.Rules is null)
            .WithErrorCode("not-enough-data").WithMessage("A plan needs a rule. Give rule, or several in rules.");
        RuleFor(request => request.Rules).Null().When(request => request.Rule is { })
            .WithErrorCode("given-twice").WithMessage("There is a rule and a list of rules. Put them all into rules, or leave one out.");
        RuleFor(request => request.Rule!).SetValidator(new LotRuleRules(forPlan: true, MostTests)).When(request => request.Rule is { });
        RuleFor(request => request.Rules).Counted(MostRules);
        RuleForEach(request => request.Rules).Needed().SetValidator(new LotRuleRules(forPlan: true, MostTests));
        RuleFor(request => request.Rules).Must(rules => rules is null || rules.OfType<LotRuleContract>().DistinctBy(rule => rule.Quantity ?? "relativeCompaction").Count() <= 1)
            .WithErrorCode("several-quantities").WithMessage("All rules of a plan look at one quantity, for how two scatter together is not known. Ask for each quantity by itself.");
        RuleFor(request => request.StandardDeviation).Needed().Positive();
        RuleFor(request => request.Levels).Counted(MostLevels);
        RuleForEach(request => request.Levels).Must(IsNumber).WithErrorCode("out-of-range").WithMessage((_, level) => NotANumber(level));
        RuleFor(request => request.AcceptableLevel).Must(IsNumber).WithErrorCode("out-of-range").WithMessage((_, level) => NotANumber(level));
        RuleFor(request => request.RejectableLevel).Must(IsNumber).WithErrorCode("out-of-range").WithMessage((_, level) => NotANumber(level));
        RuleFor(request => request.Count).Must(count => count is null or (>= 1 and <= MostTests))
            .WithErrorCode("out-of-range").WithMessage((_, count) => $"A lot has from 1 to {MostTests} tests; {count} was received.");
        RuleFor(request => request.MostTests).Must(count => count is null or (>= 1 and <= MostTests))
            .WithErrorCode("out-of-range").WithMessage((_, count) => $"A design may think of 1 to {MostTests} tests; {count} was received.");
        RuleFor(request => request.Seed).Must(seed => seed is null or >= 0).WithErrorCode("negative").WithMessage((_, seed) => $"A seed must not be negative; {seed} was received.");
        RuleFor(request => request.Trials).Must(trials => trials is null or (>= LeastTrials and <= MostTrials))
            .WithErrorCode("out-of-range").WithMessage((_, trials) => $"A simulation takes from {LeastTrials} to {MostTrials} trials; {trials} was received.");
        RuleFor(request => request.ProducersRisk).Within(LeastRisk, 0.5);
        RuleFor(request => request.ConsumersRisk).Within(LeastRisk, 0.5).Must((request, risk) => !(risk + (request.ProducersRisk ?? AcceptancePlanJob.UsualProducersRisk) >= 1))
            .WithErrorCode("out-of-range").WithMessage("The two risks together must stay below 1.");
        When(request => request.Design is true, ForDesign).Otherwise(ForPlan);
    }

    private void ForPlan()
    {
        RuleFor(request => request.Count).NotNull().WithErrorCode("not-enough-data").WithMessage("A plan needs its number of tests: give count, or design: true to have it found.");
        RuleFor(request => request.ProducersRisk).Null().WithErrorCode("not-without-design").WithMessage("Here the risk is what comes out. Leave it out, or give design: true.");
        RuleFor(request => request.ConsumersRisk).Null().WithErrorCode("not-without-design").WithMessage("Here the risk is what comes out. Leave it out, or give design: true.");
        RuleFor(request => request.MostTests).Null().WithErrorCode("not-without-design").WithMessage("Only a design looks for a number of tests. Leave it out, or give design: true.");
        RuleFor(request => request).Custom((request, context) =>
        {
            foreach (var (rule, path) in Placed(request))
            {
                foreach (var (member, message) in rule is null ? [] : Missing(rule))
                {
                    context.Fail($"{path}.{member}", "not-enough-data", message);
                }
            }
        });
        RuleFor(request => request).Custom(CheckWork);
    }

    private void ForDesign()
    {
        RuleFor(request => request.Rule).NotNull().When(request => request.Rules is { })
            .WithErrorCode("not-for-a-design").WithMessage("A design finds the number of one rule. Give rule in place of rules.");
        RuleFor(request => request.AcceptableLevel).NotNull().WithErrorCode("not-enough-data").WithMessage("A design needs the level that should be accepted: give acceptableLevel.");
        RuleFor(request => request.RejectableLevel).NotNull().WithErrorCode("not-enough-data").WithMessage("A design needs the level that should be rejected: give rejectableLevel.");
        RuleFor(request => request.RejectableLevel).Must((request, level) => !(level is { } known && request.AcceptableLevel == known))
            .WithErrorCode("levels-equal").WithMessage("The two levels are the same, and no plan can tell them apart. Set them apart.");
        RuleFor(request => request.Rule).Custom((rule, context) =>
        {
            var request = context.InstanceToValidate;
            if (rule?.Rule is not { } name || !LotRuleNames.All.Contains(name) || name == LotRuleNames.WetOfLineOfOptimums)
            {
                return;
            }

            if (name == LotRuleNames.MovingMean)
            {
                context.Fail("Rule.Rule", "not-for-a-design", "A moving mean has no design: its risks are simulated. Choose another rule, or ask for the risks of a plan.");
                return;
            }

            var minimumIsMeant = request.AcceptableLevel > request.RejectableLevel;
            var (wanted, other) = minimumIsMeant ? (rule.Minimum, rule.Maximum) : (rule.Maximum, rule.Minimum);
            var (member, otherMember) = minimumIsMeant ? ("Minimum", "Maximum") : ("Maximum", "Minimum");
            if (other is { })
            {
                context.Fail("Rule." + otherMember, "not-for-a-design", $"The acceptable level is {(minimumIsMeant ? "above" : "below")} the rejectable one, so that the limit is a {member.ToLowerInvariant()}. Leave this out, or exchange the levels.");
            }
            else if (wanted is null && name is not (LotRuleNames.Mean or LotRuleNames.EveryTest))
            {
                context.Fail("Rule." + member, "not-enough-data", $"The design finds the {(name == LotRuleNames.CharacteristicValue ? "factor" : "share")}, and needs the limit that it is about: give {member.ToLowerInvariant()}.");
            }
        });
    }

    /// <summary>What a rule needs that is not to be designed.</summary>
    private static IEnumerable<(string Member, string Message)> Missing(LotRuleContract rule)
    {
        if (rule.Rule is LotRuleNames.WetOfLineOfOptimums || !LotRuleNames.All.Contains(rule.Rule ?? ""))
        {
            yield break;
        }

        if (rule is { Minimum: null, Maximum: null })
        {
            yield return (nameof(rule.Minimum), "The rule needs a limit. Give minimum, maximum, or both.");
        }

        if (rule is { Rule: LotRuleNames.PercentWithinLimits or LotRuleNames.ShareOfTests, Required: null })
        {
            yield return (nameof(rule.Required), "The share that is required is missing: give required, in %.");
        }

        if (rule is { Rule: LotRuleNames.CharacteristicValue, Factor: null, Risk: null, Fraction: null })
        {
            yield return (nameof(rule.Factor), "A characteristic value needs its factor: give factor, or risk and fraction.");
        }
    }

    private static IEnumerable<(LotRuleContract? Rule, string Path)> Placed(AcceptancePlanRequest request) =>
        request.Rule is { } one ? [(one, "Rule")] : (request.Rules ?? []).Select((rule, i) => ((LotRuleContract?)rule, $"Rules[{i}]"));

    /// <summary>A simulation draws each lot and looks at it at each level: its size is bounded, and asked only of a plan without other faults.</summary>
    private static void CheckWork(AcceptancePlanRequest request, ValidationContext<AcceptancePlanRequest> context)
    {
        if (request.Count is not (> 0 and <= MostTests and var count) || request.StandardDeviation is not (>= RuleWords.Least and <= RuleWords.Greatest)
            || !Placed(request).Any() || Placed(request).Any(placed => placed.Rule is null || Missing(placed.Rule).Any() || !new LotRuleRules(true, MostTests).Validate(placed.Rule).IsValid))
        {
            return;
        }

        var plan = new AcceptancePlan([.. Placed(request).Select(placed => placed.Rule!.ToQuantityRule(new UnitSet()))], count, 1);
        if (plan.IsExact)
        {
            return;
        }

        var looks = plan.Rules.Any(rule => rule is Soil.Acceptance.LotRules.MovingMeanRule or Soil.Acceptance.LotRules.ShareOfTestsRule) ? request.Levels?.Count ?? AcceptancePlanJob.UsualLevels : 1;
        if (count > MostSimulatedTests)
        {
            context.Fail(nameof(request.Count), "out-of-range", $"This plan is simulated, and may have up to {MostSimulatedTests} tests; {count} was received. Ask for fewer, or for one rule whose risk theory gives.");
        }
        else if ((double)count * looks * (request.Trials ?? LeastTrials) > MostWork)
        {
            context.Fail(nameof(request.Levels), "too-much-work", $"{count} tests at {looks} levels in {request.Trials ?? LeastTrials} trials are too much for one answer. Ask for fewer levels, trials or tests.");
        }
    }

    private static bool IsNumber(double? level) => level is null || IsNumber(level.Value);

    private static bool IsNumber(double level) => level is >= -RuleWords.Greatest and <= RuleWords.Greatest;

    private static string NotANumber(double? level) => $"A level lies between −1e9 and 1e9; {RuleWords.Text(level)} was received.";
}
