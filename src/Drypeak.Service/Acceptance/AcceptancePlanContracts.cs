using System.Text.Json.Serialization;
using Drypeak.Service.Contracts;

namespace Drypeak.Service.Acceptance;

/// <summary>A plan: rules and a number of tests. Tests are taken as normal about the lot's true mean.</summary>
public sealed record AcceptancePlanRequest
{
    /// <summary>One line that names the plan, up to 200 characters.</summary>
    /// <example>Ternmarsh, embankment fill</example>
    public string? Reference { get; init; }

    /// <summary>Units; densities among the limits and levels are in units.density.</summary>
    public UnitsContract? Units { get; init; }

    /// <summary>The rule; its quantity may be left out and is then the relative compaction. Either rule or rules.</summary>
    public LotRuleContract? Rule { get; init; }

    /// <summary>Several rules on one quantity, 1 to 20, all to be met by the same tests.</summary>
    public IReadOnlyList<LotRuleContract>? Rules { get; init; }

    /// <summary>Tests in the lot, 1 to 10,000; up to 1,000 where it is simulated. A design finds it.</summary>
    /// <example>6</example>
    public int? Count { get; init; }

    /// <summary>True standard deviation of single tests within a lot, in the quantity's unit, over 0.</summary>
    /// <example>2</example>
    [JsonRequired]
    public double? StandardDeviation { get; init; }

    /// <summary>True means of lots, in the quantity's unit, 1 to 200: where the curve is wanted. Default: 41 about the limits.</summary>
    /// <example>[93, 94, 95, 96, 97, 98, 99]</example>
    public IReadOnlyList<double>? Levels { get; init; }

    /// <summary>True mean of a lot that should be accepted: the producer's risk is to see it rejected.</summary>
    /// <example>98</example>
    public double? AcceptableLevel { get; init; }

    /// <summary>True mean of a lot that should be rejected: the consumer's risk is to see it accepted.</summary>
    /// <example>95</example>
    public double? RejectableLevel { get; init; }

    /// <summary>Whether the smallest number of tests is to be found, with the rule's number (limit, share or factor), that keeps two stated risks at the two levels. Default: false.</summary>
    /// <example>false</example>
    public bool? Design { get; init; }

    /// <summary>With a design: the greatest producer's risk, 0.0001 to 0.5. Default 0.05.</summary>
    /// <example>0.05</example>
    public double? ProducersRisk { get; init; }

    /// <summary>With a design: the greatest consumer's risk, 0.0001 to 0.5; the two together below 1. Default 0.1.</summary>
    /// <example>0.1</example>
    public double? ConsumersRisk { get; init; }

    /// <summary>With a design: the most tests to think of, 1 to 10,000. Default 1,000.</summary>
    /// <example>1000</example>
    public int? MostTests { get; init; }

    /// <summary>Seed of the random numbers where it is simulated, 0 to 2,147,483,647. Default 1.</summary>
    /// <example>1</example>
    public int? Seed { get; init; }

    /// <summary>Lots to simulate at each level, where it is simulated: 100,000 to 1,000,000. Default 100,000.</summary>
    /// <example>100000</example>
    public int? Trials { get; init; }
}

/// <summary>What a plan risks.</summary>
public sealed record AcceptancePlanAnswer
{
    /// <summary>As in the request.</summary>
    /// <example>Ternmarsh, embankment fill</example>
    public string? Reference { get; init; }

    /// <summary>All units that were used.</summary>
    public required UnitsContract Units { get; init; }

    /// <summary>The rules, in the order of the request; a design's with the number that it found.</summary>
    public required IReadOnlyList<LotRuleContract> Rules { get; init; }

    /// <summary>Tests in the lot, as given or found; null where a design found none.</summary>
    /// <example>6</example>
    public int? Count { get; init; }

    /// <summary>The operating characteristic, in the order of the levels; empty where a design found nothing.</summary>
    public required IReadOnlyList<AcceptanceAnswer> Curve { get; init; }

    /// <summary>Probability of rejecting a lot at the acceptable level; null without one.</summary>
    /// <example>0.041</example>
    public double? ProducersRisk { get; init; }

    /// <summary>Probability of accepting a lot at the rejectable level; null without one.</summary>
    /// <example>0.093</example>
    public double? ConsumersRisk { get; init; }

    /// <summary>"exact" by theory, or "simulated".</summary>
    /// <example>exact</example>
    public required string Computed { get; init; }

    /// <summary>Lots simulated at each level; null where it is exact.</summary>
    /// <example>100000</example>
    public int? Trials { get; init; }

    /// <summary>Seed of the random numbers; null where it is exact.</summary>
    /// <example>1</example>
    public int? Seed { get; init; }

    /// <summary>Who carries which risk, in a sentence or two.</summary>
    /// <example>The contractor carries a risk of 4.1 %: …</example>
    public required string Explanation { get; init; }

    /// <summary>What a careful reviewer says, worst first.</summary>
    public required IReadOnlyList<FindingContract> Findings { get; init; }

    /// <summary>What to bear in mind.</summary>
    public required IReadOnlyList<string> Cautions { get; init; }

    /// <summary>Addresses of the picture of the operating characteristic.</summary>
    public required LinksContract Links { get; init; }

    /// <summary>Version and digest.</summary>
    public required ProvenanceContract Provenance { get; init; }
}

/// <summary>A point of the operating characteristic.</summary>
/// <param name="Level" example="96">True mean of the lot.</param>
/// <param name="ProbabilityOfAcceptance" example="0.62">0 to 1.</param>
/// <param name="StandardError" example="0.0015">Of a simulated probability; 0 where it is exact.</param>
public sealed record AcceptanceAnswer(double Level, double ProbabilityOfAcceptance, double StandardError);
