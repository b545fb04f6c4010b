using Drypeak.Soil.Quantities;

namespace Drypeak.Soil.Laboratory;

/// <summary>
/// A length given as one number, as several readings whose mean counts, or as both, which must then agree. At least one of the two is
/// there. Equal where number and readings are. Immutable, safe on any thread.
/// </summary>
public sealed record MeasuredLength
{
    /// <summary>The one number, or null.</summary>
    public Length? Given { get; init; }

    /// <summary>The readings, or none.</summary>
    public IReadOnlyList<Length> Readings { get; init; } = [];

    /// <summary>Arithmetic mean of the readings; null without any.</summary>
    public Length? Mean => Readings.Count > 0 ? new Length(Readings.Average(reading => reading.Meters)) : null;

    /// <summary>What is reckoned with: the number given, else the mean.</summary>
    /// <exception cref="InvalidOperationException">There is neither.</exception>
    public Length Value => Given ?? Mean ?? throw new InvalidOperationException("A measured length without a number and without a reading.");

    /// <summary>A length given as one number.</summary>
    public static implicit operator MeasuredLength(Length length) => new() { Given = length };

    /// <summary>Whether both are given alike, reading by reading.</summary>
    public bool Equals(MeasuredLength? other) => other is not null && Given == other.Given && Readings.SequenceEqual(other.Readings);

    /// <inheritdoc/>
    public override int GetHashCode() => HashCode.Combine(Given, Readings.Count, Mean);
}
