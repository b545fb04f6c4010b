using System.Globalization;

namespace Drypeak.Service.Charts;

/// <summary>Numbers as a picture needs them.</summary>
internal static class ChartNumbers
{
    /// <summary>Digits of what is drawn: finer than any picture, and short in an address.</summary>
    private const string SevenDigits = "G7";

    /// <summary>The number to seven digits.</summary>
    public static double Drawn(double value) => double.Parse(value.ToString(SevenDigits, CultureInfo.InvariantCulture), CultureInfo.InvariantCulture);
}
