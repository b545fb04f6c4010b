using Drypeak.Figures;
using Drypeak.Service.Charts;
using Drypeak.Soil.Quantities;
using Drypeak.Soil.References;

namespace Drypeak.Service.Field;

/// <summary>What the chart of the rapid method shows: the converted wet densities, their peak, and the field's wet density across.</summary>
internal static class RapidMethodChart
{
    public static PlotChart Of(RapidMethodRequest request, Density field, IReadOnlyList<RapidSpecimen> specimens, RapidResult result, DensityUnit unit)
    {
        var title = result.DensityRatio is { } ratio ? $"Density ratio {ReaderText.Percent(ratio)}" : "No peak between the specimens";
        var subtitle = result is { PeakDensity: { } most, PeakWaterAdded: { } z }
            ? $"peak {ReaderText.Of(most, unit)} at {ReaderText.Percent(Math.Abs(z))} water {(z < 0 ? "taken off" : "added")}" : null;
        return new PlotChart
        {
            Reference = request.Reference,
            Title = title,
            Subtitle = subtitle,
            Description = $"{title}. {(subtitle is null ? "" : subtitle + ". ")}Converted wet density of {specimens.Count} specimens against the water added, with the field's wet density of {ReaderText.Of(field, unit)}.",
            X = new PlotAxis("Water added (% of the wet mass)"),
            Y = new PlotAxis($"Converted wet {(unit == DensityUnit.KilonewtonPerCubicMeter ? "unit weight" : "density")} ({unit.Symbol()})"),
            Lines = result.Curve.Count > 1 ? [new PlotLine([.. result.Curve.Select(point => At(point.WaterContent, new Density(point.DryDensity)))], PlotLineRole.Result)] : [],
            Limits = [new PlotLimit(DrawnNumber.Of(field.In(unit)), "the field", Role: PlotLineRole.Reference)],
            Marks =
            [
                .. specimens.Select(specimen => Mark(specimen.WaterAdded, specimen.Converted, MarkRole.Measured)),
                .. result is { PeakWaterAdded: { } water, PeakDensity: { } peak } ? [Mark(water, peak, MarkRole.Result)] : Array.Empty<PlotMark>(),
            ],
        };

        PlotMark Mark(double added, Density density, MarkRole role)
        {
            var at = At(added, density);
            return new PlotMark(at.X, at.Y, role);
        }

        PlotPoint At(double added, Density density) => new(DrawnNumber.Of(added * 100), DrawnNumber.Of(density.In(unit)));
    }
}
