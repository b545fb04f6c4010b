using Drypeak.Figures.Drawing;
using Drypeak.Figures.Layout;

namespace Drypeak.Figures;

/// <summary>
/// The laboratory sheet as one page of A4 (ISO 216), with lines to write on. Reading <see cref="Draw"/> is reading the page.
/// </summary>
public static class LaboratorySheetFigure
{
    /// <summary>Lays the sheet out. Equal sheets give equal figures.</summary>
    /// <exception cref="ArgumentOutOfRangeException">There is no specimen, or more than a page has columns for.</exception>
    public static Figure Draw(LaboratorySheet sheet)
    {
        ArgumentOutOfRangeException.ThrowIfZero(sheet.WaterContents.Count, nameof(sheet));
        ArgumentOutOfRangeException.ThrowIfGreaterThan(sheet.WaterContents.Count, LaboratorySheet.MostSpecimens, nameof(sheet));

        var wording = new SheetWording(sheet);
        var page = new SheetPage(Paper.A4.Size);
        page.Heading(SheetWording.Heading, wording.Method, wording.Summary);
        page.Blanks(2, [("Reference", PlainText.Clean(sheet.Reference ?? "")), ("Sampled at", ""), ("Soil", ""), ("Prepared how", ""), ("Tested by", ""), ("Date", "")]);
        page.Section("Apparatus");
        page.Facts(4, wording.Apparatus);
        page.Blanks(3, [.. wording.ApparatusBlanks.Select(label => (label, ""))]);
        page.Section("Specimens");
        SheetTable.Draw(page, wording.Rows, sheet.WaterContents.Count);
        page.Section("Soil");
        page.Blanks(3, [.. wording.SoilBlanks.Select(label => (label, ""))]);
        page.Notes(wording.Notes);
        page.Foot(SheetWording.Foot);
        return new Figure(Paper.A4.Size, wording.Title, wording.Description, Palette.Light, page.Parts);
    }
}
