using Drypeak.Figures;
using Drypeak.Service.Charts;
using Drypeak.Service.Contracts;
using Drypeak.Service.Hosting;
using Drypeak.Soil.Earthwork;
using Drypeak.Soil.Phases;
using Drypeak.Soil.Quantities;
using FluentValidation;

namespace Drypeak.Service.Earthwork;

/// <summary><c>POST /v1/earthwork/test-strip</c>.</summary>
internal sealed class TestStripJob(Limits limits)
{
    private const int CurvePoints = 61;

    private readonly Lazy<TestStripRules> _rules = new(() => new(limits));

    /// <summary>The kind of its chart.</summary>
    public ChartKind<PlotChart> Chart { get; } = ChartKind.Plot("test-strip", "Dry density against passes on a trial strip", limits);

    public static void Map(IEndpointRouteBuilder app)
    {
        var job = app.ServiceProvider.GetRequiredService<TestStripJob>();
        app.MapJob<TestStripRequest, TestStripAnswer, PlotChart>(EarthworkJob.Address + "test-strip", job.Check, job.Compute, Examples.TestStripRequest, job.Chart)
            .WithTags("Earthwork")
            .WithName("test-strip")
            .WithSummary("Passes and target density from a trial strip")
            .WithDescription("Dry density against passes of the roller: the growth curve, the passes after which one more gains less than a stated amount, and the density that they reach with its spread. With Accept: image/svg+xml, image/png or application/pdf the chart is the answer.");
    }

    /// <summary>Every broken rule; empty where the request can be computed.</summary>
    public IReadOnlyList<Fault> Check(TestStripRequest request) => _rules.Value.Check(request);

    /// <summary>Computes a request that passed <see cref="Check"/>.</summary>
    public Charted<TestStripAnswer, PlotChart> Compute(TestStripRequest request)
    {
        var units = request.Units.ToUnits();
        var strip = StripOf(request, []);
        var places = request.Readings!.Index().ToDictionary(item => item.Item.Passes!.Value, item => $"/readings/{item.Index}");
        var chart = TestStripChart.Of(request, strip, units);
        var links = Chart.LinksOf(chart, limits, out var whyNoLink);
        var findings = strip.Review(passes => places[passes], units);
        var answer = new TestStripAnswer
        {
            Reference = request.Reference,
            Identification = request.Identification,
            Units = units.ToContract(),
            Stages = [.. strip.Stages.Select(stage => ToAnswer(stage, strip.Growing.Contains(stage) ? strip.Curve : null, units))],
            Curve = strip is { Curve: { } curve, RootMeanSquareError: { } error } ? ToAnswer(curve, error, strip.Growing, units) : null,
            Passes = strip.PassesNeeded,
            Target = strip.Target is { } target
                ? new StripTargetAnswer(
                    target.DryDensity.In(units.Density), target.Readings, target.StandardDeviation?.In(units.Density),
                    100 * target.StandardDeviation?.KilogramsPerCubicMeter / target.DryDensity.KilogramsPerCubicMeter)
                : null,
            Links = links,
            Trace = EarthworkJob.TraceOf(request, () => strip.Working(units)),
            Findings = (whyNoLink is null ? findings : findings.Append(whyNoLink)).ToContract(request),
            Cautions = EarthworkCautions.OfRollers.With(request.Readings!),
            Provenance = ProvenanceContract.Of(request),
        };
        return new Charted<TestStripAnswer, PlotChart>(answer, chart);
    }

    /// <summary>The strip; call with a request whose single values are sound.</summary>
    public static TestStrip StripOf(TestStripRequest request, ICollection<Fault> faults)
    {
        var units = request.Units.ToUnits();
        return new TestStrip(
            [
                .. request.Readings!.Select((readings, i) => StageOf(readings, units, $"/readings/{i}", faults))
                    .OrderBy(stage => stage.Passes),
            ],
            Density.From(request.LeastGain!.Value, units.Density));
    }

    private static StripStage StageOf(StripReadingsContract readings, EarthworkUnits units, string place, ICollection<Fault> faults)
    {
        var w = readings.WaterContentOf(units, place, faults);
        var dry = readings.DryDensity is { } given
            ? given.Select(density => Density.From(density, units.Density))
            : readings.WetDensity!.Select(density => PhaseRelations.DryDensity(Density.From(density, units.Density), w!.Value));
        return new StripStage(readings.Passes!.Value, [.. dry], w);
    }

    private static StripStageAnswer ToAnswer(StripStage stage, GrowthCurve? curve, EarthworkUnits units)
    {
        double? InUnit(double? density) => density / units.Density.InKilogramsPerCubicMeter();
        return new StripStageAnswer(
            stage.Passes, stage.DryDensities.Count, [.. stage.DryDensities.Select(density => density.In(units.Density))], stage.WaterContent?.Percent, stage.Mean.In(units.Density),
            stage.StandardDeviation?.In(units.Density), InUnit(curve?.At(stage.Passes)), InUnit(curve?.GainAfter(stage.Passes)));
    }

    private static GrowthCurveAnswer ToAnswer(GrowthCurve curve, double error, IReadOnlyList<StripStage> stages, EarthworkUnits units)
    {
        double InUnit(double density) => density / units.Density.InKilogramsPerCubicMeter();
        var (first, last) = (stages[0].Passes, stages[^1].Passes);
        return new GrowthCurveAnswer(
            InUnit(curve.Limit), InUnit(curve.Reserve), curve.Passes, InUnit(error),
            [
                .. Enumerable.Range(0, CurvePoints)
                    .Select(i => first + ((double)(last - first) * i / (CurvePoints - 1)))
                    .Select(passes => new[] { passes, InUnit(curve.At(passes)) }),
            ]);
    }
}

/// <summary>All that a trial strip must keep.</summary>
internal sealed class TestStripRules : EarthworkRules<TestStripRequest>
{
    private const int MostStages = 100;
    private const int MostReadings = 100;
    private const int MostPasses = 1000;

    public TestStripRules(Limits limits)
        : base(limits)
    {
        RuleFor(request => request.Readings).Needed().Counted(MostStages);
        RuleForEach(request => request.Readings).Needed().SetValidator(new ReadingsRules(limits));
        RuleFor(request => request.Readings).Custom(CheckPasses);
        RuleFor(request => request.LeastGain).Needed().Positive();
    }

    protected override void CheckTogether(TestStripRequest request, List<Fault> faults) => TestStripJob.StripOf(request, faults);

    private static void CheckPasses(IReadOnlyList<StripReadingsContract>? readings, ValidationContext<TestStripRequest> context)
    {
        var seen = new HashSet<int>();
        foreach (var (i, stage) in (readings ?? []).Index())
        {
            if (stage?.Passes is >= 1 and var passes && !seen.Add(passes))
            {
                context.Fail($"Readings[{i}].Passes", "repeated", $"Readings after {passes} passes stand here more than once. Write them into one list.");
            }
        }
    }

    private sealed class ReadingsRules : AbstractValidator<StripReadingsContract>
    {
        public ReadingsRules(Limits limits)
        {
            RuleFor(readings => readings.Passes).Needed().Whole(MostPasses);
            RuleFor(readings => readings.DryDensity).Counted(MostReadings);
            RuleForEach(readings => readings.DryDensity).Positive();
            RuleFor(readings => readings.WetDensity).Counted(MostReadings);
            RuleForEach(readings => readings.WetDensity).Positive();
            RuleFor(readings => readings.DryDensity).NotNull().When(readings => readings.WetDensity is null)
                .WithErrorCode("not-enough-data").WithMessage("There are no readings. Give dryDensity, or wetDensity with a water content.");
            RuleFor(readings => readings.WetDensity).Null().When(readings => readings.DryDensity is { })
                .WithErrorCode("given-twice").WithMessage("Dry and wet densities are given for one stage. Leave one list out.");
            Include(new WaterContentRules(limits));
            When(readings => readings.WetDensity is { }, this.NeedsWaterContent);
        }
    }
}
