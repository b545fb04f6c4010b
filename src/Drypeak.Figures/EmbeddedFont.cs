using System.Text;
using Drypeak.Figures.Drawing;

namespace Drypeak.Figures;

/// <summary>The embedded font, Source Sans 3 under the SIL Open Font License 1.1: the same letters in every picture, on every machine.
/// It has Latin, Greek and Cyrillic; Arabic, Hebrew, Devanagari, Thai, kana and the usual Han characters come from cuts of Noto Sans under the
/// same license, in one weight; other letters are written as their codes in PNG and PDF, and stand as they are in SVG.</summary>
public static class EmbeddedFont
{
    /// <summary>Weight 400.</summary>
    public static FontFace Regular { get; } = Face(400, "Regular");

    /// <summary>Weight 600.</summary>
    public static FontFace SemiBold { get; } = Face(600, "SemiBold");

    /// <summary>Copyright notice and license of the font and of those for letters that it lacks.</summary>
    public static string License { get; } = Encoding.UTF8.GetString(Read("LICENSE.txt")) + "\n" + Encoding.UTF8.GetString(Read("LICENSE-Noto.txt"));

    private static FontFace Face(int weight, string style) =>
        new(weight, Read($"SourceSans3-{style}.ttf")) { Cut = new FontFace(weight, Read($"Cut-{style}.ttf")) };

    /// <summary>A file of the program's own.</summary>
    internal static byte[] Read(string name)
    {
        using var stream = typeof(EmbeddedFont).Assembly.GetManifestResourceStream(name)
            ?? throw new InvalidOperationException($"The resource {name} is missing.");
        var bytes = new byte[stream.Length];
        stream.ReadExactly(bytes);
        return bytes;
    }
}
