using Drypeak.Soil.Quantities;
using static Drypeak.Soil.Laboratory.Workings.WorkingNumbers;

namespace Drypeak.Soil.Laboratory.Workings;

/// <summary>The working of the oversize correction, by itself or at the end of a laboratory test.</summary>
public static class OversizeWorking
{
    /// <summary>The two steps of the correction.</summary>
    /// <param name="given">The material that it starts from: the fines, or the total.</param>
    /// <param name="oversize">The oversize, with its specific gravity; the correction must be possible.</param>
    /// <param name="water">Density of water.</param>
    /// <param name="toTotal">From the fines to the total; else back.</param>
    /// <param name="unit">The unit of the numbers.</param>
    /// <param name="densityName">What the density is called; by itself, that of the material it is for.</param>
    /// <param name="waterName">What the water content is called; likewise.</param>
    public static IReadOnlyList<WorkingStep> Of(
        DensityAndWater given, Oversize oversize, Density water, bool toTotal, DensityUnit unit,
        string? densityName = null, string? waterName = null)
    {
        var gravity = oversize.SpecificGravity!.Value;
        var (coarse, fine) = (Number(oversize.Fraction * 100), $"(100 - {Number(oversize.Fraction * 100)})");
        var stone = $"{coarse}/({Number(gravity)}*{Number(water.In(unit))})";
        var (density, w, stoneWater) = (Number(given.DryDensity.In(unit)), Number(given.WaterContent.Percent), Number(oversize.WaterContent.Percent));
        if (toTotal)
        {
            var total = OversizeCorrection.ToTotal(given, oversize.Fraction, gravity, oversize.WaterContent, water);
            return
            [
                Formulas.CorrectedDensity.Step(densityName ?? "dry density of the total material", $"100/({fine}/{density} + {stone})", total.DryDensity.In(unit), unit.Symbol()),
                Formulas.CorrectedWater.Step(waterName ?? "water content of the total material", $"({fine}*{w} + {coarse}*{stoneWater})/100", total.WaterContent.Percent, "%"),
            ];
        }

        var fines = OversizeCorrection.ToFines(given, oversize.Fraction, gravity, oversize.WaterContent, water)
            ?? throw new ArgumentException("The oversize leaves nothing for the fines.", nameof(oversize));
        return
        [
            Formulas.DensityOfFines.Step(densityName ?? "dry density of the fines", $"{fine}/(100/{density} - {stone})", fines.DryDensity.In(unit), unit.Symbol()),
            Formulas.WaterOfFines.Step(waterName ?? "water content of the fines", $"(100*{w} - {coarse}*{stoneWater})/{fine}", fines.WaterContent.Percent, "%"),
        ];
    }
}
