using Drypeak.Soil.Laboratory.Workings;
using Drypeak.Soil.Quantities;

namespace Drypeak.Soil.Earthwork;

/// <summary>Readings of a trial strip after so many passes.</summary>
/// <param name="Passes">Of the roller, over each place.</param>
/// <param name="DryDensities">One or more.</param>
/// <param name="WaterContent">At which they were taken; null where it was not said.</param>
public sealed record StripStage(int Passes, IReadOnlyList<Density> DryDensities, WaterContent? WaterContent = null)
{
    /// <summary>Their mean.</summary>
    public Density Mean => new(DryDensities.Average(density => density.KilogramsPerCubicMeter));

    /// <summary>Their sample standard deviation; null for one reading.</summary>
    public Density? StandardDeviation => Spread.Of([.. DryDensities.Select(density => density.KilogramsPerCubicMeter)]) is { } s ? new Density(s) : null;
}

/// <summary>The density that a strip says can be reached.</summary>
/// <param name="DryDensity">Mean of the readings from the passes needed on; of the last stage where none lies beyond.</param>
/// <param name="Readings">How many.</param>
/// <param name="StandardDeviation">Their sample standard deviation; null for one reading.</param>
public sealed record StripTarget(Density DryDensity, int Readings, Density? StandardDeviation);

/// <summary>A trial strip: dry density against passes, the passes that are worth making, and the density that they reach.</summary>
/// <param name="Stages">By passes, each number once.</param>
/// <param name="LeastGain">A pass that gains less is not worth making.</param>
public sealed record TestStrip(IReadOnlyList<StripStage> Stages, Density LeastGain)
{
    /// <summary>Numbers of passes that a growth curve needs.</summary>
    public const int LeastStages = 3;

    /// <summary>Readings after which a mean says something: common practice, no source.</summary>
    private const int LeastReadings = 3;

    private const double Arithmetic = 1e-9;

    /// <summary>The stages up to the first fall of density: what comes after is no growth, and is neither fitted nor counted to the target.</summary>
    public IReadOnlyList<StripStage> Growing { get; } = GrowingOf(Stages, LeastGain);

    /// <summary>The growth curve over <see cref="Growing"/>; null with fewer than three numbers of passes, or where density does not grow.</summary>
    public GrowthCurve? Curve { get; } = CurveOf(GrowingOf(Stages, LeastGain));

    /// <summary>Passes after which one more gains less than <see cref="LeastGain"/>; null without a curve, or beyond the passes over which density grew.</summary>
    public int? PassesNeeded => Curve?.PassesUntilGainBelow(LeastGain.KilogramsPerCubicMeter) is { } passes && passes <= Growing[^1].Passes ? (int)passes : null;

    /// <summary>The strip's target density; null where the passes needed are not known.</summary>
    public StripTarget? Target
    {
        get
        {
            if (PassesNeeded is not { } needed)
            {
                return null;
            }

            double[] reached = [.. Growing.Where(stage => stage.Passes >= needed).SelectMany(stage => stage.DryDensities).Select(density => density.KilogramsPerCubicMeter)];
            return new StripTarget(new Density(reached.Average()), reached.Length, Spread.Of(reached) is { } s ? new Density(s) : null);
        }
    }

    /// <summary>Root mean square distance of the readings from the curve, kg/m³.</summary>
    public double? RootMeanSquareError => Curve is { } curve
        ? Math.Sqrt(Growing.SelectMany(stage => stage.DryDensities.Select(density => density.KilogramsPerCubicMeter - curve.At(stage.Passes))).Average(off => off * off))
        : null;

    /// <summary>What a careful reviewer says.</summary>
    /// <param name="placeOf">JSON pointer to a stage, by its passes.</param>
    /// <param name="units">The units that texts speak.</param>
    public IEnumerable<Finding> Review(Func<int, string> placeOf, EarthworkUnits units)
    {
        foreach (var finding in Stages.SelectMany(stage => stage.DryDensities.SelectMany(density => PlausibilityReview.DryDensity(density, placeOf(stage.Passes), units)).Take(1)))
        {
            yield return finding;
        }

        if (Stages.Count < LeastStages)
        {
            yield return EarthworkFindingKinds.TooFewPasses.At("/readings",
                $"Readings stand at {Stages.Count} number{(Stages.Count == 1 ? "" : "s")} of passes; a growth curve needs {LeastStages}. Roll on and test after each two passes.");
        }

        foreach (var stage in Stages.Where(stage => stage.DryDensities.Count < LeastReadings))
        {
            yield return EarthworkFindingKinds.TooFewReadings.At(placeOf(stage.Passes),
                $"After {stage.Passes} passes there {(stage.DryDensities.Count == 1 ? "is 1 reading" : $"are {stage.DryDensities.Count} readings")}; {LeastReadings} or more make a mean that can be trusted. Test at more places of the strip.");
        }

        foreach (var (before, after) in Stages.Zip(Stages.Skip(1)).Where(pair => Falls(pair.First, pair.Second, LeastGain)))
        {
            yield return EarthworkFindingKinds.DensityFalls.At(placeOf(after.Passes),
                $"From {before.Passes} to {after.Passes} passes the mean falls from {ReaderText.Of(before.Mean, units.Density)} to {ReaderText.Of(after.Mean, units.Density)}. The roller loosens what it has packed, the lift is too wet or drying, or the places differ: what was read from there on is left out of the curve. Stop before, check the water content, and repeat.");
        }

        if (Stages.Count >= LeastStages && Curve is null)
        {
            yield return EarthworkFindingKinds.NoGrowth.At("/readings",
                $"The density does not grow over {LeastStages} numbers of passes, so that no number can be read from the strip. Check that the readings belong to their passes; make another strip, and test it at fewer passes too.");
        }
        else if (Curve is { } curve && PassesNeeded is null)
        {
            yield return EarthworkFindingKinds.StillGaining.At("/readings",
                $"After {Growing[^1].Passes} passes one more would still gain {ReaderText.Of(new Density(curve.GainAfter(Growing[^1].Passes)), units.Density)}, not less than {ReaderText.Of(LeastGain, units.Density)}. Roll on, and test again.");
        }
    }

    /// <summary>The working, in the caller's units: the means, and the fit that no line of arithmetic gives.</summary>
    public IReadOnlyList<WorkingStep> Working(EarthworkUnits units)
    {
        var sheet = new EarthworkSheet(units);
        foreach (var stage in Stages)
        {
            var terms = string.Join(" + ", stage.DryDensities.Select(density => EarthworkSheet.Text(density.In(units.Density))));
            sheet.Density(EarthworkFormulas.MeanOfReadings, $"mean after {stage.Passes} passes", $"({terms})/{stage.DryDensities.Count}", stage.Mean);
        }

        if (Curve is { } curve)
        {
            foreach (var (name, value, unit) in new[]
            {
                ("limit of the growth curve", new Density(curve.Limit).In(units.Density), units.Density.Symbol()),
                ("reserve of the growth curve", new Density(curve.Reserve).In(units.Density), units.Density.Symbol()),
                ("passes of the growth curve", curve.Passes, "passes"),
            })
            {
                sheet.Step(EarthworkFormulas.Growth, name, null, value, unit);
            }
        }

        return sheet.Steps;
    }

    private static StripStage[] GrowingOf(IReadOnlyList<StripStage> stages, Density leastGain) =>
        [.. stages.TakeWhile((stage, i) => i == 0 || !Falls(stages[i - 1], stage, leastGain))];

    private static GrowthCurve? CurveOf(StripStage[] growing) => growing.Length < LeastStages ? null : GrowthCurve.Fit(
        [.. growing.SelectMany(stage => stage.DryDensities.Select(density => ((double)stage.Passes, density.KilogramsPerCubicMeter)))]);

    /// <summary>Lower by more than what the spread of both means explains (two standard errors), and by more than the gain that counts.</summary>
    private static bool Falls(StripStage before, StripStage after, Density leastGain)
    {
        double Variance(StripStage stage) => stage.StandardDeviation is { KilogramsPerCubicMeter: var s } ? s * s / stage.DryDensities.Count : 0;
        var fall = before.Mean.KilogramsPerCubicMeter - after.Mean.KilogramsPerCubicMeter;
        return fall > Math.Max(leastGain.KilogramsPerCubicMeter, 2 * Math.Sqrt(Variance(before) + Variance(after))) * (1 + Arithmetic);
    }
}

/// <summary>The sample standard deviation.</summary>
internal static class Spread
{
    /// <summary>With n − 1; null for fewer than two numbers.</summary>
    public static double? Of(IReadOnlyList<double> numbers)
    {
        if (numbers.Count < 2)
        {
            return null;
        }

        var mean = numbers.Average();
        return Math.Sqrt(numbers.Sum(number => (number - mean) * (number - mean)) / (numbers.Count - 1));
    }
}
