namespace Drypeak.Soil.Earthwork;

/// <summary>Counts that come from a division.</summary>
public static class Count
{
    private const double Tolerance = 1e-9;

    /// <summary>The next whole number, unless the quotient is one already up to the arithmetic (relative 1e-9): 3 for 2.5, and 3 for 3.000000001.</summary>
    /// <param name="quotient">0 or more.</param>
    /// <returns>A whole number as a double, since a quotient may be beyond every integer type.</returns>
    public static double RoundedUp(double quotient)
    {
        var nearest = Math.Round(quotient);
        return Math.Abs(quotient - nearest) <= Tolerance * quotient ? nearest : Math.Ceiling(quotient);
    }
}
