using Drypeak.Figures.Drawing;

namespace Drypeak.Figures.Layout.Plots;

/// <summary>The marks of a plot with their names.</summary>
internal sealed class PlotMarks(PlotChart chart, Plot plot, TypeScale type)
{
    /// <summary>Above this many names would say nothing: then only those that matter are written, and of these no more.</summary>
    private const int MostLabeled = 60;

    /// <summary>What is looked for stands last, over the others.</summary>
    private static readonly MarkRole[] DrawingOrder =
        [MarkRole.SetAside, MarkRole.Measured, MarkRole.Met, MarkRole.Undecided, MarkRole.NotMet, MarkRole.Result];

    private double WidestLabel => Math.Min(220 * type.Unit, plot.Area.Width / 2);

    public FigurePart Draw() => new("marks", [.. chart.Marks
        .OrderBy(mark => Array.IndexOf(DrawingOrder, mark.Role))
        .SelectMany(mark => MarkShapes.Of(mark.Shape, mark.Role, At(mark), type, "mark " + MarkShapes.Name(mark.Role), new DataPoint(mark.X, mark.Y)))]);

    public void Block(LabelSpace space)
    {
        foreach (var mark in chart.Marks)
        {
            space.BlockMark(At(mark), Reach(mark));
        }
    }

    public void LabelResults(LabelSpace space)
    {
        foreach (var mark in chart.Marks.Where(mark => mark.Role == MarkRole.Result).Take(MostLabeled))
        {
            space.PlaceFullest([Candidates(mark)]);
        }
    }

    public void LabelOthers(LabelSpace space)
    {
        var others = chart.Marks.Where(mark => mark.Role != MarkRole.Result && mark.Label is { Length: > 0 }).ToList();
        var written = others.Count <= MostLabeled ? others : others.Where(mark => mark.Role is MarkRole.NotMet or MarkRole.Undecided);
        foreach (var mark in written.OrderByDescending(mark => Array.IndexOf(DrawingOrder, mark.Role)).Take(MostLabeled))
        {
            space.Place(Candidates(mark), Barriers.All);
        }
    }

    private Place At(PlotMark mark) => plot.At(new DataPoint(mark.X, mark.Y));

    private double Reach(PlotMark mark) => mark.Role is MarkRole.Result or MarkRole.NotMet ? 7 * type.Unit : type.MarkRadius;

    private IEnumerable<TextRun> Candidates(PlotMark mark)
    {
        var color = mark.Role switch { MarkRole.Result or MarkRole.NotMet => ColorRole.Clay, _ => ColorRole.Quiet };
        return MarkLabels.Around(At(mark), Reach(mark), PlainText.Clean(mark.Label ?? ""), type.Label, color, WidestLabel).Select(label => label with { Name = "mark-label" });
    }
}
