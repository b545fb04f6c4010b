using System.Text.RegularExpressions;
using Drypeak.Service.Contracts;
using Drypeak.Service.Exchange.Files;
using Drypeak.Service.Laboratory;
using Drypeak.Service.Pages.Tables;
using Drypeak.Soil.Laboratory;
using Drypeak.Soil.Quantities;

namespace Drypeak.Service.Exchange.Csv;

/// <summary>Laboratory tests as CSV, a row a specimen: read, computed by the job of <c>/v1/moisture-density</c>, written back.</summary>
internal static partial class LaboratoryCsv
{
    /// <summary>Reads and computes a file.</summary>
    public static CsvOutcome<MoistureDensityAnswer> Compute(ReadOnlySpan<byte> bytes, MoistureDensityJob job)
    {
        var ofForm = new List<FileFault>();
        if (CsvTable.Read(bytes, LaboratoryColumns.All, ofForm) is not { } table)
        {
            return CsvOutcome<MoistureDensityAnswer>.Refused(ofForm, []);
        }

        var tests = TestsOf(table).Select(rows => new CsvTest(table, rows, ofForm)).ToList();
        var ofValues = tests.SelectMany(test => job.Check(test.Request).Select(test.At).Where(fault => !ofForm.Exists(form => form.Line == fault.Line))).ToList();
        ofValues.AddRange(tests.SelectMany(test => test.Faults));
        if (ofForm.Count + ofValues.Count > 0)
        {
            return CsvOutcome<MoistureDensityAnswer>.Refused(ofForm, ofValues);
        }

        var answers = tests.ConvertAll(test => job.Compute(test.Request).Answer);
        return new CsvOutcome<MoistureDensityAnswer>(
            new CsvFile<MoistureDensityAnswer>(answers, [.. tests.Zip(answers).SelectMany(test => test.First.Replaced(test.Second))], () => Write([.. tests.Select(test => test.Request).Zip(answers)])), null);
    }

    /// <summary>Tests and their answers as a file, a row a specimen.</summary>
    public static byte[] Write(IReadOnlyList<(MoistureDensityRequest Request, MoistureDensityAnswer Answer)> tests)
    {
        var rows = tests.SelectMany(test => test.Answer.Specimens.Select((_, i) => new LaboratoryRow(test.Request, test.Answer, i))).ToList();
        var tins = Math.Max(1, rows.Max(row => row.Given.Tins?.Count ?? 0));
        var seldom = LaboratoryColumns.Seldom.Where(column => rows.Exists(row => column.Value(row) is not null)).ToList();
        List<(string Header, Func<LaboratoryRow, string?> Value)> columns =
        [
            .. LaboratoryColumns.Before.Concat(seldom).Select(each => (HeaderOf(each.Column, tests[0].Answer.Units), each.Value)),
            .. Enumerable.Range(0, tins).SelectMany(tin => LaboratoryColumns.OfTin.Select(each => (
                HeaderOf(each.Column, tests[0].Answer.Units, tin), (Func<LaboratoryRow, string?>)(row => each.Value(new LaboratoryColumns.TinContractOf(row, tin)))))),
            .. LaboratoryColumns.AfterTins.Select(each => (HeaderOf(each.Column, tests[0].Answer.Units), each.Value)),
        ];
        return CsvText.Write([columns.Select(column => (string?)column.Header), .. rows.Select(row => columns.Select(column => column.Value(row)))]);
    }

    /// <summary><c>tin2AndWet [g]</c>.</summary>
    public static string HeaderOf(CsvColumn column, UnitsContract units, int tin = 0)
    {
        var name = tin == 0 ? column.Name : column.Name.Replace("tin", $"tin{tin + 1}", StringComparison.Ordinal);
        var unit = ColumnUnits.Of(column.Measure, units.ToUnitSet());
        return unit.Length > 0 ? $"{name} [{unit}]" : name;
    }

    /// <summary>The rows of each test, in the order of their first rows; a row without a reference belongs to the test above it.</summary>
    private static IEnumerable<IReadOnlyList<CsvRow>> TestsOf(CsvTable table)
    {
        var tests = new List<(string? Reference, List<CsvRow> Rows)>();
        var current = -1;
        foreach (var row in table.Rows)
        {
            var reference = ReferenceOf(table, row);
            if (reference is not null || current < 0)
            {
                current = tests.FindIndex(test => test.Reference == reference);
                if (current < 0)
                {
                    current = tests.Count;
                    tests.Add((reference, []));
                }
            }

            tests[current].Rows.Add(row);
        }

        return tests.Select(test => test.Rows);
    }

    private static string? ReferenceOf(CsvTable table, CsvRow row) =>
        table.Text(row, LaboratoryColumns.Reference.Name) is { } text ? LineBreaks().Replace(text, " ") : null;

    [GeneratedRegex("\r\n|\n|\r")]
    private static partial Regex LineBreaks();

    /// <summary>A test of a file: its request, and for each place in it the cell that it came from.</summary>
    private sealed class CsvTest
    {
        private readonly CsvTable _table;
        private readonly IReadOnlyList<CsvRow> _rows;
        private readonly List<FoundColumn> _ofSpecimens;
        private readonly SpecimenSheet _sheet;
        private readonly Dictionary<string, (CsvRow Row, string Column)> _ofTest = [];
        private readonly int _rowOfMold;

        public CsvTest(CsvTable table, IReadOnlyList<CsvRow> rows, List<FileFault> ofForm)
        {
            (_table, _rows) = (table, rows);
            _ofSpecimens = [.. table.Columns.Where(column => column.Column.OfSpecimen is not null)];
            _sheet = SpecimenSheet.Read(
                [.. _ofSpecimens.Select(CsvTable.AsTableColumn)],
                [.. rows.Select(row => _ofSpecimens.ConvertAll(column => column.Column.IsNumber ? CsvTable.Plain(CsvTable.Cell(row, column)) : CsvTable.Cell(row, column)))],
                table.UnitSet, table.Mark);
            ofForm.AddRange(_sheet.Faults.Select(At));

            _rowOfMold = _sheet.Specimens.Select(specimen => specimen.Mold is not null).ToList().IndexOf(true);
            var mold = _rowOfMold < 0 ? null : _sheet.Specimens[_rowOfMold].Mold;
            var gravity = OfTest("/specificGravity/value", LaboratoryColumns.SpecificGravity, row => table.Number(row, LaboratoryColumns.SpecificGravity.Name));
            Request = new MoistureDensityRequest
            {
                Reference = ReferenceOf(table, rows[0]),
                Method = OfTest("/method", LaboratoryColumns.Method, row => table.Text(row, LaboratoryColumns.Method.Name)),
                Units = table.Units,
                Mold = mold,
                SpecificGravity = gravity is { } value ? new SpecificGravityContract { Value = value } : null,
                Specimens =
                [
                    .. _sheet.Specimens.Select(specimen => specimen.Mold == mold ? specimen with { Mold = null } : specimen)
                        .Select((specimen, i) => WithoutWhatFollows(specimen, mold, i, table.UnitSet)),
                ],
            };
        }

        public MoistureDensityRequest Request { get; }

        /// <summary>What is the test's and stands differently on its rows.</summary>
        public List<FileFault> Faults { get; } = [];

        /// <summary>What the file says of the peak otherwise than the answer.</summary>
        public IEnumerable<FileFinding> Replaced(MoistureDensityAnswer answer) => new[]
        {
            _table.Replaced(_rows[0], LaboratoryColumns.OptimumWaterContent, answer.Optimum?.WaterContent),
            _table.Replaced(_rows[0], LaboratoryColumns.MaximumDryDensity, answer.Optimum?.MaximumDryDensity),
        }.OfType<FileFinding>();

        /// <summary>A fault of the request at its cell.</summary>
        public FileFault At(Fault fault)
        {
            for (var place = fault.Place; place.Length > 0; place = place[..place.LastIndexOf('/')])
            {
                if (_ofTest.TryGetValue(place, out var cell))
                {
                    return CsvText.Fault(cell.Row.Line, _table.Find(cell.Column)!.Position + 1, fault.Code, fault.Message);
                }

                var inSheet = place.StartsWith("/mold", StringComparison.Ordinal) ? $"/specimens/{Math.Max(_rowOfMold, 0)}{place}" : place;
                if (_sheet.CellOf(inSheet) is { } found)
                {
                    return CsvText.Fault(_rows[found.Row].Line, _ofSpecimens[found.Column].Position + 1, fault.Code, fault.Message);
                }
            }

            var row = fault.Place.Split('/') is [_, "specimens", var index, ..] && int.TryParse(index, out var number) && number < _rows.Count ? _rows[number] : _rows[0];
            var column = fault.Place == "/reference" ? _table.Find(LaboratoryColumns.Reference.Name) : null;
            return CsvText.Fault(row.Line, (column?.Position ?? 0) + 1, fault.Code, fault.Message);
        }

        /// <summary>A value of the test: the first that stands on one of its rows; another one on a later row is a fault.</summary>
        private T? OfTest<T>(string place, CsvColumn column, Func<CsvRow, T?> read)
        {
            T? first = default;
            foreach (var row in _rows)
            {
                if (read(row) is not { } value)
                {
                    continue;
                }

                if (_ofTest.TryAdd(place, (row, column.Name)))
                {
                    first = value;
                }
                else if (!value.Equals(first))
                {
                    Faults.Add(CsvText.Fault(row.Line, _table.Find(column.Name)!.Position + 1, "contradiction",
                        $"{column.Name} is the test's, and on line {_ofTest[place].Row.Line} it is {first}; here it is {value}. Correct one, or give the rows different references."));
                }
            }

            return first;
        }

        /// <summary>
        /// The specimen without the densities and the water content that come out of its other cells to the last digit, as
        /// they do in a file that was written here: so such a file gives the very request that it came from.
        /// </summary>
        private static SpecimenContract WithoutWhatFollows(SpecimenContract specimen, MoldContract? mold, int index, UnitSet units)
        {
            var (wet, dry, w) = (specimen.WetDensity, specimen.DryDensity, specimen.WaterContent);
            if (wet is null || dry is null || w is null)
            {
                return specimen;
            }

            SpecimenContract[] leaner =
            [
                specimen with { WetDensity = null, DryDensity = null, WaterContent = null },
                specimen with { WetDensity = null, DryDensity = null },
                specimen with { DryDensity = null, WaterContent = null },
                specimen with { WetDensity = null, WaterContent = null },
                specimen with { WetDensity = null },
                specimen with { DryDensity = null },
                specimen with { WaterContent = null },
            ];
            return leaner.FirstOrDefault(GivesTheSame) ?? specimen;

            bool GivesTheSame(SpecimenContract candidate) =>
                SpecimenReduction.Reduce(candidate.ToMeasurement(index, units), mold.ToMold(units), "", units, []) is { } reduced
                && reduced.WetDensity.In(units.Density).Equals(wet) && reduced.DryDensity.In(units.Density).Equals(dry) && reduced.WaterContent.Percent.Equals(w);
        }
    }
}
