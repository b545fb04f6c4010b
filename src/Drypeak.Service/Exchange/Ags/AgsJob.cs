using System.Buffers;
using Drypeak.Service.Exchange.Files;
using Drypeak.Service.Field;
using Drypeak.Service.Hosting;
using Drypeak.Service.Laboratory;
using Drypeak.Soil.Quantities;

namespace Drypeak.Service.Exchange.Ags;

/// <summary>How a file is to be computed.</summary>
/// <param name="Replace">Whether results that stand in the file and differ are replaced.</param>
/// <param name="MaximumDryDensity">Mg/m³; what the field tests are held against, or null.</param>
internal sealed record AgsOptions(bool Replace, double? MaximumDryDensity)
{
    public static readonly AgsOptions Default = new(false, null);
}

/// <summary>What came of a file: the answer and the file with its results, or why it was refused.</summary>
internal sealed record AgsOutcome(AgsAnswer? Answer, ReadOnlyMemory<byte> File, FileProblem? Refusal);

/// <summary>AGS4 files: read, computed by the jobs of <c>/v1/moisture-density</c> and <c>/v1/field-density</c>, results written into their own lines.</summary>
internal sealed class AgsJob(ExchangeJobs jobs)
{
    private const string Maximum = "CMPG_MAXD";
    private const string Optimum = "CMPG_MCOP";

    public AgsOutcome Compute(ReadOnlyMemory<byte> bytes, AgsOptions options)
    {
        var report = new AgsReport();
        var file = AgsFile.Read(bytes, report);
        var rules = new AgsRules(file, report);
        rules.Check();
        var reader = new AgsTests(file, report);
        var (tests, fieldTests) = (reader.Laboratory(), reader.Field(options.MaximumDryDensity));
        if (report.Faults.Count == 0)
        {
            CheckValues(tests, fieldTests, report);
        }

        if (report.Faults.Count > 0)
        {
            return new AgsOutcome(null, default, FileProblem.Of(ProblemKind.InvalidValues, report.Faults));
        }

        if (tests.Count + fieldTests.Count == 0)
        {
            report.Note(1, "nothing-to-compute", Severity.Warning, "The file has no compaction test with points (CMPG with CMPT) and no field density test (IDEN), so nothing was computed.");
        }

        var computed = tests.Select(test => (Test: test, jobs.Laboratory.Compute(test.Request).Answer)).ToList();
        var written = WithResults(file, computed, options.Replace, report);
        return new AgsOutcome(
            new AgsAnswer(
                rules.Edition,
                [.. file.Groups.Select(group => new AgsGroupAnswer(group.Name, group.Rows.Count))],
                [.. computed.Select(each => new AgsTestAnswer(each.Test.Key, each.Answer))],
                [.. fieldTests.Select(test => Of(test, FieldDensityJob.Compute(test.Request)))],
                report.Findings),
            written,
            null);
    }

    private static AgsFieldTestAnswer Of(AgsFieldTest test, FieldDensityAnswer answer) =>
        new(test.Key, answer.Test.DryDensity, answer.Test.WaterContent, answer.RelativeCompaction);

    private void CheckValues(IReadOnlyList<AgsLaboratoryTest> tests, IReadOnlyList<AgsFieldTest> fieldTests, AgsReport report)
    {
        foreach (var test in tests)
        {
            foreach (var fault in jobs.Laboratory.Check(test.Request))
            {
                var ofPoint = fault.Place.Split('/') is [_, "specimens", var index, ..] && int.TryParse(index, out var number) && number < test.Points.Count;
                report.Refuse(ofPoint ? test.Points[int.Parse(fault.Place.Split('/')[2], System.Globalization.CultureInfo.InvariantCulture)].Line : test.Row.Line, ofPoint ? "CMPT" : "CMPG", fault.Code, fault.Message);
            }
        }

        foreach (var test in fieldTests)
        {
            foreach (var fault in jobs.Field.Check(test.Request))
            {
                report.Refuse(test.Row.Line, "IDEN", fault.Code, fault.Message);
            }
        }
    }

    /// <summary>The file with the results in their places and every other byte as it came.</summary>
    private static ReadOnlyMemory<byte> WithResults(AgsFile file, IReadOnlyList<(AgsLaboratoryTest Test, MoistureDensityAnswer Answer)> computed, bool replace, AgsReport report)
    {
        if (file.Find("CMPG") is not { } group)
        {
            return file.Text.Bytes;
        }

        var changes = new SortedDictionary<int, (int Length, byte[] Bytes)>();
        foreach (var (test, answer) in computed)
        {
            if (answer.Optimum is not { } optimum)
            {
                report.Note(test.Row.Line, "result-not-written", Severity.Warning, $"CMPG: no optimum was found, so that {Maximum} and {Optimum} are left as they are. See the test's own findings.");
                continue;
            }

            if (AgsTests.UnitOfDensity(group, Maximum) is { } unit)
            {
                Write(Maximum, new Density(optimum.MaximumDryDensity * 1000).In(unit), test);
            }
            else
            {
                report.Note(group.UnitLine, "result-not-written", Severity.Warning, $"CMPG: the unit of {Maximum}, \"{Received.Shorten(group.UnitOf(Maximum))}\", is none of a density, so that the result is not written. Correct the UNIT line.");
            }

            Write(Optimum, optimum.WaterContent, test);
        }

        return changes.Count == 0 ? file.Text.Bytes : Spliced(file.Text.Bytes, changes);

        void Write(string heading, double value, AgsLaboratoryTest test)
        {
            if (group.IndexOf(heading) is not (>= 0 and var index))
            {
                report.Note(group.HeadingLine, "result-not-written", Severity.Warning, $"CMPG: the group has no heading {heading}, so that the result is not written. Add the heading with empty items and send the file again.");
                return;
            }

            var text = AgsValue.Written(value, group.TypeOf(heading), group.Definition!.Find(heading)!.Type);
            var item = test.Row.Items[index];
            var standing = item.Text.Trim();
            if (standing == text)
            {
                return;
            }

            if (standing.Length > 0)
            {
                report.Note(test.Row.Line, "result-differs", Severity.Warning, replace
                    ? $"CMPG: {heading} was \"{Received.Shorten(standing)}\" and is now {text}, as computed."
                    : $"CMPG: {heading} is \"{Received.Shorten(standing)}\" in the file; computed it is {text}. The file's is kept; ask for replace=true to put the computed one in its place.");
                if (!replace)
                {
                    return;
                }
            }

            changes[item.Start] = (item.Length, file.Text.Encoding.GetBytes($"\"{text}\""));
        }
    }

    private static byte[] Spliced(ReadOnlyMemory<byte> bytes, SortedDictionary<int, (int Length, byte[] Bytes)> changes)
    {
        var written = new ArrayBufferWriter<byte>(bytes.Length + 64);
        var from = 0;
        foreach (var (start, (length, replacement)) in changes)
        {
            written.Write(bytes.Span[from..start]);
            written.Write(replacement);
            from = start + length;
        }

        written.Write(bytes.Span[from..]);
        return written.WrittenSpan.ToArray();
    }
}
