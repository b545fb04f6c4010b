using Drypeak.Service.Contracts;
using Drypeak.Service.Hosting;
using Drypeak.Soil.Earthwork;
using Drypeak.Soil.Quantities;
using FluentValidation;

namespace Drypeak.Service.Earthwork;

/// <summary><c>POST /v1/earthwork/specimen-water</c>.</summary>
internal static class SpecimenWaterJob
{
    public static void Map(IEndpointRouteBuilder app) =>
        app.MapEarthworkJob("specimen-water", new SpecimenWaterRules(app.ServiceProvider.GetRequiredService<Limits>()), Compute, Examples.SpecimenWaterRequest)
            .WithSummary("Water for the specimens of a compaction test")
            .WithDescription("How much water each portion of soil needs to come from its present water content to its target, by mass and by volume. Targets are given, or proposed around an expected optimum.");

    /// <summary>Computes a request that passed the rules.</summary>
    public static SpecimenWaterAnswer Compute(SpecimenWaterRequest request)
    {
        var (units, water) = (request.Units.ToUnits(), request.Water());
        var portions = PortionsOf(request, []);
        var expected = OptimumOf(request);
        var findings = SpecimenWater.Review(portions, water, i => request.Portions is null ? request.Targets is null ? "/expected" : $"/targets/{i}" : $"/portions/{i}/target", units);
        if (expected is { })
        {
            findings = findings.Append(EarthworkFindingKinds.TargetsProposed.At("/expected", expected.MaximumDryDensity is null
                ? $"The targets were placed around the expected optimum, {ReaderText.Of(expected.WaterContent)}. Add a specimen where the curve is not bracketed."
                : $"The targets were placed around {ReaderText.Of(expected.WaterContent)}, an estimate from the plastic limit for standard effort on fine-grained soil. Make the test; do not use the estimate in its place.",
                basis: expected.MaximumDryDensity is null ? null : ExpectedOptimum.EstimateSource));
        }

        return new SpecimenWaterAnswer
        {
            Reference = request.Reference,
            Identification = request.Identification,
            Units = units.ToContract(),
            Portions =
            [
                .. portions.Select((portion, i) => new PortionAnswer(
                    portion.Label,
                    request.Portions?[i].WetMass ?? request.WetMass!.Value,
                    request.Portions?[i].WaterContent ?? request.WaterContent ?? portion.Present.Percent,
                    request.Portions?[i].Target ?? request.Targets?[i] ?? portion.Target.Percent,
                    portion.DryMass.In(units.Mass),
                    portion.ToAdd(water).ToAnswer(units),
                    portion.FinalMass.In(units.Mass))),
            ],
            Expected = expected is null ? null : new ExpectedAnswer(
                expected.WaterContent.Percent, expected.MaximumDryDensity?.In(units.Density),
                expected.MaximumDryDensity is null ? "Expected by the caller" : ExpectedOptimum.EstimateSource),
            Trace = EarthworkJob.TraceOf(request, () => SpecimenWater.Working(portions, LimitOf(request), water, units)),
            Findings = findings.ToContract(request),
            Cautions = EarthworkCautions.OfSpecimens.With((request.Portions ?? []).Append<IWaterContentGiven>(request)),
            Provenance = ProvenanceContract.Of(request),
        };
    }

    /// <summary>The portions with their targets; call with a request whose single values are sound.</summary>
    public static IReadOnlyList<Portion> PortionsOf(SpecimenWaterRequest request, ICollection<Fault> faults)
    {
        var units = request.Units.ToUnits();
        if (request.Portions is { } portions)
        {
            var proposed = TargetsOf(request, portions.Count);
            return
            [
                .. portions.Select((portion, i) => new Portion(
                    portion.Label ?? $"{i + 1}",
                    Mass.From(portion.WetMass!.Value, units.Mass),
                    portion.WaterContentOf(units, $"/portions/{i}", faults)!.Value,
                    portion.Target is { } target ? WaterContent.FromPercent(target) : proposed[i])),
            ];
        }

        var targets = request.Targets is { } given ? [.. given.Select(WaterContent.FromPercent)] : TargetsOf(request, request.Expected!.Count ?? SpecimenTargets.UsualCount);
        var present = request.WaterContentOf(units, "", faults)!.Value;
        return [.. targets.Select((target, i) => new Portion($"{i + 1}", Mass.From(request.WetMass!.Value, units.Mass), present, target))];
    }

    private static IReadOnlyList<WaterContent> TargetsOf(SpecimenWaterRequest request, int count) => OptimumOf(request) is { } optimum
        ? SpecimenTargets.Around(optimum.WaterContent, count, WaterContent.FromPercent(request.Expected!.Spacing ?? SpecimenTargets.UsualSpacing))
        : [];

    private static WaterContent? LimitOf(SpecimenWaterRequest request) => request.Expected?.PlasticLimit is { } limit ? WaterContent.FromPercent(limit) : null;

    private static ExpectedOptimum? OptimumOf(SpecimenWaterRequest request) =>
        LimitOf(request) is { } limit ? ExpectedOptimum.FromPlasticLimit(limit)
        : request.Expected?.OptimumWaterContent is { } optimum ? new ExpectedOptimum(WaterContent.FromPercent(optimum), null)
        : null;
}

/// <summary>All that a request for the water of specimens must keep.</summary>
internal sealed class SpecimenWaterRules : EarthworkRules<SpecimenWaterRequest>
{
    private const int MostTargets = 20;

    public SpecimenWaterRules(Limits limits)
        : base(limits)
    {
        RuleFor(request => request.Portions).Counted(limits.Specimens);
        RuleForEach(request => request.Portions).Needed().SetValidator(new PortionRules(limits));
        RuleFor(request => request.Portions).Custom(CheckLabels);
        RuleFor(request => request.Portions).NotNull().When(request => request.WetMass is null)
            .WithErrorCode("not-enough-data").WithMessage("There is nothing to wet. Give portions, or wetMass with one water content for all.");
        RuleFor(request => request.WetMass).Positive();
        RuleFor(request => request.WetMass).Null().When(request => request.Portions is { })
            .WithErrorCode("not-with-portions").WithMessage("Portions have their own masses. Leave wetMass out, or the portions.");
        RuleFor(request => request.Targets).Null().When(request => request.Portions is { })
            .WithErrorCode("not-with-portions").WithMessage("Portions have their own targets. Leave targets out, and give each portion its target.");
        RuleFor(request => request.WaterContent).Null().When(request => request.Portions is { })
            .WithErrorCode("not-with-portions").WithMessage("Portions have their own water contents. Leave waterContent out here.");
        RuleFor(request => request.Tins).Null().When(request => request.Portions is { })
            .WithErrorCode("not-with-portions").WithMessage("Portions have their own tins. Leave tins out here.");
        RuleFor(request => request.WetBasis).Null().When(request => request.Portions is { })
            .WithErrorCode("not-with-portions").WithMessage("Portions have their own water contents. Leave wetBasis out here.");
        RuleFor(request => request.Carbide).Null().When(request => request.Portions is { })
            .WithErrorCode("not-with-portions").WithMessage("Portions have their own water contents. Leave carbide out here.");
        Include(new WaterContentRules(limits));
        When(request => request is { Portions: null, WetMass: { } }, this.NeedsWaterContent);

        RuleFor(request => request.Targets).Counted(limits.Specimens);
        RuleForEach(request => request.Targets).Must(target => target is >= 0 and <= 1000)
            .WithErrorCode("out-of-range").WithMessage((_, target) => $"A target must lie between 0 and 1000 %; {RuleWords.Text(target)} was received.");
        RuleFor(request => request.Targets).NotNull().When(request => request is { Portions: null, WetMass: { }, Expected: null })
            .WithErrorCode("not-enough-data").WithMessage("There are no targets. Give targets, or expected to have them proposed.");
        RuleFor(request => request.Expected).Null().When(request => request.Targets is { } || request.Portions?.Any(portion => portion?.Target is { }) == true)
            .WithErrorCode("given-twice").WithMessage("Targets are given, and an expected optimum to propose them. Leave one out.");
        RuleFor(request => request.Expected!).SetValidator(new ExpectedRules()).When(request => request.Expected is { });
        RuleFor(request => request.Expected!.Count).Null().When(request => request is { Expected: { }, Portions: { } })
            .WithErrorCode("not-with-portions").WithMessage("With portions there is one target for each. Leave count out.");
        RuleForEach(request => request.Portions).ChildRules(portion =>
            portion.RuleFor(each => each.Target).NotNull().WithErrorCode("not-enough-data").WithMessage("The target is missing. Give each portion one, or give expected and none."))
            .When(request => request.Expected is null);
    }

    protected override void CheckTogether(SpecimenWaterRequest request, List<Fault> faults) => SpecimenWaterJob.PortionsOf(request, faults);

    private static void CheckLabels(IReadOnlyList<PortionContract>? portions, ValidationContext<SpecimenWaterRequest> context)
    {
        var seen = new HashSet<string>();
        foreach (var (i, portion) in (portions ?? []).Index())
        {
            if (portion is { } && !seen.Add(portion.Label ?? $"{i + 1}"))
            {
                context.Fail($"Portions[{i}].Label", "repeated-label", "Another portion has this label. Give each its own.");
            }
        }
    }

    private sealed class PortionRules : AbstractValidator<PortionContract>
    {
        public PortionRules(Limits limits)
        {
            RuleFor(portion => portion.Label).NotBlank("A label").AtMost(limits.NameCharacters);
            RuleFor(portion => portion.WetMass).Needed().Positive();
            RuleFor(portion => portion.Target).WaterPercent();
            Include(new WaterContentRules(limits));
            this.NeedsWaterContent();
        }
    }

    private sealed class ExpectedRules : AbstractValidator<ExpectedContract>
    {
        public ExpectedRules()
        {
            RuleFor(expected => expected.OptimumWaterContent).Within(0.1, 200, " %");
            RuleFor(expected => expected.PlasticLimit).Within(1, 200, " %");
            RuleFor(expected => expected.OptimumWaterContent).NotNull().When(expected => expected.PlasticLimit is null)
                .WithErrorCode("not-enough-data").WithMessage("Nothing says what is expected. Give optimumWaterContent or plasticLimit.");
            RuleFor(expected => expected.PlasticLimit).Null().When(expected => expected.OptimumWaterContent is { })
                .WithErrorCode("given-twice").WithMessage("An expected optimum is given, and a plastic limit to estimate it from. Leave one out.");
            RuleFor(expected => expected.Count).Whole(MostTargets);
            RuleFor(expected => expected.Spacing).Within(0.1, 10, " percentage points");
        }
    }
}
