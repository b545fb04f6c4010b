using Drypeak.Figures.Drawing;

namespace Drypeak.Figures.Layout;

/// <summary>What a label must keep clear of, besides other labels.</summary>
[Flags]
internal enum Barriers
{
    None = 0,
    Marks = 1,
    Curve = 2,
    Leaders = 4,
    PhaseLines = 8,
    Axes = 16,
    All = Marks | Curve | Leaders | PhaseLines | Axes,
}

/// <summary>
/// The room that is left for labels. Labels are placed in the order of their importance, each at the first of its candidate places that is
/// free; a label without a free place is left out. No two texts ever share room, and none leaves the picture.
/// </summary>
/// <param name="picture">The picture, less a narrow edge.</param>
internal sealed class LabelSpace(Area picture)
{
    /// <summary>Between two texts, px: readers of SVG round the height of a line up.</summary>
    private const double LineGap = 1;

    private readonly List<TextRun> _placed = [];
    private readonly List<Area> _taken = [];
    private readonly List<(Barriers Kind, Place From, Place To, Area Around, object? Owner)> _segments = [];
    private readonly MarksByCell _marks = new();

    /// <summary>The labels placed so far.</summary>
    public IReadOnlyList<TextRun> Placed => _placed;

    /// <summary>Keeps labels off a run of places.</summary>
    public void Block(Barriers kind, IReadOnlyList<Place> run, object? owner = null)
    {
        for (var i = 1; i < run.Count; i++)
        {
            _segments.Add((kind, run[i - 1], run[i], Around(run[i - 1], run[i]), owner));
        }
    }

    /// <summary>Keeps labels off a mark.</summary>
    public void BlockMark(Place center, double radius) => _marks.Add(center, radius);

    /// <summary>Places the first of the candidates that is free.</summary>
    /// <param name="candidates">The label at its possible places, the best first.</param>
    /// <param name="barriers">What it must keep clear of.</param>
    /// <param name="owner">The owner of segments that it may touch: a line's label stands on its own line.</param>
    /// <returns>The label as placed, or null where no candidate is free.</returns>
    public TextRun? Place(IEnumerable<TextRun> candidates, Barriers barriers, object? owner = null)
    {
        foreach (var candidate in candidates)
        {
            if (candidate.Text.Length > 0 && IsFree(candidate, barriers, owner))
            {
                _placed.Add(candidate);
                _taken.Add(candidate.LineBox.Grown(LineGap).Bounds);
                return candidate;
            }
        }

        return null;
    }

    /// <summary>Places texts that have one place each, over whatever is drawn there; one whose place another text has is left out.</summary>
    public void PlaceEach(IEnumerable<TextRun> texts)
    {
        foreach (var text in texts)
        {
            Place([text], Barriers.None);
        }
    }

    /// <summary>Places a label that matters: rather in full with a quiet line behind its halo than shortened, and rather shortened than not at all.</summary>
    /// <param name="wordings">The candidate places of each wording, the fullest wording first.</param>
    public void PlaceFullest(IEnumerable<IEnumerable<TextRun>> wordings)
    {
        _ = wordings.Any(candidates =>
        {
            var places = candidates.ToList();
            return (Place(places, Barriers.All) ?? Place(places, Barriers.All & ~Barriers.PhaseLines)) is not null;
        });
    }

    private bool IsFree(TextRun text, Barriers barriers, object? owner)
    {
        var bounds = text.LineBox.Bounds;
        if (!picture.Contains(bounds) || _taken.Exists(bounds.Overlaps))
        {
            return false;
        }

        var letters = text.InkBox.Grown(2);
        var near = letters.Bounds;
        return !_segments.Exists(segment => (segment.Kind & barriers) != 0
                && (owner is null || !ReferenceEquals(segment.Owner, owner))
                && near.Overlaps(segment.Around)
                && letters.Meets(segment.From, segment.To))
            && !(barriers.HasFlag(Barriers.Marks) && _marks.Meet(letters));
    }

    private static Area Around(Place from, Place to) =>
        new Area(Math.Min(from.X, to.X), Math.Min(from.Y, to.Y), Math.Max(from.X, to.X), Math.Max(from.Y, to.Y)).Grown(0.01);
}
