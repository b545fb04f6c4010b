using Drypeak.Service.Contracts;
using Drypeak.Service.Field;
using Drypeak.Soil.Acceptance;
using Drypeak.Soil.Acceptance.ControlCharts;
using Drypeak.Soil.FieldDensity;
using Drypeak.Soil.Quantities;

namespace Drypeak.Service.Acceptance;

/// <summary>A lot from contract to domain, with the findings on its whole field tests by label.</summary>
internal sealed record MappedLot(Lot Lot, IReadOnlyDictionary<string, IReadOnlyList<Finding>> FindingsByLabel, IReadOnlyList<Finding> Findings);

/// <summary>From the contract's numbers to the domain's lot. Call with requests that passed the rules.</summary>
internal static class LotMapping
{
    /// <summary>Maps a lot, and judges each of its tests.</summary>
    /// <param name="request">The lot.</param>
    /// <param name="faults">Receives each contradiction.</param>
    public static MappedLot ToLot(LotAcceptanceRequest request, ICollection<Fault> faults)
    {
        var units = request.Units.ToUnitSet();
        var soils = new LotSoils(request, units);
        var requirements = request.Specification.ToRequirements(units);
        var decision = request.Specification.ToDecision();
        var findings = new Dictionary<string, IReadOnlyList<Finding>>();
        List<LotTest> tests = new(request.Tests!.Count);
        for (var i = 0; i < request.Tests.Count; i++)
        {
            var (test, place) = (request.Tests[i], $"/tests/{i}");
            var mapped = test.FieldDensity is { } whole
                ? OfFieldTest(whole, soils.Of(test, place), request.Specification is null, requirements, decision, place, findings, test.LabelOr(i))
                : OfValues(test, soils.Of(test, place), requirements, decision, units, place, faults);
            tests.Add(mapped with
            {
                Label = test.LabelOr(i),
                SetAside = test.SetAside,
                Replaces = test.Replaces,
                Time = test.Time is { } time ? LotTimes.Read(time) : null,
                Station = InMeters(test.Station),
                Offset = InMeters(test.Offset),
                Lift = test.Lift,
            });
        }

        var lot = new Lot
        {
            Tests = tests,
            Rules = [.. (request.LotRules ?? []).Select(rule => rule.ToLotRule(units))],
            ControlChart = request.ControlChart?.ToPlan(units),
            Window = request.Window?.ToWindow(units),
            Reference = soils.OfLot.Reference,
            ToleranceFraction = request.ToleranceInterval?.Fraction ?? 0.9,
            ToleranceConfidence = request.ToleranceInterval?.Confidence ?? 0.95,
            Units = units,
        };
        return new MappedLot(lot, findings, soils.Findings);

        double? InMeters(double? length) => length * units.Length.InMeters();
    }

    private static LotTest OfValues(
        LotTestContract test, LotSoil soil, IReadOnlyList<Requirement> requirements, DecisionRule decision, UnitSet units, string place, ICollection<Fault> faults)
    {
        var given = new Dictionary<AcceptedQuantity, double>();
        void Give(AcceptedQuantity quantity, double? value)
        {
            if (value is { } known)
            {
                given.Add(quantity, known * Specification.UnitOf(quantity, units));
            }
        }

        Give(AcceptedQuantity.RelativeCompaction, test.RelativeCompaction);
        Give(AcceptedQuantity.DryDensity, test.DryDensity);
        Give(AcceptedQuantity.WetDensity, test.WetDensity);
        Give(AcceptedQuantity.WaterContent, test.ToMeasuredWater(units).Reduce(place, faults)?.Percent);
        Give(AcceptedQuantity.WaterContentFromOptimum, test.WaterContentFromOptimum);
        Give(AcceptedQuantity.Saturation, test.Saturation);
        Give(AcceptedQuantity.AirVoids, test.AirVoids);
        Give(AcceptedQuantity.RelativeDensity, test.RelativeDensity);
        Give(AcceptedQuantity.VoidRatio, test.VoidRatio);

        var values = TestValues.Complete(given, soil.Reference, quantity => $"{place}/{Specification.NameOf(quantity)}", units, faults);
        List<Judgement> judgements = [.. requirements.Select(requirement => decision.Judge(
            requirement, values[requirement.Quantity], values.Soil.StandardUncertaintyOf(requirement.Quantity, soil.Held.Uncertainty)))];
        return new LotTest { Label = "", Values = values, Judgements = judgements, Outcome = DecisionRule.OutcomeOf(judgements) };
    }

    private static LotTest OfFieldTest(
        FieldDensityRequest request, LotSoil soil, bool ownSpecification, IReadOnlyList<Requirement> requirements, DecisionRule decision,
        string place, Dictionary<string, IReadOnlyList<Finding>> findings, string label)
    {
        List<Finding> found = [];
        var test = FieldDensityJob.HeldAgainst(request, found).Test;
        test = (request.Laboratory is null ? soil.Hold(test) : test) with
        {
            WaterDensity = request is { WaterTemperature: null, WaterDensity: null } ? soil.Held.WaterDensity : test.WaterDensity,
            Requirements = ownSpecification ? test.Requirements : requirements,
            Decision = ownSpecification ? test.Decision : decision,
        };
        test = test with { SpecificGravity = test.SpecificGravity ?? soil.Held.SpecificGravity };
        if (!ownSpecification && request.Specification is { })
        {
            found.Add(LotFindingKinds.OwnSpecificationUnused.At("/specification", "The lot has a specification too, and it is the lot's that this test is held against. Leave one of the two out."));
        }

        var faults = new List<Fault>();
        var result = FieldAnalysis.Analyze(test, faults) ?? throw new ArgumentException("The request does not keep the rules: " + faults[0].Message, nameof(request));
        found.AddRange(result.Findings);
        if (found.Count > 0)
        {
            findings.Add(label, [.. found.Select(finding => finding with { Place = place + "/fieldDensity" + finding.Place }).OrderBy(finding => finding.Severity)]);
        }

        return new LotTest { Label = label, Values = TestValues.Of(result.Judged), Judgements = result.Judgements, Outcome = result.Outcome };
    }

    private static ControlChartPlan ToPlan(this ControlChartContract chart, UnitSet units)
    {
        var quantity = Specification.Quantities[chart.Quantity!];
        var unit = Specification.UnitOf(quantity, units);
        var plan = new ControlChartPlan(quantity, chart.Kind switch
        {
            ControlChartRules.Individuals => ControlChartKind.Individuals,
            ControlChartRules.Ewma => ControlChartKind.Ewma,
            _ => ControlChartKind.Cusum,
        });
        return plan with
        {
            Target = chart.Target * unit,
            StandardDeviation = chart.StandardDeviation * unit,
            Weight = chart.Weight ?? plan.Weight,
            Width = chart.Width ?? plan.Width,
            Reference = chart.Reference ?? plan.Reference,
            Decision = chart.Decision ?? plan.Decision,
            Rules = chart.RunRules switch
            {
                ControlChartRules.Nelson => RunRules.Nelson,
                ControlChartRules.LimitsOnly => RunRules.LimitsOnly,
                _ => RunRules.WesternElectric,
            },
        };
    }

    private static CompactionWindow ToWindow(this WindowContract window, UnitSet units)
    {
        List<WindowEdge> edges = [];
        void Edge(string name, AcceptedQuantity quantity, double? minimum, double? maximum)
        {
            if (minimum is { } || maximum is { })
            {
                var unit = Specification.UnitOf(quantity, units);
                edges.Add(new WindowEdge(System.Text.Json.JsonNamingPolicy.CamelCase.ConvertName(name), new Requirement(quantity, minimum * unit, maximum * unit)));
            }
        }

        Edge(nameof(window.MinimumRelativeCompaction), AcceptedQuantity.RelativeCompaction, window.MinimumRelativeCompaction, null);
        Edge(nameof(window.MaximumRelativeCompaction), AcceptedQuantity.RelativeCompaction, null, window.MaximumRelativeCompaction);
        Edge(nameof(window.MinimumDryDensity), AcceptedQuantity.DryDensity, window.MinimumDryDensity, null);
        Edge(nameof(window.MaximumDryDensity), AcceptedQuantity.DryDensity, null, window.MaximumDryDensity);
        Edge(nameof(window.MinimumSaturation), AcceptedQuantity.Saturation, window.MinimumSaturation, null);
        Edge(nameof(window.MaximumSaturation), AcceptedQuantity.Saturation, null, window.MaximumSaturation);
        Edge(nameof(window.MinimumAirVoids), AcceptedQuantity.AirVoids, window.MinimumAirVoids, null);
        Edge(nameof(window.MaximumAirVoids), AcceptedQuantity.AirVoids, null, window.MaximumAirVoids);
        Edge(nameof(window.WaterContent), AcceptedQuantity.WaterContent, window.WaterContent?[0], window.WaterContent?[1]);
        Edge(nameof(window.WaterContentFromOptimum), AcceptedQuantity.WaterContentFromOptimum, window.WaterContentFromOptimum?[0], window.WaterContentFromOptimum?[1]);
        return new CompactionWindow(edges, window.WetOfLineOfOptimums is true);
    }
}
