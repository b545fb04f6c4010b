using Drypeak.Figures.Drawing;

namespace Drypeak.Figures.Layout;

/// <summary>How marks are drawn: the outline says what was marked, its filling what it came to.</summary>
internal static class MarkShapes
{
    private const double EdgeWidth = 1.25;
    private const double CrossWidth = 1.75;

    /// <summary>Half the side of a square that looks as large as a disc of radius 1.</summary>
    private const double SquareSide = 0.9;

    private const double DiamondReach = 1.3;

    /// <summary>The shapes of a mark; the first carries its numbers.</summary>
    /// <param name="outline">Its outline.</param>
    /// <param name="role">What it came to.</param>
    /// <param name="at">Its middle.</param>
    /// <param name="type">Sizes.</param>
    /// <param name="name">Its class in SVG.</param>
    /// <param name="data">Its numbers.</param>
    public static IEnumerable<Shape> Of(MarkShape outline, MarkRole role, Place at, TypeScale type, string name, DataPoint? data)
    {
        var (color, full) = (ColorOf(role), role is MarkRole.Measured or MarkRole.Met);
        var edge = new Stroke(color, EdgeWidth * type.Unit);
        var shape = role == MarkRole.Result
            ? Cross(at, 5.5 * type.Unit, new Stroke(color, CrossWidth * type.Unit))
            : Outline(outline, at, type.MarkRadius, full ? color : null, edge);
        yield return shape with { Name = name, Data = data };
        if (role == MarkRole.NotMet)
        {
            yield return Cross(at, 1.45 * type.MarkRadius, edge) with { Name = "crossed" };
        }
        else if (role == MarkRole.Undecided)
        {
            yield return new Disc(at, 0.3 * type.MarkRadius, color, null) { Name = "dotted" };
        }
    }

    /// <summary>What a role's name is in an SVG class: lower case, words joined by a hyphen.</summary>
    public static string Name(MarkRole role) => role switch
    {
        MarkRole.Measured => "measured",
        MarkRole.SetAside => "set-aside",
        MarkRole.Result => "result",
        MarkRole.Met => "met",
        MarkRole.NotMet => "not-met",
        MarkRole.Undecided => "undecided",
        _ => throw new ArgumentOutOfRangeException(nameof(role)),
    };

    /// <summary>The color of a mark and of its label.</summary>
    public static ColorRole ColorOf(MarkRole role) => role switch
    {
        MarkRole.Result or MarkRole.NotMet => ColorRole.Clay,
        MarkRole.Met => ColorRole.Moss,
        MarkRole.Undecided => ColorRole.Quiet,
        _ => ColorRole.Ink,
    };

    private static Shape Outline(MarkShape outline, Place at, double radius, ColorRole? fill, Stroke edge)
    {
        // A hollow mark looks as large as a full one where its outer edge is the same.
        var reach = fill is null ? radius - (edge.Width / 2) : radius;
        return outline switch
        {
            MarkShape.Disc => new Disc(at, reach, fill, fill is null ? edge : null),
            MarkShape.Square => Shaped([(-SquareSide, -SquareSide), (SquareSide, -SquareSide), (SquareSide, SquareSide), (-SquareSide, SquareSide)]),
            MarkShape.Diamond => Shaped([(0, -DiamondReach), (DiamondReach, 0), (0, DiamondReach), (-DiamondReach, 0)]),
            MarkShape.Triangle => Shaped([(0, -1.3), (1.2, 0.8), (-1.2, 0.8)]),
            _ => throw new ArgumentOutOfRangeException(nameof(outline)),
        };

        Polygon Shaped((double X, double Y)[] corners) =>
            new([.. corners.Select(corner => new Place(at.X + (corner.X * reach), at.Y + (corner.Y * reach)))], fill, 1, fill is null ? edge : null);
    }

    private static Lines Cross(Place at, double arm, Stroke stroke) =>
        new([[new(at.X - arm, at.Y - arm), new(at.X + arm, at.Y + arm)], [new(at.X - arm, at.Y + arm), new(at.X + arm, at.Y - arm)]], stroke);
}
