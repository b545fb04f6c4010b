using System.Threading.RateLimiting;
using Microsoft.AspNetCore.RateLimiting;

namespace Drypeak.Service.Hosting;

/// <summary>
/// How much is done at once. Who comes beyond that waits in the order of arrival, and who finds the queue full is told to come back
/// (503). A request takes its turn only when its body has arrived, so that slow senders hold up nobody but themselves.
/// </summary>
/// <remarks>Health and metrics are outside of it: they must answer when all else is busy.</remarks>
internal sealed class Capacity(Limits limits) : IDisposable
{
    /// <summary>Up to so many bytes, a body that is being received needs no permission.</summary>
    private const int SmallBody = 64 << 10;

    private const int RetryAfterSeconds = 1;

    private readonly ConcurrencyLimiter _computations = Limiter(limits.RequestsAtOnce, limits.RequestsWaiting);
    private readonly ConcurrencyLimiter _largeBodies = Limiter(limits.LargeBodiesAtOnce, limits.RequestsWaiting);
    private readonly ConcurrencyLimiter _batches = Limiter(limits.BatchesAtOnce, limits.BatchesAtOnce);

    public void Dispose()
    {
        _computations.Dispose();
        _largeBodies.Dispose();
        _batches.Dispose();
    }

    /// <summary>Passes a request on when there is room for it.</summary>
    public async Task PassAsync(HttpContext context, RequestDelegate next)
    {
        var endpoint = context.GetEndpoint();
        if (endpoint?.Metadata.GetMetadata<DisableRateLimitingAttribute>() is { })
        {
            await next(context);
            return;
        }

        using var time = CancellationTokenSource.CreateLinkedTokenSource(context.RequestAborted);
        time.CancelAfter(TimeSpan.FromSeconds(limits.RequestSeconds));
        if (endpoint?.Metadata.GetMetadata<StreamedBody>() is { })
        {
            await PassAsync(_batches, context, next, time.Token);
            return;
        }

        var length = BytesToAwait(context);
        if (length <= SmallBody)
        {
            await ReceiveAsync(context, length, next, time.Token);
            return;
        }

        await PassAsync(_largeBodies, context, received => ReceiveAsync(received, length, next, time.Token), time.Token);
    }

    private async Task ReceiveAsync(HttpContext context, long length, RequestDelegate next, CancellationToken time)
    {
        try
        {
            if (length > 0)
            {
                // Looked at and not taken: whoever answers finds it all in the server's buffer.
                var body = context.Request.BodyReader;
                var read = await body.ReadAtLeastAsync((int)length, time);
                body.AdvanceTo(read.Buffer.Start);
            }
        }
        catch (OperationCanceledException) when (!context.RequestAborted.IsCancellationRequested)
        {
            Meters.Refused("too-slow");
            // The rest of the body is not waited for.
            context.Response.Headers.Connection = "close";
            await Problems.OfStatus(StatusCodes.Status408RequestTimeout).ExecuteAsync(context);
            return;
        }

        await PassAsync(_computations, context, next, time);
    }

    /// <summary>How much of a body must be there before it is its request's turn: all, or as much as any endpoint reads before it refuses.</summary>
    private long BytesToAwait(HttpContext context) => context.Request switch
    {
        { ContentLength: { } length } => length <= limits.LotBodyBytes ? length : 0,
        { Headers.TransferEncoding.Count: > 0 } => limits.BodyBytes + 1,
        _ => 0,
    };

    private static async Task PassAsync(ConcurrencyLimiter limiter, HttpContext context, RequestDelegate next, CancellationToken time)
    {
        using var lease = await WaitAsync(limiter, context, time);
        if (lease is { IsAcquired: true })
        {
            await next(context);
            return;
        }

        Meters.Refused("busy");
        await Problems.Unavailable("The service is busy with other requests. Send the request again in a moment.", RetryAfterSeconds).ExecuteAsync(context);
    }

    /// <summary>A permission, or none: the queue is full, or the time is over.</summary>
    private static async ValueTask<RateLimitLease?> WaitAsync(ConcurrencyLimiter limiter, HttpContext context, CancellationToken time)
    {
        var turn = limiter.AcquireAsync(1, time);
        if (turn.IsCompletedSuccessfully)
        {
            return turn.Result;
        }

        using var waiting = Meters.Waiting();
        try
        {
            return await turn;
        }
        catch (OperationCanceledException) when (!context.RequestAborted.IsCancellationRequested)
        {
            return null;
        }
    }

    private static ConcurrencyLimiter Limiter(int atOnce, int waiting) => new(new ConcurrencyLimiterOptions
    {
        PermitLimit = atOnce,
        QueueLimit = waiting,
        QueueProcessingOrder = QueueProcessingOrder.OldestFirst,
    });
}

/// <summary>
/// Marks an endpoint that reads its body while it answers: a batch. It has neither a bound on its length nor on its time, needs the scope
/// <c>batch</c>, and is counted apart, so that long streams take no turn from short requests.
/// </summary>
internal sealed class StreamedBody;
