using Drypeak.Soil.Laboratory.Workings;
using static Drypeak.Soil.Laboratory.Workings.MathMl;

namespace Drypeak.Soil.Earthwork;

/// <summary>The formulas of planning the work, in the order of its jobs.</summary>
internal static class EarthworkFormulas
{
    private const string WaterContent = "Definition of the water content; ASTM D2216 (from memory)";
    private const string Conservation = "Solids are neither lost nor gained";
    private const string Geometry = "Geometry";
    private const string Definition = "Definition; both kinds in use: common practice, no source";
    private const string Practice = "Common practice, no source";
    private const string Sampling = "Stratified random sampling; ASTM D3665 (from memory)";

    private static readonly string DryMassSymbol = Sub("m", "d");
    private static readonly string Target = Sub("w", "t");
    private static readonly string RhoW = Sub("ρ", "w");
    private static readonly string RhoD = Sub("ρ", "d");
    private static readonly string WaterMass = Sub("m", "w");
    private static readonly string BankVolume = Sub("V", "b");
    private static readonly string FillVolume = Sub("V", "f");
    private static readonly string LooseVolume = Sub("V", "l");
    private static readonly string Each = Sub("q", "1");

    public static readonly Formula DryMass = new("md = m/(1 + w/100)", Formula(DryMassSymbol, "=", Over("m", Row("1", "+", Over("w", "100")))), WaterContent);
    public static readonly Formula WaterToAdd = new("mw = md·(wt − w)/100", Formula(WaterMass, "=", Over(Row(DryMassSymbol, "(", Target, "−", "w", ")"), "100")), WaterContent);
    public static readonly Formula VolumeOfWater = new("Vw = mw/ρw", Formula(Sub("V", "w"), "=", Over(WaterMass, RhoW)), "Definition of density");
    public static readonly Formula FinalMass = new("m = md·(1 + wt/100)", Formula("m", "=", DryMassSymbol, "(", "1", "+", Over(Target, "100"), ")"), WaterContent);

    public static readonly Formula OptimumOfPlasticLimit = new("wopt = 0.92·PL", Formula(Sub("w", "opt"), "=", "0.92", "PL"), ExpectedOptimum.EstimateSource);

    public static readonly Formula VolumeOfLift = new("V = A·t", Formula("V", "=", "A", "t"), Geometry);
    public static readonly Formula Solids = new("md = V·ρd", Formula(DryMassSymbol, "=", "V", RhoD), "Definition of dry density");
    public static readonly Formula Evaporated = new("me = A·d·ρw", Formula(Sub("m", "e"), "=", "A", "d", RhoW), Geometry);
    public static readonly Formula WaterOfLift = new("mw = md·(wt + wa − w)/100 + me",
        Formula(WaterMass, "=", Over(Row(DryMassSymbol, "(", Target, "+", Sub("w", "a"), "−", "w", ")"), "100"), "+", Sub("m", "e")), WaterContent);
    public static readonly Formula PerVolume = new("q1 = q/V", Formula(Each, "=", Over("q", "V")), "Division");
    public static readonly Formula Loads = new("n = q/q1, rounded up", Formula("n", "=", Over("q", Each)), "Division, rounded up");

    public static readonly Formula DryDensity = new("ρd = ρ/(1 + w/100)", Formula(RhoD, "=", Over("ρ", Row("1", "+", Over("w", "100")))), WaterContent);
    public static readonly Formula LooseDryDensity = new("ρdl = ρdb/(1 + s/100)", Formula(Sub("ρ", "dl"), "=", Over(Sub("ρ", "db"), Row("1", "+", Over("s", "100")))), Definition);
    public static readonly Formula VolumeOfSolids = new("V = md/ρd", Formula("V", "=", Over(DryMassSymbol, RhoD)), Conservation);
    public static readonly Formula WetMass = new("m = md·(1 + w/100)", Formula("m", "=", DryMassSymbol, "(", "1", "+", Over("w", "100"), ")"), WaterContent);
    public static readonly Formula ShrinkageOfBorrow = new("s = 100·(Vb − Vf)/Vb", Formula("s", "=", "100", Over(Row(BankVolume, "−", FillVolume), BankVolume)), Definition);
    public static readonly Formula ShrinkageOfFill = new("s = 100·(Vb − Vf)/Vf", Formula("s", "=", "100", Over(Row(BankVolume, "−", FillVolume), FillVolume)), Definition);
    public static readonly Formula SwellOfBank = new("s = 100·(Vl − Vb)/Vb", Formula("s", "=", "100", Over(Row(LooseVolume, "−", BankVolume), BankVolume)), Definition);
    public static readonly Formula SwellOfLoose = new("s = 100·(Vl − Vb)/Vl", Formula("s", "=", "100", Over(Row(LooseVolume, "−", BankVolume), LooseVolume)), Definition);

    public static readonly Formula CycleTime = new("T = tl + D/vh + td + D/vr",
        Formula("T", "=", Sub("t", "l"), "+", Over("D", Sub("v", "h")), "+", Sub("t", "d"), "+", Over("D", Sub("v", "r"))), Practice);
    public static readonly Formula BalancedTrucks = new("n = T/tl, rounded up", Formula("n", "=", Over("T", Sub("t", "l"))), Practice);

    public static readonly Formula AreaOfLift = new("A = L·b", Formula("A", "=", "L", "b"), Geometry);
    public static readonly Formula TestsPerLift = new("n = q/q1, rounded up", Formula("n", "=", Over("q", Each)), "Stated frequency");
    public static readonly Formula StationInStratum = new("s = s0 + (i − 1 + u)·L/n",
        Formula("s", "=", Sub("s", "0"), "+", "(", "i", "−", "1", "+", "u", ")", Over("L", "n")), Sampling);
    public static readonly Formula OffsetInStratum = new("o = v·b", Formula("o", "=", "v", "b"), Sampling);

    public static readonly Formula EffectiveWidth = new("be = b − o", Formula(Sub("b", "e"), "=", "b", "−", "o"), Practice);
    public static readonly Formula AreaPerHour = new("A = be·v·E/n", Formula("A", "=", Over(Row(Sub("b", "e"), "v", "E"), "n")), Practice);
    public static readonly Formula VolumePerHour = new("V = A·t", Formula("V", "=", "A", "t"), Geometry);

    public static readonly Formula MeanOfReadings = new("x = (x1 + … + xn)/n", Formula("x", "=", Over(Row(Sub("x", "1"), "+", "…", "+", Sub("x", "n")), "n")), "Arithmetic mean of the readings");
    public static readonly Formula Growth = new("ρd(N) = ρ∞ − Δ·e^(−N/c)", Formula(RhoD, "(", "N", ")", "=", Sub("ρ", "∞"), "−", "Δ", "exp", "(", "−", Over("N", "c"), ")"), "Least squares over all readings; an exponential approach: common practice, no source");
}
