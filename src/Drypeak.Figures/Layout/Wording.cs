using Drypeak.Figures.Drawing;
using Drypeak.Soil.Quantities;

namespace Drypeak.Figures.Layout;

/// <summary>Every sentence and label of a compaction figure that is made from its numbers, in the reader's language.</summary>
internal sealed class Wording
{
    private const string Percent = " %";

    private readonly CompactionChart _chart;
    private readonly FigureOptions _options;
    private readonly Phrases _phrases;

    public Wording(CompactionChart chart, FigureOptions options)
    {
        (_chart, _options, _phrases) = (chart, options, options.Language.Phrases);
        Result = chart.Adopted ?? chart.Optimum;
        Reference = PlainText.Clean(chart.Reference ?? "");
        Statement = PlainText.Clean(chart.Statement ?? "") is { Length: > 0 } said ? said : null;
        OwnTitle = PlainText.Clean(options.Title ?? "") is { Length: > 0 } own ? own : Statement;
    }

    /// <summary>The optimum that stands for the result, or null.</summary>
    public ChartOptimum? Result { get; }

    /// <summary>The test's name, empty where there is none.</summary>
    public string Reference { get; }

    /// <summary>The result in one line where it is not the optimum, or null.</summary>
    public string? Statement { get; }

    /// <summary>The title that was asked for, or the statement; null where the optimum is the title.</summary>
    public string? OwnTitle { get; }

    private string Unit => _chart.DensityUnit.Symbol();

    private string DensityName => Term(_phrases.DryDensity);

    private string MaximumName => Term(_chart.Adopted is null ? _phrases.Maximum : _phrases.AdoptedMaximum);

    /// <summary>The result, in two halves between which a line may break.</summary>
    public (string First, string Second) Headline => Result is null
        ? _phrases.NoOptimum
        : ($"{Capitalized(MaximumName)} {Density(Result)}", Fill(_phrases.AtWater, Water(Result)));

    /// <summary>The result in one line.</summary>
    public string ResultLine => $"{Headline.First} {Headline.Second}";

    /// <summary>The title in one line.</summary>
    public string Title => OwnTitle ?? ResultLine;

    /// <summary>What the bars on the marks are, or empty where there is none.</summary>
    public string Bars => HasBars ? _phrases.Bars : "";

    /// <summary>What the band about the curve is, or empty where there is none.</summary>
    public string Band => HasBand ? _phrases.Band : "";

    /// <summary>The 95 % intervals of the result, or empty.</summary>
    public string Intervals
    {
        get
        {
            var water = IntervalText(Result?.WaterContentInterval, 1, "%");
            var density = IntervalText(Result?.MaximumDryDensityInterval, DensityDecimals, Unit);
            return (density, water) switch
            {
                (null, null) => "",
                ({ } only, null) => Fill(_phrases.Interval, only),
                (null, { } only) => Fill(_phrases.Interval, only),
                _ => Fill(_phrases.Interval, Fill(_phrases.And, density, water)),
            };
        }
    }

    /// <summary>What is written along the axes.</summary>
    public AxisWords Axes => new($"{Capitalized(_phrases.WaterContent)} (%)", $"{Capitalized(DensityName)} ({Unit})")
    {
        Second = Second(),
        XValue = Result is null ? null : new AxisValue(Result.WaterContent, Bare(Water(Result), "%")),
        YValue = Result is null ? null : new AxisValue(Result.MaximumDryDensity, Bare(Density(Result), Unit)),
        Number = Number,
    };

    /// <summary>What is written over the plot.</summary>
    public HeadingWords Heading => !_options.SaysResult ? new("", null, [[Bars, Band]]) : new(
        Title,
        OwnTitle is null ? Headline : null,
        [[OwnTitle == Statement ? "" : Statement ?? "", OwnTitle is null || IsWithoutLaboratory ? "" : ResultLine, Reference], [Intervals, Bars, Band]]);

    /// <summary>What the picture says, for who cannot see it.</summary>
    public string Description
    {
        get
        {
            var describe = _phrases.Describe;
            var sentences = new List<string>();
            if (Statement is not null)
            {
                sentences.Add($"{Statement.TrimEnd('.')}.");
            }

            if (!IsWithoutLaboratory)
            {
                sentences.Add(Specimens);
            }

            if (_chart.FieldTests.Count > 0)
            {
                sentences.Add(FieldTests);
            }

            if (PlainText.Clean(_chart.Zone?.Label ?? "") is { Length: > 0 } zone)
            {
                sentences.Add(Fill(describe.Zone, zone));
            }

            if (!IsWithoutLaboratory)
            {
                sentences.Add(Result is null ? describe.NoResult : Capitalized(Fill(describe.Result, MaximumName, Density(Result), Water(Result))));
            }

            if (Intervals.Length > 0)
            {
                sentences.Add($"{Capitalized(Intervals)}.");
            }

            if (HasBars)
            {
                sentences.Add(describe.Bars);
            }

            if (HasBand)
            {
                sentences.Add(describe.Band);
            }

            if (_chart is { Adopted: not null, Optimum: { } fitted })
            {
                sentences.Add(Fill(describe.Fitted, Density(fitted), Water(fitted)));
            }

            if (_chart.Corrected is { } corrected)
            {
                sentences.Add(Fill(describe.Corrected, Density(corrected), Water(corrected)));
            }

            var lines = PhaseLines.Of(_chart, _options).All;
            if (lines.Count > 0)
            {
                sentences.Add(Fill(describe.Lines, string.Join(", ", lines.Select(line => line.Labels[0]))));
            }

            if (_chart.NextSpecimen is { } next)
            {
                sentences.Add(Fill(describe.Next, WaterText(next)));
            }

            return string.Join(" ", sentences);
        }
    }

    /// <summary>The name of another model's curve.</summary>
    public string Model(string name) => _phrases.Models.GetValueOrDefault(name, PlainText.Clean(name));

    /// <summary>What stands beside the mark of the adopted optimum.</summary>
    public string Adopted => _phrases.Adopted;

    /// <summary>What stands beside the mark of the fitted optimum where it is not the result, the fullest first.</summary>
    public IReadOnlyList<string> Fitted(ChartOptimum optimum) => Beside(_phrases.Fitted, _phrases.Fitted, optimum);

    /// <summary>What stands beside the mark of the corrected optimum, the fullest first.</summary>
    public IReadOnlyList<string> Corrected(ChartOptimum optimum) => Beside(_phrases.Corrected.Full, _phrases.Corrected.Brief, optimum);

    /// <summary>What stands beside a specimen's mark, the fullest first.</summary>
    public IReadOnlyList<string> Specimen(ChartSpecimen specimen)
    {
        var label = PlainText.Clean(specimen.Label ?? "");
        return (label, specimen.SetAside) switch
        {
            ("", true) => [_phrases.SetAside],
            (_, true) => [$"{label}, {_phrases.SetAside}", label],
            _ => [label],
        };
    }

    /// <summary>What stands beside a field test's mark, the fullest first.</summary>
    public IReadOnlyList<string> FieldTest(ChartFieldTest test)
    {
        var (label, outcome) = (PlainText.Clean(test.Label ?? ""), Outcome(test.Outcome));
        return (label, outcome) switch
        {
            (_, "") => [label],
            ("", _) => [outcome],
            _ => [$"{label}, {outcome}", label],
        };
    }

    /// <summary>What stands at the next specimen's place, the fullest first.</summary>
    public IReadOnlyList<string> Next(double waterContent) =>
        [$"{_phrases.Next.Full} {WaterText(waterContent)}", $"{_phrases.Next.Brief} {WaterText(waterContent)}", _phrases.Next.Brief];

    /// <summary>A number with a decimal point as the language writes it.</summary>
    public string Number(string text) => _phrases.Number(text);

    /// <summary>Whether the chart shows field tests alone, so that nothing is to be said of a curve.</summary>
    private bool IsWithoutLaboratory => _chart.FieldTests.Count > 0 && _chart.Specimens.Count == 0 && Result is null;

    private string FieldTests
    {
        get
        {
            var outcomes = _chart.FieldTests.GroupBy(test => test.Outcome).OrderBy(group => group.Key)
                .Select(group => (Word: Outcome(group.Key), Count: group.Count())).Where(outcome => outcome.Word.Length > 0)
                .Select(outcome => $"{outcome.Count} {outcome.Word}").ToList();
            return Fill(_phrases.Describe.FieldTests, _chart.FieldTests.Count, outcomes.Count == 0 ? "" : $" ({string.Join(", ", outcomes)})");
        }
    }

    private string Outcome(MarkRole role) => role switch
    {
        MarkRole.SetAside => _phrases.SetAside,
        MarkRole.Met => _phrases.Outcomes.Met,
        MarkRole.NotMet => _phrases.Outcomes.NotMet,
        MarkRole.Undecided => _phrases.Outcomes.Undecided,
        _ => "",
    };

    private bool HasBand => _chart.Band is { Count: > 1 };

    private bool HasBars => _chart.Specimens.Any(specimen => specimen.IsUncertain);

    private int DensityDecimals => _chart.DensityUnit switch
    {
        DensityUnit.MegagramPerCubicMeter or DensityUnit.GramPerCubicCentimeter => 2,
        DensityUnit.KilogramPerCubicMeter => 0,
        _ => 1,
    };

    private string Specimens
    {
        get
        {
            var (describe, quantity, specimens) = (_phrases.Describe, Capitalized(DensityName), _chart.Specimens);
            if (specimens.Count == 0)
            {
                return Fill(describe.NoSpecimens, quantity);
            }

            var setAside = specimens.Count(specimen => specimen.SetAside);
            var count = setAside > 0 ? Fill(describe.ManySetAside, specimens.Count, setAside)
                : specimens.Count == 1 ? describe.One
                : Fill(describe.Many, specimens.Count);
            var water = Between(specimens.Min(s => s.WaterContent), specimens.Max(s => s.WaterContent), 1, "%");
            var density = Between(specimens.Min(s => s.DryDensity), specimens.Max(s => s.DryDensity), DensityDecimals, Unit);
            return Fill(describe.Specimens, quantity, count, water, density);
        }
    }

    private SecondAxisWords? Second()
    {
        switch (_options.Second)
        {
            case null:
                return null;
            case { Unit: { } unit }:
                var ratio = Soil.Quantities.Density.From(1, _chart.DensityUnit).In(unit);
                return new SecondAxisWords(unit.Symbol(), density => density * ratio, value => value / ratio);
            default:
                // e = Gs·ρw/ρd − 1. Below the least density that is drawn for it there is no void ratio that a reader could want.
                var solids = _chart.SpecificGravity!.Value * new Density(_chart.WaterDensity!.Value).In(_chart.DensityUnit);
                var least = solids * 1e-3;
                return new SecondAxisWords(Capitalized(_phrases.VoidRatio), density => (solids / Math.Max(density, least)) - 1, voidRatio => solids / (1 + voidRatio));
        }
    }

    private string Water(ChartOptimum optimum) => Number(PlainText.Clean(optimum.ReportedWaterContent));

    private string Density(ChartOptimum optimum) => Number(PlainText.Clean(optimum.ReportedMaximumDryDensity));

    private string WaterText(double percent) => Number(Ticks.Format(percent, 1)) + Percent;

    private string[] Beside(string full, string brief, ChartOptimum optimum) =>
        [$"{full}: {Fill(_phrases.DensityAtWater, Density(optimum), Water(optimum))}", $"{brief}: {Density(optimum)}, {Water(optimum)}", brief];

    private string Between(double lower, double upper, int decimals, string unit)
    {
        var (from, to) = (Number(Ticks.Format(lower, decimals)), Number(Ticks.Format(upper, decimals)));
        return from == to ? $"{from} {unit}" : $"{Fill(_phrases.Range, from, to)} {unit}";
    }

    /// <summary>With at least one digit of the interval's width, and no fewer decimals than readers expect.</summary>
    private string? IntervalText(double[]? interval, int decimals, string unit)
    {
        if (interval is not [var lower, var upper])
        {
            return null;
        }

        var needed = upper > lower ? (int)Math.Ceiling(-Math.Log10((upper - lower) / 2)) : 0;
        return Between(lower, upper, Math.Clamp(needed, decimals, decimals + 3), unit);
    }

    /// <summary>A reported value without its unit, which the axis names.</summary>
    private static string Bare(string reported, string unit) =>
        reported.EndsWith(unit, StringComparison.Ordinal) ? reported[..^unit.Length].TrimEnd() : reported;

    private string Term(Phrases.TermPair term) => _chart.DensityUnit == DensityUnit.KilonewtonPerCubicMeter ? term.UnitWeight : term.Density;

    private static string Fill(string template, params object[] values) => Phrases.Fill(template, values);

    private static string Capitalized(string words) => char.ToUpperInvariant(words[0]) + words[1..];
}
