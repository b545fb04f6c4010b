namespace Drypeak.Soil.Curves;

/// <summary>The front door: from points to a curve, how sure it is, how the other models see it, and the specimen to make next.</summary>
public static class CompactionCurve
{
    private const string TooFew = "A curve with a peak needs at least three points.";
    private const string NoRange = "All points stand at one water content: there is no range in which a peak could lie.";

    /// <summary>Fits every model to the points and takes one for the answer.</summary>
    /// <param name="data">The points kept, at least one, in any order; finite, densities over 0, water contents 0 or more.</param>
    /// <param name="asked">The model asked for, or null for the averaged model, which needs no choice.</param>
    /// <returns>
    /// The analysis. Its chosen curve has no optimum where the points show none; it then says why not. Nothing in it is infinite or not a number,
    /// and it does not depend on the order of the points.
    /// </returns>
    public static CurveAnalysis Analyze(CompactionData data, CurveModel? asked = null)
    {
        var points = new TestedPoints(data);
        NextSpecimen? next;
        FittedCurve[] curves;
        if (points.Count < AveragedModel.FewestPoints || !points.HasRange)
        {
            next = SpecimenPlan.Start(points);
            curves = NotFitted(points);
        }
        else
        {
            curves =
            [
                AveragedModel.Fit(points, out next),
                SaturationModel.Fit(points),
                Parabola.Fit(points),
                Cubic.Fit(points),
                Spline.Fit(points),
            ];
        }

        var chosen = Array.FindIndex(curves, curve => curve.Model == (asked ?? CurveModel.Averaged));
        return new()
        {
            Chosen = curves[chosen],
            Why = asked is null ? AveragedModel.Why(curves[chosen], points) : "The model was asked for by name.",
            Alternatives = [.. curves[..chosen], .. curves[(chosen + 1)..]],
            DepartureFromOnePeak = TestedPoints.ToKilograms(OnePeak.Departure(points)),
            Next = next,
        };
    }

    /// <summary>The peak alone, for those who need it thousands of times; the same as the optimum of <see cref="Analyze"/> for the model.</summary>
    /// <param name="data">As for <see cref="Analyze"/>.</param>
    /// <param name="model">The model.</param>
    /// <returns>Optimum and maximum, or null where the model gives none inside the tested range.</returns>
    public static CompactionPoint? PeakOf(CompactionData data, CurveModel model)
    {
        var points = new TestedPoints(data);
        if (points.Count < AveragedModel.FewestPoints || !points.HasRange)
        {
            return null;
        }

        return model switch
        {
            CurveModel.Averaged => Point(AveragedModel.PeakOf(points)),
            CurveModel.Saturation => Point(SaturationModel.PeakOf(points)),
            CurveModel.Parabola => Point(Parabola.Fit(points)),
            CurveModel.Cubic => Point(Cubic.Fit(points)),
            CurveModel.Spline => Point(Spline.Fit(points)),
            _ => throw new ArgumentOutOfRangeException(nameof(model), model, "Not a model."),
        };
    }

    /// <summary>How far a model's curve is known over the tested range: for who draws it.</summary>
    /// <param name="data">As for <see cref="Analyze"/>.</param>
    /// <param name="model">The model.</param>
    /// <returns>The pointwise 95 % interval in order of water content; null where nothing supports one. All of it is finite.</returns>
    public static IReadOnlyList<BandPoint>? BandOf(CompactionData data, CurveModel model)
    {
        var points = new TestedPoints(data);
        if (points.DistinctCount < AveragedModel.FewestPoints)
        {
            return null;
        }

        return model switch
        {
            CurveModel.Averaged => CurveBand.OfAveraged(points),
            CurveModel.Saturation => SaturationModel.ModeOf(points) is { } mode ? CurveBand.Of(points, mode) : null,
            CurveModel.Parabola => CurveBand.Of(points, Polynomial.Fit(points, Parabola.Degree)),
            CurveModel.Cubic => CurveBand.Of(points, Polynomial.Fit(points, Cubic.Degree)),
            CurveModel.Spline => CurveBand.Of(points, new NaturalSpline(points)),
            _ => throw new ArgumentOutOfRangeException(nameof(model), model, "Not a model."),
        };
    }

    private static CompactionPoint? Point(in PeakEstimate? peak) =>
        peak is { } found ? new(found.WaterContent, TestedPoints.ToKilograms(found.Density)) : null;

    private static CompactionPoint? Point(FittedCurve fit) =>
        fit.Optimum is { } found ? new(found.WaterContent.Value, found.MaximumDryDensity.Value) : null;

    private static FittedCurve[] NotFitted(TestedPoints points)
    {
        var whyNot = points.HasRange ? TooFew : NoRange;
        return
        [
            Candidate.NotFitted(CurveModel.Averaged, whyNot),
            Candidate.NotFitted(CurveModel.Saturation, points.SpecificGravity is null ? SaturationModel.NoSpecificGravity : whyNot),
            Candidate.NotFitted(CurveModel.Parabola, whyNot),
            Candidate.NotFitted(CurveModel.Cubic, whyNot),
            Candidate.NotFitted(CurveModel.Spline, whyNot),
        ];
    }
}
