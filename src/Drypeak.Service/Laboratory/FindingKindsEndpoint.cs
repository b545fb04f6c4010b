using Drypeak.Service.Charts;
using Drypeak.Service.Hosting;
using Drypeak.Soil.Acceptance;
using Drypeak.Soil.Earthwork;
using Drypeak.Soil.FieldDensity.Review;
using Drypeak.Soil.Laboratory.Review;
using Drypeak.Soil.References;

namespace Drypeak.Service.Laboratory;

/// <summary><c>GET /v1/findings</c>: what each kind of finding means.</summary>
internal static class FindingKindsEndpoint
{
    internal static IReadOnlyList<FindingKindAnswer> Kinds { get; } =
    [
        .. FindingKinds.All.Concat(FieldFindingKinds.All).Concat(ReferenceFindingKinds.All).Concat(EarthworkFindingKinds.All).Concat(LotFindingKinds.All).Append(ChartAddress.NoAddress).Select(kind => new FindingKindAnswer(
            kind.Code, kind.Severity.ToString().ToLowerInvariant(), kind.Meaning, kind.Why, kind.Remedy, kind.Basis)),
    ];

    public static void MapFindingKinds(this IEndpointRouteBuilder app) =>
        app.MapMethods("/v1/findings", EndpointDescription.Reading, () => Results.Json(Kinds, ServiceJson.Of<IReadOnlyList<FindingKindAnswer>>()))
            .WithTags("Catalogues")
            .WithName("findings")
            .WithSummary("Every kind of finding")
            .WithDescription("What it means, why it matters, what to do, and on what rule it stands.")
            .Gives<IReadOnlyList<FindingKindAnswer>>("application/json");
}
