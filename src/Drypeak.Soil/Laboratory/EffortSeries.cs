using Drypeak.Soil.TestMethods;

namespace Drypeak.Soil.Laboratory;

/// <summary>The optimum of one soil at one compactive effort.</summary>
/// <param name="Effort">kJ/m³, over 0.</param>
/// <param name="WaterContent">Optimum water content, fraction.</param>
/// <param name="MaximumDryDensity">kg/m³.</param>
public readonly record struct EffortPoint(double Effort, double WaterContent, double MaximumDryDensity);

/// <summary>
/// The line of optimums of one soil: optimum and maximum against the logarithm of the compactive effort, straight between two tests
/// (common practice, no source).
/// </summary>
public static class EffortSeries
{
    /// <summary>Compactive effort of a test: of its method, or of the caller's own compaction in the mold it used.</summary>
    /// <returns>Null where it is not known.</returns>
    public static CompactiveEffort? EffortOf(MoistureDensityTest test, IEnumerable<Specimen> specimens) => test switch
    {
        { Method: { } method } => method.Effort,
        { CustomEffort: { } effort } when specimens.Select(specimen => specimen.MoldVolume).FirstOrDefault(volume => volume is { }) is { } mold =>
            CompactiveEffort.Of(effort.Rammer, effort.Drop, effort.Layers, effort.BlowsPerLayer, mold),
        _ => null,
    };

    /// <summary>The point of the line at an effort; beyond its ends the last stretch goes on.</summary>
    /// <param name="line">Two or more points in order of effort, each effort once.</param>
    /// <param name="effort">kJ/m³, over 0.</param>
    public static EffortPoint At(IReadOnlyList<EffortPoint> line, double effort)
    {
        var upper = 1;
        while (upper < line.Count - 1 && effort > line[upper].Effort)
        {
            upper++;
        }

        var (from, to) = (line[upper - 1], line[upper]);
        var share = Math.Log(effort / from.Effort) / Math.Log(to.Effort / from.Effort);
        return new EffortPoint(
            effort,
            from.WaterContent + (share * (to.WaterContent - from.WaterContent)),
            from.MaximumDryDensity + (share * (to.MaximumDryDensity - from.MaximumDryDensity)));
    }

    /// <summary>Whether an effort lies within the line's tests.</summary>
    public static bool Covers(IReadOnlyList<EffortPoint> line, double effort) =>
        effort >= line[0].Effort * (1 - 1e-9) && effort <= line[^1].Effort * (1 + 1e-9);
}
