using System.IO.Compression;
using System.IO.Pipelines;
using Microsoft.Net.Http.Headers;

namespace Drypeak.Service.Exchange.Batch;

/// <summary>A body that expands further than any batch of tests would.</summary>
internal sealed class ExpansionException : Exception;

/// <summary>The content codings of a batch, gzip and br (RFC 9110, section 8.4), both ways.</summary>
internal static class BodyCoding
{
    /// <summary>How many bytes a byte of a compressed body may become. Tests that differ in their numbers compress about tenfold, the same test over and over two hundredfold.</summary>
    public const int LargestExpansion = 250;

    /// <summary>Bytes that any body may become, however well it compresses: 16 MiB. They are read line by line and never held.</summary>
    private const long AlwaysAllowed = 16L << 20;

    /// <summary>Without it the framework takes a compressed body that is cut short for one that ends there.</summary>
    private const string StrictValidation = "System.IO.Compression.UseStrictValidation";

    private const string Gzip = "gzip";
    private const string Brotli = "br";

    static BodyCoding() => AppContext.SetSwitch(StrictValidation, true);

    /// <summary>The request's body as it was before it was compressed; null where its coding is not understood.</summary>
    public static PipeReader? Decoded(HttpRequest request)
    {
        var coding = request.Headers.ContentEncoding.ToString().Trim().ToLowerInvariant();
        if (coding is "" or "identity")
        {
            return request.BodyReader;
        }

        var meter = new ExpansionMeter();
        var compressed = new MeteredStream(request.Body, meter.AddCompressed);
        Stream? expanded = coding switch
        {
            Gzip or "x-gzip" => new GZipStream(compressed, CompressionMode.Decompress),
            Brotli => new BrotliStream(compressed, CompressionMode.Decompress),
            _ => null,
        };
        return expanded is null ? null : PipeReader.Create(new MeteredStream(expanded, meter.AddExpanded));
    }

    /// <summary>The coding that the answer shall have: the one that the request likes best, gzip where it does not care; null for none.</summary>
    public static string? Chosen(HttpRequest request)
    {
        if (!StringWithQualityHeaderValue.TryParseList(request.Headers.AcceptEncoding, out var accepted))
        {
            return null;
        }

        double QualityOf(string coding) =>
            (accepted.FirstOrDefault(each => each.Value.Equals(coding, StringComparison.OrdinalIgnoreCase)) ?? accepted.FirstOrDefault(each => each.Value == "*")) is { } found
                ? found.Quality ?? 1
                : 0;
        var (gzip, brotli) = (QualityOf(Gzip), QualityOf(Brotli));
        return (gzip, brotli) is (0, 0) ? null : gzip >= brotli ? Gzip : Brotli;
    }

    /// <summary>A stream that compresses into the answer's body; to be disposed at the end.</summary>
    public static Stream Encode(Stream body, string coding) => coding == Gzip
        ? new GZipStream(body, CompressionLevel.Fastest, leaveOpen: true)
        : new BrotliStream(body, CompressionLevel.Fastest, leaveOpen: true);

    private sealed class ExpansionMeter
    {
        private long _compressed, _expanded;

        public void AddCompressed(int bytes) => _compressed += bytes;

        public void AddExpanded(int bytes)
        {
            _expanded += bytes;
            if (_expanded > AlwaysAllowed + (LargestExpansion * _compressed))
            {
                throw new ExpansionException();
            }
        }
    }

    /// <summary>A stream that is read from, and tells how much.</summary>
    private sealed class MeteredStream(Stream inner, Action<int> told) : Stream
    {
        public override bool CanRead => true;

        public override bool CanSeek => false;

        public override bool CanWrite => false;

        public override long Length => throw new NotSupportedException();

        public override long Position
        {
            get => throw new NotSupportedException();
            set => throw new NotSupportedException();
        }

        public override async ValueTask<int> ReadAsync(Memory<byte> buffer, CancellationToken cancellationToken = default)
        {
            var bytes = await ReadInnerAsync(buffer, cancellationToken);
            told(bytes);
            return bytes;
        }

        /// <summary>Of damaged data Brotli's decoder says that the operation is invalid, gzip's that the data are; here both say the latter.</summary>
        private async ValueTask<int> ReadInnerAsync(Memory<byte> buffer, CancellationToken cancellationToken)
        {
            try
            {
                return await inner.ReadAsync(buffer, cancellationToken);
            }
            catch (InvalidOperationException damaged) when (inner is BrotliStream)
            {
                throw new InvalidDataException("The compressed data are damaged.", damaged);
            }
        }

        public override Task<int> ReadAsync(byte[] buffer, int offset, int count, CancellationToken cancellationToken) =>
            ReadAsync(buffer.AsMemory(offset, count), cancellationToken).AsTask();

        public override int Read(byte[] buffer, int offset, int count) => throw new NotSupportedException();

        public override void Flush() => throw new NotSupportedException();

        public override long Seek(long offset, SeekOrigin origin) => throw new NotSupportedException();

        public override void SetLength(long value) => throw new NotSupportedException();

        public override void Write(byte[] buffer, int offset, int count) => throw new NotSupportedException();

        protected override void Dispose(bool disposing)
        {
            if (disposing)
            {
                inner.Dispose();
            }

            base.Dispose(disposing);
        }
    }
}
