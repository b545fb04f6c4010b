using Drypeak.Figures.Drawing;

namespace Drypeak.Figures.Layout;

/// <summary>A row of the sheet's table.</summary>
/// <param name="Label">What is written into it.</param>
/// <param name="Values">What is printed in its cells; empty for a row of blanks.</param>
/// <param name="Begins">Whether a group of rows begins with it.</param>
internal sealed record SheetRow(string Label, IReadOnlyList<string> Values, bool Begins = false);

/// <summary>The table of specimens: a column a specimen, cells to write in.</summary>
internal static class SheetTable
{
    private const double RowHeight = 25.5;
    private const double LabelWidth = 196;
    private const double LabelSize = 11.5;

    public static void Draw(SheetPage page, IReadOnlyList<SheetRow> rows, int columns)
    {
        var column = (page.Width - LabelWidth) / columns;
        page.Down(10);
        var (top, bottom) = (page.Y, page.Y + (rows.Count * RowHeight));
        for (var i = 0; i <= columns; i++)
        {
            var x = SheetPage.Left + LabelWidth + (i * column);
            page.Hairline(new Place(x, top), new Place(x, bottom));
        }

        foreach (var row in rows)
        {
            if (row.Begins)
            {
                page.Rule(page.Y);
            }
            else
            {
                page.Hairline(new Place(SheetPage.Left, page.Y), new Place(SheetPage.Left + page.Width, page.Y));
            }

            page.Down(17);
            page.Write(row.Label, SheetPage.Left, LabelSize, row.Values.Count > 0 ? EmbeddedFont.SemiBold : EmbeddedFont.Regular);
            for (var i = 0; i < row.Values.Count; i++)
            {
                page.Write(row.Values[i], SheetPage.Left + LabelWidth + ((i + 0.5) * column), LabelSize + 1, EmbeddedFont.SemiBold, anchor: TextAnchor.Middle);
            }

            page.Down(RowHeight - 17);
        }

        page.Rule(page.Y);
    }
}
