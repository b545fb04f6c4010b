using System.Globalization;

namespace Drypeak.Soil.Laboratory.Workings;

/// <summary>Numbers as they stand in a substitution: all digits, no exponent, so that any calculator takes them.</summary>
internal static class WorkingNumbers
{
    public static string Number(double value)
    {
        var text = value.ToString("R", CultureInfo.InvariantCulture);
        return text.Contains('E') ? value.ToString("0.####################################", CultureInfo.InvariantCulture) : text;
    }
}
