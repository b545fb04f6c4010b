namespace Drypeak.Soil;

/// <summary>How much a finding weighs.</summary>
public enum Severity
{
    /// <summary>The test or the result cannot stand as it is.</summary>
    Error,
    /// <summary>A careful reviewer would stop here and ask.</summary>
    Warning,
    /// <summary>Good to know.</summary>
    Note,
}

/// <summary>What a careful reviewer says about a test: about numbers that are each possible, but not together, or not likely.</summary>
/// <param name="Code">Stable code, such as <c>above-zero-air-voids</c>.</param>
/// <param name="Severity">How much it weighs.</param>
/// <param name="Message">A sentence with the numbers in it, and what to do.</param>
/// <param name="Place">JSON pointer (RFC 6901) to the place in the request; empty for the whole.</param>
/// <param name="Basis">The rule and its source.</param>
public sealed record Finding(string Code, Severity Severity, string Message, string Place, string Basis);
