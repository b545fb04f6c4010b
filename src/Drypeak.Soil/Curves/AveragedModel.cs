using System.Globalization;

namespace Drypeak.Soil.Curves;

/// <summary>
/// The average over curves anchored at their peak. The optimum itself is the variable of integration: on a grid of places, eight pairs
/// of leg shapes are weighed by how well they fit with their level and scales integrated out, and the saturation model joins by its evidence.
/// It needs no choice between models and no starting value; without the specific gravity it does without the saturation model.
/// </summary>
internal static class AveragedModel
{
    /// <summary>Fewest points for a curve with a peak.</summary>
    public const int FewestPoints = 3;

    /// <summary>No optimum is given where its chance to lie outside the tested range is greater.</summary>
    public const double GreatestChanceOutside = 0.5;

    /// <summary>Half length of the maximum's 95 % interval in standard deviations; calibrated with the interval of the optimum.</summary>
    public const double HalfLength = 1.85;

    /// <summary>Error of the saturation model as such, Mg/m³.</summary>
    private const double ErrorOfSaturationModel = 0.004;

    /// <summary>The saturation model's priors as a component of the average.</summary>
    public static readonly SaturationPrior Prior = new(
        0.45, 0.2, 0.5, 0.4, Math.Sqrt((LegSums.Noise * LegSums.Noise) + (ErrorOfSaturationModel * ErrorOfSaturationModel)));

    /// <summary>Fits the points.</summary>
    /// <param name="points">At least <see cref="FewestPoints"/>, not all at one water content.</param>
    /// <param name="next">The specimen to make next.</param>
    public static FittedCurve Fit(TestedPoints points, out NextSpecimen? next)
    {
        Span<PeakNode> nodes = stackalloc PeakNode[PeakNodes.Count];
        var mixture = Weigh(points, nodes);
        next = SpecimenPlan.Next(points, nodes, mixture);

        var predictions = NodePredictions.Of(points, nodes);
        var isInside = mixture.ChanceOutside <= GreatestChanceOutside;
        var drawing = isInside
            ? CurveDrawing.Of(points, new AlignedCurve(points, nodes, mixture, stackalloc double[AlignedCurve.Scales]), mixture.Peak.WaterContent)
            : CurveDrawing.Of(points, new PlainCurve(points, nodes), null);
        return new FittedCurve
        {
            Model = CurveModel.Averaged,
            Optimum = isInside ? Optimum(mixture) : null,
            Admissible = isInside,
            WhyNot = isInside ? null : WhyNot(points, mixture),
            Parameters = Parameters(mixture),
            RootMeanSquareError = drawing.RootMeanSquareError,
            LeaveOneOutError = predictions.RootMeanSquareError,
            Fitted = drawing.Fitted,
            Predictions = predictions.Each,
            Curve = drawing.Curve,
            ChanceOfPeakOutside = mixture.ChanceOutside,
        };
    }

    /// <summary>The peak alone, or null where it lies probably outside the tested range.</summary>
    public static PeakEstimate? PeakOf(TestedPoints points)
    {
        Span<PeakNode> nodes = stackalloc PeakNode[PeakNodes.Count];
        var mixture = Weigh(points, nodes);
        return mixture.ChanceOutside <= GreatestChanceOutside ? mixture.Peak : null;
    }

    /// <summary>Fills the nodes and weighs them with the saturation model's mode.</summary>
    public static PeakMixture Weigh(TestedPoints points, Span<PeakNode> nodes)
    {
        PeakNodes.Fill(points, nodes);
        return new(points, nodes, points.SpecificGravity is { } gs ? SaturationMode.Of(points, gs, Prior) : null);
    }

    /// <summary>One sentence on why the averaged model stands for the answer.</summary>
    public static string Why(FittedCurve fit, TestedPoints points)
    {
        var saturation = fit.Parameters.Count > LegShapes.Pairs.Length + 1 ? fit.Parameters[LegShapes.Pairs.Length].Value : 0;
        var joined = points.SpecificGravity is null
            ? ""
            : string.Create(CultureInfo.InvariantCulture, $" and the saturation model (here {100 * saturation:0} % of the weight)");
        return string.Create(
            CultureInfo.InvariantCulture,
            $"The averaged model weighs {LegShapes.Pairs.Length} shapes of curve{joined} by how well they fit the {points.Count} points, so that no one of them has to be chosen.");
    }

    private static FittedOptimum Optimum(in PeakMixture mixture)
    {
        var (lower, upper) = mixture.Interval();
        var peak = mixture.Peak;
        var deviation = TestedPoints.ToKilograms(Math.Sqrt(peak.DensityVariance));
        var density = TestedPoints.ToKilograms(peak.Density);
        return new(
            // Its tails are no halves: only on data like no soil's can they leave the mean out.
            new(peak.WaterContent, Math.Sqrt(peak.WaterContentVariance), Math.Min(lower, peak.WaterContent), Math.Max(upper, peak.WaterContent)),
            new(density, deviation, density - (HalfLength * deviation), density + (HalfLength * deviation)));
    }

    private static string WhyNot(TestedPoints points, in PeakMixture mixture) =>
        string.Create(
            CultureInfo.InvariantCulture,
            $"The peak lies outside the tested range of {100 * points.Driest:0.0} to {100 * points.Wettest:0.0} % with a chance of {100 * mixture.ChanceOutside:0} %: {100 * mixture.ChanceDrier:0} % drier, {100 * mixture.ChanceWetter:0} % wetter.");

    private static CurveParameter[] Parameters(in PeakMixture mixture)
    {
        var pairs = LegShapes.Pairs;
        var parameters = new CurveParameter[pairs.Length + (mixture.Saturation is null ? 1 : 2)];
        for (var i = 0; i < pairs.Length; i++)
        {
            parameters[i] = new(pairs[i].Name, mixture.WeightOf(i) / mixture.Total, "", null, pairs[i].Meaning);
        }

        if (mixture.Saturation is not null)
        {
            parameters[pairs.Length] = new("shareSaturation", mixture.SaturationWeight / mixture.Total, "", null, "Share of the saturation model (Li and Sego 2000) in the average.");
        }

        parameters[^1] = Noise;
        return parameters;
    }

    private static readonly CurveParameter Noise = new(
        "noise", TestedPoints.ToKilograms(LegSums.Noise), "kg/m³", null, "Standard deviation of a point about the curve, assumed for every test.");
}
