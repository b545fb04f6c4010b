using Drypeak.Service.Contracts;
using Drypeak.Service.Hosting;
using Drypeak.Soil.Laboratory;
using Drypeak.Soil.Quantities;
using Drypeak.Soil.References;
using FluentValidation;

namespace Drypeak.Service.Field;

/// <summary><c>POST /v1/rapid-method</c>: the density ratio of a lift before the oven has spoken.</summary>
internal sealed class RapidMethodJob(Limits limits)
{
    private readonly Rules _rules = new(limits);

    public static void Map(IEndpointRouteBuilder app) =>
        app.MapJob<RapidMethodRequest, RapidMethodAnswer>(
                "/v1/rapid-method", services => new RapidMethodJob(services.GetRequiredService<Limits>()).Check, Compute, Examples.RapidMethodRequest)
            .WithTags("Field")
            .WithName("rapid-method")
            .WithSummary("The rapid method: density ratio without a water content")
            .WithDescription("Field soil compacted at fill water content and with water added gives the relative compaction exactly, and the difference from the optimum (Hilf; ASTM D5080, AS 1289.5.7.1).");

    private List<Fault> Check(RapidMethodRequest request)
    {
        var faults = _rules.Validate(request).ToFaults().ToList();
        if (faults.Count == 0)
        {
            FieldWater(request, faults);
        }

        return faults;
    }

    private static RapidMethodAnswer Compute(RapidMethodRequest request)
    {
        var units = request.Units.ToUnitSet();
        var specimens = request.Specimens!.Select(specimen => new RapidSpecimen(specimen.WaterAdded!.Value / 100, Density.From(specimen.WetDensity!.Value, units.Density))).ToList();
        var result = RapidMethod.Compute(Density.From(request.Field!.WetDensity!.Value, units.Density), FieldWater(request, []), specimens, units.Density);
        return new RapidMethodAnswer
        {
            Reference = request.Reference,
            Units = units.ToContract(),
            Specimens = [.. specimens.Select((specimen, i) => new RapidSpecimenAnswer(
                request.Specimens![i].WaterAdded!.Value, request.Specimens[i].WetDensity!.Value, specimen.Converted.In(units.Density)))],
            Peak = result is { PeakWaterAdded: { } z, PeakDensity: { } density } ? new RapidPeakAnswer(z * 100, density.In(units.Density)) : null,
            DensityRatio = result.DensityRatio * 100,
            WaterContentFromOptimum = result.WaterContentFromOptimum * 100,
            Findings = [.. result.Findings.OrderBy(finding => finding.Severity).Select(FindingContract.Of)],
            Links = new LinksContract(),
            Provenance = ProvenanceContract.Of(request),
            Cautions = request.Field.Carbide is { } ? [.. Cautions.OfArithmetic, Cautions.OfCarbideTester] : Cautions.OfArithmetic,
        };
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
