using Drypeak.Soil.Acceptance.LotRules;
using Drypeak.Soil.FieldDensity.Review;
using Drypeak.Soil.Laboratory.Review;
using Drypeak.Soil.Phases;
using Drypeak.Soil.Quantities;

namespace Drypeak.Soil.Acceptance;

/// <summary>The review of a lot, as a careful colleague would do it before it is signed.</summary>
internal static class LotReview
{
    private const double HighCompaction = 1.05;
    private const double Arithmetic = 1e-9;

    private static readonly (Doubt Doubt, FindingKind Kind, string Advice)[] Doubts =
    [
        (Doubt.ValueUnknown, FieldFindingKinds.ValueMissing, "Give it, or what it follows from."),
        (Doubt.UncertaintyUnknown, FieldFindingKinds.UncertaintyMissing, "Give the standard uncertainties, or decide by the simple rule."),
        (Doubt.WithinGuardBand, FieldFindingKinds.WithinGuardBand, "Make another test on the same lift, or measure more surely."),
    ];

    public static IEnumerable<Finding> Of(Lot lot, LotResult result, LotSample sample) =>
    [
        .. Counting(lot, result),
        .. Rules(result),
        .. OneTest(result),
        .. Chart(result, sample),
        .. Window(result),
        .. result.Trends.Where(trend => trend.Trend.IsPlain && trend.Trend.Slope != 0).Select(trend => Changing(trend, lot.Units)),
        .. Possible(result.Counted),
    ];

    private static IEnumerable<Finding> Counting(Lot lot, LotResult result)
    {
        if (result.Counted.Count == 0)
        {
            yield return LotFindingKinds.NoTestCounts.At("/tests", "Every test is set aside or replaced. Make tests, or look at the reasons again.");
        }

        List<string> setAside = [.. lot.Tests.Where(test => test.SetAside is { }).Select(test => test.Label)];
        if (setAside.Count > 0)
        {
            yield return LotFindingKinds.TestsSetAside.At("/tests", $"{Labels.Listed(setAside, "test")} {Are(setAside)} set aside and {(setAside.Count == 1 ? "does" : "do")} not count. See that the {(setAside.Count == 1 ? "reason holds" : "reasons hold")} whatever the result was.");
        }

        if (result.ReplacedBy.Count > 0)
        {
            List<string> replaced = [.. result.ReplacedBy.Keys];
            yield return LotFindingKinds.TestsReplaced.At("/tests", $"{Labels.Listed(replaced, "test")} {Are(replaced)} replaced by {(replaced.Count == 1 ? "a retest, which counts" : "retests, which count")}. See that the lift was reworked first, or the first test was faulty.");
        }
    }

    private static IEnumerable<Finding> Rules(LotResult result)
    {
        for (var i = 0; i < result.Rules.Count; i++)
        {
            var judged = result.Rules[i];
            var place = $"/lotRules/{i}";
            if (judged.TooFew)
            {
                yield return LotFindingKinds.TooFewTests.At(place, judged.Explanation);
            }

            if (judged.Missing.Count > 0)
            {
                yield return LotFindingKinds.QuantityMissing.At(place, judged.TooFew ? $"{Labels.Listed(judged.Missing, "test")} {(judged.Missing.Count == 1 ? "has" : "have")} no value for this rule. Give it, or what it follows from." : judged.Explanation);
            }

            if (judged.NoSpread)
            {
                yield return LotFindingKinds.NoSpread.At(place, judged.Explanation + " Compare with the field sheets: was a result copied?");
            }
        }
    }

    /// <summary>The requirements of single tests that could not be judged.</summary>
    private static IEnumerable<Finding> OneTest(LotResult result)
    {
        foreach (var (doubt, kind, advice) in Doubts)
        {
            List<(string Label, AcceptedQuantity Quantity)> found =
                [.. result.Counted.SelectMany(test => test.Judgements.Where(judged => judged.Doubt == doubt).Select(judged => (test.Label, judged.Requirement.Quantity)))];
            if (found.Count > 0)
            {
                List<string> labels = [.. found.Select(test => test.Label).Distinct()];
                yield return kind.At("/tests", $"{Labels.Listed(labels, "test")} {Are(labels)} undecided in {string.Join(", ", found.Select(test => test.Quantity.Words()).Distinct())}. {advice}");
            }
        }
    }

    private static IEnumerable<Finding> Chart(LotResult result, LotSample sample)
    {
        if (result.ControlChart is not { } chart)
        {
            yield break;
        }

        var quantity = chart.Plan.Quantity.Words();
        if (chart.Lower is null)
        {
            yield return LotFindingKinds.TooFewTests.At("/controlChart", $"A control chart needs two tests or more with {quantity}; there {(chart.Points.Count == 1 ? "is 1" : $"are {chart.Points.Count}")}. Make more tests, or give the standard deviation.");
        }

        if (sample.Of(chart.Plan.Quantity).Missing is { Count: > 0 } missing)
        {
            yield return LotFindingKinds.QuantityMissing.At("/controlChart", $"{Labels.Listed(missing, "test")} {(missing.Count == 1 ? "has" : "have")} no {quantity} and {Are(missing)} not on the chart. Give it, or what it follows from.");
        }

        List<string> signals = [.. chart.Points.Where(point => point.Signal is { }).Select(point => point.Test.Label)];
        if (signals.Count > 0)
        {
            yield return LotFindingKinds.OutOfControl.At("/controlChart", $"{Labels.Listed(signals, "test")} {(signals.Count == 1 ? "signals" : "signal")}: {chart.Points.First(point => point.Signal is { }).Signal} Look for what changed there before the next lift.");
        }
    }

    private static IEnumerable<Finding> Window(LotResult result)
    {
        if (result.Window is not { } window)
        {
            yield break;
        }

        if (window.Polygon is { Count: 0 })
        {
            yield return LotFindingKinds.WindowEmpty.At("/window", "The edges leave no room for any soil. Compare them with the laboratory's values and with each other.");
        }
        else if (window.Polygon is null)
        {
            yield return LotFindingKinds.WindowNotDrawn.At("/window", "The window has no polygon: an edge needs the lot's own laboratory values or specificGravity, or a side is open. Give them, or a limit on that side.");
        }

        if (window.Outside.Count > 0)
        {
            List<string> labels = [.. window.Outside.Select(entry => entry.Label).Distinct()];
            yield return LotFindingKinds.OutsideWindow.At("/window", $"{Labels.Listed(labels, "test")} {(labels.Count == 1 ? "lies" : "lie")} outside the window, across {string.Join(", ", window.Outside.Select(entry => entry.Edge).Distinct())}. Rework the lift there by what the edge asks.");
        }

        if (window.Unknown.Count > 0)
        {
            List<string> labels = [.. window.Unknown.Select(entry => entry.Label).Distinct()];
            yield return LotFindingKinds.QuantityMissing.At("/window", $"{Labels.Listed(labels, "test")} cannot be held against {string.Join(", ", window.Unknown.Select(entry => entry.Edge).Distinct())}: a value is missing. Give water content, density, specificGravity or the laboratory's values.");
        }
    }

    private static Finding Changing(QuantityTrend trend, UnitSet units)
    {
        var along = trend.Along == Along.Station ? "100 m of station" : "lift";
        var change = trend.Trend.Slope * (trend.Along == Along.Station ? 100 : 1);
        return LotFindingKinds.TrendFound.At("/tests",
            $"The {trend.Quantity.Words()} {(change > 0 ? "rises" : "falls")} by {JudgementWords.Amount(trend.Quantity, Math.Abs(change), units)} with each {along}, by more than the scatter explains. Look at the map; split the lot where the work changed.");
    }

    /// <summary>Whether any soil could lie as the values say.</summary>
    private static IEnumerable<Finding> Possible(IReadOnlyList<LotTest> counted)
    {
        List<string> high = [.. counted.Where(test => test.Values[AcceptedQuantity.RelativeCompaction] > HighCompaction * (1 + Arithmetic)).Select(test => test.Label)];
        if (high.Count > 0)
        {
            yield return FieldFindingKinds.RelativeCompactionHigh.At("/tests", $"{Labels.Listed(high, "test")} {(high.Count == 1 ? "has" : "have")} a relative compaction above 105 %: a wrong reference is likelier than so good a roller. Compare the soil with the reference's sample.");
        }

        List<string> above = [.. counted.Where(test => IsAboveZeroAirVoids(test.Values.Soil)).Select(test => test.Label)];
        if (above.Count > 0)
        {
            yield return FindingKinds.AboveZeroAirVoids.At("/tests", $"{Labels.Listed(above, "test")} {(above.Count == 1 ? "lies" : "lie")} above the zero-air-voids line. Check density, water content and specific gravity.");
        }
    }

    private static bool IsAboveZeroAirVoids(FieldDensity.JudgedSoil soil) =>
        soil is { SpecificGravity: { } gravity, DryDensity: { } dry, WaterContent: { } w }
        && dry > PhaseRelations.OnZeroAirVoidsLine(new WaterContent(w), gravity, new Density(soil.WaterDensity)).KilogramsPerCubicMeter * (1 + Arithmetic);

    private static string Are(IReadOnlyCollection<string> labels) => labels.Count == 1 ? "is" : "are";
}
