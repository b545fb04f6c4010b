using Drypeak.Soil.Curves;
using Drypeak.Soil.FieldDensity.Review;
using Drypeak.Soil.Laboratory.Review;
using Drypeak.Soil.Laboratory.Workings;
using Drypeak.Soil.Quantities;

namespace Drypeak.Soil.References;

/// <summary>A specimen of the fill with water added, or dried.</summary>
/// <param name="WaterAdded">z: share of the wet mass at fill water content; negative where it was dried; over −1.</param>
/// <param name="WetDensity">As compacted.</param>
public readonly record struct RapidSpecimen(double WaterAdded, Density WetDensity)
{
    /// <summary>Wet density at fill water content: ρ/(1 + z).</summary>
    public Density Converted => new(WetDensity.KilogramsPerCubicMeter / (1 + WaterAdded));
}

/// <summary>What the rapid method says.</summary>
/// <param name="PeakWaterAdded">zm, as a fraction of the wet mass; null where the specimens show no peak.</param>
/// <param name="PeakDensity">Converted wet density there.</param>
/// <param name="DensityRatio">Field wet density over the peak: exactly the relative compaction; a fraction.</param>
/// <param name="WaterContentFromOptimum">Field less optimum, as a fraction: −zm(1 + w), or −zm for an estimate where w is not known.</param>
/// <param name="Findings">What a careful reviewer says, worst first.</param>
public sealed record RapidResult(double? PeakWaterAdded, Density? PeakDensity, double? DensityRatio, double? WaterContentFromOptimum, IReadOnlyList<Finding> Findings)
{
    /// <summary>The fitted curve: water added as a fraction, converted wet density in kg/m³; in order of water added; empty where nothing could be fitted.</summary>
    public IReadOnlyList<CompactionPoint> Curve { get; init; } = [];

    /// <summary>Each step of the arithmetic.</summary>
    public IReadOnlyList<WorkingStep> Working { get; init; } = [];
}

/// <summary>
/// The rapid method (Hilf; ASTM D5080, AS 1289.5.7.1): field soil is compacted at fill water content and with water added, and all wet
/// densities are converted to fill water content. Dry density is the converted one over 1 + w, whatever w is, so that the ratio of the field's
/// wet density to the peak is the relative compaction before any oven has spoken. Three specimens: the vertex of the parabola through them;
/// more: the fit of the laboratory's curve. The field water content changes neither.
/// </summary>
public static class RapidMethod
{
    private const int Parabola = 3;
    private const double HighRatio = 1.05;

    /// <summary>
    /// The fit wants water contents and dry densities. Which water content the driest specimen is put at changes a parabola not at all and the averaged
    /// curve hardly: it is a usual one, as a fraction.
    /// </summary>
    private const double DriestFitted = 0.1;

    /// <summary>Computes the method.</summary>
    /// <param name="fieldWetDensity">Wet density in place.</param>
    /// <param name="fieldWater">Field water content, or null while it is not known.</param>
    /// <param name="specimens">At least one, in any order.</param>
    /// <param name="unit">The unit that texts speak.</param>
    public static RapidResult Compute(Density fieldWetDensity, WaterContent? fieldWater, IReadOnlyList<RapidSpecimen> specimens, DensityUnit unit)
    {
        var (peakOrNone, curve) = Fitted(specimens);
        if (peakOrNone is not { } peak)
        {
            return Worked(new RapidResult(null, null, null, null, [NoPeak(specimens, unit)]));
        }

        var ratio = fieldWetDensity.KilogramsPerCubicMeter / peak.DryDensity;
        var findings = new List<Finding>();
        if (ratio > HighRatio * (1 + 1e-9))
        {
            findings.Add(FieldFindingKinds.RelativeCompactionHigh.At("/field/wetDensity",
                $"The density ratio is {ReaderText.Percent(ratio)}. Check the field's wet density, and that the specimens are of the same soil."));
        }

        if (fieldWater is null)
        {
            findings.Add(ReferenceFindingKinds.WaterContentEstimated.At("/field/waterContent",
                "The difference from the optimum is an estimate: the true one is larger by the factor 1 + w. Give the field water content once it is known; the density ratio does not change."));
        }

        return Worked(new RapidResult(peak.WaterContent, new Density(peak.DryDensity), ratio, -peak.WaterContent * (1 + (fieldWater?.Fraction ?? 0)), findings));

        RapidResult Worked(RapidResult result) => result with { Curve = curve, Working = RapidWorking.Of(fieldWetDensity, fieldWater, specimens, result, unit) };
    }

    /// <summary>Peak of the converted wet densities and the curve through them: z, and kg/m³.</summary>
    private static (CompactionPoint? Peak, IReadOnlyList<CompactionPoint> Curve) Fitted(IReadOnlyList<RapidSpecimen> specimens)
    {
        var driest = specimens.Min(specimen => specimen.WaterAdded);
        var fill = (DriestFitted - driest) / (1 + driest);
        var data = new CompactionData(
            [.. specimens.Select(specimen => new CompactionPoint(fill + (specimen.WaterAdded * (1 + fill)), specimen.Converted.KilogramsPerCubicMeter / (1 + fill)))], null, 1000);
        var chosen = CompactionCurve.Analyze(data, specimens.Count == Parabola ? CurveModel.Parabola : CurveModel.Averaged).Chosen;
        return (
            chosen.Optimum is { } optimum ? Back(new CompactionPoint(optimum.WaterContent.Value, optimum.MaximumDryDensity.Value)) : null,
            [.. chosen.Curve.Select(Back)]);

        CompactionPoint Back(CompactionPoint point) => new((point.WaterContent - fill) / (1 + fill), point.DryDensity * (1 + fill));
    }

    private static Finding NoPeak(IReadOnlyList<RapidSpecimen> specimens, DensityUnit unit)
    {
        if (specimens.Select(specimen => specimen.WaterAdded).Distinct().Count() < Parabola)
        {
            return FindingKinds.TooFewSpecimens.At("/specimens", "A peak needs three specimens with different water added. Compact another.", Severity.Error);
        }

        var densest = specimens.MaxBy(specimen => specimen.Converted.KilogramsPerCubicMeter);
        var rising = densest.WaterAdded == specimens.Max(specimen => specimen.WaterAdded);
        return FindingKinds.NoOptimum.At("/specimens",
            $"The converted wet densities show no peak between the specimens; the greatest, {ReaderText.Of(densest.Converted, unit)}, stands at {ReaderText.Percent(densest.WaterAdded)} water added. Compact another {(rising ? "with more water" : "with less water, or dried")}.");
    }
}
