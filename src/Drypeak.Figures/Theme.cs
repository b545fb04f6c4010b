using Drypeak.Figures.Drawing;

namespace Drypeak.Figures;

/// <summary>
/// How a figure is dressed for where it is looked at: its colors, and what carries the difference where colors do not. In every theme text
/// stands out by 4.5:1 and lines by 3:1 (WCAG 2.2, 1.4.3 and 1.4.11), and no two kinds of lines are alike to any eye or in grey.
/// </summary>
public sealed record Theme
{
    private Theme(string name, Palette palette) => (Name, Palette) = (name, palette);

    /// <summary>Ink on paper: for pages and files.</summary>
    public static Theme Light { get; } = new("light", Palette.Light);

    /// <summary>The same on a dark ground: for screens at night.</summary>
    public static Theme Dark { get; } = new("dark", Palette.Dark);

    /// <summary>Pure black on white, lines told apart by dash and mark: for printers, photocopies and facsimiles.</summary>
    public static Theme Print { get; } = new("print", Palette.BlackOnWhite)
    {
        GridWidth = 0.2,
        ReferenceDash = [16, 3, 3, 3],
        LeaderDash = [3, 2],
    };

    /// <summary>All themes, the usual one first.</summary>
    public static IReadOnlyList<Theme> All { get; } = [Light, Dark, Print];

    /// <summary>Its name in an address: one word in lower case.</summary>
    public string Name { get; }

    /// <summary>The colors of the roles.</summary>
    public Palette Palette { get; }

    /// <summary>Width of the lines that lead from the ticks through the plot, px: finer where they are as dark as all else.</summary>
    internal double GridWidth { get; private init; } = 0.6;

    /// <summary>Dash and gap in turn of the zero-air-voids line and of curves to compare with, at the default size; empty where their color keeps them from the result.</summary>
    internal IReadOnlyList<double> ReferenceDash { get; private init; } = [];

    /// <summary>Dash and gap in turn of the lines that lead from the optimum to its values, at the default size.</summary>
    internal IReadOnlyList<double> LeaderDash { get; private init; } = [];
}
