namespace Drypeak.Soil.Acceptance;

/// <summary>
/// A zone in the plane of water content and dry density (D. E. Daniel and C. H. Benson, Water content-density criteria for compacted soil
/// liners, J. Geotech. Eng. 116 (1990) 1811–1830), bounded by density, water content, lines of saturation or air voids, or the line of optimums.
/// </summary>
/// <param name="Edges">Each with the quantity that it bounds; inclusive.</param>
/// <param name="WetOfOptimums">Whether the line of optimums is an edge too: tests lie on it or wet of it.</param>
public sealed record CompactionWindow(IReadOnlyList<WindowEdge> Edges, bool WetOfOptimums)
{
    /// <summary>The name of the line of optimums as an edge.</summary>
    public const string LineOfOptimums = "wetOfLineOfOptimums";

    /// <summary>Each edge that a test crosses, and each that it cannot be held against.</summary>
    public (IReadOnlyList<string> Crossed, IReadOnlyList<string> Unknown) Locate(LotTest test)
    {
        List<string> crossed = [];
        List<string> unknown = [];
        foreach (var edge in Edges)
        {
            if (test.Values[edge.Limits.Quantity] is not { } value)
            {
                unknown.Add(edge.Name);
            }
            else if (edge.Limits.MarginOf(value) < -edge.Limits.Tolerance)
            {
                crossed.Add(edge.Name);
            }
        }

        if (WetOfOptimums && test.IsWetOfOptimums is not true)
        {
            (test.IsWetOfOptimums is null ? unknown : crossed).Add(LineOfOptimums);
        }

        return (crossed, unknown);
    }
}

/// <summary>An edge of a window.</summary>
/// <param name="Name">The window's member: <c>minimumSaturation</c>.</param>
/// <param name="Limits">The quantity and its limits.</param>
public sealed record WindowEdge(string Name, Requirement Limits);
