using Drypeak.Figures;
using Drypeak.Service.Field;
using Drypeak.Soil.Acceptance;
using Drypeak.Soil.Acceptance.Plans;
using Drypeak.Soil.Quantities;

namespace Drypeak.Service.Acceptance;

/// <summary>The operating characteristic as a picture: the curve, the limits, and the two risks where they are asked for.</summary>
internal static class AcceptancePlanChart
{
    private const int Between = 60;

    public static PlotChart Of(
        IReadOnlyList<AcceptanceAnswer> points, AcceptancePlan plan, AcceptancePlanRequest request, double? producers, double? consumers, AcceptedQuantity quantity, UnitSet units)
    {
        List<PlotMark> marks = [];
        if (producers is { } p)
        {
            marks.Add(new PlotMark(request.AcceptableLevel!.Value, 100 * (1 - p), MarkRole.Measured, $"rejected {ReaderText.Percent(p)}"));
        }

        if (consumers is { } c)
        {
            marks.Add(new PlotMark(request.RejectableLevel!.Value, 100 * c, MarkRole.Measured, $"accepted {ReaderText.Percent(c)}", MarkShape.Diamond));
        }

        var unit = Specification.UnitOf(quantity, units);
        PlotPoint[] curve = [.. Dense(points, plan, unit).Concat(marks.Select(mark => new PlotPoint(mark.X, mark.Y))).DistinctBy(point => point.X).OrderBy(point => point.X)];
        var title = (producers, consumers) switch
        {
            ({ } producer, { } consumer) => $"Producer’s risk {ReaderText.Percent(producer)}, consumer’s risk {ReaderText.Percent(consumer)}",
            ({ } producer, null) => $"Producer’s risk {ReaderText.Percent(producer)}",
            (null, { } consumer) => $"Consumer’s risk {ReaderText.Percent(consumer)}",
            _ => $"How often a lot is accepted by {plan.Count} tests",
        };
        return new PlotChart
        {
            Title = title,
            Subtitle = $"{plan.Count} {(plan.Count == 1 ? "test" : "tests")} a lot, {string.Join(" and ", plan.Rules.Select(rule => rule.Code.Replace('-', ' ')))}",
            Reference = request.Reference,
            Description = $"Operating characteristic: the probability that a lot is accepted, in %, against its true {quantity.Words()}. {title}.",
            X = new PlotAxis($"True {quantity.Words()} of the lot{(quantity.IsDensity() ? $" ({units.Density.Symbol()})" : quantity.IsPercent() ? " (%)" : "")}"),
            Y = new PlotAxis("Accepted (%)") { From = 0, To = 100 },
            Lines = curve.Length > 1 ? [new PlotLine(curve, PlotLineRole.Result)] : [],
            Limits = [.. plan.Rules.SelectMany(rule => new[] { rule.Limits.Minimum, rule.Limits.Maximum }).OfType<double>().Distinct().Select(limit => new PlotLimit(limit / unit, "limit", Upright: true, PlotLineRole.Reference))],
            Marks = curve.Length > 1 ? marks : [.. marks, .. curve.Select(point => new PlotMark(point.X, point.Y, MarkRole.Measured))],
        };
    }

    /// <summary>The levels asked for, and between them what theory gives: few levels make no corners in the picture.</summary>
    private static IEnumerable<PlotPoint> Dense(IReadOnlyList<AcceptanceAnswer> points, AcceptancePlan plan, double unit)
    {
        var asked = points.Select(point => new PlotPoint(point.Level, 100 * point.ProbabilityOfAcceptance));
        var (from, to) = (points.Min(point => point.Level), points.Max(point => point.Level));
        return points.Count is 1 or > Between || !plan.IsExact ? asked
            : asked.Concat(plan.At([.. Enumerable.Range(1, Between).Select(i => (from + ((to - from) * i / (Between + 1))) * unit)], 0, 1).Points.Select(point => new PlotPoint(point.Level / unit, 100 * point.Probability)));
    }
}
