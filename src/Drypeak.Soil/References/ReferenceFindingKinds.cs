using Drypeak.Soil.Laboratory.Review;

namespace Drypeak.Soil.References;

/// <summary>Every kind of finding on the choice of a reference, in one table.</summary>
public static class ReferenceFindingKinds
{
    private const string OnePoint = "AASHTO T 272, R 75";
    private const string Hilf = "ASTM D5080; AS 1289.5.7.1";
    private const string CommonPractice = "common practice, no source";

    /// <summary>Too few curves.</summary>
    public static readonly FindingKind FamilyTooSmall = new("family-too-small", Severity.Error,
        "The family has fewer than three curves.",
        "Two curves do not show how optimum and maximum change together.",
        "Add the curves of more soils of the same origin, or make a whole test.",
        OnePoint + ": at least three curves");

    /// <summary>Outside the family.</summary>
    public static readonly FindingKind OutsideFamily = new("outside-family", Severity.Error,
        "The point lies outside the family.",
        "Beyond its curves the family says nothing of the soil.",
        "Make a whole test of this soil, and add its curve to the family.",
        OnePoint + ": outside the family, a full test");

    /// <summary>Too dry of the optimum.</summary>
    public static readonly FindingKind PointTooDry = new("point-too-dry", Severity.Error,
        "The point lies below 80 % of the optimum water content of the curve that it selects.",
        "So far on the dry side the curves lie close together, and a small error selects another.",
        "Add water and compact another point.",
        OnePoint + ": 80 to 100 % of the optimum");

    /// <summary>Wet of the optimum.</summary>
    public static readonly FindingKind PointTooWet = new("point-too-wet", Severity.Error,
        "The point lies wet of the optimum of the curve that it selects.",
        "On the wet side the curves run into one line, and a point does not tell them apart.",
        "Dry the soil and compact another point.",
        OnePoint + ": 80 to 100 % of the optimum");

    /// <summary>Curves without points.</summary>
    public static readonly FindingKind ShapeAssumed = new("shape-assumed", Severity.Warning,
        "Some curves of the family are given by their optima alone.",
        "How they fall off on the dry side is assumed, and the blend rests on it.",
        "Give the curves' points, or their whole tests.",
        "ρd = ρmax(1 − 0.8(w/wopt − 1)²): " + CommonPractice);

    /// <summary>Curves out of order.</summary>
    public static readonly FindingKind FamilyOutOfOrder = new("family-out-of-order", Severity.Warning,
        "A denser curve of the family has the wetter optimum.",
        "In a family the optimum rises as the maximum falls; a curve that does not follow is another soil's, or wrong.",
        "Check that curve; leave it out if it does not belong.",
        "Line of optimums: " + CommonPractice);

    /// <summary>A member of the family without a peak.</summary>
    public static readonly FindingKind MemberWithoutPeak = new("member-without-peak", Severity.Error,
        "A curve of the family has no optimum.",
        "It cannot be blended, and is left out.",
        "Give its optimum, or the specimens that are missing.",
        "An optimum is an interior maximum");

    /// <summary>Beyond the limits of density.</summary>
    public static readonly FindingKind BeyondDensityLimits = new("beyond-density-limits", Severity.Warning,
        "The soil is looser than its loosest or denser than its densest state.",
        "The limits were found on another soil, or a density is wrong.",
        "Check the three densities; find the limits on this soil.",
        "Relative density outside 0 to 100 %");

    /// <summary>Without the field water content.</summary>
    public static readonly FindingKind WaterContentEstimated = new("water-content-estimated", Severity.Note,
        "The difference from the optimum is an estimate until the field water content is known.",
        "The true difference is larger by the factor 1 + w.",
        "Give field.waterContent once the oven has spoken. The density ratio does not change.",
        Hilf + ": wopt − w = zm(1 + w)");

    /// <summary>Every kind, in the order of a review.</summary>
    public static IReadOnlyList<FindingKind> All { get; } =
    [
        FamilyTooSmall, OutsideFamily, PointTooDry, PointTooWet, MemberWithoutPeak, ShapeAssumed, FamilyOutOfOrder, BeyondDensityLimits, WaterContentEstimated,
    ];
}
