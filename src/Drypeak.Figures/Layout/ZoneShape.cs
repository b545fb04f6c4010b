using Drypeak.Figures.Drawing;

namespace Drypeak.Figures.Layout;

/// <summary>A closed area within the plot, and the places in it where its name can stand.</summary>
internal sealed class ZoneShape(IReadOnlyList<Place> corners, Plot plot)
{
    private const int Steps = 8;

    /// <summary>Its corners, cut at the edge of the plot.</summary>
    public IReadOnlyList<Place> Corners { get; } = plot.Area.Clip(corners);

    /// <summary>Whether anything of it can be seen.</summary>
    public bool IsSeen => Corners.Count >= 3;

    /// <summary>From the top down and from the left, wholly within.</summary>
    public IEnumerable<TextRun> LabelsWithin(string text, double size, ColorRole color)
    {
        var bounds = new Area(Corners.Min(corner => corner.X), Corners.Min(corner => corner.Y), Corners.Max(corner => corner.X), Corners.Max(corner => corner.Y));
        var width = EmbeddedFont.Regular.Measure(text, size);
        var room = new Area(bounds.Left + (0.5 * size), bounds.Top + (1.2 * size), bounds.Right - width - (0.5 * size), bounds.Bottom - (0.6 * size));
        if (room.Width < 0 || room.Height < 0)
        {
            yield break;
        }

        for (var row = 0; row <= Steps; row++)
        {
            for (var column = 0; column <= Steps; column++)
            {
                var at = new Place(room.Left + (room.Width * column / Steps), room.Top + (room.Height * row / Steps));
                if (Contains(new Area(at.X, at.Y - (0.75 * size), at.X + width, at.Y + (0.22 * size)).Grown(0.2 * size)))
                {
                    yield return new TextRun(text, at, size, EmbeddedFont.Regular, color);
                }
            }
        }
    }

    private bool Contains(Area box)
    {
        Place[] ends = [new(box.Left, box.Top), new(box.Right, box.Top), new(box.Right, box.Bottom), new(box.Left, box.Bottom)];
        return Array.TrueForAll(ends, Contains)
            && !Enumerable.Range(0, Corners.Count).Any(i => box.Clip(Corners[i], Corners[(i + 1) % Corners.Count]) is not null);
    }

    /// <summary>By the edges that a ray to the right crosses: an odd number of them.</summary>
    private bool Contains(Place place)
    {
        var within = false;
        for (var i = 0; i < Corners.Count; i++)
        {
            var (a, b) = (Corners[i], Corners[(i + 1) % Corners.Count]);
            if (a.Y > place.Y != b.Y > place.Y && place.X < a.X + ((place.Y - a.Y) / (b.Y - a.Y) * (b.X - a.X)))
            {
                within = !within;
            }
        }

        return within;
    }
}
