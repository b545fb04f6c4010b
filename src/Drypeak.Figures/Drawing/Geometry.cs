namespace Drypeak.Figures.Drawing;

/// <summary>An upright rectangle, px.</summary>
internal readonly record struct Area(double Left, double Top, double Right, double Bottom)
{
    public double Width => Right - Left;

    public double Height => Bottom - Top;

    public bool Contains(Area other) => other.Left >= Left && other.Right <= Right && other.Top >= Top && other.Bottom <= Bottom;

    public bool Contains(Place place) => place.X >= Left && place.X <= Right && place.Y >= Top && place.Y <= Bottom;

    public bool Overlaps(Area other) => other.Left < Right && Left < other.Right && other.Top < Bottom && Top < other.Bottom;

    /// <summary>The area with every side moved outward by <paramref name="distance"/>, which may be below 0.</summary>
    public Area Grown(double distance) => new(Left - distance, Top - distance, Right + distance, Bottom + distance);

    /// <summary>The distance of a place from the area, 0 within it.</summary>
    public double DistanceOf(Place place) => place.To(new Place(Math.Clamp(place.X, Left, Right), Math.Clamp(place.Y, Top, Bottom)));

    /// <summary>
    /// The part of a segment that lies within, or null. Each side in turn cuts the parameter range of the segment
    /// (Liang and Barsky, A new concept and method for line clipping, ACM Trans. Graphics 3 (1984) 1–22).
    /// </summary>
    public (Place From, Place To)? Clip(Place from, Place to)
    {
        var (dx, dy) = (to.X - from.X, to.Y - from.Y);
        var (enters, leaves) = (0.0, 1.0);
        var within = Cut(-dx, from.X - Left) && Cut(dx, Right - from.X) && Cut(-dy, from.Y - Top) && Cut(dy, Bottom - from.Y);
        return within ? (from.Toward(to, enters), from.Toward(to, leaves)) : null;

        bool Cut(double outward, double room)
        {
            if (outward == 0)
            {
                return room >= 0;
            }

            var crossing = room / outward;
            if (outward < 0)
            {
                enters = Math.Max(enters, crossing);
            }
            else
            {
                leaves = Math.Min(leaves, crossing);
            }

            return enters <= leaves;
        }
    }

    /// <summary>
    /// The part of a closed area that lies within, as corners; fewer than three where nothing does. Each side in turn cuts the corners
    /// (Sutherland and Hodgman, Reentrant polygon clipping, Commun. ACM 17 (1974) 32–42).
    /// </summary>
    public IReadOnlyList<Place> Clip(IReadOnlyList<Place> corners)
    {
        var (left, top, right, bottom) = (Left, Top, Right, Bottom);
        IReadOnlyList<Place> within = corners;
        foreach (var room in (Func<Place, double>[])[place => place.X - left, place => right - place.X, place => place.Y - top, place => bottom - place.Y])
        {
            within = Cut(within, room);
        }

        return within;

        static List<Place> Cut(IReadOnlyList<Place> corners, Func<Place, double> room)
        {
            var kept = new List<Place>(corners.Count + 2);
            for (var i = 0; i < corners.Count; i++)
            {
                var (from, to) = (corners[i], corners[(i + 1) % corners.Count]);
                var (before, after) = (room(from), room(to));
                if (before >= 0)
                {
                    kept.Add(from);
                }

                if (before >= 0 != after >= 0)
                {
                    kept.Add(from.Toward(to, before / (before - after)));
                }
            }

            return kept;
        }
    }
}

/// <summary>A rectangle turned about a place.</summary>
/// <param name="Pivot">The place about which it is turned.</param>
/// <param name="Cosine">Of the angle, clockwise.</param>
/// <param name="Sine">Of the angle, clockwise.</param>
/// <param name="Local">The rectangle before it is turned, measured from the pivot.</param>
internal readonly record struct OrientedBox(Place Pivot, double Cosine, double Sine, Area Local)
{
    public static OrientedBox About(Place pivot, double degrees, Area local)
    {
        var (sine, cosine) = Math.SinCos(degrees * Math.PI / 180);
        return new OrientedBox(pivot, cosine, sine, local);
    }

    /// <summary>The upright rectangle about the box.</summary>
    public Area Bounds
    {
        get
        {
            var (a, b) = (Turned(Local.Left, Local.Top), Turned(Local.Right, Local.Top));
            var (c, d) = (Turned(Local.Right, Local.Bottom), Turned(Local.Left, Local.Bottom));
            return new Area(
                Math.Min(Math.Min(a.X, b.X), Math.Min(c.X, d.X)),
                Math.Min(Math.Min(a.Y, b.Y), Math.Min(c.Y, d.Y)),
                Math.Max(Math.Max(a.X, b.X), Math.Max(c.X, d.X)),
                Math.Max(Math.Max(a.Y, b.Y), Math.Max(c.Y, d.Y)));
        }
    }

    public bool Meets(Place from, Place to) => Local.Clip(ToLocal(from), ToLocal(to)) is not null;

    public bool MeetsDisc(Place center, double radius) => Local.DistanceOf(ToLocal(center)) < radius;

    public OrientedBox Grown(double distance) => this with { Local = Local.Grown(distance) };

    private Place Turned(double x, double y) => new(Pivot.X + (x * Cosine) - (y * Sine), Pivot.Y + (x * Sine) + (y * Cosine));

    private Place ToLocal(Place place)
    {
        var (x, y) = (place.X - Pivot.X, place.Y - Pivot.Y);
        return new Place((x * Cosine) + (y * Sine), (y * Cosine) - (x * Sine));
    }
}
