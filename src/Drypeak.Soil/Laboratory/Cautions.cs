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
    public static IReadOnlyList<string> OfLaboratoryTest { get; } = [.. OfArithmetic, "Ovens and hot tins burn."];

    /// <summary>Where a carbide tester was used.</summary>
    public const string OfCarbideTester = "Calcium carbide and water make a flammable gas: release it outdoors, away from flames and sparks.";
}
