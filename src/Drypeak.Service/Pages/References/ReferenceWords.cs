using Drypeak.Service.Contracts;
using Drypeak.Soil.Quantities;
using Drypeak.Soil.TestMethods;

namespace Drypeak.Service.Pages.References;

/// <summary>Numbers as the pages of references show them.</summary>
internal static class ReferenceWords
{
    public static string Percent(double percent) => ReaderText.Fixed(percent, 1) + " %";

    public static string Density(double density, UnitsContract units)
    {
        var unit = units.DensityUnit();
        return ReaderText.Of(Soil.Quantities.Density.From(density, unit), unit);
    }

    /// <summary>An optimum as a laboratory would report it.</summary>
    public static (string Density, string WaterContent) Reported(double density, double waterContent, UnitsContract units)
    {
        var unit = units.DensityUnit();
        return (Reporting.DryDensity(null, Soil.Quantities.Density.From(density, unit), unit), Reporting.WaterContent(null, WaterContent.FromPercent(waterContent)));
    }

    /// <summary>A difference from the optimum: <c>1.2 % dry</c>.</summary>
    public static string FromOptimum(double points) =>
        $"{ReaderText.Fixed(Math.Abs(points), 1)} % {(points < 0 ? "dry" : "wet")}";
}
