using Drypeak.Service.Contracts;
using Drypeak.Service.Hosting;
using FluentValidation;

namespace Drypeak.Service.Field;

/// <summary>One measure of the soil, one pair of limits, and a specific gravity where one speaks of density and the other of voids.</summary>
internal sealed class RelativeDensityRules : AbstractValidator<RelativeDensityRequest>
{
    private const double GreatestVoidRatio = 100;

    public RelativeDensityRules(Limits limits)
    {
        RuleFor(request => request.Reference).AtMost(limits.NameCharacters);
        RuleFor(request => request.Units!).SetValidator(new UnitsRules()).When(request => request.Units is { });
        Include(new WaterRules());
        Include(new WaterContentRules(limits));
        RuleFor(request => request.SpecificGravity!).SetValidator(new SpecificGravityRules()).When(request => request.SpecificGravity is { });
        RuleFor(request => request.DryDensity).Positive();
        RuleFor(request => request.WetDensity).Positive();
        RuleFor(request => request.VoidRatio).Within(0, GreatestVoidRatio);
        RuleFor(request => request.RelativeCompaction).Within(1, 1000, " %");
        RuleFor(request => request.RelativeDensity).Within(-1000, 1000, " %");
        RuleFor(request => request.MinimumDryDensity).Positive();
        RuleFor(request => request.MaximumDryDensity).Positive();
        RuleFor(request => request.MinimumVoidRatio).Within(0, GreatestVoidRatio);
        RuleFor(request => request.MaximumVoidRatio).Within(0, GreatestVoidRatio);

        RuleFor(request => request).Must(request => MeasuresOf(request).Count == 1).OverridePropertyName("")
            .WithErrorCode("not-one-measure")
            .WithMessage(request => $"One measure of the soil is needed: dryDensity, voidRatio, wetDensity with a water content, relativeCompaction or relativeDensity. {(MeasuresOf(request) is { Count: > 0 } given ? $"{string.Join(" and ", given)} were received." : "None was received.")}");
        RuleFor(request => request.WaterContent).NotNull().When(request => request.WetDensity is { } && !HasWater(request))
            .WithErrorCode("not-enough-data").WithMessage("A wet density needs a water content. Give waterContent, tins, wetBasis or carbide.");

        RuleFor(request => request).Must(request => HasDensities(request) != HasVoidRatios(request)).OverridePropertyName("")
            .WithErrorCode("not-one-pair-of-limits")
            .WithMessage("The limits are given as minimumDryDensity and maximumDryDensity, or as minimumVoidRatio and maximumVoidRatio: one pair, and not both.");
        RuleFor(request => request.MinimumDryDensity).NotNull().When(request => request.MaximumDryDensity is { })
            .WithErrorCode("incomplete").WithMessage("A maximum dry density needs the minimum. Give both.");
        RuleFor(request => request.MaximumDryDensity).NotNull().When(request => request.MinimumDryDensity is { })
            .WithErrorCode("incomplete").WithMessage("A minimum dry density needs the maximum. Give both.");
        RuleFor(request => request.MinimumVoidRatio).NotNull().When(request => request.MaximumVoidRatio is { })
            .WithErrorCode("incomplete").WithMessage("A maximum void ratio needs the minimum. Give both.");
        RuleFor(request => request.MaximumVoidRatio).NotNull().When(request => request.MinimumVoidRatio is { })
            .WithErrorCode("incomplete").WithMessage("A minimum void ratio needs the maximum. Give both.");
        RuleFor(request => request.MinimumDryDensity).Must((request, least) => !(least >= request.MaximumDryDensity))
            .WithErrorCode("limits-exchanged").WithMessage((request, least) => Exchanged("dry density", least, request.MaximumDryDensity));
        RuleFor(request => request.MinimumVoidRatio).Must((request, least) => !(least >= request.MaximumVoidRatio))
            .WithErrorCode("limits-exchanged").WithMessage((request, least) => Exchanged("void ratio", least, request.MaximumVoidRatio));

        RuleFor(request => request.SpecificGravity).NotNull()
            .When(request => (request.VoidRatio is { } && HasDensities(request)) || ((request.DryDensity is { } || request.WetDensity is { }) && HasVoidRatios(request)))
            .WithErrorCode("not-enough-data").WithMessage("Between a density and a void ratio the specific gravity is needed. Give it.");
    }

    private static bool HasDensities(RelativeDensityRequest request) => request.MinimumDryDensity is { } || request.MaximumDryDensity is { };

    private static bool HasVoidRatios(RelativeDensityRequest request) => request.MinimumVoidRatio is { } || request.MaximumVoidRatio is { };

    private static bool HasWater(RelativeDensityRequest request) => request is { WaterContent: { } } or { Tins: { } } or { WetBasis: { } } or { Carbide: { } };

    private static List<string> MeasuresOf(RelativeDensityRequest request) =>
    [
        .. new (string Name, double? Value)[]
        {
            ("dryDensity", request.DryDensity), ("voidRatio", request.VoidRatio), ("wetDensity", request.WetDensity),
            ("relativeCompaction", request.RelativeCompaction), ("relativeDensity", request.RelativeDensity),
        }.Where(measure => measure.Value is { }).Select(measure => measure.Name),
    ];

    private static string Exchanged(string quantity, double? least, double? greatest) =>
        $"The minimum {quantity}, {RuleWords.Text(least)}, is not below the maximum, {RuleWords.Text(greatest)}. Were the two exchanged?";
}
