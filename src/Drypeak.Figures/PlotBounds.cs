namespace Drypeak.Figures;

/// <summary>What a plot can be drawn for.</summary>
internal static class PlotBounds
{
    /// <summary>The first thing that is out of bounds, as a sentence, or null.</summary>
    public static string? Refusal(PlotChart chart, FigureOptions options) =>
        ChartBounds.Refusal(options.Size)
        ?? (string.IsNullOrWhiteSpace(chart.Title) ? "The title must not be blank." : null)
        ?? (string.IsNullOrWhiteSpace(chart.Description) ? "The description must not be blank." : null)
        ?? TooMany("marks", chart.Marks.Count, PlotChart.MostMarks)
        ?? TooMany("lines", chart.Lines.Count, PlotChart.MostOfAKind)
        ?? TooMany("areas", chart.Areas.Count, PlotChart.MostOfAKind)
        ?? TooMany("limits", chart.Limits.Count, PlotChart.MostOfAKind)
        ?? TooMany("named positions of an axis", Math.Max(chart.X.Positions?.Count ?? 0, chart.Y.Positions?.Count ?? 0), PlotChart.MostMarks)
        ?? TooMany("points of lines and areas", chart.Lines.Sum(line => line.Points.Count) + chart.Areas.Sum(area => area.Corners.Count), PlotChart.MostPoints)
        ?? (chart.Lines.Any(line => line.Points.Count < 2) ? "A line must have two points or more." : null)
        ?? (chart.Areas.Any(area => area.Corners.Count < 3) ? "An area must have three corners or more." : null)
        ?? Numbers(chart).Where(number => !(Math.Abs(number.Value) <= CompactionChart.LargestNumber))
            .Select(number => $"{number.What} must be a number between −1e9 and 1e9, not {number.Value}.").FirstOrDefault()
        ?? Backward("to the right", chart.X)
        ?? Backward("upward", chart.Y);

    private static string? TooMany(string what, int count, int most) => count > most ? $"There may be up to {most} {what}, not {count}." : null;

    private static string? Backward(string which, PlotAxis axis) =>
        axis is { From: { } from, To: { } to } && to <= from ? $"The axis {which} must end after it begins, not at {to} after {from}." : null;

    private static IEnumerable<(string What, double Value)> Numbers(PlotChart chart)
    {
        foreach (var axis in (PlotAxis[])[chart.X, chart.Y])
        {
            yield return ("The end of an axis", axis.From ?? 0);
            yield return ("The end of an axis", axis.To ?? 0);
            foreach (var position in axis.Positions ?? [])
            {
                yield return ("A named position", position.At);
            }
        }

        foreach (var mark in chart.Marks)
        {
            yield return ("A mark's place", mark.X);
            yield return ("A mark's place", mark.Y);
        }

        foreach (var limit in chart.Limits)
        {
            yield return ("A limit", limit.Value);
        }

        foreach (var point in chart.Lines.SelectMany(line => line.Points))
        {
            yield return ("A line's point", point.X);
            yield return ("A line's point", point.Y);
        }

        foreach (var corner in chart.Areas.SelectMany(area => area.Corners))
        {
            yield return ("An area's corner", corner.X);
            yield return ("An area's corner", corner.Y);
        }
    }
}
