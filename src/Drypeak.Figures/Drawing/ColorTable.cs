namespace Drypeak.Figures.Drawing;

/// <summary>
/// The colors of a drawing in no more than 256 entries: paper, each other role exactly, and its mixtures with paper in even steps, as they
/// stand at the edges of shapes. A step is too small to be seen. For one picture, on one thread.
/// </summary>
internal sealed class ColorTable
{
    private const int Steps = 42;

    private readonly Dictionary<uint, byte> _nearest = [];

    private ColorTable(IReadOnlyList<Color> entries) => Entries = entries;

    public IReadOnlyList<Color> Entries { get; }

    public static ColorTable Of(Palette palette)
    {
        var inks = Enum.GetValues<ColorRole>().Where(role => role != ColorRole.Paper).Select(role => palette[role]);
        return new ColorTable([palette.Paper, .. inks.SelectMany(ink => Enumerable.Range(1, Steps).Select(step => Mixed(palette.Paper, ink, step)))]);
    }

    /// <summary>The entry nearest to a pixel.</summary>
    /// <param name="pixel">Red in the lowest byte, then green, then blue.</param>
    public byte NearestTo(uint pixel)
    {
        if (!_nearest.TryGetValue(pixel, out var nearest))
        {
            nearest = Search(new Color((byte)pixel, (byte)(pixel >> 8), (byte)(pixel >> 16)));
            _nearest.Add(pixel, nearest);
        }

        return nearest;
    }

    private byte Search(Color color)
    {
        var (nearest, least) = (0, int.MaxValue);
        for (var i = 0; i < Entries.Count && least > 0; i++)
        {
            var (red, green, blue) = (Entries[i].Red - color.Red, Entries[i].Green - color.Green, Entries[i].Blue - color.Blue);
            var distance = (red * red) + (green * green) + (blue * blue);
            if (distance < least)
            {
                (nearest, least) = (i, distance);
            }
        }

        return (byte)nearest;
    }

    private static Color Mixed(Color paper, Color ink, int step)
    {
        byte Channel(byte from, byte to) => (byte)Math.Round(from + ((to - from) * (double)step / Steps));
        return new Color(Channel(paper.Red, ink.Red), Channel(paper.Green, ink.Green), Channel(paper.Blue, ink.Blue));
    }
}
