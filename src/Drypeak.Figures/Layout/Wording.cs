using Drypeak.Figures.Drawing;
using Drypeak.Soil.Quantities;

namespace Drypeak.Figures.Layout;

/// <summary>Every sentence and label of a compaction figure that is made from its numbers.</summary>
internal sealed class Wording
{
    private const string Percent = " %";

    private readonly CompactionChart _chart;

    public Wording(CompactionChart chart)
    {
        _chart = chart;
        Result = chart.Adopted ?? chart.Optimum;
        Reference = PlainText.Clean(chart.Reference ?? "");
    }

    /// <summary>The optimum that stands for the result, or null.</summary>
    public ChartOptimum? Result { get; }

    /// <summary>The test's name, empty where there is none.</summary>
    public string Reference { get; }

    private string Unit => _chart.DensityUnit.Symbol();

    private string DensityName => _chart.DensityUnit.DryDensityName();

    private bool IsAdopted => _chart.Adopted is not null;

    /// <summary>The result, in two halves between which a line may break.</summary>
    public (string First, string Second) Headline => Result is null
        ? ("No optimum", "within the tested range")
        : ($"{(IsAdopted ? "Adopted maximum" : "Maximum")} {DensityName} {Density(Result)}", $"at {Water(Result)} water");

    /// <summary>The result in one line.</summary>
    public string Title => $"{Headline.First} {Headline.Second}";

    /// <summary>What the bars on the marks are, or empty where there is none.</summary>
    public string Bars => _chart.Specimens.Any(specimen => specimen.IsUncertain) ? "bars: 95 % of each measurement" : "";

    /// <summary>The 95 % intervals of the result, or empty.</summary>
    public string Intervals
    {
        get
        {
            var water = IntervalText(Result?.WaterContentInterval, 1, "%");
            var density = IntervalText(Result?.MaximumDryDensityInterval, DensityDecimals, Unit);
            var both = string.Join(" and ", new[] { density, water }.OfType<string>());
            return both.Length == 0 ? "" : $"95 % interval {both}";
        }
    }

    public static string WaterAxis => "Water content (%)";

    public string DensityAxis => $"{Capitalized(DensityName)} ({Unit})";

    /// <summary>What the picture says, for who cannot see it.</summary>
    public string Description
    {
        get
        {
            var sentences = new List<string> { Specimens, ResultSentence };
            if (Intervals.Length > 0)
            {
                sentences.Add($"{Intervals}.");
            }

            if (Bars.Length > 0)
            {
                sentences.Add("Bars on the marks are the 95 % intervals of the measurements.");
            }

            if (_chart is { Adopted: not null, Optimum: { } fitted })
            {
                sentences.Add($"The fitted curve has its maximum of {Density(fitted)} at {Water(fitted)}.");
            }

            if (_chart.Corrected is { } corrected)
            {
                sentences.Add($"Corrected for oversize: {Density(corrected)} at {Water(corrected)}.");
            }

            var lines = PhaseLines.Of(_chart).All;
            if (lines.Count > 0)
            {
                sentences.Add($"Lines: {string.Join(", ", lines.Select(line => line.Labels[0]))}.");
            }

            if (_chart.NextSpecimen is { } next)
            {
                sentences.Add($"Suggested next specimen: {WaterText(next)} water.");
            }

            return string.Join(" ", sentences);
        }
    }

    /// <summary>What stands beside the mark of the fitted optimum where it is not the result, the fullest first.</summary>
    public static IReadOnlyList<string> Fitted(ChartOptimum optimum) => Beside("fitted", "fitted", optimum);

    /// <summary>What stands beside the mark of the corrected optimum, the fullest first.</summary>
    public static IReadOnlyList<string> Corrected(ChartOptimum optimum) => Beside("corrected for oversize", "corrected", optimum);

    /// <summary>What stands beside a specimen's mark, the fullest first.</summary>
    public static IReadOnlyList<string> Specimen(ChartSpecimen specimen)
    {
        var label = PlainText.Clean(specimen.Label ?? "");
        return (label, specimen.SetAside) switch
        {
            ("", true) => ["set aside"],
            (_, true) => [$"{label}, set aside", label],
            _ => [label],
        };
    }

    /// <summary>What stands at the next specimen's place, the fullest first.</summary>
    public static IReadOnlyList<string> Next(double waterContent) => [$"next specimen {WaterText(waterContent)}", $"next {WaterText(waterContent)}", "next"];

    /// <summary>A reported water content without its unit, which the axis names.</summary>
    public static string BareWater(ChartOptimum optimum) => Bare(Water(optimum), "%");

    /// <summary>A reported density without its unit, which the axis names.</summary>
    public string BareDensity(ChartOptimum optimum) => Bare(Density(optimum), Unit);

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
            var specimens = _chart.Specimens;
            if (specimens.Count == 0)
            {
                return $"{Capitalized(DensityName)} against water content, without specimens.";
            }

            var setAside = specimens.Count(specimen => specimen.SetAside);
            var water = Between(specimens.Min(s => s.WaterContent), specimens.Max(s => s.WaterContent), 1, "%");
            var density = Between(specimens.Min(s => s.DryDensity), specimens.Max(s => s.DryDensity), DensityDecimals, Unit);
            return $"{Capitalized(DensityName)} against water content of {specimens.Count} {(specimens.Count == 1 ? "specimen" : "specimens")}"
                + $"{(setAside > 0 ? $", {setAside} of them set aside" : "")}: {water} water, {density}.";
        }
    }

    private string ResultSentence => Result is null
        ? "There is no optimum within the tested range."
        : $"The {(IsAdopted ? "adopted" : "fitted")} maximum {DensityName} is {Density(Result)} at an optimum water content of {Water(Result)}.";

    private static string Water(ChartOptimum optimum) => PlainText.Clean(optimum.ReportedWaterContent);

    private static string Density(ChartOptimum optimum) => PlainText.Clean(optimum.ReportedMaximumDryDensity);

    private static string WaterText(double percent) => Ticks.Format(percent, 1) + Percent;

    private static string[] Beside(string full, string brief, ChartOptimum optimum) =>
        [$"{full}: {Density(optimum)} at {Water(optimum)}", $"{brief}: {Density(optimum)}, {Water(optimum)}", brief];

    private static string Between(double lower, double upper, int decimals, string unit)
    {
        var (from, to) = (Ticks.Format(lower, decimals), Ticks.Format(upper, decimals));
        return from == to ? $"{from} {unit}" : $"{from} to {to} {unit}";
    }

    /// <summary>With at least one digit of the interval's width, and no fewer decimals than readers expect.</summary>
    private static string? IntervalText(double[]? interval, int decimals, string unit)
    {
        if (interval is not [var lower, var upper])
        {
            return null;
        }

        var needed = upper > lower ? (int)Math.Ceiling(-Math.Log10((upper - lower) / 2)) : 0;
        return Between(lower, upper, Math.Clamp(needed, decimals, decimals + 3), unit);
    }

    private static string Bare(string reported, string unit) =>
        reported.EndsWith(unit, StringComparison.Ordinal) ? reported[..^unit.Length].TrimEnd() : reported;

    private static string Capitalized(string words) => char.ToUpperInvariant(words[0]) + words[1..];
}
