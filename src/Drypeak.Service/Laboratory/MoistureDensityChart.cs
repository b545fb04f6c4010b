using Drypeak.Figures;
using Drypeak.Service.Charts;
using Drypeak.Soil.Curves;
using Drypeak.Soil.Laboratory;
using Drypeak.Soil.Quantities;
using Drypeak.Soil.TestMethods;

namespace Drypeak.Service.Laboratory;

/// <summary>What the chart of a laboratory test shows.</summary>
internal static class MoistureDensityChart
{
    /// <summary>Digits of a band: its edge is read off less finely than the curve.</summary>
    private const int BandDigits = 5;

    /// <summary>Every so many points of another model's curve are carried.</summary>
    private const int ModelStep = 4;

    /// <summary>Above this many specimens other models' curves would make the address too long.</summary>
    private const int MostWithModels = 20;

    /// <summary>Above this many specimens bars hide one another.</summary>
    private const int MostWithErrorBars = 40;

    /// <summary>Half of a normal quantity's 95 % interval, in standard uncertainties.</summary>
    private const double HalfOf95Percent = 1.959963984540054;

    public static CompactionChart Of(MoistureDensityRequest request, MoistureDensityTest test, MoistureDensityResult result)
    {
        var unit = test.Units.Density;
        var uncertain = result.Specimens.Count <= MostWithErrorBars ? SpecimenUncertainty.Of(test, result.Specimens) : new Dictionary<string, SpecimenUncertainty>();
        return new CompactionChart
        {
            Reference = request.Reference,
            DensityUnit = unit,
            Specimens = [.. result.Specimens.Select(specimen => new ChartSpecimen(
                specimen.WaterContent.Percent, specimen.DryDensity.In(unit), specimen.Label, specimen.SetAside is { })
            {
                WaterContentPlusMinus = uncertain.TryGetValue(specimen.Label, out var its) ? DrawnNumber.Of(HalfOf95Percent * its.WaterContent * 100) : null,
                DryDensityPlusMinus = uncertain.TryGetValue(specimen.Label, out its) ? DrawnNumber.Of(HalfOf95Percent * new Density(its.DryDensity).In(unit)) : null,
            })],
            Curve = [.. (result.Curve?.Chosen.Curve ?? []).Select(point => new ChartPoint(
                DrawnNumber.Of(point.WaterContent * 100), DrawnNumber.Of(new Density(point.DryDensity).In(unit))))],
            Band = result.Curve is { Chosen: { Curve.Count: > 0 } chosen }
                && CompactionCurve.BandOf(MoistureDensity.KeptPoints(result.Specimens, test.SpecificGravity?.Value, test.WaterDensity), chosen.Model) is { } band
                    ? [.. band.Select(point => new ChartBandPoint(
                        DrawnNumber.Of(point.WaterContent * 100, BandDigits), DrawnNumber.Of(new Density(point.Lower).In(unit), BandDigits), DrawnNumber.Of(new Density(point.Upper).In(unit), BandDigits)))]
                    : null,
            Models = result.Curve is { } curves && result.Specimens.Count <= MostWithModels
                ? [.. curves.Alternatives.Where(model => model.Curve.Count > 0).Select(model => new ChartModel(model.Model.Name(), [.. Thinned(model.Curve).Select(point => new ChartPoint(
                    DrawnNumber.Of(point.WaterContent * 100, BandDigits), DrawnNumber.Of(new Density(point.DryDensity).In(unit), BandDigits)))]))]
                : null,
            Optimum = result.Optimum is { } optimum ? Peak(test, optimum) : null,
            Adopted = test.Adopted is { } adopted ? Peak(test, adopted.WaterContent, adopted.MaximumDryDensity) : null,
            Corrected = result.Corrected is { } corrected ? Peak(test, corrected.WaterContent, corrected.DryDensity) : null,
            SpecificGravity = test.SpecificGravity?.Value,
            WaterDensity = test.SpecificGravity is { } ? test.WaterDensity.KilogramsPerCubicMeter : null,
            Saturation = request.Lines?.Saturation ?? [],
            AirVoids = request.Lines?.AirVoids ?? [],
            NextSpecimen = result.Curve?.Next is { } next ? DrawnNumber.Of(next.WaterContent * 100) : null,
        };
    }

    private static ChartOptimum Peak(MoistureDensityTest test, FittedOptimum optimum) =>
        Peak(test, new WaterContent(optimum.WaterContent.Value), new Density(optimum.MaximumDryDensity.Value)) with
        {
            WaterContentInterval = optimum.WaterContent is { Lower: { } driest, Upper: { } wettest }
                ? [DrawnNumber.Of(driest * 100), DrawnNumber.Of(wettest * 100)]
                : null,
            MaximumDryDensityInterval = optimum.MaximumDryDensity is { Lower: { } least, Upper: { } greatest }
                ? [DrawnNumber.Of(new Density(least).In(test.Units.Density)), DrawnNumber.Of(new Density(greatest).In(test.Units.Density))]
                : null,
        };

    private static ChartOptimum Peak(MoistureDensityTest test, WaterContent w, Density density) => new(
        w.Percent,
        density.In(test.Units.Density),
        Reporting.WaterContent(test.Method, w),
        Reporting.DryDensity(test.Method, density, test.Units.Density),
        null,
        null);

    /// <summary>Every few points, and the last one.</summary>
    private static IEnumerable<CompactionPoint> Thinned(IReadOnlyList<CompactionPoint> curve) => curve.Where((_, i) => i % ModelStep == 0 || i == curve.Count - 1);
}
