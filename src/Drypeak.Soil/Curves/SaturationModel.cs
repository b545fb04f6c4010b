namespace Drypeak.Soil.Curves;

/// <summary>
/// The saturation model: the Li–Sego curve as a maximum a posteriori estimate, so that its four parameters can be had from as few as
/// three points; without the priors' pull they could not. Standard errors and intervals are normal, from the information at the mode.
/// </summary>
internal static class SaturationModel
{
    /// <summary>Priors and noise of the model standing alone, wider than as a component of the average.</summary>
    private static readonly SaturationPrior Prior = new(0.45, 0.2, 0.8, 0.8, 0.010);

    public const string NoSpecificGravity = "The specific gravity is missing: the saturation model needs it to turn saturation into density.";
    /// <summary>Up to so many points the leave-one-out predictions are refits.</summary>
    private const int MostRefits = 12;

    private const string NoPeak = "The curve has no maximum inside the tested range.";

    /// <summary>Fits the points, at least <see cref="AveragedModel.FewestPoints"/> and with a range.</summary>
    public static FittedCurve Fit(TestedPoints points)
    {
        if (points.SpecificGravity is not { } gs)
        {
            return new() { Model = CurveModel.Saturation, Admissible = false, WhyNot = NoSpecificGravity };
        }

        var mode = SaturationMode.Of(points, gs, Prior);
        var drawing = CurveDrawing.Of(points, mode.Curve, mode.Peak?.WaterContent);
        var predictions = Predictions(points, gs, mode);
        return new()
        {
            Model = CurveModel.Saturation,
            Optimum = mode.Peak is { } peak ? Intervals.Normally(peak) : null,
            Admissible = mode.Peak is not null,
            WhyNot = mode.Peak is null ? NoPeak : null,
            Parameters = Parameters(mode),
            RootMeanSquareError = drawing.RootMeanSquareError,
            LeaveOneOutError = predictions.RootMeanSquareError,
            DegreesOfFreedom = Math.Max(0, points.Count - LiSegoCurve.Parameters),
            Fitted = drawing.Fitted,
            Predictions = predictions.Each,
            Curve = drawing.Curve,
        };
    }

    /// <summary>The peak alone.</summary>
    public static PeakEstimate? PeakOf(TestedPoints points) => ModeOf(points)?.Peak;

    /// <summary>The mode, or null without the specific gravity.</summary>
    public static SaturationMode? ModeOf(TestedPoints points) => points.SpecificGravity is { } gs ? SaturationMode.Of(points, gs, Prior) : null;

    /// <summary>
    /// Each point from the others: by refits where the points are few and each may carry the curve; where they are many, to first order about the
    /// mode, by the misfit over 1 − h with the leverage h that the point has beside the priors.
    /// </summary>
    private static LeaveOneOut Predictions(TestedPoints points, double gs, SaturationMode mode)
    {
        Span<double> gradient = stackalloc double[LiSegoCurve.Parameters];
        var (predictions, deviations) = (new double[points.Count], new double[points.Count]);
        for (var i = 0; i < points.Count; i++)
        {
            var isRefitted = points.Count <= MostRefits;
            var fit = isRefitted ? mode.Refit(points.Without(i), gs, Prior) : mode;
            var density = fit.Curve.Density(points.WaterContents[i], gradient);
            var relative = fit.Variance(gradient) / (Prior.Noise * Prior.Noise);
            predictions[i] = isRefitted ? density : points.Densities[i] - ((points.Densities[i] - density) / (1 - relative));
            deviations[i] = Prior.Noise * Math.Sqrt(isRefitted ? 1 + relative : 1 / (1 - relative));
        }

        return LeaveOneOut.From(points, predictions, deviations);
    }

    private static CurveParameter[] Parameters(SaturationMode mode)
    {
        Span<double> errors = stackalloc double[LiSegoCurve.Parameters];
        for (var j = 0; j < errors.Length; j++)
        {
            errors[j] = Math.Sqrt(mode.Variance(j));
        }

        var saturation = 1 / (1 + Math.Exp(-mode.Values[0]));
        var (wetEnd, shape, dryLeg) = (Math.Exp(mode.Values[1]), Math.Exp(mode.Values[2]), Math.Exp(mode.Values[3]));
        return
        [
            new("greatestSaturation", 100 * saturation, "%", 100 * saturation * (1 - saturation) * errors[0],
                "Sm, the degree of saturation that the wet leg follows. Prior: odds about those of 91 %, deviation of their logarithm 0.45."),
            new("wetEnd", 100 * wetEnd, "%", 100 * wetEnd * errors[1],
                "wm, the water content from which the saturation rises no more. Prior: about 1.05 times the greatest water content, deviation of its logarithm 0.2."),
            new("shape", shape, "", shape * errors[2],
                "n, how sharply the curve bends. Prior: about 6, deviation of its logarithm 0.8."),
            new("dryLeg", 100 * dryLeg, "%", 100 * dryLeg * errors[3],
                "p, the water content that sets the slope of the dry leg. Prior: about 0.4 times the greatest water content, deviation of its logarithm 0.8."),
        ];
    }
}
