using System.Globalization;

namespace Drypeak.Soil.Curves;

/// <summary>How a leg bends far from the peak.</summary>
internal enum LegTail
{
    /// <summary>On and on as its shape says.</summary>
    Straight,
    /// <summary>Parallel to a line of saturation: flatter as the water content grows.</summary>
    AlongSaturation,
    /// <summary>Back up, as a dry sand that bulks.</summary>
    TurnsBack,
}

/// <summary>
/// The shape of one leg of a compaction curve seen from its peak, up to a random scale: the density lost at a distance d is
/// μ·b·(√(d² + s²) − s + κ·d)·f, with b = y0²/ρw, the slope of a saturation line at the highest density y0.
/// </summary>
/// <param name="Rounding">s, the water content over which the top is round; fraction.</param>
/// <param name="Steepness">μ, far slope in units of b.</param>
/// <param name="SlopeAtPeak">κ, slope at the peak itself in units of μ·b: a kink.</param>
/// <param name="Tail">f.</param>
internal readonly record struct LegShape(double Rounding, double Steepness, double SlopeAtPeak = 0, LegTail Tail = LegTail.Straight)
{
    /// <summary>Distance at which a dry leg has turned back, fraction.</summary>
    private const double TurningDistance = 0.03;

    /// <summary>Density lost at a distance from the peak, for the scale 1.</summary>
    /// <param name="distance">0 or more, fraction.</param>
    /// <param name="slope">b, Mg/m³.</param>
    /// <param name="density">c = y0/ρw.</param>
    public double Drop(double distance, double slope, double density)
    {
        var drop = Steepness * slope
            * (Math.Sqrt((distance * distance) + (Rounding * Rounding)) - Rounding + (SlopeAtPeak * distance));
        switch (Tail)
        {
            case LegTail.AlongSaturation:
                return drop / (1 + (density * distance));
            case LegTail.TurnsBack:
                var turns = distance / TurningDistance;
                var factor = 1 + (turns * turns);
                return drop / (factor * factor);
            default:
                return drop;
        }
    }
}

/// <summary>A dry and a wet leg that occur together.</summary>
/// <param name="Dry">Place among <see cref="LegShapes.Dry"/>.</param>
/// <param name="Wet">Place among <see cref="LegShapes.Wet"/>.</param>
/// <param name="Prior">How often, before the points speak.</param>
/// <param name="Name">As it stands among an answer's parameters.</param>
/// <param name="Words">What it looks like.</param>
internal sealed record LegPair(int Dry, int Wet, double Prior, string Name, string Words)
{
    /// <summary>The pair's share in the average, in words.</summary>
    public string Meaning { get; } = string.Create(
        CultureInfo.InvariantCulture, $"Share in the average of curves of this shape: {Words}; {100 * Prior:0.0} % before the points are seen.");
}

/// <summary>The shapes over which the averaged model averages.</summary>
internal static class LegShapes
{
    public static readonly LegShape[] Dry =
    [
        new(0.08, 1), new(0.08, 4), new(0.08, 8), new(0.08, 16), new(0.08, 5, 0.2), new(0.01, 0.9), new(0.08, 12, 0, LegTail.TurnsBack),
    ];

    public static readonly LegShape[] Wet =
    [
        new(0.07, 1.5, 0, LegTail.AlongSaturation), new(0.08, 4), new(0.08, 8), new(0.08, 16),
        new(0, 1, 0, LegTail.AlongSaturation), new(0.015, 1, 0, LegTail.AlongSaturation),
    ];

    public static readonly LegPair[] Pairs =
    [
        new(0, 0, 0.300, "shareBroad", "broad: two gently rounded legs"),
        new(1, 1, 0.150, "shareParabolic", "parabolic: two legs that bend as a parabola does"),
        new(2, 2, 0.080, "shareSteep", "steep: two parabolic legs, twice as steep"),
        new(3, 3, 0.015, "shareVerySteep", "very steep: two parabolic legs, four times as steep"),
        new(1, 4, 0.125, "shareKink", "kink: a parabolic dry leg, and from the peak on a wet leg parallel to the saturation line"),
        new(4, 4, 0.130, "shareKinkSloping", "kink with a sloping dry leg: the dry leg still rises where the wet leg begins"),
        new(5, 5, 0.150, "shareStraight", "two straight legs with a rounded top"),
        new(6, 5, 0.050, "shareTurningBack", "a dry leg that turns back up, as of a bulking sand, and a straight wet leg"),
    ];

    /// <summary>The dry leg of each pair.</summary>
    public static readonly LegShape[] DryOfPair = [.. Pairs.Select(pair => Dry[pair.Dry])];

    /// <summary>The wet leg of each pair.</summary>
    public static readonly LegShape[] WetOfPair = [.. Pairs.Select(pair => Wet[pair.Wet])];
}
