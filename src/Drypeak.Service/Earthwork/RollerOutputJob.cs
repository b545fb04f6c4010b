using Drypeak.Service.Contracts;
using Drypeak.Service.Hosting;
using Drypeak.Soil.Earthwork;
using Drypeak.Soil.Quantities;
using FluentValidation;

namespace Drypeak.Service.Earthwork;

/// <summary><c>POST /v1/earthwork/roller-output</c>.</summary>
internal static class RollerOutputJob
{
    public static void Map(IEndpointRouteBuilder app) =>
        app.MapEarthworkJob("roller-output", new RollerOutputRules(app.ServiceProvider.GetRequiredService<Limits>()), Compute, Examples.RollerOutputRequest)
            .WithSummary("What a roller finishes in an hour")
            .WithDescription("Area and compacted volume in an hour: effective width times speed times efficiency over passes, and times the lift's thickness.");

    /// <summary>Computes a request that passed the rules.</summary>
    public static RollerOutputAnswer Compute(RollerOutputRequest request)
    {
        var units = request.Units.ToUnits();
        var roller = new Roller(
            Length.From(request.Width!.Value, units.Length),
            Length.From(request.Overlap ?? 0, units.Length),
            Speed.From(request.Speed!.Value, units.Speed),
            Length.From(request.LiftThickness!.Value, units.Length),
            request.Passes!.Value,
            request.Efficiency ?? 1);
        return new RollerOutputAnswer
        {
            Reference = request.Reference,
            Identification = request.Identification,
            Units = units.ToContract(),
            EffectiveWidth = roller.EffectiveWidth.In(units.Length),
            Efficiency = roller.Efficiency,
            AreaPerHour = roller.AreaPerHour.In(units.Area),
            VolumePerHour = roller.VolumePerHour.In(units.BulkVolume),
            Trace = EarthworkJob.TraceOf(request, () => roller.Working(units)),
            Findings = roller.Review(request.Efficiency is { }, units).ToContract(request),
            Cautions = EarthworkCautions.OfRollers,
            Provenance = ProvenanceContract.Of(request),
        };
    }
}

/// <summary>All that a request about a roller must keep.</summary>
internal sealed class RollerOutputRules : EarthworkRules<RollerOutputRequest>
{
    private const int MostPasses = 1000;

    public RollerOutputRules(Limits limits)
        : base(limits)
    {
        RuleFor(request => request.Width).Needed().Positive();
        RuleFor(request => request.Overlap).NotNegative();
        RuleFor(request => request.Overlap).Must((request, overlap) => !(request.Width > 0 && overlap >= request.Width))
            .WithErrorCode("overlap-not-below-width")
            .WithMessage((request, overlap) => $"The overlap, {RuleWords.Text(overlap)}, must be below the width, {RuleWords.Text(request.Width)}: a lane would add nothing.");
        RuleFor(request => request.Speed).Needed().Positive();
        RuleFor(request => request.LiftThickness).Needed().Positive();
        RuleFor(request => request.Passes).Needed().Whole(MostPasses);
        RuleFor(request => request.Efficiency).Efficiency();
    }
}
