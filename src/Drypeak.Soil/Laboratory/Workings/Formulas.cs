using static Drypeak.Soil.Laboratory.Workings.MathMl;

namespace Drypeak.Soil.Laboratory.Workings;

/// <summary>A formula as the working shows it.</summary>
/// <param name="Text">In symbols, on one line.</param>
/// <param name="MathMl">As MathML.</param>
/// <param name="Source">Where it stands.</param>
internal sealed record Formula(string Text, string MathMl, string Source)
{
    /// <summary>The formula with its numbers put in.</summary>
    public WorkingStep Step(string quantity, string? substitution, double value, string unit) =>
        new(quantity, Text, substitution, value, unit, Source, MathMl);
}

/// <summary>The formulas of the laboratory test, in the order of the working.</summary>
internal static class Formulas
{
    private const string Reduction = "ASTM D698, calculations (from memory)";
    private const string Phase = "Phase relations; ASTM D653 (from memory)";
    private const string Correction = "ASTM D4718; AASHTO T 99 annex / T 224";

    private static readonly string RhoD = Sub("ρ", "d");
    private static readonly string RhoW = Sub("ρ", "w");
    private static readonly string Gs = Sub("G", "s");
    private static readonly string Sr = Sub("S", "r");

    public static readonly Formula WaterDensity = new(
        "ρw = 999.97495·(1 − (t − 3.983035)²·(t + 301.797)/(522528.9·(t + 69.34881)))",
        Formula(RhoW, "=", "999.97495", "(", "1", "−", Over(Row(Squared(Row("(", "t", "−", "3.983035", ")")), "(", "t", "+", "301.797", ")"), Row("522528.9", "(", "t", "+", "69.34881", ")")), ")"),
        "Tanaka et al. 2001 (CIPM), equation 1");

    public static readonly Formula VolumeOfCylinder = new("V = π·d²·h/4",
        Formula("V", "=", Over(Row("π", Squared("d"), "h"), "4")), Reduction);

    public static readonly Formula MeanOfReadings = new("x = (x1 + … + xn)/n",
        Formula("x", "=", Over(Row(Sub("x", "1"), "+", "…", "+", Sub("x", "n")), "n")), "Arithmetic mean of the readings");

    public static readonly Formula VolumeOfSoil = new("V = Vm·(h − z)/h",
        Formula("V", "=", Sub("V", "m"), Over(Row("h", "−", "z"), "h")), "Geometry of a cylinder; BS 1377-4 cl. 3.7 (from memory)");

    public static readonly Formula VolumeByWater = new("V = (m2 − m1)/ρw",
        Formula("V", "=", Over(Row(Sub("m", "2"), "−", Sub("m", "1")), RhoW)), "ASTM D698, calibration of the mold by water (from memory)");

    public static readonly Formula WaterContentOfTin = new("w = 100·(m2 − m3)/(m3 − m1)",
        Formula("w", "=", "100", Over(Row(Sub("m", "2"), "−", Sub("m", "3")), Row(Sub("m", "3"), "−", Sub("m", "1")))), "ASTM D2216 (from memory)");

    public static readonly Formula MeanOfTins = new("w = (w1 + … + wn)/n",
        Formula("w", "=", Over(Row(Sub("w", "1"), "+", "…", "+", Sub("w", "n")), "n")), Reduction);

    public static readonly Formula WaterContentFromWetBasis = new("w = 100·r/(100 − r)",
        Formula("w", "=", "100", Over("r", Row("100", "−", "r"))), "AASHTO T 217");

    public static readonly Formula WaterContentFromDensities = new("w = 100·(ρ/ρd − 1)",
        Formula("w", "=", "100", "(", Over("ρ", RhoD), "−", "1", ")"), Phase);

    public static readonly Formula WetMass = new("m = m2 − m1",
        Formula("m", "=", Sub("m", "2"), "−", Sub("m", "1")), Reduction);

    public static readonly Formula MassWithoutPlate = new("m = m1 − mp",
        Formula("m", "=", Sub("m", "1"), "−", Sub("m", "p")), Reduction);

    public static readonly Formula WetDensity = new("ρ = m/V",
        Formula("ρ", "=", Over("m", "V")), Reduction);

    public static readonly Formula WetFromDry = new("ρ = ρd·(1 + w/100)",
        Formula("ρ", "=", RhoD, "(", "1", "+", Over("w", "100"), ")"), Reduction);

    public static readonly Formula DryDensity = new("ρd = ρ/(1 + w/100)",
        Formula(RhoD, "=", Over("ρ", Row("1", "+", Over("w", "100")))), Reduction);

    public static readonly Formula VoidRatio = new("e = Gs·ρw/ρd − 1",
        Formula("e", "=", Over(Row(Gs, RhoW), RhoD), "−", "1"), Phase);

    public static readonly Formula Porosity = new("n = 100·e/(1 + e)",
        Formula("n", "=", "100", Over("e", Row("1", "+", "e"))), Phase);

    public static readonly Formula Saturation = new("Sr = w·Gs/e",
        Formula(Sr, "=", Over(Row("w", Gs), "e")), Phase);

    public static readonly Formula AirVoids = new("A = n·(1 − Sr/100)",
        Formula("A", "=", "n", "(", "1", "−", Over(Sr, "100"), ")"), Phase);

    public static readonly Formula Effort = new("E = m·g·h·layers·blows/V",
        Formula("E", "=", Over(Row("m", "g", "h", Sub("n", "layers"), Sub("n", "blows")), "V")), "ASTM D698 (from memory)");

    public static readonly Formula CorrectedDensity = new("ρdT = 100/(Pf/ρdF + Pc/(Gc·ρw))",
        Formula(Sub("ρ", "dT"), "=", Over("100", Row(Over(Sub("P", "f"), Sub("ρ", "dF")), "+", Over(Sub("P", "c"), Row(Sub("G", "c"), RhoW))))), Correction);

    public static readonly Formula CorrectedWater = new("wT = (Pf·wF + Pc·wc)/100",
        Formula(Sub("w", "T"), "=", Over(Row(Sub("P", "f"), Sub("w", "F"), "+", Sub("P", "c"), Sub("w", "c")), "100")), Correction);

    public static readonly Formula DensityOfFines = new("ρdF = Pf/(100/ρdT − Pc/(Gc·ρw))",
        Formula(Sub("ρ", "dF"), "=", Over(Sub("P", "f"), Row(Over("100", Sub("ρ", "dT")), "−", Over(Sub("P", "c"), Row(Sub("G", "c"), RhoW))))), Correction);

    public static readonly Formula WaterOfFines = new("wF = (100·wT − Pc·wc)/Pf",
        Formula(Sub("w", "F"), "=", Over(Row("100", Sub("w", "T"), "−", Sub("P", "c"), Sub("w", "c")), Sub("P", "f"))), Correction);

    /// <summary>The peak of a fitted model, which no line of arithmetic gives.</summary>
    public static Formula Peak(string model) => new($"maximum of the {model} curve",
        Formula("max", RhoD, "(", "w", ")"), "Least squares or posterior mean, as curve.chosen says");
}
