using Drypeak.Service.Contracts;
using Drypeak.Soil.Laboratory;
using Drypeak.Soil.Laboratory.Review;
using Drypeak.Soil.Quantities;

namespace Drypeak.Service.Laboratory;

/// <summary><c>POST /v1/effort-series</c>: one soil at several efforts, and its line of optimums.</summary>
internal sealed class EffortSeriesJob(MoistureDensityJob laboratory)
{
    private const int FewestTests = 2;
    private const int MostTests = 20;
    private const int MostEfforts = 100;

    public static void Map(IEndpointRouteBuilder app) =>
        app.MapJob<EffortSeriesRequest, EffortSeriesAnswer>(
                "/v1/effort-series", new EffortSeriesJob(app.ServiceProvider.GetRequiredService<MoistureDensityJob>()).Check, Compute, Examples.EffortSeriesRequest)
            .WithTags("Laboratory")
            .WithName("effort-series")
            .WithSummary("The line of optimums over compactive effort")
            .WithDescription("Two or more tests of one soil at different efforts; the optimum at another effort between them.");

    private IReadOnlyList<Fault> Check(EffortSeriesRequest request)
    {
        if (request.Tests is not { Count: >= FewestTests and <= MostTests } tests)
        {
            return [new Fault("/tests", "out-of-range", $"A series takes {FewestTests} to {MostTests} tests; {request.Tests?.Count ?? 0} were received.")];
        }

        var faults = new List<Fault>(tests.Within("/tests", laboratory.Check));
        if (request.At?.Count > MostEfforts)
        {
            faults.Add(new Fault("/at", "too-many", $"There may be up to {MostEfforts} efforts; there are {request.At.Count}."));
        }

        for (var i = 0; i < request.At?.Count; i++)
        {
            if (request.At[i] is not (>= 1 and <= 1e5))
            {
                faults.Add(new Fault($"/at/{i}", "out-of-range", $"An effort lies between 1 and 100000 kJ/m³; {RuleWords.Text(request.At[i])} was received."));
            }
        }

        return faults.Count > 0 ? faults : [.. EffortFaults(tests)];
    }

    /// <summary>Each test must have an effort, and one of its own.</summary>
    private static IEnumerable<Fault> EffortFaults(IReadOnlyList<MoistureDensityRequest> tests)
    {
        var seen = new Dictionary<double, int>();
        for (var i = 0; i < tests.Count; i++)
        {
            var (test, specimens) = MoistureDensityJob.Reduce(tests[i]);
            if (EffortSeries.EffortOf(test, specimens) is not { } effort)
            {
                yield return new Fault($"/tests/{i}/method", "effort-unknown",
                    "The compactive effort is not known: name a method that has one, or \"custom\" with effort and a mold whose volume is known.");
            }
            else if (!seen.TryAdd(effort.KilojoulesPerCubicMeter, i))
            {
                yield return new Fault($"/tests/{i}/method", "repeated-effort",
                    $"Test {seen[effort.KilojoulesPerCubicMeter] + 1} has the same effort, {ReaderText.Fixed(effort.KilojoulesPerCubicMeter, 0)} kJ/m³. A series takes each effort once.");
            }
        }
    }

    private static EffortSeriesAnswer Compute(EffortSeriesRequest request)
    {
        var results = request.Tests!.Select(MoistureDensityJob.Analyze).ToList();
        var units = results[0].Test.Units;
        var line = results
            .Where(item => item.Result.Optimum is { })
            .Select(item => new EffortPoint(
                EffortSeries.EffortOf(item.Test, item.Result.Specimens)!.Value.KilojoulesPerCubicMeter,
                item.Result.Optimum!.WaterContent.Value,
                item.Result.Optimum.MaximumDryDensity.Value))
            .OrderBy(point => point.Effort).ToList();
        var wanted = line.Count < FewestTests ? [] : request.At ?? [];
        var soil = results.FirstOrDefault(item => item.Test.SpecificGravity is { }).Test;
        return new EffortSeriesAnswer
        {
            Units = units.ToContract(),
            Line = [.. line.Select(point => ToAnswer(point, soil, units))],
            At = [.. wanted.Select(effort => ToAnswer(EffortSeries.At(line, effort), soil, units))],
            Findings =
            [
                .. wanted.Select((effort, i) => (effort, i)).Where(item => !EffortSeries.Covers(line, item.effort))
                    .Select(item => FindingContract.Of(FindingKinds.EffortOutsideRange.At($"/at/{item.i}",
                        $"{ReaderText.Fixed(item.effort, 0)} kJ/m³ lies beyond the tests, {ReaderText.Fixed(line[0].Effort, 0)} to {ReaderText.Fixed(line[^1].Effort, 0)} kJ/m³: the values there are a guess. Make a test at that effort."))),
                .. results.SelectMany((item, i) => item.Result.Findings.Select(finding => FindingContract.Of(finding with { Place = $"/tests/{i}{finding.Place}" }))),
            ],
            Provenance = ProvenanceContract.Of(request),
            Cautions = Cautions.OfLaboratoryTest,
        };
    }

    private static EffortPointAnswer ToAnswer(EffortPoint point, MoistureDensityTest? soil, UnitSet units)
    {
        var (w, density) = (new WaterContent(point.WaterContent), new Density(point.MaximumDryDensity));
        return new EffortPointAnswer(point.Effort, w.Percent, density.In(units.Density), soil is null ? null : MoistureDensityJob.SaturationAt(w, density, soil));
    }
}
