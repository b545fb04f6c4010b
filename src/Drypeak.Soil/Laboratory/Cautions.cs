namespace Drypeak.Soil.Laboratory;

/// <summary>The cautions that go with a laboratory result.</summary>
public static class Cautions
{
    /// <summary>For every result.</summary>
    public static IReadOnlyList<string> OfArithmetic { get; } =
    [
        "This is arithmetic on the data given. Acceptance belongs to the engineer responsible and to the contract.",
        "Local codes, the current edition of the standard and licensed practice come first.",
    ];

    /// <summary>For every compaction test.</summary>
    public static IReadOnlyList<string> OfLaboratoryTest { get; } = [.. OfArithmetic, OfOven];

    /// <summary>Where soil was dried in an oven.</summary>
    public const string OfOven = "Ovens and hot tins burn.";

    /// <summary>Where a hole was dug.</summary>
    public const string OfExcavation = "Enter excavations and test pits only by the site's safety rules.";

    /// <summary>Where a nuclear gauge was used.</summary>
    public const string OfNuclearGauge = "A nuclear gauge is for licensed operators who wear their badge.";

    /// <summary>Where a carbide tester was used.</summary>
    public const string OfCarbideTester = "Calcium carbide and water make a flammable gas: release it outdoors, away from flames and sparks.";
}
