using Drypeak.Service.Contracts;
using Drypeak.Service.Hosting;
using Drypeak.Soil.Laboratory;
using Drypeak.Soil.TestMethods;
using FluentValidation;

namespace Drypeak.Service.Laboratory;

/// <summary>All that a laboratory test must keep to be computed.</summary>
internal sealed class MoistureDensityRules(Limits limits)
{
    private readonly RequestRules _values = new(limits);

    /// <summary>Every broken rule; empty where the test can be computed.</summary>
    public IReadOnlyList<Fault> Check(MoistureDensityRequest request)
    {
        var faults = _values.Validate(request).ToFaults().ToList();
        faults.AddRange(Identification.Check(request.Identification, limits));
        faults.AddRange(Contradictions(request, faults));
        return faults;
    }

    /// <summary>What is given twice and does not agree, and what is missing: only where the single values are sound.</summary>
    private static List<Fault> Contradictions(MoistureDensityRequest request, List<Fault> faults)
    {
        var contradictions = new List<Fault>();
        bool Sound(string place) => !faults.Exists(fault => fault.Place == place || fault.Place.StartsWith(place + "/", StringComparison.Ordinal));
        if (!Sound("/units") || request.Specimens is null)
        {
            return contradictions;
        }

        var units = request.Units.ToUnitSet();
        var mold = Sound("/mold") ? request.Mold.ToMold(units) : null;
        for (var i = 0; i < request.Specimens.Count; i++)
        {
            var place = $"/specimens/{i}";
            if (request.Specimens[i] is not { } specimen || !Sound(place) || !(Sound("/mold") || specimen.Mold is { }))
            {
                continue;
            }

            var measured = specimen.ToMeasurement(i, units);
            var missing = MissingOfMold(measured, mold, place).ToList();
            if (missing.Count == 0)
            {
                SpecimenReduction.Reduce(measured, mold, place, units, contradictions);
            }

            contradictions.AddRange(missing.Except(contradictions));
        }

        return contradictions;
    }

    /// <summary>
    /// What a specimen's masses need of the mold and do not find: at the mold, so that a mold that all share is complained of once, and not
    /// at all where its form is at fault.
    /// </summary>
    private static IEnumerable<Fault> MissingOfMold(SpecimenMeasurement measured, Mold? testMold, string place)
    {
        if (measured is { MoldAndWetSoil: null, WetMass: null } or { WetDensity: { } } or { DryDensity: { } })
        {
            yield break;
        }

        var mold = measured.Mold?.Over(testMold) ?? testMold;
        var moldPlace = measured.Mold is null ? "/mold" : place + "/mold";
        if (mold is null)
        {
            yield return new Fault(moldPlace, "not-enough-data", measured.WetMass is null
                ? "Masses of mold and wet soil need the mold: give mold.mass and mold.volume, for the test or for each specimen."
                : "Wet masses need the mold: give mold.volume, for the test or for each specimen.");
            yield break;
        }

        if (measured.WetMass is null && mold.EmptyMass is null)
        {
            yield return new Fault(moldPlace + "/mass", "not-enough-data", "The mass of the empty mold is missing. Give it, or the wet mass alone.");
        }

        if (mold is { Volume: null, WaterFilling: null, Diameter: null })
        {
            yield return new Fault(moldPlace + "/volume", "not-enough-data", "The volume of the mold is missing. Give it, or diameter and height, or empty and withWater.");
        }
    }

    private sealed class RequestRules : AbstractValidator<MoistureDensityRequest>
    {
        public RequestRules(Limits limits)
        {
            RuleFor(request => request.Reference).AtMost(limits.NameCharacters);
            RuleFor(request => request.Method).Must(code => code is null || IsMethod(code))
                .WithErrorCode("unknown-method").WithMessage((_, code) => NoSuchMethod(code!));
            RuleFor(request => request.Effort).Null().When(request => request.Method is null || TestMethodCatalogue.Find(request.Method) is { })
                .WithErrorCode("not-for-this-method").WithMessage("An effort goes with method \"custom\" only; the others bring their own. Leave it out, or name \"custom\".");
            RuleFor(request => request.Effort!).SetValidator(new EffortRules()).When(request => request.Effort is { });
            RuleFor(request => request.Units!).SetValidator(new UnitsRules()).When(request => request.Units is { });
            RuleFor(request => request.Mold!).SetValidator(new MoldRules()).When(request => request.Mold is { });
            RuleFor(request => request.SpecificGravity!).SetValidator(new SpecificGravityRules()).When(request => request.SpecificGravity is { });
            Include(new WaterRules());

            RuleFor(request => request.Specimens).Needed().Counted(limits.Specimens);
            RuleForEach(request => request.Specimens).Needed().SetValidator(new SpecimenRules(limits));
            RuleFor(request => request.Specimens).Custom(CheckLabels);

            RuleFor(request => request.Oversize!).SetValidator(new OversizeRules()).When(request => request.Oversize is { });
            RuleFor(request => request.ParticlesAbove!).SetValidator(new ParticlesAboveRules()).When(request => request.ParticlesAbove is { });
            RuleFor(request => request.Curve!).SetValidator(new CurveRules(limits)).When(request => request.Curve is { });
            RuleFor(request => request.Lines!).SetValidator(new LinesRules(limits)).When(request => request.Lines is { });
            RuleFor(request => request.Uncertainty!).SetValidator(new UncertaintyRules()).When(request => request.Uncertainty is { });
        }

        private static bool IsMethod(string code) => code == MoistureDensityMapping.CustomMethod || TestMethodCatalogue.Find(code) is { };

        private static string NoSuchMethod(string code)
        {
            var meant = NearestName.Of(code, TestMethodCatalogue.Codes);
            return $"There is no method \"{Received.Shorten(code)}\". {(meant is null ? "" : $"Did you mean \"{meant}\"? ")}The codes are listed at /v1/test-methods; \"custom\" is the caller's own.";
        }

        private static void CheckLabels(IReadOnlyList<SpecimenContract>? specimens, ValidationContext<MoistureDensityRequest> context)
        {
            var first = new Dictionary<string, int>(StringComparer.Ordinal);
            for (var i = 0; i < specimens?.Count; i++)
            {
                if (specimens[i] is { } specimen && !string.IsNullOrWhiteSpace(specimen.LabelOr(i)) && !first.TryAdd(specimen.LabelOr(i), i))
                {
                    context.Fail($"Specimens[{i}].Label", "repeated-label",
                        $"Specimen {first[specimen.LabelOr(i)] + 1} has the label \"{specimen.LabelOr(i)}\" too. Give each its own.");
                }
            }
        }
    }

    private sealed class SpecimenRules : AbstractValidator<SpecimenContract>
    {
        public SpecimenRules(Limits limits)
        {
            RuleFor(specimen => specimen.Label).NotBlank("A label").AtMost(limits.NameCharacters);
            RuleFor(specimen => specimen.MoldAndWetSoil).Positive();
            RuleFor(specimen => specimen.Mold!).SetValidator(new MoldRules()).When(specimen => specimen.Mold is { });
            RuleFor(specimen => specimen.DepthBelowRim).NotNegative();
            RuleFor(specimen => specimen.DepthsBelowRim).Counted(MoldRules.MostReadings);
            RuleForEach(specimen => specimen.DepthsBelowRim).NotNegative();
            RuleFor(specimen => specimen.WetMass).Positive();
            RuleFor(specimen => specimen.WetDensity).Positive();
            RuleFor(specimen => specimen.DryDensity).Positive();
            Include(new WaterContentRules(limits));
            RuleFor(specimen => specimen.SetAside).NotBlank("The reason for setting a specimen aside").AtMost(limits.TextCharacters);
        }
    }

    private sealed class EffortRules : AbstractValidator<EffortContract>
    {
        public EffortRules()
        {
            RuleFor(effort => effort.RammerMass).Needed().Positive();
            RuleFor(effort => effort.Drop).Needed().Positive();
            RuleFor(effort => effort.Layers).Needed().Must(layers => layers is null or (>= 1 and <= 100))
                .WithErrorCode("out-of-range").WithMessage((_, layers) => $"There must be 1 to 100 layers; {layers} was received.");
            RuleFor(effort => effort.Blows).Needed().Must(blows => blows is null or (>= 1 and <= 10_000))
                .WithErrorCode("out-of-range").WithMessage((_, blows) => $"There must be 1 to 10000 blows a layer; {blows} was received.");
        }
    }

    private sealed class ParticlesAboveRules : AbstractValidator<ParticlesAboveContract>
    {
        public ParticlesAboveRules()
        {
            RuleFor(particles => particles.Sieve).Needed().Positive();
            RuleFor(particles => particles.Percent).Needed().Within(0, 100, " %");
        }
    }

    private sealed class CurveRules : AbstractValidator<CurveRequest>
    {
        public CurveRules(Limits limits)
        {
            RuleFor(curve => curve.Model).OneOf(MoistureDensityMapping.ModelNames, "unknown-model");
            RuleFor(curve => curve.Adopted!).SetValidator(new AdoptedRules(limits)).When(curve => curve.Adopted is { });
        }
    }

    private sealed class AdoptedRules : AbstractValidator<AdoptedRequest>
    {
        public AdoptedRules(Limits limits)
        {
            RuleFor(adopted => adopted.WaterContent).Needed().Within(0, 1000, " %");
            RuleFor(adopted => adopted.MaximumDryDensity).Needed().Positive();
            RuleFor(adopted => adopted.Reason).Needed().NotBlank("The reason for an adopted peak", "Say why it was adopted.").AtMost(limits.TextCharacters);
        }
    }

    private sealed class LinesRules : AbstractValidator<LinesRequest>
    {
        public LinesRules(Limits limits)
        {
            RuleFor(lines => lines.Saturation).LinesOfAKind(limits.LinesOfAKind);
            RuleForEach(lines => lines.Saturation).Saturation();
            RuleFor(lines => lines.AirVoids).LinesOfAKind(limits.LinesOfAKind);
            RuleForEach(lines => lines.AirVoids).AirVoids();
        }
    }

    private sealed class UncertaintyRules : AbstractValidator<UncertaintyRequest>
    {
        public UncertaintyRules()
        {
            RuleFor(uncertainty => uncertainty.Mass).NotNegative();
            RuleFor(uncertainty => uncertainty.TinMass).NotNegative();
            RuleFor(uncertainty => uncertainty.Volume).NotNegative();
            RuleFor(uncertainty => uncertainty.WaterContent).Within(0, 100, " percentage points");
            RuleFor(uncertainty => uncertainty.DryDensity).NotNegative();
            RuleFor(uncertainty => uncertainty.SpecificGravity).Within(0, SpecificGravityRules.Greatest);
        }
    }
}
