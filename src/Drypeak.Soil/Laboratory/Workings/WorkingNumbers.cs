using System.Globalization;

namespace Drypeak.Soil.Laboratory.Workings;

/// <summary>
/// Numbers as they stand in a substitution: fifteen digits, which is all that a calculator takes and one less than a change of unit
/// spoils (1962 g, not 1961.9999999999998 g); no exponent.
/// </summary>
internal static class WorkingNumbers
{
    public static string Number(double value)
    {
        var text = value.ToString("G15", CultureInfo.InvariantCulture);
        return text.Contains('E') ? value.ToString("0.####################################", CultureInfo.InvariantCulture) : text;
    }
}
