using Drypeak.Soil.Curves;

namespace Drypeak.Soil.Laboratory;

/// <summary>What a laboratory compaction test says.</summary>
public sealed record MoistureDensityResult
{
    /// <summary>The specimens, in the order given.</summary>
    public required IReadOnlyList<Specimen> Specimens { get; init; }

    /// <summary>The curve through the specimens kept, or null where all were set aside.</summary>
    public required CurveAnalysis? Curve { get; init; }

    /// <summary>The measurements' uncertainties carried to the optimum, or null where none were given or there is no optimum.</summary>
    public PropagatedUncertainty? Propagated { get; init; }

    /// <summary>The peak corrected for oversize, or null where there is no peak, no oversize, or its specific gravity is unknown.</summary>
    public DensityAndWater? Corrected { get; init; }

    /// <summary>What a careful reviewer says, worst first.</summary>
    public required IReadOnlyList<Finding> Findings { get; init; }

    /// <summary>The fitted peak with all that is known of its uncertainty, or null where there is none.</summary>
    public FittedOptimum? Optimum => Curve?.Chosen.Optimum is { } fitted ? Propagated?.Widen(fitted) ?? fitted : null;
}
