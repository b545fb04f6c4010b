using System.Globalization;
using Drypeak.Figures;
using Drypeak.Service.Contracts;
using Drypeak.Service.Hosting;
using Drypeak.Service.Laboratory;
using Drypeak.Soil.Quantities;
using static Drypeak.Service.Reports.ReportTexts;

namespace Drypeak.Service.Reports;

/// <summary>The report of a laboratory test.</summary>
internal static class MoistureDensityReport
{
    public const string Job = "moisture-density";

    public static void Map(IEndpointRouteBuilder app)
    {
        var (job, limits) = (app.ServiceProvider.GetRequiredService<MoistureDensityJob>(), app.ServiceProvider.GetRequiredService<Limits>());
        app.MapReport(new ReportKind<MoistureDensityRequest>(
            Job, "The report of a laboratory test", "Laboratory", Examples.MoistureDensityRequest, job.Check, (request, options) => Of(job, limits, request, options)));
    }

    private static Report Of(MoistureDensityJob job, Limits limits, MoistureDensityRequest request, ReportOptions options)
    {
        var (answer, chart) = job.Compute(request with { Trace = options.Working });
        var unit = request.Units.DensityUnit();
        return new Report
        {
            Kind = "Laboratory compaction test",
            Reference = answer.Reference,
            Result = Result(answer, unit),
            Support = Support(answer, unit),
            Identification = Identification(answer.Identification),
            Method = Method(request, answer),
            Table = Table(answer, unit),
            Picture = chart is null || CompactionFigure.Refusal(chart, FigureSize.Default) is { } ? null : figure => CompactionFigure.Draw(chart with { Reference = null }, figure),
            Results = Results(request, answer, unit),
            Findings = Findings(answer.Findings),
            Cautions = answer.Cautions,
            Working = options.Working ? Working(answer.Trace) : [],
            Provenance = Provenance(ProvenanceContract.Of(request)),
            Address = ReportAddress.Of(Job, request, limits, options.Query),
        };
    }

    private static string Result(MoistureDensityAnswer answer, DensityUnit unit)
    {
        var name = unit == DensityUnit.KilonewtonPerCubicMeter ? "dry unit weight" : "dry density";
        return answer switch
        {
            { Adopted: { } adopted } => $"Adopted maximum {name} {adopted.Reported.MaximumDryDensity} at {adopted.Reported.WaterContent} water content",
            { Optimum: { } optimum } => $"Maximum {name} {optimum.Reported.MaximumDryDensity} at {optimum.Reported.WaterContent} water content",
            _ => "No optimum within the tested range",
        };
    }

    private static string? Support(MoistureDensityAnswer answer, DensityUnit unit)
    {
        if (answer.Adopted is { } adopted)
        {
            return $"Adopted in place of the fitted optimum: {adopted.Reason}";
        }

        var density = Interval(answer.Optimum?.Uncertainty?.MaximumDryDensity?.Interval, value => Density(value, unit), unit.Symbol());
        var water = Interval(answer.Optimum?.Uncertainty?.WaterContent?.Interval, value => Number(value, 1), "%");
        var both = string.Join(" and ", ((string?[])[density, water]).OfType<string>());
        return answer.Optimum is null ? null : both.Length > 0 ? $"95 % interval {both}" : "The points support no uncertainty.";
    }

    private static IReadOnlyList<ReportFact> Method(MoistureDensityRequest request, MoistureDensityAnswer answer)
    {
        var effort = answer.Method?.Effort;
        return Facts(
            ("Method", answer.Method?.Title ?? "not given"),
            ("What it is", answer.Method?.Summary),
            ("Compactive effort", string.Join(", ", ((string?[])
            [
                effort?.Computed is { } computed ? $"{Number(computed, 0)} kJ/m³ computed" : null,
                effort?.Nominal is { } nominal ? $"{Number(nominal, 0)} kJ/m³ nominal" : null,
            ]).OfType<string>())),
            ("Specific gravity", request.SpecificGravity is { Value: { } gravity } given ? $"{gravity.ToString("0.00##", CultureInfo.InvariantCulture)}, {given.Determined ?? "assumed"}" : "not given"),
            ("Oversize", request.Oversize is { Percent: { } percent } oversize
                ? $"{percent.ToString("0.#", CultureInfo.InvariantCulture)} % of the total" + (oversize.SpecificGravity is { } gs ? $", specific gravity {gs.ToString("0.00#", CultureInfo.InvariantCulture)}" : "") : null),
            ("Curve", answer.Curve is { } curve ? $"{curve.Model}, {curve.Residuals.Count} points" : "none"));
    }

    private static ReportTable Table(MoistureDensityAnswer answer, DensityUnit unit) => new(
        "Specimens",
        ["Specimen", "Water (%)", $"Wet ({unit.Symbol()})", $"Dry ({unit.Symbol()})", "Void ratio", "Saturation (%)", "Air voids (%)"],
        [.. answer.Specimens.Select(specimen => (IReadOnlyList<string>)
        [
            specimen.SetAside is null ? specimen.Label : $"{specimen.Label}, set aside",
            Number(specimen.WaterContent, 2), Density(specimen.WetDensity, unit), Density(specimen.DryDensity, unit),
            Number(specimen.VoidRatio, 3), Number(specimen.Saturation, 1), Number(specimen.AirVoids, 1),
        ])],
        [.. answer.Specimens.Where(specimen => specimen.SetAside is { }).Select(specimen => $"{specimen.Label} set aside: {specimen.SetAside}")]);

    private static IReadOnlyList<ReportFact> Results(MoistureDensityRequest request, MoistureDensityAnswer answer, DensityUnit unit) => Facts(
        ("As fitted", answer.Optimum is { } optimum ? $"{Density(optimum.MaximumDryDensity, unit)} {unit.Symbol()} at {Number(optimum.WaterContent, 2)} %" : null),
        ("Saturation at the optimum", answer.Optimum?.Saturation is { } saturation ? $"{Number(saturation, 1)} %" : null),
        ("Corrected for oversize", answer.Corrected is { } corrected ? $"{corrected.Reported.MaximumDryDensity} at {corrected.Reported.WaterContent}"
            : request.Oversize is { } ? "not corrected: see the findings" : null),
        ("Scatter about the curve", answer.Curve?.RootMeanSquareError is { } scatter ? $"{Density(scatter, unit)} {unit.Symbol()}" : null),
        ("Suggested next specimen", answer.NextSpecimen is { } next ? $"{Number(next.WaterContent, 1)} % water" : null));
}
