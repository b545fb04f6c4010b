using System.Globalization;
using System.Text;

namespace Drypeak.Service.Earthwork;

/// <summary>The locations of a programme as a table (RFC 4180): comma, decimal point, the unit in the header, numbers unrounded.</summary>
internal static class TestLocationsTable
{
    /// <summary>As it is asked for by Accept.</summary>
    public static TextForm<TestLocationsAnswer> Csv { get; } = new("text/csv", "; charset=utf-8; header=present", Text);

    /// <summary>The table.</summary>
    public static string Text(TestLocationsAnswer answer)
    {
        var table = new StringBuilder($"label,lift,station [{answer.Units.Length}],offset [{answer.Units.Length}]\r\n");
        foreach (var location in answer.Locations)
        {
            table.Append(CultureInfo.InvariantCulture, $"{location.Label},{location.Lift},{location.Station:R},{location.Offset:R}\r\n");
        }

        return table.ToString();
    }
}
