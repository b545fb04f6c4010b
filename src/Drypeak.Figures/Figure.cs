using Drypeak.Figures.Drawing;

namespace Drypeak.Figures;

/// <summary>
/// A finished picture as a value: every shape has its place in px, every text its size, nothing is left to decide. The writers turn the
/// same figure into SVG, PNG and PDF. Immutable, safe on any thread.
/// </summary>
/// <param name="Size">Width and height, px.</param>
/// <param name="Title">The result in one line.</param>
/// <param name="Description">What the picture shows, in words, for who cannot see it.</param>
/// <param name="Palette">The colors of the roles.</param>
/// <param name="Parts">The parts, in drawing order.</param>
public sealed record Figure(FigureSize Size, string Title, string Description, Palette Palette, IReadOnlyList<FigurePart> Parts)
{
    /// <summary>Draws every part that has a shape, in order.</summary>
    internal void DrawOn(ICanvas canvas)
    {
        foreach (var part in Parts.Where(part => part.Shapes.Count > 0))
        {
            canvas.Begin(part.Name);
            foreach (var shape in part.Shapes)
            {
                shape.DrawOn(canvas);
            }

            canvas.End();
        }
    }
}

/// <summary>One part of a picture: the grid, the curve, the axes.</summary>
/// <param name="Name">Its name, which in SVG is its class: lower case, words joined by a hyphen.</param>
/// <param name="Shapes">Its shapes, in drawing order.</param>
public sealed record FigurePart(string Name, IReadOnlyList<Shape> Shapes);
