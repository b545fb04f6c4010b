using Drypeak.Figures;
using Drypeak.Service.Contracts;
using Drypeak.Service.Hosting;
using FluentValidation;

namespace Drypeak.Service.Charts;

/// <summary>What a chart from an address must keep to be drawn: the address is the caller's, not ours.</summary>
internal sealed class ChartRules : AbstractValidator<CompactionChart>
{
    public ChartRules(Limits limits)
    {
        RuleFor(chart => chart.Reference).AtMost(limits.NameCharacters);
        RuleFor(chart => chart.DensityUnit).IsInEnum().WithErrorCode("unknown-unit").WithMessage("There is no such unit of density.");
        RuleFor(chart => chart.Curve).Needed();
        RuleFor(chart => chart.Specimens).Must(list => list.Count >= 1 && list.Count <= limits.Specimens)
            .WithErrorCode("out-of-range").WithMessage($"There must be 1 to {limits.Specimens} specimens.");
        RuleForEach(chart => chart.Specimens).Must(specimen => specimen is { WaterContent: >= 0 and <= RuleWords.Greatest, DryDensity: >= RuleWords.Least and <= RuleWords.Greatest })
            .WithErrorCode("out-of-range").WithMessage("A specimen's water content and dry density must be possible.");
        RuleFor(chart => chart.SpecificGravity).Within(0.1, SpecificGravityRules.Greatest);
        RuleFor(chart => chart.WaterDensity).Within(500, 1500, " kg/m³");
        RuleFor(chart => chart.Saturation).Needed().LinesOfAKind(limits.LinesOfAKind);
        RuleForEach(chart => chart.Saturation).Saturation();
        RuleFor(chart => chart.AirVoids).Needed().LinesOfAKind(limits.LinesOfAKind);
        RuleForEach(chart => chart.AirVoids).AirVoids();
    }

    /// <summary>Every broken rule, at the place of the address; what only the figure knows is asked last.</summary>
    public IReadOnlyList<Fault> Check(CompactionChart chart)
    {
        var faults = Validate(chart).ToFaults();
        return faults.Count > 0 ? [.. faults.Select(fault => fault with { Place = "/d", Message = $"At {fault.Place} of the chart: {fault.Message}" })]
            : CompactionFigure.Refusal(chart, FigureSize.Default) is { } refusal ? [new Fault("/d", "not-drawable", refusal)]
            : [];
    }
}
