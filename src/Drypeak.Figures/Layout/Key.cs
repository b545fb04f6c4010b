using Drypeak.Figures.Drawing;
using Drypeak.Figures.Layout.Plots;

namespace Drypeak.Figures.Layout;

/// <summary>An entry of the key.</summary>
/// <param name="Text">What the sample is.</param>
/// <param name="Sample">The sample about its middle.</param>
/// <param name="SampleWidth">px.</param>
internal sealed record KeyEntry(string Text, Func<Place, IEnumerable<Shape>> Sample, double SampleWidth)
{
    private const double Length = 26;

    /// <summary>A piece of a line.</summary>
    public static KeyEntry Line(string text, Stroke stroke, TypeScale type)
    {
        var half = Length * type.Unit / 2;
        return new KeyEntry(PlainText.Clean(text), at => [new Lines([[at with { X = at.X - half }, at with { X = at.X + half }]], stroke) { Name = "key-line" }], 2 * half);
    }

    /// <summary>A piece of an area.</summary>
    public static KeyEntry Zone(string text, PlotAreaRole role, TypeScale type)
    {
        var (halfWidth, halfHeight) = (Length * type.Unit / 2, 0.35 * type.Label);
        return new KeyEntry(PlainText.Clean(text), at =>
        {
            var (left, right, top, bottom) = (at.X - halfWidth, at.X + halfWidth, at.Y - halfHeight, at.Y + halfHeight);
            return [PlotStyles.Of(role, [new(left, top), new(right, top), new(right, bottom), new(left, bottom)], type) with { Name = "key-area" }];
        }, 2 * halfWidth);
    }
}

/// <summary>What could not be written at its place in the plot, in rows under it; beside the title of the axis if one row is enough.</summary>
internal sealed class Key
{
    /// <summary>Most of the picture's height that the key may take.</summary>
    private const double MostHeight = 0.25;

    private readonly List<(KeyEntry Entry, Place At)> _placed = [];
    private readonly TypeScale _type;

    private Key(TypeScale type) => _type = type;

    /// <summary>px that the key takes under the titles of the axes.</summary>
    public double Height { get; private set; }

    /// <summary>The texts with their places.</summary>
    public IEnumerable<TextRun> Texts => _placed.Select(placed => new TextRun(
        placed.Entry.Text,
        placed.At with { X = placed.At.X + (placed.Entry.SampleWidth > 0 ? placed.Entry.SampleWidth + Gap(_type) : 0) },
        _type.Label,
        EmbeddedFont.Regular,
        ColorRole.Ink)
    {
        Name = "key-label",
    });

    public static Key Lay(IReadOnlyList<KeyEntry> entries, string axisTitle, FigureSize size, TypeScale type)
    {
        var key = new Key(type);
        var room = size.Width - (2 * type.Margin);
        var shortened = entries.Select(entry => entry with { Text = PlainText.Elide(entry.Text, EmbeddedFont.Regular, type.Label, room - entry.SampleWidth - Gap(type)) }).ToList();
        var width = shortened.Sum(entry => Width(entry, type));
        var besideTitle = room - EmbeddedFont.Regular.Measure(axisTitle, type.AxisTitle);
        if (width <= besideTitle)
        {
            key.Place(shortened, size.Height - Axes.XTitleDepth(type));
            return key;
        }

        var rows = Rows(shortened, room, (int)Math.Max(1, size.Height * MostHeight / LineHeight(type)), type);
        key.Height = rows.Count * LineHeight(type);
        for (var i = 0; i < rows.Count; i++)
        {
            key.Place(rows[i], size.Height - Axes.XTitleDepth(type) - ((rows.Count - 1 - i) * LineHeight(type)));
        }

        return key;
    }

    public FigurePart Draw() => new("key", [.. _placed.SelectMany(placed => placed.Entry.Sample(
        new Place(placed.At.X + (placed.Entry.SampleWidth / 2), placed.At.Y - (0.31 * _type.Label))))]);

    private void Place(IReadOnlyList<KeyEntry> row, double baseline)
    {
        var x = _type.Margin;
        foreach (var entry in row)
        {
            _placed.Add((entry, new Place(x, baseline)));
            x += Width(entry, _type);
        }
    }

    /// <summary>Where the rows are full, the last entry says how many more there are.</summary>
    private static List<List<KeyEntry>> Rows(List<KeyEntry> entries, double room, int most, TypeScale type)
    {
        var rows = new List<List<KeyEntry>> { new() };
        var used = 0.0;
        for (var i = 0; i < entries.Count; i++)
        {
            var more = new KeyEntry($"+ {entries.Count - i}", _ => [], 0);
            var reserve = rows.Count == most && i < entries.Count - 1 ? Width(more, type) : 0;
            var width = Width(entries[i], type);
            if (used > 0 && used + width - (2 * Gap(type)) + reserve > room)
            {
                if (rows.Count == most)
                {
                    rows[^1].Add(more);
                    return rows;
                }

                rows.Add([]);
                used = 0;
            }

            rows[^1].Add(entries[i]);
            used += width;
        }

        return rows;
    }

    private static double Gap(TypeScale type) => 0.45 * type.Label;

    private static double LineHeight(TypeScale type) => (EmbeddedFont.Regular.Ascent + EmbeddedFont.Regular.Descent + 0.15) * type.Label;

    /// <summary>With the space to the next entry.</summary>
    private static double Width(KeyEntry entry, TypeScale type) =>
        entry.SampleWidth + (entry.SampleWidth > 0 ? Gap(type) : 0) + EmbeddedFont.Regular.Measure(entry.Text, type.Label) + (3 * Gap(type));
}
