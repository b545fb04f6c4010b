using Microsoft.AspNetCore.Server.Kestrel.Core;

namespace Drypeak.Service.Hosting;

/// <summary>What of <see cref="Limits"/> the server itself watches over: connections, header fields, speed.</summary>
internal static class ServerLimits
{
    /// <summary>The server's bounds on the request line and on header fields, above ours, so that a problem refuses what is between and not a bare status.</summary>
    private const int RequestLineBytes = 32 << 10;
    private const int RoomAboveOurs = 2;

    /// <summary>What a connection may hold that nobody has read yet.</summary>
    private const int UnreadBytes = 256 << 10;

    public static void Apply(KestrelServerOptions server, Limits limits)
    {
        server.AddServerHeader = false;
        var bounds = server.Limits;
        bounds.MaxRequestLineSize = RequestLineBytes;
        bounds.MaxRequestHeadersTotalSize = limits.HeaderBytes * RoomAboveOurs;
        bounds.MaxRequestHeaderCount = limits.HeaderFields * RoomAboveOurs;
        bounds.MaxRequestBufferSize = Math.Max(UnreadBytes, Math.Max(RequestLineBytes, limits.HeaderBytes * RoomAboveOurs));
        bounds.RequestHeadersTimeout = TimeSpan.FromSeconds(limits.HeaderSeconds);
        bounds.KeepAliveTimeout = TimeSpan.FromSeconds(limits.IdleSeconds);
        // Each endpoint has its own bound, and a batch has none.
        bounds.MaxRequestBodySize = null;
        bounds.MinRequestBodyDataRate = new MinDataRate(limits.BytesPerSecond, TimeSpan.FromSeconds(limits.SlowSeconds));
        bounds.MinResponseDataRate = new MinDataRate(limits.BytesPerSecond, TimeSpan.FromSeconds(limits.SlowSeconds));
        bounds.MaxConcurrentConnections = limits.Connections == 0 ? null : limits.Connections;
    }
}
