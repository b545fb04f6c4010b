using Drypeak.Figures;
using Drypeak.Service.Contracts;
using Drypeak.Service.Hosting;
using FluentValidation;

namespace Drypeak.Service.Charts;

/// <summary>What a chart from an address must keep to be drawn: the address is the caller's, not ours.</summary>
internal sealed class ChartRules : AbstractValidator<CompactionChart>
{
    private static readonly ChartRules Rules = new();

    private ChartRules()
    {
        RuleFor(chart => chart.Reference).AtMost(Bounds.NameCharacters);
        RuleFor(chart => chart.Specimens).Must(list => list.Count is >= 1 and <= Bounds.Specimens)
            .WithErrorCode("out-of-range").WithMessage($"There must be 1 to {Bounds.Specimens} specimens.");
        RuleForEach(chart => chart.Specimens).Must(specimen => specimen is { WaterContent: >= 0 and <= RuleWords.Greatest, DryDensity: >= RuleWords.Least and <= RuleWords.Greatest })
            .WithErrorCode("out-of-range").WithMessage("A specimen's water content and dry density must be possible.");
        RuleFor(chart => chart.SpecificGravity).Within(0.1, SpecificGravityRules.Greatest);
        RuleFor(chart => chart.WaterDensity).Within(500, 1500);
        RuleFor(chart => chart.Saturation).Must(list => list.Count <= Bounds.LinesOfAKind)
            .WithErrorCode("too-many").WithMessage($"There may be up to {Bounds.LinesOfAKind} lines of a kind.");
        RuleForEach(chart => chart.Saturation).Must(value => value is > 0 and <= 100)
            .WithErrorCode("out-of-range").WithMessage("A degree of saturation lies over 0 and up to 100 %.");
        RuleFor(chart => chart.AirVoids).Must(list => list.Count <= Bounds.LinesOfAKind)
            .WithErrorCode("too-many").WithMessage($"There may be up to {Bounds.LinesOfAKind} lines of a kind.");
        RuleForEach(chart => chart.AirVoids).Must(value => value is >= 0 and < 100)
            .WithErrorCode("out-of-range").WithMessage("Air voids lie from 0 to below 100 %.");
    }

    /// <summary>Every broken rule.</summary>
    public static IReadOnlyList<Fault> Check(CompactionChart chart)
    {
        var faults = Rules.Validate(chart).ToFaults();
        return faults.Count == 0 && CompactionFigure.Refusal(chart, FigureSize.Default) is { } refusal ? [new Fault("", "not-drawable", refusal)] : faults;
    }
}
