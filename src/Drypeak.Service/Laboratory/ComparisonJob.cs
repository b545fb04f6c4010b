using Drypeak.Service.Contracts;
using Drypeak.Soil.Laboratory;
using Drypeak.Soil.Quantities;

namespace Drypeak.Service.Laboratory;

/// <summary>Two tests of one soil from contract to contract.</summary>
internal sealed class ComparisonJob(MoistureDensityJob laboratory)
{
    private const int Tests = 2;

    /// <summary>Every broken rule; empty where the two can be compared.</summary>
    public IReadOnlyList<Fault> Check(ComparisonRequest request) => request.Tests switch
    {
        null => [new Fault("/tests", "missing-member", "It is missing. Give the two tests.")],
        { Count: not Tests } tests => [new Fault("/tests", "not-two", $"A comparison takes two tests; {tests.Count} were received.")],
        var tests => [.. tests.Within("/tests", laboratory.Check)],
    };

    /// <summary>Compares two tests that passed <see cref="Check"/>.</summary>
    public static ComparisonAnswer Compute(ComparisonRequest request)
    {
        var units = request.Tests![0].Units.ToUnitSet();
        var results = request.Tests.Select(MoistureDensityJob.Analyze).ToList();
        var comparison = results[0].Result.Optimum is { } first && results[1].Result.Optimum is { } second
            ? TestComparison.Of(first, second)
            : null;
        var agree = comparison is { Allowed: { } allowed } ? comparison.Difference.Within(allowed) : ((bool, bool)?)null;
        return new ComparisonAnswer
        {
            Units = units.ToContract(),
            Optima = [.. results.Select(item => item.Result.Optimum is { } optimum ? MoistureDensityJob.ToAnswer(optimum, item.Test with { Units = units }, item.Result.Propagated) : null)],
            Difference = comparison is null ? null : ToAnswer(comparison.Difference, units),
            Allowed = comparison?.Allowed is { } limit ? ToAnswer(limit, units) : null,
            Agree = ToAnswer(agree),
            Precision = [.. (comparison?.Statements ?? []).Select(statement => new PrecisionAnswer(
                statement.Conditions, ToAnswer(statement.Limit, units), ToAnswer(comparison!.Difference.Within(statement.Limit))!, statement.Basis))],
            Findings = [.. results.SelectMany((item, i) => item.Result.Findings.Select(finding => FindingContract.Of(finding with { Place = $"/tests/{i}{finding.Place}" })))],
            Provenance = ProvenanceContract.Of(request),
            Cautions = Cautions.OfLaboratoryTest,
        };
    }

    private static PeakDifferenceAnswer ToAnswer(PeakDifference difference, UnitSet units) =>
        new(difference.WaterContent * 100, new Density(difference.MaximumDryDensity).In(units.Density));

    private static AgreementAnswer? ToAnswer((bool WaterContent, bool MaximumDryDensity)? agree) =>
        agree is { } known ? new AgreementAnswer(known.WaterContent, known.MaximumDryDensity) : null;
}
