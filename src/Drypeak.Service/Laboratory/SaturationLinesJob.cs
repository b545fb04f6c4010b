using Drypeak.Service.Contracts;
using Drypeak.Service.Hosting;
using Drypeak.Soil.Laboratory;
using Drypeak.Soil.Laboratory.Review;
using Drypeak.Soil.Phases;
using Drypeak.Soil.Quantities;
using FluentValidation;

namespace Drypeak.Service.Laboratory;

/// <summary><c>POST /v1/saturation-lines</c>.</summary>
internal static class SaturationLinesJob
{
    public static void MapSaturationLines(this IEndpointRouteBuilder app)
    {
        var rules = new Lazy<Rules>(() => new(app.ServiceProvider.GetRequiredService<Limits>()));
        app.MapJob<SaturationLinesRequest, SaturationLinesAnswer>(
                "/v1/saturation-lines", request => rules.Value.Validate(request).ToFaults(), Compute, Examples.SaturationLinesRequest)
            .WithTags("Laboratory")
            .WithName("saturation-lines")
            .WithSummary("Lines of saturation and of air voids")
            .WithDescription("The dry density at each water content on each line. The zero-air-voids line is saturation 100.");
    }

    private static SaturationLinesAnswer Compute(SaturationLinesRequest request)
    {
        var units = request.Units.ToUnitSet();
        var (gravity, water) = (request.SpecificGravity!.Value!.Value, request.Water());
        var contents = WaterContentsOf(request).ToList();
        IReadOnlyList<double[]> Points(Func<WaterContent, Density> line) =>
            [.. contents.Select(percent => new[] { percent, line(WaterContent.FromPercent(percent)).In(units.Density) })];
        var saturations = request.Saturation ?? (request.AirVoids is null ? [100] : []);
        return new SaturationLinesAnswer
        {
            Units = units.ToContract(),
            Lines =
            [
                .. saturations.Select(percent => new LineAnswer("saturation", percent, Points(w => PhaseRelations.OnSaturationLine(w, percent / 100, gravity, water)))),
                .. (request.AirVoids ?? []).Select(percent => new LineAnswer("airVoids", percent, Points(w => PhaseRelations.OnAirVoidsLine(w, percent / 100, gravity, water)))),
            ],
            Findings = [.. MaterialReview.SpecificGravity(new SpecificGravity(gravity, request.SpecificGravity.Determined == "measured")).Select(FindingContract.Of)],
            Provenance = ProvenanceContract.Of(request),
            Cautions = Cautions.OfArithmetic,
        };
    }

    private static IEnumerable<double> WaterContentsOf(SaturationLinesRequest request)
    {
        if (request is not { From: { } from, To: { } to, Count: { } count })
        {
            return request.WaterContents!;
        }

        return Enumerable.Range(0, count).Select(i => i == count - 1 ? to : from + ((to - from) * i / (count - 1)));
    }

    private sealed class Rules : AbstractValidator<SaturationLinesRequest>
    {
        private const double MostWater = 1000;

        public Rules(Limits limits)
        {
            RuleFor(request => request.Units!).SetValidator(new UnitsRules()).When(request => request.Units is { });
            Include(new WaterRules());
            RuleFor(request => request.SpecificGravity).Needed();
            RuleFor(request => request.SpecificGravity!).SetValidator(new SpecificGravityRules()).When(request => request.SpecificGravity is { });
            RuleFor(request => request.Saturation).LinesOfAKind(limits.LinesOfAKind);
            RuleForEach(request => request.Saturation).Saturation();
            RuleFor(request => request.AirVoids).LinesOfAKind(limits.LinesOfAKind);
            RuleForEach(request => request.AirVoids).AirVoids();
            RuleFor(request => request.WaterContents).Counted(limits.PointsPerLine);
            RuleForEach(request => request.WaterContents).Must(value => value is >= 0 and <= MostWater)
                .WithErrorCode("out-of-range").WithMessage((_, value) => $"It must lie between 0 and {MostWater} %; {RuleWords.Text(value)} was received.");
            RuleFor(request => request.From).Within(0, MostWater, " %");
            RuleFor(request => request.To).Within(0, MostWater, " %");
            RuleFor(request => request.To).Must((request, to) => !(to <= request.From))
                .WithErrorCode("not-over-from").WithMessage((request, to) => $"It must be over from, {RuleWords.Text(request.From)}; {RuleWords.Text(to)} was received.");
            RuleFor(request => request.Count).Must(count => count is null || (count >= 2 && count <= limits.PointsPerLine))
                .WithErrorCode("out-of-range").WithMessage((_, count) => $"There may be 2 to {limits.PointsPerLine} points; {count} was received.");
            RuleFor(request => request.WaterContents).Must((request, list) => list is { } != request is { From: { } } or { To: { } } or { Count: { } })
                .WithErrorCode("incomplete").WithMessage("Say where the points lie: by waterContents, or by from, to and count, and not by both.");
            RuleFor(request => request.Count).Must((request, count) => (request.From is null && request.To is null && count is null) || (request.From is { } && request.To is { } && count is { }))
                .WithErrorCode("incomplete").WithMessage("from, to and count go together: give all three, or waterContents.");
        }
    }
}
