using MathNet.Numerics.Distributions;
using static Drypeak.Soil.Tests.Curves.Accuracy.SyntheticSoil;

namespace Drypeak.Soil.Tests.Curves.Accuracy;

/// <summary>A way in which soils compact, with random parameters.</summary>
/// <param name="Letter">Short name.</param>
/// <param name="Words">What the curves look like.</param>
/// <param name="Draw">One soil.</param>
internal sealed record SoilFamily(string Letter, string Words, Func<Random, SyntheticSoil> Draw)
{
    /// <summary>The four families on which the models are held to bounds.</summary>
    public static readonly SoilFamily[] Main =
    [
        new("a", "Li–Sego curves", LiSego),
        new("b", "sloping dry side, wet leg along a line of saturation", random => Kink(random, linearShare: Uniform(random, 0.2, 0.5), dropAtFour: Uniform(random, 0.09, 0.30))),
        new("c", "sharp parabolas, two-sided", random => TwoSided(random, Uniform(random, 0.14, 0.32), Uniform(random, 0.6, 1.5))),
        new("d", "flat granular", Granular),
    ];

    /// <summary>Further shapes, some of which no model contains.</summary>
    public static readonly SoilFamily[] Further =
    [
        new("B", "kink: parabolic dry side, wet leg along a line of saturation", random => Kink(random, 0, Uniform(random, 0.08, 0.18))),
        new("C", "lopsided parabolas", random => TwoSided(random, Uniform(random, 0.12, 0.24), Uniform(random, 0.45, 0.75))),
        new("D", "symmetric bell", Bell),
        new("e", "saturation by a retention curve", Retention),
        new("f", "bulking: the dry leg turns back up", Bulking),
        new("g", "flat top", FlatTop),
        new("h", "air voids die away with water", AirDies),
        new("i", "a second hump on the dry side", TwoHumps),
        new("j", "kink after a flat dry side", random => Kink(random, 0, Uniform(random, 0.04, 0.08))),
    ];

    private static double SpecificGravityOf(Random random) => Uniform(random, 2.62, 2.78);

    /// <summary>Random parameters of the curve of X. Li and D. C. Sego (2000), written out here apart from the product's own.</summary>
    private static SyntheticSoil LiSego(Random random)
    {
        var (gs, wm, greatest) = (SpecificGravityOf(random), Uniform(random, 0.12, 0.28), Uniform(random, 0.84, 0.95));
        var (n, p) = (Math.Exp(Normal.Sample(random, Math.Log(6), 0.3)), wm * Uniform(random, 0.3, 0.5));
        return WithPeak(gs, 0.45 * wm, wm, w =>
        {
            var u = w < wm ? (wm - w) / wm : 0;
            var saturation = greatest * (1 - (Math.Pow(u, n + 1) * (1 + Math.Pow(p / wm, n)) / (Math.Pow(u, n) + Math.Pow(p / wm, n))));
            return gs * WaterDensity / (1 + (w * gs / saturation));
        });
    }

    private static SyntheticSoil Kink(Random random, double linearShare, double dropAtFour)
    {
        var (gs, optimum, saturation) = (SpecificGravityOf(random), Uniform(random, 0.08, 0.20), Uniform(random, 0.80, 0.92));
        double WetLeg(double w) => gs * WaterDensity / (1 + (w * gs / saturation));
        return new(
            w =>
            {
                var four = (optimum - w) / 0.04;
                return w >= optimum ? WetLeg(w) : WetLeg(optimum) - (dropAtFour * ((linearShare * four) + ((1 - linearShare) * four * four)));
            },
            optimum,
            gs);
    }

    private static SyntheticSoil TwoSided(Random random, double dropAtFour, double wetShare)
    {
        var (gs, optimum) = (SpecificGravityOf(random), Uniform(random, 0.08, 0.18));
        var maximum = OnAirVoids(gs, optimum, Uniform(random, 0.03, 0.07));
        return new(
            w =>
            {
                var four = (w - optimum) / 0.04;
                return maximum - (dropAtFour * (four > 0 ? wetShare : 1) * four * four);
            },
            optimum,
            gs);
    }

    /// <summary>A clean sand or gravel: shallow legs, straight away from a rounded top, somewhat steeper on the wet side.</summary>
    private static SyntheticSoil Granular(Random random)
    {
        var (gs, optimum) = (Uniform(random, 2.62, 2.70), Uniform(random, 0.06, 0.12));
        var (maximum, rounding) = (OnAirVoids(gs, optimum, Uniform(random, 0.06, 0.12)), Uniform(random, 0.01, 0.03));
        var (dry, wet) = (Uniform(random, 0.025, 0.055), Uniform(random, 1.0, 2.0));
        double Leg(double distance) => Math.Sqrt((distance * distance) + (rounding * rounding)) - rounding;
        return new(w => maximum - (dry * (w > optimum ? wet : 1) * Leg(w - optimum) / Leg(0.04)), optimum, gs);
    }

    private static SyntheticSoil Bell(Random random)
    {
        var (gs, optimum) = (SpecificGravityOf(random), Uniform(random, 0.08, 0.16));
        var (maximum, depth, width) = (OnAirVoids(gs, optimum, Uniform(random, 0.05, 0.10)), Uniform(random, 0.08, 0.25), Uniform(random, 0.04, 0.07));
        return new(w => maximum - (depth * (1 - Math.Exp(-0.5 * Math.Pow((w - optimum) / width, 2)))), optimum, gs);
    }

    /// <summary>Saturation rises with water as a van Genuchten curve would, to its greatest value.</summary>
    private static SyntheticSoil Retention(Random random)
    {
        var (gs, scale, greatest) = (SpecificGravityOf(random), Uniform(random, 0.08, 0.18), Uniform(random, 0.86, 0.95));
        var (power, outer) = (Uniform(random, 3.5, 5.5), Uniform(random, 0.6, 1.0));
        return WithPeak(gs, 0.4 * scale, 2.2 * scale, w =>
        {
            var saturation = greatest * (1 - Math.Pow(1 + Math.Pow(w / scale, power), -outer));
            return gs * WaterDensity / (1 + (w * gs / saturation));
        });
    }

    private static SyntheticSoil Bulking(Random random)
    {
        var (gs, optimum) = (Uniform(random, 2.62, 2.70), Uniform(random, 0.09, 0.13));
        var (maximum, depth, width) = (OnAirVoids(gs, optimum, Uniform(random, 0.05, 0.10)), Uniform(random, 0.08, 0.14), Uniform(random, 0.03, 0.045));
        var wet = Uniform(random, 0.08, 0.14);
        return new(
            w =>
            {
                var (four, turned) = ((w - optimum) / 0.04, (optimum - w) / width);
                return four > 0 ? maximum - (wet * four * four) : maximum - (depth * turned * turned * Math.Exp(1 - (turned * turned / 2)) / 2);
            },
            optimum,
            gs);
    }

    private static SyntheticSoil FlatTop(Random random)
    {
        var (gs, optimum) = (SpecificGravityOf(random), Uniform(random, 0.08, 0.16));
        var (maximum, drop, flat) = (OnAirVoids(gs, optimum, Uniform(random, 0.04, 0.09)), Uniform(random, 0.05, 0.12), Uniform(random, 0.6, 1.2));
        return new(
            w =>
            {
                var two = (w - optimum) / 0.02;
                return maximum - (drop * two * two * two * two / (4 * ((two * two) + (flat * flat))));
            },
            optimum,
            gs);
    }

    private static SyntheticSoil AirDies(Random random)
    {
        var (gs, rest, whole, scale) = (SpecificGravityOf(random), Uniform(random, 0.02, 0.05), Uniform(random, 0.5, 1.0), Uniform(random, 0.03, 0.05));
        return WithPeak(gs, 0.04, 0.25, w => (1 - rest - (whole * Math.Exp(-w / scale))) * WaterDensity / ((1 / gs) + w));
    }

    private static SyntheticSoil TwoHumps(Random random)
    {
        var (gs, optimum) = (SpecificGravityOf(random), Uniform(random, 0.10, 0.18));
        var (maximum, drop) = (OnAirVoids(gs, optimum, Uniform(random, 0.05, 0.08)), Uniform(random, 0.05, 0.09));
        var (hump, place) = (Uniform(random, 0.01, 0.025), optimum - Uniform(random, 0.04, 0.055));
        return WithPeak(gs, optimum - 0.02, optimum + 0.02, w =>
            maximum - (drop * Math.Pow((w - optimum) / 0.04, 2)) + (hump * Math.Exp(-0.5 * Math.Pow((w - place) / 0.01, 2))));
    }

    private static double OnAirVoids(double gs, double w, double airVoids) => (1 - airVoids) * WaterDensity / ((1 / gs) + w);

    /// <summary>Finds the peak by golden sections; the curves that come here have one between the bounds.</summary>
    private static SyntheticSoil WithPeak(double gs, double from, double to, Func<double, double> density)
    {
        var golden = (Math.Sqrt(5) - 1) / 2;
        while (to - from > 1e-9)
        {
            var (left, right) = (to - (golden * (to - from)), from + (golden * (to - from)));
            if (density(left) < density(right))
            {
                from = left;
            }
            else
            {
                to = right;
            }
        }

        return new(density, (from + to) / 2, gs);
    }
}
