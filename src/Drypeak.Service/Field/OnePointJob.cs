using System.Globalization;
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

    private readonly OnePointRules _rules = new(limits);

    public static void Map(IEndpointRouteBuilder app) =>
        app.MapJob<OnePointRequest, OnePointAnswer>(
                "/v1/one-point",
                services => new OnePointJob(services.GetRequiredService<MoistureDensityJob>(), services.GetRequiredService<Limits>()).Check,
                Compute, Examples.OnePointRequest)
            .WithTags("Field")
            .WithName("one-point")
            .WithSummary("One point on a family of curves")
            .WithDescription("The curve through the point, shaped like its two neighbours in the family (AASHTO T 272, R 75); it may be used where the point lies at 80 to 100 % of its optimum.");

    private List<Fault> Check(OnePointRequest request)
    {
        var faults = _rules.Validate(request).ToFaults().ToList();
        for (var i = 0; i < request.Family?.Count; i++)
        {
            if (request.Family[i]?.Test is { } test)
            {
                faults.AddRange(laboratory.Check(test).Select(fault => fault with { Place = $"/family/{i}/test{fault.Place}" }));
            }
        }

        if (faults.Count == 0)
        {
            Reduce(request, faults);
        }

        return faults;
    }

    private static OnePointAnswer Compute(OnePointRequest request)
    {
        var units = request.Units.ToUnitSet();
        var point = Reduce(request, []) ?? throw new ArgumentException("The request does not keep the rules.", nameof(request));
        var findings = new List<Finding>();
        var family = request.Family!.Select((member, i) => ToCurve(member, i, units, findings)).OfType<FamilyCurve>().ToList();
        var result = OnePoint.Select(family, new CompactionPoint(point.WaterContent.Fraction, point.DryDensity.KilogramsPerCubicMeter), units.Density);
        return new OnePointAnswer
        {
            Reference = request.Reference,
            Units = units.ToContract(),
            Point = new DensityAndWaterContract { DryDensity = point.DryDensity.In(units.Density), WaterContent = point.WaterContent.Percent },
            Optimum = result.Optimum is { } optimum ? new SelectedOptimumAnswer(optimum.WaterContent * 100, new Density(optimum.DryDensity).In(units.Density)) : null,
            Between = [.. result.Between.Select(curve => curve.Label)],
            Blend = result.Blend,
            PercentOfOptimum = result.ShareOfOptimum * 100,
            Usable = result.Optimum is { },
            Curve = [.. result.Curve.Select(drawn => new[] { drawn.WaterContent * 100, new Density(drawn.DryDensity).In(units.Density) })],
            Findings = [.. result.Findings.Concat(findings).OrderBy(finding => finding.Severity).Select(FindingContract.Of)],
            Links = new LinksContract(),
            Provenance = ProvenanceContract.Of(request),
            Cautions = request.Point!.Carbide is { } ? [.. Cautions.OfLaboratoryTest, Cautions.OfCarbideTester] : Cautions.OfLaboratoryTest,
        };
    }

    private static Specimen? Reduce(OnePointRequest request, ICollection<Fault> faults)
    {
        var units = request.Units.ToUnitSet();
        var point = request.Point!;
        var water = point.ToMeasuredWater(units);
        var measured = new SpecimenMeasurement
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
        return SpecimenReduction.Reduce(measured, null, PointPlace, units, faults);
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
