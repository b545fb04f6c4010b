using Drypeak.Figures;
using Drypeak.Service.Charts;
using Drypeak.Service.Contracts;
using Drypeak.Service.Hosting;
using Drypeak.Service.Reports;
using Drypeak.Soil.Curves;
using Drypeak.Soil.Laboratory;
using Drypeak.Soil.Laboratory.Workings;
using Drypeak.Soil.Phases;
using Drypeak.Soil.Quantities;
using Drypeak.Soil.TestMethods;

namespace Drypeak.Service.Laboratory;

/// <summary>The laboratory test from contract to contract. The endpoint, the page and a batch line all call this.</summary>
internal sealed class MoistureDensityJob(Limits limits)
{
    private readonly Lazy<MoistureDensityRules> _rules = new(() => new(limits));

    private const int LinePoints = 41;
    private const double Coverage = 0.95;

    /// <summary>The kind of its chart.</summary>
    public ChartKind<CompactionChart> Chart { get; } = ChartKind.Compaction("moisture-density", "The chart of a laboratory test", limits);

    /// <summary>Every broken rule; empty where the request can be computed.</summary>
    public IReadOnlyList<Fault> Check(MoistureDensityRequest request) => _rules.Value.Check(request);

    /// <summary>Computes a request that passed <see cref="Check"/>.</summary>
    public Charted<MoistureDensityAnswer, CompactionChart> Compute(MoistureDensityRequest request)
    {
        var (test, result) = Analyze(request);
        var specimens = result.Specimens;
        var chart = MoistureDensityChart.Of(request, test, result);
        var links = Chart.LinksOf(chart, limits, out var whyNoLink);
        var findings = (whyNoLink is null ? result.Findings : result.Findings.Append(whyNoLink)).Select(FindingContract.Of);
        return new Charted<MoistureDensityAnswer, CompactionChart>(
            new MoistureDensityAnswer
            {
                Reference = request.Reference,
                Identification = request.Identification,
                Method = MethodOf(test, specimens),
                Units = test.Units.ToContract(),
                Specimens = [.. specimens.Select(specimen => ToAnswer(specimen, test))],
                Optimum = result.Optimum is { } optimum ? ToAnswer(optimum, test, result.Propagated) : null,
                Adopted = test.Adopted is { } adopted
                    ? new AdoptedAnswer(adopted.WaterContent.Percent, adopted.MaximumDryDensity.In(test.Units.Density), adopted.Reason, Reported(test, adopted.WaterContent, adopted.MaximumDryDensity))
                    : null,
                OversizeGiven = test.Oversize is { },
                Corrected = result.Corrected is { } corrected
                    ? new CorrectedAnswer(corrected.WaterContent.Percent, corrected.DryDensity.In(test.Units.Density), Reported(test, corrected.WaterContent, corrected.DryDensity))
                    : null,
                Curve = result.Curve is { } curve ? ToAnswer(curve, test, specimens) : null,
                ZeroAirVoids = Line(test, specimens, w => PhaseRelations.OnZeroAirVoidsLine(w, test.SpecificGravity!.Value, test.WaterDensity)),
                Lines = LinesOf(request.Lines, test, specimens),
                NextSpecimen = result.Curve?.Next is { } next
                    ? new NextSpecimenAnswer(Math.Round(next.WaterContent * 200) / 2, next.Reason, next.StandardUncertaintyNow * 100, next.StandardUncertaintyAfter * 100)
                    : null,
                Trace = request.Trace is true ? [.. Working.Of(test, result).Select(TraceStep.Of)] : null,
                Findings = [.. findings],
                Links = links with { Report = ReportAddress.Of(MoistureDensityReport.Job, request, limits) },
                Provenance = ProvenanceContract.Of(request),
                Cautions = request.Specimens!.Any(specimen => specimen.Carbide is { })
                    ? [.. Cautions.OfLaboratoryTest, Cautions.OfCarbideTester]
                    : Cautions.OfLaboratoryTest,
            },
            chart);
    }

    /// <summary>The domain's result of a request that passed <see cref="Check"/>.</summary>
    public static (MoistureDensityTest Test, MoistureDensityResult Result) Analyze(MoistureDensityRequest request)
    {
        var (test, specimens) = Reduce(request);
        var result = MoistureDensity.Analyze(test, specimens);
        if (result.Curve is { } curve)
        {
            Meters.Curve(curve.Chosen.Model.Name(), hasOptimum: result.Optimum is { });
        }

        return (test, result);
    }

    /// <summary>The reduced specimens of a request that passed <see cref="Check"/>, without a curve.</summary>
    public static (MoistureDensityTest Test, IReadOnlyList<Specimen> Specimens) Reduce(MoistureDensityRequest request)
    {
        var test = request.ToTest();
        var faults = new List<Fault>();
        var specimens = MoistureDensity.Reduce(test, faults).OfType<Specimen>().ToList();
        return faults.Count == 0
            ? (test, specimens)
            : throw new ArgumentException("The request does not keep the rules: " + faults[0].Message, nameof(request));
    }

    private static MethodAnswer? MethodOf(MoistureDensityTest test, IReadOnlyList<Specimen> specimens)
    {
        var computed = EffortSeries.EffortOf(test, specimens)?.KilojoulesPerCubicMeter;
        return test switch
        {
            { IsCustomMethod: true } => new MethodAnswer(MoistureDensityMapping.CustomMethod, "The caller's own method", null, null,
                test.CustomEffort is null ? null : new EffortAnswer(computed, null)),
            { Method: { } method } => new MethodAnswer(method.Code, method.Title, method.Summary, method.Standard,
                new EffortAnswer(computed, method.NominalEffort?.Value.KilojoulesPerCubicMeter)),
            _ => null,
        };
    }

    private static SpecimenAnswer ToAnswer(Specimen specimen, MoistureDensityTest test)
    {
        var phases = specimen.PhasesWith(test.SpecificGravity?.Value, test.WaterDensity);
        return new SpecimenAnswer(
            specimen.Label,
            specimen.WaterContent.Percent,
            specimen.WetDensity.In(test.Units.Density),
            specimen.DryDensity.In(test.Units.Density),
            phases?.VoidRatio,
            phases?.Porosity * 100,
            phases?.Saturation * 100,
            phases?.AirVoids * 100,
            specimen.SetAside);
    }

    public static OptimumAnswer ToAnswer(FittedOptimum optimum, MoistureDensityTest test, PropagatedUncertainty? propagated)
    {
        var w = new WaterContent(optimum.WaterContent.Value);
        var density = new Density(optimum.MaximumDryDensity.Value);
        var unit = test.Units.Density.InKilogramsPerCubicMeter();
        var water = ToAnswer(optimum.WaterContent, 0.01);
        var maximum = ToAnswer(optimum.MaximumDryDensity, unit);
        return new OptimumAnswer(
            w.Percent,
            density.In(test.Units.Density),
            SaturationAt(w, density, test),
            water is null && maximum is null ? null : new OptimumUncertaintyAnswer
            {
                WaterContent = water,
                MaximumDryDensity = maximum,
                Trials = propagated?.Trials,
                Contributions = propagated is null
                    ? null
                    : [.. propagated.Contributions.Select(part => new ContributionAnswer(part.Quantity, part.Share, part.OfWaterContent, part.OfMaximumDryDensity))],
            },
            Reported(test, w, density));
    }

    /// <summary>Degree of saturation at a point, %; null without a specific gravity, or where the solids leave no voids.</summary>
    public static double? SaturationAt(WaterContent w, Density density, MoistureDensityTest test) =>
        test.SpecificGravity is { } gravity && PhaseRelations.VoidRatio(density, gravity.Value, test.WaterDensity) is (> 0 and var voidRatio)
            ? PhaseRelations.Saturation(w, voidRatio, gravity.Value) * 100
            : null;

    private static UncertaintyAnswer? ToAnswer(Estimate estimate, double unit) => estimate.StandardUncertainty is { } standard
        ? new UncertaintyAnswer(standard / unit, estimate is { Lower: { } lower, Upper: { } upper } ? [lower / unit, upper / unit] : null, Coverage)
        : null;

    private static ReportedAnswer Reported(MoistureDensityTest test, WaterContent w, Density density) =>
        new(Reporting.WaterContent(test.Method, w), Reporting.DryDensity(test.Method, density, test.Units.Density));

    private static CurveAnswer ToAnswer(CurveAnalysis curve, MoistureDensityTest test, IReadOnlyList<Specimen> specimens)
    {
        var unit = test.Units.Density.InKilogramsPerCubicMeter();
        var chosen = curve.Chosen;
        var kept = specimens.Where(specimen => specimen.SetAside is null).ToList();
        return new CurveAnswer
        {
            Model = chosen.Model.Name(),
            Chosen = curve.Why,
            Parameters = chosen.Parameters.ToDictionary(
                parameter => parameter.Name,
                parameter => InCallersUnit(parameter, test.Units.Density)),
            RootMeanSquareError = chosen.RootMeanSquareError / unit,
            LeaveOneOutError = chosen.LeaveOneOutError / unit,
            DegreesOfFreedom = chosen.DegreesOfFreedom,
            ChanceOfPeakOutside = chosen.ChanceOfPeakOutside,
            Residuals =
            [
                .. chosen.Fitted.Select((fitted, i) => new ResidualAnswer(
                    kept[i].Label,
                    fitted / unit,
                    (kept[i].DryDensity.KilogramsPerCubicMeter - fitted) / unit,
                    i < chosen.Predictions.Count ? chosen.Predictions[i].DryDensity / unit : null,
                    i < chosen.Predictions.Count ? chosen.Predictions[i].StandardUncertainty / unit : null)),
            ],
            Points = [.. chosen.Curve.Select(point => new[] { point.WaterContent * 100, point.DryDensity / unit })],
            Alternatives =
            [
                .. curve.Alternatives.Select(model => new AlternativeAnswer(
                    model.Model.Name(),
                    model.Admissible,
                    model.WhyNot,
                    model.Optimum is { } optimum ? ToAnswer(optimum, test, null) : null,
                    model.RootMeanSquareError / unit,
                    model.LeaveOneOutError / unit)),
            ],
        };
    }

    /// <summary>A density, or a density per something (<c>kg/m³ per %</c>), in the caller's unit; any other parameter as it is.</summary>
    private static ParameterAnswer InCallersUnit(CurveParameter parameter, DensityUnit unit)
    {
        var inside = DensityUnit.KilogramPerCubicMeter.Symbol();
        return parameter.Unit.StartsWith(inside, StringComparison.Ordinal)
            ? new ParameterAnswer(
                new Density(parameter.Value).In(unit), unit.Symbol() + parameter.Unit[inside.Length..],
                parameter.StandardError is { } error ? new Density(error).In(unit) : null, parameter.Meaning)
            : new ParameterAnswer(parameter.Value, parameter.Unit, parameter.StandardError, parameter.Meaning);
    }

    private static IReadOnlyList<LineAnswer> LinesOf(LinesRequest? lines, MoistureDensityTest test, IReadOnlyList<Specimen> specimens) =>
        test.SpecificGravity is not { Value: var gravity } ? [] :
        [
            .. (lines?.Saturation ?? []).Select(percent => new LineAnswer("saturation", percent,
                Line(test, specimens, w => PhaseRelations.OnSaturationLine(w, percent / 100, gravity, test.WaterDensity)))),
            .. (lines?.AirVoids ?? []).Select(percent => new LineAnswer("airVoids", percent,
                Line(test, specimens, w => PhaseRelations.OnAirVoidsLine(w, percent / 100, gravity, test.WaterDensity)))),
        ];

    /// <summary>A line over the specimens' range and a little beyond; empty without a specific gravity.</summary>
    private static IReadOnlyList<double[]> Line(MoistureDensityTest test, IReadOnlyList<Specimen> specimens, Func<WaterContent, Density> line)
    {
        if (test.SpecificGravity is null)
        {
            return [];
        }

        var least = specimens.Min(specimen => specimen.WaterContent.Percent);
        var greatest = specimens.Max(specimen => specimen.WaterContent.Percent);
        var margin = Math.Max(1, (greatest - least) / 5);
        var from = Math.Max(0, least - margin);
        return
        [
            .. Enumerable.Range(0, LinePoints)
                .Select(i => WaterContent.FromPercent(from + ((greatest + margin - from) * i / (LinePoints - 1))))
                .Select(w => new[] { w.Percent, line(w).In(test.Units.Density) }),
        ];
    }
}
