using System.Text;
using System.Text.RegularExpressions;

namespace Drypeak.Service.Pages.Tables;

/// <summary>What parts the cells of a pasted table.</summary>
public enum Separator
{
    Tab,
    Semicolon,
    Comma,
    Spaces,
}

/// <summary>A row of a pasted table, before anything is understood.</summary>
/// <param name="Line">Line of the pasted text, from 1.</param>
/// <param name="Text">The line as it was pasted.</param>
/// <param name="Cells">Its cells without surrounding spaces, the last of them not empty.</param>
internal sealed record TextRow(int Line, string Text, IReadOnlyList<string> Cells);

/// <summary>Cuts a pasted text into rows and cells. Rows without any text are left out.</summary>
internal static partial class TableText
{
    /// <summary>
    /// A tab anywhere means tabs, else a semicolon means semicolons: neither stands in a number. A comma may also be a decimal mark, so
    /// it parts cells only where no line has two numbers with nothing but spaces between them.
    /// </summary>
    public static Separator FindSeparator(string text)
    {
        var bare = Quoted().Replace(text, "0");
        if (bare.Contains('\t', StringComparison.Ordinal))
        {
            return Separator.Tab;
        }

        if (bare.Contains(';', StringComparison.Ordinal))
        {
            return Separator.Semicolon;
        }

        return bare.Contains(',', StringComparison.Ordinal) && !NumbersApartBySpaces().IsMatch(bare) ? Separator.Comma : Separator.Spaces;
    }

    /// <summary>The rows that hold any text.</summary>
    /// <param name="text">As pasted; lines end in LF, CRLF or CR.</param>
    /// <param name="separator">What parts the cells.</param>
    /// <param name="unclosed">The line of a quotation mark that is opened and not closed, or null.</param>
    public static IReadOnlyList<TextRow> Split(string text, Separator separator, out int? unclosed)
    {
        unclosed = null;
        var lines = text.ReplaceLineEndings("\n");
        return separator == Separator.Spaces
            ? [.. lines.Split('\n').Select((line, i) => new TextRow(i + 1, line, BySpaces(line))).Where(row => row.Cells.Count > 0)]
            : BySeparator(lines, separator switch { Separator.Tab => '\t', Separator.Semicolon => ';', _ => ',' }, out unclosed);
    }

    /// <summary>Cells between single or repeated spaces. A no-break space stays in its cell, where it is a grouping mark.</summary>
    private static string[] BySpaces(string line) => line.Split(' ', StringSplitOptions.RemoveEmptyEntries | StringSplitOptions.TrimEntries);

    /// <summary>Cells as spreadsheets write them: a cell in quotation marks may hold the separator and line breaks, a doubled mark stands for one (RFC 4180).</summary>
    private static List<TextRow> BySeparator(string text, char separator, out int? unclosed)
    {
        var rows = new List<TextRow>();
        var cells = new List<string>();
        var cell = new StringBuilder();
        var (line, rowLine, rowStart) = (1, 1, 0);
        int? quoteLine = null;
        for (var i = 0; i <= text.Length; i++)
        {
            var end = i == text.Length;
            var letter = end ? '\n' : text[i];
            if (quoteLine is not null && !end)
            {
                if (letter != '"')
                {
                    cell.Append(letter == '\n' ? ' ' : letter);
                }
                else if (i + 1 < text.Length && text[i + 1] == '"')
                {
                    cell.Append('"');
                    i++;
                }
                else
                {
                    quoteLine = null;
                }
            }
            else if (letter == '"' && cell.ToString().AsSpan().Trim(' ').IsEmpty)
            {
                cell.Clear();
                quoteLine = line;
            }
            else if (letter == separator || letter == '\n')
            {
                cells.Add(cell.ToString().Trim());
                cell.Clear();
                if (letter == '\n')
                {
                    if (cells.FindLastIndex(text => text.Length > 0) is >= 0 and var last)
                    {
                        rows.Add(new TextRow(rowLine, text[rowStart..i], cells[..(last + 1)]));
                    }

                    cells.Clear();
                    (rowLine, rowStart) = (line + 1, i + 1);
                }
            }
            else
            {
                cell.Append(letter);
            }

            if (letter == '\n')
            {
                line++;
            }
        }

        unclosed = quoteLine;
        return rows;
    }

    [GeneratedRegex("\"[^\"]*\"")]
    private static partial Regex Quoted();

    [GeneratedRegex(@"[0-9] +[-−+]?[0-9]")]
    private static partial Regex NumbersApartBySpaces();
}
