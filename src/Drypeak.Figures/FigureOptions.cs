namespace Drypeak.Figures;

/// <summary>How a chart is to be drawn, apart from what it shows. Immutable, safe on any thread.</summary>
public sealed record FigureOptions
{
    /// <summary>Width and height.</summary>
    public FigureSize Size { get; init; } = FigureSize.Default;

    /// <summary>Colors and dashes.</summary>
    public Theme Theme { get; init; } = Theme.Light;
}
