using System.Globalization;
using BenchmarkDotNet.Running;
using Drypeak.Benchmarks;

// Either the benchmarks, or the bare server that the service is measured against over HTTP, or the batch beside single requests, or lots.
if (args is ["bare-server", var url])
{
    await BareServer.RunAsync(url);
}
else if (args is ["lots", var lots])
{
    await LotTimes.RunAsync(lots);
}
else if (args is ["batch", var service, var process, var tests, var singles])
{
    await BatchMeasurement.RunAsync(new Uri(service), int.Parse(process, CultureInfo.InvariantCulture), int.Parse(tests, CultureInfo.InvariantCulture), int.Parse(singles, CultureInfo.InvariantCulture));
}
else
{
    BenchmarkSwitcher.FromAssembly(typeof(BareServer).Assembly).Run(args);
}
