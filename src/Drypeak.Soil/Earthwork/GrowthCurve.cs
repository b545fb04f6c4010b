using MathNet.Numerics.RootFinding;

namespace Drypeak.Soil.Earthwork;

/// <summary>
/// Dry density against passes of the roller: ρ(N) = ρ∞ − Δ·e^(−N/c), an approach to what this roller can do on this lift. The form is
/// common practice, no source. Immutable, safe on any thread.
/// </summary>
/// <param name="Limit">ρ∞, kg/m³.</param>
/// <param name="Reserve">Δ, kg/m³: what would be gained from no pass on; over 0 where the density grows.</param>
/// <param name="Passes">c: passes in which the distance to the limit falls to 1/e; over 0.</param>
public sealed record GrowthCurve(double Limit, double Reserve, double Passes)
{
    /// <summary>c is sought from this share of the most passes tried, where all growth is over after the first readings…</summary>
    private const double QuickestShare = 0.05;

    /// <summary>…to this multiple, where growth is all but straight.</summary>
    private const double SlowestShare = 20;

    private const int Steps = 200;
    private const double RootAccuracy = 1e-14;

    /// <summary>Dry density after some passes, kg/m³.</summary>
    public double At(double passes) => Limit - (Reserve * Math.Exp(-passes / Passes));

    /// <summary>What one pass more gains, kg/m³.</summary>
    public double GainAfter(double passes) => Reserve * Math.Exp(-passes / Passes) * (1 - Math.Exp(-1 / Passes));

    /// <summary>The least number of passes, 1 or more, after which one more gains less than an amount.</summary>
    /// <param name="amount">kg/m³, over 0.</param>
    public double PassesUntilGainBelow(double amount)
    {
        var exact = Passes * Math.Log(Reserve * (1 - Math.Exp(-1 / Passes)) / amount);
        // The gain has to be below the amount: at a whole number where it equals it, one pass more is needed.
        var whole = exact > 0 ? Math.Floor(exact + (1e-9 * exact)) + 1 : 1;
        return double.IsFinite(exact) ? Math.Max(1, whole) : 1;
    }

    /// <summary>
    /// Least squares over readings. For each c the other two follow linearly (Golub and Pereyra 1973, variable projection); c is sought on a
    /// grid, and then where the gradient is 0, so that units and order of the readings do not show.
    /// </summary>
    /// <param name="readings">Passes and dry density, kg/m³, at three numbers of passes or more.</param>
    /// <returns>The curve; null where the density does not grow.</returns>
    public static GrowthCurve? Fit(IReadOnlyList<(double Passes, double DryDensity)> readings)
    {
        var most = readings.Max(reading => reading.Passes);
        double Scale(int step) => most * QuickestShare * Math.Pow(SlowestShare / QuickestShare, (double)step / Steps);
        var best = Enumerable.Range(0, Steps + 1).MinBy(step => Of(readings, Scale(step)).SquaresFrom(readings));
        var (low, high) = (Scale(Math.Max(0, best - 1)), Scale(Math.Min(Steps, best + 1)));
        var stationary = Brent.TryFindRoot(scale => Of(readings, scale).GradientOver(readings), low, high, RootAccuracy * most, 100, out var root);
        var curve = Of(readings, stationary ? root : Scale(best));
        return curve.Reserve > 0 ? curve : null;
    }

    private double SquaresFrom(IReadOnlyList<(double Passes, double DryDensity)> readings) =>
        readings.Sum(reading => (reading.DryDensity - At(reading.Passes)) is var off ? off * off : 0);

    /// <summary>Half of the derivative of the sum of squares by ln c, over Δ: the other two parameters are at their best, so that theirs are 0.</summary>
    private double GradientOver(IReadOnlyList<(double Passes, double DryDensity)> readings) =>
        readings.Sum(reading => (reading.DryDensity - At(reading.Passes)) * Math.Exp(-reading.Passes / Passes) * reading.Passes / Passes) * Math.Sign(Reserve);

    /// <summary>The best curve of one c: a straight line over e^(−N/c), about the means.</summary>
    private static GrowthCurve Of(IReadOnlyList<(double Passes, double DryDensity)> readings, double scale)
    {
        var (x, y) = (readings.Average(reading => Math.Exp(-reading.Passes / scale)), readings.Average(reading => reading.DryDensity));
        double xx = 0, xy = 0;
        foreach (var (passes, density) in readings)
        {
            var fromMean = Math.Exp(-passes / scale) - x;
            xx += fromMean * fromMean;
            xy += fromMean * (density - y);
        }

        var slope = xy / xx;
        return new GrowthCurve(y - (slope * x), -slope, scale);
    }
}
