using Drypeak.Soil.Laboratory.Review;

namespace Drypeak.Soil.Earthwork;

/// <summary>Every kind of finding on planning the work that no other job has, in one table.</summary>
public static class EarthworkFindingKinds
{
    private const string CommonPractice = "common practice, no source";

    /// <summary>A portion that is too wet.</summary>
    public static readonly FindingKind DryBack = new("dry-back", Severity.Warning,
        "A portion is wetter than its target: it has to be dried back.",
        "Drying changes some soils, heat more than air; a portion that was overdried is another soil.",
        "Dry it in air, mixing, until it weighs its final mass; or start from a drier portion.",
        "ASTM D698: drying in air, or below 60 °C (from memory)");

    /// <summary>Targets that rest on an estimate.</summary>
    public static readonly FindingKind TargetsProposed = new("targets-proposed", Severity.Note,
        "The targets were proposed around an expected optimum.",
        "The optimum is not known before the test: the estimate only places the specimens.",
        "Make the specimens, look at the curve, and add one where it is not bracketed.",
        "About 2 % apart, two dry and two wet: ASTM D698 (from memory)");

    /// <summary>Soil that is too wet.</summary>
    public static readonly FindingKind WaterToLose = new("water-to-lose", Severity.Warning,
        "The soil is wetter than it shall be when it is rolled.",
        "Rolled too wet it heaves, and its density is not reached.",
        "Scarify and turn it in dry weather, mix in drier soil, or stabilize; add no water.",
        "Water content above the target");

    /// <summary>More water than goes in at once.</summary>
    public static readonly FindingKind MuchWater = new("much-water", Severity.Warning,
        "More water is to be added than a lift takes up at once.",
        "It runs off or stays on top, and the lift is wet above and dry below.",
        "Wet the borrow area beforehand, or add it in passes with mixing between.",
        "Over 5 % of the dry mass: " + CommonPractice);

    /// <summary>A lift of an unusual thickness.</summary>
    public static readonly FindingKind LiftThicknessUnusual = new("lift-thickness-unusual", Severity.Warning,
        "The lift is thinner or thicker than lifts are.",
        "Most often the number is in another unit.",
        "Check the number and units.length.",
        "0.05 to 1 m: " + CommonPractice);

    /// <summary>Too little borrow.</summary>
    public static readonly FindingKind BorrowShort = new("borrow-short", Severity.Error,
        "The borrow areas hold less than the fill needs.",
        "Part of the fill has no soil.",
        "Open another area, or raise a capacity.",
        "Solids are neither lost nor gained");

    /// <summary>Borrow areas on both sides of the fill's water content.</summary>
    public static readonly FindingKind WaterBothWays = new("water-both-ways", Severity.Warning,
        "Some borrow areas are wetter than the fill shall be, and others drier.",
        "Their sum sets water to lose against water to add, as if all soil were mixed.",
        "Plan the water of each area by itself, or mix the soils in one lift.",
        "Water to add, summed over areas");

    /// <summary>A fill that takes more room than its borrow.</summary>
    public static readonly FindingKind FillLooserThanBorrow = new("fill-looser-than-borrow", Severity.Note,
        "The fill takes more room than its soil has in the bank.",
        "Rock and very dense soil bulk even when they are rolled; in other soils it hints at a wrong density.",
        "Check that both densities are of the same soil, and both dry.",
        "Dry density of the fill below the bank's");

    /// <summary>Loose soil denser than in the bank.</summary>
    public static readonly FindingKind LooseDenserThanBank = new("loose-denser-than-bank", Severity.Warning,
        "Loose, the soil would take less room than in the bank.",
        "Digging loosens soil.",
        "Check the loose density and its water content.",
        "Swell below 0");

    /// <summary>Soil that dries on the way.</summary>
    public static readonly FindingKind DriesInHaul = new("dries-in-haul", Severity.Note,
        "The soil is drier in the truck than in the bank.",
        "The water to add is counted from the bank.",
        "Add what dries out on the way as well, or give the borrow's water content as it arrives.",
        "Water content loose below the bank's");

    /// <summary>A truck's volume without a loose density.</summary>
    public static readonly FindingKind LooseDensityMissing = new("loose-density-missing", Severity.Note,
        "Loads cannot be counted by volume.",
        "A truck's volume is filled by loose soil, of which nothing is known.",
        "Give the loose density, or the swell.",
        "Loads by volume = loose volume over the truck's");

    /// <summary>A unit of volume that is not the earth's.</summary>
    public static readonly FindingKind BulkVolumeUnitNotGiven = new("bulk-volume-unit-not-given", Severity.Note,
        "A unit of volume was given, but none for volumes of earth.",
        "units.volume is the unit of molds and holes; earth is counted in units.bulkVolume, whose default is m3.",
        "Give units.bulkVolume.",
        "The interface's units");

    /// <summary>An area that is hardly a lift.</summary>
    public static readonly FindingKind AreaSmall = new("area-small", Severity.Warning,
        "The area is smaller than lifts are.",
        "Most often the number is in another unit.",
        "Check the numbers and units.length.",
        "Below 10 m²: " + CommonPractice);

    /// <summary>A roller that drives too fast.</summary>
    public static readonly FindingKind RollerFast = new("roller-fast", Severity.Warning,
        "The roller drives faster than rollers compact.",
        "Fast rolling compacts little; most often the number is in another unit.",
        "Check units.speed; prove speed and passes on a test strip.",
        "Over 12 km/h: " + CommonPractice);

    /// <summary>No efficiency.</summary>
    public static readonly FindingKind EfficiencyNotGiven = new("efficiency-not-given", Severity.Note,
        "No efficiency was given: roller, loader and trucks would work all of the hour.",
        "Turning, waiting and breaks take a part of every hour.",
        "Give it as a fraction: 50 minutes in the hour is 0.83.",
        CommonPractice);

    /// <summary>Too few numbers of passes.</summary>
    public static readonly FindingKind TooFewPasses = new("too-few-passes", Severity.Error,
        "The strip was tested at fewer than three numbers of passes.",
        "Two points do not show how growth slows down.",
        "Roll on and test after each two passes.",
        "A growth curve has three parameters");

    /// <summary>Too few readings at a stage.</summary>
    public static readonly FindingKind TooFewReadings = new("too-few-readings", Severity.Warning,
        "There are few readings after some number of passes.",
        "One place says little about a strip.",
        "Test at three places or more after each number of passes.",
        "Three readings: " + CommonPractice);

    /// <summary>Density that falls.</summary>
    public static readonly FindingKind DensityFalls = new("density-falls", Severity.Warning,
        "The density falls with more passes.",
        "The roller loosens or crushes what it has packed, or the lift's water changes.",
        "Stop before; check the water content and the places; repeat. What was read after the fall is left out of the curve.",
        "A fall of the mean over two standard errors and over the gain that counts: " + CommonPractice);

    /// <summary>No growth at all.</summary>
    public static readonly FindingKind NoGrowth = new("no-growth", Severity.Error,
        "The density does not grow with the passes.",
        "Nothing can be read from the strip.",
        "Check the readings; make another strip.",
        "Least squares gives no growth");

    /// <summary>Growth beyond the passes tried.</summary>
    public static readonly FindingKind StillGaining = new("still-gaining", Severity.Warning,
        "After the last passes tried, one more still gains the stated amount.",
        "The passes that are needed lie beyond the trial, where the curve is only a guess.",
        "Roll on, and test again.",
        "Gain of one pass more, by the growth curve");

    /// <summary>Every kind, in the order of the jobs.</summary>
    public static IReadOnlyList<FindingKind> All { get; } =
    [
        DryBack, TargetsProposed, WaterToLose, MuchWater, LiftThicknessUnusual, BorrowShort, WaterBothWays, FillLooserThanBorrow, LooseDenserThanBank, DriesInHaul,
        LooseDensityMissing, BulkVolumeUnitNotGiven, AreaSmall, RollerFast, EfficiencyNotGiven, TooFewPasses, TooFewReadings, DensityFalls, NoGrowth, StillGaining,
    ];
}
