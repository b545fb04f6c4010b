namespace Drypeak.Figures.Layout;

/// <summary>Field tests among the specimens of their laboratory's curve: squares, filled or crossed by what each came to.</summary>
internal sealed class FieldTestMarks(CompactionChart chart, Wording wording, Plot plot, TypeScale type)
{
    /// <summary>Above this many their labels would say nothing.</summary>
    private const int MostLabeled = 40;

    private double WidestLabel => Math.Min(180 * type.Unit, plot.Area.Width / 2);

    public FigurePart Draw() => new("field-tests", [.. chart.FieldTests.SelectMany(test =>
        MarkShapes.Of(MarkShape.Square, test.Outcome, plot.At(test.Point), type, "field-test " + MarkShapes.Name(test.Outcome), test.Point.Data))]);

    public void Block(LabelSpace space)
    {
        foreach (var test in chart.FieldTests)
        {
            space.BlockMark(plot.At(test.Point), Reach(test));
        }
    }

    public void Label(LabelSpace space)
    {
        foreach (var test in chart.FieldTests.Count <= MostLabeled ? chart.FieldTests : chart.FieldTests.Where(test => test.Outcome == MarkRole.NotMet).Take(MostLabeled))
        {
            space.PlaceFullest(wording.FieldTest(test).Select(text => MarkLabels
                .Around(plot.At(test.Point), Reach(test), text, type.Label, MarkShapes.ColorOf(test.Outcome), WidestLabel)
                .Select(label => label with { Name = "field-test-label" })));
        }
    }

    private double Reach(ChartFieldTest test) => (test.Outcome == MarkRole.NotMet ? 1.6 : 1.1) * type.MarkRadius;
}
