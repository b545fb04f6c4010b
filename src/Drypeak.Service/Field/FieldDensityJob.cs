using Drypeak.Figures;
using Drypeak.Service.Charts;
using Drypeak.Service.Contracts;
using Drypeak.Service.Hosting;
using Drypeak.Service.Laboratory;
using Drypeak.Service.Reports;
using Drypeak.Soil.Acceptance;
using Drypeak.Soil.FieldDensity;
using Drypeak.Soil.FieldDensity.Review;
using Drypeak.Soil.Laboratory;
using Drypeak.Soil.Quantities;

namespace Drypeak.Service.Field;

/// <summary><c>POST /v1/field-density</c>: the field test from contract to contract. The endpoint and the page both call this.</summary>
internal sealed class FieldDensityJob(MoistureDensityJob laboratory, Limits limits)
{
    private readonly Lazy<FieldDensityRules> _rules = new(() => new(laboratory, limits));

    /// <summary>The kind of its chart.</summary>
    public ChartKind<CompactionChart> Chart { get; } = ChartKind.Compaction("field-density", "The chart of a field test on its laboratory's curve, with the zone in which it is accepted", limits);

    public static void Map(IEndpointRouteBuilder app)
    {
        var job = app.ServiceProvider.GetRequiredService<FieldDensityJob>();
        app.MapJob<FieldDensityRequest, FieldDensityAnswer, CompactionChart>(
                "/v1/field-density", job.Check, job.ComputeWithChart, Examples.FieldDensityRequest, job.Chart)
            .WithTags("Field")
            .WithName("field-density")
            .WithSummary("Reduce a field density test and decide on it")
            .WithDescription("From the readings of six methods to the soil in place, its relative compaction, and each requirement met, missed or undecided, with the probability of conformance where an uncertainty is known. With Accept: image/svg+xml, image/png or application/pdf the chart is the answer: the test on its laboratory's curve, and the zone in which it is accepted.");
    }

    /// <summary>Every broken rule; empty where the request can be computed.</summary>
    public IReadOnlyList<Fault> Check(FieldDensityRequest request) => _rules.Value.Check(request);

    /// <summary>Computes a request that passed <see cref="Check"/>, with its chart and the chart's addresses.</summary>
    public Charted<FieldDensityAnswer, CompactionChart> ComputeWithChart(FieldDensityRequest request)
    {
        var (answer, chart) = Answer(request);
        var report = ReportAddress.Of(FieldDensityReport.Job, request, limits);
        if (chart is null)
        {
            return new(answer with { Links = new LinksContract { Report = report } }, null);
        }

        var links = Chart.LinksOf(chart, limits, out var whyNot);
        return new(answer with { Links = links with { Report = report }, Findings = whyNot is null ? answer.Findings : [.. answer.Findings, FindingContract.Of(whyNot)] }, chart);
    }

    /// <summary>Computes a request that passed <see cref="Check"/>, where only its numbers are wanted.</summary>
    public static FieldDensityAnswer Compute(FieldDensityRequest request) => Answer(request).Answer;

    private static Charted<FieldDensityAnswer, CompactionChart> Answer(FieldDensityRequest request)
    {
        var ofLaboratory = new List<Finding>();
        var (test, laboratory) = HeldAgainst(request, ofLaboratory);
        var curve = laboratory is { } known ? MoistureDensityChart.Of(request.Laboratory!.Test!, known.Test with { Units = test.Units }, known.Result) : null;
        var faults = new List<Fault>();
        var result = FieldAnalysis.Analyze(test, faults)
            ?? throw new ArgumentException("The request does not keep the rules: " + faults[0].Message, nameof(request));
        var judged = result.Judged;
        var answer = new FieldDensityAnswer
        {
            Reference = request.Reference,
            Identification = request.Identification,
            Method = test.Method.Code,
            Units = test.Units.ToContract(),
            Test = ToAnswer(result, test.Units),
            Laboratory = request.Laboratory is null ? null : new FieldReferenceAnswer(
                InUnit(judged.ReferenceDensity, test.Units), judged.ReferenceWater * 100, InUnit(judged.ReferenceMinimum, test.Units),
                judged.ReferenceIsCorrected || test.Reference.CorrectedForOversize),
            RelativeCompaction = judged.ValueOf(AcceptedQuantity.RelativeCompaction) * 100,
            WaterContentFromOptimum = judged.ValueOf(AcceptedQuantity.WaterContentFromOptimum) * 100,
            RelativeDensity = judged.ValueOf(AcceptedQuantity.RelativeDensity) * 100,
            Requirements =
            [
                .. result.Judgements.Select((judgement, i) => judgement.ToAnswer(
                    request.Specification!.Requirements![i], JudgementWords.Of(judgement, judged, test.Units), test.Units)),
            ],
            Outcome = result.Outcome?.ToString().ToLowerInvariant(),
            Trace = request.Trace is true ? [.. result.Working.Select(TraceStep.Of)] : null,
            Findings = [.. result.Findings.Concat(ofLaboratory).OrderBy(finding => finding.Severity).Select(FindingContract.Of)],
            Cautions = CautionsOf(request),
            Links = new LinksContract(),
            Provenance = ProvenanceContract.Of(request),
        };
        return new(answer, FieldDensityChart.Of(request, test, result, curve));
    }

    /// <summary>The test of a request that passed <see cref="Check"/>, held against its laboratory: values, or a whole test that is computed here.</summary>
    /// <param name="request">The request.</param>
    /// <param name="findings">Receives what a reviewer says of the laboratory test.</param>
    public static (FieldTest Test, (MoistureDensityTest Test, MoistureDensityResult Result)? Laboratory) HeldAgainst(FieldDensityRequest request, List<Finding> findings)
    {
        var test = request.ToTest();
        if (request.Laboratory?.Test is not { } embedded)
        {
            return (test, null);
        }

        var laboratory = MoistureDensityJob.Analyze(embedded);
        test = test.Against(laboratory.Test, laboratory.Result);
        findings.AddRange(laboratory.Result.Findings.Select(finding => finding with { Place = "/laboratory/test" + finding.Place }));
        if (test.Reference.MaximumDryDensity is null)
        {
            findings.Add(FieldFindingKinds.ReferenceWithoutPeak.At("/laboratory/test", "The laboratory test has no optimum, so that there is nothing to hold the field test against. See its own findings."));
        }

        return (test, laboratory);
    }

    private static SoilInPlaceAnswer ToAnswer(FieldResult result, UnitSet units)
    {
        var (soil, judged) = (result.Soil, result.Judged);
        var voidRatio = judged.ValueOf(AcceptedQuantity.VoidRatio);
        return new SoilInPlaceAnswer
        {
            Volume = soil.Volume?.In(units.Volume),
            SandDensity = soil.SandDensity?.In(units.Density),
            WetDensity = soil.WetDensity?.In(units.Density),
            WaterContent = soil.WaterContent?.Percent,
            DryDensity = soil.DryDensity?.In(units.Density),
            VoidRatio = voidRatio,
            Porosity = 100 * voidRatio / (1 + voidRatio),
            Saturation = judged.ValueOf(AcceptedQuantity.Saturation) * 100,
            AirVoids = judged.ValueOf(AcceptedQuantity.AirVoids) * 100,
            Fine = judged.Fines is { } fines
                ? new FinesAnswer(
                    Soil.Phases.PhaseRelations.WetDensity(fines.DryDensity, fines.WaterContent).In(units.Density), fines.WaterContent.Percent, fines.DryDensity.In(units.Density))
                : null,
            Readings = soil.Readings.Count == 0 ? null
                : [.. soil.Readings.Select(spread =>
                {
                    var unit = spread.IsDensity ? units.Density.InKilogramsPerCubicMeter() : 0.01;
                    return new ReadingsAnswer(spread.Quantity, spread.Count, spread.Mean / unit, spread.StandardDeviation / unit, spread.StandardUncertainty / unit);
                })],
            MoistureOffset = soil.Offset is { } offset ? new MoistureOffsetAnswer(offset.K, offset.StandardUncertainty, offset.Pairs) : null,
        };
    }

    private static double? InUnit(double? density, UnitSet units) => density / units.Density.InKilogramsPerCubicMeter();

    private static IReadOnlyList<string> CautionsOf(FieldDensityRequest request) =>
    [
        .. Cautions.OfArithmetic,
        .. FieldMethodNames.WeighsSoil(request.Method) ? [Cautions.OfExcavation] : Array.Empty<string>(),
        .. request.NuclearGauge is { } ? [Cautions.OfNuclearGauge] : Array.Empty<string>(),
        .. request.Tins is { } ? [Cautions.OfOven] : Array.Empty<string>(),
        .. request.Carbide is { } ? [Cautions.OfCarbideTester] : Array.Empty<string>(),
    ];
}
