using System.Buffers;
using System.IO.Pipelines;
using System.Runtime.CompilerServices;

namespace Drypeak.Service.Exchange.Batch;

/// <summary>A line of a body that has anything in it.</summary>
/// <param name="Number">From 1; every line counts, blank ones too.</param>
/// <param name="Bytes">The line without its line break; empty where it is too long.</param>
/// <param name="IsTooLong">Whether it has more bytes than are read of a line.</param>
internal readonly record struct Line(long Number, ReadOnlyMemory<byte> Bytes, bool IsTooLong);

/// <summary>Cuts a stream of bytes into lines, passes over the blank ones, and never holds more than one.</summary>
/// <param name="source">The stream. It is read only as fast as lines are taken.</param>
/// <param name="maximumBytes">The longest line, inclusive, without its line break.</param>
internal sealed class LineReader(PipeReader source, int maximumBytes)
{
    private static readonly SearchValues<byte> WhiteSpace = SearchValues.Create(" \t\r"u8);

    /// <summary>Lines read so far, blank ones too.</summary>
    public long Lines { get; private set; }

    /// <summary>Of these, the lines with nothing in them but white space.</summary>
    public long Blank { get; private set; }

    /// <summary>The lines; LF or CRLF ends each, and may be missing at the end. One that is too long is given at once, without its bytes, and the rest of it is passed over.</summary>
    public async IAsyncEnumerable<Line> ReadAsync([EnumeratorCancellation] CancellationToken stop)
    {
        var isPassedOver = false;
        for (var isCompleted = false; !isCompleted;)
        {
            var read = await source.ReadAsync(stop);
            var buffer = read.Buffer;
            isCompleted = read.IsCompleted;
            while (TryTake(ref buffer, isCompleted, out var bytes))
            {
                if (!isPassedOver && Counted(bytes) is { } line)
                {
                    yield return line;
                }

                isPassedOver = false;
            }

            if (!isPassedOver && WithoutCarriageReturn(buffer).Length > maximumBytes)
            {
                isPassedOver = true;
                yield return new Line(++Lines, default, IsTooLong: true);
            }

            source.AdvanceTo(isPassedOver ? buffer.End : buffer.Start, buffer.End);
        }
    }

    private Line? Counted(ReadOnlySequence<byte> bytes)
    {
        Lines++;
        var text = WithoutCarriageReturn(bytes);
        if (text.Length > maximumBytes)
        {
            return new Line(Lines, default, IsTooLong: true);
        }

        if (IsBlank(text))
        {
            Blank++;
            return null;
        }

        return new Line(Lines, text.ToArray(), IsTooLong: false);
    }

    private static bool IsBlank(ReadOnlySequence<byte> text)
    {
        foreach (var part in text)
        {
            if (part.Span.IndexOfAnyExcept(WhiteSpace) >= 0)
            {
                return false;
            }
        }

        return true;
    }

    private static bool TryTake(ref ReadOnlySequence<byte> buffer, bool isCompleted, out ReadOnlySequence<byte> line)
    {
        if (buffer.PositionOf((byte)'\n') is { } end)
        {
            line = buffer.Slice(0, end);
            buffer = buffer.Slice(buffer.GetPosition(1, end));
            return true;
        }

        line = buffer;
        if (!isCompleted || buffer.IsEmpty)
        {
            return false;
        }

        buffer = buffer.Slice(buffer.End);
        return true;
    }

    private static ReadOnlySequence<byte> WithoutCarriageReturn(ReadOnlySequence<byte> line) =>
        !line.IsEmpty && line.Slice(line.Length - 1).FirstSpan[0] == '\r' ? line.Slice(0, line.Length - 1) : line;
}
