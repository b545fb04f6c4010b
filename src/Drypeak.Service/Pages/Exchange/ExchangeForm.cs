using System.Globalization;
using System.Text;
using Drypeak.Service.Contracts;
using Drypeak.Service.Exchange;
using Drypeak.Service.Exchange.Ags;
using Drypeak.Service.Exchange.Csv;
using Drypeak.Service.Exchange.Files;
using Drypeak.Service.Field;
using Drypeak.Service.Laboratory;

namespace Drypeak.Service.Pages.Exchange;

/// <summary>What a file is, as the page asks for it.</summary>
/// <param name="Code">Its value in the form.</param>
/// <param name="Label">What it is called on the page.</param>
public sealed record ExchangeKind(string Code, string Label)
{
    public static readonly ExchangeKind Laboratory = new("csv-laboratory", "CSV, compaction tests");
    public static readonly ExchangeKind Field = new("csv-field", "CSV, field density tests");
    public static readonly ExchangeKind Ags4 = new("ags4", "AGS4");

    public static IReadOnlyList<ExchangeKind> All { get; } = [Laboratory, Field, Ags4];
}

/// <summary>The form as it was filled. A file that was uploaded stands in the text, so that it can be corrected on the page.</summary>
public sealed record ExchangeForm(ExchangeKind Kind, ReadOnlyMemory<byte> File, string MaximumDryDensity, bool Replace)
{
    public static readonly ExchangeForm Empty = new(ExchangeKind.Laboratory, default, "", false);

    public string Text => Encoding.UTF8.GetString(File.Span).TrimStart('\uFEFF');
}

/// <summary>A test of the file in a row of the page.</summary>
/// <param name="Name">Its reference, or its key.</param>
/// <param name="Numbers">What was computed, by the headings of the table.</param>
/// <param name="Findings">Its findings, worst first.</param>
public sealed record ExchangeRow(string Name, IReadOnlyList<string> Numbers, IReadOnlyList<FindingContract> Findings);

/// <summary>A table of tests.</summary>
public sealed record ExchangeTable(string Heading, IReadOnlyList<string> Columns, IReadOnlyList<ExchangeRow> Rows);

/// <summary>What the page shows of a computed file.</summary>
/// <param name="Sentence">In one sentence, what was computed.</param>
/// <param name="Tables">The tests.</param>
/// <param name="Groups">With AGS4: its groups and their rows.</param>
/// <param name="Findings">What there is to say about the file.</param>
/// <param name="Name">The name under which the file with results is saved.</param>
/// <param name="File">The file with results.</param>
/// <param name="Cautions">What to bear in mind.</param>
public sealed record ExchangeResult(
    string Sentence, IReadOnlyList<ExchangeTable> Tables, IReadOnlyList<AgsGroupAnswer> Groups, IReadOnlyList<FileFinding> Findings, string Name, ReadOnlyMemory<byte> File, IReadOnlyList<string> Cautions);

/// <summary>A form with its answer, or with what is wrong.</summary>
public sealed record ExchangeSubmission(ExchangeForm Form)
{
    /// <summary>The outcomes of field tests, in the order in which they are counted.</summary>
    private static readonly string[] Outcomes = ["accepted", "rejected", "undecided"];

    public ExchangeResult? Result { get; init; }

    /// <summary>What is wrong with the file, at its lines.</summary>
    public IReadOnlyList<FileFault> Faults { get; init; } = [];

    /// <summary>What is wrong with the density that the field tests are held against, or null.</summary>
    public string? DensityFault { get; init; }

    public int Status { get; init; } = StatusCodes.Status200OK;

    /// <summary>Computes a form, by the jobs of <c>/v1/exchange</c>.</summary>
    internal static ExchangeSubmission Of(ExchangeForm form, ExchangeJobs jobs)
    {
        double? maximum = null;
        if (form is { Kind.Code: "ags4", MaximumDryDensity.Length: > 0 })
        {
            if (Tables.NumberText.Read(form.MaximumDryDensity, null, out var number) is { } refusal || number is not (> 0.1 and < 10))
            {
                return new ExchangeSubmission(form) { DensityFault = "Give a density in Mg/m³ between 0.1 and 10, such as 1.93, or leave it empty.", Status = StatusCodes.Status422UnprocessableEntity };
            }

            maximum = number;
        }

        if (form.Kind == ExchangeKind.Ags4)
        {
            var outcome = new AgsJob(jobs).Compute(form.File, new AgsOptions(form.Replace, maximum));
            return outcome.Answer is { } answer ? new ExchangeSubmission(form) { Result = Of(answer, outcome.File) } : Refused(form, outcome.Refusal!);
        }

        return form.Kind == ExchangeKind.Laboratory
            ? Of(form, LaboratoryCsv.Compute(form.File.Span, jobs.Laboratory), tests => Sentence(tests.Count, "compaction test"), LaboratoryTable, answer => answer.Cautions)
            : Of(form, FieldCsv.Compute(form.File.Span, jobs.Field), SentenceOfField, FieldTable, answer => answer.Cautions);
    }

    private static ExchangeSubmission Of<TAnswer>(
        ExchangeForm form, CsvOutcome<TAnswer> outcome, Func<IReadOnlyList<TAnswer>, string> sentence, Func<IReadOnlyList<TAnswer>, ExchangeTable> table, Func<TAnswer, IReadOnlyList<string>> cautions) =>
        outcome.File is { } file
            ? new ExchangeSubmission(form)
            {
                Result = new ExchangeResult(sentence(file.Tests), [table(file.Tests)], [], file.Findings, "computed.csv", file.Write(), [.. file.Tests.SelectMany(cautions).Distinct()]),
            }
            : Refused(form, outcome.Refusal!);

    private static ExchangeSubmission Refused(ExchangeForm form, FileProblem refusal) => new(form) { Faults = refusal.Errors, Status = refusal.Status };

    private static ExchangeResult Of(AgsAnswer answer, ReadOnlyMemory<byte> file)
    {
        var laboratory = LaboratoryTable([.. answer.Tests.Select(test => test.Answer)]);
        var field = new ExchangeTable("Field density tests", ["Dry density, Mg/m³", "Water content, %", "Relative compaction, %"],
            [.. answer.FieldTests.Select(test => new ExchangeRow(string.Join(", ", test.Key.Values.Where(text => text.Length > 0)), [Text(test.DryDensity, "0.000"), Text(test.WaterContent, "0.0"), Text(test.RelativeCompaction, "0.0")], []))]);
        var sentence = (answer.Tests.Count, answer.FieldTests.Count) switch
        {
            (0, 0) => "Nothing in the file could be computed.",
            (var tests, 0) => Sentence(tests, "compaction test"),
            (0, var tests) => Sentence(tests, "field density test"),
            var (tests, fieldTests) => $"{Counted(tests, "compaction test")} and {Counted(fieldTests, "field density test")} computed.",
        };
        return new ExchangeResult(sentence, [.. new[] { laboratory, field }.Where(table => table.Rows.Count > 0)], answer.Groups, answer.Findings, "computed.ags", file,
            [.. answer.Tests.SelectMany(test => test.Answer.Cautions).Distinct()]);
    }

    private static string Sentence(int count, string what) => $"{Counted(count, what)} computed.";

    private static string SentenceOfField(IReadOnlyList<FieldDensityAnswer> tests)
    {
        var decided = Outcomes
            .Select(outcome => (Outcome: outcome, Count: tests.Count(test => test.Outcome == outcome))).Where(each => each.Count > 0).Select(each => $"{each.Count} {each.Outcome}").ToList();
        return decided.Count == 0 ? Sentence(tests.Count, "field density test") : $"{Counted(tests.Count, "field density test")} computed: {string.Join(", ", decided)}.";
    }

    private static string Counted(int count, string what) => $"{count} {what}{(count == 1 ? "" : "s")}";

    private static ExchangeTable LaboratoryTable(IReadOnlyList<MoistureDensityAnswer> tests) => new(
        "Compaction tests", ["Maximum dry density", "Optimum water content", "Curve"],
        [.. tests.Select((test, i) => new ExchangeRow(
            test.Reference ?? $"Test {i + 1}",
            [test.Optimum?.Reported.MaximumDryDensity ?? "none", test.Optimum?.Reported.WaterContent ?? "none", test.Curve?.Model ?? "none"],
            test.Findings))]);

    private static ExchangeTable FieldTable(IReadOnlyList<FieldDensityAnswer> tests) => new(
        "Field density tests", ["Dry density", "Water content, %", "Relative compaction, %", "Outcome"],
        [.. tests.Select((test, i) => new ExchangeRow(
            test.Reference ?? $"Test {i + 1}",
            [$"{Text(test.Test.DryDensity, "0.###")} {test.Units.Density}", Text(test.Test.WaterContent, "0.0"), Text(test.RelativeCompaction, "0.0"), test.Outcome ?? "nothing required"],
            test.Findings))]);

    private static string Text(double? value, string format) => value?.ToString(format, CultureInfo.InvariantCulture) ?? "–";
}
