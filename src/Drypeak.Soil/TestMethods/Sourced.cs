namespace Drypeak.Soil.TestMethods;

/// <summary>Where a value comes from, so that a reader can judge how far to trust it. Immutable, safe on any thread.</summary>
/// <param name="Origin">The standard or document, with the clause where it is known; never empty.</param>
/// <param name="Read">Whether the value was read in a source; else it is from memory or common practice, and waits for its check.</param>
public readonly record struct ValueSource(string Origin, bool Read)
{
    /// <summary>The origin, and the reservation where there is one: <c>ASTM D698 (from memory)</c>.</summary>
    public override string ToString() => Read ? Origin : $"{Origin} (from memory)";
}

/// <summary>One value of a test method with its source. Where a method leaves a value open, there is no <c>Sourced</c> at all (null).</summary>
/// <param name="Value">The value that the method asks for.</param>
/// <param name="Tolerance">What may be more or less; null where the method names none, which is not zero.</param>
/// <param name="Source">Where both come from.</param>
public sealed record Sourced<T>(T Value, T? Tolerance, ValueSource Source)
    where T : struct;
