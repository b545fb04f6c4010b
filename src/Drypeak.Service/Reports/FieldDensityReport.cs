using System.Text.RegularExpressions;
using Drypeak.Figures;
using Drypeak.Service.Contracts;
using Drypeak.Service.Field;
using Drypeak.Service.Hosting;
using Drypeak.Soil.Quantities;
using static Drypeak.Service.Reports.ReportTexts;

namespace Drypeak.Service.Reports;

/// <summary>The report of a field test.</summary>
internal static partial class FieldDensityReport
{
    public const string Job = "field-density";

    public static void Map(IEndpointRouteBuilder app)
    {
        var (job, limits) = (app.ServiceProvider.GetRequiredService<FieldDensityJob>(), app.ServiceProvider.GetRequiredService<Limits>());
        app.MapReport(new ReportKind<FieldDensityRequest>(
            Job, "The report of a field test", "Field", Examples.FieldDensityRequest, job.Check, (request, options) => Of(job, limits, request, options)));
    }

    private static Report Of(FieldDensityJob job, Limits limits, FieldDensityRequest request, ReportOptions options)
    {
        var (answer, chart) = job.ComputeWithChart(request with { Trace = options.Working });
        var unit = request.Units.DensityUnit();
        return new Report
        {
            Kind = "Field density test",
            Reference = answer.Reference,
            Result = chart?.Statement ?? (answer.Outcome is { } outcome ? $"The test is {outcome}" : "The readings give no result to judge"),
            Support = answer.Outcome is { } judged && chart?.Statement?.Contains(judged, StringComparison.OrdinalIgnoreCase) is false ? $"The test is {judged}." : null,
            Identification = Identification(answer.Identification),
            Method = Method(answer, unit),
            Table = Requirements(answer, unit),
            Picture = chart is null || CompactionFigure.Refusal(chart, FigureSize.Default) is { } ? null
                : figure => CompactionFigure.Draw(chart with { Reference = null }, figure),
            Results = InPlace(answer, unit),
            Findings = Findings(answer.Findings),
            Cautions = answer.Cautions,
            Working = options.Working ? Working(answer.Trace) : [],
            Provenance = Provenance(ProvenanceContract.Of(request)),
            Address = ReportAddress.Of(Job, request, limits, options.Query),
        };
    }

    private static IReadOnlyList<ReportFact> Method(FieldDensityAnswer answer, DensityUnit unit) => Facts(
        ("Method", answer.Method.Replace('-', ' ')),
        ("Maximum dry density", With(answer.Laboratory?.MaximumDryDensity, "maximumDryDensity", unit)),
        ("Optimum water content", With(answer.Laboratory?.OptimumWaterContent, "waterContent", unit)),
        ("Minimum dry density", With(answer.Laboratory?.MinimumDryDensity, "minimumDryDensity", unit)),
        ("Reference", answer.Laboratory is null ? "none" : answer.Laboratory.CorrectedForOversize ? "corrected for oversize" : "as the laboratory gave it"));

    private static ReportTable Requirements(FieldDensityAnswer answer, DensityUnit unit) => new(
        "Requirements",
        ["Requirement", "At least", "At most", "Value", "Margin", "Conformance", "Outcome"],
        [.. answer.Requirements.Select(requirement => (IReadOnlyList<string>)
        [
            Words(requirement.Quantity),
            With(requirement.Minimum, requirement.Quantity, unit) ?? "–", With(requirement.Maximum, requirement.Quantity, unit) ?? "–",
            With(requirement.Value, requirement.Quantity, unit) ?? "–", With(requirement.Margin, requirement.Quantity, unit) ?? "–",
            requirement.ProbabilityOfConformance is { } chance ? $"{Number(100 * chance, 1)} %" : "–",
            requirement.Outcome.Replace('-', ' '),
        ])],
        [.. answer.Requirements.Select(requirement => requirement.Explanation)]);

    private static IReadOnlyList<ReportFact> InPlace(FieldDensityAnswer answer, DensityUnit unit) => Facts(
        ("Wet density", With(answer.Test.WetDensity, "wetDensity", unit)),
        ("Water content", With(answer.Test.WaterContent, "waterContent", unit)),
        ("Dry density", With(answer.Test.DryDensity, "dryDensity", unit)),
        ("Relative compaction", With(answer.RelativeCompaction, "relativeCompaction", unit)),
        ("Water content from optimum", With(answer.WaterContentFromOptimum, "waterContentFromOptimum", unit)),
        ("Relative density", With(answer.RelativeDensity, "relativeDensity", unit)),
        ("Void ratio", With(answer.Test.VoidRatio, "voidRatio", unit)),
        ("Saturation", With(answer.Test.Saturation, "saturation", unit)),
        ("Air voids", With(answer.Test.AirVoids, "airVoids", unit)));

    /// <summary>A value with its unit, as its quantity asks; null where there is none.</summary>
    private static string? With(double? value, string quantity, DensityUnit unit) =>
        value is null ? null
        : quantity == "voidRatio" ? Number(value, 3)
        : quantity != "relativeDensity" && quantity.EndsWith("Density", StringComparison.OrdinalIgnoreCase) ? $"{Density(value, unit)} {unit.Symbol()}"
        : $"{Number(value, 1)} %";

    /// <summary>A member's name as words: <c>relativeCompaction</c> is "relative compaction".</summary>
    private static string Words(string member) => Capital().Replace(member, match => " " + match.Value.ToLowerInvariant());

    [GeneratedRegex("[A-Z]")]
    private static partial Regex Capital();
}
