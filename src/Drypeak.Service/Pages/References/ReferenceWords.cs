using Drypeak.Service.Contracts;
using Drypeak.Soil.Quantities;

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

    /// <summary>A difference from the optimum: <c>1.2 % dry of the optimum</c>.</summary>
    public static string FromOptimum(double points) =>
        $"{ReaderText.Fixed(Math.Abs(points), 1)} % {(points < 0 ? "dry" : "wet")} of the optimum";
}
