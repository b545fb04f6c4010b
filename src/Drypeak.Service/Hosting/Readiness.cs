namespace Drypeak.Service.Hosting;

/// <summary>Whether new requests are welcome: when the program is warm, until it is told to stop.</summary>
internal sealed class Readiness(IHostApplicationLifetime lifetime)
{
    private volatile bool _isWarm;

    public bool IsWarm
    {
        get => _isWarm;
        set => _isWarm = value;
    }

    public bool IsStopping => lifetime.ApplicationStopping.IsCancellationRequested;
}
