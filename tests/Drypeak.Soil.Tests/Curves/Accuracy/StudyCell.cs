using Drypeak.Soil.Curves;

namespace Drypeak.Soil.Tests.Curves.Accuracy;

/// <summary>How one model did on many tests of one family with so many points.</summary>
internal sealed class ModelScore
{
    private readonly List<double> waterLengths = [], densityLengths = [];
    private double waterSquares, waterSum, densitySquares, densitySum;
    private int waterCovered, densityCovered;

    public int Tests { get; private set; }

    public int WithOptimum { get; private set; }

    /// <summary>Share of tests for which no optimum was given.</summary>
    public double ShareWithout => 1 - ((double)WithOptimum / Tests);

    /// <summary>% water.</summary>
    public double OptimumError => Math.Sqrt(waterSquares / WithOptimum);

    /// <summary>% water, found less true.</summary>
    public double OptimumBias => waterSum / WithOptimum;

    /// <summary>kg/m³.</summary>
    public double MaximumError => Math.Sqrt(densitySquares / WithOptimum);

    /// <summary>kg/m³, found less true.</summary>
    public double MaximumBias => densitySum / WithOptimum;

    /// <summary>Share of the intervals given that hold the truth.</summary>
    public double OptimumCoverage => (double)waterCovered / waterLengths.Count;

    public double MaximumCoverage => (double)densityCovered / densityLengths.Count;

    /// <summary>Share of the optima that came with an interval.</summary>
    public double ShareWithInterval => (double)waterLengths.Count / WithOptimum;

    /// <summary>% water, median.</summary>
    public double OptimumLength => Median(waterLengths);

    /// <summary>kg/m³, median.</summary>
    public double MaximumLength => Median(densityLengths);

    public void Add(FittedOptimum? found, SyntheticSoil soil)
    {
        Tests++;
        if (found is null)
        {
            return;
        }

        WithOptimum++;
        var (water, density) = (100 * (found.WaterContent.Value - soil.Optimum), found.MaximumDryDensity.Value - (1000 * soil.Maximum));
        (waterSquares, waterSum) = (waterSquares + (water * water), waterSum + water);
        (densitySquares, densitySum) = (densitySquares + (density * density), densitySum + density);
        waterCovered += Cover(found.WaterContent, soil.Optimum, 100, waterLengths);
        densityCovered += Cover(found.MaximumDryDensity, 1000 * soil.Maximum, 1, densityLengths);
    }

    private static int Cover(Estimate estimate, double truth, double scale, List<double> lengths)
    {
        if (estimate is not { Lower: { } lower, Upper: { } upper })
        {
            return 0;
        }

        lengths.Add(scale * (upper - lower));
        return lower <= truth && truth <= upper ? 1 : 0;
    }

    private static double Median(List<double> values)
    {
        values.Sort();
        return values.Count == 0 ? double.NaN : values[values.Count / 2];
    }
}

/// <summary>A family of soils tested with so many points each: every model's score.</summary>
internal sealed class StudyCell
{
    private readonly Dictionary<CurveModel, ModelScore> scores = Enum.GetValues<CurveModel>().ToDictionary(model => model, _ => new ModelScore());

    private StudyCell(SoilFamily family, int points) => (Family, Points) = (family, points);

    public SoilFamily Family { get; }

    public int Points { get; }

    public ModelScore this[CurveModel model] => scores[model];

    /// <summary>Draws soils, tests them, and scores every model by one analysis of each test.</summary>
    /// <param name="family">The family.</param>
    /// <param name="points">Points of a test.</param>
    /// <param name="soils">How many.</param>
    /// <param name="withSpecificGravity">Whether the models are told the specific gravity.</param>
    /// <param name="seed">Of the soils and of their noise; the cell's own family and points are mixed in.</param>
    public static StudyCell Run(SoilFamily family, int points, int soils, bool withSpecificGravity = true, int seed = 1)
    {
        var cell = new StudyCell(family, points);
        var random = new Random((seed * 1000) + (family.Letter[0] * 10) + points);
        for (var i = 0; i < soils; i++)
        {
            var soil = family.Draw(random);
            var test = soil.Test(points, random);
            var analysis = CompactionCurve.Analyze(withSpecificGravity ? test : test with { SpecificGravity = null });
            foreach (var fit in analysis.Alternatives.Append(analysis.Chosen))
            {
                cell[fit.Model].Add(fit.Optimum, soil);
            }
        }

        return cell;
    }
}
