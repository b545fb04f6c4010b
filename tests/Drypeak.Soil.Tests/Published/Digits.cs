using Xunit;

namespace Drypeak.Soil.Tests.Published;

/// <summary>How a computed value is held to a printed one.</summary>
internal static class Digits
{
    /// <summary>Equal to the last printed digit, with room for the arithmetic at a half.</summary>
    public static void Printed(double printed, double computed, int decimals) =>
        Assert.Equal(printed, computed, (0.5 + 1e-9) * Math.Pow(10, -decimals));

    /// <summary>Each equal to its last printed digit, and as many of them.</summary>
    public static void Printed(double[] printed, IEnumerable<double> computed, int decimals)
    {
        var values = computed.ToArray();
        Assert.Equal(printed.Length, values.Length);
        Assert.All(printed.Zip(values), pair => Printed(pair.First, pair.Second, decimals));
    }

    /// <summary>Equal to within a fraction of the published value.</summary>
    public static void Relative(double published, double computed, double tolerance) =>
        Assert.Equal(published, computed, Math.Abs(published) * tolerance);
}
