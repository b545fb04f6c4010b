using System.Globalization;
using Drypeak.Service.Contracts;
using Drypeak.Service.Laboratory;
using Drypeak.Service.Pages.Tables;
using Drypeak.Soil.Quantities;

namespace Drypeak.Service.Pages.Laboratory;

/// <summary>The sentences and numbers of an answer as a page shows them.</summary>
internal static class AnswerWords
{
    private const int WaterDecimals = 1;

    /// <summary>The result in a few words.</summary>
    public static string Headline(MoistureDensityAnswer answer) => (answer.Adopted?.Reported ?? answer.Optimum?.Reported) is { } reported
        ? $"{reported.MaximumDryDensity} at {reported.WaterContent} water"
        : "No optimum";

    /// <summary>The 95 % intervals about the fitted optimum, or a standard uncertainty where there is no interval; null where there is neither.</summary>
    public static string? Sureness(MoistureDensityAnswer answer)
    {
        if (answer.Optimum is not { Uncertainty: { } uncertainty } optimum)
        {
            return null;
        }

        var unit = answer.Units.DensityUnit();
        var density = Margin(optimum.MaximumDryDensity, uncertainty.MaximumDryDensity, DensityDecimals(unit), unit.Symbol());
        var water = Margin(optimum.WaterContent, uncertainty.WaterContent, WaterDecimals, "% water");
        return string.Join(", ", new[] { density, water }.OfType<string>());
    }

    /// <summary>Decimals with which a table shows a density.</summary>
    public static int DensityDecimals(DensityUnit unit) => unit switch
    {
        DensityUnit.KilogramPerCubicMeter => 0,
        DensityUnit.PoundPerCubicFoot => 1,
        DensityUnit.KilonewtonPerCubicMeter => 2,
        _ => 3,
    };

    /// <summary>A number with its decimals and a real minus; a dash where there is none.</summary>
    public static string Number(double? value, int decimals) => value is { } number ? ReaderText.Fixed(number, decimals) : "–";

    /// <summary>A difference, with its sign.</summary>
    public static string Signed(double? value, int decimals) => value is > 0 ? "+" + Number(value, decimals) : Number(value, decimals);

    /// <summary>How a table was understood, in a phrase.</summary>
    public static string Understood(TableReading table, UnitSet units)
    {
        var sheet = table.Sheet!;
        var parts = new List<string>
        {
            sheet.Rows.Count == 1 ? "one specimen" : string.Create(CultureInfo.InvariantCulture, $"{sheet.Rows.Count} specimens"),
            table.Shape.Separator switch
            {
                Separator.Tab => "parted by tabs",
                Separator.Semicolon => "parted by semicolons",
                Separator.Comma => "parted by commas",
                _ => "parted by spaces",
            },
        };
        parts.AddRange(table.Shape.DecimalMark switch
        {
            DecimalMark.Point => ["decimal point"],
            DecimalMark.Comma => ["decimal comma"],
            _ => Array.Empty<string>(),
        });
        parts.AddRange(table.Shape.SpecimensAcross ? ["a column each"] : []);
        parts.AddRange(table.Shape.HasHeader ? [] : ["columns by their number: " + string.Join(", ", sheet.Columns.Select(column => column.Heading))]);
        parts.AddRange(sheet.Columns.Where(column => column.Unit is { } unit && unit != ColumnUnits.Of(column.Kind.Measure, units))
            .Select(column => $"{column.Heading} turned from {ColumnUnits.Symbol(column.Unit!)} into {ColumnUnits.Symbol(ColumnUnits.Of(column.Kind.Measure, units))}"));
        return string.Join(", ", parts);
    }

    /// <summary>What the test was given besides its specimens.</summary>
    public static IEnumerable<string> Given(MoistureDensityRequest request, MoistureDensityAnswer answer)
    {
        if (answer.Method is { } method)
        {
            yield return method.Title;
        }

        if (request.Mold is { } mold)
        {
            if (mold.Mass is { } mass)
            {
                yield return $"mold {ReaderText.Significant(mass)} {answer.Units.Mass}";
            }

            if (mold.Volume is { } volume)
            {
                yield return $"{ReaderText.Significant(volume)} {UnitNames.Volume[answer.Units.Volume!].Symbol()}";
            }
        }

        if (request.SpecificGravity is { } gravity)
        {
            yield return $"specific gravity {gravity.Value?.ToString("0.00##", CultureInfo.InvariantCulture)}, {gravity.Determined}";
        }

        if (request.Oversize is { } oversize)
        {
            yield return $"{ReaderText.Significant(oversize.Percent!.Value)} % oversize";
        }
    }

    /// <summary>The half width of an interval; both halves where they differ as shown.</summary>
    private static string? Margin(double value, UncertaintyAnswer? uncertainty, int decimals, string unit)
    {
        if (uncertainty is not { Interval: [var lower, var upper] })
        {
            return uncertainty is { } known ? $"standard uncertainty {Number(known.Standard, decimals)} {unit}" : null;
        }

        var (below, above) = (Number(value - lower, decimals), Number(upper - value, decimals));
        return below == above ? $"± {above} {unit}" : $"+{above} −{below} {unit}";
    }

    /// <summary>The weight of a finding as a word.</summary>
    public static string SeverityWord(string severity) => severity switch { "error" => "Error", "warning" => "Warning", _ => "Note" };
}
