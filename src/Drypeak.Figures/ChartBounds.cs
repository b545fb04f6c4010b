namespace Drypeak.Figures;

/// <summary>What a figure can be drawn for.</summary>
internal static class ChartBounds
{
    /// <summary>The first thing that is out of bounds, as a sentence, or null.</summary>
    public static string? Refusal(CompactionChart chart, FigureOptions options) =>
        Refusal(options.Size)
        ?? (options.Second == SecondAxis.VoidRatio && chart is not { SpecificGravity: { }, WaterDensity: { } } ? "An axis of void ratio needs the specific gravity, which the chart does not hold." : null)
        ?? Numbers(chart).Where(number => !(Math.Abs(number.Value) <= CompactionChart.LargestNumber))
            .Select(number => $"{number.What} must be a number between −1e9 and 1e9, not {number.Value}.").FirstOrDefault()
        ?? chart.Specimens.SelectMany(Bars).Where(half => half < 0).Select(half => $"Half of an interval must be 0 or more, not {half}.").FirstOrDefault()
        ?? (Intervals(chart).Any(interval => interval is not [_, _]) ? "An interval must have two ends." : null)
        ?? (chart.Zone is { Corners.Count: < 3 } ? "A zone must have three corners or more." : null)
        ?? (chart.FieldTests.Any(test => test.Outcome == MarkRole.Result) ? "A field test is measured, set aside, met, not met or undecided, not a result." : null)
        ?? (chart.SpecificGravity <= 0 ? $"The specific gravity must be over 0, not {chart.SpecificGravity}." : null)
        ?? (chart.WaterDensity <= 0 ? $"The density of water must be over 0, not {chart.WaterDensity}." : null)
        ?? chart.Saturation.Where(percent => percent is not (> 0 and <= 100)).Select(percent => $"A saturation must be over 0 and up to 100 %, not {percent}.").FirstOrDefault()
        ?? chart.AirVoids.Where(percent => percent is not (>= 0 and < 100)).Select(percent => $"Air voids must be from 0 to below 100 %, not {percent}.").FirstOrDefault();

    /// <summary>Why a size is not drawn, or null.</summary>
    public static string? Refusal(FigureSize size)
    {
        var (smallest, largest) = (FigureSize.Smallest, FigureSize.Largest);
        var fits = size.Width >= smallest && size.Width <= largest && size.Height >= smallest && size.Height <= largest;
        return fits ? null : $"Width and height must be from {smallest} to {largest} px, not {size.Width} and {size.Height}.";
    }

    private static IEnumerable<double[]> Intervals(CompactionChart chart) =>
        chart.Optima.SelectMany(optimum => new[] { optimum.WaterContentInterval, optimum.MaximumDryDensityInterval }).OfType<double[]>();

    private static IEnumerable<double> Bars(ChartSpecimen specimen) =>
        new[] { specimen.WaterContentPlusMinus, specimen.DryDensityPlusMinus }.OfType<double>();

    private static IEnumerable<(string What, double Value)> Numbers(CompactionChart chart)
    {
        var points = chart.Specimens.Select(specimen => ("A specimen's", specimen.Point))
            .Concat(chart.Curve.Select(point => ("The curve's", point)))
            .Concat((chart.Models ?? []).SelectMany(model => model.Curve).Select(point => ("A model's", point)))
            .Concat((chart.Band ?? []).SelectMany(point => (ChartPoint[])[new(point.WaterContent, point.Lower), new(point.WaterContent, point.Upper)]).Select(point => ("The band's", point)))
            .Concat(chart.Optima.Select(optimum => ("An optimum's", optimum.Point)))
            .Concat(chart.FieldTests.Select(test => ("A field test's", test.Point)))
            .Concat((chart.Zone?.Corners ?? []).Select(corner => ("The zone's", corner)));
        foreach (var (whose, point) in points)
        {
            yield return ($"{whose} water content", point.WaterContent);
            yield return ($"{whose} dry density", point.DryDensity);
        }

        foreach (var half in chart.Specimens.SelectMany(Bars))
        {
            yield return ("Half of a specimen's interval", half);
        }

        foreach (var end in Intervals(chart).SelectMany(interval => interval))
        {
            yield return ("An interval's end", end);
        }

        yield return ("The specific gravity", chart.SpecificGravity ?? 1);
        yield return ("The density of water", chart.WaterDensity ?? 1);
        yield return ("The next specimen's water content", chart.NextSpecimen ?? 0);
    }
}
