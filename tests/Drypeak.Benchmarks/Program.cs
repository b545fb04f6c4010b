using BenchmarkDotNet.Running;
using Drypeak.Benchmarks;

// Either the benchmarks, or the bare server that the service is measured against over HTTP.
if (args is ["bare-server", var url])
{
    await BareServer.RunAsync(url);
}
else
{
    BenchmarkSwitcher.FromAssembly(typeof(BareServer).Assembly).Run(args);
}
