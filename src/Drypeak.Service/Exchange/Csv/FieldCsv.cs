using Drypeak.Service.Exchange.Files;
using Drypeak.Service.Field;
using Drypeak.Service.Pages.Tables;

namespace Drypeak.Service.Exchange.Csv;

/// <summary>Field tests as CSV, a row a test with densities that are known already (method <c>direct</c>): read, computed by the job of <c>/v1/field-density</c>, written back.</summary>
internal static class FieldCsv
{
    private const string Direct = "direct";

    private static readonly CsvColumn Label = new("label", Measure.Text, "Names the test.") { Words = ["reference", "test", "no", "number", "location"] };
    private static readonly CsvColumn Method = new("method", Measure.Text, "direct, or empty: the densities are known.");
    private static readonly CsvColumn WetDensity = new("wetDensity", Measure.Density, "Wet density in place.") { OfSpecimen = ColumnKind.WetDensity };
    private static readonly CsvColumn WaterContent = new("waterContent", Measure.Percent, "Water content in place, % of dry mass.") { OfSpecimen = ColumnKind.WaterContent };
    private static readonly CsvColumn DryDensity = new("dryDensity", Measure.Density, "Dry density in place.") { OfSpecimen = ColumnKind.DryDensity };
    private static readonly CsvColumn MaximumDryDensity = new("maximumDryDensity", Measure.Density, "The laboratory's maximum dry density.") { Words = ["max dry density"] };
    private static readonly CsvColumn OptimumWaterContent = new("optimumWaterContent", Measure.Percent, "The laboratory's optimum water content.") { Words = ["optimum water"] };
    private static readonly CsvColumn MinimumRelativeCompaction = new("minimumRelativeCompaction", Measure.Percent, "The relative compaction required.") { Words = ["required relative compaction"] };
    private static readonly CsvColumn RelativeCompaction = new("relativeCompaction", Measure.Percent, "Dry density over the laboratory's maximum.") { IsComputed = true };
    private static readonly CsvColumn WaterContentFromOptimum = new("waterContentFromOptimum", Measure.Percent, "Water content less the laboratory's optimum, percentage points.") { IsComputed = true };
    private static readonly CsvColumn Outcome = new("outcome", Measure.Text, "accepted, rejected or undecided; empty where nothing is required.") { IsComputed = true };

    public static IReadOnlyList<CsvColumn> Columns { get; } =
        [Label, Method, WetDensity, WaterContent, DryDensity, MaximumDryDensity, OptimumWaterContent, MinimumRelativeCompaction, RelativeCompaction, WaterContentFromOptimum, Outcome];

    /// <summary>The cell that a member of the request comes from.</summary>
    private static readonly Dictionary<string, CsvColumn> Places = new()
    {
        ["/reference"] = Label,
        ["/method"] = Method,
        ["/direct/wetDensity"] = WetDensity,
        ["/direct/dryDensity"] = DryDensity,
        ["/waterContent"] = WaterContent,
        ["/laboratory/maximumDryDensity"] = MaximumDryDensity,
        ["/laboratory/optimumWaterContent"] = OptimumWaterContent,
        ["/specification/requirements/0/minimum"] = MinimumRelativeCompaction,
    };

    private static readonly IReadOnlyList<(CsvColumn Column, Func<FieldDensityRequest, FieldDensityAnswer, string?> Value)> Written =
    [
        (Label, (_, answer) => CsvText.Guarded(answer.Reference)),
        (Method, (request, _) => request.Method),
        (WetDensity, (_, answer) => Text(answer.Test.WetDensity)),
        (WaterContent, (_, answer) => Text(answer.Test.WaterContent)),
        (DryDensity, (_, answer) => Text(answer.Test.DryDensity)),
        (MaximumDryDensity, (request, _) => Text(request.Laboratory?.MaximumDryDensity)),
        (OptimumWaterContent, (request, _) => Text(request.Laboratory?.OptimumWaterContent)),
        (MinimumRelativeCompaction, (request, _) => Text(request.Specification?.Requirements?[0].Minimum)),
        (RelativeCompaction, (_, answer) => Text(answer.RelativeCompaction)),
        (WaterContentFromOptimum, (_, answer) => Text(answer.WaterContentFromOptimum)),
        (Outcome, (_, answer) => answer.Outcome),
    ];

    /// <summary>Reads and computes a file.</summary>
    public static CsvOutcome<FieldDensityAnswer> Compute(ReadOnlySpan<byte> bytes, FieldDensityJob job)
    {
        var ofForm = new List<FileFault>();
        if (CsvTable.Read(bytes, Columns, ofForm) is not { } table)
        {
            return CsvOutcome<FieldDensityAnswer>.Refused(ofForm, []);
        }

        var ofValues = new List<FileFault>();
        var tests = new List<FieldDensityRequest>();
        foreach (var row in table.Rows)
        {
            if (table.Text(row, Method.Name) is { } method && method != Direct)
            {
                ofValues.Add(CsvText.Fault(row.Line, table.Find(Method.Name)!.Position + 1, "not-by-csv",
                    $"A row holds densities that are known, method {Direct}; “{NumberText.Shortened(method)}” was read. Send the readings of other methods as JSON, one a line, to /v1/field-density/batch."));
                continue;
            }

            var test = RequestOf(table, row);
            var faults = job.Check(test);
            ofValues.AddRange(faults.Select(fault => At(table, row, fault)).Where(fault => !ofForm.Exists(form => form.Line == fault.Line)));
            tests.Add(faults.Count == 0 ? WithoutWhatFollows(test, job) : test);
        }

        if (ofForm.Count + ofValues.Count > 0)
        {
            return CsvOutcome<FieldDensityAnswer>.Refused(ofForm, ofValues);
        }

        var answers = tests.ConvertAll(test => job.ComputeWithChart(test).Answer);
        var replaced = table.Rows.Zip(answers).SelectMany(test => new[]
        {
            table.Replaced(test.First, RelativeCompaction, test.Second.RelativeCompaction),
            table.Replaced(test.First, WaterContentFromOptimum, test.Second.WaterContentFromOptimum),
        });
        return new CsvOutcome<FieldDensityAnswer>(new CsvFile<FieldDensityAnswer>(answers, [.. replaced.OfType<FileFinding>()], () => Write(tests, answers)), null);
    }

    private static byte[] Write(List<FieldDensityRequest> tests, List<FieldDensityAnswer> answers) => CsvText.Write(
    [
        Written.Select(column => (string?)LaboratoryCsv.HeaderOf(column.Column, answers[0].Units)),
        .. tests.Zip(answers).Select(test => Written.Select(column => column.Value(test.First, test.Second))),
    ]);

    private static FieldDensityRequest RequestOf(CsvTable table, CsvRow row)
    {
        double? Number(CsvColumn column) => table.Number(row, column.Name);
        var (maximum, optimum, minimum) = (Number(MaximumDryDensity), Number(OptimumWaterContent), Number(MinimumRelativeCompaction));
        return new FieldDensityRequest
        {
            Reference = table.Text(row, Label.Name)?.ReplaceLineEndings(" "),
            Units = table.Units,
            Method = table.Text(row, Method.Name) ?? Direct,
            Direct = new DirectContract { WetDensity = Number(WetDensity), DryDensity = Number(DryDensity) },
            WaterContent = Number(WaterContent),
            Laboratory = (maximum, optimum) is (null, null) ? null : new LaboratoryContract { MaximumDryDensity = maximum, OptimumWaterContent = optimum },
            Specification = minimum is null ? null : new SpecificationContract
            {
                Requirements = [new RequirementContract { Quantity = "relativeCompaction", Minimum = minimum }],
            },
        };
    }

    private static FileFault At(CsvTable table, CsvRow row, Fault fault)
    {
        for (var place = fault.Place; place.Length > 0; place = place[..place.LastIndexOf('/')])
        {
            if (Places.GetValueOrDefault(place) is { } column && table.Find(column.Name) is { } found)
            {
                return CsvText.Fault(row.Line, found.Position + 1, fault.Code, fault.Message);
            }
        }

        return CsvText.Fault(row.Line, 1, fault.Code, fault.Message);
    }

    /// <summary>The test without what comes out of its other cells to the last digit, see the laboratory's.</summary>
    private static FieldDensityRequest WithoutWhatFollows(FieldDensityRequest test, FieldDensityJob job)
    {
        var (wet, dry, w) = (test.Direct!.WetDensity, test.Direct.DryDensity, test.WaterContent);
        if (wet is null || dry is null || w is null)
        {
            return test;
        }

        FieldDensityRequest[] leaner =
        [
            test with { Direct = new DirectContract { DryDensity = dry } },
            test with { Direct = new DirectContract { WetDensity = wet } },
            test with { WaterContent = null },
        ];
        return leaner.FirstOrDefault(candidate => job.Check(candidate).Count == 0 && FieldDensityJob.Compute(candidate).Test is var soil
            && soil.WetDensity.Equals(wet) && soil.DryDensity.Equals(dry) && soil.WaterContent.Equals(w)) ?? test;
    }

    private static string? Text(double? value) => value is { } number ? CsvText.Number(number) : null;
}
