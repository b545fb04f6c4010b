using BenchmarkDotNet.Attributes;
using Drypeak.Soil.Curves;

namespace Drypeak.Benchmarks;

/// <summary>A whole analysis of the curve: chosen model with uncertainty and predictions, all alternatives, the next specimen.</summary>
[MemoryDiagnoser]
public class CurveBenchmarks
{
    private CompactionData data = new([], null, 998.2);

    /// <summary>Specimens; 5 is the usual test, whose goal is 120 µs.</summary>
    [Params(5, 50, 500)]
    public int Specimens { get; set; }

    [GlobalSetup]
    public void Setup()
    {
        var points = new CompactionPoint[Specimens];
        for (var i = 0; i < Specimens; i++)
        {
            var fromPeak = (i / (Specimens - 1.0)) - 0.52;
            points[i] = new(0.14 + (0.08 * fromPeak), 1860 - (400 * fromPeak * fromPeak) + (3 * Math.Sin(7 * i)));
        }

        data = new(points, 2.70, 998.2);
    }

    [Benchmark]
    public CurveAnalysis WithSpecificGravity() => CompactionCurve.Analyze(data);

    [Benchmark]
    public CurveAnalysis WithoutSpecificGravity() => CompactionCurve.Analyze(data with { SpecificGravity = null });

    [Benchmark]
    public CompactionPoint? PeakAlone() => CompactionCurve.PeakOf(data, CurveModel.Averaged);
}
