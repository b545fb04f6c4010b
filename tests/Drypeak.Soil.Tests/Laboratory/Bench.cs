using Drypeak.Soil.Laboratory;
using Xunit;

namespace Drypeak.Soil.Tests.Laboratory;

/// <summary>The laboratory test from end to end, as its callers run it.</summary>
internal static class Bench
{
    /// <summary>The specimens of a test that has no fault.</summary>
    public static IReadOnlyList<Specimen> Reduce(MoistureDensityTest test)
    {
        var faults = new List<Fault>();
        var specimens = MoistureDensity.Reduce(test, faults);
        Assert.Empty(faults);
        return [.. specimens.Select(specimen => specimen!)];
    }

    /// <summary>The result of a test that has no fault.</summary>
    public static MoistureDensityResult Analyze(MoistureDensityTest test) => MoistureDensity.Analyze(test, Reduce(test));

    /// <summary>What keeps a test from being computed.</summary>
    public static IReadOnlyList<Fault> FaultsOf(MoistureDensityTest test)
    {
        var faults = new List<Fault>();
        MoistureDensity.Reduce(test, faults);
        return faults;
    }
}
