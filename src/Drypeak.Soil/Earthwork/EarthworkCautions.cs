using Drypeak.Soil.Laboratory;

namespace Drypeak.Soil.Earthwork;

/// <summary>The cautions that go with a plan of the work.</summary>
public static class EarthworkCautions
{
    /// <summary>For the water of specimens.</summary>
    public static IReadOnlyList<string> OfSpecimens { get; } =
    [
        .. Cautions.OfArithmetic,
        "Dry soil for specimens in air, or below 60 °C, and only until it weighs what it shall: soil that was oven-dried does not take up water as before (ASTM D698, from memory).",
        "Let wetted portions stand closed until the water is even: about 3 hours for silty sands and gravels, 16 hours for silts and clays (ASTM D698, from memory).",
    ];

    /// <summary>For the water of a lift.</summary>
    public static IReadOnlyList<string> OfLift { get; } =
    [
        .. Cautions.OfArithmetic,
        "Keep people away from tankers and mixers at work; draw and spill water only as permits allow.",
    ];

    /// <summary>For quantities and haulage.</summary>
    public static IReadOnlyList<string> OfQuantities { get; } =
    [
        .. Cautions.OfArithmetic,
        "Load trucks by their plate and by the road's limits, whatever is computed here.",
        "Volumes by survey decide on payment; the soil of a borrow area varies.",
    ];

    /// <summary>For a test programme.</summary>
    public static IReadOnlyList<string> OfTestProgramme { get; } =
    [
        .. Cautions.OfArithmetic,
        "Random locations come in addition to tests where the eye doubts; keep the seed with the records.",
        "Stand on a lift only while no plant works there; locate buried services before a hole is dug.",
    ];

    /// <summary>For rollers.</summary>
    public static IReadOnlyList<string> OfRollers { get; } =
    [
        .. Cautions.OfArithmetic,
        "Keep people out of a roller's way, and rollers away from edges; vibration can harm structures and buried services.",
    ];
}
