using System.Globalization;
using System.Text;
using System.Text.RegularExpressions;
using CsvHelper;
using CsvHelper.Configuration;
using Drypeak.Service.Exchange.Files;

namespace Drypeak.Service.Exchange.Csv;

/// <summary>A row of a CSV file.</summary>
/// <param name="Line">The line that it begins in, from 1.</param>
/// <param name="Cells">Its cells, without the spaces around unquoted ones, an apostrophe before a would-be formula taken away.</param>
internal sealed record CsvRow(int Line, IReadOnlyList<string> Cells);

/// <summary>CSV as text (RFC 4180, and as spreadsheets write it): bytes to rows of cells, and back. It knows nothing of what the cells mean.</summary>
internal static partial class CsvText
{
    private static readonly UTF8Encoding Utf8 = new(encoderShouldEmitUTF8Identifier: false, throwOnInvalidBytes: true);

    /// <summary>The rows that have anything in them; rows of empty cells, as spreadsheets leave them below a table, are passed over.</summary>
    /// <param name="bytes">UTF-8, with a byte order mark or without.</param>
    /// <param name="faults">Receives what is wrong with the form.</param>
    public static IReadOnlyList<CsvRow> Read(ReadOnlySpan<byte> bytes, List<FileFault> faults)
    {
        string text;
        try
        {
            text = Utf8.GetString(bytes).TrimStart('\uFEFF');
        }
        catch (DecoderFallbackException invalid)
        {
            faults.Add(Fault(1 + bytes[..Math.Clamp(invalid.Index, 0, bytes.Length)].Count((byte)'\n'), 1, "invalid-utf-8", "The file is not UTF-8 here. Save it as CSV in UTF-8."));
            return [];
        }

        return Split(text, faults);
    }

    /// <summary>Rows as CSV: comma, CRLF, quotes where they are needed, in UTF-8.</summary>
    public static byte[] Write(IEnumerable<IEnumerable<string?>> rows)
    {
        using var bytes = new MemoryStream();
        using (var text = new StreamWriter(bytes, Utf8, leaveOpen: true))
        using (var csv = new CsvWriter(text, new CsvConfiguration(CultureInfo.InvariantCulture) { NewLine = "\r\n" }))
        {
            foreach (var row in rows)
            {
                foreach (var cell in row)
                {
                    csv.WriteField(cell);
                }

                csv.NextRecord();
            }
        }

        return bytes.ToArray();
    }

    /// <summary>
    /// A text that a spreadsheet would take for a formula, with an apostrophe before it; so too one that already begins as
    /// such a guarded text does, for reading takes one apostrophe away.
    /// </summary>
    public static string? Guarded(string? text) => text is not null && WouldBeFormula().IsMatch(text) ? "'" + text : text;

    /// <summary>A number's shortest digits that give it back, without an exponent: <c>0.000012</c> where others write 1.2E-05.</summary>
    public static string Number(double value) => WithoutExponent(value.ToString("R", CultureInfo.InvariantCulture));

    /// <summary>The same number with its exponent carried out; a text that has none as it is.</summary>
    public static string WithoutExponent(string text)
    {
        var parts = Exponent().Match(text);
        if (!parts.Success || !int.TryParse(parts.Groups["power"].Value.Replace('−', '-'), NumberStyles.AllowLeadingSign, CultureInfo.InvariantCulture, out var power) || Math.Abs(power) > 300)
        {
            return text;
        }

        var (sign, whole, decimals) = (parts.Groups["sign"].Value, parts.Groups["whole"].Value, parts.Groups["decimals"].Value);
        var mark = parts.Groups["mark"].Value is { Length: > 0 } given ? given : ".";
        var digits = whole + decimals;
        var point = whole.Length + power;
        return point <= 0 ? $"{sign}0{mark}{new string('0', -point)}{digits}"
            : point >= digits.Length ? sign + digits + new string('0', point - digits.Length)
            : $"{sign}{digits[..point]}{mark}{digits[point..]}";
    }

    public static FileFault Fault(int line, int column, string code, string message) => new() { Line = line, Column = column, Code = code, Message = message };

    private static List<CsvRow> Split(string text, List<FileFault> faults)
    {
        var badCell = false;
        using var parser = new CsvParser(new StringReader(text), new CsvConfiguration(CultureInfo.InvariantCulture)
        {
            HasHeaderRecord = false,
            Delimiter = Separator(text).ToString(),
            TrimOptions = TrimOptions.Trim,
            IgnoreBlankLines = false,
            BadDataFound = _ => badCell = true,
        });
        var rows = new List<CsvRow>();
        for (var line = 1; parser.Read(); line += LineBreak().Count(parser.RawRecord))
        {
            var cells = new string[parser.Count];
            for (var i = 0; i < cells.Length; i++)
            {
                badCell = false;
                var cell = parser[i];
                if (badCell)
                {
                    faults.Add(BadQuotation(parser.RawRecord, parser.Delimiter[0], line, i + 1));
                }

                cells[i] = string.IsNullOrWhiteSpace(cell) ? "" : GuardedFormula().IsMatch(cell) ? cell[1..] : cell;
            }

            if (cells.Any(cell => cell.Length > 0))
            {
                rows.Add(new CsvRow(line, cells));
            }
        }

        return rows;
    }

    /// <summary>A tab in the first row parts cells, else a semicolon, else a comma: names of columns hold none of the first two.</summary>
    private static char Separator(string text)
    {
        var header = Quoted().Replace(text.TrimStart('\r', '\n').Split('\n')[0], "");
        return header.Contains('\t', StringComparison.Ordinal) ? '\t' : header.Contains(';', StringComparison.Ordinal) ? ';' : ',';
    }

    /// <summary>A mark is opened at the beginning of a cell only; anywhere else outside of one it is astray.</summary>
    private static FileFault BadQuotation(string record, char separator, int line, int column)
    {
        int? open = null;
        for (var i = 0; i < record.Length; i++)
        {
            if (record[i] != '"')
            {
                continue;
            }

            if (open is null)
            {
                open = record[..i].TrimEnd(' ') is var before && (before.Length == 0 || before[^1] == separator) ? i : null;
            }
            else if (i + 1 < record.Length && record[i + 1] == '"')
            {
                i++;
            }
            else
            {
                open = null;
            }
        }

        return open is { } start
            ? Fault(line + LineBreak().Count(record[..start]), column, "unclosed-quotation", "A quotation mark is opened here and not closed. Close it, or remove it.")
            : Fault(line, column, "stray-quotation", "A quotation mark stands inside a cell. Put the whole cell in quotation marks and double the ones inside.");
    }

    [GeneratedRegex(@"\A'*[=+\-@\t\r\n]")]
    private static partial Regex WouldBeFormula();

    [GeneratedRegex(@"\A''*[=+\-@\t\r\n]")]
    private static partial Regex GuardedFormula();

    [GeneratedRegex("\r\n|\n|\r")]
    private static partial Regex LineBreak();

    [GeneratedRegex("\"[^\"]*\"?")]
    private static partial Regex Quoted();

    [GeneratedRegex(@"\A(?<sign>[-−+]?)(?<whole>[0-9]+)(?:(?<mark>[.,])(?<decimals>[0-9]*))?[eE](?<power>[-−+]?[0-9]+)\z")]
    private static partial Regex Exponent();
}
