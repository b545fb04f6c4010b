using Drypeak.Soil.Quantities;

namespace Drypeak.Soil.TestMethods;

/// <summary>How a method rounds the optimum that it reports. Immutable, safe on any thread.</summary>
/// <param name="WaterContent">The optimum water content, in %.</param>
/// <param name="DryDensity">The maximum dry density, in <paramref name="DryDensityUnit"/>.</param>
/// <param name="DryDensityUnit">The one unit for which the method says how to round.</param>
/// <param name="Source">Where the rule comes from.</param>
public sealed record ReportingRule(Rounding WaterContent, Rounding DryDensity, DensityUnit DryDensityUnit, ValueSource Source);

/// <summary>Results as a report prints them: by the method's rule where it has one for the unit, else by the default of the unit.</summary>
public static class Reporting
{
    private static readonly Rounding Tens = Rounding.ToStep(10m);
    private static readonly Rounding Tenths = Rounding.ToStep(0.1m);
    private static readonly Rounding Hundredths = Rounding.ToStep(0.01m);

    /// <summary>A water content in %, to 0.1 % where the method says nothing: <c>13.9 %</c>.</summary>
    /// <param name="method">The test method; null where none was named, or it is the caller's own.</param>
    /// <param name="waterContent">Any finite water content.</param>
    /// <exception cref="ArgumentOutOfRangeException">The water content is NaN or infinite.</exception>
    public static string WaterContent(TestMethod? method, WaterContent waterContent) =>
        ReportedValue.Of(waterContent.Percent, method?.Reporting?.WaterContent ?? Tenths, "%");

    /// <summary>
    /// A dry density or dry unit weight. Where the method says nothing for the unit: 0.1 lb/ft³; 0.01 Mg/m³, g/cm³ or kN/m³; 10 kg/m³.
    /// </summary>
    /// <param name="method">The test method; null where none was named, or it is the caller's own.</param>
    /// <param name="density">Any finite density.</param>
    /// <param name="unit">The unit to report in.</param>
    /// <exception cref="ArgumentOutOfRangeException">The density is NaN or infinite.</exception>
    public static string DryDensity(TestMethod? method, Density density, DensityUnit unit)
    {
        var rounding = method?.Reporting is { } rule && rule.DryDensityUnit == unit ? rule.DryDensity : Default(unit);
        return ReportedValue.Of(density.In(unit), rounding, unit.Symbol());
    }

    private static Rounding Default(DensityUnit unit) => unit switch
    {
        DensityUnit.PoundPerCubicFoot => Tenths,
        DensityUnit.KilogramPerCubicMeter => Tens,
        _ => Hundredths,
    };
}
