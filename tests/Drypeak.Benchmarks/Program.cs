using BenchmarkDotNet.Running;
using Drypeak.Benchmarks;

// The benchmarks; or the bare server that the service is measured against over HTTP; or the times of lots at a running service.
if (args is ["bare-server", var url])
{
    await BareServer.RunAsync(url);
}
else if (args is ["lots", var service])
{
    await LotTimes.RunAsync(service);
}
else
{
    BenchmarkSwitcher.FromAssembly(typeof(BareServer).Assembly).Run(args);
}
