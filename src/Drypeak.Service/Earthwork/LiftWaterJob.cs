using Drypeak.Service.Contracts;
using Drypeak.Service.Hosting;
using Drypeak.Soil.Earthwork;
using Drypeak.Soil.Quantities;
using FluentValidation;

namespace Drypeak.Service.Earthwork;

/// <summary><c>POST /v1/earthwork/lift-water</c>.</summary>
internal static class LiftWaterJob
{
    public static void Map(IEndpointRouteBuilder app) =>
        app.MapEarthworkJob("lift-water", new LiftWaterRules(app.ServiceProvider.GetRequiredService<Limits>()), Compute, Examples.LiftWaterRequest)
            .WithSummary("Water for a lift")
            .WithDescription("Water to add to a lift, or to lose from it: for each unit of volume and of area, in all, in tanker loads; with an allowance for evaporation, and with an uncertainty where the water contents have one.");

    /// <summary>Computes a request that passed the rules.</summary>
    public static LiftWaterAnswer Compute(LiftWaterRequest request)
    {
        var (units, water) = (request.Units.ToUnits(), request.Water());
        var lift = LiftOf(request, []);
        var result = LiftWater.Compute(lift, water);
        var (cubicMeters, squareMeters) = (units.BulkVolume.InCubicMeters(), units.Area.InSquareMeters());
        return new LiftWaterAnswer
        {
            Reference = request.Reference,
            Identification = request.Identification,
            Units = units.ToContract(),
            Volume = lift.Volume.In(units.BulkVolume),
            DryMass = result.DryMass.In(units.Mass),
            PerVolume = (result.PerVolume * cubicMeters).ToAnswer(units),
            PerArea = result.PerArea is { } perArea ? (perArea * squareMeters).ToAnswer(units) : null,
            Total = result.Total.ToAnswer(units),
            TankerLoads = result.TankerLoads,
            Uncertainty = result.StandardUncertainty is { } uncertainty
                ? new LiftUncertaintyAnswer((uncertainty * (cubicMeters / lift.Volume.CubicMeters)).ToAnswer(units), uncertainty.ToAnswer(units))
                : null,
            Trace = EarthworkJob.TraceOf(request, () => LiftWater.Working(lift, result, water, units)),
            Findings = LiftWater.Review(lift, result, units).ToContract(request),
            Cautions = EarthworkCautions.OfLift.With(request),
            Provenance = ProvenanceContract.Of(request),
        };
    }

    /// <summary>The lift; call with a request whose single values are sound.</summary>
    public static Lift LiftOf(LiftWaterRequest request, ICollection<Fault> faults)
    {
        var units = request.Units.ToUnits();
        double? given = request.Volume is { } volume ? Volume.From(volume, units.BulkVolume).CubicMeters : null;
        double? area = request.Area is { } surface ? Area.From(surface, units.Area).SquareMeters : null;
        double? thickness = request.Thickness is { } height ? Length.From(height, units.Length).Meters : null;
        if (area * thickness is { } byArea && given is { } byVolume)
        {
            faults.RefuseApart(byArea, byVolume, "/volume", "the volume", "area and thickness");
        }

        return new Lift
        {
            Volume = new Volume(area * thickness ?? given!.Value),
            Area = (area ?? given / thickness) is { } known ? new Area(known) : null,
            DryDensity = Density.From(request.DryDensity!.Value, units.Density),
            Present = request.WaterContentOf(units, "", faults)!.Value,
            Target = WaterContent.FromPercent(request.Target!.Value),
            Allowance = WaterContent.FromPercent(request.EvaporationAllowance ?? 0),
            EvaporatedDepth = request.Evaporation is { Rate: { } rate, Hours: { } hours } ? Length.From(rate * hours, units.Length) : default,
            Tanker = request.Tanker is { } tanker ? Volume.From(tanker, units.Liquid) : null,
            UncertaintyOfPresent = WaterContent.FromPercent(request.Uncertainty?.WaterContent ?? 0),
            UncertaintyOfTarget = WaterContent.FromPercent(request.Uncertainty?.Target ?? 0),
            UncertaintyOfDryDensity = Density.From(request.Uncertainty?.DryDensity ?? 0, units.Density),
        };
    }
}

/// <summary>All that a request for the water of a lift must keep.</summary>
internal sealed class LiftWaterRules : EarthworkRules<LiftWaterRequest>
{
    public LiftWaterRules(Limits limits)
        : base(limits)
    {
        RuleFor(request => request.Volume).VolumeOfEarth();
        RuleFor(request => request.Area).Positive();
        RuleFor(request => request.Thickness).Positive();
        RuleFor(request => request.Volume).NotNull().When(request => request is { Area: null, Thickness: null })
            .WithErrorCode("not-enough-data").WithMessage("The lift has no size. Give volume, or area and thickness.");
        RuleFor(request => request.Thickness).NotNull().When(request => request is { Volume: null, Area: { } })
            .WithErrorCode("incomplete").WithMessage("An area needs a thickness: give both, or the volume.");
        RuleFor(request => request.Area).NotNull().When(request => request is { Volume: null, Thickness: { } })
            .WithErrorCode("incomplete").WithMessage("A thickness needs an area: give both, or the volume.");
        RuleFor(request => request.DryDensity).Needed().Positive();
        Include(new WaterContentRules(limits));
        this.NeedsWaterContent();
        RuleFor(request => request.Target).Needed().WaterPercent();
        RuleFor(request => request.EvaporationAllowance).Within(0, 100, " percentage points");
        RuleFor(request => request.EvaporationAllowance).Null().When(request => request.Evaporation is { })
            .WithErrorCode("given-twice").WithMessage("Evaporation is given as an allowance and as a rate. Leave one out.");
        RuleFor(request => request.Evaporation!).SetValidator(new EvaporationRules()).When(request => request.Evaporation is { });
        RuleFor(request => request.Area).NotNull().When(request => request is { Evaporation: { }, Volume: { }, Thickness: null })
            .WithErrorCode("not-enough-data").WithMessage("A rate of evaporation needs the surface. Give area, or the allowance in place of the rate.");
        RuleFor(request => request.Tanker).Positive();
        RuleFor(request => request.Uncertainty!).SetValidator(new UncertaintyRules()).When(request => request.Uncertainty is { });
    }

    protected override void CheckTogether(LiftWaterRequest request, List<Fault> faults) => LiftWaterJob.LiftOf(request, faults);

    private sealed class EvaporationRules : AbstractValidator<EvaporationContract>
    {
        public EvaporationRules()
        {
            RuleFor(evaporation => evaporation.Rate).Needed().NotNegative();
            RuleFor(evaporation => evaporation.Hours).Needed().Within(0, 1000, " hours");
        }
    }

    private sealed class UncertaintyRules : AbstractValidator<LiftUncertaintyContract>
    {
        public UncertaintyRules()
        {
            RuleFor(uncertainty => uncertainty.WaterContent).WaterPercent();
            RuleFor(uncertainty => uncertainty.Target).WaterPercent();
            RuleFor(uncertainty => uncertainty.DryDensity).NotNegative();
        }
    }
}
