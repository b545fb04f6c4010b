using Drypeak.Soil.Laboratory.Workings;
using Drypeak.Soil.Quantities;
using static Drypeak.Soil.Laboratory.Workings.MathMl;

namespace Drypeak.Soil.References;

/// <summary>A state of a free-draining soil between its limits: any one of its measures gives the others.</summary>
/// <param name="Limits">The limits, as volumes.</param>
/// <param name="InVoidRatios">Whether the limits came as void ratios, so that a volume is 1 + e; else it is 1/ρd, m³/kg.</param>
/// <param name="Volume">The state's volume, over 0.</param>
/// <param name="Solids">Gs·ρw, kg/m³; null where it is not known: then void ratio and density do not give each other.</param>
public sealed record DensityState(DensityLimits Limits, bool InVoidRatios, double Volume, double? Solids)
{
    private const string Relative = "ASTM D4254 (from memory)";
    private static readonly string RhoD = Sub("ρ", "d");
    private static readonly string RhoMax = Sub("ρ", "dmax");
    private static readonly string RhoMin = Sub("ρ", "dmin");
    private static readonly string EMax = Sub("e", "max");
    private static readonly string EMin = Sub("e", "min");

    private static readonly Formula ByDensities = new("Dr = 100·(ρdmax/ρd)·(ρd − ρdmin)/(ρdmax − ρdmin)",
        MathMl.Formula(Sub("D", "r"), "=", "100", Over(RhoMax, RhoD), Over(Row(RhoD, "−", RhoMin), Row(RhoMax, "−", RhoMin))), Relative);

    private static readonly Formula ByVoidRatios = new("Dr = 100·(emax − e)/(emax − emin)",
        MathMl.Formula(Sub("D", "r"), "=", "100", Over(Row(EMax, "−", "e"), Row(EMax, "−", EMin))), Relative);

    private static readonly Formula CompactionByDensities = new("RC = 100·ρd/ρdmax",
        MathMl.Formula("RC", "=", "100", Over(RhoD, RhoMax)), "Definition of relative compaction: common practice, no source");

    private static readonly Formula CompactionByVoidRatios = new("RC = 100·(1 + emin)/(1 + e)",
        MathMl.Formula("RC", "=", "100", Over(Row("1", "+", EMin), Row("1", "+", "e"))), "Phase relations: ρd = Gs·ρw/(1 + e)");

    /// <summary>Dry density, kg/m³; null where the limits are void ratios and the solids are not known.</summary>
    public double? DryDensity => InVoidRatios ? Solids / Volume : 1 / Volume;

    /// <summary>Void ratio; null where the limits are densities and the solids are not known.</summary>
    public double? VoidRatio => (InVoidRatios ? Volume : Volume * Solids) - 1;

    /// <summary>A fraction.</summary>
    public double RelativeDensity => Limits.RelativeDensityAt(Volume);

    /// <summary>A fraction.</summary>
    public double RelativeCompaction => Limits.RelativeCompactionAt(Volume);

    /// <summary>The two ratios with their numbers put in.</summary>
    /// <param name="unit">The unit of the densities.</param>
    public IReadOnlyList<WorkingStep> Working(DensityUnit unit)
    {
        string Number(double volume) => WorkingNumbers.Number(InVoidRatios ? volume - 1 : new Density(1 / volume).In(unit));
        var (here, densest, loosest) = (Number(Volume), Number(Limits.Densest), Number(Limits.Loosest));
        return InVoidRatios
            ?
            [
                ByVoidRatios.Step("relative density", $"100*({loosest} - {here})/({loosest} - {densest})", RelativeDensity * 100, "%"),
                CompactionByVoidRatios.Step("relative compaction", $"100*(1 + {densest})/(1 + {here})", RelativeCompaction * 100, "%"),
            ]
            :
            [
                ByDensities.Step("relative density", $"100*({densest}/{here})*({here} - {loosest})/({densest} - {loosest})", RelativeDensity * 100, "%"),
                CompactionByDensities.Step("relative compaction", $"100*{here}/{densest}", RelativeCompaction * 100, "%"),
            ];
    }
}
