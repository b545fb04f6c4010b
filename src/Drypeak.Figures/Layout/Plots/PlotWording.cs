using Drypeak.Figures.Drawing;

namespace Drypeak.Figures.Layout.Plots;

/// <summary>The texts of a plot, fit to be drawn.</summary>
internal sealed class PlotWording(PlotChart chart, FigureOptions options)
{
    private readonly string? _ownTitle = PlainText.Clean(options.Title ?? "") is { Length: > 0 } own ? own : null;
    private readonly string _result = PlainText.Clean(chart.Title);

    public string Title => _ownTitle ?? _result;

    public string Description => PlainText.Clean(chart.Description);

    public AxisWords Axes => new(PlainText.Clean(chart.X.Title), PlainText.Clean(chart.Y.Title));

    public HeadingWords Heading => !options.SaysResult ? new("", null, [[PlainText.Clean(chart.Subtitle ?? "")]]) : new(
        Title,
        Halves(Title),
        [[_ownTitle is null ? "" : _result, PlainText.Clean(chart.Reference ?? "")], [PlainText.Clean(chart.Subtitle ?? "")]]);

    /// <summary>Two lines of about the same length.</summary>
    private static (string First, string Second)? Halves(string title)
    {
        var breaks = Enumerable.Range(0, title.Length).Where(i => title[i] == ' ').ToList();
        if (breaks.Count == 0)
        {
            return null;
        }

        var middle = breaks.MinBy(at => Math.Abs(at - (title.Length / 2)));
        return (title[..middle].TrimEnd(), title[middle..].TrimStart());
    }
}
