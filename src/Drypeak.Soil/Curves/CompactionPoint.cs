namespace Drypeak.Soil.Curves;

/// <summary>One point of a compaction curve, as the kernels see it: plain doubles, SI.</summary>
/// <param name="WaterContent">Mass of water over mass of dry solids, as a fraction; 0 or more.</param>
/// <param name="DryDensity">kg/m³; over 0.</param>
public readonly record struct CompactionPoint(double WaterContent, double DryDensity);
