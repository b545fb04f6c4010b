namespace Drypeak.Figures.Drawing;

/// <summary>What a color is used for.</summary>
public enum ColorRole
{
    /// <summary>The ground.</summary>
    Paper,
    /// <summary>Text, axes, measured points.</summary>
    Ink,
    /// <summary>Secondary labels, lines of saturation and air voids.</summary>
    Quiet,
    /// <summary>Hairlines.</summary>
    Rule,
    /// <summary>The fitted curve.</summary>
    Water,
    /// <summary>The result; what is not met.</summary>
    Clay,
    /// <summary>What is met, what is accepted.</summary>
    Moss,
}

/// <summary>A color of the sRGB space.</summary>
/// <param name="Red">0 to 255.</param>
/// <param name="Green">0 to 255.</param>
/// <param name="Blue">0 to 255.</param>
public readonly record struct Color(byte Red, byte Green, byte Blue)
{
    /// <summary>As SVG writes it: <c>#1F1D1A</c>.</summary>
    public string Hex => $"#{Red:X2}{Green:X2}{Blue:X2}";

    /// <summary>Relative luminance, 0 to 1 (WCAG 2.2, definition of relative luminance).</summary>
    public double Luminance => (0.2126 * Linear(Red)) + (0.7152 * Linear(Green)) + (0.0722 * Linear(Blue));

    /// <summary>Contrast ratio of two colors, 1 to 21 (WCAG 2.2, definition of contrast ratio).</summary>
    public static double Contrast(Color one, Color other)
    {
        var (lighter, darker) = (Math.Max(one.Luminance, other.Luminance), Math.Min(one.Luminance, other.Luminance));
        return (lighter + 0.05) / (darker + 0.05);
    }

    private static double Linear(byte channel)
    {
        var value = channel / 255.0;
        return value <= 0.04045 ? value / 12.92 : Math.Pow((value + 0.055) / 1.055, 2.4);
    }
}

/// <summary>The colors of the roles. Immutable, safe on any thread.</summary>
public sealed record Palette(Color Paper, Color Ink, Color Quiet, Color Rule, Color Water, Color Clay, Color Moss)
{
    /// <summary>Ink on paper, one color for water, one for clay, one for moss.</summary>
    public static Palette Light { get; } = new(
        Paper: new(0xFC, 0xFB, 0xF8),
        Ink: new(0x1F, 0x1D, 0x1A),
        Quiet: new(0x5A, 0x55, 0x4C),
        Rule: new(0xCF, 0xC8, 0xBA),
        Water: new(0x0B, 0x5B, 0x73),
        Clay: new(0xA3, 0x43, 0x1B),
        Moss: new(0x2E, 0x63, 0x36));

    /// <summary>The same roles on a dark ground.</summary>
    public static Palette Dark { get; } = new(
        Paper: new(0x16, 0x15, 0x13),
        Ink: new(0xF1, 0xED, 0xE5),
        Quiet: new(0xB4, 0xAC, 0x9E),
        Rule: new(0x47, 0x42, 0x3A),
        Water: new(0x6C, 0xC3, 0xDC),
        Clay: new(0xF0, 0x94, 0x6A),
        Moss: new(0x86, 0xC9, 0x8F));

    /// <summary>Every role black, the ground white.</summary>
    public static Palette BlackOnWhite { get; } = new(Paper: new(255, 255, 255), Ink: Black, Quiet: Black, Rule: Black, Water: Black, Clay: Black, Moss: Black);

    private static Color Black => new(0, 0, 0);

    /// <summary>The color of a role.</summary>
    public Color this[ColorRole role] => role switch
    {
        ColorRole.Paper => Paper,
        ColorRole.Ink => Ink,
        ColorRole.Quiet => Quiet,
        ColorRole.Rule => Rule,
        ColorRole.Water => Water,
        ColorRole.Clay => Clay,
        ColorRole.Moss => Moss,
        _ => throw new ArgumentOutOfRangeException(nameof(role)),
    };
}
