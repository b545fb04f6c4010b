using Drypeak.Service.Contracts;
using Drypeak.Service.Hosting;
using Drypeak.Soil.Laboratory;
using Drypeak.Soil.Laboratory.Review;
using Drypeak.Soil.Laboratory.Workings;
using Drypeak.Soil.Quantities;
using FluentValidation;

namespace Drypeak.Service.Laboratory;

/// <summary><c>POST /v1/oversize-correction</c>.</summary>
internal static class OversizeCorrectionJob
{
    private const string ToTotal = "to-total";
    private const string ToFines = "to-fines";
    private static readonly Rules RequestRules = new();

    public static void MapOversizeCorrection(this IEndpointRouteBuilder app) =>
        app.MapJob<OversizeCorrectionRequest, OversizeCorrectionAnswer>("/v1/oversize-correction", Check, Compute, Examples.OversizeCorrectionRequest)
            .WithTags("Laboratory")
            .WithName("oversize-correction")
            .WithSummary("Correct for oversize particles")
            .WithDescription("From the fines that were tested to the total material, or back (ASTM D4718; AASHTO T 99 annex / T 224).");

    private static IReadOnlyList<Fault> Check(OversizeCorrectionRequest request)
    {
        var faults = RequestRules.Validate(request).ToFaults();
        return faults.Count > 0 || Corrected(request) is { }
            ? faults
            : [new Fault("/total", "oversize-fills-all", "The oversize alone would fill the volume, or hold more than all the water: nothing is left for the fines. Check its share, specific gravity and water content.")];
    }

    private static OversizeCorrectionAnswer Compute(OversizeCorrectionRequest request)
    {
        var units = request.Units.ToUnitSet();
        var oversize = request.Oversize!.ToOversize()!;
        var corrected = Corrected(request)!.Value;
        var total = request.Direction == ToTotal ? ToContract(corrected, units) : request.Total!;
        var fine = request.Direction == ToTotal ? request.Fine! : ToContract(corrected, units);
        return new OversizeCorrectionAnswer
        {
            Units = units.ToContract(),
            Total = total,
            Fine = fine,
            Trace = request.Trace is true
                ? [.. OversizeWorking.Of(Given(request, units), oversize, request.Water(), request.Direction == ToTotal, units.Density).Select(TraceStep.Of)]
                : null,
            Findings = [.. MaterialReview.Oversize(oversize, null).Select(FindingContract.Of)],
            Provenance = ProvenanceContract.Of(request),
            Cautions = Cautions.OfArithmetic,
        };
    }

    /// <summary>The other material; null where none is possible.</summary>
    private static DensityAndWater? Corrected(OversizeCorrectionRequest request)
    {
        var oversize = request.Oversize!.ToOversize()!;
        var given = Given(request, request.Units.ToUnitSet());
        return request.Direction == ToTotal
            ? OversizeCorrection.ToTotal(given, oversize.Fraction, oversize.SpecificGravity!.Value, oversize.WaterContent, request.Water())
            : OversizeCorrection.ToFines(given, oversize.Fraction, oversize.SpecificGravity!.Value, oversize.WaterContent, request.Water());
    }

    private static DensityAndWater Given(OversizeCorrectionRequest request, UnitSet units)
    {
        var given = request.Direction == ToTotal ? request.Fine! : request.Total!;
        return new DensityAndWater(Density.From(given.DryDensity!.Value, units.Density), WaterContent.FromPercent(given.WaterContent!.Value));
    }

    private static DensityAndWaterContract ToContract(DensityAndWater material, UnitSet units) =>
        new() { DryDensity = material.DryDensity.In(units.Density), WaterContent = material.WaterContent.Percent };

    private sealed class Rules : AbstractValidator<OversizeCorrectionRequest>
    {
        public Rules()
        {
            RuleFor(request => request.Units!).SetValidator(new UnitsRules()).When(request => request.Units is { });
            Include(new WaterRules());
            RuleFor(request => request.Direction).Needed().OneOf([ToTotal, ToFines], "unknown-word");
            RuleFor(request => request.Fine).NotNull().When(request => request.Direction == ToTotal)
                .WithErrorCode("incomplete").WithMessage("\"to-total\" starts from the fines: give fine.");
            RuleFor(request => request.Total).NotNull().When(request => request.Direction == ToFines)
                .WithErrorCode("incomplete").WithMessage("\"to-fines\" starts from all the material: give total.");
            RuleFor(request => request.Fine).Null().When(request => request.Direction == ToFines)
                .WithErrorCode("not-for-this-direction").WithMessage("With \"to-fines\" the fines are the answer. Leave fine out.");
            RuleFor(request => request.Total).Null().When(request => request.Direction == ToTotal)
                .WithErrorCode("not-for-this-direction").WithMessage("With \"to-total\" the total is the answer. Leave total out.");
            RuleFor(request => request.Fine!).SetValidator(new MaterialRules()).When(request => request.Fine is { });
            RuleFor(request => request.Total!).SetValidator(new MaterialRules()).When(request => request.Total is { });
            RuleFor(request => request.Oversize).Needed();
            RuleFor(request => request.Oversize!).SetValidator(new OversizeRules()).When(request => request.Oversize is { });
            RuleFor(request => request.Oversize!.SpecificGravity).NotNull().When(request => request.Oversize is { })
                .WithErrorCode("incomplete").WithMessage("The correction needs the bulk specific gravity of the oversize. Give it.");
        }
    }

    private sealed class MaterialRules : AbstractValidator<DensityAndWaterContract>
    {
        public MaterialRules()
        {
            RuleFor(material => material.DryDensity).Needed().Positive();
            RuleFor(material => material.WaterContent).Needed().Within(0, 1000, " %");
        }
    }
}
