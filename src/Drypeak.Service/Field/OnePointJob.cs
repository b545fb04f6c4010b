using System.Globalization;
using Drypeak.Figures;
using Drypeak.Service.Charts;
using Drypeak.Service.Contracts;
using Drypeak.Service.Hosting;
using Drypeak.Service.Laboratory;
using Drypeak.Soil.Curves;
using Drypeak.Soil.Laboratory;
using Drypeak.Soil.Quantities;
using Drypeak.Soil.References;

namespace Drypeak.Service.Field;

/// <summary><c>POST /v1/one-point</c>: one compacted point selects a curve of a family, or one between two.</summary>
internal sealed class OnePointJob(MoistureDensityJob laboratory, Limits limits)
{
    private const string PointPlace = "/point";

    private readonly Lazy<OnePointRules> _rules = new(() => new(limits));

    /// <summary>The kind of its chart.</summary>
    public ChartKind<PlotChart> Chart { get; } = ChartKind.Plot("one-point", "A family of curves with the point and the curve that it chose", limits);

    public static void Map(IEndpointRouteBuilder app)
    {
        var job = app.ServiceProvider.GetRequiredService<OnePointJob>();
        app.MapJob<OnePointRequest, OnePointAnswer, PlotChart>("/v1/one-point", job.Check, job.Compute, Examples.OnePointRequest, job.Chart)
            .WithTags("Field")
            .WithName("one-point")
            .WithSummary("One point on a family of curves")
            .WithDescription("The curve through the point, shaped like its two neighbours in the family (AASHTO T 272, R 75); it may be used where the point lies at 80 to 100 % of its optimum. With Accept: image/svg+xml, image/png or application/pdf the chart is the answer.");
    }

    /// <summary>Every broken rule; empty where the request can be computed.</summary>
    public IReadOnlyList<Fault> Check(OnePointRequest request)
    {
        var faults = _rules.Value.Validate(request).ToFaults().ToList();
        faults.AddRange(Identification.Check(request.Identification, limits));
        for (var i = 0; i < request.Family?.Count; i++)
        {
            if (request.Family[i]?.Test is { } test)
            {
                faults.AddRange(laboratory.Check(test).Select(fault => fault with { Place = $"/family/{i}/test{fault.Place}" }));
            }
        }

        if (faults.Count == 0)
        {
            var units = request.Units.ToUnitSet();
            SpecimenReduction.Reduce(Measured(request, units), null, PointPlace, units, faults);
        }

        return faults;
    }

    /// <summary>Computes a request that passed <see cref="Check"/>.</summary>
    public Charted<OnePointAnswer, PlotChart> Compute(OnePointRequest request)
    {
        var units = request.Units.ToUnitSet();
        var measured = Measured(request, units);
        var point = SpecimenReduction.Reduce(measured, null, PointPlace, units, new List<Fault>()) ?? throw new ArgumentException("The request does not keep the rules.", nameof(request));
        var findings = new List<Finding>();
        var family = request.Family!.Select((member, i) => ToCurve(member, i, units, findings)).OfType<FamilyCurve>().ToList();
        var at = new CompactionPoint(point.WaterContent.Fraction, point.DryDensity.KilogramsPerCubicMeter);
        var result = OnePoint.Select(family, at, units.Density);
        var chart = OnePointChart.Of(request, family, at, result, units.Density);
        var links = Chart.LinksOf(chart, limits, out var whyNot);
        var answer = new OnePointAnswer
        {
            Reference = request.Reference,
            Identification = request.Identification,
            Units = units.ToContract(),
            Point = new DensityAndWaterContract { DryDensity = point.DryDensity.In(units.Density), WaterContent = point.WaterContent.Percent },
            Optimum = result.Optimum is { } optimum ? new SelectedOptimumAnswer(optimum.WaterContent * 100, new Density(optimum.DryDensity).In(units.Density)) : null,
            Between = [.. result.Between.Select(curve => curve.Label)],
            Blend = result.Blend,
            PercentOfOptimum = result.ShareOfOptimum * 100,
            Usable = result.Optimum is { },
            Curve = [.. result.Curve.Select(drawn => new[] { drawn.WaterContent * 100, new Density(drawn.DryDensity).In(units.Density) })],
            Trace = request.Trace is true ? [.. OnePointWorking.Of(measured, point, result, units).Select(TraceStep.Of)] : null,
            Findings = [.. result.Findings.Concat(findings).Concat(whyNot is null ? [] : [whyNot]).OrderBy(finding => finding.Severity).Select(FindingContract.Of)],
            Links = links,
            Provenance = ProvenanceContract.Of(request),
            Cautions = request.Point!.Carbide is { } ? [.. Cautions.OfLaboratoryTest, Cautions.OfCarbideTester] : Cautions.OfLaboratoryTest,
        };
        return new(answer, chart);
    }

    private static SpecimenMeasurement Measured(OnePointRequest request, UnitSet units)
    {
        var point = request.Point!;
        var water = point.ToMeasuredWater(units);
        return new SpecimenMeasurement
        {
            Label = "1",
            MoldAndWetSoil = point.MoldAndWetSoil is { } full ? Mass.From(full, units.Mass) : null,
            WetDensity = point.WetDensity is { } wet ? Density.From(wet, units.Density) : null,
            DryDensity = point.DryDensity is { } dry ? Density.From(dry, units.Density) : null,
            Mold = point.Mold.ToMold(units),
            Tins = water.Tins,
            WaterContent = water.Given,
            WaterContentFromWetBasis = water.FromWetBasis,
            WaterContentFromCarbide = water.FromCarbide,
        };
    }

    /// <summary>A curve; null, with a finding, where it has no optimum.</summary>
    private static FamilyCurve? ToCurve(FamilyMemberContract member, int index, UnitSet units, List<Finding> findings)
    {
        var label = member.LabelOr(index);
        List<CompactionPoint> points =
        [
            .. (member.Points ?? []).Select(point => new CompactionPoint(point[0] / 100, Density.From(point[1], units.Density).KilogramsPerCubicMeter)),
        ];
        if (member is { OptimumWaterContent: { } w, MaximumDryDensity: { } density })
        {
            return new FamilyCurve(label, new CompactionPoint(w / 100, Density.From(density, units.Density).KilogramsPerCubicMeter), points);
        }

        var (peak, curve) = member.Test is { } test ? OfTest(test) : OfPoints(points);
        if (peak is { WaterContent: > 0 } found)
        {
            return new FamilyCurve(label, found, curve);
        }

        findings.Add(ReferenceFindingKinds.MemberWithoutPeak.At($"/family/{index}",
            $"{label} shows no optimum, and is left out of the family. Give its optimum, or the specimens that are missing."));
        return null;
    }

    private static (CompactionPoint? Peak, IReadOnlyList<CompactionPoint> Curve) OfTest(MoistureDensityRequest request)
    {
        var (test, result) = MoistureDensityJob.Analyze(request);
        return test.Adopted is { } adopted
            ? (new CompactionPoint(adopted.WaterContent.Fraction, adopted.MaximumDryDensity.KilogramsPerCubicMeter), [])
            : (PeakOf(result.Curve), result.Curve?.Chosen.Curve ?? []);
    }

    private static (CompactionPoint? Peak, IReadOnlyList<CompactionPoint> Curve) OfPoints(IReadOnlyList<CompactionPoint> points)
    {
        var analysis = CompactionCurve.Analyze(new CompactionData(points, null, Soil.Phases.WaterDensity.At(Soil.Phases.WaterDensity.DefaultTemperature).KilogramsPerCubicMeter));
        return (PeakOf(analysis), analysis.Chosen.Curve);
    }

    private static CompactionPoint? PeakOf(CurveAnalysis? analysis) => analysis?.Chosen.Optimum is { } optimum
        ? new CompactionPoint(optimum.WaterContent.Value, optimum.MaximumDryDensity.Value)
        : null;
}

internal static class FamilyMembers
{
    /// <summary>A curve's label, or its position.</summary>
    public static string LabelOr(this FamilyMemberContract member, int index) => member.Label ?? (index + 1).ToString(CultureInfo.InvariantCulture);
}
