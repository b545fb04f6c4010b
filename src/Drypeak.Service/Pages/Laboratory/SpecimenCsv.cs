using System.Globalization;
using System.Text;
using Drypeak.Service.Laboratory;

namespace Drypeak.Service.Pages.Laboratory;

/// <summary>
/// A test as a table, a row a specimen (RFC 4180): what was given with its computed columns filled, then on the first row what the test
/// says. Numbers are unrounded, with a decimal point; units stand in the header.
/// </summary>
internal static class SpecimenCsv
{
    /// <summary>A text that begins so would be run as a formula by a spreadsheet.</summary>
    private const string FormulaStarts = "=+-@\t\r";

    private sealed record Row(MoistureDensityRequest Request, MoistureDensityAnswer Answer, int Index)
    {
        public SpecimenContract Given => Request.Specimens![Index];

        public SpecimenAnswer Computed => Answer.Specimens[Index];

        public bool IsFirst => Index == 0;
    }

    private sealed record Column(string Name, Func<MoistureDensityAnswer, string?> Unit, Func<Row, string?> Value);

    private static readonly IReadOnlyList<Column> Columns =
    [
        Text("reference", row => row.IsFirst ? row.Answer.Reference : null),
        Text("method", row => row.IsFirst ? row.Request.Method : null),
        Text("label", row => row.Computed.Label),
        Number("moldMass", answer => answer.Units.Mass, row => row.Given.Mold?.Mass ?? (row.IsFirst ? row.Request.Mold?.Mass : null)),
        Number("moldVolume", answer => answer.Units.Volume, row => row.Given.Mold?.Volume ?? (row.IsFirst ? row.Request.Mold?.Volume : null)),
        Number("moldAndWetSoil", answer => answer.Units.Mass, row => row.Given.MoldAndWetSoil),
        Number("wetMass", answer => answer.Units.Mass, row => row.Given.WetMass),
        Number("wetDensity", answer => answer.Units.Density, row => row.Computed.WetDensity),
        Number("dryDensity", answer => answer.Units.Density, row => row.Computed.DryDensity),
        Number("waterContent", _ => "%", row => row.Computed.WaterContent),
        Number("specificGravity", _ => null, row => row.IsFirst ? row.Request.SpecificGravity?.Value : null),
        Text("setAside", row => row.Computed.SetAside),
        Number("voidRatio", _ => null, row => row.Computed.VoidRatio),
        Number("porosity", _ => "%", row => row.Computed.Porosity),
        Number("saturation", _ => "%", row => row.Computed.Saturation),
        Number("airVoids", _ => "%", row => row.Computed.AirVoids),
        Number("optimumWaterContent", _ => "%", row => row.IsFirst ? row.Answer.Optimum?.WaterContent : null),
        Number("maximumDryDensity", answer => answer.Units.Density, row => row.IsFirst ? row.Answer.Optimum?.MaximumDryDensity : null),
        Text("model", row => row.IsFirst ? row.Answer.Curve?.Model : null),
        Text("findings", row => row.IsFirst ? string.Join(' ', row.Answer.Findings.Select(finding => finding.Code)) : null),
    ];

    public static byte[] Write(MoistureDensityRequest request, MoistureDensityAnswer answer)
    {
        var csv = new StringBuilder();
        csv.AppendJoin(',', Columns.Select(column => column.Unit(answer) is { } unit ? $"{column.Name} [{unit}]" : column.Name)).Append("\r\n");
        for (var i = 0; i < answer.Specimens.Count; i++)
        {
            var row = new Row(request, answer, i);
            csv.AppendJoin(',', Columns.Select(column => column.Value(row))).Append("\r\n");
        }

        return Encoding.UTF8.GetBytes(csv.ToString());
    }

    private static Column Text(string name, Func<Row, string?> value) => new(name, _ => null, row => Quoted(value(row)));

    private static Column Number(string name, Func<MoistureDensityAnswer, string?> unit, Func<Row, double?> value) =>
        new(name, unit, row => value(row)?.ToString("R", CultureInfo.InvariantCulture));

    private static string? Quoted(string? text)
    {
        if (string.IsNullOrEmpty(text))
        {
            return null;
        }

        var safe = FormulaStarts.Contains(text[0], StringComparison.Ordinal) ? "'" + text : text;
        return safe.AsSpan().IndexOfAny(",\"\r\n;") >= 0 ? $"\"{safe.Replace("\"", "\"\"", StringComparison.Ordinal)}\"" : safe;
    }
}
