using System.Text;
using System.Text.Unicode;

namespace Drypeak.Service.Exchange.Ags;

/// <summary>An item of a line.</summary>
/// <param name="Text">Without its quotation marks; doubled ones are one.</param>
/// <param name="Start">Where its bytes begin in the file, the quotation mark included.</param>
/// <param name="Length">How many bytes it has, both marks included.</param>
internal readonly record struct AgsItem(string Text, int Start, int Length);

/// <summary>A line that has anything in it.</summary>
/// <param name="Number">From 1.</param>
/// <param name="Items">Its items; empty where the line is not of the standard's form.</param>
/// <param name="Fault">What is wrong with its form: a code with a sentence; null where nothing is.</param>
internal sealed record AgsLine(int Number, IReadOnlyList<AgsItem> Items, (string Code, string Message)? Fault)
{
    /// <summary>GROUP, HEADING, UNIT, TYPE or DATA; or whatever else stands first.</summary>
    public string Descriptor => Items.Count > 0 ? Items[0].Text : "";
}

/// <summary>AGS4 as text: bytes to lines of quoted items (rules 1 to 6). The bytes are kept, so that what is not changed is given back as it came.</summary>
internal sealed class AgsText
{
    private static readonly Encoding Windows1252 = CodePagesEncodingProvider.Instance.GetEncoding(1252)!;

    private AgsText(ReadOnlyMemory<byte> bytes, Encoding encoding, IReadOnlyList<AgsLine> lines) => (Bytes, Encoding, Lines) = (bytes, encoding, lines);

    public ReadOnlyMemory<byte> Bytes { get; }

    public Encoding Encoding { get; }

    public IReadOnlyList<AgsLine> Lines { get; }

    /// <summary>Reads a file; what holds for the whole of it is reported here.</summary>
    public static AgsText Read(ReadOnlyMemory<byte> bytes, AgsReport report)
    {
        var span = bytes.Span;
        var encoding = Utf8.IsValid(span) ? Encoding.UTF8 : Windows1252;
        var start = 0;
        if (span.StartsWith("\uFEFF"u8))
        {
            start = "\uFEFF"u8.Length;
            report.Note(1, "byte-order-mark", Severity.Warning, "The file begins with a byte order mark, which the standard does not have. It is passed over, and kept where the file is given back; save the file as ASCII.");
        }

        if (span.IndexOf((byte)0) is >= 0 and var zero)
        {
            report.Refuse(LineAt(span, zero), "", "not-text", "The file has a zero byte here: it is no text, or text of two bytes a letter. Save it as ASCII or UTF-8.");
            return new AgsText(bytes, encoding, []);
        }

        if (span[start..].IndexOfAnyInRange((byte)0x80, (byte)0xFF) is >= 0 and var beyond)
        {
            report.Note(LineAt(span, start + beyond), "not-ascii", Severity.Note,
                $"The file has letters beyond ASCII, the first in this line; they were read as {(encoding == Windows1252 ? "Windows-1252" : "UTF-8")}. Receivers may read them otherwise.");
        }

        var lines = new List<AgsLine>();
        var (number, lonelyLineFeeds, firstLonely) = (0, 0, 0);
        while (start < span.Length)
        {
            number++;
            var rest = span[start..];
            var length = rest.IndexOf((byte)'\n') is >= 0 and var lineFeed ? lineFeed : rest.Length;
            var text = rest[..length];
            if (length < rest.Length && !text.EndsWith("\r"u8))
            {
                firstLonely = lonelyLineFeeds++ == 0 ? number : firstLonely;
            }

            var bare = text.EndsWith("\r"u8) ? text[..^1] : text;
            if (!bare.Trim(" \t"u8).IsEmpty)
            {
                lines.Add(Split(bare, number, start, encoding));
            }

            start += length + 1;
        }

        if (lonelyLineFeeds > 0)
        {
            report.Note(firstLonely, "line-ending", Severity.Warning, $"{lonelyLineFeeds} lines end by LF alone, this one first; the standard has CRLF. They are read all the same, and kept where the file is given back.");
        }

        return new AgsText(bytes, encoding, lines);
    }

    private static AgsLine Split(ReadOnlySpan<byte> line, int number, int start, Encoding encoding)
    {
        var items = new List<AgsItem>();
        for (var i = 0; ; i++)
        {
            if (i >= line.Length || line[i] != '"')
            {
                return Broken("not-quoted", $"item {items.Count + 1} is not in quotation marks. Put every item in double quotation marks, with nothing between the marks and the commas.");
            }

            var end = Closing(line, i + 1);
            if (end < 0)
            {
                return Broken("unclosed-quotation", $"item {items.Count + 1} has no closing quotation mark. Close it in the same line; an item has no line break, and a mark inside is doubled.");
            }

            var text = encoding.GetString(line[(i + 1)..end]).Replace("\"\"", "\"", StringComparison.Ordinal);
            items.Add(new AgsItem(text, start + i, end - i + 1));
            if (end + 1 == line.Length)
            {
                return new AgsLine(number, items, null);
            }

            if (line[end + 1] != ',')
            {
                return Broken("stray-text", $"something other than a comma follows item {items.Count}. Double a quotation mark inside an item, and leave no spaces outside of the marks.");
            }

            i = end + 1;
        }

        AgsLine Broken(string code, string message) => new(number, items, (code, $"In this line {message}"));
    }

    /// <summary>Where the mark is that closes an item; -1 where there is none.</summary>
    private static int Closing(ReadOnlySpan<byte> line, int from)
    {
        for (var i = from; i < line.Length; i++)
        {
            if (line[i] == '"')
            {
                if (i + 1 == line.Length || line[i + 1] != '"')
                {
                    return i;
                }

                i++;
            }
        }

        return -1;
    }

    private static int LineAt(ReadOnlySpan<byte> bytes, int offset) => 1 + bytes[..offset].Count((byte)'\n');
}
