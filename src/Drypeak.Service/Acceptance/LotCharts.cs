using Drypeak.Figures;
using Drypeak.Service.Field;
using Drypeak.Soil.Acceptance;
using Drypeak.Soil.Acceptance.ControlCharts;
using Drypeak.Soil.Acceptance.LotRules;
using Drypeak.Soil.FieldDensity.Review;
using Drypeak.Soil.Quantities;

namespace Drypeak.Service.Acceptance;

/// <summary>The pictures of a lot: results in order, histogram, window, map.</summary>
internal sealed class LotCharts(Lot lot, LotResult result, string? reference)
{
    private const int MostBars = 40;
    private const int MostNamedPositions = 60;

    /// <summary>The quantity that the pictures are about: the chart's, the first rule's or requirement's, or the first that is known.</summary>
    private readonly AcceptedQuantity? _quantity =
        lot.ControlChart?.Quantity
        ?? lot.Rules.OfType<QuantityRule>().FirstOrDefault()?.Limits.Quantity
        ?? lot.Tests.SelectMany(test => test.Judgements).FirstOrDefault()?.Requirement.Quantity
        ?? (result.Statistics.Count > 0 ? result.Statistics[0].Quantity : null);

    /// <summary>The tests that count.</summary>
    private readonly HashSet<LotTest> _counted = result.Counted.ToHashSet<LotTest>(ReferenceEqualityComparer.Instance);

    /// <summary>Results in order with limits and signals; null where no result is known.</summary>
    public PlotChart? InOrder()
    {
        if (_quantity is not { } quantity)
        {
            return null;
        }

        var chart = result.ControlChart;
        var points = chart?.Points ?? [.. result.Counted.Where(test => test.Values[quantity] is { }).Select(test => new ControlPoint(test, test.Values[quantity]!.Value, test.Values[quantity]!.Value, null))];
        if (points.Count == 0)
        {
            return null;
        }

        var left = lot.Tests.Where(test => test.Values[quantity] is { } && !_counted.Contains(test)).ToList();
        var order = lot.Tests.Select((test, i) => (test.Label, i)).ToDictionary(pair => pair.Label, pair => pair.i);
        List<(LotTest Test, double Value, string? Signal)> all =
        [
            .. points.Select(point => (point.Test, point.Plotted, point.Signal)),
            .. chart is null or { Plan.Kind: ControlChartKind.Individuals } ? left.Select(test => (test, test.Values[quantity]!.Value, (string?)null)) : [],
        ];
        all = lot.Tests.All(test => test.Time is { }) ? [.. all.OrderBy(entry => entry.Test.Time).ThenBy(entry => order[entry.Test.Label])] : [.. all.OrderBy(entry => order[entry.Test.Label])];
        List<PlotLimit> limits = chart is { Lower: { } lower, Upper: { } upper, Center: { } center }
            ? [.. ControlLimits(quantity, lower, center, upper)]
            : [];
        if (chart is null or { Plan.Kind: ControlChartKind.Individuals })
        {
            limits.AddRange(LimitsOf(quantity, upright: false));
        }

        return new PlotChart
        {
            Title = Title(quantity),
            Subtitle = chart?.Plan.Kind switch
            {
                ControlChartKind.Ewma => "Exponentially weighted moving average of the results in order",
                ControlChartKind.Cusum => "Cumulative sums of the results in order, upward above and downward below 0",
                _ => null,
            },
            Reference = reference,
            Description = $"{Capital(quantity.Words())} of {points.Count} tests in order. {Outcomes()}{(chart is null ? "" : $" {chart.Points.Count(point => point.Signal is { })} of them signal on the control chart.")}",
            X = new PlotAxis("Test") { Positions = Positions(all) },
            Y = AxisOf(quantity),
            Lines = all.Count(entry => _counted.Contains(entry.Test)) < 2 ? [] :
            [
                new PlotLine([.. all.Select((entry, i) => (entry, i)).Where(pair => _counted.Contains(pair.entry.Test)).Select(pair => new PlotPoint(pair.i + 1, In(quantity, pair.entry.Value)))], PlotLineRole.Quiet),
            ],
            Limits = limits,
            Marks = [.. all.Select((entry, i) => new PlotMark(i + 1, In(quantity, entry.Value), RoleOf(entry.Test), entry.Signal is null ? null : $"{entry.Test.Label}: signal", entry.Signal is null ? MarkShape.Disc : MarkShape.Diamond))],
        };
    }

    /// <summary>How often which result, with the limits; null with fewer than two different results.</summary>
    public PlotChart? Histogram()
    {
        if (_quantity is not { } quantity || result.Statistics.FirstOrDefault(known => known.Quantity == quantity) is not { Summary: { StandardDeviation: > 0 and var deviation } summary })
        {
            return null;
        }

        double[] values = [.. result.Counted.Select(test => test.Values[quantity]).OfType<double>().Select(value => In(quantity, value))];
        var (least, most) = (values.Min(), values.Max());

        // D. W. Scott, On optimal and data-based histograms, Biometrika 66 (1979): 3.49·s/∛n, made a round number not over it.
        var width = RoundBelow(Math.Max(3.49 * In(quantity, deviation) / Math.Cbrt(values.Length), 2.5 * (most - least) / MostBars));
        var first = Math.Floor(least / width);
        var counts = values.CountBy(value => (int)(Math.Floor(value / width) - first)).ToDictionary(pair => pair.Key, pair => pair.Value);
        var share = result.Rules.FirstOrDefault(judged => judged.Rule is PercentWithinLimitsRule rule && rule.Limits.Quantity == quantity);
        var (mean, spread) = (In(quantity, summary.Mean), In(quantity, deviation));
        var (from, to) = (Math.Min(first * width, mean - (3.2 * spread)), Math.Max((first + counts.Keys.Max() + 1) * width, mean + (3.2 * spread)));
        return new PlotChart
        {
            Title = share?.Value is { } percent ? $"An estimated {ReaderText.Percent(percent)} of the lot lies within the limits" : $"Mean {Text(quantity, summary.Mean)}, standard deviation {JudgementWords.Amount(quantity, deviation, lot.Units)}",
            Subtitle = share?.Value is null ? null : $"Mean {Text(quantity, summary.Mean)}, standard deviation {JudgementWords.Amount(quantity, deviation, lot.Units)}",
            Reference = reference,
            Description = $"Histogram of {quantity.Words()} over {values.Length} tests, from {Text(quantity, summary.Minimum)} to {Text(quantity, summary.Maximum)}, with the normal curve of their mean and standard deviation.",
            X = AxisOf(quantity),
            Y = new PlotAxis("Tests") { From = 0 },
            Areas = [.. counts.OrderBy(pair => pair.Key).Select(pair => Bar((first + pair.Key) * width, width, pair.Value))],
            Lines = [new PlotLine([.. Enumerable.Range(0, 101).Select(i => from + ((to - from) * i / 100)).Select(x => new PlotPoint(x, values.Length * width * Normal((x - mean) / spread) / spread))], PlotLineRole.Result)],
            Limits = [.. LimitsOf(quantity, upright: true)],
        };
    }

    /// <summary>The window with the tests in the plane of water content and dry density; null without a window or tests in the plane.</summary>
    public PlotChart? Window()
    {
        if (result.Window is not { } window)
        {
            return null;
        }

        var outside = window.Outside.Select(entry => entry.Label).ToHashSet();
        var unknown = window.Unknown.Select(entry => entry.Label).ToHashSet();
        List<PlotMark> marks =
        [
            .. from test in lot.Tests
               let w = test.Values[AcceptedQuantity.WaterContent]
               let dry = test.Values[AcceptedQuantity.DryDensity]
               where w is { } && dry is { }
               let counts = _counted.Contains(test)
               let role = !counts ? MarkRole.SetAside : outside.Contains(test.Label) ? MarkRole.NotMet : unknown.Contains(test.Label) ? MarkRole.Undecided : MarkRole.Met
               select new PlotMark(100 * w.Value, In(AcceptedQuantity.DryDensity, dry.Value), role, outside.Contains(test.Label) ? test.Label : null),
        ];
        if (marks.Count == 0)
        {
            return null;
        }

        return new PlotChart
        {
            Title = $"{window.Inside.Count} of {result.Counted.Count} tests lie inside the compaction window",
            Subtitle = window.WetOfOptimums is { } share ? $"{ReaderText.Percent(share)} on the line of optimums or wet of it" : null,
            Reference = reference,
            Description = $"Dry density against water content of {marks.Count} tests{(window.Polygon is { Count: > 0 } ? ", with the compaction window" : "")}. {window.Inside.Count} lie inside, {outside.Count} outside.",
            X = new PlotAxis("Water content (%)"),
            Y = AxisOf(AcceptedQuantity.DryDensity),
            Areas = window.Polygon is { Count: > 2 } corners ? [new PlotArea([.. corners.Select(corner => new PlotPoint(100 * corner.WaterContent, In(AcceptedQuantity.DryDensity, corner.DryDensity)))], PlotAreaRole.Accepted, "window")] : [],
            Marks = marks,
        };
    }

    /// <summary>Where the tests were made, and what they came to; null with fewer than two places.</summary>
    public PlotChart? Map()
    {
        List<LotTest> placed = [.. lot.Tests.Where(test => test.Station is { })];
        if (placed.Select(test => (test.Station, test.Offset)).Distinct().Count() < 2)
        {
            return null;
        }

        var meter = lot.Units.Length.InMeters();
        return new PlotChart
        {
            Title = $"Where {placed.Count} tests were made",
            Subtitle = Outcomes(),
            Reference = reference,
            Description = $"Map of {placed.Count} tests by station and offset. {Outcomes()}",
            X = new PlotAxis($"Station ({lot.Units.Length.Code()})"),
            Y = new PlotAxis($"Offset ({lot.Units.Length.Code()})"),
            Marks =
            [
                .. placed.Select(test => new PlotMark(test.Station!.Value / meter, (test.Offset ?? 0) / meter, RoleOf(test),
                    _quantity is { } quantity && test.Values[quantity] is { } value ? $"{test.Label}: {Text(quantity, value)}" : test.Label)),
            ],
        };
    }

    private string Title(AcceptedQuantity quantity)
    {
        var accepted = result.Counted.Count(test => test.Outcome == TestOutcome.Accepted);
        return result.Outcome switch
        {
            TestOutcome.Accepted => $"The lot is accepted: {Of(result.Rules, Conformance.Met, accepted)}",
            TestOutcome.Rejected => $"The lot is rejected: {Of(result.Rules, Conformance.NotMet, result.Counted.Count(test => test.Outcome == TestOutcome.Rejected))}",
            TestOutcome.Undecided => $"The lot is undecided: {Of(result.Rules, Conformance.Undecided, result.Counted.Count(test => test.Outcome == TestOutcome.Undecided))}",
            _ => $"{Capital(quantity.Words())} of {result.Counted.Count} tests",
        };
    }

    private string Of(IReadOnlyList<LotJudgement> rules, Conformance conformance, int tests)
    {
        var word = conformance switch { Conformance.Met => "met", Conformance.NotMet => "not met", _ => "undecided" };
        var alike = rules.Count(judged => judged.Conformance == conformance);
        return rules.Count > 0 ? $"{alike} of {rules.Count} {(rules.Count == 1 ? "rule" : "rules")} {word}"
            : $"{tests} of {result.Counted.Count} tests {conformance switch { Conformance.Met => "accepted", Conformance.NotMet => "rejected", _ => "undecided" }}";
    }

    private string Outcomes()
    {
        int Count(TestOutcome outcome) => result.Counted.Count(test => test.Outcome == outcome);
        return lot.Tests.All(test => test.Outcome is null) ? $"{result.Counted.Count} of {lot.Tests.Count} tests count."
            : $"{Count(TestOutcome.Accepted)} accepted, {Count(TestOutcome.Rejected)} rejected, {Count(TestOutcome.Undecided)} undecided.";
    }

    private MarkRole RoleOf(LotTest test) => !_counted.Contains(test) ? MarkRole.SetAside : test.Outcome switch
    {
        TestOutcome.Accepted => MarkRole.Met,
        TestOutcome.Rejected => MarkRole.NotMet,
        TestOutcome.Undecided => MarkRole.Undecided,
        _ => MarkRole.Measured,
    };

    private IEnumerable<PlotLimit> ControlLimits(AcceptedQuantity quantity, double lower, double center, double upper)
    {
        var name = lot.ControlChart!.Kind == ControlChartKind.Cusum ? "decision interval" : "control limit";
        yield return new PlotLimit(In(quantity, upper), name, Role: PlotLineRole.Reference);
        yield return new PlotLimit(In(quantity, center), lot.ControlChart.Kind == ControlChartKind.Cusum ? null : lot.ControlChart.Target is null ? "mean" : "target", Role: PlotLineRole.Quiet);
        yield return new PlotLimit(In(quantity, lower), name, Role: PlotLineRole.Reference);
    }

    /// <summary>Every limit that the specification or a rule sets to single values of a quantity, once.</summary>
    private IEnumerable<PlotLimit> LimitsOf(AcceptedQuantity quantity, bool upright) =>
        lot.Tests.SelectMany(test => test.Judgements).Select(judged => judged.Requirement)
            .Concat(lot.Rules.Where(rule => rule is EveryTestRule or PercentWithinLimitsRule or CharacteristicValueRule or ShareOfTestsRule).Cast<QuantityRule>().Select(rule => rule.Limits))
            .Where(limits => limits.Quantity == quantity)
            .SelectMany(limits => new[] { (Value: limits.Minimum, Word: "at least"), (Value: limits.Maximum, Word: "at most") })
            .Where(limit => limit.Value is { })
            .Distinct()
            .Select(limit => new PlotLimit(In(quantity, limit.Value!.Value), $"{limit.Word} {Text(quantity, limit.Value.Value)}", upright));

    private static List<PlotPosition> Positions(List<(LotTest Test, double Value, string? Signal)> all)
    {
        var step = (all.Count + MostNamedPositions - 1) / MostNamedPositions;
        return [.. all.Select((entry, i) => new PlotPosition(i + 1, entry.Test.Label)).Where((_, i) => i % step == 0)];
    }

    private PlotAxis AxisOf(AcceptedQuantity quantity) => new(
        $"{Capital(quantity.Words())}{(quantity.IsDensity() ? $" ({lot.Units.Density.Symbol()})" : quantity.IsPercent() ? " (%)" : "")}");

    private double In(AcceptedQuantity quantity, double value) => value / Specification.UnitOf(quantity, lot.Units);

    private string Text(AcceptedQuantity quantity, double value) => JudgementWords.Text(quantity, value, lot.Units);

    private static string Capital(string words) => char.ToUpperInvariant(words[0]) + words[1..];

    private static double Normal(double z) => Math.Exp(-z * z / 2) / Math.Sqrt(2 * Math.PI);

    /// <summary>The last of 1, 2, 5, 10, … that is not over it.</summary>
    private static double RoundBelow(double width)
    {
        var power = Math.Pow(10, Math.Floor(Math.Log10(width)));
        return width >= 5 * power ? 5 * power : width >= 2 * power ? 2 * power : power;
    }

    private static PlotArea Bar(double from, double width, int count) =>
        new([new(from, 0), new(from, count), new(from + width, count), new(from + width, 0)], PlotAreaRole.Bar);
}
