using Drypeak.Soil.Acceptance.ControlCharts;
using Drypeak.Soil.Acceptance.LotRules;
using Drypeak.Soil.FieldDensity;
using Drypeak.Soil.Quantities;

namespace Drypeak.Soil.Acceptance;

/// <summary>A lot: tests of one stretch of work that are accepted or rejected together. Immutable, safe on any thread.</summary>
public sealed record Lot
{
    /// <summary>The tests, as they were given; 1 or more.</summary>
    public required IReadOnlyList<LotTest> Tests { get; init; }

    /// <summary>The rules of the lot; empty: every test must be accepted.</summary>
    public IReadOnlyList<LotRule> Rules { get; init; } = [];

    /// <summary>The control chart that is wanted, or null.</summary>
    public ControlChartPlan? ControlChart { get; init; }

    /// <summary>The compaction window, or null.</summary>
    public CompactionWindow? Window { get; init; }

    /// <summary>The lot's own reference, specific gravity and water, without a soil: for the window's polygon.</summary>
    public required JudgedSoil Reference { get; init; }

    /// <summary>Share of the lot that its tolerance intervals hold.</summary>
    public double ToleranceFraction { get; init; } = 0.9;

    /// <summary>Confidence of its tolerance intervals.</summary>
    public double ToleranceConfidence { get; init; } = 0.95;

    /// <summary>The units that texts speak.</summary>
    public UnitSet Units { get; init; } = new();
}
