namespace Drypeak.Soil.Laboratory.Review;

/// <summary>A kind of finding: what it means, why it matters, what to do, and on what rule it stands.</summary>
/// <param name="Code">Stable code.</param>
/// <param name="Severity">Its usual severity; a finding says its own.</param>
/// <param name="Meaning">What it means.</param>
/// <param name="Why">Why it matters.</param>
/// <param name="Remedy">What to do.</param>
/// <param name="Basis">The rule and its source.</param>
public sealed record FindingKind(string Code, Severity Severity, string Meaning, string Why, string Remedy, string Basis)
{
    /// <summary>A finding of this kind.</summary>
    /// <param name="place">JSON pointer.</param>
    /// <param name="message">The sentence with the numbers.</param>
    /// <param name="severity">Its severity where it is not the usual one.</param>
    /// <param name="basis">The very clause that it stands on, where a method names one.</param>
    public Finding At(string place, string message, Severity? severity = null, string? basis = null) => new(Code, severity ?? Severity, message, place, basis ?? Basis);
}

/// <summary>Every kind of finding on a laboratory test, in one table.</summary>
public static class FindingKinds
{
    private const string CommonPractice = "common practice, no source";
    private const string PhaseRelation = "Phase relations: no air less than none";

    /// <summary>Fewer specimens than a curve needs.</summary>
    public static readonly FindingKind TooFewSpecimens = new("too-few-specimens", Severity.Warning,
        "There are fewer specimens than the method asks for.",
        "With few points the peak is a guess: a curve can always be drawn, and little speaks against it.",
        "Make more specimens, two on each side of the expected optimum.",
        "ASTM D698 and D1557: at least four, preferably five (from memory); the method's own number where it names one");

    /// <summary>A side of the optimum without two specimens.</summary>
    public static readonly FindingKind FewOnASide = new("few-on-a-side", Severity.Warning,
        "Fewer than two specimens stand on one side of the optimum.",
        "That leg of the curve is hardly known, and with it the peak.",
        "Make another specimen on that side.",
        "ASTM D698 and D1557: two dry and two wet of the optimum (from memory)");

    /// <summary>Neighbors too far apart.</summary>
    public static readonly FindingKind WideSpacing = new("wide-spacing", Severity.Warning,
        "Two neighboring water contents are further apart than the method allows.",
        "Between them the curve is not held by anything, and the peak may lie there.",
        "Make a specimen between the two.",
        "ASTM D698 and D1557: about 2 % apart and not over 4 % (from memory); the method's own spacing where it names one");

    /// <summary>No peak within the tested range.</summary>
    public static readonly FindingKind NoOptimum = new("no-optimum", Severity.Error,
        "The points show no maximum within the tested water contents.",
        "A curve that only rises or only falls has its peak elsewhere: no optimum can be given.",
        "Make specimens on the side that is missing until dry density has fallen.",
        "An optimum is an interior maximum; none is given when the chance of a peak outside the tested range is over one half");

    /// <summary>The peak may lie outside the tested range.</summary>
    public static readonly FindingKind OptimumAtEdge = new("optimum-at-edge", Severity.Warning,
        "The peak may well lie outside the tested water contents.",
        "Close to the last specimen the peak is not bracketed: the optimum and its interval can mislead.",
        "Make another specimen beyond that end.",
        "Chance of a peak outside the tested range over 0.15");

    /// <summary>A point above the zero-air-voids line.</summary>
    public static readonly FindingKind AboveZeroAirVoids = new("above-zero-air-voids", Severity.Error,
        "A point lies above the zero-air-voids line: more water than the voids can hold.",
        "No soil does that. A mass, the mold's volume, a water content or the specific gravity is wrong.",
        "Check the weighings of that specimen, the mold and the specific gravity.",
        PhaseRelation + "; ASTM D698: no point lies above or to the right of the line (from memory)");

    /// <summary>A dry density that no soil has.</summary>
    public static readonly FindingKind ImpossibleDensity = new("impossible-density", Severity.Error,
        "A dry density is far from anything a compacted soil has.",
        "A volume or a mass is wrong or in another unit, and everything after it too.",
        "Check the mold's volume, the masses and the units.",
        "Compacted soil lies between about 300 and 2,800 kg/m³: " + CommonPractice);

    /// <summary>Denser than its own solids.</summary>
    public static readonly FindingKind DensityAboveSolids = new("density-above-solids", Severity.Error,
        "A dry density is not below the density of the solids.",
        "The voids would have no volume.",
        "Check the specific gravity, the volume and the masses.",
        PhaseRelation + ": ρd < Gs·ρw");

    /// <summary>An unusual specific gravity.</summary>
    public static readonly FindingKind SpecificGravityUnusual = new("specific-gravity-unusual", Severity.Warning,
        "The specific gravity is outside what mineral soils have.",
        "Void ratio, saturation and the zero-air-voids line rest on it.",
        "Check the value; keep it if the soil is organic, or holds heavy minerals.",
        "Mineral soils lie between 2.2 and 3.2: " + CommonPractice);

    /// <summary>An assumed specific gravity.</summary>
    public static readonly FindingKind SpecificGravityAssumed = new("specific-gravity-assumed", Severity.Note,
        "The specific gravity is assumed, not measured.",
        "Void ratio, saturation and the lines are only as good as the assumption.",
        "Measure it where the result hangs on saturation.",
        "ASTM D854 measures it; " + CommonPractice);

    /// <summary>No specific gravity.</summary>
    public static readonly FindingKind SpecificGravityMissing = new("specific-gravity-missing", Severity.Note,
        "No specific gravity was given.",
        "Without it there are no saturations, no lines, no saturation model, and no check against the zero-air-voids line.",
        "Give it, marked as assumed if it was not measured.",
        PhaseRelation);

    /// <summary>A value in another unit.</summary>
    public static readonly FindingKind MixedUnits = new("mixed-units", Severity.Error,
        "A value is out of line with its neighbors by the factor between two units.",
        "It was most likely written in another unit than the rest.",
        "Write all values of a kind in the unit that the request names.",
        "Ratio near 1000, 453.6 or 62.4 to the median of the other specimens");

    /// <summary>Fractions where percent are asked.</summary>
    public static readonly FindingKind FractionsForPercent = new("fractions-for-percent", Severity.Error,
        "All water contents are below 1 %.",
        "They look like fractions; water contents are given in percent.",
        "Multiply them by 100.",
        "No compaction test is run below 1 % water throughout: " + CommonPractice);

    /// <summary>The same readings twice.</summary>
    public static readonly FindingKind RepeatedValues = new("repeated-values", Severity.Warning,
        "The same readings stand in two places.",
        "Two weighings seldom agree to the last digit: one was probably typed twice.",
        "Compare with the sheet.",
        CommonPractice);

    /// <summary>An engineer's own peak.</summary>
    public static readonly FindingKind PeakAdopted = new("peak-adopted", Severity.Note,
        "An engineer's own peak is reported in place of the fitted one.",
        "A reader must see that it is a judgement, and how far it is from the fit.",
        "Read the reason; ask where the difference is large against the uncertainty.",
        "The fitted peak and its standard uncertainty");

    /// <summary>A wet leg that does not follow the zero-air-voids line.</summary>
    public static readonly FindingKind WetLegNotParallel = new("wet-leg-not-parallel", Severity.Note,
        "The wet leg is not roughly parallel to the zero-air-voids line.",
        "Wet of the optimum the air voids hardly change. A leg that crosses them hints at a wrong water content or density.",
        "Check the wettest specimens and the specific gravity.",
        "Slope of the wet leg between one third and three times the line's; ASTM D698: roughly parallel (from memory)");

    /// <summary>An unusual saturation at the optimum.</summary>
    public static readonly FindingKind SaturationAtOptimumUnusual = new("saturation-at-optimum-unusual", Severity.Note,
        "The degree of saturation at the optimum is unusual.",
        "Most soils have their optimum between 75 and 95 % saturation.",
        "Check the specific gravity and the mold's volume.",
        "75 to 95 %: " + CommonPractice);

    /// <summary>Points that follow no single curve.</summary>
    public static readonly FindingKind TwoPeaks = new("two-peaks", Severity.Error,
        "The points do not rise once and then fall.",
        "No single-peaked curve goes through them; a point is wrong, or the soil has two peaks.",
        "Look for a specimen that does not belong, or repeat the test.",
        "Distance to the nearest sequence with one peak over 20 kg/m³ (isotonic least squares)");

    /// <summary>One point off the curve of the others.</summary>
    public static readonly FindingKind PointFarOff = new("point-far-off", Severity.Warning,
        "A point is far from what the others say.",
        "It pulls the curve, and with it the optimum.",
        "Check its weighings; make it again; set it aside only with a reason.",
        "Leave-one-out prediction: from six points on, off by over three standard uncertainties; among fewer, an inner point off by over 60 kg/m³ and 2.5 of them");

    /// <summary>Tins that disagree.</summary>
    public static readonly FindingKind TinsDisagree = new("tins-disagree", Severity.Warning,
        "The tins of one specimen disagree.",
        "The specimen was not mixed well, or a tin was misread.",
        "Check the weighings; leave a bad tin out with a reason on the sheet.",
        "Apart by over 1 percentage point and over 7.8 % of the mean: ASTM D2216 single-operator precision (from memory)");

    /// <summary>A mold outside its tolerance.</summary>
    public static readonly FindingKind MoldOutsideTolerance = new("mold-outside-tolerance", Severity.Warning,
        "The mold is outside the method's tolerance.",
        "Effort and volume are not those of the method.",
        "Calibrate the mold; check volume and unit.",
        "The method's tolerance on volume, diameter and height; where none is at hand, a volume more than 2 % off is noted (common practice, no source)");

    /// <summary>Particles too large for the method.</summary>
    public static readonly FindingKind ParticlesAboveLimit = new("particles-above-limit", Severity.Warning,
        "The material has more large particles than the method allows.",
        "Large particles in a small mold bridge and leave voids.",
        "Use the method for coarser material, or remove and correct for them.",
        "The method's limit on particles");

    /// <summary>More oversize than the correction is valid for.</summary>
    public static readonly FindingKind OversizeAboveLimit = new("oversize-above-limit", Severity.Warning,
        "The share of oversize is above the limit of the correction.",
        "The corrected values are computed, but outside the procedure.",
        "Use a larger mold, or a method for such material.",
        "ASTM D4718: up to 40 % on 4.75 mm, 30 % on 19 mm; the method's own limit where it names one");

    /// <summary>A correction for oversize that the method does not have.</summary>
    public static readonly FindingKind OversizeOutsideMethod = new("oversize-outside-method", Severity.Note,
        "The method has no procedure for oversize, or parts the oversize at another sieve.",
        "The corrected values are no result of that method, whatever they are by themselves.",
        "Agree on the correction with who asked for the test, and report it as outside the method.",
        "The method's own procedure; ASTM D4718 and AASHTO T 99 annex / T 224 for the correction");

    /// <summary>Oversize without a correction.</summary>
    public static readonly FindingKind OversizeNotCorrected = new("oversize-not-corrected", Severity.Warning,
        "Oversize above 5 % was not corrected for.",
        "The field's total material is denser than the fines that were tested.",
        "Give the bulk specific gravity of the oversize.",
        "ASTM D4718: correction above 5 % unless the agency says otherwise");

    /// <summary>Oversize below what needs a correction.</summary>
    public static readonly FindingKind OversizeSmall = new("oversize-small", Severity.Note,
        "The share of oversize is below 5 %.",
        "The standards ask for no correction; it is computed all the same.",
        "Use the uncorrected values unless the agency asks for the corrected ones.",
        "ASTM D4718: correction above 5 % unless the agency says otherwise");

    /// <summary>Models that disagree.</summary>
    public static readonly FindingKind ModelsDisagree = new("models-disagree", Severity.Note,
        "The candidate curves have their peaks far apart.",
        "The choice of the curve matters here; the points do not settle it.",
        "Make the suggested specimen.",
        "Admissible optima over 0.5 % water or 20 kg/m³ apart");

    /// <summary>A specimen set aside.</summary>
    public static readonly FindingKind SpecimenSetAside = new("specimen-set-aside", Severity.Note,
        "A specimen was set aside.",
        "It is reported and drawn, not fitted.",
        "Read the reason.",
        "Data are kept; what is not used is said");

    /// <summary>No method named.</summary>
    public static readonly FindingKind MethodNotGiven = new("method-not-given", Severity.Note,
        "No test method was named.",
        "Nothing of a method was checked: mold, effort, spacing, particles, reporting.",
        "Name the method.",
        "The catalogue of test methods");

    /// <summary>An effort beyond the tests of a series.</summary>
    public static readonly FindingKind EffortOutsideRange = new("effort-outside-range", Severity.Warning,
        "An effort lies beyond the tests of the series.",
        "The line of optimums is only known between the tests; beyond them it is a guess.",
        "Make a test at that effort, or one beyond it.",
        "Interpolation over the logarithm of effort: " + CommonPractice);

    /// <summary>Every kind, in the order of a review.</summary>
    public static IReadOnlyList<FindingKind> All { get; } =
    [
        MixedUnits, FractionsForPercent, ImpossibleDensity, DensityAboveSolids, AboveZeroAirVoids, TwoPeaks, NoOptimum,
        OptimumAtEdge, TooFewSpecimens, FewOnASide, WideSpacing, PointFarOff, TinsDisagree, RepeatedValues,
        SpecificGravityUnusual, MoldOutsideTolerance, ParticlesAboveLimit, OversizeAboveLimit, OversizeOutsideMethod, OversizeNotCorrected,
        WetLegNotParallel, SaturationAtOptimumUnusual, ModelsDisagree, PeakAdopted, OversizeSmall,
        SpecificGravityAssumed, SpecificGravityMissing, SpecimenSetAside, MethodNotGiven, EffortOutsideRange,
    ];
}
