using Drypeak.Service.Contracts;
using Drypeak.Service.Field;
using Drypeak.Soil.Quantities;

namespace Drypeak.Service.Pages.FieldDensity;

/// <summary>The sentences and numbers of a field answer as a page shows them.</summary>
internal static class FieldAnswerWords
{
    /// <summary>The outcome as a word; the relative compaction or the dry density where nothing was required.</summary>
    public static string Headline(FieldDensityAnswer answer) => answer switch
    {
        { Outcome: { } outcome } => char.ToUpperInvariant(outcome[0]) + outcome[1..],
        { RelativeCompaction: { } compaction } => $"Relative compaction {ReaderText.Fixed(compaction, 1)} %",
        { Test.DryDensity: { } dry } => $"Dry density {Text(dry, answer)}",
        _ => "No dry density",
    };

    /// <summary>Why: every requirement that is missed; else the first that is undecided, or the first of all, in the order of the specification.</summary>
    public static string? Why(FieldDensityAnswer answer)
    {
        var missed = answer.Requirements.Where(requirement => requirement.Outcome == "not-met").ToList();
        var decides = missed.Count > 0 ? missed : [.. answer.Requirements.OrderBy(requirement => requirement.Outcome == "undecided" ? 0 : 1).Take(1)];
        return decides.Count == 0 ? null : string.Join(" ", decides.Select(requirement => requirement.Explanation));
    }

    /// <summary>What to do next, by the outcome.</summary>
    public static string? Next(FieldDensityAnswer answer) => answer switch
    {
        { Outcome: "accepted" } => "The next lift may cover it, if the engineer responsible agrees.",
        { Outcome: "rejected" } => WaterMissed(answer) switch
        {
            { Value: { } value, Minimum: { } driest } when value < driest => "Wet the lift, roll it again, and test again.",
            { } => "Dry the lift, roll it again, and test again.",
            null => "Roll the lift again, and test again.",
        },
        { Outcome: "undecided" } => "Leave the lift open until that is done and has decided.",
        _ => null,
    };

    /// <summary>A probability, without claiming certainty.</summary>
    public static string Probability(double probability) => probability switch
    {
        >= 0.9995 => "over 99.9 %",
        < 0.0005 => "under 0.1 %",
        _ => ReaderText.Percent(probability),
    };

    private static RequirementAnswer? WaterMissed(FieldDensityAnswer answer) =>
        answer.Requirements.FirstOrDefault(requirement => requirement is { Outcome: "not-met", Quantity: "waterContent" or "waterContentFromOptimum" });

    /// <summary>Name, text and unit of each quantity of the soil in place that is known.</summary>
    public static IEnumerable<(string Name, string Text)> Quantities(FieldDensityAnswer answer)
    {
        var test = answer.Test;
        (string, string?)[] all =
        [
            ("Wet density", test.WetDensity is { } wet ? Text(wet, answer) : null),
            ("Water content", Percent(test.WaterContent)),
            ("Dry density", test.DryDensity is { } dry ? Text(dry, answer) : null),
            ("Relative compaction", Percent(answer.RelativeCompaction)),
            ("From the optimum", Percent(answer.WaterContentFromOptimum)),
            ("Relative density", Percent(answer.RelativeDensity)),
            ("Void ratio", test.VoidRatio is { } e ? ReaderText.Fixed(e, 3) : null),
            ("Saturation", Percent(test.Saturation)),
            ("Air voids", Percent(test.AirVoids)),
            ("Reference maximum", answer.Laboratory?.MaximumDryDensity is { } most ? Text(most, answer) + (answer.Laboratory.CorrectedForOversize ? ", corrected for oversize" : "") : null),
            ("Reference optimum", Percent(answer.Laboratory?.OptimumWaterContent)),
        ];
        return all.Where(item => item.Item2 is { }).Select(item => (item.Item1, item.Item2!));
    }

    private static string Text(double density, FieldDensityAnswer answer)
    {
        var unit = answer.Units.DensityUnit();
        return ReaderText.Of(Density.From(density, unit), unit);
    }

    private static string? Percent(double? value) => value is { } number ? ReaderText.Fixed(number, 1) + " %" : null;
}
