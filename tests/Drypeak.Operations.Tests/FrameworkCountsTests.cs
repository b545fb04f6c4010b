using Xunit;

namespace Drypeak.Operations.Tests;

/// <summary>
/// What the framework counts. It is asked of a process of its own: within one process, a host that ends also ends the framework's counts
/// of the same names that other hosts keep.
/// </summary>
public sealed class FrameworkCountsTests
{
    [Fact]
    public async Task The_framework_s_own_counts_stand_beside_ours()
    {
        using var service = await ServiceProcess.StartAsync();
        using var client = new HttpClient { BaseAddress = service.Address };
        await service.ReadyAsync();
        var metrics = await client.GetStringAsync("/metrics", TestContext.Current.CancellationToken);
        string[] names = ["http_server_request_duration_seconds_bucket", "http_server_active_requests", "kestrel_active_connections", "dotnet_gc_collections_total", "dotnet_process_memory_working_set_bytes"];
        Assert.All(names, name => Assert.Contains("\n" + name, metrics, StringComparison.Ordinal));
    }
}
