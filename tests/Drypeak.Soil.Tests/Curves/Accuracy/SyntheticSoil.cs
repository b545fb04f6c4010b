using Drypeak.Soil.Curves;
using MathNet.Numerics.Distributions;

namespace Drypeak.Soil.Tests.Curves.Accuracy;

/// <summary>A soil whose compaction curve is known.</summary>
/// <param name="Density">Dry density, Mg/m³, at a water content (fraction).</param>
/// <param name="Optimum">True optimum water content, fraction.</param>
/// <param name="SpecificGravity">True specific gravity.</param>
internal sealed record SyntheticSoil(Func<double, double> Density, double Optimum, double SpecificGravity)
{
    /// <summary>Mg/m³.</summary>
    public const double WaterDensity = 0.9982;

    private const double Spacing = 0.02;
    private const double GreatestOffset = 0.008;
    private const double Unevenness = 0.002;
    private const double DensityNoise = 0.008;
    private const double WaterContentNoise = 0.0015;
    private const double SpecificGravityNoise = 0.02;

    /// <summary>True maximum dry density, Mg/m³.</summary>
    public double Maximum => Density(Optimum);

    /// <summary>A test of the soil: points about 2 % apart, off center by up to 0.8 %, with the errors of a careful laboratory.</summary>
    public CompactionData Test(int count, Random random)
    {
        var center = Optimum + Uniform(random, -GreatestOffset, GreatestOffset);
        var points = new CompactionPoint[count];
        for (var i = 0; i < count; i++)
        {
            var water = center + (Spacing * (i - ((count - 1) / 2.0))) + Uniform(random, -Unevenness, Unevenness);
            points[i] = new(
                Math.Max(0, water + Normal.Sample(random, 0, WaterContentNoise)),
                1000 * (Density(Math.Max(water, 0.001)) + Normal.Sample(random, 0, DensityNoise)));
        }

        return new(points, SpecificGravity + Normal.Sample(random, 0, SpecificGravityNoise), 1000 * WaterDensity);
    }

    public static double Uniform(Random random, double least, double greatest) => least + ((greatest - least) * random.NextDouble());
}
