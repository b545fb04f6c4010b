namespace Drypeak.Soil.Curves;

/// <summary>A curve of dry density over water content.</summary>
internal interface ICurve
{
    /// <summary>Mg/m³ at a water content (fraction).</summary>
    double Density(double waterContent);
}

/// <summary>What every fitted curve shows: its values at the points, its scatter, the line to draw. kg/m³, in the order in which the points came.</summary>
/// <param name="Fitted">The curve at each point.</param>
/// <param name="RootMeanSquareError">Over the points.</param>
/// <param name="Curve">The line, evenly over the tested range, its peak among its points.</param>
/// <param name="CrossesZeroAirVoids">Whether the curve rises above the zero-air-voids line though no point does; the line is then drawn along it.</param>
internal readonly record struct CurveDrawing(double[] Fitted, double RootMeanSquareError, CompactionPoint[] Curve, bool CrossesZeroAirVoids)
{
    private const int Intervals = 64;

    /// <summary>Evaluates a curve.</summary>
    /// <param name="points">The points it was fitted to.</param>
    /// <param name="curve">The curve.</param>
    /// <param name="peak">Its optimum, so that the line passes through it; null where it has none.</param>
    public static CurveDrawing Of<TCurve>(TestedPoints points, in TCurve curve, double? peak)
        where TCurve : ICurve, allows ref struct
    {
        Span<double> fitted = points.Count <= 64 ? stackalloc double[points.Count] : new double[points.Count];
        var squares = 0.0;
        for (var i = 0; i < fitted.Length; i++)
        {
            var density = curve.Density(points.WaterContents[i]);
            squares += (density - points.Densities[i]) * (density - points.Densities[i]);
            fitted[i] = TestedPoints.ToKilograms(density);
        }

        return new(
            points.InOrderGiven<double>(fitted),
            TestedPoints.ToKilograms(Math.Sqrt(squares / fitted.Length)),
            Line(points, curve, peak, out var crosses),
            crosses);
    }

    private static CompactionPoint[] Line<TCurve>(TestedPoints points, in TCurve curve, double? peak, out bool crosses)
        where TCurve : ICurve, allows ref struct
    {
        var line = new CompactionPoint[Intervals + (peak is null ? 1 : 2)];
        var left = peak;
        crosses = false;
        for (int i = 0, step = 0; i < line.Length; i++)
        {
            var waterContent = step == Intervals ? points.Wettest : points.Driest + (points.Range * step / Intervals);
            if (left <= waterContent)
            {
                (waterContent, left) = (left.Value, null);
            }
            else
            {
                step++;
            }

            var density = curve.Density(waterContent);
            if (!points.AnyAboveZeroAirVoids && points.IsAboveZeroAirVoids(waterContent, density))
            {
                (density, crosses) = (points.ZeroAirVoids(waterContent), true);
            }

            line[i] = new(waterContent, TestedPoints.ToKilograms(density));
        }

        return line;
    }
}

/// <summary>What the other points say of each point.</summary>
/// <param name="Each">In the order in which the points came; empty where the model cannot do without one of them.</param>
/// <param name="RootMeanSquareError">kg/m³, or null.</param>
internal readonly record struct LeaveOneOut(LeaveOneOutPrediction[] Each, double? RootMeanSquareError)
{
    public static readonly LeaveOneOut Impossible = new([], null);

    /// <summary>From predictions in the order of water content.</summary>
    /// <param name="points">The points.</param>
    /// <param name="predictions">Mg/m³.</param>
    /// <param name="deviations">Standard uncertainties, Mg/m³; empty where the model gives none.</param>
    public static LeaveOneOut From(TestedPoints points, ReadOnlySpan<double> predictions, ReadOnlySpan<double> deviations)
    {
        Span<LeaveOneOutPrediction> each = points.Count <= 64
            ? stackalloc LeaveOneOutPrediction[points.Count]
            : new LeaveOneOutPrediction[points.Count];
        var squares = 0.0;
        for (var i = 0; i < each.Length; i++)
        {
            squares += (predictions[i] - points.Densities[i]) * (predictions[i] - points.Densities[i]);
            each[i] = new(
                TestedPoints.ToKilograms(predictions[i]),
                deviations.IsEmpty ? null : TestedPoints.ToKilograms(deviations[i]));
        }

        return new(
            points.InOrderGiven<LeaveOneOutPrediction>(each),
            TestedPoints.ToKilograms(Math.Sqrt(squares / each.Length)));
    }
}
