using Drypeak.Figures.Drawing;

namespace Drypeak.Figures.Layout;

/// <summary>The ranges of the two axes.</summary>
/// <param name="X">To the right.</param>
/// <param name="Y">Upward.</param>
internal sealed record View(Interval X, Interval Y)
{
    /// <summary>Named places of the axis to the right; null where it is marked at round numbers.</summary>
    public NamedTicks? XNames { get; init; }

    /// <summary>Named places of the axis upward; null where it is marked at round numbers.</summary>
    public NamedTicks? YNames { get; init; }

    /// <summary>Whether 1 is as long on the one axis as on the other, as on a map.</summary>
    public bool SameScale { get; init; }

    /// <summary>With the range widened about its middle that is too short for the shape of the area.</summary>
    public View Shaped(Area area)
    {
        var perPixel = Math.Max(X.Span / area.Width, Y.Span / area.Height);
        return this with { X = X.AtLeast(perPixel * area.Width), Y = Y.AtLeast(perPixel * area.Height) };
    }
}
