namespace Drypeak.Soil.Curves;
public static class CompactionCurve {
    public static CurveAnalysis Analyze(CompactionData data, CurveModel? asked = null) => throw new NotSupportedException();
    public static CompactionPoint? PeakOf(CompactionData data, CurveModel model) => throw new NotSupportedException();
}
