namespace Drypeak.Soil;

/// <summary>Why a request cannot be computed, at one place.</summary>
/// <param name="Place">JSON pointer (RFC 6901) to the place in the request; empty for the whole.</param>
/// <param name="Code">Stable code in kebab-case, such as <c>contradiction</c>.</param>
/// <param name="Message">A sentence with the limit and what was received, and what to do.</param>
public sealed record Fault(string Place, string Code, string Message);
