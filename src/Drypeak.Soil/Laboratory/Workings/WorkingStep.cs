namespace Drypeak.Soil.Laboratory.Workings;

/// <summary>One step of the working, such that a checker with a calculator can follow it.</summary>
/// <param name="Quantity">What is computed, and of what.</param>
/// <param name="Formula">How, in symbols.</param>
/// <param name="Substitution">The formula's right side with the numbers put in: bare arithmetic with + − written as -, *, /, ^ and parentheses; null where a fit gives the value.</param>
/// <param name="Value">The value, unrounded, in the caller's unit.</param>
/// <param name="Unit">The unit as readers write it; empty for a ratio.</param>
/// <param name="Source">Where the formula stands.</param>
/// <param name="MathMl">The formula as MathML Core.</param>
public sealed record WorkingStep(string Quantity, string Formula, string? Substitution, double Value, string Unit, string Source, string MathMl);
