using Microsoft.AspNetCore.Mvc.Testing;
using Xunit;

namespace Drypeak.Service.Tests.Documents;

/// <summary>The exported description is the running service's.</summary>
public sealed class OpenApiTests : IDisposable
{
    private readonly WebApplicationFactory<Program> _service = new();

    public OpenApiTests()
    {
        _service.UseKestrel(0);
        _service.StartServer();
    }

    [Fact]
    public async Task The_served_description_is_the_exported_file_byte_for_byte()
    {
        using var client = _service.CreateClient();
        var served = await client.GetByteArrayAsync("/openapi/v1.json", TestContext.Current.CancellationToken);
        var exported = await File.ReadAllBytesAsync(Repository.File("openapi/v1.json"), TestContext.Current.CancellationToken);
        Assert.True(served.AsSpan().SequenceEqual(exported),
            "openapi/v1.json differs from the service. Run: dotnet run --project src/Drypeak.Service -- openapi \"$PWD/openapi/v1.json\"");
    }

    public void Dispose() => _service.Dispose();
}
