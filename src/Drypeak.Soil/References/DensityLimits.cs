namespace Drypeak.Soil.References;

/// <summary>
/// The loosest and the densest state of a free-draining soil, as its volume for a given mass of solids: 1/ρd where densities are known, 1 + e
/// where void ratios are. In it, relative density is linear and relative compaction a ratio, whichever of the two is meant; in dry density
/// neither holds (ASTM D4254, from memory): Dr = (vmax − v)/(vmax − vmin) = (ρmax/ρd)·(ρd − ρmin)/(ρmax − ρmin), RC = vmin/v.
/// </summary>
/// <param name="Loosest">vmax; over <paramref name="Densest"/>.</param>
/// <param name="Densest">vmin; over 0.</param>
public readonly record struct DensityLimits(double Loosest, double Densest)
{
    /// <summary>From dry densities, in any one unit.</summary>
    public static DensityLimits OfDensities(double least, double greatest) => new(1 / least, 1 / greatest);

    /// <summary>From void ratios.</summary>
    public static DensityLimits OfVoidRatios(double least, double greatest) => new(1 + greatest, 1 + least);

    /// <summary>Relative density at a volume, as a fraction; outside 0 to 1 beyond the limits.</summary>
    public double RelativeDensityAt(double volume) => (Loosest - volume) / (Loosest - Densest);

    /// <summary>Relative compaction at a volume, as a fraction.</summary>
    public double RelativeCompactionAt(double volume) => Densest / volume;

    /// <summary>The volume of a relative density; not over 0 where no soil could be so dense.</summary>
    public double VolumeOfRelativeDensity(double relativeDensity) => Loosest - (relativeDensity * (Loosest - Densest));

    /// <summary>The volume of a relative compaction, over 0.</summary>
    public double VolumeOfRelativeCompaction(double relativeCompaction) => Densest / relativeCompaction;
}
