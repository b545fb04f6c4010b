using Drypeak.Service.Contracts;
using Drypeak.Service.Field;
using Drypeak.Service.Laboratory;
using Drypeak.Service.Pages.Tables;
using Drypeak.Soil.Phases;
using Drypeak.Soil.Quantities;

namespace Drypeak.Service.Exchange.Ags;

/// <summary>A laboratory test of a file: a row of CMPG with its rows of CMPT.</summary>
internal sealed record AgsLaboratoryTest(AgsRow Row, IReadOnlyDictionary<string, string> Key, MoistureDensityRequest Request, IReadOnlyList<AgsRow> Points);

/// <summary>A field test of a file: a row of IDEN.</summary>
internal sealed record AgsFieldTest(AgsRow Row, IReadOnlyDictionary<string, string> Key, FieldDensityRequest Request);

/// <summary>Groups of a file to requests of the jobs. Densities are in Mg/m³ from here on, whatever unit the file's UNIT line names.</summary>
internal sealed class AgsTests(AgsFile file, AgsReport report)
{
    private const string MegagramPerCubicMeter = "Mg/m3";

    private static readonly UnitsContract Units = new() { Density = MegagramPerCubicMeter };

    /// <summary>Clauses of BS 1377-4 by the codes of CMPG_TYPE and CMPG_MOLD, whose words are that standard's.</summary>
    private static readonly Dictionary<(string Rammer, string Mold), string> Methods = new()
    {
        [("2.5KG", "1 LITRE")] = "bs-1377-4-3.3",
        [("2.5KG", "CBR")] = "bs-1377-4-3.4",
        [("4.5KG", "1 LITRE")] = "bs-1377-4-3.5",
        [("4.5KG", "CBR")] = "bs-1377-4-3.6",
        [("VIBRO", "CBR")] = "bs-1377-4-3.7",
    };

    /// <summary>The tests of CMPG that have points; one without is said.</summary>
    public IReadOnlyList<AgsLaboratoryTest> Laboratory()
    {
        if (file.Find("CMPG") is not { } tests)
        {
            return [];
        }

        var points = file.Find("CMPT");
        var found = new List<AgsLaboratoryTest>();
        foreach (var row in tests.Rows)
        {
            var ofTest = points is null ? [] : PointsOf(tests, row, points);
            if (ofTest.Count == 0)
            {
                report.Note(row.Line, "no-points", Severity.Note, "CMPG: the test has no points in CMPT, so nothing is computed for it. Its line is kept as it is.");
            }
            else
            {
                found.Add(new AgsLaboratoryTest(row, tests.KeyOf(row), RequestOf(tests, row, points!, ofTest), ofTest));
            }
        }

        return found;
    }

    /// <summary>The tests of IDEN that give a density and a water content.</summary>
    /// <param name="maximumDryDensity">Mg/m³; what they are held against, or null.</param>
    public IReadOnlyList<AgsFieldTest> Field(double? maximumDryDensity)
    {
        if (file.Find("IDEN") is not { } tests)
        {
            return [];
        }

        var found = new List<AgsFieldTest>();
        foreach (var row in tests.Rows)
        {
            var (wet, w) = (Density(tests, row, "IDEN_IDEN"), Number(tests, row, "IDEN_MC"));
            if (wet is null || w is null)
            {
                report.Note(row.Line, "incomplete-test", Severity.Warning, "IDEN: the row lacks its bulk density or its water content, so nothing is computed for it.");
                continue;
            }

            found.Add(new AgsFieldTest(row, tests.KeyOf(row), new FieldDensityRequest
            {
                Reference = tests.Text(row, "IDEN_TESN"),
                Units = Units,
                Method = "direct",
                Direct = new DirectContract { WetDensity = wet },
                WaterContent = w,
                Laboratory = maximumDryDensity is null ? null : new LaboratoryContract { MaximumDryDensity = maximumDryDensity },
            }));
        }

        return found;
    }

    private List<AgsRow> PointsOf(AgsGroup tests, AgsRow test, AgsGroup points)
    {
        var keys = tests.Definition!.Keys.Where(key => tests.IndexOf(key) >= 0 && points.IndexOf(key) >= 0).ToList();
        var complete = new List<AgsRow>();
        foreach (var point in points.Rows.Where(point => keys.TrueForAll(key => points.Text(point, key) == tests.Text(test, key))))
        {
            if (points.Text(point, "CMPT_MC").Length == 0 || points.Text(point, "CMPT_DDEN").Length == 0)
            {
                report.Note(point.Line, "incomplete-point", Severity.Warning, "CMPT: the point lacks its water content or its dry density. It is left out of the curve.");
            }
            else
            {
                complete.Add(point);
            }
        }

        return complete;
    }

    private MoistureDensityRequest RequestOf(AgsGroup tests, AgsRow row, AgsGroup points, IReadOnlyList<AgsRow> ofTest)
    {
        var method = Methods.GetValueOrDefault((tests.Text(row, "CMPG_TYPE").ToUpperInvariant(), tests.Text(row, "CMPG_MOLD").ToUpperInvariant()));
        return new MoistureDensityRequest
        {
            Reference = string.Join(", ", tests.KeyOf(row).Values.Where(text => text.Length > 0)),
            Method = method,
            Units = Units,
            SpecificGravity = SpecificGravityOf(tests, row),
            ParticlesAbove = method is null ? null : ParticlesAbove(tests, row),
            Specimens = [.. ofTest.Select(point => new SpecimenContract
            {
                Label = points.Text(point, "CMPT_TESN") is { Length: > 0 } label ? label : null,
                WaterContent = Number(points, point, "CMPT_MC"),
                DryDensity = Density(points, point, "CMPT_DDEN"),
            })],
        };
    }

    /// <summary>The coarser of the two sieves of which anything was retained.</summary>
    private ParticlesAboveContract? ParticlesAbove(AgsGroup tests, AgsRow row) =>
        Number(tests, row, "CMPG_375") is > 0 and var coarse ? new ParticlesAboveContract { Sieve = 37.5, Percent = coarse }
        : Number(tests, row, "CMPG_200") is { } fine ? new ParticlesAboveContract { Sieve = 20, Percent = fine }
        : null;

    /// <summary>CMPG_PDEN over the density of water at 20 °C; <c>#</c> before or behind it says that it was assumed. Where it is empty, the specimen's LPDN_PDEN.</summary>
    private SpecificGravityContract? SpecificGravityOf(AgsGroup tests, AgsRow row)
    {
        var (group, at, text, heading) = (tests, row, tests.Text(row, "CMPG_PDEN"), "CMPG_PDEN");
        if (text.Length == 0)
        {
            if (file.Find("LPDN") is not { } densities)
            {
                return null;
            }

            var keys = densities.Definition!.Keys.Where(key => densities.IndexOf(key) >= 0 && tests.IndexOf(key) >= 0).ToList();
            var same = densities.Rows.FindAll(other => densities.Text(other, "LPDN_PDEN").Length > 0 && keys.TrueForAll(key => densities.Text(other, key) == tests.Text(row, key)));
            if (same is not [var only])
            {
                return null;
            }

            report.Note(row.Line, "particle-density-from-lpdn", Severity.Note, $"CMPG: the test has no CMPG_PDEN; the particle density of the same specimen, LPDN in line {only.Line}, is used.");
            (group, at, text, heading) = (densities, only, densities.Text(only, "LPDN_PDEN"), "LPDN_PDEN");
        }

        var unit = DensityUnitOf(group, heading);
        if (AgsValue.Number(text.Trim('#', ' ')) is not { } particle)
        {
            report.Refuse(at.Line, group.Name, "not-a-number", $"{heading} is \"{Hosting.Received.Shorten(text)}\", no number. Write the particle density in figures, with # before it where it was assumed.");
            return null;
        }

        return new SpecificGravityContract
        {
            Value = Soil.Quantities.Density.From(particle, unit).KilogramsPerCubicMeter / WaterDensity.At(WaterDensity.DefaultTemperature).KilogramsPerCubicMeter,
            Determined = text.Contains('#', StringComparison.Ordinal) ? "assumed" : "measured",
        };
    }

    private double? Density(AgsGroup group, AgsRow row, string heading)
    {
        var unit = DensityUnitOf(group, heading);
        return Number(group, row, heading) is not { } number ? null
            : unit == DensityUnit.MegagramPerCubicMeter ? number
            : Soil.Quantities.Density.From(number, unit).In(DensityUnit.MegagramPerCubicMeter);
    }

    /// <summary>The unit of a density by the UNIT line, Mg/m³ where it is empty; null where it names no unit of density.</summary>
    public static DensityUnit? UnitOfDensity(AgsGroup group, string heading)
    {
        var written = group.UnitOf(heading);
        return written.Length == 0 ? DensityUnit.MegagramPerCubicMeter
            : ColumnUnits.Code(Measure.Density, written) is { } code ? UnitNames.Density[code]
            : null;
    }

    private DensityUnit DensityUnitOf(AgsGroup group, string heading)
    {
        if (UnitOfDensity(group, heading) is { } unit)
        {
            return unit;
        }

        report.Refuse(group.UnitLine, group.Name, "unit-unknown", $"The unit of {heading} is \"{Hosting.Received.Shorten(group.UnitOf(heading))}\"; densities are in {string.Join(", ", ColumnUnits.Known(Measure.Density))}.");
        return DensityUnit.MegagramPerCubicMeter;
    }

    private double? Number(AgsGroup group, AgsRow row, string heading)
    {
        var text = group.Text(row, heading);
        if (text.Length == 0)
        {
            return null;
        }

        if (AgsValue.Number(text) is { } number)
        {
            return number;
        }

        report.Refuse(row.Line, group.Name, "not-a-number", $"{heading} is \"{Hosting.Received.Shorten(text)}\", no number. Write it in figures with a decimal point, or leave it empty.");
        return null;
    }
}
