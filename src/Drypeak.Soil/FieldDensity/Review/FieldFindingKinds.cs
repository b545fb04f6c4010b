using Drypeak.Soil.Laboratory.Review;

namespace Drypeak.Soil.FieldDensity.Review;

/// <summary>Every kind of finding on a field test that a laboratory test does not have, in one table.</summary>
public static class FieldFindingKinds
{
    private const string CommonPractice = "common practice, no source";

    /// <summary>No sand is left for the hole.</summary>
    public static readonly FindingKind ConeOverSand = new("cone-over-sand", Severity.Error,
        "Cone and plate take all the sand that ran out, or more.",
        "The hole would have no volume, and the soil no density.",
        "Check the masses of the jar before and after, and the calibration of the cone.",
        "ASTM D1556: sand in the hole = before − after − cone");

    /// <summary>A hole without a volume.</summary>
    public static readonly FindingKind NoVolume = new("no-volume", Severity.Error,
        "The second reading is not over the first: the hole has no volume.",
        "Without a volume there is no density.",
        "Check both readings; they may have been exchanged.",
        "ASTM D2167 and D5030: volume = second reading − first");

    /// <summary>Too small a hole.</summary>
    public static readonly FindingKind HoleTooSmall = new("hole-too-small", Severity.Warning,
        "The hole is too small for its largest particle.",
        "One stone more or less in a small hole changes the density.",
        "Dig a larger hole, or replace the volume by water in a test pit.",
        "AASHTO T 191: 700 cm³ up to 4.75 mm, 1400 up to 12.5, 2100 up to 25, 2800 up to 50 mm (from memory)");

    /// <summary>An unusual sand.</summary>
    public static readonly FindingKind SandDensityUnusual = new("sand-density-unusual", Severity.Warning,
        "The density of the sand is outside what dry test sand has.",
        "The volume of the hole rests on it.",
        "Calibrate the sand again; check that it is dry, and its unit.",
        "1.25 to 1.75 Mg/m³: " + CommonPractice);

    /// <summary>Denser than the reference allows.</summary>
    public static readonly FindingKind RelativeCompactionHigh = new("relative-compaction-high", Severity.Warning,
        "The relative compaction is above 105 %.",
        "A roller seldom does more than the laboratory: most likely the reference curve is another soil's.",
        "Compare the soil with the sample of the reference; make one point on a family of curves.",
        "Above 105 %: " + CommonPractice);

    /// <summary>Far from the optimum.</summary>
    public static readonly FindingKind FarFromOptimum = new("far-from-optimum", Severity.Warning,
        "The water content is far from the optimum.",
        "So far from it, the roller's work goes to waste, or the reference is another soil's.",
        "Check the water content and the reference; wet or dry the lift before it is rolled again.",
        "Over 4 percentage points: " + CommonPractice);

    /// <summary>Gauge and oven disagree.</summary>
    public static readonly FindingKind GaugeAndOvenApart = new("gauge-and-oven-apart", Severity.Warning,
        "The gauge's water content and the oven's are far apart.",
        "A gauge counts all hydrogen, also what the oven leaves in the soil.",
        "Take pairs of gauge and oven on this soil, and use their offset.",
        "Over 1 percentage point on a test, over 2 in a pair: " + CommonPractice);

    /// <summary>No water content.</summary>
    public static readonly FindingKind WaterContentMissing = new("water-content-missing", Severity.Warning,
        "No water content was given.",
        "Without it a wet density gives no dry density, and nothing can be held against the reference.",
        "Give waterContent, tins, wetBasis or carbide.",
        "ρd = ρ/(1 + w)");

    /// <summary>A requirement's value is unknown.</summary>
    public static readonly FindingKind ValueMissing = new("value-missing", Severity.Warning,
        "A requirement could not be judged: something that its value needs is missing.",
        "It is neither met nor missed.",
        "Give what is missing, and ask again.",
        "A requirement without a value is undecided");

    /// <summary>A guarded rule without an uncertainty.</summary>
    public static readonly FindingKind UncertaintyMissing = new("uncertainty-missing", Severity.Warning,
        "A guarded decision was asked for, and no uncertainty is known.",
        "The guard band follows from the uncertainty; without it nothing can be decided under this rule.",
        "Give the standard uncertainties of the field and of the laboratory, or decide by the simple rule.",
        "ISO/IEC 17025:2017, 7.8.6; JCGM 106:2012, clause 8");

    /// <summary>The readings' spread stands for an uncertainty.</summary>
    public static readonly FindingKind UncertaintyFromReadings = new("uncertainty-from-readings", Severity.Note,
        "The field's uncertainty is the spread of the readings alone.",
        "Readings at one place do not show what the gauge's own calibration and another place would add: the probability of conformance is too sure.",
        "Give the standard uncertainties of dry density and water content as a whole.",
        "JCGM 100:2008, 4.2.3 and 5.1.2: s/√n of each mean, carried to the first order");

    /// <summary>Within a guard band.</summary>
    public static readonly FindingKind WithinGuardBand = new("within-guard-band", Severity.Note,
        "A value lies within the guard band of its limit.",
        "At the stated risk it can be said neither that the requirement is met nor that it is missed.",
        "Make another test on the same lift, or find the water content by the oven, and decide on both.",
        "JCGM 106:2012, clause 8: guard band z(1 − risk)·u");

    /// <summary>The embedded laboratory test has no peak.</summary>
    public static readonly FindingKind ReferenceWithoutPeak = new("reference-without-peak", Severity.Error,
        "The laboratory test has no optimum.",
        "There is nothing to hold the field test against.",
        "See the laboratory test's own findings; adopt a peak with a reason, or make the specimens that are missing.",
        "An optimum is an interior maximum");

    /// <summary>Every kind, in the order of a review.</summary>
    public static IReadOnlyList<FindingKind> All { get; } =
    [
        ConeOverSand, NoVolume, ReferenceWithoutPeak, HoleTooSmall, SandDensityUnusual, RelativeCompactionHigh, FarFromOptimum,
        GaugeAndOvenApart, WaterContentMissing, ValueMissing, UncertaintyMissing, UncertaintyFromReadings, WithinGuardBand,
    ];
}
