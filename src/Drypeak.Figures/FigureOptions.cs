using Drypeak.Soil.Quantities;

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

    /// <summary>A unit for a second axis of density at the right, or null.</summary>
    public DensityUnit? SecondUnit { get; init; }

    /// <summary>Which kinds of the chart's lines are drawn.</summary>
    public IReadOnlyList<PhaseLineKind> Lines { get; init; } = PhaseLineKindNames.All;
}
