using System.Text.Json.Serialization;

namespace Drypeak.Soil;

/// <summary>One thing for which a request cannot be computed, and what to do about it.</summary>
/// <param name="Place" example="/specimens/0/tins/0/dry">JSON pointer (RFC 6901) to the place in the request; empty for the whole. Of a missing member: the member's own.</param>
/// <param name="Code" example="dry-over-wet">Stable code in kebab-case, such as <c>contradiction</c>. Programs may branch on it; the message may change.</param>
/// <param name="Message" example="Tin and dry soil, 152.4, are heavier than tin and wet soil, 141. Were the two exchanged?">A sentence for people: the limit, what was received, what to do.</param>
public sealed record Fault([property: JsonPropertyName("pointer")] string Place, string Code, string Message);
