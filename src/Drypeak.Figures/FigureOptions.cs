namespace Drypeak.Figures;

/// <summary>How a chart is to be drawn, apart from what it shows. Immutable, safe on any thread.</summary>
public sealed record FigureOptions
{
    /// <summary>Most characters of a title of one's own.</summary>
    public const int LongestTitle = 200;

    /// <summary>Width and height.</summary>
    public FigureSize Size { get; init; } = FigureSize.Default;

    /// <summary>Colors and dashes.</summary>
    public Theme Theme { get; init; } = Theme.Light;

    /// <summary>Words and decimal mark.</summary>
    public Language Language { get; init; } = Language.English;

    /// <summary>A title in place of the result, which then stands under it; null or blank: the result is the title.</summary>
    public string? Title { get; init; }

    /// <summary>Whether the figure says its result itself; false where it stands under a text that does, as in a report.</summary>
    public bool SaysResult { get; init; } = true;

    /// <summary>What a second axis at the right shows, or null where there is none.</summary>
    public SecondAxis? Second { get; init; }

    /// <summary>Names of the other models whose curves are drawn, of those that the chart carries.</summary>
    public IReadOnlyList<string> Models { get; init; } = [];

    /// <summary>Which kinds of the chart's lines are drawn.</summary>
    public IReadOnlyList<PhaseLineKind> Lines { get; init; } = PhaseLineKindNames.All;
}
