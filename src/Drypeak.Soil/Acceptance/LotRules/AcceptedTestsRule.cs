namespace Drypeak.Soil.Acceptance.LotRules;

/// <summary>Every test of the lot is accepted by the specification of single tests.</summary>
public sealed record AcceptedTestsRule : LotRule
{
    /// <inheritdoc/>
    public override string Code => "every-test";

    /// <inheritdoc/>
    public override string Basis => "Every test accepted by the specification; outcome of a test as under ISO/IEC 17025:2017, 7.8.6";

    /// <inheritdoc/>
    internal override LotJudgement Judge(LotSample sample)
    {
        var tests = sample.Tests;
        var rejected = Labelled(tests, TestOutcome.Rejected);
        var undecided = Labelled(tests, TestOutcome.Undecided);
        var accepted = tests.Count - rejected.Count - undecided.Count;
        var start = $"{accepted} of {tests.Count} tests are accepted";
        return tests.Count == 0
            ? new LotJudgement(this, null, null, Conformance.Undecided, "No test counts: all are set aside. Make tests.")
            : new LotJudgement(this, accepted, tests.Count,
                rejected.Count > 0 ? Conformance.NotMet : undecided.Count > 0 ? Conformance.Undecided : Conformance.Met,
                start + (rejected.Count > 0 ? $"; {Labels.Listed(rejected, "test")} {(rejected.Count == 1 ? "is" : "are")} rejected." : undecided.Count > 0 ? $"; {Labels.Listed(undecided, "test")} {(undecided.Count == 1 ? "is" : "are")} undecided: see the test's own requirements." : "."));
    }

    private static List<string> Labelled(IReadOnlyList<LotTest> tests, TestOutcome outcome) =>
        [.. tests.Where(test => test.Outcome == outcome).Select(test => test.Label)];
}
