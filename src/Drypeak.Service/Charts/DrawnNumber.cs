namespace Drypeak.Service.Charts;

/// <summary>Numbers of drawn lines.</summary>
internal static class DrawnNumber
{
    private const int Usual = 6;

    /// <summary>A number with so many digits; the usual six are finer than any picture, and short in an address.</summary>
    public static double Of(double value, int digits = Usual) =>
        value == 0 ? 0 : Math.Round(value, Math.Clamp(digits - 1 - (int)Math.Floor(Math.Log10(Math.Abs(value))), 0, 15));
}
