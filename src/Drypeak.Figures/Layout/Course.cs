using Drypeak.Figures.Drawing;

namespace Drypeak.Figures.Layout;

/// <summary>A run of places that can be walked by its length.</summary>
internal sealed class Course
{
    /// <summary>Places that lie off the line of their neighbors by less than this, px, are not worth writing.</summary>
    private const double Tolerance = 0.05;

    private readonly double[] _distances;

    public Course(IReadOnlyList<Place> places)
    {
        Places = places;
        _distances = new double[places.Count];
        for (var i = 1; i < places.Count; i++)
        {
            _distances[i] = _distances[i - 1] + places[i - 1].To(places[i]);
        }
    }

    public IReadOnlyList<Place> Places { get; }

    public double Length => _distances[^1];

    /// <summary>What lies within an area: a course for each time that the run comes into it.</summary>
    public static List<Course> Clipped(IReadOnlyList<Place> places, Area area)
    {
        var courses = new List<Course>();
        var run = new List<Place>();
        for (var i = 1; i < places.Count; i++)
        {
            if (area.Clip(places[i - 1], places[i]) is not { } inside || inside.From == inside.To)
            {
                continue;
            }

            if (run.Count > 0 && run[^1] != inside.From)
            {
                courses.Add(new Course(run));
                run = [];
            }

            if (run.Count == 0)
            {
                run.Add(inside.From);
            }

            run.Add(inside.To);
        }

        if (run.Count > 0)
        {
            courses.Add(new Course(run));
        }

        return courses;
    }

    public Place At(double distance)
    {
        var index = Math.Clamp(Next(distance), 1, Places.Count - 1);
        var step = _distances[index] - _distances[index - 1];
        return Places[index - 1].Toward(Places[index], step > 0 ? (distance - _distances[index - 1]) / step : 0);
    }

    /// <summary>The part between two distances, with no more places than show.</summary>
    public IReadOnlyList<Place> Part(double from, double to)
    {
        var part = new List<Place> { At(from) };
        for (var i = Next(from); i < Places.Count && _distances[i] < to; i++)
        {
            if (_distances[i] > from)
            {
                part.Add(Places[i]);
            }
        }

        part.Add(At(to));
        return Thinned(part);
    }

    /// <summary>The whole, with no more places than show.</summary>
    public IReadOnlyList<Place> Whole() => Thinned(Places);

    private int Next(double distance)
    {
        var found = Array.BinarySearch(_distances, distance);
        return found >= 0 ? found : ~found;
    }

    /// <summary>Keeps the place farthest off the straight line, and so on to both sides (Douglas and Peucker, Cartographica 10 (1973) 112–122).</summary>
    private static List<Place> Thinned(IReadOnlyList<Place> places)
    {
        var kept = new bool[places.Count];
        kept[0] = kept[^1] = true;
        var open = new Stack<(int From, int To)>([(0, places.Count - 1)]);
        while (open.TryPop(out var span))
        {
            var (farthest, distance) = (0, Tolerance);
            for (var i = span.From + 1; i < span.To; i++)
            {
                var off = Off(places[i], places[span.From], places[span.To]);
                if (off > distance)
                {
                    (farthest, distance) = (i, off);
                }
            }

            if (farthest > 0)
            {
                kept[farthest] = true;
                open.Push((span.From, farthest));
                open.Push((farthest, span.To));
            }
        }

        return [.. places.Where((_, i) => kept[i])];
    }

    private static double Off(Place place, Place from, Place to)
    {
        var length = from.To(to);
        return length == 0
            ? place.To(from)
            : Math.Abs(((to.X - from.X) * (place.Y - from.Y)) - ((to.Y - from.Y) * (place.X - from.X))) / length;
    }
}
