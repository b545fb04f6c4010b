namespace Drypeak.Service.Charts;

/// <summary>Numbers of drawn lines.</summary>
internal static class DrawnNumber
{
    private const int Digits = 6;

    /// <summary>Six digits: finer than any picture, and short in an address.</summary>
    public static double Of(double value) =>
        value == 0 ? 0 : Math.Round(value, Math.Clamp(Digits - 1 - (int)Math.Floor(Math.Log10(Math.Abs(value))), 0, 15));
}
