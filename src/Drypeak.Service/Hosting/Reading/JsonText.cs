using System.Buffers;
using System.Globalization;
using System.Text;
using System.Text.Json;
using System.Text.Unicode;

namespace Drypeak.Service.Hosting;

/// <summary>Checks bytes as JSON text (RFC 8259, in UTF-8), before anything is known of a contract.</summary>
internal static class JsonText
{
    private static readonly SearchValues<byte> Delimiters = SearchValues.Create(" \t\r\n,:]}"u8);

    /// <summary>A mark of byte order is no part of the text: section 8.1 lets a reader skip it, and some spreadsheets' exports begin with one.</summary>
    public static ReadOnlyMemory<byte> WithoutByteOrderMark(ReadOnlyMemory<byte> bytes) =>
        bytes.Span.StartsWith("\uFEFF"u8) ? bytes["\uFEFF"u8.Length..] : bytes;

    /// <summary>The fault of bytes that are no text at all, or null.</summary>
    public static Fault? EncodingFault(ReadOnlySpan<byte> text)
    {
        if (text.IndexOfAnyExcept(" \t\r\n"u8) < 0)
        {
            return new Fault(Places.Whole, "empty-body", "The body is empty. Send a JSON object.");
        }

        return Utf8.IsValid(text)
            ? null
            : new Fault(Places.Whole, "invalid-utf-8", $"The text is not UTF-8 {Position(text, FirstInvalidByte(text))}. Save or send it as UTF-8.");
    }

    /// <summary>The first fault of syntax, with the place as far as it is known; null where the text is JSON.</summary>
    public static Fault? SyntaxFault(ReadOnlySpan<byte> text)
    {
        var trail = new Trail();
        var reader = new Utf8JsonReader(text, new JsonReaderOptions { MaxDepth = int.MaxValue });
        try
        {
            while (reader.Read())
            {
                if (reader.CurrentDepth >= StrictJson.MaximumDepth && reader.TokenType is JsonTokenType.StartObject or JsonTokenType.StartArray)
                {
                    return new Fault(trail.Place, "too-deep", string.Create(CultureInfo.InvariantCulture, $"Objects and lists may lie {StrictJson.MaximumDepth} deep in one another, not deeper."));
                }

                trail.Pass(ref reader);
            }

            return null;
        }
        catch (JsonException exception)
        {
            var offset = LineStart(text, exception.LineNumber ?? 0) + (int)(exception.BytePositionInLine ?? 0);
            return new Fault(trail.Place, "syntax", $"The text is not JSON {Position(text, offset)}: {Found(text, offset)}");
        }
        catch (InvalidOperationException)
        {
            // The bytes are UTF-8, so the one thing for which the reader cannot give a string is half of a surrogate pair.
            return new Fault(trail.Place, "lone-surrogate", $"A text has half of a surrogate pair in its \\u escapes {Position(text, (int)reader.TokenStartIndex)}. Escape both halves, or write the letter itself.");
        }
    }

    private static string Found(ReadOnlySpan<byte> text, int offset)
    {
        if (offset >= text.Length)
        {
            return "it ends too early. Close what is open: a text, a list or an object.";
        }

        var rest = text[offset..];
        var end = rest.IndexOfAny(Delimiters);
        var word = Encoding.UTF8.GetString(rest[..Math.Max(end < 0 ? Math.Min(rest.Length, 200) : end, 1)]);
        var advice = word[0] switch
        {
            'N' or 'I' or '+' or '.' => " A number is written with digits, as in 0.5 or -12; there is no NaN and no Infinity.",
            '\'' or '\u201C' or '\u201D' => " Texts and names stand in double quotes.",
            '/' or '#' => " There are no comments in JSON.",
            ']' or '}' => " Look for a comma too many, or a bracket of the other kind.",
            '"' or '{' or '[' => " Look for a comma or a colon too few before it.",
            >= '0' and <= '9' => " The decimal mark is a point, a number has no leading zeros and no spaces.",
            < ' ' => " Control characters in a text are escaped, as in \\n.",
            _ => "",
        };
        return $"{Received.Shorten(word)} cannot stand there.{advice}";
    }

    private static string Position(ReadOnlySpan<byte> text, int offset)
    {
        var before = text[..Math.Min(offset, text.Length)];
        var line = before.Count((byte)'\n') + 1;
        var column = Encoding.UTF8.GetCharCount(before[(before.LastIndexOf((byte)'\n') + 1)..]) + 1;
        return string.Create(CultureInfo.InvariantCulture, $"at line {line}, column {column}");
    }

    private static int LineStart(ReadOnlySpan<byte> text, long line)
    {
        var start = 0;
        for (; line > 0; line--)
        {
            start += text[start..].IndexOf((byte)'\n') + 1;
        }

        return start;
    }

    private static int FirstInvalidByte(ReadOnlySpan<byte> text)
    {
        var offset = 0;
        while (Rune.DecodeFromUtf8(text[offset..], out _, out var length) == OperationStatus.Done)
        {
            offset += length;
        }

        return offset;
    }

    /// <summary>Follows a reader and knows the place of what it reads.</summary>
    private sealed class Trail
    {
        private readonly Stack<Level> levels = new();
        private string? member;

        /// <summary>The member whose value is being read, or the object or list in which the reader stands.</summary>
        public string Place => levels.TryPeek(out var level) ? Inside(level) : Places.Whole;

        public void Pass(ref Utf8JsonReader reader)
        {
            switch (reader.TokenType)
            {
                case JsonTokenType.PropertyName:
                    member = reader.GetString();
                    break;
                case JsonTokenType.StartObject or JsonTokenType.StartArray:
                    levels.Push(new Level(Place, reader.TokenType == JsonTokenType.StartArray));
                    member = null;
                    break;
                case JsonTokenType.EndObject or JsonTokenType.EndArray:
                    levels.Pop();
                    ValueIsRead();
                    break;
                case JsonTokenType.String:
                    _ = reader.GetString();
                    ValueIsRead();
                    break;
                default:
                    ValueIsRead();
                    break;
            }
        }

        private string Inside(Level level) => level.IsList
            ? Places.Item(level.Place, level.Count)
            : member is null ? level.Place : Places.Member(level.Place, member);

        private void ValueIsRead()
        {
            member = null;
            if (levels.TryPeek(out var level))
            {
                level.Count++;
            }
        }

        private sealed class Level(string place, bool isList)
        {
            public string Place { get; } = place;

            public bool IsList { get; } = isList;

            public int Count { get; set; }
        }
    }
}
