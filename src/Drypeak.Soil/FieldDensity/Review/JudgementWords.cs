using Drypeak.Soil.Acceptance;
using Drypeak.Soil.Quantities;

namespace Drypeak.Soil.FieldDensity.Review;

/// <summary>A judgement as a sentence: the value, how far from which limit, why it is undecided, and what to do next.</summary>
public static class JudgementWords
{
    /// <summary>The sentence, and the next step where one is needed.</summary>
    public static string Of(Judgement judged, JudgedSoil soil, UnitSet units)
    {
        var (quantity, requirement) = (judged.Requirement.Quantity, judged.Requirement);
        if (judged.Value is not { } value)
        {
            return $"The {quantity.Words()} could not be computed: {WhatIsMissing(quantity, soil)}";
        }

        var start = $"The {quantity.Words()} {(quantity == AcceptedQuantity.AirVoids ? "are" : "is")} {Standing(requirement, value, units)}";
        return judged.Doubt switch
        {
            Doubt.UncertaintyUnknown => start + ". The guarded rule needs its uncertainty, and none is known: give the standard uncertainties, or decide by the simple rule.",
            Doubt.WithinGuardBand => $"{start}: within the guard band of {Amount(quantity, judged.GuardBand!.Value, units)} about the limit. Make another test on the same lift, or find the water content by the oven, and decide on both.",
            _ => start + ".",
        };
    }

    /// <summary>A value as readers write it: <c>95.4 %</c>.</summary>
    public static string Text(AcceptedQuantity quantity, double value, UnitSet units) =>
        quantity.IsDensity() ? ReaderText.Of(new Density(value), units.Density)
        : quantity == AcceptedQuantity.WaterContentFromOptimum ? $"{(value > 0 ? "+" : "")}{ReaderText.Fixed(value * 100, 1)} %"
        : quantity.IsPercent() ? ReaderText.Percent(value)
        : ReaderText.Fixed(value, 3);

    /// <summary>A value beside a requirement: <c>95.4 %, 0.40 above the minimum of 95.0 %</c>.</summary>
    public static string Standing(Requirement requirement, double value, UnitSet units) =>
        $"{Text(requirement.Quantity, value, units)}, {Against(requirement, value, units)}";

    /// <summary>A difference of two values, or a standard deviation, as readers write it.</summary>
    public static string Amount(AcceptedQuantity quantity, double value, UnitSet units) =>
        quantity.IsDensity() ? ReaderText.Of(new Density(value), units.Density)
        : quantity.IsPercent() ? ReaderText.Fixed(value * 100, 2)
        : ReaderText.Fixed(value, 3);

    /// <summary>The nearer limit, and by how much.</summary>
    private static string Against(Requirement requirement, double value, UnitSet units)
    {
        var fromMinimum = value - requirement.Minimum;
        var fromMaximum = requirement.Maximum - value;
        var lower = fromMaximum is null || fromMinimum <= fromMaximum;
        var limit = (lower ? requirement.Minimum : requirement.Maximum)!.Value;
        var margin = (lower ? fromMinimum : fromMaximum)!.Value;
        var name = lower ? "minimum" : "maximum";
        var (quantity, amount) = (requirement.Quantity, Math.Abs(margin));
        return amount <= requirement.Tolerance ? $"on the {name} of {Text(quantity, limit, units)}"
            : $"{Amount(quantity, amount, units)} {(margin > 0 == lower ? "above" : "below")} the {name} of {Text(quantity, limit, units)}";
    }

    private static string WhatIsMissing(AcceptedQuantity quantity, JudgedSoil soil)
    {
        var needsReference = quantity is AcceptedQuantity.RelativeCompaction or AcceptedQuantity.RelativeDensity;
        var needsPhases = quantity is AcceptedQuantity.Saturation or AcceptedQuantity.AirVoids or AcceptedQuantity.VoidRatio;
        var needsDensity = needsReference || needsPhases || quantity is AcceptedQuantity.DryDensity or AcceptedQuantity.WetDensity;
        var needsWater = quantity is AcceptedQuantity.WaterContent or AcceptedQuantity.WaterContentFromOptimum or AcceptedQuantity.Saturation or AcceptedQuantity.AirVoids
            || (needsReference && soil is { OnFines: true, Oversize: { } });
        return needsDensity && soil is { WetDensityAlone: null, DryDensity: null } ? "the readings give no density. Correct them, or test again."
            : (needsWater || needsDensity) && soil.WaterContent is null && (needsWater || soil.DryDensity is null) ? "there is no water content. Give waterContent, tins, wetBasis or carbide."
            : needsReference && soil.MaximumDryDensity is null ? "there is no maximum dry density. Give laboratory.maximumDryDensity, or a laboratory test with an optimum."
            : quantity == AcceptedQuantity.RelativeDensity ? "there is no minimum dry density. Give laboratory.minimumDryDensity."
            : quantity == AcceptedQuantity.WaterContentFromOptimum ? "there is no optimum water content. Give laboratory.optimumWaterContent, or a laboratory test with an optimum."
            : soil.SpecificGravity is null ? "there is no specific gravity. Give it, marked as assumed if it was not measured."
            : "the density leaves no voids. Check volume, masses and specific gravity.";
    }
}
