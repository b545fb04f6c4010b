using Drypeak.Figures;
using Drypeak.Service.Acceptance;
using Drypeak.Service.Pages.Forms;

namespace Drypeak.Service.Pages.Acceptance;

/// <summary>The page of a plan: what a rule with so many tests risks, or how many tests keep two risks.</summary>
internal static class PlanPage
{
    private const string Wanting = "design";

    private static readonly ChoiceField Task = new("task", "What is wanted", "/design",
        [new("risks", "The risks of a plan") { Flag = false }, new(Wanting, "The fewest tests for two risks") { Flag = true }]);

    private static readonly ChoiceField Rule = new("rule", "Rule", "/rule/rule",
    [
        new(LotRuleNames.PercentWithinLimits, "Percent within limits"), new(LotRuleNames.EveryTest, "Every test"), new(LotRuleNames.Mean, "Mean of the lot"),
        new(LotRuleNames.CharacteristicValue, "Characteristic value"), new(LotRuleNames.ShareOfTests, "Counted share of tests"), new(LotRuleNames.MovingMean, "Mean of consecutive tests"),
    ]);

    private static readonly ChoiceField Quantity = new("quantity", "of", "/rule/quantity", LotPage.Quantities);
    private static readonly NumberField Minimum = new("minimum", "Limit, at least", "/rule/minimum") { Hint = "in % or the unit of density, as the quantity is" };
    private static readonly NumberField Most = new("maximum", "or at most", "/rule/maximum");
    private static readonly NumberField Required = new("required", "Share required", "/rule/required") { Unit = "%", Hint = "percent within limits, counted share" };
    private static readonly NumberField Factor = new("factor", "Factor k", "/rule/factor") { Hint = "characteristic value" };
    private static readonly NumberField Span = new("span", "Tests in a mean", "/rule/count") { Hint = "mean of consecutive tests" };
    private static readonly NumberField Floor = new("floor", "and none below", "/rule/floor") { Hint = "mean of consecutive tests" };
    private static readonly NumberField Count = new("count", "Tests in a lot", "/count");
    private static readonly NumberField Deviation = new("deviation", "Standard deviation within a lot", "/standardDeviation") { Hint = "of single tests; 1.5 to 2.5 % of relative compaction where nothing is known (common practice, no source)" };
    private static readonly NumberField Acceptable = new("acceptable", "A lot with this true level should be accepted", "/acceptableLevel");
    private static readonly NumberField Rejectable = new("rejectable", "and one with this rejected", "/rejectableLevel");
    private static readonly NumberField ProducersRisk = new("producers-risk", "Producer’s risk at most", "/producersRisk") { Hint = "of seeing the first rejected; 0.05 where left empty" };
    private static readonly NumberField ConsumersRisk = new("consumers-risk", "Consumer’s risk at most", "/consumersRisk") { Hint = "of seeing the second accepted; 0.1 where left empty" };

    public static FormPage Of(AcceptancePlanJob job) => new FormPage<AcceptancePlanRequest, AcceptancePlanAnswer>
    {
        Address = "/plan",
        Heading = "What a plan risks",
        Lead = "How often a rule accepts a lot that is good, poor or between; and how many tests keep two risks.",
        WhatComesOut = "The operating characteristic: the probability of acceptance against the lot’s true level, exact where theory gives it; and in a sentence who carries which risk.",
        HasWorking = false,
        Variant = Task,
        Parts =
        [
            new("", [FormFields.Reference]) { Columns = 1 },
            new("Rule", [Rule, Quantity, FormFields.DensityUnit]) { Columns = 3 },
            new("Its numbers", [Minimum, Most, Required, Factor, Span, Floor]) { When = texts => texts[Task] != Wanting },
            new("Its limit", [Minimum, Most]) { When = texts => texts[Task] == Wanting, Note = "The design finds the limit of a mean and of every test; of percent within limits, a counted share and a characteristic value it finds the share or the factor, and needs the limit." },
            new("Tests", [Count, Deviation]) { When = texts => texts[Task] != Wanting },
            new("Scatter", [Deviation]) { When = texts => texts[Task] == Wanting },
            new("Two lots to tell apart", [Acceptable, Rejectable]),
            new("Risks", [ProducersRisk, ConsumersRisk]) { When = texts => texts[Task] == Wanting },
        ],
        Demonstrations =
        [
            new("risks", "six tests and percent within limits",
                (FormFields.Reference, "Ternmarsh, embankment fill"), (Minimum, "95"), (Required, "85"), (Count, "6"), (Deviation, "1.8"), (Acceptable, "98"), (Rejectable, "95.5")),
            new("every-test", "every test of ten: who pays when a lot is just good enough",
                (FormFields.Reference, "Ternmarsh, embankment fill"), (Rule, LotRuleNames.EveryTest), (Minimum, "95"), (Count, "10"), (Deviation, "1.8"), (Acceptable, "97.5"), (Rejectable, "95.5")),
            new("design", "the fewest tests for a mean",
                (FormFields.Reference, "Ternmarsh, embankment fill"), (Task, Wanting), (Rule, LotRuleNames.Mean), (Deviation, "1.8"), (Acceptable, "98"), (Rejectable, "96")),
        ],
        Help = typeof(RuleHelp),
        View = typeof(PlanAnswerView),
        Check = job.Check,
        Compute = FormAnswer.Of<AcceptancePlanRequest, AcceptancePlanAnswer, PlotChart>(job.Compute, job.Chart),
        Headline = PlanWords.Headline,
    };
}
