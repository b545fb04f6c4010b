using Drypeak.Service.Contracts;
using Drypeak.Service.Laboratory;
using Drypeak.Soil.Earthwork;
using Drypeak.Soil.Laboratory;
using Drypeak.Soil.Laboratory.Workings;

namespace Drypeak.Service.Earthwork;

/// <summary>What the jobs of planning the work have in common.</summary>
internal static class EarthworkJob
{
    /// <summary>Where they stand.</summary>
    public const string Address = "/v1/earthwork/";

    /// <summary>Maps a job by its name.</summary>
    public static RouteHandlerBuilder MapEarthworkJob<TRequest, TAnswer>(
        this IEndpointRouteBuilder app, string name, EarthworkRules<TRequest> rules, Func<TRequest, TAnswer> compute, string example)
        where TRequest : EarthworkRequest =>
        app.MapJob(Address + name, rules.Check, compute, example).WithTags("Earthwork").WithName(name);

    /// <summary>Findings worst first, with what concerns the units of the request.</summary>
    public static IReadOnlyList<FindingContract> ToContract(this IEnumerable<Finding> findings, EarthworkRequest request) =>
        [.. findings.Concat(OfUnits(request)).OrderBy(finding => finding.Severity).Select(FindingContract.Of)];

    /// <summary>The working, where it was asked for.</summary>
    public static IReadOnlyList<TraceStep>? TraceOf(EarthworkRequest request, Func<IReadOnlyList<WorkingStep>> working) =>
        request.Trace is true ? [.. working().Select(TraceStep.Of)] : null;

    /// <summary>The cautions of a job, and those of how its water contents were found.</summary>
    public static IReadOnlyList<string> With(this IReadOnlyList<string> cautions, params IEnumerable<IWaterContentGiven?> given)
    {
        var all = given.OfType<IWaterContentGiven>().ToList();
        return
        [
            .. cautions,
            .. all.Exists(part => part.Tins is { }) ? [Cautions.OfOven] : Array.Empty<string>(),
            .. all.Exists(part => part.Carbide is { }) ? [Cautions.OfCarbideTester] : Array.Empty<string>(),
        ];
    }

    private static IEnumerable<Finding> OfUnits(EarthworkRequest request)
    {
        if (request.Units is { Volume: { } volume, BulkVolume: null })
        {
            yield return EarthworkFindingKinds.BulkVolumeUnitNotGiven.At("/units",
                $"units.volume is {volume}, which is the unit of molds; volumes of earth were read in m3. Give units.bulkVolume to say what you mean.");
        }
    }
}
