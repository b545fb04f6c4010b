namespace Drypeak.Soil.Curves;

/// <summary>What parabola, cubic and spline have in common once they are fitted: the drawing and whether they can be taken for the answer.</summary>
internal static class Candidate
{
    private const string NoPeak = "The curve has no maximum inside the tested range that is higher than its ends.";
    private const string CrossesZeroAirVoids = "The curve rises above the zero-air-voids line, though no point does.";

    /// <summary>A model that could not be fitted.</summary>
    public static FittedCurve NotFitted(CurveModel model, string whyNot) => new() { Model = model, Admissible = false, WhyNot = whyNot };

    /// <summary>Completes a fitted model; it is admissible with one peak inside and, where no point lies above the zero-air-voids line, below that line.</summary>
    /// <param name="model">Which.</param>
    /// <param name="points">The points.</param>
    /// <param name="curve">The fitted curve.</param>
    /// <param name="optimum">Its optimum inside the tested range, or null.</param>
    /// <param name="predictions">Leave-one-out.</param>
    /// <param name="objection">What the model itself has against being taken, or null.</param>
    public static FittedCurve Complete<TCurve>(
        CurveModel model, TestedPoints points, TCurve curve, FittedOptimum? optimum, in LeaveOneOut predictions, string? objection = null)
        where TCurve : ICurve
    {
        var drawing = CurveDrawing.Of(points, curve, optimum?.WaterContent.Value);
        var whyNot = optimum is null ? NoPeak : objection ?? (drawing.CrossesZeroAirVoids ? CrossesZeroAirVoids : null);
        return new()
        {
            Model = model,
            Optimum = optimum,
            Admissible = whyNot is null,
            WhyNot = whyNot,
            RootMeanSquareError = drawing.RootMeanSquareError,
            LeaveOneOutError = predictions.RootMeanSquareError,
            Fitted = drawing.Fitted,
            Predictions = predictions.Each,
            Curve = drawing.Curve,
        };
    }

    /// <summary>Whether a place inside the tested range is higher than both its ends.</summary>
    public static bool IsPeak<TCurve>(TestedPoints points, TCurve curve, double waterContent)
        where TCurve : ICurve =>
        waterContent > points.Driest && waterContent < points.Wettest
        && curve.Density(waterContent) >= Math.Max(curve.Density(points.Driest), curve.Density(points.Wettest));
}
