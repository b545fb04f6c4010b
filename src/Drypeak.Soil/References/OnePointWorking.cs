using Drypeak.Soil.Curves;
using Drypeak.Soil.Laboratory;
using Drypeak.Soil.Laboratory.Workings;
using Drypeak.Soil.Quantities;
using static Drypeak.Soil.Laboratory.Workings.MathMl;
using static Drypeak.Soil.Laboratory.Workings.WorkingNumbers;

namespace Drypeak.Soil.References;

/// <summary>The working of one point on a family: the point reduced, the blend, the optimum between its two neighbours.</summary>
public static class OnePointWorking
{
    private const string Source = "AASHTO T 272, R 75";

    private static readonly Formula Blend = new("f(w, b) = ρd, solved for b", Formula("f", "(", "w", ",", "b", ")", "=", Sub("ρ", "d")), Source + ": a curve through the point, shaped like its neighbours");

    private static readonly Formula BlendedWater = new("wopt = w1 + b·(w2 − w1)",
        Formula(Sub("w", "opt"), "=", Sub("w", "1"), "+", "b", "(", Sub("w", "2"), "−", Sub("w", "1"), ")"), Source);

    private static readonly Formula BlendedDensity = new("ρdmax = ρ1 + b·(ρ2 − ρ1)",
        Formula(Sub("ρ", "dmax"), "=", Sub("ρ", "1"), "+", "b", "(", Sub("ρ", "2"), "−", Sub("ρ", "1"), ")"), Source);

    private static readonly Formula Share = new("100·w/wopt", Formula("100", Over("w", Sub("w", "opt"))), Source + ": 80 to 100 %");

    /// <summary>Every step, in the caller's units.</summary>
    /// <param name="measured">The point as measured.</param>
    /// <param name="point">The point, reduced.</param>
    /// <param name="result">What it says of the family.</param>
    /// <param name="units">The caller's units.</param>
    public static IReadOnlyList<WorkingStep> Of(SpecimenMeasurement measured, Specimen point, OnePointResult result, UnitSet units)
    {
        var unit = units.Density;
        List<WorkingStep> steps = [.. Laboratory.Workings.Working.OfSpecimen(measured, point, units, " of the point")];
        if (result is not { Blend: { } blend, ShareOfOptimum: { } share, Between: [var first, ..] between })
        {
            return steps;
        }

        var second = between[^1];
        steps.Add(Blend.Step($"blend of {string.Join(" and ", between.Select(curve => curve.Label))}", null, blend, ""));
        string Water(CompactionPoint optimum) => Number(optimum.WaterContent * 100);
        string Dry(CompactionPoint optimum) => Number(new Density(optimum.DryDensity).In(unit));
        var optimum = point.WaterContent.Fraction / share;
        steps.Add(BlendedWater.Step("optimum water content", $"{Water(first.Optimum)} + {Number(blend)}*({Water(second.Optimum)} - {Water(first.Optimum)})", optimum * 100, "%"));
        var density = first.Optimum.DryDensity + (blend * (second.Optimum.DryDensity - first.Optimum.DryDensity));
        steps.Add(BlendedDensity.Step("maximum dry density", $"{Dry(first.Optimum)} + {Number(blend)}*({Dry(second.Optimum)} - {Dry(first.Optimum)})", new Density(density).In(unit), unit.Symbol()));
        steps.Add(Share.Step("share of the optimum", $"100*{Number(point.WaterContent.Percent)}/{Number(optimum * 100)}", share * 100, "%"));
        return steps;
    }
}
