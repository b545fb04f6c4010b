using System.Text;
using Drypeak.Figures.Drawing;

namespace Drypeak.Figures;

/// <summary>The embedded font, Source Sans 3 under the SIL Open Font License 1.1: the same letters in every picture, on every machine.</summary>
public static class EmbeddedFont
{
    /// <summary>Weight 400.</summary>
    public static FontFace Regular { get; } = Face(400, "Regular");

    /// <summary>Weight 600.</summary>
    public static FontFace SemiBold { get; } = Face(600, "SemiBold");

    /// <summary>The font's copyright notice and license.</summary>
    public static string License { get; } = Encoding.UTF8.GetString(Read("LICENSE.txt"));

    private static FontFace Face(int weight, string style) =>
        new(weight, Read($"SourceSans3-{style}.ttf")) { Cut = new FontFace(weight, Read($"Cut-{style}.ttf")) };

    private static byte[] Read(string name)
    {
        using var stream = typeof(EmbeddedFont).Assembly.GetManifestResourceStream(name)
            ?? throw new InvalidOperationException($"The resource {name} is missing.");
        var bytes = new byte[stream.Length];
        stream.ReadExactly(bytes);
        return bytes;
    }
}
