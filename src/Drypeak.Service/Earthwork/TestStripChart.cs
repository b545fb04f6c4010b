using Drypeak.Figures;
using Drypeak.Service.Charts;
using Drypeak.Soil.Earthwork;
using Drypeak.Soil.Quantities;

namespace Drypeak.Service.Earthwork;

/// <summary>Dry density against passes: the readings, the growth curve, the passes needed and the density that they reach.</summary>
internal static class TestStripChart
{
    private const int CurvePoints = 41;

    public static PlotChart Of(TestStripRequest request, TestStrip strip, EarthworkUnits units)
    {
        var unit = units.Density;
        var (first, last) = (strip.Growing[0].Passes, strip.Growing[^1].Passes);
        var gain = ReaderText.Of(strip.LeastGain, unit);
        double InUnit(double density) => ChartNumbers.Drawn(new Density(density).In(unit));
        return new PlotChart
        {
            Title = strip is { PassesNeeded: { } needed, Target: { } target }
                ? $"{(needed == 1 ? "1 pass" : $"{needed} passes")}, target {unit.DryDensityName()} {ReaderText.Of(target.DryDensity, unit)}"
                : strip.Curve is null ? "The strip gives no growth curve" : $"Still gaining after {last} passes",
            Subtitle = $"Another pass counts while it gains {gain} or more",
            Reference = request.Reference,
            Description = DescriptionOf(strip, units),
            X = new PlotAxis("Passes") { From = 0 },
            Y = new PlotAxis($"{char.ToUpperInvariant(unit.DryDensityName()[0])}{unit.DryDensityName()[1..]} ({unit.Symbol()})"),
            Lines = strip.Curve is { } curve && last > first
                ? [new PlotLine(
                    [.. Enumerable.Range(0, CurvePoints).Select(i => first + ((double)(last - first) * i / (CurvePoints - 1))).Select(passes => new PlotPoint(passes, InUnit(curve.At(passes))))],
                    PlotLineRole.Result, "growth curve")]
                : [],
            Limits = strip is { Target: { } reached, PassesNeeded: { } passesNeeded }
                ? [new PlotLimit(InUnit(reached.DryDensity.KilogramsPerCubicMeter), $"target {ReaderText.Of(reached.DryDensity, unit)}", Role: PlotLineRole.Reference), new PlotLimit(passesNeeded, $"{passesNeeded} passes", Upright: true, Role: PlotLineRole.Quiet)]
                : [],
            Marks =
            [
                .. strip.Stages.SelectMany(stage => stage.DryDensities.Select(density => new PlotMark(
                    stage.Passes, InUnit(density.KilogramsPerCubicMeter), strip.Growing.Contains(stage) ? MarkRole.Measured : MarkRole.SetAside))),
            ],
        };
    }

    private static string DescriptionOf(TestStrip strip, EarthworkUnits units)
    {
        var means = string.Join(", ", strip.Stages.Select(stage => $"{ReaderText.Of(stage.Mean, units.Density)} after {stage.Passes}"));
        var outcome = strip is { PassesNeeded: { } needed, Target: { } target }
            ? $" After {needed} passes another gains less than {ReaderText.Of(strip.LeastGain, units.Density)}; the readings from there on have the mean {ReaderText.Of(target.DryDensity, units.Density)}."
            : " No number of passes follows from the readings.";
        return $"Dry density against passes of the roller. Means: {means}.{outcome}";
    }
}
