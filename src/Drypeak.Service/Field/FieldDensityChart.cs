using Drypeak.Figures;
using Drypeak.Service.Charts;
using Drypeak.Soil.Curves;
using Drypeak.Soil.FieldDensity;
using Drypeak.Soil.Quantities;
using Drypeak.Soil.TestMethods;

namespace Drypeak.Service.Field;

/// <summary>What the chart of a field test shows: the test among its laboratory's specimens, or beside its reference, and the zone in which it would be accepted.</summary>
internal static class FieldDensityChart
{
    /// <summary>How far beyond what is shown a zone without an end of its own reaches, so that the edge of the picture cuts it: water content, and a share of the density.</summary>
    private const double WaterBeyond = 0.05;
    private const double DensityBeyond = 0.5;

    /// <summary>The chart; null where the readings give no point to show.</summary>
    /// <param name="request">The request.</param>
    /// <param name="test">The field test.</param>
    /// <param name="result">What it says.</param>
    /// <param name="laboratory">The chart of the embedded laboratory test, or null.</param>
    public static CompactionChart? Of(FieldDensityRequest request, FieldTest test, FieldResult result, CompactionChart? laboratory)
    {
        var judged = result.Judged;
        var (unit, soil) = (test.Units.Density, judged.OnFines && judged.Oversize is { } ? judged with { Oversize = null, OnFines = false } : judged);
        var shown = judged.OnFines && judged.Fines is { } fines ? new CompactionPoint(fines.WaterContent.Fraction, fines.DryDensity.KilogramsPerCubicMeter)
            : judged is { DryDensity: { } dry, WaterContent: { } w } ? new CompactionPoint(w, dry)
            : (CompactionPoint?)null;
        if (shown is not { } point)
        {
            return null;
        }

        var chart = laboratory ?? new CompactionChart { DensityUnit = unit, Specimens = [], Optimum = Peak(judged.OptimumWaterContent, judged.MaximumDryDensity, unit) };
        return chart with
        {
            Reference = request.Reference,
            DensityUnit = unit,
            Statement = FieldDensityWords.Statement(result),
            Corrected = judged.ReferenceIsCorrected ? Peak(judged.ReferenceWater, judged.ReferenceDensity, unit) : chart.Corrected,
            NextSpecimen = null,
            SpecificGravity = test.SpecificGravity?.Value,
            WaterDensity = test.SpecificGravity is { } ? test.WaterDensity.KilogramsPerCubicMeter : null,
            Zone = ZoneOf(soil, test, chart, point),
            FieldTests = [new ChartFieldTest(point.WaterContent * 100, new Density(point.DryDensity).In(unit), null, RoleOf(result.Outcome))],
        };
    }

    private static ChartZone? ZoneOf(JudgedSoil soil, FieldTest test, CompactionChart chart, CompactionPoint point)
    {
        var unit = test.Units.Density;
        var shown = chart.Specimens.Select(specimen => (specimen.WaterContent, specimen.DryDensity))
            .Concat(new[] { chart.Optimum, chart.Adopted, chart.Corrected }.OfType<ChartOptimum>().Select(peak => (peak.WaterContent, DryDensity: peak.MaximumDryDensity)))
            .Select(at => new CompactionPoint(at.WaterContent / 100, Density.From(at.DryDensity, unit).KilogramsPerCubicMeter)).Append(point).ToList();
        var lowest = new CompactionPoint(Math.Max(0, shown.Min(at => at.WaterContent) - WaterBeyond), shown.Min(at => at.DryDensity) * (1 - DensityBeyond));
        var highest = new CompactionPoint(shown.Max(at => at.WaterContent) + WaterBeyond, shown.Max(at => at.DryDensity) * (1 + DensityBeyond));
        var corners = AcceptanceZone.Of(soil, test.Requirements, (lowest, highest));
        return corners.Count < 3 ? null : new ChartZone([.. corners.Select(corner => new ChartPoint(DrawnNumber.Of(corner.WaterContent * 100), DrawnNumber.Of(new Density(corner.DryDensity).In(unit))))], "accepted");
    }

    private static ChartOptimum? Peak(double? waterContent, double? density, DensityUnit unit) => waterContent is { } w && density is { } most
        ? new ChartOptimum(
            w * 100, new Density(most).In(unit), Reporting.WaterContent(null, new WaterContent(w)), Reporting.DryDensity(null, new Density(most), unit), null, null)
        : null;

    private static MarkRole RoleOf(Soil.Acceptance.TestOutcome? outcome) => outcome switch
    {
        Soil.Acceptance.TestOutcome.Accepted => MarkRole.Met,
        Soil.Acceptance.TestOutcome.Rejected => MarkRole.NotMet,
        Soil.Acceptance.TestOutcome.Undecided => MarkRole.Undecided,
        _ => MarkRole.Measured,
    };
}

/// <summary>The result of a field test in one line.</summary>
internal static class FieldDensityWords
{
    public static string Statement(FieldResult result)
    {
        var judged = result.Judged;
        var compaction = judged.ValueOf(Soil.Acceptance.AcceptedQuantity.RelativeCompaction) is { } ratio ? $"relative compaction {ReaderText.Percent(ratio)}" : null;
        var water = judged.ValueOf(Soil.Acceptance.AcceptedQuantity.WaterContentFromOptimum) is { } apart
            ? $"{ReaderText.Fixed(Math.Abs(apart) * 100, 1)} % {(apart < 0 ? "dry" : "wet")} of the optimum" : null;
        var measured = string.Join(", ", new[] { compaction, water }.OfType<string>());
        var text = result.Outcome is { } outcome ? $"{outcome}{(measured.Length > 0 ? ": " + measured : "")}" : measured;
        return text.Length == 0 ? "Field density test" : char.ToUpperInvariant(text[0]) + text[1..];
    }
}
