using Drypeak.Soil.FieldDensity.Review;
using Drypeak.Soil.Quantities;

namespace Drypeak.Soil.FieldDensity;

/// <summary>
/// The nuclear gauge (ASTM D6938, AASHTO T 310): wet density by gamma rays, water by neutrons, each the mean of its readings. The neutrons count
/// all hydrogen, so that pairs of gauge and oven give an offset: K = 1000(w_oven − w_gauge)/(100 + w_gauge) of each pair, its mean over the
/// pairs (from memory).
/// </summary>
public sealed record NuclearGauge : DensityMethod
{
    private const double FarApart = 0.02;

    /// <summary>Readings of wet density; at least one.</summary>
    public required IReadOnlyList<Density> WetDensity { get; init; }

    /// <summary>Readings of water content; may be empty.</summary>
    public IReadOnlyList<WaterContent> WaterContent { get; init; } = [];

    /// <summary>Readings of the mass of water per volume; may be empty.</summary>
    public IReadOnlyList<Density> WaterDensity { get; init; } = [];

    /// <summary>Gauge and oven on the same soil; may be empty.</summary>
    public IReadOnlyList<OvenPair> OvenPairs { get; init; } = [];

    /// <inheritdoc/>
    public override string Code => "nuclear-gauge";

    /// <inheritdoc/>
    public override string Place => "/nuclearGauge";

    internal override MeasuredInPlace Read(FieldSheet sheet)
    {
        var readings = new List<ReadingSpread>();
        var wet = new Density(MeanOf("wetDensity", "wet density", WetDensity.Select(density => density.KilogramsPerCubicMeter), sheet, readings));
        var offset = OffsetOf(sheet);
        var read = WaterOf(wet, sheet, readings);
        return new MeasuredInPlace(wet, null, read is { } w ? Corrected(w, offset, sheet) : null)
        {
            Readings = readings,
            Offset = offset,
            Effects = [.. EffectsOf(readings, read, offset)],
        };
    }

    /// <summary>
    /// Where the water content is read as a mass of water ρm, w = ρm/(ρ − ρm) moves with the wet density too: ∂w/∂ρ = −ρm/(ρ − ρm)² and
    /// ∂w/∂ρm = ρ/(ρ − ρm)². The offset stretches each by 1 + K/1000, and is itself uncertain where there are several pairs.
    /// </summary>
    private static IEnumerable<ReadingEffect> EffectsOf(List<ReadingSpread> readings, WaterContent? read, MoistureOffset? offset)
    {
        ReadingSpread? Spread(string quantity) => readings.Find(spread => spread.Quantity == quantity);
        var (wet, water) = (Spread("wetDensity")!, Spread("waterContent") is null ? Spread("waterDensity") : null);
        var stretch = 1 + ((offset?.K ?? 0) / 1000);
        var dry = wet.Mean - (water?.Mean ?? 0);
        if (wet.StandardUncertainty is > 0 and var ofWet)
        {
            yield return new ReadingEffect(ofWet, water is null ? 0 : -water.Mean / (dry * dry) * stretch * ofWet);
        }

        if (water?.StandardUncertainty is > 0 and var ofWater)
        {
            yield return new ReadingEffect(0, wet.Mean / (dry * dry) * stretch * ofWater);
        }

        if (Spread("waterContent")?.StandardUncertainty is > 0 and var ofContent)
        {
            yield return new ReadingEffect(0, stretch * ofContent);
        }

        if (read is { } w && offset?.StandardUncertainty is > 0 and var ofOffset)
        {
            yield return new ReadingEffect(0, ofOffset * (1 + w.Fraction) / 1000);
        }
    }

    private WaterContent? WaterOf(Density wet, FieldSheet sheet, List<ReadingSpread> readings)
    {
        WaterContent? read = WaterContent.Count > 0
            ? new WaterContent(MeanOf("waterContent", "water content by the gauge", WaterContent.Select(w => w.Fraction), sheet, readings))
            : null;
        if (WaterDensity.Count == 0)
        {
            return read;
        }

        var water = new Density(MeanOf("waterDensity", "water per volume", WaterDensity.Select(density => density.KilogramsPerCubicMeter), sheet, readings));
        if (water.KilogramsPerCubicMeter >= wet.KilogramsPerCubicMeter)
        {
            sheet.Contradiction(Place + "/waterDensity",
                $"The water per volume, {sheet.ReaderDensity(water.KilogramsPerCubicMeter)}, is not below the wet density, {sheet.ReaderDensity(wet.KilogramsPerCubicMeter)}: nothing is left for the soil. Check both readings and their units.");
            return read;
        }

        var byDensity = new WaterContent(water.KilogramsPerCubicMeter / (wet.KilogramsPerCubicMeter - water.KilogramsPerCubicMeter));
        if (read is { } given)
        {
            Laboratory.MeasuredWater.RefuseApart(given, "the gauge's water content", byDensity, "its water per volume", Place + "/waterDensity", sheet.Faults);
            return given;
        }

        sheet.Step(FieldFormulas.WaterByGauge, "water content by the gauge", $"100*{sheet.Text(water)}/({sheet.Text(wet)} - {sheet.Text(water)})", byDensity);
        return byDensity;
    }

    private MoistureOffset? OffsetOf(FieldSheet sheet)
    {
        if (OvenPairs.Count == 0)
        {
            return null;
        }

        var offset = MoistureOffset.Of(OvenPairs);
        var terms = OvenPairs.Select(pair => $"1000*({FieldSheet.Text(pair.Oven)} - {FieldSheet.Text(pair.Gauge)})/(100 + {FieldSheet.Text(pair.Gauge)})");
        sheet.Step(FieldFormulas.OffsetOfPair, OvenPairs.Count > 1 ? "moisture offset, the mean over the pairs" : "moisture offset",
            $"({string.Join(" + ", terms)})/{OvenPairs.Count}", offset.K, "");
        for (var i = 0; i < OvenPairs.Count; i++)
        {
            var apart = Math.Abs(OvenPairs[i].Oven.Fraction - OvenPairs[i].Gauge.Fraction);
            if (apart > FarApart * (1 + 1e-9))
            {
                sheet.Find(FieldFindingKinds.GaugeAndOvenApart, $"{Place}/ovenPairs/{i}",
                    $"Gauge and oven of pair {i + 1} say {ReaderText.Of(OvenPairs[i].Gauge)} and {ReaderText.Of(OvenPairs[i].Oven)}: {ReaderText.Fixed(apart * 100, 1)} percentage points apart. Check the gauge's standard count and the tin; the offset rests on it.");
            }
        }

        return offset;
    }

    private static WaterContent Corrected(WaterContent read, MoistureOffset? offset, FieldSheet sheet)
    {
        if (offset is null)
        {
            return read;
        }

        var corrected = offset.Applied(read);
        sheet.Step(FieldFormulas.OffsetWater, "water content with the offset",
            $"{FieldSheet.Text(read)} + {FieldSheet.Text(offset.K)}*(100 + {FieldSheet.Text(read)})/1000", corrected);
        return corrected;
    }

    private static double MeanOf(string member, string quantity, IEnumerable<double> values, FieldSheet sheet, List<ReadingSpread> readings)
    {
        var isDensity = member != "waterContent";
        var spread = ReadingSpread.Of(member, isDensity, [.. values]);
        if (spread.Count > 1)
        {
            string Text(double value) => isDensity ? sheet.Text(new Density(value)) : FieldSheet.Text(new WaterContent(value));
            var substitution = $"({string.Join(" + ", values.Select(Text))})/{spread.Count}";
            if (isDensity)
            {
                sheet.Step(FieldFormulas.MeanOfReadings, quantity, substitution, new Density(spread.Mean));
            }
            else
            {
                sheet.Step(FieldFormulas.MeanOfReadings, quantity, substitution, new WaterContent(spread.Mean));
            }
        }

        readings.Add(spread);
        return spread.Mean;
    }
}

/// <summary>Gauge and oven on the same soil.</summary>
/// <param name="Gauge">Water content that the gauge showed.</param>
/// <param name="Oven">Water content by the oven.</param>
public sealed record OvenPair(WaterContent Gauge, WaterContent Oven);

/// <summary>A gauge's moisture offset.</summary>
/// <param name="K">Mean over the pairs, per mille of 100 + w.</param>
/// <param name="StandardUncertainty">Of the mean; null for one pair.</param>
/// <param name="Pairs">How many; 1 or more.</param>
public sealed record MoistureOffset(double K, double? StandardUncertainty, int Pairs)
{
    /// <summary>The mean over the pairs of K = 1000(w_oven − w_gauge)/(100 + w_gauge), water contents in %.</summary>
    public static MoistureOffset Of(IReadOnlyList<OvenPair> pairs)
    {
        var spread = ReadingSpread.Of("k", false, [.. pairs.Select(pair => 1000 * (pair.Oven.Percent - pair.Gauge.Percent) / (100 + pair.Gauge.Percent))]);
        return new MoistureOffset(spread.Mean, spread.StandardUncertainty, spread.Count);
    }

    /// <summary>A reading with the offset: w_gauge + K(100 + w_gauge)/1000, in %.</summary>
    public WaterContent Applied(WaterContent read) => WaterContent.FromPercent(read.Percent + (K * (100 + read.Percent) / 1000));
}
