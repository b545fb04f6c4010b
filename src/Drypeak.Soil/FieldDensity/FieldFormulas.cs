using Drypeak.Soil.Laboratory.Workings;
using static Drypeak.Soil.Laboratory.Workings.MathMl;

namespace Drypeak.Soil.FieldDensity;

/// <summary>The formulas of the field test that the laboratory does not have, in the order of the working.</summary>
internal static class FieldFormulas
{
    private const string Cone = "ASTM D1556; AASHTO T 191";
    private const string Balloon = "ASTM D2167";
    private const string Cylinder = "ASTM D2937; BS 1377-9";
    private const string Replacement = "ASTM D5030";
    private const string Gauge = "ASTM D6938; AASHTO T 310";
    private const string GaugeOffset = "Moisture offset of a gauge (from memory)";
    private const string Balance = "Definition of the water content; ASTM D2216 (from memory)";
    private const string Ratio = "Ratio to the reference curve: common practice, no source";
    private const string Relative = "ASTM D4254 (from memory)";

    private static readonly string RhoD = Sub("ρ", "d");
    private static readonly string RhoMax = Sub("ρ", "dmax");
    private static readonly string RhoMin = Sub("ρ", "dmin");
    private static readonly string RhoSand = Sub("ρ", "s");
    private static readonly string MassOfCone = Sub("m", "c");

    public static readonly Formula SandToFill = new("m = m1 − m2 − mc", Formula("m", "=", Sub("m", "1"), "−", Sub("m", "2"), "−", MassOfCone), Cone);
    public static readonly Formula SandDensity = new("ρs = m/V", Formula(RhoSand, "=", Over("m", "V")), Cone);
    public static readonly Formula SandInCone = new("mc = Vc·ρs", Formula(MassOfCone, "=", Sub("V", "c"), RhoSand), Cone);
    public static readonly Formula HoleBySand = new("V = m/ρs", Formula("V", "=", Over("m", RhoSand)), Cone);
    public static readonly Formula HoleBySandVolumes = new("V = V1 − Vc", Formula("V", "=", Sub("V", "1"), "−", Sub("V", "c")), Cone);
    public static readonly Formula HoleByBalloon = new("V = V2 − V1", Formula("V", "=", Sub("V", "2"), "−", Sub("V", "1")), Balloon);
    public static readonly Formula VolumeOfCylinder = new("V = π·d²·h/4", Formula("V", "=", Over(Row("π", Squared("d"), "h"), "4")), Cylinder);
    public static readonly Formula HoleByWater = new("V = V2 − V1", Formula("V", "=", Sub("V", "2"), "−", Sub("V", "1")), Replacement);

    public static readonly Formula MeanOfReadings = new("x = (x1 + … + xn)/n", Formula("x", "=", Over(Row(Sub("x", "1"), "+", "…", "+", Sub("x", "n")), "n")), Gauge);
    public static readonly Formula WaterByGauge = new("w = 100·ρm/(ρ − ρm)", Formula("w", "=", "100", Over(Sub("ρ", "m"), Row("ρ", "−", Sub("ρ", "m")))), Gauge);

    public static readonly Formula OffsetOfPair = new("K = 1000·(wo − wg)/(100 + wg)",
        Formula("K", "=", "1000", Over(Row(Sub("w", "o"), "−", Sub("w", "g")), Row("100", "+", Sub("w", "g")))), GaugeOffset);

    public static readonly Formula OffsetWater = new("w = wg + K·(100 + wg)/1000",
        Formula("w", "=", Sub("w", "g"), "+", Over(Row("K", "(", "100", "+", Sub("w", "g"), ")"), "1000")), GaugeOffset);

    public static readonly Formula WaterByMasses = new("w = 100·(m/md − 1)", Formula("w", "=", "100", "(", Over("m", Sub("m", "d")), "−", "1", ")"), Balance);
    public static readonly Formula DryDensityByMass = new("ρd = md/V", Formula(RhoD, "=", Over(Sub("m", "d"), "V")), Balance);

    public static readonly Formula RelativeCompaction = new("RC = 100·ρd/ρdmax", Formula("RC", "=", "100", Over(RhoD, RhoMax)), Ratio);
    public static readonly Formula FromOptimum = new("Δw = w − wopt", Formula("Δw", "=", "w", "−", Sub("w", "opt")), Ratio);

    public static readonly Formula RelativeDensity = new("Dr = 100·(ρdmax/ρd)·(ρd − ρdmin)/(ρdmax − ρdmin)",
        Formula(Sub("D", "r"), "=", "100", Over(RhoMax, RhoD), Over(Row(RhoD, "−", RhoMin), Row(RhoMax, "−", RhoMin))), Relative);
}
