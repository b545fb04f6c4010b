namespace Drypeak.Soil.Laboratory;

/// <summary>What the measurements leave uncertain of one specimen, as standard uncertainties.</summary>
/// <param name="WaterContent">Fraction, 0 or more.</param>
/// <param name="DryDensity">kg/m³, 0 or more.</param>
public readonly record struct SpecimenUncertainty(double WaterContent, double DryDensity)
{
    /// <summary>Of the usual step of an error, in standard uncertainties: small enough for the chain to be straight over it.</summary>
    private const double Step = 0.01;

    /// <summary>
    /// The uncertainties of the specimens kept, by label: each error of the chain in turn is moved a little, and what it moves is added in
    /// quadrature (JCGM 100:2008, 5.1.2 and 5.1.3). An error that specimens share, as the mold's volume, counts for each of them.
    /// </summary>
    /// <param name="test">The test; without uncertainties there is nothing to tell.</param>
    /// <param name="specimens">Its reduced specimens, in the order of the request.</param>
    /// <returns>Empty where no uncertainty is over 0. The work grows with the square of the specimens.</returns>
    public static IReadOnlyDictionary<string, SpecimenUncertainty> Of(MoistureDensityTest test, IReadOnlyList<Specimen> specimens)
    {
        var chain = new PerturbedChain(test, specimens);
        if (chain.Inputs.Count == 0)
        {
            return new Dictionary<string, SpecimenUncertainty>();
        }

        var (water, density) = (new double[chain.SpecimenCount], new double[chain.SpecimenCount]);
        var draws = new double[chain.Inputs.Count];
        for (var input = 0; input < draws.Length; input++)
        {
            draws[input] = Step;
            var above = chain.Points(draws).Points;
            draws[input] = -Step;
            var below = chain.Points(draws).Points;
            draws[input] = 0;
            for (var i = 0; i < water.Length; i++)
            {
                water[i] += Square((above[i].WaterContent - below[i].WaterContent) / (2 * Step));
                density[i] += Square((above[i].DryDensity - below[i].DryDensity) / (2 * Step));
            }
        }

        return chain.Labels.Select((label, i) => (label, Uncertainty: new SpecimenUncertainty(Math.Sqrt(water[i]), Math.Sqrt(density[i]))))
            .ToDictionary(item => item.label, item => item.Uncertainty);
    }

    private static double Square(double value) => value * value;
}
