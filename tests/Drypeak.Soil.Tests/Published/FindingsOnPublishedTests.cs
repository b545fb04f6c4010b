using Drypeak.Soil.Tests.Laboratory;
using Xunit;

namespace Drypeak.Soil.Tests.Published;

/// <summary>
/// The review of every published test, beside what a careful reviewer would say of it. Errors and warnings are listed here to the last;
/// notes are held by their own tests.
/// </summary>
public class FindingsOnPublishedTests
{
    public static TheoryData<string, string[]> Judged => new()
    {
        // Five points with a plain peak and specific gravity: nothing to object to.
        { "P02", [] },

        // One point wet of the peak, 7.5 % away: the wet leg is not known.
        { "P05", ["Warning few-on-a-side"] },

        // Densities of iron ore: the mold held about two liters. The tins of specimen 1 are 1.3 points apart. One point wet of the peak.
        { "P06", ["Error impossible-density", "Warning tins-disagree", "Warning few-on-a-side", "Warning specific-gravity-unusual"] },

        // The three wettest points hold more water than their voids.
        { "P09", ["Error above-zero-air-voids"] },

        // Eight points on a smooth curve.
        { "P10", [] },

        // Specimen 4 is 102 % saturated at the stated specific gravity; the textbook does not look. The steep curve itself is sound.
        { "P11", ["Error above-zero-air-voids"] },

        // An exercise of three points, one of them dry of the peak.
        { "P13", ["Warning too-few-specimens", "Warning few-on-a-side"] },

        // Half of the points above the line, and no single curve through the rest.
        { "P15", ["Error above-zero-air-voids", "Error two-peaks", "Warning optimum-at-edge", "Warning few-on-a-side"] },

        // A single specimen is no curve.
        { "P17c", ["Error too-few-specimens", "Error no-optimum"] },
    };

    [Theory]
    [MemberData(nameof(Judged))]
    public void A_published_test_gets_the_objections_of_a_careful_reviewer_and_no_others(string id, string[] objections)
    {
        var findings = Bench.Analyze(PublishedTests.Of(id)).Findings;
        foreach (var finding in findings)
        {
            TestContext.Current.TestOutputHelper!.WriteLine($"{finding.Severity,-7} {finding.Code} {finding.Place}: {finding.Message}");
        }

        Assert.Equal(
            objections,
            findings.Where(finding => finding.Severity != Severity.Note).Select(finding => $"{finding.Severity} {finding.Code}").Distinct());
    }

    [Fact]
    public void Every_published_test_has_been_judged() =>
        Assert.Equal(PublishedTests.All, Judged.Select(row => row.Data.Item1));
}
