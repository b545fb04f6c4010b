namespace Drypeak.Soil.Curves;

/// <summary>
/// What the points on one side of a supposed peak say about a leg of a given shape, its random scale β ~ N(1, r²) integrated out.
/// Point i lies E_i below the peak by the shape, with noise N_i = σ² + (τE_i)²: a leg is trusted less the further down it goes.
/// </summary>
internal struct LegSums
{
    /// <summary>σ, the noise of a point, Mg/m³.</summary>
    public const double Noise = 0.012;

    /// <summary>τ, error of a shape relative to its drop.</summary>
    public const double ShapeError = 0.20;

    /// <summary>1/r² for r = 0.5, the relative spread of a leg's scale.</summary>
    public const double ScalePrecision = 4;

    /// <summary>Products of noises are turned into logarithms before they under- or overflow.</summary>
    private const double Large = 1e100;

    private double s0, s1, s2, t0, t1, t2;
    private double noises;
    private double logNoises;

    /// <summary>q, variance of the scale once the points have spoken.</summary>
    public double ScaleVariance { get; private set; }

    /// <summary>ΣE/N.</summary>
    public readonly double Drops => s1;

    /// <summary>a, information on the level.</summary>
    public readonly double Information => s0 - (ScaleVariance * s1 * s1);

    /// <summary>t, the level's score against the highest density.</summary>
    public readonly double Score => t0 - (ScaleVariance * s1 * t1);

    /// <summary>e, what is left of the squares.</summary>
    public readonly double Squares => t2 - (ScaleVariance * t1 * t1);

    /// <summary>D = (1 + r²·ΣE²/N)·ΠN, less the factor whose logarithm is <see cref="LogDeterminant"/>.</summary>
    public readonly double Determinant => noises / (ScaleVariance * ScalePrecision);

    /// <summary>Logarithm of the rest of D; 0 unless the points are many.</summary>
    public readonly double LogDeterminant => logNoises;

    /// <summary>Mean of the scale, given the level above the highest density.</summary>
    public readonly double Scale(double level) => 1 + (ScaleVariance * ((level * s1) - t1));

    /// <summary>N for a drop.</summary>
    public static double NoiseVariance(double drop) => (Noise * Noise) + (ShapeError * drop * (ShapeError * drop));

    /// <summary>Sums over points on one side of the peak.</summary>
    /// <param name="shape">The leg's.</param>
    /// <param name="peak">The supposed optimum, fraction.</param>
    /// <param name="waterContents">Of the side's points.</param>
    /// <param name="densities">Of the side's points, Mg/m³.</param>
    /// <param name="highest">y0, Mg/m³.</param>
    /// <param name="waterDensity">Mg/m³.</param>
    public static LegSums Over(
        in LegShape shape, double peak, ReadOnlySpan<double> waterContents, ReadOnlySpan<double> densities, double highest, double waterDensity)
    {
        var density = highest / waterDensity;
        var slope = highest * density;
        var sums = new LegSums { noises = 1 };
        for (var i = 0; i < waterContents.Length; i++)
        {
            var drop = shape.Drop(Math.Abs(waterContents[i] - peak), slope, density);
            sums.Add(drop, densities[i] - highest + drop);
        }

        sums.ScaleVariance = 1 / (ScalePrecision + sums.s2);
        return sums;
    }

    private void Add(double drop, double residual)
    {
        var variance = NoiseVariance(drop);
        var weight = 1 / variance;
        var (dropWeight, residualWeight) = (drop * weight, residual * weight);
        s0 += weight;
        s1 += dropWeight;
        s2 += drop * dropWeight;
        t0 += residualWeight;
        t1 += drop * residualWeight;
        t2 += residual * residualWeight;
        noises *= variance;
        if (noises is < 1 / Large or > Large)
        {
            logNoises += Math.Log(noises);
            noises = 1;
        }
    }
}
