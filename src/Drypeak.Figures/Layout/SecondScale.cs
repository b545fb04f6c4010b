namespace Drypeak.Figures.Layout;

/// <summary>The axis of density once more, marked at round values of another unit.</summary>
/// <param name="Ratio">What 1 of the first unit is in the second.</param>
/// <param name="Ticks">In the second unit.</param>
internal sealed record SecondScale(double Ratio, Ticks Ticks)
{
    /// <summary>Over the same range.</summary>
    public static SecondScale Of(Interval density, double ratio, double mostTicks) =>
        new(ratio, Ticks.Within(new Interval(density.From * ratio, density.To * ratio), mostTicks));

    /// <summary>A value of the second unit in the first.</summary>
    public double InFirst(double value) => value / Ratio;
}
