namespace Drypeak.Figures;

/// <summary>Kinds of lines through states of equal air.</summary>
public enum PhaseLineKind
{
    /// <summary>No air at all: saturation of 100 %.</summary>
    ZeroAirVoids,
    /// <summary>Equal degree of saturation.</summary>
    Saturation,
    /// <summary>Equal share of air in the total volume.</summary>
    AirVoids,
}

/// <summary>Names of the kinds.</summary>
public static class PhaseLineKindNames
{
    /// <summary>Every kind.</summary>
    public static IReadOnlyList<PhaseLineKind> All { get; } = Enum.GetValues<PhaseLineKind>();

    /// <summary>Its name in an address, and its class in SVG: lower case, words joined by a hyphen.</summary>
    public static string Name(this PhaseLineKind kind) => kind switch
    {
        PhaseLineKind.ZeroAirVoids => "zero-air-voids",
        PhaseLineKind.Saturation => "saturation",
        PhaseLineKind.AirVoids => "air-voids",
        _ => throw new ArgumentOutOfRangeException(nameof(kind)),
    };
}
