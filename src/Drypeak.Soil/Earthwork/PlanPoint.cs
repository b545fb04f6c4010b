namespace Drypeak.Soil.Earthwork;

/// <summary>A point of the plan. Immutable, safe on any thread.</summary>
/// <param name="Station">Along the work, m.</param>
/// <param name="Offset">Across it, m.</param>
public readonly record struct PlanPoint(double Station, double Offset);

/// <summary>A closed outline on the plan.</summary>
/// <param name="Corners">Three or more, in order; the last joins the first.</param>
public sealed record Outline(IReadOnlyList<PlanPoint> Corners)
{
    /// <summary>A rectangle along the work.</summary>
    public static Outline Rectangle(double startStation, double length, double width) => new(
        [new(startStation, 0), new(startStation + length, 0), new(startStation + length, width), new(startStation, width)]);

    /// <summary>Its sides.</summary>
    internal IEnumerable<PlanEdge> Edges => Corners.Select((corner, i) => new PlanEdge(corner, Corners[(i + 1) % Corners.Count]));

    /// <summary>Whether two sides that are not neighbors cross or touch, or two that are lie on each other.</summary>
    public bool CrossesItself
    {
        get
        {
            var edges = Edges.ToList();
            return Enumerable.Range(0, edges.Count).Any(i => Enumerable.Range(i + 1, edges.Count - i - 1).Any(j =>
                j == i + 1 || (i == 0 && j == edges.Count - 1)
                    ? edges.Count > 2 && edges[i].FoldsBackOn(edges[j])
                    : edges[i].Meets(edges[j])));
        }
    }
}

/// <summary>A straight side of an outline.</summary>
internal readonly record struct PlanEdge(PlanPoint From, PlanPoint To)
{
    public bool IsAcross => From.Station == To.Station;

    public double OffsetAt(double station) =>
        From.Offset + ((To.Offset - From.Offset) * ((station - From.Station) / (To.Station - From.Station)));

    public bool Spans(double station) => station > Math.Min(From.Station, To.Station) && station < Math.Max(From.Station, To.Station);

    /// <summary>Whether the two have a point in common.</summary>
    public bool Meets(PlanEdge other)
    {
        var (a, b) = (Side(other.From), Side(other.To));
        var (c, d) = (other.Side(From), other.Side(To));
        return (a * b < 0 && c * d < 0)
            || (a == 0 && Holds(other.From)) || (b == 0 && Holds(other.To))
            || (c == 0 && other.Holds(From)) || (d == 0 && other.Holds(To));
    }

    /// <summary>Whether a neighbor, which shares a corner, runs back along this side.</summary>
    public bool FoldsBackOn(PlanEdge next)
    {
        var (along, back) = next.From == To ? ((next.To.Station - To.Station, next.To.Offset - To.Offset), (From.Station - To.Station, From.Offset - To.Offset))
            : ((next.From.Station - From.Station, next.From.Offset - From.Offset), (To.Station - From.Station, To.Offset - From.Offset));
        return (along.Item1 * back.Item2) - (along.Item2 * back.Item1) == 0 && (along.Item1 * back.Item1) + (along.Item2 * back.Item2) >= 0;
    }

    /// <summary>The station at which the two cross, or null.</summary>
    public double? CrossingWith(PlanEdge other)
    {
        var (a, b) = (Side(other.From), Side(other.To));
        var (c, d) = (other.Side(From), other.Side(To));
        return a * b <= 0 && c * d <= 0 && a != b
            ? other.From.Station + ((other.To.Station - other.From.Station) * (a / (a - b)))
            : null;
    }

    /// <summary>On which side of this one a point lies: the sign, and 0 on the line.</summary>
    private double Side(PlanPoint point) =>
        ((To.Station - From.Station) * (point.Offset - From.Offset)) - ((To.Offset - From.Offset) * (point.Station - From.Station));

    /// <summary>Whether a point of the line lies within the side.</summary>
    private bool Holds(PlanPoint point) =>
        point.Station >= Math.Min(From.Station, To.Station) && point.Station <= Math.Max(From.Station, To.Station)
        && point.Offset >= Math.Min(From.Offset, To.Offset) && point.Offset <= Math.Max(From.Offset, To.Offset);
}
