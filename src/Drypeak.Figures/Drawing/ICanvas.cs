namespace Drypeak.Figures.Drawing;

/// <summary>The drawing primitives: all that a format must know to be written. Coordinates are in px, colors are roles.</summary>
internal interface ICanvas
{
    /// <summary>A part of the picture begins.</summary>
    void Begin(string part);

    /// <summary>The part that began last is complete.</summary>
    void End();

    /// <summary>Draws lines, with butt ends and round joins.</summary>
    void Draw(Lines lines);

    /// <summary>Draws a disc or a ring.</summary>
    void Draw(Disc disc);

    /// <summary>Draws a closed area.</summary>
    void Draw(Polygon polygon);

    /// <summary>Draws a line of text.</summary>
    void Draw(TextRun text);
}
