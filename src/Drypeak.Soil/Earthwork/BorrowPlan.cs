using Drypeak.Soil.Quantities;

namespace Drypeak.Soil.Earthwork;

/// <summary>Which borrow area gives how much.</summary>
public static class BorrowPlan
{
    private const double Arithmetic = 1e-9;

    /// <summary>Draws the fill's solids from the areas: by their shares where they have them, else from the nearest first, each up to its capacity.</summary>
    /// <param name="solids">Of the fill.</param>
    /// <param name="areas">At least one; all with a share or none.</param>
    /// <param name="loose">As it is hauled.</param>
    /// <param name="missing">Solids that no area gives; 0 where the fill is served.</param>
    /// <returns>One for each area, in the order given; nothing drawn is a draw of 0.</returns>
    public static IReadOnlyList<Draw> Draw(Mass solids, IReadOnlyList<BorrowArea> areas, LooseSoil? loose, out Mass missing)
    {
        var drawn = new double[areas.Count];
        var left = solids.Kilograms;
        if (areas[0].Share is { })
        {
            for (var i = 0; i < areas.Count; i++)
            {
                drawn[i] = Math.Min(solids.Kilograms * areas[i].Share!.Value, Holds(areas[i]));
            }

            left -= drawn.Sum();
        }
        else
        {
            foreach (var i in Enumerable.Range(0, areas.Count).OrderBy(i => areas[i].HaulDistance?.Meters ?? 0))
            {
                drawn[i] = Math.Min(left, Holds(areas[i]));
                left -= drawn[i];
            }
        }

        missing = new Mass(left <= Arithmetic * solids.Kilograms ? 0 : left);
        return [.. areas.Select((area, i) => new Draw(area, new Mass(drawn[i]), loose))];
    }

    /// <summary>Solids that an area can give, kg.</summary>
    private static double Holds(BorrowArea area) =>
        area.Capacity is { } capacity ? capacity.CubicMeters * area.DryDensity.KilogramsPerCubicMeter : double.PositiveInfinity;
}
