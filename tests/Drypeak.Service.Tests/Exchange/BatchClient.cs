using System.Globalization;
using System.Net.Sockets;
using System.Text;
using System.Text.Json;
using System.Text.Json.Nodes;
using Drypeak.Service.Tests.Laboratory;
using Xunit;

namespace Drypeak.Service.Tests.Exchange;

/// <summary>A caller of a batch who sends and takes at the same time, as HTTP/1.1 lets it: it speaks to the socket itself.</summary>
internal sealed class BatchClient : IDisposable
{
    private readonly TcpClient _socket = new();
    private readonly NetworkStream _stream;
    private readonly BufferedStream _received;
    private readonly MemoryStream _unread = new();

    public BatchClient(Uri service, string address)
    {
        _socket.Connect(service.Host, service.Port);
        _stream = _socket.GetStream();
        _received = new BufferedStream(_stream, 64 << 10);
        Write($"POST {address} HTTP/1.1\r\nHost: {service.Authority}\r\nContent-Type: application/x-ndjson\r\nTransfer-Encoding: chunked\r\n\r\n");
    }

    private static CancellationToken Stop => TestContext.Current.CancellationToken;

    /// <summary>A test of Ternmarsh as one line.</summary>
    public static string OneLine { get; } = JsonNode.Parse(Body.Sound)!.ToJsonString();

    /// <summary>Sends text as one chunk.</summary>
    public void Send(string text) => Write(string.Create(CultureInfo.InvariantCulture, $"{Encoding.UTF8.GetByteCount(text):x}\r\n{text}\r\n"));

    /// <summary>Sends as much as the service takes until nobody reads any more for a while; gives the number of lines that went away.</summary>
    public int SendUntilStuck(string line, TimeSpan patience, int most)
    {
        _stream.WriteTimeout = (int)patience.TotalMilliseconds;
        for (var sent = 0; sent < most; sent++)
        {
            try
            {
                Send(line + "\n");
            }
            catch (IOException)
            {
                return sent;
            }
        }

        return most;
    }

    public void End() => Write("0\r\n\r\n");

    /// <summary>The status line, after which the header fields are passed over.</summary>
    public Task<string> StatusAsync() => Task.Run(() =>
    {
        var status = ReadLine();
        while (ReadLine().Length > 0)
        {
        }

        return status;
    }, Stop);

    /// <summary>The next line of the answer, or null at its end.</summary>
    /// <exception cref="IOException">The answer broke off.</exception>
    public Task<JsonElement?> NextAsync() => Task.Run(() =>
    {
        using var line = new MemoryStream();
        for (var letter = ReadByteOfBody(); letter != '\n'; letter = ReadByteOfBody())
        {
            if (letter < 0)
            {
                return line.Length == 0 ? (JsonElement?)null : throw new IOException("The answer ends within a line.");
            }

            line.WriteByte((byte)letter);
        }

        return JsonElement.Parse(line.ToArray());
    }, Stop);

    public void Dispose() => _socket.Dispose();

    /// <summary>The next byte of the body, or -1 at its end: the chunks of RFC 9112, section 7.1, put together.</summary>
    private int ReadByteOfBody()
    {
        if (_unread.Position == _unread.Length)
        {
            var size = int.Parse(ReadLine(), NumberStyles.HexNumber, CultureInfo.InvariantCulture);
            if (size == 0)
            {
                return -1;
            }

            var chunk = new byte[size];
            _received.ReadExactly(chunk);
            _unread.SetLength(0);
            _unread.Write(chunk);
            _unread.Position = 0;
            ReadLine();
        }

        return _unread.ReadByte();
    }

    private string ReadLine()
    {
        var line = new StringBuilder();
        for (var letter = _received.ReadByte(); letter != '\n'; letter = _received.ReadByte())
        {
            line.Append(letter >= 0 ? (char)letter : throw new IOException("The service has closed the connection."));
        }

        return line.ToString().TrimEnd('\r');
    }

    private void Write(string text) => _stream.Write(Encoding.UTF8.GetBytes(text));
}
