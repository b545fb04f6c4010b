namespace Drypeak.Soil.Acceptance;

/// <summary>A test of a lot, already held against the specification of single tests. Immutable, safe on any thread.</summary>
public sealed record LotTest
{
    /// <summary>Its label, not repeated in the lot.</summary>
    public required string Label { get; init; }

    /// <summary>What is known of it.</summary>
    public required TestValues Values { get; init; }

    /// <summary>Each requirement.</summary>
    public IReadOnlyList<Judgement> Judgements { get; init; } = [];

    /// <summary>The outcome; null where nothing was required.</summary>
    public TestOutcome? Outcome { get; init; }

    /// <summary>Why it does not count, or null.</summary>
    public string? SetAside { get; init; }

    /// <summary>Label of the test that it was made again for, or null.</summary>
    public string? Replaces { get; init; }

    /// <summary>When it was made, or null.</summary>
    public DateTimeOffset? Time { get; init; }

    /// <summary>Along the work, m, or null.</summary>
    public double? Station { get; init; }

    /// <summary>Across the work, m, or null.</summary>
    public double? Offset { get; init; }

    /// <summary>Number of the lift, or null.</summary>
    public int? Lift { get; init; }

    /// <inheritdoc cref="TestValues.IsWetOfOptimums"/>
    public bool? IsWetOfOptimums => Values.IsWetOfOptimums;
}
