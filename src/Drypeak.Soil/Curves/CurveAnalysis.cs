namespace Drypeak.Soil.Curves;

/// <summary>The candidate models of the compaction curve.</summary>
public enum CurveModel
{
    /// <summary>Average over curves anchored at the peak; needs no choice, works with and without specific gravity.</summary>
    Averaged,
    /// <summary>Li and Sego (2000), anchored in the degree of saturation; needs the specific gravity.</summary>
    Saturation,
    /// <summary>Least-squares parabola.</summary>
    Parabola,
    /// <summary>Least-squares cubic, from five points.</summary>
    Cubic,
    /// <summary>Natural cubic spline through the points: what a hand draws.</summary>
    Spline,
}

/// <summary>What a fit starts from: the points kept, and what is known of the solids.</summary>
/// <param name="Points">The points kept, in any order; at least one.</param>
/// <param name="SpecificGravity">Gs, or null where it is not known.</param>
/// <param name="WaterDensity">kg/m³.</param>
public sealed record CompactionData(IReadOnlyList<CompactionPoint> Points, double? SpecificGravity, double WaterDensity);

/// <summary>A value with what is known of its uncertainty; same unit throughout.</summary>
/// <param name="Value">The estimate.</param>
/// <param name="StandardUncertainty">Standard uncertainty, or null where nothing supports one.</param>
/// <param name="Lower">Lower end of the 95 % interval, or null.</param>
/// <param name="Upper">Upper end of the 95 % interval, or null.</param>
public sealed record Estimate(double Value, double? StandardUncertainty, double? Lower, double? Upper);

/// <summary>The peak of a compaction curve.</summary>
/// <param name="WaterContent">Optimum water content, as a fraction.</param>
/// <param name="MaximumDryDensity">Maximum dry density, kg/m³.</param>
public sealed record FittedOptimum(Estimate WaterContent, Estimate MaximumDryDensity);

/// <summary>A parameter of a fitted model.</summary>
/// <param name="Name">camelCase name, as it stands in an answer.</param>
/// <param name="Value">The value, in <paramref name="Unit"/>.</param>
/// <param name="Unit">kg/m³, kg/m³ per %, kg/m³ per %² or %³, %, or empty for a ratio.</param>
/// <param name="StandardError">Standard error, or null.</param>
/// <param name="Meaning">What it is, in words; with its prior where it has one.</param>
public sealed record CurveParameter(string Name, double Value, string Unit, double? StandardError, string Meaning);

/// <summary>What the other points say of one point.</summary>
/// <param name="DryDensity">Predicted dry density, kg/m³.</param>
/// <param name="StandardUncertainty">Of the prediction, kg/m³; null where the model gives none.</param>
public readonly record struct LeaveOneOutPrediction(double DryDensity, double? StandardUncertainty);

/// <summary>One model fitted to the points.</summary>
public sealed record FittedCurve
{
    /// <summary>Which model.</summary>
    public required CurveModel Model { get; init; }

    /// <summary>The peak, or null where the model gives none inside the tested range.</summary>
    public FittedOptimum? Optimum { get; init; }

    /// <summary>Whether the curve can be taken for the answer; see <see cref="WhyNot"/>.</summary>
    public required bool Admissible { get; init; }

    /// <summary>One sentence on why it cannot, or null where it can.</summary>
    public string? WhyNot { get; init; }

    /// <summary>The model's parameters; empty where the model could not be fitted.</summary>
    public IReadOnlyList<CurveParameter> Parameters { get; init; } = [];

    /// <summary>Root of the mean square residual over the points, kg/m³; null where the model could not be fitted.</summary>
    public double? RootMeanSquareError { get; init; }

    /// <summary>Root of the mean square leave-one-out error, kg/m³; null where points are too few for it.</summary>
    public double? LeaveOneOutError { get; init; }

    /// <summary>Points less parameters; 0 or more. Null where the notion does not apply (the averaged model).</summary>
    public int? DegreesOfFreedom { get; init; }

    /// <summary>The curve at each point, kg/m³, in the order of the data's points; empty where not fitted.</summary>
    public IReadOnlyList<double> Fitted { get; init; } = [];

    /// <summary>Leave-one-out prediction of each point, in the order of the data's points; empty where there is none.</summary>
    public IReadOnlyList<LeaveOneOutPrediction> Predictions { get; init; } = [];

    /// <summary>The curve to draw, over the tested range, in order of water content; empty where not fitted.</summary>
    public IReadOnlyList<CompactionPoint> Curve { get; init; } = [];

    /// <summary>The chance that the peak lies outside the tested range, 0 to 1; null for a model that does not tell.</summary>
    public double? ChanceOfPeakOutside { get; init; }
}

/// <summary>Where one more specimen would tell most.</summary>
/// <param name="WaterContent">Fraction; a multiple of 0.005.</param>
/// <param name="StandardUncertaintyNow">Of the optimum water content, as a fraction, by the same reckoning as <paramref name="StandardUncertaintyAfter"/>; null where the step only brackets the peak.</param>
/// <param name="StandardUncertaintyAfter">Expected after the specimen, as a fraction; null where the step only brackets the peak.</param>
/// <param name="Reason">One sentence.</param>
public sealed record NextSpecimen(double WaterContent, double? StandardUncertaintyNow, double? StandardUncertaintyAfter, string Reason);

/// <summary>All that the points say about the curve.</summary>
public sealed record CurveAnalysis
{
    /// <summary>The model that stands for the answer. Its <see cref="FittedCurve.Optimum"/> is null where there is none.</summary>
    public required FittedCurve Chosen { get; init; }

    /// <summary>One sentence on why this model.</summary>
    public required string Why { get; init; }

    /// <summary>Every other model, fitted or with the reason why it could not be.</summary>
    public required IReadOnlyList<FittedCurve> Alternatives { get; init; }

    /// <summary>How far the points are from any sequence that rises once and then falls, kg/m³ (U); 0 where they do.</summary>
    public required double DepartureFromOnePeak { get; init; }

    /// <summary>The specimen to make next; null where one more would gain little.</summary>
    public NextSpecimen? Next { get; init; }
}
