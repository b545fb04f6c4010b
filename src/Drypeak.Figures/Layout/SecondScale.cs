namespace Drypeak.Figures.Layout;

/// <summary>The axis upward once more, marked at round values of another quantity.</summary>
/// <param name="ToFirst">A value of the second axis on the first.</param>
/// <param name="Ticks">On the second axis.</param>
internal sealed record SecondScale(Func<double, double> ToFirst, Ticks Ticks)
{
    /// <summary>Over the same range.</summary>
    public static SecondScale Of(Interval range, SecondAxisWords axis, double mostTicks)
    {
        var (one, other) = (axis.FromFirst(range.From), axis.FromFirst(range.To));
        return new SecondScale(axis.ToFirst, Ticks.Within(Interval.Of(one).With(other), mostTicks));
    }
}
