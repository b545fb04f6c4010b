using System.Globalization;
using Drypeak.Figures;
using Drypeak.Service.Contracts;
using Drypeak.Service.Laboratory;
using Drypeak.Soil.Quantities;

namespace Drypeak.Service.Reports;

/// <summary>Numbers and lists of an answer as a report writes them.</summary>
internal static class ReportTexts
{
    private const string Nothing = "–";

    /// <summary>A number with fixed decimals and a real minus; a dash where there is none.</summary>
    public static string Number(double? value, int decimals) =>
        value is { } number ? ReaderText.Fixed(number, decimals) : Nothing;

    /// <summary>A density with the decimals that a reader can use, without its unit.</summary>
    public static string Density(double? value, DensityUnit unit) =>
        value is { } number ? ReaderText.Of(Soil.Quantities.Density.From(number, unit), unit)[..^(unit.Symbol().Length + 1)] : Nothing;

    /// <summary>An interval with its unit.</summary>
    public static string? Interval(double[]? ends, Func<double, string> number, string unit) =>
        ends is [var lower, var upper] ? $"{number(lower)} to {number(upper)} {unit}" : null;

    /// <summary>Facts of which the text is known.</summary>
    public static IReadOnlyList<ReportFact> Facts(params (string Label, string? Text)[] facts) =>
        [.. facts.Where(fact => !string.IsNullOrWhiteSpace(fact.Text)).Select(fact => new ReportFact(fact.Label, fact.Text!))];

    public static IReadOnlyList<ReportFact> Identification(IReadOnlyDictionary<string, string>? labels) =>
        [.. (labels ?? new Dictionary<string, string>()).Select(label => new ReportFact(label.Key, label.Value))];

    /// <summary>All but what is said of addresses, which a report has its own line for.</summary>
    public static IReadOnlyList<ReportFinding> Findings(IEnumerable<FindingContract> findings) =>
        [.. findings.Where(finding => finding.Code != Charts.ChartAddress.NoAddress.Code).Select(finding => new ReportFinding(finding.Severity, finding.Message, finding.Basis))];

    public static IReadOnlyList<ReportStep> Working(IReadOnlyList<TraceStep>? steps) =>
        [.. (steps ?? []).Select(step => new ReportStep(
            step.Quantity, step.Formula, step.Substitution, $"{step.Value.ToString("G6", CultureInfo.InvariantCulture)} {step.Unit}".TrimEnd(), step.Source))];

    public static string Provenance(ProvenanceContract provenance) => $"Drypeak {provenance.Version}, input {provenance.InputDigest}";
}
