using Drypeak.Soil.Quantities;

namespace Drypeak.Soil.Acceptance.LotRules;

/// <summary>A share of the tests lies on the line of optimums or wet of it: their saturation is not below that at the laboratory's optimum.</summary>
/// <param name="Required">A fraction, 0 to 1.</param>
public sealed record WetOfOptimumsRule(double Required) : LotRule
{
    /// <inheritdoc/>
    public override string Code => "wet-of-line-of-optimums";

    /// <inheritdoc/>
    public override string Basis => "C. H. Benson, D. E. Daniel, G. P. Boutwell, Field performance of compacted clay liners, J. Geotech. Geoenviron. Eng. 125 (1999): compaction primarily wet of the line of optimums";

    /// <inheritdoc/>
    public override bool GivesShare => true;

    /// <inheritdoc/>
    internal override LotJudgement Judge(LotSample sample)
    {
        var known = sample.Tests.Where(test => test.IsWetOfOptimums is { }).ToList();
        IReadOnlyList<string> missing = [.. sample.Tests.Where(test => test.IsWetOfOptimums is null).Select(test => test.Label)];
        if (ShareOf(sample.Tests) is not { } share)
        {
            return new LotJudgement(this, null, Required, Conformance.Undecided,
                "No test can be held against the line of optimums. Give water contents, densities, the specific gravity, and the laboratory's optimum and maximum.")
            { Missing = missing };
        }

        var sentence = $"{known.Count(test => test.IsWetOfOptimums is true)} of {known.Count} tests lie on the line of optimums or wet of it: {ReaderText.Percent(share)}, where {ReaderText.Percent(Required)} is required.";
        return missing.Count == 0
            ? new LotJudgement(this, share, Required, share >= Required * (1 - 1e-9) ? Conformance.Met : Conformance.NotMet, sentence)
            : new LotJudgement(this, share, Required, Conformance.Undecided,
                $"{sentence} {Labels.Listed(missing, "test")} cannot be held against it, so that the rule stays undecided.")
            { Missing = missing };
    }

    /// <summary>The share among the tests that can be held against the line; null where none can.</summary>
    internal static double? ShareOf(IEnumerable<LotTest> tests)
    {
        var known = tests.Select(test => test.IsWetOfOptimums).OfType<bool>().ToList();
        return known.Count == 0 ? null : known.Count(wet => wet) / (double)known.Count;
    }
}
