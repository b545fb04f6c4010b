using Drypeak.Soil.Laboratory.Workings;
using Drypeak.Soil.Quantities;
using static Drypeak.Soil.Laboratory.Workings.MathMl;
using static Drypeak.Soil.Laboratory.Workings.WorkingNumbers;

namespace Drypeak.Soil.References;

/// <summary>The working of the rapid method: each specimen converted, the peak, the ratio, the difference from the optimum.</summary>
internal static class RapidWorking
{
    private const string Hilf = "Hilf; ASTM D5080; AS 1289.5.7.1";
    private static readonly string RhoC = Sub("ρ", "c");
    private static readonly string RhoM = Sub("ρ", "m");
    private static readonly string Zm = Sub("z", "m");

    private static readonly Formula Converted = new("ρc = ρ/(1 + z/100)", Formula(RhoC, "=", Over("ρ", Row("1", "+", Over("z", "100")))), Hilf);

    private static readonly Formula VertexWater = new("zm = Σ(zj² − zk²)·ρi/(2·Σ(zj − zk)·ρi)",
        Formula(Zm, "=", Over(Row("Σ", "(", Squared(Sub("z", "j")), "−", Squared(Sub("z", "k")), ")", Sub("ρ", "i")), Row("2", "Σ", "(", Sub("z", "j"), "−", Sub("z", "k"), ")", Sub("ρ", "i")))),
        Hilf + ": vertex of the parabola through three specimens");

    private static readonly Formula VertexDensity = new("ρm = Σρi·(zm − zj)(zm − zk)/((zi − zj)(zi − zk))",
        Formula(RhoM, "=", "Σ", Sub("ρ", "i"), Over(Row("(", Zm, "−", Sub("z", "j"), ")", "(", Zm, "−", Sub("z", "k"), ")"), Row("(", Sub("z", "i"), "−", Sub("z", "j"), ")", "(", Sub("z", "i"), "−", Sub("z", "k"), ")"))),
        Hilf + ": vertex of the parabola through three specimens");

    private static readonly Formula Ratio = new("D = 100·ρf/ρm", Formula("D", "=", "100", Over(Sub("ρ", "f"), RhoM)), Hilf);

    private static readonly Formula FromOptimum = new("w − wopt = −zm·(1 + w/100)",
        Formula("w", "−", Sub("w", "opt"), "=", "−", Zm, "(", "1", "+", Over("w", "100"), ")"), Hilf);

    public static IReadOnlyList<WorkingStep> Of(Density field, WaterContent? water, IReadOnlyList<RapidSpecimen> specimens, RapidResult result, DensityUnit unit)
    {
        string Text(Density density) => Number(density.In(unit));
        var steps = specimens.Select((specimen, i) => Converted.Step(
            $"converted wet density of specimen {i + 1}", $"{Text(specimen.WetDensity)}/(1 + {Number(specimen.WaterAdded * 100)}/100)", specimen.Converted.In(unit), unit.Symbol())).ToList();
        if (result is not { PeakWaterAdded: { } peakWater, PeakDensity: { } peak, DensityRatio: { } ratio, WaterContentFromOptimum: { } apart })
        {
            return steps;
        }

        steps.AddRange(specimens.Count == 3 ? Vertex(specimens, peakWater, peak, unit) :
        [
            Formulas.Peak("averaged").Step("water added at the peak", null, peakWater * 100, "%"),
            Formulas.Peak("averaged").Step("converted wet density at the peak", null, peak.In(unit), unit.Symbol()),
        ]);
        steps.Add(Ratio.Step("density ratio", $"100*{Text(field)}/{Text(peak)}", ratio * 100, "%"));
        steps.Add(FromOptimum.Step(water is null ? "water content from the optimum, an estimate with w = 0" : "water content from the optimum",
            $"{Number(-peakWater * 100)}*(1 + {Number((water?.Fraction ?? 0) * 100)}/100)", apart * 100, "%"));
        return steps;
    }

    private static WorkingStep[] Vertex(IReadOnlyList<RapidSpecimen> specimens, double peakWater, Density peak, DensityUnit unit)
    {
        var (z, density) = (specimens.Select(specimen => $"({Number(specimen.WaterAdded * 100)})").ToList(), specimens.Select(specimen => Number(specimen.Converted.In(unit))).ToList());
        string Sum(Func<int, int, int, string> term) => string.Join(" + ", new[] { term(0, 1, 2), term(1, 2, 0), term(2, 0, 1) });
        var at = $"({Number(peakWater * 100)})";
        return
        [
            VertexWater.Step("water added at the peak",
                $"({Sum((i, j, k) => $"({z[j]}^2 - {z[k]}^2)*{density[i]}")})/(2*({Sum((i, j, k) => $"({z[j]} - {z[k]})*{density[i]}")}))", peakWater * 100, "%"),
            VertexDensity.Step("converted wet density at the peak",
                Sum((i, j, k) => $"{density[i]}*({at} - {z[j]})*({at} - {z[k]})/(({z[i]} - {z[j]})*({z[i]} - {z[k]}))"), peak.In(unit), unit.Symbol()),
        ];
    }
}
