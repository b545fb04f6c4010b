using Drypeak.Figures;
using Drypeak.Service.Charts;
using Drypeak.Service.Contracts;
using Drypeak.Service.Hosting;
using Drypeak.Service.Laboratory;
using Drypeak.Soil.Laboratory;
using Drypeak.Soil.Quantities;
using Drypeak.Soil.References;
using FluentValidation;

namespace Drypeak.Service.Field;

/// <summary><c>POST /v1/rapid-method</c>: the density ratio of a lift before the oven has spoken.</summary>
internal sealed class RapidMethodJob(Limits limits)
{
    private readonly Lazy<Rules> _rules = new(() => new(limits));

    /// <summary>The kind of its chart.</summary>
    public ChartKind<PlotChart> Chart { get; } = ChartKind.Plot("rapid-method", "The converted wet densities of the rapid method with their peak", limits);

    public static void Map(IEndpointRouteBuilder app)
    {
        var job = app.ServiceProvider.GetRequiredService<RapidMethodJob>();
        app.MapJob<RapidMethodRequest, RapidMethodAnswer, PlotChart>("/v1/rapid-method", job.Check, job.Compute, Examples.RapidMethodRequest, job.Chart)
            .WithTags("Field")
            .WithName("rapid-method")
            .WithSummary("The rapid method: density ratio without a water content")
            .WithDescription("Field soil compacted at fill water content and with water added gives the relative compaction exactly, and the difference from the optimum (Hilf; ASTM D5080, AS 1289.5.7.1). With Accept: image/svg+xml, image/png or application/pdf the chart is the answer.");
    }

    /// <summary>Every broken rule; empty where the request can be computed.</summary>
    public IReadOnlyList<Fault> Check(RapidMethodRequest request)
    {
        var faults = _rules.Value.Validate(request).ToFaults().ToList();
        faults.AddRange(Identification.Check(request.Identification, limits));
        if (faults.Count == 0)
        {
            FieldWater(request, faults);
        }

        return faults;
    }

    /// <summary>Computes a request that passed <see cref="Check"/>.</summary>
    public Charted<RapidMethodAnswer, PlotChart> Compute(RapidMethodRequest request)
    {
        var units = request.Units.ToUnitSet();
        var specimens = request.Specimens!.Select(specimen => new RapidSpecimen(specimen.WaterAdded!.Value / 100, Density.From(specimen.WetDensity!.Value, units.Density))).ToList();
        var field = Density.From(request.Field!.WetDensity!.Value, units.Density);
        var result = RapidMethod.Compute(field, FieldWater(request, []), specimens, units.Density);
        var chart = RapidMethodChart.Of(request, field, specimens, result, units.Density);
        var links = Chart.LinksOf(chart, limits, out var whyNot);
        var answer = new RapidMethodAnswer
        {
            Reference = request.Reference,
            Identification = request.Identification,
            Units = units.ToContract(),
            Specimens = [.. specimens.Select((specimen, i) => new RapidSpecimenAnswer(
                request.Specimens![i].WaterAdded!.Value, request.Specimens[i].WetDensity!.Value, specimen.Converted.In(units.Density)))],
            Peak = result is { PeakWaterAdded: { } z, PeakDensity: { } density } ? new RapidPeakAnswer(z * 100, density.In(units.Density)) : null,
            DensityRatio = result.DensityRatio * 100,
            WaterContentFromOptimum = result.WaterContentFromOptimum * 100,
            Trace = request.Trace is true ? [.. result.Working.Select(TraceStep.Of)] : null,
            Findings = [.. result.Findings.Concat(whyNot is null ? [] : [whyNot]).OrderBy(finding => finding.Severity).Select(FindingContract.Of)],
            Links = links,
            Provenance = ProvenanceContract.Of(request),
            Cautions = request.Field.Carbide is { } ? [.. Cautions.OfArithmetic, Cautions.OfCarbideTester] : Cautions.OfArithmetic,
        };
        return new(answer, chart);
    }

    private static WaterContent? FieldWater(RapidMethodRequest request, ICollection<Fault> faults) =>
        request.Field!.ToMeasuredWater(request.Units.ToUnitSet()).Reduce("/field", faults);

    private sealed class Rules : AbstractValidator<RapidMethodRequest>
    {
        private const double MostWaterAdded = 100;
        private const double MostDried = -50;

        public Rules(Limits limits)
        {
            RuleFor(request => request.Reference).AtMost(limits.NameCharacters);
            RuleFor(request => request.Units!).SetValidator(new UnitsRules()).When(request => request.Units is { });
            RuleFor(request => request.Field).Needed();
            RuleFor(request => request.Field!).SetValidator(new FieldRules(limits)).When(request => request.Field is { });
            RuleFor(request => request.Specimens).Needed().Counted(limits.Specimens);
            RuleForEach(request => request.Specimens).Needed().SetValidator(new SpecimenRules());
        }

        private sealed class FieldRules : AbstractValidator<RapidFieldContract>
        {
            public FieldRules(Limits limits)
            {
                RuleFor(field => field.WetDensity).Needed().Positive();
                Include(new WaterContentRules(limits));
            }
        }

        private sealed class SpecimenRules : AbstractValidator<RapidSpecimenContract>
        {
            public SpecimenRules()
            {
                RuleFor(specimen => specimen.WaterAdded).Needed().Within(MostDried, MostWaterAdded, " % of the wet mass");
                RuleFor(specimen => specimen.WetDensity).Needed().Positive();
            }
        }
    }
}
