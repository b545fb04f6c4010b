namespace Drypeak.Soil.TestMethods;

/// <summary>A result as it is written in a report. Only this text is rounded; every number beside it keeps all its digits.</summary>
public static class ReportedValue
{
    /// <summary>Number, space, unit: <c>1.83 Mg/m³</c>. The decimal mark is a point; trailing zeros stay; zero has no sign.</summary>
    /// <param name="value">Any finite number, in the unit.</param>
    /// <param name="rounding">To which place.</param>
    /// <param name="unitSymbol">The symbol for readers: <c>%</c>, <c>Mg/m³</c>.</param>
    /// <exception cref="ArgumentOutOfRangeException">The value is NaN or infinite.</exception>
    public static string Of(double value, Rounding rounding, string unitSymbol) => $"{rounding.Apply(value)} {unitSymbol}";
}
