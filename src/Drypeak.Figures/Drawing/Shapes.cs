namespace Drypeak.Figures.Drawing;

/// <summary>A place in the picture, px from the left and from the top.</summary>
/// <param name="X">px to the right.</param>
/// <param name="Y">px downward.</param>
public readonly record struct Place(double X, double Y)
{
    /// <summary>The place at a fraction of the way to <paramref name="other"/>.</summary>
    internal Place Toward(Place other, double fraction) => new(X + ((other.X - X) * fraction), Y + ((other.Y - Y) * fraction));

    /// <summary>The place so far to the right and downward.</summary>
    internal Place Moved(double x, double y) => new(X + x, Y + y);

    /// <summary>The distance to another place, px.</summary>
    internal double To(Place other) => Math.Sqrt(((other.X - X) * (other.X - X)) + ((other.Y - Y) * (other.Y - Y)));
}

/// <summary>Two numbers of the data, in the units of the axes.</summary>
/// <param name="X">Along the axis to the right.</param>
/// <param name="Y">Along the axis upward.</param>
public readonly record struct DataPoint(double X, double Y);

/// <summary>How a line is drawn.</summary>
/// <param name="Color">Role of its color.</param>
/// <param name="Width">px.</param>
/// <param name="Dash">Lengths of dash and gap in turn, px; empty for a whole line.</param>
public sealed record Stroke(ColorRole Color, double Width, IReadOnlyList<double> Dash)
{
    /// <summary>A whole line.</summary>
    public Stroke(ColorRole color, double width) : this(color, width, []) { }
}

/// <summary>Where a text stands against its place.</summary>
public enum TextAnchor
{
    /// <summary>It begins there.</summary>
    Start,
    /// <summary>It has its middle there.</summary>
    Middle,
    /// <summary>It ends there.</summary>
    End,
}

/// <summary>A shape with its place and its looks: one of lines, a disc, an area, a text.</summary>
public abstract record Shape
{
    /// <summary>Class of this shape within its part, in SVG; null for none.</summary>
    public string? Name { get; init; }

    /// <summary>The numbers that the shape stands for, or null.</summary>
    public DataPoint? Data { get; init; }

    /// <summary>Draws the shape by the canvas's primitive for it.</summary>
    internal abstract void DrawOn(ICanvas canvas);

    /// <summary>The same shape elsewhere.</summary>
    /// <param name="x">px to the right.</param>
    /// <param name="y">px downward.</param>
    internal abstract Shape Moved(double x, double y);
}

/// <summary>Lines that are drawn alike: each run is a sequence of places joined in turn.</summary>
/// <param name="Runs">The runs, each of two places or more.</param>
/// <param name="Stroke">How they are drawn.</param>
public sealed record Lines(IReadOnlyList<IReadOnlyList<Place>> Runs, Stroke Stroke) : Shape
{
    internal override void DrawOn(ICanvas canvas) => canvas.Draw(this);

    internal override Shape Moved(double x, double y) => this with { Runs = [.. Runs.Select(run => (IReadOnlyList<Place>)[.. run.Select(place => place.Moved(x, y))])] };
}

/// <summary>A disc, or a ring where it has no fill.</summary>
/// <param name="Center">Its center.</param>
/// <param name="Radius">px, to the middle of the stroke.</param>
/// <param name="Fill">Role of its fill; null for none.</param>
/// <param name="Stroke">Its edge; null for none.</param>
public sealed record Disc(Place Center, double Radius, ColorRole? Fill, Stroke? Stroke) : Shape
{
    internal override void DrawOn(ICanvas canvas) => canvas.Draw(this);

    internal override Shape Moved(double x, double y) => this with { Center = Center.Moved(x, y) };
}

/// <summary>A closed area.</summary>
/// <param name="Corners">Its corners in turn, three or more.</param>
/// <param name="Fill">Role of its fill; null for none.</param>
/// <param name="Opacity">Of the fill: over 0, up to 1.</param>
/// <param name="Edge">Its edge; null for none.</param>
public sealed record Polygon(IReadOnlyList<Place> Corners, ColorRole? Fill, double Opacity, Stroke? Edge) : Shape
{
    internal override void DrawOn(ICanvas canvas) => canvas.Draw(this);

    internal override Shape Moved(double x, double y) => this with { Corners = [.. Corners.Select(corner => corner.Moved(x, y))] };
}

/// <summary>A line of text in the embedded font.</summary>
/// <param name="Text">The text, already clean (<see cref="PlainText"/>).</param>
/// <param name="At">Where its baseline is anchored.</param>
/// <param name="Size">px.</param>
/// <param name="Face">Its face.</param>
/// <param name="Color">Role of its color.</param>
/// <param name="Anchor">Where it stands against <paramref name="At"/>.</param>
/// <param name="Angle">Degrees, clockwise about <paramref name="At"/>.</param>
public sealed record TextRun(string Text, Place At, double Size, FontFace Face, ColorRole Color, TextAnchor Anchor = TextAnchor.Start, double Angle = 0) : Shape
{
    private const double InkAscent = 0.75;
    private const double InkDescent = 0.22;

    /// <summary>Whether the letters have an edge of paper about them, which hides the lines behind.</summary>
    public bool Halo { get; init; }

    /// <summary>An address that the text leads to, in a format that has such; null: none.</summary>
    public string? Link { get; init; }

    /// <summary>Width of the halo's stroke, half of which shows, px.</summary>
    internal double HaloWidth => Size * 0.3;

    /// <summary>Width of the text, px.</summary>
    public double Width { get; } = Face.Measure(Text, Size);

    /// <summary>What the line of text takes up, from the font's ascent to its descent: two texts must not share it.</summary>
    internal OrientedBox LineBox => Box(Face.Ascent * Size, Face.Descent * Size);

    /// <summary>What the letters themselves cover: no mark and no line should come into it.</summary>
    internal OrientedBox InkBox => Box(InkAscent * Size, InkDescent * Size);

    internal override void DrawOn(ICanvas canvas) => canvas.Draw(this);

    internal override Shape Moved(double x, double y) => this with { At = At.Moved(x, y) };

    private OrientedBox Box(double ascent, double descent)
    {
        var left = Anchor switch { TextAnchor.Start => 0, TextAnchor.Middle => -Width / 2, _ => -Width };
        return OrientedBox.About(At, Angle, new Area(left, -ascent, left + Width, descent));
    }
}
