using Drypeak.Soil.Laboratory.Review;

namespace Drypeak.Soil.Acceptance;

/// <summary>Every kind of finding on a lot or a plan that a single test does not have, in one table.</summary>
public static class LotFindingKinds
{
    internal const string CommonPractice = "common practice, no source";

    /// <summary>A rule with fewer tests than it needs.</summary>
    public static readonly FindingKind TooFewTests = new("too-few-tests", Severity.Warning,
        "There are fewer tests than a rule or a chart of the lot needs.",
        "A spread cannot be told from one test, a share of a lot not from two: the rule stays undecided.",
        "Make more tests at random places of the lot, or decide by a rule that needs fewer.",
        "Percent within limits: n ≥ 3 (FHWA T 5080.12); a standard deviation: n ≥ 2");

    /// <summary>Tests without a quantity that a rule needs.</summary>
    public static readonly FindingKind QuantityMissing = new("quantity-missing", Severity.Warning,
        "Some tests of the lot have no value of a quantity that a rule, the chart or the window looks at.",
        "A decision that passes over tests in silence is open to choice: the rule stays undecided.",
        "Give the value or what it follows from, or set the test aside with a reason.",
        "Every test that counts takes part in every rule: " + CommonPractice);

    /// <summary>All values equal.</summary>
    public static readonly FindingKind NoSpread = new("no-spread", Severity.Warning,
        "All values of a lot are equal, so that its standard deviation is 0.",
        "Soil does not do that: most likely one result was copied, or the values were rounded away.",
        "Compare with the field sheets.",
        CommonPractice);

    /// <summary>Tests set aside.</summary>
    public static readonly FindingKind TestsSetAside = new("tests-set-aside", Severity.Note,
        "Tests of the lot were set aside; they are shown and do not count.",
        "Who may leave out tests may choose the outcome: the reason has to hold without looking at the result.",
        "Look at the reasons.",
        CommonPractice);

    /// <summary>Tests replaced.</summary>
    public static readonly FindingKind TestsReplaced = new("tests-replaced", Severity.Note,
        "Tests of the lot were replaced by retests; both are shown, and the retest counts.",
        "Testing again until it passes accepts poor work: a retest follows on rework, not on a poor result.",
        "See that the lift was reworked, or the first test was faulty.",
        CommonPractice);

    /// <summary>Nothing left.</summary>
    public static readonly FindingKind NoTestCounts = new("no-test-counts", Severity.Error,
        "No test of the lot counts.",
        "All are set aside or replaced, so that nothing can be decided.",
        "Make tests, or look at the reasons again.",
        CommonPractice);

    /// <summary>Findings on single tests.</summary>
    public static readonly FindingKind TestsHaveFindings = new("tests-have-findings", Severity.Note,
        "Single tests of the lot have findings of their own.",
        "A lot is as good as its tests.",
        "Read them at the tests.",
        "The findings of each test");

    /// <summary>A specification of a test beside the lot's.</summary>
    public static readonly FindingKind OwnSpecificationUnused = new("own-specification-unused", Severity.Note,
        "Field tests of the lot bring a specification of their own, and the lot has one too.",
        "The lot's is held against every test; the test's own is not looked at.",
        "Leave one of the two out.",
        "One specification for a lot: " + CommonPractice);

    /// <summary>Out of control.</summary>
    public static readonly FindingKind OutOfControl = new("out-of-control", Severity.Warning,
        "The control chart signals.",
        "Something changed along the work beyond the usual scatter: soil, water, roller or tester.",
        "Look for the cause at the first signal before the next lift.",
        "The chart's own source and run rules");

    /// <summary>A trend.</summary>
    public static readonly FindingKind TrendFound = new("trend", Severity.Note,
        "A result changes along the stations or the lifts by more than its scatter explains.",
        "The lot is then not one population, and a mean or a share of it speaks for no part of it.",
        "Look at the map; split the lot where the work changed.",
        "Least squares; the 95 % interval of the slope leaves out 0");

    /// <summary>A window without room.</summary>
    public static readonly FindingKind WindowEmpty = new("window-empty", Severity.Error,
        "The edges of the compaction window leave no room.",
        "No soil can lie inside.",
        "Compare the edges with the laboratory's values.",
        "Daniel and Benson 1990: the window is what all edges leave");

    /// <summary>No polygon.</summary>
    public static readonly FindingKind WindowNotDrawn = new("window-not-drawn", Severity.Note,
        "The compaction window has no polygon.",
        "Its edges do not close, or need the lot's own reference or specific gravity.",
        "Give specificGravity, laboratory, or an edge on the open side.",
        "Daniel and Benson 1990");

    /// <summary>Outside the window.</summary>
    public static readonly FindingKind OutsideWindow = new("outside-window", Severity.Warning,
        "Tests lie outside the compaction window.",
        "The window was drawn for a property, such as a low conductivity: outside it that property is not shown.",
        "Rework the lift at these tests by what the crossed edge says.",
        "Daniel and Benson 1990");

    /// <summary>No plan found.</summary>
    public static readonly FindingKind RiskNotMet = new("risk-not-met", Severity.Warning,
        "No plan keeps both stated risks within the number of tests allowed.",
        "The two levels lie too near to each other for the scatter, or the rule tells them apart badly.",
        "Allow more risk, set the levels further apart, reduce the scatter, or take another rule.",
        "Operating characteristic of the rule");

    /// <summary>A limit that the design replaced.</summary>
    public static readonly FindingKind LimitDesigned = new("limit-designed", Severity.Note,
        "The rule gave a number that the design finds itself.",
        "The one found takes its place in the answer.",
        "Compare the two.",
        "Operating characteristic of the rule");

    /// <summary>Levels the wrong way round for the rule.</summary>
    public static readonly FindingKind LevelsOnOneSide = new("levels-on-one-side", Severity.Warning,
        "The rejectable level is accepted at least as often as the acceptable one.",
        "The rule does not tell the two levels apart as they are meant.",
        "Check levels and limits; were the two exchanged?",
        "Operating characteristic of the rule");

    /// <summary>Every kind, in the order of a review.</summary>
    public static IReadOnlyList<FindingKind> All { get; } =
    [
        NoTestCounts, WindowEmpty, TooFewTests, QuantityMissing, NoSpread, OutOfControl, OutsideWindow, RiskNotMet, LevelsOnOneSide, TrendFound,
        TestsSetAside, TestsReplaced, TestsHaveFindings, OwnSpecificationUnused, WindowNotDrawn, LimitDesigned,
    ];
}
