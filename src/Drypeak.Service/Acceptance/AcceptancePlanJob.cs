using Drypeak.Figures;
using Drypeak.Service.Charts;
using Drypeak.Service.Contracts;
using Drypeak.Service.Field;
using Drypeak.Service.Hosting;
using Drypeak.Soil.Acceptance;
using Drypeak.Soil.Acceptance.LotRules;
using Drypeak.Soil.Acceptance.Plans;
using Drypeak.Soil.FieldDensity.Review;
using Drypeak.Soil.Laboratory;
using Drypeak.Soil.Quantities;

namespace Drypeak.Service.Acceptance;

/// <summary><c>POST /v1/acceptance-plan</c>: what a plan risks, from contract to contract. The endpoint and the page both call this.</summary>
internal sealed class AcceptancePlanJob(Limits limits)
{
    public const int UsualLevels = 41;
    public const double UsualProducersRisk = 0.05;
    private const double UsualConsumersRisk = 0.1;
    private const int UsualMostTests = 1_000;
    private const int UsualSeed = 1;

    private readonly Lazy<AcceptancePlanRules> _rules = new(() => new(limits));

    /// <summary>The kind of its chart.</summary>
    public ChartKind<PlotChart> Chart { get; } = ChartKind.Plot("acceptance-plan", "The operating characteristic of a plan", limits);

    public static void Map(IEndpointRouteBuilder app)
    {
        var job = app.ServiceProvider.GetRequiredService<AcceptancePlanJob>();
        app.MapJob<AcceptancePlanRequest, AcceptancePlanAnswer, PlotChart>("/v1/acceptance-plan", job.Check, job.Compute, Examples.AcceptancePlanRequest, job.Chart)
            .WithTags("Lots")
            .WithName("acceptance-plan")
            .WithSummary("What a plan risks, or the smallest plan that keeps two risks")
            .WithDescription("Probability of acceptance against the true level of a lot: exact for a single rule (mean, every test, share of tests, percent within limits, characteristic value), else by simulation from a stated seed with its standard error; the producer's and the consumer's risk. With design: true the smallest number of tests, and the limit, share or factor, that keep two stated risks.");
    }

    /// <summary>Every broken rule; empty where the request can be computed.</summary>
    public IReadOnlyList<Fault> Check(AcceptancePlanRequest request) => _rules.Value.Validate(request).ToFaults();

    /// <summary>Computes a request that passed <see cref="Check"/>.</summary>
    public Charted<AcceptancePlanAnswer, PlotChart> Compute(AcceptancePlanRequest request)
    {
        var units = request.Units.ToUnitSet();
        IReadOnlyList<LotRuleContract> given = request.Rule is { } one ? [one] : request.Rules!;
        var quantity = given[0].QuantityMeant();
        var unit = Specification.UnitOf(quantity, units);
        List<Finding> findings = [];
        var plan = request.Design is true ? Designed(request, quantity, units, findings)
            : new AcceptancePlan([.. given.Select(rule => rule.ToQuantityRule(units))], request.Count!.Value, request.StandardDeviation!.Value * unit);
        if (plan is null)
        {
            return new Charted<AcceptancePlanAnswer, PlotChart>(NotFound(request, given, units, findings), null);
        }

        if (plan.Count < plan.LeastCount)
        {
            findings.Add(LotFindingKinds.TooFewTests.At("/count", $"The rule needs {plan.LeastCount} tests to decide, and the plan has {plan.Count}: no lot is ever accepted. Make more tests."));
        }

        var (seed, trials) = (request.Seed ?? UsualSeed, request.Trials ?? AcceptancePlanRules.LeastTrials);
        IReadOnlyList<double> levels = request.Levels ?? Usual(plan, request, unit);
        double[] stated = [.. new[] { request.AcceptableLevel, request.RejectableLevel }.OfType<double>()];
        var curve = plan.At([.. levels.Concat(stated).Select(level => level * unit)], seed, trials);
        var producers = request.AcceptableLevel is null ? (double?)null : 1 - curve.Points[levels.Count].Probability;
        var consumers = request.RejectableLevel is null ? (double?)null : curve.Points[^1].Probability;
        if (producers is { } p && consumers is { } c && c >= 1 - p)
        {
            findings.Add(LotFindingKinds.LevelsOnOneSide.At("/rejectableLevel", "A lot at the rejectable level is accepted as often as one at the acceptable level, or more. Check levels and limits; were the two exchanged?"));
        }

        var points = levels.Select((level, i) => new AcceptanceAnswer(level, curve.Points[i].Probability, curve.Points[i].StandardError)).ToList();
        var explanation = Explanation(plan, producers, consumers, request, quantity, units);
        var chart = AcceptancePlanChart.Of(points, plan, request, producers, consumers, quantity, units);
        var links = Chart.LinksOf(chart, limits, out var whyNot);
        if (whyNot is { })
        {
            findings.Add(whyNot);
        }

        return new Charted<AcceptancePlanAnswer, PlotChart>(
            new AcceptancePlanAnswer
            {
                Reference = request.Reference,
                Units = units.ToContract(),
                Rules = request.Design is true ? [WithNumber(given[0], plan.Rules[0], unit)] : given,
                Count = plan.Count,
                Curve = points,
                ProducersRisk = producers,
                ConsumersRisk = consumers,
                Computed = curve.Trials is null ? "exact" : "simulated",
                Trials = curve.Trials,
                Seed = curve.Trials is null ? null : seed,
                Explanation = explanation,
                Findings = [.. findings.OrderBy(finding => finding.Severity).Select(FindingContract.Of)],
                Cautions = [.. Cautions.OfArithmetic, LotCautions.NormalTests, LotCautions.RandomTests],
                Links = links,
                Provenance = ProvenanceContract.Of(request),
            },
            chart);
    }

    private static AcceptancePlan? Designed(AcceptancePlanRequest request, AcceptedQuantity quantity, UnitSet units, List<Finding> findings)
    {
        var unit = Specification.UnitOf(quantity, units);
        var given = request.Rule!;
        var risks = new PlanRisks(
            request.AcceptableLevel!.Value * unit, request.RejectableLevel!.Value * unit, request.ProducersRisk ?? UsualProducersRisk, request.ConsumersRisk ?? UsualConsumersRisk,
            request.StandardDeviation!.Value * unit);
        var rule = given.ToQuantityRule(units);
        var plan = PlanDesign.Find(rule, risks, request.MostTests ?? UsualMostTests);
        string[] replaced =
        [
            .. request.Count is { } ? ["count"] : Array.Empty<string>(),
            .. PlanDesign.FindsLimit(rule) && (given.Minimum ?? given.Maximum) is { } ? ["the limit"] : Array.Empty<string>(),
            .. given.Required is { } ? ["required"] : Array.Empty<string>(),
            .. (given.Factor ?? given.Risk) is { } ? ["the factor"] : Array.Empty<string>(),
        ];
        if (replaced.Length > 0)
        {
            findings.Add(LotFindingKinds.LimitDesigned.At("/rule", $"A design finds {string.Join(" and ", replaced)} itself, and what was given was not used. Compare the two, or leave it out."));
        }

        if (plan is null)
        {
            findings.Add(LotFindingKinds.RiskNotMet.At("",
                $"No plan of up to {request.MostTests ?? UsualMostTests} tests keeps the producer's risk of {ReaderText.Percent(risks.ProducersRisk)} and the consumer's of {ReaderText.Percent(risks.ConsumersRisk)}. Allow more risk, set the levels further apart, or take another rule."));
        }

        return plan;
    }

    private static AcceptancePlanAnswer NotFound(AcceptancePlanRequest request, IReadOnlyList<LotRuleContract> given, UnitSet units, List<Finding> findings) => new()
    {
        Reference = request.Reference,
        Units = units.ToContract(),
        Rules = given,
        Curve = [],
        Computed = "exact",
        Explanation = findings[^1].Message,
        Findings = [.. findings.OrderBy(finding => finding.Severity).Select(FindingContract.Of)],
        Cautions = [.. Cautions.OfArithmetic, LotCautions.NormalTests, LotCautions.RandomTests],
        Links = new LinksContract(),
        Provenance = ProvenanceContract.Of(request),
    };

    /// <summary>The rule with the number that the design found, in the caller's unit.</summary>
    private static LotRuleContract WithNumber(LotRuleContract given, QuantityRule found, double unit) => found switch
    {
        PercentWithinLimitsRule share => given with { Required = 100 * share.Required },
        ShareOfTestsRule share => given with { Required = 100 * share.Required },
        CharacteristicValueRule characteristic => given with { Factor = characteristic.Factor, Risk = null, Fraction = null },
        _ => given with { Minimum = found.Limits.Minimum / unit, Maximum = found.Limits.Maximum / unit },
    };

    /// <summary>From where hardly any lot is accepted to where nearly every one is.</summary>
    private static List<double> Usual(AcceptancePlan plan, AcceptancePlanRequest request, double unit)
    {
        var sigma = request.StandardDeviation!.Value;
        double[] marks = [.. plan.Rules.SelectMany(rule => new[] { rule.Limits.Minimum, rule.Limits.Maximum }).OfType<double>().Select(limit => limit / unit), .. new[] { request.AcceptableLevel, request.RejectableLevel }.OfType<double>()];
        var (from, to) = (marks.Min() - (3 * sigma), marks.Max() + (3 * sigma));
        return [.. Enumerable.Range(0, UsualLevels).Select(i => from + ((to - from) * i / (UsualLevels - 1)))];
    }

    /// <summary>Who carries which risk.</summary>
    private static string Explanation(AcceptancePlan plan, double? producers, double? consumers, AcceptancePlanRequest request, AcceptedQuantity quantity, UnitSet units)
    {
        var unit = Specification.UnitOf(quantity, units);
        string Text(double level) => JudgementWords.Text(quantity, level * unit, units);
        var tests = $"With {plan.Count} {(plan.Count == 1 ? "test" : "tests")}";
        List<string> sentences = [];
        if (producers is { } p)
        {
            sentences.Add($"{tests} the contractor carries a risk of {ReaderText.Percent(p)}: a lot that truly has {Text(request.AcceptableLevel!.Value)} is rejected so often.");
        }

        if (consumers is { } c)
        {
            sentences.Add($"{(sentences.Count == 0 ? $"{tests} the" : "The")} owner carries a risk of {ReaderText.Percent(c)}: a lot that truly has {Text(request.RejectableLevel!.Value)} is accepted so often.");
        }

        return sentences.Count > 0 ? string.Join(' ', sentences)
            : $"{tests} the curve says how often a lot of each true level is accepted. Give acceptableLevel and rejectableLevel to see who carries which risk.";
    }
}
