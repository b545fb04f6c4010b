using Drypeak.Soil.Quantities;

namespace Drypeak.Soil.Phases;

/// <summary>The density of pure water by temperature.</summary>
public static class WaterDensity
{
    /// <summary>Lowest temperature of the formula, °C.</summary>
    public const double LowestTemperature = 0;

    /// <summary>Highest temperature of the formula, °C.</summary>
    public const double HighestTemperature = 40;

    /// <summary>The temperature meant where none is given, °C.</summary>
    public const double DefaultTemperature = 20;

    /// <summary>Density of pure, air-free water at one atmosphere.</summary>
    /// <param name="celsius">°C, 0 to 40.</param>
    /// <exception cref="ArgumentOutOfRangeException">The temperature is outside the formula's range.</exception>
    /// <remarks>
    /// M. Tanaka, G. Girard, R. Davis, A. Peuto, N. Bignell, Recommended table for the density of water between 0 °C and 40 °C
    /// based on recent experimental reports, Metrologia 38 (2001) 301–309 (the CIPM formula), equation (1).
    /// </remarks>
    public static Density At(double celsius)
    {
        if (celsius is not (>= LowestTemperature and <= HighestTemperature))
        {
            throw new ArgumentOutOfRangeException(nameof(celsius), celsius, "The formula holds from 0 to 40 °C.");
        }

        const double a1 = -3.983035, a2 = 301.797, a3 = 522528.9, a4 = 69.34881, a5 = 999.974950;
        var fromMaximum = celsius + a1;
        return new Density(a5 * (1 - (fromMaximum * fromMaximum * (celsius + a2) / (a3 * (celsius + a4)))));
    }
}
