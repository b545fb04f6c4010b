using Drypeak.Figures;
using Drypeak.Service.Contracts;
using Drypeak.Service.Hosting;
using FluentValidation;

namespace Drypeak.Service.Charts;

/// <summary>What a compaction chart from an address must keep to be drawn: the address is the caller's, not ours.</summary>
internal sealed class CompactionChartRules : AbstractValidator<CompactionChart>
{
    public CompactionChartRules(Limits limits)
    {
        RuleFor(chart => chart.Reference).AtMost(limits.NameCharacters);
        RuleFor(chart => chart.Statement).AtMost(limits.NameCharacters);
        RuleFor(chart => chart.DensityUnit).IsInEnum().WithErrorCode("unknown-unit").WithMessage("There is no such unit of density.");
        RuleFor(chart => chart.Curve).Needed();
        RuleFor(chart => chart.Specimens).Must(list => list.Count <= limits.Specimens)
            .WithErrorCode("out-of-range").WithMessage($"There must be up to {limits.Specimens} specimens.");
        RuleFor(chart => chart).Must(chart => chart.Specimens.Count > 0 || chart.FieldTests is { Count: > 0 })
            .WithErrorCode("out-of-range").WithMessage("There must be a specimen or a field test.");
        RuleForEach(chart => chart.Specimens).Must(specimen => specimen is { WaterContent: >= 0 and <= RuleWords.Greatest, DryDensity: >= RuleWords.Least and <= RuleWords.Greatest })
            .WithErrorCode("out-of-range").WithMessage("A specimen's water content and dry density must be possible.");
        RuleFor(chart => chart.FieldTests).Needed().Must(list => list is null || list.Count <= limits.Specimens)
            .WithErrorCode("out-of-range").WithMessage($"There must be up to {limits.Specimens} field tests.");
        RuleForEach(chart => chart.FieldTests).Must(test => test is { WaterContent: >= 0 and <= RuleWords.Greatest, DryDensity: >= RuleWords.Least and <= RuleWords.Greatest } && Enum.IsDefined(test.Outcome))
            .WithErrorCode("out-of-range").WithMessage("A field test's water content, dry density and outcome must be possible.");
        RuleFor(chart => chart.Band).Must(band => band is null or { Count: <= MostCorners })
            .WithErrorCode("out-of-range").WithMessage($"A band must have up to {MostCorners} points.");
        RuleForEach(chart => chart.Models).Must(model => model is { Name.Length: <= LongestModelName, Curve.Count: <= MostCorners })
            .WithErrorCode("out-of-range").WithMessage($"A model must have a name and up to {MostCorners} points.");
        RuleFor(chart => chart.Models).Must(models => models is null or { Count: <= MostModels })
            .WithErrorCode("out-of-range").WithMessage($"There must be up to {MostModels} other models.");
        RuleFor(chart => chart.Zone).Must(zone => zone is null or { Corners.Count: <= MostCorners })
            .WithErrorCode("out-of-range").WithMessage($"A zone must have up to {MostCorners} corners.");
        RuleFor(chart => chart.SpecificGravity).Within(0.1, SpecificGravityRules.Greatest);
        RuleFor(chart => chart.WaterDensity).Within(500, 1500, " kg/m³");
        RuleFor(chart => chart.Saturation).Needed().LinesOfAKind(limits.LinesOfAKind);
        RuleForEach(chart => chart.Saturation).Saturation();
        RuleFor(chart => chart.AirVoids).Needed().LinesOfAKind(limits.LinesOfAKind);
        RuleForEach(chart => chart.AirVoids).AirVoids();
    }

    private const int MostCorners = 1000;
    private const int MostModels = 10;
    private const int LongestModelName = 40;
}
