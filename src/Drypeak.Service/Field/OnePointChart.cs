using Drypeak.Figures;
using Drypeak.Service.Charts;
using Drypeak.Soil.Curves;
using Drypeak.Soil.Quantities;
using Drypeak.Soil.References;
using Drypeak.Soil.TestMethods;

namespace Drypeak.Service.Field;

/// <summary>What the chart of one point shows: the family, the point, and the curve that it chose.</summary>
internal static class OnePointChart
{
    private const int DrawnPoints = 25;

    public static PlotChart Of(OnePointRequest request, IReadOnlyList<FamilyCurve> family, CompactionPoint point, OnePointResult result, DensityUnit unit)
    {
        var title = result.Optimum is { } optimum
            ? $"Maximum {unit.DryDensityName()} {Reporting.DryDensity(null, new Density(optimum.DryDensity), unit)} at {Reporting.WaterContent(null, new WaterContent(optimum.WaterContent))} water"
            : "The point does not choose a curve";
        var subtitle = Subtitle(result);
        return new PlotChart
        {
            Reference = request.Reference,
            Title = title,
            Subtitle = subtitle,
            Description = $"{title}. {(subtitle is null ? "" : subtitle + ". ")}A family of {family.Count} curves of dry density against water content, with the point at {ReaderText.Of(new WaterContent(point.WaterContent))} water and {ReaderText.Of(new Density(point.DryDensity), unit)}.",
            X = new PlotAxis("Water content (%)"),
            Y = new PlotAxis($"{char.ToUpperInvariant(unit.DryDensityName()[0])}{unit.DryDensityName()[1..]} ({unit.Symbol()})"),
            Lines =
            [
                .. family.Select(curve => new PlotLine(Drawn(curve, unit), PlotLineRole.Reference, curve.Label) { LabelAt = PlotLabelPlace.End }),
                .. result.Curve.Count > 1 ? [new PlotLine([.. result.Curve.Select(drawn => At(drawn, unit))], PlotLineRole.Result)] : Array.Empty<PlotLine>(),
            ],
            Marks =
            [
                Mark(point, result.Optimum is null ? MarkRole.NotMet : MarkRole.Measured, "the point", unit),
                .. result.Optimum is { } peak ? [Mark(peak, MarkRole.Result, null, unit)] : Array.Empty<PlotMark>(),
            ],
        };
    }

    private static string? Subtitle(OnePointResult result) => result.Between switch
    {
        [var one] => $"on curve {one.Label}",
        [var first, var second] => $"between {first.Label} and {second.Label}, {ReaderText.Percent(result.Blend!.Value, 0)} of the way",
        _ => null,
    };

    private static List<PlotPoint> Drawn(FamilyCurve curve, DensityUnit unit) =>
        [.. Enumerable.Range(0, DrawnPoints).Select(i => curve.Optimum.WaterContent * (curve.From + ((curve.To - curve.From) * i / (DrawnPoints - 1))))
            .Select(w => At(new CompactionPoint(w, curve.DensityAt(w)), unit))];

    private static PlotMark Mark(CompactionPoint point, MarkRole role, string? label, DensityUnit unit)
    {
        var at = At(point, unit);
        return new PlotMark(at.X, at.Y, role, label);
    }

    private static PlotPoint At(CompactionPoint point, DensityUnit unit) =>
        new(DrawnNumber.Of(point.WaterContent * 100), DrawnNumber.Of(new Density(point.DryDensity).In(unit)));
}
