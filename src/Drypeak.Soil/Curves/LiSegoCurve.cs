namespace Drypeak.Soil.Curves;

/// <summary>
/// The compaction curve of X. Li and D. C. Sego (2000): the degree of saturation rises with the water content to a greatest
/// value Sm, which the wet leg follows, and the dry density follows from the saturation. It cannot cross the zero-air-voids line.
/// <code>
/// Sr = Sm − Sm·u^(n+1)·(1 + K)/(uⁿ + K),  u = 1 − w/wm,  K = (p/wm)ⁿ   for w below wm;  Sr = Sm beyond
/// ρd = Gs·ρw/(1 + w·Gs/Sr)
/// </code>
/// Densities in Mg/m³, water contents as fractions.
/// </summary>
/// <remarks>X. Li, D. C. Sego, Equation for complete compaction curve of fine-grained soils (2000), the form written above; title from memory.</remarks>
internal readonly struct LiSegoCurve : ICurve
{
    /// <summary>logit Sm, ln wm, ln n, ln p.</summary>
    public const int Parameters = 4;

    /// <summary>At w = 0 the saturation is 0 and the density its limit. This water content (0.001 %) gives it, without the digits that 1 − F would lose nearer to 0.</summary>
    private const double LeastWaterContent = 1e-5;

    /// <summary>The same against wm, for water contents that no soil has.</summary>
    private const double LeastShareOfWm = 1e-10;

    /// <summary>Nearer to wm than this, relative, the logarithm of u would run away.</summary>
    private const double LeastDistance = 1e-12;

    /// <summary>exp of this and of its negative are finite, and so are their products.</summary>
    private const double GreatestExponent = 300;

    private readonly double greatestSaturation;
    private readonly double wm;
    private readonly double n;
    private readonly double logQ;
    private readonly double k;
    private readonly double volumeOfSolids;
    private readonly double least;
    private readonly double waterDensity;

    /// <param name="parameters">logit Sm, ln wm, ln n, ln p.</param>
    /// <param name="specificGravity">Gs.</param>
    /// <param name="waterDensity">Mg/m³.</param>
    public LiSegoCurve(ReadOnlySpan<double> parameters, double specificGravity, double waterDensity)
    {
        greatestSaturation = 1 / (1 + Math.Exp(-parameters[0]));
        wm = Math.Exp(parameters[1]);
        n = Math.Exp(parameters[2]);
        logQ = parameters[3] - parameters[1];
        k = Power(n * logQ);
        volumeOfSolids = 1 / specificGravity;
        least = Math.Max(LeastWaterContent, LeastShareOfWm * wm);
        this.waterDensity = waterDensity;
    }

    /// <summary>Dry density, Mg/m³.</summary>
    public double Density(double waterContent)
    {
        var w = Math.Max(waterContent, least);
        return waterDensity / (volumeOfSolids + (w / Saturation(w)));
    }

    /// <summary>Dry density, and its derivatives by the four parameters.</summary>
    public double Density(double waterContent, Span<double> gradient)
    {
        var w = Math.Max(waterContent, least);
        double saturation, byWm, byN, byP;
        if (w >= wm)
        {
            (saturation, byWm, byN, byP) = (greatestSaturation, 0, 0, 0);
        }
        else
        {
            var u = Math.Max(1 - (w / wm), LeastDistance);
            var logU = Math.Log(u);
            var power = Power(n * logU);
            var both = power + k;
            var dryness = u * power * (1 + k) / both;
            saturation = greatestSaturation * (1 - dryness);
            var scale = -greatestSaturation * dryness;
            var onWm = (1 - u) / u;
            byWm = scale * (((n + 1) * onWm) - (n * k / (1 + k)) - (((n * power * onWm) - (n * k)) / both));
            byN = scale * n * (logU + (k * logQ / (1 + k)) - (((power * logU) + (k * logQ)) / both));
            byP = scale * n * k * ((1 / (1 + k)) - (1 / both));
        }

        var density = waterDensity / (volumeOfSolids + (w / saturation));
        var bySaturation = density * density * w / (waterDensity * saturation * saturation);
        gradient[0] = bySaturation * (1 - greatestSaturation) * saturation;
        gradient[1] = bySaturation * byWm;
        gradient[2] = bySaturation * byN;
        gradient[3] = bySaturation * byP;
        return density;
    }

    /// <summary>dρd/dw, Mg/m³: −ρ²/ρw·(Sr − w·dSr/dw)/Sr².</summary>
    public double Slope(double waterContent)
    {
        var w = Math.Max(waterContent, least);
        var (saturation, fall) = (greatestSaturation, greatestSaturation);
        if (w < wm)
        {
            var u = Math.Max(1 - (w / wm), LeastDistance);
            var power = Power(n * Math.Log(u));
            var dryness = u * power * (1 + k) / (power + k);
            var rise = dryness * ((n + 1) - (n * power / (power + k))) / (u * wm);
            saturation = greatestSaturation * (1 - dryness);
            fall = greatestSaturation * (1 - dryness - (w * rise));
        }

        var density = waterDensity / (volumeOfSolids + (w / saturation));
        return -density * density * fall / (waterDensity * saturation * saturation);
    }

    private double Saturation(double w)
    {
        if (w >= wm)
        {
            return greatestSaturation;
        }

        var u = Math.Max(1 - (w / wm), LeastDistance);
        var power = Power(n * Math.Log(u));
        return greatestSaturation * (1 - (u * power * (1 + k) / (power + k)));
    }

    private static double Power(double exponent) => Math.Exp(Math.Clamp(exponent, -GreatestExponent, GreatestExponent));
}
