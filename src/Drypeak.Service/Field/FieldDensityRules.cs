using Drypeak.Service.Contracts;
using Drypeak.Service.Hosting;
using Drypeak.Service.Laboratory;
using Drypeak.Soil.FieldDensity;
using FluentValidation;

namespace Drypeak.Service.Field;

/// <summary>All that a field test must keep to be computed.</summary>
internal sealed class FieldDensityRules(MoistureDensityJob laboratory, Limits limits)
{
    private readonly RequestRules _values = new(limits);

    /// <summary>Every broken rule; empty where the test can be computed. What contradicts itself is looked for once the single values are sound.</summary>
    public IReadOnlyList<Fault> Check(FieldDensityRequest request)
    {
        var faults = _values.Validate(request).ToFaults().ToList();
        faults.AddRange(Identification.Check(request.Identification, limits));
        if (request.Laboratory?.Test is { } test)
        {
            faults.AddRange(laboratory.Check(test).Select(fault => fault with { Place = "/laboratory/test" + fault.Place }));
        }

        if (faults.Count == 0)
        {
            FieldAnalysis.Analyze(request.ToTest(), faults);
        }

        return faults;
    }

    private sealed class RequestRules : AbstractValidator<FieldDensityRequest>
    {
        public RequestRules(Limits limits)
        {
            RuleFor(request => request.Reference).AtMost(limits.NameCharacters);
            RuleFor(request => request.Units!).SetValidator(new UnitsRules()).When(request => request.Units is { });
            RuleFor(request => request.Method).Needed().OneOf(FieldMethodNames.All, "unknown-method");

            Block(request => request.SandCone, FieldMethodNames.SandCone, new SandConeRules());
            Block(request => request.RubberBalloon, FieldMethodNames.RubberBalloon, new RubberBalloonRules());
            Block(request => request.DriveCylinder, FieldMethodNames.DriveCylinder, new DriveCylinderRules());
            Block(request => request.WaterReplacement, FieldMethodNames.WaterReplacement, new WaterReplacementRules());
            Block(request => request.NuclearGauge, FieldMethodNames.NuclearGauge, new NuclearGaugeRules(limits));
            Block(request => request.Direct, FieldMethodNames.Direct, new DirectRules());

            RuleFor(request => request.Soil).NotNull().When(request => FieldMethodNames.WeighsSoil(request.Method))
                .WithErrorCode("not-enough-data").WithMessage("The soil out of the hole is missing: give soil.wet, or soil.containerAndWet and soil.container.");
            RuleFor(request => request.Soil!).SetValidator(new SoilRules()).When(request => request.Soil is { });
            RuleFor(request => request.Soil).Must(soil => soil is null or { Dry: { }, Wet: { } } or { Dry: { }, ContainerAndWet: { } })
                .When(request => request.Method is FieldMethodNames.NuclearGauge or FieldMethodNames.Direct)
                .WithErrorCode("not-for-this-method").WithMessage("This method weighs no soil: soil says something only with a wet and a dry mass, for the water content. Leave it out.");

            Include(new WaterContentRules(limits));
            Include(new WaterRules());
            RuleFor(request => request.SpecificGravity!).SetValidator(new SpecificGravityRules()).When(request => request.SpecificGravity is { });
            RuleFor(request => request.LargestParticle).Positive();
            RuleFor(request => request.Oversize!).SetValidator(new FieldOversizeRules()).When(request => request.Oversize is { });
            RuleFor(request => request.Laboratory!).SetValidator(new LaboratoryRules()).When(request => request.Laboratory is { });
            RuleFor(request => request.Uncertainty!).SetValidator(new UncertaintyRules()).When(request => request.Uncertainty is { });
            RuleFor(request => request.Specification!).SetValidator(new SpecificationRules()).When(request => request.Specification is { });
        }

        /// <summary>A method brings its own block, and no other.</summary>
        private void Block<TBlock>(System.Linq.Expressions.Expression<Func<FieldDensityRequest, TBlock?>> block, string method, IValidator<TBlock> rules)
            where TBlock : class
        {
            // A block that is absent has nothing to validate: the validator passes over it.
            var member = FieldMethodNames.MemberOf(method);
            RuleFor(block).NotNull().When(request => request.Method == method)
                .WithErrorCode("not-enough-data").WithMessage($"Method \"{method}\" needs its readings: give {member}.");
            RuleFor(block).Null().When(request => FieldMethodNames.All.Contains(request.Method ?? "") && request.Method != method)
                .WithErrorCode("not-for-this-method").WithMessage(request => $"{member} goes with method \"{method}\"; this test's is \"{request.Method}\". Leave it out, or change the method.");
            RuleFor(block).SetValidator(rules!).When(request => request.Method == method);
        }
    }

    private sealed class SoilRules : AbstractValidator<SoilContract>
    {
        public SoilRules()
        {
            RuleFor(soil => soil.Wet).Positive();
            RuleFor(soil => soil.ContainerAndWet).Positive();
            RuleFor(soil => soil.Container).NotNegative();
            RuleFor(soil => soil.Dry).Positive();
            RuleFor(soil => soil.Container).NotNull().When(soil => soil.ContainerAndWet is { })
                .WithErrorCode("incomplete").WithMessage("A mass of container and soil needs the container's: give container, or wet alone.");
            RuleFor(soil => soil.ContainerAndWet).NotNull().When(soil => soil.Container is { })
                .WithErrorCode("incomplete").WithMessage("A container's mass needs that of container and soil: give containerAndWet, or leave container out.");
            RuleFor(soil => soil.Wet).NotNull().When(soil => soil is { ContainerAndWet: null, Container: null, Dry: null })
                .WithErrorCode("not-enough-data").WithMessage("The mass of the soil is missing: give wet, or containerAndWet and container.");
        }
    }

    private sealed class FieldOversizeRules : AbstractValidator<FieldOversizeContract>
    {
        public FieldOversizeRules()
        {
            Include(new OversizeRules());
            RuleFor(oversize => oversize.Apply).OneOf([FieldDensityMapping.ToLaboratory, FieldDensityMapping.ToField], "unknown-word");
        }
    }

    internal sealed class LaboratoryRules : AbstractValidator<LaboratoryContract>
    {
        public LaboratoryRules()
        {
            RuleFor(values => values.MaximumDryDensity).Positive();
            RuleFor(values => values.OptimumWaterContent).Within(0, 1000, " %");
            RuleFor(values => values.MinimumDryDensity).Positive();
            RuleFor(values => values.MinimumDryDensity).Must((values, least) => !(least >= values.MaximumDryDensity))
                .WithErrorCode("limits-exchanged")
                .WithMessage((values, least) => $"The minimum dry density, {RuleWords.Text(least)}, is not below the maximum, {RuleWords.Text(values.MaximumDryDensity)}. Were the two exchanged?");
            RuleFor(values => values.Uncertainty!).SetValidator(new ReferenceUncertaintyRules()).When(values => values.Uncertainty is { });
            When(values => values.Test is { }, () =>
            {
                RuleFor(values => values.MaximumDryDensity).Null().WithErrorCode("not-with-test").WithMessage(Doubled);
                RuleFor(values => values.OptimumWaterContent).Null().WithErrorCode("not-with-test").WithMessage(Doubled);
                RuleFor(values => values.Uncertainty).Null().WithErrorCode("not-with-test").WithMessage(Doubled);
            });
        }

        private const string Doubled = "The laboratory test brings this value itself. Leave it out, or leave out the test.";
    }

    private sealed class ReferenceUncertaintyRules : AbstractValidator<LaboratoryUncertaintyContract>
    {
        public ReferenceUncertaintyRules()
        {
            RuleFor(uncertainty => uncertainty.MaximumDryDensity).NotNegative();
            RuleFor(uncertainty => uncertainty.OptimumWaterContent).Within(0, 100, " percentage points");
        }
    }

    internal sealed class UncertaintyRules : AbstractValidator<FieldUncertaintyContract>
    {
        public UncertaintyRules()
        {
            RuleFor(uncertainty => uncertainty.DryDensity).NotNegative();
            RuleFor(uncertainty => uncertainty.WaterContent).Within(0, 100, " percentage points");
            RuleFor(uncertainty => uncertainty.SpecificGravity).Within(0, SpecificGravityRules.Greatest);
        }
    }
}
