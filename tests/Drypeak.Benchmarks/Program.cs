BenchmarkDotNet.Running.BenchmarkSwitcher.FromAssembly(typeof(Drypeak.Benchmarks.Marker).Assembly).Run(args);

namespace Drypeak.Benchmarks
{
    internal static class Marker;
}
