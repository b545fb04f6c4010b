using Drypeak.Soil.Acceptance;
using Drypeak.Soil.FieldDensity.Review;
using Drypeak.Soil.Laboratory.Workings;
using Drypeak.Soil.Quantities;

namespace Drypeak.Soil.FieldDensity;

/// <summary>The field density test: readings to the soil in place, that against its reference and its specification, all of it reviewed.</summary>
public static class FieldAnalysis
{
    /// <summary>Computes a test.</summary>
    /// <param name="test">The test.</param>
    /// <param name="faults">Receives each contradiction.</param>
    /// <returns>The result, or null where there is a fault.</returns>
    public static FieldResult? Analyze(FieldTest test, ICollection<Fault> faults)
    {
        var sheet = new FieldSheet(test.Units);
        var soil = FieldReduction.Reduce(test, sheet);
        var judged = Judged(test, soil);
        if (sheet.Faults.Count == 0 && judged is { OnFines: true, Oversize: { }, DryDensity: { }, WaterContent: { }, Fines: null })
        {
            sheet.Faults.Add(new Fault("/oversize", "oversize-fills-all",
                "The oversize alone would fill the volume, or hold more than all the water: nothing is left for the fines. Check its share, specific gravity and water content."));
        }

        if (sheet.Faults.Count > 0)
        {
            sheet.Faults.ForEach(faults.Add);
            return null;
        }

        ShowPhases(judged, sheet);
        ShowOversize(test, judged, sheet);
        ShowRatios(judged, sheet);
        List<Judgement> judgements = [.. test.Requirements.Select(requirement => test.Decision.Judge(
            requirement, judged.ValueOf(requirement.Quantity), judged.StandardUncertaintyOf(requirement.Quantity, test.Uncertainty)))];
        var result = new FieldResult(soil, judged, judgements, DecisionRule.OutcomeOf(judgements), sheet.Steps, []);
        return result with { Findings = [.. sheet.Findings.Concat(FieldReview.Of(test, result)).OrderBy(finding => finding.Severity)] };
    }

    private static JudgedSoil Judged(FieldTest test, SoilInPlace soil) => new()
    {
        DryDensity = soil.DryDensity?.KilogramsPerCubicMeter,
        WetDensityAlone = soil.WetDensity?.KilogramsPerCubicMeter,
        WaterContent = soil.WaterContent?.Fraction,
        MaximumDryDensity = test.Reference.MaximumDryDensity?.KilogramsPerCubicMeter,
        OptimumWaterContent = test.Reference.OptimumWaterContent?.Fraction,
        MinimumDryDensity = test.Reference.MinimumDryDensity?.KilogramsPerCubicMeter,
        SpecificGravity = test.SpecificGravity?.Value,
        WaterDensity = test.WaterDensity.KilogramsPerCubicMeter,
        Oversize = test.Oversize is { SpecificGravity: { } } ? test.Oversize : null,
        OnFines = test.OnFines,
        Effects = soil.Effects,
    };

    private static void ShowPhases(JudgedSoil judged, FieldSheet sheet)
    {
        if (judged.ValueOf(AcceptedQuantity.VoidRatio) is not { } e)
        {
            return;
        }

        var (gs, dry) = (FieldSheet.Text(judged.SpecificGravity!.Value), sheet.Text(new Density(judged.DryDensity!.Value)));
        var porosity = 100 * e / (1 + e);
        sheet.Step(Formulas.VoidRatio, "void ratio", $"{gs}*{sheet.Text(new Density(judged.WaterDensity))}/{dry} - 1", e, "");
        sheet.Step(Formulas.Porosity, "porosity", $"100*{FieldSheet.Text(e)}/(1 + {FieldSheet.Text(e)})", porosity, "%");
        if (judged.ValueOf(AcceptedQuantity.Saturation) * 100 is { } saturation)
        {
            sheet.Step(Formulas.Saturation, "saturation", $"{FieldSheet.Text(100 * judged.WaterContent!.Value)}*{gs}/{FieldSheet.Text(e)}", saturation, "%");
            sheet.Step(Formulas.AirVoids, "air voids", $"{FieldSheet.Text(porosity)}*(1 - {FieldSheet.Text(saturation)}/100)", 100 * judged.ValueOf(AcceptedQuantity.AirVoids)!.Value, "%");
        }
    }

    private static void ShowOversize(FieldTest test, JudgedSoil judged, FieldSheet sheet)
    {
        if (judged.Oversize is not { } oversize)
        {
            return;
        }

        if (judged is { OnFines: true, Fines: { } })
        {
            sheet.Append(OversizeWorking.Of(
                new(new Density(judged.DryDensity!.Value), new WaterContent(judged.WaterContent!.Value)), oversize, test.WaterDensity, toTotal: false, test.Units.Density));
        }
        else if (judged is { ReferenceIsCorrected: true, MaximumDryDensity: { } most })
        {
            var steps = OversizeWorking.Of(
                new(new Density(most), new WaterContent(judged.OptimumWaterContent ?? 0)), oversize, test.WaterDensity, toTotal: true, test.Units.Density, "maximum dry density", "optimum water content");
            sheet.Append(judged.OptimumWaterContent is null ? steps.Take(1) : steps);
        }
    }

    private static void ShowRatios(JudgedSoil judged, FieldSheet sheet)
    {
        var dry = (judged.OnFines ? judged.Fines?.DryDensity : null) ?? (judged.DryDensity is { } density ? new Density(density) : null);
        var w = (judged.OnFines ? judged.Fines?.WaterContent : null) ?? (judged.WaterContent is { } fraction ? new WaterContent(fraction) : null);
        if (judged.ValueOf(AcceptedQuantity.RelativeCompaction) is { } compaction)
        {
            sheet.Step(FieldFormulas.RelativeCompaction, "relative compaction", $"100*{sheet.Text(dry!.Value)}/{sheet.Text(new Density(judged.ReferenceDensity!.Value))}", 100 * compaction, "%");
        }

        if (judged.ValueOf(AcceptedQuantity.WaterContentFromOptimum) is { } apart)
        {
            sheet.Step(FieldFormulas.FromOptimum, "water content from the optimum", $"{FieldSheet.Text(w!.Value)} - {FieldSheet.Text(100 * judged.ReferenceWater!.Value)}", 100 * apart, "%");
        }

        if (judged.ValueOf(AcceptedQuantity.RelativeDensity) is { } relative)
        {
            var (most, least, here) = (sheet.Text(new Density(judged.ReferenceDensity!.Value)), sheet.Text(new Density(judged.ReferenceMinimum!.Value)), sheet.Text(dry!.Value));
            sheet.Step(FieldFormulas.RelativeDensity, "relative density", $"100*({most}/{here})*({here} - {least})/({most} - {least})", 100 * relative, "%");
        }
    }
}
