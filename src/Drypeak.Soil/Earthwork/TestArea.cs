namespace Drypeak.Soil.Earthwork;

/// <summary>
/// The plan of a lift: an outline less its exclusion zones, cut at every corner and crossing into slabs across the work. Within a slab the
/// open width changes linearly with the station, so that the area up to a station, and the station up to which an area lies, are known
/// exactly: a location is drawn without trial and error. Immutable, safe on any thread.
/// </summary>
public sealed class TestArea
{
    private readonly IReadOnlyList<Slab> _slabs;
    private readonly double[] _areaBefore;

    /// <summary>Cuts an area.</summary>
    /// <param name="outline">Where tests may lie; it does not cross itself.</param>
    /// <param name="exclusions">Where none may; they may overlap each other and reach beyond the outline.</param>
    public TestArea(Outline outline, IReadOnlyList<Outline> exclusions)
    {
        (Outline, Exclusions) = (outline, exclusions);
        _slabs = [.. SlabsOf(outline, exclusions)];
        _areaBefore = new double[_slabs.Count];
        foreach (var (i, slab) in _slabs.Index())
        {
            _areaBefore[i] = SquareMeters;
            SquareMeters += slab.Area;
        }
    }

    /// <summary>Where tests may lie.</summary>
    public Outline Outline { get; }

    /// <summary>Where none may.</summary>
    public IReadOnlyList<Outline> Exclusions { get; }

    /// <summary>Area that is open to tests, m²; 0 where the exclusions leave nothing.</summary>
    public double SquareMeters { get; }

    /// <summary>The point that has a share of the area before its station, and a share of the open width below its offset.</summary>
    /// <param name="areaShare">0 to 1.</param>
    /// <param name="widthShare">0 to 1.</param>
    public PlanPoint At(double areaShare, double widthShare)
    {
        var (slab, within) = Locate(areaShare);
        return new PlanPoint(slab.From + ((slab.To - slab.From) * within), slab.OffsetAt(within, widthShare));
    }

    /// <summary>The station that has a share of the area before it.</summary>
    public double StationAt(double areaShare)
    {
        var (slab, within) = Locate(areaShare);
        return slab.From + ((slab.To - slab.From) * within);
    }

    /// <summary>Whether a point lies in the outline and in no exclusion zone, its sides not counted.</summary>
    public bool IsOpen(PlanPoint point) => Holds(Outline, point) && !Exclusions.Any(zone => Holds(zone, point));

    private (Slab Slab, double Within) Locate(double areaShare)
    {
        var wanted = areaShare * SquareMeters;
        var found = Array.BinarySearch(_areaBefore, wanted);
        var index = Math.Clamp(found >= 0 ? found : ~found - 1, 0, _slabs.Count - 1);
        return (_slabs[index], _slabs[index].WithinAt(wanted - _areaBefore[index]));
    }

    private static IEnumerable<Slab> SlabsOf(Outline outline, IReadOnlyList<Outline> exclusions)
    {
        PlanEdge[] edges = [.. exclusions.Prepend(outline).SelectMany(each => each.Edges)];
        var slanted = edges.Where(edge => !edge.IsAcross).ToArray();
        var stations = edges.Select(edge => edge.From.Station)
            .Concat(slanted.SelectMany((one, i) => slanted.Skip(i + 1).Select(one.CrossingWith)).OfType<double>())
            .Distinct().Order().ToList();
        foreach (var (from, to) in stations.Zip(stations.Skip(1)))
        {
            var middle = from + ((to - from) / 2);
            var crossing = slanted.Where(edge => edge.Spans(middle)).OrderBy(edge => edge.OffsetAt(middle)).ToList();
            Strip[] strips =
            [
                .. crossing.Zip(crossing.Skip(1)).Where(pair => IsOpenBetween(pair.First, pair.Second, middle, outline, exclusions)).Select(pair => new Strip(
                    new Span(pair.First.OffsetAt(from), pair.Second.OffsetAt(from)), new Span(pair.First.OffsetAt(to), pair.Second.OffsetAt(to)))),
            ];
            if (strips.Length > 0 && new Slab(from, to, strips) is { Area: > 0 } slab)
            {
                yield return slab;
            }
        }
    }

    private static bool IsOpenBetween(PlanEdge lower, PlanEdge upper, double station, Outline outline, IReadOnlyList<Outline> exclusions)
    {
        var between = new PlanPoint(station, (lower.OffsetAt(station) + upper.OffsetAt(station)) / 2);
        return Holds(outline, between) && !exclusions.Any(zone => Holds(zone, between));
    }

    /// <summary>Whether a line from the point outward crosses the outline an odd number of times.</summary>
    private static bool Holds(Outline outline, PlanPoint point) => outline.Edges.Count(edge =>
        (edge.From.Station > point.Station) != (edge.To.Station > point.Station) && edge.OffsetAt(point.Station) > point.Offset) % 2 == 1;

    private readonly record struct Span(double Lower, double Upper)
    {
        public double Width => Math.Max(0, Upper - Lower);
    }

    /// <summary>An open strip of a slab, between two sides.</summary>
    private readonly record struct Strip(Span Start, Span End)
    {
        public Span At(double within) =>
            new(Start.Lower + ((End.Lower - Start.Lower) * within), Start.Upper + ((End.Upper - Start.Upper) * within));
    }

    private sealed record Slab(double From, double To, IReadOnlyList<Strip> Strips)
    {
        private double StartWidth => Strips.Sum(strip => strip.Start.Width);

        private double EndWidth => Strips.Sum(strip => strip.End.Width);

        public double Area => (To - From) * (StartWidth + EndWidth) / 2;

        /// <summary>Share of the slab's length that has an area before it: the root of w0·x + (w1 − w0)·x²/2 = a, in the form that does not cancel.</summary>
        public double WithinAt(double area)
        {
            var (start, change, wanted) = (StartWidth, EndWidth - StartWidth, Math.Max(0, area) / (To - From));
            var root = start + Math.Sqrt(Math.Max(0, (start * start) + (2 * change * wanted)));
            return root == 0 ? 0 : Math.Min(1, 2 * wanted / root);
        }

        /// <summary>The offset below which a share of the open width lies.</summary>
        public double OffsetAt(double within, double widthShare)
        {
            Span[] spans = [.. Strips.Select(strip => strip.At(within))];
            var left = widthShare * spans.Sum(span => span.Width);
            foreach (var span in spans.SkipLast(1))
            {
                if (left < span.Width)
                {
                    return span.Lower + left;
                }

                left -= span.Width;
            }

            return spans[^1].Lower + Math.Min(left, spans[^1].Width);
        }
    }
}
