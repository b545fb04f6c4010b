using System.Globalization;
using System.Text.RegularExpressions;
using Drypeak.Soil.TestMethods;

namespace Drypeak.Service.Exchange.Ags;

/// <summary>Values and the data types that their TYPE line says (rule 8).</summary>
internal static partial class AgsValue
{
    /// <summary>Whether a type has a count in it: <c>2DP</c> decimal places, <c>3SF</c> significant figures, <c>1SCI</c> scientific notation.</summary>
    public static bool HasCount(string type) => Counted().IsMatch(type);

    /// <summary>Why a value does not fit its type, and what would; null where it does. An empty value fits every type.</summary>
    /// <param name="value">The item.</param>
    /// <param name="type">The type in the TYPE line.</param>
    /// <param name="unit">The unit in the UNIT line: for a date or a time, its pattern.</param>
    public static string? Misfit(string value, string type, string unit)
    {
        if (value.Length == 0)
        {
            return null;
        }

        if (Counted().Match(type) is { Success: true } counted)
        {
            return MisfitOfNumber(value, int.Parse(counted.Groups["count"].Value, CultureInfo.InvariantCulture), counted.Groups["kind"].Value);
        }

        return type switch
        {
            "YN" => value is "Y" or "N" or "y" or "n" ? null : "it must be Y or N",
            "DT" => Dates(unit) is { } pattern && !pattern.IsMatch(value) ? $"it must be written as {unit}" : null,
            "DMS" => Degrees().IsMatch(value) ? null : "it must be degrees:minutes:seconds",
            "MC" => double.TryParse(value, NumberStyles.AllowDecimalPoint, CultureInfo.InvariantCulture, out _) ? null : "it must be a water content in figures",
            _ => null,
        };
    }

    /// <summary>A number as its type writes it, halves to the even digit; in <paramref name="otherwise"/>, the dictionary's type, where the file's own has no figures.</summary>
    public static string Written(double value, string type, string otherwise)
    {
        var counted = Counted().Match(HasCount(type) ? type : otherwise);
        var count = int.Parse(counted.Groups["count"].Value, CultureInfo.InvariantCulture);
        return counted.Groups["kind"].Value switch
        {
            "DP" => Rounding.ToStep(new decimal(1, 0, 0, isNegative: false, (byte)Math.Min(count, 17))).Apply(value),
            "SF" => Rounding.ToSignificantFigures(Math.Clamp(count, 1, 17)).Apply(value),
            _ => value.ToString($"0.{new string('0', count)}E+00", CultureInfo.InvariantCulture),
        };
    }

    /// <summary>A plain number: digits with at most one decimal point and a sign.</summary>
    public static double? Number(string value) =>
        double.TryParse(value.Trim(), NumberStyles.AllowLeadingSign | NumberStyles.AllowDecimalPoint, CultureInfo.InvariantCulture, out var number) && double.IsFinite(number) ? number : null;

    private static string? MisfitOfNumber(string value, int count, string kind)
    {
        var number = Plain().Match(value);
        return (kind, number.Success) switch
        {
            ("SCI", _) => Scientific().Match(value) is { Success: true } written && written.Groups["decimals"].Length == count ? null : $"it must be in scientific notation with {count} decimals, as in 1.{new string('0', count)}E-05",
            (_, false) => "it must be a number of digits with a decimal point",
            ("DP", _) => number.Groups["decimals"].Length == count && (count > 0 || !value.Contains('.')) ? null : $"it must have {count} decimals",
            _ => HasFigures(number.Groups["whole"].Value, number.Groups["decimals"].Value, count) ? null : $"it must have {count} significant figures",
        };
    }

    /// <summary>Zeros before the first other digit are no figures; zeros at the end of a whole number may be or may not.</summary>
    private static bool HasFigures(string whole, string decimals, int count)
    {
        var digits = (whole + decimals).TrimStart('0');
        if (digits.Length == 0)
        {
            return true;
        }

        var least = decimals.Length == 0 ? digits.TrimEnd('0').Length : digits.Length;
        return count >= least && count <= digits.Length;
    }

    /// <summary>The pattern of a date's unit, such as <c>yyyy-mm-dd</c>; null where it has letters that are not known.</summary>
    private static Regex? Dates(string unit) => DateUnit().IsMatch(unit)
        ? new Regex($@"\A{Regex.Replace(Regex.Escape(unit), "[ymdhs]", "[0-9]", RegexOptions.IgnoreCase)}\z")
        : null;

    [GeneratedRegex(@"\A(?<count>[0-9]{1,2})(?<kind>DP|SF|SCI)\z")]
    private static partial Regex Counted();

    [GeneratedRegex(@"\A[-+]?(?<whole>[0-9]+)(?:\.(?<decimals>[0-9]+))?\z")]
    private static partial Regex Plain();

    [GeneratedRegex(@"\A[-+]?[0-9](?:\.(?<decimals>[0-9]+))?[eE][-+]?[0-9]+\z")]
    private static partial Regex Scientific();

    [GeneratedRegex(@"\A-?[0-9]{1,3}:[0-9]{1,2}:[0-9]{1,2}(?:\.[0-9]+)?\z")]
    private static partial Regex Degrees();

    [GeneratedRegex(@"\A[ymdhs:/.T\s-]+\z", RegexOptions.IgnoreCase)]
    private static partial Regex DateUnit();
}
