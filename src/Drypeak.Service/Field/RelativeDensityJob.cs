using Drypeak.Service.Contracts;
using Drypeak.Service.Hosting;
using Drypeak.Service.Laboratory;
using Drypeak.Soil.Laboratory;
using Drypeak.Soil.Laboratory.Review;
using Drypeak.Soil.Phases;
using Drypeak.Soil.Quantities;
using Drypeak.Soil.References;

namespace Drypeak.Service.Field;

/// <summary><c>POST /v1/relative-density</c>: a free-draining soil between its loosest and its densest state.</summary>
internal sealed class RelativeDensityJob(Limits limits)
{
    private readonly Lazy<RelativeDensityRules> _rules = new(() => new(limits));

    public static void Map(IEndpointRouteBuilder app) =>
        app.MapJob<RelativeDensityRequest, RelativeDensityAnswer>(
                "/v1/relative-density", app.ServiceProvider.GetRequiredService<RelativeDensityJob>().Check, Compute, Examples.RelativeDensityRequest)
            .WithTags("Field")
            .WithName("relative-density")
            .WithSummary("Relative density and relative compaction of a free-draining soil")
            .WithDescription("Any one measure of the soil gives the others: dry density, void ratio, wet density with a water content, relative density, relative compaction.");

    /// <summary>Every broken rule; empty where the request can be computed.</summary>
    public IReadOnlyList<Fault> Check(RelativeDensityRequest request)
    {
        var faults = _rules.Value.Validate(request).ToFaults().ToList();
        faults.AddRange(Identification.Check(request.Identification, limits));
        if (faults.Count == 0 && StateOf(request, faults) is not { } && faults.Count == 0)
        {
            faults.Add(new Fault("/relativeDensity", "out-of-range", $"At a relative density of {RuleWords.Text(request.RelativeDensity)} % the soil would have no volume. Check it and the limits."));
        }

        return faults;
    }

    /// <summary>Computes a request that passed <see cref="Check"/>.</summary>
    public static RelativeDensityAnswer Compute(RelativeDensityRequest request)
    {
        var unit = request.Units.DensityUnit();
        var state = StateOf(request, []) ?? throw new ArgumentException("The request does not keep the rules.", nameof(request));
        return new RelativeDensityAnswer
        {
            Reference = request.Reference,
            Identification = request.Identification,
            Units = request.Units.ToUnitSet().ToContract(),
            DryDensity = state.DryDensity / unit.InKilogramsPerCubicMeter(),
            VoidRatio = state.VoidRatio,
            RelativeDensity = state.RelativeDensity * 100,
            RelativeCompaction = state.RelativeCompaction * 100,
            Trace = request.Trace is true ? [.. state.Working(unit).Select(TraceStep.Of)] : null,
            Findings = [.. FindingsOf(request, state).OrderBy(finding => finding.Severity).Select(FindingContract.Of)],
            Provenance = ProvenanceContract.Of(request),
            Cautions = request.Carbide is { } ? [.. Cautions.OfArithmetic, Cautions.OfCarbideTester] : Cautions.OfArithmetic,
        };
    }

    private static IEnumerable<Finding> FindingsOf(RelativeDensityRequest request, DensityState state)
    {
        if (state.RelativeDensity is < -1e-9 or > 1 + 1e-9)
        {
            yield return ReferenceFindingKinds.BeyondDensityLimits.At("",
                $"The relative density is {ReaderText.Percent(state.RelativeDensity)}: the soil is {(state.RelativeDensity < 0 ? "looser than its loosest" : "denser than its densest")} state. Check the densities, and that the limits are this soil's.");
        }

        if (state.VoidRatio <= 0)
        {
            yield return FindingKinds.DensityAboveSolids.At("", "The void ratio is not over 0: the soil would be denser than its solids. Check the densities and the specific gravity.");
        }

        foreach (var finding in request.SpecificGravity is { Value: { } value } gravity ? MaterialReview.SpecificGravity(new SpecificGravity(value, gravity.Determined == "measured")) : [])
        {
            yield return finding;
        }
    }

    /// <summary>The state; null where there is a fault, or where it has no volume.</summary>
    private static DensityState? StateOf(RelativeDensityRequest request, List<Fault> faults)
    {
        var unit = request.Units.DensityUnit();
        double? solids = request.SpecificGravity is { Value: { } gravity } ? gravity * request.Water().KilogramsPerCubicMeter : null;
        var inVoidRatios = request.MinimumVoidRatio is { };
        var limits = request is { MinimumVoidRatio: { } least, MaximumVoidRatio: { } greatest }
            ? DensityLimits.OfVoidRatios(least, greatest)
            : DensityLimits.OfDensities(InSi(request.MinimumDryDensity!.Value), InSi(request.MaximumDryDensity!.Value));
        var volume = request switch
        {
            { RelativeDensity: { } relative } => limits.VolumeOfRelativeDensity(relative / 100),
            { RelativeCompaction: { } compaction } => limits.VolumeOfRelativeCompaction(compaction / 100),
            { VoidRatio: { } e } => inVoidRatios ? 1 + e : (1 + e) / solids!.Value,
            { DryDensity: { } dry } => OfDensity(InSi(dry)),
            _ => request.ToMeasuredWater(request.Units.ToUnitSet()).Reduce("", faults) is { } w
                ? OfDensity(PhaseRelations.DryDensity(new Density(InSi(request.WetDensity!.Value)), w).KilogramsPerCubicMeter)
                : 0,
        };
        return volume > 0 && faults.Count == 0 ? new DensityState(limits, inVoidRatios, volume, solids) : null;

        double InSi(double density) => Density.From(density, unit).KilogramsPerCubicMeter;
        double OfDensity(double dry) => inVoidRatios ? solids!.Value / dry : 1 / dry;
    }
}
