using Drypeak.Figures;
using Drypeak.Service.Contracts;
using Drypeak.Service.Hosting;
using FluentValidation;

namespace Drypeak.Service.Charts;

/// <summary>What a plot from an address must keep, besides what its figure asks: texts of bounded length, known kinds, no holes.</summary>
internal sealed class PlotChartRules : AbstractValidator<PlotChart>
{
    /// <summary>A title or a line under it says one thing.</summary>
    private const int LongestLine = 400;

    private const int LongestDescription = 4000;

    public PlotChartRules(Limits limits)
    {
        var longestName = limits.NameCharacters;
        RuleFor(chart => chart.Title).AtMost(LongestLine);
        RuleFor(chart => chart.Subtitle).AtMost(LongestLine);
        RuleFor(chart => chart.Description).AtMost(LongestDescription);
        RuleFor(chart => chart.Reference).AtMost(longestName);
        RuleFor(chart => chart.X).Must(axis => IsWhole(axis, longestName)).WithErrorCode("out-of-range").WithMessage(NotWhole);
        RuleFor(chart => chart.Y).Must(axis => IsWhole(axis, longestName)).WithErrorCode("out-of-range").WithMessage(NotWhole);
        RuleForEach(chart => chart.Lines).Must(line => line is { Points: { } } && Enum.IsDefined(line.Role) && Enum.IsDefined(line.Dash) && Enum.IsDefined(line.LabelAt) && Fits(line.Label))
            .WithErrorCode("out-of-range").WithMessage(NotWhole);
        RuleForEach(chart => chart.Areas).Must(area => area is { Corners: { } } && Enum.IsDefined(area.Role) && Fits(area.Label))
            .WithErrorCode("out-of-range").WithMessage(NotWhole);
        RuleForEach(chart => chart.Limits).Must(limit => limit is { } && Enum.IsDefined(limit.Role) && Fits(limit.Label))
            .WithErrorCode("out-of-range").WithMessage(NotWhole);
        RuleForEach(chart => chart.Marks).Must(mark => mark is { } && Enum.IsDefined(mark.Role) && Enum.IsDefined(mark.Shape) && Fits(mark.Label))
            .WithErrorCode("out-of-range").WithMessage(NotWhole);

        bool Fits(string? label) => label is null || label.Length <= longestName;
    }

    private const string NotWhole = "It must be whole, of a known kind, with names of bounded length.";

    private static bool IsWhole(PlotAxis? axis, int longestName) =>
        axis is { Title: { } title } && title.Length <= longestName
        && (axis.Positions is not { } positions || positions.All(position => position is { Name: { } name } && name.Length <= longestName));
}
